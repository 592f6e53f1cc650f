import type { EntrySubmission } from '#shared/records/entry'
import type { Refer } from '#shared/records/shapes'
import { plusDays } from '#shared/time/days'
import { localDay, plusMinutes } from '#shared/time/zoned'
import { coded } from '../builders/coded'
import type { MadePlace } from '../builders/place'
import type { Maker, VisitPlan } from '../builders/visit'
import { crewOf, visitOf } from '../builders/visit'
import type { MadeBranch } from './book'
import { branchOf, labelOf, personOf } from './book'
import type { PlannedEvent, VisitEvent } from './events'
import { clockAt } from './routine'
import type { Span } from './routine'
import type { BranchKey } from './people'
import type { TreatmentKey } from './treatments'

/** What an officer is to find in the demonstration at least once, in the weeks before the day. */
export function specials(maker: Maker, span: Span): PlannedEvent[] {
  return [
    ...afterRegistrationEnded(maker, span), ...rateAbove(maker, span), ...asRead(maker, span), ...nothingApplied(maker, span), ...longLate(maker, span),
    ...tankOverStops(maker, span, { key: 'TX', who: 'cody', daysAgo: 4, site: 'lawn' }), ...tankOverStops(maker, span, { key: 'NY', who: 'tomas', daysAgo: 13, site: 'house' }),
    ...twoProductsInOneTank(maker, span),
  ]
}

const placeOf = (branch: MadeBranch, site: MadePlace['site'], n = 0): Refer => {
  const place = branch.places.filter(p => p.site === site)[n]
  if (!place) throw new Error(`no ${site} in ${branch.key}`)
  return { id: place.id }
}

type Brief = Omit<VisitPlan, 'branch' | 'start' | 'sizes'> & { branch: BranchKey, daysAgo: number, minutes?: number }

function visit(maker: Maker, { day }: Span, { branch: key, daysAgo, minutes = 90, ...rest }: Brief): VisitEvent {
  const branch = branchOf(maker.book, key)
  return { kind: 'visit', who: rest.who, ...visitOf(maker, { branch, start: clockAt(plusDays(day, -daysAgo), minutes, branch.zone), sizes: `${key}${daysAgo}`, ...rest }) }
}

const explained = (explanation: string) => (entry: EntrySubmission): EntrySubmission => ({ ...entry, words: { ...entry.words, explanation } })

const afterRegistrationEnded = (maker: Maker, span: Span): PlannedEvent[] => [visit(maker, span, {
  branch: 'NY', daysAgo: 16, who: 'della', place: placeOf(branchOf(maker.book, 'NY'), 'restaurant'), treatments: ['roach-spray'],
  change: explained('Last bottle from the van. I had not seen that its state registration ended; the rest is set aside for return.'),
})]

function rateAbove(maker: Maker, span: Span): PlannedEvent[] {
  const change = (entry: EntrySubmission): EntrySubmission => {
    const [line] = entry.facts.lines
    if (!line) return entry
    const strong = { ...line, rate: { value: '0.80', unit: 'fl_oz/gal' as const }, amount: { value: '1.60', unit: 'fl_oz' as const } }
    return explained('Mixed by the old label, 0.80 fl oz in each gallon. Told the officer the same day.')({ ...entry, facts: { ...entry.facts, finished: { value: '2', unit: 'gal' }, lines: [strong] } })
  }
  return [visit(maker, span, { branch: 'CA', daysAgo: 9, who: 'wes', place: placeOf(branchOf(maker.book, 'CA'), 'house', 7), treatments: ['band'], change })]
}

function asRead(maker: Maker, span: Span): PlannedEvent[] {
  const readProduct = (entry: EntrySubmission): EntrySubmission => ({ ...entry, facts: { ...entry.facts, lines: entry.facts.lines.map(line => ({ ...line, labelVersionId: null, product: { read: { name: 'Dampwood Foam 1', address: null, number: '990120-4' } } })) } })
  return [
    visit(maker, span, { branch: 'NY', daysAgo: 6, who: 'della', place: { read: { name: 'Corner kiosk at the bus station', address: '1 Terminal Square, Ellory, NY 12205', number: null } }, treatments: ['crevice'], note: 'Not in the book yet: the neighbour of the diner asked for it.' }),
    visit(maker, span, { branch: 'TX', daysAgo: 11, who: 'cody', place: placeOf(branchOf(maker.book, 'TX'), 'house', 3), treatments: ['dusting'], change: readProduct }),
  ]
}

const nothingApplied = (maker: Maker, span: Span): PlannedEvent[] => [visit(maker, span, { branch: 'NY', daysAgo: 5, who: 'tomas', place: placeOf(branchOf(maker.book, 'NY'), 'school'), treatments: [], nothing: coded.nothing('below-threshold'), note: 'Two ants on twelve monitors. Come back in two weeks.' })]

const longLate = (maker: Maker, span: Span): PlannedEvent[] => [visit(maker, span, { branch: 'NY', daysAgo: 10, who: 'tomas', minutes: 500, place: placeOf(branchOf(maker.book, 'NY'), 'house', 9), treatments: ['band'], signedAfter: 43, note: 'Phone was lost until Thursday.' })]

const twoProductsInOneTank = (maker: Maker, span: Span): PlannedEvent[] => [visit(maker, span, { branch: 'TX', daysAgo: 8, who: 'bea', place: placeOf(branchOf(maker.book, 'TX'), 'sports-turf'), treatments: ['weeds-with-spreader'] })]

interface Tank { key: BranchKey, who: string, daysAgo: number, site: MadePlace['site'] }

/** One tank made up in the morning, drawn from at several stops of that day. */
function tankOverStops(maker: Maker, span: Span, { key, who, daysAgo, site }: Tank): PlannedEvent[] {
  const { book, makeId } = maker
  const branch = branchOf(book, key)
  const madeAt = clockAt(plusDays(span.day, -daysAgo), 20, branch.zone)
  const signed = Date.parse(plusMinutes(madeAt, 4, branch.zone))
  const id = makeId(signed)
  const [harrow, cling] = ['harrow', 'cling'].map(product => labelOf(book, product, localDay(madeAt, branch.zone)))
  const truck = branch.equipment['power-sprayer']
  if (!harrow || !cling || !truck) throw new Error('the tank has no product')
  const mix: PlannedEvent = { kind: 'mix', at: signed, who, submission: {
    facts: {
      v: 1, id, branchId: branch.id, madeAt, zone: branch.zone, by: { id: personOf(book, who).id }, equipment: { id: truck }, carrier: coded.carrier('water'), finished: { value: '50', unit: 'gal' }, leftFrom: null,
      lines: [{ labelVersionId: harrow.id, product: null, amount: { value: '25.0', unit: 'fl_oz' }, lot: 'DM-0417' }, { labelVersionId: cling.id, product: null, amount: { value: '12.5', unit: 'fl_oz' }, lot: null }],
    },
    words: { note: null, deviceNow: plusMinutes(madeAt, 4, branch.zone) },
  } }
  const stops = ['9', '12.5', '7.5', '11'].map((gallons, n) => {
    const drawn = (entry: EntrySubmission): EntrySubmission => ({
      ...entry,
      facts: { ...entry.facts, mixId: id, drawn: { value: gallons, unit: 'gal' }, finished: null, lines: [], equipment: { id: truck }, people: crewOf(book, who, key), areas: entry.facts.areas.map(area => ({ ...area, size: { value: String(Number(gallons) * 350), unit: 'sq_ft' as const } })) },
    })
    const treatments: TreatmentKey[] = ['harrow-band']
    return visit(maker, span, { branch: key, daysAgo, who, minutes: 70 + n * 95, place: placeOf(branch, n < 2 ? site : 'house', 10 + n - (n < 2 && site === 'lawn' ? 10 : 0)), treatments, change: drawn })
  })
  return [mix, ...stops]
}

