import { createHash } from 'node:crypto'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ZERO_HASH, chainHash, commitment, equalBytes, fromHex, leafHash, sha256, toHex } from '#shared/ledger/hash'

const node = (...parts: Uint8Array[]) => createHash('sha256').update(Buffer.concat(parts)).digest('hex')
const bytes32 = fc.uint8Array({ minLength: 32, maxLength: 32 })

describe('hashes', () => {
  it('are those of the platform library, each kind with its own first byte', () => {
    fc.assert(fc.property(bytes32, bytes32, fc.uint8Array({ maxLength: 200 }), (a, b, body) => {
      expect(toHex(sha256(body))).toBe(node(body))
      expect(toHex(leafHash(body))).toBe(node(Uint8Array.of(0), body))
      expect(toHex(chainHash(a, b))).toBe(node(Uint8Array.of(3), a, b))
      expect(toHex(commitment(a, body))).toBe(node(Uint8Array.of(2), a, body))
    }))
  })

  it('give the leaf of RFC 6962 (transparency-dev/merkle, constants.go, size 1)', () => {
    expect(toHex(leafHash(new Uint8Array()))).toBe('6e340b9cffb37a989ca544e6bb780a2c78901d3fb33738768511a30617afa01d')
  })

  it('refuse a previous hash or salt of another length', () => {
    expect(() => chainHash(new Uint8Array(31), new Uint8Array(32))).toThrow(RangeError)
    expect(() => commitment(new Uint8Array(16), new Uint8Array())).toThrow(RangeError)
    expect(ZERO_HASH).toEqual(new Uint8Array(32))
  })
})

describe('hex', () => {
  it('reads back what it wrote', () => {
    fc.assert(fc.property(fc.uint8Array({ maxLength: 64 }), (bytes) => {
      expect(equalBytes(fromHex(toHex(bytes), bytes.length), bytes)).toBe(true)
    }))
  })

  it.each([['AB', undefined], ['abc', undefined], ['0x12', undefined], ['zz', undefined], ['ab', 2], ['ab\n', undefined]])('refuses %j', (text, length) => {
    expect(() => fromHex(text, length)).toThrow(RangeError)
  })

  it('compares length and content', () => {
    expect(equalBytes(Uint8Array.of(1, 2), Uint8Array.of(1, 2, 3))).toBe(false)
    expect(equalBytes(Uint8Array.of(1, 2), Uint8Array.of(1, 3))).toBe(false)
  })
})
