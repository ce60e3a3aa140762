export const people = /* sql */ `
create table company (
  id uuid primary key, name text not null, address text not null, email text not null, tax_percent integer not null, created_at timestamptz not null
);
create table sites (
  id uuid primary key, name text not null unique, address text not null, time_zone text not null, created_at timestamptz not null,
  hours jsonb not null default '[{"weekday":1,"from":"07:30","to":"17:00"},{"weekday":2,"from":"07:30","to":"17:00"},{"weekday":3,"from":"07:30","to":"17:00"},{"weekday":4,"from":"07:30","to":"17:00"},{"weekday":5,"from":"07:30","to":"17:00"}]'
);
create table customers (
  id uuid primary key, name text not null unique, address text not null, report_email text not null, currency text not null, created_at timestamptz not null
);
create table people (
  id uuid primary key, name text not null, email text not null unique check (email = lower(email)),
  role text not null check (role in ('client', 'technician', 'manager')),
  site_id uuid references sites, customer_id uuid references customers,
  state text not null check (state in ('invited', 'active', 'disabled')),
  password_hash text, session_epoch integer not null default 0, last_sign_in_at timestamptz, version integer not null default 0, created_at timestamptz not null,
  check ((role = 'client') = (customer_id is not null)), check (role <> 'technician' or site_id is not null), check (role <> 'client' or site_id is null)
);
create index people_by_customer on people (customer_id);
create index people_by_site on people (site_id);
create table links (
  id uuid primary key, person_id uuid not null references people, purpose text not null check (purpose in ('invitation', 'password reset')),
  token_hash text not null unique, expires_at timestamptz not null, used_at timestamptz, created_at timestamptz not null
);
create index links_by_person on links (person_id);
create table sessions (
  sid text primary key, sess jsonb not null, expire timestamptz not null
);
create index sessions_by_expiry on sessions (expire);
create index sessions_by_person on sessions ((sess -> 'passport' ->> 'user'));
create table authorisations (
  id uuid primary key, person_id uuid not null references people, site_id uuid not null references sites, method_id text not null,
  "right" text not null check ("right" in ('carry out', 'review', 'sign')), until date not null, evidence text not null, created_at timestamptz not null
);
create index authorisations_by_person on authorisations (person_id, method_id);
create table equipment (
  id uuid primary key, site_id uuid not null references sites, code text not null unique, name text not null, type text not null,
  calibrated_until date, certificate text not null, out_of_use boolean not null default false, created_at timestamptz not null
);
create table verifications (
  id uuid primary key, equipment_id uuid not null references equipment, site_id uuid not null references sites, at timestamptz not null, passed boolean not null,
  text text not null, created_at timestamptz not null
);
create index verifications_by_equipment on verifications (equipment_id, at desc);
create table benches (
  id uuid primary key, site_id uuid not null references sites, name text not null, code text not null unique, units integer not null check (units between 1 and 200),
  does jsonb not null, hours jsonb not null, out boolean not null default false, equipment_id uuid references equipment, created_at timestamptz not null
);
create index benches_by_site on benches (site_id);
create table method_offers (
  id uuid primary key, method_id text not null unique, price_minor integer not null check (price_minor >= 0), currency text not null, site_ids jsonb not null, created_at timestamptz not null
);
`
