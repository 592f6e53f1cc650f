import Database from 'better-sqlite3'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { DESK, PHONE, accessibilityFaults, alive, withPage } from '../support/browser'
import { makeFirm, type MadeFirm, put, withHouse } from '../support/firm'
import { TEST_PASSWORD, type TestServer, removeDirs, signIn, startServer, temporaryDirs } from '../support/server'

const dirs = temporaryDirs()
const ODILE = '01970000-0000-7000-8000-00000000bbbb'
const NEW_PASSWORD = 'seven slow green herons'
let first: MadeFirm
let server: TestServer

const directory = <T>(sql: string, ...values: unknown[]): T => {
  const raw = new Database(join(dirs.dataDir, 'directory.sqlite'), { readonly: true })
  const row = raw.prepare(sql).pluck().get(...values)
  raw.close()
  return row as T
}

beforeAll(async () => {
  first = await makeFirm(dirs)
  await makeFirm(dirs, { slug: 'salt-marsh', name: 'Salt Marsh Turf' })
  await withHouse(dirs, (house) => {
    put(house.firm(first.slug).raw, 'person', { id: ODILE, name: 'Odile Łaski', email: null, phone: null, from_day: '2020-01-01', to_day: null })
    put(house.firm(first.slug).raw, 'person_role', { id: '01970000-0000-7000-8000-00000000bbbc', person_id: ODILE, role: 'applicator', branch_id: first.branchId, from_day: '2020-01-01' })
  })
  server = await startServer({ dirs })
})
afterAll(async () => {
  await server.stop()
  removeDirs(dirs)
})

describe('the door', () => {
  it('keeps what was typed when the password is wrong, then leads where one wanted to go', async () => {
    await withPage(server, { expected: /status of 401/ }, async (page) => {
      await page.goto('/account')
      expect(new URL(page.url()).pathname).toBe('/sign-in')
      await alive(page)
      const [email, password] = [page.getByLabel('E-mail address'), page.getByLabel('Password')]
      expect([await email.getAttribute('autocomplete'), await password.getAttribute('autocomplete')]).toEqual(['username', 'current-password'])
      await email.fill(first.people.officer.email)
      await password.fill('not the password')
      await password.press('Enter')
      await page.getByRole('alert').getByText('That address and password do not go together').waitFor()
      expect([await email.inputValue(), await password.inputValue()]).toEqual([first.people.officer.email, 'not the password'])
      await password.fill(TEST_PASSWORD)
      await page.getByRole('button', { name: 'Sign in' }).click()
      await page.getByRole('heading', { name: 'Account' }).waitFor()
      expect(new URL(page.url()).pathname).toBe('/account')
      await page.reload()
      await page.getByText(`Maren Okafor, ${first.people.officer.email}`).waitFor()
    })
  })

  it('names the field that is not taken and leads to it', async () => {
    await withPage(server, { expected: /status of 400/ }, async (page) => {
      await page.goto('/sign-in')
      await alive(page)
      await page.getByLabel('E-mail address').fill('no address')
      await page.getByLabel('Password').fill('something')
      await page.getByRole('button', { name: 'Sign in' }).click()
      await page.getByRole('alert').getByRole('link').click()
      expect(await page.getByLabel('E-mail address').evaluate(field => field === document.activeElement && field.getAttribute('aria-invalid') === 'true')).toBe(true)
    })
  })

  it('keeps what was typed before the page came alive', async () => {
    await withPage(server, {}, async (page) => {
      let letScriptsThrough = () => {}
      const held = new Promise<void>((resolve) => { letScriptsThrough = resolve })
      await page.route('**/_nuxt/*.js', async (route) => {
        await held
        await route.continue()
      })
      await page.goto('/sign-in', { waitUntil: 'commit' })
      await page.getByLabel('E-mail address').fill(first.people.owner.email)
      letScriptsThrough()
      await alive(page)
      expect(await page.getByLabel('E-mail address').inputValue()).toBe(first.people.owner.email)
      await page.getByLabel('Password').fill(TEST_PASSWORD)
      await page.getByRole('button', { name: 'Sign in' }).click()
      await page.waitForURL(url => url.pathname === '/')
    })
  })

  it('signs out here, and elsewhere', async () => {
    const elsewhere = await signIn(server, first.people.applicator.email)
    await withPage(server, { viewport: DESK }, async (page) => {
      await page.goto('/sign-in?next=/account')
      await alive(page)
      await page.getByLabel('E-mail address').fill(first.people.applicator.email)
      await page.getByLabel('Password').fill(TEST_PASSWORD)
      await page.getByRole('button', { name: 'Sign in' }).click()
      await page.getByRole('button', { name: 'End', exact: true }).click()
      await page.getByRole('button', { name: 'End', exact: true }).waitFor({ state: 'detached' })
      expect((await elsewhere('/api/account/sessions')).status).toBe(401)
      await page.getByRole('button', { name: 'Sign out here' }).click()
      await page.waitForURL('**/sign-in')
      expect((await page.context().cookies()).filter(cookie => cookie.name === '__Host-tankside')).toEqual([])
    })
  })

  it('uses an invitation only when its button is pressed', async () => {
    const owner = await signIn(server, first.people.owner.email)
    await owner('/api/people/invitations', { json: { subject: { kind: 'person', id: ODILE }, email: 'odile@quarry-lane.example' } })
    const token = /#(\S+)/.exec(directory<string>('select text from account_mail where to_address = ?', 'odile@quarry-lane.example'))?.[1]
    await withPage(server, { expected: /status of 422/ }, async (page) => {
      await page.goto(`/invitation#${token}`)
      await page.getByText('Quarry Lane Pest has opened its treatment ledger to you').waitFor()
      expect(directory<string | null>('select used_at from link order by created_at desc limit 1')).toBeNull()
      expect(await page.getByLabel('Your name').inputValue()).toBe('Odile Łaski')
      const password = page.getByLabel('New password')
      expect(await password.getAttribute('autocomplete')).toBe('new-password')
      await password.fill('too short')
      await page.getByRole('button', { name: 'Set the password and sign in' }).click()
      await page.getByRole('alert').getByText('Take at least 12 characters').waitFor()
      await password.fill(NEW_PASSWORD)
      await page.getByRole('button', { name: 'Set the password and sign in' }).click()
      await page.waitForURL(url => url.pathname === '/')
      expect(page.url()).not.toContain(token)
    })
  })

  it.each([PHONE, DESK])('has no fault that axe finds, on $width px', async (viewport) => {
    await withPage(server, { viewport, expected: /status of 4(00|10)/ }, async (page) => {
      for (const path of ['/sign-in', '/forgot', '/invitation', `/reset#${'a'.repeat(43)}`]) {
        await page.goto(path)
        await alive(page)
        expect([path, await accessibilityFaults(page)]).toEqual([path, []])
      }
      await page.goto('/sign-in?next=/account')
      await alive(page)
      await page.getByLabel('E-mail address').fill(first.customer.email)
      await page.getByLabel('Password').fill(TEST_PASSWORD)
      await page.getByRole('button', { name: 'Sign in' }).click()
      await page.getByRole('heading', { name: 'Account' }).waitFor()
      expect(await accessibilityFaults(page)).toEqual([])
    })
  })
})
