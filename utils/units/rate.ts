import { z } from 'zod'
import { DecimalSchema, compareRational, div, mul, parseDecimal, rational } from '#shared/units/decimal'
import type { Rational } from '#shared/units/decimal'
import { QuantityError } from '#shared/units/errors'
import { dimensionOf, unitDefinition } from '#shared/units/units'
import type { UnitCode } from '#shared/units/units'

const AMOUNT_UNITS = ['mg', 'g', 'kg', 'oz_wt', 'lb', 'mL', 'L', 'tsp', 'tbsp', 'fl_oz', 'cup', 'pt', 'qt', 'gal'] as const satisfies UnitCode[]
const COUNT_UNITS = ['placement', 'station', 'container', 'each'] as const satisfies UnitCode[]

/** What a rate is per: so many of a unit. */
const PER = {
  gal: { unit: 'gal', times: 1n },
  '100_gal': { unit: 'gal', times: 100n },
  L: { unit: 'L', times: 1n },
  sq_ft: { unit: 'sq_ft', times: 1n },
  '1000_sq_ft': { unit: 'sq_ft', times: 1000n },
  acre: { unit: 'acre', times: 1n },
  ha: { unit: 'ha', times: 1n },
  linear_ft: { unit: 'ft', times: 1n },
  placement: { unit: 'placement', times: 1n },
  station: { unit: 'station', times: 1n },
  each: { unit: 'each', times: 1n },
} as const satisfies Record<string, { unit: UnitCode; times: bigint }>

export type RatePer = keyof typeof PER
export type RateAmountUnit = (typeof AMOUNT_UNITS)[number] | (typeof COUNT_UNITS)[number]
/** `pct` says neither v/v nor w/w, so it compares only with itself. */
export type RateUnit = `${RateAmountUnit}/${RatePer}` | 'pct'

export const RATE_PERS = Object.keys(PER) as RatePer[]

const rateUnit = (unit: RateAmountUnit, per: RatePer): RateUnit => `${unit}/${per}`
const amountRates = AMOUNT_UNITS.flatMap(unit => RATE_PERS.map(per => rateUnit(unit, per)))
// A count per liquid, or per itself, means nothing.
const countRates = COUNT_UNITS.flatMap(unit =>
  RATE_PERS.filter(per => dimensionOf(PER[per].unit) !== 'volume' && per !== unit).map(per => rateUnit(unit, per)))

/** Every unit a rate may have: amounts of product, finished spray or strength (lb/gal), counts by size, and percent. */
export const RATE_UNITS: readonly RateUnit[] = [...amountRates, ...countRates, 'pct']
export const RateUnitSchema = z.enum(RATE_UNITS)
export const RateSchema = z.strictObject({ value: DecimalSchema, unit: RateUnitSchema })
export type Rate = z.infer<typeof RateSchema>

export type SplitRateUnit = { unit: RateAmountUnit; per: RatePer } | { unit: 'pct'; per: null }

/** The two halves of a rate's unit; percent has no second half. */
export function splitRateUnit(unit: RateUnit): SplitRateUnit {
  if (unit === 'pct') return { unit, per: null }
  const slash = unit.indexOf('/')
  return { unit: unit.slice(0, slash) as RateAmountUnit, per: unit.slice(slash + 1) as RatePer }
}

/** `{ unit: 'gal', times: 100n }` for per 100 gal: the size for which the rate's value holds. */
export const perSize = (per: RatePer): { unit: UnitCode; times: bigint } => PER[per]

/** What two rates must share to be compared: "volume/area"; a counted thing stands for itself. */
export function rateDimension(unit: RateUnit): string {
  const { unit: amount, per } = splitRateUnit(unit)
  return per === null ? 'ratio' : `${dimensionKey(amount)}/${dimensionKey(PER[per].unit)}`
}

/** The rate in base units of its first half per base unit of its second. */
export function rateToRational(rate: Rate): Rational {
  const { unit, per } = splitRateUnit(rate.unit)
  const amount = mul(parseDecimal(rate.value), unitDefinition(unit).factor)
  return per === null ? amount : div(amount, mul(unitDefinition(PER[per].unit).factor, rational(PER[per].times)))
}

/** -1, 0 or 1, exact across units (fl_oz/gal with mL/L). Throws `QuantityError` wrong-dimension for rates of different kinds. */
export function compareRates(a: Rate, b: Rate): -1 | 0 | 1 {
  if (rateDimension(a.unit) !== rateDimension(b.unit)) throw new QuantityError('wrong-dimension', { from: a.unit, to: b.unit })
  return compareRational(rateToRational(a), rateToRational(b))
}

const dimensionKey = (unit: UnitCode): string => (dimensionOf(unit) === 'count' ? unit : dimensionOf(unit))
