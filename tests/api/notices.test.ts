import { createHash } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { NoticeAnswer, NoticeLine } from '#shared/api/contract/notices'
import { leavesOf } from '#server/database/firm/repositories/leaves'
import { makeBooks, postVisit, visitSubmission } from '../support/books'
import type { MadeBooks } from '../support/books'
import { makeFirm, withHouse } from '../support/firm'
import type { MadeFirm } from '../support/firm'
import { startMailServer } from '../support/mail'
import type { MailServer } from '../support/mail'
import { pdfPages, pdfText } from '../support/pdf'
import { type Client, type TestServer, removeDirs, signIn, startServer, temporaryDirs } from '../support/server'

const dirs = temporaryDirs()
let firm: MadeFirm
let books: MadeBooks
let post: MailServer
let server: TestServer
let applicator: Client
let officer: Client
let customer: Client

beforeAll(async () => {
  firm = await makeFirm(dirs)
  books = await makeBooks(dirs, firm)
  post = await startMailServer()
  server = await startServer({ dirs, env: { NUXT_MAIL_URL: post.url } })
  applicator = await signIn(server, firm.people.applicator.email)
  officer = await signIn(server, firm.people.officer.email)
  customer = await signIn(server, firm.customer.email)
})
afterAll(async () => {
  await server.stop()
  await post.stop()
  removeDirs(dirs)
})

const read = async <T>(client: Client, path: string, init?: Parameters<Client>[1]): Promise<T> => (await client(path, init)).json() as Promise<T>
const noticeOf = async (visitId: string): Promise<NoticeLine> => {
  const { rows } = await read<{ rows: NoticeLine[] }>(officer, '/api/notices')
  const found = rows.find(row => row.visitId === visitId)
  if (!found) throw new Error(`no notice of ${visitId}`)
  return found
}
const show = (id: string): Promise<NoticeAnswer> => read(officer, `/api/notices/${id}`)
/** Asks until it is so: what a job does is told by no answer. */
async function until(id: string, so: (notice: NoticeAnswer) => boolean): Promise<NoticeAnswer> {
  const ends = Date.now() + 20_000
  for (;;) {
    const notice = await show(id)
    if (so(notice)) return notice
    if (Date.now() > ends) throw new Error(`the notice stays as it is: ${JSON.stringify({ ...notice, model: null, html: null, text: null })}`)
  }
}
const sign = (notify: string[] = []) => postVisit(applicator, visitSubmission(books, { notify, followUpAfter: 60 })).then(s => s.visit.facts.id)
const whats = (notice: NoticeAnswer) => notice.events.map(event => event.what)

describe('a notice that was tapped "send when signed"', () => {
  it('arrives as text, HTML and a page to keep; its leaf has the hash of the bytes', async () => {
    const visitId = await sign([firm.customer.id])
    const { raw, mail, to } = await post.next()
    const { id } = await noticeOf(visitId)
    expect(to).toEqual([firm.customer.email])
    expect(mail.messageId).toBe(`<${id}@${firm.slug}.tankside>`)
    expect(mail.from?.text).toContain('book@quarry-lane.example')
    expect(mail.headers.get('content-language')).toBe('en-US')
    for (const said of ['Keep people and animals off the treated areas until they are fully dry.', 'EPA Reg. No. 990014-27', 'Bedrow G', 'C5-81172', '1-800-222-1222']) {
      expect(mail.text).toContain(said)
      expect(mail.html).toContain(said)
    }
    const [pdf] = mail.attachments
    expect(pdf?.contentType).toBe('application/pdf')
    const text = pdfText(pdf?.content ?? Buffer.alloc(0))
    for (const said of ['Treatment notice', '22 Quarry Lane', 'Tomás Nguyễn', '0.75 fl oz', 'Next visit']) expect(text.toLowerCase()).toContain(said.toLowerCase())
    expect(pdfPages(pdf?.content ?? Buffer.alloc(0))).toBeLessThanOrEqual(2)
    expect(`${mail.text} ${mail.html} ${text}`).not.toMatch(/\bsafe/i)

    const notice = await until(id, n => n.state === 'sent')
    expect(whats(notice)).toEqual(['released', 'composed', 'sent'])
    expect(notice.contentHash).toBe(createHash('sha256').update(raw).digest('hex'))
  })
})

describe('a notice that waits', () => {
  it('goes when the officer lets it go, and only then', async () => {
    const visitId = await sign()
    const line = await noticeOf(visitId)
    expect(line).toMatchObject({ state: 'planned', waiting: true, address: firm.customer.email })
    expect((await read<{ rows: NoticeLine[] }>(officer, '/api/notices?state=waiting')).rows.map(row => row.id)).toContain(line.id)
    const preview = await show(line.id)
    expect(preview.model?.leads).toEqual(['Keep people and animals off the treated areas until they are fully dry.'])
    expect((await customer(`/api/notices/${line.id}`)).status).toBe(404)
    expect((await applicator(`/api/notices/${line.id}/release`, { method: 'POST' })).status).toBe(403)

    expect((await officer(`/api/notices/${line.id}/release`, { method: 'POST' })).status).toBe(202)
    const { mail } = await post.next()
    expect(mail.messageId).toContain(line.id)
    expect(mail.text).toContain(preview.text?.slice(0, 200))
    await until(line.id, n => n.state === 'sent')
    expect((await officer(`/api/notices/${line.id}/release`, { method: 'POST' })).status).toBe(409)
    expect((await customer(`/api/notices/${line.id}`)).status).toBe(200)
  })

  it('can be handed over on paper instead; the leaf has the hash of the page', async () => {
    const line = await noticeOf(await sign())
    const page = Buffer.from(await (await officer(`/api/notices/${line.id}/notice.pdf`)).arrayBuffer())
    expect((await officer(`/api/notices/${line.id}/handed-over`, { method: 'POST' })).status).toBe(200)
    const notice = await show(line.id)
    expect(notice).toMatchObject({ state: 'handed-over', contentHash: createHash('sha256').update(page).digest('hex') })
    expect(whats(notice)).toEqual(['planned', 'handed-over'])
  })
})

describe('a mail server that refuses', () => {
  it('is tried again later for a while, and the trouble shows', async () => {
    post.refuse = 451
    const line = await noticeOf(await sign([firm.customer.id]))
    const notice = await until(line.id, n => n.trouble !== null)
    expect(notice).toMatchObject({ state: 'planned', attempts: 1, trouble: expect.stringContaining('451') })
    expect(whats(notice)).toEqual(['released', 'composed', 'not-taken'])
    post.refuse = null
  })

  it('is given up when it says never, and the same mail goes when tried again', async () => {
    post.refuse = 550
    const line = await noticeOf(await sign([firm.customer.id]))
    const failed = await until(line.id, n => n.state === 'failed')
    post.refuse = null
    expect((await officer(`/api/notices/${line.id}/again`, { method: 'POST' })).status).toBe(202)
    const { raw, mail } = await post.next()
    expect(mail.messageId).toBe(`<${line.id}@${firm.slug}.tankside>`)
    expect(createHash('sha256').update(raw).digest('hex')).toBe(failed.contentHash)
    expect(whats(await until(line.id, n => n.state === 'sent'))).toEqual(['released', 'composed', 'failed', 'tried-again', 'sent'])
  })
})

describe('after a power cut in mid-sending', () => {
  it('the mail goes again under the same Message-ID, and the history says perhaps twice', async () => {
    const line = await noticeOf(await sign([firm.customer.id]))
    const first = await post.next()
    await until(line.id, n => n.state === 'sent')
    await server.stop()
    await withHouse(dirs, (house) => {
      const { raw } = house.firm(firm.slug)
      // as the file stands when the process died between the other side's answer and the commit
      raw.prepare('update outbox set state = \'sending\', lease_until = \'2026-01-01T00:00:00.000Z\' where notice_id = ?').run(line.id)
      raw.prepare('update notice set state = \'planned\' where id = ?').run(line.id)
      const [leaf] = leavesOf(raw, line.id)
      expect(leaf?.body).toMatchObject({ kind: 'notice', by: { job: 'notices' }, facts: { channel: 'mail', contentHash: createHash('sha256').update(first.raw).digest('hex'), releasedBy: firm.people.applicator.id } })
    })
    server = await startServer({ dirs, env: { NUXT_MAIL_URL: post.url } })
    const second = await post.next()
    expect(second.raw.equals(first.raw)).toBe(true)
    officer = await signIn(server, firm.people.officer.email)
    expect(whats(await until(line.id, n => n.state === 'sent')).slice(-2)).toEqual(['unanswered', 'sent-perhaps-twice'])
  })
})
