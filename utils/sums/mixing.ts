import { DecimalSchema, div, mul, parseDecimal, rational, toReadable } from '#shared/units/decimal'
import type { Rational } from '#shared/units/decimal'
import { QuantityError } from '#shared/units/errors'
import { convertRational, fromRational, toRational } from '#shared/units/quantity'
import type { Quantity } from '#shared/units/quantity'
import { perSize, rateDimension, splitRateUnit } from '#shared/units/rate'
import type { Rate, RateUnit } from '#shared/units/rate'
import { dimensionOf } from '#shared/units/units'
import type { UnitCode } from '#shared/units/units'
import type { Sum, Workings } from '#shared/sums/workings'

/** `unit` asks for the answer in another unit; `density` is the product's (lb/gal, kg/L …), for going between mass and volume. */
type Asked = { unit?: UnitCode; density?: Rate }

/** A percent by weight of a mixed spray takes the spray for water: 8.34 lb a gallon, as the sources do (8.345404 at 1 kg/L). */
export const WATER_DENSITY: Rate = { value: '8.34', unit: 'lb/gal' }

/** `weight-percent-as-volume`: the label's percent is by weight and was read as by volume for want of a density. `spray-as-water`: see `WATER_DENSITY`. */
export const PERCENT_CAVEATS = ['weight-percent-as-volume', 'spray-as-water'] as const
export type PercentCaveat = (typeof PERCENT_CAVEATS)[number]

const HUNDREDTH = rational(1n, 100n)

/**
 * Product for a finished volume (product included): rate × volume. A `pct` rate is taken by volume. The answer has the rate's unit,
 * for `pct` that of the volume. Throws `QuantityError`: wrong-dimension for a rate that is not per volume, needs-density.
 */
export function productForRate({ rate, finished, unit, density }: { rate: Rate; finished: Quantity } & Asked): Sum {
  requireVolume(finished)
  return answer(applyRate(rate, finished), unit, density, {
    formula: 'rate-times-finished', inputs: [{ name: 'rate', quantity: rate }, { name: 'finished', quantity: finished }], source: 'pmep-mixing',
  })
}

/**
 * The finished volume that an amount of product makes at a rate, or the area, length or count that it treats: amount ÷ rate.
 * The answer has the unit that the rate is per (gal for per 100 gal), for `pct` that of the amount. Throws `QuantityError`:
 * division-by-zero for a rate of zero, wrong-dimension, needs-density.
 */
export function finishedForProduct({ rate, amount, unit, density }: { rate: Rate; amount: Quantity } & Asked): Sum {
  const { unit: ofRate, per } = splitRateUnit(rate.unit)
  const value = parseDecimal(rate.value)
  const own = per === null
    ? { exact: div(toRational(amount), mul(value, HUNDREDTH)), unit: requireVolume(amount) }
    : { exact: mul(div(toRational(amount, ofRate, density), value), rational(perSize(per).times)), unit: perSize(per).unit }
  return answer(own, unit, undefined, {
    formula: 'amount-over-rate', inputs: [{ name: 'amount', quantity: amount }, { name: 'rate', quantity: rate }, ...given(density, amount.unit, per === null ? amount.unit : ofRate)], source: 'pmep-mixing',
  })
}

/**
 * Product (or finished spray, for a rate such as gal/acre) for an area, a length or a count: rate × size. The answer has the
 * rate's unit. Throws `QuantityError`: wrong-dimension when the rate is per something else, needs-density.
 */
export function productForArea({ rate, area, unit, density }: { rate: Rate; area: Quantity } & Asked): Sum {
  if (dimensionOf(area.unit) === 'volume' || rate.unit === 'pct') throw new QuantityError('wrong-dimension', { from: area.unit, to: rate.unit })
  return answer(applyRate(rate, area), unit, density, {
    formula: 'rate-times-size', inputs: [{ name: 'rate', quantity: rate }, { name: 'size', quantity: area }], source: 'area-rate',
  })
}

/**
 * The rate at which an amount went into a finished volume, or onto an area, length or count: amount ÷ size, in `unit`; `pct` is by
 * volume. Throws `QuantityError`: division-by-zero for a size of zero, wrong-dimension, needs-density.
 */
export function ratePerFrom({ amount, finished, unit, density }: { amount: Quantity; finished: Quantity; unit: RateUnit; density?: Rate }): Sum<Rate> {
  const { unit: ofRate, per } = splitRateUnit(unit)
  const exact = per === null
    ? mul(volumeShare(amount, finished), rational(100n))
    : div(toRational(amount, ofRate, density), sizeIn(per, finished))
  const inputs: Workings['inputs'] = [
    { name: 'amount', quantity: amount },
    { name: dimensionOf(finished.unit) === 'volume' ? 'finished' : 'size', quantity: finished },
    ...given(density, amount.unit, per === null ? amount.unit : ofRate),
  ]
  return { value: rateOf(exact, unit), exact, workings: { formula: 'amount-over-size', inputs, source: 'definition' } }
}

/**
 * Percent of active ingredient in a finished volume. `strength` is the label's: percent (by weight), or weight in a volume (lb/gal).
 * - Liquid, percent, no density: by volume, caveat `weight-percent-as-volume`.
 * - Otherwise by weight, caveat `spray-as-water`: the finished spray is taken for water of 8.34 lb/gal.
 * Throws `QuantityError`: division-by-zero, wrong-dimension, needs-density for a weight of product whose strength is lb/gal.
 */
export function finishedPercent({ amount, finished, strength, density }: { amount: Quantity; finished: Quantity; strength: Rate; density?: Rate }): Sum & { caveat: PercentCaveat } {
  requireVolume(finished)
  const inputs: Workings['inputs'] = [{ name: 'amount', quantity: amount }, { name: 'strength', quantity: strength }, { name: 'finished', quantity: finished }, ...given(density, amount.unit, strength.unit === 'pct' ? 'lb' : 'gal')]
  if (strength.unit === 'pct' && dimensionOf(amount.unit) === 'volume' && !density) {
    const exact = mul(volumeShare(amount, finished), parseDecimal(strength.value))
    return { value: fromRational(exact, 'pct'), exact, workings: { formula: 'percent-by-volume', inputs, source: 'army-percent' }, caveat: 'weight-percent-as-volume' }
  }
  const spray = toRational(finished, 'lb', WATER_DENSITY)
  const exact = mul(div(ingredientPounds(amount, strength, density), spray), rational(100n))
  inputs.push({ name: 'water-density', quantity: WATER_DENSITY })
  return { value: fromRational(exact, 'pct'), exact, workings: { formula: 'percent-by-weight', inputs, source: 'army-percent' }, caveat: 'spray-as-water' }
}

function ingredientPounds(amount: Quantity, strength: Rate, density: Rate | undefined): Rational {
  if (strength.unit === 'pct') return mul(toRational(amount, 'lb', density), mul(parseDecimal(strength.value), HUNDREDTH))
  if (rateDimension(strength.unit) !== 'mass/volume') throw new QuantityError('wrong-dimension', { from: strength.unit, to: 'lb/gal' })
  const volume = toRational(amount, 'gal', density)
  return convertRational(volume, 'gal', 'lb', strength)
}

function applyRate(rate: Rate, size: Quantity): { exact: Rational; unit: UnitCode } {
  const { unit, per } = splitRateUnit(rate.unit)
  const value = parseDecimal(rate.value)
  if (per === null) return { exact: mul(mul(value, HUNDREDTH), toRational(size)), unit: size.unit }
  return { exact: mul(value, sizeIn(per, size)), unit }
}

function answer(own: { exact: Rational; unit: UnitCode }, asked: UnitCode | undefined, density: Rate | undefined, workings: Workings): Sum {
  const unit = asked ?? own.unit
  const exact = convertRational(own.exact, own.unit, unit, density)
  return { value: fromRational(exact, unit), exact, workings: { ...workings, inputs: [...workings.inputs, ...given(density, own.unit, unit)] } }
}

function rateOf(exact: Rational, unit: RateUnit): Rate {
  const value = DecimalSchema.safeParse(toReadable(exact))
  if (!value.success) throw new QuantityError('out-of-range', { value: toReadable(exact), unit })
  return { value: value.data, unit }
}

const sizeIn = (per: Parameters<typeof perSize>[0], size: Quantity): Rational =>
  div(toRational(size, perSize(per).unit), rational(perSize(per).times))

const volumeShare = (amount: Quantity, finished: Quantity): Rational =>
  div(toRational(amount, requireVolume(finished)), toRational(finished))

/** The density, where the sum did go from mass to volume or back. */
const given = (density: Rate | undefined, from: UnitCode, to: UnitCode): Workings['inputs'] =>
  density && dimensionOf(from) !== dimensionOf(to) ? [{ name: 'density', quantity: density }] : []

function requireVolume(q: Quantity): UnitCode {
  if (dimensionOf(q.unit) !== 'volume') throw new QuantityError('wrong-dimension', { from: q.unit, to: 'gal' })
  return q.unit
}
