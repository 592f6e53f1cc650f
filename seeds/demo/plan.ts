import { plusMonths } from '#shared/time/days'
import { idsFrom } from '../builders/ids'
import { Dice } from '../builders/random'
import type { Maker } from '../builders/visit'
import type { Book } from './book'
import { makeBook } from './book'
import { changes } from './changes'
import type { PlannedEvent } from './events'
import type { PersonPlan } from './people'
import { BRANCHES, PEOPLE } from './people'
import { clockAt, regulars, routine } from './routine'
import type { Span } from './routine'
import { specials } from './special'

export const FIRST_FIRM = 'alder-wick'
export const SECOND_FIRM = 'second-firm'
export const CUSTOMER = 'customer@alder-wick.example'

export interface FirmPlan {
  slug: string, name: string, address: string, phone: string, mailFrom: string
  book: Book
  events: PlannedEvent[]
  /** The instant at which the plan ends: nothing of it was received later. */
  until: number
  /** Who lets notices go. */
  office: string
  /** What is drawn while it is carried out: salts, ids of notices. */
  dice: Dice
}

export interface PlanSettings {
  seed: string
  /** The local day, in the westernmost branch, on which the demonstration is made: the last visit was the day before. */
  day: string
  /** First day of work; eighteen months before unless told. */
  since?: string
}

/** Everything that happened up to the day, as data: the same for the same seed and day. */
export function planDemonstration(settings: PlanSettings): FirmPlan[] {
  const { day } = settings
  const span = { since: settings.since ?? plusMonths(day, -18), day }
  return [firstFirm(settings.seed, span), secondFirm(settings.seed, span)]
}

const inOrder = (events: PlannedEvent[]): PlannedEvent[] => events.sort((a, b) => a.at - b.at)
/** The day begins in the westernmost branch. */
const endOf = ({ day }: Span) => Date.parse(clockAt(day, -7 * 60, BRANCHES.CA.zone))
const startOf = ({ since }: Span) => Date.parse(`${since}T00:00:00Z`)

function firstFirm(seed: string, span: Span): FirmPlan {
  const dice = new Dice(`${seed} ${FIRST_FIRM} ${span.day}`)
  const book = makeBook(dice, { ...span, branches: ['NY', 'CA', 'TX'], people: PEOPLE, customer: CUSTOMER })
  const maker: Maker = { book, dice, makeId: idsFrom(startOf(span), dice) }
  const usual = routine(maker, span, PEOPLE)
  const until = endOf(span)
  const events = [...usual, ...regulars(maker, span, 'tomas'), ...specials(maker, span), ...changes(maker, usual, until)].filter(event => event.at < until)
  return { slug: FIRST_FIRM, name: 'Alder & Wick Pest and Turf', address: BRANCHES.NY.address, phone: BRANCHES.NY.phone, mailFrom: 'Alder & Wick <book@alder-wick.example>', book, events: inOrder(events), until, office: 'officer', dice }
}

/** A one-man firm, whose owner also works for the first. */
const ANSEL: PersonPlan = {
  key: 'ansel', name: 'Ansel Brack', roles: [{ role: 'owner', branch: null }, { role: 'applicator', branch: 'NY' }], account: 'owner@second-firm.example', field: { branch: 'NY', share: 0.13 },
  licences: [{ region: 'NY', number: 'C5-990158', className: 'Certified commercial applicator', categories: ['3A'], days: 700 }],
}

function secondFirm(seed: string, span: Span): FirmPlan {
  const dice = new Dice(`${seed} ${SECOND_FIRM} ${span.day}`)
  const own = { name: 'Brackwater', address: '3 Mill Race, Hudson Bluff, NY 12144', phone: '518 555 0163', county: 'Rensselaer', registration: { number: '09977', kind: 'Pesticide business registration' } }
  const book = makeBook(dice, { ...span, branches: ['NY'], people: [ANSEL], customer: null, own, houses: 8 })
  const maker: Maker = { book, dice, makeId: idsFrom(startOf(span), dice) }
  return { slug: SECOND_FIRM, name: 'Brackwater Lawn and Tree', address: own.address, phone: own.phone, mailFrom: 'Brackwater <book@second-firm.example>', book, events: inOrder(routine(maker, span, [ANSEL], 1)), until: endOf(span), office: ANSEL.key, dice }
}
