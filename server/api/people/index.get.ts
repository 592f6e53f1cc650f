import { readPeople } from '#server/services/books'

export default defineRoute('GET /api/people', ({ file, query, now }) => readPeople(file, query, now))
