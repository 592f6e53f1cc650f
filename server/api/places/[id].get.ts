import { readPlace } from '#server/services/books'

export default defineRoute('GET /api/places/:id', ({ file, actor, params }) => readPlace(file, actor, params.id))
