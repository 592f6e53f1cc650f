import type { Actor, HeldRole } from '#shared/access/abilities'
import { localDay } from '#shared/time/zoned'
import type { FirmFile, House } from '#server/services/house'
import type { HeldMembership } from '#server/database/directory/repositories/accounts'
import { subjectsIn } from '#server/database/firm/repositories/subjects'

const inForce = (row: { from_day: string, to_day: string | null }, day: string) => row.from_day <= day && (row.to_day === null || day <= row.to_day)

/** Today as the firm counts days: in its first branch's zone. */
export function firmDay(file: FirmFile, now: Date): string {
  return localDay(now.toISOString(), subjectsIn(file.reader).zone.get({})?.zone ?? 'UTC')
}

/** The roles that a person holds on this day, each judged in its own branch's zone. */
function rolesOf(file: FirmFile, personId: string, now: Date): HeldRole[] {
  const today = firmDay(file, now)
  return subjectsIn(file.reader).roles.all({ id: personId })
    .filter(row => inForce(row, row.zone ? localDay(now.toISOString(), row.zone) : today))
    .map(row => ({ role: row.role, branchId: row.branch_id }))
}

/**
 * Who a member is in the firm's book at this moment. Null: the book names nobody of that id, the person has left, or the firm is closed.
 * Read for every request, so that a role that ends, ends at once.
 */
export function actorOf(house: House, member: HeldMembership, now: Date): Actor | null {
  const file = house.openOrClosed(member.slug)
  if (!file) return null
  const who = { accountId: member.account_id, membershipId: member.id, firmId: member.firm_id, firmSlug: member.slug }
  if (member.subject_kind === 'party') {
    const party = subjectsIn(file.reader).party.get({ id: member.subject_id })
    return party ? { ...who, name: party.name, subject: { kind: 'party', id: member.subject_id }, roles: [{ role: 'customer', branchId: null }] } : null
  }
  const person = subjectsIn(file.reader).person.get({ id: member.subject_id })
  if (!person || !inForce(person, firmDay(file, now))) return null
  return { ...who, name: person.name, subject: { kind: 'person', id: member.subject_id }, roles: rolesOf(file, member.subject_id, now) }
}

/** The number of a licence of the person's that is in force today, the one that lasts longest; null without any. */
export function licenceOf(file: FirmFile, actor: Actor, now: Date): string | null {
  if (actor.subject.kind !== 'person') return null
  return subjectsIn(file.reader).licences.get({ id: actor.subject.id, day: firmDay(file, now) })?.number ?? null
}
