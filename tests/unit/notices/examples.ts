import type { EntryFacts } from '#shared/records/entry'
import type { EntrySnapshot, VisitSnapshot } from '#shared/records/snapshot'
import type { VisitFacts } from '#shared/records/visit'
import type { NoticeEntry, NoticeSource } from '#shared/notices/notice'

const BOOK = '0196c0de-0000-7000-8000-00000000000'
const PRODUCT: EntrySnapshot['lines'][number] = {
  product: {
    id: `${BOOK}1`, name: 'Sillgard 6.4 CS', kind: 'registered', number: '990014-27', numberRegion: null, registrant: 'Sill & Garden Works', form: 'concentrate', signalWord: 'CAUTION', restrictedUse: false, demo: true,
    ingredients: [{ name: 'Demothrin', percent: '6.40' }], registrations: [],
  },
  label: { id: `${BOOK}2`, labelDate: '2025-02-01', from: '2025-02-01', to: null, checked: true, reentry: { until: 'dry' }, protective: [], cautions: 'Keep out of drains.', uses: [] },
}
const PLACE: EntrySnapshot['place'] = {
  id: `${BOOK}3`, name: '22 Quarry Lane', address: '22 Quarry Lane, Ellory, NY 12205', town: 'Ellory', county: 'Albany', region: 'NY', country: 'US', kind: 'property', siteKind: { code: 'house', text: 'House' },
  parties: [{ id: `${BOOK}4`, name: 'Zażółć Gęślą Jaźń Wspólnota', role: 'occupant' }],
}
export const FIRM: Pick<EntrySnapshot, 'firm' | 'branch'> = {
  firm: { id: `${BOOK}5`, name: 'Alder & Wick Pest and Turf', address: '3 Weir Street, Albany, NY 12205', phone: '518 555 0100', country: 'US' },
  branch: { id: `${BOOK}6`, name: 'Albany', address: '3 Weir Street, Albany, NY 12205', phone: '518 555 0148', region: 'NY', registrations: [{ region: 'NY', number: '15118', kind: 'Business registration', from: '2020-01-01', to: null }] },
}
const PERSON: EntrySnapshot['people'][number] = {
  id: `${BOOK}7`, name: 'Tomás Nguyễn', licence: { id: `${BOOK}8`, region: 'NY', number: 'C5-81172', className: 'Commercial applicator', categories: ['7A', '3A'], issued: '2025-01-01', expires: '2027-12-31' },
}

const FACTS: EntryFacts = {
  v: 1, id: '0196ce00-0000-7000-8000-000000000001', visitId: '0196ce00-0000-7000-8000-000000000000', language: 'en', place: { id: `${BOOK}3` }, branchId: `${BOOK}6`,
  startedAt: '2026-05-14T08:32:00-04:00', finishedAt: '2026-05-14T09:10:20-04:00', zone: 'America/New_York', method: { code: 'foundation-band', text: 'Foundation band' }, equipment: null,
  targets: [{ code: 'ants', text: 'Ants' }, { code: 'earwigs', text: 'Earwigs' }], people: [{ person: { id: `${BOOK}7` }, did: ['mixed', 'applied'], licenceId: `${BOOK}8`, responsible: true }],
  mixId: null, drawn: null, finished: { value: '3.0', unit: 'gal' },
  lines: [{ labelVersionId: `${BOOK}2`, product: null, rate: { value: '0.30', unit: 'fl_oz/gal' }, amount: { value: '0.90', unit: 'fl_oz' }, counted: null, lot: 'L-2205' }],
  areas: [{ place: { code: 'outside-wall', text: 'Outside wall and ground beside it' }, setting: 'outdoors', size: { value: '1116', unit: 'sq_ft' }, how: 'measured' }],
  weather: [{ at: '2026-05-14T08:32:00-04:00', where: 'site', temperature: { value: '64', unit: 'deg_F' }, wind: { speed: { value: '4', unit: 'mph' }, from: 'SW' }, humidity: null, sky: 'clear', source: 'observed' }], noWeather: null,
  reentry: { until: 'dry' }, protective: [{ code: 'gloves', text: 'Chemical-resistant gloves' }], prevention: [{ code: 'sealed-gaps', text: 'Gaps sealed' }], advice: 'Trim the ivy back from the wall by a hand.\nSeal the gap at the cellar door by June 1.', attestation: 'a1',
}

export const noticeEntry = (facts: Partial<EntryFacts> = {}, snapshot: Partial<EntrySnapshot> = {}, status: NoticeEntry['status'] = 'on-record'): NoticeEntry => ({
  facts: { ...FACTS, ...facts }, snapshot: { ...FIRM, place: PLACE, equipment: null, people: [PERSON], lines: [PRODUCT], mix: null, ...snapshot }, reference: '260514-7KQ4M2', hash: '8f3a61c4'.padEnd(64, '0'), status,
})

export const noticeSource = (entries: NoticeEntry[] = [noticeEntry()], visit: Partial<VisitFacts> = {}, place: Partial<VisitSnapshot['place']> = {}): NoticeSource => ({
  visit: {
    facts: {
      v: 1, id: FACTS.visitId ?? '', language: 'en', place: FACTS.place, branchId: FACTS.branchId, arrivedAt: '2026-05-14T08:30:00-04:00', leftAt: '2026-05-14T09:12:00-04:00', zone: FACTS.zone,
      present: [{ id: `${BOOK}7` }], nothing: null, followUpOn: '2026-07-13', entries: [], mixes: [], ...visit,
    },
    snapshot: { ...FIRM, place: { ...PLACE, ...place }, people: [PERSON] },
  },
  entries,
})
export { PERSON, PRODUCT }
