import { writeFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import type { Leaf } from '#shared/records/body'
import { noticeModel } from '#shared/notices/notice'
import { recordModel } from '#shared/reports/record'
import { finding } from '#shared/checks/finding'
import { words } from '#server/words/words'
import { PERSON, PRODUCT, noticeEntry, noticeSource } from '../notices/examples'
import { draw, pdfPages, pdfText } from '../../support/pdf'

const page = words('paper.record.page', { page: '{page}', pages: '{pages}' })
const notice = (...args: Parameters<typeof noticeSource>) => draw({ kind: 'notice', model: noticeModel(noticeSource(...args), words), createdAt: '2026-05-14T13:12:00.000Z', page })
/** For the eye: where `LOOK` names a folder, what was drawn stays there. */
const keep = (name: string, bytes: Uint8Array) => { if (process.env.LOOK) writeFileSync(`${process.env.LOOK}/${name}.pdf`, bytes) }

const author = { person: '0196c0de-0000-7000-8000-000000000007', name: 'Tomás Nguyễn' }
const officer = { person: '0196c0de-0000-7000-8000-000000000009', name: 'Maren Okafor' }
const common = { v: 1 as const, firm: '0196c0de-0000-7000-8000-000000000005', packs: [], inner: null }

function leaf(entry = noticeEntry()): Leaf<'application'> {
  const { facts, snapshot } = entry
  return {
    seq: 2, kind: 'application', id: facts.id, root: facts.id, receivedAt: '2026-05-14T13:15:00.000Z',
    body: { ...common, kind: 'application', id: facts.id, by: author, receivedAt: '2026-05-14T13:15:00.000Z', facts, snapshot, amends: null },
    inner: {
      words: { note: 'Dog in the yard until nine.', explanation: null, seen: [], given: { finished: 'entered', amounts: 'computed', areas: 'as-last-time', times: 'now', weather: 'entered' }, deviceNow: '2026-05-14T09:12:00-04:00' },
      findings: [finding('rate-in-range', 'stop', 'rate-above', { params: { product: 'Sillgard 6.4 CS' }, value: '0.70', limit: '0.60', unit: 'fl_oz/gal', seen: true }), finding('late', 'note', 'late', { params: { hours: '26' }, seen: false })],
    },
  }
}
function amended(): Leaf[] {
  const root = leaf()
  const id = '0196ce00-0000-7000-8000-000000000009'
  const facts = { ...root.body.facts, id, lines: root.body.facts.lines.map(l => ({ ...l, amount: { value: '0.95', unit: 'fl_oz' as const } })) }
  const amends = { root: root.id, head: root.id, reason: 'The jug was read again.' }
  return [root, { ...root, seq: 5, kind: 'amendment', id, receivedAt: '2026-05-15T10:00:00.000Z', body: { ...root.body, kind: 'amendment', id, by: officer, receivedAt: '2026-05-15T10:00:00.000Z', facts, amends } }]
}
function struck(): Leaf[] {
  const root = leaf()
  const id = '0196ce00-0000-7000-8000-000000000010'
  return [root, {
    seq: 7, kind: 'strike', id, root: root.id, receivedAt: '2026-05-16T10:00:00.000Z', inner: { words: { deviceNow: '2026-05-16T06:00:00-04:00' } },
    body: { ...common, kind: 'strike', id, by: author, receivedAt: '2026-05-16T10:00:00.000Z', facts: { v: 1, id, root: root.id, head: root.id, reason: 'Same work written twice.' }, snapshot: null, amends: null },
  }]
}
const record = (leaves: Leaf[], forFirm = true) => draw({ kind: 'record', model: recordModel(leaves, words, forFirm) })

describe('a notice on paper', () => {
  it('is one page that reads back word for word', async () => {
    const bytes = await notice()
    keep('notice', bytes)
    expect(pdfPages(bytes)).toBe(1)
    const text = pdfText(bytes)
    for (const said of ['22 Quarry Lane', 'Keep people and animals off the treated areas until they are fully dry.', 'EPA Reg. No. 990014-27', 'signal word CAUTION', 'Demothrin 6.40%', 'C5-81172', 'Tomás Nguyễn', '1-800-222-1222', 'page 1 of 1']) expect(text).toContain(said)
    expect(text).not.toMatch(/\bsafe/i)
  })

  it('holds twelve products and names of any length, and is the same bytes each time', async () => {
    const lines = Array.from({ length: 12 }, (_, n) => ({ ...PRODUCT, product: { ...PRODUCT.product, name: `Sillgard Extended Residual Microencapsulated Suspension ${n + 1}` } }))
    const [first] = noticeEntry().facts.lines
    const many = noticeEntry({ lines: lines.flatMap(() => first ?? []) }, { lines, people: [{ ...PERSON, name: 'Małgorzata Wiśniewska-Brzęczyszczykiewicz, Łódź' }] })
    const bytes = await notice([many, noticeEntry({ reentry: { until: 'hours', hours: '4' }, areas: [{ place: { code: 'kitchen', text: 'Kitchen' }, setting: 'indoors', size: null, how: 'estimated' }] })])
    keep('notice-many', bytes)
    expect(pdfText(bytes)).toContain('Małgorzata Wiśniewska-Brzęczyszczykiewicz, Łódź')
    expect(await notice()).toEqual(await notice())
  })
})

describe('a record on paper', () => {
  it('shows every field, the licence first of all', async () => {
    const bytes = await record([leaf()])
    keep('record', bytes)
    const text = pdfText(bytes)
    for (const said of ['260514-', 'C5-81172', 'Dec 31, 2027', '22 Quarry Lane', 'Albany, NY', 'EPA Reg. No. 990014-27', '0.90 fl oz', '0.30 fl oz per gal', 'L-2205', '1,116 sq ft', 'Chemical-resistant gloves', 'Business registration 15118', 'America/New_York', 'Dog in the yard', 'is above the label’s', 'page 1 of']) expect(text).toContain(said)
    expect(text).not.toMatch(/paper\.|common\.|notices\.|checks\.|catalogues\./)
  })

  it('keeps the firm’s own words from others', async () => {
    const text = pdfText(await record([leaf()], false))
    expect(text).not.toContain('Dog in the yard')
    expect(text).not.toContain('is above')
  })

  it('tells an amendment by its reason and difference', async () => {
    const bytes = await record(amended())
    keep('record-amended', bytes)
    const text = pdfText(bytes)
    for (const said of ['as amended', 'Amended by Maren Okafor: The jug was read again.', 'Amount 1: 0.90 fl oz → 0.95 fl oz', 'author’s word owed']) expect(text).toContain(said)
  })

  it('shows what was struck as struck, and readable', async () => {
    const bytes = await record(struck())
    keep('record-struck', bytes)
    expect(pdfText(bytes)).toMatch(/STRUCK: this entry was made in error.*Struck by Tomás Nguyễn: Same work written twice\./)
  })

  it('is letter size in the United States and A4 elsewhere', () => {
    const abroad = noticeEntry()
    abroad.snapshot.place = { ...abroad.snapshot.place, country: 'PL' }
    expect([recordModel([leaf()], words, true).paper, recordModel([leaf(abroad)], words, true).paper]).toEqual(['LETTER', 'A4'])
  })
})
