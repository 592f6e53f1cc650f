import { execFileSync } from 'node:child_process'
import { readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { parse } from 'csv-parse/sync'
import type { Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { verifyFirm } from '#server/services/verify/verify-firm'
import { openReader } from '#server/database/connection'
import { DESK, PHONE, accessibilityFaults, alive, withPage } from '../support/browser'
import { makeBooks, postVisit, visitSubmission } from '../support/books'
import type { MadeBooks } from '../support/books'
import { makeFirm } from '../support/firm'
import type { MadeFirm } from '../support/firm'
import { startMailServer } from '../support/mail'
import type { MailServer } from '../support/mail'
import { TEST_PASSWORD, removeDirs, signIn, startServer, temporaryDirs } from '../support/server'
import type { TestServer } from '../support/server'

const dirs = temporaryDirs()
let server: TestServer
let firm: MadeFirm
let books: MadeBooks
let mail: MailServer

beforeAll(async () => {
  firm = await makeFirm(dirs)
  books = await makeBooks(dirs, firm)
  mail = await startMailServer()
  server = await startServer({ dirs, env: { NUXT_MAIL_URL: mail.url } })
  const applicator = await signIn(server, firm.people.applicator.email)
  await postVisit(applicator, visitSubmission(books, { ended: new Date(Date.now() - 60 * 86_400_000), followUpAfter: 60 }))
}, 60_000)
afterAll(async () => {
  await server.stop()
  await mail.stop()
  removeDirs(dirs)
})

async function enter(page: Page, email: string, to: string) {
  await page.goto(`/sign-in?next=${encodeURIComponent(to)}`)
  await alive(page)
  await page.getByLabel('E-mail address').fill(email)
  await page.getByLabel('Password').fill(TEST_PASSWORD)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL(url => url.pathname === to)
  await alive(page)
}

/** Counts what a thumb does: presses on anything, and presses on the number pad. */
function thumb(page: Page) {
  const count = { taps: 0, keys: 0 }
  return {
    count,
    tap: async (name: string | RegExp, role: 'button' | 'radio' | 'checkbox' = 'button', within: Pick<Page, 'getByRole'> = page) => {
      count.taps++
      const target = within.getByRole(role, { name }).first()
      if (role === 'button') await target.click()
      else await target.check({ force: true })
    },
    /** Into the field that has the focus, as the pad would. */
    type: async (text: string) => {
      count.keys += text.length
      await page.keyboard.type(text)
    },
    focused: (name: string | RegExp) => page.getByRole('textbox', { name }).and(page.locator(':focus')).waitFor(),
  }
}

describe('a whole day', () => {
  let number = ''

  it('the applicator, on a telephone, records a repeat visit of two outdoor treatments, one amount different', async () => {
    await withPage(server, { viewport: PHONE, hasTouch: true }, async (page) => {
      await enter(page, firm.people.applicator.email, '/visits/new')
      const { tap, type, focused, count } = thumb(page)
      const begun = Date.now()
      await page.getByRole('heading', { name: 'New visit' }).waitFor()
      await tap(/^22 Quarry Lane/)
      await tap(/^As on /)
      // treatment 1: as last time
      await tap(/: 2\.5 gal$/)
      await tap(/: 980 sq ft$/)
      // treatment 2: another amount
      await focused('Amount of Bedrow G')
      await type('3.5')
      await tap(/: 1,000 sq ft$/)
      // weather, for both
      await focused('Temperature')
      await type('64')
      await page.keyboard.press('Tab')
      await type('4')
      await tap('SW', 'radio')
      await tap('Clear', 'radio')
      await tap('Next')
      await tap('Arrived: now')
      await tap('Finished and left: now')
      expect(await accessibilityFaults(page)).toEqual([])
      await tap('Review and sign')
      expect(await accessibilityFaults(page)).toEqual([])
      await tap(/^Send to Harbour House Tenants/, 'checkbox')
      await tap('Sign')
      await page.getByRole('heading', { name: 'On record' }).waitFor()
      const seconds = (Date.now() - begun) / 1000
      console.log(`a repeat visit: ${count.taps} taps, ${count.keys} keys, ${seconds.toFixed(1)} s by a program’s fingers`)
      // The Tab to the wind's field is a tap for a thumb.
      expect(count.taps + 1).toBeLessThanOrEqual(20)
      expect(count.keys).toBeLessThanOrEqual(12)
      expect(await page.getByText('Until dry').count()).toBe(2)
      expect(await page.getByText('The notice goes to Harbour House Tenants now.').count()).toBe(1)
      expect(await accessibilityFaults(page)).toEqual([])
      number = books.granules.number
    })
  })

  it('the officer finds it by its number, exports CSV and PDF, and amends it with a reason', async () => {
    await withPage(server, { viewport: DESK, acceptDownloads: true }, async (page) => {
      await enter(page, firm.people.officer.email, '/daybook')
      await page.getByRole('searchbox', { name: 'Search' }).fill(number)
      await page.getByRole('button', { name: 'Find' }).click()
      await page.getByRole('row').filter({ hasText: '3.5 lb' }).waitFor()
      const [csv] = await Promise.all([page.waitForEvent('download'), page.getByRole('link', { name: 'CSV' }).click()])
      const records = parse(readFileSync(await csv.path()), { columns: true }) as Record<string, string>[]
      expect(records.map(r => [r.registration_number, r.amount, r.amount_unit])).toEqual([[number, '3.5', 'lb'], [number, '3.0', 'lb']])

      await page.getByRole('row').filter({ hasText: '3.5 lb' }).getByRole('link', { name: '22 Quarry Lane' }).click()
      await page.getByRole('heading', { level: 1, name: '22 Quarry Lane' }).waitFor()
      const pdf = await page.context().request.get(await page.getByRole('link', { name: 'Record as PDF' }).getAttribute('href') ?? '')
      const file = join(dirs.dataDir, 'record.pdf')
      writeFileSync(file, await pdf.body())
      const text = execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' })
      for (const words of ['22 Quarry Lane', number, '3.5 lb', books.licences.applicator.number, firm.people.applicator.name]) expect(text).toContain(words)

      await page.getByRole('link', { name: 'Amend' }).click()
      await page.getByRole('heading', { name: 'Amend 22 Quarry Lane' }).waitFor()
      await alive(page)
      await page.getByRole('button', { name: /How much and where/ }).click()
      await page.getByRole('textbox', { name: 'Amount of Bedrow G' }).fill('3.25')
      await page.getByRole('row').filter({ hasText: 'Amount of product' }).filter({ hasText: '3.25 lb' }).waitFor()
      await page.getByRole('textbox', { name: 'Reason for the change' }).fill('The bag was weighed again')
      expect(await accessibilityFaults(page)).toEqual([])
      await page.getByRole('button', { name: 'Amend' }).click()
      await page.getByRole('heading', { level: 1, name: '22 Quarry Lane' }).waitFor()
      await page.getByText('author’s word owed').waitFor()
      await page.getByText('Reason: The bag was weighed again').waitFor()
    })
  })

  it('the author confirms', async () => {
    await withPage(server, { viewport: PHONE }, async (page) => {
      await enter(page, firm.people.applicator.email, '/')
      await page.getByRole('heading', { name: /Your word is owed/ }).waitFor()
      await page.getByRole('link', { name: /22 Quarry Lane.*Bedrow G/ }).first().click()
      await page.getByRole('button', { name: 'Confirm' }).click()
      await page.getByText('author confirmed').waitFor()
    })
  })

  it('the customer’s notice is in the mailbox, as text and as PDF', async () => {
    const { mail: letter, to } = await mail.next()
    expect(to).toEqual([firm.customer.email])
    expect(letter.text).toContain('22 Quarry Lane')
    expect(letter.text).toMatch(/until .*dry/)
    expect(`${letter.text} ${String(letter.html)}`).not.toMatch(/\bsafe\b/i)
    const file = join(dirs.dataDir, 'notice.pdf')
    writeFileSync(file, letter.attachments.find(one => one.contentType === 'application/pdf')?.content ?? '')
    const text = execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' })
    for (const words of [books.spray.number, number, '1-800-222-1222']) expect(text).toContain(words)
  })

  it('verify says good', () => {
    const raw = openReader(join(dirs.dataDir, 'firms', `${firm.slug}.sqlite`))
    const verdict = verifyFirm(raw)
    raw.close()
    expect(verdict).toMatchObject({ good: true, problems: [] })
  })
})
