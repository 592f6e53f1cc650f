import { builder, perConnection, statement } from '#server/database/statement'
import type { DirectoryDatabase } from '#server/database/directory/tables'

const q = builder<DirectoryDatabase>()

export const settingsIn = perConnection(raw => ({
  get: statement<{ name: string }, { value: string }>(raw, p => q.selectFrom('setting').select('value').where('name', '=', p('name'))),
  set: statement<{ name: string, value: string }>(raw, p => q.insertInto('setting').values({ name: p('name'), value: p('value') }).onConflict(c => c.column('name').doUpdateSet({ value: p('value') }))),
  firms: statement<object, { slug: string }>(raw, () => q.selectFrom('firm').select('slug').orderBy('slug')),
}))
