import { z } from 'zod'
import { BranchSchema, EquipmentSchema, FirmSchema, LabelVersionSchema, PARTY_ROLES, PersonSchema, PlaceSchema, ProductSchema } from '#shared/books/shapes'
import { EntryFactsSchema } from '#shared/records/entry'
import { SnapshotMixSchema } from '#shared/records/snapshot'
import { BookIdSchema, RecordIdSchema } from '#shared/records/shapes'
import { DaySchema, InstantSchema } from '#shared/time/zoned'
import { QuantitySchema } from '#shared/units/quantity'

/** Whoever is told of work at a place. Addresses stay on the server: the device needs to know only whether there is one. */
const KitPartySchema = z.object({ id: BookIdSchema, name: z.string(), mail: z.boolean(), language: z.enum(['en', 'es']) })

/** One treatment of a place's last visit, as it stands on record; products by the names that they had then. */
const LastEntrySchema = z.object({ id: RecordIdSchema, facts: EntryFactsSchema, products: z.array(z.object({ id: BookIdSchema.nullable(), name: z.string(), number: z.string().nullable() })) })
export type LastEntry = z.infer<typeof LastEntrySchema>

/** A tank made up in the last days, and what entries on record have drawn from it. */
const OpenMixSchema = z.object({ mix: SnapshotMixSchema, branchId: BookIdSchema, madeAt: InstantSchema, zone: z.string(), equipment: z.string().nullable(), drawn: z.array(QuantitySchema) })
export type OpenMix = z.infer<typeof OpenMixSchema>

/** All that the entry form needs from opening to signing without an answer from the server. Kept on the device by person and firm. */
export const KitSchema = z.object({
  v: z.literal(1),
  madeAt: z.string(),
  firm: FirmSchema,
  branches: z.array(BranchSchema),
  places: z.array(PlaceSchema),
  parties: z.array(KitPartySchema),
  partyRoles: z.array(z.object({ partyId: BookIdSchema, placeId: BookIdSchema, role: z.enum(PARTY_ROLES), from: DaySchema, to: DaySchema.nullable() })),
  products: z.array(ProductSchema),
  labels: z.array(LabelVersionSchema),
  people: z.array(PersonSchema),
  equipment: z.array(EquipmentSchema),
  mixes: z.array(OpenMixSchema),
  last: z.array(z.object({ placeId: BookIdSchema, visitId: RecordIdSchema, day: DaySchema, entries: z.array(LastEntrySchema) })),
  due: z.array(z.object({ placeId: BookIdSchema, on: DaySchema })),
  recent: z.array(BookIdSchema),
})
export type Kit = z.infer<typeof KitSchema>
export type LastVisit = Kit['last'][number]
