import { accountsIn } from '#server/database/directory/repositories/accounts'
import { settingsIn } from '#server/database/directory/repositories/settings'
import { createAccount, createMembership } from '#server/services/accounts'
import { House, newId } from '#server/services/house'
import type { HouseSettings } from '#server/services/house'
import type { Actor } from '#shared/access/abilities'
import { plusMonths } from '#shared/time/days'
import { insertBooks } from '../builders/books'
import { Dice } from '../builders/random'
import { carryOut, planWorld } from './carry-out'
import type { PlanWorld } from './carry-out'
import { dealWithNotices } from './notices'
import type { NoticesMade } from './notices'
import { CUSTOMER, planDemonstration } from './plan'
import type { FirmPlan, PlanSettings } from './plan'

export const DEMO_PASSWORD = 'tankside-demo'

export interface Made extends NoticesMade { firm: string, slug: string, leaves: number, entries: number }

interface Making extends PlanSettings {
  house: HouseSettings
  /** Hash of the one password that all accounts have. */
  password: string
  now: Date
  progress?: (slug: string, done: number, of: number) => void
}

/** Fills an empty data folder with the demonstration. */
export async function makeDemonstration({ house: settings, password, now, progress = () => undefined, ...plan }: Making): Promise<Made[]> {
  const since = plan.since ?? plusMonths(plan.day, -18)
  const dice = new Dice(`${plan.seed} house`)
  const world = planWorld(Date.parse(`${since}T00:00:00Z`), size => dice.bytes(size))
  const house = new House(settings, world)
  try {
    settingsIn(house.directory.raw).set.run({ name: 'demo', value: now.toISOString() })
    const made: Made[] = []
    for (const firm of planDemonstration(plan)) {
      world.set(Date.parse(`${since}T00:00:00Z`))
      made.push(await makeFirm(house, world, firm, { password, progress }))
    }
    return made
  }
  finally {
    house.close()
  }
}

async function makeFirm(house: House, world: PlanWorld, plan: FirmPlan, { password, progress }: Required<Pick<Making, 'password' | 'progress'>>): Promise<Made> {
  const { slug, name, address, phone, mailFrom, book, dice } = plan
  const file = house.createFirm({ id: newId(world), slug, name, address, phone, country: 'US', mailFrom })
  insertBooks(file.raw, book.rows)
  addAccounts(house, file.id, plan, password)
  const own: PlanWorld = { ...world, random: size => dice.bytes(size) }
  carryOut(file, own, plan, (done, of) => progress(slug, done, of))
  const notices = await dealWithNotices({ file, world: own, plan, dataDir: house.settings.dataDir })
  const count = (sql: string) => (file.raw.prepare(sql).get() as { n: number }).n
  return { firm: name, slug, leaves: count('select count(*) n from leaf'), entries: count('select count(*) n from leaf where kind = \'application\''), ...notices }
}

/** One account an address, with a membership in each firm whose book names the person. */
function addAccounts(house: House, firmId: string, { book }: FirmPlan, password: string): void {
  const add = (email: string, name: string, subject: Actor['subject']) => {
    const known = accountsIn(house.directory.raw).byEmail.get({ email })
    createMembership(house, { accountId: (known ?? createAccount(house, { email, name, password, language: 'en' })).id, firmId, subject })
  }
  for (const { id, name, plan } of book.people.values()) if (plan.account) add(plan.account, name, { kind: 'person', id })
  const customer = book.rows.party.find(party => party.id === book.customerId)
  if (customer) add(CUSTOMER, customer.name, { kind: 'party', id: customer.id })
}
