/**
 * Words for unit codes. Each key is written out, so that a missing or unused word is found by reading the code;
 * `n` chooses the plural form.
 */
export function useUnitWords() {
  const { t } = useI18n()

  const mass: Record<string, (n: number) => string> = {
    g: () => t('common.units.g'), kg: () => t('common.units.kg'), mg: () => t('common.units.mg'),
    lb: () => t('common.units.lb'), oz_wt: () => t('common.units.oz_wt'),
  }
  const volume: Record<string, (n: number) => string> = {
    'mL': () => t('common.units.mL'), 'L': () => t('common.units.L'), 'fl_oz': () => t('common.units.fl_oz'),
    'cup': n => t('common.units.cup', n), 'pt': () => t('common.units.pt'), 'qt': () => t('common.units.qt'), 'gal': () => t('common.units.gal'),
    'tbsp': () => t('common.units.tbsp'), 'tsp': () => t('common.units.tsp'), '100_gal': () => t('common.units.100_gal'),
  }
  const length: Record<string, (n: number) => string> = {
    in: () => t('common.units.in'), ft: () => t('common.units.ft'), yd: () => t('common.units.yd'), mi: () => t('common.units.mi'),
    cm: () => t('common.units.cm'), m: () => t('common.units.m'), km: () => t('common.units.km'), linear_ft: () => t('common.units.linear_ft'),
  }
  const area: Record<string, (n: number) => string> = {
    'sq_in': () => t('common.units.sq_in'), 'sq_ft': () => t('common.units.sq_ft'), '1000_sq_ft': () => t('common.units.1000_sq_ft'),
    'acre': n => t('common.units.acre', n), 'sq_m': () => t('common.units.sq_m'), 'ha': () => t('common.units.ha'),
  }
  const otherMeasures: Record<string, (n: number) => string> = {
    s: () => t('common.units.s'), min: () => t('common.units.min'), h: () => t('common.units.h'), d: n => t('common.units.d', n),
    deg_F: () => t('common.units.deg_F'), deg_C: () => t('common.units.deg_C'),
    mph: () => t('common.units.mph'), km_h: () => t('common.units.km_h'), m_s: () => t('common.units.m_s'), kn: () => t('common.units.kn'),
    pct: () => t('common.units.pct'),
  }
  const counts: Record<string, (n: number) => string> = {
    placement: n => t('common.units.placement', n), station: n => t('common.units.station', n),
    container: n => t('common.units.container', n), each: () => t('common.units.each'),
  }
  const words = { ...mass, ...volume, ...length, ...area, ...otherMeasures, ...counts }
  const one = (code: string, n: number) => words[code]?.(n) ?? code

  /** The word for a unit, or for a rate unit `<unit>/<per>`. A code that has no word yet is shown as it is: wrong words would be worse. */
  return (code: string, n = 2): string => {
    const [unit = code, per] = code.split('/')
    return per === undefined ? one(unit, n) : t('common.unitPer', { unit: one(unit, n), per: one(per, 1) })
  }
}
