import { randomBytes } from 'node:crypto'
import { toHex } from '#shared/ledger/hash'
import { uuidv7 } from '#shared/ledger/ids'
import type { EntryFacts, EntrySubmission, EntryWords } from '#shared/records/entry'
import { submissionHash } from '#shared/records/projection'
import type { VisitSubmission } from '#shared/records/visit'

export const id = (at = Date.now()): string => uuidv7(at, new Uint8Array(randomBytes(10)))

/** What of the books a visit names. */
export interface Named { branchId: string, placeId: string, personId: string, licenceId: string | null, labelVersionId: string }

export interface VisitSpec extends Named {
  /** Minutes before now that the work ended. */
  ended?: number
  entries?: number
  notify?: string[]
  nothing?: VisitSubmission['visit']['facts']['nothing']
  facts?: Partial<EntryFacts>
  words?: Partial<EntryWords>
  now?: Date
}

const at = (now: Date, minutesAgo: number): string => new Date(now.getTime() - minutesAgo * 60_000).toISOString()

/** One outdoor foundation band as the book's example label allows it: 0.90 fl oz in 3.0 gal. All invented. */
export function entrySubmission(spec: VisitSpec, visitId: string | null): EntrySubmission {
  const now = spec.now ?? new Date()
  const ended = spec.ended ?? 10
  return {
    facts: {
      v: 1, id: id(now.getTime()), visitId, language: 'en', place: { id: spec.placeId }, branchId: spec.branchId, startedAt: at(now, ended + 20), finishedAt: at(now, ended), zone: 'America/New_York',
      method: { code: 'foundation-band', text: 'Foundation band' }, equipment: null, targets: [{ code: 'ants', text: 'Ants' }],
      people: [{ person: { id: spec.personId }, did: ['mixed', 'applied'], licenceId: spec.licenceId, responsible: true }],
      mixId: null, drawn: null, finished: { value: '3.0', unit: 'gal' },
      lines: [{ labelVersionId: spec.labelVersionId, product: null, rate: { value: '0.30', unit: 'fl_oz/gal' }, amount: { value: '0.90', unit: 'fl_oz' }, counted: null, lot: null }],
      areas: [{ place: { code: 'outside-wall', text: 'Outside wall and ground beside it' }, setting: 'outdoors', size: { value: '1116', unit: 'sq_ft' }, how: 'measured' }],
      weather: [{ at: at(now, ended + 20), where: 'site', temperature: { value: '64', unit: 'deg_F' }, wind: { speed: { value: '4', unit: 'mph' }, from: 'SW' }, humidity: null, sky: 'clear', source: 'observed' }], noWeather: null,
      reentry: { until: 'dry' }, protective: [{ code: 'gloves', text: 'Gloves' }], prevention: [], advice: null, attestation: 'a1', ...spec.facts,
    },
    words: { note: null, explanation: null, seen: [], given: { finished: 'entered', amounts: 'computed', areas: 'entered', times: 'now', weather: 'entered' }, deviceNow: now.toISOString(), ...spec.words },
  }
}

/** A visit as a device signs it. */
export function visitSubmission(spec: VisitSpec): VisitSubmission {
  const now = spec.now ?? new Date()
  const ended = spec.ended ?? 10
  const visitId = id(now.getTime())
  const entries = Array.from({ length: spec.nothing ? 0 : spec.entries ?? 1 }, () => entrySubmission(spec, visitId))
  return {
    visit: {
      facts: {
        v: 1, id: visitId, language: 'en', place: { id: spec.placeId }, branchId: spec.branchId, arrivedAt: at(now, ended + 30), leftAt: at(now, ended), zone: 'America/New_York', present: [{ id: spec.personId }],
        nothing: spec.nothing ?? null, followUpOn: null, entries: entries.map(e => ({ id: e.facts.id, hash: toHex(submissionHash(e)) })), mixes: [],
      },
      words: { note: null, notify: spec.notify ?? [], deviceNow: now.toISOString() },
    },
    mixes: [], entries,
  }
}
