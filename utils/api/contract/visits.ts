import { z } from 'zod'
import type { Contracts } from '#shared/api/contract/define'
import { AcknowledgementSchema, AmendmentSchema, EntrySubmissionSchema, StrikeSchema } from '#shared/records/entry'
import { MixSubmissionSchema, VisitSubmissionSchema } from '#shared/records/visit'
import { FindingSchema } from '#shared/checks/finding'
import { HashSchema, RecordIdSchema } from '#shared/records/shapes'

/** What the signer gets back for one entry: its reference, what the mark is drawn from, what was found. */
export const EntryReceiptSchema = z.object({ id: RecordIdSchema, root: RecordIdSchema, reference: z.string(), factsHash: HashSchema, findings: z.array(FindingSchema) })
export type EntryReceipt = z.infer<typeof EntryReceiptSchema>

export const VisitReceiptSchema = z.object({
  visitId: RecordIdSchema, receivedAt: z.string(), entries: z.array(EntryReceiptSchema),
  notices: z.array(z.object({ id: z.string(), party: z.string(), released: z.boolean() })),
})
export type VisitReceipt = z.infer<typeof VisitReceiptSchema>

const IdParams = z.object({ id: RecordIdSchema })
const MEGABYTE = 1_048_576

export const VISITS = {
  'POST /api/visits': { ability: 'visit.sign', summary: 'Put a visit with its mixes and entries on record, all or nothing', body: VisitSubmissionSchema, bodyLimit: MEGABYTE, answers: { 200: VisitReceiptSchema, 201: VisitReceiptSchema } },
  'POST /api/mixes': { ability: 'mix.sign', summary: 'Put a tank that was made up on record', body: MixSubmissionSchema, answers: { 200: z.object({ id: RecordIdSchema }), 201: z.object({ id: RecordIdSchema }) } },
  'POST /api/applications': { ability: 'visit.sign', summary: 'Put one entry on record without a visit', body: EntrySubmissionSchema, bodyLimit: MEGABYTE, answers: { 200: EntryReceiptSchema, 201: EntryReceiptSchema } },
  'POST /api/applications/:id/amendments': { ability: 'entry.amend', summary: 'Correct an entry by a new row', params: IdParams, body: AmendmentSchema, bodyLimit: MEGABYTE, answers: { 200: EntryReceiptSchema, 201: EntryReceiptSchema } },
  'POST /api/applications/:id/strike': { ability: 'entry.strike', summary: 'Strike an entry made in error by a new row', params: IdParams, body: StrikeSchema, answers: { 200: z.object({ id: RecordIdSchema }), 201: z.object({ id: RecordIdSchema }) } },
  'POST /api/applications/:id/acknowledgements': { ability: 'entry.acknowledge', summary: 'Confirm or dispute another person’s change', params: IdParams, body: AcknowledgementSchema, answers: { 200: z.object({ id: RecordIdSchema }), 201: z.object({ id: RecordIdSchema }) } },
} as const satisfies Contracts

