import { TZDate, tzOffset } from '@date-fns/tz'
import { addMinutes } from 'date-fns'
import { z } from 'zod'

const MINUTE = 60_000
const DAY = 24 * 60 * MINUTE
const ZONE = /^(UTC|[A-Za-z]+(\/[A-Za-z0-9_+-]+){1,2})$/

/** An instant with its offset and seconds, `2026-05-04T08:10:00-05:00`; milliseconds and `Z` pass too. */
export const InstantSchema = z.iso.datetime({ offset: true }).regex(/T\d{2}:\d{2}:\d{2}(\.\d{3})?(Z|[+-]\d{2}:\d{2})$/)
/** A calendar day that exists, `2026-05-04`. */
export const DaySchema = z.iso.date()
/** A wall-clock time, `08:10`. */
export const ClockSchema = z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/)
/** An IANA zone that this machine's data knows, `America/Chicago`. A bare offset is no zone: it does not know when clocks change. */
export const ZoneSchema = z.string().max(40).refine(zone => ZONE.test(zone) && !Number.isNaN(tzOffset(zone, new Date(0))))

/**
 * What a wall-clock reading may mean. In autumn one hour comes twice; in spring one never comes, and `before` and `after` are
 * the same reading moved out of the gap to either side (02:30 to 01:30 and 03:30). All are instants with their offset.
 */
export type LocalReading =
  | { kind: 'one'; iso: string }
  | { kind: 'two'; first: string; second: string }
  | { kind: 'none'; before: string; after: string }

/** The same instant in UTC with milliseconds. Throws `RangeError` for text that is no instant. */
export const toUtc = (iso: string): string => instant(iso).toISOString()

/** The same instant written with the zone's offset: `2026-05-04T08:10:00-05:00` (whole seconds; a fraction is dropped). */
export const inZone = (iso: string, zone: string): string => write(instant(iso), zone)

/** The calendar day of the instant in that zone. Throws `RangeError` for an unknown zone. */
export const localDay = (iso: string, zone: string): string => inZone(iso, zone).slice(0, 10)

/** The offset in force at the instant, `-05:00`. */
export const offsetAt = (iso: string, zone: string): string => inZone(iso, zone).slice(-6)

/** Elapsed minutes from `a` to `b`, below zero when `b` is earlier. Never wall-clock: a night in November has 60 more. */
export const minutesBetween = (a: string, b: string): number => (instant(b).getTime() - instant(a).getTime()) / MINUTE

/** The instant so many elapsed minutes later, with the offset then in force. Intervals in hours run on elapsed time. */
export const plusMinutes = (iso: string, minutes: number, zone: string): string => write(addMinutes(instant(iso), minutes), zone)

/** What a wall clock in `zone` meant at `clock` (HH:mm) on `day` (YYYY-MM-DD). Throws `RangeError` for an unknown zone. */
export function resolveLocal(day: string, clock: string, zone: string): LocalReading {
  const wall = instant(`${day}T${clock}:00Z`).getTime()
  // No zone is further than 14 hours from UTC, so a day on either side lies beyond any change that this reading could fall in.
  const offsets = [offsetMinutes(wall - DAY, zone), offsetMinutes(wall + DAY, zone)]
  const candidates = [...new Set(offsets)].map(offset => wall - offset * MINUTE).sort((a, b) => a - b)
  const meant = candidates.filter(at => at + offsetMinutes(at, zone) * MINUTE === wall)
  const [first, second] = (meant.length > 0 ? meant : candidates).map(at => write(new Date(at), zone))
  if (first !== undefined && second !== undefined) return meant.length > 0 ? { kind: 'two', first, second } : { kind: 'none', before: first, after: second }
  if (first === undefined) throw new RangeError(`no reading of ${day} ${clock} in ${zone}`)
  return { kind: 'one', iso: first }
}

function instant(iso: string): Date {
  const date = new Date(iso)
  if (Number.isNaN(date.getTime())) throw new RangeError('not an instant')
  return date
}

function offsetMinutes(ms: number, zone: string): number {
  const offset = tzOffset(zone, new Date(ms))
  if (Number.isNaN(offset)) throw new RangeError(`unknown zone ${zone}`)
  return offset
}

function write(date: Date, zone: string): string {
  offsetMinutes(date.getTime(), zone)
  return new TZDate(date, zone).toISOString().replace(/\.\d{3}/, '')
}
