import type { Actor } from '#shared/access/abilities'
import type { House, FirmFile } from '#server/services/house'
import { newId } from '#server/services/house'
import { insertBooks, noRows } from '../../seeds/builders/books'
import { addPartyRole, addPlace } from '../../seeds/builders/place'
import { addProduct } from '../../seeds/builders/product'
import type { MadeFirm, Member } from './firm'
import type { Named } from './submission'

const SINCE = '2020-01-01'

/** The least that an entry stands on, made by the demonstration's own builders: a place with its occupant, one product with a checked label and a New York registration, a licence. */
export function makeLedgerBooks(house: House, firm: MadeFirm): Named & { partyId: string, file: FirmFile } {
  const file = house.firm(firm.slug)
  const makeId = () => newId(house.world)
  const rows = noRows()
  const place = addPlace(rows, makeId, { branch: { id: firm.branchId, region: 'NY', zone: firm.zone }, town: { town: 'Ellory', zip: '12205', county: 'Albany', lat: 42.65, lon: -73.75 }, kind: 'property', name: '9 Foundry Row', street: '9 Foundry Row', site: 'house' })
  addPartyRole(rows, makeId, firm.customer.id, place.id, 'occupant', SINCE)
  const product = addProduct(rows, makeId, {
    key: 'sillgard', name: 'Sillgard 6.4 CS', kind: 'registered', number: '990014-27', form: 'concentrate', signal: 'CAUTION', ingredients: [['Demothrin', '6.4']], reentry: { until: 'dry' }, cautions: 'Keep out of drains.', protective: ['gloves'],
    uses: [{ methods: ['foundation-band'], targets: ['ants'], limit: { unit: 'fl_oz/gal', min: '0.15', max: '0.60', words: '0.15 to 0.60 fl oz per gallon of water' } }],
  }, { since: SINCE, day: SINCE, states: ['NY'], endedIn: () => null })
  const licenceId = makeId()
  rows.licence.push({ id: licenceId, person_id: firm.people.applicator.id, region: 'NY', number: 'C5-81172', class_name: 'Certified commercial applicator', categories: '["7A"]', issued: SINCE, expires: '2099-12-31', recorded_at: `${SINCE}T00:00:00.000Z` })
  insertBooks(file.raw, rows)
  return { branchId: firm.branchId, placeId: place.id, personId: firm.people.applicator.id, licenceId, labelVersionId: product.labels[0]?.id ?? '', partyId: firm.customer.id, file }
}

/** A member of the firm as the session makes one. */
export const actorOf = (firm: MadeFirm, member: Member): Actor => ({
  accountId: firm.people[member].id, membershipId: firm.people[member].id, firmId: firm.id, firmSlug: firm.slug, name: firm.people[member].name,
  subject: { kind: 'person', id: firm.people[member].id }, roles: [{ role: member, branchId: member === 'owner' ? null : firm.branchId }],
})
