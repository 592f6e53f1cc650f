import type { Raw } from '#server/database/connection'

const SCHEMA = `
create table setting (name text primary key, value text not null) strict;
create table firm (id text primary key, slug text not null unique, name text not null, created_at text not null, next_due_at text) strict;
create table account (id text primary key, email text not null unique, name text not null, password text, language text not null, created_at text not null, disabled_at text) strict;
create table membership (id text primary key, account_id text not null references account, firm_id text not null references firm, subject_kind text not null check (subject_kind in ('person', 'party')), subject_id text not null, created_at text not null, ended_at text, unique (account_id, firm_id, subject_kind, subject_id)) strict;
create table session (hash blob primary key, kind text not null check (kind in ('member', 'pass')), account_id text references account, membership_id text references membership, firm_id text references firm, pass_id text, device text not null, created_at text not null, seen_at text not null, ends_at text not null, ended_at text) strict;
create index session_account on session (account_id);
create table link (hash blob primary key, kind text not null check (kind in ('invitation', 'reset')), account_id text not null references account, created_at text not null, ends_at text not null, used_at text) strict;
create index link_account on link (account_id);
create table account_mail (id text primary key, message_id text not null, to_address text not null, subject text not null, text text not null, html text not null, state text not null, attempts integer not null, next_at text not null, lease_until text, last_error text, sent_at text) strict;
create index account_mail_due on account_mail (state, next_at);
create table sign_in_event (id text primary key, at text not null, what text not null, account_id text, address text not null, device text not null) strict;
create index sign_in_event_account on sign_in_event (account_id, at);
`

export default { up: (raw: Raw) => { raw.exec(SCHEMA) } }
