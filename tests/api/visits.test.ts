import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { VisitReceipt } from '#shared/api/contract/visits'
import { verifyFirm } from '#server/services/verify/verify-firm'
import { openReader } from '#server/database/connection'
import { join } from 'node:path'
import { makeFirm, withHouse } from '../support/firm'
import type { MadeFirm } from '../support/firm'
import { makeLedgerBooks } from '../support/ledger'
import { removeDirs, signIn, startServer, temporaryDirs } from '../support/server'
import type { Client, TestServer } from '../support/server'
import { visitSubmission } from '../support/submission'
import type { Named } from '../support/submission'

const dirs = temporaryDirs()
let server: TestServer
let firm: MadeFirm
let books: Named
let applicator: Client

beforeAll(async () => {
  firm = await makeFirm(dirs)
  books = await withHouse(dirs, (house) => {
    const { file: _, ...named } = makeLedgerBooks(house, firm)
    return named
  })
  server = await startServer({ dirs })
  applicator = await signIn(server, firm.people.applicator.email)
})
afterAll(async () => {
  await server.stop()
  removeDirs(dirs)
})

const verdict = () => {
  const raw = openReader(join(dirs.dataDir, 'firms', `${firm.slug}.sqlite`))
  const found = verifyFirm(raw)
  raw.close()
  return found
}

describe('POST /api/visits', () => {
  it('posted 100 times at once is one visit', async () => {
    const before = verdict().leaves
    const visit = visitSubmission({ ...books, entries: 2 })
    const answers = await Promise.all(Array.from({ length: 100 }, () => applicator('/api/visits', { json: visit })))
    const statuses = answers.map(a => a.status).sort()
    expect(statuses.filter(s => s === 201)).toHaveLength(1)
    expect(statuses.filter(s => s === 200)).toHaveLength(99)
    const receipts = await Promise.all(answers.map(a => a.json() as Promise<VisitReceipt>))
    for (const receipt of receipts) expect(receipt).toEqual(receipts[0])
    expect(verdict()).toMatchObject({ good: true, leaves: before + 3 })
  })

  it('names the field, the reason and the way out', async () => {
    const visit = visitSubmission({ ...books, entries: 0 })
    const answer = await applicator('/api/visits', { json: visit })
    expect(answer.status).toBe(422)
    expect(await answer.json()).toEqual({
      code: 'refused', message: expect.stringContaining('nothing you typed is lost'), detail: null,
      issues: [{ path: 'visit.facts.nothing', code: 'nothing-and-no-reason', message: 'Nothing was applied and no reason is given. Add a treatment, or say why nothing was applied.' }],
    })
  })

  it('refuses what has not the shape, before anything is looked at', async () => {
    const visit = visitSubmission({ ...books })
    const entry = visit.entries[0]
    const answer = await applicator('/api/visits', { json: { ...visit, entries: [{ ...entry, facts: { ...entry?.facts, finished: { value: 'three', unit: 'gal' } } }] } })
    expect(answer.status).toBe(400)
    expect(await answer.json()).toMatchObject({ code: 'malformed', issues: [{ path: 'entries.0.facts.finished.value', code: 'wrong-form' }] })
  })

  it('is not an officer’s to sign', async () => {
    const officer = await signIn(server, firm.people.officer.email)
    expect((await officer('/api/visits', { json: visitSubmission({ ...books }) })).status).toBe(403)
  })
})
