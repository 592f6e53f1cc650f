import { z } from 'zod'
import { BookIdSchema, HashSchema, RecordIdSchema, text } from '#shared/records/shapes'
import { AcknowledgementSchema, EntryFactsSchema, EntryWordsSchema, StrikeSchema } from '#shared/records/entry'
import { MixFactsSchema, MixWordsSchema, VisitFactsSchema, VisitWordsSchema } from '#shared/records/visit'
import { EntrySnapshotSchema, MixSnapshotSchema, VisitSnapshotSchema } from '#shared/records/snapshot'
import { FindingSchema } from '#shared/checks/finding'

/**
 * The leaves. Stored data depends on this closed list: a kind or a version is only ever added, and what was ever shipped stays readable.
 * `assessment`, `inspection`, `incident`, `disposal`, `request`, `filing`, `access`, `purge`, `key` and `break` are reserved names.
 */
export const KINDS = ['visit', 'application', 'mix', 'amendment', 'strike', 'acknowledgement', 'notice'] as const
export type Kind = (typeof KINDS)[number]
export const RESERVED_KINDS = ['assessment', 'inspection', 'incident', 'disposal', 'request', 'filing', 'access', 'purge', 'key', 'break'] as const

/** Who signed, or which job composed the leaf. */
export const BySchema = z.union([z.strictObject({ person: BookIdSchema, name: z.string() }), z.strictObject({ job: z.string() })])
export type By = z.infer<typeof BySchema>

/** One notice as it was first attempted or handed over; the bytes are kept beside it, here stands their hash. */
export const NoticeFactsSchema = z.strictObject({
  v: z.literal(1), id: RecordIdSchema, visitId: RecordIdSchema, entries: z.array(RecordIdSchema), partyId: BookIdSchema, channel: z.enum(['mail', 'printed', 'handed-over']),
  address: z.string().nullable(), subject: z.string(), messageId: z.string().nullable(), contentHash: HashSchema, releasedBy: BookIdSchema.nullable(),
})
export type NoticeFacts = z.infer<typeof NoticeFactsSchema>

const common = {
  v: z.literal(1), firm: BookIdSchema, id: RecordIdSchema, by: BySchema, receivedAt: z.iso.datetime(), packs: z.array(z.strictObject({ id: z.string(), hash: HashSchema })), inner: HashSchema.nullable(),
}
const amends = z.strictObject({ root: RecordIdSchema, head: RecordIdSchema, reason: text(1000) })

/** What a proof hands out: only what any party to the place may see. */
export const BodySchema = z.discriminatedUnion('kind', [
  z.strictObject({ ...common, kind: z.literal('visit'), facts: VisitFactsSchema, snapshot: VisitSnapshotSchema, amends: z.null() }),
  z.strictObject({ ...common, kind: z.literal('application'), facts: EntryFactsSchema, snapshot: EntrySnapshotSchema, amends: z.null() }),
  z.strictObject({ ...common, kind: z.literal('amendment'), facts: EntryFactsSchema, snapshot: EntrySnapshotSchema, amends }),
  z.strictObject({ ...common, kind: z.literal('mix'), facts: MixFactsSchema, snapshot: MixSnapshotSchema, amends: z.null() }),
  z.strictObject({ ...common, kind: z.literal('strike'), facts: StrikeSchema.shape.facts, snapshot: z.null(), amends: z.null() }),
  z.strictObject({ ...common, kind: z.literal('acknowledgement'), facts: AcknowledgementSchema.shape.facts, snapshot: z.null(), amends: z.null() }),
  z.strictObject({ ...common, kind: z.literal('notice'), facts: NoticeFactsSchema, snapshot: z.null(), amends: z.null() }),
])
export type Body = z.infer<typeof BodySchema>
export type BodyOf<K extends Kind> = Extract<Body, { kind: K }>
export type EntryBody = BodyOf<'application'> | BodyOf<'amendment'>

/** The firm's own part of a leaf, committed to by `inner`. */
export const INNER = {
  visit: z.strictObject({ words: VisitWordsSchema }),
  application: z.strictObject({ words: EntryWordsSchema, findings: z.array(FindingSchema) }),
  amendment: z.strictObject({ words: EntryWordsSchema, findings: z.array(FindingSchema) }),
  mix: z.strictObject({ words: MixWordsSchema }),
  strike: z.strictObject({ words: StrikeSchema.shape.words }),
  acknowledgement: z.strictObject({ words: AcknowledgementSchema.shape.words }),
  notice: z.null(),
} as const
export type InnerOf<K extends Kind> = z.infer<(typeof INNER)[K]>
export type EntryInner = InnerOf<'application'>

/** A leaf as read back: its place in the log, its body, its inner part. */
export type Leaf<K extends Kind = Kind> = K extends Kind ? { seq: number, kind: K, id: string, root: string, receivedAt: string, body: BodyOf<K>, inner: InnerOf<K> } : never
