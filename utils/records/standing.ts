import { localDay, toUtc } from '#shared/time/zoned'
import { RANK } from '#shared/checks/finding'
import type { Leaf } from '#shared/records/body'
import { entryReference, factsHash, signer } from '#shared/records/projection'
import { linesInUse } from '#shared/records/lines'
import type { Confirmation, EntryHeadRow, StandingRows, Status } from '#shared/records/rows'
import { referId } from '#shared/records/shapes'
import { basicNumber } from '#shared/registration/basic'
import { reference } from '#shared/ledger/ids'

/** How one root stands after a leaf: its head row, the rows beside it, and the words that search looks through. */
export interface Standing {
  head: EntryHeadRow
  beside: { [T in Exclude<keyof StandingRows, 'entry_head'>]: StandingRows[T][] }
  search: string
}

type EntryLeaf = Leaf<'application' | 'amendment'>
type Change = Pick<EntryHeadRow, 'status' | 'confirmation' | 'owed_by' | 'head'>

const isEntry = (leaf: Leaf): leaf is EntryLeaf => leaf.kind === 'application' || leaf.kind === 'amendment'

/**
 * Standing: what the leaves of one root say together, in order of `seq`. Null where they are no row of the Daybook
 * (a visit with entries, a mix, a notice).
 */
export function stand(leaves: readonly Leaf[]): Standing | null {
  const [root] = leaves
  if (!root) return null
  if (root.kind === 'visit') return standNothing(root)
  if (root.kind !== 'application') return null
  const facts = leaves.filter(isEntry).at(-1)
  const last = leaves.at(-1)
  return facts && last ? standEntry(root, facts, last.seq, change(leaves)) : null
}

/** Folds the changes: each amendment or strike by somebody else than whoever signed what it changes owes that person's word. */
function change(leaves: readonly Leaf[]): Change {
  let is: Change = { status: 'on-record', confirmation: 'none-owed', owed_by: null, head: leaves[0]?.id ?? '' }
  let changed = leaves[0]
  for (const leaf of leaves.slice(1)) {
    if (leaf.body.kind === 'acknowledgement') {
      is = { ...is, confirmation: leaf.body.facts.says }
      continue
    }
    const author = changed ? signer(changed) : null
    const owes = author !== null && author !== signer(leaf)
    const status: Status = leaf.kind === 'strike' ? 'struck' : 'amended'
    const confirmation: Confirmation = owes ? 'owed' : 'none-owed'
    is = { status, confirmation, owed_by: owes ? author : null, head: leaf.id }
    changed = leaf
  }
  return is
}

function standEntry(root: Leaf<'application'>, leaf: EntryLeaf, fromSeq: number, is: Change): Standing {
  const { facts, snapshot } = leaf.body
  const lines = linesInUse(facts, snapshot)
  const findings = leaf.inner.findings
  const responsible = facts.people.findIndex(p => p.responsible)
  const person = snapshot.people[responsible]
  const key = { root: root.id, from_seq: fromSeq }
  const ingredients = [...new Set(lines.flatMap(l => l.shot.product.ingredients.map(i => i.name)))]
  const [first] = lines
  const ref = entryReference(root.body.facts)
  const head: EntryHeadRow = {
    ...key, root_seq: root.seq, until_seq: null, kind: 'entry', facts_seq: leaf.seq, ...is, author: signer(root),
    visit_id: facts.visitId, reference: ref, facts_hash: factsHash(facts), branch_id: facts.branchId, place_id: referId(facts.place), place_name: snapshot.place.name, county: snapshot.place.county, region: snapshot.place.region,
    local_day: localDay(facts.finishedAt, facts.zone), finished_at: toUtc(facts.finishedAt), recorded_at: root.receivedAt, person_id: person?.id ?? null, person_name: person?.name ?? '',
    number: first?.shot.product.number ?? null, product_name: first?.shot.product.name ?? null, ingredient: ingredients[0] ?? null, method_text: facts.method.text, target_text: facts.targets[0]?.text ?? null,
    finding_rank: Math.max(0, ...findings.map(f => RANK[f.outcome])) as 0 | 1 | 2 | 3, late: findings.some(f => f.check === 'late') ? 1 : 0, restricted_use: lines.some(l => l.shot.product.restrictedUse) ? 1 : 0,
  }
  const words = [ref, snapshot.place.name, snapshot.place.address, snapshot.place.town, snapshot.place.county, ...snapshot.place.parties.map(p => p.name), facts.method.text, leaf.inner.words.note ?? '', leaf.inner.words.explanation ?? '', facts.advice ?? '',
    ...lines.flatMap(l => [l.shot.product.name, l.shot.product.number ?? '']), ...ingredients, ...facts.targets.map(t => t.text), ...facts.areas.map(a => a.place.text), ...snapshot.people.flatMap(p => [p.name, p.licence?.number ?? ''])]
  return {
    head,
    beside: {
      entry_product: lines.map((l, n) => ({ ...key, n, product_id: l.shot.product.id, name: l.shot.product.name, number: l.shot.product.number, number_basic: l.shot.product.number ? basicNumber(l.shot.product.number) : null })),
      entry_ingredient: ingredients.map((name, n) => ({ ...key, n, name })),
      entry_person: snapshot.people.map((p, n) => ({ ...key, n, person_id: p.id, name: p.name, licence_number: p.licence?.number ?? null })),
      entry_target: facts.targets.map((t, n) => ({ ...key, n, code: t.code, text: t.text })),
      entry_finding: findings.map((f, n) => ({ ...key, n, check_name: f.check, outcome: f.outcome })),
    },
    search: words.filter(Boolean).join('\n'),
  }
}

/** A visit with nothing applied: a row of the Daybook of its own kind. */
function standNothing(leaf: Leaf<'visit'>): Standing | null {
  const { facts, snapshot } = leaf.body
  if (!facts.nothing) return null
  const key = { root: leaf.id, from_seq: leaf.seq }
  const day = localDay(facts.leftAt, facts.zone)
  const ref = reference(day, leaf.id)
  const head: EntryHeadRow = {
    ...key, root_seq: leaf.seq, until_seq: null, kind: 'nothing', facts_seq: leaf.seq, head: leaf.id, status: 'on-record', confirmation: 'none-owed', owed_by: null, author: signer(leaf),
    visit_id: leaf.id, reference: ref, facts_hash: factsHash(facts), branch_id: facts.branchId, place_id: referId(facts.place), place_name: snapshot.place.name, county: snapshot.place.county, region: snapshot.place.region,
    local_day: day, finished_at: toUtc(facts.leftAt), recorded_at: leaf.receivedAt, person_id: snapshot.people[0]?.id ?? null, person_name: snapshot.people[0]?.name ?? '',
    number: null, product_name: null, ingredient: null, method_text: facts.nothing.text, target_text: null, finding_rank: 0, late: 0, restricted_use: 0,
  }
  const words = [ref, snapshot.place.name, snapshot.place.address, snapshot.place.town, snapshot.place.county, ...snapshot.place.parties.map(p => p.name), facts.nothing.text, leaf.inner.words.note ?? '', ...snapshot.people.map(p => p.name)]
  return {
    head,
    beside: { entry_product: [], entry_ingredient: [], entry_person: snapshot.people.map((p, n) => ({ ...key, n, person_id: p.id, name: p.name, licence_number: null })), entry_target: [], entry_finding: [] },
    search: words.filter(Boolean).join('\n'),
  }
}
