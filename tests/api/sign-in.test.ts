import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { SessionAnswer } from '#shared/api/contract/session'
import { makeFirm, type MadeFirm, put, withHouse } from '../support/firm'
import type { TestServer } from '../support/server'
import { TEST_PASSWORD, newClient, removeDirs, signIn, startServer, temporaryDirs } from '../support/server'

const me = async (response: Response): Promise<SessionAnswer['me']> => (await response.json() as SessionAnswer).me
const dirs = temporaryDirs()
let first: MadeFirm
let server: TestServer

beforeAll(async () => {
  first = await makeFirm(dirs)
  const second = await makeFirm(dirs, { slug: 'salt-marsh', name: 'Salt Marsh Turf' })
  // the owner of the second firm also works for the first, as an applicator
  await withHouse(dirs, (house) => {
    const file = house.firm(first.slug)
    const row = { id: '01970000-0000-7000-8000-00000000aaaa', name: 'Ines Wick', email: null, phone: null, from_day: '2020-01-01', to_day: null }
    put(file.raw, 'person', row)
    put(file.raw, 'person_role', { id: '01970000-0000-7000-8000-00000000aaab', person_id: row.id, role: 'applicator', branch_id: first.branchId, from_day: '2020-01-01' })
    const account = house.directory.raw.prepare('select id from account where email = ?').get(second.people.owner.email) as { id: string }
    house.directory.raw.prepare('insert into membership (id, account_id, firm_id, subject_kind, subject_id, created_at) values (?, ?, ?, ?, ?, ?)')
      .run('01970000-0000-7000-8000-00000000aaac', account.id, first.id, 'person', row.id, new Date().toISOString())
  })
  server = await startServer({ dirs })
})
afterAll(async () => {
  await server.stop()
  removeDirs(dirs)
})

describe('signing in', () => {
  it('answers who came in, and a cookie that scripts and other sites do not get', async () => {
    const answer = await newClient(server)('/api/session', { json: { email: ` ${first.people.officer.email.toUpperCase()} `, password: TEST_PASSWORD } })
    expect(answer.status).toBe(201)
    expect(answer.headers.getSetCookie()).toEqual([expect.stringMatching(/^__Host-tankside=[^;]+; Max-Age=2592000; Path=\/; HttpOnly; Secure; SameSite=Lax$/)])
    expect(await me(answer)).toMatchObject({ person: 'Maren Okafor', personId: first.people.officer.id, firm: { id: first.id, slug: first.slug, closed: false }, roles: ['officer'], branches: [first.branchId], licence: null, demo: false })
  })

  it('says the same of a wrong password and of an unknown address', async () => {
    const client = newClient(server)
    const wrong = await client('/api/session', { json: { email: first.people.owner.email, password: 'not the password' } })
    const unknown = await client('/api/session', { json: { email: 'nobody@quarry-lane.example', password: 'not the password' } })
    expect([wrong.status, unknown.status]).toEqual([401, 401])
    expect(await wrong.json()).toEqual(await unknown.json())
  })

  it('knows nobody without a session, and nobody under a cookie that it did not seal', async () => {
    expect(await me(await newClient(server)('/api/session'))).toBeNull()
    expect(await me(await newClient(server)('/api/session', { headers: { cookie: '__Host-tankside=Fe26.2**forged' } }))).toBeNull()
  })

  it('sets no cookie for somebody who only looks', async () => {
    expect((await newClient(server)('/api/session')).headers.getSetCookie()).toEqual([])
  })

  it('lets a customer in as a party', async () => {
    const client = await signIn(server, first.customer.email)
    expect(await me(await client('/api/session'))).toMatchObject({ person: first.customer.name, partyId: first.customer.id, personId: null, roles: ['customer'] })
  })

  it('asks somebody of two firms which one, and remembers it the next time', async () => {
    const client = await signIn(server, 'owner@salt-marsh.example')
    const before = await me(await client('/api/session'))
    expect(before).toMatchObject({ firm: null, roles: [], abilities: [] })
    expect(before?.memberships.map(m => m.firm)).toEqual(['Quarry Lane Pest', 'Salt Marsh Turf'])
    const there = await signIn(server, 'owner@salt-marsh.example', { firm: 'Quarry Lane Pest' })
    expect(await me(await there('/api/session'))).toMatchObject({ firm: { name: 'Quarry Lane Pest' }, roles: ['applicator'] })
    const again = await signIn(server, 'owner@salt-marsh.example')
    expect(await me(await again('/api/session'))).toMatchObject({ firm: { name: 'Quarry Lane Pest' } })
  })

  it('lets nobody choose a membership of somebody else', async () => {
    const other = await me(await (await signIn(server, first.people.owner.email))('/api/session'))
    const client = await signIn(server, 'owner@salt-marsh.example')
    expect((await client('/api/session/firm', { json: { membershipId: other?.membershipId } })).status).toBe(404)
  })
})

describe('signing out', () => {
  it('ends the session on the server: the cookie kept aside is worth nothing', async () => {
    const client = newClient(server)
    const cookie = (await client('/api/session', { json: { email: first.people.officer.email, password: TEST_PASSWORD } })).headers.getSetCookie()[0]?.split(';')[0] ?? ''
    const aside = (path: string) => newClient(server)(path, { headers: { cookie } })
    expect(await me(await aside('/api/session'))).not.toBeNull()
    expect((await client('/api/session', { method: 'DELETE' })).status).toBe(204)
    expect(await me(await aside('/api/session'))).toBeNull()
    expect((await aside('/api/account/sessions')).status).toBe(401)
  })

  it('lists the places where one is signed in, ends one of them, and all', async () => {
    const [here, there] = [await signIn(server, first.people.applicator.email), await signIn(server, first.people.applicator.email)]
    const list = async () => ((await (await here('/api/account/sessions', { headers: { 'user-agent': 'Mozilla/5.0 (Linux; Android 14) Chrome/140' } })).json()) as { sessions: { id: string, here: boolean }[] }).sessions
    const before = await list()
    expect(before.filter(s => s.here)).toHaveLength(1)
    const other = before.find(s => !s.here)
    expect((await here(`/api/account/sessions/${other?.id}`, { method: 'DELETE' })).status).toBe(204)
    expect(await me(await there('/api/session'))).toBeNull()
    const third = await signIn(server, first.people.applicator.email)
    expect((await here('/api/account/sessions', { method: 'DELETE' })).status).toBe(204)
    expect(await me(await here('/api/session'))).toBeNull()
    expect(await me(await third('/api/session'))).toBeNull()
  })

  it('ends nobody else’s session', async () => {
    const [mine, other] = [await signIn(server, first.people.owner.email), await signIn(server, first.people.officer.email)]
    const { sessions } = await (await other('/api/account/sessions')).json() as { sessions: { id: string, here: boolean }[] }
    expect((await mine(`/api/account/sessions/${sessions.find(s => s.here)?.id}`, { method: 'DELETE' })).status).toBe(404)
    expect(await me(await other('/api/session'))).not.toBeNull()
  })
})
