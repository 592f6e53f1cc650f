import type { House } from '#server/services/house'
import { isNearHost } from '#server/services/addresses'
import { accountsIn } from '#server/database/directory/repositories/accounts'
import { settingsIn } from '#server/database/directory/repositories/settings'
import { actorOf } from '#server/services/actors'
import type { Role } from '#shared/books/shapes'

/** Was this data folder made by `npm run demo`? */
export const isDemonstration = (house: House): boolean => settingsIn(house.directory.raw).get.get({ name: 'demo' }) !== undefined

/** Stops the start of a demonstration that the outside could reach. @throws */
export function checkDemonstrationHost(house: House, host: string | undefined): void {
  if (isDemonstration(house) && !isNearHost(host)) throw new Error('HOST: this data folder is a demonstration, whose sign-ins are public; it starts only on a loopback or private address, for example HOST=127.0.0.1')
}

export interface DemoAccount { email: string, name: string, firms: { firm: string, roles: Role[] }[] }

/** The accounts for one-click sign-in, with what each may see. */
export function demoAccounts(house: House): DemoAccount[] {
  const now = house.world.now()
  return accountsIn(house.directory.raw).all.all({}).map(account => ({
    email: account.email,
    name: account.name,
    firms: accountsIn(house.directory.raw).membershipsOf.all({ account_id: account.id })
      .map(m => ({ firm: m.firm_name, roles: [...new Set(actorOf(house, m, now)?.roles.map(held => held.role) ?? [])] })),
  }))
}
