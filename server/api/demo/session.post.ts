import { signInToDemonstration } from '#server/services/sign-in'

export default defineRoute('POST /api/demo/session', async ({ event, body }) => {
  const sid = signInToDemonstration(doorOf(event), body.email, event.context.signedIn ?? null)
  return answer(201, await admit(event, sid))
})
