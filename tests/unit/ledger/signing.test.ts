import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { House } from '#server/services/house'
import { realWorld } from '#server/services/the-house'
import { signMix, signVisit } from '#server/services/sign-visit'
import { acknowledge, amendEntry, strikeEntry } from '#server/services/change-entry'
import { verifyFirm } from '#server/services/verify/verify-firm'
import { rebuildProjections } from '#server/services/rebuild-projections'
import { AppError } from '#shared/errors'
import type { Issue } from '#shared/errors'
import { toHex } from '#shared/ledger/hash'
import type { EntrySubmission } from '#shared/records/entry'
import { submissionHash } from '#shared/records/projection'
import type { VisitSubmission } from '#shared/records/visit'
import { actorOf, makeLedgerBooks } from '../../support/ledger'
import { makeFirm } from '../../support/firm'
import type { MadeFirm } from '../../support/firm'
import { removeDirs, temporaryDirs } from '../../support/server'
import { entrySubmission, id, visitSubmission } from '../../support/submission'

const dirs = temporaryDirs()
let house: House
let firm: MadeFirm
let books: ReturnType<typeof makeLedgerBooks>
const sign = (submission: VisitSubmission, member: 'applicator' | 'officer' = 'applicator') => signVisit({ file: books.file, actor: actorOf(firm, member), world: realWorld }, submission)
const head = (root: string) => books.file.raw.prepare('select * from entry_head where root = ? and until_seq is null').get(root) as Record<string, unknown>
const leaves = () => (books.file.raw.prepare('select count(*) as n from leaf').get() as { n: number }).n
const codes = (work: () => unknown): (string | Issue[])[] => {
  try {
    work()
    return []
  }
  catch (error) {
    if (error instanceof AppError) return [error.code, error.issues]
    throw error
  }
}
const first = <T>(list: T[]): T => {
  if (list[0] === undefined) throw new Error('empty')
  return list[0]
}

beforeAll(async () => {
  firm = await makeFirm(dirs)
  house = new House({ ...dirs, logHost: 'log.test.example' }, realWorld)
  books = makeLedgerBooks(house, firm)
})
afterAll(() => {
  house.close()
  removeDirs(dirs)
})

describe('a visit goes on record', () => {
  it('with its entries, consecutive, the visit first', () => {
    const submission = visitSubmission({ ...books, entries: 2 })
    const { receipt, repeated } = sign(submission)
    expect(repeated).toBe(false)
    expect(receipt.entries.map(e => e.id)).toEqual(submission.entries.map(e => e.facts.id))
    expect(first(receipt.entries).findings).toEqual([])
    const kinds = books.file.raw.prepare('select kind from leaf order by seq desc limit 3').all() as { kind: string }[]
    expect(kinds.map(k => k.kind)).toEqual(['application', 'application', 'visit'])
  })

  it('once: the same again is answered with the first answer, another under the same id is a conflict', () => {
    const submission = visitSubmission({ ...books })
    const { receipt } = sign(submission)
    const before = leaves()
    expect(sign(structuredClone(submission))).toEqual({ repeated: true, receipt })
    const other = structuredClone(submission)
    other.visit.words.note = 'something else'
    expect(codes(() => sign(other))[0]).toBe('id-in-use')
    expect(leaves()).toBe(before)
  })

  it('or not at all: one part that cannot be taken leaves nothing behind', () => {
    const submission = visitSubmission({ ...books, entries: 2 })
    const last = submission.entries[1] as EntrySubmission
    last.facts.lines[0]!.labelVersionId = id()
    submission.visit.facts.entries[1]!.hash = toHex(submissionHash(last))
    const before = leaves()
    expect(codes(() => sign(submission))).toEqual(['refused', [{ path: 'entries.1.facts.lines.0.labelVersionId', code: 'not-in-book' }]])
    expect(leaves()).toBe(before)
  })

  it('takes a record that is out of label, without a licence and late, and stores what was found', () => {
    const submission = visitSubmission({ ...books, licenceId: null, ended: 3 * 24 * 60, facts: { lines: [{ labelVersionId: books.labelVersionId, product: null, rate: null, amount: { value: '9.0', unit: 'fl_oz' }, counted: null, lot: null }], targets: [{ code: 'ants', text: 'Ants' }] } })
    const found = first(sign(submission).receipt.entries).findings.map(f => `${f.outcome} ${f.message} ${f.seen}`)
    expect(found).toEqual(['stop licence-none false', 'stop rate-above false', 'note late false'])
  })

  it('takes a place and a product as read', () => {
    const read = { read: { name: 'The Harbour Mill', address: '1 Mill Lane', number: null } }
    const submission = visitSubmission({ ...books, facts: { place: read, lines: [{ labelVersionId: null, product: { read: { name: 'Unknown can', address: null, number: '990099-1' } }, rate: null, amount: { value: '1', unit: 'fl_oz' }, counted: null, lot: null }] } })
    submission.visit.facts.place = read
    const { receipt } = sign(submission)
    expect(head(first(receipt.entries).root)).toMatchObject({ place_name: 'The Harbour Mill', place_id: null, number: '990099-1' })
  })

  it('with nothing applied needs a reason, and is a row of its own kind', () => {
    const reasonless = visitSubmission({ ...books, entries: 0 })
    expect(codes(() => sign(reasonless))).toEqual(['refused', [{ path: 'visit.facts.nothing', code: 'nothing-and-no-reason' }]])
    const visit = visitSubmission({ ...books, nothing: { code: 'no-access', text: 'Nobody opened' } })
    sign(visit)
    expect(head(visit.visit.facts.id)).toMatchObject({ kind: 'nothing', method_text: 'Nobody opened' })
  })

  it.each<[string, (s: EntrySubmission) => void, string, string]>([
    ['an end before its start', (s) => { s.facts.finishedAt = new Date(Date.parse(s.facts.startedAt) - 60_000).toISOString() }, 'facts.finishedAt', 'end-before-start'],
    ['a time later than the device’s clock', (s) => { s.facts.finishedAt = new Date(Date.parse(s.words.deviceNow) + 60_000).toISOString() }, 'facts.finishedAt', 'later-than-clock'],
    ['finished spray in square feet', (s) => { s.facts.finished = { value: '3', unit: 'sq_ft' } }, 'facts.finished', 'unit-does-not-fit'],
    ['no product', (s) => { s.facts.lines = [] }, 'facts.lines', 'nothing-applied'],
    ['two responsible people', (s) => { s.facts.people = [...s.facts.people, ...s.facts.people] }, 'facts.people', 'one-responsible'],
    ['a count that is not the amount', (s) => { s.facts.lines[0]!.counted = { of: 'placement', count: '14', each: { value: '0.5', unit: 'g' } }; s.facts.lines[0]!.amount = { value: '8', unit: 'g' } }, 'facts.lines.0.amount', 'count-and-amount-differ'],
  ])('refuses what is not a record: %s', (_, spoil, path, code) => {
    const submission = visitSubmission({ ...books })
    const entry = first(submission.entries)
    spoil(entry)
    first(submission.visit.facts.entries).hash = toHex(submissionHash(entry))
    expect(codes(() => sign(submission))).toEqual(['refused', [expect.objectContaining({ path: `entries.0.${path}`, code })]])
  })

  it('refuses a part that was changed after signing', () => {
    const submission = visitSubmission({ ...books })
    first(submission.entries).facts.finished = { value: '3.5', unit: 'gal' }
    expect(codes(() => sign(submission))).toEqual(['refused', [{ path: 'entries.0', code: 'part-altered' }]])
  })

  it('refuses a signer who was not there', () => {
    expect(codes(() => sign(visitSubmission({ ...books, personId: firm.people.officer.id, licenceId: null })))).toEqual(['refused', [{ path: 'visit.facts.present', code: 'not-yours' }]])
  })
})

describe('a record is corrected by a new row', () => {
  const officer = () => ({ file: books.file, actor: actorOf(firm, 'officer'), world: realWorld })
  const applicator = () => ({ file: books.file, actor: actorOf(firm, 'applicator'), world: realWorld })
  const onRecord = () => first(sign(visitSubmission({ ...books })).receipt.entries).root
  const correction = (root: string, onHead: string, value: string) => {
    const { facts, words } = entrySubmission({ ...books, facts: { finished: { value, unit: 'gal' } } }, null)
    return { facts: { ...facts, visitId: head(root).visit_id as string }, words, amends: { root, head: onHead, reason: 'misread the sight gauge' } }
  }
  const word = (root: string, onHead: string, says: 'confirmed' | 'disputed', because: string | null) => ({ facts: { v: 1 as const, id: id(), root, head: onHead, says, because }, words: { deviceNow: new Date().toISOString() } })

  it('by an officer: the author owes a word, and confirms', () => {
    const root = onRecord()
    const amendment = correction(root, root, '2.5')
    amendEntry(officer(), root, amendment)
    expect(head(root)).toMatchObject({ status: 'amended', confirmation: 'owed', owed_by: firm.people.applicator.id, head: amendment.facts.id })
    expect(codes(() => acknowledge(officer(), root, word(root, amendment.facts.id, 'confirmed', null)))[0]).toBe('not-allowed')
    acknowledge(applicator(), root, word(root, amendment.facts.id, 'confirmed', null))
    expect(head(root)).toMatchObject({ status: 'amended', confirmation: 'confirmed' })
  })

  it('a dispute needs its reason and changes no figure', () => {
    const root = onRecord()
    const amendment = correction(root, root, '2.5')
    amendEntry(officer(), root, amendment)
    expect(codes(() => acknowledge(applicator(), root, word(root, amendment.facts.id, 'disputed', null)))).toEqual(['refused', [{ path: 'facts.because', code: 'required' }]])
    acknowledge(applicator(), root, word(root, amendment.facts.id, 'disputed', 'it was three gallons'))
    expect(head(root)).toMatchObject({ confirmation: 'disputed', status: 'amended' })
  })

  it('by its author: no word is owed; only against the head that stands', () => {
    const root = onRecord()
    const amendment = correction(root, root, '2.5')
    amendEntry(applicator(), root, amendment)
    expect(head(root)).toMatchObject({ confirmation: 'none-owed' })
    expect(amendEntry(applicator(), root, structuredClone(amendment)).repeated).toBe(true)
    expect(codes(() => amendEntry(applicator(), root, correction(root, root, '2.0')))[0]).toBe('head-moved')
  })

  it('keeps the snapshot of what it does not change: a product renamed meanwhile keeps the name under which it was used', () => {
    const root = onRecord()
    books.file.raw.prepare('update product set name = ?').run('Renamed')
    amendEntry(officer(), root, correction(root, root, '2.5'))
    expect(head(root).product_name).toBe('Sillgard 6.4 CS')
    books.file.raw.prepare('update product set name = ?').run('Sillgard 6.4 CS')
  })

  it('struck is final, and readable', () => {
    const root = onRecord()
    const strike = { facts: { v: 1 as const, id: id(), root, head: root, reason: 'same work twice' }, words: { deviceNow: new Date().toISOString() } }
    strikeEntry(applicator(), root, strike)
    expect(head(root)).toMatchObject({ status: 'struck', product_name: 'Sillgard 6.4 CS' })
    expect(codes(() => amendEntry(officer(), root, correction(root, strike.facts.id, '1.0')))[0]).toBe('already-struck')
  })
})

describe('a tank', () => {
  it('gives each entry its share, exact, shown with one digit more', () => {
    const now = new Date().toISOString()
    const mix = { facts: { v: 1 as const, id: id(), branchId: books.branchId, madeAt: now, zone: 'America/New_York', by: { id: books.personId }, equipment: null, carrier: { code: 'water', text: 'Water' }, finished: { value: '9', unit: 'gal' as const }, lines: [{ labelVersionId: books.labelVersionId, product: null, amount: { value: '2.7', unit: 'fl_oz' as const }, lot: null }], leftFrom: null }, words: { note: null, deviceNow: now } }
    signMix({ file: books.file, actor: actorOf(firm, 'applicator'), world: realWorld }, mix)
    const visit = visitSubmission({ ...books, facts: { mixId: mix.facts.id, drawn: { value: '1', unit: 'gal' }, lines: [] } })
    sign(visit)
    const line = books.file.raw.prepare('select amount_value, amount_unit, share_of_mix from application_line join application using (seq) where id = ?').get(first(visit.entries).facts.id)
    expect(line).toEqual({ amount_value: '0.30', amount_unit: 'fl_oz', share_of_mix: 1 })
  })
})

describe('the file', () => {
  it('is verified good, and its projections can be written again', () => {
    expect(verifyFirm(books.file.raw)).toMatchObject({ good: true, problems: [] })
    expect(rebuildProjections(books.file.raw)).toBe(leaves())
    expect(verifyFirm(books.file.raw)).toMatchObject({ good: true, problems: [] })
  })
})
