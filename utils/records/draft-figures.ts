import { DecimalSchema, mul, parseDecimal, toReadable } from '#shared/units/decimal'
import { QuantityError } from '#shared/units/errors'
import { toRational } from '#shared/units/quantity'
import type { Quantity } from '#shared/units/quantity'
import { RateSchema, splitRateUnit } from '#shared/units/rate'
import type { Rate, RateUnit } from '#shared/units/rate'
import { UnitSchema, dimensionOf } from '#shared/units/units'
import type { UnitCode } from '#shared/units/units'
import { finishedForProduct, productForArea, productForRate } from '#shared/sums/mixing'
import type { Sum } from '#shared/sums/workings'
import type { DraftArea, DraftLine, DraftTreatment } from '#shared/records/draft'

/** A figure as typed: empty, half written, or a decimal. */
export interface Figure { value: string, unit: string }

const isDecimal = (value: string) => DecimalSchema.safeParse(value).success && !value.startsWith('-')
export const isQuantity = (figure: Figure): figure is Quantity => DecimalSchema.safeParse(figure.value).success && UnitSchema.safeParse(figure.unit).success
export const quantityOr = (figure: Figure): Quantity | null => isQuantity(figure) ? { value: figure.value, unit: figure.unit } : null
export const rateOr = (figure: Figure): Rate | null => isDecimal(figure.value) ? RateSchema.safeParse(figure).data ?? null : null
/** Something stands in the field that is no figure: asked about, never dropped. */
export const isUnreadable = (figure: Figure): boolean => figure.value.trim() !== '' && !isQuantity(figure) && rateOr(figure) === null

const tried = <T>(sum: () => T): T | null => {
  try {
    return sum()
  }
  catch (error) {
    // a rate per area has nothing to say of a volume: no sum, no complaint
    if (error instanceof QuantityError) return null
    throw error
  }
}

/** Is the rate of product in finished spray (so that the volume gives the product, or the other way)? */
export const isDilution = (unit: string): boolean => {
  const parsed = RateSchema.shape.unit.safeParse(unit)
  if (!parsed.success) return false
  const { per } = splitRateUnit(parsed.data)
  return per === null || per === 'gal' || per === '100_gal' || per === 'L'
}

/** Product by its rate: from the finished volume for a dilution, else from the first area that the rate fits. */
export function amountByRate(line: DraftLine, treatment: Pick<DraftTreatment, 'finished'> & { areas: readonly DraftArea[] }): Sum | null {
  const rate = rateOr(line.rate)
  if (!rate) return null
  const finished = quantityOr(treatment.finished)
  if (isDilution(rate.unit)) return finished ? tried(() => productForRate({ rate, finished })) : null
  const sizes = treatment.areas.map(area => quantityOr(area.size))
  const [only] = sizes
  return sizes.length === 1 && only ? tried(() => productForArea({ rate, area: only })) : null
}

/** Finished volume by the product used and its rate: the other way. */
export function finishedByRate(line: DraftLine): Sum | null {
  const [rate, amount] = [rateOr(line.rate), quantityOr(line.amount)]
  return rate && amount && isDilution(rate.unit) ? tried(() => finishedForProduct({ rate, amount })) : null
}

/** Count × the size of each, exactly. */
export function amountByCount({ counted }: Pick<DraftLine, 'counted'>): Quantity | null {
  const each = counted && quantityOr(counted.each)
  if (!counted || !each || !isDecimal(counted.count)) return null
  return { value: toReadable(mul(parseDecimal(counted.count), toRational(each))), unit: each.unit }
}

const VOLUMES: UnitCode[] = ['fl_oz', 'pt', 'qt', 'gal', 'mL', 'L']
const MASSES: UnitCode[] = ['oz_wt', 'lb', 'g', 'kg']

/** Units in which product of this rate is measured out, the rate's own first. */
export function amountUnits(rateUnit: string): UnitCode[] {
  const own = RateSchema.shape.unit.safeParse(rateUnit).data
  const unit = own ? splitRateUnit(own).unit : 'pct'
  if (unit === 'pct') return [...VOLUMES, ...MASSES]
  const others = dimensionOf(unit) === 'mass' ? MASSES : dimensionOf(unit) === 'volume' ? VOLUMES : []
  return [unit, ...others.filter(other => other !== unit)]
}

export const ownUnit = (rateUnit: RateUnit): UnitCode => {
  const { unit } = splitRateUnit(rateUnit)
  return unit === 'pct' ? 'fl_oz' : unit
}
