import { readFileSync, readdirSync } from 'node:fs'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { newUuid, makeBooks, postVisit, visitSubmission } from '../support/books'
import { makeFirm } from '../support/firm'
import type { MadeFirm } from '../support/firm'
import { pdfText } from '../support/pdf'
import { type Client, type TestServer, removeDirs, signIn, startServer, temporaryDirs } from '../support/server'

const dirs = temporaryDirs()
let firm: MadeFirm
let server: TestServer
let applicator: Client
let officer: Client
let root: string

beforeAll(async () => {
  firm = await makeFirm(dirs)
  await makeFirm(dirs, { slug: 'salt-marsh', name: 'Salt Marsh Turf' })
  const books = await makeBooks(dirs, firm)
  server = await startServer({ dirs })
  applicator = await signIn(server, firm.people.applicator.email)
  officer = await signIn(server, firm.people.officer.email)
  const signed = await postVisit(applicator, visitSubmission(books, { change: entry => ({ ...entry, words: { ...entry.words, note: 'Gate was open.' } }) }))
  const [first] = signed.entries
  if (!first) throw new Error('no entry')
  root = first.facts.id
  const amendment = { facts: { ...first.facts, id: newUuid(), lines: first.facts.lines.map(l => ({ ...l, amount: { value: '0.80', unit: 'fl_oz' as const } })) }, words: first.words, amends: { root, head: root, reason: 'The jug was read again.' } }
  expect((await officer(`/api/applications/${root}/amendments`, { json: amendment })).status).toBe(201)
})
afterAll(async () => {
  await server.stop()
  removeDirs(dirs)
})

const bytesOf = async (client: Client) => Buffer.from(await (await client(`/api/applications/${root}/record.pdf`)).arrayBuffer())

describe('the record on paper', () => {
  it('says everything that an inspector asks for', async () => {
    const answer = await officer(`/api/applications/${root}/record.pdf`)
    expect(answer.headers.get('content-type')).toBe('application/pdf')
    expect(answer.headers.get('content-disposition')).toMatch(/^inline; filename="record-\d{6}-[0-9A-Z]{6}\.pdf"/)
    const text = pdfText(Buffer.from(await answer.arrayBuffer()))
    for (const said of ['Tomás Nguyễn', 'C5-81172', 'Dec 31, 2029', '22 Quarry Lane', 'EPA Reg. No. 990014-27', 'Demothrin 6.40%', '0.80 fl oz', '980 sq ft', 'Harbour House Tenants', 'Gate was open.', 'Amended by Maren Okafor: The jug was read again.', 'Amount 1: 0.75 fl oz → 0.80 fl oz']) expect(text).toContain(said)
  })

  it('keeps the firm’s own words from a customer', async () => {
    const text = pdfText(await bytesOf(await signIn(server, firm.customer.email)))
    expect(text).toContain('EPA Reg. No. 990014-27')
    expect(text).not.toContain('Gate was open.')
  })

  it('is the same bytes each time', async () => {
    expect((await bytesOf(officer)).equals(await bytesOf(officer))).toBe(true)
  })

  it('is nobody else’s', async () => {
    expect((await (await signIn(server, 'owner@salt-marsh.example'))(`/api/applications/${root}/record.pdf`)).status).toBe(404)
  })
})

describe('the drawing thread', () => {
  it('is bundled apart from the server, or it would start a second one', () => {
    const folder = '.output/server/workers'
    const files = readdirSync(folder)
    expect(files).toContain('pdf.worker.mjs')
    for (const file of files) expect(readFileSync(join(folder, file), 'utf8')).not.toMatch(/nitro\.mjs|\.\.\/chunks/)
  })
})
