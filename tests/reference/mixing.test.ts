import { describe, expect, it } from 'vitest'
import { finishedForProduct, finishedPercent, productForArea, productForRate, ratePerFrom } from '#shared/sums/mixing'
import { addQuantities, quantityOf } from '#shared/units/quantity'
import type { Quantity } from '#shared/units/quantity'
import type { Rate, RateUnit } from '#shared/units/rate'
import type { UnitCode } from '#shared/units/units'

/** "6 lb" */
const q = (text: string): Quantity => {
  const [value = '', unit = ''] = text.split(' ')
  return quantityOf(value, unit as UnitCode)
}
/** "2 lb/100_gal" */
const rate = (text: string): Rate => {
  const [value = '', unit = ''] = text.split(' ')
  return { value, unit: unit as RateUnit }
}
const written = ({ value }: { value: Quantity | Rate }) => `${value.value} ${value.unit}`

describe('product for a finished volume', () => {
  it.each([
    ['C1-04', '2 lb/100_gal', '300 gal', '6 lb', 'PMEP module 17, Calculations for Mixing Pesticides'],
    ['C1-05', '2 lb/100_gal', '20 gal', '6.4 oz_wt', 'PMEP module 17'],
    ['C1-06', '2 pt/100_gal', '300 gal', '6 pt', 'PMEP module 17'],
    ['C1-07', '2 lb/100_gal', '500 gal', '10 lb', 'Texas A&M, Calculating Dilutions (inputs; answer recomputed)'],
    ['C1-12', '0.5 fl_oz/gal', '50 gal', '25 fl_oz', 'trade magazine, August 2017, perimeter treatments'],
    ['C1-13', '0.0056 kg/L', '750 L', '4.2 kg', 'Ontario ministry fruit blog: 2.8 kg per 500 L'],
    ['C1-15', '1 lb/100_gal', '1 gal', '0.16 oz_wt', 'Penn State Extension, Weighing Pesticides'],
    ['C1-16', '1 lb/100_gal', '1 gal', '4.536 g', 'University of Kentucky REC; printed 4.5 from 454 g'],
    ['C1-20', '1 pt/100_gal', '1 gal', '0.96 tsp', 'New England Vegetable Management Guide; printed 1 tsp'],
    ['C1-20', '1 pt/100_gal', '6.25 gal', '1 fl_oz', 'New England Vegetable Management Guide'],
    ['F1.4', '0.25 pct', '100 gal', '32 fl_oz', 'percent by volume: a quart in 100 gallons'],
    ['X6', '0.75 pct', '30 gal', '0.225 gal', 'a 2024 practice key prints 0.3, its own second choice is right'],
  ])('%s: %s in %s is %s (%s)', (_id, perVolume, finished, product) => {
    expect(written(productForRate({ rate: rate(perVolume), finished: q(finished), unit: q(product).unit }))).toBe(product)
  })

  it('C1-10 (1/128 method, extension slides): 32 fl oz an acre at 40 gal an acre, one-gallon can', () => {
    const acres = finishedForProduct({ rate: rate('40 gal/acre'), amount: q('1 gal') })
    expect(written(acres)).toBe('0.025 acre')
    expect(written(finishedForProduct({ rate: rate('40 gal/acre'), amount: q('1 gal'), unit: 'sq_ft' }))).toBe('1089 sq_ft')
    expect(written(productForArea({ rate: rate('32 fl_oz/acre'), area: acres.value }))).toBe('0.8 fl_oz')
    expect(written(productForArea({ rate: rate('32 fl_oz/acre'), area: acres.value, unit: 'mL' }))).toBe('23.66 mL')
  })
})

describe('product and spray for a size', () => {
  it.each([
    ['C1-08', '15 gal/acre', '3.5 acre', '52.5 gal', 'Agrochemical and Pesticide Safety handbook, p. 128'],
    ['C1-08', '3 lb/acre', '3.5 acre', '10.5 lb', 'Agrochemical and Pesticide Safety handbook, p. 128'],
    ['C1-09', '0.375 gal/acre', '25 acre', '75 pt', 'W. Casady, University of Missouri'],
    ['C1-12', '1 fl_oz/1000_sq_ft', '25000 sq_ft', '25 fl_oz', 'trade magazine, August 2017'],
    ['C1-14', '200 L/ha', '20 ha', '4000 L', 'Calculating Spray Application Information (PEI)'],
    ['C1-31', '0.4 gal/linear_ft', '180 ft', '72 gal', 'termite soil treatment, 4 gal per 10 linear ft'],
    ['C1-33', '20 gal/acre', '12 acre', '240 gal', 'computed after the PEI factsheet'],
    ['F1.10', '1 fl_oz/1000_sq_ft', '1 acre', '43.56 fl_oz', 'per 1,000 sq ft x 43.56 = per acre'],
    ['C2-03', '1.5 g/placement', '40 placement', '60 g', 'Cornell reporting units guidance: bait stations of 1.5 g net'],
  ])('%s: %s over %s is %s (%s)', (_id, perSize, area, amount) => {
    expect(written(productForArea({ rate: rate(perSize), area: q(area), unit: q(amount).unit }))).toBe(amount)
  })

  it('C1-33: loads add up to rate × area', () => {
    const loads = ['100 gal', '100 gal', '40 gal'].map((load) => {
      const acres = finishedForProduct({ rate: rate('20 gal/acre'), amount: q(load) }).value
      return productForArea({ rate: rate('1.5 pt/acre'), area: acres }).value
    })
    expect(loads.map(load => load.value)).toEqual(['7.5', '7.5', '3'])
    expect(addQuantities(loads, 'pt').value).toBe('18.0')
  })
})

describe('what an amount makes or treats', () => {
  it.each([
    ['C1-09', '20 gal/acre', '500 gal', '25 acre', 'W. Casady, University of Missouri'],
    ['C1-12', '2 gal/1000_sq_ft', '50 gal', '25000 sq_ft', 'trade magazine, August 2017'],
    ['C1-14', '200 L/ha', '4000 L', '20 ha', 'PEI factsheet'],
    ['C1-04', '2 lb/100_gal', '6 lb', '300 gal', 'PMEP module 17, read backwards'],
    ['C1-05', '2 lb/100_gal', '6.4 oz_wt', '20 gal', 'PMEP module 17, read backwards'],
  ])('%s: at %s, %s goes for %s (%s)', (_id, at, amount, size) => {
    expect(written(finishedForProduct({ rate: rate(at), amount: q(amount) }))).toBe(size)
  })
})

describe('the rate that was applied', () => {
  it.each([
    ['C1-32', '1 gal', '32 acre', '4 fl_oz/acre', 'Mississippi State University Extension'],
    ['C1-10', '0.8 fl_oz', '1 gal', '0.8 fl_oz/gal', 'extension slides'],
    ['C1-11', '75 lb', '9000 sq_ft', '8.333 lb/1000_sq_ft', 'Virginia turf training: 50 lb per 6,000 sq ft'],
    ['C1-13', '4.2 kg', '750 L', '0.0056 kg/L', 'Ontario ministry fruit blog'],
    ['C2-07', '2 qt', '1 acre', '4.677 L/ha', 'from 16 CFR 500.19'],
  ])('%s: %s over %s is %s (%s)', (_id, amount, size, applied) => {
    expect(written(ratePerFrom({ amount: q(amount), finished: q(size), unit: rate(applied).unit }))).toBe(applied)
  })
})

describe('percent in the finished spray', () => {
  it.each([
    ['C1-02', '1.0425 lb', '5 gal', '80 pct', '2 pct', 'US Army MD0173, powders: 80 % powder, water 8.34 lb/gal'],
    ['C1-21', '8.34 gal', '100 gal', '1 lb/gal', '1 pct', 'Missouri G7510 with water at 8.34; it prints 8 gal (X11)'],
    ['C1-22', '4.17 pt', '100 gal', '4 lb/gal', '0.25 pct', 'Missouri G7510 with water at 8.34; it prints 4 pt'],
    ['C1-23', '2.78 pt', '100 gal', '3 lb/gal', '0.125 pct', 'Missouri G7510 with water at 8.34; it prints 3 pt'],
  ])('%s: %s in %s at %s is %s by weight (%s)', (_id, amount, finished, strength, percent) => {
    const sum = finishedPercent({ amount: q(amount), finished: q(finished), strength: rate(strength) })
    expect(written(sum)).toBe(percent)
    expect(sum.caveat).toBe('spray-as-water')
  })

  it.each([
    ['C1-01', '1.145833 gal', '55 gal', '48 pct', '1.000 pct', 'US Army MD0173: 1 % emulsion from a 48 % concentrate'],
    ['C1-24', '0.4491228 fl_oz', '10 gal', '57 pct', '0.02000 pct', 'Pesticides Control Board of Belize (inputs; answer recomputed)'],
  ])('%s: %s in %s at %s is %s by volume (%s)', (_id, amount, finished, strength, percent) => {
    const sum = finishedPercent({ amount: q(amount), finished: q(finished), strength: rate(strength) })
    expect(written(sum)).toBe(percent)
    expect(sum.caveat).toBe('weight-percent-as-volume')
  })

  it('C1-27 and C1-28 (fact of the trade, no source): 7.9 % by weight, 1 fl oz in a gallon, with the implied density', () => {
    const sum = finishedPercent({ amount: q('1 fl_oz'), finished: q('1 gal'), strength: rate('7.9 pct'), density: rate('8.438819 lb/gal') })
    expect(written(sum)).toBe('0.06245 pct')
    expect(sum.caveat).toBe('spray-as-water')
    expect(sum.workings.inputs.map(input => input.name)).toEqual(['amount', 'strength', 'finished', 'density', 'water-density'])
  })
})
