import type { House } from '#server/services/house'
import { newId } from '#server/services/house'
import type { AccountMailRow } from '#server/database/directory/tables'
import { accountMailsIn } from '#server/database/directory/repositories/account-mails'
import { words } from '#server/words/words'

const MINUTE = 60_000
/** Longer than any one attempt takes: a claim that outlives it belonged to a process that died. */
const LEASE = 5 * MINUTE
const ATTEMPTS = 6

export type AccountMailKind = 'reset' | 'invitation' | 'added'
export interface AccountMail { kind: AccountMailKind, to: string, name: string, firm: string, link: string, publicUrl: string }

const escape = (text: string) => text.replace(/[&<>"']/g, c => `&#${c.charCodeAt(0)};`)

/** Words of one mail, as plain text and as simple HTML. The link stands on a line of its own, since mail programs break long lines. */
export function composeAccountMail(mail: Pick<AccountMail, 'kind' | 'name' | 'firm' | 'link'>): { subject: string, text: string, html: string } {
  const { name, firm, link } = mail
  const say = {
    reset: { subject: words('account.mail.resetSubject'), why: words('account.mail.resetWhy'), act: words('account.mail.resetAct'), note: words('account.mail.resetNote') },
    invitation: { subject: words('account.mail.invitationSubject', { firm }), why: words('account.mail.invitationWhy', { firm }), act: words('account.mail.invitationAct'), note: words('account.mail.invitationNote') },
    added: { subject: words('account.mail.addedSubject', { firm }), why: words('account.mail.addedWhy', { firm }), act: words('account.mail.addedAct'), note: words('account.mail.addedNote') },
  }[mail.kind]
  const greeting = words('account.mail.greeting', { name })
  const paragraphs = [greeting, say.why, say.act, link, say.note]
  const html = paragraphs.map(p => p === link ? `<p><a href="${escape(link)}">${escape(link)}</a></p>` : `<p>${escape(p)}</p>`).join('\n')
  return { subject: say.subject, text: `${paragraphs.join('\n\n')}\n`, html: `<!doctype html>\n<html lang="en"><body>\n${html}\n</body></html>\n` }
}

/** Puts a mail in the queue; inside the transaction that makes the link it carries. */
export function queueAccountMail(house: House, mail: AccountMail): void {
  const id = newId(house.world)
  accountMailsIn(house.directory.raw).insert.run({
    id, message_id: `<${id}@${new URL(mail.publicUrl).hostname}>`, to_address: mail.to, ...composeAccountMail(mail),
    state: 'due', attempts: 0, next_at: house.world.now().toISOString(), lease_until: null, last_error: null, sent_at: null,
  })
}

/** Claims the next mail that is due, or one whose sender died; null when none is. The claim runs out by itself. */
export function nextDueAccountMail(house: House, now: Date): AccountMailRow | null {
  return accountMailsIn(house.directory.raw).claim.get({ now: now.toISOString(), until: new Date(now.getTime() + LEASE).toISOString() }) ?? null
}

/** Sent: its words are blanked, since they hold a secret. */
export function markAccountMailSent(house: House, id: string, now: Date): void {
  accountMailsIn(house.directory.raw).sent.run({ id, at: now.toISOString() })
}

/** Tried in vain: again after 1, 4, 16 … minutes, given up after the sixth time (or at once where the other side said never). */
export function markAccountMailFailed(house: House, mail: Pick<AccountMailRow, 'id' | 'attempts'>, error: string, now: Date, forGood = false): void {
  const mails = accountMailsIn(house.directory.raw)
  if (forGood || mail.attempts >= ATTEMPTS) mails.givenUp.run({ id: mail.id, error })
  else mails.again.run({ id: mail.id, error, next: new Date(now.getTime() + 4 ** (mail.attempts - 1) * MINUTE).toISOString() })
}
