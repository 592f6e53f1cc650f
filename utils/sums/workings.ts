import type { Quantity } from '#shared/units/quantity'
import type { Rate } from '#shared/units/rate'
import type { Rational } from '#shared/units/decimal'

/** How a figure came about, in codes that the message catalogue words. */
export const FORMULA_CODES = ['rate-times-finished', 'amount-over-rate', 'rate-times-size', 'amount-over-size', 'percent-by-volume', 'percent-by-weight'] as const
export type FormulaCode = (typeof FORMULA_CODES)[number]

export const INPUT_NAMES = ['rate', 'finished', 'amount', 'size', 'strength', 'density', 'water-density'] as const
export type InputName = (typeof INPUT_NAMES)[number]

/**
 * Where a formula was read:
 * - pmep-mixing: Calculations for Mixing Pesticides, PMEP module 17 (pesticidesafety.org)
 * - area-rate: Application, section two: how much to use; Virginia turf training (vaturf.org)
 * - army-percent: subcourse MD0173, lesson 2, percent by volume and powders in liquids (armymedical.tpub.com/MD0173)
 * - definition: what a rate is; no source needed
 */
export const SOURCE_CODES = ['pmep-mixing', 'area-rate', 'army-percent', 'definition'] as const
export type SourceCode = (typeof SOURCE_CODES)[number]

export type Workings = { formula: FormulaCode; inputs: { name: InputName; quantity: Quantity | Rate }[]; source: SourceCode }

/** `value` in the readable form of `toReadable`; `exact` in the same unit, for whatever is computed or decided from it. */
export type Sum<Value extends Quantity | Rate = Quantity> = { value: Value; exact: Rational; workings: Workings }
