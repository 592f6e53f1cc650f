import type { RatePer } from '#shared/units/rate'
import type { UnitCode } from '#shared/units/units'
import type { Words } from '#shared/reports/words'

/** The word for a unit, or for a rate unit `<unit>/<per>`. A code without a word is shown as it is: wrong words would be worse. */
export function unitWords(words: Words): (code: string, n?: number) => string {
  const known: Record<UnitCode | RatePer, (n: number) => string> = {
    'g': () => words('common.units.g'), 'kg': () => words('common.units.kg'), 'mg': () => words('common.units.mg'),
    'lb': () => words('common.units.lb'), 'oz_wt': () => words('common.units.oz_wt'),
    'mL': () => words('common.units.mL'), 'L': () => words('common.units.L'), 'fl_oz': () => words('common.units.fl_oz'), 'cup': n => words('common.units.cup', { n }),
    'pt': () => words('common.units.pt'), 'qt': () => words('common.units.qt'), 'gal': () => words('common.units.gal'), '100_gal': () => words('common.units.100_gal'),
    'tbsp': () => words('common.units.tbsp'), 'tsp': () => words('common.units.tsp'),
    'in': () => words('common.units.in'), 'ft': () => words('common.units.ft'), 'linear_ft': () => words('common.units.linear_ft'), 'yd': () => words('common.units.yd'),
    'mi': () => words('common.units.mi'), 'cm': () => words('common.units.cm'), 'm': () => words('common.units.m'), 'km': () => words('common.units.km'),
    'sq_in': () => words('common.units.sq_in'), 'sq_ft': () => words('common.units.sq_ft'), '1000_sq_ft': () => words('common.units.1000_sq_ft'),
    'acre': n => words('common.units.acre', { n }), 'sq_m': () => words('common.units.sq_m'), 'ha': () => words('common.units.ha'),
    's': () => words('common.units.s'), 'min': () => words('common.units.min'), 'h': () => words('common.units.h'), 'd': n => words('common.units.d', { n }),
    'deg_F': () => words('common.units.deg_F'), 'deg_C': () => words('common.units.deg_C'),
    'mph': () => words('common.units.mph'), 'km_h': () => words('common.units.km_h'), 'm_s': () => words('common.units.m_s'), 'kn': () => words('common.units.kn'), 'pct': () => words('common.units.pct'),
    'placement': n => words('common.units.placement', { n }), 'station': n => words('common.units.station', { n }), 'container': n => words('common.units.container', { n }), 'each': () => words('common.units.each'),
  }
  const byCode = new Map<string, (n: number) => string>(Object.entries(known))
  const one = (code: string, n: number) => byCode.get(code)?.(n) ?? code
  return (code, n = 2) => {
    const [unit = code, per] = code.split('/')
    return per === undefined ? one(unit, n) : words('common.unitPer', { unit: one(unit, n), per: one(per, 1) })
  }
}
