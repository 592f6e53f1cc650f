import { randomBytes } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { dirname, join, resolve } from 'node:path'
import { Passwords } from '#server/services/passwords'
import { localDay } from '#shared/time/zoned'
import { DEMO_PASSWORD, makeDemonstration } from '../../seeds/demo/make'
import { BRANCHES } from '../../seeds/demo/people'

/**
 * Fills a new data folder with the demonstration. It is made beside the folder and moved to its place when whole,
 * so that one that was interrupted leaves nothing that looks like data. `demonstration.json` tells `npm run demo` that
 * the folder is one, and keeps the session secret, so that who is signed in stays so over a restart.
 */
const dataDir = resolve(process.env.NUXT_DATA_DIR ?? '.data')
const keyDir = resolve(process.env.NUXT_KEY_DIR ?? '.keys')
if (existsSync(dataDir) && readdirSync(dataDir).length > 0) {
  console.error(`${dataDir} is not empty. The demonstration is only made in a folder of its own.`)
  process.exit(1)
}
const making = { dataDir: `${dataDir}.making-${process.pid}`, keyDir: `${keyDir}.making-${process.pid}` }
const started = Date.now()
const now = new Date()

try {
  mkdirSync(dirname(dataDir), { recursive: true })
  const password = await new Passwords().make(DEMO_PASSWORD)
  const made = await makeDemonstration({
    seed: process.env.DEMO_SEED ?? 'tankside', day: localDay(now.toISOString(), BRANCHES.CA.zone), now, password, house: { ...making, logHost: 'demo.tankside.example' },
    progress: (slug, done, of) => { if (done % 1000 === 0 || done === of) console.log(`  ${slug}: ${done} of ${of}`) },
  })
  for (const { firm, entries, leaves, settled, told, waiting } of made) console.log(`${firm}: ${entries} entries, ${leaves} leaves; ${waiting} notices wait, ${told} were told last, ${settled} lie in the past`)
  writeFileSync(join(making.dataDir, 'demonstration.json'), JSON.stringify({ secret: randomBytes(33).toString('base64') }), { mode: 0o600 })
  mkdirSync(keyDir, { recursive: true, mode: 0o700 })
  for (const name of readdirSync(making.keyDir)) {
    const key = join(keyDir, name)
    // a key may belong to a copy of the data elsewhere: it is never written over
    if (existsSync(key)) renameSync(key, `${key}.before-${started}`)
    renameSync(join(making.keyDir, name), key)
  }
  renameSync(making.dataDir, dataDir)
  console.log(`Made in ${((Date.now() - started) / 1000).toFixed(1)} s.`)
}
finally {
  for (const folder of Object.values(making)) rmSync(folder, { recursive: true, force: true })
}
