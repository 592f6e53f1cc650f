import type { Check } from '#shared/checks/finding'
import { finding } from '#shared/checks/finding'

/** Does the responsible person name a licence of the place's state that was in force on the day of the work? */
export const licenceInForce: Check = ({ facts, snapshot, day }) => {
  const at = facts.people.findIndex(p => p.responsible)
  const person = snapshot.people[at]
  if (!person) return []
  const { licence, name } = person
  const { region } = snapshot.place
  if (!licence) return [finding('licence-in-force', 'stop', 'licence-none', { params: { person: name, region } })]
  if (licence.region !== region) return [finding('licence-in-force', 'stop', 'licence-other-state', { params: { person: name, number: licence.number, state: licence.region, region } })]
  if (day > licence.expires) return [finding('licence-in-force', 'stop', 'licence-expired', { params: { person: name, number: licence.number }, value: day, limit: licence.expires })]
  if (day < licence.issued) return [finding('licence-in-force', 'stop', 'licence-not-yet', { params: { person: name, number: licence.number }, value: day, limit: licence.issued })]
  return []
}
