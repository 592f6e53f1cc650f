import { builder, perConnection, statement } from '#server/database/statement'
import type { FirmDatabase } from '#server/database/firm/tables'

const q = builder<FirmDatabase>()

export interface RoleInBook { role: 'owner' | 'officer' | 'applicator', branch_id: string | null, zone: string | null, from_day: string, to_day: string | null }

/** Who a membership's subject is in the firm's book: a person with dated roles, or a party. */
export const subjectsIn = perConnection(raw => ({
  person: statement<{ id: string }, { name: string, from_day: string, to_day: string | null }>(raw, p => q.selectFrom('person').select(['name', 'from_day', 'to_day']).where('id', '=', p('id'))),
  roles: statement<{ id: string }, RoleInBook>(raw, p => q.selectFrom('person_role')
    .leftJoin('person_role_end', 'person_role_end.role_id', 'person_role.id').leftJoin('branch', 'branch.id', 'person_role.branch_id')
    .select(['person_role.role', 'person_role.branch_id', 'branch.zone', 'person_role.from_day', 'person_role_end.to_day']).where('person_id', '=', p('id')).orderBy('person_role.role')),
  party: statement<{ id: string }, { name: string }>(raw, p => q.selectFrom('party').select('name').where('id', '=', p('id'))),
  licences: statement<{ id: string, day: string }, { number: string }>(raw, p => q.selectFrom('licence').select('number').where('person_id', '=', p('id')).where('issued', '<=', p('day')).where('expires', '>=', p('day')).orderBy('expires', 'desc')),
  zone: statement<object, { zone: string }>(raw, () => q.selectFrom('branch').select('zone').orderBy('id').limit(1)),
}))
