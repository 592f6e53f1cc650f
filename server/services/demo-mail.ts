import type { ParsedMail } from 'mailparser'
import type { MailLine } from '#shared/api/contract/notices'
import { AppError } from '#shared/errors'
import { addressText } from '#server/mail/demo-mailbox'
import type { DemoMailbox } from '#server/mail/demo-mailbox'

const SHOWN = 50

const lineOf = (id: string, mail: ParsedMail): MailLine => ({ id, at: mail.date?.toISOString() ?? '', from: addressText(mail.from), to: addressText(mail.to), subject: mail.subject ?? '', attachments: mail.attachments.length })

/** A demonstration that was given a mail server has no box of its own. */
const boxOf = (box: DemoMailbox | null): DemoMailbox => {
  if (!box) throw new AppError('not-found')
  return box
}

async function read(box: DemoMailbox | null, id: string): Promise<ParsedMail> {
  const mail = await boxOf(box).read(id)
  if (!mail) throw new AppError('not-found')
  return mail
}

export async function listMails(box: DemoMailbox | null): Promise<MailLine[]> {
  const held = boxOf(box)
  const mails = await Promise.all(held.names(SHOWN).map(async id => ({ id, mail: await held.read(id) })))
  return mails.flatMap(({ id, mail }) => mail ? [lineOf(id, mail)] : [])
}

export async function showMail(box: DemoMailbox | null, id: string) {
  const mail = await read(box, id)
  return {
    ...lineOf(id, mail), messageId: mail.messageId ?? '', text: mail.text ?? '', html: mail.html || '',
    files: mail.attachments.map(a => ({ name: a.filename ?? '', type: a.contentType, size: a.size })),
  }
}

export async function mailFile(box: DemoMailbox | null, id: string, n: number): Promise<{ bytes: Uint8Array, name: string, type: string }> {
  const file = (await read(box, id)).attachments[n]
  if (!file) throw new AppError('not-found')
  return { bytes: file.content, name: file.filename ?? id, type: file.contentType }
}
