import { AppError } from '#shared/errors'
import { fromHex } from '#shared/ledger/hash'
import { endSession } from '#server/services/sessions'

export default defineRoute('DELETE /api/account/sessions/:id', ({ event, house, session, params }) => {
  if (!endSession(house, session.accountId, fromHex(params.id), doorOf(event).caller, 'session-ended')) throw new AppError('not-found')
  return answer(204, null)
})
