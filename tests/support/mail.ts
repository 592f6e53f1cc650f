import { simpleParser } from 'mailparser'
import type { ParsedMail } from 'mailparser'
import { SMTPServer } from 'smtp-server'

export interface Received { raw: Buffer, mail: ParsedMail, to: string[] }
export interface MailServer {
  readonly url: string
  readonly received: Received[]
  /** While set, every mail is refused with this status. */
  refuse: number | null
  /** The next mail that arrives (or one that did and was not asked for yet). */
  next: () => Promise<Received>
  stop: () => Promise<void>
}

/** A real SMTP server on a free port, whose mails are read back. */
export async function startMailServer(): Promise<MailServer> {
  const received: Received[] = []
  const asked: ((got: Received) => void)[] = []
  let taken = 0
  const state: { refuse: number | null } = { refuse: null }
  const server = new SMTPServer({
    authOptional: true, disabledCommands: ['STARTTLS', 'AUTH'], logger: false,
    onData(stream, session, done) {
      const chunks: Buffer[] = []
      stream.on('data', (chunk: Buffer) => chunks.push(chunk))
      stream.on('end', () => {
        if (state.refuse !== null) return done(Object.assign(new Error('not now'), { responseCode: state.refuse }))
        const raw = Buffer.concat(chunks)
        // the session forgets its envelope once it has answered
        const to = session.envelope.rcptTo.map(each => each.address)
        done()
        void simpleParser(raw).then((mail) => {
          received.push({ raw, mail, to })
          hand()
        })
      })
    },
  })
  function hand() {
    while (asked.length > 0 && taken < received.length) asked.shift()?.(received[taken++] as Received)
  }
  await new Promise<void>((resolve) => { server.listen(0, '127.0.0.1', () => resolve()) })
  const address = server.server.address()
  const port = typeof address === 'object' && address ? address.port : 0
  return {
    url: `smtp://127.0.0.1:${port}`, received,
    get refuse() { return state.refuse },
    set refuse(status) { state.refuse = status },
    next: () => new Promise((resolve) => {
      asked.push(resolve)
      hand()
    }),
    stop: () => new Promise(resolve => server.close(() => resolve())),
  }
}
