import { signIn } from '#server/services/sign-in'

export default defineRoute('POST /api/session', async ({ event, body }) => {
  const sid = await signIn(doorOf(event), body, event.context.signedIn ?? null)
  return answer(201, await admit(event, sid))
})
