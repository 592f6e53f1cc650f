import { lookAtLink } from '#server/services/links'

export default defineRoute('POST /api/links/look', ({ event, body }) => lookAtLink(doorOf(event), body.token))
