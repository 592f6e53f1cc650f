import type { Raw } from '#server/database/connection'

/**
 * The tables that the file itself refuses to change. `key` is what makes a row unique; `leaf` names the column that says to which leaf
 * a row belongs: such a child is accepted only while that leaf is not on record yet (children are written before their leaf).
 */
export const APPEND_ONLY = [
  { table: 'leaf', key: ['seq'] },
  { table: 'leaf_body', key: ['seq'], leaf: 'seq' },
  { table: 'visit', key: ['seq'], leaf: 'seq' },
  { table: 'mix', key: ['seq'], leaf: 'seq' },
  { table: 'mix_line', key: ['seq', 'n'], leaf: 'seq' },
  { table: 'application', key: ['seq'], leaf: 'seq' },
  { table: 'application_line', key: ['seq', 'n'], leaf: 'seq' },
  { table: 'application_ingredient', key: ['seq', 'n'], leaf: 'seq' },
  { table: 'application_area', key: ['seq', 'n'], leaf: 'seq' },
  { table: 'application_person', key: ['seq', 'n'], leaf: 'seq' },
  { table: 'application_target', key: ['seq', 'n'], leaf: 'seq' },
  { table: 'application_weather', key: ['seq', 'n'], leaf: 'seq' },
  { table: 'finding', key: ['seq', 'n'], leaf: 'seq' },
  { table: 'strike', key: ['seq'], leaf: 'seq' },
  { table: 'acknowledgement', key: ['seq'], leaf: 'seq' },
  { table: 'notice_leaf', key: ['seq'], leaf: 'seq' },
  { table: 'notice_event', key: ['id'] },
  { table: 'licence', key: ['id'] },
  { table: 'person_role', key: ['id'] },
  { table: 'person_role_end', key: ['role_id'] },
  { table: 'label_version', key: ['id'] },
  { table: 'label_use', key: ['id'] },
  { table: 'label_limit', key: ['id'] },
] as const satisfies readonly AppendOnly[]

export interface AppendOnly { table: string, key: readonly string[], leaf?: string }

/** The triggers of one table, by name. BEFORE INSERT is the important one: INSERT OR REPLACE walks past the other two. */
export function appendOnlyTriggers({ table, key, leaf }: AppendOnly): Record<string, string> {
  const same = key.map(column => `${column} = new.${column}`).join(' and ')
  const refuse = (when: string) => `select raise(abort, '${table} is append-only: ${when}')`
  const onInsert = [`${refuse('this row is on record')} where exists (select 1 from ${table} where ${same})`]
  if (leaf) {
    onInsert.push(`${refuse('its leaf is on record already')} where exists (select 1 from leaf where seq = new.${leaf})`)
    onInsert.push(`${refuse('only the next leaf may have rows')} where new.${leaf} <> (select coalesce(max(seq), 0) + 1 from leaf)`)
  }
  if (table === 'leaf') {
    onInsert.push(`${refuse('seq must follow the last one')} where new.seq <> (select coalesce(max(seq), 0) + 1 from leaf)`)
    onInsert.push(`${refuse('prev_hash must be the last chain_hash')} where new.prev_hash <> coalesce((select chain_hash from leaf order by seq desc limit 1), zeroblob(32))`)
    onInsert.push(`${refuse('a leaf needs its body')} where not exists (select 1 from leaf_body where seq = new.seq)`)
  }
  return {
    [`${table}_no_update`]: `create trigger ${table}_no_update before update on ${table} begin ${refuse('no update')}; end`,
    [`${table}_no_delete`]: `create trigger ${table}_no_delete before delete on ${table} begin ${refuse('no delete')}; end`,
    [`${table}_only_append`]: `create trigger ${table}_only_append before insert on ${table} begin ${onInsert.join('; ')}; end`,
  }
}

const allTriggers = (): Record<string, string> => Object.assign({}, ...APPEND_ONLY.map(appendOnlyTriggers))

/** Part of a migration that adds tables to the list. */
export function createAppendOnlyTriggers(raw: Raw, tables: readonly string[]): void {
  for (const entry of APPEND_ONLY) if (tables.includes(entry.table)) for (const sql of Object.values(appendOnlyTriggers(entry))) raw.exec(sql)
}

/** The names of triggers that are missing or read otherwise than this program makes them. Empty = as it should be. */
export function brokenTriggers(raw: Raw): string[] {
  const rows = raw.prepare('select name, sql from sqlite_schema where type = \'trigger\'').all() as { name: string, sql: string }[]
  const is = new Map(rows.map(row => [row.name, row.sql.toLowerCase()]))
  return Object.entries(allTriggers()).filter(([name, sql]) => is.get(name) !== sql.toLowerCase()).map(([name]) => name)
}
