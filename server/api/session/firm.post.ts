import { AppError } from '#shared/errors'
import { chooseFirm } from '#server/services/sessions'

export default defineRoute('POST /api/session/firm', async ({ event, house, session, body }) => {
  if (!chooseFirm(house, session, body.membershipId, doorOf(event).caller)) throw new AppError('not-found')
  event.context.signedIn = await readSignedIn(event)
  return sessionAnswer(event)
})
