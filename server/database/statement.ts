import type { Compilable } from 'kysely'
import { DummyDriver, Kysely, SqliteAdapter, SqliteIntrospector, SqliteQueryCompiler } from 'kysely'
import type { Raw } from '#server/database/connection'

const PARAMETER = Symbol('parameter')
interface Placeholder { [PARAMETER]: string }

const isPlaceholder = (value: unknown): value is Placeholder => typeof value === 'object' && value !== null && PARAMETER in value

/** Builds SQL, runs nothing: for statements that better-sqlite3 runs synchronously. */
export const builder = <DB>(): Kysely<DB> => new Kysely<DB>({
  dialect: { createAdapter: () => new SqliteAdapter(), createDriver: () => new DummyDriver(), createIntrospector: db => new SqliteIntrospector(db), createQueryCompiler: () => new SqliteQueryCompiler() },
})

export interface Statement<P, R> {
  run: (given: P) => { changes: number }
  get: (given: P) => R | undefined
  all: (given: P) => R[]
}

/**
 * A query of Kysely's, compiled and prepared once, run synchronously inside the ledger's transaction; `p('id')` marks a parameter.
 * Not for `in (…)` lists of varying length.
 */
export function statement<P, R = unknown>(raw: Raw, build: (p: <K extends keyof P & string>(name: K) => P[K]) => Compilable<R>): Statement<P, R> {
  const { sql, parameters } = build(name => ({ [PARAMETER]: name }) as never).compile()
  const prepared = raw.prepare<unknown[], R>(sql)
  const bind = (given: P) => parameters.map(value => isPlaceholder(value) ? (given as Record<string, unknown>)[value[PARAMETER]] : value)
  return { run: given => prepared.run(...bind(given)), get: given => prepared.get(...bind(given)), all: given => prepared.all(...bind(given)) }
}

/** What is prepared on a connection is made once and lives as long as the connection. */
export function perConnection<T>(make: (raw: Raw) => T): (raw: Raw) => T {
  const made = new WeakMap<Raw, T>()
  return (raw) => {
    const known = made.get(raw) ?? make(raw)
    made.set(raw, known)
    return known
  }
}
