import { join } from 'node:path'
import Database from 'better-sqlite3'
import { makeFirm, withHouse } from '../support/firm'
import { makeLedgerBooks } from '../support/ledger'
import { removeDirs, signIn, startServer, temporaryDirs } from '../support/server'
import type { Client } from '../support/server'
import { visitSubmission } from '../support/submission'

/**
 * Whole visits of one entry through HTTP, 32 clients of one firm, as a ratio to the floor: one bare row of the same size a commit,
 * `synchronous=FULL`, on the same disk. Floor and ours in turn; the median of the rounds' ratios counts, seconds never do.
 */
const ROUNDS = Number(process.env.ROUNDS ?? 5)
const SECONDS = Number(process.env.SECONDS ?? 3)
const CLIENTS = 32

function floor(folder: string, body: Buffer): number {
  const raw = new Database(join(folder, `floor-${Date.now()}.sqlite`))
  raw.pragma('journal_mode = WAL')
  raw.pragma('synchronous = FULL')
  raw.exec('create table row (n integer primary key, body blob not null) strict')
  const insert = raw.prepare('insert into row (body) values (?)')
  const until = performance.now() + SECONDS * 1000
  let rows = 0
  for (; performance.now() < until; rows++) insert.run(body)
  raw.close()
  return rows / SECONDS
}

const median = (list: number[]): number => list.toSorted((a, b) => a - b)[Math.floor(list.length / 2)] ?? Number.NaN

/** 32 clients sign one visit after the other until the round is over. @returns visits a second and latencies in ms */
async function signAll(client: Client): Promise<{ rate: number, latencies: number[] }> {
  const latencies: number[] = []
  const until = performance.now() + SECONDS * 1000
  await Promise.all(Array.from({ length: CLIENTS }, async () => {
    while (performance.now() < until) {
      const started = performance.now()
      const answer = await client('/api/visits', { json: visitSubmission({ ...books }) })
      await answer.arrayBuffer()
      if (answer.status !== 201) throw new Error(`answered ${answer.status}`)
      latencies.push(performance.now() - started)
    }
  }))
  return { rate: latencies.length / SECONDS, latencies: latencies.toSorted((x, y) => x - y) }
}

const at = (sorted: number[], share: number): string => (sorted[Math.floor(sorted.length * share)] ?? Number.NaN).toFixed(1)

const dirs = temporaryDirs()
const firm = await makeFirm(dirs)
const books = await withHouse(dirs, (house) => {
  const { file: _, ...named } = makeLedgerBooks(house, firm)
  return named
})
const server = await startServer({ dirs })
const client = await signIn(server, firm.people.applicator.email)
const body = Buffer.from(JSON.stringify(visitSubmission({ ...books })))
const ratios: number[] = []
for (let round = 1; round <= ROUNDS; round++) {
  const bare = floor(dirs.dataDir, body)
  const { rate, latencies } = await signAll(client)
  ratios.push(rate / bare)
  console.log(`round ${round}: floor ${bare.toFixed(0)} rows/s, visits ${rate.toFixed(0)}/s, ratio ${(rate / bare).toFixed(2)}; latency p50 ${at(latencies, 0.5)} ms, p99 ${at(latencies, 0.99)} ms`)
}
console.log(`visits through HTTP, ${CLIENTS} clients ÷ bare one-row commits: median ${median(ratios).toFixed(2)} (${Math.min(...ratios).toFixed(2)} to ${Math.max(...ratios).toFixed(2)})`)
await server.stop()
removeDirs(dirs)
