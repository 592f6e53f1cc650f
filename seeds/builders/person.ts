import { plusDays } from '#shared/time/days'
import type { PersonPlan } from '../demo/people'
import type { BookRows } from './books'
import type { MakeId } from './ids'

export interface MadePerson { id: string, name: string, plan: PersonPlan, licences: { id: string, region: string }[] }

/** A person with roles and licences, in the book since `since`; licences end so many days after `day` as planned. */
export function addPerson(rows: BookRows, makeId: MakeId, plan: PersonPlan, { since, day, branchId }: { since: string, day: string, branchId: (key: string) => string }): MadePerson {
  const id = makeId()
  rows.person.push({ id, name: plan.name, email: plan.account ?? null, phone: null, from_day: since, to_day: null })
  for (const { role, branch } of plan.roles) rows.person_role.push({ id: makeId(), person_id: id, role, branch_id: branch ? branchId(branch) : null, from_day: since })
  const licences = plan.licences.map((licence) => {
    const licenceId = makeId()
    rows.licence.push({ id: licenceId, person_id: id, region: licence.region, number: licence.number, class_name: licence.className, categories: JSON.stringify(licence.categories), issued: plusDays(since, -400), expires: plusDays(day, licence.days), recorded_at: `${since}T12:00:00.000Z` })
    return { id: licenceId, region: licence.region }
  })
  return { id, name: plan.name, plan, licences }
}
