import type { Branch, Person } from '#shared/books/shapes'
import type { EntryFacts, EntryPerson, EntryWords, Reentry, WeatherReading } from '#shared/records/entry'
import type { Coded, Refer } from '#shared/records/shapes'
import { isQuantity } from '#shared/records/draft-figures'
import type { Figure } from '#shared/records/draft-figures'
import { inZone } from '#shared/time/zoned'

/** A time as it was given: tapped, or read off a clock (`at` is null while the clock reading is doubtful and not yet settled). */
export interface Moment { given: 'now' | 'entered', at: string | null, day: string, clock: string }

export interface DraftLine {
  labelVersionId: string | null
  product: Refer | null
  rate: Figure
  amount: Figure
  amountGiven: EntryWords['given']['amounts']
  counted: { of: 'placement' | 'station' | 'container', count: string, each: Figure } | null
  lot: string
}

export interface DraftArea { place: Coded, setting: EntryFacts['areas'][number]['setting'], size: Figure, how: EntryFacts['areas'][number]['how'] }

export interface DraftReading {
  at: string | null
  where: WeatherReading['where']
  temperature: Figure
  wind: 'not-taken' | 'calm' | 'blowing'
  speed: Figure
  from: string | null
  humidity: string
  sky: WeatherReading['sky']
  source: WeatherReading['source']
}

/** One treatment as far as it is written. `reentry` and `protective` are null as long as the label's own stand. */
export interface DraftTreatment {
  id: string
  mixId: string | null
  drawn: Figure
  method: Coded | null
  equipment: Refer | null
  targets: Coded[]
  lines: DraftLine[]
  finished: Figure
  finishedGiven: EntryWords['given']['finished']
  areas: DraftArea[]
  areasGiven: EntryWords['given']['areas']
  /** Times of its own; null while those of the visit hold. */
  started: Moment | null
  ended: Moment | null
  reentry: Reentry | null
  protective: Coded[] | null
  prevention: Coded[]
  advice: string
  note: string
}

/** A visit as far as it is written. Its id is the visit's own, made on the device. */
export interface Draft {
  v: 1
  id: string
  begunAt: string
  place: Refer | null
  branchId: string | null
  zone: string
  country: string
  arrived: Moment | null
  left: Moment | null
  treatments: DraftTreatment[]
  weather: DraftReading[]
  noWeather: 'indoors' | 'not-taken' | null
  people: EntryPerson[]
  nothing: Coded | null
  followUpOn: string
  note: string
  explanation: string
  notify: string[]
}

const METRIC = (country: string) => country !== 'US'
export const emptyFigure = (unit: Figure['unit']): Figure => ({ value: '', unit })

export const newReading = (country: string): DraftReading => ({
  at: null, where: 'site', temperature: emptyFigure(METRIC(country) ? 'deg_C' : 'deg_F'), wind: 'not-taken', speed: emptyFigure(METRIC(country) ? 'km_h' : 'mph'), from: null, humidity: '', sky: null, source: 'observed',
})

export const newTreatment = (id: string, country: string): DraftTreatment => ({
  id, mixId: null, drawn: emptyFigure(METRIC(country) ? 'L' : 'gal'), method: null, equipment: null, targets: [], lines: [], finished: emptyFigure(METRIC(country) ? 'L' : 'gal'), finishedGiven: 'not-given',
  areas: [], areasGiven: 'not-given', started: null, ended: null, reentry: null, protective: null, prevention: [], advice: '', note: '',
})

export const newLine = (labelVersionId: string | null, product: Refer | null, unit: Figure['unit'] = 'fl_oz'): DraftLine => ({
  labelVersionId, product, rate: emptyFigure('fl_oz/gal'), amount: emptyFigure(unit), amountGiven: 'not-given', counted: null, lot: '',
})

export const newArea = (place: Coded, setting: DraftArea['setting'], country: string): DraftArea => ({ place, setting, size: emptyFigure(METRIC(country) ? 'sq_m' : 'sq_ft'), how: 'measured' })

/** The licence under which somebody works in a state: the one in force that lasts longest, else none. */
export function licenceFor(person: Person | undefined, region: string, day: string): string | null {
  const held = (person?.licences ?? []).filter(l => l.region === region && l.issued <= day && day <= l.expires)
  return held.at(-1)?.id ?? null
}

export interface NewDraft { id: string, begunAt: string, branch: Branch | undefined, me: Person | undefined }

export function newDraft({ id, begunAt, branch, me }: NewDraft): Draft {
  const [zone, country] = [branch?.zone ?? 'UTC', branch?.country ?? 'US']
  return {
    v: 1, id, begunAt, place: null, branchId: branch?.id ?? null, zone, country, arrived: null, left: null, treatments: [], weather: [], noWeather: null,
    people: me ? [{ person: { id: me.id }, did: ['applied'], licenceId: licenceFor(me, branch?.region ?? '', begunAt.slice(0, 10)), responsible: true }] : [],
    nothing: null, followUpOn: '', note: '', explanation: '', notify: [],
  }
}

/** The whole second just past, on the clock of the place: never later than the device's own clock. */
export function nowMoment(iso: string, zone: string): Moment {
  const at = inZone(iso, zone)
  return { given: 'now', at, day: at.slice(0, 10), clock: at.slice(11, 16) }
}

export const startOf = (draft: Draft, treatment: DraftTreatment): string | null => (treatment.started ?? draft.arrived)?.at ?? null
export const endOf = (draft: Draft, treatment: DraftTreatment): string | null => (treatment.ended ?? draft.left)?.at ?? null

/** Every area of the treatment lies inside: weather has no bearing on it. */
export const isIndoors = (treatment: Pick<DraftTreatment, 'areas'>): boolean => treatment.areas.length > 0 && treatment.areas.every(area => area.setting === 'indoors')

/** Has anything of the reading been taken? An untouched one goes on no record. */
export const isTaken = (reading: DraftReading): boolean => isQuantity(reading.temperature) || reading.wind !== 'not-taken' || reading.humidity !== '' || reading.sky !== null
