import type { BookRows } from '../builders/books'
import type { MakeId } from '../builders/ids'
import { addParty, addPartyRole, addPlace } from '../builders/place'
import type { MadePlace, PlaceSpec } from '../builders/place'
import type { Dice } from '../builders/random'
import type { MadeBranch } from './book'
import { FAMILY_NAMES, GIVEN_NAMES, PLACES, REMARKS } from './places'

interface Making { rows: BookRows, makeId: MakeId, dice: Dice, branch: MadeBranch, since: string, customer: string | null, houses?: number }

const mailName = (name: string) => name.normalize('NFD').replace(/\p{M}/gu, '').toLowerCase().replace(/[^a-z]+/g, '.').replace(/^\.|\.$/g, '')

/** Places of one branch with who pays, owns, manages and lives there. Only places at which work is done are returned: not a complex or farm as a whole. */
export function placesOf(making: Making): { places: MadePlace[], customerId: string | null } {
  const rented = complexOf(making)
  return { places: [...housesOf(making), ...(making.houses === undefined ? [...namedOf(making), ...rented.units, ...fieldsOf(making)] : [])], customerId: rented.customerId }
}

const add = ({ rows, makeId, branch, dice }: Making, spec: Omit<PlaceSpec, 'branch'>): MadePlace =>
  addPlace(rows, makeId, { branch, off: [dice.between(-40, 40), dice.between(-40, 40)], ...spec })

function personParty({ rows, makeId, dice }: Making): string {
  const name = `${dice.pick(GIVEN_NAMES)} ${dice.pick(FAMILY_NAMES)}`
  return addParty(rows, makeId, { name, email: dice.chance(0.7) ? `${mailName(name)}${dice.between(2, 99)}@households.example` : null, phone: `555 01${dice.between(10, 99)}`, language: dice.chance(0.12) ? 'es' : 'en' })
}

function housesOf(making: Making): MadePlace[] {
  const { branch, dice, rows, makeId, since } = making
  const { towns, streets, houses } = PLACES[branch.key]
  const landlord = addParty(rows, makeId, { name: `${towns[0].town} Rentals`, email: `office@${mailName(towns[0].town)}-rentals.example` })
  return Array.from({ length: making.houses ?? houses }, (_, n) => {
    const street = `${4 + n * 9} ${streets[n % streets.length] ?? streets[0]}`
    const made = add(making, { town: towns[n % towns.length] ?? towns[0], kind: 'property', name: street, street, site: 'house', remark: dice.chance(0.4) ? dice.pick(REMARKS) : null })
    addPartyRole(rows, makeId, personParty(making), made.id, 'occupant', since)
    if (n % 6 === 5) for (const role of ['owner', 'payer'] as const) addPartyRole(rows, makeId, landlord, made.id, role, since)
    return made
  })
}

function namedOf(making: Making): MadePlace[] {
  const { branch, dice, rows, makeId, since } = making
  const { towns, streets, named } = PLACES[branch.key]
  return named.map(([name, site], n) => {
    const made = add(making, { town: towns[n % towns.length] ?? towns[0], kind: site === 'lawn' || site === 'sports-turf' ? 'property' : 'building', name, street: `${110 + n * 14} ${dice.pick(streets)}`, site, remark: dice.chance(0.3) ? dice.pick(REMARKS) : null })
    const party = addParty(rows, makeId, { name, email: dice.chance(0.85) ? `desk@${mailName(name).replaceAll('.', '-')}.example` : null })
    for (const role of ['payer', 'manager'] as const) addPartyRole(rows, makeId, party, made.id, role, since)
    return made
  })
}

/** A property with two buildings of three units each. Its manager is the demonstration's customer where one is asked for. */
function complexOf(making: Making): { units: MadePlace[], customerId: string | null } {
  const { branch, rows, makeId, since, customer } = making
  if (making.houses !== undefined) return { units: [], customerId: null }
  const { towns: [town], complex } = PLACES[branch.key]
  const whole = add(making, { town, kind: 'property', name: complex.name, street: complex.street, site: 'apartment', remark: 'Leave a notice at the office' })
  const owner = addParty(rows, makeId, { name: complex.owner, email: null })
  const manager = addParty(rows, makeId, { name: complex.manager, email: customer ?? `office@${mailName(complex.name).replaceAll('.', '-')}.example` })
  addPartyRole(rows, makeId, owner, whole.id, 'owner', since)
  for (const role of ['manager', 'payer'] as const) addPartyRole(rows, makeId, manager, whole.id, role, since)
  const units = ['A', 'B'].flatMap((letter) => {
    const building = add(making, { town, kind: 'building', name: `${complex.name}, building ${letter}`, street: `${complex.street}, building ${letter}`, site: 'apartment', parent: whole })
    return ['101', '102', '201'].map((number) => {
      const unit = add(making, { town, kind: 'unit', name: `${complex.name} ${letter}-${number}`, street: `${complex.street}, ${letter}-${number}`, site: 'apartment', parent: building })
      addPartyRole(rows, makeId, personParty(making), unit.id, 'occupant', since)
      return unit
    })
  })
  return { units, customerId: customer ? manager : null }
}

function fieldsOf(making: Making): MadePlace[] {
  const { branch, rows, makeId, since } = making
  const { towns, farm } = PLACES[branch.key]
  if (!farm) return []
  const town = towns[1] ?? towns[0]
  const street = `4 ${farm.name} Road`
  const whole = add(making, { town, kind: 'farm', name: farm.name, street, site: 'field-crop', remark: 'Well head by the barn' })
  const operator = addParty(rows, makeId, { name: farm.name, email: `office@${mailName(farm.name).replaceAll('.', '-')}.example` })
  for (const role of ['operator', 'payer'] as const) addPartyRole(rows, makeId, operator, whole.id, role, since)
  return farm.fields.flatMap(([name, site, blocks]) => {
    const field = add(making, { town, kind: 'field', name: `${farm.name}, ${name}`, street, site, parent: whole })
    return blocks.map(block => add(making, { town, kind: 'block', name: `${field.name}, ${block}`, street, site, parent: field }))
  })
}
