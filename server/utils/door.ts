import { LRUCache } from 'lru-cache'
import type { H3Event } from 'h3'
import type { SessionAnswer } from '#shared/api/contract/session'
import { deviceOf } from '#shared/access/device'
import { toHex } from '#shared/ledger/hash'
import { FORWARDING, callerAddress, isNear } from '#server/services/addresses'
import { isDemonstration } from '#server/services/demonstration'
import { describeMe } from '#server/services/me'
import { Passwords } from '#server/services/passwords'
import { DoorLimits } from '#server/services/rate-limits'
import type { SignedIn } from '#server/services/sessions'
import { SESSION_LIFE, readSession, secretHash } from '#server/services/sessions'
import type { Door } from '#server/services/sign-in'
import { theHouse } from '#server/services/the-house'

const passwords = new Passwords()
const limits = new DoorLimits()
/** Seals found genuine, by the hash of the cookie's text: opening one costs half a millisecond. Whether the session is still good is the row's to say, every time. */
const opened = new LRUCache<string, string>({ max: 10_000, ttl: 10 * 60_000 })

export function doorOf(event: H3Event): Door {
  const config = useRuntimeConfig(event)
  const address = callerAddress(event.node.req.socket.remoteAddress, getRequestHeader(event, 'x-forwarded-for'), config.trustedProxy)
  return { house: theHouse(), limits, passwords, publicUrl: config.publicUrl, caller: { address, device: deviceOf(getRequestHeader(event, 'user-agent') ?? '') } }
}

/** A demonstration answers its open doors only to near peers, and never to what a proxy hands on. */
export function isDemoRequest(event: H3Event): boolean {
  return isNear(event.node.req.socket.remoteAddress ?? '')
    && FORWARDING.every(name => getRequestHeader(event, name) === undefined)
    && isDemonstration(theHouse())
}

/**
 * The sealed cookie carries the session's secret and nothing else. `__Host-` binds it to this host and to https;
 * only the demonstration, on plain http, goes without, under another name.
 */
function cookieConfig(event: H3Event) {
  const { password } = useRuntimeConfig(event).session
  const demo = event.context.demo === true
  return { password, name: demo ? 'tankside-demo' : '__Host-tankside', sessionHeader: false as const, cookie: { path: '/', httpOnly: true, secure: !demo, sameSite: 'lax' as const, maxAge: SESSION_LIFE / 1000 } }
}

export async function readSignedIn(event: H3Event): Promise<SignedIn | null> {
  const config = cookieConfig(event)
  const sealed = getCookie(event, config.name)
  if (!sealed) return null
  const key = toHex(secretHash(sealed))
  const sid = opened.get(key) ?? await unseal(event, config, sealed)
  if (sid === null) return null
  opened.set(key, sid)
  return readSession(theHouse(), sid)
}

async function unseal(event: H3Event, config: ReturnType<typeof cookieConfig>, sealed: string): Promise<string | null> {
  try {
    const { data } = await unsealSession(event, config, sealed) as { data?: { secure?: { sid?: unknown } } }
    return typeof data?.secure?.sid === 'string' ? data.secure.sid : null
  }
  catch {
    // not sealed by us, or under an earlier secret
    return null
  }
}

/** Hands the browser a new session's secret and answers who came in. */
export async function admit(event: H3Event, sid: string): Promise<SessionAnswer> {
  await replaceUserSession(event, { secure: { sid } }, cookieConfig(event))
  event.context.signedIn = readSession(theHouse(), sid)
  return sessionAnswer(event)
}

export async function forgetCookie(event: H3Event): Promise<void> {
  const config = cookieConfig(event)
  await clearUserSession(event, { ...config, cookie: { ...config.cookie, maxAge: 0 } })
  event.context.signedIn = null
}

export function sessionAnswer(event: H3Event): SessionAnswer {
  const { signedIn, demo = false } = event.context
  return { me: signedIn ? describeMe(theHouse(), signedIn, demo) : null, demo }
}
