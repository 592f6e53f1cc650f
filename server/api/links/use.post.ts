import { useLink } from '#server/services/links'

export default defineRoute('POST /api/links/use', async ({ event, body }) => answer(201, await admit(event, await useLink(doorOf(event), body))))
