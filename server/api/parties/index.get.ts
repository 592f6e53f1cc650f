import { readParties } from '#server/services/books'

export default defineRoute('GET /api/parties', ({ file, actor, query }) => readParties(file, actor, query))
