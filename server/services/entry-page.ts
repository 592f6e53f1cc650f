import type { Actor } from '#shared/access/abilities'
import { can, entryScope, fieldClass, mayAcknowledge, mayChange } from '#shared/access/abilities'
import type { EntryPage, HistoryItem } from '#shared/api/contract/daybook'
import { AppError } from '#shared/errors'
import { toHex } from '#shared/ledger/hash'
import type { Leaf } from '#shared/records/body'
import { factsHash } from '#shared/records/projection'
import type { EntryHeadRow } from '#shared/records/rows'
import { leafById, leavesOf } from '#server/database/firm/repositories/leaves'
import { mayReadEntry } from '#server/database/firm/repositories/heads'
import { linesOf } from '#server/services/daybook'
import type { FirmFile } from '#server/services/house'

const byWords = (leaf: Leaf): string => 'person' in leaf.body.by ? leaf.body.by.name : leaf.body.by.job

/** A leaf as the history shows it. The firm's own words only to the firm's own people. */
function historyItem(leaf: Leaf, firm: boolean): HistoryItem {
  const item: HistoryItem = { id: leaf.id, kind: leaf.kind, by: byWords(leaf), receivedAt: leaf.receivedAt, reason: null, facts: null, snapshot: null, words: null, says: null, because: null }
  switch (leaf.kind) {
    case 'application':
    case 'amendment': return { ...item, reason: leaf.body.amends?.reason ?? null, facts: leaf.body.facts, snapshot: leaf.body.snapshot, words: firm ? leaf.inner.words : null }
    case 'strike': return { ...item, reason: leaf.body.facts.reason }
    case 'acknowledgement': return { ...item, says: leaf.body.facts.says, because: leaf.body.facts.because }
    default: return item
  }
}

function mayDo(actor: Actor, head: EntryHeadRow): EntryPage['may'] {
  const entry = { branchId: head.branch_id, authorId: head.author }
  const standing = head.status !== 'struck'
  const owed = head.confirmation === 'owed'
  const word = { branchId: head.branch_id, owedBy: head.owed_by }
  return {
    amend: standing && can(actor, 'entry.amend') && mayChange(actor, 'entry.amend', entry), strike: standing && can(actor, 'entry.strike') && mayChange(actor, 'entry.strike', entry),
    confirm: owed && mayAcknowledge(actor, 'confirmed', word), cannotBeHad: owed && can(actor, 'entry.acknowledge') && mayAcknowledge(actor, 'cannot-be-had', word),
  }
}

const nameOf = (leaves: Leaf[], personId: string): string => leaves.flatMap(leaf => 'person' in leaf.body.by && leaf.body.by.person === personId ? [leaf.body.by.name] : [])[0] ?? ''

const noticesOfVisit = (file: FirmFile, actor: Actor, visitId: string) => (file.reader.prepare('select id, party_id, party_name as party, state from notice where visit_id = ? order by id').all(visitId) as { id: string, party_id: string, party: string, state: string }[])
  .filter(notice => actor.subject.kind === 'person' || notice.party_id === actor.subject.id).map(({ id, party, state }) => ({ id, party, state }))

/** One entry by its root's id or that of any leaf that touched it. @throws AppError not-found, also where it may not be seen. */
export function readEntry(file: FirmFile, actor: Actor, id: string): EntryPage {
  const root = leafById(file.reader, id)?.root
  if (!root || !mayReadEntry(file.reader, root, entryScope(actor))) throw new AppError('not-found')
  const head = file.reader.prepare('select * from entry_head where root = ? and until_seq is null').get(root) as EntryHeadRow
  const leaves = leavesOf(file.reader, root)
  const stands = leaves.find(leaf => leaf.seq === head.facts_seq)
  if (stands?.kind !== 'application' && stands?.kind !== 'amendment') throw new AppError('not-found')
  const firm = fieldClass(actor) === 'firm'
  const { facts, snapshot } = stands.body
  const proof = leafById(file.reader, stands.id)
  return {
    id: root, root, head: head.head, status: head.status, confirmation: head.confirmation, owedBy: head.owed_by ? { id: head.owed_by, name: nameOf(leaves, head.owed_by) } : null,
    reference: head.reference, factsHash: toHex(factsHash(facts)), recordedAt: head.recorded_at, facts, snapshot, words: firm ? stands.inner.words : null, findings: firm ? stands.inner.findings : null,
    visit: visitOf(file, facts.visitId), history: leaves.map(leaf => historyItem(leaf, firm)), notices: facts.visitId ? noticesOfVisit(file, actor, facts.visitId) : [],
    proof: { leafHash: toHex(new Uint8Array(proof?.leaf_hash ?? [])), chainHash: toHex(new Uint8Array(proof?.chain_hash ?? [])) }, may: mayDo(actor, head),
  }
}

function visitOf(file: FirmFile, visitId: string | null): EntryPage['visit'] {
  const [leaf] = visitId ? leavesOf(file.reader, visitId) : []
  if (leaf?.kind !== 'visit') return null
  const { id, arrivedAt, leftAt, followUpOn } = leaf.body.facts
  return { id, arrivedAt, leftAt, followUpOn }
}

/** A visit with those of its entries that may be seen. @throws AppError not-found where there is none. */
export async function readVisit(file: FirmFile, actor: Actor, id: string) {
  const [leaf] = leavesOf(file.reader, id)
  if (leaf?.kind !== 'visit') throw new AppError('not-found')
  const heads = file.reader.prepare('select * from entry_head where visit_id = ? and until_seq is null order by root_seq').all(id) as EntryHeadRow[]
  const seen = heads.filter(head => mayReadEntry(file.reader, head.root, entryScope(actor)))
  if (seen.length === 0) throw new AppError('not-found')
  return {
    id, by: byWords(leaf), receivedAt: leaf.receivedAt, facts: leaf.body.facts, snapshot: leaf.body.snapshot, note: fieldClass(actor) === 'firm' ? leaf.inner.words.note : null,
    entries: await linesOf(file, actor, seen.filter(head => head.kind === 'entry')), notices: noticesOfVisit(file, actor, id),
  }
}
