import type { DaybookRow } from '#shared/api/contract/daybook'
import type { Finding } from '#shared/checks/finding'
import { toHex } from '#shared/ledger/hash'
import { linesInUse } from '#shared/records/lines'
import type { EntryFacts } from '#shared/records/entry'
import type { EntryHeadRow } from '#shared/records/rows'
import type { EntrySnapshot, VisitSnapshot } from '#shared/records/snapshot'
import type { VisitFacts } from '#shared/records/visit'
import { toRational } from '#shared/units/quantity'
import { compareRational } from '#shared/units/decimal'

const headOf = (head: EntryHeadRow) => ({
  root: head.root, kind: head.kind, reference: head.reference, factsHash: head.facts_hash ? toHex(new Uint8Array(head.facts_hash)) : null, visitId: head.visit_id,
  finishedAt: head.finished_at, recordedAt: head.recorded_at, localDay: head.local_day, status: head.status, confirmation: head.confirmation, late: head.late === 1, restrictedUse: head.restricted_use === 1, person: head.person_name,
})
const placeOf = ({ id, name, address, county, region, siteKind }: EntrySnapshot['place']) => ({ id, name, address, county, region, siteKind: siteKind?.text ?? null })

/** The reading that matters: the one with the most wind. */
function weatherOf({ weather, noWeather }: EntryFacts): DaybookRow['weather'] {
  const [first, ...rest] = weather
  if (!first) return noWeather === 'indoors' ? 'indoors' : 'not-taken'
  const speed = (reading: typeof first) => reading.wind && 'speed' in reading.wind ? toRational(reading.wind.speed, 'mph') : { n: 0n, d: 1n }
  const worst = rest.reduce((a, b) => compareRational(speed(b), speed(a)) > 0 ? b : a, first)
  const blowing = worst.wind && 'speed' in worst.wind ? worst.wind : null
  return { temperature: worst.temperature, calm: worst.wind !== null && blowing === null, wind: blowing?.speed ?? null, from: blowing?.from ?? null, readings: weather.length }
}

/** An entry's line of the Daybook. `findings` null where the reader does not see the firm's own part. */
export function entryLine(head: EntryHeadRow, facts: EntryFacts, snapshot: EntrySnapshot, findings: Finding[] | null): DaybookRow {
  const licence = snapshot.people[facts.people.findIndex(p => p.responsible)]?.licence ?? null
  return {
    ...headOf(head), startedAt: facts.startedAt, zone: facts.zone, place: placeOf(snapshot.place),
    lines: linesInUse(facts, snapshot).map(({ shot: { product }, amount }) => ({ name: product.name, number: product.number, ingredients: product.ingredients, amount, restrictedUse: product.restrictedUse, demo: product.demo })),
    finished: facts.drawn ?? facts.finished, method: facts.method.text, equipment: snapshot.equipment?.name ?? null, targets: facts.targets.map(t => t.text), areas: facts.areas.map(a => ({ place: a.place.text, size: a.size })),
    weather: weatherOf(facts), licence: licence && { number: licence.number, region: licence.region }, findings, ...(findings === null ? { late: false } : {}),
  }
}

/** The line of a visit with nothing applied. */
export function nothingLine(head: EntryHeadRow, facts: VisitFacts, snapshot: VisitSnapshot): DaybookRow {
  return {
    ...headOf(head), startedAt: facts.arrivedAt, zone: facts.zone, place: placeOf(snapshot.place), lines: [], finished: null, method: facts.nothing?.text ?? '', equipment: null, targets: [], areas: [], weather: 'not-taken', licence: null, findings: [],
  }
}
