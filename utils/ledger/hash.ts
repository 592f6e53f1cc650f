import { sha256 as nobleSha256 } from '@noble/hashes/sha2.js'
import { bytesToHex, concatBytes } from '@noble/hashes/utils.js'

// One byte before each kind of content, so that no hash of one kind can be passed off as another (as RFC 6962, section 2.1, does with 0x00 and 0x01).
const LEAF = Uint8Array.of(0x00)
const COMMITMENT = Uint8Array.of(0x02)
const CHAIN = Uint8Array.of(0x03)

/** What stands before the first leaf. Read only. */
export const ZERO_HASH: Readonly<Uint8Array> = new Uint8Array(32)

export const sha256 = (bytes: Uint8Array): Uint8Array => nobleSha256(bytes)
/** SHA-256(0x00 ‖ body). */
export const leafHash = (body: Uint8Array): Uint8Array => sha256(concatBytes(LEAF, body))
/** SHA-256(0x03 ‖ prev ‖ leaf); both 32 bytes, else `RangeError`. */
export const chainHash = (prev: Uint8Array, leaf: Uint8Array): Uint8Array => sha256(concatBytes(CHAIN, hash32(prev), hash32(leaf)))
/** SHA-256(0x02 ‖ salt ‖ bytes); salt 32 bytes, else `RangeError`. */
export const commitment = (salt: Uint8Array, bytes: Uint8Array): Uint8Array => sha256(concatBytes(COMMITMENT, hash32(salt), bytes))

/** Lower-case hex. */
export const toHex = (bytes: Uint8Array): string => bytesToHex(bytes)

/** Bytes of lower-case hex, `length` of them when given. Throws `RangeError` for anything else, upper case too: a hash has one spelling. */
export function fromHex(text: string, length?: number): Uint8Array {
  if (!/^([0-9a-f]{2})*$/.test(text)) throw new RangeError('not lower-case hex')
  if (length !== undefined && text.length !== length * 2) throw new RangeError(`expected ${length} bytes`)
  return Uint8Array.from({ length: text.length / 2 }, (_, i) => Number.parseInt(text.slice(i * 2, i * 2 + 2), 16))
}

/** Same length and content. Not constant-time: for public hashes, never for secrets. */
export const equalBytes = (a: Uint8Array, b: Uint8Array): boolean => a.length === b.length && a.every((byte, i) => byte === b[i])

function hash32(bytes: Uint8Array): Uint8Array {
  if (bytes.length !== 32) throw new RangeError('expected 32 bytes')
  return bytes
}
