import { newId } from '#server/services/house'
import type { FirmFile, World } from '#server/services/house'

/** Days for which notices are still waiting for the officer. */
const WAITING_DAYS = 5

/**
 * The demonstration's own past: nobody was mailed in those eighteen months, so every notice but the last days' is written down as handed over,
 * with the remark "demonstration", and nothing of them waits to be sent. No service does this: it is no part of the program.
 */
export function settleOldNotices(file: FirmFile, world: World): { settled: number, waiting: number } {
  const { raw } = file
  const before = new Date(world.now().getTime() - WAITING_DAYS * 86_400_000).toISOString()
  return raw.transaction(() => {
    const old = raw.prepare<[string], { id: string, planned_at: string }>('select id, planned_at from notice where state = \'planned\' and planned_at < ?').all(before)
    const event = raw.prepare('insert into notice_event (id, notice_id, at, what, by_person, detail) values (?, ?, ?, \'handed-over\', null, \'demonstration\')')
    const unsent = raw.prepare('delete from outbox where notice_id = ?')
    const state = raw.prepare('update notice set state = \'handed-over\' where id = ?')
    for (const { id, planned_at } of old) {
      event.run(newId(world), id, planned_at)
      unsent.run(id)
      state.run(id)
    }
    const { waiting } = raw.prepare('select count(*) waiting from notice where state = \'planned\'').get() as { waiting: number }
    return { settled: old.length, waiting }
  }).immediate()
}
