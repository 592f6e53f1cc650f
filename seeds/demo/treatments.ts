import type { AreaCode, EquipmentKind, Method, SiteKind, Target } from '#shared/catalogues/codes'
import type { Quantity } from '#shared/units/quantity'
import type { RateUnit } from '#shared/units/rate'
import type { UnitCode } from '#shared/units/units'
import type { BranchKey } from './people'

type Range = [low: number, high: number]

/** How big the work is and from what the amount follows. */
export type Sizing =
  | { by: 'spray', quarterGallons: Range, sqFtPerGallon: number }
  | { by: 'area', hundredsOfSqFt: Range, gallonsPer1000?: string }
  | { by: 'acres', tenths: Range, gallonsPerAcre: number }
  | { by: 'count', of: 'placement' | 'station', count: Range, each: Quantity, sqFt: Range }
  | { by: 'weighed', amounts: [string, ...string[]], unit: UnitCode, sqFt: Range }

export interface TreatmentPlan {
  products: { product: string, rates: [string, ...string[]], unit: RateUnit | null }[]
  method: Method, setting: 'indoors' | 'outdoors', areas: [AreaCode, ...AreaCode[]], targets: [Target, ...Target[]], equipment: EquipmentKind | null, size: Sizing
  /** First and last month in which it is done; all year unless told. */
  months?: Range
  states?: BranchKey[]
}

const SPRING_TO_AUTUMN: Range = [3, 11]
const indoorsSpray: Sizing = { by: 'spray', quarterGallons: [1, 4], sqFtPerGallon: 400 }

export const TREATMENTS = {
  'band': { products: [{ product: 'sillgard', rates: ['0.30', '0.40', '0.50'], unit: 'fl_oz/gal' }], method: 'foundation-band', setting: 'outdoors', areas: ['outside-wall'], targets: ['ants', 'spiders', 'earwigs'], equipment: 'backpack-sprayer', size: { by: 'spray', quarterGallons: [6, 16], sqFtPerGallon: 390 } },
  'harrow-band': { products: [{ product: 'harrow', rates: ['0.50', '0.75'], unit: 'fl_oz/gal' }], method: 'foundation-band', setting: 'outdoors', areas: ['outside-wall', 'eaves'], targets: ['crickets', 'spiders', 'ants'], equipment: 'power-sprayer', size: { by: 'spray', quarterGallons: [8, 24], sqFtPerGallon: 350 } },
  'granules': { products: [{ product: 'bedrow', rates: ['2.5', '3.0', '3.5'], unit: 'lb/1000_sq_ft' }], method: 'granules', setting: 'outdoors', areas: ['beds'], targets: ['ants', 'earwigs'], equipment: 'spreader', size: { by: 'area', hundredsOfSqFt: [6, 18] } },
  'grubs': { products: [{ product: 'grubhold', rates: ['1.5', '1.6'], unit: 'lb/1000_sq_ft' }], method: 'granules', setting: 'outdoors', areas: ['lawn'], targets: ['grubs'], equipment: 'spreader', size: { by: 'area', hundredsOfSqFt: [30, 120] }, months: [5, 8] },
  'ant-gel': { products: [{ product: 'mirabel', rates: ['0.40'], unit: 'g/placement' }], method: 'bait-placement', setting: 'indoors', areas: ['kitchen', 'bathroom'], targets: ['ants'], equipment: 'bait-gun', size: { by: 'count', of: 'placement', count: [8, 30], each: { value: '0.40', unit: 'g' }, sqFt: [80, 240] } },
  'roach-gel': { products: [{ product: 'roachline', rates: ['0.25'], unit: 'g/placement' }], method: 'bait-placement', setting: 'indoors', areas: ['kitchen'], targets: ['cockroaches'], equipment: 'bait-gun', size: { by: 'count', of: 'placement', count: [12, 48], each: { value: '0.25', unit: 'g' }, sqFt: [90, 400] } },
  'crevice': { products: [{ product: 'quietus', rates: ['0.5'], unit: null }], method: 'crack-and-crevice', setting: 'indoors', areas: ['kitchen', 'bathroom'], targets: ['cockroaches', 'silverfish'], equipment: 'hand-sprayer', size: { by: 'weighed', amounts: ['4', '6', '8', '12'], unit: 'fl_oz', sqFt: [60, 180] } },
  'roach-spray': { products: [{ product: 'stillwater', rates: ['0.30', '0.40', '0.50'], unit: 'fl_oz/gal' }], method: 'crack-and-crevice', setting: 'indoors', areas: ['kitchen', 'storeroom'], targets: ['cockroaches'], equipment: 'hand-sprayer', size: indoorsSpray },
  'powder-spray': { products: [{ product: 'wallow', rates: ['0.25', '0.30'], unit: 'oz_wt/gal' }], method: 'crack-and-crevice', setting: 'indoors', areas: ['storeroom', 'basement'], targets: ['cockroaches', 'crickets'], equipment: 'hand-sprayer', size: indoorsSpray },
  'bed-bugs': { products: [{ product: 'bedcalm', rates: ['0.5'], unit: null }], method: 'crack-and-crevice', setting: 'indoors', areas: ['bedroom', 'living-room'], targets: ['bed-bugs'], equipment: 'hand-sprayer', size: { by: 'weighed', amounts: ['16', '24', '32'], unit: 'fl_oz', sqFt: [140, 320] } },
  'dusting': { products: [{ product: 'lithodust', rates: ['1.0'], unit: null }], method: 'dust', setting: 'indoors', areas: ['wall-void', 'attic'], targets: ['silverfish', 'cockroaches'], equipment: 'hand-duster', size: { by: 'weighed', amounts: ['0.5', '0.8', '1.0', '1.5'], unit: 'oz_wt', sqFt: [20, 90] } },
  'wasps': { products: [{ product: 'vespa', rates: ['1.0'], unit: null }], method: 'spot', setting: 'outdoors', areas: ['eaves'], targets: ['wasps'], equipment: null, size: { by: 'weighed', amounts: ['2.0', '3.0', '4.0'], unit: 'oz_wt', sqFt: [4, 20] }, months: [4, 10] },
  'rodent-blocks': { products: [{ product: 'pelletine', rates: ['2.0'], unit: 'oz_wt/station' }], method: 'bait-station', setting: 'outdoors', areas: ['outside-wall', 'waste-area'], targets: ['mice', 'rats'], equipment: null, size: { by: 'count', of: 'station', count: [6, 24], each: { value: '2.0', unit: 'oz_wt' }, sqFt: [400, 1600] } },
  'fly-traps': { products: [{ product: 'glueline', rates: ['1'], unit: null }], method: 'bait-station', setting: 'indoors', areas: ['storeroom'], targets: ['flies', 'stored-product-insects'], equipment: null, size: { by: 'weighed', amounts: ['2', '4', '6'], unit: 'each', sqFt: [600, 2400] } },
  'ticks': { products: [{ product: 'tickstay', rates: ['0.80', '1.00', '1.20'], unit: 'fl_oz/gal' }], method: 'foliar', setting: 'outdoors', areas: ['fence-line', 'trees-and-shrubs'], targets: ['ticks', 'mosquitoes'], equipment: 'mist-blower', size: { by: 'spray', quarterGallons: [8, 20], sqFtPerGallon: 900 }, months: [4, 10] },
  'cedar-mist': { products: [{ product: 'cedarwick', rates: ['1.0'], unit: null }], method: 'foliar', setting: 'outdoors', areas: ['trees-and-shrubs'], targets: ['mosquitoes', 'aphids'], equipment: 'hand-sprayer', size: { by: 'weighed', amounts: ['1.0', '1.5', '2.0'], unit: 'qt', sqFt: [300, 900] }, months: SPRING_TO_AUTUMN },
  'weeds': { products: [{ product: 'cloverout', rates: ['1.1', '1.2', '1.4'], unit: 'fl_oz/1000_sq_ft' }], method: 'broadcast', setting: 'outdoors', areas: ['lawn'], targets: ['broadleaf-weeds'], equipment: 'power-sprayer', size: { by: 'area', hundredsOfSqFt: [30, 180], gallonsPer1000: '1.5' }, months: SPRING_TO_AUTUMN },
  'weeds-with-spreader': { products: [{ product: 'cloverout', rates: ['1.1', '1.2'], unit: 'fl_oz/1000_sq_ft' }, { product: 'cling', rates: ['0.25', '0.30'], unit: 'fl_oz/gal' }], method: 'broadcast', setting: 'outdoors', areas: ['lawn'], targets: ['broadleaf-weeds'], equipment: 'power-sprayer', size: { by: 'area', hundredsOfSqFt: [40, 160], gallonsPer1000: '1.5' }, months: SPRING_TO_AUTUMN },
  'crabgrass': { products: [{ product: 'springbar', rates: ['0.30', '0.40', '0.50'], unit: 'fl_oz/1000_sq_ft' }], method: 'broadcast', setting: 'outdoors', areas: ['lawn'], targets: ['crabgrass'], equipment: 'power-sprayer', size: { by: 'area', hundredsOfSqFt: [30, 200], gallonsPer1000: '1.0' }, months: [2, 5] },
  'turf-disease': { products: [{ product: 'blotless', rates: ['0.40', '0.60'], unit: 'fl_oz/1000_sq_ft' }], method: 'broadcast', setting: 'outdoors', areas: ['lawn'], targets: ['leaf-disease'], equipment: 'power-sprayer', size: { by: 'area', hundredsOfSqFt: [50, 300], gallonsPer1000: '2.0' }, months: [4, 11] },
  'termites': { products: [{ product: 'ironbark', rates: ['0.90', '1.20'], unit: 'fl_oz/gal' }], method: 'trench', setting: 'outdoors', areas: ['foundation'], targets: ['termites'], equipment: 'power-sprayer', size: { by: 'spray', quarterGallons: [120, 320], sqFtPerGallon: 2 } },
  'burndown': { products: [{ product: 'rowclear', rates: ['1.2', '1.5'], unit: 'pt/acre' }], method: 'boom', setting: 'outdoors', areas: ['field'], targets: ['broadleaf-weeds', 'grass-weeds'], equipment: 'boom-sprayer', size: { by: 'acres', tenths: [80, 420], gallonsPerAcre: 15 }, months: [2, 10] },
  'orchard-mites': { products: [{ product: 'orchard', rates: ['15.0', '16.0'], unit: 'fl_oz/acre' }], method: 'foliar', setting: 'outdoors', areas: ['field'], targets: ['mites'], equipment: 'mist-blower', size: { by: 'acres', tenths: [40, 160], gallonsPerAcre: 100 }, months: [4, 9], states: ['CA', 'TX'] },
  'almond-mites': { products: [{ product: 'valley', rates: ['14.0', '18.0'], unit: 'fl_oz/acre' }], method: 'foliar', setting: 'outdoors', areas: ['field'], targets: ['mites', 'caterpillars'], equipment: 'mist-blower', size: { by: 'acres', tenths: [40, 160], gallonsPerAcre: 100 }, months: [4, 7], states: ['CA'] },
} satisfies Record<string, TreatmentPlan>

export type TreatmentKey = keyof typeof TREATMENTS

/** What is done at one visit, by kind of place. */
export const PROGRAMMES: Partial<Record<SiteKind, TreatmentKey[][]>> = {
  'house': [['band', 'granules'], ['band'], ['band', 'ant-gel'], ['harrow-band'], ['ant-gel'], ['wasps', 'band'], ['ticks'], ['crevice'], ['termites'], ['dusting'], ['cedar-mist', 'granules']],
  'apartment': [['roach-gel'], ['roach-gel', 'crevice'], ['crevice'], ['ant-gel'], ['bed-bugs'], ['dusting']],
  'restaurant': [['roach-gel', 'crevice'], ['roach-spray'], ['roach-gel', 'rodent-blocks'], ['dusting', 'fly-traps']],
  'office': [['ant-gel'], ['crevice'], ['harrow-band']],
  'shop': [['rodent-blocks'], ['crevice', 'fly-traps'], ['powder-spray']],
  'warehouse': [['rodent-blocks', 'fly-traps'], ['rodent-blocks'], ['powder-spray']],
  'school': [['ant-gel'], ['rodent-blocks'], ['granules']],
  'hotel': [['bed-bugs'], ['roach-gel', 'crevice'], ['harrow-band']],
  'lawn': [['weeds'], ['weeds-with-spreader'], ['crabgrass'], ['grubs'], ['turf-disease'], ['ticks']],
  'sports-turf': [['weeds-with-spreader'], ['crabgrass'], ['turf-disease'], ['grubs']],
  'field-crop': [['burndown']],
  'orchard': [['orchard-mites'], ['almond-mites'], ['burndown']],
}
