import type { Words } from '#shared/reports/words'
import { unitWords } from '#shared/reports/unit-words'

/** A decimal, figure or moment as the country writes it, for paper and mail; the same rules as on screen. */
export interface Writing {
  words: Words
  /** `en-US` */
  language: string
  number: (value: string) => string
  percent: (value: string) => string
  /** A quantity or a rate: `0.90 fl oz`, unbroken between figure and unit. */
  figure: (of: { value: string, unit: string }) => string
  /** `2026-05-14` → `May 14, 2026` */
  day: (day: string) => string
  /** `2026-05-14` → `Thursday, May 14, 2026` */
  dayLong: (day: string) => string
  /** An instant on the place's clock: `9:12 am` */
  time: (at: string, zone: string) => string
  /** `9:12 am EDT` */
  timeZoned: (at: string, zone: string) => string
  dateTime: (at: string, zone: string) => string
  /** `ants and earwigs`, `a, b, and c` as the language joins them. */
  list: (items: readonly string[]) => string
}

// Fewer than what every engine takes; a longer decimal is shown as it stands.
const MOST_PLACES = 20
const DAY: Intl.DateTimeFormatOptions = { year: 'numeric', month: 'short', day: 'numeric' }
const DAY_LONG: Intl.DateTimeFormatOptions = { weekday: 'long', year: 'numeric', month: 'long', day: 'numeric' }
const TIME: Intl.DateTimeFormatOptions = { hour: 'numeric', minute: '2-digit' }

const formatters = new Map<string, Intl.DateTimeFormat>()
/** Making a formatter costs a hundred times what using it does; there are few of them, one a language, form and zone. */
function formatter(language: string, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
  const key = `${language} ${JSON.stringify(options)}`
  const known = formatters.get(key) ?? new Intl.DateTimeFormat(language, options)
  formatters.set(key, known)
  return known
}

export function writing(words: Words, language = 'en-US'): Writing {
  const unit = unitWords(words)

  function decimal(value: string, more: Intl.NumberFormatOptions = {}): string {
    const places = value.split('.')[1]?.length ?? 0
    if (!/^-?\d+(\.\d+)?$/.test(value) || places > MOST_PLACES) return value
    // as a string: through a binary float, long figures would lose digits
    return new Intl.NumberFormat(language, { ...more, minimumFractionDigits: places, maximumFractionDigits: places }).format(value as Intl.StringNumericLiteral)
  }
  const percent = (value: string) => decimal(value, { style: 'unit', unit: 'percent' })

  function moment(at: string, options: Intl.DateTimeFormatOptions): string {
    const parts = formatter(language, options).formatToParts(new Date(at))
    return parts.map((part, i) => {
      // engines differ in the space before am and pm (U+202F or U+0020)
      if (part.type === 'literal' && parts[i + 1]?.type === 'dayPeriod') return '\u00A0'
      return part.type === 'dayPeriod' && language.startsWith('en') ? part.value.toLowerCase() : part.value
    }).join('')
  }
  /** A calendar day has no zone of its own, so it is read and written in the same one. */
  const ofDay = (day: string, options: Intl.DateTimeFormatOptions) => moment(`${day}T12:00:00Z`, { ...options, timeZone: 'UTC' })

  return {
    words, language, number: decimal, percent,
    figure: of => of.unit === 'pct' ? percent(of.value) : `${decimal(of.value)}\u00A0${unit(of.unit, of.value === '1' ? 1 : 2)}`,
    day: day => ofDay(day, DAY),
    dayLong: day => ofDay(day, DAY_LONG),
    time: (at, timeZone) => moment(at, { ...TIME, timeZone }),
    timeZoned: (at, timeZone) => moment(at, { ...TIME, timeZone, timeZoneName: 'short' }),
    dateTime: (at, timeZone) => moment(at, { ...DAY, ...TIME, timeZone, timeZoneName: 'short' }),
    list: items => new Intl.ListFormat(language, { style: 'long', type: 'conjunction' }).format(items),
  }
}
