import { sql } from 'kysely'
import type { Compilable, Expression, SqlBool } from 'kysely'
import type { Raw } from '#server/database/connection'
import { builder } from '#server/database/statement'
import type { FirmDatabase } from '#server/database/firm/tables'
import type { EntryHeadRow } from '#shared/records/rows'

const q = builder<FirmDatabase>()
const SHOWN = 10
type Branches = 'all' | string[]

export interface Counted<T> { rows: T[], count: number }
export interface WaitingNotice { id: string, party_name: string, subject: string, planned_at: string }

function all<R>(raw: Raw, query: Compilable<R>): R[] {
  const { sql: text, parameters } = query.compile()
  return raw.prepare(text).all(...parameters) as R[]
}

const within = (column: string, branches: Branches): Expression<SqlBool> => branches === 'all' ? sql<boolean>`1` : sql<boolean>`${sql.ref(column)} in (${sql.join(branches)})`

/** Standing entries of these branches that meet a condition: the latest ten, and how many there are. */
function heads(raw: Raw, branches: Branches, condition: Expression<SqlBool>): Counted<EntryHeadRow> {
  const found = q.selectFrom('entry_head').where('until_seq', 'is', null).where('status', '<>', 'struck').where(within('entry_head.branch_id', branches)).where(condition)
  const [counted] = all(raw, found.select(({ fn }) => fn.countAll<number>().as('n')))
  return { rows: all(raw, found.selectAll().orderBy('finished_at', 'desc').limit(SHOWN)), count: counted?.n ?? 0 }
}

export const owedBy = (raw: Raw, personId: string): EntryHeadRow[] => all(raw, q.selectFrom('entry_head').selectAll().where('until_seq', 'is', null).where('confirmation', '=', 'owed').where('owed_by', '=', personId).orderBy('finished_at', 'desc'))

export const confirmationsOwed = (raw: Raw, branches: Branches) => heads(raw, branches, sql<boolean>`confirmation = 'owed'`)

export const lateSince = (raw: Raw, branches: Branches, day: string) => heads(raw, branches, sql<boolean>`late = 1 and local_day >= ${day}`)

/** Stops and queries to which the signer said nothing. */
export const findingsWithoutWord = (raw: Raw, branches: Branches) => heads(raw, branches, sql<boolean>`finding_rank >= 2 and exists (select 1 from leaf_body where seq = facts_seq and json_extract(cast(inner as text), '$.words.explanation') is null)`)

/** A place or a product that was written as read and is not linked to the book. */
export const writtenAsRead = (raw: Raw, branches: Branches) => heads(raw, branches, sql<boolean>`kind = 'entry' and (place_id is null or exists (select 1 from entry_product as p where p.root = entry_head.root and p.from_seq = entry_head.from_seq and p.product_id is null))`)

export function placeNames(raw: Raw, ids: string[]): Map<string, { name: string, address: string }> {
  if (ids.length === 0) return new Map()
  return new Map(all(raw, q.selectFrom('place').select(['id', 'name', 'address']).where('id', 'in', ids)).map(row => [row.id, row]))
}

export const licencesEnding = (raw: Raw, day: string, until: string) => all(raw, q.selectFrom('licence').innerJoin('person', 'person.id', 'licence.person_id').select(['person_id', 'person.name', 'region', 'number', 'expires'])
  .where('person.to_day', 'is', null).where('expires', '<=', until).where('expires', '>=', sql<string>`date(${day}, '-30 days')`)
  // A licence renewed since is not what ends.
  .where(({ not, exists, selectFrom }) => not(exists(selectFrom('licence as newer').select('newer.id').whereRef('newer.person_id', '=', 'licence.person_id').whereRef('newer.region', '=', 'licence.region').whereRef('newer.expires', '>', 'licence.expires'))))
  .orderBy('expires'))

export function noticesWaiting(raw: Raw, branches: Branches): { waiting: Counted<WaitingNotice>, failed: Counted<WaitingNotice> } {
  const of = (condition: Expression<SqlBool>): Counted<WaitingNotice> => {
    const found = q.selectFrom('notice').innerJoin('visit', 'visit.id', 'notice.visit_id').where(within('visit.branch_id', branches)).where(condition)
    const [counted] = all(raw, found.select(({ fn }) => fn.countAll<number>().as('n')))
    return { rows: all(raw, found.select(['notice.id', 'party_name', 'subject', 'planned_at']).orderBy('planned_at', 'desc').limit(SHOWN)), count: counted?.n ?? 0 }
  }
  return { waiting: of(sql<boolean>`notice.state = 'planned' and notice.released_at is null`), failed: of(sql<boolean>`notice.state in ('failed', 'bounced')`) }
}

/** The zone of the firm's first branch: whose day "today" is in the office. */
export const officeZone = (raw: Raw): string => all(raw, q.selectFrom('branch').select('zone').orderBy('id').limit(1))[0]?.zone ?? 'UTC'
