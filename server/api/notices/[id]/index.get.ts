import { showNotice } from '#server/services/notices'

export default defineRoute('GET /api/notices/:id', ({ file, actor, params }) => showNotice(file, actor, params.id))
