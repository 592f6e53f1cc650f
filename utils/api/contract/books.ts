import { z } from 'zod'
import { pageOf } from '#shared/api/contract/define'
import type { Contracts } from '#shared/api/contract/define'
import { BookIdSchema } from '#shared/records/shapes'
import { BranchSchema, EquipmentSchema, FirmSchema, LabelVersionSchema, PARTY_ROLES, PartySchema, PersonSchema, PlaceSchema, ProductSchema, ROLES } from '#shared/books/shapes'
import { DaySchema } from '#shared/time/zoned'
import { REGISTRATION_REFUSALS } from '#shared/registration/number'

/** A search over names and numbers; lists go by name, by keyset. */
export const BookQuerySchema = z.object({ q: z.string().trim().min(1).max(100).optional(), limit: z.coerce.number().int().min(1).max(200).default(50), cursor: z.string().max(1000).optional() })
const IdParams = z.object({ id: BookIdSchema })

const PlaceRowSchema = PlaceSchema.pick({ id: true, name: true, kind: true, address: true, town: true, county: true, region: true, siteKind: true }).extend({ lastOn: DaySchema.nullable() })
const Linked = z.object({ id: BookIdSchema, name: z.string(), kind: z.string() })
const PartyLineSchema = z.object({ id: BookIdSchema, name: z.string(), role: z.enum(PARTY_ROLES), from: DaySchema, to: DaySchema.nullable(), email: z.string().nullable(), phone: z.string().nullable(), at: z.string() })
export const PlacePageSchema = PlaceSchema.extend({ above: z.array(Linked), below: z.array(Linked), parties: z.array(PartyLineSchema), branch: z.string() })

/** `places`: at how many places of the reader's branches the party has a role, ended ones included. */
const PartyRowSchema = PartySchema.extend({ places: z.number().int() })
const RoleAtSchema = z.object({ placeId: BookIdSchema, place: z.string(), address: z.string(), role: z.enum(PARTY_ROLES), from: DaySchema, to: DaySchema.nullable() })
export const PartyPageSchema = PartySchema.extend({ at: z.array(RoleAtSchema) })

/** `regions`: states in which it is registered today. */
const ProductRowSchema = ProductSchema.pick({ id: true, name: true, kind: true, number: true, form: true, signalWord: true, restrictedUse: true, demo: true, retiredOn: true, ingredients: true }).extend({ regions: z.array(z.string()) })
/** `numberRefused`: why the number in the book is none, by the rules for its kind. */
export const ProductPageSchema = ProductSchema.extend({ labels: z.array(LabelVersionSchema), numberRefused: z.enum(REGISTRATION_REFUSALS).nullable() })

const PersonRowSchema = PersonSchema.extend({ roles: z.array(z.object({ role: z.enum(ROLES), branch: z.string().nullable() })), endsOn: DaySchema.nullable() })
const EquipmentRowSchema = EquipmentSchema.extend({ branch: z.string() })

export const BOOKS = {
  'GET /api/places': { ability: 'book.read', summary: 'Places by name', query: BookQuerySchema, answers: { 200: pageOf(PlaceRowSchema) } },
  'GET /api/places/:id': { ability: 'book.read', summary: 'A place with what is above and below it and the parties at it', params: IdParams, answers: { 200: PlacePageSchema } },
  'GET /api/parties': { ability: 'book.read', summary: 'Parties by name: who pays for, owns, manages, lives at or works a place', query: BookQuerySchema, answers: { 200: pageOf(PartyRowSchema) } },
  'GET /api/parties/:id': { ability: 'book.read', summary: 'A party with its roles at places', params: IdParams, answers: { 200: PartyPageSchema } },
  'GET /api/products': { ability: 'book.read', summary: 'The Shelf: products by name or number', query: BookQuerySchema, answers: { 200: pageOf(ProductRowSchema) } },
  'GET /api/products/:id': { ability: 'book.read', summary: 'A product with its label versions', params: IdParams, answers: { 200: ProductPageSchema } },
  'GET /api/people': { ability: 'people.read', summary: 'People with their licences', query: BookQuerySchema, answers: { 200: pageOf(PersonRowSchema) } },
  'GET /api/people/:id': { ability: 'people.read', summary: 'A person with roles and licences', params: IdParams, answers: { 200: PersonRowSchema } },
  'GET /api/equipment': { ability: 'book.read', summary: 'Equipment by name', query: BookQuerySchema, answers: { 200: pageOf(EquipmentRowSchema) } },
  'GET /api/equipment/:id': { ability: 'book.read', summary: 'A piece of equipment', params: IdParams, answers: { 200: EquipmentRowSchema } },
  'GET /api/branches': { ability: 'firm.read', summary: 'The firm and its branches with their registrations', answers: { 200: z.object({ firm: FirmSchema, branches: z.array(BranchSchema) }) } },
} as const satisfies Contracts
