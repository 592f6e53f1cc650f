import type { Raw } from '#server/database/connection'
import { APPEND_ONLY, appendOnlyTriggers, createAppendOnlyTriggers } from '#server/database/firm/append-only'
import { parseLeaf } from '#server/database/firm/repositories/leaves'
import { BESIDE_TABLES, FACTS_TABLES, writeFacts, writeStanding } from '#server/database/firm/repositories/projections'
import type { LeafBodyRow, LeafRow } from '#server/database/firm/tables'
import type { Leaf } from '#shared/records/body'
import { entryReference, project } from '#shared/records/projection'
import { stand } from '#shared/records/standing'

/**
 * Writes facts, standing and search again from the leaves, in one transaction; touches no leaf. Needs the data folder to itself.
 * The triggers of the tables of facts are taken off for it and put back before it commits.
 * @returns how many leaves were read
 */
export function rebuildProjections(raw: Raw): number {
  return raw.transaction(() => {
    const facts = APPEND_ONLY.filter(entry => (FACTS_TABLES as readonly string[]).includes(entry.table))
    for (const entry of facts) for (const name of Object.keys(appendOnlyTriggers(entry))) raw.exec(`drop trigger if exists ${name}`)
    for (const table of [...FACTS_TABLES, 'entry_head', ...BESIDE_TABLES, 'entry_search']) raw.exec(`delete from ${table}`)
    const rows = raw.prepare<[], LeafRow & LeafBodyRow>('select leaf.*, body, inner, salt from leaf join leaf_body using (seq) order by seq').all()
    const byRoot = new Map<string, Leaf[]>()
    for (const row of rows) {
      const leaf = parseLeaf(row)
      const leaves = [...byRoot.get(leaf.root) ?? [], leaf]
      byRoot.set(leaf.root, leaves)
      const root = leaves[0] ?? leaf
      writeFacts(raw, project(leaf, root.kind === 'application' ? entryReference(root.body.facts) : ''))
      const standing = stand(leaves)
      if (standing) writeStanding(raw, standing)
    }
    createAppendOnlyTriggers(raw, facts.map(entry => entry.table))
    return rows.length
  }).immediate()
}
