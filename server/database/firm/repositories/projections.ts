import type { Raw } from '#server/database/connection'
import { perConnection } from '#server/database/statement'
import type { Facts, FactsTable } from '#shared/records/rows'
import type { Standing } from '#shared/records/standing'

/** Tables of facts in the order in which they are written. */
export const FACTS_TABLES: readonly FactsTable[] = ['visit', 'mix', 'mix_line', 'application', 'application_line', 'application_ingredient', 'application_area', 'application_person', 'application_target', 'application_weather', 'finding', 'strike', 'acknowledgement', 'notice_leaf']
export const BESIDE_TABLES = ['entry_product', 'entry_ingredient', 'entry_person', 'entry_target', 'entry_finding'] as const

type Insert = (row: object) => void
const inserts = perConnection(() => new Map<string, Insert>())

const standingStatements = perConnection((raw: Raw) => ({
  endHead: raw.prepare('update entry_head set until_seq = ? where root = ? and until_seq is null'),
  forget: raw.prepare('delete from entry_search where rowid = ?'),
  remember: raw.prepare('insert into entry_search (rowid, words) values (?, ?)'),
}))

/** An insert into a table, prepared once a connection: the projection gives every row of a table the same columns. */
function insertInto(raw: Raw, table: string, row: object): Insert {
  const known = inserts(raw)
  const made = known.get(table) ?? (() => {
    const columns = Object.keys(row)
    const prepared = raw.prepare(`insert into ${table} (${columns.join(', ')}) values (${columns.map(c => `@${c}`).join(', ')})`)
    return (values: object) => void prepared.run(values)
  })()
  known.set(table, made)
  return made
}

export function writeFacts(raw: Raw, facts: Facts): void {
  for (const table of FACTS_TABLES) for (const row of facts[table] ?? []) insertInto(raw, table, row)(row)
}

/** Ends how the root stood, writes how it stands now. History stays: `from_seq <= N and (until_seq is null or until_seq > N)` is the Daybook as known at N. */
export function writeStanding(raw: Raw, { head, beside, search }: Standing): void {
  const { endHead, forget, remember } = standingStatements(raw)
  endHead.run(head.from_seq, head.root)
  insertInto(raw, 'entry_head', head)(head)
  for (const table of BESIDE_TABLES) for (const row of beside[table]) insertInto(raw, table, row)(row)
  forget.run(head.root_seq)
  remember.run(head.root_seq, search)
}
