import { z } from 'zod'
import { fromHex, toHex } from '#shared/ledger/hash'

const UUID7 = /^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/
const MAX_MS = 2 ** 48 - 1

/** A UUID of version 7, variant 10, in lower case: an id has one spelling in records and hashes. */
export const Uuid7Schema = z.string().regex(UUID7)

/**
 * A UUID version 7 (RFC 9562, section 5.7) from Unix milliseconds (0 to 2^48 − 1) and 10 random bytes.
 * Throws `RangeError` when either is out of bounds.
 */
export function uuidv7(unixMs: number, random: Uint8Array): string {
  if (!Number.isInteger(unixMs) || unixMs < 0 || unixMs > MAX_MS) throw new RangeError('time outside 48 bits')
  if (random.length !== 10) throw new RangeError('expected 10 random bytes')
  const bytes = Uint8Array.of(...fromHex(unixMs.toString(16).padStart(12, '0')), ...random)
  const [version = 0, , variant = 0] = random
  bytes[6] = 0x70 | (version & 0x0f)
  bytes[8] = 0x80 | (variant & 0x3f)
  return toHex(bytes).replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5')
}

/** Unix milliseconds of a version 7 UUID, in either case. Throws `RangeError` for anything else. */
export function uuidTime(id: string): number {
  const lower = id.toLowerCase()
  if (!UUID7.test(lower)) throw new RangeError('not a version 7 UUID')
  return Number.parseInt(lower.replace('-', '').slice(0, 12), 16)
}

// Crockford's Base32 (crockford.com/base32.html): no I, L, O, U.
const ALPHABET = '0123456789ABCDEFGHJKMNPQRSTVWXYZ'

/**
 * The reference people read aloud, `260514-7KQ4M2`: the local day (YYYY-MM-DD) as yymmdd, then the last 30 bits of the id.
 * Not unique by law: looking one up gives a list.
 */
export function reference(localDay: string, id: string): string {
  const bits = Number.parseInt(id.slice(-8), 16) & 0x3fff_ffff
  const characters = [25, 20, 15, 10, 5, 0].map(shift => ALPHABET[(bits >>> shift) & 31])
  return `${localDay.slice(2).replaceAll('-', '')}-${characters.join('')}`
}

/** A reference as typed or read aloud (lower case, O for 0, I or L for 1, dash or spaces missing) in its one spelling, or null. */
export function parseReference(text: string): string | null {
  const compact = text.toUpperCase().replace(/[\s\-–—]/g, '').replace(/O/g, '0').replace(/[IL]/g, '1')
  const match = /^(\d{2}(?:0[1-9]|1[0-2])(?:0[1-9]|[12]\d|3[01]))([0-9A-HJKMNP-TV-Z]{6})$/.exec(compact)
  return match ? `${match[1]}-${match[2]}` : null
}
