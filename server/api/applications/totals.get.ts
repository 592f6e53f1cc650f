import { readTotals } from '#server/services/daybook'

export default defineRoute('GET /api/applications/totals', ({ file, actor, query }) => readTotals(file, actor, query))
