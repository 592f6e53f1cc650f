import { join } from 'node:path'
import { expect, it } from 'vitest'
import { openReader } from '#server/database/connection'
import { verifyFirm } from '#server/services/verify/verify-firm'
import { makeFirm, withHouse } from '../support/firm'
import { makeLedgerBooks } from '../support/ledger'
import type { Client } from '../support/server'
import { removeDirs, signIn, startServer, temporaryDirs } from '../support/server'
import { visitSubmission } from '../support/submission'
import type { Named } from '../support/submission'

const KILLS = Number(process.env.KILLS ?? 10)
const CLIENTS = 8

/** Posts visits one after the other until the server is gone; `acknowledged` are those it said yes to. */
async function keepSigning(client: Client, books: Named, acknowledged: string[], count: () => void): Promise<void> {
  for (;;) {
    const visit = visitSubmission({ ...books })
    try {
      const answer = await client('/api/visits', { json: visit })
      await answer.text()
      if (answer.status !== 201) throw new Error(`answered ${answer.status}`)
      acknowledged.push(visit.visit.facts.id)
      count()
    }
    catch (error) {
      if (error instanceof TypeError) return
      throw error
    }
  }
}

it(`${KILLS} kills under load: nothing acknowledged is lost, the chain is whole`, async () => {
  const dirs = temporaryDirs()
  const firm = await makeFirm(dirs)
  const books = await withHouse(dirs, (house) => {
    const { file: _, ...named } = makeLedgerBooks(house, firm)
    return named
  })
  const acknowledged: string[] = []
  for (let kill = 0; kill < KILLS; kill++) {
    const server = await startServer({ dirs })
    const client = await signIn(server, firm.people.applicator.email)
    // The kill comes after a number of answers that no clock decides, in the middle of the others' requests.
    let left = 5 + Math.floor(Math.random() * 40)
    const enough = new Promise<void>((resolve) => {
      const count = () => {
        if (--left === 0) resolve()
      }
      void Promise.all(Array.from({ length: CLIENTS }, () => keepSigning(client, books, acknowledged, count))).finally(resolve)
    })
    await enough
    await server.kill()
    const raw = openReader(join(dirs.dataDir, 'firms', `${firm.slug}.sqlite`))
    const verdict = verifyFirm(raw)
    expect(verdict.problems).toEqual([])
    const on = new Set((raw.prepare('select id from visit').all() as { id: string }[]).map(row => row.id))
    raw.close()
    expect(acknowledged.filter(id => !on.has(id))).toEqual([])
  }
  expect(acknowledged.length).toBeGreaterThanOrEqual(KILLS * 5)
  removeDirs(dirs)
}, 240_000)
