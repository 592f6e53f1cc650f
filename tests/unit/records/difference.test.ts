import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { differences, factRows } from '#shared/records/difference'
import type { Side } from '#shared/records/difference'
import { snapshotEntry } from '#shared/records/snapshot'
import { localDay } from '#shared/time/zoned'
import { booksOf } from '#server/database/firm/repositories/books'
import { makeBooks, visitSubmission } from '../../support/books'
import { makeFirm, withHouse } from '../../support/firm'
import { removeDirs, temporaryDirs } from '../../support/server'

const dirs = temporaryDirs()
let side: Side

beforeAll(async () => {
  const firm = await makeFirm(dirs)
  const books = await makeBooks(dirs, firm)
  const [entry] = visitSubmission(books, { treatments: ['spray'] }).entries
  if (!entry) throw new Error('no entry')
  await withHouse(dirs, (house) => {
    side = { facts: entry.facts, snapshot: snapshotEntry(entry.facts, booksOf(house.firm(firm.slug).raw), localDay(entry.facts.finishedAt, firm.zone)) }
  })
})
afterAll(() => removeDirs(dirs))

const changed = (facts: Partial<Side['facts']>): Side => ({ ...side, facts: { ...side.facts, ...facts } })

describe('what differs between two versions of an entry', () => {
  it('is nothing between an entry and itself', () => {
    expect(differences(side, side)).toEqual([])
  })

  it('names each fact by its path, once', () => {
    const paths = factRows(side).map(row => row.path)
    expect(new Set(paths).size).toBe(paths.length)
  })

  it('shows a changed amount before and after, with its digits', () => {
    const [line] = side.facts.lines
    if (!line) throw new Error('no line')
    expect(differences(side, changed({ lines: [{ ...line, amount: { value: '0.750', unit: 'fl_oz' } }] }))).toEqual([{
      path: 'lines.0.amount', label: 'amount', n: 1,
      before: [{ kind: 'figure', figure: { value: '0.75', unit: 'fl_oz' } }], after: [{ kind: 'figure', figure: { value: '0.750', unit: 'fl_oz' } }],
    }])
  })

  it('shows what was added and what went, each with an empty side', () => {
    const gone = differences(side, changed({ weather: [], noWeather: 'not-taken' }))
    expect(gone.map(d => [d.path, d.before.length, d.after.length])).toEqual([['noWeather', 0, 1], ['weather.0', 1, 0]])
    expect(differences(side, changed({ areas: [] })).map(d => d.path)).toEqual(['areas.0.place', 'areas.0.setting', 'areas.0.size', 'areas.0.how'])
  })
})
