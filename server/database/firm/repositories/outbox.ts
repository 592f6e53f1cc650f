import { perConnection } from '#server/database/statement'
import type { OutboxRow } from '#server/database/firm/tables'

type At = { now: string }

/** The queue of notices by mail. Every change of a row is one statement; a claim carries a lease, so that a sender that died blocks nothing. */
export const outboxIn = perConnection((raw) => {
  const claimDue = raw.prepare<[At & { until: string }], OutboxRow>(`update outbox set state = 'sending', lease_until = @until, attempts = attempts + 1
    where id = (select id from outbox where state = 'due' and next_at <= @now order by next_at limit 1) returning *`)
  const claimLost = raw.prepare<[At & { until: string }], OutboxRow>(`update outbox set lease_until = @until, attempts = attempts + 1
    where id = (select id from outbox where state = 'sending' and lease_until < @now order by lease_until limit 1) returning *`)
  const compose = raw.prepare<[{ id: string, raw: Uint8Array, hash: string }]>('update outbox set raw = @raw, content_hash = @hash where id = @id')
  const sent = raw.prepare<[{ id: string, at: string }]>('update outbox set state = \'sent\', sent_at = @at, lease_until = null, last_error = null where id = @id')
  const again = raw.prepare<[{ id: string, next: string, error: string }]>('update outbox set state = \'due\', next_at = @next, lease_until = null, last_error = @error where id = @id')
  const failed = raw.prepare<[{ id: string, error: string }]>('update outbox set state = \'failed\', lease_until = null, last_error = @error where id = @id')
  const release = raw.prepare<[{ notice: string, now: string }]>('update outbox set state = \'due\', next_at = @now where notice_id = @notice and state = \'held\'')
  const retry = raw.prepare<[{ notice: string, now: string }]>('update outbox set state = \'due\', next_at = @now, attempts = 0 where notice_id = @notice and state = \'failed\'')
  const next = raw.prepare<[], { at: string | null }>('select min(case state when \'due\' then next_at else lease_until end) as at from outbox where state in (\'due\', \'sending\')')
  const ofNotice = raw.prepare<[string], OutboxRow>('select * from outbox where notice_id = ?')
  return {
    claimDue: (given: At & { until: string }) => claimDue.get(given),
    /** A row whose sender's lease ran out: it may have been sent. */
    claimLost: (given: At & { until: string }) => claimLost.get(given),
    compose: (id: string, bytes: Uint8Array, hash: string) => void compose.run({ id, raw: bytes, hash }),
    sent: (id: string, at: string) => void sent.run({ id, at }),
    again: (id: string, nextAt: string, error: string) => void again.run({ id, next: nextAt, error }),
    failed: (id: string, error: string) => void failed.run({ id, error }),
    release: (notice: string, now: string) => release.run({ notice, now }).changes === 1,
    retry: (notice: string, now: string) => retry.run({ notice, now }).changes === 1,
    /** When there is next something to do; null when nothing waits. */
    nextAt: () => next.get()?.at ?? null,
    ofNotice: (notice: string) => ofNotice.get(notice),
  }
})
