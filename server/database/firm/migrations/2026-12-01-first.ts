import type { Raw } from '#server/database/connection'
import { createAppendOnlyTriggers } from '#server/database/firm/append-only'

const BOOKS = `
create table firm (id text primary key, slug text not null, name text not null, address text not null, phone text not null, country text not null, mail_from text not null, origin text not null, key_fingerprint text not null, created_at text not null) strict;
create table branch (id text primary key, name text not null, address text not null, phone text not null, county text not null, region text not null, country text not null, zone text not null) strict;
create table branch_registration (id text primary key, branch_id text not null references branch, region text not null, number text not null, kind text not null, from_day text not null, to_day text) strict;
create index branch_registration_branch on branch_registration (branch_id);

create table person (id text primary key, name text not null, email text, phone text, from_day text not null, to_day text) strict;
create table person_role (id text primary key, person_id text not null references person, role text not null check (role in ('owner', 'officer', 'applicator')), branch_id text references branch, from_day text not null) strict;
create table person_role_end (role_id text primary key references person_role, to_day text not null, at text not null) strict;
create index person_role_person on person_role (person_id);
create table licence (id text primary key, person_id text not null references person, region text not null, number text not null, class_name text not null, categories text not null, issued text not null, expires text not null, recorded_at text not null) strict;
create index licence_person on licence (person_id);
create index licence_number on licence (number);

create table place (id text primary key, parent_id text references place, branch_id text not null references branch, kind text not null, name text not null, address text not null, town text not null, county text not null, region text not null, country text not null, zone text not null, lat real, lon real, site_code text, site_text text not null, remark text, retired_on text) strict;
create index place_parent on place (parent_id);
create index place_branch on place (branch_id, name);
create table party (id text primary key, name text not null, email text, phone text, language text not null) strict;
create table party_role (id text primary key, party_id text not null references party, place_id text not null references place, role text not null, from_day text not null, to_day text) strict;
create index party_role_place on party_role (place_id);
create index party_role_party on party_role (party_id);

create table product (id text primary key, name text not null, kind text not null, number text, number_region text, number_basic text, registrant text not null, form text not null, signal_word text not null, restricted_use integer not null, demo integer not null, retired_on text) strict;
create index product_number on product (number);
create index product_basic on product (number_basic);
create table product_ingredient (product_id text not null references product, n integer not null, name text not null, percent text not null, primary key (product_id, n)) strict;
create table product_registration (id text primary key, product_id text not null references product, region text not null, number text, from_day text not null, to_day text) strict;
create index product_registration_product on product_registration (product_id, region);
create table label_version (id text primary key, product_id text not null references product, label_date text not null, from_day text not null, to_day text, checked integer not null, reentry text not null, protective text not null, cautions text not null, recorded_at text not null) strict;
create index label_version_product on label_version (product_id, from_day);
create table label_use (id text primary key, label_version_id text not null references label_version, n integer not null, sites text not null, targets text not null, methods text not null) strict;
create index label_use_version on label_use (label_version_id, n);
create table label_limit (id text primary key, label_use_id text not null references label_use, n integer not null, of_what text not null, unit text not null, per text not null, over_time text not null, min text, max text, where_used text, words text not null) strict;
create index label_limit_use on label_limit (label_use_id, n);
create table equipment (id text primary key, branch_id text not null references branch, name text not null, kind_code text, kind_text text not null, number text, retired_on text) strict;
`

const CHILD = 'seq integer not null references leaf (seq) deferrable initially deferred'
const CHILD_KEY = 'seq integer primary key references leaf (seq) deferrable initially deferred'

const LEDGER = `
create table leaf (seq integer primary key, id text not null unique, kind text not null, root text not null, leaf_hash blob not null, prev_hash blob not null, chain_hash blob not null, received_at text not null) strict;
create index leaf_root on leaf (root, seq);
create table leaf_body (${CHILD_KEY}, body blob not null, inner blob, salt blob) strict;

create table visit (${CHILD_KEY}, id text not null unique, branch_id text not null, place_id text, place_name text not null, arrived_at text not null, left_at text not null, zone text not null, local_day text not null, nothing_code text, nothing_text text, follow_up_on text, signer text not null, submission_hash blob not null) strict;
create index visit_place on visit (place_id, left_at);
create table mix (${CHILD_KEY}, id text not null unique, branch_id text not null, made_at text not null, zone text not null, by_person text, carrier_text text not null, equipment_text text, finished_value text not null, finished_unit text not null, finished_base integer not null, left_from text, submission_hash blob not null) strict;
create table mix_line (${CHILD}, n integer not null, product_id text, product_name text not null, number text, label_version_id text, amount_value text not null, amount_unit text not null, amount_base integer not null, lot text, primary key (seq, n)) strict, without rowid;

create table application (${CHILD_KEY}, id text not null unique, root text not null, kind text not null, visit_id text, reference text not null, branch_id text not null,
  place_id text, place_name text not null, place_address text not null, county text not null, region text not null, country text not null,
  started_at text not null, finished_at text not null, zone text not null, local_day text not null, received_at text not null,
  method_code text, method_text text not null, equipment_id text, equipment_text text, mix_id text, drawn_value text, drawn_unit text, drawn_base integer,
  finished_value text, finished_unit text, finished_base integer, no_weather text, reentry text not null, signer text not null, facts_hash blob not null, submission_hash blob not null) strict;
create index application_root on application (root, seq);
create index application_visit on application (visit_id);
create index application_place on application (place_id, finished_at);
create table application_line (${CHILD}, n integer not null, product_id text, product_name text not null, number text, number_basic text, label_version_id text, restricted_use integer not null, rate_value text, rate_unit text, amount_value text, amount_unit text, amount_base integer, share_of_mix integer not null, count_of text, count_value text, lot text, primary key (seq, n)) strict, without rowid;
create table application_ingredient (${CHILD}, n integer not null, line_n integer not null, name text not null, percent text not null, primary key (seq, n)) strict, without rowid;
create table application_area (${CHILD}, n integer not null, place_code text, place_text text not null, setting text not null, size_value text, size_unit text, size_base integer, how text not null, primary key (seq, n)) strict, without rowid;
create table application_person (${CHILD}, n integer not null, person_id text, name text not null, did text not null, responsible integer not null, licence_id text, licence_region text, licence_number text, licence_class text, licence_expires text, primary key (seq, n)) strict, without rowid;
create table application_target (${CHILD}, n integer not null, code text, text text not null, primary key (seq, n)) strict, without rowid;
create table application_weather (${CHILD}, n integer not null, at text not null, where_taken text not null, temperature_value text, temperature_unit text, calm integer, wind_value text, wind_unit text, wind_from text, humidity text, sky text, source text not null, primary key (seq, n)) strict, without rowid;
create table finding (${CHILD}, n integer not null, check_name text not null, outcome text not null, message text not null, params text not null, line integer, value text, limit_value text, unit text, basis text not null, seen integer, primary key (seq, n)) strict, without rowid;
create table strike (${CHILD_KEY}, id text not null unique, root text not null, head text not null, reason text not null, by_person text not null) strict;
create table acknowledgement (${CHILD_KEY}, id text not null unique, root text not null, head text not null, says text not null, because text, by_person text not null) strict;
create table notice_leaf (${CHILD_KEY}, id text not null unique, visit_id text not null, party_id text not null, channel text not null, content_hash text not null) strict;
`

const STANDING = `
create table entry_head (root text not null, root_seq integer not null, from_seq integer not null, until_seq integer, kind text not null, facts_seq integer not null, head text not null, status text not null, confirmation text not null, owed_by text, author text not null,
  visit_id text, reference text not null, facts_hash blob, branch_id text not null, place_id text, place_name text not null, county text not null, region text not null,
  local_day text not null, finished_at text not null, recorded_at text not null, person_id text, person_name text not null, number text, product_name text, ingredient text, method_text text, target_text text,
  finding_rank integer not null, late integer not null, restricted_use integer not null, primary key (root, from_seq)) strict, without rowid;
create index entry_head_finished on entry_head (finished_at, root) where until_seq is null;
create index entry_head_recorded on entry_head (recorded_at, root) where until_seq is null;
create index entry_head_place on entry_head (place_name, finished_at, root) where until_seq is null;
create index entry_head_place_id on entry_head (place_id, finished_at, root) where until_seq is null;
create index entry_head_person on entry_head (person_name, finished_at, root) where until_seq is null;
create index entry_head_number on entry_head (number, finished_at, root) where until_seq is null;
create index entry_head_status on entry_head (status, finished_at, root) where until_seq is null;
create index entry_head_finding on entry_head (finding_rank, finished_at, root) where until_seq is null;
create index entry_head_branch on entry_head (branch_id, finished_at, root) where until_seq is null;
create index entry_head_confirmation on entry_head (confirmation, owed_by) where until_seq is null;
create index entry_head_visit on entry_head (visit_id);
create index entry_head_reference on entry_head (reference);
create table entry_product (root text not null, from_seq integer not null, n integer not null, product_id text, name text not null, number text, number_basic text, primary key (root, from_seq, n)) strict, without rowid;
create index entry_product_number on entry_product (number, root);
create index entry_product_basic on entry_product (number_basic, root);
create index entry_product_product on entry_product (product_id, root);
create table entry_ingredient (root text not null, from_seq integer not null, n integer not null, name text not null, primary key (root, from_seq, n)) strict, without rowid;
create index entry_ingredient_name on entry_ingredient (name, root);
create table entry_person (root text not null, from_seq integer not null, n integer not null, person_id text, name text not null, licence_number text, primary key (root, from_seq, n)) strict, without rowid;
create index entry_person_person on entry_person (person_id, root);
create index entry_person_licence on entry_person (licence_number, root);
create table entry_target (root text not null, from_seq integer not null, n integer not null, code text, text text not null, primary key (root, from_seq, n)) strict, without rowid;
create index entry_target_code on entry_target (code, root);
create table entry_finding (root text not null, from_seq integer not null, n integer not null, check_name text not null, outcome text not null, primary key (root, from_seq, n)) strict, without rowid;
create index entry_finding_check on entry_finding (check_name, outcome, root);
create virtual table entry_search using fts5 (words, tokenize = 'unicode61 remove_diacritics 2', prefix = '2 3');
insert into entry_search (entry_search, rank) values ('secure-delete', 1);
`

const NOTICES = `
create table notice (id text primary key, visit_id text not null, party_id text not null references party, party_name text not null, channel text not null, address text, language text not null, state text not null, planned_at text not null, released_by text, released_at text, subject text not null) strict;
create index notice_visit on notice (visit_id);
create index notice_state on notice (state, planned_at);
create index notice_party on notice (party_id, planned_at);
create table outbox (id text primary key, notice_id text not null unique references notice, state text not null, attempts integer not null, next_at text not null, lease_until text, message_id text not null, raw blob, content_hash text, last_error text, sent_at text) strict;
create index outbox_due on outbox (state, next_at);
create table notice_event (id text primary key, notice_id text not null, at text not null, what text not null, by_person text, detail text) strict;
create index notice_event_notice on notice_event (notice_id, at);
`

export default {
  up(raw: Raw) {
    raw.exec(BOOKS + LEDGER + STANDING + NOTICES)
    createAppendOnlyTriggers(raw, ['leaf', 'leaf_body', 'visit', 'mix', 'mix_line', 'application', 'application_line', 'application_ingredient', 'application_area', 'application_person',
      'application_target', 'application_weather', 'finding', 'strike', 'acknowledgement', 'notice_leaf', 'notice_event', 'licence', 'person_role', 'person_role_end', 'label_version', 'label_use', 'label_limit'])
  },
}
