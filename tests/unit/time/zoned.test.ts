import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { daysBetween, plusDays } from '#shared/time/days'
import { ClockSchema, DaySchema, InstantSchema, ZoneSchema, inZone, localDay, minutesBetween, offsetAt, plusMinutes, resolveLocal, toUtc } from '#shared/time/zoned'

const ZONES = ['America/New_York', 'America/Phoenix', 'America/St_Johns', 'Australia/Lord_Howe', 'Asia/Kathmandu', 'Europe/London', 'Pacific/Apia', 'Pacific/Kiritimati', 'UTC']
const seconds = fc.integer({ min: Date.UTC(2000, 0, 1) / 1000, max: Date.UTC(2045, 0, 1) / 1000 })
const iso = seconds.map(at => new Date(at * 1000).toISOString())
const zone = fc.constantFrom(...ZONES)
const accepts = (schema: { safeParse: (value: unknown) => { success: boolean } }, text: string) => schema.safeParse(text).success

describe('instants', () => {
  it('stay themselves in every zone', () => {
    fc.assert(fc.property(iso, zone, (at, where) => {
      const local = inZone(at, where)
      expect(accepts(InstantSchema, local)).toBe(true)
      expect(toUtc(local)).toBe(at)
      expect(local.endsWith(offsetAt(at, where)) && local.startsWith(localDay(at, where))).toBe(true)
    }))
  })

  it('are among the meanings of their own wall clock', () => {
    fc.assert(fc.property(iso, zone, (at, where) => {
      const minute = `${at.slice(0, 16)}:00.000Z`
      const local = inZone(minute, where)
      expect(Object.values(resolveLocal(local.slice(0, 10), local.slice(11, 16), where))).toContain(local)
    }))
  })

  it('move by elapsed minutes', () => {
    fc.assert(fc.property(iso, fc.integer({ min: -100_000, max: 100_000 }), zone, (at, minutes, where) => {
      expect(minutesBetween(at, plusMinutes(at, minutes, where))).toBe(minutes)
    }))
  })

  it('count the November night with its extra hour', () => {
    expect(minutesBetween('2026-10-31T20:00:00-05:00', '2026-11-01T07:00:00-06:00')).toBe(12 * 60)
    expect(minutesBetween('2026-05-04T08:10:30-05:00', '2026-05-04T08:10:00-05:00')).toBe(-0.5)
  })
})

describe('wall clocks', () => {
  it('handle a change of half an hour and a day that never was', () => {
    expect(resolveLocal('2026-04-05', '01:45', 'Australia/Lord_Howe')).toEqual({ kind: 'two', first: '2026-04-05T01:45:00+11:00', second: '2026-04-05T01:45:00+10:30' })
    expect(resolveLocal('2011-12-30', '12:00', 'Pacific/Apia')).toEqual({ kind: 'none', before: '2011-12-29T12:00:00-10:00', after: '2011-12-31T12:00:00+14:00' })
  })

  it('refuse an unknown zone and a day that does not parse', () => {
    expect(() => resolveLocal('2026-05-04', '08:10', 'America/Nowhere')).toThrow(RangeError)
    expect(() => localDay('2026-05-04T08:10:00Z', 'America/Nowhere')).toThrow(RangeError)
    expect(() => toUtc('yesterday')).toThrow(RangeError)
  })
})

describe('schemas', () => {
  it.each(['2026-05-04T08:10:00-05:00', '2026-05-04T13:10:00Z', '2026-05-04T13:10:00.123Z', '2028-02-29T00:00:00+05:45'])('take the instant %s', (text) => {
    expect(accepts(InstantSchema, text)).toBe(true)
  })

  it.each(['2026-05-04T08:10:00', '2026-05-04T08:10-05:00', '2026-02-30T08:10:00Z', '2026-05-04 08:10:00Z', '2026-05-04', '2026-05-04T24:10:00Z', '2026-05-04T08:10:00.1Z', '2026-05-04T08:10:00-05'])('refuse %s as an instant', (text) => {
    expect(accepts(InstantSchema, text)).toBe(false)
  })

  it.each([['2026-02-28', true], ['2027-02-29', false], ['05/04/2026', false], ['2026-5-4', false]])('day %s: %s', (text, ok) => {
    expect(accepts(DaySchema, text)).toBe(ok)
  })

  it.each([['00:00', true], ['23:59', true], ['24:00', false], ['8:10', false]])('clock %s: %s', (text, ok) => {
    expect(accepts(ClockSchema, text)).toBe(ok)
  })

  it.each([...ZONES.map(name => [name, true] as const), ['-05:00', false], ['America/Nowhere', false], ['', false], ['EST5EDT;x', false]] as const)('zone %s: %s', (text, ok) => {
    expect(accepts(ZoneSchema, text)).toBe(ok)
  })
})

it('days count there and back whatever the machine’s own zone', () => {
  fc.assert(fc.property(iso, fc.integer({ min: -4000, max: 4000 }), (at, count) => {
    const day = at.slice(0, 10)
    expect(daysBetween(day, plusDays(day, count))).toBe(count)
    expect(plusDays(plusDays(day, count), -count)).toBe(day)
  }))
})
