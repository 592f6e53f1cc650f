import { z } from 'zod'
import type { EntryFacts, EntryWords } from '#shared/records/entry'
import type { EntrySnapshot } from '#shared/records/snapshot'

export const OUTCOMES = ['stop', 'query', 'note'] as const
export type Outcome = (typeof OUTCOMES)[number]

export const CHECKS = ['licence-in-force', 'product-registered', 'rate-in-range', 'required-fields', 'late'] as const
export type CheckName = (typeof CHECKS)[number]

/** What a finding rests on: the label version and its words, a rule with how sure we are of it, or the house's own measure. */
export const BasisSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('label'), labelVersionId: z.string(), labelDate: z.string(), words: z.string() }),
  z.strictObject({ kind: z.literal('rule'), citation: z.string(), certainty: z.enum(['text read', 'summary read', 'from memory']) }),
  z.strictObject({ kind: z.literal('house') }),
])

/** `message` is a key of `checks.messages`, `params` fill its sentence; `value`, `limit`, `unit` are what was compared. */
export const FindingSchema = z.strictObject({
  check: z.enum(CHECKS),
  outcome: z.enum(OUTCOMES),
  message: z.string().max(60),
  params: z.record(z.string(), z.string()),
  line: z.number().int().nullable(),
  value: z.string().nullable(),
  limit: z.string().nullable(),
  unit: z.string().nullable(),
  basis: BasisSchema,
  /** Was it on the screen when the record was signed? Not known before signing. */
  seen: z.boolean().nullable(),
})
export type Finding = z.infer<typeof FindingSchema>

/** All that a check may look at. `receivedAt` is null on the device, before the record is received. */
export interface CheckContext {
  facts: EntryFacts
  words: Pick<EntryWords, 'deviceNow'>
  snapshot: EntrySnapshot
  /** Local day of the finish, in the place's zone. */
  day: string
  receivedAt: string | null
}

export type Check = (context: CheckContext) => Finding[]

export const RANK = { note: 1, query: 2, stop: 3 } as const satisfies Record<Outcome, number>

/** A finding with nothing compared, to be completed by its check. */
export const finding = (check: CheckName, outcome: Outcome, message: string, rest: Partial<Omit<Finding, 'check' | 'outcome' | 'message'>> = {}): Finding =>
  ({ check, outcome, message, params: {}, line: null, value: null, limit: null, unit: null, basis: { kind: 'house' }, seen: null, ...rest })
