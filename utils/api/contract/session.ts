import { z } from 'zod'
import { ABILITIES } from '#shared/access/abilities'
import { PASSWORD_MAX } from '#shared/access/passwords'
import type { Contracts } from '#shared/api/contract/define'
import { NothingAnswer } from '#shared/api/contract/define'
import { ROLES } from '#shared/books/shapes'
import { BookIdSchema, HashSchema, text } from '#shared/records/shapes'

/** An e-mail address in its one spelling. */
export const EmailSchema = z.string().trim().normalize().toLowerCase().max(254).pipe(z.email())
/** 32 bytes in base64url: what stands behind the `#` of a mailed link. */
const TokenSchema = z.string().regex(/^[A-Za-z0-9_-]{43}$/)
const PasswordSchema = z.string().min(1).max(PASSWORD_MAX)

export const MeSchema = z.object({
  person: z.string(),
  personId: BookIdSchema.nullable(),
  partyId: BookIdSchema.nullable(),
  email: z.string(),
  language: z.string(),
  /** Null while somebody of several firms has not chosen; `closed` when the firm's file failed a check at opening. */
  firm: z.object({ id: BookIdSchema, name: z.string(), slug: z.string(), closed: z.boolean() }).nullable(),
  membershipId: z.string().nullable(),
  memberships: z.array(z.object({ id: z.string(), firm: z.string() })),
  roles: z.array(z.enum(ROLES)),
  branches: z.union([z.literal('all'), z.array(BookIdSchema)]),
  abilities: z.array(z.enum(ABILITIES)),
  /** Number of the licence in force that lasts longest. */
  licence: z.string().nullable(),
  demo: z.boolean(),
})
export type Me = z.infer<typeof MeSchema>

export const SessionAnswerSchema = z.object({ me: MeSchema.nullable(), demo: z.boolean() })
export type SessionAnswer = z.infer<typeof SessionAnswerSchema>

export const SignInSchema = z.strictObject({ email: EmailSchema, password: PasswordSchema })
export const OpenSessionSchema = z.object({ id: HashSchema, device: z.string(), createdAt: z.string(), seenAt: z.string(), here: z.boolean() })
export const LinkLookSchema = z.object({ kind: z.enum(['invitation', 'reset']), email: z.string(), name: z.string().nullable(), firm: z.string().nullable() })
export const DemoAccountSchema = z.object({ email: z.string(), name: z.string(), firms: z.array(z.object({ firm: z.string(), roles: z.array(z.enum(ROLES)) })) })

export const InvitationSchema = z.strictObject({
  subject: z.strictObject({ kind: z.enum(['person', 'party']), id: BookIdSchema }),
  email: EmailSchema,
})

export const SESSION = {
  'GET /api/session': { ability: 'public', summary: 'Who is signed in, in which firm, with which abilities; null without a session', answers: { 200: SessionAnswerSchema } },
  'POST /api/session': { ability: 'public', summary: 'Sign in by address and password', body: SignInSchema, answers: { 201: SessionAnswerSchema } },
  'DELETE /api/session': { ability: 'public', summary: 'Sign out here', answers: { 204: NothingAnswer } },
  'POST /api/session/firm': { ability: 'signed-in', summary: 'Choose the firm to work in', body: z.strictObject({ membershipId: BookIdSchema }), answers: { 200: SessionAnswerSchema } },
  'GET /api/account/sessions': { ability: 'signed-in', summary: 'Where this account is signed in', answers: { 200: z.object({ sessions: z.array(OpenSessionSchema) }) } },
  'DELETE /api/account/sessions': { ability: 'signed-in', summary: 'Sign out everywhere', answers: { 204: NothingAnswer } },
  'DELETE /api/account/sessions/:id': { ability: 'signed-in', summary: 'End one session of this account', params: z.object({ id: HashSchema }), answers: { 204: NothingAnswer } },
  'POST /api/account/password': { ability: 'signed-in', summary: 'Change the password; other sessions end', body: z.strictObject({ current: PasswordSchema, next: PasswordSchema }), answers: { 204: NothingAnswer } },
  'POST /api/links/reset': { ability: 'public', summary: 'Ask for a link that sets a new password; the answer is the same for unknown addresses', body: z.strictObject({ email: EmailSchema }), answers: { 202: z.object({ asked: z.literal(true) }) } },
  'POST /api/links/look': { ability: 'public', summary: 'What a mailed link is for; changes nothing', body: z.strictObject({ token: TokenSchema }), answers: { 200: LinkLookSchema } },
  'POST /api/links/use': { ability: 'public', summary: 'Set the password by a mailed link, once, and sign in', body: z.strictObject({ token: TokenSchema, password: PasswordSchema, name: text(120).optional() }), answers: { 201: SessionAnswerSchema } },
  'POST /api/people/invitations': { ability: 'people.invite', summary: 'Let a person or a party of the book in by mail', body: InvitationSchema, answers: { 202: z.object({ invited: z.literal(true) }) } },
  'GET /api/demo/accounts': { ability: 'demo', summary: 'Accounts of the demonstration', answers: { 200: z.object({ accounts: z.array(DemoAccountSchema) }) } },
  'POST /api/demo/session': { ability: 'demo', summary: 'Sign in to the demonstration with one click', body: z.strictObject({ email: EmailSchema }), answers: { 201: SessionAnswerSchema } },
  'GET /api/health': { ability: 'public', summary: 'Does the server answer, and how many firms are open or closed', answers: { 200: z.object({ ok: z.boolean(), firms: z.object({ open: z.int(), closed: z.int() }) }) } },
  'GET /_openapi.json': { ability: 'signed-in', summary: 'This description', answers: { 200: z.record(z.string(), z.unknown()) } },
} as const satisfies Contracts
