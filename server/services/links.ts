import { AppError } from '#shared/errors'
import type { House } from '#server/services/house'
import { accountsIn } from '#server/database/directory/repositories/accounts'
import type { AccountRow, LinkRow } from '#server/database/directory/tables'
import { linksIn } from '#server/database/directory/repositories/links'
import { assertStrong } from '#server/services/passwords'
import { queueAccountMail } from '#server/services/account-mail'
import type { SignedIn } from '#server/services/sessions'
import { endEverySession, newSecret, recordEvent, secretHash } from '#server/services/sessions'
import type { Door } from '#server/services/sign-in'
import { comeIn } from '#server/services/sign-in'

const MINUTE = 60_000
export const LINK_LIFE = { reset: 30 * MINUTE, invitation: 7 * 24 * 60 * MINUTE } as const

/** A new single-use link; inside the caller's transaction. @returns the secret that goes behind the `#`, of which only the hash is kept. */
export function issueLink(house: House, accountId: string, kind: LinkRow['kind']): string {
  const secret = newSecret(house)
  const now = house.world.now().getTime()
  linksIn(house.directory.raw).insert.run({ hash: secretHash(secret), kind, account_id: accountId, created_at: new Date(now).toISOString(), ends_at: new Date(now + LINK_LIFE[kind]).toISOString(), used_at: null })
  return secret
}

/**
 * Mails a reset link when the address is an account's. The answer is the same either way, and so is the time but for two inserts:
 * both ways make one commit. @throws AppError 429.
 */
export async function askForReset({ house, limits, caller, publicUrl }: Door, email: string): Promise<void> {
  await limits.tryReset(email, caller.address)
  const { raw } = house.directory
  raw.transaction(() => {
    const account = accountsIn(raw).byEmail.get({ email })
    if (account && !account.disabled_at) queueAccountMail(house, { to: account.email, name: account.name, firm: '', publicUrl, kind: 'reset', link: `${publicUrl}/reset#${issueLink(house, account.id, 'reset')}` })
    recordEvent(house, 'reset-asked', account?.id ?? null, caller)
  }).immediate()
}

function openLink(house: House, token: string): { link: LinkRow, account: AccountRow } {
  const { raw } = house.directory
  const link = linksIn(raw).open.get({ hash: secretHash(token), at: house.world.now().toISOString() })
  const account = link && accountsIn(raw).byId.get({ id: link.account_id })
  // an invitation to an account that has a password since would be a week-long way to take it
  if (!link || !account || account.disabled_at || (link.kind === 'invitation' && account.password)) throw new AppError('link-used')
  return { link, account }
}

/** `m…@alder-wick.example`: enough to recognise the own address, too little for whoever found the mail's link. */
export function maskEmail(email: string): string {
  const at = email.lastIndexOf('@')
  return `${email.slice(0, 1)}…${email.slice(at)}`
}

/** What a link is for; changes nothing, since mail scanners open links. @throws AppError 410, 429. */
export async function lookAtLink({ house, limits, caller }: Door, token: string) {
  await limits.tryLink(caller.address)
  const { link, account } = openLink(house, token)
  const [membership] = accountsIn(house.directory.raw).membershipsOf.all({ account_id: account.id })
  return { kind: link.kind, email: maskEmail(account.email), name: link.kind === 'invitation' ? account.name : null, firm: link.kind === 'invitation' ? membership?.firm_name ?? null : null }
}

/**
 * Sets the password by a link, once: every open link and every session of the account ends, and the caller is signed in.
 * @returns the new session's secret. @throws AppError 410, 422, 429, 503.
 */
export async function useLink(door: Door, given: { token: string, password: string, name?: string | undefined }, replaces: SignedIn | null): Promise<string> {
  const { house, limits, passwords, caller } = door
  await limits.tryLink(caller.address)
  const { account } = openLink(house, given.token)
  assertStrong(given.password, account.email, 'password')
  const password = await passwords.make(given.password)
  const { raw } = house.directory
  return raw.transaction(() => {
    // looked up again: the same link may have been used while the password was being hashed
    const { link } = openLink(house, given.token)
    accountsIn(raw).setPassword.run({ id: account.id, password })
    if (link.kind === 'invitation' && given.name) accountsIn(raw).setName.run({ id: account.id, name: given.name })
    linksIn(raw).close.run({ account_id: account.id, at: house.world.now().toISOString() })
    endEverySession(house, account.id)
    recordEvent(house, link.kind === 'invitation' ? 'invitation-used' : 'reset-used', account.id, caller)
    return comeIn(door, account.id, replaces)
  }).immediate()
}
