import type { Leaf } from '#shared/records/body'
import { referId } from '#shared/records/shapes'
import type { VisitSubmission } from '#shared/records/visit'
import type { Raw } from '#server/database/connection'
import { perConnection } from '#server/database/statement'
import { booksOf } from '#server/database/firm/repositories/books'
import { newId } from '#server/services/house'
import type { FirmFile } from '#server/services/house'
import type { Signing } from '#server/services/sign-visit'
import type { VisitReceipt } from '#shared/api/contract/visits'
import { whoIsTold } from '#shared/notices/recipients'
import { writing } from '#shared/reports/writing'
import { localDay } from '#shared/time/zoned'
import { words as say } from '#server/words/words'

interface Planned { facts: VisitSubmission['visit']['facts'], words: VisitSubmission['visit']['words'], receivedAt: string, entries: Leaf<'application'>[] }

const prepared = perConnection((raw: Raw) => ({
  notice: raw.prepare('insert into notice (id, visit_id, party_id, party_name, channel, address, language, state, planned_at, released_by, released_at, subject) values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)'),
  outbox: raw.prepare('insert into outbox (id, notice_id, state, attempts, next_at, message_id) values (?, ?, ?, 0, ?, ?)'),
  event: raw.prepare('insert into notice_event (id, notice_id, at, what, by_person, detail) values (?, ?, ?, ?, ?, ?)'),
  ofVisit: raw.prepare<[string], { id: string, party_name: string, released_at: string | null }>('select id, party_name, released_at from notice where visit_id = ? order by id'),
}))

/**
 * In the visit's own transaction: one notice for each party to be told, *planned*, its outbox row *held* unless the signer tapped
 * "send when signed" for that party. Nothing is told of a visit with nothing applied.
 */
export function planNotices({ file, actor, world }: Signing, { facts, words, receivedAt, entries }: Planned): void {
  const placeId = referId(facts.place)
  if (entries.length === 0 || !placeId) return
  const day = localDay(facts.leftAt, facts.zone)
  const { notice, outbox, event } = prepared(file.raw)
  // the line it is filed and mailed under
  const subject = say('notices.subject', { place: entries[0]?.body.snapshot.place.name ?? '', day: writing(say).day(day) })
  for (const party of whoIsTold(booksOf(file.raw).parties(placeId), day)) {
    const id = newId(world)
    const released = party.email !== null && words.notify.includes(party.id)
    notice.run(id, facts.id, party.id, party.name, party.email ? 'mail' : 'paper', party.email, party.language, 'planned', receivedAt, released ? actor.subject.id : null, released ? receivedAt : null, subject)
    event.run(newId(world), id, receivedAt, released ? 'released' : 'planned', actor.subject.id, null)
    if (party.email) outbox.run(newId(world), id, released ? 'due' : 'held', receivedAt, `<${id}@${file.slug}.tankside>`)
  }
}

export function noticesOf(file: FirmFile, visitId: string): VisitReceipt['notices'] {
  return prepared(file.raw).ofVisit.all(visitId).map(row => ({ id: row.id, party: row.party_name, released: row.released_at !== null }))
}
