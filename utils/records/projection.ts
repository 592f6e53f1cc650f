import { sha256 } from '#shared/ledger/hash'
import { canonicalBytes } from '#shared/ledger/canonical'
import { reference } from '#shared/ledger/ids'
import { localDay, toUtc } from '#shared/time/zoned'
import { toBase } from '#shared/units/quantity'
import type { Quantity } from '#shared/units/quantity'
import type { Leaf } from '#shared/records/body'
import type { EntryFacts } from '#shared/records/entry'
import { referId } from '#shared/records/shapes'
import type { EntrySnapshot } from '#shared/records/snapshot'
import { basicNumber } from '#shared/registration/basic'
import { linesInUse } from '#shared/records/lines'
import type { Facts, FactsRows } from '#shared/records/rows'

/** SHA-256 of a canonical submission: what idempotency compares, and what a visit names its parts by. */
export const submissionHash = (submission: unknown): Uint8Array => sha256(canonicalBytes(submission))
/** SHA-256 of the canonical facts: what the mark is drawn from. */
export const factsHash = (facts: unknown): Uint8Array => sha256(canonicalBytes(facts))

/** An entry's short name: local day of the finish as first signed, and the id's last 30 bits. */
export const entryReference = (facts: Pick<EntryFacts, 'id' | 'finishedAt' | 'zone'>): string => reference(localDay(facts.finishedAt, facts.zone), facts.id)

const quantity = (q: Quantity | null) => q ? { value: q.value, unit: q.unit, base: toBase(q) } : { value: null, unit: null, base: null }

/**
 * Facts: the rows that one leaf gives, a function of its body and inner part alone.
 * @param rootReference the reference of the root (an amendment keeps it).
 */
export function project(leaf: Leaf, rootReference: string): Facts {
  switch (leaf.kind) {
    case 'visit': return { visit: [visitRow(leaf)] }
    case 'mix': return mixRows(leaf)
    case 'application':
    case 'amendment': return entryRows(leaf, rootReference)
    case 'strike': {
      const { id, root, head, reason } = leaf.body.facts
      return { strike: [{ seq: leaf.seq, id, root, head, reason, by_person: signer(leaf) }] }
    }
    case 'acknowledgement': {
      const { id, root, head, says, because } = leaf.body.facts
      return { acknowledgement: [{ seq: leaf.seq, id, root, head, says, because, by_person: signer(leaf) }] }
    }
    case 'notice': {
      const { id, visitId, partyId, channel, contentHash } = leaf.body.facts
      return { notice_leaf: [{ seq: leaf.seq, id, visit_id: visitId, party_id: partyId, channel, content_hash: contentHash }] }
    }
  }
}

/** Who signed a leaf: a person's id, or the job's name. */
export const signer = (leaf: Leaf): string => 'person' in leaf.body.by ? leaf.body.by.person : leaf.body.by.job

function visitRow(leaf: Leaf<'visit'>): FactsRows['visit'] {
  const { facts, snapshot } = leaf.body
  return {
    seq: leaf.seq, id: facts.id, branch_id: facts.branchId, place_id: referId(facts.place), place_name: snapshot.place.name, arrived_at: toUtc(facts.arrivedAt), left_at: toUtc(facts.leftAt),
    zone: facts.zone, local_day: localDay(facts.leftAt, facts.zone), nothing_code: facts.nothing?.code ?? null, nothing_text: facts.nothing?.text ?? null, follow_up_on: facts.followUpOn,
    signer: signer(leaf), submission_hash: submissionHash({ facts, words: leaf.inner.words }),
  }
}

function mixRows(leaf: Leaf<'mix'>): Facts {
  const { facts, snapshot } = leaf.body
  return {
    mix: [{
      seq: leaf.seq, id: facts.id, branch_id: facts.branchId, made_at: toUtc(facts.madeAt), zone: facts.zone, by_person: referId(facts.by), carrier_text: facts.carrier.text, equipment_text: snapshot.equipment?.name ?? null,
      finished_value: facts.finished.value, finished_unit: facts.finished.unit, finished_base: toBase(facts.finished), left_from: facts.leftFrom, submission_hash: submissionHash({ facts, words: leaf.inner.words }),
    }],
    mix_line: facts.lines.map((line, n) => ({
      seq: leaf.seq, n, product_id: snapshot.lines[n]?.product.id ?? null, product_name: snapshot.lines[n]?.product.name ?? '', number: snapshot.lines[n]?.product.number ?? null, label_version_id: line.labelVersionId,
      amount_value: line.amount.value, amount_unit: line.amount.unit, amount_base: toBase(line.amount), lot: line.lot,
    })),
  }
}

function entryRows(leaf: Leaf<'application' | 'amendment'>, rootReference: string): Facts {
  const { body, inner, seq } = leaf
  const { facts, snapshot } = body
  const lines = linesInUse(facts, snapshot)
  const [drawn, finished] = [quantity(facts.drawn), quantity(facts.finished)]
  const submission = body.amends ? { facts, words: inner.words, amends: body.amends } : { facts, words: inner.words }
  return {
    application: [{
      seq, id: facts.id, root: leaf.root, kind: body.kind, visit_id: facts.visitId, reference: rootReference, branch_id: facts.branchId,
      place_id: referId(facts.place), place_name: snapshot.place.name, place_address: snapshot.place.address, county: snapshot.place.county, region: snapshot.place.region, country: snapshot.place.country,
      started_at: toUtc(facts.startedAt), finished_at: toUtc(facts.finishedAt), zone: facts.zone, local_day: localDay(facts.finishedAt, facts.zone), received_at: leaf.receivedAt,
      method_code: facts.method.code, method_text: facts.method.text, equipment_id: snapshot.equipment?.id ?? null, equipment_text: snapshot.equipment?.name ?? null, mix_id: facts.mixId,
      drawn_value: drawn.value, drawn_unit: drawn.unit, drawn_base: drawn.base, finished_value: finished.value, finished_unit: finished.unit, finished_base: finished.base,
      no_weather: facts.noWeather, reentry: JSON.stringify(facts.reentry), signer: signer(leaf), facts_hash: factsHash(facts), submission_hash: submissionHash(submission),
    }],
    application_line: lines.map(({ shot, line, amount, share }, n) => {
      const held = quantity(amount)
      return {
        seq, n, product_id: shot.product.id, product_name: shot.product.name, number: shot.product.number, number_basic: shot.product.number ? basicNumber(shot.product.number) : null,
        label_version_id: shot.label?.id ?? null, restricted_use: shot.product.restrictedUse ? 1 : 0, rate_value: line?.rate?.value ?? null, rate_unit: line?.rate?.unit ?? null,
        amount_value: held.value, amount_unit: held.unit, amount_base: held.base, share_of_mix: share ? 1 : 0, count_of: line?.counted?.of ?? null, count_value: line?.counted?.count ?? null, lot: line?.lot ?? null,
      }
    }),
    application_ingredient: lines.flatMap(({ shot }, line_n) => shot.product.ingredients.map(i => ({ line_n, ...i }))).map((i, n) => ({ seq, n, line_n: i.line_n, name: i.name, percent: i.percent })),
    application_area: facts.areas.map((area, n) => {
      const size = quantity(area.size)
      return { seq, n, place_code: area.place.code, place_text: area.place.text, setting: area.setting, size_value: size.value, size_unit: size.unit, size_base: size.base, how: area.how }
    }),
    application_person: personRows(seq, facts, snapshot),
    application_target: facts.targets.map((target, n) => ({ seq, n, code: target.code, text: target.text })),
    application_weather: weatherRows(seq, facts),
    finding: inner.findings.map((f, n) => ({
      seq, n, check_name: f.check, outcome: f.outcome, message: f.message, params: JSON.stringify(f.params), line: f.line, value: f.value, limit_value: f.limit, unit: f.unit, basis: JSON.stringify(f.basis), seen: f.seen === null ? null : f.seen ? 1 : 0,
    })),
  }
}

function personRows(seq: number, facts: EntryFacts, snapshot: EntrySnapshot): FactsRows['application_person'][] {
  return facts.people.map((p, n) => {
    const shot = snapshot.people[n]
    return {
      seq, n, person_id: shot?.id ?? null, name: shot?.name ?? '', did: p.did.join(' '), responsible: p.responsible ? 1 : 0,
      licence_id: shot?.licence?.id ?? null, licence_region: shot?.licence?.region ?? null, licence_number: shot?.licence?.number ?? null, licence_class: shot?.licence?.className ?? null, licence_expires: shot?.licence?.expires ?? null,
    }
  })
}

function weatherRows(seq: number, facts: EntryFacts): FactsRows['application_weather'][] {
  return facts.weather.map((reading, n) => {
    const { wind } = reading
    const blowing = wind && 'speed' in wind ? wind : null
    return {
      seq, n, at: toUtc(reading.at), where_taken: reading.where, temperature_value: reading.temperature?.value ?? null, temperature_unit: reading.temperature?.unit ?? null,
      calm: wind === null ? null : blowing ? 0 : 1, wind_value: blowing?.speed.value ?? null, wind_unit: blowing?.speed.unit ?? null, wind_from: blowing?.from ?? null,
      humidity: reading.humidity, sky: reading.sky, source: reading.source,
    }
  })
}
