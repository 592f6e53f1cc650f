import { ZodError } from 'zod'
import type { Raw } from '#server/database/connection'
import { brokenTriggers } from '#server/database/firm/append-only'
import type { LeafBodyRow, LeafRow } from '#server/database/firm/tables'
import { leavesOf, parseLeaf } from '#server/database/firm/repositories/leaves'
import { BESIDE_TABLES, FACTS_TABLES } from '#server/database/firm/repositories/projections'
import { canonicalBytes } from '#shared/ledger/canonical'
import { ZERO_HASH, chainHash, commitment, equalBytes, leafHash, toHex } from '#shared/ledger/hash'
import type { Leaf } from '#shared/records/body'
import { entryReference, project } from '#shared/records/projection'
import { stand } from '#shared/records/standing'
import type { Problem } from '#server/services/verify/problem'
import { Problems } from '#server/services/verify/problem'
import type { Row } from '#server/services/verify/rows'
import { compareRows, rowReader } from '#server/services/verify/rows'

export interface Verdict {
  good: boolean
  leaves: number
  /** The chain hash of the last leaf, hex: whoever kept an earlier one can ask whether the log still passes through it. */
  head: string
  problems: Problem[]
  /** All problems, also those beyond the list. */
  count: number
}

type StoredLeaf = LeafRow & Partial<LeafBodyRow>

/**
 * Recomputes everything that a firm's file says of its ledger: triggers, chain, bodies, facts, standing, search.
 * Reads only; on a connection of its own it runs beside the server. What it shows and does not show: `docs/verify.md`.
 */
export function verifyFirm(raw: Raw): Verdict {
  const problems = new Problems()
  for (const name of brokenTriggers(raw)) problems.add('triggers', `trigger ${name}`, 'is missing or altered')
  return raw.transaction(() => {
    const firmId = (raw.prepare('select id from firm').get() as { id: string }).id
    const walked = walkLeaves(raw, firmId, problems)
    orphanFacts(raw, problems)
    walkRoots(raw, walked.roots, problems)
    return { good: problems.count === 0, leaves: walked.leaves, head: toHex(walked.head), problems: problems.list, count: problems.count }
  })()
}

function walkLeaves(raw: Raw, firmId: string, problems: Problems) {
  const facts = FACTS_TABLES.map(table => ({ table, read: rowReader(raw, table, 'seq = ?') }))
  const references = new Map<string, string>()
  const roots = new Set<string>()
  let head: Uint8Array = ZERO_HASH
  let leaves = 0
  const rows = raw.prepare<[], StoredLeaf>('select leaf.*, leaf_body.body, leaf_body.inner, leaf_body.salt from leaf left join leaf_body using (seq) order by seq').iterate()
  for (const row of rows) {
    leaves++
    checkChain(row, leaves, head, problems)
    head = row.chain_hash
    const leaf = checkBody(row, firmId, problems)
    if (!leaf) continue
    if (leaf.kind === 'application') references.set(leaf.id, entryReference(leaf.body.facts))
    roots.add(leaf.root)
    const given = project(leaf, references.get(leaf.root) ?? '')
    for (const { table, read } of facts) compareRows(problems, 'facts', table, `seq ${leaf.seq}`, read(leaf.seq), (given[table] ?? []) as unknown as Row[])
  }
  return { leaves, head, roots }
}

function checkChain(row: StoredLeaf, expected: number, before: Uint8Array, problems: Problems): void {
  const where = `leaf seq ${row.seq}`
  if (row.seq !== expected) problems.add('chain', where, `the sequence has a gap: ${expected} should come here`)
  if (!equalBytes(row.prev_hash, before)) problems.add('chain', where, 'prev_hash is not the chain_hash of the leaf before')
  if (!equalBytes(row.chain_hash, chainHash(row.prev_hash, row.leaf_hash))) problems.add('chain', where, 'chain_hash does not follow from prev_hash and leaf_hash')
}

/** The stored bytes against their hash, their canonical form, their schema, and what the leaf says of them. */
function checkBody(row: StoredLeaf, firmId: string, problems: Problems): Leaf | null {
  const where = `leaf_body seq ${row.seq} (${row.kind} ${row.id})`
  if (!row.body) {
    problems.add('body', where, 'the body is missing')
    return null
  }
  if (!equalBytes(leafHash(row.body), row.leaf_hash)) problems.add('body', where, 'the stored bytes do not have the hash that the leaf holds: the body was changed')
  const inner = row.inner ?? null
  try {
    const leaf = parseLeaf({ ...row, body: row.body, inner })
    if (!equalBytes(canonicalBytes(leaf.body), row.body)) problems.add('body', where, 'the stored bytes are not the canonical form of their content')
    if (leaf.body.inner === null ? inner !== null : !(inner && row.salt && toHex(commitment(row.salt, inner)) === leaf.body.inner)) problems.add('body', where, 'the firm’s own part is not the one that the body commits to')
    const said = { id: leaf.body.id, kind: leaf.body.kind, firm: leaf.body.firm, receivedAt: leaf.body.receivedAt, root: rootOf(leaf) }
    const held = { id: row.id, kind: row.kind, firm: firmId, receivedAt: row.received_at, root: row.root }
    for (const key of Object.keys(said) as (keyof typeof said)[]) if (said[key] !== held[key]) problems.add('body', where, `${key}: the body says ${said[key]}, the leaf ${held[key]}`)
    return leaf
  }
  catch (error) {
    problems.add('body', where, error instanceof ZodError ? `cannot be read: ${error.issues[0]?.path.join('.')}: ${error.issues[0]?.message}` : `cannot be read: ${String(error)}`)
    return null
  }
}

function rootOf({ body }: Leaf): string {
  switch (body.kind) {
    case 'amendment': return body.amends.root
    case 'strike':
    case 'acknowledgement': return body.facts.root
    case 'notice': return body.facts.id
    default: return body.id
  }
}

/** Rows of facts under a sequence number that no leaf has. */
function orphanFacts(raw: Raw, problems: Problems): void {
  for (const table of [...FACTS_TABLES, 'leaf_body']) {
    const rows = raw.prepare<[], { seq: number }>(`select distinct seq from ${table} where seq not in (select seq from leaf) order by seq`).all()
    for (const { seq } of rows) problems.add('facts', `${table} seq ${seq}`, 'no leaf gives this row')
  }
}

function walkRoots(raw: Raw, roots: Set<string>, problems: Problems): void {
  const heads = rowReader(raw, 'entry_head', 'root = ?', 'from_seq')
  const beside = BESIDE_TABLES.map(table => ({ table, read: rowReader(raw, table, 'root = ? and from_seq = ?') }))
  const search = raw.prepare<[number], { words: string }>('select words from entry_search where rowid = ?')
  for (const root of roots) {
    const leaves = readable(raw, root)
    const given = leaves.map((_, n) => stand(leaves.slice(0, n + 1))).filter(standing => standing !== null)
    const held = heads(root)
    given.forEach((standing, n) => {
      const until = given[n + 1]?.head.from_seq ?? null
      const key = `root ${root} from_seq ${standing.head.from_seq}`
      const mine = held.filter(row => Number(row.from_seq) === standing.head.from_seq)
      compareRows(problems, 'standing', 'entry_head', key, mine, [{ ...standing.head, until_seq: until } as unknown as Row])
      for (const { table, read } of beside) compareRows(problems, 'standing', table, key, read(root, standing.head.from_seq), standing.beside[table] as unknown as Row[])
    })
    for (const row of held) if (!given.some(s => s.head.from_seq === Number(row.from_seq))) problems.add('standing', `entry_head root ${root} from_seq ${String(row.from_seq)}`, 'no leaf gives this row')
    const last = given.at(-1)
    if (last && search.get(last.head.root_seq)?.words !== last.search) problems.add('search', `entry_search of root ${root}`, 'is not what the leaf gives')
  }
  orphanStanding(raw, problems)
}

/** Leaves of a root that could be read; one that could not has been reported already. */
function readable(raw: Raw, root: string): Leaf[] {
  try {
    return leavesOf(raw, root)
  }
  catch {
    return []
  }
}

function orphanStanding(raw: Raw, problems: Problems): void {
  for (const table of ['entry_head', ...BESIDE_TABLES]) {
    const rows = raw.prepare<[], { root: string }>(`select distinct root from ${table} where root not in (select root from leaf)`).all()
    for (const { root } of rows) problems.add('standing', `${table} root ${root}`, 'no leaf gives this row')
  }
  const words = raw.prepare<[], { rowid: number }>('select rowid from entry_search where rowid not in (select root_seq from entry_head)').all()
  for (const { rowid } of words) problems.add('search', `entry_search row ${rowid}`, 'no leaf gives this row')
}
