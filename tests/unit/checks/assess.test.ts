import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { assess, markSeen } from '#shared/checks/assess'
import type { CheckContext, Finding } from '#shared/checks/finding'
import type { EntryFacts } from '#shared/records/entry'
import type { EntrySnapshot } from '#shared/records/snapshot'
import { localDay } from '#shared/time/zoned'
import { entrySubmission } from '../../support/submission'

const named = { branchId: '00000000-0000-4000-8000-000000000001', placeId: '00000000-0000-4000-8000-000000000002', personId: '00000000-0000-4000-8000-000000000003', licenceId: '00000000-0000-4000-8000-000000000004', labelVersionId: '00000000-0000-4000-8000-000000000005' }
const now = new Date('2026-05-14T14:00:00Z')

/** An entry with nothing to find: 0.90 fl oz in 3.0 gal, label 0.15 to 0.60 fl oz per gal. All invented. */
const clean: EntrySnapshot = {
  firm: { id: named.branchId, name: 'Demo', address: '', phone: '', country: 'US' },
  branch: { id: named.branchId, name: 'Albany', address: '', phone: '', region: 'NY', registrations: [] },
  place: { id: named.placeId, name: '9 Foundry Row', address: '9 Foundry Row', town: 'Albany', county: 'Albany', region: 'NY', country: 'US', kind: 'property', siteKind: { code: 'residence-outdoors', text: 'Residence, outdoors' }, parties: [] },
  equipment: null,
  people: [{ id: named.personId, name: 'Tomás Nguyễn', licence: { id: named.licenceId, region: 'NY', number: 'C5-81172', className: 'Certified', categories: ['7A'], issued: '2024-01-01', expires: '2026-12-31' } }],
  lines: [{
    product: { id: named.labelVersionId, name: 'Sillgard', kind: 'registered', number: '990014-27', numberRegion: null, registrant: 'Demo', form: 'concentrate', signalWord: 'CAUTION', restrictedUse: false, demo: true, ingredients: [], registrations: [{ region: 'NY', number: null, from: '2020-01-01', to: null }] },
    label: { id: named.labelVersionId, labelDate: '2024-03-01', from: '2024-03-01', to: null, checked: true, reentry: { until: 'dry' }, protective: [], cautions: '', uses: [{ sites: [], targets: ['ants'], methods: ['foundation-band'], limits: [{ of: 'product', unit: 'fl_oz', per: 'gal', over: 'application', min: '0.15', max: '0.60', where: null, words: '0.15 to 0.60 fl oz per gallon' }] }] },
  }],
  mix: null,
}

function context(change: { facts?: Partial<EntryFacts>, snapshot?: (s: EntrySnapshot) => void, receivedAt?: string } = {}): CheckContext {
  const { facts, words } = entrySubmission({ ...named, now, facts: change.facts ?? {} }, null)
  const snapshot = structuredClone(clean)
  change.snapshot?.(snapshot)
  return { facts, words, snapshot, day: localDay(facts.finishedAt, facts.zone), receivedAt: change.receivedAt ?? now.toISOString() }
}
const found = (c: CheckContext) => assess(c).map(f => `${f.outcome} ${f.message}`)
const line = (amount: string | null, unit: 'fl_oz' | 'mL' | 'oz_wt' = 'fl_oz', rate: EntryFacts['lines'][number]['rate'] = null): Partial<EntryFacts> =>
  ({ lines: [{ labelVersionId: named.labelVersionId, product: null, rate, amount: amount === null ? null : { value: amount, unit }, counted: null, lot: null }] })
const label = (s: EntrySnapshot) => s.lines[0]!.label!
const licence = (s: EntrySnapshot) => s.people[0]!.licence!

it('finds nothing where nothing is wrong', () => {
  expect(found(context())).toEqual([])
})

describe('licence in force, as of the day of the work', () => {
  it.each<[string, (s: EntrySnapshot) => void, string[]]>([
    ['on its last day', (s) => { licence(s).expires = '2026-05-14' }, []],
    ['the day after', (s) => { licence(s).expires = '2026-05-13' }, ['stop licence-expired']],
    ['on its first day', (s) => { licence(s).issued = '2026-05-14' }, []],
    ['the day before its first', (s) => { licence(s).issued = '2026-05-15' }, ['stop licence-not-yet']],
    ['of another state', (s) => { licence(s).region = 'TX' }, ['stop licence-other-state']],
    ['none named', (s) => { s.people[0]!.licence = null }, ['stop licence-none']],
  ])('%s', (_, snapshot, expected) => expect(found(context({ snapshot }))).toEqual(expected))
})

describe('product registered there that day', () => {
  it.each<[string, (s: EntrySnapshot) => void, string[]]>([
    ['in another state only', (s) => { s.lines[0]!.product.registrations = [{ region: 'TX', number: null, from: '2020-01-01', to: null }] }, ['stop product-not-registered']],
    ['nowhere', (s) => { s.lines[0]!.product.registrations = [] }, ['stop product-not-registered']],
    ['exempt 25(b): not judged until rule packs say where it must be', (s) => { s.lines[0]!.product.kind = 'minimum-risk'; s.lines[0]!.product.number = null; s.lines[0]!.product.registrations = [] }, []],
    ['written as read', (s) => { s.lines[0]!.product.id = null; s.lines[0]!.product.registrations = []; s.lines[0]!.label = null }, ['query product-as-read']],
  ])('%s', (_, snapshot, expected) => expect(found(context({ snapshot }))).toEqual(expected))
})

describe('rate inside the label’s range, compared exactly', () => {
  it.each<[string, Partial<EntryFacts>, string[]]>([
    ['at the maximum: 1.80 fl oz in 3 gal', line('1.80'), []],
    ['a hair above it', line('1.80001'), ['stop rate-above']],
    ['at the minimum', line('0.45'), []],
    ['below it', line('0.44'), ['stop rate-below']],
    // 53 mL in 3 gal is 0.597 fl oz per gal, 54 mL is 0.609 (1 fl oz = 29.5735295625 mL, NIST HB 44 appendix C)
    ['in millilitres, inside', line('53', 'mL'), []],
    ['in millilitres, above', line('54', 'mL'), ['stop rate-above']],
    ['ounces by weight are not fluid ounces: no rate, not checked', line('0.90', 'oz_wt'), ['note rate-not-checked']],
    ['no amount: the stated rate is judged, the gap is named', line(null, 'fl_oz', { value: '0.70', unit: 'fl_oz/gal' }), ['stop rate-above', 'query missing-amount']],
    ['neither amount nor rate', line(null), ['query missing-amount', 'note rate-not-checked']],
  ])('%s', (_, facts, expected) => expect(found(context({ facts }))).toEqual(expected))

  it('a label that nobody has checked asks, it does not stop', () => {
    expect(found(context({ facts: line('9'), snapshot: (s) => { label(s).checked = false } }))).toEqual(['query rate-above'])
  })
  it('a use that is not on the label is not judged by another use’s range', () => {
    expect(found(context({ facts: { targets: [{ code: 'wasps', text: 'Wasps' }] } }))).toEqual(['note rate-not-checked-no-use'])
  })
  it('rests on the label’s own words', () => {
    expect(assess(context({ facts: line('9') }))[0]).toMatchObject({ value: '3', limit: '0.60', unit: 'fl_oz/gal', basis: { kind: 'label', words: '0.15 to 0.60 fl oz per gallon', labelDate: '2024-03-01' } })
  })
  it('per area, over all areas treated', () => {
    const perArea = (s: EntrySnapshot) => { label(s).uses[0]!.limits = [{ of: 'product', unit: 'fl_oz', per: '1000_sq_ft', over: 'application', min: null, max: '0.80', where: null, words: 'up to 0.80 fl oz per 1,000 sq ft' }] }
    expect(found(context({ snapshot: perArea }))).toEqual(['stop rate-above'])
    const areas = [1116, 10].map(value => ({ place: { code: null, text: 'Lawn' }, setting: 'outdoors' as const, size: { value: String(value), unit: 'sq_ft' as const }, how: 'measured' as const }))
    expect(found(context({ snapshot: perArea, facts: { areas } }))).toEqual([])
  })
  it('the unit of the input never changes the result', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 999 }), (hundredths) => {
      const flOz = (hundredths / 100).toFixed(2)
      // 1 fl oz is 2 tbsp, exactly (NIST HB 44 appendix C)
      const tbsp = (hundredths / 50).toFixed(2)
      const inUnit = (value: string, unit: 'fl_oz' | 'tbsp') => assess(context({ facts: { lines: [{ labelVersionId: named.labelVersionId, product: null, rate: null, amount: { value, unit }, counted: null, lot: null }] } })).map(f => [f.message, f.value])
      expect(inUnit(tbsp, 'tbsp')).toEqual(inUnit(flOz, 'fl_oz'))
    }))
  })
})

describe('required fields', () => {
  it.each<[string, Partial<EntryFacts>, string[]]>([
    ['no target', { targets: [] }, ['query missing-target', 'note rate-not-checked-no-use']],
    ['no area', { areas: [] }, ['query missing-area']],
    ['weather not taken', { weather: [], noWeather: 'not-taken' }, ['query missing-weather']],
    ['indoors is a reason', { weather: [], noWeather: 'indoors', areas: [{ place: { code: null, text: 'Kitchen' }, setting: 'indoors', size: { value: '90', unit: 'sq_ft' }, how: 'measured' }] }, []],
    ['"indoors" for work outdoors', { weather: [], noWeather: 'indoors' }, ['query missing-weather-outdoors']],
    ['calm is a wind value', { weather: [{ at: now.toISOString(), where: 'site', temperature: null, wind: { calm: true }, humidity: null, sky: null, source: 'observed' }] }, []],
    ['wind not taken', { weather: [{ at: now.toISOString(), where: 'site', temperature: { value: '60', unit: 'deg_F' }, wind: null, humidity: null, sky: null, source: 'observed' }] }, ['query missing-wind']],
  ])('%s', (_, facts, expected) => expect(found(context({ facts }))).toEqual(expected))
})

describe('late: on record more than 24 elapsed hours after finishing, the house’s own measure', () => {
  const after = (minutes: number) => context({ receivedAt: new Date(now.getTime() - 10 * 60_000 + minutes * 60_000).toISOString() })
  it('24 hours exactly are in time', () => expect(found(after(24 * 60))).toEqual([]))
  it('a minute more is late', () => expect(found(after(24 * 60 + 1))).toEqual(['note late']))
  it('a clock change does not count: elapsed time (regulations: 24/48/72 h are elapsed hours)', () => {
    const finishedAt = '2026-03-07T12:00:00-05:00'
    const c = context({ facts: { startedAt: '2026-03-07T11:00:00-05:00', finishedAt } })
    expect(found({ ...c, receivedAt: '2026-03-08T13:00:00-04:00' })).toEqual([])
    expect(found({ ...c, receivedAt: '2026-03-08T13:01:00-04:00' })).toEqual(['note late'])
  })
})

it('heaviest first; what was not on the screen is marked', () => {
  const findings = assess(context({ facts: { ...line('9'), targets: [{ code: 'ants', text: 'Ants' }], areas: [] }, receivedAt: '2026-06-14T14:00:00Z' }))
  expect(findings.map(f => f.outcome)).toEqual(['stop', 'query', 'note'])
  const seen = markSeen(findings, [{ check: 'rate-in-range', message: 'rate-above', outcome: 'stop', line: 0 }])
  expect(seen.map((f: Finding) => f.seen)).toEqual([true, false, false])
})
