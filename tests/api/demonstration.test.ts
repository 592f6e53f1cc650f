import { execFile } from 'node:child_process'
import { existsSync, mkdirSync, readFileSync, readdirSync, statSync, writeFileSync } from 'node:fs'
import { createServer } from 'node:net'
import type { AddressInfo } from 'node:net'
import { dirname, join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { DaybookRow, TodayList } from '#shared/api/contract/daybook'
import { newClient, removeDirs, startServer, temporaryDirs } from '../support/server'
import type { Client, Dirs, TestServer } from '../support/server'

interface Ended { code: number, said: string }
/** Runs a command of the program, as npm does. */
const command = (args: string[], { dataDir, keyDir }: Dirs, env: Record<string, string> = {}) => new Promise<Ended>((resolve) => {
  execFile(process.execPath, args, { env: { ...process.env, NUXT_DATA_DIR: dataDir, NUXT_KEY_DIR: keyDir, NUXT_CHECKPOINT_DIR: join(dirname(dataDir), 'checkpoints'), ...env } },
    (error, stdout, stderr) => resolve({ code: error ? Number(error.code ?? 1) : 0, said: stdout + stderr }))
})
const SEED = ['--import', 'tsx', 'server/cli/seed-demo.ts']

// what is asked before anything is installed, built, moved or made
describe('npm run demo', () => {
  it.each([[[]], [['--fresh']]])('leaves data alone that is not a demonstration (%s)', async (args) => {
    const dirs = temporaryDirs()
    mkdirSync(dirs.dataDir, { recursive: true })
    writeFileSync(join(dirs.dataDir, 'directory.sqlite'), 'a firm’s own')
    const { code, said } = await command(['scripts/demo.mjs', ...args], dirs, { PORT: '0' })
    expect(code).toBe(1)
    expect(said).toContain('is not a demonstration; it is left as it is')
    expect(readdirSync(dirname(dirs.dataDir))).toEqual(['data'])
    expect(readFileSync(join(dirs.dataDir, 'directory.sqlite'), 'utf8')).toBe('a firm’s own')
    removeDirs(dirs)
  })

  it('says so when something listens on its port, and makes nothing', async () => {
    const other = createServer()
    await new Promise<void>(resolve => other.listen(0, '127.0.0.1', resolve))
    const dirs = temporaryDirs()
    const { port } = other.address() as AddressInfo
    const { code, said } = await command(['scripts/demo.mjs'], dirs, { PORT: String(port), HOST: '127.0.0.1' })
    expect(code).toBe(1)
    expect(said).toContain(`127.0.0.1:${port} cannot be listened on (EADDRINUSE)`)
    expect(existsSync(dirs.dataDir)).toBe(false)
    await new Promise(resolve => other.close(resolve))
    removeDirs(dirs)
  })
})

describe('the demonstration as the command fills it, today', () => {
  const dirs = temporaryDirs()
  let server: TestServer
  const enter = async (email: string): Promise<Client> => {
    const client = newClient(server)
    expect((await client('/api/demo/session', { json: { email } })).status).toBe(201)
    return client
  }
  const get = async <T>(client: Client, path: string): Promise<T> => {
    const answer = await client(path)
    if (answer.status !== 200) throw new Error(`${path}: ${answer.status} ${await answer.text()}`)
    return await answer.json() as T
  }

  beforeAll(async () => {
    const { code, said } = await command(SEED, dirs)
    if (code !== 0) throw new Error(said)
    server = await startServer({ dirs, env: { NUXT_LOG_HOST: 'demo.tankside.example', NUXT_MAIL_URL: '' } })
  })
  afterAll(async () => {
    await server.stop()
    removeDirs(dirs)
  })

  it('is marked as one, its secret is nobody else’s to read, and it is never filled twice', async () => {
    const mark = join(dirs.dataDir, 'demonstration.json')
    expect(statSync(mark).mode & 0o077).toBe(0)
    expect((JSON.parse(readFileSync(mark, 'utf8')) as { secret: string }).secret.length).toBeGreaterThanOrEqual(32)
    expect(readdirSync(dirs.keyDir).sort()).toEqual(['alder-wick.ed25519.pem', 'second-firm.ed25519.pem'])
    expect((await command(SEED, dirs)).said).toContain('is not empty')
  })

  it('offers six accounts, and the second firm’s owner works for the first too', async () => {
    const { accounts } = await get<{ accounts: { email: string, firms: { firm: string, roles: string[] }[] }[] }>(newClient(server), '/api/demo/accounts')
    const local = ['applicator', 'customer', 'officer', 'owner', 'technician'].map(name => `${name}@alder-wick.example`)
    expect(accounts.map(account => account.email).sort()).toEqual([...local, 'owner@second-firm.example'].sort())
    expect(accounts.find(account => account.email === 'owner@second-firm.example')?.firms.map(firm => firm.firm).sort()).toEqual(['Alder & Wick Pest and Turf', 'Brackwater Lawn and Tree'])
  })

  const today = async (client: Client) => (await get<{ lists: TodayList[] }>(client, '/api/today')).lists.filter(list => list.count > 0).map(list => list.list)

  it('has something on everyone’s Today', async () => {
    expect(await today(await enter('applicator@alder-wick.example'))).toEqual(expect.arrayContaining(['due', 'recent']))
    expect(await today(await enter('officer@alder-wick.example'))).toEqual(expect.arrayContaining(['owed', 'late', 'notices-waiting', 'licences', 'as-read']))
  })

  it('finds a product whose registration ended by its number, and has notices wait for the officer', async () => {
    const officer = await enter('officer@alder-wick.example')
    const { rows } = await get<{ rows: DaybookRow[] }>(officer, '/api/applications?q=990101-3&limit=5')
    expect(rows.length).toBeGreaterThan(0)
    const { rows: waiting } = await get<{ rows: unknown[] }>(officer, '/api/notices?state=waiting')
    expect(waiting.length).toBeGreaterThan(0)
  })

  it('shows the customer what was done at the own place, and the mail that told of it', async () => {
    const { rows } = await get<{ rows: DaybookRow[] }>(await enter('customer@alder-wick.example'), '/api/applications?limit=200')
    expect(rows.length).toBeGreaterThan(20)
    expect(rows.every(row => row.place.name.startsWith('Harbor Hill'))).toBe(true)
    const { mails } = await get<{ mails: { to: string }[] }>(newClient(server), '/api/demo/mailbox')
    expect(mails.length).toBeGreaterThan(0)
  })
})
