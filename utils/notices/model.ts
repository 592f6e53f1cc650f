import { z } from 'zod'

const RowSchema = z.object({ label: z.string(), lines: z.array(z.string()) })

/** A notice in ready words: what the review page, the mail and the paper show. Nothing in it is worked out again by whoever draws it. */
export const NoticeModelSchema = z.object({
  language: z.string(), country: z.string(),
  title: z.string(), subject: z.string(),
  /** Name and address of the place, as its heading. */
  place: z.string(), address: z.string(), when: z.string(),
  firm: z.object({ name: z.string(), line: z.string() }),
  /** What to keep off and until what; one sentence for each condition. */
  leads: z.array(z.string()),
  /** Plain words: what was treated against what. */
  told: z.array(z.string()),
  treatments: z.array(z.object({ reference: z.string(), hash: z.string(), heading: z.string(), rows: z.array(RowSchema) })),
  /** What holds for the whole visit: by whom, please do, next visit. */
  rows: z.array(RowSchema),
  emergency: z.object({ heading: z.string(), lines: z.array(z.string()) }),
  cautions: z.array(z.string()),
})
export type NoticeModel = z.infer<typeof NoticeModelSchema>
export type NoticeRow = z.infer<typeof RowSchema>
