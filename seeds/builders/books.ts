import type { Raw } from '#server/database/connection'
import type { FirmDatabase } from '#server/database/firm/tables'

/** Tables of the book in the order in which their rows refer to one another. */
const BOOK_TABLES = [
  'branch', 'branch_registration', 'person', 'person_role', 'licence', 'place', 'party', 'party_role',
  'product', 'product_ingredient', 'product_registration', 'label_version', 'label_use', 'label_limit', 'equipment',
] as const
type BookTable = (typeof BOOK_TABLES)[number]

export type BookRows = { [T in BookTable]: FirmDatabase[T][] }

export const noRows = (): BookRows => ({
  branch: [], branch_registration: [], person: [], person_role: [], licence: [], place: [], party: [], party_role: [],
  product: [], product_ingredient: [], product_registration: [], label_version: [], label_use: [], label_limit: [], equipment: [],
})

export function insertBooks(raw: Raw, rows: BookRows): void {
  raw.transaction(() => {
    for (const table of BOOK_TABLES) {
      for (const row of rows[table]) {
        const columns = Object.keys(row)
        raw.prepare(`insert into ${table} (${columns.join(', ')}) values (${columns.map(c => `@${c}`).join(', ')})`).run(row)
      }
    }
  }).immediate()
}
