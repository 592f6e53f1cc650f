import type { Role } from '#shared/books/shapes'

/** What may be done at all. Which rows it may be done to is the scope's business (`entryScope`), which fields are seen is `fieldClass`'s. */
export const ABILITIES = [
  'visit.sign', 'mix.sign', 'kit.read',
  'entry.read', 'entry.amend', 'entry.strike', 'entry.acknowledge', 'entry.export', 'entry.print',
  'book.read', 'people.read', 'people.invite', 'firm.read',
  'notice.read', 'notice.send', 'today.read', 'log.verify',
] as const
export type Ability = (typeof ABILITIES)[number]

/** A route that needs no role: anybody, or anybody signed in. */
export type Door = 'public' | 'signed-in' | 'demo'

const APPLICATOR: readonly Ability[] = ['visit.sign', 'mix.sign', 'kit.read', 'entry.read', 'entry.amend', 'entry.strike', 'entry.acknowledge', 'entry.print', 'book.read', 'firm.read', 'today.read']
const OFFICER: readonly Ability[] = ['kit.read', 'entry.read', 'entry.amend', 'entry.strike', 'entry.acknowledge', 'entry.export', 'entry.print', 'book.read', 'people.read', 'firm.read', 'notice.read', 'notice.send', 'today.read', 'log.verify']

/** Deny by default: what is not listed is not allowed. */
export const ROLE_ABILITIES: Record<Role, readonly Ability[]> = {
  owner: [...OFFICER, 'people.invite'],
  officer: OFFICER,
  applicator: APPLICATOR,
  customer: ['entry.read', 'entry.print', 'notice.read', 'today.read'],
}

/** A role as held: in one branch, or in all (`branchId` null). */
export interface HeldRole { role: Role, branchId: string | null }

/** Who acts: a person of the firm, or a party of the customer's side. Read fresh for every request. */
export interface Actor {
  accountId: string
  membershipId: string
  firmId: string
  firmSlug: string
  name: string
  subject: { kind: 'person', id: string } | { kind: 'party', id: string }
  roles: HeldRole[]
}

export const abilitiesOf = (actor: Pick<Actor, 'roles'>): Ability[] => [...new Set(actor.roles.flatMap(held => ROLE_ABILITIES[held.role]))]

export const can = (actor: Pick<Actor, 'roles'>, ability: Ability): boolean => actor.roles.some(held => ROLE_ABILITIES[held.role].includes(ability))

/** The branches in which an ability holds: 'all', or a list. */
export function branchesFor(actor: Pick<Actor, 'roles'>, ability: Ability, roles: readonly Role[] = ['owner', 'officer', 'applicator', 'customer']): 'all' | string[] {
  const held = actor.roles.filter(h => roles.includes(h.role) && ROLE_ABILITIES[h.role].includes(ability))
  return held.some(h => h.branchId === null) ? 'all' : [...new Set(held.flatMap(h => h.branchId ?? []))]
}

/**
 * Which entries somebody sees: an officer and an owner those of their branches, an applicator the own ones
 * (signed or taken part in), a customer those at places where the party has a role.
 */
export interface EntryScope { branches: 'all' | string[], personId: string | null, partyId: string | null }

export function entryScope(actor: Pick<Actor, 'roles' | 'subject'>): EntryScope {
  return {
    branches: branchesFor(actor, 'entry.read', ['owner', 'officer']),
    personId: actor.subject.kind === 'person' && actor.roles.some(h => h.role === 'applicator') ? actor.subject.id : null,
    partyId: actor.subject.kind === 'party' ? actor.subject.id : null,
  }
}

/** 'firm' sees the firm's own words and findings; 'party' sees what any party to the place may see. */
export const fieldClass = (actor: Pick<Actor, 'subject'>): 'firm' | 'party' => actor.subject.kind === 'person' ? 'firm' : 'party'

/** An entry may be amended or struck by its author (an applicator: own ones only) and by officers and owners of its branch. */
export function mayChange(actor: Pick<Actor, 'roles' | 'subject'>, ability: 'entry.amend' | 'entry.strike', entry: { branchId: string, authorId: string }): boolean {
  const branches = branchesFor(actor, ability, ['owner', 'officer'])
  if (branches === 'all' || branches.includes(entry.branchId)) return true
  return actor.subject.kind === 'person' && actor.subject.id === entry.authorId && can(actor, ability)
}

/** Only the author of what was changed can confirm or dispute; an officer or owner can say that the word can't be had. */
export function mayAcknowledge(actor: Pick<Actor, 'roles' | 'subject'>, says: 'confirmed' | 'disputed' | 'cannot-be-had', entry: { branchId: string, owedBy: string | null }): boolean {
  if (says !== 'cannot-be-had') return actor.subject.kind === 'person' && actor.subject.id === entry.owedBy && can(actor, 'entry.acknowledge')
  const branches = branchesFor(actor, 'entry.acknowledge', ['owner', 'officer'])
  return branches === 'all' || branches.includes(entry.branchId)
}
