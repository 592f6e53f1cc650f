import type { Raw } from '#server/database/connection'
import { perConnection } from '#server/database/statement'
import { canonicalBytes } from '#shared/ledger/canonical'
import { ZERO_HASH, chainHash, commitment, leafHash, toHex } from '#shared/ledger/hash'
import type { BodyOf, InnerOf, Kind, Leaf } from '#shared/records/body'
import { BodySchema, INNER } from '#shared/records/body'
import type { LeafBodyRow, LeafRow } from '#server/database/firm/tables'
import { entryReference, project } from '#shared/records/projection'
import { writeFacts, writeStanding } from '#server/database/firm/repositories/projections'
import { stand } from '#shared/records/standing'

const utf8 = new TextDecoder('utf-8', { fatal: true })
const fromBytes = (bytes: Uint8Array): unknown => JSON.parse(utf8.decode(bytes))

interface Prepared {
  last: () => { seq: number, chain_hash: Uint8Array } | undefined
  body: (seq: number) => LeafBodyRow | undefined
  ofRoot: (root: string) => (LeafRow & LeafBodyRow)[]
  byId: (id: string) => LeafRow | undefined
  insertLeaf: (row: LeafRow) => void
  insertBody: (row: LeafBodyRow) => void
}

const prepared = perConnection((raw: Raw): Prepared => {
  const last = raw.prepare<[], { seq: number, chain_hash: Uint8Array }>('select seq, chain_hash from leaf order by seq desc limit 1')
  const body = raw.prepare<[number], LeafBodyRow>('select seq, body, inner, salt from leaf_body where seq = ?')
  const ofRoot = raw.prepare<[string], LeafRow & LeafBodyRow>('select leaf.*, body, inner, salt from leaf join leaf_body using (seq) where root = ? order by seq')
  const byId = raw.prepare<[string], LeafRow>('select * from leaf where id = ?')
  const insertLeaf = raw.prepare('insert into leaf (seq, id, kind, root, leaf_hash, prev_hash, chain_hash, received_at) values (@seq, @id, @kind, @root, @leaf_hash, @prev_hash, @chain_hash, @received_at)')
  const insertBody = raw.prepare('insert into leaf_body (seq, body, inner, salt) values (@seq, @body, @inner, @salt)')
  return { last: () => last.get(), body: seq => body.get(seq), ofRoot: root => ofRoot.all(root), byId: id => byId.get(id), insertLeaf: row => void insertLeaf.run(row), insertBody: row => void insertBody.run(row) }
})

/** The body at `seq` as stored, parsed. @throws when there is none. */
export function readBody(raw: Raw, seq: number): unknown {
  const row = prepared(raw).body(seq)
  if (!row) throw new Error(`no body at ${seq}`)
  return fromBytes(row.body)
}

/** A leaf's bytes read by the schemas of its kind. @throws ZodError when the bytes are not what that kind says. */
export function parseLeaf(row: Pick<LeafRow, 'seq' | 'id' | 'kind' | 'root' | 'received_at'> & Pick<LeafBodyRow, 'body' | 'inner'>): Leaf {
  const body = BodySchema.parse(fromBytes(row.body))
  const inner = INNER[body.kind].parse(row.inner ? fromBytes(row.inner) : null)
  return { seq: row.seq, kind: body.kind, id: row.id, root: row.root, receivedAt: row.received_at, body, inner } as Leaf
}

/** All leaves of one root, in order. Rows come from our own transaction or from a verified file: they are read, not doubted. */
export const leavesOf = (raw: Raw, root: string): Leaf[] => prepared(raw).ofRoot(root).map(row => ({
  seq: row.seq, kind: row.kind, id: row.id, root: row.root, receivedAt: row.received_at, body: fromBytes(row.body), inner: row.inner ? fromBytes(row.inner) : null,
}) as Leaf)

export const leafById = (raw: Raw, id: string): LeafRow | undefined => prepared(raw).byId(id)

export interface NewLeaf<K extends Kind> {
  root: string
  body: Omit<BodyOf<K>, 'inner'>
  inner: InnerOf<K>
  /** 32 random bytes; not used where there is no inner part. */
  salt: Uint8Array
}

/**
 * Appends one leaf with its rows and how its root stands after it. Inside a transaction of the caller's, on the writing connection.
 * Children first: the file takes them only while their leaf is not on record.
 */
export function appendLeaf<K extends Kind>(raw: Raw, leaf: NewLeaf<K>): Leaf<K> {
  const db = prepared(raw)
  const last = db.last()
  const seq = (last?.seq ?? 0) + 1
  const inner = leaf.inner === null ? null : canonicalBytes(leaf.inner)
  const body = { ...leaf.body, inner: inner ? toHex(commitment(leaf.salt, inner)) : null } as BodyOf<K>
  const bytes = canonicalBytes(body)
  const leaf_hash = leafHash(bytes)
  const prev_hash = last ? last.chain_hash : ZERO_HASH
  const written = { seq, kind: body.kind, id: body.id, root: leaf.root, receivedAt: body.receivedAt, body, inner: leaf.inner } as Leaf<K>

  const before = written.id === leaf.root ? [] : leavesOf(raw, leaf.root)
  const leaves = [...before, written as Leaf]
  const root = leaves[0] as Leaf
  const reference = root.body.kind === 'application' ? entryReference(root.body.facts) : ''

  db.insertBody({ seq, body: bytes, inner, salt: inner ? leaf.salt : null })
  writeFacts(raw, project(written as Leaf, reference))
  db.insertLeaf({ seq, id: body.id, kind: body.kind, root: leaf.root, leaf_hash, prev_hash: new Uint8Array(prev_hash), chain_hash: chainHash(prev_hash, leaf_hash), received_at: body.receivedAt })
  const standing = stand(leaves)
  if (standing) writeStanding(raw, standing)
  return written
}
