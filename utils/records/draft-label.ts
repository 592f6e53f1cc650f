import type { LabelVersion } from '#shared/books/shapes'
import type { DraftLine, DraftTreatment } from '#shared/records/draft'
import type { Reentry } from '#shared/records/entry'
import type { Coded } from '#shared/records/shapes'
import type { Books } from '#shared/records/snapshot'
import { add, compareRational, div, parseDecimal, rational, toReadable } from '#shared/units/decimal'
import { RateUnitSchema } from '#shared/units/rate'
import type { RateUnit } from '#shared/units/rate'

export interface Range { unit: RateUnit, min: string | null, max: string | null, words: string }

/** The label's range for one application here: of a use that takes the site, targets and method, else of any use. */
export function rangeOf(label: LabelVersion | undefined, given: { site: string | null, targets: readonly Coded[], method: string | null }): Range | null {
  if (!label) return null
  const takes = (listed: string[], codes: (string | null)[]) => listed.length === 0 || codes.some(code => code !== null && listed.includes(code))
  const fitting = label.uses.filter(use => takes(use.sites, [given.site]) && takes(use.targets, given.targets.map(t => t.code)) && takes(use.methods, [given.method]))
  for (const limit of [...fitting, ...label.uses].flatMap(use => use.limits)) {
    const unit = RateUnitSchema.safeParse(`${limit.unit}/${limit.per}`).data
    if (unit && limit.of === 'product' && limit.over === 'application') return { unit, min: limit.min, max: limit.max, words: limit.words }
  }
  return null
}

export interface RateChoice { value: string, at: 'low' | 'middle' | 'high' }

/** Low, something between, high. The middle is last time's rate where that lies between. */
export function rateChoices({ min, max, unit }: Range, last: DraftLine['rate'] | null): RateChoice[] {
  const [low, high] = [min && parseDecimal(min), max && parseDecimal(max)]
  const choices: RateChoice[] = min ? [{ value: min, at: 'low' }] : []
  if (low && high && compareRational(low, high) < 0) {
    const before = last && last.unit === unit && last.value !== '' ? last.value : null
    const between = before && compareRational(low, parseDecimal(before)) < 0 && compareRational(parseDecimal(before), high) < 0
    choices.push({ value: between ? before : toReadable(div(add(low, high), rational(2n))), at: 'middle' })
  }
  return max && max !== min ? [...choices, { value: max, at: 'high' }] : choices
}

const labelsOf = (treatment: DraftTreatment, books: Books): LabelVersion[] => {
  const ids = treatment.mixId ? (books.mix(treatment.mixId)?.lines ?? []).map(line => line.label?.id ?? null) : treatment.lines.map(line => line.labelVersionId)
  return ids.flatMap(id => (id && books.label(id)) || [])
}

const WEIGHT: Record<Reentry['until'], number> = { 'none-stated': 0, 'dry': 1, 'dusts-settled': 2, 'ventilated': 3, 'hours': 4, 'label': 5 }

/** The labels' own condition; of several products the one that keeps people off longest. */
export function reentryOf(treatment: DraftTreatment, books: Books): Reentry {
  if (treatment.reentry) return treatment.reentry
  const hours = (r: Reentry) => r.until === 'hours' ? Number(r.hours) : 0
  const stated = labelsOf(treatment, books).map(label => label.reentry).sort((a, b) => WEIGHT[b.until] - WEIGHT[a.until] || hours(b) - hours(a))
  return stated[0] ?? { until: 'none-stated' }
}

/** What the labels ask to be worn, each once. */
export function protectiveOf(treatment: DraftTreatment, books: Books): Coded[] {
  if (treatment.protective) return treatment.protective
  const all = labelsOf(treatment, books).flatMap(label => label.protective)
  return all.filter((one, n) => all.findIndex(other => other.code === one.code && other.text === one.text) === n)
}
