import Database from 'better-sqlite3'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { SessionAnswer } from '#shared/api/contract/session'
import { makeFirm, type MadeFirm, put } from '../support/firm'
import { type Client, type TestServer, removeDirs, newClient, signIn, startServer, temporaryDirs } from '../support/server'

const dirs = temporaryDirs()
let first: MadeFirm
let server: TestServer
const me = async (client: Client) => (await (await client('/api/session')).json() as SessionAnswer).me
/** Writes beside the running program, as time and other pages would. */
const write = (file: string, work: (raw: Database.Database) => void) => {
  const raw = new Database(join(dirs.dataDir, file))
  work(raw)
  raw.close()
}
const hoursAgo = (hours: number) => new Date(Date.now() - hours * 3_600_000).toISOString()

beforeAll(async () => {
  first = await makeFirm(dirs)
  await makeFirm(dirs, { slug: 'broken', name: 'Broken Book' })
  write('firms/broken.sqlite', raw => raw.exec('drop trigger leaf_no_delete'))
  server = await startServer({ dirs })
})
afterAll(async () => {
  await server.stop()
  removeDirs(dirs)
})

describe('rights', () => {
  it('are read for every request: a role that ends, ends at once', async () => {
    const client = await signIn(server, first.people.officer.email)
    expect((await me(client))?.abilities).toContain('entry.amend')
    write(`firms/${first.slug}.sqlite`, (raw) => {
      const role = raw.prepare('select id from person_role where person_id = ?').pluck().get(first.people.officer.id) as string
      put(raw, 'person_role_end', { role_id: role, to_day: '2024-06-30', at: '2024-06-30T12:00:00.000Z' })
    })
    expect(await me(client)).toMatchObject({ roles: [], abilities: [], branches: [] })
  })

  it('end with the account', async () => {
    const client = await signIn(server, first.customer.email)
    write('directory.sqlite', raw => raw.prepare('update account set disabled_at = ? where email = ?').run(hoursAgo(0), first.customer.email))
    expect(await me(client)).toBeNull()
  })
})

describe('a session', () => {
  it('ends after 12 hours in which nothing was asked', async () => {
    const client = await signIn(server, first.people.owner.email)
    const seen = (at: string) => write('directory.sqlite', raw => raw.prepare('update session set seen_at = ?').run(at))
    seen(hoursAgo(11.9))
    expect(await me(client)).not.toBeNull()
    seen(hoursAgo(12.1))
    expect(await me(client)).toBeNull()
  })

  it('ends after 30 days, however busy', async () => {
    const client = await signIn(server, first.people.owner.email)
    write('directory.sqlite', raw => raw.prepare('update session set ends_at = ?').run(hoursAgo(0)))
    expect(await me(client)).toBeNull()
  })
})

describe('comings and goings', () => {
  it('are written down, with from where and on what', async () => {
    const headers = { 'user-agent': 'Mozilla/5.0 (Linux; Android 14) Chrome/140.0' }
    const { email } = first.people.applicator
    await newClient(server)('/api/session', { json: { email, password: 'not the password' }, headers })
    const client = await signIn(server, email)
    await client('/api/session', { method: 'DELETE' })
    const events: unknown[] = []
    write('directory.sqlite', raw => events.push(...raw.prepare('select what, address, device from sign_in_event join account on account.id = account_id where email = ? order by sign_in_event.id').all(email)))
    expect(events).toEqual([{ what: 'refused', address: '127.0.0.1', device: 'Chrome, Android' }, { what: 'signed-in', address: '127.0.0.1', device: 'node' }, { what: 'signed-out', address: '127.0.0.1', device: 'node' }])
  })
})

describe('a firm whose book failed its checks', () => {
  it('stays closed and says so; the others go on', async () => {
    const client = await signIn(server, 'owner@broken.example')
    expect(await me(client)).toMatchObject({ firm: { slug: 'broken', closed: true }, abilities: [] })
    const refused = await client('/api/people/invitations', { json: {} })
    expect(refused.status).toBe(503)
    expect(await refused.json()).toMatchObject({ code: 'firm-closed' })
    expect(await (await newClient(server)('/api/health')).json()).toEqual({ ok: true, firms: { open: 1, closed: 1 } })
    expect((await me(await signIn(server, first.people.owner.email)))?.roles).toEqual(['owner'])
  })
})

describe('pages drawn on the server', () => {
  it('send who is not signed in to the door, and back afterwards', async () => {
    const answer = await newClient(server)('/account?x=1')
    expect(answer.status).toBe(302)
    expect(answer.headers.get('location')).toBe('/sign-in?next=/account?x=1')
  })

  it('never show one person what was drawn for another at the same time', async () => {
    const people = [first.people.owner.email, first.people.applicator.email]
    const clients = await Promise.all(people.map(email => signIn(server, email)))
    const drawn = await Promise.all(Array.from({ length: 40 }, async (_, i) => ({ whose: i % 2, html: await (await clients[i % 2]?.('/account'))?.text() ?? '' })))
    for (const { whose, html } of drawn) {
      expect(html).toContain(people[whose])
      expect(html).not.toContain(people[1 - whose])
    }
  })
})
