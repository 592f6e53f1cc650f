export const QUANTITY_ERROR_CODES = [
  'not-a-decimal', 'unknown-unit', 'wrong-dimension', 'needs-density', 'density-not-positive', 'out-of-range', 'division-by-zero',
] as const
export type QuantityErrorCode = (typeof QUANTITY_ERROR_CODES)[number]

/** A sum that cannot be done. `code` and `params` feed the message catalogue; `message` is for logs only. */
export class QuantityError extends Error {
  override readonly name = 'QuantityError'

  constructor(readonly code: QuantityErrorCode, readonly params: Readonly<Record<string, string>> = {}) {
    super(`${code} ${JSON.stringify(params)}`)
  }
}
