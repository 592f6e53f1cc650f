import Database from 'better-sqlite3'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { ROLE_ABILITIES } from '#shared/access/abilities'
import type { Ability } from '#shared/access/abilities'
import type { Contract, ErrorAnswer } from '#shared/api/contract/define'
import { CONTRACT } from '#shared/api/contract/index'
import { join } from 'node:path'
import { makeFirm, type MadeFirm, put, withHouse } from '../support/firm'
import { builtRoutes } from '../support/routes'
import { type Client, type TestServer, newClient, removeDirs, signIn, startServer, temporaryDirs } from '../support/server'

const ROUTES = (Object.entries(CONTRACT) as [string, Contract][]).map(([key, contract]) => {
  const [method = '', path = ''] = key.split(' ')
  return { key, method, path, contract }
})
type Route = (typeof ROUTES)[number]

const WHO = ['nobody', 'owner', 'officer', 'applicator', 'customer', 'left', 'other'] as const
type Who = (typeof WHO)[number]
/** These end the sessions of who asks: the next question needs a new one. */
const ENDS_SESSION = ['DELETE /api/session', 'DELETE /api/account/sessions']
const ABSENT = '01970000-0000-7000-8000-0000000000ff'

const dirs = temporaryDirs()
let server: TestServer
let first: MadeFirm
let ids: string[]
const clients = new Map<Who, Client>()

const addressOf = (who: Exclude<Who, 'nobody'>): string => ({
  owner: first.people.owner.email, officer: first.people.officer.email, applicator: first.people.applicator.email,
  customer: first.customer.email, left: 'left@quarry-lane.example', other: 'owner@salt-marsh.example',
})[who]
const enter = async (who: Who): Promise<Client> => who === 'nobody' ? newClient(server) : signIn(server, addressOf(who))
async function clientFor(who: Who, route: Route): Promise<Client> {
  const client = clients.get(who) ?? await enter(who)
  if (ENDS_SESSION.includes(route.key)) clients.delete(who)
  else clients.set(who, client)
  return client
}
const fill = (path: string, id = ABSENT): string => path.replace(/:\w+/g, id)
const ask = (client: Client, { method, path, contract }: Route, init: RequestInit & { json?: unknown } = {}, id?: string) =>
  client(fill(path, id), { method, ...(contract.body && !('body' in init) && !('json' in init) ? { json: {} } : {}), ...init })

/** What the table promises: let through (anything but 401 and 403), or refused with exactly this. */
function promised(who: Who, { contract }: Route): 'let through' | 401 | 403 | 404 {
  if (contract.ability === 'public') return 'let through'
  if (contract.ability === 'demo') return 404
  if (who === 'nobody') return 401
  if (contract.ability === 'signed-in') return 'let through'
  if (who === 'left') return 403
  return ROLE_ABILITIES[who === 'other' ? 'owner' : who].includes(contract.ability as Ability) ? 'let through' : 403
}
const mayAsk = (route: Route): Who | undefined => WHO.find(who => promised(who, route) === 'let through')

/** Every id that stands in the firm's file. */
function idsIn(file: string): string[] {
  const raw = new Database(file, { readonly: true })
  const tables = raw.prepare('select m.name from sqlite_schema m join pragma_table_info(m.name) c where m.type = \'table\' and c.name = \'id\' and m.name not like \'entry_search%\'').pluck().all() as string[]
  const found = tables.flatMap(table => raw.prepare(`select id from ${table} limit 3`).pluck().all() as string[])
  raw.close()
  return [...new Set(found)]
}

beforeAll(async () => {
  first = await makeFirm(dirs)
  await makeFirm(dirs, { slug: 'salt-marsh', name: 'Salt Marsh Turf' })
  // somebody whose only role ended, and whose account did not
  const { people } = await makeFirm(dirs, { slug: 'leaving', domain: 'leaving.example' })
  await withHouse(dirs, (house) => {
    const { raw } = house.firm('leaving')
    const role = raw.prepare('select id from person_role where person_id = ?').pluck().get(people.officer.id) as string
    put(raw, 'person_role_end', { role_id: role, to_day: '2024-06-30', at: '2024-06-30T12:00:00.000Z' })
    house.directory.raw.prepare('update account set email = ? where email = ?').run('left@quarry-lane.example', people.officer.email)
  })
  ids = idsIn(join(dirs.dataDir, 'firms', `${first.slug}.sqlite`))
  server = await startServer({ dirs })
})
afterAll(async () => {
  await server.stop()
  removeDirs(dirs)
})

describe('the contract table', () => {
  it('names exactly the routes of the build', () => {
    const built = builtRoutes().filter(({ method }) => method !== null).map(({ method, path }) => `${method} ${path}`)
    const named = ROUTES.map(route => route.key)
    expect(built.length).toBeGreaterThan(10)
    expect({ notInTable: built.filter(key => !named.includes(key)), notBuilt: named.filter(key => !built.includes(key)) }).toEqual({ notInTable: [], notBuilt: [] })
  })

  it('has no door without a method beside it', () => {
    expect(builtRoutes().filter(({ method }) => method === null).map(({ path }) => path).sort())
      .toEqual(['/**', '/__nuxt_error', '/__nuxt_island/**', '/_i18n/:hash/:locale/messages.json'])
  })

  it('is what the published description says', async () => {
    const document = await (await (await enter('owner'))('/_openapi.json')).json() as { openapi: string, paths: Record<string, Record<string, { 'x-ability': string }>> }
    expect(document.openapi).toBe('3.1.0')
    const described = Object.entries(document.paths).flatMap(([path, methods]) => Object.entries(methods).map(([method, operation]) => `${method.toUpperCase()} ${path.replace(/\{(\w+)\}/g, ':$1')} ${operation['x-ability']}`))
    expect(described.sort()).toEqual(ROUTES.map(({ key, contract }) => `${key} ${contract.ability}`).sort())
  })
})

describe.each(ROUTES)('$key', (route) => {
  it.each(WHO)('answers %s as the table says', async (who) => {
    const answer = await ask(await clientFor(who, route), route)
    const expected = promised(who, route)
    if (expected === 'let through') {
      expect([401, 403]).not.toContain(answer.status)
      expect(answer.status).toBeLessThan(500)
      return
    }
    expect(answer.status).toBe(expected)
    const { code, message } = await answer.json() as ErrorAnswer
    expect(message).not.toBe(`errors.${code}`)
  })
})

describe('across firms', () => {
  it.each(ROUTES.filter(({ path, method }) => path.includes(':') && method === 'GET'))('$key opens nothing of the first firm to the second', async (route) => {
    for (const id of ids) {
      const { status } = await ask(await clientFor('other', route), route, {}, id)
      expect(status).toBeGreaterThanOrEqual(400)
    }
  })

  it.each(ROUTES.filter(({ path, method }) => !path.includes(':') && method === 'GET'))('$key tells the second nothing of the first', async (route) => {
    const text = await (await ask(await clientFor('other', route), route)).text()
    expect(ids.filter(id => text.includes(id))).toEqual([])
    expect(text).not.toContain(first.name)
  })
})

const UNSAFE = ROUTES.filter(({ method }) => method !== 'GET')

describe.each(UNSAFE)('$key', (route) => {
  const who = mayAsk(route)
  it.each([['origin', 'https://elsewhere.example'], ['origin', 'null'], ['sec-fetch-site', 'cross-site'], ['sec-fetch-site', 'same-site']] as const)('is not taken from another site (%s: %s)', async (name, value) => {
    const answer = await ask(await clientFor(who ?? 'nobody', route), route, { headers: { [name]: value } })
    expect(answer.status).toBe(403)
    expect(((await answer.json()) as ErrorAnswer).code).toBe('cross-site')
  })
})

describe.each(UNSAFE.filter(route => route.contract.body && mayAsk(route)))('$key', (route) => {
  const who = mayAsk(route)
  it('takes nothing but JSON', async () => {
    const answer = await ask(await clientFor(who ?? 'nobody', route), route, { body: '{}', headers: { 'content-type': 'text/plain' } })
    expect(answer.status).toBe(415)
  })

  it('takes no more than its limit, whatever length is announced', async () => {
    const limit = route.contract.bodyLimit ?? 65_536
    const text = JSON.stringify({ much: 'x'.repeat(limit) })
    const client = await clientFor(who ?? 'nobody', route)
    const announced = await ask(client, route, { body: text, headers: { 'content-type': 'application/json' } })
    expect(announced.status).toBe(413)
    const chunked = await ask(client, route, { body: new Blob([text]).stream(), duplex: 'half', headers: { 'content-type': 'application/json' } } as RequestInit)
    expect(chunked.status).toBe(413)
  })
})
