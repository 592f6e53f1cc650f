import type { RatePer } from '#shared/units/rate'
import type { UnitCode } from '#shared/units/units'

type Word = (n: number) => string

/**
 * Words for unit codes. Each key is written out, so that a missing or unused word is found by reading the code;
 * `n` chooses the plural form.
 */
export function useUnitWords() {
  const { t } = useI18n()

  const mass = {
    g: () => t('common.units.g'), kg: () => t('common.units.kg'), mg: () => t('common.units.mg'),
    lb: () => t('common.units.lb'), oz_wt: () => t('common.units.oz_wt'),
  }
  const volume = {
    'mL': () => t('common.units.mL'), 'L': () => t('common.units.L'), 'fl_oz': () => t('common.units.fl_oz'),
    'cup': (n: number) => t('common.units.cup', n), 'pt': () => t('common.units.pt'), 'qt': () => t('common.units.qt'), 'gal': () => t('common.units.gal'),
    'tbsp': () => t('common.units.tbsp'), 'tsp': () => t('common.units.tsp'), '100_gal': () => t('common.units.100_gal'),
  }
  const length = {
    in: () => t('common.units.in'), ft: () => t('common.units.ft'), yd: () => t('common.units.yd'), mi: () => t('common.units.mi'),
    cm: () => t('common.units.cm'), m: () => t('common.units.m'), km: () => t('common.units.km'), linear_ft: () => t('common.units.linear_ft'),
  }
  const area = {
    'sq_in': () => t('common.units.sq_in'), 'sq_ft': () => t('common.units.sq_ft'), '1000_sq_ft': () => t('common.units.1000_sq_ft'),
    'acre': (n: number) => t('common.units.acre', n), 'sq_m': () => t('common.units.sq_m'), 'ha': () => t('common.units.ha'),
  }
  const otherMeasures = {
    s: () => t('common.units.s'), min: () => t('common.units.min'), h: () => t('common.units.h'), d: (n: number) => t('common.units.d', n),
    deg_F: () => t('common.units.deg_F'), deg_C: () => t('common.units.deg_C'),
    mph: () => t('common.units.mph'), km_h: () => t('common.units.km_h'), m_s: () => t('common.units.m_s'), kn: () => t('common.units.kn'),
    pct: () => t('common.units.pct'),
  }
  const counts = {
    placement: (n: number) => t('common.units.placement', n), station: (n: number) => t('common.units.station', n),
    container: (n: number) => t('common.units.container', n), each: () => t('common.units.each'),
  }
  const words: Record<UnitCode | RatePer, Word> = { ...mass, ...volume, ...length, ...area, ...otherMeasures, ...counts }
  const known = new Map<string, Word>(Object.entries(words))
  const one = (code: string, n: number) => known.get(code)?.(n) ?? code

  /** The word for a unit, or for a rate unit `<unit>/<per>`. A code that has no word yet is shown as it is: wrong words would be worse. */
  return (code: string, n = 2): string => {
    const [unit = code, per] = code.split('/')
    return per === undefined ? one(unit, n) : t('common.unitPer', { unit: one(unit, n), per: one(per, 1) })
  }
}
