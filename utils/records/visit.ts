import { z } from 'zod'
import { DaySchema, InstantSchema, ZoneSchema } from '#shared/time/zoned'
import { QuantitySchema } from '#shared/units/quantity'
import { EntrySubmissionSchema } from '#shared/records/entry'
import { BookIdSchema, CodedSchema, HashSchema, RecordIdSchema, ReferSchema, text } from '#shared/records/shapes'

const PartSchema = z.strictObject({ id: RecordIdSchema, hash: HashSchema })

/** One arrival at one place. `entries` and `mixes` name each part with SHA-256 of its canonical submission, so that a missing one shows. */
export const VisitFactsSchema = z.strictObject({
  v: z.literal(1),
  id: RecordIdSchema,
  language: z.enum(['en', 'es']),
  place: ReferSchema,
  branchId: BookIdSchema,
  arrivedAt: InstantSchema,
  leftAt: InstantSchema,
  zone: ZoneSchema,
  present: z.array(ReferSchema).min(1).max(12),
  nothing: CodedSchema.nullable(),
  followUpOn: DaySchema.nullable(),
  entries: z.array(PartSchema).max(24),
  mixes: z.array(PartSchema).max(12),
})
export type VisitFacts = z.infer<typeof VisitFactsSchema>

/** `notify` is the tap "send when signed": the parties to whom the notice goes at once; the others' notices wait for the officer. */
export const VisitWordsSchema = z.strictObject({
  note: text(4000).nullable(),
  notify: z.array(BookIdSchema).max(12),
  deviceNow: InstantSchema,
})

export const MixLineSchema = z.strictObject({ labelVersionId: BookIdSchema.nullable(), product: ReferSchema.nullable(), amount: QuantitySchema, lot: text(60).nullable() })

/** What was made up in a tank, from which entries draw. */
export const MixFactsSchema = z.strictObject({
  v: z.literal(1),
  id: RecordIdSchema,
  branchId: BookIdSchema,
  madeAt: InstantSchema,
  zone: ZoneSchema,
  by: ReferSchema,
  equipment: ReferSchema.nullable(),
  carrier: CodedSchema,
  finished: QuantitySchema,
  lines: z.array(MixLineSchema).min(1).max(12),
  leftFrom: RecordIdSchema.nullable(),
})
export type MixFacts = z.infer<typeof MixFactsSchema>

export const MixWordsSchema = z.strictObject({ note: text(4000).nullable(), deviceNow: InstantSchema })
export const MixSubmissionSchema = z.strictObject({ facts: MixFactsSchema, words: MixWordsSchema })
export type MixSubmission = z.infer<typeof MixSubmissionSchema>

/** What one signing sends: `POST /api/visits`. */
export const VisitSubmissionSchema = z.strictObject({
  visit: z.strictObject({ facts: VisitFactsSchema, words: VisitWordsSchema }),
  mixes: z.array(MixSubmissionSchema).max(12),
  entries: z.array(EntrySubmissionSchema).max(24),
})
export type VisitSubmission = z.infer<typeof VisitSubmissionSchema>
