import { z } from 'zod'
import { Uuid7Schema } from '#shared/ledger/ids'

/** The fixed form of the rules in force for shapes: text is NFC, carries no control characters but line breaks, and says something. */
export const text = (max: number) => z.string().trim().min(1).max(max)
  .refine(value => value === value.normalize('NFC'), { error: 'not-nfc' })
  // eslint-disable-next-line no-control-regex -- exactly the control characters are refused
  .refine(value => !/[\u0000-\u0008\u000B-\u001F\u007F]/.test(value), { error: 'control-character' })

/** Books may have come from elsewhere: their ids are any UUID. What a device signs is a version 7. */
export const BookIdSchema = z.uuid().toLowerCase()
export const RecordIdSchema = Uuid7Schema

/** A code of our catalogues with the words as shown at signing, or the words alone. */
export const CodedSchema = z.strictObject({ code: z.string().max(60).nullable(), text: text(160) })
export type Coded = z.infer<typeof CodedSchema>

/** Something of the books, or what was read off it when it is not in the book yet. */
export const ReferSchema = z.union([
  z.strictObject({ id: BookIdSchema }),
  z.strictObject({ read: z.strictObject({ name: text(160), address: text(300).nullable().default(null), number: text(60).nullable().default(null) }) }),
])
export type Refer = z.infer<typeof ReferSchema>

export const referId = (refer: Refer | null): string | null => refer && 'id' in refer ? refer.id : null

/** SHA-256 as lower-case hex. */
export const HashSchema = z.string().regex(/^[0-9a-f]{64}$/)
