import type { Difference, FactLabel, Shown } from '#shared/records/difference'
import { factWords } from '#shared/reports/fact-words'
import type { Writing } from '#shared/reports/writing'

/** What differs between two versions of an entry, one line each: `Amount 1: 0.90 fl oz → 0.75 fl oz`. */
export function differenceWords(write: Writing) {
  const { words } = write
  const facts = factWords(write)
  const labels: Record<FactLabel, string> = {
    place: words('paper.facts.place'),
    branch: words('paper.facts.branch'),
    startedAt: words('paper.facts.startedAt'),
    finishedAt: words('paper.facts.finishedAt'),
    zone: words('paper.facts.zone'),
    method: words('paper.facts.method'),
    equipment: words('paper.facts.equipment'),
    targets: words('paper.facts.targets'),
    mix: words('paper.facts.mix'),
    drawn: words('paper.facts.drawn'),
    finished: words('paper.facts.finished'),
    product: words('paper.facts.product'),
    labelVersion: words('paper.facts.labelVersion'),
    rate: words('paper.facts.rate'),
    amount: words('paper.facts.amount'),
    counted: words('paper.facts.counted'),
    lot: words('paper.facts.lot'),
    area: words('paper.facts.area'),
    setting: words('paper.facts.setting'),
    size: words('paper.facts.size'),
    how: words('paper.facts.how'),
    weather: words('paper.facts.weather'),
    noWeather: words('paper.facts.noWeather'),
    person: words('paper.facts.person'),
    did: words('paper.facts.did'),
    licence: words('paper.facts.licence'),
    responsible: words('paper.facts.responsible'),
    reentry: words('paper.facts.reentry'),
    protective: words('paper.facts.protective'),
    prevention: words('paper.facts.prevention'),
    advice: words('paper.facts.advice'),
  }
  const codes = { 'how': facts.how, 'setting': facts.setting, 'no-weather': facts.noWeather } as Record<'how' | 'setting' | 'no-weather', Record<string, string>>

  function shown(value: Shown): string {
    switch (value.kind) {
      case 'text': return value.text
      case 'figure': return write.figure(value.figure)
      case 'instant': return write.dateTime(value.at, value.zone)
      case 'code': return codes[value.of][value.code] ?? value.code
      case 'did': return value.did.map(one => facts.did[one]).join(', ')
      case 'count': return facts.counted(value.counted)
      case 'reentry': return facts.reentry(value.reentry)
      case 'reading': return words('notices.weatherAt', { time: write.time(value.reading.at, value.zone), reading: facts.reading(value.reading) })
    }
  }
  const side = (values: readonly Shown[]) => values.map(shown).join(', ') || words('paper.record.history.nothing')

  return ({ label, n, before, after }: Difference): string => words('paper.record.history.difference', {
    label: n === null ? labels[label] : words('paper.record.history.numbered', { label: labels[label], n: String(n) }), before: side(before), after: side(after),
  })
}
