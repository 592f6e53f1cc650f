import { readPerson } from '#server/services/books'

export default defineRoute('GET /api/people/:id', ({ file, params, now }) => readPerson(file, params.id, now))
