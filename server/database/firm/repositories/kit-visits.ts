import { sql } from 'kysely'
import type { Compilable } from 'kysely'
import type { Raw } from '#server/database/connection'
import { builder } from '#server/database/statement'
import type { FirmDatabase } from '#server/database/firm/tables'
import type { BranchesSeen } from '#server/database/firm/repositories/kit'
import type { Kit, LastVisit, OpenMix } from '#shared/books/kit'
import type { EntryBody } from '#shared/records/body'
import type { MixFacts } from '#shared/records/visit'
import type { MixSnapshot } from '#shared/records/snapshot'
import type { Quantity } from '#shared/units/quantity'

const q = builder<FirmDatabase>()
const all = <R>(raw: Raw, query: Compilable<R>): R[] => {
  const { sql: text, parameters } = query.compile()
  return raw.prepare(text).all(...parameters) as R[]
}
const read = <T>(body: Uint8Array): T => JSON.parse(new TextDecoder().decode(body)) as T
const branchOf = (seen: BranchesSeen) => seen === 'all' ? sql<boolean>`1` : sql<boolean>`place.branch_id in (${sql.join(seen)})`

/** The entries of each place's latest visit at which something was applied, as they stand; the index over (place, finish) finds it in one step a place. */
export function lastVisits(raw: Raw, seen: BranchesSeen): LastVisit[] {
  const latest = sql<string>`(select visit_id from entry_head as h where h.place_id = place.id and h.until_seq is null and h.status <> 'struck' and h.kind = 'entry' and h.visit_id is not null order by h.finished_at desc, h.root desc limit 1)`
  const rows = all(raw, q.selectFrom('place').innerJoin('entry_head', 'entry_head.place_id', 'place.id').innerJoin('leaf_body', 'leaf_body.seq', 'entry_head.facts_seq')
    .select(['place.id as placeId', 'entry_head.visit_id as visitId', 'entry_head.local_day as day', 'entry_head.root', 'leaf_body.body'])
    .where('entry_head.visit_id', '=', latest).where('entry_head.kind', '=', 'entry').where('entry_head.until_seq', 'is', null).where('entry_head.status', '<>', 'struck').where('place.retired_on', 'is', null)
    .where(branchOf(seen)).orderBy('place.id').orderBy('entry_head.root_seq'))
  const visits = new Map<string, LastVisit>()
  for (const row of rows) {
    const { facts, snapshot } = read<EntryBody>(row.body)
    const products = (snapshot.mix?.lines ?? snapshot.lines).map(({ product: { id, name, number } }) => ({ id, name, number }))
    const visit = visits.get(row.placeId) ?? { placeId: row.placeId, visitId: row.visitId ?? '', day: row.day, entries: [] }
    visit.entries.push({ id: row.root, facts, products })
    visits.set(row.placeId, visit)
  }
  return [...visits.values()]
}

/** Places whose latest visit asks for another by `until`; the longest overdue first. */
export function placesDue(raw: Raw, seen: BranchesSeen, until: string): Kit['due'] {
  const latest = sql<number>`(select seq from visit as v where v.place_id = place.id order by v.left_at desc, v.seq desc limit 1)`
  const rows = all(raw, q.selectFrom('place').innerJoin('visit', 'visit.place_id', 'place.id').select(['place.id as placeId', 'visit.follow_up_on as on'])
    .where('visit.seq', '=', latest).where('visit.follow_up_on', '<=', until).where('place.retired_on', 'is', null).where(branchOf(seen)).orderBy('visit.follow_up_on'))
  return rows.flatMap(({ placeId, on }) => on === null ? [] : [{ placeId, on }])
}

/** Where this person was last, latest first. Only the newest visits of the log are looked at, however long it is. */
export function recentPlaces(raw: Raw, personId: string): string[] {
  const newest = q.selectFrom('visit').select(['place_id', 'left_at', 'signer']).orderBy('seq', 'desc').limit(2000).as('newest')
  const rows = all(raw, q.selectFrom(newest).select(['newest.place_id']).where('newest.signer', '=', personId).where('newest.place_id', 'is not', null)
    .groupBy('newest.place_id').orderBy(({ fn }) => fn.max('newest.left_at'), 'desc').limit(8))
  return rows.flatMap(({ place_id }) => place_id ?? [])
}

/** Tanks made up since `since`, with what entries as they stand drew from each. */
export function openMixes(raw: Raw, seen: BranchesSeen, since: string): OpenMix[] {
  let query = q.selectFrom('mix').innerJoin('leaf_body', 'leaf_body.seq', 'mix.seq').select(['mix.seq', 'mix.id', 'leaf_body.body']).where('mix.made_at', '>=', since).orderBy('mix.made_at', 'desc')
  if (seen !== 'all') query = query.where('mix.branch_id', 'in', seen)
  const mixes = all(raw, query)
  if (mixes.length === 0) return []
  const first = Math.min(...mixes.map(m => m.seq))
  const draws = all(raw, q.selectFrom('application').innerJoin('entry_head', 'entry_head.facts_seq', 'application.seq').select(['application.mix_id', 'application.drawn_value', 'application.drawn_unit'])
    .where('application.seq', '>', first).where('application.mix_id', 'in', mixes.map(m => m.id)).where('entry_head.until_seq', 'is', null).where('entry_head.status', '<>', 'struck'))
  return mixes.map(({ id, body }) => {
    const { facts, snapshot } = read<{ facts: MixFacts, snapshot: MixSnapshot }>(body)
    const drawn = draws.flatMap(d => d.mix_id === id && d.drawn_value && d.drawn_unit ? [{ value: d.drawn_value, unit: d.drawn_unit as Quantity['unit'] }] : [])
    const lines = facts.lines.flatMap((line, n) => snapshot.lines[n] ? [{ ...snapshot.lines[n], amount: line.amount, lot: line.lot }] : [])
    return { mix: { id, finished: facts.finished, lines }, branchId: facts.branchId, madeAt: facts.madeAt, zone: facts.zone, equipment: snapshot.equipment?.name ?? null, drawn }
  })
}
