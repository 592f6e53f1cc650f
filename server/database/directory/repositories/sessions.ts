import { builder, perConnection, statement } from '#server/database/statement'
import type { DirectoryDatabase, SessionRow } from '#server/database/directory/tables'

const q = builder<DirectoryDatabase>()
const open = () => q.selectFrom('session').selectAll().where('ended_at', 'is', null)

/** Sessions by the SHA-256 of their secret. Whether one is still good (idle, absolute end) is the service's to say. */
export const sessionsIn = perConnection(raw => ({
  byHash: statement<{ hash: Uint8Array }, SessionRow>(raw, p => open().where('hash', '=', p('hash'))),
  ofAccount: statement<{ account_id: string }, SessionRow>(raw, p => open().where('account_id', '=', p('account_id')).orderBy('seen_at', 'desc')),
  lastMembership: statement<{ account_id: string }, { membership_id: string | null }>(raw, p => q.selectFrom('session').select('membership_id').where('account_id', '=', p('account_id')).where('membership_id', 'is not', null).orderBy('created_at', 'desc').limit(1)),
  insert: statement<SessionRow>(raw, p => q.insertInto('session').values({ hash: p('hash'), kind: p('kind'), account_id: p('account_id'), membership_id: p('membership_id'), firm_id: p('firm_id'), pass_id: p('pass_id'), device: p('device'), created_at: p('created_at'), seen_at: p('seen_at'), ends_at: p('ends_at'), ended_at: p('ended_at') })),
  touch: statement<{ hash: Uint8Array, at: string }>(raw, p => q.updateTable('session').set({ seen_at: p('at') }).where('hash', '=', p('hash'))),
  setMembership: statement<{ hash: Uint8Array, membership_id: string }>(raw, p => q.updateTable('session').set({ membership_id: p('membership_id') }).where('hash', '=', p('hash'))),
  end: statement<{ hash: Uint8Array, account_id: string, at: string }>(raw, p => q.updateTable('session').set({ ended_at: p('at') }).where('hash', '=', p('hash')).where('account_id', '=', p('account_id')).where('ended_at', 'is', null)),
  endAll: statement<{ account_id: string, at: string, but: Uint8Array }>(raw, p => q.updateTable('session').set({ ended_at: p('at') }).where('account_id', '=', p('account_id')).where('hash', '!=', p('but')).where('ended_at', 'is', null)),
}))
