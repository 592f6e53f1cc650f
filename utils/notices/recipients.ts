import type { Party, PartyAtPlace } from '#shared/books/shapes'

/** Roles whose holders are told of a treatment at their place. A neighbour is told only where a rule says so, or when asking (role `notice`). */
const TOLD: readonly PartyAtPlace['role'][] = ['payer', 'owner', 'manager', 'occupant', 'operator', 'notice']

/** Who is told, once each, of work on `day`: the holders of those roles in force that day, in the order of the book. */
export function whoIsTold(parties: readonly PartyAtPlace[], day: string): Party[] {
  const holders = parties.filter(p => TOLD.includes(p.role) && p.from <= day && (p.to === null || day <= p.to)).map(p => p.party)
  return holders.filter((party, n) => holders.findIndex(other => other.id === party.id) === n)
}
