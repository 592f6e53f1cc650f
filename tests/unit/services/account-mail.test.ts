import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { composeAccountMail, markAccountMailFailed, markAccountMailSent, nextDueAccountMail, queueAccountMail } from '#server/services/account-mail'
import { House } from '#server/services/house'
import { realWorld } from '#server/services/the-house'
import type { AccountMailRow } from '#server/database/directory/tables'

const START = new Date('2026-05-04T12:00:00.000Z')
const after = (minutes: number) => new Date(START.getTime() + minutes * 60_000)
const LINK = 'https://book.example/reset#secret'
let base: string
let house: House
const stored = () => house.directory.raw.prepare('select * from account_mail').get() as AccountMailRow

beforeEach(() => {
  base = mkdtempSync(join(tmpdir(), 'tankside-mail-'))
  house = new House({ dataDir: join(base, 'data'), keyDir: join(base, 'keys'), logHost: 'log.test.example' }, { ...realWorld, now: () => START })
  queueAccountMail(house, { kind: 'reset', to: 'maren@alder-wick.example', name: 'Maren Okafor', firm: '', link: LINK, publicUrl: 'https://book.example' })
})
afterEach(() => {
  house.close()
  rmSync(base, { recursive: true })
})

describe('the queue of account mail', () => {
  it('gives each mail to one sender, and again when that one died', () => {
    const mail = nextDueAccountMail(house, START)
    expect(mail).toMatchObject({ to_address: 'maren@alder-wick.example', attempts: 1, state: 'sending', message_id: expect.stringMatching(/^<[0-9a-f-]{36}@book\.example>$/) })
    expect(nextDueAccountMail(house, after(4))).toBeNull()
    expect(nextDueAccountMail(house, after(6))).toMatchObject({ id: mail?.id, message_id: mail?.message_id, attempts: 2 })
  })

  it('forgets the secret once it is sent', () => {
    const mail = nextDueAccountMail(house, START)
    expect(mail?.text).toContain(LINK)
    markAccountMailSent(house, mail?.id ?? '', after(1))
    expect(stored()).toMatchObject({ state: 'sent', text: '', html: '', sent_at: after(1).toISOString() })
    expect(nextDueAccountMail(house, after(600))).toBeNull()
  })

  it('tries again after 1, 4, 16, 64 and 256 minutes, then gives up and forgets the secret', () => {
    const waits: number[] = []
    let now = 0
    for (let attempt = 1; attempt <= 6; attempt++) {
      const mail = nextDueAccountMail(house, after(now))
      expect(mail?.attempts).toBe(attempt)
      if (mail) markAccountMailFailed(house, mail, 'connection refused', after(now))
      const wait = (Date.parse(stored().next_at) - after(now).getTime()) / 60_000
      if (attempt < 6) {
        waits.push(wait)
        now += wait
      }
    }
    expect(waits).toEqual([1, 4, 16, 64, 256])
    expect(stored()).toMatchObject({ state: 'failed', last_error: 'connection refused', text: '', html: '' })
  })
})

describe('a mail', () => {
  it('stands as plain text with the link on a line of its own, and as HTML in which names are only text', () => {
    const { subject, text, html } = composeAccountMail({ kind: 'invitation', name: 'Łódź <b>', firm: 'Alder & Wick', link: LINK })
    expect(subject).toBe('Alder & Wick invites you to its treatment ledger')
    expect(text.split('\n')).toContain(LINK)
    expect(html).toContain('Łódź &#60;b&#62;')
    expect(html).toContain(`<a href="${LINK}">${LINK}</a>`)
    expect(html).not.toContain('<b>')
  })

  it.each(['reset', 'invitation', 'added'] as const)('of the kind %s has all its words', (kind) => {
    expect(composeAccountMail({ kind, name: 'A', firm: 'B', link: LINK }).text).not.toContain('account.mail')
  })
})
