import { UNIT_CODES } from '#shared/units/units'
import type { UnitCode } from '#shared/units/units'

export const UNIT_REFUSALS = ['ambiguous-ounce', 'imperial-measure', 'unknown-unit'] as const
export type UnitRefusal = (typeof UNIT_REFUSALS)[number]
export type ParsedUnit = { ok: true; unit: UnitCode } | { ok: false; reason: UnitRefusal }

// Written forms beside the codes: common practice, no source. A lone "c" (cup or Celsius), "t" or "gr" (grain) stays out as ambiguous,
// and so does a lone capital: "M" is a thousand square feet to one reader, a metre to another.
const WRITTEN: Record<UnitCode, string> = {
  mg: 'milligram|milligrams',
  g: 'gm|gram|grams',
  kg: 'kilo|kilos|kilogram|kilograms',
  oz_wt: 'oz wt|wt oz|oz weight|dry oz|oz dry|dry ounce|dry ounces|ounce weight|ounces weight|weight ounce|weight ounces|oz by weight|ounces by weight|oz avdp',
  lb: 'lbs|pound|pounds',
  mL: 'cc|milliliter|milliliters|millilitre|millilitres',
  L: 'liter|liters|litre|litres',
  tsp: 'teaspoon|teaspoons',
  tbsp: 'tbs|tablespoon|tablespoons',
  fl_oz: 'floz|fl oz|fl ozs|fluid oz|fluid ounce|fluid ounces|liquid ounce|liquid ounces|us fl oz',
  cup: 'cups',
  pt: 'pts|pint|pints',
  qt: 'qts|quart|quarts',
  gal: 'gals|gallon|gallons|us gal|us gallon|us gallons',
  cm: 'centimeter|centimeters|centimetre|centimetres',
  m: 'meter|meters|metre|metres',
  km: 'kilometer|kilometers|kilometre|kilometres',
  in: 'inch|inches',
  ft: 'foot|feet|lin ft|linear ft|linear foot|linear feet',
  yd: 'yds|yard|yards',
  mi: 'mile|miles',
  sq_in: 'sq in|sq inch|sq inches|square inch|square inches|in2|in²',
  sq_ft: 'sqft|sq ft|sq feet|square foot|square feet|ft2|ft²|sf',
  '1000_sq_ft': '1000 sq ft|1000 sqft|1000 square feet|1000 ft2|1000 ft²',
  acre: 'acres|ac',
  sq_m: 'sq m|sq meter|sq meters|sq metre|sq metres|square meter|square meters|square metre|square metres|m2|m²',
  ha: 'hectare|hectares',
  s: 'sec|secs|second|seconds',
  min: 'mins|minute|minutes',
  h: 'hr|hrs|hour|hours',
  d: 'day|days',
  deg_C: '°c|deg c|degrees c|celsius|degrees celsius',
  deg_F: '°f|deg f|degrees f|fahrenheit|degrees fahrenheit',
  mph: 'mi/h|miles per hour',
  km_h: 'km/h|kph|kmh|kilometers per hour|kilometres per hour',
  m_s: 'm/s|meters per second|metres per second',
  kn: 'kt|kts|knot|knots',
  placement: 'placements',
  station: 'stations',
  container: 'containers',
  each: 'ea',
  pct: '%|percent|per cent',
}

const AMBIGUOUS_OUNCE = new Set(['oz', 'ozs', 'ounce', 'ounces'])
const LONE_CAPITAL = /^[A-KM-Z]$/
const IMPERIAL = /^(imp|imperial|uk)([ _]|$)/

const BY_TEXT = new Map<string, UnitCode>(UNIT_CODES.flatMap((code) => {
  const written = code.toLowerCase()
  return [written, written.replaceAll('_', ' '), ...WRITTEN[code].split('|')].map(form => [form, code] as const)
}))

/** A unit from its code or a common written form, case, dots and commas aside. "Ounce" alone and imperial measures are refused with the reason. */
export function parseUnit(text: string): ParsedUnit {
  if (LONE_CAPITAL.test(text.trim())) return { ok: false, reason: 'unknown-unit' }
  const form = text.trim().toLowerCase().replace(/[.,]/g, '').replace(/\s+/g, ' ')
  if (AMBIGUOUS_OUNCE.has(form)) return { ok: false, reason: 'ambiguous-ounce' }
  if (IMPERIAL.test(form)) return { ok: false, reason: 'imperial-measure' }
  const unit = BY_TEXT.get(form)
  return unit ? { ok: true, unit } : { ok: false, reason: 'unknown-unit' }
}
