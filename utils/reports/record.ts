import { toHex } from '#shared/ledger/hash'
import type { Leaf } from '#shared/records/body'
import { entryReference, factsHash } from '#shared/records/projection'
import { stand } from '#shared/records/standing'
import { localDay } from '#shared/time/zoned'
import { factWords } from '#shared/reports/fact-words'
import { findingWords } from '#shared/reports/finding-words'
import { historySteps, isVersion } from '#shared/reports/record-history'
import type { Version } from '#shared/reports/record-history'
import { areaTable, keepOffRows, peopleTable, productTable, weatherTable, whereRows } from '#shared/reports/record-parts'
import { paperOf } from '#shared/reports/record-model'
import type { RecordFinding, RecordModel, RecordRow, RecordSection } from '#shared/reports/record-model'
import type { Words } from '#shared/reports/words'
import { writing } from '#shared/reports/writing'
import type { Writing } from '#shared/reports/writing'

/**
 * One entry with its history, from its leaves in order. @param forFirm with the firm's own words and findings; others see what any party
 * to the place may see. @throws RangeError when the leaves are no entry's.
 */
export function recordModel(leaves: readonly Leaf[], words: Words, forFirm: boolean, language = 'en-US'): RecordModel {
  const [root] = leaves
  const version = leaves.filter(isVersion).at(-1)
  const head = stand(leaves)?.head
  if (root?.kind !== 'application' || !version || !head) throw new RangeError('not an entry')
  const write = writing(words, language)
  const { facts, snapshot } = version.body
  const responsible = snapshot.people[facts.people.findIndex(p => p.responsible)]
  const hash = toHex(factsHash(facts))
  const reference = entryReference(root.body.facts)
  const day = localDay(facts.finishedAt, facts.zone)
  const struck = head.status === 'struck'
  return {
    language, paper: paperOf(snapshot.place.country), createdAt: leaves.at(-1)?.receivedAt ?? root.receivedAt,
    title: struck ? words('paper.record.struck') : head.status === 'amended' ? words('paper.record.corrected') : words('paper.record.title'),
    reference, hash, place: [snapshot.place.name, snapshot.place.town].filter(Boolean).join(', '),
    when: words('notices.when', { day: write.dayLong(day), from: write.time(facts.startedAt, facts.zone), to: write.timeZoned(facts.finishedAt, facts.zone) }),
    standing: { word: standingWord(head, words), struck, plain: head.status === 'on-record' },
    key: [
      { label: words('paper.record.key.by'), value: responsible?.name ?? '', beside: snapshot.firm.name },
      responsible?.licence
        ? { label: words('paper.record.key.licence'), value: responsible.licence.number, beside: words('paper.record.licenceUntil', { className: responsible.licence.className, region: responsible.licence.region, day: write.day(responsible.licence.expires) }) }
        : { label: words('paper.record.key.licence'), value: words('paper.record.noLicence'), beside: '' },
    ],
    sections: [...bodySections(version, write), ...(forFirm ? ownSections(version, write) : []), ...historySection(leaves, write), proofSection(root, hash, write)],
    cautions: [words('paper.record.cautions.label'), words('paper.record.cautions.proof')],
    foot: words('paper.record.foot', { firm: snapshot.firm.name, reference }),
    page: words('paper.record.page', { page: '{page}', pages: '{pages}' }),
  }
}

function standingWord({ status, confirmation }: NonNullable<ReturnType<typeof stand>>['head'], words: Words): string {
  const is = { 'on-record': words('paper.record.status.on-record'), 'amended': words('paper.record.status.amended'), 'struck': words('paper.record.status.struck') }[status]
  const said = { 'none-owed': '', 'owed': words('common.standing.owed'), 'confirmed': words('common.standing.confirmed'), 'disputed': words('common.standing.disputed'), 'cannot-be-had': words('common.standing.cannot-be-had') }[confirmation]
  return [is, said].filter(Boolean).join(' · ')
}

function bodySections({ body: { facts, snapshot } }: Version, write: Writing): RecordSection[] {
  const { words } = write
  const { firm, branch } = snapshot
  const readings = weatherTable(facts, write)
  const firmRows: RecordRow[] = [
    { label: words('paper.record.rows.firm'), lines: [firm.name, firm.address] },
    { label: words('paper.record.rows.branch'), lines: [branch.name, branch.address] },
    { label: words('paper.record.rows.phone'), lines: [branch.phone] },
    { label: words('paper.record.rows.registrations'), lines: branch.registrations.map(r => words('paper.registration', { kind: r.kind, number: r.number, region: r.region })) },
  ]
  return [
    { kind: 'rows', title: words('paper.record.sections.where'), rows: filled(whereRows({ facts, snapshot }, write)) },
    { kind: 'table', title: words('paper.record.sections.what'), table: productTable({ facts, snapshot }, write) },
    { kind: 'table', title: words('paper.record.sections.areas'), table: areaTable(facts, write) },
    readings
      ? { kind: 'table', title: words('paper.record.sections.weather'), table: readings }
      : { kind: 'rows', title: words('paper.record.sections.weather'), rows: [{ label: words('paper.record.rows.noWeather'), lines: [factWords(write).noWeather[facts.noWeather ?? 'not-taken']] }] },
    { kind: 'table', title: words('paper.record.sections.people'), table: peopleTable({ facts, snapshot }, write) },
    { kind: 'rows', title: words('paper.record.sections.keepOff'), rows: filled(keepOffRows(facts, write)) },
    { kind: 'rows', title: words('paper.record.sections.firm'), rows: filled(firmRows) },
  ]
}
const filled = (rows: RecordRow[]): RecordRow[] => rows.filter(row => row.lines.some(Boolean))

/** Kept beside the body and shown to the firm alone: note, explanation, where figures came from, findings. */
function ownSections({ inner: { words: own, findings } }: Version, write: Writing): RecordSection[] {
  const { words } = write
  const { given } = factWords(write)
  const came = [
    words('paper.record.given.finished', { how: given[own.given.finished] }), words('paper.record.given.amounts', { how: given[own.given.amounts] }), words('paper.record.given.areas', { how: given[own.given.areas] }),
    words('paper.record.given.times', { how: given[own.given.times] }), words('paper.record.given.weather', { how: given[own.given.weather] }),
  ]
  const rows: RecordRow[] = [
    { label: words('paper.record.rows.note'), lines: own.note?.split('\n') ?? [] },
    { label: words('paper.record.rows.explanation'), lines: own.explanation?.split('\n') ?? [] },
    { label: words('paper.record.rows.given'), lines: [came.join(', ')] },
  ]
  const say = findingWords(write)
  const outcome = { stop: words('paper.record.outcome.stop'), query: words('paper.record.outcome.query'), note: words('paper.record.outcome.note') }
  const found: RecordFinding[] = findings.map(f => ({
    outcome: f.outcome, word: outcome[f.outcome],
    lines: [words('paper.record.finding', { name: say.names[f.check], sentence: say.sentence(f) }), f.seen ? words('paper.record.findingSeen') : words('paper.record.findingUnseen')],
  }))
  return [
    { kind: 'rows', title: words('paper.record.sections.own'), rows: filled(rows) },
    ...(found.length > 0 ? [{ kind: 'findings' as const, title: words('paper.record.sections.findings'), findings: found }] : []),
  ]
}

function historySection(leaves: readonly Leaf[], write: Writing): RecordSection[] {
  return [{ kind: 'history', title: write.words('paper.record.sections.history'), steps: historySteps(leaves, write) }]
}

function proofSection(root: Leaf<'application'>, hash: string, write: Writing): RecordSection {
  const { words } = write
  return {
    kind: 'rows', title: words('paper.record.sections.proof'),
    rows: [
      { label: words('paper.record.rows.received'), lines: [write.dateTime(root.receivedAt, root.body.facts.zone)] },
      { label: words('paper.record.rows.hash'), lines: [hash.slice(0, 32), hash.slice(32)] },
    ],
  }
}
