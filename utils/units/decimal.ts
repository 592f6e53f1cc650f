import { z } from 'zod'
import { QuantityError } from '#shared/units/errors'

/** An exact fraction: `d` is above zero and the pair is reduced, so equal values have equal parts. */
export type Rational = { readonly n: bigint; readonly d: bigint }

/** The longest text of one value: every base unit fits a signed 64-bit integer well below it. */
export const DECIMAL_MAX_LENGTH = 24
const DECIMAL = /^-?\d+(\.\d+)?$/

/** Plain decimal text as entered, digits kept: "1.20" stays "1.20". No exponent, plus sign or white space. */
export const DecimalSchema = z.string().max(DECIMAL_MAX_LENGTH).regex(DECIMAL)

const abs = (n: bigint): bigint => (n < 0n ? -n : n)
const gcd = (a: bigint, b: bigint): bigint => {
  let [x, y] = [a, b]
  while (y !== 0n) [x, y] = [y, x % y]
  return x
}

/** `n / d`, reduced. Throws `QuantityError` division-by-zero. */
export function rational(n: bigint, d: bigint = 1n): Rational {
  if (d === 0n) throw new QuantityError('division-by-zero')
  const divisor = gcd(abs(n), abs(d)) * (d < 0n ? -1n : 1n)
  return { n: n / divisor, d: d / divisor }
}

/** The exact value of plain decimal text. Throws `QuantityError` not-a-decimal. */
export function parseDecimal(text: string): Rational {
  if (!DECIMAL.test(text)) throw new QuantityError('not-a-decimal', { text })
  return rational(BigInt(text.replace('.', '')), 10n ** BigInt(decimalsOf(text)))
}

/** How many digits stand after the point of plain decimal text. */
export function decimalsOf(text: string): number {
  const point = text.indexOf('.')
  return point < 0 ? 0 : text.length - point - 1
}

export const add = (a: Rational, b: Rational): Rational => rational(a.n * b.d + b.n * a.d, a.d * b.d)
export const sub = (a: Rational, b: Rational): Rational => rational(a.n * b.d - b.n * a.d, a.d * b.d)
export const mul = (a: Rational, b: Rational): Rational => rational(a.n * b.n, a.d * b.d)
/** `a / b`. Throws `QuantityError` division-by-zero. */
export const div = (a: Rational, b: Rational): Rational => rational(a.n * b.d, a.d * b.n)

export function compareRational(a: Rational, b: Rational): -1 | 0 | 1 {
  const difference = a.n * b.d - b.n * a.d
  return difference < 0n ? -1 : difference > 0n ? 1 : 0
}

/** The nearest integer, a tie going to the even one, so that long sums do not drift upwards. */
export function roundToInteger(r: Rational): bigint {
  const magnitude = abs(r.n)
  const whole = magnitude / r.d
  const twice = (magnitude % r.d) * 2n
  const up = twice > r.d || (twice === r.d && whole % 2n === 1n)
  const rounded = up ? whole + 1n : whole
  return r.n < 0n ? -rounded : rounded
}

/** Decimal text with exactly `digits` places, rounded half to even, trailing zeros kept. Never "-0". */
export function toDecimal(r: Rational, digits: number): string {
  const scaled = roundToInteger(mul(r, rational(10n ** BigInt(digits))))
  const figures = abs(scaled).toString().padStart(digits + 1, '0')
  const sign = scaled < 0n ? '-' : ''
  if (digits === 0) return sign + figures
  return `${sign}${figures.slice(0, -digits)}.${figures.slice(-digits)}`
}

/** Decimal text of `count` significant digits, rounded half to even: 12345 at 2 is "12000", 1/3 at 4 is "0.3333". */
export function toSignificant(r: Rational, count: number): string {
  if (r.n === 0n) return '0'
  const places = count - 1 - exponentOf(r)
  const rounded = roundAt(r, places)
  const settled = exponentOf(rounded) > exponentOf(r) ? places - 1 : places
  return toDecimal(rounded, Math.max(0, settled))
}

/**
 * The house's form of a computed figure: exact when it ends within four decimals, else four significant digits,
 * and never coarser than whole units. Products are measured to about three figures, so a fourth hides nothing.
 */
export function toReadable(r: Rational): string {
  for (let digits = 0; digits <= 4; digits++) {
    if ((10n ** BigInt(digits)) % r.d === 0n) return toDecimal(r, digits)
  }
  return exponentOf(r) >= 3 ? toDecimal(r, 0) : toSignificant(r, 4)
}

function roundAt(r: Rational, places: number): Rational {
  const scale = 10n ** BigInt(Math.abs(places))
  return places >= 0
    ? rational(roundToInteger(mul(r, rational(scale))), scale)
    : rational(roundToInteger(div(r, rational(scale))) * scale)
}

/** The `e` for which 10^e <= |r| < 10^(e+1); `r` is not zero. */
function exponentOf(r: Rational): number {
  const magnitude = abs(r.n)
  const guess = magnitude.toString().length - r.d.toString().length
  const reaches = guess >= 0 ? magnitude >= r.d * 10n ** BigInt(guess) : magnitude * 10n ** BigInt(-guess) >= r.d
  return reaches ? guess : guess - 1
}
