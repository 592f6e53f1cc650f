import type { Compilable, Kysely } from 'kysely'
import type { Raw } from '#server/database/connection'
import { builder, perConnection, statement } from '#server/database/statement'
import type { FirmDatabase, LabelVersionRow, LicenceRow, PartyRow, PlaceRow, ProductRow } from '#server/database/firm/tables'
import type { Branch, Equipment, Firm, LabelLimit, LabelUse, LabelVersion, Licence, Party, PartyAtPlace, Person, Place, Product } from '#shared/books/shapes'
import type { MixFacts } from '#shared/records/visit'
import type { Books, MixSnapshot } from '#shared/records/snapshot'
import { readBody } from '#server/database/firm/repositories/leaves'

const q = builder<FirmDatabase>()

export const toPlace = (r: PlaceRow): Place => ({
  id: r.id, parentId: r.parent_id, branchId: r.branch_id, kind: r.kind as Place['kind'], name: r.name, address: r.address, town: r.town, county: r.county, region: r.region, country: r.country, zone: r.zone,
  lat: r.lat, lon: r.lon, siteKind: { code: r.site_code, text: r.site_text }, remark: r.remark,
})
export const toParty = (r: PartyRow): Party => ({ id: r.id, name: r.name, email: r.email, phone: r.phone, language: r.language })
export const toLicence = (r: LicenceRow): Licence => ({ id: r.id, region: r.region, number: r.number, className: r.class_name, categories: JSON.parse(r.categories) as string[], issued: r.issued, expires: r.expires })
export const toProduct = (r: ProductRow, ingredients: Product['ingredients'], registrations: Product['registrations']): Product => ({
  id: r.id, name: r.name, kind: r.kind as Product['kind'], number: r.number, numberRegion: r.number_region, registrant: r.registrant, form: r.form as Product['form'], signalWord: r.signal_word as Product['signalWord'],
  restrictedUse: r.restricted_use === 1, demo: r.demo === 1, retiredOn: r.retired_on, ingredients, registrations,
})
export const toLabel = (r: LabelVersionRow, uses: LabelUse[]): LabelVersion => ({
  id: r.id, productId: r.product_id, labelDate: r.label_date, from: r.from_day, to: r.to_day, checked: r.checked === 1,
  reentry: JSON.parse(r.reentry) as LabelVersion['reentry'], protective: JSON.parse(r.protective) as LabelVersion['protective'], cautions: r.cautions, uses,
})

/** The firm's books read on the writing connection, inside whatever transaction is open: what a snapshot is taken from. */
export const booksOf = perConnection((raw: Raw): Books => {
  type Id = { id: string }
  const one = <T extends 'branch' | 'place' | 'product' | 'label_version' | 'person' | 'licence' | 'equipment'>(table: T) =>
    statement<Id, FirmDatabase[T]>(raw, p => (q as unknown as Kysely<{ keyed: { id: string } }>).selectFrom(table as 'keyed').selectAll().where('id', '=', p('id')) as unknown as Compilable<FirmDatabase[T]>)
  const [branch, place, product, label, person, licence, equipment] = [one('branch'), one('place'), one('product'), one('label_version'), one('person'), one('licence'), one('equipment')] as const
  const firm = statement<object, FirmDatabase['firm']>(raw, () => q.selectFrom('firm').selectAll())
  const registrations = statement<Id, FirmDatabase['branch_registration']>(raw, p => q.selectFrom('branch_registration').selectAll().where('branch_id', '=', p('id')).orderBy('id'))
  const licences = statement<Id, LicenceRow>(raw, p => q.selectFrom('licence').selectAll().where('person_id', '=', p('id')).orderBy('expires'))
  const ingredients = statement<Id, FirmDatabase['product_ingredient']>(raw, p => q.selectFrom('product_ingredient').selectAll().where('product_id', '=', p('id')).orderBy('n'))
  const states = statement<Id, FirmDatabase['product_registration']>(raw, p => q.selectFrom('product_registration').selectAll().where('product_id', '=', p('id')).orderBy('id'))
  const parties = statement<Id, PartyRow & { place_id: string, role: string, from_day: string, to_day: string | null }>(raw, p => q.selectFrom('party_role').innerJoin('party', 'party.id', 'party_role.party_id')
    .select(['party.id', 'name', 'email', 'phone', 'language', 'place_id', 'role', 'from_day', 'to_day']).where('place_id', '=', p('id')).orderBy('party_role.id'))
  const above = statement<Id, { parent_id: string | null }>(raw, p => q.selectFrom('place').select('parent_id').where('id', '=', p('id')))
  const uses = statement<Id, FirmDatabase['label_use']>(raw, p => q.selectFrom('label_use').selectAll().where('label_version_id', '=', p('id')).orderBy('n'))
  const limits = statement<Id, FirmDatabase['label_limit']>(raw, p => q.selectFrom('label_limit').selectAll().where('label_use_id', '=', p('id')).orderBy('n'))
  const mixSeq = statement<Id, { seq: number }>(raw, p => q.selectFrom('mix').select('seq').where('id', '=', p('id')))

  const some = <R, T>(row: R | undefined, to: (row: R) => T): T | undefined => row === undefined ? undefined : to(row)
  const partiesAt = (placeId: string): PartyAtPlace[] => {
    const at = parties.all({ id: placeId }).map(r => ({ party: toParty(r), placeId: r.place_id, role: r.role as PartyAtPlace['role'], from: r.from_day, to: r.to_day }))
    const parent = above.get({ id: placeId })?.parent_id
    return parent ? [...at, ...partiesAt(parent)] : at
  }
  return {
    firm: (): Firm => {
      const row = firm.get({})
      if (!row) throw new Error('the file has no firm')
      return { id: row.id, name: row.name, address: row.address, phone: row.phone, country: row.country }
    },
    branch: (id): Branch | undefined => some(branch.get({ id }), r => ({ ...r, registrations: registrations.all({ id }).map(s => ({ region: s.region, number: s.number, kind: s.kind, from: s.from_day, to: s.to_day })) })),
    place: id => some(place.get({ id }), toPlace),
    parties: partiesAt,
    product: id => some(product.get({ id }), r => toProduct(r, ingredients.all({ id }).map(i => ({ name: i.name, percent: i.percent })), states.all({ id }).map(s => ({ region: s.region, number: s.number, from: s.from_day, to: s.to_day })))),
    label: id => some(label.get({ id }), r => toLabel(r, uses.all({ id }).map(u => ({ sites: JSON.parse(u.sites) as string[], targets: JSON.parse(u.targets) as string[], methods: JSON.parse(u.methods) as string[], limits: limits.all({ id: u.id }).map(toLimit) })))),
    person: (id): Person | undefined => some(person.get({ id }), r => ({ id: r.id, name: r.name, licences: licences.all({ id }).map(toLicence) })),
    licence: id => some(licence.get({ id }), toLicence),
    equipment: (id): Equipment | undefined => some(equipment.get({ id }), r => ({ id: r.id, branchId: r.branch_id, name: r.name, kind: { code: r.kind_code, text: r.kind_text }, number: r.number })),
    mix: (id) => {
      const at = mixSeq.get({ id })
      if (!at) return undefined
      const body = readBody(raw, at.seq) as { facts: MixFacts, snapshot: MixSnapshot }
      return { id, finished: body.facts.finished, lines: body.facts.lines.flatMap((line, n) => body.snapshot.lines[n] ? [{ ...body.snapshot.lines[n], amount: line.amount, lot: line.lot }] : []) }
    },
  }
})

export const toLimit = (r: FirmDatabase['label_limit']): LabelLimit => ({
  of: r.of_what as LabelLimit['of'], unit: r.unit as LabelLimit['unit'], per: r.per as LabelLimit['per'], over: r.over_time as LabelLimit['over'], min: r.min, max: r.max, where: r.where_used, words: r.words,
})
