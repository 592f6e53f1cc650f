import { AppError } from '#shared/errors'
import type { Actor } from '#shared/access/abilities'
import { accountsIn } from '#server/database/directory/repositories/accounts'
import { subjectsIn } from '#server/database/firm/repositories/subjects'
import type { FirmFile } from '#server/services/house'
import { queueAccountMail } from '#server/services/account-mail'
import { createAccount, createMembership } from '#server/services/accounts'
import { issueLink } from '#server/services/links'
import { recordEvent } from '#server/services/sessions'
import type { Door } from '#server/services/sign-in'

/**
 * Lets somebody of the firm's book in: account (without a password when it is new), membership, and the mail, in one commit.
 * Whoever has a password already is only told: a link that sets one would let a week-old mail take the account.
 * @throws AppError 404 where the book has no such person or party, 429.
 */
export async function invite(door: Door, actor: Actor, file: FirmFile, given: { subject: Actor['subject'], email: string }): Promise<void> {
  const { house, caller, limits, publicUrl } = door
  await limits.tryInvite(actor.accountId)
  const { kind, id } = given.subject
  const named = kind === 'person' ? subjectsIn(file.reader).person.get({ id }) : subjectsIn(file.reader).party.get({ id })
  if (!named) throw new AppError('not-found')
  const { raw } = house.directory
  raw.transaction(() => {
    const account = accountsIn(raw).byEmail.get({ email: given.email }) ?? createAccount(house, { email: given.email, name: named.name, password: null, language: 'en' })
    createMembership(house, { accountId: account.id, firmId: actor.firmId, subject: given.subject })
    const firm = accountsIn(raw).membershipsOf.all({ account_id: account.id }).find(m => m.firm_id === actor.firmId)?.firm_name ?? ''
    const about = { to: account.email, name: named.name, firm, publicUrl }
    if (account.password) queueAccountMail(house, { ...about, kind: 'added', link: `${publicUrl}/sign-in` })
    else queueAccountMail(house, { ...about, kind: 'invitation', link: `${publicUrl}/invitation#${issueLink(house, account.id, 'invitation')}` })
    recordEvent(house, 'invited', account.id, caller)
  }).immediate()
}
