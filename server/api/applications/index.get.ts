import { readDaybook } from '#server/services/daybook'

export default defineRoute('GET /api/applications', ({ file, actor, query }) => readDaybook(file, actor, query))
