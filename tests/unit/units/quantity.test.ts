import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { parseDecimal } from '#shared/units/decimal'
import { QuantitySchema, addQuantities, compareQuantities, convert, fromRational, quantityOf, toBase, toRational } from '#shared/units/quantity'
import type { Quantity } from '#shared/units/quantity'
import type { Rate } from '#shared/units/rate'
import { UNIT_CODES, commensurable, unitsOf } from '#shared/units/units'

const value = fc.tuple(fc.integer({ min: 0, max: 99_999 }), fc.integer({ min: 0, max: 999 })).map(([whole, part]) => `${whole}.${String(part).padStart(3, '0')}`)
const pairs = UNIT_CODES.flatMap(a => UNIT_CODES.filter(b => commensurable(a, b)).map(b => [a, b] as const))
const OIL: Rate = { value: '8.695652', unit: 'lb/gal' }

describe('QuantitySchema', () => {
  it('keeps the digits as entered', () => {
    expect(QuantitySchema.parse({ value: '1.20', unit: 'fl_oz' })).toEqual({ value: '1.20', unit: 'fl_oz' })
  })

  it.each([
    [{ value: 1.2, unit: 'fl_oz' }], [{ value: '1.2', unit: 'oz' }], [{ value: '1.2', unit: 'imp_gal' }], [{ value: '1e2', unit: 'gal' }],
    [{ value: '1.2', unit: 'gal', note: '' }], [{ value: '1'.repeat(25), unit: 'gal' }], [{ value: '1.2' }],
  ])('refuses %j', (input) => {
    expect(QuantitySchema.safeParse(input).success).toBe(false)
  })
})

describe('converting', () => {
  it('goes there and back exactly between all units that share a dimension', () => {
    fc.assert(fc.property(value, fc.constantFrom(...pairs), (text, [from, to]) => {
      const there = toRational(quantityOf(text, from), to)
      const oneThere = toRational(quantityOf('1', to), from)
      const zeroThere = toRational(quantityOf('0', to), from)
      const slope = { n: oneThere.n * zeroThere.d - zeroThere.n * oneThere.d, d: oneThere.d * zeroThere.d }
      const left = there.n * slope.n * zeroThere.d + zeroThere.n * there.d * slope.d
      const back = { n: left, d: there.d * slope.d * zeroThere.d }
      const start = parseDecimal(text)
      expect(back.n * start.d).toBe(start.n * back.d)
    }))
  })

  it('keeps the order of quantities in base units', () => {
    fc.assert(fc.property(value, value, fc.constantFrom(...pairs), (a, b, [unitA, unitB]) => {
      const [x, y] = [quantityOf(a, unitA), quantityOf(b, unitB)]
      if (toBase(x) < toBase(y)) expect(compareQuantities(x, y)).toBe(-1)
      if (compareQuantities(x, y) === -1) expect(toBase(x) <= toBase(y)).toBe(true)
    }))
  })

  it('keeps the text when the unit stays', () => {
    expect(convert(quantityOf('1.20', 'gal'), 'gal')).toEqual(quantityOf('1.20', 'gal'))
    expect(convert(quantityOf('1.20', 'gal'), 'gal', { digits: 1 }).value).toBe('1.2')
  })

  it.each([['gal', 'acre'], ['lb', 'ft'], ['station', 'placement'], ['pct', 'each'], ['deg_F', 'mph']] as const)('%s is never %s', (from, to) => {
    expect(() => convert(quantityOf('1', from), to)).toThrow(expect.objectContaining({ code: 'wrong-dimension', params: { from, to } }))
  })

  it('crosses from mass to volume only by a density', () => {
    expect(() => convert(quantityOf('1', 'lb'), 'gal')).toThrow(expect.objectContaining({ code: 'needs-density' }))
    expect(convert(quantityOf('8.695652', 'lb'), 'fl_oz', { density: OIL })).toEqual(quantityOf('128', 'fl_oz'))
    expect(convert(quantityOf('1', 'L'), 'kg', { density: { value: '1.2', unit: 'kg/L' } })).toEqual(quantityOf('1.2', 'kg'))
  })

  it.each([
    [{ value: '0', unit: 'lb/gal' }, 'density-not-positive'], [{ value: '1', unit: 'fl_oz/gal' }, 'wrong-dimension'], [{ value: '1', unit: 'lb/acre' }, 'wrong-dimension'],
  ] as [Rate, string][])('refuses %j as a density', (density, code) => {
    expect(() => convert(quantityOf('1', 'lb'), 'gal', { density })).toThrow(expect.objectContaining({ code }))
  })

  it('there and back through a density is exact', () => {
    fc.assert(fc.property(value, fc.constantFrom(...unitsOf('mass')), fc.constantFrom(...unitsOf('volume')), (text, mass, volume) => {
      const perUnit = toRational(quantityOf('1', volume), mass, OIL)
      const there = toRational(quantityOf(text, mass), volume, OIL)
      const start = parseDecimal(text)
      expect(there.n * perUnit.n * start.d).toBe(start.n * there.d * perUnit.d)
    }))
  })
})

describe('base integers', () => {
  it('round half to even', () => {
    expect(toBase(quantityOf('0.0000005', 'mL'))).toBe(0n)
    expect(toBase(quantityOf('0.0000015', 'mL'))).toBe(2n)
  })

  it('fit a signed 64-bit integer or are refused', () => {
    expect(toBase(quantityOf('9223372036854775807', 's'))).toBe(9_223_372_036_854_775_807n)
    expect(() => toBase(quantityOf('9223372036854775808', 's'))).toThrow(expect.objectContaining({ code: 'out-of-range' }))
  })
})

describe('sums', () => {
  it('keep the longest fraction in one unit', () => {
    expect(addQuantities([quantityOf('0.90', 'fl_oz'), quantityOf('1.2', 'fl_oz')], 'fl_oz').value).toBe('2.10')
  })

  it('round once when units mix', () => {
    expect(addQuantities([quantityOf('1', 'pt'), quantityOf('8', 'fl_oz'), quantityOf('1', 'cup')], 'qt')).toEqual(quantityOf('1', 'qt'))
    expect(addQuantities([], 'gal')).toEqual(quantityOf('0', 'gal'))
  })

  it('do not depend on the order', () => {
    const quantities: fc.Arbitrary<Quantity> = fc.tuple(value, fc.constantFrom(...unitsOf('volume'))).map(([text, unit]) => quantityOf(text, unit))
    fc.assert(fc.property(fc.array(quantities, { maxLength: 8 }), (list) => {
      expect(addQuantities([...list].reverse(), 'gal')).toEqual(addQuantities(list, 'gal'))
    }))
  })

  it('refuse a stray dimension', () => {
    expect(() => addQuantities([quantityOf('1', 'gal'), quantityOf('1', 'acre')], 'gal')).toThrow(expect.objectContaining({ code: 'wrong-dimension' }))
  })
})

it('a figure too long for a record is refused, not cut', () => {
  expect(() => fromRational({ n: 1n, d: 3n }, 'gal', 30)).toThrow(expect.objectContaining({ code: 'out-of-range' }))
})
