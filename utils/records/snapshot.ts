import { z } from 'zod'
import type { Branch, Equipment, Firm, LabelVersion, Licence, PartyAtPlace, Person, Place, Product } from '#shared/books/shapes'
import { BranchSchema, EquipmentSchema, FirmSchema, LabelVersionSchema, LicenceSchema, PARTY_ROLES, PlaceSchema, ProductSchema } from '#shared/books/shapes'
import { CodedSchema, RecordIdSchema, referId } from '#shared/records/shapes'
import type { EntryFacts } from '#shared/records/entry'
import type { MixFacts, VisitFacts } from '#shared/records/visit'
import { QuantitySchema } from '#shared/units/quantity'
import type { Refer } from '#shared/records/shapes'

/** What the books said when the record was received (dated rows: on the local day of the work). Only what any party to the place may see. */
const SnapshotPlaceSchema = PlaceSchema.pick({ name: true, address: true, town: true, county: true, region: true, country: true, kind: true }).extend({
  id: z.string().nullable(), siteKind: CodedSchema.nullable(), parties: z.array(z.object({ id: z.string(), name: z.string(), role: z.enum(PARTY_ROLES) })),
})
const SnapshotProductSchema = ProductSchema.omit({ retiredOn: true, id: true }).extend({ id: z.string().nullable() })
const SnapshotLabelSchema = LabelVersionSchema.omit({ productId: true })

export const SnapshotLineSchema = z.object({ product: SnapshotProductSchema, label: SnapshotLabelSchema.nullable() })
export type SnapshotLine = z.infer<typeof SnapshotLineSchema>
export const SnapshotPersonSchema = z.object({ id: z.string().nullable(), name: z.string(), licence: LicenceSchema.nullable() })

/** A mix as an entry that draws from it carries it: enough to state every share again. */
export const SnapshotMixSchema = z.object({
  id: RecordIdSchema, finished: QuantitySchema, lines: z.array(SnapshotLineSchema.extend({ amount: QuantitySchema, lot: z.string().nullable() })),
})

export const EntrySnapshotSchema = z.object({
  firm: FirmSchema,
  branch: BranchSchema.pick({ id: true, name: true, address: true, phone: true, region: true, registrations: true }),
  place: SnapshotPlaceSchema,
  equipment: EquipmentSchema.pick({ name: true, number: true }).extend({ id: z.string().nullable(), kind: CodedSchema.nullable() }).nullable(),
  people: z.array(SnapshotPersonSchema),
  lines: z.array(SnapshotLineSchema),
  mix: SnapshotMixSchema.nullable(),
})
export type EntrySnapshot = z.infer<typeof EntrySnapshotSchema>

export const VisitSnapshotSchema = EntrySnapshotSchema.pick({ firm: true, branch: true, place: true, people: true })
export type VisitSnapshot = z.infer<typeof VisitSnapshotSchema>

export const MixSnapshotSchema = EntrySnapshotSchema.pick({ firm: true, branch: true, equipment: true, people: true, lines: true })
export type MixSnapshot = z.infer<typeof MixSnapshotSchema>

/** Where a snapshot is read from: the firm's file on the server, the kit on a device. Undefined = not in the book. */
export interface Books {
  firm: () => Firm
  branch: (id: string) => Branch | undefined
  place: (id: string) => Place | undefined
  parties: (placeId: string) => PartyAtPlace[]
  product: (id: string) => Product | undefined
  label: (id: string) => LabelVersion | undefined
  person: (id: string) => Person | undefined
  licence: (id: string) => Licence | undefined
  equipment: (id: string) => Equipment | undefined
  mix: (id: string) => z.infer<typeof SnapshotMixSchema> | undefined
}

/** A reference that names nothing in the books: `path` says where it stands. */
export class NotInBook extends Error {
  constructor(readonly path: string) {
    super(`not in the book: ${path}`)
    this.name = 'NotInBook'
  }
}

const inForce = (row: { from: string, to: string | null }, day: string) => row.from <= day && (row.to === null || day <= row.to)
const found = <T>(value: T | undefined, path: string): T => {
  if (value === undefined) throw new NotInBook(path)
  return value
}

function snapshotBranch(books: Books, branchId: string, day: string): EntrySnapshot['branch'] {
  const { id, name, address, phone, region, registrations } = found(books.branch(branchId), 'branchId')
  return { id, name, address, phone, region, registrations: registrations.filter(r => inForce(r, day)) }
}

function snapshotPlace(books: Books, place: Refer, branch: EntrySnapshot['branch'], day: string): EntrySnapshot['place'] {
  if ('read' in place) {
    return { id: null, name: place.read.name, address: place.read.address ?? '', town: '', county: '', region: branch.region, country: books.firm().country, kind: 'property', siteKind: null, parties: [] }
  }
  const row = found(books.place(place.id), 'place')
  const { id, name, address, town, county, region, country, kind, siteKind } = row
  const parties = books.parties(place.id).filter(p => inForce(p, day)).map(p => ({ id: p.party.id, name: p.party.name, role: p.role }))
  return { id, name, address, town, county, region, country, kind, siteKind, parties }
}

function snapshotLine(books: Books, line: { labelVersionId: string | null, product: Refer | null }, day: string, path: string): SnapshotLine {
  const label = line.labelVersionId ? found(books.label(line.labelVersionId), `${path}.labelVersionId`) : null
  const productId = label?.productId ?? referId(line.product)
  if (!productId) {
    const read = line.product && 'read' in line.product ? line.product.read : { name: '', number: null }
    return { product: { id: null, name: read.name, kind: 'registered', number: read.number, numberRegion: null, registrant: '', form: 'concentrate', signalWord: 'none', restrictedUse: false, demo: false, ingredients: [], registrations: [] }, label: null }
  }
  const { retiredOn: _, ...product } = found(books.product(productId), `${path}.product`)
  if (!label) return { product: { ...product, registrations: product.registrations.filter(r => inForce(r, day)) }, label: null }
  const { productId: __, ...shown } = label
  return { product: { ...product, registrations: product.registrations.filter(r => inForce(r, day)) }, label: shown }
}

function snapshotPerson(books: Books, person: Refer, licenceId: string | null, path: string): z.infer<typeof SnapshotPersonSchema> {
  if ('read' in person) return { id: null, name: person.read.name, licence: null }
  const row = found(books.person(person.id), `${path}.person`)
  return { id: row.id, name: row.name, licence: licenceId ? found(row.licences.find(l => l.id === licenceId), `${path}.licenceId`) : null }
}

function snapshotEquipment(books: Books, equipment: Refer | null): EntrySnapshot['equipment'] {
  if (!equipment) return null
  if ('read' in equipment) return { id: null, name: equipment.read.name, number: equipment.read.number, kind: null }
  const { id, name, number, kind } = found(books.equipment(equipment.id), 'equipment')
  return { id, name, number, kind }
}

/**
 * The books as they bear on one entry. @param day local day of the finish: dated rows are taken as in force on it.
 * @throws NotInBook with the path inside the facts that names nothing.
 */
export function snapshotEntry(facts: EntryFacts, books: Books, day: string): EntrySnapshot {
  const branch = snapshotBranch(books, facts.branchId, day)
  return {
    firm: books.firm(),
    branch,
    place: snapshotPlace(books, facts.place, branch, day),
    equipment: snapshotEquipment(books, facts.equipment),
    people: facts.people.map((p, n) => snapshotPerson(books, p.person, p.licenceId, `people.${n}`)),
    lines: facts.lines.map((line, n) => snapshotLine(books, line, day, `lines.${n}`)),
    mix: facts.mixId ? found(books.mix(facts.mixId), 'mixId') : null,
  }
}

export function snapshotVisit(facts: VisitFacts, books: Books, day: string): VisitSnapshot {
  const branch = snapshotBranch(books, facts.branchId, day)
  return { firm: books.firm(), branch, place: snapshotPlace(books, facts.place, branch, day), people: facts.present.map((p, n) => snapshotPerson(books, p, null, `present.${n}`)) }
}

export function snapshotMix(facts: MixFacts, books: Books, day: string): MixSnapshot {
  return {
    firm: books.firm(),
    branch: snapshotBranch(books, facts.branchId, day),
    equipment: snapshotEquipment(books, facts.equipment),
    people: [snapshotPerson(books, facts.by, null, 'by')],
    lines: facts.lines.map((line, n) => snapshotLine(books, line, day, `lines.${n}`)),
  }
}

/**
 * An amendment keeps the amended leaf's snapshot for every reference that it does not change
 * (a product renamed meanwhile keeps the name under which it was used).
 */
export function keepUnchanged(before: { facts: EntryFacts, snapshot: EntrySnapshot }, after: { facts: EntryFacts, snapshot: EntrySnapshot }): EntrySnapshot {
  const same = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b)
  const keep = <T>(unchanged: boolean, old: T, fresh: T) => unchanged ? old : fresh
  const lineKey = (line: EntryFacts['lines'][number]) => ({ label: line.labelVersionId, product: line.product })
  const personKey = (person: EntryFacts['people'][number]) => ({ person: person.person, licence: person.licenceId })
  const carried = <F, S>(oldFacts: F[], oldShots: S[], newFacts: F[], newShots: S[], key: (f: F) => unknown) => newFacts.map((fact, n) => {
    const at = oldFacts.findIndex(old => same(key(old), key(fact)))
    return (at >= 0 ? oldShots[at] : newShots[n]) as S
  })
  return {
    firm: before.snapshot.firm,
    branch: keep(before.facts.branchId === after.facts.branchId, before.snapshot.branch, after.snapshot.branch),
    place: keep(same(before.facts.place, after.facts.place), before.snapshot.place, after.snapshot.place),
    equipment: keep(same(before.facts.equipment, after.facts.equipment), before.snapshot.equipment, after.snapshot.equipment),
    people: carried(before.facts.people, before.snapshot.people, after.facts.people, after.snapshot.people, personKey),
    lines: carried(before.facts.lines, before.snapshot.lines, after.facts.lines, after.snapshot.lines, lineKey),
    mix: keep(before.facts.mixId === after.facts.mixId, before.snapshot.mix, after.snapshot.mix),
  }
}
