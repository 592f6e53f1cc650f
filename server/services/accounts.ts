import { accountsIn } from '#server/database/directory/repositories/accounts'
import type { AccountRow } from '#server/database/directory/tables'
import type { Actor } from '#shared/access/abilities'
import type { House } from '#server/services/house'
import { newId } from '#server/services/house'

/** One spelling of an address: trimmed, composed, lower case. */
export const spellEmail = (email: string): string => email.trim().normalize('NFC').toLowerCase()

export interface NewAccount { email: string, name: string, password: string | null, language: string }

/** Inside the caller's transaction. `password` is a hash. */
export function createAccount(house: House, given: NewAccount): AccountRow {
  const row: AccountRow = { id: newId(house.world), email: spellEmail(given.email), name: given.name, password: given.password, language: given.language, created_at: house.world.now().toISOString(), disabled_at: null }
  accountsIn(house.directory.raw).insert.run(row)
  return row
}

export interface NewMembership { accountId: string, firmId: string, subject: Actor['subject'] }

/** Inside the caller's transaction; a membership that was ended is opened again. */
export function createMembership(house: House, { accountId, firmId, subject }: NewMembership): void {
  accountsIn(house.directory.raw).insertMembership.run({ id: newId(house.world), account_id: accountId, firm_id: firmId, subject_kind: subject.kind, subject_id: subject.id, created_at: house.world.now().toISOString() })
}
