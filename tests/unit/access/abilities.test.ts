import { describe, expect, it } from 'vitest'
import type { HeldRole } from '#shared/access/abilities'
import { ABILITIES, ROLE_ABILITIES, abilitiesOf, branchesFor, can, entryScope, fieldClass, mayAcknowledge, mayChange } from '#shared/access/abilities'

const [NORTH, SOUTH, ME, OTHER] = ['north', 'south', 'me', 'other']
const person = (...roles: HeldRole[]) => ({ roles, subject: { kind: 'person' as const, id: ME } })
const officer = (branchId: string | null): HeldRole => ({ role: 'officer', branchId })
const applicator: HeldRole = { role: 'applicator', branchId: NORTH }
const customer = { roles: [{ role: 'customer' as const, branchId: null }], subject: { kind: 'party' as const, id: 'party' } }

describe('abilities', () => {
  it('are denied unless listed', () => {
    for (const ability of ABILITIES) expect(can({ roles: [] }, ability)).toBe(false)
    expect(ROLE_ABILITIES.customer.filter(a => /sign|amend|strike|invite|export|send/.test(a))).toEqual([])
  })

  it('of several roles add up, each once', () => {
    const both = abilitiesOf(person(officer(NORTH), applicator))
    expect(new Set(both).size).toBe(both.length)
    expect(both).toEqual(expect.arrayContaining(['visit.sign', 'entry.export']))
  })

  it('hold in the branches of the roles that give them', () => {
    expect(branchesFor(person(officer(NORTH), officer(SOUTH)), 'entry.amend')).toEqual([NORTH, SOUTH])
    expect(branchesFor(person(officer(NORTH), officer(null)), 'entry.amend')).toBe('all')
    expect(branchesFor(person(applicator), 'entry.export')).toEqual([])
  })
})

describe('whose entries', () => {
  it.each([
    ['an officer: those of the branch', person(officer(NORTH)), { branches: [NORTH], personId: null, partyId: null }],
    ['an applicator: the own ones', person(applicator), { branches: [], personId: ME, partyId: null }],
    ['both at once: either', person(officer(SOUTH), applicator), { branches: [SOUTH], personId: ME, partyId: null }],
    ['a customer: those at the own places', customer, { branches: [], personId: null, partyId: 'party' }],
    ['nobody without a role: none', person(), { branches: [], personId: null, partyId: null }],
  ])('%s', (_, actor, scope) => {
    expect(entryScope(actor)).toEqual(scope)
  })

  it('a customer sees no words of the firm’s own', () => {
    expect([fieldClass(person(applicator)), fieldClass(customer)]).toEqual(['firm', 'party'])
  })
})

describe('changing an entry', () => {
  it.each([
    ['its author', person(applicator), { branchId: NORTH, authorId: ME }, true],
    ['another applicator', person(applicator), { branchId: NORTH, authorId: OTHER }, false],
    ['an officer of its branch', person(officer(NORTH)), { branchId: NORTH, authorId: OTHER }, true],
    ['an officer of another branch', person(officer(SOUTH)), { branchId: NORTH, authorId: OTHER }, false],
    ['an author who has left the trade', person(), { branchId: NORTH, authorId: ME }, false],
    ['a customer', customer, { branchId: NORTH, authorId: OTHER }, false],
  ])('%s: %#', (_, actor, entry, may) => {
    expect(mayChange(actor, 'entry.amend', entry)).toBe(may)
    expect(mayChange(actor, 'entry.strike', entry)).toBe(may)
  })

  it('only the author gives the word owed; an officer can say that it can’t be had', () => {
    const owed = { branchId: NORTH, owedBy: ME }
    expect(mayAcknowledge(person(applicator), 'confirmed', owed)).toBe(true)
    expect(mayAcknowledge(person(officer(NORTH)), 'confirmed', { ...owed, owedBy: OTHER })).toBe(false)
    expect(mayAcknowledge(person(officer(NORTH)), 'cannot-be-had', { ...owed, owedBy: OTHER })).toBe(true)
    expect(mayAcknowledge(person(officer(SOUTH)), 'cannot-be-had', { ...owed, owedBy: OTHER })).toBe(false)
    expect(mayAcknowledge(person(applicator), 'cannot-be-had', owed)).toBe(false)
  })
})
