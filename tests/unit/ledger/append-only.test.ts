import { execFileSync } from 'node:child_process'
import { copyFileSync } from 'node:fs'
import { join } from 'node:path'
import Database from 'better-sqlite3'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { APPEND_ONLY, brokenTriggers } from '#server/database/firm/append-only'
import type { AppendOnly } from '#server/database/firm/append-only'
import { FIRM_MIGRATIONS } from '#server/database/firm/migrations/index'
import { signMix, signVisit } from '#server/services/sign-visit'
import { amendEntry, acknowledge, strikeEntry } from '#server/services/change-entry'
import { House } from '#server/services/house'
import { realWorld } from '#server/services/the-house'
import { actorOf, makeLedgerBooks } from '../../support/ledger'
import { makeFirm, put } from '../../support/firm'
import { removeDirs, temporaryDirs } from '../../support/server'
import { entrySubmission, id, visitSubmission } from '../../support/submission'

const dirs = temporaryDirs()
let house: House
/** A closed copy of a firm's file with at least one row in every table of the list. */
let path: string

/** Fills every table of the list through the program's own services, where they reach; the rest by hand. */
async function fill() {
  const firm = await makeFirm(dirs)
  house = new House({ ...dirs, logHost: 'log.test.example' }, realWorld)
  const books = makeLedgerBooks(house, firm)
  const signing = (member: 'applicator' | 'officer') => ({ file: books.file, actor: actorOf(firm, member), world: realWorld })
  const now = new Date().toISOString()
  signMix(signing('applicator'), { facts: { v: 1, id: id(), branchId: books.branchId, madeAt: now, zone: 'America/New_York', by: { id: books.personId }, equipment: null, carrier: { code: null, text: 'Water' }, finished: { value: '9', unit: 'gal' }, lines: [{ labelVersionId: books.labelVersionId, product: null, amount: { value: '2.7', unit: 'fl_oz' }, lot: null }], leftFrom: null }, words: { note: null, deviceNow: now } })
  const visit = visitSubmission({ ...books, ended: 3 * 24 * 60 })
  signVisit(signing('applicator'), visit)
  const root = visit.entries[0]?.facts.id ?? ''
  const { facts, words } = entrySubmission({ ...books }, visit.visit.facts.id)
  amendEntry(signing('officer'), root, { facts, words, amends: { root, head: root, reason: 'read again' } })
  acknowledge(signing('applicator'), root, { facts: { v: 1, id: id(), root, head: facts.id, says: 'confirmed', because: null }, words: { deviceNow: now } })
  strikeEntry(signing('applicator'), root, { facts: { v: 1, id: id(), root, head: facts.id, reason: 'same work twice' }, words: { deviceNow: now } })
  const role = books.file.raw.prepare('select id from person_role limit 1').get() as { id: string }
  put(books.file.raw, 'person_role_end', { role_id: role.id, to_day: '2030-01-01', at: now })
  return books.file
}

beforeAll(async () => {
  const file = await fill()
  path = join(dirs.dataDir, 'copy.sqlite')
  file.raw.pragma('wal_checkpoint(TRUNCATE)')
  copyFileSync(file.path, path)
})
afterAll(() => {
  house.close()
  removeDirs(dirs)
})

const TABLES: readonly AppendOnly[] = APPEND_ONLY
const columnsOf = (raw: Database.Database, table: string) => (raw.prepare(`select name from pragma_table_info('${table}')`).all() as { name: string }[]).map(c => c.name)

/** Every statement that could change, remove or smuggle in a row of a table. */
function attempts(raw: Database.Database, { table, key, leaf }: AppendOnly): [string, string][] {
  const columns = columnsOf(raw, table)
  const [other = ''] = columns.filter(c => !key.includes(c))
  const all = columns.join(', ')
  const row = `select ${all} from ${table} limit 1`
  const list: [string, string][] = [
    ['update', `update ${table} set ${other} = ${other}`],
    ['update or replace', `update or replace ${table} set ${other} = ${other}`],
    ['delete', `delete from ${table}`],
    ['insert or replace', `insert or replace into ${table} (${all}) ${row}`],
    ['replace', `replace into ${table} (${all}) ${row}`],
    ['upsert', `insert into ${table} (${all}) select ${all} from (${row}) where true on conflict (${key.join(', ')}) do update set ${other} = excluded.${other}`],
  ]
  if (leaf && key.includes('n')) list.push(['a late child', `insert into ${table} (${all}) select ${columns.map(c => c === 'n' ? '99' : c).join(', ')} from (${row})`])
  if (leaf) list.push(['a child of a leaf to come', `insert into ${table} (${all}) select ${columns.map(c => c === 'seq' ? '99999' : c === 'id' ? '\'0\'' : c).join(', ')} from (${row})`])
  if (table === 'leaf') list.push(['a leaf after a gap', `insert into leaf (${all}) select ${columns.map(c => c === 'seq' ? 'seq + 99999' : c === 'id' ? '\'0\'' : c).join(', ')} from (select ${all} from leaf order by seq desc limit 1)`])
  return list
}

describe.each(TABLES.map(entry => [entry.table, entry] as const))('%s', (table, entry) => {
  it('has a row to try on', () => {
    const raw = new Database(path, { readonly: true })
    const { n } = raw.prepare(`select count(*) as n from ${table}`).get() as { n: number }
    raw.close()
    // What only later services write: a notice's leaf is written when it is first attempted.
    if (table !== 'notice_leaf') expect(n).toBeGreaterThan(0)
  })

  it('refuses every way to change it, whatever the connection’s pragmas', () => {
    const raw = new Database(path)
    raw.pragma('foreign_keys = off')
    raw.pragma('recursive_triggers = off')
    const { n } = raw.prepare(`select count(*) as n from ${table}`).get() as { n: number }
    const tried = n > 0 ? attempts(raw, entry) : []
    for (const [name, sql] of tried) expect(() => raw.exec(sql), name).toThrow(/append-only/)
    raw.close()
  })

  it('refuses them in the stock shell too', () => {
    const raw = new Database(path, { readonly: true })
    const { n } = raw.prepare(`select count(*) as n from ${table}`).get() as { n: number }
    const tried = n > 0 ? attempts(raw, entry) : []
    raw.close()
    for (const [name, sql] of tried) {
      expect(() => execFileSync('sqlite3', [path, sql], { stdio: 'pipe' }), name).toThrow(/append-only/)
    }
  })
})

it('names every trigger that is missing or altered', () => {
  const raw = new Database(':memory:')
  FIRM_MIGRATIONS['2026-12-01-first']?.up(raw)
  expect(brokenTriggers(raw)).toEqual([])
  raw.exec('drop trigger leaf_no_update')
  raw.exec('drop trigger finding_no_delete; create trigger finding_no_delete before delete on finding begin select 1; end')
  expect(brokenTriggers(raw).sort()).toEqual(['finding_no_delete', 'leaf_no_update'])
})
