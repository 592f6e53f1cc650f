import type { Actor } from '#shared/access/abilities'
import { branchesFor } from '#shared/access/abilities'
import type { EntryReceipt, VisitReceipt } from '#shared/api/contract/visits'
import { assess, markSeen } from '#shared/checks/assess'
import type { Issue } from '#shared/errors'
import { AppError } from '#shared/errors'
import { equalBytes, toHex } from '#shared/ledger/hash'
import type { By, Leaf } from '#shared/records/body'
import type { EntrySubmission } from '#shared/records/entry'
import { entryReference, factsHash, submissionHash } from '#shared/records/projection'
import { refuseEntry, refuseVisit } from '#shared/records/refusals'
import { referId } from '#shared/records/shapes'
import { NotInBook, snapshotEntry, snapshotMix, snapshotVisit } from '#shared/records/snapshot'
import type { EntrySnapshot } from '#shared/records/snapshot'
import type { MixSubmission, VisitSubmission } from '#shared/records/visit'
import { localDay } from '#shared/time/zoned'
import type { Raw } from '#server/database/connection'
import { perConnection } from '#server/database/statement'
import { booksOf } from '#server/database/firm/repositories/books'
import { appendLeaf, leafById, leavesOf } from '#server/database/firm/repositories/leaves'
import type { FirmFile, World } from '#server/services/house'
import { noticesOf, planNotices } from '#server/services/plan-notices'

/** What signing needs beside the submission: who signs, when it was received, randomness for salts and ids. */
export interface Signing { file: FirmFile, actor: Actor, world: World }

export interface Signed<T> { receipt: T, repeated: boolean }

const byOf = (actor: Actor): By => ({ person: actor.subject.id, name: actor.name })

/** Snapshots name what is missing by its path inside the facts; the sender wants it by its path inside the submission. */
function within<T>(path: string, take: () => T): T {
  try {
    return take()
  }
  catch (error) {
    if (error instanceof NotInBook) throw new AppError('refused', [{ path: `${path}.${error.path}`, code: 'not-in-book' }])
    throw error
  }
}

/** The visit names every part by id and hash, in order: a missing or altered one shows. */
function checkParts({ visit, mixes, entries }: VisitSubmission): Issue[] {
  const issues: Issue[] = []
  const compare = (name: 'mixes' | 'entries', parts: readonly (MixSubmission | EntrySubmission)[]) => {
    const named = visit.facts[name]
    if (named.length !== parts.length) issues.push({ path: `visit.facts.${name}`, code: 'part-missing' })
    parts.forEach((part, n) => {
      if (named[n]?.id !== part.facts.id) issues.push({ path: `${name}.${n}.facts.id`, code: 'part-missing' })
      else if (named[n].hash !== toHex(submissionHash(part))) issues.push({ path: `${name}.${n}`, code: 'part-altered' })
    })
  }
  compare('mixes', mixes)
  compare('entries', entries)
  return issues
}

function checkSigner(actor: Actor, people: (string | null)[], branchId: string, path: string): void {
  const branches = branchesFor(actor, 'visit.sign')
  if (branches !== 'all' && !branches.includes(branchId)) throw new AppError('not-allowed')
  if (!people.includes(actor.subject.id)) throw new AppError('refused', [{ path, code: 'not-yours' }])
}

/** The snapshot and findings of one entry, as they bear on the day of the work. */
export function judgeEntry(file: FirmFile, submission: EntrySubmission, receivedAt: string, path: string, adjust: (fresh: EntrySnapshot) => EntrySnapshot = s => s) {
  const { facts, words } = submission
  const day = localDay(facts.finishedAt, facts.zone)
  const snapshot = adjust(within(path, () => snapshotEntry(facts, booksOf(file.raw), day)))
  return { snapshot, findings: markSeen(assess({ facts, words, snapshot, day, receivedAt }), words.seen) }
}

export const receiptOf = (leaf: Leaf<'application' | 'amendment'>, root: Leaf): EntryReceipt => ({
  id: leaf.id, root: root.id, reference: root.body.kind === 'application' ? entryReference(root.body.facts) : '', factsHash: toHex(factsHash(leaf.body.facts)), findings: leaf.inner.findings,
})

function appendEntry(signing: Signing, submission: EntrySubmission, receivedAt: string, path: string): Leaf<'application'> {
  const { file, actor, world } = signing
  const { facts, words } = submission
  if (leafById(file.raw, facts.id)) throw new AppError('id-in-use', [{ path: `${path}.id`, code: 'id-in-use' }])
  const { snapshot, findings } = judgeEntry(file, submission, receivedAt, path)
  return appendLeaf(file.raw, {
    root: facts.id, inner: { words, findings }, salt: world.random(32),
    body: { v: 1, kind: 'application', firm: file.id, id: facts.id, by: byOf(actor), receivedAt, facts, snapshot, packs: [], amends: null },
  })
}

function appendMix(signing: Signing, { facts, words }: MixSubmission, receivedAt: string, path: string): Leaf<'mix'> {
  const { file, actor, world } = signing
  if (leafById(file.raw, facts.id)) throw new AppError('id-in-use', [{ path: `${path}.id`, code: 'id-in-use' }])
  const snapshot = within(path, () => snapshotMix(facts, booksOf(file.raw), localDay(facts.madeAt, facts.zone)))
  return appendLeaf(file.raw, {
    root: facts.id, inner: { words }, salt: world.random(32),
    body: { v: 1, kind: 'mix', firm: file.id, id: facts.id, by: byOf(actor), receivedAt, facts, snapshot, packs: [], amends: null },
  })
}

const hashOf = perConnection((raw: Raw) => {
  const prepare = (table: string) => raw.prepare<[string], { submission_hash: Uint8Array }>(`select submission_hash from ${table} where id = ?`)
  return { visit: prepare('visit'), mix: prepare('mix'), application: prepare('application') }
})

/** The same submission again is answered with the first answer; another under the same id is a conflict. Whoever signed it may ask again, nobody else. */
function repeatOf(signing: Signing, id: string, hash: Uint8Array, table: 'visit' | 'mix' | 'application'): Leaf | null {
  const row = hashOf(signing.file.raw)[table].get(id)
  const [leaf] = row ? leavesOf(signing.file.raw, id) : []
  if (!row || !leaf) {
    if (leafById(signing.file.raw, id)) throw new AppError('id-in-use')
    return null
  }
  const own = 'person' in leaf.body.by && leaf.body.by.person === signing.actor.subject.id
  if (!own || !equalBytes(row.submission_hash, hash)) throw new AppError('id-in-use')
  return leaf
}

/**
 * Puts a visit on record: its leaf first, then mixes, then entries, then what is to be told, in one commit, all or nothing.
 * Answers only after the commit returned. @throws AppError refused (422), id-in-use (409), not-allowed (403).
 */
export function signVisit(signing: Signing, submission: VisitSubmission): Signed<VisitReceipt> {
  const { file, actor, world } = signing
  const issues = [...refuseVisit(submission), ...checkParts(submission)]
  if (issues.length > 0) throw new AppError('refused', issues)
  const { facts, words } = submission.visit
  checkSigner(actor, facts.present.map(referId), facts.branchId, 'visit.facts.present')
  const hash = submissionHash(submission.visit)

  const commit = file.raw.transaction((): Signed<VisitReceipt> => {
    const before = repeatOf(signing, facts.id, hash, 'visit')
    if (before) return { repeated: true, receipt: receiptAgain(file, before as Leaf<'visit'>) }
    const receivedAt = world.now().toISOString()
    const snapshot = within('visit.facts', () => snapshotVisit(facts, booksOf(file.raw), localDay(facts.leftAt, facts.zone)))
    appendLeaf(file.raw, {
      root: facts.id, inner: { words }, salt: world.random(32),
      body: { v: 1, kind: 'visit', firm: file.id, id: facts.id, by: byOf(actor), receivedAt, facts, snapshot, packs: [], amends: null },
    })
    submission.mixes.forEach((mix, n) => appendMix(signing, mix, receivedAt, `mixes.${n}.facts`))
    const entries = submission.entries.map((entry, n) => appendEntry(signing, entry, receivedAt, `entries.${n}.facts`))
    planNotices(signing, { facts, words, receivedAt, entries })
    return { repeated: false, receipt: { visitId: facts.id, receivedAt, entries: entries.map(e => receiptOf(e, e as Leaf)), notices: noticesOf(file, facts.id) } }
  })
  return commit.immediate()
}

function receiptAgain(file: FirmFile, visit: Leaf<'visit'>): VisitReceipt {
  const entries = visit.body.facts.entries.map((part) => {
    const [leaf] = leavesOf(file.raw, part.id)
    return receiptOf(leaf as Leaf<'application'>, leaf as Leaf)
  })
  return { visitId: visit.id, receivedAt: visit.receivedAt, entries, notices: noticesOf(file, visit.id) }
}

/** One entry without a visit. */
export function signEntry(signing: Signing, submission: EntrySubmission): Signed<EntryReceipt> {
  const issues = refuseEntry(submission)
  if (submission.facts.visitId !== null) issues.push({ path: 'facts.visitId', code: 'other-visit' })
  if (issues.length > 0) throw new AppError('refused', issues)
  checkSigner(signing.actor, submission.facts.people.map(p => referId(p.person)), submission.facts.branchId, 'facts.people')
  return signing.file.raw.transaction((): Signed<EntryReceipt> => {
    const before = repeatOf(signing, submission.facts.id, submissionHash(submission), 'application') as Leaf<'application'> | null
    const leaf = before ?? appendEntry(signing, submission, signing.world.now().toISOString(), 'facts')
    return { repeated: before !== null, receipt: receiptOf(leaf, leaf as Leaf) }
  }).immediate()
}

/** A tank that was made up, on record before anything is drawn from it. */
export function signMix(signing: Signing, submission: MixSubmission): Signed<{ id: string }> {
  const { facts } = submission
  checkSigner(signing.actor, [referId(facts.by)], facts.branchId, 'facts.by')
  return signing.file.raw.transaction((): Signed<{ id: string }> => {
    const before = repeatOf(signing, facts.id, submissionHash(submission), 'mix')
    if (!before) appendMix(signing, submission, signing.world.now().toISOString(), 'facts')
    return { repeated: before !== null, receipt: { id: facts.id } }
  }).immediate()
}
