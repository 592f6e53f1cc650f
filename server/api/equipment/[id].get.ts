import { readPiece } from '#server/services/books'

export default defineRoute('GET /api/equipment/:id', ({ file, actor, params }) => readPiece(file, actor, params.id))
