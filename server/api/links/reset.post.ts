import { askForReset } from '#server/services/links'

export default defineRoute('POST /api/links/reset', async ({ event, body }) => {
  await askForReset(doorOf(event), body.email)
  return answer(202, { asked: true })
})
