import type { Issue } from '#shared/errors'
import type { Finding } from '#shared/checks/finding'
import { toHex } from '#shared/ledger/hash'
import type { Draft, DraftReading, DraftTreatment } from '#shared/records/draft'
import { endOf, isIndoors, isTaken, startOf } from '#shared/records/draft'
import { amountByCount, isUnreadable, quantityOr, rateOr } from '#shared/records/draft-figures'
import { protectiveOf, reentryOf } from '#shared/records/draft-label'
import type { EntryFacts, EntrySubmission, EntryWords, WeatherReading } from '#shared/records/entry'
import { WIND_FROM } from '#shared/records/entry'
import { submissionHash } from '#shared/records/projection'
import type { Books } from '#shared/records/snapshot'
import type { VisitSubmission } from '#shared/records/visit'
import { inZone } from '#shared/time/zoned'

/** What signing needs beside the draft. `now` is the device's clock, whole seconds in the place's zone. */
export interface Signing { books: Books, now: string, language: 'en' | 'es', seen: (entry: number) => Finding[] }

const textOr = (value: string): string | null => value.normalize('NFC').trim() || null

function readingOf(reading: DraftReading, now: string): WeatherReading {
  const speed = quantityOr(reading.speed)
  const from = WIND_FROM.find(code => code === reading.from) ?? null
  return {
    at: reading.at ?? now, where: reading.where, temperature: quantityOr(reading.temperature), humidity: reading.humidity || null, sky: reading.sky, source: reading.source,
    wind: reading.wind === 'calm' ? { calm: true } : reading.wind === 'blowing' && speed ? { speed, from } : null,
  }
}

/** Weather of one entry: none bears on work indoors, which the areas say themselves. */
function weatherOf(draft: Draft, treatment: DraftTreatment, now: string): Pick<EntryFacts, 'weather' | 'noWeather'> {
  if (draft.noWeather === 'indoors' || isIndoors(treatment)) return { weather: [], noWeather: 'indoors' }
  const weather = draft.weather.filter(isTaken).map(reading => readingOf(reading, now))
  return { weather, noWeather: weather.length > 0 ? null : 'not-taken' }
}

/** The facts of a treatment as far as they are known; where a time is still missing, `now` stands in so that checks can run. Not for signing before `gapsOf` is empty. */
export function factsOf(draft: Draft, treatment: DraftTreatment, { books, now, language }: Omit<Signing, 'seen'>): EntryFacts {
  const drawing = treatment.mixId !== null
  return {
    v: 1, id: treatment.id, visitId: draft.id, language, place: draft.place ?? { read: { name: '?', address: null, number: null } }, branchId: draft.branchId ?? '',
    startedAt: startOf(draft, treatment) ?? now, finishedAt: endOf(draft, treatment) ?? now, zone: draft.zone,
    method: treatment.method ?? { code: null, text: '?' }, equipment: treatment.equipment, targets: treatment.targets, people: draft.people,
    mixId: treatment.mixId, drawn: drawing ? quantityOr(treatment.drawn) : null, finished: drawing ? null : quantityOr(treatment.finished),
    lines: drawing ? [] : treatment.lines.map((line) => {
      const each = line.counted && quantityOr(line.counted.each)
      const byCount = amountByCount(line)
      return {
        labelVersionId: line.labelVersionId, product: line.labelVersionId ? null : line.product, rate: rateOr(line.rate), amount: byCount ?? quantityOr(line.amount),
        counted: line.counted && each && byCount ? { of: line.counted.of, count: line.counted.count, each } : null, lot: textOr(line.lot),
      }
    }),
    areas: treatment.areas.map(area => ({ ...area, size: quantityOr(area.size) })),
    ...weatherOf(draft, treatment, now),
    reentry: reentryOf(treatment, books), protective: protectiveOf(treatment, books), prevention: treatment.prevention, advice: textOr(treatment.advice), attestation: 'a1',
  }
}

export function givenOf(draft: Draft, treatment: DraftTreatment, facts: EntryFacts): EntryWords['given'] {
  const times = [treatment.started ?? draft.arrived, treatment.ended ?? draft.left]
  return {
    finished: facts.finished || facts.drawn ? (treatment.mixId ? 'entered' : treatment.finishedGiven) : 'not-given',
    amounts: treatment.mixId ? 'computed' : facts.lines.some(line => line.counted) ? 'computed' : treatment.lines[0]?.amountGiven ?? 'not-given',
    areas: facts.areas.length > 0 ? treatment.areasGiven : 'not-given',
    times: times.every(time => time?.given === 'now') ? 'now' : 'entered',
    weather: facts.weather.length > 0 ? 'entered' : facts.noWeather === 'indoors' ? 'computed' : 'not-given',
  }
}

/** What must be there before it can be a record at all, by the path of its field in the form; codes are keys of `visit.gaps`. */
export function gapsOf(draft: Draft): Issue[] {
  const gaps: Issue[] = []
  const need = (path: string, missing: boolean, code: string) => missing && gaps.push({ path, code })
  need('place', draft.place === null || draft.branchId === null, 'place')
  need('arrived', !draft.arrived?.at, 'arrived')
  need('left', !draft.left?.at, 'left')
  need('people', draft.people.filter(p => p.responsible).length !== 1, 'responsible')
  need('treatments', draft.treatments.length === 0 && draft.nothing === null, 'nothing')
  draft.treatments.forEach((treatment, n) => {
    const at = (path: string) => `treatments.${n}.${path}`
    need(at('lines'), treatment.mixId === null && treatment.lines.length === 0, 'product')
    need(at('method'), treatment.method === null, 'method')
    const figures = [['finished', treatment.finished], ['drawn', treatment.drawn], ...treatment.lines.map((l, i) => [`lines.${i}.amount`, l.amount]), ...treatment.areas.map((a, i) => [`areas.${i}.size`, a.size])] as const
    figures.forEach(([path, figure]) => need(at(path as string), isUnreadable(figure as { value: string, unit: string }), 'unreadable'))
  })
  draft.weather.forEach((reading, n) => {
    need(`weather.${n}.temperature`, isUnreadable(reading.temperature), 'unreadable')
    need(`weather.${n}.speed`, isUnreadable(reading.speed), 'unreadable')
  })
  return gaps
}

/** The submission that a signing freezes. @param draft with no gaps. */
export function submissionOf(draft: Draft, signing: Signing): VisitSubmission {
  const { now, language } = signing
  const entries = draft.treatments.map((treatment, n): EntrySubmission => {
    const facts = factsOf(draft, treatment, signing)
    const findings = signing.seen(n)
    const owes = findings.some(f => f.outcome !== 'note')
    const seen = findings.map(({ check, message, outcome, line }) => ({ check, message, outcome, line }))
    return { facts, words: { note: textOr(treatment.note), explanation: owes ? textOr(draft.explanation) : null, seen, given: givenOf(draft, treatment, facts), deviceNow: now } }
  })
  return {
    visit: {
      facts: {
        v: 1, id: draft.id, language, place: draft.place ?? { read: { name: '?', address: null, number: null } }, branchId: draft.branchId ?? '', arrivedAt: inZone(draft.arrived?.at ?? now, draft.zone), leftAt: inZone(draft.left?.at ?? now, draft.zone), zone: draft.zone,
        present: draft.people.map(p => p.person), nothing: entries.length === 0 ? draft.nothing : null, followUpOn: draft.followUpOn || null,
        entries: entries.map(entry => ({ id: entry.facts.id, hash: toHex(submissionHash(entry)) })), mixes: [],
      },
      words: { note: textOr(draft.note), notify: draft.notify, deviceNow: now },
    },
    mixes: [], entries,
  }
}
