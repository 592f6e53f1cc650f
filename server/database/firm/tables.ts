import type { FactsRows, StandingRows } from '#shared/records/rows'

export interface FirmRow { id: string, slug: string, name: string, address: string, phone: string, country: string, mail_from: string, origin: string, key_fingerprint: string, created_at: string }
export interface BranchRow { id: string, name: string, address: string, phone: string, county: string, region: string, country: string, zone: string }
export interface BranchRegistrationRow { id: string, branch_id: string, region: string, number: string, kind: string, from_day: string, to_day: string | null }
export interface PersonRow { id: string, name: string, email: string | null, phone: string | null, from_day: string, to_day: string | null }
export interface PersonRoleRow { id: string, person_id: string, role: 'owner' | 'officer' | 'applicator', branch_id: string | null, from_day: string }
export interface PersonRoleEndRow { role_id: string, to_day: string, at: string }
/** `categories`: JSON list of text. */
export interface LicenceRow { id: string, person_id: string, region: string, number: string, class_name: string, categories: string, issued: string, expires: string, recorded_at: string }
export interface PlaceRow { id: string, parent_id: string | null, branch_id: string, kind: string, name: string, address: string, town: string, county: string, region: string, country: string, zone: string, lat: number | null, lon: number | null, site_code: string | null, site_text: string, remark: string | null, retired_on: string | null }
export interface PartyRow { id: string, name: string, email: string | null, phone: string | null, language: 'en' | 'es' }
export interface PartyRoleRow { id: string, party_id: string, place_id: string, role: string, from_day: string, to_day: string | null }
export interface ProductRow { id: string, name: string, kind: string, number: string | null, number_region: string | null, number_basic: string | null, registrant: string, form: string, signal_word: string, restricted_use: 0 | 1, demo: 0 | 1, retired_on: string | null }
export interface ProductIngredientRow { product_id: string, n: number, name: string, percent: string }
export interface ProductRegistrationRow { id: string, product_id: string, region: string, number: string | null, from_day: string, to_day: string | null }
/** `reentry`, `protective`: JSON as in LabelVersionSchema. */
export interface LabelVersionRow { id: string, product_id: string, label_date: string, from_day: string, to_day: string | null, checked: 0 | 1, reentry: string, protective: string, cautions: string, recorded_at: string }
/** `sites`, `targets`, `methods`: JSON lists of codes. */
export interface LabelUseRow { id: string, label_version_id: string, n: number, sites: string, targets: string, methods: string }
export interface LabelLimitRow { id: string, label_use_id: string, n: number, of_what: string, unit: string, per: string, over_time: string, min: string | null, max: string | null, where_used: string | null, words: string }
export interface EquipmentRow { id: string, branch_id: string, name: string, kind_code: string | null, kind_text: string, number: string | null, retired_on: string | null }

export interface LeafRow { seq: number, id: string, kind: string, root: string, leaf_hash: Uint8Array, prev_hash: Uint8Array, chain_hash: Uint8Array, received_at: string }
export interface LeafBodyRow { seq: number, body: Uint8Array, inner: Uint8Array | null, salt: Uint8Array | null }

export const NOTICE_STATES = ['planned', 'sent', 'delivered', 'bounced', 'failed', 'printed', 'handed-over', 'read'] as const
export type NoticeState = (typeof NOTICE_STATES)[number]
export interface NoticeRow { id: string, visit_id: string, party_id: string, party_name: string, channel: 'mail' | 'paper', address: string | null, language: 'en' | 'es', state: NoticeState, planned_at: string, released_by: string | null, released_at: string | null, subject: string }
export interface OutboxRow { id: string, notice_id: string, state: 'held' | 'due' | 'sending' | 'sent' | 'failed', attempts: number, next_at: string, lease_until: string | null, message_id: string, raw: Uint8Array | null, content_hash: string | null, last_error: string | null, sent_at: string | null }
export interface NoticePaperRow { notice_id: string, pdf: Uint8Array, content_hash: string, at: string }
export interface NoticeEventRow { id: string, notice_id: string, at: string, what: string, by_person: string | null, detail: string | null }

/** The firm's own file. Facts and standing have the shape that the projection gives (`utils/records/rows.ts`). */
export interface FirmDatabase extends FactsRows, StandingRows {
  firm: FirmRow
  branch: BranchRow
  branch_registration: BranchRegistrationRow
  person: PersonRow
  person_role: PersonRoleRow
  person_role_end: PersonRoleEndRow
  licence: LicenceRow
  place: PlaceRow
  party: PartyRow
  party_role: PartyRoleRow
  product: ProductRow
  product_ingredient: ProductIngredientRow
  product_registration: ProductRegistrationRow
  label_version: LabelVersionRow
  label_use: LabelUseRow
  label_limit: LabelLimitRow
  equipment: EquipmentRow
  leaf: LeafRow
  leaf_body: LeafBodyRow
  /** Full text of how an entry stands now; `rowid` is `entry_head.root_seq`. */
  entry_search: { rowid: number, words: string, entry_search: string, rank: number }
  notice: NoticeRow
  outbox: OutboxRow
  notice_event: NoticeEventRow
  notice_paper: NoticePaperRow
}
