import { spawn } from 'node:child_process'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'

/** What the program is started with, unless a test says otherwise. */
const SETTINGS = {
  HOST: '127.0.0.1',
  PORT: '0',
  NODE_ENV: 'production',
  NUXT_SESSION_PASSWORD: 'a test secret, long enough: 0123456789',
  NUXT_PUBLIC_URL: 'http://127.0.0.1',
  NUXT_LOG_HOST: 'log.test.example',
  NUXT_MAIL_URL: 'smtp://127.0.0.1:9',
  NUXT_MAIL_FROM: 'Tankside <book@tankside.example>',
}

export interface Dirs { dataDir: string, keyDir: string }

/** A data and a key folder of one's own. */
export function temporaryDirs(): Dirs {
  const base = mkdtempSync(join(tmpdir(), 'tankside-test-'))
  return { dataDir: join(base, 'data'), keyDir: join(base, 'keys') }
}
export const removeDirs = ({ dataDir }: Dirs): void => rmSync(join(dataDir, '..'), { recursive: true, force: true })

export interface TestServer {
  readonly url: string
  readonly dirs: Dirs
  readonly pid: number
  /** Everything said so far. */
  readonly output: () => { stdout: string, stderr: string }
  /** SIGTERM, then waits for the end. @throws when it did not end well or said anything on stderr that `expected` does not cover. */
  stop: (expected?: RegExp) => Promise<void>
  /** SIGKILL: as a power cut. */
  kill: () => Promise<void>
}

export interface StartOptions { dirs?: Dirs, env?: Record<string, string> }

/** Starts the built program on a free port and waits until it listens. @throws with what it said when it ends before that. */
export async function startServer({ dirs = temporaryDirs(), env = {} }: StartOptions = {}): Promise<TestServer> {
  const child = spawn(process.execPath, ['.output/server/index.mjs'], {
    env: { PATH: process.env.PATH, TZ: 'UTC', ...SETTINGS, NUXT_DATA_DIR: dirs.dataDir, NUXT_KEY_DIR: dirs.keyDir, NUXT_CHECKPOINT_DIR: join(dirs.dataDir, '..', 'checkpoints'), ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  const said = { stdout: '', stderr: '' }
  child.stderr.on('data', (chunk: Buffer) => { said.stderr += chunk })
  const ended = new Promise<number | NodeJS.Signals | null>(resolve => child.on('close', (code, signal) => resolve(code ?? signal)))
  const url = await new Promise<string>((resolve, reject) => {
    child.stdout.on('data', (chunk: Buffer) => {
      said.stdout += chunk
      const listening = /Listening on (http\S+)/.exec(said.stdout)?.[1]
      if (listening) resolve(listening)
    })
    void ended.then(how => reject(new Error(`the server ended (${how}) before it listened:\n${said.stdout}${said.stderr}`)))
  })

  return {
    url, dirs, pid: child.pid ?? 0,
    output: () => ({ ...said }),
    async stop(expected) {
      child.kill('SIGTERM')
      const how = await ended
      const noise = said.stderr.split('\n').filter(line => line !== '' && !expected?.test(line))
      if (how !== 0 || noise.length > 0) throw new Error(`the server ended with ${how} and said:\n${noise.join('\n')}`)
    },
    async kill() {
      child.kill('SIGKILL')
      await ended
    },
  }
}

/** Asks the server with this client's cookies; JSON goes in as `json`. */
export type Client = (path: string, init?: RequestInit & { json?: unknown }) => Promise<Response>

/** A client with a cookie jar of its own, as far as one site needs it. */
export function newClient(server: Pick<TestServer, 'url'>): Client {
  const jar = new Map<string, string>()
  return async (path, { json, ...init } = {}) => {
    const headers = new Headers(init.headers)
    if (jar.size > 0) headers.set('cookie', [...jar].map(([name, value]) => `${name}=${value}`).join('; '))
    if (json !== undefined) headers.set('content-type', 'application/json')
    const response = await fetch(new URL(path, server.url), { redirect: 'manual', ...init, ...(json === undefined ? {} : { body: JSON.stringify(json), method: init.method ?? 'POST' }), headers })
    for (const cookie of response.headers.getSetCookie()) keep(jar, cookie)
    return response
  }
}

function keep(jar: Map<string, string>, cookie: string): void {
  const [pair = '', ...attributes] = cookie.split(/;\s*/)
  const at = pair.indexOf('=')
  if (attributes.some(a => /^max-age=0$/i.test(a))) jar.delete(pair.slice(0, at))
  else jar.set(pair.slice(0, at), pair.slice(at + 1))
}

/** Of every account that `makeFirm` makes. */
export const TEST_PASSWORD = 'four quiet barn owls'

/** A client that is signed in, in the named firm where the account has several. */
export async function signIn(server: Pick<TestServer, 'url'>, email: string, options: { password?: string, firm?: string } = {}): Promise<Client> {
  const client = newClient(server)
  const answer = await client('/api/session', { json: { email, password: options.password ?? TEST_PASSWORD } })
  if (answer.status !== 201) throw new Error(`${email} was not let in: ${answer.status} ${await answer.text()}`)
  const { me } = await answer.json() as { me: { firm: { name: string } | null, memberships: { id: string, firm: string }[] } }
  if (options.firm && me.firm?.name !== options.firm) {
    const membershipId = me.memberships.find(m => m.firm === options.firm)?.id
    const chosen = await client('/api/session/firm', { json: { membershipId } })
    if (chosen.status !== 200) throw new Error(`${email} may not work in ${options.firm}: ${chosen.status}`)
  }
  return client
}
