import { signOutEverywhere } from '#server/services/sessions'

export default defineRoute('DELETE /api/account/sessions', async ({ event, house, session }) => {
  signOutEverywhere(house, session.accountId, doorOf(event).caller)
  await forgetCookie(event)
  return answer(204, null)
})
