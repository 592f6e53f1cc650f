import { builder, perConnection, statement } from '#server/database/statement'
import type { DirectoryDatabase, LinkRow } from '#server/database/directory/tables'

const q = builder<DirectoryDatabase>()

/** Invitation and reset links by the SHA-256 of their secret. */
export const linksIn = perConnection(raw => ({
  open: statement<{ hash: Uint8Array, at: string }, LinkRow>(raw, p => q.selectFrom('link').selectAll().where('hash', '=', p('hash')).where('used_at', 'is', null).where('ends_at', '>', p('at'))),
  insert: statement<LinkRow>(raw, p => q.insertInto('link').values({ hash: p('hash'), kind: p('kind'), account_id: p('account_id'), created_at: p('created_at'), ends_at: p('ends_at'), used_at: p('used_at') })),
  /** One use closes every open link of the account: an older mail is then worth nothing. */
  close: statement<{ account_id: string, at: string }>(raw, p => q.updateTable('link').set({ used_at: p('at') }).where('account_id', '=', p('account_id')).where('used_at', 'is', null)),
}))
