import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { finishedForProduct, finishedPercent, productForArea, productForRate, ratePerFrom } from '#shared/sums/mixing'
import { mul, parseDecimal } from '#shared/units/decimal'
import { quantityOf } from '#shared/units/quantity'
import { splitRateUnit } from '#shared/units/rate'
import type { Rate, RateUnit } from '#shared/units/rate'
import type { UnitCode } from '#shared/units/units'

const amount = fc.integer({ min: 1, max: 100_000 }).map(n => (n / 100).toFixed(2))
const perVolume = fc.constantFrom<RateUnit>('fl_oz/gal', 'pt/100_gal', 'mL/L', 'lb/100_gal', 'pct')
const FL_OZ: Rate = { value: '0.30', unit: 'fl_oz/gal' }

describe('mixing sums', () => {
  it('give the example of a record: 0.30 fl oz a gallon in 3.0 gallons', () => {
    const sum = productForRate({ rate: FL_OZ, finished: quantityOf('3.0', 'gal') })
    expect(sum).toEqual({
      value: quantityOf('0.9', 'fl_oz'), exact: { n: 9n, d: 10n },
      workings: { formula: 'rate-times-finished', inputs: [{ name: 'rate', quantity: FL_OZ }, { name: 'finished', quantity: quantityOf('3.0', 'gal') }], source: 'pmep-mixing' },
    })
  })

  it('undo one another, exactly', () => {
    fc.assert(fc.property(amount, amount, perVolume, (value, used, unit) => {
      const rate: Rate = { value, unit }
      const product: UnitCode = unit === 'pct' ? 'fl_oz' : splitRateUnit(unit).unit
      const made = finishedForProduct({ rate, amount: quantityOf(used, product) })
      const perOne = productForRate({ rate, finished: quantityOf('1', made.value.unit) })
      expect(mul(made.exact, perOne.exact)).toEqual(parseDecimal(used))
    }))
  })

  it('find again the rate that made the amount', () => {
    fc.assert(fc.property(amount, fc.integer({ min: 1, max: 500 }), fc.constantFrom<RateUnit>('fl_oz/gal', 'mL/L', 'pct'), (value, volume, unit) => {
      const finished = quantityOf(String(volume), unit === 'mL/L' ? 'L' : 'gal')
      const product = productForRate({ rate: { value, unit }, finished })
      expect(ratePerFrom({ amount: product.value, finished, unit }).exact).toEqual(parseDecimal(value))
    }))
  })

  it('go between weight and volume only with the product’s density, and then say so', () => {
    const finished = quantityOf('100', 'gal')
    const rate: Rate = { value: '1', unit: 'lb/100_gal' }
    const density: Rate = { value: '8', unit: 'lb/gal' }
    expect(() => productForRate({ rate, finished, unit: 'pt' })).toThrow(expect.objectContaining({ code: 'needs-density' }))
    const sum = productForRate({ rate, finished, unit: 'pt', density })
    expect(sum.value).toEqual(quantityOf('1', 'pt'))
    expect(sum.workings.inputs).toContainEqual({ name: 'density', quantity: density })
    expect(productForRate({ rate, finished, unit: 'oz_wt', density }).workings.inputs).toHaveLength(2)
    expect(finishedForProduct({ rate, amount: quantityOf('1', 'pt'), density }).value).toEqual(finished)
  })

  it.each([
    ['an area for a volume rate', () => productForRate({ rate: FL_OZ, finished: quantityOf('1', 'acre') })],
    ['a volume for an area rate', () => productForRate({ rate: { value: '1', unit: 'pt/acre' }, finished: quantityOf('1', 'gal') })],
    ['a volume as an area', () => productForArea({ rate: FL_OZ, area: quantityOf('1', 'gal') })],
    ['percent of an area', () => productForArea({ rate: { value: '1', unit: 'pct' }, area: quantityOf('1', 'acre') })],
    ['stations at a rate per placement', () => productForArea({ rate: { value: '1.5', unit: 'g/placement' }, area: quantityOf('4', 'station') })],
    ['percent by volume of a powder', () => finishedForProduct({ rate: { value: '1', unit: 'pct' }, amount: quantityOf('1', 'lb') })],
    ['a strength per area', () => finishedPercent({ amount: quantityOf('1', 'pt'), finished: quantityOf('1', 'gal'), strength: { value: '1', unit: 'lb/acre' } })],
  ])('refuse %s', (_what, sum) => {
    expect(sum).toThrow(expect.objectContaining({ code: 'wrong-dimension' }))
  })

  it.each([
    ['a rate of zero', () => finishedForProduct({ rate: { value: '0', unit: 'fl_oz/gal' }, amount: quantityOf('1', 'fl_oz') })],
    ['no finished volume', () => ratePerFrom({ amount: quantityOf('1', 'fl_oz'), finished: quantityOf('0', 'gal'), unit: 'fl_oz/gal' })],
    ['percent in nothing', () => finishedPercent({ amount: quantityOf('1', 'fl_oz'), finished: quantityOf('0', 'gal'), strength: { value: '5', unit: 'pct' } })],
  ])('refuse %s', (_what, sum) => {
    expect(sum).toThrow(expect.objectContaining({ code: 'division-by-zero' }))
  })

  it('percent: the density is an input only where it was used', () => {
    const names = (of: ReturnType<typeof finishedPercent>) => of.workings.inputs.map(input => input.name)
    const density: Rate = { value: '8.5', unit: 'lb/gal' }
    expect(names(finishedPercent({ amount: quantityOf('1', 'lb'), finished: quantityOf('5', 'gal'), strength: { value: '80', unit: 'pct' }, density }))).not.toContain('density')
    expect(names(finishedPercent({ amount: quantityOf('1', 'lb'), finished: quantityOf('5', 'gal'), strength: { value: '2', unit: 'lb/gal' }, density }))).toContain('density')
    expect(() => finishedPercent({ amount: quantityOf('1', 'lb'), finished: quantityOf('5', 'gal'), strength: { value: '2', unit: 'lb/gal' } })).toThrow(expect.objectContaining({ code: 'needs-density' }))
  })
})
