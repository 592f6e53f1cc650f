import type { EntryFacts } from '#shared/records/entry'
import { referId } from '#shared/records/shapes'
import type { Books, EntrySnapshot } from '#shared/records/snapshot'

/** The books, and behind them what an entry's own snapshot knows: an old label version, a product or a person that the books at hand no longer hold. */
export function booksBehind(books: Books, { facts, snapshot }: { facts: EntryFacts, snapshot: EntrySnapshot }): Books {
  const lines = facts.lines.flatMap((line, n) => snapshot.lines[n] ? [{ line, shot: snapshot.lines[n] }] : [])
  const people = facts.people.flatMap((one, n) => snapshot.people[n] ? [{ id: referId(one.person), shot: snapshot.people[n] }] : [])
  return {
    ...books,
    branch: id => books.branch(id) ?? (snapshot.branch.id === id ? { ...snapshot.branch, county: '', country: snapshot.place.country, zone: facts.zone } : undefined),
    place: id => books.place(id) ?? (snapshot.place.id === id ? { ...snapshot.place, id, parentId: null, branchId: facts.branchId, zone: facts.zone, lat: null, lon: null, remark: null, siteKind: snapshot.place.siteKind ?? { code: null, text: '' } } : undefined),
    label: id => books.label(id) ?? lines.flatMap(({ shot }) => shot.label?.id === id ? [{ ...shot.label, productId: shot.product.id ?? '' }] : [])[0],
    product: id => books.product(id) ?? lines.flatMap(({ shot }) => shot.product.id === id ? [{ ...shot.product, id, retiredOn: null }] : [])[0],
    person: (id) => {
      const known = books.person(id)
      const shot = people.find(one => one.id === id)?.shot
      if (!known) return shot ? { id, name: shot.name, licences: shot.licence ? [shot.licence] : [] } : undefined
      return shot?.licence && !known.licences.some(l => l.id === shot.licence?.id) ? { ...known, licences: [...known.licences, shot.licence] } : known
    },
    equipment: id => books.equipment(id) ?? (snapshot.equipment?.id === id ? { id, branchId: facts.branchId, name: snapshot.equipment.name, number: snapshot.equipment.number, kind: snapshot.equipment.kind ?? { code: null, text: '' } } : undefined),
    mix: id => books.mix(id) ?? (snapshot.mix?.id === id ? snapshot.mix : undefined),
  }
}
