import type { Actor } from '#shared/access/abilities'
import { sha256, toHex } from '#shared/ledger/hash'
import type { House } from '#server/services/house'
import { newId } from '#server/services/house'
import { actorOf } from '#server/services/actors'
import type { AccountRow, SessionRow } from '#server/database/directory/tables'
import { accountsIn } from '#server/database/directory/repositories/accounts'
import { sessionsIn } from '#server/database/directory/repositories/sessions'

const MINUTE = 60_000
const HOUR = 60 * MINUTE

/** A session ends when nothing was asked under it for this long, and at the latest after `SESSION_LIFE`. Milliseconds. */
export const SESSION_IDLE = 12 * HOUR
export const SESSION_LIFE = 30 * 24 * HOUR
/** `seen_at` is written at most this often: a look costs no commit. */
const SEEN_EVERY = 5 * MINUTE

export interface SignedIn {
  accountId: string
  email: string
  name: string
  language: string
  sessionHash: Uint8Array
  /** The firm chosen; `actor` is null beside it when the book gives no standing there (left, or the firm is closed). */
  membershipId: string | null
  actor: Actor | null
  firmClosed: boolean
}

/** From where somebody knocks: for the record and the limits. */
export interface Caller { address: string, device: string }

export type DoorEvent = 'signed-in' | 'refused' | 'limited' | 'signed-out' | 'session-ended' | 'signed-out-everywhere' | 'firm-chosen' | 'password-changed' | 'reset-asked' | 'reset-used' | 'invited' | 'invitation-used'

export function recordEvent(house: House, what: DoorEvent, accountId: string | null, caller: Caller): void {
  accountsIn(house.directory.raw).insertEvent.run({ id: newId(house.world), at: house.world.now().toISOString(), what, account_id: accountId, address: caller.address, device: caller.device })
}

export const secretHash = (secret: string): Uint8Array => sha256(new TextEncoder().encode(secret))
/** 256 random bits, in characters that need no escaping in a cookie or after a `#`. */
export const newSecret = (house: House): string => Buffer.from(house.world.random(32)).toString('base64url')

const iso = (ms: number) => new Date(ms).toISOString()

function isGood(row: SessionRow, now: number): boolean {
  return Date.parse(row.ends_at) > now && Date.parse(row.seen_at) + SESSION_IDLE > now
}

/** Starts a session in the firm used last, or in the only one; with several and none used yet the firm is still to be chosen. @returns the secret that the cookie carries. */
export function openSession(house: House, account: AccountRow, caller: Caller): string {
  const { raw } = house.directory
  const held = accountsIn(raw).membershipsOf.all({ account_id: account.id })
  const last = sessionsIn(raw).lastMembership.get({ account_id: account.id })?.membership_id
  const chosen = held.find(m => m.id === last) ?? (held.length === 1 ? held[0] : undefined)
  const sid = newSecret(house)
  const now = house.world.now().getTime()
  sessionsIn(raw).insert.run({
    hash: secretHash(sid), kind: 'member', account_id: account.id, membership_id: chosen?.id ?? null, firm_id: null, pass_id: null,
    device: caller.device, created_at: iso(now), seen_at: iso(now), ends_at: iso(now + SESSION_LIFE), ended_at: null,
  })
  return sid
}

/** Who is signed in under this secret, with rights as they are at this moment; null when the session ended, ran out or never was. */
export function readSession(house: House, sid: string): SignedIn | null {
  const { raw } = house.directory
  const hash = secretHash(sid)
  const row = sessionsIn(raw).byHash.get({ hash })
  const now = house.world.now()
  if (!row?.account_id || !isGood(row, now.getTime())) return null
  const account = accountsIn(raw).byId.get({ id: row.account_id })
  if (!account || account.disabled_at) return null
  if (Date.parse(row.seen_at) + SEEN_EVERY < now.getTime()) sessionsIn(raw).touch.run({ hash, at: now.toISOString() })
  const member = row.membership_id ? accountsIn(raw).membership.get({ id: row.membership_id }) : undefined
  return { accountId: account.id, email: account.email, name: account.name, language: account.language, sessionHash: hash, membershipId: member?.id ?? null, actor: member ? actorOf(house, member, now) : null, firmClosed: member !== undefined && house.closedFirms.has(member.slug) }
}

/** @returns false where that membership is not (or no longer) the account's. */
export function chooseFirm(house: House, signedIn: SignedIn, membershipId: string, caller: Caller): boolean {
  const { raw } = house.directory
  const member = accountsIn(raw).membership.get({ id: membershipId })
  if (member?.account_id !== signedIn.accountId) return false
  raw.transaction(() => {
    sessionsIn(raw).setMembership.run({ hash: signedIn.sessionHash, membership_id: membershipId })
    recordEvent(house, 'firm-chosen', signedIn.accountId, caller)
  }).immediate()
  return true
}

export interface OpenSession { id: string, device: string, createdAt: string, seenAt: string, here: boolean }

/** The account's open sessions, the last used first. The id is the hash of the secret, which gives nothing away. */
export function listSessions(house: House, signedIn: SignedIn): OpenSession[] {
  const now = house.world.now().getTime()
  return sessionsIn(house.directory.raw).ofAccount.all({ account_id: signedIn.accountId }).filter(row => isGood(row, now))
    .map(row => ({ id: toHex(row.hash), device: row.device, createdAt: row.created_at, seenAt: row.seen_at, here: toHex(row.hash) === toHex(signedIn.sessionHash) }))
}

/** Ends one session of the account. @returns false where there is none of that hash. */
export function endSession(house: House, accountId: string, hash: Uint8Array, caller: Caller, what: 'signed-out' | 'session-ended'): boolean {
  const { raw } = house.directory
  return raw.transaction(() => {
    const { changes } = sessionsIn(raw).end.run({ hash, account_id: accountId, at: house.world.now().toISOString() })
    if (changes > 0) recordEvent(house, what, accountId, caller)
    return changes > 0
  }).immediate()
}

/** No hash is empty: with it nothing is spared. */
const NONE = new Uint8Array(0)

/** Ends all sessions of the account, but one if told so. Inside the caller's transaction. */
export function endEverySession(house: House, accountId: string, but: Uint8Array = NONE): void {
  sessionsIn(house.directory.raw).endAll.run({ account_id: accountId, at: house.world.now().toISOString(), but })
}

export function signOutEverywhere(house: House, accountId: string, caller: Caller): void {
  house.directory.raw.transaction(() => {
    endEverySession(house, accountId)
    recordEvent(house, 'signed-out-everywhere', accountId, caller)
  }).immediate()
}
