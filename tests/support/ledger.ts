import type { Actor } from '#shared/access/abilities'
import type { House, FirmFile } from '#server/services/house'
import { newId } from '#server/services/house'
import type { MadeFirm, Member } from './firm'
import { put } from './firm'
import type { Named } from './submission'

/** The least that an entry stands on: a place with its occupant, one product with a checked label and a New York registration, a licence. */
export function makeLedgerBooks(house: House, firm: MadeFirm): Named & { partyId: string, file: FirmFile } {
  const file = house.firm(firm.slug)
  const { raw } = file
  const make = () => newId(house.world)
  const [placeId, productId, labelVersionId, useId, licenceId] = [make(), make(), make(), make(), make()]
  const personId = firm.people.applicator.id
  put(raw, 'place', { id: placeId, parent_id: null, branch_id: firm.branchId, kind: 'property', name: '9 Foundry Row', address: '9 Foundry Row, Albany, NY 12205', town: 'Albany', county: 'Albany', region: 'NY', country: 'US', zone: firm.zone, lat: null, lon: null, site_code: 'residence-outdoors', site_text: 'Residence, outdoors', remark: null, retired_on: null })
  put(raw, 'party_role', { id: make(), party_id: firm.customer.id, place_id: placeId, role: 'occupant', from_day: '2020-01-01', to_day: null })
  put(raw, 'product', { id: productId, name: 'Sillgard 6.4 CS', kind: 'registered', number: '990014-27', number_region: null, number_basic: '990014-27', registrant: 'Demo Registrant', form: 'concentrate', signal_word: 'CAUTION', restricted_use: 0, demo: 1, retired_on: null })
  put(raw, 'product_ingredient', { product_id: productId, n: 0, name: 'lambda-cyhalothrin', percent: '6.4' })
  put(raw, 'product_registration', { id: make(), product_id: productId, region: 'NY', number: null, from_day: '2020-01-01', to_day: null })
  put(raw, 'label_version', { id: labelVersionId, product_id: productId, label_date: '2024-03-01', from_day: '2024-03-01', to_day: null, checked: 1, reentry: '{"until":"dry"}', protective: '[{"code":"gloves","text":"Gloves"}]', cautions: 'Keep out of drains.', recorded_at: '2024-03-02T00:00:00.000Z' })
  put(raw, 'label_use', { id: useId, label_version_id: labelVersionId, n: 0, sites: '[]', targets: '["ants"]', methods: '["foundation-band"]' })
  put(raw, 'label_limit', { id: make(), label_use_id: useId, n: 0, of_what: 'product', unit: 'fl_oz', per: 'gal', over_time: 'application', min: '0.15', max: '0.60', where_used: null, words: '0.15 to 0.60 fl oz per gallon of water' })
  put(raw, 'licence', { id: licenceId, person_id: personId, region: 'NY', number: 'C5-81172', class_name: 'Certified commercial applicator', categories: '["7A"]', issued: '2020-01-01', expires: '2099-12-31', recorded_at: '2020-01-01T00:00:00.000Z' })
  return { branchId: firm.branchId, placeId, personId, licenceId, labelVersionId, partyId: firm.customer.id, file }
}

/** A member of the firm as the session makes one. */
export const actorOf = (firm: MadeFirm, member: Member): Actor => ({
  accountId: firm.people[member].id, membershipId: firm.people[member].id, firmId: firm.id, firmSlug: firm.slug, name: firm.people[member].name,
  subject: { kind: 'person', id: firm.people[member].id }, roles: [{ role: member, branchId: member === 'owner' ? null : firm.branchId }],
})
