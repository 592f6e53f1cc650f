import type { Area, EntryFacts, Reentry, WeatherReading } from '#shared/records/entry'
import type { Writing } from '#shared/reports/writing'

/** What records say in codes, in words. */
export function factWords(write: Writing) {
  const { words, figure, percent, number } = write
  const sky = {
    'clear': words('catalogues.sky.clear'), 'part-cloud': words('catalogues.sky.part-cloud'), 'overcast': words('catalogues.sky.overcast'), 'fog': words('catalogues.sky.fog'),
    'drizzle': words('catalogues.sky.drizzle'), 'rain': words('catalogues.sky.rain'), 'snow': words('catalogues.sky.snow'),
  }
  const windFrom = {
    N: words('paper.wind.N'), NE: words('paper.wind.NE'), E: words('paper.wind.E'), SE: words('paper.wind.SE'), S: words('paper.wind.S'), SW: words('paper.wind.SW'), W: words('paper.wind.W'), NW: words('paper.wind.NW'),
    variable: words('paper.wind.variable'),
  }
  const where = { site: words('catalogues.where.site'), nearby: words('catalogues.where.nearby'), station: words('catalogues.where.station') }
  const did = { mixed: words('catalogues.did.mixed'), applied: words('catalogues.did.applied'), assisted: words('catalogues.did.assisted'), supervised: words('catalogues.did.supervised'), trained: words('catalogues.did.trained') }
  const how = { measured: words('catalogues.how.measured'), estimated: words('catalogues.how.estimated'), plan: words('catalogues.how.plan'), computed: words('catalogues.how.computed') }
  const setting = { indoors: words('catalogues.setting.indoors'), outdoors: words('catalogues.setting.outdoors') }
  const noWeather = { 'indoors': words('catalogues.noWeather.indoors'), 'not-taken': words('catalogues.noWeather.not-taken') }
  const given = {
    'entered': words('catalogues.given.entered'), 'as-last-time': words('catalogues.given.as-last-time'), 'now': words('catalogues.given.now'), 'station': words('catalogues.given.station'),
    'computed': words('catalogues.given.computed'), 'not-given': words('catalogues.given.not-given'),
  }

  function wind(of: WeatherReading['wind']): string | null {
    if (of === null) return words('paper.wind.notTaken')
    if ('calm' in of) return words('paper.wind.calm')
    return of.from ? words('paper.wind.from', { speed: figure(of.speed), from: windFrom[of.from] }) : words('paper.wind.speed', { speed: figure(of.speed) })
  }
  /** `64 °F, wind from the south-west 4 mph, clear`; what was not taken is said for the wind, since blank is not calm. */
  const reading = (r: WeatherReading): string =>
    [r.temperature && figure(r.temperature), wind(r.wind), r.humidity && words('paper.humidity', { percent: percent(r.humidity) }), r.sky && sky[r.sky].toLowerCase()].filter(Boolean).join(', ')

  /** The label's own condition, as a record states it. */
  function reentry(of: Reentry): string {
    switch (of.until) {
      case 'dry': return words('catalogues.reentry.dry')
      case 'dusts-settled': return words('catalogues.reentry.dusts-settled')
      case 'ventilated': return words('catalogues.reentry.ventilated')
      case 'hours': return words('catalogues.reentry.hours', { hours: number(of.hours) })
      case 'label': return words('paper.labelSays', { words: of.words })
      case 'none-stated': return words('catalogues.reentry.none-stated')
    }
  }
  const area = ({ place, size }: Area): string => size ? words('paper.areaOf', { place: place.text, size: figure(size) }) : place.text
  const counted = (of: NonNullable<EntryFacts['lines'][number]['counted']>): string => words('paper.counted', { count: figure({ value: of.count, unit: of.of }), each: figure(of.each) })

  return { sky, where, did, how, setting, noWeather, given, reading, reentry, area, counted, wind }
}
export type FactWords = ReturnType<typeof factWords>
