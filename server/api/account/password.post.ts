import { changePassword } from '#server/services/sign-in'

export default defineRoute('POST /api/account/password', async ({ event, session, body }) => {
  await changePassword(doorOf(event), session, body)
  return answer(204, null)
})
