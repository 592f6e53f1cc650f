import { z } from 'zod'
import type { Ability, Door } from '#shared/access/abilities'

/** One route of the program: who may call it, what goes in, what comes out. Everything that knows routes reads this table. */
export interface Contract {
  ability: Ability | Door
  summary: string
  params?: z.ZodObject
  query?: z.ZodObject
  body?: z.ZodType
  /** Bytes; 64 kB where not stated. */
  bodyLimit?: number
  /** By status. A file download has no schema: `z.instanceof` cannot be said in OpenAPI, so it is `FileAnswer`. */
  answers: Partial<Record<200 | 201 | 202 | 204, z.ZodType>>
}

export type Contracts = Record<`${'GET' | 'POST' | 'PUT' | 'DELETE'} /${string}`, Contract>

export const FileAnswer = z.string().meta({ contentEncoding: 'binary', description: 'A file.' })
export const NothingAnswer = z.null()

export const IssueSchema = z.object({ path: z.string(), code: z.string(), message: z.string() })
/** What every refusal answers. `detail` carries what the next step needs (for example the head that stands now). */
export const ErrorAnswerSchema = z.object({ code: z.string(), message: z.string(), issues: z.array(IssueSchema), detail: z.record(z.string(), z.unknown()).nullable() })
export type ErrorAnswer = z.infer<typeof ErrorAnswerSchema>

/** A list by keyset: hand `cursor` back to have the next page. */
export const pageOf = <T extends z.ZodType>(row: T) => z.object({ rows: z.array(row), next: z.string().nullable() })
