import { sql } from 'kysely'
import type { Compilable, SelectQueryBuilder } from 'kysely'
import type { Raw } from '#server/database/connection'
import { builder } from '#server/database/statement'
import type { EquipmentRow, FirmDatabase, PartyRow, PersonRow, PlaceRow, ProductRow } from '#server/database/firm/tables'

const q = builder<FirmDatabase>()
export type Branches = 'all' | string[]
export interface ListAsked { q?: string, limit: number, after: { name: string, id: string } | null }

function all<R>(raw: Raw, query: Compilable<R>): R[] {
  const { sql: text, parameters } = query.compile()
  return raw.prepare(text).all(...parameters) as R[]
}

const like = (text: string): string => `%${text.replace(/[\\%_]/g, '\\$&')}%`
const inBranches = (column: string, branches: Branches) => branches === 'all' ? sql<boolean>`1` : sql<boolean>`${sql.ref(column)} in (${sql.join(branches)})`
/** Any of the columns holds the words. */
const holds = (columns: string[], text: string | undefined) => text === undefined ? sql<boolean>`1` : sql<boolean>`(${sql.join(columns.map(c => sql`${sql.ref(c)} like ${like(text)} escape '\\'`), sql` or `)})`

/** One page by name from behind `after`, one row more than asked to tell whether there is another. */
function byName<O>(query: SelectQueryBuilder<FirmDatabase, never, O>, table: string, { after, limit }: ListAsked) {
  const name = sql.ref(`${table}.name`)
  const id = sql.ref(`${table}.id`)
  const from = after ? query.where(sql<boolean>`(${name}, ${id}) > (${after.name}, ${after.id})`) : query
  return from.orderBy(name).orderBy(id).limit(limit + 1)
}

export function listPlaces(raw: Raw, branches: Branches, asked: ListAsked): (PlaceRow & { last_on: string | null })[] {
  const query = q.selectFrom('place').selectAll('place')
    .select(sql<string | null>`(select local_day from entry_head as h where h.place_id = place.id and h.until_seq is null and h.status <> 'struck' order by h.finished_at desc limit 1)`.as('last_on'))
    .where('retired_on', 'is', null).where(inBranches('place.branch_id', branches)).where(holds(['place.name', 'place.address', 'place.town', 'place.county'], asked.q))
  return all(raw, byName(query as never, 'place', asked))
}

const rolesInBranches = (branches: Branches) => sql`from party_role join place on place.id = party_role.place_id where party_role.party_id = party.id and ${inBranches('place.branch_id', branches)}`

/** Parties with a role at a place of these branches; a party that has none yet is seen by who sees all branches. */
export function listParties(raw: Raw, branches: Branches, asked: ListAsked): (PartyRow & { places: number })[] {
  const query = q.selectFrom('party').selectAll('party').select(sql<number>`(select count(distinct place.id) ${rolesInBranches(branches)})`.as('places'))
    .where(holds(['party.name', 'party.email', 'party.phone'], asked.q))
    .where(branches === 'all' ? sql<boolean>`1` : sql<boolean>`exists (select 1 ${rolesInBranches(branches)})`)
  return all(raw, byName(query as never, 'party', asked))
}

export const partyRow = (raw: Raw, id: string): PartyRow | undefined => all(raw, q.selectFrom('party').selectAll().where('id', '=', id))[0]

/** A party's roles at places of these branches, by place and time. */
export const rolesOfParty = (raw: Raw, id: string, branches: Branches) => all(raw, q.selectFrom('party_role').innerJoin('place', 'place.id', 'party_role.place_id')
  .select(['place.id as place_id', 'place.name', 'place.address', 'party_role.role', 'party_role.from_day', 'party_role.to_day'])
  .where('party_role.party_id', '=', id).where(inBranches('place.branch_id', branches)).orderBy('place.name').orderBy('party_role.from_day').orderBy('party_role.id'))

export function listProducts(raw: Raw, asked: ListAsked): ProductRow[] {
  return all(raw, byName(q.selectFrom('product').selectAll('product').where(holds(['product.name', 'product.number', 'product.registrant'], asked.q)) as never, 'product', asked))
}

export function listPeople(raw: Raw, asked: ListAsked): PersonRow[] {
  return all(raw, byName(q.selectFrom('person').selectAll('person').where(sql<boolean>`(${holds(['person.name'], asked.q)} or exists (select 1 from licence where licence.person_id = person.id and ${holds(['licence.number'], asked.q)}))`) as never, 'person', asked))
}

export const personRow = (raw: Raw, id: string): PersonRow | undefined => all(raw, q.selectFrom('person').selectAll().where('id', '=', id))[0]

export function listEquipment(raw: Raw, branches: Branches, asked: ListAsked): EquipmentRow[] {
  return all(raw, byName(q.selectFrom('equipment').selectAll('equipment').where('retired_on', 'is', null).where(inBranches('equipment.branch_id', branches)).where(holds(['equipment.name', 'equipment.kind_text', 'equipment.number'], asked.q)) as never, 'equipment', asked))
}

export const placesBelow = (raw: Raw, id: string) => all(raw, q.selectFrom('place').select(['id', 'name', 'kind']).where('parent_id', '=', id).where('retired_on', 'is', null).orderBy('name'))

export const labelsOf = (raw: Raw, productId: string) => all(raw, q.selectFrom('label_version').select('id').where('product_id', '=', productId).orderBy('from_day', 'desc'))

export const branchIds = (raw: Raw) => all(raw, q.selectFrom('branch').select(['id', 'name']).orderBy('name'))

/** Roles in force on a day, by person. */
export const rolesOn = (raw: Raw, personIds: string[], day: string) => personIds.length === 0 ? [] : all(raw, q.selectFrom('person_role').leftJoin('branch', 'branch.id', 'person_role.branch_id').leftJoin('person_role_end', 'person_role_end.role_id', 'person_role.id')
  .select(['person_role.person_id', 'person_role.role', 'branch.name as branch']).where('person_role.person_id', 'in', personIds).where('person_role.from_day', '<=', day)
  .where(eb => eb.or([eb('person_role_end.to_day', 'is', null), eb('person_role_end.to_day', '>=', day)])).orderBy('person_role.id'))
