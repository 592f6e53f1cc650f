import type { Product } from '#shared/books/shapes'
import type { Method, Protective, SiteKind, Target } from '#shared/catalogues/codes'
import type { Reentry } from '#shared/records/entry'
import type { RateUnit } from '#shared/units/rate'
import type { BranchKey } from './people'

export interface UsePlan { methods: Method[], targets?: Target[], sites?: SiteKind[], limit?: { unit: RateUnit, min: string | null, max: string, words: string } }
export interface ProductPlan {
  key: string, name: string, kind: Product['kind'], number: string | null, form: Product['form'], signal: Product['signalWord'], restricted?: boolean
  ingredients: [name: string, percent: string][]
  reentry: Reentry, cautions: string, protective: Protective[], uses: UsePlan[]
  /** States that register it, all three unless told. */
  states?: BranchKey[]
  /** A second version of the label, from so many days before the day: its strongest rate is another. */
  newer?: { days: number, max: string, words: string }
  unchecked?: boolean
}

const dry: Reentry = { until: 'dry' }
const skin: Protective[] = ['gloves', 'long-sleeves', 'long-trousers', 'shoes-and-socks']
const water = 'Do not apply to water, or where surface water is present. Do not contaminate water when cleaning equipment.'
const inside = 'Cover or remove food, dishes and fish tanks before use. Do not apply to surfaces where food is prepared.'
const indoorTargets: Target[] = ['ants', 'cockroaches', 'spiders', 'silverfish', 'crickets', 'centipedes', 'earwigs']

/** Every product, name, number, strength and rate is invented: no such registrant numbers have been given out. */
export const PRODUCTS: ProductPlan[] = [
  { key: 'sillgard', name: 'Sillgard 6.4 CS', kind: 'registered', number: '990014-27', form: 'concentrate', signal: 'CAUTION', ingredients: [['Demothrin', '6.40']], reentry: dry, cautions: `Keep people and pets off until the spray has dried. ${water}`, protective: skin,
    uses: [{ methods: ['foundation-band', 'spot', 'crack-and-crevice'], limit: { unit: 'fl_oz/gal', min: '0.15', max: '0.80', words: 'Mix 0.15 to 0.80 fl oz in each gallon of finished spray.' } }], newer: { days: 210, max: '0.60', words: 'Mix 0.15 to 0.60 fl oz in each gallon of finished spray. Do not apply more than once in 21 days.' } },
  { key: 'harrow', name: 'Harrow Perimeter EC', kind: 'registered', number: '990014-31', form: 'concentrate', signal: 'WARNING', ingredients: [['Bifendemo', '7.90']], reentry: dry, cautions: `Toxic to fish. ${water}`, protective: [...skin, 'eye-protection'],
    uses: [{ methods: ['foundation-band', 'broadcast', 'foliar', 'spot'], limit: { unit: 'fl_oz/gal', min: '0.25', max: '1.00', words: 'Use 0.25 to 1.00 fl oz per gallon of water as a coarse, low-pressure spray.' } }] },
  { key: 'bedrow', name: 'Bedrow G', kind: 'registered', number: '990031-4', form: 'granule', signal: 'CAUTION', ingredients: [['Bifendemo', '0.20']], reentry: dry, cautions: 'Water in after spreading. Sweep granules off paving.', protective: skin,
    uses: [{ methods: ['granules'], limit: { unit: 'lb/1000_sq_ft', min: '2.0', max: '4.0', words: 'Spread 2.0 to 4.0 lb over each 1,000 sq ft.' } }] },
  { key: 'grubhold', name: 'Grubhold 0.5 G', kind: 'distributor', number: '990031-9-990077', form: 'granule', signal: 'CAUTION', ingredients: [['Imidademo', '0.50']], reentry: dry, cautions: 'Water in with a quarter inch of water. Do not mow before watering.', protective: skin,
    uses: [{ methods: ['granules'], targets: ['grubs'], limit: { unit: 'lb/1000_sq_ft', min: '1.4', max: '1.8', words: 'For grubs: 1.4 to 1.8 lb per 1,000 sq ft, once a season.' } }] },
  { key: 'mirabel', name: 'Mirabel Ant Gel', kind: 'registered', number: '990042-3', form: 'bait', signal: 'CAUTION', ingredients: [['Indoxademo', '0.05']], reentry: { until: 'none-stated' }, cautions: 'Place out of reach of children and pets. Do not place on food surfaces.', protective: ['gloves'],
    uses: [{ methods: ['bait-placement'], targets: ['ants', 'carpenter-ants'], limit: { unit: 'g/placement', min: '0.25', max: '0.50', words: 'Place 0.25 to 0.50 g in each spot.' } }] },
  { key: 'roachline', name: 'Roachline Gel', kind: 'registered', number: '990042-8', form: 'bait', signal: 'CAUTION', ingredients: [['Fiprodemo', '0.01']], reentry: { until: 'none-stated' }, cautions: `Place in cracks and voids. ${inside}`, protective: ['gloves'],
    uses: [{ methods: ['bait-placement'], targets: ['cockroaches'], limit: { unit: 'g/placement', min: '0.10', max: '0.50', words: 'Place 0.10 to 0.50 g in each spot, up to 3 spots per square yard.' } }] },
  { key: 'quietus', name: 'Quietus Crevice 0.5', kind: 'registered', number: '990055-12', form: 'ready-to-use', signal: 'CAUTION', ingredients: [['Demothrin', '0.50']], reentry: dry, cautions: inside, protective: ['gloves', 'long-sleeves'],
    uses: [{ methods: ['crack-and-crevice', 'spot'], targets: indoorTargets }] },
  { key: 'vespa', name: 'Vespa Drop Aerosol', kind: 'registered', number: '990055-20', form: 'aerosol', signal: 'WARNING', ingredients: [['Pyredemo', '0.25'], ['Synerdemo', '1.00']], reentry: { until: 'ventilated' }, cautions: 'Do not use on or near live electric parts. Air the space before people return.', protective: ['gloves', 'eye-protection'],
    uses: [{ methods: ['spot', 'space-spray', 'void-injection'], targets: ['wasps', 'flies', 'spiders'] }] },
  { key: 'lithodust', name: 'Lithodust', kind: 'registered', number: '990061-2', form: 'dust', signal: 'CAUTION', ingredients: [['Silica demonate', '40.00']], reentry: { until: 'dusts-settled' }, cautions: 'Apply as a light film in voids. Stay out until the dust has settled.', protective: ['gloves', 'dust-mask', 'eye-protection'],
    uses: [{ methods: ['dust', 'void-injection'] }] },
  { key: 'wallow', name: 'Wallow 40 WP', kind: 'registered', number: '990061-7', form: 'concentrate', signal: 'CAUTION', ingredients: [['Cyflademo', '40.00']], reentry: dry, cautions: `Keep the mix stirred. ${water}`, protective: [...skin, 'dust-mask'],
    uses: [{ methods: ['crack-and-crevice', 'foundation-band', 'spot'], limit: { unit: 'oz_wt/gal', min: '0.20', max: '0.40', words: 'Use 0.20 to 0.40 oz by weight per gallon.' } }] },
  { key: 'cloverout', name: 'Cloverout Turf', kind: 'registered', number: '990072-5', form: 'concentrate', signal: 'DANGER', ingredients: [['2,4-demo', '31.30'], ['Dicademo', '2.70']], reentry: dry, cautions: `Corrosive: causes irreversible eye damage. Do not spray when the wind exceeds 10 mph. ${water}`, protective: [...skin, 'eye-protection'],
    uses: [{ methods: ['broadcast', 'spot'], targets: ['broadleaf-weeds'], limit: { unit: 'fl_oz/1000_sq_ft', min: '1.0', max: '1.5', words: 'Use 1.0 to 1.5 fl oz in 1 to 2 gal of water on each 1,000 sq ft.' } }] },
  { key: 'springbar', name: 'Springbar Pre', kind: 'registered', number: '990072-11', form: 'concentrate', signal: 'CAUTION', ingredients: [['Prodidemo', '40.70']], reentry: dry, cautions: `Water in within 14 days. ${water}`, protective: skin,
    uses: [{ methods: ['broadcast'], targets: ['crabgrass', 'grass-weeds'], limit: { unit: 'fl_oz/1000_sq_ft', min: '0.20', max: '0.55', words: 'Use 0.20 to 0.55 fl oz per 1,000 sq ft, by length of control.' } }] },
  { key: 'blotless', name: 'Blotless Turf F', kind: 'registered', number: '990072-16', form: 'concentrate', signal: 'CAUTION', ingredients: [['Azoxydemo', '22.90']], reentry: dry, cautions: water, protective: skin, unchecked: true,
    uses: [{ methods: ['broadcast', 'foliar'], targets: ['leaf-disease'], limit: { unit: 'fl_oz/1000_sq_ft', min: '0.38', max: '0.77', words: '0.38 to 0.77 fl oz per 1,000 sq ft every 14 to 28 days.' } }] },
  { key: 'tickstay', name: 'Tickstay 10', kind: 'registered', number: '990083-2', form: 'concentrate', signal: 'CAUTION', ingredients: [['Permedemo', '10.00']], reentry: dry, cautions: `Toxic to bees: do not spray plants in bloom while bees visit. ${water}`, protective: skin,
    uses: [{ methods: ['foliar', 'broadcast'], targets: ['ticks', 'mosquitoes', 'fleas'], limit: { unit: 'fl_oz/gal', min: '0.50', max: '1.60', words: 'Use 0.50 to 1.60 fl oz per gallon on plants and edges.' } }] },
  { key: 'ironbark', name: 'Ironbark T', kind: 'registered', number: '990083-6', form: 'concentrate', signal: 'WARNING', restricted: true, ingredients: [['Fiprodemo', '9.10']], reentry: { until: 'hours', hours: '12' }, cautions: `Restricted use product. Treat soil only; keep out of wells and drains. ${water}`, protective: [...skin, 'eye-protection', 'boots'],
    uses: [{ methods: ['trench', 'soil-injection'], targets: ['termites', 'carpenter-ants'], limit: { unit: 'fl_oz/gal', min: '0.80', max: '1.60', words: 'Use 0.80 to 1.60 fl oz per gallon; 4 gal of finished dilution per 10 linear ft per foot of depth.' } }] },
  { key: 'rowclear', name: 'Rowclear 4 L', kind: 'registered', number: '990090-1', form: 'concentrate', signal: 'DANGER-POISON', restricted: true, ingredients: [['Paraquademo', '43.80']], reentry: { until: 'hours', hours: '24' }, cautions: `Restricted use product. Fatal if swallowed. Keep out of the field for the time on the label. ${water}`, protective: [...skin, 'apron', 'respirator', 'eye-protection'],
    uses: [{ methods: ['boom'], limit: { unit: 'pt/acre', min: '1.0', max: '2.0', words: '1.0 to 2.0 pt in at least 10 gal of water per acre.' } }] },
  { key: 'orchard', name: 'Orchard Mite SC', kind: 'registered', number: '990090-14', form: 'concentrate', signal: 'CAUTION', ingredients: [['Spirodemo', '22.30']], reentry: { until: 'hours', hours: '12' }, cautions: `Keep workers out for 12 hours. ${water}`, protective: skin,
    uses: [{ methods: ['foliar', 'boom'], targets: ['mites', 'aphids'], limit: { unit: 'fl_oz/acre', min: '14.0', max: '18.0', words: '14.0 to 18.0 fl oz in 100 gal per acre.' } }], states: ['CA', 'TX'] },
  { key: 'valley', name: 'Valley Almond SLN', kind: 'special-local-need', number: 'CA-990012', form: 'concentrate', signal: 'CAUTION', ingredients: [['Spirodemo', '22.30']], reentry: { until: 'hours', hours: '24' }, cautions: `For the counties named on this label only. ${water}`, protective: skin,
    uses: [{ methods: ['foliar', 'boom'], targets: ['mites', 'caterpillars'], limit: { unit: 'fl_oz/acre', min: '12.0', max: '24.0', words: '12.0 to 24.0 fl oz per acre before hull split.' } }], states: ['CA'] },
  { key: 'stillwater', name: 'Stillwater Cockroach EC', kind: 'registered', number: '990101-3', form: 'concentrate', signal: 'CAUTION', ingredients: [['Cyflademo', '11.80']], reentry: dry, cautions: inside, protective: skin,
    uses: [{ methods: ['crack-and-crevice', 'spot'], limit: { unit: 'fl_oz/gal', min: '0.27', max: '0.54', words: '0.27 to 0.54 fl oz per gallon, to cracks and crevices only.' } }] },
  { key: 'pelletine', name: 'Pelletine Rodent Block', kind: 'registered', number: '990110-6', form: 'bait', signal: 'CAUTION', ingredients: [['Bromademo', '0.01']], reentry: { until: 'none-stated' }, cautions: 'In locked stations only, within 100 ft of buildings.', protective: ['gloves'],
    uses: [{ methods: ['bait-station'], targets: ['mice', 'rats'], limit: { unit: 'oz_wt/station', min: '1.0', max: '4.0', words: 'Place 1.0 to 4.0 oz in each station, 15 to 30 ft apart.' } }] },
  { key: 'cedarwick', name: 'Cedarwick Garden Mist', kind: 'minimum-risk', number: null, form: 'ready-to-use', signal: 'none', ingredients: [['Cedarwood oil', '5.00'], ['Peppermint oil', '2.00']], reentry: dry, cautions: 'May mark painted surfaces: try a small spot first.', protective: ['gloves'],
    uses: [{ methods: ['foliar', 'spot', 'broadcast'] }] },
  { key: 'cling', name: 'Clingwell Spreader', kind: 'adjuvant', number: null, form: 'concentrate', signal: 'CAUTION', ingredients: [['Alkyl demoxylate', '80.00']], reentry: { until: 'none-stated' }, cautions: 'Adjuvant: use with products whose label allows one.', protective: ['gloves'],
    uses: [{ methods: ['broadcast', 'foliar', 'boom', 'foundation-band'], limit: { unit: 'fl_oz/gal', min: '0.20', max: '0.50', words: 'Add 0.20 to 0.50 fl oz to each gallon of mix.' } }] },
  { key: 'glueline', name: 'Glueline Flying-Insect Trap', kind: 'device', number: null, form: 'device', signal: 'none', ingredients: [], reentry: { until: 'none-stated' }, cautions: 'Change the board monthly.', protective: [],
    uses: [{ methods: ['bait-station'], targets: ['flies', 'stored-product-insects'] }] },
  { key: 'bedcalm', name: 'Bedcalm RTU', kind: 'registered', number: '990055-33', form: 'ready-to-use', signal: 'CAUTION', ingredients: [['Chlorfedemo', '0.50']], reentry: dry, cautions: `Do not treat bedding or toys. ${inside}`, protective: skin,
    uses: [{ methods: ['crack-and-crevice', 'spot'], targets: ['bed-bugs', 'fleas'] }] },
]

/** Its registration in New York ended three months before the day: work with it since then is a stop. */
export const ENDED_IN_NEW_YORK = 'stillwater'
