export const jobs = /* sql */ `
create table numbers (
  series text not null, year integer not null, last integer not null, primary key (series, year)
);
create table jobs (
  id uuid primary key, number text not null unique, customer_id uuid not null references customers, site_id uuid not null references sites, ordered_by_id uuid not null references people,
  state text not null, money text not null, waits_for_payment boolean not null default false, holds integer not null default 0 check (holds >= 0),
  "order" jsonb not null, lines jsonb not null, net_minor bigint not null, tax_minor bigint not null, total_minor bigint not null, currency text not null,
  purchase_order text not null, what text not null, tests text not null, needed_by date,
  placed_at timestamptz, promised_at timestamptz, expected_at timestamptz, version integer not null default 0, created_at timestamptz not null,
  check (state in ('draft', 'placed', 'awaiting samples', 'in work', 'in review', 'reported', 'closed', 'cancelled')),
  check (money in ('unpaid', 'paid', 'on account', 'part refunded', 'refunded'))
);
create index jobs_of_customer on jobs (customer_id, id desc);
create index jobs_of_site on jobs (site_id, id desc);
create index jobs_of_customer_by_state on jobs (customer_id, state, id desc);
create index jobs_of_site_by_state on jobs (site_id, state, id desc);
create table payments (
  id uuid primary key, job_id uuid not null references jobs, customer_id uuid not null references customers, site_id uuid not null references sites,
  checkout_id text unique, url text, payment_intent_id text, amount_minor bigint not null, currency text not null, job_version integer not null,
  state text not null check (state in ('opening', 'open', 'paid', 'closed', 'refund owed', 'refunded')), paid_at timestamptz, refund_id text, created_at timestamptz not null
);
create index payments_of_job on payments (job_id);
create unique index one_open_payment_a_job on payments (job_id) where state in ('opening', 'open');
create table payment_notices (
  id uuid primary key, notice_id text not null unique, type text not null, checkout_id text, created_at timestamptz not null
);
create table invoices (
  id uuid primary key, number text not null unique, job_id uuid not null unique references jobs, customer_id uuid not null references customers, site_id uuid not null references sites,
  issued_on date not null, currency text not null, lines jsonb not null, net_minor bigint not null, tax_percent integer not null, tax_minor bigint not null, total_minor bigint not null,
  paid_minor bigint not null, refunded_minor bigint not null default 0, created_at timestamptz not null, check (net_minor + tax_minor = total_minor), check (refunded_minor between 0 and paid_minor)
);
create index invoices_of_customer on invoices (customer_id, id desc);
create index invoices_of_site on invoices (site_id, id desc);
create table samples (
  id uuid primary key, job_id uuid not null references jobs, customer_id uuid not null references customers, site_id uuid not null references sites,
  number text not null unique, code text not null unique, position integer not null, heat text not null, lot text not null, material text not null, piece jsonb not null,
  state text not null check (state in ('expected', 'received', 'in work', 'done', 'missing', 'void')), on_hold boolean not null default false, condition text not null default '',
  received_at timestamptz, received_by_id uuid references people, version integer not null default 0, created_at timestamptz not null, unique (job_id, position)
);
create index samples_of_customer on samples (customer_id, id desc);
create index samples_of_site on samples (site_id, id desc);
create index samples_by_heat on samples (customer_id, heat text_pattern_ops);
create table tests (
  id uuid primary key, job_id uuid not null references jobs, sample_id uuid not null references samples, customer_id uuid not null references customers, site_id uuid not null references sites,
  position integer not null, method_id text not null, method_version integer not null, label text not null, parameters jsonb not null, requirement jsonb,
  state text not null check (state in ('waiting', 'ready', 'in run', 'recorded', 'accepted', 'reported', 'void')), version integer not null default 0, created_at timestamptz not null
);
create index tests_of_job on tests (job_id);
create index tests_of_sample on tests (sample_id, position);
create table steps (
  id uuid primary key, sample_id uuid not null references samples, job_id uuid not null references jobs, test_id uuid references tests, site_id uuid not null references sites,
  position integer not null, type text not null, label text not null, capability text not null, need jsonb not null,
  state text not null check (state in ('to come', 'planned', 'started', 'done', 'void')),
  bench_id uuid references benches, started_at timestamptz, started_by_id uuid references people, ended_at timestamptz, remark text not null default '', created_at timestamptz not null, unique (sample_id, position)
);
create index steps_of_job on steps (job_id);
create index steps_to_do on steps (site_id) where state in ('to come', 'planned', 'started');
create table plan_entries (
  id uuid primary key, step_id uuid not null unique references steps, site_id uuid not null references sites, bench_id uuid references benches, person_id uuid references people,
  starts_at timestamptz, ends_at timestamptz, why text not null, rejected jsonb not null, unplaced_because text, cures jsonb not null, created_at timestamptz not null,
  check ((bench_id is null) = (unplaced_because is not null))
);
create index plan_entries_of_bench on plan_entries (bench_id, starts_at);
create index plan_entries_of_site on plan_entries (site_id, starts_at);
create table plans (
  id uuid primary key, site_id uuid not null unique references sites, made_at timestamptz not null, ledger_id bigint not null, created_at timestamptz not null
);
create table holds (
  id uuid primary key, job_id uuid not null references jobs, sample_id uuid references samples, customer_id uuid not null references customers, site_id uuid not null references sites,
  reason text not null, question text not null, answers jsonb not null, answer text, placed_by_id uuid not null references people, answered_by_id uuid references people,
  answered_at timestamptz, released_at timestamptz, version integer not null default 0, created_at timestamptz not null
);
create index holds_of_job on holds (job_id);
create table messages (
  id uuid primary key, job_id uuid not null references jobs, customer_id uuid not null references customers, site_id uuid not null references sites, by_id uuid not null references people,
  text text not null, created_at timestamptz not null
);
create index messages_of_job on messages (job_id, id);
create table files (
  id uuid primary key, job_id uuid not null references jobs, sample_id uuid references samples, test_run_id uuid, customer_id uuid not null references customers, site_id uuid not null references sites,
  visible_to_customer boolean not null, purpose text not null check (purpose in ('attachment', 'photo', 'record', 'report')), name text not null, media_type text not null,
  size bigint not null, sha256 text not null, store_key text not null, display_key text, by_id uuid references people, removed_at timestamptz, created_at timestamptz not null
);
create index files_of_job on files (job_id);
`
