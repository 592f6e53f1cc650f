import { z } from 'zod'
import { rational } from '#shared/units/decimal'
import type { Rational } from '#shared/units/decimal'

export type Dimension = 'mass' | 'volume' | 'length' | 'area' | 'time' | 'temperature' | 'speed' | 'count' | 'ratio'

/**
 * `factor` turns one of the unit into base units: ng, nL, µm, 0.01 mm², s, m°C, mm/s, a thousandth of a thing, a millionth of a ratio.
 * `zero` is where the unit's own zero lies in base units (temperatures alone have one).
 */
export type UnitDefinition = { readonly dimension: Dimension; readonly factor: Rational; readonly zero?: Rational }

const unit = (dimension: Dimension, n: bigint, d = 1n): UnitDefinition => ({ dimension, factor: rational(n, d) })

// Exact by definition: the pound is 453.59237 g, the inch 2.54 cm, the US gallon 231 cubic inches
// (NIST Handbook 44, appendix C; 16 CFR 500.19). The acre is 43,560 international square feet.
const POUND_NG = 453_592_370_000n
const GALLON_NL = 3_785_411_784n
const FOOT_UM = 304_800n
const SQUARE_FOOT = 9_290_304n

/** Every unit a quantity may have. Volumes are US measures: the imperial gallon is a fifth larger and is refused by `parseUnit`. */
const CATALOGUE = {
  mg: unit('mass', 1_000_000n),
  g: unit('mass', 1_000_000_000n),
  kg: unit('mass', 1_000_000_000_000n),
  oz_wt: unit('mass', POUND_NG, 16n),
  lb: unit('mass', POUND_NG),
  mL: unit('volume', 1_000_000n),
  L: unit('volume', 1_000_000_000n),
  tsp: unit('volume', GALLON_NL, 768n),
  tbsp: unit('volume', GALLON_NL, 256n),
  fl_oz: unit('volume', GALLON_NL, 128n),
  cup: unit('volume', GALLON_NL, 16n),
  pt: unit('volume', GALLON_NL, 8n),
  qt: unit('volume', GALLON_NL, 4n),
  gal: unit('volume', GALLON_NL),
  cm: unit('length', 10_000n),
  m: unit('length', 1_000_000n),
  km: unit('length', 1_000_000_000n),
  in: unit('length', FOOT_UM, 12n),
  ft: unit('length', FOOT_UM),
  yd: unit('length', FOOT_UM * 3n),
  mi: unit('length', FOOT_UM * 5280n),
  sq_in: unit('area', SQUARE_FOOT, 144n),
  sq_ft: unit('area', SQUARE_FOOT),
  '1000_sq_ft': unit('area', SQUARE_FOOT * 1000n),
  acre: unit('area', SQUARE_FOOT * 43_560n),
  sq_m: unit('area', 100_000_000n),
  ha: unit('area', 1_000_000_000_000n),
  s: unit('time', 1n),
  min: unit('time', 60n),
  h: unit('time', 3600n),
  d: unit('time', 86_400n),
  deg_C: { ...unit('temperature', 1000n), zero: rational(0n) },
  deg_F: { ...unit('temperature', 5000n, 9n), zero: rational(-160_000n, 9n) },
  mph: unit('speed', FOOT_UM * 5280n, 3_600_000n),
  km_h: unit('speed', 2500n, 9n),
  m_s: unit('speed', 1000n),
  kn: unit('speed', 4630n, 9n),
  placement: unit('count', 1000n),
  station: unit('count', 1000n),
  container: unit('count', 1000n),
  each: unit('count', 1000n),
  pct: unit('ratio', 10_000n),
} as const satisfies Record<string, UnitDefinition>

export type UnitCode = keyof typeof CATALOGUE
export const UNIT_CODES = Object.keys(CATALOGUE) as UnitCode[]
export const UnitSchema = z.enum(UNIT_CODES)

export const unitDefinition = (code: UnitCode): UnitDefinition => CATALOGUE[code]
export const dimensionOf = (code: UnitCode): Dimension => CATALOGUE[code].dimension
export const unitsOf = (...dimensions: Dimension[]): UnitCode[] => UNIT_CODES.filter(code => dimensions.includes(dimensionOf(code)))

/** Whether one unit turns into the other without a density. Things that are counted do not: two stations are not two placements. */
export const commensurable = (a: UnitCode, b: UnitCode): boolean =>
  a === b || (dimensionOf(a) === dimensionOf(b) && dimensionOf(a) !== 'count')
