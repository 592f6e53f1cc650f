import { composeMail } from '#server/mail/compose'
import { MailFailure } from '#server/mail/transport'
import type { MailTransport } from '#server/mail/transport'
import { outboxIn } from '#server/database/firm/repositories/outbox'
import { markAccountMailFailed, markAccountMailSent, nextDueAccountMail } from '#server/services/account-mail'
import type { House } from '#server/services/house'
import type { PdfWorker } from '#server/services/pdf-worker'
import { sendNextNotice } from '#server/services/send-notices'

/** Account mail is looked for this often; it stands in the directory, whose file is always open. */
const IDLE = 1000
const AFTER_FAULT = 30_000

export interface JobsSettings { house: House, transport: Promise<MailTransport>, pdf: PdfWorker, accountFrom: string, log: (error: unknown) => void }

/**
 * What goes out by itself: notices and account mail, one after the other. When a firm next has something due is kept in memory, read from
 * its file at the start and after each change (`poke`), so that idle firms' files are left alone.
 */
export class Jobs {
  private readonly due = new Map<string, number>()
  private stopped = false
  private wake: (() => void) | null = null
  private running: Promise<void> | null = null

  constructor(private readonly settings: JobsSettings) {
    for (const slug of settings.house.slugs()) this.due.set(slug, 0)
  }

  start(): void {
    this.running = this.loop()
  }

  /** Something of this firm may be due now. */
  poke(slug: string): void {
    this.due.set(slug, 0)
    this.wake?.()
  }

  /** Waits for the step under way, takes no other. */
  async stop(): Promise<void> {
    this.stopped = true
    this.wake?.()
    await this.running
  }

  private async loop(): Promise<void> {
    while (!this.stopped) {
      let wait: number
      try {
        wait = await this.step() ? 0 : IDLE
      }
      catch (error) {
        this.settings.log(error)
        wait = AFTER_FAULT
      }
      if (wait > 0 && !this.stopped) await this.sleep(wait)
    }
  }

  private sleep(ms: number): Promise<void> {
    return new Promise((resolve) => {
      const timer = setTimeout(resolve, ms).unref()
      this.wake = () => {
        clearTimeout(timer)
        resolve()
      }
    })
  }

  /** One account mail and one notice of each firm that has any due. @returns whether anything was done. */
  private async step(): Promise<boolean> {
    const transport = await this.settings.transport
    let done = await this.sendAccountMail(transport)
    const now = this.settings.house.world.now().getTime()
    for (const [slug, at] of this.due) {
      if (this.stopped) break
      if (at > now) continue
      // set before the look: a poke that comes meanwhile is not lost
      this.due.set(slug, Infinity)
      done = await this.sendNotice(slug, transport) || done
    }
    return done
  }

  private async sendNotice(slug: string, transport: MailTransport): Promise<boolean> {
    const { house, pdf } = this.settings
    const file = house.openOrClosed(slug)
    if (!file) return false
    const sent = await sendNextNotice({ file, world: house.world, transport, draw: report => pdf.draw(report) })
    const next = outboxIn(file.raw).nextAt()
    this.due.set(slug, Math.min(this.due.get(slug) ?? Infinity, next === null ? Infinity : Date.parse(next)))
    return sent
  }

  private async sendAccountMail(transport: MailTransport): Promise<boolean> {
    const { house, accountFrom } = this.settings
    const mail = nextDueAccountMail(house, house.world.now())
    if (!mail) return false
    try {
      const raw = await composeMail({ from: accountFrom, to: mail.to_address, subject: mail.subject, text: mail.text, html: mail.html, messageId: mail.message_id, date: house.world.now(), language: 'en' })
      await transport.send({ from: bareAddress(accountFrom), to: mail.to_address, raw })
      markAccountMailSent(house, mail.id, house.world.now())
    }
    catch (error) {
      markAccountMailFailed(house, mail, error instanceof Error ? error.message : String(error), house.world.now(), error instanceof MailFailure && error.forGood)
    }
    return true
  }
}

/** `Tankside <book@book.example>` → `book@book.example` */
const bareAddress = (from: string): string => /<([^<>]+)>\s*$/.exec(from)?.[1] ?? from
