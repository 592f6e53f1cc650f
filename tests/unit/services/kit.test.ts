import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { KitSchema } from '#shared/books/kit'
import type { Kit } from '#shared/books/kit'
import { kitBooks } from '#shared/records/kit-books'
import { snapshotEntry } from '#shared/records/snapshot'
import { localDay } from '#shared/time/zoned'
import { booksOf } from '#server/database/firm/repositories/books'
import { makeKit } from '#server/services/kit'
import { signVisit } from '#server/services/sign-visit'
import { realWorld } from '#server/services/the-house'
import type { Actor } from '#shared/access/abilities'
import { makeBooks, visitSubmission } from '../../support/books'
import type { MadeBooks } from '../../support/books'
import { makeFirm, put, withHouse } from '../../support/firm'
import type { MadeFirm } from '../../support/firm'
import { removeDirs, temporaryDirs } from '../../support/server'

const dirs = temporaryDirs()
const FAR = '01970000-0000-7000-8000-0000000000fa'
let firm: MadeFirm
let books: MadeBooks
const actorOf = (who: 'owner' | 'applicator'): Actor => ({
  accountId: firm.id, membershipId: firm.id, firmId: firm.id, firmSlug: firm.slug, name: firm.people[who].name, subject: { kind: 'person', id: firm.people[who].id },
  roles: [{ role: who, branchId: who === 'owner' ? null : firm.branchId }],
})
const kitOf = (who: 'owner' | 'applicator'): Promise<Kit> => withHouse(dirs, house => makeKit(house.firm(firm.slug), actorOf(who), new Date()))
const daysAgo = (n: number) => new Date(Date.now() - n * 86_400_000)

beforeAll(async () => {
  firm = await makeFirm(dirs)
  books = await makeBooks(dirs, firm)
  await withHouse(dirs, (house) => {
    const file = house.firm(firm.slug)
    put(file.raw, 'branch', { id: FAR, name: 'Far', address: '', phone: '', county: 'Kings', region: 'NY', country: 'US', zone: firm.zone })
    put(file.raw, 'place', { id: FAR, parent_id: null, branch_id: FAR, kind: 'property', name: 'Far away', address: '1 Far Road', town: 'Far', county: 'Kings', region: 'NY', country: 'US', zone: firm.zone, lat: null, lon: null, site_code: 'house', site_text: 'House', remark: null, retired_on: null })
    for (const ended of [daysAgo(90), daysAgo(30)]) signVisit({ file, actor: actorOf('applicator'), world: realWorld }, visitSubmission(books, { ended, followUpAfter: 30 }))
    signVisit({ file, actor: actorOf('applicator'), world: realWorld }, visitSubmission(books, { place: books.kitchen, ended: daysAgo(2), treatments: ['spray'], followUpAfter: 60 }))
  })
})
afterAll(() => removeDirs(dirs))

describe('the kit of the entry form', () => {
  it('has the shape that its contract says', async () => {
    expect(KitSchema.safeParse(await kitOf('applicator')).error).toBeUndefined()
  })

  it('brings the last visit of each place, what is due and where one was last', async () => {
    const kit = await kitOf('applicator')
    expect(kit.last.map(visit => [visit.placeId, visit.entries.length]).sort()).toEqual([[books.house.id, 2], [books.kitchen.id, 1]].sort())
    expect(kit.last.find(visit => visit.placeId === books.house.id)?.day).toBe(localDay(daysAgo(30).toISOString(), firm.zone))
    expect(kit.due.map(due => due.placeId)).toEqual([books.house.id])
    expect(kit.recent).toEqual([books.kitchen.id, books.house.id])
  })

  it('shows an applicator only the places of the own branches, an owner all', async () => {
    expect((await kitOf('applicator')).places.map(place => place.name)).toEqual(['22 Quarry Lane', 'Copper Ladle Kitchen'])
    expect((await kitOf('owner')).places.map(place => place.name)).toContain('Far away')
  })

  it('gives the same snapshot as the server takes', async () => {
    const kit = await kitOf('applicator')
    const [entry] = visitSubmission(books).entries
    if (!entry) throw new Error('no entry')
    const day = localDay(entry.facts.finishedAt, firm.zone)
    const taken = await withHouse(dirs, house => snapshotEntry(entry.facts, booksOf(house.firm(firm.slug).raw), day))
    expect(snapshotEntry(entry.facts, kitBooks(kit), day)).toEqual(taken)
  })

  it('keeps the parties’ addresses on the server', async () => {
    expect(JSON.stringify(await kitOf('owner'))).not.toContain(firm.customer.email)
  })

  it('repeats the last visit with work, not one at which nothing was applied', async () => {
    await withHouse(dirs, house => signVisit({ file: house.firm(firm.slug), actor: actorOf('applicator'), world: realWorld }, visitSubmission(books, { place: books.kitchen, treatments: [] })))
    expect((await kitOf('applicator')).last.find(visit => visit.placeId === books.kitchen.id)?.entries).toHaveLength(1)
  })
})
