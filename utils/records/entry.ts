import { z } from 'zod'
import { DecimalSchema } from '#shared/units/decimal'
import { QuantitySchema } from '#shared/units/quantity'
import { RateSchema } from '#shared/units/rate'
import { InstantSchema, ZoneSchema } from '#shared/time/zoned'
import { BookIdSchema, CodedSchema, RecordIdSchema, ReferSchema, text } from '#shared/records/shapes'

export const DID = ['mixed', 'applied', 'assisted', 'supervised', 'trained'] as const

/** Who took part, what each did, on which licence; exactly one person is responsible (see `refusals`). */
export const EntryPersonSchema = z.strictObject({
  person: ReferSchema,
  did: z.array(z.enum(DID)).min(1),
  licenceId: BookIdSchema.nullable(),
  responsible: z.boolean(),
})
export type EntryPerson = z.infer<typeof EntryPersonSchema>

/** Product by count: so many placements, stations or containers of a size each. The line's `amount` is count × each. */
export const CountedSchema = z.strictObject({
  of: z.enum(['placement', 'station', 'container']),
  count: DecimalSchema,
  each: QuantitySchema,
})

/**
 * One product of the application. `amount` is product as it comes, never finished spray.
 * It is null where it was not noted (a gap that shows) or where the entry draws from a mix (then it is the share of the mix).
 */
export const EntryLineSchema = z.strictObject({
  labelVersionId: BookIdSchema.nullable(),
  product: ReferSchema.nullable(),
  rate: RateSchema.nullable(),
  amount: QuantitySchema.nullable(),
  counted: CountedSchema.nullable(),
  lot: text(60).nullable(),
})
export type EntryLine = z.infer<typeof EntryLineSchema>

export const SETTINGS = ['indoors', 'outdoors'] as const
export const HOW_SIZED = ['measured', 'estimated', 'plan', 'computed'] as const

export const AreaSchema = z.strictObject({
  place: CodedSchema,
  setting: z.enum(SETTINGS),
  size: QuantitySchema.nullable(),
  how: z.enum(HOW_SIZED),
})
export type Area = z.infer<typeof AreaSchema>

export const WIND_FROM = ['N', 'NE', 'E', 'SE', 'S', 'SW', 'W', 'NW', 'variable'] as const
export const SKY = ['clear', 'part-cloud', 'overcast', 'fog', 'drizzle', 'rain', 'snow'] as const

/** A reading. A wind of `{ calm: true }` was looked at and found calm; null was not taken. */
export const WeatherReadingSchema = z.strictObject({
  at: InstantSchema,
  where: z.enum(['site', 'nearby', 'station']),
  temperature: QuantitySchema.nullable(),
  wind: z.union([
    z.strictObject({ calm: z.literal(true) }),
    z.strictObject({ speed: QuantitySchema, from: z.enum(WIND_FROM).nullable() }),
  ]).nullable(),
  humidity: DecimalSchema.nullable(),
  sky: z.enum(SKY).nullable(),
  source: z.enum(['observed', 'instrument', 'station']),
})
export type WeatherReading = z.infer<typeof WeatherReadingSchema>

/** When people and animals may come back, in the label's own condition. */
export const ReentrySchema = z.discriminatedUnion('until', [
  z.strictObject({ until: z.literal('dry') }),
  z.strictObject({ until: z.literal('dusts-settled') }),
  z.strictObject({ until: z.literal('ventilated') }),
  z.strictObject({ until: z.literal('hours'), hours: DecimalSchema }),
  z.strictObject({ until: z.literal('label'), words: text(300) }),
  z.strictObject({ until: z.literal('none-stated') }),
])
export type Reentry = z.infer<typeof ReentrySchema>

/** One application as signed: one mix or ready-to-use product, one method, its own areas, targets and times. */
export const EntryFactsSchema = z.strictObject({
  v: z.literal(1),
  id: RecordIdSchema,
  visitId: RecordIdSchema.nullable(),
  language: z.enum(['en', 'es']),
  place: ReferSchema,
  branchId: BookIdSchema,
  startedAt: InstantSchema,
  finishedAt: InstantSchema,
  zone: ZoneSchema,
  method: CodedSchema,
  equipment: ReferSchema.nullable(),
  targets: z.array(CodedSchema).max(12),
  people: z.array(EntryPersonSchema).min(1).max(12),
  mixId: RecordIdSchema.nullable(),
  drawn: QuantitySchema.nullable(),
  finished: QuantitySchema.nullable(),
  lines: z.array(EntryLineSchema).max(12),
  areas: z.array(AreaSchema).max(24),
  weather: z.array(WeatherReadingSchema).max(12),
  noWeather: z.enum(['indoors', 'not-taken']).nullable(),
  reentry: ReentrySchema,
  protective: z.array(CodedSchema).max(20),
  prevention: z.array(CodedSchema).max(20),
  advice: text(2000).nullable(),
  attestation: z.literal('a1'),
})
export type EntryFacts = z.infer<typeof EntryFactsSchema>

/** Where a value came from, as the record says it of each (product.md, truth 7). */
export const GIVEN = ['entered', 'as-last-time', 'now', 'station', 'computed', 'not-given'] as const
export const GivenSchema = z.strictObject({
  finished: z.enum(GIVEN), amounts: z.enum(GIVEN), areas: z.enum(GIVEN), times: z.enum(GIVEN), weather: z.enum(GIVEN),
})

/** A finding that was on the screen at signing. */
export const SeenSchema = z.strictObject({ check: z.string().max(60), message: z.string().max(60), outcome: z.enum(['stop', 'query', 'note']), line: z.number().int().min(0).max(11).nullable() })

/** What is the firm's own: kept beside the body, in the body only as a commitment. */
export const EntryWordsSchema = z.strictObject({
  note: text(4000).nullable(),
  explanation: text(2000).nullable(),
  seen: z.array(SeenSchema).max(60),
  given: GivenSchema,
  deviceNow: InstantSchema,
})
export type EntryWords = z.infer<typeof EntryWordsSchema>

export const EntrySubmissionSchema = z.strictObject({ facts: EntryFactsSchema, words: EntryWordsSchema })
export type EntrySubmission = z.infer<typeof EntrySubmissionSchema>

export const AmendmentSchema = z.strictObject({
  facts: EntryFactsSchema,
  words: EntryWordsSchema,
  amends: z.strictObject({ root: RecordIdSchema, head: RecordIdSchema, reason: text(1000) }),
})
export type Amendment = z.infer<typeof AmendmentSchema>

export const StrikeSchema = z.strictObject({
  facts: z.strictObject({ v: z.literal(1), id: RecordIdSchema, root: RecordIdSchema, head: RecordIdSchema, reason: text(1000) }),
  words: z.strictObject({ deviceNow: InstantSchema }),
})
export type Strike = z.infer<typeof StrikeSchema>

export const SAYS = ['confirmed', 'disputed', 'cannot-be-had'] as const

/** The author's word on another person's amendment or strike (or an officer's, that it can't be had). */
export const AcknowledgementSchema = z.strictObject({
  facts: z.strictObject({ v: z.literal(1), id: RecordIdSchema, root: RecordIdSchema, head: RecordIdSchema, says: z.enum(SAYS), because: text(1000).nullable() }),
  words: z.strictObject({ deviceNow: InstantSchema }),
})
export type Acknowledgement = z.infer<typeof AcknowledgementSchema>
