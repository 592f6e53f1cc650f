import { randomBytes } from 'node:crypto'
import type { ServerResponse } from 'node:http'

const YEAR = 365 * 24 * 60 * 60

const policy = (nonce: string) => [
  "default-src 'self'",
  `script-src 'self' 'nonce-${nonce}'`,
  `style-src 'self' 'nonce-${nonce}'`,
  "style-src-attr 'none'",
  "img-src 'self' data: blob:",
  "font-src 'self'",
  "connect-src 'self'",
  "worker-src 'self'",
  "manifest-src 'self'",
  "object-src 'none'",
  "base-uri 'none'",
  "form-action 'self'",
  "frame-ancestors 'none'",
].join('; ')

/** What every answer carries. A page's own policy replaces the bare one, which is for answers that are no page. */
const ALWAYS = {
  'x-content-type-options': 'nosniff',
  'referrer-policy': 'no-referrer',
  'permissions-policy': 'geolocation=(self), camera=(self), microphone=(), payment=(), usb=()',
  'cross-origin-opener-policy': 'same-origin',
  'cross-origin-resource-policy': 'same-origin',
  'content-security-policy': "default-src 'none'; frame-ancestors 'none'; base-uri 'none'; form-action 'none'",
}

export default defineNitroPlugin((nitro) => {
  // Vite's own client has no nonce
  if (import.meta.dev) return

  const always = useRuntimeConfig().publicUrl.startsWith('https:')
    ? { ...ALWAYS, 'strict-transport-security': `max-age=${YEAR}` }
    : ALWAYS

  nitro.hooks.hook('request', (event: { path: string, node: { res: ServerResponse } }) => {
    for (const [name, value] of Object.entries(always)) event.node.res.setHeader(name, value)
    if (event.path.startsWith('/api/')) event.node.res.setHeader('cache-control', 'no-store')
  })

  nitro.hooks.hook('render:html', (html, { event }) => {
    const nonce = randomBytes(18).toString('base64')
    const sign = (chunk: string) => chunk.replace(/<(script|style|link)(?=[\s>])/g, `<$1 nonce="${nonce}"`)
    html.head = html.head.map(sign)
    html.bodyPrepend = html.bodyPrepend.map(sign)
    html.bodyAppend = html.bodyAppend.map(sign)
    // html.body is never signed: markup that slipped into a page stays without effect
    event.node.res.setHeader('content-security-policy', policy(nonce))
    event.node.res.setHeader('cache-control', 'no-store')
  })
})
