import { readToday } from '#server/services/today'

export default defineRoute('GET /api/today', ({ file, actor, now }) => readToday(file, actor, now))
