import type { EntryFacts } from '#shared/records/entry'
import { linesInUse } from '#shared/records/lines'
import type { LineInUse } from '#shared/records/lines'
import type { EntrySnapshot } from '#shared/records/snapshot'
import { factWords } from '#shared/reports/fact-words'
import { ingredientWords, numberWords, productName, signalWords } from '#shared/reports/product-words'
import type { RecordRow, RecordTable } from '#shared/reports/record-model'
import type { Writing } from '#shared/reports/writing'

interface Entry { facts: EntryFacts, snapshot: EntrySnapshot }
const lines = (...texts: (string | null | undefined | false)[]): string[] => texts.filter((t): t is string => Boolean(t))

export function whereRows({ facts, snapshot }: Entry, write: Writing): RecordRow[] {
  const { words, figure, dateTime } = write
  const { place, equipment, mix } = snapshot
  const roles = {
    payer: words('paper.record.roles.payer'), owner: words('paper.record.roles.owner'), manager: words('paper.record.roles.manager'), occupant: words('paper.record.roles.occupant'),
    operator: words('paper.record.roles.operator'), neighbour: words('paper.record.roles.neighbour'), notice: words('paper.record.roles.notice'),
  }
  const tank = mix && words('paper.record.mixOf', { finished: figure(mix.finished), products: write.list(mix.lines.map(l => words('paper.record.mixProduct', { amount: figure(l.amount), product: l.product.name }))) })
  return [
    { label: words('paper.record.rows.address'), lines: lines(!place.address.startsWith(place.name) && place.name, place.address) },
    { label: words('paper.record.rows.county'), lines: lines([place.county, place.region].filter(Boolean).join(', ')) },
    { label: words('paper.record.rows.site'), lines: lines(place.siteKind?.text) },
    { label: words('paper.record.rows.parties'), lines: place.parties.map(p => words('paper.record.siteParty', { name: p.name, role: roles[p.role] })) },
    { label: words('paper.record.rows.started'), lines: [dateTime(facts.startedAt, facts.zone)] },
    { label: words('paper.record.rows.finished'), lines: [dateTime(facts.finishedAt, facts.zone)] },
    { label: words('paper.record.rows.zone'), lines: [facts.zone] },
    { label: words('paper.record.rows.method'), lines: [facts.method.text] },
    { label: words('paper.record.rows.equipment'), lines: lines([equipment?.name, equipment?.kind?.text, equipment?.number].filter(Boolean).join(', ')) },
    { label: words('paper.record.rows.targets'), lines: lines(facts.targets.map(t => t.text).join(', ')) },
    { label: words('paper.record.rows.mix'), lines: lines(tank) },
    { label: words('paper.record.rows.drawn'), lines: lines(facts.drawn && figure(facts.drawn)) },
    { label: words('paper.record.rows.spray'), lines: lines(facts.finished && figure(facts.finished)) },
  ]
}

export function productTable({ facts, snapshot }: Entry, write: Writing): RecordTable {
  const { words } = write
  const counted = (of: LineInUse) => of.line?.counted && factWords(write).counted(of.line.counted)
  const amount = (of: LineInUse) => of.amount === null ? words('paper.notNoted') : of.share ? words('paper.record.shareOfMix', { amount: write.figure(of.amount) }) : write.figure(of.amount)
  return {
    heads: [words('paper.record.heads.product'), words('paper.record.heads.rate'), words('paper.record.heads.amount'), words('paper.record.heads.lot')], widths: [48, 20, 20, 12],
    rows: linesInUse(facts, snapshot).map((used, n) => {
      const { shot: { product, label } } = used
      return [
        lines(productName(product, write), numberWords(product, write), product.restrictedUse && words('paper.restrictedUse'), ingredientWords(product, write),
          [signalWords(product, write), label ? words('paper.record.labelOf', { day: write.day(label.labelDate) }) : words('paper.record.noLabel')].filter(Boolean).join(', ')),
        lines(used.line?.rate && write.figure(used.line.rate)),
        lines(amount(used), counted(used)),
        lines(used.line?.lot ?? snapshot.mix?.lines[n]?.lot),
      ]
    }),
  }
}

export function areaTable(facts: EntryFacts, write: Writing): RecordTable {
  const { words } = write
  const { how, setting } = factWords(write)
  return {
    heads: [words('paper.record.heads.part'), words('paper.record.heads.setting'), words('paper.record.heads.size'), words('paper.record.heads.how')], widths: [48, 20, 20, 12],
    rows: facts.areas.map(area => [[area.place.text], [setting[area.setting]], [area.size ? write.figure(area.size) : words('paper.notNoted')], [how[area.how]]]),
  }
}

/** Null where no reading was taken: then the reason stands in its place. */
export function weatherTable(facts: EntryFacts, write: Writing): RecordTable | null {
  const { words } = write
  const { reading, where } = factWords(write)
  if (facts.weather.length === 0) return null
  return {
    heads: [words('paper.record.heads.reading'), words('paper.record.heads.time'), words('paper.record.heads.where')], widths: [48, 20, 32],
    rows: facts.weather.map(r => [[reading(r)], [write.time(r.at, facts.zone)], [where[r.where]]]),
  }
}

export function peopleTable({ facts, snapshot }: Entry, write: Writing): RecordTable {
  const { words } = write
  const { did } = factWords(write)
  return {
    heads: [words('paper.record.heads.person'), words('paper.record.heads.did'), words('paper.record.heads.licence'), words('paper.record.heads.expires')], widths: [30, 18, 36, 16],
    rows: facts.people.map((person, n) => {
      const shot = snapshot.people[n]
      const licence = shot?.licence
      const given = licence && { className: licence.className, region: licence.region, categories: licence.categories.join(', ') }
      return [
        [person.responsible ? words('paper.record.responsible', { name: shot?.name ?? '' }) : shot?.name ?? ''],
        [person.did.map(one => did[one]).join(', ')],
        licence && given ? [licence.number, licence.categories.length > 0 ? words('paper.record.classOf', given) : words('paper.record.classBare', given)] : [words('paper.record.noLicence')],
        licence ? [write.day(licence.expires)] : [],
      ]
    }),
  }
}

export function keepOffRows(facts: EntryFacts, write: Writing): RecordRow[] {
  const { words } = write
  return [
    { label: words('paper.record.rows.reentry'), lines: [factWords(write).reentry(facts.reentry)] },
    { label: words('paper.record.rows.protective'), lines: [facts.protective.map(p => p.text).join(', ') || words('paper.none')] },
    { label: words('paper.record.rows.prevention'), lines: lines(facts.prevention.map(p => p.text).join(', ')) },
    { label: words('paper.record.rows.advice'), lines: facts.advice?.split('\n') ?? [] },
  ]
}
