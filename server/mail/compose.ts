import { createHash } from 'node:crypto'
import MailComposer from 'nodemailer/lib/mail-composer'

export interface Mail {
  from: { name: string, address: string } | string
  to: { name: string, address: string } | string
  subject: string
  text: string
  html: string
  messageId: string
  date: Date
  language: string
  attachments?: { filename: string, content: Uint8Array, contentType: string }[]
}

/** Lines as SMTP sends them, the last one ended too: then the hash of these bytes is the hash of what arrives. */
const asSent = (bytes: Buffer): Buffer => Buffer.from(`${bytes.toString('latin1').replace(/\r?\n/g, '\r\n').replace(/(\r\n)*$/, '')}\r\n`, 'latin1')

/** The bytes of a mail. The line between its parts follows from the Message-ID, so that the same mail is the same bytes. */
export async function composeMail({ language, attachments = [], ...mail }: Mail): Promise<Buffer> {
  return asSent(await new MailComposer({
    ...mail, baseBoundary: createHash('sha256').update(mail.messageId).digest('hex').slice(0, 32), headers: { 'Content-Language': language, 'Auto-Submitted': 'auto-generated' },
    attachments: attachments.map(a => ({ ...a, content: Buffer.from(a.content) })), disableFileAccess: true, disableUrlAccess: true,
  }).compile().build())
}
