import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { RATE_UNITS, RateSchema, compareRates, rateDimension, splitRateUnit } from '#shared/units/rate'
import type { RateUnit } from '#shared/units/rate'

const units = fc.constantFrom(...RATE_UNITS)
const value = fc.integer({ min: 0, max: 1_000_000 }).map(n => (n / 100).toFixed(2))

describe('rates', () => {
  it.each([
    ['0.30', 'fl_oz/gal', '2.34375', 'mL/L'], ['1.5', 'fl_oz/1000_sq_ft', '4.08375', 'pt/acre'], ['1', 'lb/1000_sq_ft', '43.56', 'lb/acre'],
    ['8', 'fl_oz/100_gal', '0.08', 'fl_oz/gal'], ['4', 'gal/1000_sq_ft', '0.004', 'gal/sq_ft'], ['2', 'pct', '2.0', 'pct'], ['16', 'fl_oz/station', '1', 'pt/station'],
  ] as [string, RateUnit, string, RateUnit][])('%s %s is %s %s', (a, unitA, b, unitB) => {
    expect(compareRates({ value: a, unit: unitA }, { value: b, unit: unitB })).toBe(0)
  })

  it('decide at the last digit, where floating point would not', () => {
    expect(compareRates({ value: '0.30', unit: 'fl_oz/gal' }, { value: '2.34374', unit: 'mL/L' })).toBe(1)
    expect(compareRates({ value: '0.1', unit: 'lb/acre' }, { value: '0.10000000000000000001', unit: 'lb/acre' })).toBe(-1)
  })

  it.each([
    ['fl_oz/gal', 'lb/gal'], ['fl_oz/gal', 'fl_oz/acre'], ['pct', 'fl_oz/gal'], ['each/acre', 'placement/acre'], ['g/station', 'g/placement'], ['gal/linear_ft', 'gal/sq_ft'],
  ] as [RateUnit, RateUnit][])('%s does not compare with %s', (a, b) => {
    expect(() => compareRates({ value: '1', unit: a }, { value: '1', unit: b })).toThrow(expect.objectContaining({ code: 'wrong-dimension' }))
  })

  it('order the same both ways round', () => {
    fc.assert(fc.property(value, units, value, units, (a, unitA, b, unitB) => {
      fc.pre(rateDimension(unitA) === rateDimension(unitB))
      const [x, y] = [{ value: a, unit: unitA }, { value: b, unit: unitB }]
      expect(compareRates(x, y)).toBe(-compareRates(y, x) || 0)
      expect(compareRates(x, x)).toBe(0)
    }))
  })

  it('split into the halves they were made of', () => {
    for (const unit of RATE_UNITS) {
      const split = splitRateUnit(unit)
      expect(split.per === null ? split.unit : `${split.unit}/${split.per}`).toBe(unit)
    }
    expect(new Set(RATE_UNITS).size).toBe(RATE_UNITS.length)
  })

  it.each([['fl_oz/qt'], ['oz/gal'], ['each/each'], ['placement/gal'], ['acre/gal'], ['gal']])('refuse the unit %s', (unit) => {
    expect(RateSchema.safeParse({ value: '1', unit }).success).toBe(false)
  })
})
