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
export const canonicalJson = (value: unknown): string => write(value, [])

/** The UTF-8 bytes of `canonicalJson(value)`: what is hashed. */
export const canonicalBytes = (value: unknown): Uint8Array => utf8ToBytes(canonicalJson(value))

/** The way to the value at hand. It grows and shrinks with the walk, and is put into words only when something is refused. */
type Way = (string | number)[]
const refuse = (code: CanonicalRefusal, way: Way): never => {
  throw new CanonicalError(code, `$${way.map(step => typeof step === 'number' ? `[${step}]` : `.${step}`).join('')}`)
}

function write(value: unknown, way: Way): string {
  if (value === null || typeof value === 'boolean') return String(value)
  if (typeof value === 'string') return writeText(value, way)
  if (typeof value === 'number') return Number.isFinite(value) ? JSON.stringify(value) : refuse('not-finite', way)
  if (Array.isArray(value)) return `[${Array.from(value, (item: unknown, i) => writeAt(item, i, way)).join(',')}]`
  if (typeof value === 'object') return writeObject(value, way)
  return refuse('no-json-form', way)
}

function writeAt(value: unknown, step: string | number, way: Way): string {
  way.push(step)
  const text = write(value, way)
  way.pop()
  return text
}

function writeObject(value: object, way: Way): string {
  const prototype: unknown = Object.getPrototypeOf(value)
  if (prototype !== null && prototype !== Object.prototype) refuse('not-plain', way)
  // JavaScript lists integer-like keys first; sort() without a comparison orders by UTF-16 code units, as section 3.2.3 asks.
  const held = value as Record<string, unknown>
  return `{${Object.keys(held).sort().map(key => `${writeText(key, way)}:${writeAt(held[key], key, way)}`).join(',')}}`
}

/** Most text has no surrogate at all: that is told first, without the slower reading by code points. */
const hasLoneSurrogate = (text: string): boolean => /[\ud800-\udfff]/.test(text) && /\p{Surrogate}/u.test(text)

function writeText(text: string, way: Way): string {
  return hasLoneSurrogate(text) ? refuse('lone-surrogate', way) : JSON.stringify(text)
}
