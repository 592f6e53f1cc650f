import type { Actor } from '#shared/access/abilities'
import { branchesFor } from '#shared/access/abilities'
import type { BookQuerySchema } from '#shared/api/contract/books'
import type { PartyAtPlace, Role } from '#shared/books/shapes'
import { AppError } from '#shared/errors'
import { checkRegistrationNumber } from '#shared/registration/number'
import type { z } from 'zod'
import { booksOf, toParty } from '#server/database/firm/repositories/books'
import * as lists from '#server/database/firm/repositories/book-lists'
import type { FirmFile } from '#server/services/house'

type Asked = z.output<typeof BookQuerySchema>
const found = <T>(value: T | undefined): T => {
  if (value === undefined) throw new AppError('not-found')
  return value
}
const seenBy = (actor: Actor) => branchesFor(actor, 'book.read')
const isSeen = (branches: 'all' | string[], branchId: string) => branches === 'all' || branches.includes(branchId)

function asked({ q, limit, cursor }: Asked): lists.ListAsked {
  if (cursor === undefined) return { q, limit, after: null }
  try {
    const [name, id] = JSON.parse(Buffer.from(cursor, 'base64url').toString()) as unknown[]
    if (typeof name === 'string' && typeof id === 'string') return { q, limit, after: { name, id } }
  }
  catch (error) {
    if (!(error instanceof SyntaxError)) throw error
  }
  throw new AppError('malformed', [{ path: 'cursor', code: 'wrong-form', params: { form: 'cursor' } }])
}

function page<R extends { name: string, id: string }, T>(rows: R[], limit: number, show: (row: R) => T): { rows: T[], next: string | null } {
  const shown = rows.slice(0, limit)
  const last = shown.at(-1)
  return { rows: shown.map(show), next: rows.length > limit && last ? Buffer.from(JSON.stringify([last.name, last.id])).toString('base64url') : null }
}

const branchNames = (file: FirmFile) => new Map(lists.branchIds(file.reader).map(b => [b.id, b.name]))

export const readPlaces = (file: FirmFile, actor: Actor, query: Asked) => {
  const books = booksOf(file.reader)
  return page(lists.listPlaces(file.reader, seenBy(actor), asked(query)), query.limit, (row) => {
    const { id, name, kind, address, town, county, region, siteKind } = found(books.place(row.id))
    return { id, name, kind, address, town, county, region, siteKind, lastOn: row.last_on }
  })
}

/** A place of the branches that the actor works in. @throws AppError not-found for any other. */
export function readPlace(file: FirmFile, actor: Actor, id: string) {
  const books = booksOf(file.reader)
  const place = found(books.place(id))
  if (!isSeen(seenBy(actor), place.branchId)) throw new AppError('not-found')
  const above: { id: string, name: string, kind: string }[] = []
  for (let parent = place.parentId; parent !== null;) {
    const at = found(books.place(parent))
    above.unshift({ id: at.id, name: at.name, kind: at.kind })
    parent = at.parentId
  }
  const names = new Map([...above, place].map(p => [p.id, p.name]))
  const parties = books.parties(id).map(({ party, role, from, to, placeId }) => ({ id: party.id, name: party.name, role, from, to, email: party.email, phone: party.phone, at: names.get(placeId) ?? '' }))
  return { ...place, above, below: lists.placesBelow(file.reader, id), parties, branch: found(books.branch(place.branchId)).name }
}

export const readParties = (file: FirmFile, actor: Actor, query: Asked) =>
  page(lists.listParties(file.reader, seenBy(actor), asked(query)), query.limit, row => ({ ...toParty(row), places: row.places }))

/** A party with its roles at places of the branches that the actor works in. @throws AppError not-found where it has none there. */
export function readParty(file: FirmFile, actor: Actor, id: string) {
  const party = toParty(found(lists.partyRow(file.reader, id)))
  const branches = seenBy(actor)
  const at = lists.rolesOfParty(file.reader, id, branches).map(r => ({ placeId: r.place_id, place: r.name, address: r.address, role: r.role as PartyAtPlace['role'], from: r.from_day, to: r.to_day }))
  if (branches !== 'all' && at.length === 0) throw new AppError('not-found')
  return { ...party, at }
}

const dayOf = (now: Date) => now.toISOString().slice(0, 10)

export const readProducts = (file: FirmFile, query: Asked, now: Date) => {
  const books = booksOf(file.reader)
  const day = dayOf(now)
  return page(lists.listProducts(file.reader, asked(query)), query.limit, (row) => {
    const { registrations, ...product } = found(books.product(row.id))
    return { ...product, regions: [...new Set(registrations.filter(r => r.from <= day && (r.to === null || day <= r.to)).map(r => r.region))].sort() }
  })
}

export function readProduct(file: FirmFile, id: string) {
  const books = booksOf(file.reader)
  const product = found(books.product(id))
  const check = checkRegistrationNumber({ kind: product.kind, number: product.number, state: product.numberRegion })
  return { ...product, labels: lists.labelsOf(file.reader, id).map(label => found(books.label(label.id))), numberRefused: check.ok ? null : check.reason }
}

function people(file: FirmFile, rows: { id: string, name: string, to_day: string | null }[], now: Date) {
  const books = booksOf(file.reader)
  const roles = lists.rolesOn(file.reader, rows.map(row => row.id), dayOf(now))
  return rows.map(row => ({ ...found(books.person(row.id)), endsOn: row.to_day, roles: roles.filter(r => r.person_id === row.id).map(r => ({ role: r.role as Role, branch: r.branch })) }))
}

export const readPeople = (file: FirmFile, query: Asked, now: Date) => {
  const rows = lists.listPeople(file.reader, asked(query))
  const { next } = page(rows, query.limit, row => row)
  return { rows: people(file, rows.slice(0, query.limit), now), next }
}

export function readPerson(file: FirmFile, id: string, now: Date) {
  return found(people(file, [found(lists.personRow(file.reader, id))], now)[0])
}

export const readEquipment = (file: FirmFile, actor: Actor, query: Asked) => {
  const books = booksOf(file.reader)
  const names = branchNames(file)
  return page(lists.listEquipment(file.reader, seenBy(actor), asked(query)), query.limit, row => ({ ...found(books.equipment(row.id)), branch: names.get(row.branch_id) ?? '' }))
}

export function readPiece(file: FirmFile, actor: Actor, id: string) {
  const piece = found(booksOf(file.reader).equipment(id))
  if (!isSeen(seenBy(actor), piece.branchId)) throw new AppError('not-found')
  return { ...piece, branch: branchNames(file).get(piece.branchId) ?? '' }
}

export function readFirm(file: FirmFile) {
  const books = booksOf(file.reader)
  return { firm: books.firm(), branches: lists.branchIds(file.reader).map(({ id }) => found(books.branch(id))) }
}
