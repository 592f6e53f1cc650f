import { add, decimalsOf, parseDecimal, rational, sub, toDecimal } from '#shared/units/decimal'

/** What a person's keys mean as a decimal number. */
export type DecimalReading =
  | { kind: 'blank' }
  | { kind: 'value', value: string }
  /** `1,116` may be a thousand or one and a bit: a factor of a thousand is asked, never guessed. */
  | { kind: 'ambiguous', thousands: string, decimal: string }
  | { kind: 'unreadable' }

/** Plain digits with a leading zero and no trailing point; every digit typed after the mark is kept. */
function plain(whole: string, fraction: string): string {
  const digits = whole.replace(/^0+(?=\d)/, '') || '0'
  return fraction ? `${digits}.${fraction}` : digits
}

/**
 * Reads a number as typed, comma or point, without losing a digit: `1,20` and `1.20` are both `1.20`.
 * `group` is the language's own thousands mark, the only one that may be meant as such when it stands alone.
 */
export function readDecimal(typed: string, group: string): DecimalReading {
  const text = typed.replace(/[\s\u00A0\u202F']/g, '')
  if (text === '') return { kind: 'blank' }
  // a temperature may be below zero; keyboards write the minus in two ways
  if (/^[-\u2212]/.test(text)) return negated(readDecimal(text.slice(1), group))
  if (!/^(?=.*\d)[\d.,]+$/.test(text)) return { kind: 'unreadable' }
  const marks = text.match(/[.,]/g) ?? []
  const [only] = marks
  if (only === undefined) return { kind: 'value', value: plain(text, '') }
  if (marks.length === 1) {
    const [whole = '', fraction = ''] = text.split(only)
    if (only === group && /^[1-9]\d{0,2}$/.test(whole) && fraction.length === 3)
      return { kind: 'ambiguous', thousands: whole + fraction, decimal: plain(whole, fraction) }
    return { kind: 'value', value: plain(whole, fraction) }
  }
  return readGrouped(text, marks)
}

function negated(reading: DecimalReading): DecimalReading {
  if (reading.kind === 'value' && !reading.value.startsWith('-')) return { kind: 'value', value: `-${reading.value}` }
  if (reading.kind === 'ambiguous') return { kind: 'ambiguous', thousands: `-${reading.thousands}`, decimal: `-${reading.decimal}` }
  return { kind: 'unreadable' }
}

/** Several marks: all but a last, different one must part groups of three. */
function readGrouped(text: string, marks: string[]): DecimalReading {
  const grouping = marks[0] ?? ''
  const last = marks[marks.length - 1] ?? ''
  const at = last === grouping ? text.length : text.lastIndexOf(last)
  const groups = text.slice(0, at).split(grouping)
  const wellFormed = groups.every((part, i) => i === 0 ? /^\d{1,3}$/.test(part) : /^\d{3}$/.test(part))
  return wellFormed ? { kind: 'value', value: plain(groups.join(''), text.slice(at + 1)) } : { kind: 'unreadable' }
}

/** Adds a step to a decimal string, exactly, keeping the longer fraction; what is counted down ends at zero. */
export function stepDecimal(value: string, step: string, sign: 1 | -1): string {
  const by = sign === 1 ? add : sub
  const next = by(parseDecimal(value), parseDecimal(step))
  return toDecimal(next.n < 0n ? rational(0n) : next, Math.max(decimalsOf(value), decimalsOf(step)))
}
