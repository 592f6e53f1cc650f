import type { EntrySubmission } from '#shared/records/entry'
import { plusDays, plusMonths } from '#shared/time/days'
import { plusMinutes, resolveLocal } from '#shared/time/zoned'
import { coded } from '../builders/coded'
import type { MadePlace } from '../builders/place'
import type { Maker } from '../builders/visit'
import { visitOf } from '../builders/visit'
import type { MadeBranch } from './book'
import { branchOf } from './book'
import type { VisitEvent } from './events'
import { IDLE_COUNTY } from './places'
import type { PersonPlan } from './people'
import { ENDED_IN_NEW_YORK } from './products'
import { PROGRAMMES, TREATMENTS } from './treatments'
import type { TreatmentKey, TreatmentPlan } from './treatments'

export interface Span { since: string, day: string }

const NOTES = ['Customer asked to call an hour ahead next time.', 'Ant trail at the north corner, gone to ground behind the meter.', 'Station 4 moved away from the walkway.', 'Door sweep at the back is worn: told the manager.', 'Watered in by the customer this evening.', 'Droppings behind the dishwasher, less than last time.']

const EXPLANATIONS = ['The wind meter was in the other truck.', 'Forgot to read the weather before the spray was out.', 'Battery of the meter was flat; trees did not move.']
const readingMissing = ({ facts }: EntrySubmission): boolean => facts.noWeather === 'not-taken' || facts.weather.some(reading => reading.wind === null)

/** The houses that one applicator comes back to every four weeks, and on which day from the day they are due again. */
const REGULARS: { due: number, treatments: TreatmentKey[] }[] = [
  { due: -1, treatments: ['band', 'granules'] }, { due: 0, treatments: ['band', 'granules'] }, { due: 0, treatments: ['harrow-band', 'granules'] }, { due: 1, treatments: ['band', 'granules'] }, { due: 2, treatments: ['band'] }, { due: 3, treatments: ['ant-gel'] },
]
export const REGULAR_EVERY = 28

export const isWeekend = (day: string): boolean => [0, 6].includes(new Date(`${day}T12:00:00Z`).getUTCDay())
export const clockAt = (day: string, minutes: number, zone: string): string => {
  const read = resolveLocal(day, '07:00', zone)
  return plusMinutes(read.kind === 'one' ? read.iso : read.kind === 'two' ? read.first : read.after, minutes, zone)
}

/** What may be done at such a place in that month, in that state, with products still registered there. */
function programmesFor(branch: MadeBranch, place: MadePlace, day: string, span: Span): TreatmentKey[][] {
  const month = Number(day.slice(5, 7))
  const fits = (key: TreatmentKey) => {
    const { months = [1, 12], states, products }: TreatmentPlan = TREATMENTS[key]
    const ended = branch.key === 'NY' && day > plusMonths(span.day, -3) && products.some(p => p.product === ENDED_IN_NEW_YORK)
    return months[0] <= month && month <= months[1] && (!states || states.includes(branch.key)) && !ended
  }
  return (PROGRAMMES[place.site] ?? []).filter(keys => keys.every(fits))
}

/** Every working day of everybody in the field, up to the day before. */
export function routine(maker: Maker, span: Span, people: readonly PersonPlan[], perDay = 1.48): VisitEvent[] {
  const events: VisitEvent[] = []
  const idleMonth = plusMonths(span.day, -4).slice(0, 7)
  for (const { key, field } of people) {
    if (!field) continue
    const branch = branchOf(maker.book, field.branch)
    const crew = people.filter(p => p.field?.branch === field.branch)
    const mine = crew.findIndex(p => p.key === key)
    const route = branch.places.slice(hasRegulars(branch) ? REGULARS.length : 0).filter((_, n) => n % crew.length === mine)
    let at = 0
    for (let day = span.since; day < span.day; day = plusDays(day, 1)) {
      if (isWeekend(day) || !maker.dice.chance(field.share)) continue
      const count = Math.floor(perDay) + (maker.dice.chance(perDay % 1) ? 1 : 0)
      let minutes = maker.dice.between(60, 150)
      for (let n = 0; n < count; n++) {
        for (let tried = 0; tried < route.length; tried++) {
          const place = route[at++ % route.length]
          if (!place || (place.county === IDLE_COUNTY && day.startsWith(idleMonth))) continue
          const programmes = programmesFor(branch, place, day, span)
          if (programmes.length === 0) continue
          events.push(oneVisit(maker, { branch, place, who: key, day, minutes, treatments: maker.dice.pick(programmes), span }))
          minutes += maker.dice.between(100, 190)
          break
        }
      }
    }
  }
  return events
}

const hasRegulars = (branch: MadeBranch) => branch.key === 'NY' && branch.places.length > 20

interface OneVisit { branch: MadeBranch, place: MadePlace, who: string, day: string, minutes: number, treatments: TreatmentKey[], span: Span }

function oneVisit(maker: Maker, { branch, place, who, day, minutes, treatments, span }: OneVisit): VisitEvent {
  const { dice } = maker
  const nothing = dice.chance(0.035) ? coded.nothing(dice.pick(['none-found', 'below-threshold', 'weather', 'no-access', 'inspection-only'])) : null
  const followUpOn = dice.chance(0.3) ? plusDays(day, dice.pick([14, 30, 60, 90])) : null
  const late = dice.chance(0.025) && plusDays(day, 5) < span.day
  const visit = visitOf(maker, {
    branch, who, place: { id: place.id }, start: clockAt(day, minutes, branch.zone), treatments: nothing ? [] : treatments, nothing,
    // a date that has passed without a visit would show as due: those are the regulars' business
    followUpOn: followUpOn !== null && followUpOn <= plusDays(span.day, 15) ? null : followUpOn,
    note: dice.chance(0.08) ? dice.pick(NOTES) : null, signedAfter: late ? dice.between(25, 80) : 0,
    sizes: place.id + (dice.chance(0.75) ? '' : day),
    change: entry => ({ ...entry, words: { ...entry.words, note: dice.chance(0.03) ? dice.pick(NOTES) : null, explanation: readingMissing(entry) && dice.chance(0.85) ? dice.pick(EXPLANATIONS) : null } }),
  })
  return { kind: 'visit', who, ...visit }
}

/** One applicator's monthly houses, so that some are due around the day, with the same work as last time. */
export function regulars(maker: Maker, span: Span, who: string): VisitEvent[] {
  const branch = branchOf(maker.book, 'NY')
  return REGULARS.flatMap(({ due, treatments }, n) => {
    const place = branch.places[n]
    if (!place) return []
    const events: VisitEvent[] = []
    for (let next = plusDays(span.day, due); plusDays(next, -REGULAR_EVERY) >= span.since; next = plusDays(next, -REGULAR_EVERY)) {
      const day = plusDays(next, -REGULAR_EVERY)
      const visit = visitOf(maker, { branch, who, place: { id: place.id }, start: clockAt(day, 330 + (n % 2) * 60, branch.zone), treatments, followUpOn: next, sizes: place.id })
      events.push({ kind: 'visit', who, ...visit })
    }
    return events
  })
}
