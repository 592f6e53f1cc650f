import { describe, expect, it } from 'vitest'
import { convert, quantityOf, toBase } from '#shared/units/quantity'
import type { Quantity } from '#shared/units/quantity'
import type { UnitCode } from '#shared/units/units'
import { compareRates } from '#shared/units/rate'
import type { RateUnit } from '#shared/units/rate'

type Row = [from: UnitCode, to: UnitCode, exact: string, source: string]

// Exact by definition; each row says where the figure was read.
const FACTORS: Row[] = [
  ['in', 'cm', '2.54', '16 CFR 500.19, marked exact'],
  ['ft', 'm', '0.3048', '16 CFR 500.19'],
  ['mi', 'ft', '5280', 'NIST Handbook 44, appendix C'],
  ['sq_ft', 'sq_m', '0.09290304', '16 CFR 500.19 (929.0304 sq cm)'],
  ['acre', 'sq_ft', '43560', 'World Factbook, appendix G'],
  ['acre', 'sq_m', '4046.8564224', 'World Factbook, appendix G'],
  ['acre', 'ha', '0.40468564224', 'World Factbook, appendix G'],
  ['acre', '1000_sq_ft', '43.56', 'per 1,000 sq ft x 43.56 = per acre, exact'],
  ['gal', 'L', '3.785411784', '231 cubic inches: NIST Handbook 44, appendix C (digits from memory)'],
  ['qt', 'L', '0.946352946', 'a quarter of 231 cubic inches'],
  ['pt', 'mL', '473.176473', 'an eighth of 231 cubic inches'],
  ['cup', 'mL', '236.5882365', 'a sixteenth of 231 cubic inches'],
  ['fl_oz', 'mL', '29.5735295625', '1/128 of 231 cubic inches'],
  ['tbsp', 'mL', '14.78676478125', '1/256 of 231 cubic inches'],
  ['tsp', 'mL', '4.92892159375', '1/768 of 231 cubic inches'],
  ['lb', 'g', '453.59237', 'NIST Handbook 44, appendix C (digits from memory)'],
  ['oz_wt', 'g', '28.349523125', 'a sixteenth of the pound'],
  ['mph', 'm_s', '0.44704', 'from the foot, exact'],
  ['mph', 'km_h', '1.609344', 'from the foot, exact'],
  ['kn', 'km_h', '1.852', 'international knot, exact'],
  ['gal', 'fl_oz', '128', 'US measure'],
  ['pt', 'fl_oz', '16', 'US measure'],
  ['tbsp', 'tsp', '3', 'US measure'],
]

describe('exact factors', () => {
  it.each(FACTORS)('1 %s is so many %s: %s (%s)', (from, to, exact) => {
    const digits = exact.split('.')[1]?.length ?? 0
    expect(convert(quantityOf('1', from), to, { digits }).value).toBe(exact)
  })

  it.each([
    ['1', 'gal', 3_785_411_784n], ['1', 'lb', 453_592_370_000n], ['1', 'sq_ft', 9_290_304n], // architecture of the tables
    ['32', 'deg_F', 0n], ['212', 'deg_F', 100_000n], ['-40', 'deg_F', -40_000n], // the scales' fixed points
    ['64', 'deg_F', 17_778n], ['1', 'in', 25_400n],
  ] as [string, UnitCode, bigint][])('%s %s in base units', (value, unit, base) => {
    expect(toBase(quantityOf(value, unit))).toBe(base)
  })
})

describe('published figures, as rounded by their source', () => {
  it.each([
    ['fl_oz', 'mL', 4, '29.5735'], ['pt', 'mL', 3, '473.176'], ['qt', 'mL', 3, '946.353'],
    ['gal', 'L', 5, '3.78541'], ['oz_wt', 'g', 4, '28.3495'], ['lb', 'g', 3, '453.592'],
  ] as [UnitCode, UnitCode, number, string][])('16 CFR 500.19: 1 %s in %s to %i decimals', (from, to, digits, printed) => {
    // The rule prints 473.177 mL for the pint, its exact 473.176473 rounded up; the exact factor is what holds here.
    expect(convert(quantityOf('1', from), to, { digits }).value).toBe(printed)
  })

  it.each([
    ['10% of a 10 g placement', '1', 'g', 'oz_wt', 8, '0.03527396', 'C2-02, BPC'],
    ['a bait station of 1.5 g net', '1.5', 'g', 'oz_wt', 8, '0.05291094', 'C2-03, Cornell reporting units guidance'],
    ['40 such stations', '60', 'g', 'oz_wt', 6, '2.116438', 'C2-03, Cornell reporting units guidance'],
  ] as [string, string, UnitCode, UnitCode, number, string, string][])('%s (%s %s)', (_case, value, from, to, digits, exact) => {
    expect(convert(quantityOf(value, from), to, { digits }).value).toBe(exact)
  })

  it('water at 1 kg/L weighs 8.345404 lb a gallon', () => {
    const water = { density: { value: '1', unit: 'kg/L' as RateUnit }, digits: 6 }
    expect(convert(quantityOf('1', 'gal'), 'lb', water).value).toBe('8.345404')
  })

  it.each([
    ['1', 'lb/acre', '1.120851156', 'kg/ha'], ['1', 'gal/acre', '9.353956228', 'L/ha'],
    ['1', 'fl_oz/acre', '73.07778304', 'mL/ha'], ['1', 'lb/gal', '119.8264273', 'g/L'], ['1', 'fl_oz/1000_sq_ft', '3.183268', 'L/ha'],
  ] as [string, RateUnit, string, RateUnit][])('C2-10, from 16 CFR 500.19: %s %s lies within the last digit of %s %s', (value, unit, other, otherUnit) => {
    const step = 10 ** -(other.split('.')[1]?.length ?? 0)
    const digits = other.split('.')[1]?.length ?? 0
    const near = (by: number) => ({ value: (Number(other) + by).toFixed(digits), unit: otherUnit })
    expect(compareRates({ value, unit }, near(-step))).toBe(1)
    expect(compareRates({ value, unit }, near(step))).toBe(-1)
  })
})

describe('published mistakes that are not copied (X7)', () => {
  it.each([
    ['Cowlitz County table prints 52580 feet', quantityOf('1', 'mi'), quantityOf('52580', 'ft'), quantityOf('5280', 'ft')],
    ['Virginia DWR prints 107.640 square feet', quantityOf('1', 'ha'), quantityOf('107.640', 'sq_ft'), quantityOf('107639.1', 'sq_ft')],
  ] as [string, Quantity, Quantity, Quantity][])('%s', (_source, whole, wrong, right) => {
    expect(convert(whole, wrong.unit, { digits: 3 }).value).not.toBe(wrong.value)
    expect(convert(whole, right.unit, { digits: right.value.includes('.') ? 1 : 0 })).toEqual(right)
  })
})
