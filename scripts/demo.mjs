import { spawn } from 'node:child_process'
import { existsSync, readFileSync, readdirSync, renameSync } from 'node:fs'
import { createServer } from 'node:net'
import { join, resolve } from 'node:path'
import { build, checkNode, install, root, run } from './lib/steps.mjs'

const FOLDERS = { NUXT_DATA_DIR: '.data', NUXT_KEY_DIR: '.keys', NUXT_CHECKPOINT_DIR: '.checkpoints' }
const folders = Object.fromEntries(Object.entries(FOLDERS).map(([name, folder]) => [name, resolve(root, process.env[name] || folder)]))
const dataDir = folders.NUXT_DATA_DIR
const mark = join(dataDir, 'demonstration.json')
// `localhost` may be the IPv6 address alone, which not every machine can listen on
const host = process.env.HOST || '127.0.0.1'
const named = host === '127.0.0.1' ? 'localhost' : host.includes(':') ? `[${host}]` : host

function end(sentence) {
  console.error(sentence)
  process.exit(1)
}

/** The port to listen on, free at this moment; asked before anything is moved or made. */
function freePort() {
  const wanted = Number(process.env.PORT || 3000)
  return new Promise((resolve) => {
    const probe = createServer()
    probe.once('error', error => end(`${host}:${wanted} cannot be listened on (${error.code}). Stop what runs there (another demonstration?), or choose another by PORT and HOST.`))
    probe.listen(wanted, host, () => {
      const { port } = probe.address()
      probe.close(() => resolve(port))
    })
  })
}

/** Only what a demonstration made is ever moved, and only an empty place is filled: a firm's own data is left alone. */
function leaveOthersAlone() {
  if (!existsSync(dataDir) || readdirSync(dataDir).length === 0 || existsSync(mark)) return
  end(`${dataDir} holds data that is not a demonstration; it is left as it is. Choose another folder by NUXT_DATA_DIR (and NUXT_KEY_DIR, NUXT_CHECKPOINT_DIR).`)
}

/** Moves data, keys and checkpoints aside, under one name of the moment; nothing is deleted. */
function moveAside() {
  const suffix = new Date().toISOString().replace(/[-:]|\..*/g, '')
  for (const folder of Object.values(folders)) {
    if (!existsSync(folder)) continue
    renameSync(folder, `${folder}.before-${suffix}`)
    console.log(`Moved ${folder} to ${folder}.before-${suffix}`)
  }
}

function fill() {
  console.log('Filling the demonstration: eighteen months of visits, half a minute …')
  const status = run(process.execPath, ['--import', 'tsx', join(root, 'server/cli/seed-demo.ts')], { env: { ...process.env, ...folders } })
  if (status !== 0) process.exit(status)
}

function start(port) {
  const address = `http://${named}:${port}`
  const { secret } = JSON.parse(readFileSync(mark, 'utf8'))
  const server = spawn(process.execPath, [join(root, '.output/server/index.mjs')], {
    cwd: root,
    stdio: ['ignore', 'pipe', 'inherit'],
    env: { ...process.env, ...folders, HOST: host, PORT: String(port), NUXT_SESSION_PASSWORD: secret, NUXT_PUBLIC_URL: address, NUXT_LOG_HOST: 'demo.tankside.example', NUXT_MAIL_URL: '', NUXT_MAIL_FROM: 'Tankside <book@tankside.example>' },
  })
  let said = ''
  server.stdout.on('data', (chunk) => {
    if (/Listening on/.test(said)) return
    said += chunk
    if (/Listening on/.test(said)) welcome(address)
  })
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill('SIGTERM'))
  server.on('exit', code => process.exit(code ?? 0))
}

const welcome = address => console.log(`
Tankside, demonstration: ${address}

Everyone's password is tankside-demo; the sign-in page has a button for each.
  applicator@alder-wick.example     records visits
  technician@alder-wick.example     works under supervision
  officer@alder-wick.example        finds, amends, exports, sends
  owner@alder-wick.example          all of that, and invites people
  customer@alder-wick.example       reads what was done at the own place
  owner@second-firm.example         the second firm, and works for the first
Mail it sends is shown at ${address}/demo/mailbox. Stop it with Ctrl+C; run it again and the data is kept.
`)

checkNode()
leaveOthersAlone()
const port = await freePort()
install()
build()
if (process.argv.includes('--fresh')) moveAside()
if (!existsSync(mark)) fill()
start(port)
