import type { NoticeFacts } from '#shared/records/body'
import { sha256, toHex } from '#shared/ledger/hash'
import type { NoticeModel } from '#shared/notices/model'
import { NoticeStopped } from '#shared/notices/notice'
import { appendLeaf, leafById } from '#server/database/firm/repositories/leaves'
import { noticesIn } from '#server/database/firm/repositories/notices'
import { outboxIn } from '#server/database/firm/repositories/outbox'
import type { FirmRow, NoticeRow, OutboxRow } from '#server/database/firm/tables'
import { composeMail } from '#server/mail/compose'
import { noticeHtml, noticeText } from '#server/mail/notice-mail'
import { MailFailure } from '#server/mail/transport'
import type { MailTransport } from '#server/mail/transport'
import type { Report } from '#server/reports/draw'
import { newId } from '#server/services/house'
import type { FirmFile, World } from '#server/services/house'
import { modelOf, noticeFileName, noticeReport, noticeSource } from '#server/services/notices'

const MINUTE = 60_000
/** Longer than any one attempt takes. */
const LEASE = 5 * MINUTE
const ATTEMPTS = 8
const LONGEST_WAIT = 6 * 60 * MINUTE

export interface Sending { file: FirmFile, world: World, transport: MailTransport, draw: (report: Report) => Promise<Uint8Array> }

/** What happened to a notice, in its own order. */
export function addNoticeEvent(file: FirmFile, world: World, noticeId: string, what: string, by: string | null = null, detail: string | null = null): void {
  noticesIn(file.raw).addEvent({ id: newId(world), notice_id: noticeId, at: world.now().toISOString(), what, by_person: by, detail })
}

/** On record once, at the first attempt or hand-over: what was told to whom, by the hash of its bytes. Inside the caller's transaction. */
export function appendNoticeLeaf(file: FirmFile, world: World, notice: NoticeRow, told: Pick<NoticeFacts, 'channel' | 'contentHash' | 'messageId'>, by: { person: string, name: string } | { job: string }): void {
  if (leafById(file.raw, notice.id)) return
  appendLeaf<'notice'>(file.raw, {
    root: notice.id, inner: null, salt: world.random(32),
    body: {
      v: 1, kind: 'notice', firm: file.id, id: notice.id, by, receivedAt: world.now().toISOString(), snapshot: null, packs: [], amends: null,
      facts: {
        v: 1, id: notice.id, visitId: notice.visit_id, entries: noticeSource(file, notice.visit_id).entries.filter(e => e.status !== 'struck').map(e => e.facts.id), partyId: notice.party_id,
        address: notice.address, subject: notice.subject, releasedBy: notice.released_by, ...told,
      },
    },
  })
}

/** Sends the firm's next notice that is due. @returns whether there was one. */
export async function sendNextNotice(sending: Sending): Promise<boolean> {
  const { file, world } = sending
  const now = world.now()
  const claim = { now: now.toISOString(), until: new Date(now.getTime() + LEASE).toISOString() }
  const row = file.raw.transaction((): OutboxRow | undefined => {
    const due = outboxIn(file.raw).claimDue(claim)
    if (due) return due
    const lost = outboxIn(file.raw).claimLost(claim)
    if (lost?.raw) addNoticeEvent(file, world, lost.notice_id, 'unanswered')
    return lost
  }).immediate()
  if (!row) return false
  const notice = noticesIn(file.raw).byId(row.notice_id)
  if (!notice?.address) throw new Error(`outbox row ${row.id} has no address`)
  try {
    const raw = row.raw ?? await compose(sending, row, notice, notice.address)
    await sending.transport.send({ from: firmOf(file).mail_from, to: notice.address, raw })
    settle(sending, row)
  }
  catch (error) {
    missed(sending, row, error)
  }
  return true
}

const firmOf = (file: FirmFile): FirmRow => file.raw.prepare('select * from firm').get() as FirmRow

/** Draws and composes once. The bytes, their hash and the leaf are on record before the first attempt. */
async function compose({ file, world, draw }: Sending, row: OutboxRow, notice: NoticeRow, address: string): Promise<Uint8Array> {
  const model: NoticeModel = modelOf(file, notice)
  const pdf = await draw(noticeReport(notice, model))
  const firm = firmOf(file)
  const raw = await composeMail({
    from: { name: firm.name, address: firm.mail_from }, to: { name: notice.party_name, address }, subject: model.subject, text: noticeText(model), html: noticeHtml(model),
    messageId: row.message_id, date: world.now(), language: model.language, attachments: [{ filename: noticeFileName(model), content: pdf, contentType: 'application/pdf' }],
  })
  const contentHash = toHex(sha256(new Uint8Array(raw)))
  file.raw.transaction(() => {
    outboxIn(file.raw).compose(row.id, raw, contentHash)
    appendNoticeLeaf(file, world, notice, { channel: 'mail', contentHash, messageId: row.message_id }, { job: 'notices' })
    addNoticeEvent(file, world, notice.id, 'composed', null, contentHash)
  }).immediate()
  return raw
}

function settle({ file, world }: Sending, row: OutboxRow): void {
  file.raw.transaction(() => {
    outboxIn(file.raw).sent(row.id, world.now().toISOString())
    noticesIn(file.raw).setState(row.notice_id, 'sent')
    // the same Message-ID, so that whoever receives it twice can tell
    const twice = noticesIn(file.raw).events(row.notice_id).some(event => event.what === 'unanswered')
    addNoticeEvent(file, world, row.notice_id, twice ? 'sent-perhaps-twice' : 'sent', null, row.message_id)
  }).immediate()
}

/** Tried in vain: again after 1, 2, 4 … minutes and a little, given up after the eighth time or where it can never go. */
function missed({ file, world }: Sending, row: OutboxRow, error: unknown): void {
  const forGood = error instanceof NoticeStopped || (error instanceof MailFailure && error.forGood)
  const message = error instanceof NoticeStopped ? error.reason : error instanceof Error ? error.message : String(error)
  file.raw.transaction(() => {
    if (error instanceof MailFailure && error.unanswered) addNoticeEvent(file, world, row.notice_id, 'unanswered')
    if (forGood || row.attempts >= ATTEMPTS) {
      outboxIn(file.raw).failed(row.id, message)
      noticesIn(file.raw).setState(row.notice_id, 'failed')
      addNoticeEvent(file, world, row.notice_id, 'failed', null, message)
      return
    }
    outboxIn(file.raw).again(row.id, new Date(world.now().getTime() + waitAfter(row.attempts, world)).toISOString(), message)
    addNoticeEvent(file, world, row.notice_id, 'not-taken', null, message)
  }).immediate()
}

/** Doubled each time, plus up to a quarter by chance, so that many that failed together do not come back together. */
export function waitAfter(attempts: number, world: Pick<World, 'random'>): number {
  const wait = Math.min(2 ** (attempts - 1) * MINUTE, LONGEST_WAIT)
  return Math.round(wait * (1 + (world.random(1)[0] ?? 0) / 1024))
}
