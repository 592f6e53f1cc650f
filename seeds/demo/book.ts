import type { EquipmentKind } from '#shared/catalogues/codes'
import { plusDays, plusMonths } from '#shared/time/days'
import type { BookRows } from '../builders/books'
import { noRows } from '../builders/books'
import { coded } from '../builders/coded'
import { idsFrom } from '../builders/ids'
import { addPerson } from '../builders/person'
import type { MadePerson } from '../builders/person'
import type { MadePlace } from '../builders/place'
import { addProduct } from '../builders/product'
import type { LabelSpan } from '../builders/product'
import type { Dice } from '../builders/random'
import type { BranchKey, PersonPlan } from './people'
import { BRANCHES, EQUIPMENT } from './people'
import { placesOf } from './places-of-branch'
import { ENDED_IN_NEW_YORK, PRODUCTS } from './products'

export interface MadeBranch { key: BranchKey, id: string, region: BranchKey, zone: string, places: MadePlace[], equipment: Partial<Record<EquipmentKind, string>> }

/** A firm's book, with what the plan of visits needs to know of it. */
export interface Book {
  rows: BookRows
  branches: Partial<Record<BranchKey, MadeBranch>>
  people: Map<string, MadePerson>
  products: Map<string, { id: string, labels: LabelSpan[] }>
  /** The party whose account the demonstration offers. */
  customerId: string | null
}

export interface BookPlan { since: string, day: string, branches: readonly BranchKey[], people: readonly PersonPlan[], customer: string | null, own?: Partial<(typeof BRANCHES)[BranchKey]>, houses?: number }

export function makeBook(dice: Dice, plan: BookPlan): Book {
  const { since, day, branches, people, customer, own } = plan
  const rows = noRows()
  const makeId = idsFrom(Date.parse(`${since}T00:00:00Z`), dice)
  const book: Book = { rows, branches: {}, people: new Map(), products: new Map(), customerId: null }
  for (const key of branches) {
    const { name, address, phone, county, zone, registration } = { ...BRANCHES[key], ...own }
    const branch = { key, id: makeId(), region: key, zone, places: [], equipment: {} }
    rows.branch.push({ id: branch.id, name, address, phone, county, region: key, country: 'US', zone })
    rows.branch_registration.push({ id: makeId(), branch_id: branch.id, region: key, number: registration.number, kind: registration.kind, from_day: plusDays(since, -900), to_day: null })
    book.branches[key] = branch
  }
  for (const person of people) book.people.set(person.key, addPerson(rows, makeId, person, { since, day, branchId: key => branchOf(book, key as BranchKey).id }))
  const ended = plusMonths(day, -3)
  for (const product of PRODUCTS) {
    book.products.set(product.key, addProduct(rows, makeId, product, { since: plusDays(since, -400), day, states: ['NY', 'CA', 'TX'], endedIn: state => product.key === ENDED_IN_NEW_YORK && state === 'NY' ? ended : null }))
  }
  for (const key of branches) {
    const branch = branchOf(book, key)
    for (const { kind, name } of EQUIPMENT) {
      const id = makeId()
      const { code, text } = coded.equipment(kind)
      rows.equipment.push({ id, branch_id: branch.id, name, kind_code: code, kind_text: text, number: `${key}-${rows.equipment.length + 1}`, retired_on: null })
      branch.equipment[kind] ??= id
    }
    const made = placesOf({ rows, makeId, dice, branch, since: plusDays(since, -30), customer: key === 'NY' ? customer : null, houses: plan.houses })
    branch.places = made.places
    book.customerId ??= made.customerId
  }
  return book
}

export function branchOf(book: Book, key: BranchKey): MadeBranch {
  const branch = book.branches[key]
  if (!branch) throw new Error(`no branch ${key}`)
  return branch
}

export function personOf(book: Book, key: string): MadePerson {
  const person = book.people.get(key)
  if (!person) throw new Error(`no person ${key}`)
  return person
}

/** The label of a product that is in force on that day. */
export function labelOf(book: Book, product: string, day: string): LabelSpan {
  const label = book.products.get(product)?.labels.find(l => l.from <= day && (l.to === null || day <= l.to))
  if (!label) throw new Error(`no label of ${product} on ${day}`)
  return label
}
