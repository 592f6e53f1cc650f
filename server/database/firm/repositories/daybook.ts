import { sql } from 'kysely'
import type { Kysely, SelectQueryBuilder } from 'kysely'
import type { FirmDatabase } from '#server/database/firm/tables'
import { inScope } from '#server/database/firm/repositories/heads'
import type { EntryScope } from '#shared/access/abilities'
import type { DaybookFilter, DaybookQuery, DaybookSort } from '#shared/api/contract/daybook'
import { RANK } from '#shared/checks/finding'
import { parseReference } from '#shared/ledger/ids'
import type { EntryHeadRow } from '#shared/records/rows'

type Heads<O = object> = SelectQueryBuilder<FirmDatabase, 'entry_head', O>
const COLUMN = { finishedAt: 'finished_at', recordedAt: 'recorded_at', place: 'place_name', person: 'person_name', number: 'number', status: 'status', finding: 'finding_rank' } as const satisfies Record<DaybookSort, keyof EntryHeadRow>

/** Each word as a quoted prefix: what people type is never taken for the search's own language. */
const searchTerms = (text: string): string => text.split(/\s+/).filter(Boolean).map(word => `"${word.replaceAll('"', '""')}"*`).join(' ')

/** By all words of an entry, the firm's own among them; through the leaf, whose number the search has and whose root the head has. */
const anyWords = (text: string) => sql<boolean>`entry_head.root in (select root from leaf where seq in (select rowid from entry_search where entry_search match ${searchTerms(text)}))`
/** A party searches only what a party may read: the search's words hold the firm's notes too. */
const openWords = (text: string) => sql<boolean>`(${sql.join(text.split(/\s+/).filter(Boolean).map(word => sql`(entry_head.place_name || ' ' || coalesce(entry_head.product_name, '') || ' ' || coalesce(entry_head.number, '') || ' ' || coalesce(entry_head.method_text, '') || ' ' || coalesce(entry_head.target_text, '')) like ${`%${word.replace(/[\\%_]/g, '\\$&')}%`} escape '\\'`), sql` and `)})`

/** The heads that stand, narrowed by what was asked and by what the asker may see. */
function narrowed(db: Kysely<FirmDatabase>, scope: EntryScope, filter: DaybookFilter): Heads {
  let query = db.selectFrom('entry_head').where('entry_head.until_seq', 'is', null).where(inScope(scope))
  const { q, from, to, branchId, placeId, productId, number, personId, status, finding, late, owed } = filter
  if (q) {
    const reference = parseReference(q) ?? ''
    query = query.where(eb => eb.or([eb('entry_head.reference', '=', reference), scope.partyId ? openWords(q) : anyWords(q)]))
  }
  if (from) query = query.where('entry_head.local_day', '>=', from)
  if (to) query = query.where('entry_head.local_day', '<=', to)
  if (branchId) query = query.where('entry_head.branch_id', '=', branchId)
  if (placeId) query = query.where('entry_head.place_id', '=', placeId)
  if (status) query = query.where('entry_head.status', '=', status)
  if (finding) query = query.where('entry_head.finding_rank', '>=', finding === 'any' ? 1 : RANK[finding]).where('entry_head.finding_rank', '<=', finding === 'any' ? 3 : RANK[finding])
  if (late !== undefined) query = query.where('entry_head.late', '=', late ? 1 : 0)
  if (owed !== undefined) query = query.where('entry_head.confirmation', owed ? '=' : '<>', 'owed')
  if (personId) query = query.where(eb => eb.exists(eb.selectFrom('entry_person').select('n').whereRef('entry_person.root', '=', 'entry_head.root').whereRef('entry_person.from_seq', '=', 'entry_head.from_seq').where('entry_person.person_id', '=', personId)))
  if (productId || number) {
    query = query.where('entry_head.root', 'in', db.selectFrom('entry_product').innerJoin('entry_head as stands', join => join.onRef('stands.root', '=', 'entry_product.root').onRef('stands.from_seq', '=', 'entry_product.from_seq'))
      .select('entry_product.root').where('stands.until_seq', 'is', null)
      .where(eb => productId ? eb('entry_product.product_id', '=', productId) : eb.or([eb('entry_product.number', '=', number ?? ''), eb('entry_product.number_basic', '=', number ?? '')])))
  }
  return query
}

/** Where a page ended: the sort column's value, then what makes it unique. */
export interface Keyset { value: string | number | null, finishedAt: string, root: string }

/** One page of heads in the order asked for, from behind `after`. A page deep in the list costs what the first costs. */
export async function pageOfHeads(db: Kysely<FirmDatabase>, scope: EntryScope, query: DaybookQuery, after: Keyset | null): Promise<EntryHeadRow[]> {
  const falling = query.sort.startsWith('-')
  const column = COLUMN[query.sort.replace('-', '') as DaybookSort]
  const direction = falling ? 'desc' : 'asc'
  let heads = narrowed(db, scope, query).selectAll('entry_head')
  if (after) {
    // Row values compare in one step of the index; a null sorts first, which row values can't say.
    heads = after.value === null || column === 'number'
      ? heads.where(beyond(column, after, falling))
      : heads.where(sql<boolean>`(${sql.ref(`entry_head.${column}`)}, entry_head.finished_at, entry_head.root) ${sql.raw(falling ? '<' : '>')} (${after.value}, ${after.finishedAt}, ${after.root})`)
  }
  return heads.orderBy(`entry_head.${column}`, direction).orderBy('entry_head.finished_at', direction).orderBy('entry_head.root', direction).limit(query.limit + 1).execute()
}

function beyond(column: string, { value, finishedAt, root }: Keyset, falling: boolean) {
  const ref = sql.ref(`entry_head.${column}`)
  const later = sql`(entry_head.finished_at, entry_head.root) ${sql.raw(falling ? '<' : '>')} (${finishedAt}, ${root})`
  if (value === null) return falling ? sql<boolean>`(${ref} is null and ${later})` : sql<boolean>`((${ref} is null and ${later}) or ${ref} is not null)`
  const past = falling ? sql`(${ref} < ${value} or ${ref} is null)` : sql`${ref} > ${value}`
  return sql<boolean>`(${past} or (${ref} = ${value} and ${later}))`
}

export const keyOf = (head: EntryHeadRow, sort: DaybookQuery['sort']): Keyset => ({ value: head[COLUMN[sort.replace('-', '') as DaybookSort]], finishedAt: head.finished_at, root: head.root })

/** Body and inner part of the leaves that stand, by their sequence number. */
export async function bodiesOf(db: Kysely<FirmDatabase>, seqs: number[]): Promise<Map<number, { body: unknown, inner: unknown }>> {
  if (seqs.length === 0) return new Map()
  const rows = await db.selectFrom('leaf_body').select(['seq', 'body', 'inner']).where('seq', 'in', seqs).execute()
  const parse = (bytes: Uint8Array | null): unknown => bytes ? JSON.parse(new TextDecoder().decode(bytes)) : null
  return new Map(rows.map(row => [row.seq, { body: parse(row.body), inner: parse(row.inner) }]))
}

export const COUNTED_TO = 10_000

/** Counts what the filters find, no further than 10,000. */
export async function totalsOf(db: Kysely<FirmDatabase>, scope: EntryScope, filter: DaybookFilter) {
  const found = narrowed(db, scope, filter).select(['entry_head.root', 'entry_head.from_seq', 'entry_head.finding_rank', 'entry_head.kind']).limit(COUNTED_TO + 1)
  const counted = await db.with('found', () => found).selectFrom('found').select(({ fn, eb }) => [
    fn.count<number>(eb.case().when('kind', '=', 'entry').then(1).end()).as('count'), fn.countAll<number>().as('rows'),
    fn.count<number>(eb.case().when('finding_rank', '=', 3).then(1).end()).as('stops'), fn.count<number>(eb.case().when('finding_rank', '=', 2).then(1).end()).as('queries'),
  ]).executeTakeFirstOrThrow()
  const { products } = await db.with('found', () => found).selectFrom('found').innerJoin('entry_product', join => join.onRef('entry_product.root', '=', 'found.root').onRef('entry_product.from_seq', '=', 'found.from_seq'))
    .select(({ fn }) => fn.count<number>('entry_product.name').distinct().as('products')).executeTakeFirstOrThrow()
  return { count: Math.min(counted.count, COUNTED_TO), more: counted.rows > COUNTED_TO, stops: counted.stops, queries: counted.queries, products }
}
