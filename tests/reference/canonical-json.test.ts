import { describe, expect, it } from 'vitest'
import { canonicalBytes, canonicalJson } from '#shared/ledger/canonical'
import { sha256, toHex } from '#shared/ledger/hash'

const hash = (value: unknown) => toHex(sha256(canonicalBytes(value)))
const double = (hex: string) => Buffer.from(hex, 'hex').readDoubleBE()

// Vectors: github.com/cyberphone/json-canonicalization/tree/master/testdata, and RFC 8785.
describe('RFC 8785 canonical JSON', () => {
  it.each([
    ['arrays.json', '[56,{"d":true,"10":null,"1":[ ]}]', '[56,{"1":[],"10":null,"d":true}]', '099601b171cafed97c333f8878d68e7f8c8f795412adb34b2fdcf0e7c7beac42'],
    ['structures.json', String.raw`{"1":{"f":{"f":"hi","F":5},"\n":56.0},"10":{},"":"empty","a":{},"111":[{}],"A":{}}`,
      String.raw`{"":"empty","1":{"\n":56,"f":{"F":5,"f":"hi"}},"10":{},"111":[{}],"A":{},"a":{}}`, '513d0c0f2524a8b295a9bbd982a37b7a000f1c5f915bf2d6d8cfdf75347bacad'],
    ['unicode.json', String.raw`{"Unnormalized Unicode":"\u1e0d\u0307"}`, '{"Unnormalized Unicode":"\u1e0d\u0307"}', 'bd0218d3ca16a6bc3ec9802582742855a025566a0e2f76c93fc0ffb2541ecb19'],
    ['not normalised', String.raw`{"Unnormalized Unicode":"A\u030a"}`, '{"Unnormalized Unicode":"A\u030a"}', '0d99aad92a125196ff887876643fd3206786a84ddce2cee52ba4ad256d2381d3'],
  ])('%s', (_name, input, canonical, digest) => {
    expect(canonicalJson(JSON.parse(input))).toBe(canonical)
    expect(hash(JSON.parse(input))).toBe(digest)
  })

  it('values.json', () => {
    const input = String.raw`{"numbers":[1E30,4.50,333333333.33333329,2e-3,0.000000000000000000000000001],"escaping":"\u20ac$\u000F\u000aA'\u0042\u0022\u005c\\\"\/","literals":[null,true,false]}`
    expect(canonicalBytes(JSON.parse(input)).length).toBe(120)
    expect(hash(JSON.parse(input))).toBe('0af3685dce30daa753153aadb1956b0f3133642fbe5d4a5e3a4267f94814ba87')
  })

  it.each([
    ['4340000000000001', '9007199254740994'], ['444b1ae4d6e2ef50', '1e+21'], ['3eb0c6f7a0b5ed8d', '0.000001'],
    ['3eb0c6f7a0b5ed8c', '9.999999999999997e-7'], ['8000000000000000', '0'], // testdata README
    ['0000000000000001', '5e-324'], ['7fefffffffffffff', '1.7976931348623157e+308'], ['44b52d02c7e14af6', '1e+23'],
    ['becbf647612f3696', '-0.0000033333333333333333'], // RFC 8785, appendix B, from memory
  ])('double %s is written %s', (hex, text) => {
    expect(canonicalJson(double(hex))).toBe(text)
  })
})
