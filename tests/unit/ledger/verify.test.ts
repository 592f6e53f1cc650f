import { copyFileSync } from 'node:fs'
import { join } from 'node:path'
import Database from 'better-sqlite3'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { APPEND_ONLY, appendOnlyTriggers } from '#server/database/firm/append-only'
import { verifyFirm } from '#server/services/verify/verify-firm'
import { signVisit } from '#server/services/sign-visit'
import { House } from '#server/services/house'
import { realWorld } from '#server/services/the-house'
import { actorOf, makeLedgerBooks } from '../../support/ledger'
import { makeFirm } from '../../support/firm'
import { removeDirs, temporaryDirs } from '../../support/server'
import { visitSubmission } from '../../support/submission'

const dirs = temporaryDirs()
let house: House
let whole: string
let copies = 0

beforeAll(async () => {
  const firm = await makeFirm(dirs)
  house = new House({ ...dirs, logHost: 'log.test.example' }, realWorld)
  const books = makeLedgerBooks(house, firm)
  for (let n = 0; n < 3; n++) signVisit({ file: books.file, actor: actorOf(firm, 'applicator'), world: realWorld }, visitSubmission({ ...books, entries: 2, words: { note: 'gate on the left' } }))
  books.file.raw.pragma('wal_checkpoint(TRUNCATE)')
  whole = books.file.path
})
afterAll(() => {
  house.close()
  removeDirs(dirs)
})

/** A copy in which somebody with the file in hands took the triggers off, changed something, and put them back. */
function tampered(change: (raw: Database.Database) => void): Database.Database {
  const path = join(dirs.dataDir, `tampered-${++copies}.sqlite`)
  copyFileSync(whole, path)
  const raw = new Database(path)
  raw.pragma('foreign_keys = off')
  const triggers = APPEND_ONLY.flatMap(entry => Object.entries(appendOnlyTriggers(entry)))
  for (const [name] of triggers) raw.exec(`drop trigger ${name}`)
  change(raw)
  for (const [, sql] of triggers) raw.exec(sql)
  return raw
}

const named = (raw: Database.Database) => {
  const verdict = verifyFirm(raw)
  raw.close()
  return verdict.problems.map(p => `${p.part}: ${p.where}: ${p.says}`)
}

it('says good of a file as written', () => {
  expect(named(tampered(() => undefined))).toEqual([])
})

describe('names what was changed', () => {
  it('one character in a body', () => {
    const found = named(tampered(raw => raw.exec('update leaf_body set body = cast(replace(cast(body as text), \'"0.90"\', \'"0.80"\') as blob) where seq = 5')))
    expect(found[0]).toMatch(/^body: leaf_body seq 5 \(application .*the body was changed$/)
    expect(found).toContainEqual(expect.stringMatching(/^facts: application_line seq 5 n 0 column amount_value: holds "0.90", the leaf gives "0.80"$/))
  })

  it('one character in the firm’s own part', () => {
    const found = named(tampered(raw => raw.exec('update leaf_body set inner = cast(replace(cast(inner as text), \'left\', \'lift\') as blob) where seq = 2')))
    expect(found).toContainEqual(expect.stringMatching(/^body: leaf_body seq 2 .*not the one that the body commits to$/))
  })

  it('a body with its hash made to fit: the chain tells', () => {
    const found = named(tampered(raw => raw.exec('update leaf set leaf_hash = zeroblob(32) where seq = 3')))
    expect(found.filter(f => f.startsWith('chain: leaf seq 3'))).toHaveLength(1)
  })

  it.each([
    ['application', 'place_name', '\'Elsewhere\''], ['application_line', 'amount_base', 'amount_base + 1'], ['application_person', 'licence_number', '\'X\''], ['application_area', 'size_value', '\'1\''], ['visit', 'follow_up_on', '\'2020-01-01\''],
  ])('one column of facts: %s.%s', (table, column, value) => {
    const found = named(tampered(raw => raw.exec(`update ${table} set ${column} = ${value} where seq = (select max(seq) from ${table})`)))
    expect(found).toHaveLength(1)
    expect(found[0]).toMatch(new RegExp(`^facts: ${table} seq \\d+.* column ${column}: holds .*, the leaf gives`))
  })

  it.each([['entry_head', 'status', '\'struck\''], ['entry_head', 'until_seq', '99'], ['entry_product', 'number', '\'990001-1\''], ['entry_person', 'name', '\'Somebody\'']])('one column of standing: %s.%s', (table, column, value) => {
    const found = named(tampered(raw => raw.exec(`update ${table} set ${column} = ${value} where from_seq = (select max(from_seq) from ${table})`)))
    expect(found).toHaveLength(1)
    expect(found[0]).toMatch(new RegExp(`^standing: ${table} root .* column ${column}: holds .*, the leaf gives`))
  })

  it('a missing row, a row too many, a word of search', () => {
    expect(named(tampered(raw => raw.exec('delete from application_target where seq = 2')))).toEqual([expect.stringMatching(/^facts: application_target seq 2 n 0: the row is missing$/)])
    expect(named(tampered(raw => raw.exec('insert into application_target values (2, 9, null, \'Rats\')')))).toEqual([expect.stringMatching(/^facts: application_target seq 2 n 9: no leaf gives this row$/)])
    expect(named(tampered(raw => raw.exec('insert into application_target values (999, 0, null, \'Rats\')')))).toEqual([expect.stringMatching(/^facts: application_target seq 999: no leaf gives this row$/)])
    expect(named(tampered(raw => raw.exec('update entry_search set words = \'nothing\' where rowid = 2')))).toEqual([expect.stringMatching(/^search: /)])
  })

  it('a trigger taken off', () => {
    const raw = tampered(() => undefined)
    raw.exec('drop trigger leaf_only_append')
    expect(named(raw)).toEqual(['triggers: trigger leaf_only_append: is missing or altered'])
  })
})
