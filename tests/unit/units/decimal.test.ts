import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { add, compareRational, div, mul, parseDecimal, rational, roundToInteger, sub, toDecimal, toReadable, toSignificant } from '#shared/units/decimal'
import { QuantityError } from '#shared/units/errors'

const rationals = fc.tuple(fc.bigInt({ min: -(10n ** 20n), max: 10n ** 20n }), fc.bigInt({ min: 1n, max: 10n ** 12n })).map(([n, d]) => rational(n, d))
const decimals = fc.tuple(fc.bigInt({ min: -(10n ** 18n), max: 10n ** 18n }), fc.integer({ min: 0, max: 9 })).map(([n, digits]) => toDecimal(rational(n, 10n ** BigInt(digits)), digits))

describe('parseDecimal', () => {
  it.each(['', '.5', '5.', '+1', '1e3', ' 1', '1 ', '1,000', '--1', '0x10', '١', 'NaN'])('refuses %j', (text) => {
    expect(() => parseDecimal(text)).toThrow(QuantityError)
  })

  it('is undone by toDecimal, digits kept', () => {
    fc.assert(fc.property(decimals, (text) => {
      expect(toDecimal(parseDecimal(text), text.split('.')[1]?.length ?? 0)).toBe(text)
    }))
  })
})

describe('arithmetic', () => {
  it('commutes, associates and undoes itself', () => {
    fc.assert(fc.property(rationals, rationals, rationals, (a, b, c) => {
      expect(add(a, b)).toEqual(add(b, a))
      expect(mul(a, b)).toEqual(mul(b, a))
      expect(add(add(a, b), c)).toEqual(add(a, add(b, c)))
      expect(sub(add(a, b), b)).toEqual(a)
      if (b.n !== 0n) expect(div(mul(a, b), b)).toEqual(a)
    }))
  })

  it('orders as the difference does, without floating error', () => {
    fc.assert(fc.property(rationals, rationals, (a, b) => {
      expect(compareRational(a, b)).toBe(-compareRational(b, a) || 0)
      expect(compareRational(a, b)).toBe(compareRational(sub(a, b), rational(0n)))
    }))
    expect(compareRational(add(parseDecimal('0.1'), parseDecimal('0.2')), parseDecimal('0.3'))).toBe(0)
  })

  it('refuses to divide by zero', () => {
    expect(() => div(rational(1n), rational(0n))).toThrow(expect.objectContaining({ code: 'division-by-zero' }))
  })
})

describe('rounding', () => {
  it.each([['0.5', 0n], ['1.5', 2n], ['2.5', 2n], ['-0.5', 0n], ['-1.5', -2n], ['-2.5', -2n], ['2.51', 3n], ['-2.51', -3n]])('%s to an integer', (text, whole) => {
    expect(roundToInteger(parseDecimal(text))).toBe(whole)
  })

  it.each([['0.125', 2, '0.12'], ['0.375', 2, '0.38'], ['1', 2, '1.00'], ['-0.004', 2, '0.00'], ['-1.005', 2, '-1.00'], ['12', 0, '12']])('%s at %i places', (text, digits, printed) => {
    expect(toDecimal(parseDecimal(text), digits)).toBe(printed)
  })

  it.each([['9.9996', 4, '10.00'], ['0.0012345', 3, '0.00123'], ['12345', 2, '12000'], ['99.5', 2, '100'], ['0', 4, '0'], ['-0.33335', 4, '-0.3334'], ['1', 4, '1.000']])('%s to %i significant digits', (text, count, printed) => {
    expect(toSignificant(parseDecimal(text), count)).toBe(printed)
  })

  it.each([[3n, 8n, '0.375'], [1n, 16n, '0.0625'], [1n, 32n, '0.03125'], [1n, 3n, '0.3333'], [20n, 3n, '6.667'], [100000n, 3n, '33333'], [5n, 1n, '5'], [12345678n, 1000n, '12345.678']])('%s / %s reads %s', (n, d, printed) => {
    expect(toReadable(rational(n, d))).toBe(printed)
  })

  it('lands within half a unit of the last place', () => {
    fc.assert(fc.property(rationals, fc.integer({ min: 0, max: 8 }), (r, digits) => {
      const error = sub(parseDecimal(toDecimal(r, digits)), r)
      const twice = { n: (error.n < 0n ? -error.n : error.n) * 2n, d: error.d }
      expect(compareRational(twice, rational(1n, 10n ** BigInt(digits)))).not.toBe(1)
    }))
  })
})
