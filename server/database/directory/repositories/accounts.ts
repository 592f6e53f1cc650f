import { builder, perConnection, statement } from '#server/database/statement'
import type { AccountRow, DirectoryDatabase, MembershipRow, SignInEventRow } from '#server/database/directory/tables'

const q = builder<DirectoryDatabase>()

/** A membership with the name of its firm. */
export type HeldMembership = MembershipRow & { slug: string, firm_name: string }

const memberships = () => q.selectFrom('membership').innerJoin('firm', 'firm.id', 'membership.firm_id')
  .selectAll('membership').select(['firm.slug', 'firm.name as firm_name']).where('membership.ended_at', 'is', null)

/** Accounts, their memberships, and what is remembered of comings and goings. E-mail addresses are stored in lower case. */
export const accountsIn = perConnection(raw => ({
  byEmail: statement<{ email: string }, AccountRow>(raw, p => q.selectFrom('account').selectAll().where('email', '=', p('email'))),
  byId: statement<{ id: string }, AccountRow>(raw, p => q.selectFrom('account').selectAll().where('id', '=', p('id'))),
  all: statement<object, AccountRow>(raw, () => q.selectFrom('account').selectAll().where('disabled_at', 'is', null).orderBy('email')),
  insert: statement<AccountRow>(raw, p => q.insertInto('account').values({ id: p('id'), email: p('email'), name: p('name'), password: p('password'), language: p('language'), created_at: p('created_at'), disabled_at: p('disabled_at') })),
  setPassword: statement<{ id: string, password: string }>(raw, p => q.updateTable('account').set({ password: p('password') }).where('id', '=', p('id'))),
  setName: statement<{ id: string, name: string }>(raw, p => q.updateTable('account').set({ name: p('name') }).where('id', '=', p('id'))),

  membership: statement<{ id: string }, HeldMembership>(raw, p => memberships().where('membership.id', '=', p('id'))),
  membershipsOf: statement<{ account_id: string }, HeldMembership>(raw, p => memberships().where('account_id', '=', p('account_id')).orderBy('firm.name').orderBy('membership.created_at')),
  insertMembership: statement<Omit<MembershipRow, 'ended_at'>>(raw, p => q.insertInto('membership')
    .values({ id: p('id'), account_id: p('account_id'), firm_id: p('firm_id'), subject_kind: p('subject_kind'), subject_id: p('subject_id'), created_at: p('created_at'), ended_at: null })
    .onConflict(c => c.columns(['account_id', 'firm_id', 'subject_kind', 'subject_id']).doUpdateSet({ ended_at: null }))),

  insertEvent: statement<SignInEventRow>(raw, p => q.insertInto('sign_in_event').values({ id: p('id'), at: p('at'), what: p('what'), account_id: p('account_id'), address: p('address'), device: p('device') })),
}))
