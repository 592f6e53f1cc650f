import type { Kit, LastEntry, LastVisit } from '#shared/books/kit'
import type { Draft, DraftArea, DraftLine, DraftTreatment } from '#shared/records/draft'
import { emptyFigure, licenceFor, newTreatment } from '#shared/records/draft'
import { amountUnits } from '#shared/records/draft-figures'
import type { EntryFacts } from '#shared/records/entry'
import { referId } from '#shared/records/shapes'
import { localDay } from '#shared/time/zoned'

/** The label version in force that day; without one the product alone goes on. */
function labelNow(kit: Kit, productId: string | null, day: string): string | null {
  return kit.labels.find(label => label.productId === productId && label.from <= day && (label.to === null || day <= label.to))?.id ?? null
}

function lineAgain(kit: Kit, line: EntryFacts['lines'][number], product: LastEntry['products'][number] | undefined, day: string): DraftLine {
  const labelVersionId = labelNow(kit, product?.id ?? null, day)
  const unit = line.amount?.unit ?? (line.rate ? amountUnits(line.rate.unit)[0] : undefined) ?? 'fl_oz'
  return {
    labelVersionId, product: labelVersionId ? null : product?.id ? { id: product.id } : line.product, rate: line.rate ?? emptyFigure('fl_oz/gal'), amount: emptyFigure(unit), amountGiven: 'not-given',
    counted: line.counted ? { of: line.counted.of, count: '', each: line.counted.each } : null, lot: '',
  }
}

/** What may go on as it was: products, rate, targets, method, equipment, the names of areas. Amounts, sizes, times and weather stay empty for the eye. */
export function treatmentAgain(kit: Kit, { facts, products }: LastEntry, { id, country, day }: { id: string, country: string, day: string }): DraftTreatment {
  const fresh = newTreatment(id, country)
  return {
    ...fresh, method: facts.method, equipment: facts.equipment, targets: facts.targets, prevention: [],
    // a tank is never the same one twice: products drawn from it then have to be chosen anew
    lines: facts.mixId ? [] : facts.lines.map((line, n) => lineAgain(kit, line, products[n], day)),
    finished: emptyFigure(facts.finished?.unit ?? fresh.finished.unit),
    areas: facts.areas.map((area): DraftArea => ({ place: area.place, setting: area.setting, size: emptyFigure(area.size?.unit ?? 'sq_ft'), how: area.how })),
  }
}

/** Last visit's people go on only when the person who writes was one of them; licences are looked up for today. */
export function peopleAgain(kit: Kit, draft: Draft, last: LastVisit, region: string, day: string): Draft['people'] {
  const [me] = draft.people
  const before = last.entries[0]?.facts.people ?? []
  if (!me || !before.some(p => referId(p.person) === referId(me.person))) return draft.people
  return before.map((p) => {
    const person = kit.people.find(one => one.id === referId(p.person))
    return { ...p, licenceId: licenceFor(person, region, day) }
  })
}

export const takeFinished = (treatment: DraftTreatment, last: EntryFacts): DraftTreatment =>
  last.finished ? { ...treatment, finished: last.finished, finishedGiven: 'as-last-time' } : treatment

/** All sizes as last time, by the names of the areas. */
export function takeAreas(treatment: DraftTreatment, last: EntryFacts): DraftTreatment {
  const areas = treatment.areas.map((area) => {
    const before = last.areas.find(old => old.place.text === area.place.text)
    return before?.size ? { ...area, size: before.size, how: before.how } : area
  })
  return { ...treatment, areas, areasGiven: 'as-last-time' }
}

/** An entry on record as a draft of one treatment, for amending: everything stands as it was signed. */
export function draftOf(facts: EntryFacts, id: string, country: string): Draft {
  const moment = (at: string) => ({ given: 'entered' as const, at, day: localDay(at, facts.zone), clock: at.slice(11, 16) })
  const blank = newTreatment(id, country)
  return {
    v: 1, id: facts.visitId ?? id, begunAt: facts.finishedAt, place: facts.place, branchId: facts.branchId, zone: facts.zone, country, arrived: moment(facts.startedAt), left: moment(facts.finishedAt),
    treatments: [{
      ...blank, mixId: facts.mixId, drawn: facts.drawn ?? blank.drawn, method: facts.method, equipment: facts.equipment, targets: facts.targets,
      lines: facts.lines.map(line => ({ ...line, rate: line.rate ?? emptyFigure('fl_oz/gal'), amount: line.amount ?? emptyFigure('fl_oz'), amountGiven: 'entered', lot: line.lot ?? '' })),
      finished: facts.finished ?? blank.finished, finishedGiven: facts.finished ? 'entered' : 'not-given', areas: facts.areas.map(area => ({ ...area, size: area.size ?? emptyFigure('sq_ft') })), areasGiven: 'entered',
      reentry: facts.reentry, protective: facts.protective, prevention: facts.prevention, advice: facts.advice ?? '',
    }],
    weather: facts.weather.map(r => ({
      at: r.at, where: r.where, temperature: r.temperature ?? emptyFigure('deg_F'), wind: r.wind === null ? 'not-taken' : 'calm' in r.wind ? 'calm' : 'blowing',
      speed: r.wind && 'speed' in r.wind ? r.wind.speed : emptyFigure('mph'), from: r.wind && 'speed' in r.wind ? r.wind.from : null, humidity: r.humidity ?? '', sky: r.sky, source: r.source,
    })),
    noWeather: facts.noWeather, people: facts.people, nothing: null, followUpOn: '', note: '', explanation: '', notify: [],
  }
}
