import { listNotices } from '#server/services/notices'

export default defineRoute('GET /api/notices', ({ file, actor, query }) => listNotices(file, actor, query))
