import { AppError } from '#shared/errors'
import type { House } from '#server/services/house'
import type { Passwords } from '#server/services/passwords'
import { assertStrong } from '#server/services/passwords'
import type { DoorLimits } from '#server/services/rate-limits'
import type { Caller, SignedIn } from '#server/services/sessions'
import { endEverySession, endSession, openSession, recordEvent } from '#server/services/sessions'
import { accountsIn } from '#server/database/directory/repositories/accounts'

/** What the door needs beside the house: who knocks, how often they may, and the slots in which passwords are compared. */
export interface Door {
  house: House
  limits: DoorLimits
  passwords: Passwords
  caller: Caller
  /** The address people type, without a path: what links in mail begin with. */
  publicUrl: string
}

/**
 * Signs in by address and password. Unknown addresses, accounts without a password and wrong passwords answer alike, after the same work.
 * A session that the same browser still held (`replaces`) ends. @returns the new session's secret. @throws AppError 401, 429, 503.
 */
export async function signIn(door: Door, given: { email: string, password: string }, replaces: SignedIn | null): Promise<string> {
  const { house, limits, passwords, caller } = door
  const { raw } = house.directory
  const account = accountsIn(raw).byEmail.get({ email: given.email })
  await limits.trySignIn(given.email, caller.address, () => recordEvent(house, 'limited', account?.id ?? null, caller))
  const right = await passwords.matches(account?.password ?? null, given.password)
  if (!account || !right || account.disabled_at) {
    recordEvent(house, 'refused', account?.id ?? null, caller)
    throw new AppError('wrong-sign-in')
  }
  await limits.signedIn(given.email, caller.address)
  return comeIn(door, account.id, replaces)
}

/** Opens a session for an account that has shown who it is. */
export function comeIn({ house, caller }: Door, accountId: string, replaces: SignedIn | null): string {
  const { raw } = house.directory
  return raw.transaction(() => {
    const account = accountsIn(raw).byId.get({ id: accountId })
    if (!account || account.disabled_at) throw new AppError('wrong-sign-in')
    if (replaces) endSession(house, replaces.accountId, replaces.sessionHash, caller, 'signed-out')
    const sid = openSession(house, account, caller)
    recordEvent(house, 'signed-in', accountId, caller)
    return sid
  }).immediate()
}

/** One click, without a password: only ever called behind the demonstration's door. */
export function signInToDemonstration(door: Door, email: string, replaces: SignedIn | null): string {
  const account = accountsIn(door.house.directory.raw).byEmail.get({ email })
  if (!account) throw new AppError('not-found')
  return comeIn(door, account.id, replaces)
}

/** Changes the password of who is signed in and ends the other sessions. @throws AppError 422 (wrong or weak, by field), 429, 503. */
export async function changePassword({ house, limits, passwords, caller }: Door, signedIn: SignedIn, given: { current: string, next: string }): Promise<void> {
  const { raw } = house.directory
  const account = accountsIn(raw).byId.get({ id: signedIn.accountId })
  if (!account) throw new AppError('no-session')
  await limits.trySignIn(account.email, caller.address, () => recordEvent(house, 'limited', account.id, caller))
  if (!await passwords.matches(account.password, given.current)) throw new AppError('refused', [{ path: 'current', code: 'password-wrong' }])
  await limits.signedIn(account.email, caller.address)
  assertStrong(given.next, account.email, 'next')
  const password = await passwords.make(given.next)
  raw.transaction(() => {
    accountsIn(raw).setPassword.run({ id: account.id, password })
    endEverySession(house, account.id, signedIn.sessionHash)
    recordEvent(house, 'password-changed', account.id, caller)
  }).immediate()
}
