import canonicalize from 'canonicalize'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { CanonicalError, canonicalBytes, canonicalJson } from '#shared/ledger/canonical'

type Json = null | boolean | number | string | Json[] | { [key: string]: Json }
const json = fc.jsonValue({ noUnicodeString: false }).map(value => JSON.parse(JSON.stringify(value)) as Json)
const shuffled = (value: Json): Json => {
  if (Array.isArray(value)) return value.map(shuffled)
  if (value === null || typeof value !== 'object') return value
  return Object.fromEntries(Object.entries(value).reverse().map(([key, item]) => [key, shuffled(item)]))
}

describe('canonicalJson', () => {
  it('does not depend on the order of keys', () => {
    fc.assert(fc.property(json, (value) => {
      expect(canonicalJson(shuffled(value))).toBe(canonicalJson(value))
    }))
  })

  it('is its own canonical form once read back', () => {
    fc.assert(fc.property(json, (value) => {
      expect(canonicalJson(JSON.parse(canonicalJson(value)))).toBe(canonicalJson(value))
    }))
  })

  it('agrees with an independent implementation', () => {
    fc.assert(fc.property(json, (value) => {
      expect(canonicalJson(value)).toBe(canonicalize(value))
    }))
  })

  it('orders keys by UTF-16 code units, not code points', () => {
    expect(canonicalJson({ '\ufb33': 1, '\u{1f600}': 2, 'é': 3, '1': 4 })).toBe('{"1":4,"é":3,"\u{1f600}":2,"\ufb33":1}')
  })

  it('keeps a key named __proto__', () => {
    expect(canonicalJson(JSON.parse('{"__proto__":1,"a":2}'))).toBe('{"__proto__":1,"a":2}')
  })

  it.each([
    ['NaN', Number.NaN, 'not-finite', '$'], ['infinity', [Infinity], 'not-finite', '$[0]'], ['a bigint', { a: 1n }, 'no-json-form', '$.a'],
    ['undefined', { a: { b: undefined } }, 'no-json-form', '$.a.b'], ['a hole', Array(1), 'no-json-form', '$[0]'], ['a function', () => 1, 'no-json-form', '$'],
    ['a symbol', Symbol('x'), 'no-json-form', '$'], ['a date', new Date(0), 'not-plain', '$'], ['a map', new Map(), 'not-plain', '$'],
    ['a lone high surrogate', '\ud83d', 'lone-surrogate', '$'], ['a lone low surrogate in a key', { '\ude00': 1 }, 'lone-surrogate', '$'],
  ])('refuses %s', (_what, value, code, path) => {
    expect(() => canonicalBytes(value)).toThrow(CanonicalError)
    expect(() => canonicalJson(value)).toThrow(expect.objectContaining({ code, path: expect.stringContaining(path) }))
  })
})
