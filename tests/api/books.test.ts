import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { makeBooks, newUuid, postVisit, visitSubmission } from '../support/books'
import type { MadeBooks } from '../support/books'
import { makeFirm, put, withHouse } from '../support/firm'
import type { MadeFirm } from '../support/firm'
import { removeDirs, signIn, startServer, temporaryDirs } from '../support/server'
import type { Client, TestServer } from '../support/server'
import type { Raw } from '#server/database/connection'
import type { PlaceRow, ProductRow } from '#server/database/firm/tables'

const dirs = temporaryDirs()
const FAR = { branch: newUuid(), place: newUuid(), party: newUuid() }
const TREE = { building: newUuid(), unit: newUuid(), occupant: newUuid() }
const WRONG = newUuid()
let server: TestServer
let firm: MadeFirm
let books: MadeBooks
let owner: Client
let officer: Client
let applicator: Client

interface Page { rows: { id: string, name: string, [column: string]: unknown }[], next: string | null }
const get = async <T>(client: Client, path: string): Promise<T> => {
  const answer = await client(path)
  if (answer.status !== 200) throw new Error(`${path}: ${answer.status} ${await answer.text()}`)
  return await answer.json() as T
}
const names = async (path: string, client = officer) => (await get<Page>(client, path)).rows.map(row => row.name)
const status = async (client: Client, path: string) => (await client(path)).status

const placeRow = (row: Pick<PlaceRow, 'id' | 'name' | 'branch_id'> & Partial<PlaceRow>): PlaceRow => ({
  parent_id: null, kind: 'property', address: `${row.name}, Ellory, NY 12205`, town: 'Ellory', county: 'Albany', region: 'NY', country: 'US', zone: 'America/New_York',
  lat: null, lon: null, site_code: 'apartment', site_text: 'Apartment', remark: null, retired_on: null, ...row,
})
const productRow = (row: Pick<ProductRow, 'id' | 'name' | 'number'>): ProductRow => ({
  kind: 'registered', number_region: null, number_basic: null, registrant: 'Sill & Garden Works', form: 'dust', signal_word: 'CAUTION', restricted_use: 0, demo: 1, retired_on: null, ...row,
})

/** A second branch with a place and a party, a tree of three below the first, a second label, a product under an establishment number. */
function fillFurther(raw: Raw): void {
  put(raw, 'branch', { id: FAR.branch, name: 'Austin', address: '77 Cedar Cut Road, Pale Creek, TX 78701', phone: '512 555 0177', county: 'Travis', region: 'TX', country: 'US', zone: 'America/Chicago' })
  put(raw, 'branch_registration', { id: newUuid(), branch_id: FAR.branch, region: 'TX', number: '0990177', kind: 'Structural pest control business license', from_day: '2024-01-01', to_day: null })
  put(raw, 'place', placeRow({ id: FAR.place, name: '9 Limestone Lane', branch_id: FAR.branch, county: 'Travis', region: 'TX' }))
  put(raw, 'party', { id: FAR.party, name: 'Terrace Living', email: null, phone: null, language: 'en' })
  put(raw, 'party_role', { id: newUuid(), party_id: FAR.party, place_id: FAR.place, role: 'owner', from_day: '2025-01-01', to_day: null })
  put(raw, 'place', placeRow({ id: TREE.building, name: 'Building 100% A', branch_id: firm.branchId, kind: 'building', parent_id: books.house.id }))
  put(raw, 'place', placeRow({ id: TREE.unit, name: 'Unit A-101', branch_id: firm.branchId, kind: 'unit', parent_id: TREE.building }))
  put(raw, 'place', placeRow({ id: newUuid(), name: 'Unit A-102', branch_id: firm.branchId, kind: 'unit', parent_id: TREE.building, retired_on: '2026-01-01' }))
  put(raw, 'party', { id: TREE.occupant, name: 'Kira Łódzka', email: 'kira@households.example', phone: '555 0121', language: 'es' })
  put(raw, 'party_role', { id: newUuid(), party_id: TREE.occupant, place_id: TREE.unit, role: 'occupant', from_day: '2025-01-01', to_day: '2026-06-30' })
  put(raw, 'product_registration', { id: newUuid(), product_id: books.spray.id, region: 'CA', number: null, from_day: '2025-01-01', to_day: '2025-12-31' })
  put(raw, 'label_version', { id: newUuid(), product_id: books.spray.id, label_date: '2024-02-01', from_day: '2024-03-01', to_day: '2024-12-31', checked: 0, reentry: '{"until":"dry"}', protective: '[]', cautions: '', recorded_at: '2024-03-01T00:00:00.000Z' })
  put(raw, 'product', productRow({ id: WRONG, name: 'Lithodust', number: '990061-TX-002' }))
}

beforeAll(async () => {
  firm = await makeFirm(dirs)
  books = await makeBooks(dirs, firm)
  await withHouse(dirs, house => fillFurther(house.firm(firm.slug).raw))
  server = await startServer({ dirs })
  owner = await signIn(server, firm.people.owner.email)
  officer = await signIn(server, firm.people.officer.email)
  applicator = await signIn(server, firm.people.applicator.email)
})
afterAll(async () => {
  await server.stop()
  removeDirs(dirs)
})

describe('places', () => {
  it('are listed by name, those of the own branches and not the retired', async () => {
    const near = ['22 Quarry Lane', 'Building 100% A', 'Copper Ladle Kitchen', 'Unit A-101']
    expect(await names('/api/places', applicator)).toEqual(near)
    expect(await names('/api/places', owner)).toEqual(['22 Quarry Lane', '9 Limestone Lane', ...near.slice(1)])
  })

  it.each([['mill', ['Copper Ladle Kitchen']], ['travis', ['9 Limestone Lane']], ['100%', ['Building 100% A']], ['%', ['Building 100% A']], ['_', []], ['nowhere', []]] as const)('are found by “%s” in name, address, town or county', async (q, expected) => {
    expect(await names(`/api/places?q=${encodeURIComponent(q)}`, owner)).toEqual(expected)
  })

  it('come page by page without a gap or a repeat', async () => {
    const seen: string[] = []
    for (let next: string | null = ''; next !== null;) {
      const page: Page = await get(owner, `/api/places?limit=2${next && `&cursor=${next}`}`)
      expect(page.rows.length).toBeLessThanOrEqual(2)
      seen.push(...page.rows.map(row => row.name))
      next = page.next
    }
    expect(seen).toEqual(await names('/api/places', owner))
  })

  it.each(['x', 'WzFd', 'limit'])('refuse a cursor that is none: %s', async (cursor) => {
    expect(await status(owner, `/api/places?cursor=${cursor}`)).toBe(400)
  })

  it('say when they were last treated', async () => {
    const visit = visitSubmission(books, { place: books.kitchen })
    await postVisit(applicator, visit)
    const { rows } = await get<Page>(officer, '/api/places')
    expect(rows.find(row => row.id === books.kitchen.id)?.lastOn).toMatch(/^\d{4}-\d\d-\d\d$/)
    expect(rows.find(row => row.id === TREE.unit)?.lastOn).toBeNull()
  })

  it('stand in a tree, with the parties at the place and at what it is part of', async () => {
    const unit = await get<{ above: { name: string }[], below: { name: string }[], parties: { name: string, role: string, at: string, to: string | null, email: string | null }[] }>(applicator, `/api/places/${TREE.unit}`)
    expect(unit.above.map(at => at.name)).toEqual(['22 Quarry Lane', 'Building 100% A'])
    expect(unit.parties).toMatchObject([{ name: 'Kira Łódzka', role: 'occupant', at: 'Unit A-101', to: '2026-06-30', email: 'kira@households.example' }, { name: firm.customer.name, role: 'occupant', at: '22 Quarry Lane', to: null }])
    expect((await get<typeof unit>(applicator, `/api/places/${TREE.building}`)).below.map(at => at.name)).toEqual(['Unit A-101'])
  })

  it('of another branch are not there', async () => {
    expect(await status(applicator, `/api/places/${FAR.place}`)).toBe(404)
    expect(await status(owner, `/api/places/${FAR.place}`)).toBe(200)
  })
})

describe('parties', () => {
  it('are those with a role at a place of the own branches', async () => {
    expect(await names('/api/parties', applicator)).toEqual([firm.customer.name, 'Kira Łódzka'])
    expect(await names('/api/parties', owner)).toEqual([firm.customer.name, 'Kira Łódzka', 'Terrace Living'])
    expect(await status(applicator, `/api/parties/${FAR.party}`)).toBe(404)
  })

  it('show where they have or had which role', async () => {
    expect(await get(officer, `/api/parties/${TREE.occupant}`)).toMatchObject({ name: 'Kira Łódzka', language: 'es', at: [{ place: 'Unit A-101', role: 'occupant', from: '2025-01-01', to: '2026-06-30' }] })
    const [customer] = (await get<Page>(officer, `/api/parties?q=harbour`)).rows
    expect(customer?.places).toBe(2)
  })
})

describe('the Shelf', () => {
  it('is searched by name and by number, and says where a product is registered today', async () => {
    const { rows } = await get<Page>(applicator, '/api/products?q=990014-27')
    expect(rows).toMatchObject([{ name: 'Sillgard 6.4 CS', regions: ['NY'], ingredients: [{ name: 'Demothrin', percent: '6.40' }] }])
  })

  it('keeps a product with its versions of the label, the latest first, each with uses and limits', async () => {
    const product = await get<{ numberRefused: string | null, registrations: { region: string, to: string | null }[], labels: { from: string, checked: boolean, uses: { methods: string[], limits: { min: string, max: string, words: string }[] }[] }[] }>(applicator, `/api/products/${books.spray.id}`)
    expect(product.numberRefused).toBeNull()
    expect(product.registrations.map(r => [r.region, r.to])).toEqual(expect.arrayContaining([['NY', null], ['CA', '2025-12-31']]))
    expect(product.labels.map(label => [label.from, label.checked])).toEqual([['2025-01-01', true], ['2024-03-01', false]])
    expect(product.labels[0]?.uses).toMatchObject([{ methods: ['foundation-band', 'spot', 'crack-and-crevice'], limits: [{ min: '0.15', max: '0.60', words: 'Mix 0.15 to 0.60 fl oz in each gallon of finished spray.' }] }])
  })

  it('says why a number in the book is none for that kind of product', async () => {
    expect(await get(officer, `/api/products/${WRONG}`)).toMatchObject({ number: '990061-TX-002', numberRefused: 'establishment-number' })
  })
})

describe('people, equipment, the firm', () => {
  it('people are found by licence number too, with roles and licences', async () => {
    expect((await get<Page>(officer, '/api/people?q=C5-81172')).rows).toMatchObject([{ name: firm.people.applicator.name, roles: [{ role: 'applicator', branch: 'Albany' }], licences: [{ region: 'NY', className: 'Commercial applicator', categories: ['7A'] }] }])
    expect(await get(officer, `/api/people/${firm.people.owner.id}`)).toMatchObject({ roles: [{ role: 'owner', branch: null }] })
    expect(await status(applicator, `/api/people/${firm.people.owner.id}`)).toBe(403)
  })

  it('equipment stands under its branch', async () => {
    expect((await get<Page>(applicator, '/api/equipment?q=spreader')).rows).toMatchObject([{ id: books.spreader.id, branch: 'Albany' }])
    expect(await get(applicator, `/api/equipment/${books.sprayer.id}`)).toMatchObject({ name: 'Backpack 3', kind: { code: 'backpack-sprayer' } })
  })

  it('branches keep their registrations by state', async () => {
    const { branches } = await get<{ branches: { name: string, registrations: unknown[] }[] }>(applicator, '/api/branches')
    expect(branches).toMatchObject([{ name: 'Albany', registrations: [] }, { name: 'Austin', registrations: [{ region: 'TX', number: '0990177', to: null }] }])
  })

  it.each(['places', 'parties', 'products', 'people', 'equipment', 'branches'])('a customer reads no book: %s', async (book) => {
    expect(await status(await signIn(server, firm.customer.email), `/api/${book}`)).toBe(403)
  })
})
