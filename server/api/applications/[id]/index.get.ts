import { readEntry } from '#server/services/entry-page'

export default defineRoute('GET /api/applications/:id', ({ file, actor, params }) => readEntry(file, actor, params.id))
