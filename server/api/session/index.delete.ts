import { endSession } from '#server/services/sessions'

export default defineRoute('DELETE /api/session', async ({ event, house }) => {
  const { signedIn } = event.context
  if (signedIn) endSession(house, signedIn.accountId, signedIn.sessionHash, doorOf(event).caller, 'signed-out')
  await forgetCookie(event)
  return answer(204, null)
})
