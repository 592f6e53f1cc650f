import Database from 'better-sqlite3'
import { Kysely, SqliteDialect } from 'kysely'

export type Raw = Database.Database

/** What every connection must say when asked (measured traps: WAL drops `synchronous` to NORMAL unless it is set afterwards). */
const ASSERTED = { journal_mode: 'wal', synchronous: 2, foreign_keys: 1, recursive_triggers: 1, trusted_schema: 0, secure_delete: 1 } as const

/** The one writing connection of a file: WAL, every commit flushed, deleted bytes overwritten. */
export function openWriter(path: string): Raw {
  const raw = new Database(path)
  raw.pragma('journal_mode = WAL')
  raw.pragma('synchronous = FULL')
  raw.pragma('foreign_keys = ON')
  raw.pragma('recursive_triggers = ON')
  raw.pragma('trusted_schema = OFF')
  raw.pragma('cell_size_check = ON')
  raw.pragma('secure_delete = ON')
  raw.pragma('busy_timeout = 5000')
  for (const [name, expected] of Object.entries(ASSERTED)) {
    const is = raw.pragma(name, { simple: true })
    if (is !== expected) throw new Error(`${path}: pragma ${name} is ${String(is)}, not ${expected}`)
  }
  return raw
}

/** The file whose exclusive transaction says that somebody is in: no waiting, no journal of the write-ahead kind. */
export const openLock = (path: string): Raw => new Database(path, { timeout: 0 })

/** A reading connection: it cannot write, whatever asks it. */
export function openReader(path: string): Raw {
  const raw = new Database(path, { readonly: true, fileMustExist: true })
  raw.pragma('trusted_schema = OFF')
  raw.pragma('query_only = ON')
  raw.pragma('busy_timeout = 5000')
  return raw
}

/** Asynchronous Kysely on a connection: for reading lists, and for the books; never for the ledger's append. */
export const kyselyOn = <T>(raw: Raw): Kysely<T> => new Kysely<T>({ dialect: new SqliteDialect({ database: raw }) })
