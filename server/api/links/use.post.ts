import { useLink } from '#server/services/links'

export default defineRoute('POST /api/links/use', async ({ event, body }) => {
  const sid = await useLink(doorOf(event), body, event.context.signedIn ?? null)
  return answer(201, await admit(event, sid))
})
