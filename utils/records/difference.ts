import type { Quantity } from '#shared/units/quantity'
import type { Rate } from '#shared/units/rate'
import type { EntryFacts, Reentry, WeatherReading } from '#shared/records/entry'
import type { Coded } from '#shared/records/shapes'
import type { EntrySnapshot } from '#shared/records/snapshot'

/** What a value is, for whoever words it: text as recorded, a figure with its unit, an instant on the place's clock, a code of ours, a reading. */
export type Shown =
  | { kind: 'text', text: string }
  | { kind: 'figure', figure: Quantity | Rate }
  | { kind: 'instant', at: string, zone: string }
  | { kind: 'code', of: 'how' | 'setting' | 'no-weather', code: string }
  | { kind: 'did', did: EntryFacts['people'][number]['did'] }
  | { kind: 'count', counted: NonNullable<EntryFacts['lines'][number]['counted']> }
  | { kind: 'reentry', reentry: Reentry }
  | { kind: 'reading', reading: WeatherReading, zone: string }

export const FACT_LABELS = [
  'place', 'branch', 'startedAt', 'finishedAt', 'zone', 'method', 'equipment', 'targets', 'mix', 'drawn', 'finished', 'product', 'labelVersion', 'rate', 'amount', 'counted', 'lot',
  'area', 'setting', 'size', 'how', 'weather', 'noWeather', 'person', 'did', 'licence', 'responsible', 'reentry', 'protective', 'prevention', 'advice',
] as const
export type FactLabel = (typeof FACT_LABELS)[number]

/** One fact of an entry by its path inside the facts. `n` counts lines, areas, readings and people from 1, for "Product 2"; null where there is only one such fact. */
export interface FactRow { path: string, label: FactLabel, n: number | null, value: Shown[] }

/** One fact that differs; an empty side means that nothing stood there. */
export interface Difference { path: string, label: FactLabel, n: number | null, before: Shown[], after: Shown[] }

export interface Side { facts: EntryFacts, snapshot: EntrySnapshot }

const words = (text: string | null | undefined): Shown[] => text ? [{ kind: 'text', text }] : []
const figure = (of: Quantity | Rate | null): Shown[] => of ? [{ kind: 'figure', figure: of }] : []
const coded = (list: readonly Coded[]): Shown[] => list.map(({ text }) => ({ kind: 'text', text }))

/** Every fact of an entry in the order in which it is read, references under the names that its snapshot gives them. */
export function factRows({ facts, snapshot }: Side): FactRow[] {
  const { zone } = facts
  const row = (path: string, label: FactLabel, value: Shown[], n: number | null = null): FactRow => ({ path, label, n, value })
  return [
    row('place', 'place', words(snapshot.place.name)),
    row('branchId', 'branch', words(snapshot.branch.name)),
    row('startedAt', 'startedAt', [{ kind: 'instant', at: facts.startedAt, zone }]),
    row('finishedAt', 'finishedAt', [{ kind: 'instant', at: facts.finishedAt, zone }]),
    row('zone', 'zone', words(zone)),
    row('targets', 'targets', coded(facts.targets)),
    row('method', 'method', coded([facts.method])),
    row('equipment', 'equipment', words(snapshot.equipment?.name)),
    row('mixId', 'mix', snapshot.mix ? [...coded(snapshot.mix.lines.map(l => ({ code: null, text: l.product.name }))), ...figure(snapshot.mix.finished)] : []),
    row('drawn', 'drawn', figure(facts.drawn)),
    row('finished', 'finished', figure(facts.finished)),
    ...lineRows(facts, snapshot),
    ...facts.areas.flatMap((area, n) => [
      row(`areas.${n}.place`, 'area', words(area.place.text), n + 1),
      row(`areas.${n}.setting`, 'setting', [{ kind: 'code', of: 'setting', code: area.setting }], n + 1),
      row(`areas.${n}.size`, 'size', figure(area.size), n + 1),
      row(`areas.${n}.how`, 'how', [{ kind: 'code', of: 'how', code: area.how }], n + 1),
    ]),
    ...facts.weather.map((reading, n) => row(`weather.${n}`, 'weather', [{ kind: 'reading', reading, zone }], n + 1)),
    row('noWeather', 'noWeather', facts.noWeather ? [{ kind: 'code', of: 'no-weather', code: facts.noWeather }] : []),
    ...personRows(facts, snapshot),
    row('reentry', 'reentry', [{ kind: 'reentry', reentry: facts.reentry }]),
    row('protective', 'protective', coded(facts.protective)),
    row('prevention', 'prevention', coded(facts.prevention)),
    row('advice', 'advice', words(facts.advice)),
  ]
}

function lineRows(facts: EntryFacts, snapshot: EntrySnapshot): FactRow[] {
  return facts.lines.flatMap((line, at) => {
    const shot = snapshot.lines[at]
    const row = (part: string, label: FactLabel, value: Shown[]): FactRow => ({ path: `lines.${at}.${part}`, label, n: at + 1, value })
    return [
      row('product', 'product', words([shot?.product.name, shot?.product.number].filter(Boolean).join(' · '))),
      row('labelVersionId', 'labelVersion', words(shot?.label?.labelDate)),
      row('rate', 'rate', figure(line.rate)),
      row('amount', 'amount', figure(line.amount)),
      row('counted', 'counted', line.counted ? [{ kind: 'count', counted: line.counted }] : []),
      row('lot', 'lot', words(line.lot)),
    ]
  })
}

function personRows(facts: EntryFacts, snapshot: EntrySnapshot): FactRow[] {
  const responsible = facts.people.findIndex(p => p.responsible)
  return [
    ...facts.people.flatMap((person, n): FactRow[] => [
      { path: `people.${n}.person`, label: 'person', n: n + 1, value: words(snapshot.people[n]?.name) },
      { path: `people.${n}.did`, label: 'did', n: n + 1, value: [{ kind: 'did', did: person.did }] },
      { path: `people.${n}.licenceId`, label: 'licence', n: n + 1, value: words(snapshot.people[n]?.licence?.number) },
    ]),
    { path: 'people.responsible', label: 'responsible', n: null, value: words(snapshot.people[responsible]?.name) },
  ]
}

/** The facts in which two versions of an entry differ, in reading order; what only the earlier one had comes last. */
export function differences(before: Side, after: Side): Difference[] {
  const [old, fresh] = [factRows(before), factRows(after)]
  const was = new Map(old.map(row => [row.path, row]))
  const still = new Set(fresh.map(row => row.path))
  const changed = fresh.map(row => ({ path: row.path, label: row.label, n: row.n, before: was.get(row.path)?.value ?? [], after: row.value }))
  const gone = old.filter(row => !still.has(row.path)).map(row => ({ path: row.path, label: row.label, n: row.n, before: row.value, after: [] }))
  return [...changed, ...gone].filter(d => JSON.stringify(d.before) !== JSON.stringify(d.after))
}
