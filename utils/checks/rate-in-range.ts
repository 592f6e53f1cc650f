import type { Finding, Check, CheckContext } from '#shared/checks/finding'
import { finding } from '#shared/checks/finding'
import type { LabelLimit, LabelUse } from '#shared/books/shapes'
import type { LineInUse } from '#shared/records/lines'
import { linesInUse } from '#shared/records/lines'
import { add, compareRational, div, mul, parseDecimal, rational, toReadable } from '#shared/units/decimal'
import type { Rational } from '#shared/units/decimal'
import { QuantityError } from '#shared/units/errors'
import { toRational } from '#shared/units/quantity'
import type { Quantity } from '#shared/units/quantity'
import type { Rate, RatePer, RateUnit } from '#shared/units/rate'
import { RateUnitSchema, perSize, rateDimension, rateToRational, splitRateUnit } from '#shared/units/rate'

/** Uses of the label that take this place, target and method; a side that the label leaves open takes any. */
function usesFor(uses: readonly LabelUse[], { facts, snapshot }: CheckContext): LabelUse[] {
  const takes = (listed: string[], given: (string | null)[]) => listed.length === 0 || given.some(code => code !== null && listed.includes(code))
  return uses.filter(use => takes(use.sites, [snapshot.place.siteKind?.code ?? null]) && takes(use.targets, facts.targets.map(t => t.code)) && takes(use.methods, [facts.method.code]))
}

const rateUnitOf = (limit: LabelLimit): RateUnit | null => RateUnitSchema.safeParse(`${limit.unit}/${limit.per}`).data ?? null

/** The rate to judge: what was used by the amounts on record (product over finished spray or area), else the rate as stated. */
function rateUsed({ line, amount }: LineInUse, unit: RateUnit, context: CheckContext): Rational | null {
  const { per, unit: of } = splitRateUnit(unit)
  const base = per ? sizeOf(perSize(per).unit, context) : null
  try {
    if (amount && base && per) return rateFrom(amount, base, of, per)
    return line?.rate ? rateInUnit(line.rate, unit) : null
  }
  catch (error) {
    if (error instanceof QuantityError) return null
    throw error
  }
}

const rateInUnit = (rate: Rate, unit: RateUnit): Rational | null =>
  rateDimension(rate.unit) === rateDimension(unit) ? div(rateToRational(rate), rateToRational({ value: '1', unit })) : null

function rateFrom(amount: Quantity, base: Rational, of: Quantity['unit'], per: RatePer): Rational | null {
  if (base.n === 0n) return null
  return div(mul(toRational(amount, of), rational(perSize(per).times)), base)
}

/** What the rate is per: finished spray for a dilution, the treated areas for a rate per area or length. Null where it was not noted. */
function sizeOf(unit: Quantity['unit'], { facts, snapshot }: CheckContext): Rational | null {
  const sized = (list: (Quantity | null)[]): Rational | null => {
    try {
      const known = list.flatMap(q => q ? [toRational(q, unit)] : [])
      return known.length === list.length && known.length > 0 ? known.reduce(add) : null
    }
    catch (error) {
      if (error instanceof QuantityError) return null
      throw error
    }
  }
  const spray = snapshot.mix ? facts.drawn : facts.finished
  return (spray ? sized([spray]) : null) ?? sized(facts.areas.map(a => a.size))
}

function judgeLine(used: LineInUse, line: number, context: CheckContext): Finding[] {
  const { product, label } = used.shot
  const params = { product: product.name }
  if (!label) return product.id === null ? [] : [finding('rate-in-range', 'note', 'rate-not-checked-no-label', { params, line })]
  const uses = usesFor(label.uses, context)
  if (uses.length === 0) return [finding('rate-in-range', 'note', 'rate-not-checked-no-use', { params, line })]
  const limits = uses.flatMap(use => use.limits).filter(l => l.of === 'product' && l.over === 'application' && rateUnitOf(l) !== null)
  if (limits.length === 0) return []
  const judged = limits.flatMap((limit) => {
    const unit = rateUnitOf(limit)
    const value = unit && rateUsed(used, unit, context)
    return unit && value ? [{ limit, unit, value, side: sideOf(value, limit) }] : []
  })
  if (judged.length === 0) return [finding('rate-in-range', 'note', 'rate-not-checked', { params, line })]
  const [first] = judged.sort((a, b) => Number(a.side !== 'inside') - Number(b.side !== 'inside'))
  if (!first || first.side === 'inside') return []
  return [finding('rate-in-range', label.checked ? 'stop' : 'query', first.side === 'above' ? 'rate-above' : 'rate-below', {
    params, line, value: toReadable(first.value), limit: (first.side === 'above' ? first.limit.max : first.limit.min), unit: first.unit,
    basis: { kind: 'label', labelVersionId: label.id, labelDate: label.labelDate, words: first.limit.words },
  })]
}

function sideOf(value: Rational, limit: LabelLimit): 'below' | 'inside' | 'above' {
  if (limit.max !== null && compareRational(value, parseDecimal(limit.max)) > 0) return 'above'
  return limit.min !== null && compareRational(value, parseDecimal(limit.min)) < 0 ? 'below' : 'inside'
}

/** Is each product's rate inside a range that its label gives for this place, target and method? Compared exactly. */
export const rateInRange: Check = context => linesInUse(context.facts, context.snapshot).flatMap((used, n) => judgeLine(used, n, context))
