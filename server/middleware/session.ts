import { isDemoRequest, readSignedIn } from '#server/utils/door'

/** A request that a page made while it was drawn on the server: it stands under the browser's own request. */
const parentOf = (request: object): { signedIn?: unknown, demo?: boolean } | undefined =>
  (request as { __unenv__?: { signedIn?: unknown, demo?: boolean } }).__unenv__

export default defineEventHandler(async (event) => {
  const parent = parentOf(event.node.req)
  event.context.demo = parent ? parent.demo === true : isDemoRequest(event)
  event.context.signedIn = await readSignedIn(event)
})
