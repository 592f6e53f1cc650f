import { randomBytes } from 'node:crypto'
import { toHex } from '#shared/ledger/hash'
import { uuidv7 } from '#shared/ledger/ids'
import type { EntrySubmission } from '#shared/records/entry'
import { submissionHash } from '#shared/records/projection'
import type { VisitSubmission } from '#shared/records/visit'
import { inZone, localDay } from '#shared/time/zoned'
import { plusDays } from '#shared/time/days'
import type { MadeFirm, Member } from './firm'
import { put, withHouse } from './firm'
import type { Client, Dirs } from './server'

export const newUuid = (ms = Date.now()): string => uuidv7(ms, new Uint8Array(randomBytes(10)))

interface MadeProduct { id: string, labelId: string, name: string, number: string }
export interface MadeBooks {
  house: { id: string, name: string }
  kitchen: { id: string, name: string }
  /** A concentrate, 0.15 to 0.60 fl oz per gal, and granules, 2.0 to 4.0 lb per 1,000 sq ft. */
  spray: MadeProduct
  granules: MadeProduct
  sprayer: { id: string, name: string }
  spreader: { id: string, name: string }
  /** Of the applicator (in force in New York) and of the owner. */
  licences: Record<'applicator' | 'owner', { id: string, number: string }>
  firm: MadeFirm
}

const YEAR_AGO = '2025-01-01'
const LATER = '2029-12-31'

/** What a firm's records stand on: two places with a party, two products with labels, licences, equipment. All invented. Before the server starts. */
export const makeBooks = (dirs: Dirs, firm: MadeFirm): Promise<MadeBooks> => withHouse(dirs, (house) => {
  const { raw } = house.firm(firm.slug)
  const place = (name: string, address: string, site: string, text: string) => {
    const id = newUuid()
    put(raw, 'place', { id, parent_id: null, branch_id: firm.branchId, kind: 'property', name, address, town: 'Ellory', county: 'Albany', region: 'NY', country: 'US', zone: firm.zone, lat: 42.65, lon: -73.75, site_code: site, site_text: text, remark: 'Two dogs, fish tank indoors', retired_on: null })
    put(raw, 'party_role', { id: newUuid(), party_id: firm.customer.id, place_id: id, role: 'occupant', from_day: YEAR_AGO, to_day: null })
    return { id, name }
  }
  const product = (spec: { name: string, number: string, form: string, unit: string, per: string, min: string, max: string, words: string, methods: string[] }): MadeProduct => {
    const [id, labelId, useId] = [newUuid(), newUuid(), newUuid()]
    put(raw, 'product', { id, name: spec.name, kind: 'registered', number: spec.number, number_region: null, number_basic: spec.number, registrant: 'Sill & Garden Works', form: spec.form, signal_word: 'CAUTION', restricted_use: 0, demo: 1, retired_on: null })
    put(raw, 'product_ingredient', { product_id: id, n: 0, name: 'Demothrin', percent: '6.40' })
    put(raw, 'product_registration', { id: newUuid(), product_id: id, region: 'NY', number: null, from_day: YEAR_AGO, to_day: null })
    put(raw, 'label_version', { id: labelId, product_id: id, label_date: '2025-02-01', from_day: YEAR_AGO, to_day: null, checked: 1, reentry: JSON.stringify({ until: 'dry' }),
      protective: JSON.stringify([{ code: 'gloves', text: 'Chemical-resistant gloves' }, { code: 'long-sleeves', text: 'Long sleeves' }]), cautions: 'Keep off until dry. Do not apply to water.', recorded_at: '2025-01-01T00:00:00.000Z' })
    put(raw, 'label_use', { id: useId, label_version_id: labelId, n: 0, sites: '[]', targets: '[]', methods: JSON.stringify(spec.methods) })
    put(raw, 'label_limit', { id: newUuid(), label_use_id: useId, n: 0, of_what: 'product', unit: spec.unit, per: spec.per, over_time: 'application', min: spec.min, max: spec.max, where_used: null, words: spec.words })
    return { id, labelId, name: spec.name, number: spec.number }
  }
  const equipment = (name: string, kind: string, text: string) => {
    const id = newUuid()
    put(raw, 'equipment', { id, branch_id: firm.branchId, name, kind_code: kind, kind_text: text, number: null, retired_on: null })
    return { id, name }
  }
  const licence = (who: Member, number: string) => {
    const id = newUuid()
    put(raw, 'licence', { id, person_id: firm.people[who].id, region: 'NY', number, class_name: 'Commercial applicator', categories: '["7A"]', issued: YEAR_AGO, expires: LATER, recorded_at: '2025-01-01T00:00:00.000Z' })
    return { id, number }
  }
  return {
    firm,
    house: place('22 Quarry Lane', '22 Quarry Lane, Ellory, NY 12205', 'house', 'House'),
    kitchen: place('Copper Ladle Kitchen', '8 Mill Street, Ellory, NY 12205', 'restaurant', 'Restaurant'),
    spray: product({ name: 'Sillgard 6.4 CS', number: '990014-27', form: 'concentrate', unit: 'fl_oz', per: 'gal', min: '0.15', max: '0.60', words: 'Mix 0.15 to 0.60 fl oz in each gallon of finished spray.', methods: ['foundation-band', 'spot', 'crack-and-crevice'] }),
    granules: product({ name: 'Bedrow G', number: '990031-4', form: 'granule', unit: 'lb', per: '1000_sq_ft', min: '2.0', max: '4.0', words: 'Spread 2.0 to 4.0 lb over each 1,000 sq ft.', methods: ['granules'] }),
    sprayer: equipment('Backpack 3', 'backpack-sprayer', 'Backpack sprayer'),
    spreader: equipment('Spreader 1', 'spreader', 'Spreader'),
    licences: { applicator: licence('applicator', 'C5-81172'), owner: licence('owner', 'C5-20031') },
  }
})

export interface VisitSpec {
  place?: { id: string }
  who?: 'applicator' | 'owner'
  /** When the visit ended; started half an hour before. An hour ago unless told. */
  ended?: Date
  /** Days after the visit on which to come again. */
  followUpAfter?: number
  treatments?: ('spray' | 'granules')[]
  notify?: string[]
  change?: (entry: EntrySubmission) => EntrySubmission
}

/** A visit as a device submits it, with one entry a treatment: 2.5 gal of spray with 0.75 fl oz on 980 sq ft, 3.0 lb of granules on 1,000 sq ft. */
export function visitSubmission(books: MadeBooks, spec: VisitSpec = {}): VisitSubmission {
  const { firm } = books
  const { place = books.house, who = 'applicator', ended = new Date(Date.now() - 3_600_000), treatments = ['spray', 'granules'], change = e => e } = spec
  const at = (minutesBefore: number) => inZone(new Date(ended.getTime() - minutesBefore * 60_000).toISOString(), firm.zone)
  const [visitId, deviceNow] = [newUuid(ended.getTime()), at(0)]
  const common = { v: 1 as const, language: 'en' as const, place: { id: place.id }, branchId: firm.branchId, zone: firm.zone }
  const entries = treatments.map((kind): EntrySubmission => change({
    facts: {
      ...common, id: newUuid(ended.getTime()), visitId, startedAt: at(30), finishedAt: at(5),
      people: [{ person: { id: firm.people[who].id }, did: ['mixed', 'applied'], licenceId: books.licences[who].id, responsible: true }],
      mixId: null, drawn: null, noWeather: null,
      weather: [{ at: at(30), where: 'site', temperature: { value: '61', unit: 'deg_F' }, wind: { speed: { value: '3', unit: 'mph' }, from: 'SW' }, humidity: null, sky: 'clear', source: 'observed' }],
      reentry: { until: 'dry' }, protective: [{ code: 'gloves', text: 'Chemical-resistant gloves' }], prevention: [], advice: null, attestation: 'a1',
      ...(kind === 'spray' ? sprayed(books) : spread(books)),
    },
    words: { note: null, explanation: null, seen: [], given: { finished: 'entered', amounts: 'entered', areas: 'entered', times: 'entered', weather: 'entered' }, deviceNow },
  }))
  return {
    visit: {
      facts: {
        ...common, id: visitId, arrivedAt: at(30), leftAt: at(0), present: [{ id: firm.people[who].id }], nothing: entries.length === 0 ? { code: 'none-found', text: 'No pest found' } : null,
        followUpOn: spec.followUpAfter === undefined ? null : plusDays(localDay(ended.toISOString(), firm.zone), spec.followUpAfter),
        entries: entries.map(entry => ({ id: entry.facts.id, hash: toHex(submissionHash(entry)) })), mixes: [],
      },
      words: { note: null, notify: spec.notify ?? [], deviceNow },
    },
    mixes: [], entries,
  }
}

const sprayed = ({ spray, sprayer }: MadeBooks): Pick<EntrySubmission['facts'], 'method' | 'equipment' | 'targets' | 'finished' | 'lines' | 'areas'> => ({
  method: { code: 'foundation-band', text: 'Foundation band' }, equipment: { id: sprayer.id }, targets: [{ code: 'ants', text: 'Ants' }, { code: 'earwigs', text: 'Earwigs' }],
  finished: { value: '2.5', unit: 'gal' },
  lines: [{ labelVersionId: spray.labelId, product: null, rate: { value: '0.30', unit: 'fl_oz/gal' }, amount: { value: '0.75', unit: 'fl_oz' }, counted: null, lot: null }],
  areas: [{ place: { code: 'outside-wall', text: 'Outside wall and ground beside it' }, setting: 'outdoors', size: { value: '980', unit: 'sq_ft' }, how: 'measured' }],
})

const spread = ({ granules, spreader }: MadeBooks): ReturnType<typeof sprayed> => ({
  method: { code: 'granules', text: 'Granules spread' }, equipment: { id: spreader.id }, targets: [{ code: 'ants', text: 'Ants' }], finished: null,
  lines: [{ labelVersionId: granules.labelId, product: null, rate: { value: '3.0', unit: 'lb/1000_sq_ft' }, amount: { value: '3.0', unit: 'lb' }, counted: null, lot: null }],
  areas: [{ place: { code: 'beds', text: 'Planting beds' }, setting: 'outdoors', size: { value: '1000', unit: 'sq_ft' }, how: 'measured' }],
})

/** Signs a visit over HTTP. @throws with the answer when it was not taken. */
export async function postVisit(client: Client, submission: VisitSubmission): Promise<VisitSubmission> {
  const answer = await client('/api/visits', { json: submission })
  if (answer.status !== 201) throw new Error(`the visit was not taken: ${answer.status} ${await answer.text()}`)
  return submission
}
