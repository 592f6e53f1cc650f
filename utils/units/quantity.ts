import { z } from 'zod'
import { DECIMAL_MAX_LENGTH, DecimalSchema, add, compareRational, decimalsOf, div, mul, parseDecimal, rational, roundToInteger, sub, toDecimal, toReadable } from '#shared/units/decimal'
import type { Rational } from '#shared/units/decimal'
import { QuantityError } from '#shared/units/errors'
import { rateDimension, rateToRational } from '#shared/units/rate'
import type { Rate } from '#shared/units/rate'
import { UnitSchema, commensurable, dimensionOf, unitDefinition } from '#shared/units/units'
import type { UnitCode } from '#shared/units/units'

/** A quantity as entered: decimal text with its digits, and a unit of the catalogue. */
export const QuantitySchema = z.strictObject({ value: DecimalSchema, unit: UnitSchema })
export type Quantity = z.infer<typeof QuantitySchema>

/** `density` is mass per volume (lb/gal, g/L, kg/L …); without it mass and volume stay apart. */
export type ConvertOptions = { digits?: number; density?: Rate }

const INT64_MAX = 2n ** 63n - 1n
const ZERO = rational(0n)

/** A quantity from its parts. Throws `QuantityError` not-a-decimal or out-of-range (more than 24 characters). */
export function quantityOf(value: string, unit: UnitCode): Quantity {
  parseDecimal(value)
  if (value.length > DECIMAL_MAX_LENGTH) throw new QuantityError('out-of-range', { value, unit })
  return { value, unit }
}

/** A quantity from an exact value in `unit`, with `digits` decimals, else in the readable form of `toReadable`. */
export const fromRational = (r: Rational, unit: UnitCode, digits?: number): Quantity =>
  quantityOf(digits === undefined ? toReadable(r) : toDecimal(r, digits), unit)

/**
 * The integer that tables keep for sorting and sums, in base units (ng, nL, µm, 0.01 mm², s, m°C, mm/s, thousandths of a count,
 * millionths of a ratio), rounded half to even. Throws `QuantityError` out-of-range when SQLite's signed 64 bits cannot hold it.
 */
export function toBase(q: Quantity): bigint {
  const base = roundToInteger(baseOf(parseDecimal(q.value), q.unit))
  if (base > INT64_MAX || base < -INT64_MAX - 1n) throw new QuantityError('out-of-range', { value: q.value, unit: q.unit })
  return base
}

/**
 * An exact value in another unit. Throws `QuantityError`: wrong-dimension, needs-density between mass and volume when none is
 * given, density-not-positive.
 */
export function convertRational(value: Rational, from: UnitCode, to: UnitCode, density?: Rate): Rational {
  if (from === to) return value
  const base = commensurable(from, to) ? baseOf(value, from) : acrossDensity(value, from, to, density)
  const { factor, zero = ZERO } = unitDefinition(to)
  return div(sub(base, zero), factor)
}

/** The quantity's exact value in `unit` (its own when left out). Errors of `convertRational`. */
export const toRational = (q: Quantity, unit: UnitCode = q.unit, density?: Rate): Rational =>
  convertRational(parseDecimal(q.value), q.unit, unit, density)

/** The quantity in another unit, as `fromRational` writes it. The same unit with no digits asked keeps its text. Errors of `convertRational`. */
export function convert(q: Quantity, unit: UnitCode, options: ConvertOptions = {}): Quantity {
  if (unit === q.unit && options.digits === undefined) return q
  return fromRational(toRational(q, unit, options.density), unit, options.digits)
}

/** -1, 0 or 1 by exact value. Throws `QuantityError` wrong-dimension or needs-density. */
export const compareQuantities = (a: Quantity, b: Quantity, density?: Rate): -1 | 0 | 1 =>
  compareRational(toRational(a), toRational(b, a.unit, density))

/**
 * The sum in `unit`, rounded once at the end. When all have that unit, the longest fraction among them is kept
 * ("0.90" + "1.2" = "2.10"), since that sum is exact. An empty list is zero. Errors of `convertRational`.
 */
export function addQuantities(list: readonly Quantity[], unit: UnitCode, options: ConvertOptions = {}): Quantity {
  const sum = list.reduce((total, q) => add(total, toRational(q, unit, options.density)), ZERO)
  const sameUnit = list.every(q => q.unit === unit)
  return fromRational(sum, unit, options.digits ?? (sameUnit ? Math.max(0, ...list.map(q => decimalsOf(q.value))) : undefined))
}

function baseOf(value: Rational, unit: UnitCode): Rational {
  const { factor, zero = ZERO } = unitDefinition(unit)
  return add(mul(value, factor), zero)
}

function acrossDensity(value: Rational, from: UnitCode, to: UnitCode, density: Rate | undefined): Rational {
  const crossing = `${dimensionOf(from)}>${dimensionOf(to)}`
  if (crossing !== 'mass>volume' && crossing !== 'volume>mass') throw new QuantityError('wrong-dimension', { from, to })
  if (!density) throw new QuantityError('needs-density', { from, to })
  if (rateDimension(density.unit) !== 'mass/volume') throw new QuantityError('wrong-dimension', { from: density.unit, to: 'lb/gal' })
  const perVolume = rateToRational(density)
  if (perVolume.n <= 0n) throw new QuantityError('density-not-positive', { value: density.value, unit: density.unit })
  return crossing === 'mass>volume' ? div(baseOf(value, from), perVolume) : mul(baseOf(value, from), perVolume)
}
