import { parse } from 'csv-parse/sync'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { DaybookRow, EntryPage, TodayList } from '#shared/api/contract/daybook'
import { DAYBOOK_SORTS } from '#shared/api/contract/daybook'
import { makeBooks, newUuid, postVisit, visitSubmission } from '../support/books'
import type { MadeBooks } from '../support/books'
import { makeFirm, put, withHouse } from '../support/firm'
import type { MadeFirm } from '../support/firm'
import { removeDirs, signIn, startServer, temporaryDirs } from '../support/server'
import type { Client, TestServer } from '../support/server'

const DAY = 86_400_000
const dirs = temporaryDirs()
let server: TestServer
let firm: MadeFirm
let books: MadeBooks
let officer: Client
let applicator: Client
const roots: string[] = []

const daysAgo = (n: number, hour = 0) => new Date(Date.now() - n * DAY - hour * 3_600_000 - 3_600_000)
const get = async <T>(client: Client, path: string): Promise<T> => {
  const answer = await client(path)
  if (answer.status !== 200) throw new Error(`${path}: ${answer.status} ${await answer.text()}`)
  return await answer.json() as T
}
const rows = async (query: string, client = officer) => (await get<{ rows: DaybookRow[] }>(client, `/api/applications?${query}`)).rows

beforeAll(async () => {
  firm = await makeFirm(dirs)
  await makeFirm(dirs, { slug: 'salt-marsh', name: 'Salt Marsh Turf' })
  books = await makeBooks(dirs, firm)
  // The owner works too.
  await withHouse(dirs, house => put(house.firm(firm.slug).raw, 'person_role', { id: newUuid(), person_id: firm.people.owner.id, role: 'applicator', branch_id: firm.branchId, from_day: '2020-01-01' }))
  server = await startServer({ dirs })
  officer = await signIn(server, firm.people.officer.email)
  applicator = await signIn(server, firm.people.applicator.email)
  const owner = await signIn(server, firm.people.owner.email)
  for (let n = 1; n <= 6; n++) roots.push(...(await postVisit(applicator, visitSubmission(books, { ended: daysAgo(n), place: n % 2 ? books.house : books.kitchen, followUpAfter: 6, change: e => ({ ...e, words: { ...e.words, note: n === 3 ? '=HYPERLINK("x") said the dog' : null } }) }))).entries.map(e => e.facts.id))
  roots.push(...(await postVisit(owner, visitSubmission(books, { who: 'owner', ended: daysAgo(2, 3), treatments: ['spray'], change: e => ({ ...e, facts: { ...e.facts, targets: [{ code: null, text: '=1+1' }], lines: e.facts.lines.map(l => ({ ...l, amount: { value: '7.50', unit: 'fl_oz' as const } })) } }) }))).entries.map(e => e.facts.id))
  await postVisit(applicator, visitSubmission(books, { treatments: [], place: books.kitchen, ended: daysAgo(1, 5) }))
}, 60_000)
afterAll(async () => {
  await server.stop()
  removeDirs(dirs)
})

describe('the Daybook', () => {
  it('lists what stands, latest first, a visit with nothing applied as a row of its own kind', async () => {
    const all = await rows('limit=200')
    expect(all.filter(r => r.kind === 'entry').map(r => r.root).sort()).toEqual([...roots].sort())
    expect(all.filter(r => r.kind === 'nothing')).toHaveLength(1)
    expect(all.map(r => r.finishedAt)).toEqual(all.map(r => r.finishedAt).toSorted().toReversed())
  })

  it.each(DAYBOOK_SORTS.flatMap(s => [s, `-${s}`]))('sorted by %s, page by page, has each row once', async (sort) => {
    const whole = (await rows(`sort=${sort}&limit=200`)).map(r => r.root)
    const paged: string[] = []
    let cursor = ''
    do {
      const page = await get<{ rows: DaybookRow[], next: string | null }>(officer, `/api/applications?sort=${sort}&limit=3${cursor}`)
      paged.push(...page.rows.map(r => r.root))
      cursor = page.next ? `&cursor=${page.next}` : ''
    } while (cursor !== '')
    expect(paged).toEqual(whole)
    expect(new Set(paged).size).toBe(14)
  })

  it.each<[string, () => string, number]>([
    ['a place', () => `placeId=${books.house.id}`, 7], ['a registration number', () => `number=${books.granules.number}`, 6], ['a number as a label prints it', () => `number=${encodeURIComponent(`EPA Reg. No. ${books.granules.number}`)}`, 6], ['a person', () => `personId=${firm.people.owner.id}`, 1],
    ['stops', () => 'finding=stop', 1], ['late ones', () => 'late=true', 13], ['nothing owed', () => 'owed=true', 0], ['status', () => 'status=struck', 0],
    ['a word of a product', () => 'q=bedrow', 6], ['the beginning of words, in any order', () => 'q=kitch+copp', 7], ['what somebody types that the search would read as its own language', () => `q=${encodeURIComponent('" OR (')}`, 0], ['a note', () => 'q=hyperlink', 2],
  ])('narrowed by %s', async (_, query, count) => {
    expect(await rows(`limit=200&${query()}`)).toHaveLength(count)
  })

  it('finds a reference, however it is typed', async () => {
    const [row] = await rows('limit=1')
    for (const typed of [row?.reference ?? '', (row?.reference ?? '').toLowerCase().replace('-', '')]) expect((await rows(`q=${typed}`)).map(r => r.reference)).toContain(row?.reference)
  })

  it('counts what the same filters find', async () => {
    expect(await get(officer, `/api/applications/totals?placeId=${books.house.id}`)).toEqual({ count: 7, more: false, stops: 1, queries: 0, products: 2 })
  })

  it('answers a cursor that is none, and a sort that is none, with the field and the reason', async () => {
    for (const [query, path] of [['cursor=zzz', 'cursor'], ['sort=colour', 'sort'], ['from=yesterday', 'from'], ['q=a%00b', 'q'], ['limit=0', 'limit']]) {
      const answer = await officer(`/api/applications?${query}`)
      expect(answer.status).toBe(400)
      expect((await answer.json() as { issues: { path: string }[] }).issues[0]?.path).toBe(path)
    }
  })
})

describe('who sees what', () => {
  it('an applicator the own entries, a customer those at the own place without the firm’s words, another firm nothing', async () => {
    expect(await rows('limit=200', applicator)).toHaveLength(13)
    const customer = await signIn(server, firm.customer.email)
    const seen = await rows('limit=200', customer)
    expect(seen).toHaveLength(14)
    for (const row of seen) expect([row.findings, row.late]).toEqual(row.kind === 'entry' ? [null, false] : [[], false])
    expect(await rows('q=hyperlink', customer)).toEqual([])
    expect(await rows('q=bedrow', customer)).toHaveLength(6)
    expect(await get(customer, '/api/applications/totals')).toMatchObject({ stops: null, queries: null })
    const page = await get<EntryPage>(customer, `/api/applications/${roots[0]}`)
    expect([page.words, page.findings, page.history.map(h => h.words)]).toEqual([null, null, [null]])
    expect(await rows('limit=200', await signIn(server, 'officer@salt-marsh.example'))).toEqual([])
    expect((await (await signIn(server, 'owner@salt-marsh.example'))(`/api/applications/${roots[0]}`)).status).toBe(404)
    expect((await applicator(`/api/applications/${roots.at(-1)}`)).status).toBe(404)
  })
})

describe('one entry', () => {
  it('by its root or any leaf of it, with its history and what may be done', async () => {
    const root = roots[1] ?? ''
    const before = await get<EntryPage>(officer, `/api/applications/${root}`)
    expect(before).toMatchObject({ root, head: root, status: 'on-record', reference: expect.stringMatching(/^\d{6}-[0-9A-Z]{6}$/), may: { amend: true, strike: true, confirm: false, cannotBeHad: false } })
    const { facts, words } = before
    const amendment = { facts: { ...facts, id: newUuid(), lines: facts.lines.map(l => ({ ...l, amount: { value: '3.10', unit: 'lb' } })) }, words: { ...words, deviceNow: new Date().toISOString() }, amends: { root, head: root, reason: 'bag weighed again' } }
    expect((await officer(`/api/applications/${root}/amendments`, { json: amendment })).status).toBe(201)
    const after = await get<EntryPage>(applicator, `/api/applications/${amendment.facts.id}`)
    expect(after).toMatchObject({ root, head: amendment.facts.id, status: 'amended', confirmation: 'owed', owedBy: { name: firm.people.applicator.name }, may: { confirm: true } })
    expect(after.history.map(h => [h.kind, h.reason])).toEqual([['application', null], ['amendment', 'bag weighed again']])
    expect(JSON.stringify(after)).not.toMatch(/"seq"/)
    const today = await get<{ lists: TodayList[] }>(applicator, '/api/today')
    expect(today.lists.find(l => l.list === 'my-word')?.items.map(i => i.to)).toEqual([`/daybook/${root}`])
    expect((await get<{ lists: TodayList[] }>(officer, '/api/today')).lists.find(l => l.list === 'owed')?.count).toBe(1)
  })
})

describe('Today', () => {
  it('leads each role to what waits for it', async () => {
    const names = async (client: Client) => (await get<{ lists: TodayList[] }>(client, '/api/today')).lists.map(l => l.list)
    expect(await names(applicator)).toEqual(expect.arrayContaining(['due', 'recent']))
    expect(await names(officer)).toEqual(expect.arrayContaining(['without-word', 'late', 'notices-waiting', 'recent']))
    expect(await names(await signIn(server, firm.customer.email))).toEqual(['recent'])
  })
})

describe('the export', () => {
  it('is what was filtered, read back by another parser; text can’t be taken for a formula, figures keep their digits', async () => {
    const answer = await officer(`/api/applications/export.csv?number=${books.spray.number}`)
    expect([answer.status, answer.headers.get('content-type')]).toEqual([200, 'text/csv; charset=utf-8; header=present'])
    expect(answer.headers.get('content-disposition')).toMatch(/^attachment; filename="daybook-quarry-lane-\d{4}-\d\d-\d\d\.csv"$/)
    const records = parse(await answer.text(), { columns: true }) as Record<string, string>[]
    expect(records).toHaveLength(7)
    expect(records.find(r => r.targets?.includes('1+1'))).toMatchObject({ targets: '\'=1+1', amount: '7.50', amount_unit: 'fl_oz', registration_number: books.spray.number, findings: expect.stringContaining('stop rate-above') })
    expect(records.map(r => r.id)).toEqual((await rows(`limit=200&number=${books.spray.number}`)).map(r => r.root))
  })
  it('is not a customer’s or an applicator’s', async () => {
    for (const client of [applicator, await signIn(server, firm.customer.email)]) expect((await client('/api/applications/export.csv')).status).toBe(403)
  })
})
