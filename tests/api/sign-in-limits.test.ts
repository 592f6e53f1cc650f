import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { makeFirm, type MadeFirm } from '../support/firm'
import { type Dirs, TEST_PASSWORD, type TestServer, newClient, removeDirs, startServer, temporaryDirs } from '../support/server'

let first: MadeFirm
let template: Dirs
let server: TestServer
const knock = (email: string, password: string, headers: Record<string, string> = {}) => newClient(server)('/api/session', { json: { email, password }, headers })

async function serve(env: Record<string, string> = {}): Promise<void> {
  template = temporaryDirs()
  first = await makeFirm(template)
  server = await startServer({ dirs: template, env })
}
async function end(): Promise<void> {
  await server.stop()
  removeDirs(template)
}

describe('how often somebody may knock', () => {
  beforeAll(() => serve())
  afterAll(end)

  it('is five wrong passwords for an account from one address; then the right one does not help either', async () => {
    const { email } = first.people.owner
    const wrong: number[] = []
    for (let i = 0; i < 5; i++) wrong.push((await knock(email, 'not the password')).status)
    expect(wrong).toEqual([401, 401, 401, 401, 401])
    const sixth = await knock(email, TEST_PASSWORD)
    expect(sixth.status).toBe(429)
    expect(Number(sixth.headers.get('retry-after'))).toBeGreaterThan(14 * 60)
    expect((await knock(first.people.officer.email, TEST_PASSWORD)).status).toBe(201)
  })

  it('is not widened by a header that names another address', async () => {
    expect((await knock(first.people.owner.email, TEST_PASSWORD, { 'x-forwarded-for': '203.0.113.7' })).status).toBe(429)
  })

  it('is not passed by many at once', async () => {
    const answers = await Promise.all(Array.from({ length: 12 }, () => knock(first.people.applicator.email, 'not the password')))
    expect(answers.filter(a => a.status === 401).length).toBe(5)
    expect(answers.filter(a => a.status === 429).length).toBe(7)
  })

  it('starts anew after a right password', async () => {
    for (let round = 0; round < 3; round++) {
      for (let i = 0; i < 2; i++) expect((await knock(first.customer.email, 'not the password')).status).toBe(401)
      expect((await knock(first.customer.email, TEST_PASSWORD)).status).toBe(201)
    }
  })

  it('is three reset mails an hour for an address, whether it is an account’s or not', async () => {
    const ask = async (email: string) => (await newClient(server)('/api/links/reset', { json: { email } })).status
    for (const email of [first.people.officer.email, 'nobody@quarry-lane.example']) {
      const statuses: number[] = []
      for (let i = 0; i < 4; i++) statuses.push(await ask(email))
      expect(statuses).toEqual([202, 202, 202, 429])
    }
  })

  it('sends away whoever would wait behind twenty others, and lets the rest wait', async () => {
    const answers = await Promise.all(Array.from({ length: 30 }, (_, i) => knock(`stranger${i}@elsewhere.example`, 'not the password')))
    const away = answers.filter(a => a.status === 503)
    expect(away.length).toBe(8)
    expect(away[0]?.headers.get('retry-after')).toBe('5')
    expect(answers.filter(a => a.status === 401).length).toBe(22)
  })

  it('takes as long over an unknown address as over a wrong password', async () => {
    const time = async (email: string) => {
      const start = performance.now()
      await knock(email, 'not the password')
      return performance.now() - start
    }
    const [unknown, known] = [await time('nobody.at.all@quarry-lane.example'), await time(first.people.officer.email)]
    expect(unknown / known).toBeGreaterThan(0.4)
    expect(unknown / known).toBeLessThan(2.5)
  })
})

describe('behind the one proxy that is trusted', () => {
  beforeAll(() => serve({ NUXT_TRUSTED_PROXY: '127.0.0.1' }))
  afterAll(end)

  it('counts by the address that the proxy added last', async () => {
    const { email } = first.people.owner
    for (let i = 0; i < 5; i++) await knock(email, 'not the password', { 'x-forwarded-for': '198.51.100.1, 203.0.113.7' })
    expect((await knock(email, TEST_PASSWORD, { 'x-forwarded-for': '198.51.100.2, 203.0.113.7' })).status).toBe(429)
    expect((await knock(email, TEST_PASSWORD, { 'x-forwarded-for': '203.0.113.7, 203.0.113.8' })).status).toBe(201)
  })
})
