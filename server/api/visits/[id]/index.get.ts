import { readVisit } from '#server/services/entry-page'

export default defineRoute('GET /api/visits/:id', ({ file, actor, params }) => readVisit(file, actor, params.id))
