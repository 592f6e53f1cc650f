import { existsSync, readdirSync } from 'node:fs'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { BrowserContext } from 'playwright-core'
import { DESK, PHONE, accessibilityFaults, alive, withPage } from '../support/browser'
import { makeBooks, postVisit, visitSubmission } from '../support/books'
import type { MadeBooks } from '../support/books'
import { makeFirm } from '../support/firm'
import type { MadeFirm } from '../support/firm'
import { TEST_PASSWORD, removeDirs, signIn, startServer, temporaryDirs } from '../support/server'
import type { TestServer } from '../support/server'

const dirs = temporaryDirs()
let server: TestServer
let firm: MadeFirm
let books: MadeBooks
let entryId = ''
let visitId = ''
let noticeId = ''

beforeAll(async () => {
  firm = await makeFirm(dirs)
  books = await makeBooks(dirs, firm)
  server = await startServer({ dirs })
  const applicator = await signIn(server, firm.people.applicator.email)
  const late = visitSubmission(books, { ended: new Date(Date.now() - 3 * 86_400_000), followUpAfter: 4 })
  const { visit, entries } = await postVisit(applicator, late)
  await postVisit(applicator, visitSubmission(books, { treatments: [], place: books.kitchen }))
  visitId = visit.facts.id
  entryId = entries[0]?.facts.id ?? ''
  const officer = await signIn(server, firm.people.officer.email)
  const { rows } = await (await officer('/api/notices')).json() as { rows: { id: string }[] }
  noticeId = rows[0]?.id ?? ''
})
afterAll(async () => {
  await server.stop()
  removeDirs(dirs)
})

/** Pages that exist in a demonstration only; `tests/browser/notices.test.ts` goes through them. */
const DEMO_ONLY = ['demo/mailbox/index', 'demo/mailbox/[id]']

/** Every other page of the program, with somebody who uses it and what stands for its parameter. A page that is missing here fails below. */
const PAGES: Record<string, { as: 'officer' | 'applicator' | 'owner' | 'customer' | 'nobody', path: () => string }> = {
  'index': { as: 'officer', path: () => '/' },
  'sign-in': { as: 'nobody', path: () => '/sign-in' },
  'forgot': { as: 'nobody', path: () => '/forgot' },
  'reset': { as: 'nobody', path: () => '/reset' },
  'invitation': { as: 'nobody', path: () => '/invitation' },
  'account': { as: 'owner', path: () => '/account' },
  'firm': { as: 'owner', path: () => '/firm' },
  'visits/new': { as: 'applicator', path: () => '/visits/new' },
  'visits/[id]': { as: 'officer', path: () => `/visits/${visitId}` },
  'daybook/index': { as: 'officer', path: () => '/daybook' },
  'daybook/[id]/index': { as: 'officer', path: () => `/daybook/${entryId}` },
  'daybook/[id]/amend': { as: 'officer', path: () => `/daybook/${entryId}/amend` },
  'places/index': { as: 'applicator', path: () => '/places' },
  'places/[id]': { as: 'officer', path: () => `/places/${books.house.id}` },
  'parties/index': { as: 'officer', path: () => '/parties' },
  'parties/[id]': { as: 'officer', path: () => `/parties/${firm.customer.id}` },
  'shelf/index': { as: 'officer', path: () => '/shelf' },
  'shelf/[id]': { as: 'officer', path: () => `/shelf/${books.spray.id}` },
  'people/index': { as: 'owner', path: () => '/people' },
  'people/[id]': { as: 'owner', path: () => `/people/${firm.people.applicator.id}` },
  'equipment/index': { as: 'officer', path: () => '/equipment' },
  'equipment/[id]': { as: 'officer', path: () => `/equipment/${books.sprayer.id}` },
  'notices/index': { as: 'officer', path: () => '/notices' },
  'notices/[id]': { as: 'officer', path: () => `/notices/${noticeId}` },
}

const pagesIn = (folder = 'pages', base = ''): string[] => readdirSync(folder, { withFileTypes: true }).flatMap(e => e.isDirectory() ? pagesIn(join(folder, e.name), `${base}${e.name}/`) : [`${base}${e.name.replace(/\.vue$/, '')}`])
/** `daybook.vue` and `daybook/index.vue` are one page. */
const named = (page: string) => existsSync(join('pages', `${page}.vue`)) ? page : page.replace(/\/index$/, '')

it('every page is in the list', () => {
  expect(pagesIn().sort()).toEqual([...DEMO_ONLY, ...Object.keys(PAGES)].map(named).sort())
})

const cookies: Partial<Record<string, Awaited<ReturnType<BrowserContext['cookies']>>>> = {}
/** Signs in once for each role by the door itself; later pages are opened with its cookie. */
async function cookiesOf(as: string) {
  if (as === 'nobody') return []
  return cookies[as] ??= await withPage(server, {}, async (page) => {
    const email = as === 'customer' ? firm.customer.email : firm.people[as as 'officer'].email
    await page.goto('/sign-in')
    await alive(page)
    await page.getByLabel('E-mail address').fill(email)
    await page.getByLabel('Password').fill(TEST_PASSWORD)
    await page.getByRole('button', { name: 'Sign in' }).click()
    await page.waitForURL(url => url.pathname === '/')
    return page.context().cookies()
  })
}

const SIGHTS = [['a telephone', PHONE, 'light'], ['a desk', DESK, 'dark'], ['a telephone in the sun', PHONE, 'sun']] as const

describe.each(SIGHTS)('on %s', (_, viewport, sheet) => {
  it.each(Object.entries(PAGES))('%s has nothing that axe, the console, the policy or a narrow screen complains of', async (name, { as, path }) => {
    const signedIn = await cookiesOf(as)
    // A link's page without its secret asks about nothing, and is told so.
    const expected = ['reset', 'invitation'].includes(name) ? /status of 400/ : undefined
    await withPage(server, { viewport, expected }, async (page) => {
      await page.context().addCookies([...signedIn, { name: 'sheet', value: sheet, url: server.url }])
      const answer = await page.goto(path())
      expect(answer?.status(), name).toBe(200)
      await alive(page)
      await page.getByRole('heading', { level: 1 }).first().waitFor()
      expect(await accessibilityFaults(page), name).toEqual([])
      expect(await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth), `${name} scrolls sideways`).toBe(0)
    })
  })
})
