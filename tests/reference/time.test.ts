import { describe, expect, it } from 'vitest'
import { plusDays, plusMonths } from '#shared/time/days'
import { localDay, offsetAt, plusMinutes, resolveLocal, toUtc } from '#shared/time/zoned'

// Offsets: IANA tz 2025c. Worked by hand from the published clock changes; intervals run on elapsed time (40 CFR 170 counts from the end).
describe('intervals in hours over clock changes', () => {
  it.each([
    ['C6-01', 'America/New_York', '2026-03-07T20:00:00-05:00', 12, '2026-03-08T09:00:00-04:00'],
    ['C6-02', 'America/Chicago', '2026-10-31T20:00:00-05:00', 12, '2026-11-01T07:00:00-06:00'],
    ['C6-03', 'America/New_York', '2026-11-01T01:30:00-04:00', 4, '2026-11-01T04:30:00-05:00'],
    ['C6-04', 'Europe/London', '2026-10-24T18:00:00+01:00', 24, '2026-10-25T17:00:00+00:00'],
    ['C6-05', 'America/Chicago', '2026-06-10T14:20:00-05:00', 4, '2026-06-10T18:20:00-05:00'],
    ['C6-06', 'America/Chicago', '2028-02-28T13:00:00-06:00', 24, '2028-02-29T13:00:00-06:00'],
    ['C6-07', 'America/New_York', '2026-12-30T23:30:00-05:00', 24, '2026-12-31T23:30:00-05:00'],
    ['C6-21', 'America/Phoenix', '2026-03-07T14:15:00-07:00', 24, '2026-03-08T14:15:00-07:00'],
  ])('%s: %s, %s + %i h', (_id, zone, end, hours, until) => {
    expect(plusMinutes(end, hours * 60, zone)).toBe(until)
  })
})

describe('readings of a wall clock', () => {
  it.each([
    ['C10-06', '2026-03-08', '02:30', 'America/Denver', { kind: 'none', before: '2026-03-08T01:30:00-07:00', after: '2026-03-08T03:30:00-06:00' }],
    ['C10-07', '2026-11-01', '01:30', 'America/New_York', { kind: 'two', first: '2026-11-01T01:30:00-04:00', second: '2026-11-01T01:30:00-05:00' }],
    ['C10-08', '2026-03-29', '01:30', 'Europe/London', { kind: 'none', before: '2026-03-29T00:30:00+00:00', after: '2026-03-29T02:30:00+01:00' }],
    ['plain', '2026-05-04', '08:10', 'America/Chicago', { kind: 'one', iso: '2026-05-04T08:10:00-05:00' }],
  ])('%s: %s %s %s', (_id, day, clock, zone, reading) => {
    expect(resolveLocal(day, clock, zone)).toEqual(reading)
  })

  it('C10-07: the two readings are an hour apart in UTC', () => {
    const reading = resolveLocal('2026-11-01', '01:30', 'America/New_York')
    expect(reading.kind === 'two' && [toUtc(reading.first), toUtc(reading.second)]).toEqual(['2026-11-01T05:30:00.000Z', '2026-11-01T06:30:00.000Z'])
  })

  it('C10-09 (public copy of the IANA data): Phoenix keeps -07:00 all year', () => {
    for (let month = 1; month <= 12; month++) expect(offsetAt(`2026-${String(month).padStart(2, '0')}-15T12:00:00Z`, 'America/Phoenix')).toBe('-07:00')
  })

  it('C10-05: the day in Sydney is not the day in UTC', () => {
    expect(localDay('2026-12-20T18:40:38Z', 'Australia/Sydney')).toBe('2026-12-21')
  })
})

describe('intervals in days and months', () => {
  it.each([
    ['C6-15', '2026-05-01', 7, '2026-05-08'], ['C6-16', '2028-02-25', 7, '2028-03-03'], ['C6-16', '2027-02-25', 7, '2027-03-04'],
    ['C6-17', '2026-05-31', 90, '2026-08-29'], ['C6-18', '2025-11-30', 90, '2026-02-28'], ['C6-19', '2026-08-20', 14, '2026-09-03'], ['C6-22', '2026-12-28', 21, '2027-01-18'],
  ])('%s: %s + %i days', (_id, day, count, due) => {
    expect(plusDays(day, count)).toBe(due)
  })

  it.each([['C6-17', '2026-05-31', 3, '2026-08-31'], ['C6-18', '2025-11-30', 3, '2026-02-28'], ['leap year', '2027-11-30', 3, '2028-02-29']])('%s: %s + %i months', (_id, day, count, due) => {
    expect(plusMonths(day, count)).toBe(due)
  })
})
