import { builder, perConnection, statement } from '#server/database/statement'
import type { AccountMailRow, DirectoryDatabase } from '#server/database/directory/tables'

const q = builder<DirectoryDatabase>()

/** Mail that belongs to an account. Its text holds a secret link, so it is blanked as soon as it is sent or given up. */
export const accountMailsIn = perConnection(raw => ({
  insert: statement<AccountMailRow>(raw, p => q.insertInto('account_mail').values({ id: p('id'), message_id: p('message_id'), to_address: p('to_address'), subject: p('subject'), text: p('text'), html: p('html'), state: p('state'), attempts: p('attempts'), next_at: p('next_at'), lease_until: p('lease_until'), last_error: p('last_error'), sent_at: p('sent_at') })),
  claim: statement<{ now: string, until: string }, AccountMailRow>(raw, p => q.updateTable('account_mail')
    .set(eb => ({ state: 'sending', lease_until: p('until'), attempts: eb('attempts', '+', 1) }))
    .where('id', '=', eb => eb.selectFrom('account_mail').select('id')
      .where(w => w.or([w.and([w('state', '=', 'due'), w('next_at', '<=', p('now'))]), w.and([w('state', '=', 'sending'), w('lease_until', '<', p('now'))])]))
      .orderBy('next_at').limit(1))
    .returningAll()),
  sent: statement<{ id: string, at: string }>(raw, p => q.updateTable('account_mail').set({ state: 'sent', sent_at: p('at'), lease_until: null, last_error: null, text: '', html: '' }).where('id', '=', p('id'))),
  again: statement<{ id: string, next: string, error: string }>(raw, p => q.updateTable('account_mail').set({ state: 'due', next_at: p('next'), lease_until: null, last_error: p('error') }).where('id', '=', p('id'))),
  givenUp: statement<{ id: string, error: string }>(raw, p => q.updateTable('account_mail').set({ state: 'failed', lease_until: null, last_error: p('error'), text: '', html: '' }).where('id', '=', p('id'))),
}))
