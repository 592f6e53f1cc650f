import { spawn } from 'node:child_process'
import { randomBytes } from 'node:crypto'
import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { build, checkNode, install, root, run } from './lib/steps.mjs'

const FOLDERS = { NUXT_DATA_DIR: '.data', NUXT_KEY_DIR: '.keys', NUXT_CHECKPOINT_DIR: '.checkpoints' }
const folders = Object.fromEntries(Object.entries(FOLDERS).map(([name, folder]) => [name, process.env[name] ?? join(root, folder)]))
const host = process.env.HOST ?? 'localhost'
const port = process.env.PORT ?? '3000'
const mark = join(folders.NUXT_DATA_DIR, 'demonstration.json')

/** Moves data, keys and checkpoints aside, under one name of the moment; nothing is deleted. */
function moveAside() {
  const suffix = new Date().toISOString().replace(/[-:]|\..*/g, '')
  for (const folder of Object.values(folders)) {
    if (!existsSync(folder)) continue
    renameSync(folder, `${folder}.before-${suffix}`)
    console.log(`Moved ${folder} to ${folder}.before-${suffix}`)
  }
}

/** Fills the demonstration once. A data folder that something else made is left alone. */
function fill() {
  if (existsSync(mark)) return
  if (existsSync(folders.NUXT_DATA_DIR)) {
    console.error(`${folders.NUXT_DATA_DIR} is there and is not a demonstration. Choose another folder by NUXT_DATA_DIR, or start over with: npm run demo -- --fresh`)
    process.exit(1)
  }
  console.log('Filling the demonstration: eighteen months of visits …')
  const status = run(process.execPath, ['--import', 'tsx', join(root, 'server/cli/seed-demo.ts')], { env: { ...process.env, ...folders } })
  if (status !== 0) process.exit(status)
  mkdirSync(folders.NUXT_DATA_DIR, { recursive: true })
  writeFileSync(mark, JSON.stringify({ secret: randomBytes(33).toString('base64') }), { mode: 0o600 })
}

checkNode()
install()
build()
if (process.argv.includes('--fresh')) moveAside()
fill()

const { secret } = JSON.parse(readFileSync(mark, 'utf8'))
const address = `http://${host}:${port}`
const server = spawn(process.execPath, [join(root, '.output/server/index.mjs')], {
  cwd: root,
  stdio: ['ignore', 'pipe', 'inherit'],
  env: { ...process.env, ...folders, HOST: host, PORT: port, NUXT_SESSION_PASSWORD: secret, NUXT_PUBLIC_URL: address, NUXT_LOG_HOST: 'demo.tankside.example', NUXT_MAIL_FROM: 'Tankside <book@tankside.example>' },
})

let said = ''
server.stdout.on('data', (chunk) => {
  const before = said
  said += chunk
  if (/Listening on/.test(before) || !/Listening on/.test(said)) return
  console.log(`
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
})
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill('SIGTERM'))
server.on('exit', code => process.exit(code ?? 0))
