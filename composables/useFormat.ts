/** Fewer than the 20 fraction digits that every browser's Intl takes; a longer decimal is shown as it stands. */
const MOST_PLACES = 20

const DAY: Intl.DateTimeFormatOptions = { year: 'numeric', month: 'short', day: 'numeric' }
const DAY_LONG: Intl.DateTimeFormatOptions = { weekday: 'long', year: 'numeric', month: 'long', day: 'numeric' }
const DAY_IN_YEAR: Intl.DateTimeFormatOptions = { month: 'short', day: 'numeric' }
const TIME: Intl.DateTimeFormatOptions = { hour: 'numeric', minute: '2-digit' }

/** As the country writes: numbers with every digit they came with, days and times in the place's own zone. */
export function useFormat() {
  const { localeProperties } = useI18n()
  const unitWord = useUnitWords()
  const language = computed(() => localeProperties.value.language ?? 'en-US')

  const marks = computed(() => {
    const parts = new Intl.NumberFormat(language.value).formatToParts(1234567.8)
    const of = (type: string, otherwise: string) => parts.find(part => part.type === type)?.value ?? otherwise
    return { group: of('group', ','), decimal: of('decimal', '.') }
  })

  /** A decimal string with the country's decimal mark and no thousands marks: what stands in an input. */
  const localDecimal = (value: string) => value.replace('.', marks.value.decimal)

  function decimal(value: string | number, more: Intl.NumberFormatOptions = {}): string {
    const text = String(value)
    const places = text.split('.')[1]?.length ?? 0
    if (!/^-?\d+(\.\d+)?$/.test(text) || places > MOST_PLACES) return text
    // handed over as a string: through a binary float, long figures would lose digits
    return new Intl.NumberFormat(language.value, { ...more, minimumFractionDigits: places, maximumFractionDigits: places })
      .format(text as Intl.StringNumericLiteral)
  }

  /** `1116` → `1,116`, `1.20` → `1.20`. */
  const number = (value: string | number) => decimal(value)
  /** Percent as written on the label, not a fraction: `9.7` → `9.7%`. */
  const percent = (value: string | number) => decimal(value, { style: 'unit', unit: 'percent' })

  /** `{ value: '0.90', unit: 'fl_oz' }` → `0.90 fl oz`, unbroken between figure and unit. */
  function quantity(of: { value: string, unit: string }): string {
    if (of.unit === 'pct') return percent(of.value)
    return `${number(of.value)}\u00A0${unitWord(of.unit, of.value === '1' ? 1 : 2)}`
  }

  function moment(at: string | Date, options: Intl.DateTimeFormatOptions): string {
    const parts = new Intl.DateTimeFormat(language.value, options).formatToParts(typeof at === 'string' ? new Date(at) : at)
    return parts.map((part, i) => {
      // Node and browsers differ in the space before am and pm (U+202F or U+0020): one of our own, or the page would not hydrate
      if (part.type === 'literal' && parts[i + 1]?.type === 'dayPeriod') return '\u00A0'
      return part.type === 'dayPeriod' && language.value.startsWith('en') ? part.value.toLowerCase() : part.value
    }).join('')
  }
  /** A calendar day `YYYY-MM-DD` has no zone of its own, so it is read and written in the same one. */
  const ofDay = (day: string, options: Intl.DateTimeFormatOptions) => moment(`${day}T12:00:00Z`, { ...options, timeZone: 'UTC' })

  return {
    language, marks, unitWord, localDecimal, number, percent, quantity,
    /** `2026-05-14` → `May 14, 2026` */
    day: (day: string) => ofDay(day, DAY),
    /** `2026-05-14` → `Thursday, May 14, 2026` */
    dayLong: (day: string) => ofDay(day, DAY_LONG),
    /** `2026-05-14` → `May 14`, where the year stands elsewhere */
    dayInYear: (day: string) => ofDay(day, DAY_IN_YEAR),
    /** An instant on the place's clock: `9:12 am` */
    time: (at: string | Date, timeZone: string) => moment(at, { ...TIME, timeZone }),
    /** `May 14, 2026, 9:12 am` */
    dateTime: (at: string | Date, timeZone: string) => moment(at, { ...DAY, ...TIME, timeZone }),
    /** `May 14, 9:12 am`, where the year stands elsewhere */
    dateTimeInYear: (at: string | Date, timeZone: string) => moment(at, { ...DAY_IN_YEAR, ...TIME, timeZone }),
    /** The day of an instant on the place's calendar: `May 14, 2026` */
    date: (at: string | Date, timeZone: string) => moment(at, { ...DAY, timeZone }),
  }
}
