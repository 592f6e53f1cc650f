import type { Raw } from '#server/database/connection'
import { toHex } from '#shared/ledger/hash'
import type { Problems } from '#server/services/verify/problem'

type Value = string | number | bigint | Uint8Array | null
export type Row = Record<string, Value>

const shown = (value: Value | undefined): string => value === undefined ? 'absent' : value instanceof Uint8Array ? toHex(value) : typeof value === 'string' ? JSON.stringify(value) : String(value)
const same = (a: Value | undefined, b: Value | undefined): boolean => shown(a) === shown(b)

/** Compares what a table holds with what the leaves give, row by row of the same `n`, column by column. */
export function compareRows(problems: Problems, part: 'facts' | 'standing', table: string, key: string, held: readonly Row[], given: readonly Row[]): void {
  const byN = new Map(held.map(row => [shown(row.n), row]))
  for (const row of given) {
    const n = shown(row.n)
    const where = row.n === undefined ? `${table} ${key}` : `${table} ${key} n ${n}`
    const is = byN.get(n)
    byN.delete(n)
    if (!is) {
      problems.add(part, where, 'the row is missing')
      continue
    }
    for (const column of Object.keys(row)) if (!same(is[column], row[column])) problems.add(part, `${where} column ${column}`, `holds ${shown(is[column])}, the leaf gives ${shown(row[column])}`)
  }
  for (const row of byN.values()) problems.add(part, row.n === undefined ? `${table} ${key}` : `${table} ${key} n ${shown(row.n)}`, 'no leaf gives this row')
}

/** Reads the rows of a table under one key, integers as bigint. */
export function rowReader(raw: Raw, table: string, where: string, order = ''): (...key: Value[]) => Row[] {
  const prepared = raw.prepare<Value[], Row>(`select * from ${table} where ${where}${order ? ` order by ${order}` : ''}`).safeIntegers(true)
  return (...key) => prepared.all(...key)
}
