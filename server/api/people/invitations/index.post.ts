import { invite } from '#server/services/invitations'

export default defineRoute('POST /api/people/invitations', async ({ event, actor, file, body }) => {
  await invite(doorOf(event), actor, file, body)
  return answer(202, { invited: true })
})
