import { execFileSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { readFileSync, readdirSync } from 'node:fs'
import { join } from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { checkRegistrationNumber } from '#shared/registration/number'
import { plusDays, plusMonths } from '#shared/time/days'
import { localDay } from '#shared/time/zoned'
import { EntrySubmissionSchema } from '#shared/records/entry'
import { openReader } from '#server/database/connection'
import { verifyFirm } from '#server/services/verify/verify-firm'
import { entriesIn, visitsIn } from '../../../seeds/demo/events'
import { makeDemonstration } from '../../../seeds/demo/make'
import { IDLE_COUNTY } from '../../../seeds/demo/places'
import { FIRST_FIRM, SECOND_FIRM, planDemonstration } from '../../../seeds/demo/plan'
import { PRODUCTS } from '../../../seeds/demo/products'
import { removeDirs, temporaryDirs } from '../../support/server'

const DAY = '2026-12-01'
const folders = [temporaryDirs(), temporaryDirs()] as const
afterAll(() => folders.forEach(removeDirs))

const opened = <T>(dirs: (typeof folders)[number], slug: string, work: (raw: ReturnType<typeof openReader>) => T): T => {
  const raw = openReader(join(dirs.dataDir, 'firms', `${slug}.sqlite`))
  try {
    return work(raw)
  }
  finally {
    raw.close()
  }
}

describe('the command', () => {
  it('loads in plain node, where only the package’s own import names are known', () => {
    const said = execFileSync(process.execPath, ['--import', 'tsx', '--input-type=module', '-e', 'const made = await import("./seeds/demo/make.ts"); console.log(typeof made.makeDemonstration)'], { encoding: 'utf8' })
    expect(said.trim()).toBe('function')
  })
})

describe('twenty days of the demonstration, carried out', () => {
  it('gives the same chain for the same seed and day, and verifies', async () => {
    const [first, second] = await Promise.all(folders.map((dirs, n) => makeDemonstration({ seed: 'a seed', day: DAY, since: plusDays(DAY, -20), now: new Date(`${DAY}T1${n}:00:00Z`), password: 'no hash', house: { ...dirs, logHost: 'demo.test.example' } })))
    expect(first).toEqual(second)
    for (const slug of [FIRST_FIRM, SECOND_FIRM]) {
      const [one, other] = folders.map(dirs => opened(dirs, slug, verifyFirm))
      expect(one).toMatchObject({ good: true, problems: [] })
      if (slug === FIRST_FIRM) expect(one?.leaves).toBeGreaterThan(200)
      expect(other?.head).toBe(one?.head)
    }
  })

  it('shows the stop, its explanation, and every other finding that an officer looks for', () => {
    opened(folders[0], FIRST_FIRM, (raw) => {
      const messages = raw.prepare<[], { message: string }>('select distinct message from finding').all().map(row => row.message)
      expect(messages).toEqual(expect.arrayContaining(['product-not-registered', 'rate-above', 'product-as-read', 'late']))
      const standing = raw.prepare<[], { status: string, confirmation: string }>('select distinct status, confirmation from entry_head where until_seq is null').all().map(row => `${row.status} ${row.confirmation}`)
      expect(standing).toEqual(expect.arrayContaining(['amended owed', 'amended confirmed', 'amended disputed', 'amended none-owed', 'struck none-owed']))
    })
  })

  it('leaves the last days’ notices waiting, has told people of the days before by mail and on paper, and nothing is due to be sent', () => {
    opened(folders[0], FIRST_FIRM, (raw) => {
      const days = raw.prepare<[string], { day: string }>('select distinct substr(planned_at, 1, 10) day from notice where state = ? order by day')
      const spans = ['sent', 'planned'].map(state => days.all(state).map(row => row.day)).map(all => [all.at(0), all.at(-1)])
      expect(spans).toEqual([['2026-11-26', '2026-11-26'], ['2026-11-27', '2026-11-30']])
      expect(raw.prepare('select state, count(*) > 0 some from outbox group by state').all()).toEqual([{ state: 'held', some: 1 }, { state: 'sent', some: 1 }])
    })
  })

  it('has a leaf for each notice that was told, with the hash of what arrived in the mailbox or of the paper', () => {
    opened(folders[0], FIRST_FIRM, (raw) => {
      const mailbox = join(folders[0].dataDir, 'demo-mail')
      const arrived = readdirSync(mailbox).map(name => createHash('sha256').update(readFileSync(join(mailbox, name))).digest('hex'))
      const papers = raw.prepare<[], { content_hash: string }>('select content_hash from notice_paper').all().map(row => row.content_hash)
      const leaves = raw.prepare<[], { hash: string }>('select json_extract(body, \'$.facts.contentHash\') hash from leaf join leaf_body using (seq) where kind = \'notice\'').all().map(row => row.hash)
      expect(arrived.length).toBeGreaterThan(5)
      expect(papers.length).toBeGreaterThan(0)
      expect(leaves.sort()).toEqual([...arrived, ...papers].sort())
    })
  })
})

describe('the whole plan, as data', () => {
  const [firm, second] = planDemonstration({ seed: 'tankside', day: DAY })
  if (!firm || !second) throw new Error('two firms are planned')
  const { book, events } = firm
  const visits = visitsIn(events)
  const entries = entriesIn(events)
  const dayOf = (at: number) => new Date(at).toISOString().slice(0, 10)
  const countyOf = new Map(book.rows.place.map(place => [place.id, place.county]))

  it('is eighteen months of some six thousand entries, none later than the day begins in the west', () => {
    expect(entries.length).toBeGreaterThan(5500)
    expect(entries.length).toBeLessThan(6700)
    expect(dayOf(events[0]?.at ?? 0) < plusDays(plusMonths(DAY, -18), 4)).toBe(true)
    expect(Math.max(...events.map(event => event.at))).toBeLessThan(Date.parse(`${DAY}T08:00:00Z`))
    expect(entriesIn(second.events).length).toBeGreaterThan(40)
  })

  it('submits only what the contract takes', () => {
    for (const entry of entries) expect(EntrySubmissionSchema.safeParse(entry).error).toBeUndefined()
  })

  it('names only invented products: marked, with company numbers from 990001 up that are well formed', () => {
    expect(book.rows.product.every(product => product.demo === 1)).toBe(true)
    for (const { kind, number, states } of PRODUCTS) {
      expect(checkRegistrationNumber({ kind, number, state: kind === 'special-local-need' ? states?.[0] ?? null : null }).ok).toBe(true)
      if (kind === 'registered' || kind === 'distributor') expect(number).toMatch(/^990\d{3}-/)
    }
    expect(new Set(PRODUCTS.map(product => product.kind))).toEqual(new Set(['registered', 'distributor', 'special-local-need', 'minimum-risk', 'adjuvant', 'device']))
    expect(book.rows.label_version.some(label => label.checked === 0)).toBe(true)
    expect(book.rows.label_version.length).toBe(PRODUCTS.length + 1)
  })

  it('has every kind of work that it is there to show', () => {
    expect(entries.some(entry => entry.facts.noWeather === 'indoors')).toBe(true)
    expect(entries.some(entry => entry.facts.noWeather === 'not-taken')).toBe(true)
    expect(entries.some(entry => entry.facts.lines.length === 2)).toBe(true)
    expect(entries.some(entry => entry.facts.people.some(person => person.did.includes('supervised') && person.responsible))).toBe(true)
    expect(entries.some(entry => 'read' in entry.facts.place)).toBe(true)
    expect(entries.some(entry => entry.words.note !== null)).toBe(true)
    expect(visits.some(visit => visit.submission.visit.facts.nothing !== null)).toBe(true)
    for (const event of events) {
      if (event.kind === 'mix') expect(entries.filter(entry => entry.facts.mixId === event.submission.facts.id).length).toBeGreaterThan(2)
    }
    expect(events.filter(event => event.kind === 'mix')).toHaveLength(2)
    expect(events.filter(event => event.kind === 'strike')).toHaveLength(1)
  })

  it('has a licence about to lapse, a registration that ended, and a county idle for a month', () => {
    expect(book.rows.licence.some(licence => licence.expires > DAY && licence.expires <= plusDays(DAY, 60))).toBe(true)
    expect(book.rows.product_registration.filter(row => row.to_day !== null)).toMatchObject([{ region: 'NY', to_day: plusMonths(DAY, -3) }])
    const months = new Set(entries.flatMap(({ facts }) => 'id' in facts.place && countyOf.get(facts.place.id) === IDLE_COUNTY ? [localDay(facts.finishedAt, facts.zone).slice(0, 7)] : []))
    expect(months.has('2026-07')).toBe(true)
    expect(months.has('2026-08')).toBe(false)
    expect(months.has('2026-09')).toBe(true)
  })

  it('has six places due to the applicator around the day, most with two outdoor treatments', () => {
    const due = visits.filter(({ submission: { visit: { facts } } }) => facts.followUpOn !== null && facts.followUpOn >= plusDays(DAY, -3) && facts.followUpOn <= plusDays(DAY, 5))
    expect(due.map(visit => visit.who)).toEqual(Array.from({ length: 6 }, () => 'tomas'))
    const twice = due.filter(({ submission }) => submission.entries.length === 2 && submission.entries.every(entry => entry.facts.areas.every(area => area.setting === 'outdoors')))
    expect(twice.length).toBeGreaterThanOrEqual(4)
  })
})
