import type { Raw } from '#server/database/connection'

/** Frozen once shipped: SQL as it was on its day. Names are date-prefixed and never renamed; there is no way down. */
export interface Migration { up: (raw: Raw) => void }

/** Runs what a file has not had yet, in order of name, each in one transaction. @throws when the file knows a migration that this program does not. */
export function migrate(raw: Raw, migrations: Record<string, Migration>): string[] {
  raw.exec('create table if not exists migration (name text primary key, at text not null) strict')
  const had = new Set((raw.prepare('select name from migration').all() as { name: string }[]).map(row => row.name))
  const unknown = [...had].filter(name => !(name in migrations))
  if (unknown.length > 0) throw new Error(`the file was made by a newer program: it has ${unknown.join(', ')}`)
  const due = Object.keys(migrations).sort().filter(name => !had.has(name))
  for (const name of due) {
    raw.transaction(() => {
      migrations[name]?.up(raw)
      raw.prepare('insert into migration (name, at) values (?, strftime(\'%Y-%m-%dT%H:%M:%fZ\'))').run(name)
    }).immediate()
  }
  return due
}
