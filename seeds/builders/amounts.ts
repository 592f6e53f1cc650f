import { div, mul, parseDecimal, rational, toDecimal } from '#shared/units/decimal'
import type { Quantity } from '#shared/units/quantity'
import { perSize, splitRateUnit } from '#shared/units/rate'
import type { Rate } from '#shared/units/rate'

/** Amount of product as the form computes it: rate × size, two decimals. `size` is in the unit that the rate is per (gal, sq ft, acre, placement). */
export function amountAt(rate: Rate, size: string): Quantity {
  const { unit, per } = splitRateUnit(rate.unit)
  if (per === null) throw new Error(`a percentage has no size: ${rate.unit}`)
  return { value: toDecimal(div(mul(parseDecimal(rate.value), parseDecimal(size)), rational(perSize(per).times)), 2), unit }
}
