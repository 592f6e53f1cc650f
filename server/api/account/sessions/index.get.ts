import { listSessions } from '#server/services/sessions'

export default defineRoute('GET /api/account/sessions', ({ house, session }) => ({ sessions: listSessions(house, session) }))
