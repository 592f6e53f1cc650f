import { sql } from 'kysely'
import type { Expression, ExpressionBuilder, SqlBool } from 'kysely'
import type { Raw } from '#server/database/connection'
import { builder } from '#server/database/statement'
import type { FirmDatabase } from '#server/database/firm/tables'
import type { EntryScope } from '#shared/access/abilities'

const q = builder<FirmDatabase>()

/** The condition on `entry_head` that an actor's scope puts on every list, export and single reading. */
export function inScope(scope: EntryScope) {
  return (eb: ExpressionBuilder<FirmDatabase, 'entry_head'>): Expression<SqlBool> => {
    // literals: SQLite binds no booleans
    if (scope.branches === 'all') return eb.lit(true)
    const either: Expression<SqlBool>[] = []
    // The plus keeps the planner on the index of the order asked for; through the branch's index every page would sort the whole branch.
    if (scope.branches.length > 0) either.push(sql<boolean>`+entry_head.branch_id in (${sql.join(scope.branches)})`)
    if (scope.personId) {
      const { personId } = scope
      either.push(eb('entry_head.author', '=', personId))
      either.push(eb.exists(eb.selectFrom('entry_person').select('entry_person.n').whereRef('entry_person.root', '=', 'entry_head.root').whereRef('entry_person.from_seq', '=', 'entry_head.from_seq').where('entry_person.person_id', '=', personId)))
    }
    if (scope.partyId) either.push(placeOfParty(eb, scope.partyId))
    return either.length > 0 ? eb.or(either) : eb.lit(false)
  }
}

/** The entry's place and all that it lies in, as far up as the book goes. */
const PLACE_AND_ABOVE = sql<string>`(with recursive above (id, parent_id) as (
  select id, parent_id from place where id = entry_head.place_id union select p.id, p.parent_id from place as p join above on p.id = above.parent_id) select id from above)`

/** Entries at a place (or anywhere below it) where the party had a role on the day of the work. */
function placeOfParty(eb: ExpressionBuilder<FirmDatabase, 'entry_head'>, partyId: string): Expression<SqlBool> {
  return eb.exists(eb.selectFrom('party_role').select('party_role.id').where('party_role.party_id', '=', partyId)
    .where('party_role.place_id', 'in', PLACE_AND_ABOVE)
    .whereRef('party_role.from_day', '<=', 'entry_head.local_day')
    .where(w => w.or([w('party_role.to_day', 'is', null), w('party_role.to_day', '>=', w.ref('entry_head.local_day'))])))
}

/** May somebody with this scope see the entry as it stands? On the connection given, so also inside the ledger's transaction. */
export function mayReadEntry(raw: Raw, root: string, scope: EntryScope): boolean {
  const { sql: text, parameters } = q.selectFrom('entry_head').select('entry_head.root').where('entry_head.root', '=', root).where('entry_head.until_seq', 'is', null).where(inScope(scope)).compile()
  return raw.prepare(text).get(...parameters) !== undefined
}
