import type { Coded } from '#shared/records/shapes'
import type { Reentry, WeatherReading } from '#shared/records/entry'
import type { Shown } from '#shared/records/difference'

type Words = Record<string, string>

/** The words of our code lists, and of what records say in codes. Keys are found by `tests/unit/records/catalogues.test.ts`, which holds them against the lists. */
export function useCatalogues() {
  const { t } = useI18n()
  const format = useFormat()
  const methods: Words = {
    'foundation-band': t('catalogues.methods.foundation-band'), 'crack-and-crevice': t('catalogues.methods.crack-and-crevice'), 'spot': t('catalogues.methods.spot'),
    'void-injection': t('catalogues.methods.void-injection'), 'broadcast': t('catalogues.methods.broadcast'), 'granules': t('catalogues.methods.granules'),
    'bait-placement': t('catalogues.methods.bait-placement'), 'bait-station': t('catalogues.methods.bait-station'), 'dust': t('catalogues.methods.dust'),
    'space-spray': t('catalogues.methods.space-spray'), 'soil-injection': t('catalogues.methods.soil-injection'), 'trench': t('catalogues.methods.trench'),
    'trunk-injection': t('catalogues.methods.trunk-injection'), 'foliar': t('catalogues.methods.foliar'), 'drench': t('catalogues.methods.drench'),
    'boom': t('catalogues.methods.boom'), 'fumigation': t('catalogues.methods.fumigation'),
  }
  const areas: Words = {
    'outside-wall': t('catalogues.areas.outside-wall'), 'foundation': t('catalogues.areas.foundation'), 'entry-points': t('catalogues.areas.entry-points'),
    'eaves': t('catalogues.areas.eaves'), 'kitchen': t('catalogues.areas.kitchen'), 'bathroom': t('catalogues.areas.bathroom'), 'bedroom': t('catalogues.areas.bedroom'),
    'living-room': t('catalogues.areas.living-room'), 'dining-room': t('catalogues.areas.dining-room'), 'basement': t('catalogues.areas.basement'),
    'attic': t('catalogues.areas.attic'), 'crawl-space': t('catalogues.areas.crawl-space'), 'garage': t('catalogues.areas.garage'),
    'wall-void': t('catalogues.areas.wall-void'), 'storeroom': t('catalogues.areas.storeroom'), 'drain': t('catalogues.areas.drain'),
    'waste-area': t('catalogues.areas.waste-area'), 'lawn': t('catalogues.areas.lawn'), 'beds': t('catalogues.areas.beds'),
    'trees-and-shrubs': t('catalogues.areas.trees-and-shrubs'), 'fence-line': t('catalogues.areas.fence-line'), 'paving': t('catalogues.areas.paving'),
    'field': t('catalogues.areas.field'), 'pond-edge': t('catalogues.areas.pond-edge'),
  }
  const targets: Words = {
    'ants': t('catalogues.targets.ants'), 'cockroaches': t('catalogues.targets.cockroaches'), 'spiders': t('catalogues.targets.spiders'),
    'earwigs': t('catalogues.targets.earwigs'), 'silverfish': t('catalogues.targets.silverfish'), 'crickets': t('catalogues.targets.crickets'),
    'centipedes': t('catalogues.targets.centipedes'), 'termites': t('catalogues.targets.termites'), 'carpenter-ants': t('catalogues.targets.carpenter-ants'),
    'bed-bugs': t('catalogues.targets.bed-bugs'), 'fleas': t('catalogues.targets.fleas'), 'ticks': t('catalogues.targets.ticks'),
    'mosquitoes': t('catalogues.targets.mosquitoes'), 'flies': t('catalogues.targets.flies'), 'wasps': t('catalogues.targets.wasps'),
    'stored-product-insects': t('catalogues.targets.stored-product-insects'), 'mice': t('catalogues.targets.mice'), 'rats': t('catalogues.targets.rats'),
    'grubs': t('catalogues.targets.grubs'), 'chinch-bugs': t('catalogues.targets.chinch-bugs'), 'aphids': t('catalogues.targets.aphids'),
    'mites': t('catalogues.targets.mites'), 'caterpillars': t('catalogues.targets.caterpillars'), 'broadleaf-weeds': t('catalogues.targets.broadleaf-weeds'),
    'crabgrass': t('catalogues.targets.crabgrass'), 'grass-weeds': t('catalogues.targets.grass-weeds'), 'leaf-disease': t('catalogues.targets.leaf-disease'),
  }
  const equipmentKinds: Words = {
    'hand-sprayer': t('catalogues.equipmentKinds.hand-sprayer'), 'backpack-sprayer': t('catalogues.equipmentKinds.backpack-sprayer'),
    'power-sprayer': t('catalogues.equipmentKinds.power-sprayer'), 'boom-sprayer': t('catalogues.equipmentKinds.boom-sprayer'),
    'mist-blower': t('catalogues.equipmentKinds.mist-blower'), 'fogger': t('catalogues.equipmentKinds.fogger'), 'hand-duster': t('catalogues.equipmentKinds.hand-duster'),
    'bait-gun': t('catalogues.equipmentKinds.bait-gun'), 'spreader': t('catalogues.equipmentKinds.spreader'), 'injector': t('catalogues.equipmentKinds.injector'),
  }
  const protective: Words = {
    'gloves': t('catalogues.protective.gloves'), 'long-sleeves': t('catalogues.protective.long-sleeves'), 'long-trousers': t('catalogues.protective.long-trousers'),
    'shoes-and-socks': t('catalogues.protective.shoes-and-socks'), 'boots': t('catalogues.protective.boots'), 'eye-protection': t('catalogues.protective.eye-protection'),
    'apron': t('catalogues.protective.apron'), 'coverall': t('catalogues.protective.coverall'), 'dust-mask': t('catalogues.protective.dust-mask'),
    'respirator': t('catalogues.protective.respirator'), 'hat': t('catalogues.protective.hat'),
  }
  const prevention: Words = {
    'sealed-gaps': t('catalogues.prevention.sealed-gaps'), 'door-sweep': t('catalogues.prevention.door-sweep'), 'screens': t('catalogues.prevention.screens'),
    'traps': t('catalogues.prevention.traps'), 'vacuumed': t('catalogues.prevention.vacuumed'), 'food-stored': t('catalogues.prevention.food-stored'),
    'waste-cleared': t('catalogues.prevention.waste-cleared'), 'leak-reported': t('catalogues.prevention.leak-reported'),
    'standing-water': t('catalogues.prevention.standing-water'), 'trimmed-plants': t('catalogues.prevention.trimmed-plants'),
    'wood-moved': t('catalogues.prevention.wood-moved'), 'mowing-height': t('catalogues.prevention.mowing-height'), 'watering': t('catalogues.prevention.watering'),
  }
  const siteKinds: Words = {
    'house': t('catalogues.siteKinds.house'), 'apartment': t('catalogues.siteKinds.apartment'), 'school': t('catalogues.siteKinds.school'),
    'child-care': t('catalogues.siteKinds.child-care'), 'restaurant': t('catalogues.siteKinds.restaurant'), 'food-plant': t('catalogues.siteKinds.food-plant'),
    'office': t('catalogues.siteKinds.office'), 'shop': t('catalogues.siteKinds.shop'), 'warehouse': t('catalogues.siteKinds.warehouse'),
    'hospital': t('catalogues.siteKinds.hospital'), 'hotel': t('catalogues.siteKinds.hotel'), 'lawn': t('catalogues.siteKinds.lawn'),
    'ornamentals': t('catalogues.siteKinds.ornamentals'), 'sports-turf': t('catalogues.siteKinds.sports-turf'), 'field-crop': t('catalogues.siteKinds.field-crop'),
    'orchard': t('catalogues.siteKinds.orchard'), 'greenhouse': t('catalogues.siteKinds.greenhouse'), 'right-of-way': t('catalogues.siteKinds.right-of-way'),
  }
  const nothingReasons: Words = {
    'none-found': t('catalogues.nothingReasons.none-found'), 'below-threshold': t('catalogues.nothingReasons.below-threshold'),
    'weather': t('catalogues.nothingReasons.weather'), 'no-access': t('catalogues.nothingReasons.no-access'), 'declined': t('catalogues.nothingReasons.declined'),
    'prevention-only': t('catalogues.nothingReasons.prevention-only'), 'inspection-only': t('catalogues.nothingReasons.inspection-only'),
    'no-product': t('catalogues.nothingReasons.no-product'),
  }
  const carriers: Words = {
    'water': t('catalogues.carriers.water'), 'oil': t('catalogues.carriers.oil'), 'liquid-fertilizer': t('catalogues.carriers.liquid-fertilizer'),
    'foam': t('catalogues.carriers.foam'),
  }
  const how: Words = {
    'measured': t('catalogues.how.measured'), 'estimated': t('catalogues.how.estimated'), 'plan': t('catalogues.how.plan'), 'computed': t('catalogues.how.computed'),
  }
  const setting: Words = {
    'indoors': t('catalogues.setting.indoors'), 'outdoors': t('catalogues.setting.outdoors'),
  }
  const did: Words = {
    'mixed': t('catalogues.did.mixed'), 'applied': t('catalogues.did.applied'), 'assisted': t('catalogues.did.assisted'), 'supervised': t('catalogues.did.supervised'),
    'trained': t('catalogues.did.trained'),
  }
  const sky: Words = {
    'clear': t('catalogues.sky.clear'), 'part-cloud': t('catalogues.sky.part-cloud'), 'overcast': t('catalogues.sky.overcast'), 'fog': t('catalogues.sky.fog'),
    'drizzle': t('catalogues.sky.drizzle'), 'rain': t('catalogues.sky.rain'), 'snow': t('catalogues.sky.snow'),
  }
  const wind: Words = {
    'calm': t('catalogues.wind.calm'), 'N': t('catalogues.wind.N'), 'NE': t('catalogues.wind.NE'), 'E': t('catalogues.wind.E'), 'SE': t('catalogues.wind.SE'),
    'S': t('catalogues.wind.S'), 'SW': t('catalogues.wind.SW'), 'W': t('catalogues.wind.W'), 'NW': t('catalogues.wind.NW'), 'variable': t('catalogues.wind.variable'),
  }
  const where: Words = {
    'site': t('catalogues.where.site'), 'nearby': t('catalogues.where.nearby'), 'station': t('catalogues.where.station'),
  }
  const noWeather: Words = {
    'indoors': t('catalogues.noWeather.indoors'), 'not-taken': t('catalogues.noWeather.not-taken'),
  }

  /** A code list as options, in the list's own order: code and words. */
  const options = (list: readonly string[], words: Words) => list.map(code => ({ value: code, label: words[code] ?? code }))
  /** What goes on record: the code with the words as shown. */
  const coded = (words: Words, code: string): Coded => ({ code, text: words[code] ?? code })

  function reentry(of: Reentry): string {
    if (of.until === 'hours') return t('catalogues.reentry.hours', { hours: format.number(of.hours) })
    if (of.until === 'label') return of.words
    return { 'dry': t('catalogues.reentry.dry'), 'dusts-settled': t('catalogues.reentry.dusts-settled'), 'ventilated': t('catalogues.reentry.ventilated'), 'none-stated': t('catalogues.reentry.none-stated') }[of.until]
  }

  /** `68 °F, wind 4 mph from SW, clear`: what was taken, in one line. */
  function reading({ temperature, wind: blowing, humidity, sky: cover }: Pick<WeatherReading, 'temperature' | 'wind' | 'humidity' | 'sky'>): string {
    const from = blowing && 'speed' in blowing && blowing.from ? wind[blowing.from] ?? blowing.from : null
    const speed = blowing && 'speed' in blowing ? format.quantity(blowing.speed) : null
    return [
      temperature && format.quantity(temperature),
      blowing && 'calm' in blowing && wind.calm,
      speed && (from ? t('visit.weather.windFrom', { speed, from }) : t('visit.weather.windSpeed', { speed })),
      humidity && t('visit.weather.humid', { percent: format.percent(humidity) }),
      cover && sky[cover]?.toLowerCase(),
    ].filter(Boolean).join(', ') || t('catalogues.noWeather.not-taken')
  }

  /** One value of a record in words (see `factRows` and `differences`). */
  function shown(value: Shown): string {
    switch (value.kind) {
      case 'text': return value.text
      case 'figure': return format.quantity(value.figure)
      case 'instant': return format.dateTime(value.at, value.zone)
      case 'code': return ({ 'how': how, 'setting': setting, 'no-weather': noWeather })[value.of][value.code] ?? value.code
      case 'did': return value.did.map(one => did[one] ?? one).join(', ')
      case 'count': return t('visit.counted', { count: format.quantity({ value: value.counted.count, unit: value.counted.of }), each: format.quantity(value.counted.each) })
      case 'reentry': return reentry(value.reentry)
      case 'reading': return `${format.time(value.reading.at, value.zone)}: ${reading(value.reading)}`
    }
  }
  const shownList = (values: readonly Shown[]) => values.map(shown).join(', ')

  return { methods, areas, targets, equipmentKinds, protective, prevention, siteKinds, nothingReasons, carriers, how, setting, did, sky, wind, where, noWeather, options, coded, reentry, reading, shown, shownList }
}
