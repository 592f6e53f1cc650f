import { abilitiesOf } from '#shared/access/abilities'
import type { Me } from '#shared/api/contract/session'
import type { House } from '#server/services/house'
import type { SignedIn } from '#server/services/sessions'
import { accountsIn } from '#server/database/directory/repositories/accounts'
import { licenceOf } from '#server/services/actors'

/** What the own pages show of who is signed in. */
export function describeMe(house: House, signedIn: SignedIn, demo: boolean): Me {
  const { actor } = signedIn
  const held = accountsIn(house.directory.raw).membershipsOf.all({ account_id: signedIn.accountId })
  const chosen = held.find(m => m.id === signedIn.membershipId)
  const file = actor && house.openOrClosed(actor.firmSlug)
  return {
    person: actor?.name ?? signedIn.name,
    personId: actor?.subject.kind === 'person' ? actor.subject.id : null,
    partyId: actor?.subject.kind === 'party' ? actor.subject.id : null,
    email: signedIn.email,
    language: signedIn.language,
    firm: chosen ? { id: chosen.firm_id, slug: chosen.slug, name: chosen.firm_name, closed: signedIn.firmClosed } : null,
    membershipId: chosen?.id ?? null,
    memberships: held.map(m => ({ id: m.id, firm: m.firm_name })),
    roles: [...new Set(actor?.roles.map(r => r.role) ?? [])],
    branches: actor ? branchesOf(actor) : [],
    abilities: actor ? abilitiesOf(actor) : [],
    licence: file ? licenceOf(file, actor, house.world.now()) : null,
    demo,
  }
}

const branchesOf = ({ roles }: { roles: { branchId: string | null }[] }): 'all' | string[] =>
  roles.some(r => r.branchId === null) ? 'all' : [...new Set(roles.flatMap(r => r.branchId ?? []))]
