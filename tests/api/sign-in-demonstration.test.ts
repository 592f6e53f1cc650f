import { afterEach, describe, expect, it } from 'vitest'
import type { DemoAccount } from '#server/services/demonstration'
import { makeFirm } from '../support/firm'
import { type Dirs, type TestServer, newClient, removeDirs, startServer, temporaryDirs } from '../support/server'

let dirs: Dirs
let server: TestServer | undefined
afterEach(async () => {
  const running = server
  server = undefined
  await running?.stop()
  removeDirs(dirs)
})
async function serve(options: { demo: boolean, env?: Record<string, string> }): Promise<TestServer> {
  dirs = temporaryDirs()
  await makeFirm(dirs, { demo: options.demo })
  server = await startServer({ dirs, env: options.env ?? {} })
  return server
}

describe('the demonstration', () => {
  it('lets somebody near in with one click, under a cookie of its own that needs no https', async () => {
    const client = newClient(await serve({ demo: true }))
    const { accounts } = await (await client('/api/demo/accounts')).json() as { accounts: DemoAccount[] }
    expect(accounts.map(a => a.email)).toEqual(['applicator@quarry-lane.example', 'customer@quarry-lane.example', 'officer@quarry-lane.example', 'owner@quarry-lane.example'])
    const answer = await client('/api/demo/session', { json: { email: 'officer@quarry-lane.example' } })
    expect(answer.status).toBe(201)
    expect(answer.headers.getSetCookie()).toEqual([expect.stringMatching(/^tankside-demo=[^;]+; Max-Age=2592000; Path=\/; HttpOnly; SameSite=Lax$/)])
    expect(await (await client('/api/session')).json()).toMatchObject({ me: { roles: ['officer'], demo: true }, demo: true })
    expect(await (await client('/account')).text()).toContain('demonstration')
  })

  it.each(['x-forwarded-for', 'forwarded', 'x-real-ip', 'via'])('is shut for what a proxy hands on (%s)', async (name) => {
    const client = newClient(await serve({ demo: true }))
    const headers = { [name]: '127.0.0.1' }
    expect((await client('/api/demo/accounts', { headers })).status).toBe(404)
    expect((await client('/api/demo/session', { json: { email: 'officer@quarry-lane.example' }, headers })).status).toBe(404)
    expect(await (await client('/api/session', { headers })).json()).toEqual({ me: null, demo: false })
  })

  it('does not exist in a folder that it did not make', async () => {
    const client = newClient(await serve({ demo: false }))
    expect((await client('/api/demo/session', { json: { email: 'officer@quarry-lane.example' } })).status).toBe(404)
    expect(await (await client('/sign-in')).text()).not.toContain('officer@quarry-lane.example')
  })

  it.each(['0.0.0.0', '::', ''])('does not start where the outside could reach it (HOST=%s)', async (host) => {
    await expect(serve({ demo: true, env: { HOST: host } })).rejects.toThrow(/HOST: this data folder is a demonstration/)
  })
})

describe('the start', () => {
  it.each([['NUXT_SESSION_PASSWORD', 'short'], ['NUXT_SESSION_PASSWORD', 'a'.repeat(40)], ['NUXT_PUBLIC_URL', 'book.example'], ['NUXT_LOG_HOST', ''], ['NUXT_MAIL_URL', 'http://mail'], ['NUXT_MAIL_FROM', 'nobody']])('is refused by name for a setting that will not do: %s=%s', async (name, value) => {
    await expect(serve({ demo: false, env: { [name]: value } })).rejects.toThrow(new RegExp(`${name}: `))
  })
})
