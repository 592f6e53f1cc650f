import { perConnection } from '#server/database/statement'
import type { NoticeEventRow, NoticePaperRow, NoticeRow, NoticeState } from '#server/database/firm/tables'

export interface NoticeListRow extends NoticeRow { branch_id: string, place_name: string, local_day: string, outbox_state: string | null, last_error: string | null, attempts: number | null }
/** Which notices somebody sees: those of visits of these branches, or a party's own that were told. */
export type NoticeScope = { branches: 'all' | string[] } | { partyId: string }
/** What a party sees of its notices: nothing that was not told. */
const TOLD: readonly NoticeState[] = ['sent', 'delivered', 'read', 'printed', 'handed-over']
export interface NoticeFilter { state?: NoticeState, waiting?: boolean, before?: { at: string, id: string }, limit: number }

const LIST = `select notice.*, visit.branch_id, visit.place_name, visit.local_day, outbox.state as outbox_state, outbox.last_error, outbox.attempts
  from notice join visit on visit.id = notice.visit_id left join outbox on outbox.notice_id = notice.id`
const marks = (list: readonly unknown[]) => list.map(() => '?').join(', ')

function scoped(scope: NoticeScope): { sql: string, given: string[] } {
  if ('partyId' in scope) return { sql: `notice.party_id = ? and notice.state in (${marks(TOLD)})`, given: [scope.partyId, ...TOLD] }
  return scope.branches === 'all' ? { sql: '1 = 1', given: [] } : { sql: `visit.branch_id in (${marks(scope.branches)})`, given: scope.branches }
}

export const noticesIn = perConnection((raw) => {
  const setState = raw.prepare<[{ id: string, state: NoticeState }]>('update notice set state = @state where id = @id')
  const release = raw.prepare<[{ id: string, by: string, at: string }]>('update notice set released_by = @by, released_at = @at where id = @id and released_at is null')
  const event = raw.prepare<[NoticeEventRow]>('insert into notice_event (id, notice_id, at, what, by_person, detail) values (@id, @notice_id, @at, @what, @by_person, @detail)')
  const events = raw.prepare<[string], NoticeEventRow & { by_name: string | null }>('select notice_event.*, person.name as by_name from notice_event left join person on person.id = by_person where notice_id = ? order by at, notice_event.id')
  const byId = raw.prepare<[string], NoticeRow>('select * from notice where id = ?')
  const keepPaper = raw.prepare<[NoticePaperRow]>('insert into notice_paper (notice_id, pdf, content_hash, at) values (@notice_id, @pdf, @content_hash, @at) on conflict (notice_id) do nothing')
  const paper = raw.prepare<[string], NoticePaperRow>('select * from notice_paper where notice_id = ?')
  return {
    byId: (id: string) => byId.get(id),
    setState: (id: string, state: NoticeState) => void setState.run({ id, state }),
    release: (id: string, by: string, at: string) => release.run({ id, by, at }).changes === 1,
    addEvent: (row: NoticeEventRow) => void event.run(row),
    events: (id: string) => events.all(id),
    keepPaper: (row: NoticePaperRow) => void keepPaper.run(row),
    paper: (id: string) => paper.get(id),
    one(id: string, scope: NoticeScope): NoticeListRow | undefined {
      const { sql, given } = scoped(scope)
      return raw.prepare<unknown[], NoticeListRow>(`${LIST} where notice.id = ? and ${sql}`).get(id, ...given)
    },
    /** The latest first. */
    list(scope: NoticeScope, { state, waiting, before, limit }: NoticeFilter): NoticeListRow[] {
      const { sql, given } = scoped(scope)
      const and = [sql]
      if (state) and.push('notice.state = ?')
      if (waiting) and.push('notice.state = \'planned\' and notice.released_at is null')
      if (before) and.push('(notice.planned_at, notice.id) < (?, ?)')
      return raw.prepare<unknown[], NoticeListRow>(`${LIST} where ${and.join(' and ')} order by notice.planned_at desc, notice.id desc limit ?`)
        .all(...given, ...(state ? [state] : []), ...(before ? [before.at, before.id] : []), limit)
    },
  }
})
