export const runs = /* sql */ `
create table test_runs (
  id uuid primary key, test_id uuid not null references tests, sample_id uuid not null references samples, job_id uuid not null references jobs, step_id uuid not null references steps,
  site_id uuid not null references sites, bench_id uuid not null references benches, equipment_id uuid references equipment, performed_by_id uuid not null references people,
  number integer not null, method_id text not null, method_version integer not null, state text not null check (state in ('open', 'recorded', 'accepted', 'sent back', 'stopped')),
  evaluation jsonb, remark text not null default '', started_at timestamptz not null, recorded_at timestamptz, version integer not null default 0, created_at timestamptz not null, unique (test_id, number)
);
create unique index one_open_run_a_test on test_runs (test_id) where state in ('open', 'recorded');
create index test_runs_to_review on test_runs (site_id, recorded_at) where state = 'recorded';
create index test_runs_of_job on test_runs (job_id);
create table readings (
  id uuid primary key, test_run_id uuid not null references test_runs, key text not null, path text not null, value jsonb not null, by_id uuid not null references people, created_at timestamptz not null,
  unique (test_run_id, key)
);
create table strikes (
  id uuid primary key, reading_id uuid not null unique references readings, test_run_id uuid not null references test_runs, reason text not null, by_id uuid not null references people, created_at timestamptz not null
);
create index strikes_of_run on strikes (test_run_id);
create table results (
  id uuid primary key, test_run_id uuid not null references test_runs, test_id uuid not null references tests, sample_id uuid not null references samples, job_id uuid not null references jobs,
  customer_id uuid not null references customers, site_id uuid not null references sites, method_id text not null, key text not null, symbol text not null, value double precision not null,
  unit text not null, reported text not null, position integer not null, created_at timestamptz not null, unique (test_run_id, key)
);
create index results_of_sample on results (sample_id);
create table reviews (
  id uuid primary key, test_run_id uuid not null references test_runs, outcome text not null check (outcome in ('accepted', 'sent back')), remark text not null, readings jsonb not null,
  by_id uuid not null references people, created_at timestamptz not null, unique (test_run_id)
);
create table reports (
  id uuid primary key, job_id uuid not null references jobs, customer_id uuid not null references customers, site_id uuid not null references sites, number text not null, revision integer not null,
  code text not null, content jsonb not null, signed_by_id uuid not null references people, issued_at timestamptz not null, created_at timestamptz not null, unique (number, revision)
);
create index reports_of_job on reports (job_id);
create index reports_of_customer on reports (customer_id, id desc);
create index reports_of_site on reports (site_id, id desc);
create table report_states (
  id uuid primary key, report_id uuid not null unique references reports, state text not null check (state in ('being made', 'current', 'superseded', 'withdrawn')),
  file_id uuid references files, sha256 text, made_at timestamptz, mailed_to text, mailed_at timestamptz, created_at timestamptz not null
);
create table mails (
  id uuid primary key, key text not null unique, recipient text not null, subject text not null, state text not null check (state in ('sending', 'sent')),
  claimed_at timestamptz not null, sent_at timestamptz, created_at timestamptz not null
);
`
