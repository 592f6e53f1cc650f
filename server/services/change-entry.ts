import type { Actor } from '#shared/access/abilities'
import { entryScope, mayAcknowledge, mayChange } from '#shared/access/abilities'
import type { EntryReceipt } from '#shared/api/contract/visits'
import { AppError } from '#shared/errors'
import { equalBytes } from '#shared/ledger/hash'
import type { Leaf } from '#shared/records/body'
import type { Acknowledgement, Amendment, Strike } from '#shared/records/entry'
import { factsHash, submissionHash } from '#shared/records/projection'
import { refuseEntry } from '#shared/records/refusals'
import type { EntryHeadRow } from '#shared/records/rows'
import { keepUnchanged } from '#shared/records/snapshot'
import { appendLeaf, leafById, leavesOf } from '#server/database/firm/repositories/leaves'
import { mayReadEntry } from '#server/database/firm/repositories/heads'
import { judgeEntry, receiptOf } from '#server/services/sign-visit'
import type { Signed, Signing } from '#server/services/sign-visit'

type EntryLeaf = Leaf<'application' | 'amendment'>

/** How the entry stands, for somebody who may see it. @throws AppError not-found. */
function standingOf({ file, actor }: Signing, root: string): EntryHeadRow {
  const head = file.raw.prepare('select * from entry_head where root = ? and until_seq is null').get(root) as EntryHeadRow | undefined
  if (!head || head.kind !== 'entry' || !mayReadEntry(file.raw, root, entryScope(actor))) throw new AppError('not-found')
  return head
}

function demandHead(head: EntryHeadRow, sent: string): void {
  if (head.head !== sent) throw new AppError('head-moved', [], { head: head.head, status: head.status })
  if (head.status === 'struck') throw new AppError('already-struck')
}

const person = (actor: Actor) => ({ person: actor.subject.id, name: actor.name })

/** A leaf already on record under this id: the same again is answered as the first time, by its own signer only. */
function repeated(signing: Signing, root: string, id: string, same: (leaf: Leaf) => boolean): Leaf | null {
  if (!leafById(signing.file.raw, id)) return null
  const leaf = leavesOf(signing.file.raw, root).find(l => l.id === id)
  if (!leaf || !('person' in leaf.body.by) || leaf.body.by.person !== signing.actor.subject.id || !same(leaf)) throw new AppError('id-in-use')
  return leaf
}

/**
 * Corrects an entry by a new row against the head that the sender saw, so that forks can't arise.
 * What the correction does not change keeps the snapshot it had. @throws AppError head-moved with the head that stands now.
 */
export function amendEntry(signing: Signing, root: string, amendment: Amendment): Signed<EntryReceipt> {
  const { file, actor, world } = signing
  const { facts, words, amends } = amendment
  const issues = refuseEntry({ facts, words })
  if (amends.root !== root) issues.push({ path: 'amends.root', code: 'other-entry' })
  if (issues.length > 0) throw new AppError('refused', issues)
  return file.raw.transaction((): Signed<EntryReceipt> => {
    const head = standingOf(signing, root)
    const leaves = leavesOf(file.raw, root)
    const first = leaves[0] as Leaf
    const again = repeated(signing, root, facts.id, leaf => leaf.kind === 'amendment' && equalBytes(submissionHash(amendment), submissionHash({ facts: (leaf as EntryLeaf).body.facts, words: (leaf as EntryLeaf).inner.words, amends: leaf.body.amends })))
    if (again) return { repeated: true, receipt: receiptOf(again as EntryLeaf, first) }
    if (!mayChange(actor, 'entry.amend', { branchId: head.branch_id, authorId: head.author })) throw new AppError('not-allowed')
    demandHead(head, amends.head)
    const before = leaves.filter((leaf): leaf is EntryLeaf => leaf.kind === 'application' || leaf.kind === 'amendment').at(-1)
    if (!before) throw new AppError('not-found')
    const receivedAt = world.now().toISOString()
    // An entry is late by when it was first received: a correction does not make it so.
    const { snapshot, findings } = judgeEntry(file, { facts, words }, first.receivedAt, 'facts', fresh => keepUnchanged(before.body, { facts, snapshot: fresh }))
    const leaf = appendLeaf<'amendment'>(file.raw, {
      root, inner: { words, findings }, salt: world.random(32),
      body: { v: 1, kind: 'amendment', firm: file.id, id: facts.id, by: person(actor), receivedAt, facts, snapshot, packs: [], amends },
    })
    return { repeated: false, receipt: receiptOf(leaf, first) }
  }).immediate()
}

/** Strikes an entry made in error. Final; what was written stays readable. */
export function strikeEntry(signing: Signing, root: string, { facts, words }: Strike): Signed<{ id: string }> {
  const { file, actor, world } = signing
  if (facts.root !== root) throw new AppError('refused', [{ path: 'facts.root', code: 'other-entry' }])
  return file.raw.transaction((): Signed<{ id: string }> => {
    const head = standingOf(signing, root)
    if (repeated(signing, root, facts.id, leaf => equalBytes(factsHash(leaf.body.facts), factsHash(facts)))) return { repeated: true, receipt: { id: facts.id } }
    if (!mayChange(actor, 'entry.strike', { branchId: head.branch_id, authorId: head.author })) throw new AppError('not-allowed')
    demandHead(head, facts.head)
    appendLeaf<'strike'>(file.raw, {
      root, inner: { words }, salt: world.random(32),
      body: { v: 1, kind: 'strike', firm: file.id, id: facts.id, by: person(actor), receivedAt: world.now().toISOString(), facts, snapshot: null, packs: [], amends: null },
    })
    return { repeated: false, receipt: { id: facts.id } }
  }).immediate()
}

/** The author's word on another person's change. A dispute changes no figure: both readings show. */
export function acknowledge(signing: Signing, root: string, { facts, words }: Acknowledgement): Signed<{ id: string }> {
  const { file, actor, world } = signing
  if (facts.root !== root) throw new AppError('refused', [{ path: 'facts.root', code: 'other-entry' }])
  if (facts.says !== 'confirmed' && !facts.because) throw new AppError('refused', [{ path: 'facts.because', code: 'required' }])
  return file.raw.transaction((): Signed<{ id: string }> => {
    const head = standingOf(signing, root)
    if (repeated(signing, root, facts.id, leaf => equalBytes(factsHash(leaf.body.facts), factsHash(facts)))) return { repeated: true, receipt: { id: facts.id } }
    if (!mayAcknowledge(actor, facts.says, { branchId: head.branch_id, owedBy: head.owed_by })) throw new AppError('not-allowed')
    if (head.head !== facts.head) throw new AppError('head-moved', [], { head: head.head, status: head.status })
    if (head.confirmation !== 'owed') throw new AppError('refused', [{ path: 'facts.head', code: 'no-word-owed' }])
    appendLeaf<'acknowledgement'>(file.raw, {
      root, inner: { words }, salt: world.random(32),
      body: { v: 1, kind: 'acknowledgement', firm: file.id, id: facts.id, by: person(actor), receivedAt: world.now().toISOString(), facts, snapshot: null, packs: [], amends: null },
    })
    return { repeated: false, receipt: { id: facts.id } }
  }).immediate()
}
