/** Append-only tables refuse update and delete whoever asks; the ledger is a chain of hashes, whole and per customer. */
export const ledger = /* sql */ `
create table events (
  id bigint primary key, type text not null, subject text not null, subject_id uuid not null, job_id uuid, customer_id uuid, site_id uuid, person_id uuid, request_id text,
  at timestamptz not null, touches jsonb not null, data jsonb not null, previous_hash text not null, hash text not null, customer_previous_hash text, customer_hash text
);
create index events_of_job on events (job_id, id desc);
create index events_of_customer on events (customer_id, id);
create index events_of_site on events (site_id, id);
create table chain_heads (
  chain text primary key, event_id bigint not null, hash text not null
);
insert into chain_heads values ('all', 0, '');
create table relay_cursors (
  name text primary key, event_id bigint not null
);
insert into relay_cursors values ('tasks', 0);

create table task_deliveries (
  id uuid primary key, event_id bigint not null references events, task text not null, state text not null check (state in ('handed', 'done', 'given up')), handed_at timestamptz not null,
  done_at timestamptz, error text, created_at timestamptz not null default now(), unique (event_id, task)
);
create index task_deliveries_open on task_deliveries (handed_at) where state = 'handed';

create function refuse_change() returns trigger language plpgsql as $$
begin
  raise exception '% is append-only: a mistake is put right by a new row', tg_table_name using errcode = 'insufficient_privilege';
end $$;
create trigger append_only before update or delete on events for each row execute function refuse_change();
create trigger append_only before update or delete on readings for each row execute function refuse_change();
create trigger append_only before update or delete on strikes for each row execute function refuse_change();
create trigger append_only before update or delete on results for each row execute function refuse_change();
create trigger append_only before update or delete on reviews for each row execute function refuse_change();
create trigger append_only before update or delete on reports for each row execute function refuse_change();
create trigger append_only_truncate before truncate on events for each statement execute function refuse_change();
create trigger append_only_truncate before truncate on readings for each statement execute function refuse_change();
create trigger append_only_truncate before truncate on strikes for each statement execute function refuse_change();
create trigger append_only_truncate before truncate on results for each statement execute function refuse_change();
create trigger append_only_truncate before truncate on reviews for each statement execute function refuse_change();
create trigger append_only_truncate before truncate on reports for each statement execute function refuse_change();
`
