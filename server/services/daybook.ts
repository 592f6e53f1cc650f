import type { Actor } from '#shared/access/abilities'
import { entryScope, fieldClass } from '#shared/access/abilities'
import type { DaybookFilter, DaybookQuery, DaybookRow } from '#shared/api/contract/daybook'
import { AppError } from '#shared/errors'
import type { EntryBody, EntryInner } from '#shared/records/body'
import type { EntryHeadRow } from '#shared/records/rows'
import type { VisitSnapshot } from '#shared/records/snapshot'
import type { VisitFacts } from '#shared/records/visit'
import { entryLine, nothingLine } from '#shared/reports/daybook-row'
import type { Keyset } from '#server/database/firm/repositories/daybook'
import { bodiesOf, keyOf, pageOfHeads, totalsOf } from '#server/database/firm/repositories/daybook'
import type { FirmFile } from '#server/services/house'

const toCursor = (key: Keyset): string => Buffer.from(JSON.stringify(key)).toString('base64url')

function fromCursor(cursor: string | undefined): Keyset | null {
  if (cursor === undefined) return null
  try {
    const key = JSON.parse(Buffer.from(cursor, 'base64url').toString()) as Keyset
    if (typeof key.root === 'string' && typeof key.finishedAt === 'string' && (key.value === null || ['string', 'number'].includes(typeof key.value))) return key
  }
  catch (error) {
    if (!(error instanceof SyntaxError)) throw error
  }
  throw new AppError('malformed', [{ path: 'cursor', code: 'wrong-form', params: { form: 'cursor' } }])
}

/** The lines of these heads, each from the leaf that stands. */
export async function linesOf(file: FirmFile, actor: Pick<Actor, 'subject'>, heads: EntryHeadRow[]): Promise<DaybookRow[]> {
  const bodies = await bodiesOf(file.read, heads.map(head => head.facts_seq))
  const seesFindings = fieldClass(actor) === 'firm'
  return heads.flatMap((head) => {
    const stored = bodies.get(head.facts_seq)
    if (!stored) return []
    if (head.kind === 'nothing') {
      const { facts, snapshot } = stored.body as { facts: VisitFacts, snapshot: VisitSnapshot }
      return [nothingLine(head, facts, snapshot)]
    }
    const { facts, snapshot } = stored.body as EntryBody
    return [entryLine(head, facts, snapshot, seesFindings ? (stored.inner as EntryInner).findings : null)]
  })
}

/** A page of the Daybook. What an actor may not know can't be asked for either. */
export async function readDaybook(file: FirmFile, actor: Actor, query: DaybookQuery): Promise<{ rows: DaybookRow[], next: string | null }> {
  const heads = await pageOfHeads(file.read, entryScope(actor), ownFilter(actor, query), fromCursor(query.cursor))
  const shown = heads.slice(0, query.limit)
  const last = shown.at(-1)
  return { rows: await linesOf(file, actor, shown), next: heads.length > query.limit && last ? toCursor(keyOf(last, query.sort)) : null }
}

export async function readTotals(file: FirmFile, actor: Actor, filter: DaybookFilter) {
  const totals = await totalsOf(file.read, entryScope(actor), ownFilter(actor, filter))
  return fieldClass(actor) === 'firm' ? totals : { ...totals, stops: null, queries: null }
}

/** Findings and lateness are the firm's own: a customer's filter by them is left out, sorting by them falls back to time. */
function ownFilter<F extends DaybookFilter>(actor: Actor, filter: F): F {
  if (fieldClass(actor) === 'firm') return filter
  const { finding: _, late: __, owed: ___, ...rest } = filter
  return { ...rest, ...('sort' in filter && String(filter.sort).endsWith('finding') ? { sort: '-finishedAt' } : {}) } as F
}
