import { z } from 'zod'
import type { Contracts } from '#shared/api/contract/define'
import { FileAnswer, pageOf } from '#shared/api/contract/define'
import { NoticeModelSchema } from '#shared/notices/model'
import { BookIdSchema, RecordIdSchema } from '#shared/records/shapes'

export const NOTICE_STATES = ['planned', 'sent', 'delivered', 'bounced', 'failed', 'printed', 'handed-over', 'read'] as const

export const NoticeLineSchema = z.object({
  id: z.string(), visitId: z.string(), party: z.string(), place: z.string(), channel: z.enum(['mail', 'paper']), address: z.string().nullable(), state: z.enum(NOTICE_STATES), subject: z.string(),
  /** Local day of the visit. */
  day: z.string(), plannedAt: z.string(), releasedAt: z.string().nullable(),
  /** Planned, and nobody has said yet that it may go. */
  waiting: z.boolean(),
  /** What the last attempt at sending met, while it is tried again or after it was given up. */
  trouble: z.string().nullable(), attempts: z.int(),
})
export type NoticeLine = z.infer<typeof NoticeLineSchema>

export const NoticeAnswerSchema = NoticeLineSchema.extend({
  zone: z.string(), contentHash: z.string().nullable(),
  events: z.array(z.object({ at: z.string(), what: z.string(), by: z.string().nullable(), detail: z.string().nullable() })),
  model: NoticeModelSchema.nullable(), text: z.string().nullable(), html: z.string().nullable(),
  /** Why it is not made: `no-emergency-block`, `nothing-to-tell`. */
  stopped: z.enum(['no-emergency-block', 'nothing-to-tell']).nullable(),
})
export type NoticeAnswer = z.infer<typeof NoticeAnswerSchema>

const MailLineSchema = z.object({ id: z.string(), at: z.string(), from: z.string(), to: z.string(), subject: z.string(), attachments: z.int() })
export type MailLine = z.infer<typeof MailLineSchema>
const MailSchema = MailLineSchema.extend({ messageId: z.string(), text: z.string(), html: z.string(), files: z.array(z.object({ name: z.string(), type: z.string(), size: z.int() })) })

const IdParams = z.object({ id: BookIdSchema })
const BoxParams = z.object({ id: z.string().regex(/^[0-9a-z-]{1,60}$/) })

export const NOTICES = {
  'GET /api/notices': { ability: 'notice.read', summary: 'Notices, the latest first; a customer sees what was told to the own party', query: z.object({ state: z.enum([...NOTICE_STATES, 'waiting']).optional(), cursor: z.string().max(90).regex(/^[^~]+~[^~]+$/).optional() }), answers: { 200: pageOf(NoticeLineSchema) } },
  'GET /api/notices/:id': { ability: 'notice.read', summary: 'One notice as it will look, and what became of it', params: IdParams, answers: { 200: NoticeAnswerSchema } },
  'GET /api/notices/:id/notice.pdf': { ability: 'notice.read', summary: 'The notice on paper', params: IdParams, answers: { 200: FileAnswer } },
  'POST /api/notices/:id/release': { ability: 'notice.send', summary: 'Send a notice that waits', params: IdParams, answers: { 202: NoticeAnswerSchema } },
  'POST /api/notices/:id/again': { ability: 'notice.send', summary: 'Try a failed notice again', params: IdParams, answers: { 202: NoticeAnswerSchema } },
  'POST /api/notices/:id/printed': { ability: 'notice.send', summary: 'The notice was printed and left at the place', params: IdParams, answers: { 200: NoticeAnswerSchema } },
  'POST /api/notices/:id/handed-over': { ability: 'notice.send', summary: 'The notice was handed over on paper', params: IdParams, answers: { 200: NoticeAnswerSchema } },
  'GET /api/applications/:id/record.pdf': { ability: 'entry.print', summary: 'An entry with its history on paper', params: z.object({ id: RecordIdSchema }), answers: { 200: FileAnswer } },
  'GET /api/demo/mailbox': { ability: 'demo', summary: 'Mail of the demonstration, the latest first', answers: { 200: z.object({ mails: z.array(MailLineSchema) }) } },
  'GET /api/demo/mailbox/:id': { ability: 'demo', summary: 'One mail of the demonstration', params: BoxParams, answers: { 200: MailSchema } },
  'GET /api/demo/mailbox/:id/files/:n': { ability: 'demo', summary: 'An attachment of a mail of the demonstration', params: BoxParams.extend({ n: z.string().regex(/^\d{1,2}$/) }), answers: { 200: FileAnswer } },
} as const satisfies Contracts
