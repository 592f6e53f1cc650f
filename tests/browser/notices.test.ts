import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Page } from 'playwright-core'
import { DESK, accessibilityFaults, alive, withPage } from '../support/browser'
import { makeBooks, postVisit, visitSubmission } from '../support/books'
import { makeFirm } from '../support/firm'
import type { MadeFirm } from '../support/firm'
import { type TestServer, TEST_PASSWORD, removeDirs, signIn, startServer, temporaryDirs } from '../support/server'

const dirs = temporaryDirs()
let firm: MadeFirm
let server: TestServer

beforeAll(async () => {
  firm = await makeFirm(dirs, { demo: true })
  const books = await makeBooks(dirs, firm)
  // the demonstration's own mail server takes the place of a named one
  server = await startServer({ dirs, env: { NUXT_MAIL_URL: '' } })
  await postVisit(await signIn(server, firm.people.applicator.email), visitSubmission(books, { followUpAfter: 60 }))
})
afterAll(async () => {
  await server.stop()
  removeDirs(dirs)
})

async function enter(page: Page, email: string, path: string) {
  await page.goto(`/sign-in?next=${encodeURIComponent(path)}`)
  await alive(page)
  await page.getByLabel('E-mail').fill(email)
  await page.getByLabel('Password').fill(TEST_PASSWORD)
  await page.getByRole('button', { name: 'Sign in', exact: true }).click()
  await page.waitForURL(`**${path}`)
}
const look = (page: Page, name: string) => process.env.LOOK ? page.screenshot({ path: `${process.env.LOOK}/${name}.png`, fullPage: true }) : null

describe('a notice that waits', () => {
  it('is shown as it will look, sent by one press, and read in the demonstration’s mailbox', async () => {
    await withPage(server, { viewport: DESK }, async (page) => {
      await enter(page, firm.people.officer.email, '/notices')
      const waiting = page.getByRole('link', { name: '22 Quarry Lane' })
      await waiting.waitFor()
      await look(page, 'notices')
      await waiting.click()
      await page.getByText('Keep people and animals off the treated areas until they are fully dry.').waitFor()
      expect(await accessibilityFaults(page)).toEqual([])
      await look(page, 'notice-page')
      await page.getByRole('button', { name: `Send to ${firm.customer.email}` }).click()
      await page.getByText('Let go, Maren Okafor').waitFor()

      const link = page.getByRole('link', { name: /^Treatment notice: 22 Quarry Lane/ })
      await expect.poll(async () => {
        await page.goto('/demo/mailbox')
        return link.count()
      }, { timeout: 20_000 }).toBe(1)
      await look(page, 'mailbox')
      await link.click()
      await page.getByRole('link', { name: /^treatment-notice-.*\.pdf$/ }).waitFor()
      await page.getByText('1-800-222-1222').waitFor()
      expect(await accessibilityFaults(page)).toEqual([])
      await look(page, 'mail')
    })
  })
})
