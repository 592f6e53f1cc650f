import type { Issue } from '#shared/errors'
import type { EntryFacts, EntrySubmission } from '#shared/records/entry'
import type { MixSubmission, VisitSubmission } from '#shared/records/visit'
import type { UnitCode } from '#shared/units/units'
import { dimensionOf } from '#shared/units/units'
import { toRational } from '#shared/units/quantity'
import { mul } from '#shared/units/decimal'

/**
 * What is not a record at all (product.md, truth 1). Everything else is taken, whatever its findings.
 * Each issue's path is inside the submission; its code is a key of `errors.issues`.
 */
export function refuseVisit(submission: VisitSubmission): Issue[] {
  const { facts, words } = submission.visit
  const issues: Issue[] = []
  if (submission.entries.length === 0 && !facts.nothing) issues.push({ path: 'visit.facts.nothing', code: 'nothing-and-no-reason' })
  if (submission.entries.length > 0 && facts.nothing) issues.push({ path: 'visit.facts.nothing', code: 'reason-beside-entries' })
  issues.push(...refuseTimes(facts.arrivedAt, facts.leftAt, words.deviceNow, 'visit.facts.arrivedAt', 'visit.facts.leftAt'))
  submission.mixes.forEach((mix, n) => issues.push(...refuseMix(mix).map(i => ({ ...i, path: `mixes.${n}.${i.path}` }))))
  submission.entries.forEach((entry, n) => {
    issues.push(...refuseEntry(entry).map(i => ({ ...i, path: `entries.${n}.${i.path}` })))
    if (entry.facts.visitId !== facts.id) issues.push({ path: `entries.${n}.facts.visitId`, code: 'other-visit' })
  })
  return issues
}

export function refuseEntry({ facts, words }: EntrySubmission): Issue[] {
  const issues = refuseTimes(facts.startedAt, facts.finishedAt, words.deviceNow, 'facts.startedAt', 'facts.finishedAt')
  if (facts.lines.length === 0 && !facts.mixId) issues.push({ path: 'facts.lines', code: 'nothing-applied' })
  if (facts.lines.length > 0 && facts.mixId) issues.push({ path: 'facts.lines', code: 'lines-beside-mix' })
  if (facts.people.filter(p => p.responsible).length !== 1) issues.push({ path: 'facts.people', code: 'one-responsible' })
  facts.lines.forEach((line, n) => {
    if (!line.labelVersionId && !line.product) issues.push({ path: `facts.lines.${n}.product`, code: 'product-needed' })
  })
  facts.weather.forEach((reading, n) => {
    if (isLater(reading.at, words.deviceNow)) issues.push({ path: `facts.weather.${n}.at`, code: 'later-than-clock' })
  })
  return [...issues, ...refuseUnits(facts)]
}

function refuseMix({ facts, words }: MixSubmission): Issue[] {
  const issues: Issue[] = []
  if (isLater(facts.madeAt, words.deviceNow)) issues.push({ path: 'facts.madeAt', code: 'later-than-clock' })
  if (!fits(facts.finished.unit, ['volume', 'mass'])) issues.push({ path: 'facts.finished', code: 'unit-does-not-fit', params: { unit: facts.finished.unit } })
  facts.lines.forEach((line, n) => {
    if (!fits(line.amount.unit, ['volume', 'mass', 'count'])) issues.push({ path: `facts.lines.${n}.amount`, code: 'unit-does-not-fit', params: { unit: line.amount.unit } })
  })
  return issues
}

const isLater = (instant: string, deviceNow: string) => Date.parse(instant) > Date.parse(deviceNow)
const fits = (unit: UnitCode, dimensions: string[]) => dimensions.includes(dimensionOf(unit))

function refuseTimes(start: string, end: string, deviceNow: string, startPath: string, endPath: string): Issue[] {
  if (Date.parse(end) < Date.parse(start)) return [{ path: endPath, code: 'end-before-start' }]
  if (isLater(start, deviceNow)) return [{ path: startPath, code: 'later-than-clock' }]
  return isLater(end, deviceNow) ? [{ path: endPath, code: 'later-than-clock' }] : []
}

function refuseUnits(facts: EntryFacts): Issue[] {
  const issues: Issue[] = []
  const need = (path: string, unit: UnitCode | undefined, dimensions: string[]) => {
    if (unit && !fits(unit, dimensions)) issues.push({ path, code: 'unit-does-not-fit', params: { unit } })
  }
  need('facts.finished', facts.finished?.unit, ['volume', 'mass'])
  need('facts.drawn', facts.drawn?.unit, ['volume', 'mass'])
  facts.lines.forEach((line, n) => {
    need(`facts.lines.${n}.amount`, line.amount?.unit, ['mass', 'volume', 'count'])
    const { counted, amount } = line
    if (!counted) return
    need(`facts.lines.${n}.counted.each`, counted.each.unit, ['mass', 'volume'])
    if (amount && fits(counted.each.unit, ['mass', 'volume']) && !isCount(amount, counted)) issues.push({ path: `facts.lines.${n}.amount`, code: 'count-and-amount-differ' })
  })
  facts.areas.forEach((area, n) => need(`facts.areas.${n}.size`, area.size?.unit, ['area', 'length', 'count', 'volume']))
  facts.weather.forEach((reading, n) => {
    need(`facts.weather.${n}.temperature`, reading.temperature?.unit, ['temperature'])
    if (reading.wind && 'speed' in reading.wind) need(`facts.weather.${n}.wind.speed`, reading.wind.speed.unit, ['speed'])
  })
  return issues
}

function isCount(amount: NonNullable<EntryFacts['lines'][number]['amount']>, counted: NonNullable<EntryFacts['lines'][number]['counted']>): boolean {
  if (dimensionOf(amount.unit) !== dimensionOf(counted.each.unit)) return false
  const product = mul(toRational({ value: counted.count, unit: 'each' }), toRational(counted.each, amount.unit))
  const stated = toRational(amount)
  return product.n === stated.n && product.d === stated.d
}
