/**
 * The rows that a leaf gives (facts: append-only) and that the leaves of one root give together (standing: rewritten, rebuildable).
 * Names are the tables' own. `…_base` columns are integers in base units (ng, nL, µm, 0.01 mm², count × 1): read them as bigint.
 */
export interface VisitRow {
  seq: number, id: string, branch_id: string, place_id: string | null, place_name: string, arrived_at: string, left_at: string, zone: string, local_day: string,
  nothing_code: string | null, nothing_text: string | null, follow_up_on: string | null, signer: string, submission_hash: Uint8Array
}
export interface MixRow {
  seq: number, id: string, branch_id: string, made_at: string, zone: string, by_person: string | null, carrier_text: string, equipment_text: string | null,
  finished_value: string, finished_unit: string, finished_base: bigint | number, left_from: string | null, submission_hash: Uint8Array
}
export interface MixLineRow { seq: number, n: number, product_id: string | null, product_name: string, number: string | null, label_version_id: string | null, amount_value: string, amount_unit: string, amount_base: bigint | number, lot: string | null }

export interface ApplicationRow {
  seq: number, id: string, root: string, kind: 'application' | 'amendment', visit_id: string | null, reference: string, branch_id: string,
  place_id: string | null, place_name: string, place_address: string, county: string, region: string, country: string,
  started_at: string, finished_at: string, zone: string, local_day: string, received_at: string,
  method_code: string | null, method_text: string, equipment_id: string | null, equipment_text: string | null, mix_id: string | null,
  drawn_value: string | null, drawn_unit: string | null, drawn_base: bigint | number | null,
  finished_value: string | null, finished_unit: string | null, finished_base: bigint | number | null,
  no_weather: string | null, reentry: string, signer: string, facts_hash: Uint8Array, submission_hash: Uint8Array
}
export interface ApplicationLineRow {
  seq: number, n: number, product_id: string | null, product_name: string, number: string | null, number_basic: string | null, label_version_id: string | null, restricted_use: 0 | 1,
  rate_value: string | null, rate_unit: string | null, amount_value: string | null, amount_unit: string | null, amount_base: bigint | number | null, share_of_mix: 0 | 1,
  count_of: string | null, count_value: string | null, lot: string | null
}
export interface ApplicationIngredientRow { seq: number, n: number, line_n: number, name: string, percent: string }
export interface ApplicationAreaRow { seq: number, n: number, place_code: string | null, place_text: string, setting: string, size_value: string | null, size_unit: string | null, size_base: bigint | number | null, how: string }
export interface ApplicationPersonRow {
  seq: number, n: number, person_id: string | null, name: string, did: string, responsible: 0 | 1,
  licence_id: string | null, licence_region: string | null, licence_number: string | null, licence_class: string | null, licence_expires: string | null
}
export interface ApplicationTargetRow { seq: number, n: number, code: string | null, text: string }
export interface ApplicationWeatherRow {
  seq: number, n: number, at: string, where_taken: string, temperature_value: string | null, temperature_unit: string | null, calm: 0 | 1 | null,
  wind_value: string | null, wind_unit: string | null, wind_from: string | null, humidity: string | null, sky: string | null, source: string
}
export interface FindingRow {
  seq: number, n: number, check_name: string, outcome: string, message: string, params: string, line: number | null,
  value: string | null, limit_value: string | null, unit: string | null, basis: string, seen: 0 | 1 | null
}
export interface StrikeRow { seq: number, id: string, root: string, head: string, reason: string, by_person: string }
export interface AcknowledgementRow { seq: number, id: string, root: string, head: string, says: string, because: string | null, by_person: string }
export interface NoticeLeafRow { seq: number, id: string, visit_id: string, party_id: string, channel: string, content_hash: string }

export interface FactsRows {
  visit: VisitRow
  mix: MixRow
  mix_line: MixLineRow
  application: ApplicationRow
  application_line: ApplicationLineRow
  application_ingredient: ApplicationIngredientRow
  application_area: ApplicationAreaRow
  application_person: ApplicationPersonRow
  application_target: ApplicationTargetRow
  application_weather: ApplicationWeatherRow
  finding: FindingRow
  strike: StrikeRow
  acknowledgement: AcknowledgementRow
  notice_leaf: NoticeLeafRow
}
export type FactsTable = keyof FactsRows
/** Rows by table, in the order in which they are written. */
export type Facts = { [T in FactsTable]?: FactsRows[T][] }

export const STATUSES = ['on-record', 'amended', 'struck'] as const
export type Status = (typeof STATUSES)[number]
export const CONFIRMATIONS = ['none-owed', 'owed', 'confirmed', 'disputed', 'cannot-be-had'] as const
export type Confirmation = (typeof CONFIRMATIONS)[number]

/** How a root stands from leaf `from_seq` on (to before `until_seq`, or still). `kind` 'nothing' is a visit with nothing applied: a row of the Daybook, not an entry. */
export interface EntryHeadRow {
  root: string, root_seq: number, from_seq: number, until_seq: number | null, kind: 'entry' | 'nothing', facts_seq: number, head: string, status: Status, confirmation: Confirmation, owed_by: string | null, author: string,
  visit_id: string | null, reference: string, facts_hash: Uint8Array | null, branch_id: string, place_id: string | null, place_name: string, county: string, region: string,
  local_day: string, finished_at: string, recorded_at: string, person_id: string | null, person_name: string,
  number: string | null, product_name: string | null, ingredient: string | null, method_text: string | null, target_text: string | null,
  finding_rank: 0 | 1 | 2 | 3, late: 0 | 1, restricted_use: 0 | 1
}
interface Under { root: string, from_seq: number, n: number }
export interface EntryProductRow extends Under { product_id: string | null, name: string, number: string | null, number_basic: string | null }
export interface EntryIngredientRow extends Under { name: string }
export interface EntryPersonRow extends Under { person_id: string | null, name: string, licence_number: string | null }
export interface EntryTargetRow extends Under { code: string | null, text: string }
export interface EntryFindingRow extends Under { check_name: string, outcome: string }

export interface StandingRows {
  entry_head: EntryHeadRow
  entry_product: EntryProductRow
  entry_ingredient: EntryIngredientRow
  entry_person: EntryPersonRow
  entry_target: EntryTargetRow
  entry_finding: EntryFindingRow
}
export type StandingTable = keyof StandingRows
