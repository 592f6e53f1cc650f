import { tz } from '@date-fns/tz'
import { addDays, addMonths, differenceInCalendarDays } from 'date-fns'

// Days are counted on a clock without changes, so that no day has 23 hours.
const calendar = { in: tz('UTC') }
const read = (day: string): Date => new Date(`${day}T00:00:00Z`)
const write = (date: Date): string => new Date(date).toISOString().slice(0, 10)

/** The calendar day `count` days later (earlier when below zero); days are YYYY-MM-DD. */
export const plusDays = (day: string, count: number): string => write(addDays(read(day), count, calendar))

/** The same day of the month `count` months later, held to the month's last day: 30 November + 3 is 28 or 29 February. */
export const plusMonths = (day: string, count: number): string => write(addMonths(read(day), count, calendar))

/** Whole days from `a` to `b`: the day itself is 0. */
export const daysBetween = (a: string, b: string): number => differenceInCalendarDays(read(b), read(a), calendar)
