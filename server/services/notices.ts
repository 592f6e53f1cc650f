import type { Actor } from '#shared/access/abilities'
import { branchesFor } from '#shared/access/abilities'
import type { NoticeAnswer, NoticeLine } from '#shared/api/contract/notices'
import { AppError } from '#shared/errors'
import { toHex } from '#shared/ledger/hash'
import type { NoticeModel } from '#shared/notices/model'
import { NoticeStopped, noticeModel } from '#shared/notices/notice'
import type { NoticeEntry, NoticeSource } from '#shared/notices/notice'
import type { Leaf } from '#shared/records/body'
import { stand } from '#shared/records/standing'
import { isVersion } from '#shared/reports/record-history'
import { leavesOf } from '#server/database/firm/repositories/leaves'
import { noticesIn } from '#server/database/firm/repositories/notices'
import type { NoticeListRow, NoticeScope } from '#server/database/firm/repositories/notices'
import { outboxIn } from '#server/database/firm/repositories/outbox'
import type { NoticeRow, NoticeState } from '#server/database/firm/tables'
import { noticeHtml, noticeText } from '#server/mail/notice-mail'
import type { Report } from '#server/reports/draw'
import type { FirmFile } from '#server/services/house'
import { words } from '#server/words/words'

/** Officers and owners see those of their branches, a party its own. */
export const noticeScope = (actor: Actor): NoticeScope =>
  actor.subject.kind === 'party' ? { partyId: actor.subject.id } : { branches: branchesFor(actor, 'notice.read', ['owner', 'officer']) }

/** What a notice tells of: the visit and its entries as they stand now. */
export function noticeSource(file: FirmFile, visitId: string): NoticeSource {
  const [visit] = leavesOf(file.raw, visitId) as Leaf<'visit'>[]
  if (!visit) throw new Error(`no visit ${visitId}`)
  const entries = visit.body.facts.entries.flatMap(({ id }): NoticeEntry[] => {
    const leaves = leavesOf(file.raw, id)
    const version = leaves.filter(isVersion).at(-1)
    const head = stand(leaves)?.head
    if (!version || !head) return []
    return [{ facts: version.body.facts, snapshot: version.body.snapshot, reference: head.reference, hash: toHex(head.facts_hash ?? new Uint8Array()), status: head.status }]
  })
  return { visit: visit.body, entries }
}

/** @throws NoticeStopped */
export const modelOf = (file: FirmFile, notice: Pick<NoticeRow, 'visit_id'>): NoticeModel => noticeModel(noticeSource(file, notice.visit_id), words)

/** The page of a notice; dated like the plan for it, so that the same notice is the same bytes. */
export const noticeReport = (notice: Pick<NoticeRow, 'planned_at'>, model: NoticeModel): Report =>
  ({ kind: 'notice', model, createdAt: notice.planned_at, page: words('paper.record.page', { page: '{page}', pages: '{pages}' }) })

export const noticeFileName = (model: NoticeModel): string => words('mail.notice.file', { reference: model.treatments[0]?.reference ?? '' })

const lineOf = (row: NoticeListRow): NoticeLine => ({
  id: row.id, visitId: row.visit_id, party: row.party_name, place: row.place_name, channel: row.channel, address: row.address, state: row.state, subject: row.subject,
  day: row.local_day, plannedAt: row.planned_at, releasedAt: row.released_at, waiting: row.state === 'planned' && row.released_at === null, trouble: row.last_error, attempts: row.attempts ?? 0,
})

export interface NoticeQuery { state?: NoticeState | 'waiting', cursor?: string }
const PAGE = 50

export function listNotices(file: FirmFile, actor: Actor, { state, cursor }: NoticeQuery): { rows: NoticeLine[], next: string | null } {
  const [at = '', id = ''] = cursor?.split('~') ?? []
  const rows = noticesIn(file.raw).list(noticeScope(actor), { limit: PAGE + 1, ...(state === 'waiting' ? { waiting: true } : state ? { state } : {}), ...(cursor ? { before: { at, id } } : {}) })
  const shown = rows.slice(0, PAGE)
  const last = shown.at(-1)
  return { rows: shown.map(lineOf), next: rows.length > PAGE && last ? `${last.planned_at}~${last.id}` : null }
}

/** @throws AppError not-found */
export function findNotice(file: FirmFile, actor: Actor, id: string): NoticeListRow {
  const row = noticesIn(file.raw).one(id, noticeScope(actor))
  if (!row) throw new AppError('not-found')
  return row
}

/** One notice as it will look, or why it is not made. */
export function showNotice(file: FirmFile, actor: Actor, id: string): NoticeAnswer {
  const row = findNotice(file, actor, id)
  const events = noticesIn(file.raw).events(id).map(e => ({ at: e.at, what: e.what, by: e.by_name, detail: actor.subject.kind === 'party' ? null : e.detail }))
  const hash = outboxIn(file.raw).ofNotice(id)?.content_hash ?? noticesIn(file.raw).paper(id)?.content_hash ?? null
  const zone = noticeSource(file, row.visit_id).visit.facts.zone
  try {
    const model = modelOf(file, row)
    return { ...lineOf(row), zone, events, contentHash: hash, model, text: noticeText(model), html: noticeHtml(model), stopped: null }
  }
  catch (error) {
    if (!(error instanceof NoticeStopped)) throw error
    return { ...lineOf(row), zone, events, contentHash: hash, model: null, text: null, html: null, stopped: error.reason }
  }
}
