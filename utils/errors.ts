/** One thing that is wrong with what was sent: where, which rule (a key of `errors.issues.*`), and the values that its sentence names. */
export interface Issue {
  path: string
  code: string
  params?: Record<string, string | number>
}

export const ERROR_STATUS = {
  'malformed': 400,
  'no-session': 401,
  'wrong-sign-in': 401,
  'not-allowed': 403,
  'cross-site': 403,
  'not-found': 404,
  'conflict': 409,
  'id-in-use': 409,
  'head-moved': 409,
  'already-struck': 409,
  'notice-settled': 409,
  'notice-stopped': 409,
  'link-used': 410,
  'too-large': 413,
  'wrong-kind': 415,
  'refused': 422,
  'weak-password': 422,
  'too-many': 429,
  'not-now': 503,
  'firm-closed': 503,
} as const

export type ErrorCode = keyof typeof ERROR_STATUS

/**
 * An answer other than yes. `code` is for programs, the sentence for people comes from `errors.<code>` of the catalogue;
 * `detail` is handed to the client as it is (for example the head that stands now).
 */
export class AppError extends Error {
  readonly status: number
  constructor(readonly code: ErrorCode, readonly issues: Issue[] = [], readonly detail: Record<string, unknown> | null = null) {
    super(code)
    this.name = 'AppError'
    this.status = ERROR_STATUS[code]
  }
}
