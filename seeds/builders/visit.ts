import type { EntryFacts, EntryPerson, EntrySubmission } from '#shared/records/entry'
import type { Coded, Refer } from '#shared/records/shapes'
import type { VisitSubmission } from '#shared/records/visit'
import { localDay, plusMinutes } from '#shared/time/zoned'
import { amountAt } from './amounts'
import { coded } from './coded'
import type { MakeId } from './ids'
import { Dice } from './random'
import type { Book, MadeBranch } from '../demo/book'
import { labelOf, personOf } from '../demo/book'
import { TREATMENTS } from '../demo/treatments'
import type { TreatmentKey, TreatmentPlan } from '../demo/treatments'
import { weatherAt } from '../demo/weather'

export interface Maker { book: Book, dice: Dice, makeId: MakeId }

export interface VisitPlan {
  branch: MadeBranch
  place: Refer
  who: string
  /** Arrival, with the zone's offset. */
  start: string
  treatments: readonly TreatmentKey[]
  nothing?: Coded | null
  followUpOn?: string | null
  note?: string | null
  /** Hours after leaving at which it was signed; at once unless told. */
  signedAfter?: number
  /** Sizes are the place's own, the same at every visit, unless this is another text. */
  sizes: string
  change?: (entry: EntrySubmission) => EntrySubmission
}

type Sized = Pick<EntryFacts, 'finished' | 'lines' | 'areas'>

/** Who took part: whoever works under supervision applied, the certified person supervised and is responsible. */
export function crewOf(book: Book, key: string, region: string): EntryPerson[] {
  const person = personOf(book, key)
  const licence = (of: typeof person) => of.licences.find(l => l.region === region)?.id ?? null
  const under = person.plan.field?.under
  const worked = { person: { id: person.id }, did: ['mixed', 'applied'] as EntryPerson['did'], licenceId: licence(person), responsible: !under }
  if (!under) return [worked]
  const certified = personOf(book, under)
  return [worked, { person: { id: certified.id }, did: ['supervised'], licenceId: licence(certified), responsible: true }]
}

/** A visit as the form would sign it: hashes of its parts and the findings on the screen are filled in when it is signed. */
export function visitOf(maker: Maker, plan: VisitPlan): { at: number, submission: VisitSubmission } {
  const { book, dice, makeId } = maker
  const { branch, who, start, treatments, change = e => e } = plan
  const person = personOf(book, who)
  let minutes = dice.between(4, 9)
  const spans = treatments.map(() => {
    const startedAt = plusMinutes(start, minutes, branch.zone)
    minutes += dice.between(12, 34)
    const finishedAt = plusMinutes(start, minutes, branch.zone)
    minutes += dice.between(2, 6)
    return { startedAt, finishedAt }
  })
  const leftAt = plusMinutes(start, minutes + dice.between(3, 8), branch.zone)
  const deviceNow = plusMinutes(leftAt, (plan.signedAfter ?? 0) * 60, branch.zone)
  const at = Date.parse(deviceNow)
  const visitId = makeId(at)
  const common = { v: 1 as const, language: 'en' as const, place: plan.place, branchId: branch.id, zone: branch.zone }
  const entries = treatments.map((key, n): EntrySubmission => {
    const treatment: TreatmentPlan = TREATMENTS[key]
    const span = spans[n]
    if (!span) throw new Error('no time for it')
    const day = localDay(span.finishedAt, branch.zone)
    const [first] = treatment.products
    const label = labelOf(book, first?.product ?? '', day)
    const outdoors = treatment.setting === 'outdoors'
    const weather = outdoors ? weatherAt(dice, branch.region, span.startedAt) : { weather: [], noWeather: 'indoors' as const }
    return change({
      facts: {
        ...common, ...span, ...weather, id: makeId(at), visitId, method: coded.method(treatment.method), targets: treatment.targets.map(coded.target),
        equipment: treatment.equipment && branch.equipment[treatment.equipment] ? { id: branch.equipment[treatment.equipment] ?? '' } : null,
        people: crewOf(book, who, branch.region), mixId: null, drawn: null, reentry: label.reentry, protective: label.protective.map(coded.protective),
        prevention: dice.chance(0.12) ? [coded.prevention(dice.pick(['sealed-gaps', 'food-stored', 'trimmed-plants', 'leak-reported', 'waste-cleared']))] : [],
        advice: null, attestation: 'a1', ...sized(maker, treatment, day, plan.sizes + key),
      },
      words: { note: null, explanation: null, seen: [], deviceNow, given: { finished: 'entered', amounts: 'computed', areas: 'as-last-time', times: 'now', weather: !outdoors || weather.noWeather ? 'not-given' : 'entered' } },
    })
  })
  return {
    at,
    submission: {
      visit: {
        facts: { ...common, id: visitId, arrivedAt: start, leftAt, present: [{ id: person.id }], nothing: plan.nothing ?? null, followUpOn: plan.followUpOn ?? null, entries: [], mixes: [] },
        words: { note: plan.note ?? null, notify: [], deviceNow },
      },
      mixes: [], entries,
    },
  }
}

/** Finished spray, lines with amounts, areas: what the form computes from a size. */
function sized({ book }: Maker, treatment: TreatmentPlan, day: string, sizes: string): Sized {
  const dice = new Dice(sizes)
  const { size } = treatment
  const between = ([low, high]: [number, number]) => dice.between(low, high)
  const areas = (size: EntryFacts['areas'][number]['size']): EntryFacts['areas'] => [{ place: coded.area(dice.pick(treatment.areas)), setting: treatment.setting, size, how: 'measured' }]
  const lines = (one: (plan: TreatmentPlan['products'][number], rate: string) => Pick<EntryFacts['lines'][number], 'rate' | 'amount' | 'counted'>): EntryFacts['lines'] =>
    treatment.products.map(product => ({ labelVersionId: labelOf(book, product.product, day).id, product: null, lot: null, ...one(product, dice.pick(product.rates)) }))
  const byRate = (sizeFor: (unit: string) => string) => lines(({ unit }, value) => {
    if (!unit) throw new Error('a rate needs its unit')
    return { rate: { value, unit }, amount: amountAt({ value, unit }, sizeFor(unit)), counted: null }
  })
  switch (size.by) {
    case 'spray': {
      const gallons = (between(size.quarterGallons) / 4).toString()
      return { finished: { value: gallons, unit: 'gal' }, lines: byRate(() => gallons), areas: areas({ value: String(Math.round(Number(gallons) * size.sqFtPerGallon / 10) * 10), unit: 'sq_ft' }) }
    }
    case 'area': {
      const sqFt = between(size.hundredsOfSqFt) * 100
      const gallons = size.gallonsPer1000 ? String(Math.round(sqFt / 100 * Number(size.gallonsPer1000)) / 10) : null
      return { finished: gallons ? { value: gallons, unit: 'gal' } : null, lines: byRate(unit => unit.endsWith('/gal') && gallons ? gallons : String(sqFt)), areas: areas({ value: String(sqFt), unit: 'sq_ft' }) }
    }
    case 'acres': {
      const acres = between(size.tenths)
      const value = (acres / 10).toFixed(1)
      return { finished: { value: String(acres * size.gallonsPerAcre / 10), unit: 'gal' }, lines: byRate(() => value), areas: areas({ value, unit: 'acre' }) }
    }
    case 'count': {
      const count = String(between(size.count))
      return { finished: null, areas: areas({ value: String(Math.round(between(size.sqFt) / 10) * 10), unit: 'sq_ft' }), lines: lines(({ unit }) => {
        if (!unit) throw new Error('a count needs its rate')
        const rate = { value: size.each.value, unit }
        return { rate, amount: amountAt(rate, count), counted: { of: size.of, count, each: size.each } }
      }) }
    }
    case 'weighed':
      return { finished: null, areas: areas({ value: String(between(size.sqFt)), unit: 'sq_ft' }), lines: lines(() => ({ rate: null, amount: { value: dice.pick(size.amounts), unit: size.unit }, counted: null })) }
  }
}
