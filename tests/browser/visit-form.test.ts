import type { BrowserContext, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { PHONE, alive, withPage } from '../support/browser'
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

beforeAll(async () => {
  firm = await makeFirm(dirs)
  books = await makeBooks(dirs, firm)
  server = await startServer({ dirs })
  await postVisit(await signIn(server, firm.people.applicator.email), visitSubmission(books, { ended: new Date(Date.now() - 60 * 86_400_000), followUpAfter: 60, treatments: ['spray'] }))
}, 60_000)
afterAll(async () => {
  await server.stop()
  removeDirs(dirs)
})

async function enter(page: Page) {
  await page.goto('/sign-in?next=/visits/new')
  await alive(page)
  await page.getByLabel('E-mail address').fill(firm.people.applicator.email)
  await page.getByLabel('Password').fill(TEST_PASSWORD)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL(url => url.pathname === '/visits/new')
  await page.getByRole('heading', { name: 'New visit' }).waitFor()
}
/** A repeat visit, written up to the review. */
async function write(page: Page) {
  for (const name of [/^22 Quarry Lane/, /^As on /, /: 2\.5 gal$/, /: 980 sq ft$/]) await page.getByRole('button', { name }).first().click()
  await page.getByRole('textbox', { name: 'Temperature' }).fill('64')
  await page.getByRole('button', { name: 'Next' }).click()
  await page.getByRole('button', { name: 'Arrived: now' }).click()
  await page.getByRole('button', { name: 'Finished and left: now' }).click()
}
const entriesOnRecord = async () => {
  const officer = await signIn(server, firm.people.officer.email)
  return (await (await officer('/api/applications/totals')).json() as { count: number }).count
}
const offline = (context: BrowserContext, is: boolean) => context.setOffline(is)

describe('the entry form', () => {
  it('keeps every keystroke through a reload and a closed tab', async () => {
    await withPage(server, { viewport: PHONE }, async (page) => {
      await enter(page)
      for (const name of [/^22 Quarry Lane/, /^As on /]) await page.getByRole('button', { name }).first().click()
      await page.getByRole('textbox', { name: 'Finished spray used' }).fill('1.70')
      await page.getByText(/That is 0\.51\sfl\soz of product/).waitFor()
      await page.reload()
      await page.getByRole('textbox', { name: 'Finished spray used' }).waitFor()
      expect(await page.getByRole('textbox', { name: 'Finished spray used' }).inputValue()).toBe('1.70')
      const again = await page.context().newPage()
      await page.close()
      await again.goto('/visits/new')
      await again.getByRole('textbox', { name: 'Finished spray used' }).waitFor()
      expect(await again.getByRole('textbox', { name: 'Finished spray used' }).inputValue()).toBe('1.70')
      expect(await again.getByText(/0\.51\sfl\soz/).count()).toBeGreaterThan(0)
    })
  })

  it('names what is missing before signing, and leads there', async () => {
    await withPage(server, { viewport: PHONE }, async (page) => {
      await enter(page)
      for (const name of [/^22 Quarry Lane/, /^As on /]) await page.getByRole('button', { name }).first().click()
      await page.getByRole('button', { name: 'Review and sign' }).click()
      await page.getByRole('alert').getByText('Say when you arrived: tap “now”, or give the time.').waitFor()
      await page.getByRole('button', { name: 'Arrived: now' }).waitFor()
    })
  })

  it('shows findings as one writes, asks for a word, and takes the record all the same', async () => {
    const before = await entriesOnRecord()
    await withPage(server, { viewport: PHONE }, async (page) => {
      await enter(page)
      for (const name of [/^22 Quarry Lane/, /^As on /]) await page.getByRole('button', { name }).first().click()
      await page.getByRole('textbox', { name: 'Finished spray used' }).fill('2.5')
      await page.getByRole('button', { name: 'Measured otherwise' }).click()
      await page.getByRole('textbox', { name: 'Amount of Sillgard 6.4 CS' }).fill('9')
      await page.getByText('is above the label’s 0.60').first().waitFor()
      await page.getByRole('button', { name: /: 980 sq ft$/ }).click()
      await page.getByRole('button', { name: 'Not taken', exact: true }).click()
      await page.getByRole('button', { name: 'Next' }).click()
      await page.getByRole('button', { name: 'Arrived: now' }).click()
      await page.getByRole('button', { name: 'Finished and left: now' }).click()
      await page.getByRole('button', { name: 'Review and sign' }).click()
      await page.getByRole('textbox', { name: /What do you say of the stops and queries/ }).fill('Read the wrong line of the cup')
      await page.getByRole('button', { name: 'Sign' }).click()
      await page.getByRole('heading', { name: 'On record' }).waitFor()
    })
    expect(await entriesOnRecord()).toBe(before + 1)
    const officer = await signIn(server, firm.people.officer.email)
    const { rows } = await (await officer('/api/applications?finding=stop')).json() as { rows: { findings: { message: string, seen: boolean }[] }[] }
    expect(rows[0]?.findings.map(f => [f.message, f.seen])).toEqual([['rate-above', true], ['missing-weather', true]])
  })

  it('signs without a signal: the same bytes go when there is one, once', async () => {
    const before = await entriesOnRecord()
    await withPage(server, { viewport: PHONE, expected: /ERR_INTERNET_DISCONNECTED/ }, async (page) => {
      await enter(page)
      await write(page)
      await offline(page.context(), true)
      await page.getByRole('button', { name: 'Review and sign' }).click()
      await page.getByRole('button', { name: 'Sign' }).click()
      await page.getByText('A signed visit waits on this device until the server has it.').waitFor()
      expect(await entriesOnRecord()).toBe(before)
      await offline(page.context(), false)
      await page.getByRole('heading', { name: 'On record' }).waitFor()
    })
    expect(await entriesOnRecord()).toBe(before + 1)
  })

  it('keeps one person’s drafts from the next on the same telephone', async () => {
    await withPage(server, { viewport: PHONE }, async (page) => {
      await enter(page)
      await page.getByRole('button', { name: /^22 Quarry Lane/ }).first().click()
      await page.getByRole('button', { name: /^As on / }).click()
      await page.goto('/account')
      await alive(page)
      await page.getByRole('button', { name: 'Sign out here' }).click()
      await page.waitForURL(url => url.pathname === '/sign-in')
      const held = await page.evaluate(async () => {
        const open = indexedDB.open('tankside')
        await new Promise((resolve) => { open.onsuccess = resolve })
        const all = open.result.transaction('visits').objectStore('visits').getAll()
        await new Promise((resolve) => { all.onsuccess = resolve })
        return (all.result as { who: string }[]).map(visit => visit.who)
      })
      expect(held).toHaveLength(1)
      expect(held[0]).toMatch(/^[0-9a-f-]{36}$/)
    })
  })
})
