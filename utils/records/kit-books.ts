import type { Kit } from '#shared/books/kit'
import type { PartyAtPlace } from '#shared/books/shapes'
import type { Books } from '#shared/records/snapshot'

const byId = <T extends { id: string }>(rows: readonly T[]) => {
  const map = new Map(rows.map(row => [row.id, row]))
  return (id: string): T | undefined => map.get(id)
}

/** The books as a device holds them, for the same snapshots and checks as on the server. Addresses of parties are not on the device: `email` is null. */
export function kitBooks(kit: Kit): Books {
  const [place, party] = [byId(kit.places), byId(kit.parties)]
  const licences = byId(kit.people.flatMap(person => person.licences))
  const mixes = byId(kit.mixes.map(open => open.mix))
  const partiesAt = (placeId: string): PartyAtPlace[] => {
    const here = kit.partyRoles.filter(role => role.placeId === placeId).flatMap((role) => {
      const known = party(role.partyId)
      return known ? [{ party: { id: known.id, name: known.name, email: null, phone: null, language: known.language }, placeId, role: role.role, from: role.from, to: role.to }] : []
    })
    const parent = place(placeId)?.parentId
    return parent ? [...here, ...partiesAt(parent)] : here
  }
  return {
    firm: () => kit.firm, branch: byId(kit.branches), place, parties: partiesAt, product: byId(kit.products), label: byId(kit.labels),
    person: byId(kit.people), licence: licences, equipment: byId(kit.equipment), mix: mixes,
  }
}
