/**
 * What the form offers to choose from: codes of our own, worded by `i18n/locales/<language>/catalogues.json`. A record keeps the code and
 * the words as shown. Lists only grow: a code stands in records. Which of them belong on such a list is common practice, no source.
 */
export const METHODS = [
  'foundation-band', 'crack-and-crevice', 'spot', 'void-injection', 'broadcast', 'granules', 'bait-placement', 'bait-station', 'dust', 'space-spray',
  'soil-injection', 'trench', 'trunk-injection', 'foliar', 'drench', 'boom', 'fumigation',
] as const

/** The part of a place that was treated. */
export const AREAS = [
  'outside-wall', 'foundation', 'entry-points', 'eaves', 'kitchen', 'bathroom', 'bedroom', 'living-room', 'dining-room', 'basement', 'attic', 'crawl-space', 'garage',
  'wall-void', 'storeroom', 'drain', 'waste-area', 'lawn', 'beds', 'trees-and-shrubs', 'fence-line', 'paving', 'field', 'pond-edge',
] as const

export const TARGETS = [
  'ants', 'cockroaches', 'spiders', 'earwigs', 'silverfish', 'crickets', 'centipedes', 'termites', 'carpenter-ants', 'bed-bugs', 'fleas', 'ticks', 'mosquitoes', 'flies', 'wasps',
  'stored-product-insects', 'mice', 'rats', 'grubs', 'chinch-bugs', 'aphids', 'mites', 'caterpillars', 'broadleaf-weeds', 'crabgrass', 'grass-weeds', 'leaf-disease',
] as const

export const EQUIPMENT_KINDS = ['hand-sprayer', 'backpack-sprayer', 'power-sprayer', 'boom-sprayer', 'mist-blower', 'fogger', 'hand-duster', 'bait-gun', 'spreader', 'injector'] as const

export const PROTECTIVE = ['gloves', 'long-sleeves', 'long-trousers', 'shoes-and-socks', 'boots', 'eye-protection', 'apron', 'coverall', 'dust-mask', 'respirator', 'hat'] as const

/** What was done against the pest beside, or instead of, a product. */
export const PREVENTION = [
  'sealed-gaps', 'door-sweep', 'screens', 'traps', 'vacuumed', 'food-stored', 'waste-cleared', 'leak-reported', 'standing-water', 'trimmed-plants', 'wood-moved', 'mowing-height', 'watering',
] as const

/** What kind of place it is, as labels name their sites. */
export const SITE_KINDS = [
  'house', 'apartment', 'school', 'child-care', 'restaurant', 'food-plant', 'office', 'shop', 'warehouse', 'hospital', 'hotel', 'lawn', 'ornamentals', 'sports-turf', 'field-crop', 'orchard', 'greenhouse', 'right-of-way',
] as const

export const NOTHING_REASONS = ['none-found', 'below-threshold', 'weather', 'no-access', 'declined', 'prevention-only', 'inspection-only', 'no-product'] as const

/** What a tank is filled up with. */
export const CARRIERS = ['water', 'oil', 'liquid-fertilizer', 'foam'] as const

export type Method = (typeof METHODS)[number]
export type AreaCode = (typeof AREAS)[number]
export type Target = (typeof TARGETS)[number]
export type EquipmentKind = (typeof EQUIPMENT_KINDS)[number]
export type Protective = (typeof PROTECTIVE)[number]
export type Prevention = (typeof PREVENTION)[number]
export type SiteKind = (typeof SITE_KINDS)[number]
export type NothingReason = (typeof NOTHING_REASONS)[number]
export type Carrier = (typeof CARRIERS)[number]

/** Parts of a place that lie inside: what is chosen first for the setting, to be changed with a tap. */
export const INSIDE: readonly AreaCode[] = ['kitchen', 'bathroom', 'bedroom', 'living-room', 'dining-room', 'basement', 'attic', 'crawl-space', 'garage', 'wall-void', 'storeroom', 'drain']
