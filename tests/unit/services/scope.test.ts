import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Actor } from '#shared/access/abilities'
import { readDaybook } from '#server/services/daybook'
import { signVisit } from '#server/services/sign-visit'
import { realWorld } from '#server/services/the-house'
import { makeBooks, newUuid, visitSubmission } from '../../support/books'
import { makeFirm, put, withHouse } from '../../support/firm'
import type { MadeFirm } from '../../support/firm'
import { removeDirs, temporaryDirs } from '../../support/server'

const dirs = temporaryDirs()
let firm: MadeFirm
const actor = (subject: Actor['subject'], roles: Actor['roles']): Actor => ({ accountId: firm.id, membershipId: firm.id, firmId: firm.id, firmSlug: firm.slug, name: 'Somebody', subject, roles })
const seenBy = (who: Actor) => withHouse(dirs, async house => (await readDaybook(house.firm(firm.slug), who, { sort: '-finishedAt', limit: 50 })).rows.map(row => row.place.name))

beforeAll(async () => {
  firm = await makeFirm(dirs)
  const books = await makeBooks(dirs, firm)
  await withHouse(dirs, (house) => {
    const file = house.firm(firm.slug)
    const place = (name: string, kind: string, parent: string | null) => {
      const id = newUuid()
      put(file.raw, 'place', { id, parent_id: parent, branch_id: firm.branchId, kind, name, address: name, town: 'Ellory', county: 'Albany', region: 'NY', country: 'US', zone: firm.zone, lat: null, lon: null, site_code: 'apartment', site_text: 'Apartment', remark: null, retired_on: null })
      return { id, name }
    }
    const complex = place('Mill Court', 'property', null)
    const unit = place('Mill Court A-101', 'unit', place('Mill Court A', 'building', complex.id).id)
    put(file.raw, 'party', { id: complex.id, name: 'Mill Court office', email: null, phone: null, language: 'en' })
    put(file.raw, 'party_role', { id: newUuid(), party_id: complex.id, place_id: complex.id, role: 'manager', from_day: '2020-01-01', to_day: null })
    const signer = actor({ kind: 'person', id: firm.people.applicator.id }, [{ role: 'applicator', branchId: firm.branchId }])
    for (const at of [unit, books.house]) signVisit({ file, actor: signer, world: realWorld }, visitSubmission(books, { place: at, treatments: ['spray'] }))
    firm.customer.id = complex.id
  })
})
afterAll(() => removeDirs(dirs))

describe('whose entries are seen', () => {
  it('shows an owner of all branches everything', async () => {
    expect((await seenBy(actor({ kind: 'person', id: firm.people.owner.id }, [{ role: 'owner', branchId: null }]))).sort()).toEqual(['22 Quarry Lane', 'Mill Court A-101'])
  })

  it('shows whoever manages a complex the work in a unit two steps below, and nothing else', async () => {
    expect(await seenBy(actor({ kind: 'party', id: firm.customer.id }, [{ role: 'customer', branchId: null }]))).toEqual(['Mill Court A-101'])
  })

  it('shows nothing to somebody without a role', async () => {
    expect(await seenBy(actor({ kind: 'person', id: firm.people.officer.id }, []))).toEqual([])
  })
})
