import type { Raw } from '#server/database/connection'
import { builder } from '#server/database/statement'
import { toLabel, toLicence, toLimit, toPlace, toProduct } from '#server/database/firm/repositories/books'
import type { BranchRow, FirmDatabase, LabelVersionRow, LicenceRow, PlaceRow, ProductRow } from '#server/database/firm/tables'
import type { Branch, Equipment, Firm, LabelVersion, Person, Place, Product } from '#shared/books/shapes'
import type { Kit } from '#shared/books/kit'
import type { Compilable } from 'kysely'

const q = builder<FirmDatabase>()

/** Each list is one query, whatever its length; children are joined in memory. */
const all = <R>(raw: Raw, query: Compilable<R>): R[] => {
  const { sql, parameters } = query.compile()
  return raw.prepare(sql).all(...parameters) as R[]
}
function grouped<R>(rows: R[], key: (row: R) => string): (id: string) => R[] {
  const groups = new Map<string, R[]>()
  for (const row of rows) {
    const group = groups.get(key(row))
    if (group) group.push(row)
    else groups.set(key(row), [row])
  }
  return id => groups.get(id) ?? []
}

export type BranchesSeen = 'all' | string[]

export function kitFirm(raw: Raw): Firm {
  const [row] = all(raw, q.selectFrom('firm').select(['id', 'name', 'address', 'phone', 'country']))
  if (!row) throw new Error('the file has no firm')
  return row
}

export function kitBranches(raw: Raw, seen: BranchesSeen): Branch[] {
  let query = q.selectFrom('branch').selectAll().orderBy('name')
  if (seen !== 'all') query = query.where('id', 'in', seen)
  const registrations = grouped(all(raw, q.selectFrom('branch_registration').selectAll().orderBy('id')), r => r.branch_id)
  return all<BranchRow>(raw, query).map(r => ({ ...r, registrations: registrations(r.id).map(s => ({ region: s.region, number: s.number, kind: s.kind, from: s.from_day, to: s.to_day })) }))
}

export function kitPlaces(raw: Raw, seen: BranchesSeen, day: string): Place[] {
  let query = q.selectFrom('place').selectAll().where(w => w.or([w('retired_on', 'is', null), w('retired_on', '>', day)])).orderBy('name')
  if (seen !== 'all') query = query.where('branch_id', 'in', seen)
  return all<PlaceRow>(raw, query).map(toPlace)
}

/** Parties with a role, now or until lately, at a place of those branches or above it. */
export function kitParties(raw: Raw, seen: BranchesSeen, since: string): Pick<Kit, 'parties' | 'partyRoles'> {
  let query = q.selectFrom('party_role').innerJoin('place', 'place.id', 'party_role.place_id').innerJoin('party', 'party.id', 'party_role.party_id')
    .select(['party.id', 'party.name', 'party.email', 'party.language', 'party_role.place_id', 'party_role.role', 'party_role.from_day', 'party_role.to_day'])
    .where(w => w.or([w('party_role.to_day', 'is', null), w('party_role.to_day', '>=', since)])).orderBy('party_role.id')
  if (seen !== 'all') query = query.where('place.branch_id', 'in', seen)
  const rows = all(raw, query)
  const parties = new Map(rows.map(r => [r.id, { id: r.id, name: r.name, mail: r.email !== null, language: r.language }]))
  return { parties: [...parties.values()], partyRoles: rows.map(r => ({ partyId: r.id, placeId: r.place_id, role: r.role as Kit['partyRoles'][number]['role'], from: r.from_day, to: r.to_day })) }
}

/** Products not retired before `since`, with every registration: the check asks which was in force. */
export function kitProducts(raw: Raw, since: string): Product[] {
  const ingredients = grouped(all(raw, q.selectFrom('product_ingredient').selectAll().orderBy('n')), i => i.product_id)
  const registrations = grouped(all(raw, q.selectFrom('product_registration').selectAll().orderBy('id')), r => r.product_id)
  const rows = all<ProductRow>(raw, q.selectFrom('product').selectAll().where(w => w.or([w('retired_on', 'is', null), w('retired_on', '>=', since)])).orderBy('name'))
  return rows.map(r => toProduct(r, ingredients(r.id).map(i => ({ name: i.name, percent: i.percent })), registrations(r.id).map(s => ({ region: s.region, number: s.number, from: s.from_day, to: s.to_day }))))
}

/** Label versions in force now or since `since`, with their uses and limits. */
export function kitLabels(raw: Raw, since: string, day: string): LabelVersion[] {
  const held = q.selectFrom('label_version').where(w => w.or([w('to_day', 'is', null), w('to_day', '>=', since)])).where('from_day', '<=', day)
  const uses = grouped(all(raw, q.selectFrom('label_use').selectAll().where('label_version_id', 'in', held.select('id')).orderBy('n')), u => u.label_version_id)
  const limits = grouped(all(raw, q.selectFrom('label_limit').selectAll().orderBy('n')), l => l.label_use_id)
  const list = (json: string) => JSON.parse(json) as string[]
  return all<LabelVersionRow>(raw, held.selectAll().orderBy('from_day', 'desc'))
    .map(r => toLabel(r, uses(r.id).map(u => ({ sites: list(u.sites), targets: list(u.targets), methods: list(u.methods), limits: limits(u.id).map(toLimit) }))))
}

/** Everybody who works for the firm today; who holds no role may still have taken part. */
export function kitPeople(raw: Raw, day: string): Person[] {
  const licences = grouped(all<LicenceRow>(raw, q.selectFrom('licence').selectAll().orderBy('expires')), l => l.person_id)
  return all(raw, q.selectFrom('person').select(['id', 'name']).where(w => w.or([w('to_day', 'is', null), w('to_day', '>=', day)])).orderBy('name'))
    .map(r => ({ id: r.id, name: r.name, licences: licences(r.id).map(toLicence) }))
}

export function kitEquipment(raw: Raw, seen: BranchesSeen, day: string): Equipment[] {
  let query = q.selectFrom('equipment').selectAll().where(w => w.or([w('retired_on', 'is', null), w('retired_on', '>', day)])).orderBy('name')
  if (seen !== 'all') query = query.where('branch_id', 'in', seen)
  return all(raw, query).map(r => ({ id: r.id, branchId: r.branch_id, name: r.name, kind: { code: r.kind_code, text: r.kind_text }, number: r.number }))
}
