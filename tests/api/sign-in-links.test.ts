import Database from 'better-sqlite3'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { issueLink } from '#server/services/links'
import { realWorld } from '#server/services/the-house'
import type { AccountMailRow } from '#server/database/directory/tables'
import { sha256 } from '#shared/ledger/hash'
import { makeFirm, type MadeFirm, put, withHouse } from '../support/firm'
import { type Client, TEST_PASSWORD, type TestServer, newClient, removeDirs, signIn, startServer, temporaryDirs } from '../support/server'

const dirs = temporaryDirs()
const ODILE = '01970000-0000-7000-8000-00000000bbbb'
const NEW_PASSWORD = 'seven slow green herons'
let first: MadeFirm
let server: TestServer
let outdated: string
let owner: Client

const directory = <T>(read: (raw: Database.Database) => T): T => {
  const raw = new Database(join(dirs.dataDir, 'directory.sqlite'), { readonly: true })
  try {
    return read(raw)
  }
  finally {
    raw.close()
  }
}
/** The mails to an address, the newest last. */
const mailsTo = (address: string) => directory(raw => raw.prepare('select * from account_mail where to_address = ? order by id').all(address) as AccountMailRow[])
const linkIn = (mail: AccountMailRow | undefined) => /http\S+#(\S+)/.exec(mail?.text ?? '')?.[1] ?? ''
const post = (path: string, json: unknown) => newClient(server)(path, { json })

beforeAll(async () => {
  first = await makeFirm(dirs)
  await makeFirm(dirs, { slug: 'salt-marsh', name: 'Salt Marsh Turf' })
  await withHouse(dirs, (house) => {
    put(house.firm(first.slug).raw, 'person', { id: ODILE, name: 'Odile Łaski', email: null, phone: null, from_day: '2020-01-01', to_day: null })
    put(house.firm(first.slug).raw, 'person_role', { id: '01970000-0000-7000-8000-00000000bbbc', person_id: ODILE, role: 'applicator', branch_id: first.branchId, from_day: '2020-01-01' })
  })
  const past = { ...realWorld, now: () => new Date(Date.now() - 31 * 60_000) }
  outdated = await withHouse(dirs, (house) => {
    const { id } = house.directory.raw.prepare('select id from account where email = ?').get(first.people.owner.email) as { id: string }
    return issueLink(house, id, 'reset')
  }, past)
  server = await startServer({ dirs })
  owner = await signIn(server, first.people.owner.email)
})
afterAll(async () => {
  await server.stop()
  removeDirs(dirs)
})

describe('a forgotten password', () => {
  let token: string

  it('is answered alike for an account and for an unknown address, and mails only the account', async () => {
    const [known, unknown] = [await post('/api/links/reset', { email: first.people.officer.email }), await post('/api/links/reset', { email: 'nobody@quarry-lane.example' })]
    expect([known.status, unknown.status]).toEqual([202, 202])
    expect(await known.json()).toEqual(await unknown.json())
    expect(mailsTo('nobody@quarry-lane.example')).toEqual([])
    const [mail] = mailsTo(first.people.officer.email)
    expect(mail?.subject).toBe('Set a new Tankside password')
    expect(mail?.text).toContain('Good day, Maren Okafor,')
    expect(mail?.html).toContain('<p>Good day, Maren Okafor,</p>')
    token = linkIn(mail)
    expect(token).toMatch(/^[\w-]{43}$/)
  })

  it('leaves only the hash of the secret in the list of links', () => {
    const hashes = directory(raw => raw.prepare('select hash from link').pluck().all() as Buffer[])
    expect(hashes.some(hash => hash.equals(sha256(new TextEncoder().encode(token))))).toBe(true)
  })

  it('is not used up by being looked at, as mail scanners do', async () => {
    for (let i = 0; i < 2; i++) {
      const look = await post('/api/links/look', { token })
      expect(look.status).toBe(200)
      expect(await look.json()).toEqual({ kind: 'reset', email: 'o…@quarry-lane.example', name: null, firm: null })
      expect((await newClient(server)('/reset')).status).toBe(200)
    }
  })

  it.each([['short', 'password-short'], ['officer@quarry-lane.example', 'password-is-address'], ['Password2026!!', 'password-common'], ['abcabcabcabcabc', 'password-common']])('does not take %s', async (password, code) => {
    const answer = await post('/api/links/use', { token, password })
    expect(answer.status).toBe(422)
    expect(await answer.json()).toMatchObject({ code: 'weak-password', issues: [{ path: 'password', code }] })
  })

  it('sets the new one once, signs in, and ends what was open elsewhere', async () => {
    const elsewhere = await signIn(server, first.people.officer.email)
    const client = newClient(server)
    const used = await client('/api/links/use', { json: { token, password: NEW_PASSWORD } })
    expect(used.status).toBe(201)
    expect(await (await client('/api/session')).json()).toMatchObject({ me: { person: 'Maren Okafor' } })
    expect(await (await elsewhere('/api/session')).json()).toMatchObject({ me: null })
    expect((await post('/api/links/use', { token, password: NEW_PASSWORD })).status).toBe(410)
    expect((await post('/api/links/look', { token })).status).toBe(410)
    expect((await post('/api/session', { email: first.people.officer.email, password: TEST_PASSWORD })).status).toBe(401)
    await signIn(server, first.people.officer.email, { password: NEW_PASSWORD })
  })

  it('sets nothing twice when the same link is used twice at once', async () => {
    await post('/api/links/reset', { email: first.people.applicator.email })
    const twice = linkIn(mailsTo(first.people.applicator.email).at(-1))
    const answers = await Promise.all([post('/api/links/use', { token: twice, password: NEW_PASSWORD }), post('/api/links/use', { token: twice, password: 'another five word pass phrase' })])
    expect(answers.map(a => a.status).sort()).toEqual([201, 410])
  })

  it('is too late after 30 minutes', async () => {
    expect((await post('/api/links/use', { token: outdated, password: NEW_PASSWORD })).status).toBe(410)
  })
})

describe('an invitation', () => {
  it('lets somebody of the book in, by a link that sets password and name', async () => {
    const email = 'odile@quarry-lane.example'
    const invited = await owner('/api/people/invitations', { json: { subject: { kind: 'person', id: ODILE }, email } })
    expect(invited.status).toBe(202)
    expect((await post('/api/session', { email, password: '' })).status).toBe(400)
    expect((await post('/api/session', { email, password: 'any password at all' })).status).toBe(401)
    const [mail] = mailsTo(email)
    expect(mail?.subject).toBe('Quarry Lane Pest invites you to its treatment ledger')
    const token = linkIn(mail)
    expect(await (await post('/api/links/look', { token })).json()).toEqual({ kind: 'invitation', email: 'o…@quarry-lane.example', name: 'Odile Łaski', firm: 'Quarry Lane Pest' })
    const client = newClient(server)
    const used = await client('/api/links/use', { json: { token, password: NEW_PASSWORD, name: 'Odile Ł.' } })
    expect(used.status).toBe(201)
    expect(await used.json()).toMatchObject({ me: { person: 'Odile Łaski', personId: ODILE, roles: ['applicator'], firm: { slug: first.slug } } })
    expect((await post('/api/links/use', { token, password: NEW_PASSWORD })).status).toBe(410)
  })

  it('only tells somebody who has a password already: no link that could take the account', async () => {
    const email = 'officer@salt-marsh.example'
    expect((await owner('/api/people/invitations', { json: { subject: { kind: 'person', id: first.people.officer.id }, email } })).status).toBe(202)
    const mail = mailsTo(email).at(-1)
    expect(mail?.subject).toBe('Quarry Lane Pest has opened its treatment ledger to you')
    expect(linkIn(mail)).toBe('')
    const client = await signIn(server, email, { firm: 'Quarry Lane Pest' })
    expect(await (await client('/api/session')).json()).toMatchObject({ me: { roles: ['officer'] } })
  })

  it('is only for who stands in the own book', async () => {
    const other = await signIn(server, 'owner@salt-marsh.example')
    expect((await other('/api/people/invitations', { json: { subject: { kind: 'person', id: ODILE }, email: 'x@salt-marsh.example' } })).status).toBe(404)
    expect(mailsTo('x@salt-marsh.example')).toEqual([])
  })
})

describe('changing the password', () => {
  it('asks for the present one, names the field, and keeps this session alone', async () => {
    const [here, there] = [await signIn(server, first.customer.email), await signIn(server, first.customer.email)]
    const wrong = await here('/api/account/password', { json: { current: 'not the password', next: NEW_PASSWORD } })
    expect(await wrong.json()).toMatchObject({ code: 'refused', issues: [{ path: 'current', code: 'password-wrong', message: 'This is not your present password.' }] })
    expect((await here('/api/account/password', { json: { current: TEST_PASSWORD, next: NEW_PASSWORD } })).status).toBe(204)
    expect(await (await here('/api/session')).json()).toMatchObject({ me: { email: first.customer.email } })
    expect(await (await there('/api/session')).json()).toMatchObject({ me: null })
    await signIn(server, first.customer.email, { password: NEW_PASSWORD })
  })
})
