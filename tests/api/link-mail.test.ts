import { afterAll, beforeAll, expect, it } from 'vitest'
import { makeFirm } from '../support/firm'
import type { MadeFirm } from '../support/firm'
import { startMailServer } from '../support/mail'
import type { MailServer } from '../support/mail'
import { newClient, removeDirs, signIn, startServer, temporaryDirs } from '../support/server'
import type { TestServer } from '../support/server'

const dirs = temporaryDirs()
const NEW_PASSWORD = 'seven slow green herons'
let server: TestServer
let firm: MadeFirm
let mail: MailServer

beforeAll(async () => {
  firm = await makeFirm(dirs)
  mail = await startMailServer()
  server = await startServer({ dirs, env: { NUXT_MAIL_URL: mail.url } })
})
afterAll(async () => {
  await server.stop()
  await mail.stop()
  removeDirs(dirs)
})

const tokenIn = (text: string | undefined) => /http\S+#(\S+)/.exec(text ?? '')?.[1] ?? ''

it('a reset link arrives by SMTP, leads to a new password, once', async () => {
  const asked = await newClient(server)('/api/links/reset', { json: { email: firm.people.officer.email } })
  expect(asked.ok).toBe(true)
  const { mail: letter, to } = await mail.next()
  expect(to).toEqual([firm.people.officer.email])
  const token = tokenIn(letter.text)
  expect(token.length).toBeGreaterThan(20)
  const use = () => newClient(server)('/api/links/use', { json: { token, password: NEW_PASSWORD } })
  expect((await use()).ok).toBe(true)
  expect((await use()).status).toBe(410)
  await signIn(server, firm.people.officer.email, { password: NEW_PASSWORD })
})

it('an invitation arrives by SMTP and lets somebody new in', async () => {
  const owner = await signIn(server, firm.people.owner.email)
  const email = 'newcomer@quarry-lane.example'
  expect((await owner('/api/people/invitations', { json: { subject: { kind: 'person', id: firm.people.applicator.id }, email } })).ok).toBe(true)
  const { mail: letter, to } = await mail.next()
  expect(to).toEqual([email])
  expect((await newClient(server)('/api/links/use', { json: { token: tokenIn(letter.text), password: NEW_PASSWORD } })).ok).toBe(true)
  await signIn(server, email, { password: NEW_PASSWORD })
})
