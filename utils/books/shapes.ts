import { z } from 'zod'
import { DecimalSchema } from '#shared/units/decimal'
import { UnitSchema } from '#shared/units/units'
import { RATE_PERS } from '#shared/units/rate'
import { DaySchema } from '#shared/time/zoned'
import { ProductKindSchema } from '#shared/registration/number'
import { BookIdSchema, CodedSchema } from '#shared/records/shapes'
import { ReentrySchema } from '#shared/records/entry'

/** The books as routes hand them out and as a device keeps them. Ids are UUIDs; days are local days; `to` null means still in force. */

export const BranchSchema = z.object({
  id: BookIdSchema, name: z.string(), address: z.string(), phone: z.string(), county: z.string(), region: z.string(), country: z.string(), zone: z.string(),
  registrations: z.array(z.object({ region: z.string(), number: z.string(), kind: z.string(), from: DaySchema, to: DaySchema.nullable() })),
})
export type Branch = z.infer<typeof BranchSchema>

export const PLACE_KINDS = ['property', 'building', 'unit', 'room', 'farm', 'field', 'block'] as const

export const PlaceSchema = z.object({
  id: BookIdSchema, parentId: BookIdSchema.nullable(), branchId: BookIdSchema, kind: z.enum(PLACE_KINDS), name: z.string(),
  /** Street, town, postcode in one line, as the country writes it. */
  address: z.string(), town: z.string(), county: z.string(), region: z.string(), country: z.string(), zone: z.string(),
  lat: z.number().nullable(), lon: z.number().nullable(), siteKind: CodedSchema,
  /** What whoever comes must know: animals, ponds, who opens. */
  remark: z.string().nullable(),
})
export type Place = z.infer<typeof PlaceSchema>

export const PARTY_ROLES = ['payer', 'owner', 'manager', 'occupant', 'operator', 'neighbour', 'notice'] as const

export const PartySchema = z.object({ id: BookIdSchema, name: z.string(), email: z.string().nullable(), phone: z.string().nullable(), language: z.enum(['en', 'es']) })
export type Party = z.infer<typeof PartySchema>

export const PartyAtPlaceSchema = z.object({ party: PartySchema, placeId: BookIdSchema, role: z.enum(PARTY_ROLES), from: DaySchema, to: DaySchema.nullable() })
export type PartyAtPlace = z.infer<typeof PartyAtPlaceSchema>

export const FORMS = ['concentrate', 'ready-to-use', 'bait', 'dust', 'granule', 'aerosol', 'fumigant', 'device'] as const
export const SIGNAL_WORDS = ['DANGER-POISON', 'DANGER', 'WARNING', 'CAUTION', 'none'] as const

export const ProductSchema = z.object({
  id: BookIdSchema, name: z.string(), kind: ProductKindSchema, number: z.string().nullable(),
  /** The state of a special local need or state-only registration. */
  numberRegion: z.string().nullable(),
  registrant: z.string(), form: z.enum(FORMS), signalWord: z.enum(SIGNAL_WORDS), restrictedUse: z.boolean(), demo: z.boolean(), retiredOn: DaySchema.nullable(),
  ingredients: z.array(z.object({ name: z.string(), percent: DecimalSchema })),
  registrations: z.array(z.object({ region: z.string(), number: z.string().nullable(), from: DaySchema, to: DaySchema.nullable() })),
})
export type Product = z.infer<typeof ProductSchema>

export const LIMIT_OF = ['product', 'ingredient', 'finished'] as const
export const LIMIT_OVER = ['application', 'day', 'month', 'calendar-year', '12-months', 'season', 'crop', 'life-of-structure'] as const

/** `{ min, max }` of `unit` per `per` over `over`: for an application rate, "0.15 to 0.60 fl_oz per gal over one application". `words` are the label's own. */
export const LabelLimitSchema = z.object({
  of: z.enum(LIMIT_OF), unit: UnitSchema, per: z.enum([...RATE_PERS, 'nothing']), over: z.enum(LIMIT_OVER),
  min: DecimalSchema.nullable(), max: DecimalSchema.nullable(), where: z.string().nullable(), words: z.string(),
})
export type LabelLimit = z.infer<typeof LabelLimitSchema>

/** Sites, targets and methods by catalogue code; an empty list leaves that side open. */
export const LabelUseSchema = z.object({ sites: z.array(z.string()), targets: z.array(z.string()), methods: z.array(z.string()), limits: z.array(LabelLimitSchema) })
export type LabelUse = z.infer<typeof LabelUseSchema>

export const LabelVersionSchema = z.object({
  id: BookIdSchema, productId: BookIdSchema, labelDate: DaySchema, from: DaySchema, to: DaySchema.nullable(), checked: z.boolean(),
  reentry: ReentrySchema, protective: z.array(CodedSchema), cautions: z.string(), uses: z.array(LabelUseSchema),
})
export type LabelVersion = z.infer<typeof LabelVersionSchema>

/** A licence as its state names it. */
export const LicenceSchema = z.object({
  id: BookIdSchema, region: z.string(), number: z.string(), className: z.string(), categories: z.array(z.string()), issued: DaySchema, expires: DaySchema,
})
export type Licence = z.infer<typeof LicenceSchema>

export const ROLES = ['owner', 'officer', 'applicator', 'customer'] as const
export type Role = (typeof ROLES)[number]

export const PersonSchema = z.object({ id: BookIdSchema, name: z.string(), licences: z.array(LicenceSchema) })
export type Person = z.infer<typeof PersonSchema>

export const EquipmentSchema = z.object({ id: BookIdSchema, branchId: BookIdSchema, name: z.string(), kind: CodedSchema, number: z.string().nullable() })
export type Equipment = z.infer<typeof EquipmentSchema>

export const FirmSchema = z.object({ id: BookIdSchema, name: z.string(), address: z.string(), phone: z.string(), country: z.string() })
export type Firm = z.infer<typeof FirmSchema>
