import type { EntryFacts } from '#shared/records/entry'
import { linesInUse } from '#shared/records/lines'
import type { LineInUse } from '#shared/records/lines'
import type { EntrySnapshot, VisitSnapshot } from '#shared/records/snapshot'
import type { VisitFacts } from '#shared/records/visit'
import type { Words } from '#shared/reports/words'
import { factWords } from '#shared/reports/fact-words'
import type { FactWords } from '#shared/reports/fact-words'
import { ingredientWords, licenceWords, numberWords, productName, signalWords } from '#shared/reports/product-words'
import { writing } from '#shared/reports/writing'
import type { Writing } from '#shared/reports/writing'
import { localDay } from '#shared/time/zoned'
import { emergencyBlock } from '#shared/notices/emergency'
import { keepOffSentences } from '#shared/notices/keep-off'
import type { NoticeModel, NoticeRow } from '#shared/notices/model'

/** One entry as it stands: the facts and snapshot of its latest version, under the reference of its first. */
export interface NoticeEntry { facts: EntryFacts, snapshot: EntrySnapshot, reference: string, hash: string, status: 'on-record' | 'amended' | 'struck' }
export interface NoticeSource { visit: { facts: VisitFacts, snapshot: VisitSnapshot }, entries: readonly NoticeEntry[] }

/** Why a notice is not made: the country has no checked emergency block, or nothing is left to tell (all struck). */
export class NoticeStopped extends Error {
  constructor(readonly reason: 'no-emergency-block' | 'nothing-to-tell', readonly country: string) {
    super(`${reason} ${country}`)
    this.name = 'NoticeStopped'
  }
}

/**
 * A visit's notice in ready words, from what stands: struck entries are left out, amended ones say so.
 * On a device before signing the same from `snapshotVisit` and `snapshotEntry`. @throws NoticeStopped
 */
export function noticeModel({ visit, entries }: NoticeSource, words: Words, language = 'en-US'): NoticeModel {
  const told = entries.filter(e => e.status !== 'struck')
  const { place, firm, branch } = visit.snapshot
  const emergency = emergencyBlock(place.country, words)
  if (!emergency) throw new NoticeStopped('no-emergency-block', place.country)
  if (told.length === 0) throw new NoticeStopped('nothing-to-tell', place.country)
  const write = writing(words, language)
  const facts = factWords(write)
  const day = localDay(visit.facts.leftAt, visit.facts.zone)
  return {
    language, country: place.country, title: words('notices.title'),
    subject: words('notices.subject', { place: place.name, day: write.day(day) }),
    place: place.name, address: place.address === place.name ? '' : place.address,
    when: words('notices.when', { day: write.dayLong(day), from: write.time(visit.facts.arrivedAt, visit.facts.zone), to: write.timeZoned(visit.facts.leftAt, visit.facts.zone) }),
    firm: { name: firm.name, line: [branch.address, branch.phone, ...branch.registrations.map(r => words('paper.registration', { kind: r.kind, number: r.number, region: r.region }))].join(' · ') },
    leads: keepOffSentences(told.map(e => e.facts), write),
    told: [...told.map(e => toldOf(e, write)), ...indoorsToo(told, words), ...(told.some(e => e.status === 'amended') ? [words('notices.amended')] : [])],
    treatments: told.map(e => ({ reference: e.reference, hash: e.hash, heading: e.facts.method.text, rows: treatmentRows(e, write, facts) })),
    rows: visitRows(visit.facts, told, write),
    emergency,
    cautions: [words('notices.cautions.label'), words('notices.cautions.record')],
  }
}

function toldOf({ facts }: NoticeEntry, { words, list }: Writing): string {
  const given = { areas: list(facts.areas.map(a => lowerFirst(a.place.text))), targets: list(facts.targets.map(t => lowerFirst(t.text))) }
  if (facts.areas.length === 0) return facts.targets.length > 0 ? words('notices.told.against', given) : words('notices.told.bare')
  return facts.targets.length > 0 ? words('notices.told.areasAgainst', given) : words('notices.told.areas', given)
}
/** Catalogue words begin like a heading; inside a sentence they do not. Words in capitals stay. */
const lowerFirst = (text: string): string => /^\p{Lu}\p{Ll}/u.test(text) ? text.charAt(0).toLowerCase() + text.slice(1) : text

/** People ask first whether anything was done inside. */
function indoorsToo(entries: readonly NoticeEntry[], words: Words): string[] {
  const areas = entries.flatMap(e => e.facts.areas)
  return areas.length > 0 && areas.every(a => a.setting === 'outdoors') ? [words('notices.told.notIndoors')] : []
}

function treatmentRows(entry: NoticeEntry, write: Writing, facts: FactWords): NoticeRow[] {
  const { words } = write
  const lines = linesInUse(entry.facts, entry.snapshot)
  const weather = entry.facts.weather.map(r => words('notices.weatherAt', { time: write.time(r.at, entry.facts.zone), reading: facts.reading(r) }))
  const outdoors = entry.facts.areas.some(a => a.setting === 'outdoors')
  return [
    { label: words('notices.rows.product'), lines: lines.flatMap(line => productLines(line, write)) },
    { label: words('notices.rows.amount'), lines: [...lines.map(line => amountOf(line, lines.length, write, facts)), ...finishedOf(entry.facts, write)] },
    { label: words('notices.rows.areas'), lines: entry.facts.areas.map(facts.area) },
    { label: words('notices.rows.weather'), lines: outdoors ? weather.length > 0 ? weather : [facts.noWeather['not-taken']] : [] },
  ].filter(row => row.lines.length > 0)
}

function productLines({ shot: { product } }: LineInUse, write: Writing): string[] {
  const { words } = write
  const first = [productName(product, write), numberWords(product, write), signalWords(product, write), product.restrictedUse ? words('paper.restrictedUse') : null].filter(Boolean).join(', ')
  return product.ingredients.length > 0 ? [first, words('notices.ingredients', { ingredients: ingredientWords(product, write) })] : [first]
}

function amountOf({ shot, line, amount, share }: LineInUse, of: number, write: Writing, facts: FactWords): string {
  const { words } = write
  const counted = line?.counted ? ` (${facts.counted(line.counted)})` : ''
  const text = amount ? `${write.figure(amount)}${counted}` : words('paper.notNoted')
  const said = share && amount ? words('notices.share', { amount: text }) : text
  return of > 1 ? words('notices.amountOf', { product: shot.product.name, amount: said }) : said
}

function finishedOf(facts: EntryFacts, { words, figure }: Writing): string[] {
  const finished = facts.drawn ?? facts.finished
  return finished ? [words('notices.finished', { finished: figure(finished) })] : []
}

function visitRows(visit: VisitFacts, entries: readonly NoticeEntry[], write: Writing): NoticeRow[] {
  const { words } = write
  const once = (lines: string[]) => [...new Set(lines)]
  const people = entries.flatMap(({ facts, snapshot }) => facts.people.map((p, n) => {
    const person = snapshot.people[n]
    const name = person?.name ?? ''
    const licence = person?.licence ? licenceWords(person.licence, write) : null
    return [p.did.includes('supervised') && !p.did.includes('applied') ? words('notices.supervised', { name }) : name, licence].filter(Boolean).join(', ')
  }))
  return [
    { label: words('notices.rows.by'), lines: once(people) },
    { label: words('notices.rows.done'), lines: once(entries.flatMap(e => e.facts.prevention.map(p => p.text))) },
    { label: words('notices.rows.please'), lines: once(entries.flatMap(e => e.facts.advice?.split(/\n+/) ?? [])) },
    { label: words('notices.rows.next'), lines: visit.followUpOn ? [words('notices.nextOn', { day: write.dayLong(visit.followUpOn) })] : [] },
  ].filter(row => row.lines.length > 0)
}
