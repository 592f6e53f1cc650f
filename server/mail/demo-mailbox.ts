import { mkdirSync, readFileSync, readdirSync, renameSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { simpleParser } from 'mailparser'
import type { AddressObject, ParsedMail } from 'mailparser'
import { SMTPServer } from 'smtp-server'
import type { MailTransport } from '#server/mail/transport'
import { smtpTransport } from '#server/mail/transport'

const MOST = 20 * 1024 * 1024
const NAME = /^[0-9a-z-]{1,60}$/

/** The demonstration's letter box: a folder of mails as they came in. */
export class DemoMailbox {
  private readonly folder: string
  constructor(dataDir: string) {
    this.folder = join(dataDir, 'demo-mail')
    mkdirSync(this.folder, { recursive: true })
  }

  keep(bytes: Uint8Array, name: string): void {
    const path = join(this.folder, `${name}.eml`)
    // written aside first: a list never shows half a mail
    writeFileSync(`${path}.part`, bytes)
    renameSync(`${path}.part`, path)
  }

  /** Names of the latest mails, the latest first. */
  names(limit: number): string[] {
    return readdirSync(this.folder).filter(name => name.endsWith('.eml')).map(name => name.slice(0, -4)).sort().reverse().slice(0, limit)
  }

  async read(name: string): Promise<ParsedMail | null> {
    if (!NAME.test(name) || !this.names(Infinity).includes(name)) return null
    return simpleParser(readFileSync(join(this.folder, `${name}.eml`)))
  }
}

export const addressText = (of: AddressObject | AddressObject[] | undefined): string => [of ?? []].flat().map(a => a.text).join(', ')

/** A real SMTP server on loopback that puts what comes into the box, and a transport to it. Nothing leaves this machine. */
export async function demoTransport(box: DemoMailbox, newName: () => string): Promise<MailTransport> {
  const server = new SMTPServer({
    authOptional: true, disabledCommands: ['STARTTLS', 'AUTH'], size: MOST, logger: false,
    onData(stream, _session, done) {
      const chunks: Buffer[] = []
      stream.on('data', (chunk: Buffer) => chunks.push(chunk))
      stream.on('end', () => {
        box.keep(Buffer.concat(chunks), newName())
        done()
      })
    },
  })
  const port = await new Promise<number>((resolve, reject) => {
    server.on('error', reject)
    server.listen(0, '127.0.0.1', () => {
      const address = server.server.address()
      resolve(typeof address === 'object' && address ? address.port : 0)
    })
  })
  const transport = smtpTransport(`smtp://127.0.0.1:${port}`)
  return {
    send: letter => transport.send(letter),
    async close() {
      await transport.close()
      await new Promise<void>(resolve => server.close(() => resolve()))
    },
  }
}
