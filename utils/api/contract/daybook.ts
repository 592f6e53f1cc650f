import { z } from 'zod'
import { FileAnswer, pageOf } from '#shared/api/contract/define'
import type { Contracts } from '#shared/api/contract/define'
import { asOnLabel } from '#shared/registration/basic'
import { BookIdSchema, HashSchema, RecordIdSchema } from '#shared/records/shapes'
import { CONFIRMATIONS, STATUSES } from '#shared/records/rows'
import { EntryFactsSchema, EntryWordsSchema, SAYS } from '#shared/records/entry'
import { EntrySnapshotSchema, VisitSnapshotSchema } from '#shared/records/snapshot'
import { VisitFactsSchema } from '#shared/records/visit'
import { FindingSchema, OUTCOMES } from '#shared/checks/finding'
import { KINDS } from '#shared/records/body'
import { QuantitySchema } from '#shared/units/quantity'
import { DaySchema } from '#shared/time/zoned'

export const DAYBOOK_SORTS = ['finishedAt', 'recordedAt', 'place', 'person', 'number', 'status', 'finding'] as const
export type DaybookSort = (typeof DAYBOOK_SORTS)[number]

// A control character is no word; NUL would end the search's text early.
// eslint-disable-next-line no-control-regex -- exactly the control characters are refused
const word = (max: number) => z.string().trim().min(1).max(max).regex(/^[^\u0000-\u001F]*$/).optional()
const flag = z.enum(['true', 'false']).transform(value => value === 'true').optional()

/** What narrows the Daybook. Days are local days of the finish; `number` of two groups finds the distributors' products too. */
export const DaybookFilterSchema = z.object({
  q: word(200), from: DaySchema.optional(), to: DaySchema.optional(), branchId: BookIdSchema.optional(), placeId: BookIdSchema.optional(), productId: BookIdSchema.optional(), number: z.string().trim().min(1).max(60).transform(asOnLabel).optional(), personId: BookIdSchema.optional(),
  status: z.enum(STATUSES).optional(), finding: z.enum([...OUTCOMES, 'any']).optional(), late: flag, owed: flag,
})
export type DaybookFilter = z.output<typeof DaybookFilterSchema>

export const DaybookQuerySchema = DaybookFilterSchema.extend({
  sort: z.enum([...DAYBOOK_SORTS, ...DAYBOOK_SORTS.map(s => `-${s}` as const)]).default('-finishedAt'),
  limit: z.coerce.number().int().min(1).max(200).default(50),
  cursor: z.string().max(1000).optional(),
})
export type DaybookQuery = z.output<typeof DaybookQuerySchema>

/** A line of the Daybook: an entry, or (`nothing`) a visit with nothing applied. `findings` is null for whoever does not see the firm's own part. */
export const DaybookRowSchema = z.object({
  root: RecordIdSchema, kind: z.enum(['entry', 'nothing']), reference: z.string(), factsHash: HashSchema.nullable(), visitId: RecordIdSchema.nullable(),
  startedAt: z.string().nullable(), finishedAt: z.string(), zone: z.string(), recordedAt: z.string(), localDay: DaySchema,
  place: z.object({ id: z.string().nullable(), name: z.string(), address: z.string(), county: z.string(), region: z.string(), siteKind: z.string().nullable() }),
  lines: z.array(z.object({ name: z.string(), number: z.string().nullable(), ingredients: z.array(z.object({ name: z.string(), percent: z.string() })), amount: QuantitySchema.nullable(), restrictedUse: z.boolean(), demo: z.boolean() })),
  finished: QuantitySchema.nullable(), method: z.string(), equipment: z.string().nullable(), targets: z.array(z.string()),
  areas: z.array(z.object({ place: z.string(), size: QuantitySchema.nullable() })),
  weather: z.union([z.literal('indoors'), z.literal('not-taken'), z.object({ temperature: QuantitySchema.nullable(), calm: z.boolean(), wind: QuantitySchema.nullable(), from: z.string().nullable(), readings: z.number() })]),
  person: z.string(), licence: z.object({ number: z.string(), region: z.string() }).nullable(),
  status: z.enum(STATUSES), confirmation: z.enum(CONFIRMATIONS), findings: z.array(FindingSchema).nullable(), late: z.boolean(), restrictedUse: z.boolean(),
})
export type DaybookRow = z.infer<typeof DaybookRowSchema>

/** One leaf of an entry's history, as whoever asks may see it. */
export const HistoryItemSchema = z.object({
  id: RecordIdSchema, kind: z.enum(KINDS), by: z.string(), receivedAt: z.string(), reason: z.string().nullable(),
  facts: EntryFactsSchema.nullable(), snapshot: EntrySnapshotSchema.nullable(), words: EntryWordsSchema.nullable(), says: z.enum(SAYS).nullable(), because: z.string().nullable(),
})
export type HistoryItem = z.infer<typeof HistoryItemSchema>

export const EntryPageSchema = z.object({
  id: RecordIdSchema, root: RecordIdSchema, head: RecordIdSchema, status: z.enum(STATUSES), confirmation: z.enum(CONFIRMATIONS), owedBy: z.object({ id: z.string(), name: z.string() }).nullable(),
  reference: z.string(), factsHash: HashSchema, recordedAt: z.string(), facts: EntryFactsSchema, snapshot: EntrySnapshotSchema, words: EntryWordsSchema.nullable(), findings: z.array(FindingSchema).nullable(),
  visit: z.object({ id: RecordIdSchema, arrivedAt: z.string(), leftAt: z.string(), followUpOn: DaySchema.nullable() }).nullable(),
  history: z.array(HistoryItemSchema), notices: z.array(z.object({ id: z.string(), party: z.string(), state: z.string() })),
  proof: z.object({ leafHash: HashSchema, chainHash: HashSchema }),
  may: z.object({ amend: z.boolean(), strike: z.boolean(), confirm: z.boolean(), cannotBeHad: z.boolean() }),
})
export type EntryPage = z.infer<typeof EntryPageSchema>

export const VisitPageSchema = z.object({
  id: RecordIdSchema, by: z.string(), receivedAt: z.string(), facts: VisitFactsSchema, snapshot: VisitSnapshotSchema, note: z.string().nullable(), entries: z.array(DaybookRowSchema),
  notices: z.array(z.object({ id: z.string(), party: z.string(), state: z.string() })),
})

/** A thing that waits for somebody: `to` is the page on which it is mended. */
export const TodayItemSchema = z.object({ to: z.string(), title: z.string(), detail: z.string().nullable(), on: z.string().nullable(), outcome: z.enum(OUTCOMES).nullable() })
export const TODAY_LISTS = ['due', 'my-word', 'owed', 'without-word', 'late', 'notices-waiting', 'notices-failed', 'licences', 'as-read', 'recent'] as const
export const TodayListSchema = z.object({ list: z.enum(TODAY_LISTS), count: z.number(), items: z.array(TodayItemSchema) })
export type TodayList = z.infer<typeof TodayListSchema>

const IdParams = z.object({ id: RecordIdSchema })

export const DAYBOOK = {
  'GET /api/applications': { ability: 'entry.read', summary: 'The Daybook: entries as they stand, filtered, sorted, by keyset', query: DaybookQuerySchema, answers: { 200: pageOf(DaybookRowSchema) } },
  'GET /api/applications/totals': { ability: 'entry.read', summary: 'How many the same filters find; counting stops beyond 10,000', query: DaybookFilterSchema, answers: { 200: z.object({ count: z.number(), more: z.boolean(), stops: z.number().nullable(), queries: z.number().nullable(), products: z.number() }) } },
  'GET /api/applications/export.csv': { ability: 'entry.export', summary: 'What the same filters find, as CSV, a row a product', query: DaybookFilterSchema, answers: { 200: FileAnswer } },
  'GET /api/applications/:id': { ability: 'entry.read', summary: 'One entry as it stands, with its history', params: IdParams, answers: { 200: EntryPageSchema } },
  'GET /api/visits/:id': { ability: 'entry.read', summary: 'One visit with its entries', params: IdParams, answers: { 200: VisitPageSchema } },
  'GET /api/today': { ability: 'today.read', summary: 'What is due, owed and amiss, for whoever asks', answers: { 200: z.object({ lists: z.array(TodayListSchema) }) } },
} as const satisfies Contracts
