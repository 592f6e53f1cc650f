import { readParty } from '#server/services/books'

export default defineRoute('GET /api/parties/:id', ({ file, actor, params }) => readParty(file, actor, params.id))
