import { House, newId } from '#server/services/house'
import type { World } from '#server/services/house'
import { realWorld } from '#server/services/the-house'
import { Passwords } from '#server/services/passwords'
import { createAccount, createMembership } from '#server/services/accounts'
import type { Raw } from '#server/database/connection'
import type { BranchRow, FirmDatabase, PersonRoleRow, PersonRow } from '#server/database/firm/tables'
import { accountsIn } from '#server/database/directory/repositories/accounts'
import { settingsIn } from '#server/database/directory/repositories/settings'
import type { Dirs } from './server'
import { TEST_PASSWORD } from './server'

/** One hash a process: each costs 0.4 s. */
let hash: Promise<string> | undefined
const testHash = (): Promise<string> => hash ??= new Passwords().make(TEST_PASSWORD)

export interface FirmSpec {
  slug?: string
  name?: string
  /** Part after the `@` of the accounts' addresses: `owner@…`, `officer@…`, `applicator@…`, `customer@…`. */
  domain?: string
  /** Day from which roles hold; far enough back that any record fits. */
  since?: string
  demo?: boolean
}

export type Member = 'owner' | 'officer' | 'applicator'
export interface MadeFirm {
  id: string, slug: string, name: string, branchId: string, zone: string
  people: Record<Member, { id: string, name: string, email: string }>
  customer: { id: string, name: string, email: string }
}

const NAMES: Record<Member, string> = { owner: 'Ines Wick', officer: 'Maren Okafor', applicator: 'Tomás Nguyễn' }

/** Inserts a row into a table of the firm's file, columns as the row names them. */
export function put<T extends keyof FirmDatabase>(raw: Raw, table: T, row: FirmDatabase[T] & object): void {
  const columns = Object.keys(row)
  raw.prepare(`insert into ${table} (${columns.join(', ')}) values (${columns.map(c => `@${c}`).join(', ')})`).run(row)
}

/** Opens the data folder as the program does, for as long as `work` runs: before the server starts, or after it ended. */
export async function withHouse<T>(dirs: Dirs, work: (house: House) => T | Promise<T>, world: World = realWorld): Promise<T> {
  const house = new House({ ...dirs, logHost: 'log.test.example' }, world)
  try {
    return await work(house)
  }
  finally {
    house.close()
  }
}

/** A firm with one branch in New York, an owner, an officer, an applicator and a customer, each with an account. All invented. */
export async function makeFirm(dirs: Dirs, spec: FirmSpec = {}, world: World = realWorld): Promise<MadeFirm> {
  const password = await testHash()
  return withHouse(dirs, house => build(house, spec, password), world)
}

function build(house: House, { slug = 'quarry-lane', name = 'Quarry Lane Pest', domain = `${slug}.example`, since = '2020-01-01', demo = false }: FirmSpec, password: string): MadeFirm {
  const { world } = house
  const firm = house.createFirm({ id: newId(world), slug, name, address: '22 Quarry Lane, Albany, NY 12205', phone: '518 555 0100', country: 'US', mailFrom: `book@${domain}` })
  const branch: BranchRow = { id: newId(world), name: 'Albany', address: '22 Quarry Lane, Albany, NY 12205', phone: '518 555 0100', county: 'Albany', region: 'NY', country: 'US', zone: 'America/New_York' }
  put(firm.raw, 'branch', branch)
  const account = (local: string, called: string, subject: { kind: 'person' | 'party', id: string }) => {
    const email = `${local}@${domain}`
    const known = accountsIn(house.directory.raw).byEmail.get({ email })
    const { id } = known ?? createAccount(house, { email, name: called, password, language: 'en' })
    createMembership(house, { accountId: id, firmId: firm.id, subject })
    return email
  }
  const person = (role: Member) => {
    const row: PersonRow = { id: newId(world), name: NAMES[role], email: null, phone: null, from_day: since, to_day: null }
    const held: PersonRoleRow = { id: newId(world), person_id: row.id, role, branch_id: role === 'owner' ? null : branch.id, from_day: since }
    put(firm.raw, 'person', row)
    put(firm.raw, 'person_role', held)
    return { id: row.id, name: row.name, email: account(role, row.name, { kind: 'person', id: row.id }) }
  }
  const people = { owner: person('owner'), officer: person('officer'), applicator: person('applicator') }
  const party = { id: newId(world), name: 'Harbour House Tenants', email: `customer@${domain}`, phone: null, language: 'en' as const }
  put(firm.raw, 'party', party)
  const customer = { id: party.id, name: party.name, email: account('customer', party.name, { kind: 'party', id: party.id }) }
  if (demo) settingsIn(house.directory.raw).set.run({ name: 'demo', value: world.now().toISOString() })
  return { id: firm.id, slug, name, branchId: branch.id, zone: branch.zone, people, customer }
}
