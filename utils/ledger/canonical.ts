import { utf8ToBytes } from '@noble/hashes/utils.js'

export type CanonicalRefusal = 'not-finite' | 'lone-surrogate' | 'not-plain' | 'no-json-form'

/** A value that has no canonical form. `path` leads to it ("$.lines[0].note"). */
export class CanonicalError extends Error {
  override readonly name = 'CanonicalError'

  constructor(readonly code: CanonicalRefusal, readonly path: string) {
    super(`${code} at ${path}`)
  }
}

/**
 * Canonical JSON text by RFC 8785: keys by UTF-16 code units, ECMAScript numbers, no white space, no Unicode normalisation.
 * Throws `CanonicalError` for NaN, infinity, lone surrogates, bigint, undefined (a hole or a property too), functions, symbols and
 * objects that are not plain, rather than dropping or rewriting what somebody signed.
 */
export const canonicalJson = (value: unknown): string => write(value, '$')

/** The UTF-8 bytes of `canonicalJson(value)`: what is hashed. */
export const canonicalBytes = (value: unknown): Uint8Array => utf8ToBytes(canonicalJson(value))

function write(value: unknown, path: string): string {
  if (value === null || typeof value === 'boolean') return String(value)
  if (typeof value === 'string') return writeText(value, path)
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new CanonicalError('not-finite', path)
    return JSON.stringify(value)
  }
  if (Array.isArray(value)) return `[${Array.from(value, (item: unknown, i) => write(item, `${path}[${i}]`)).join(',')}]`
  if (typeof value === 'object') return writeObject(value, path)
  throw new CanonicalError('no-json-form', path)
}

function writeObject(value: object, path: string): string {
  const prototype: unknown = Object.getPrototypeOf(value)
  if (prototype !== null && prototype !== Object.prototype) throw new CanonicalError('not-plain', path)
  // JavaScript lists integer-like keys first; sort() orders by UTF-16 code units, as section 3.2.3 asks.
  const entries = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1))
  return `{${entries.map(([key, item]) => `${writeText(key, path)}:${write(item, `${path}.${key}`)}`).join(',')}}`
}

/** Most text has no surrogate at all: that is told first, without the slower reading by code points. */
const hasLoneSurrogate = (text: string): boolean => /[\ud800-\udfff]/.test(text) && /\p{Surrogate}/u.test(text)

function writeText(text: string, path: string): string {
  if (hasLoneSurrogate(text)) throw new CanonicalError('lone-surrogate', path)
  return JSON.stringify(text)
}
