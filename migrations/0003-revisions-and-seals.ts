import type { QueryInterface } from "sequelize";

const UP = `
create table revisions (
  id uuid primary key default gen_random_uuid(),
  job_id uuid not null references jobs on delete cascade,
  drawing_id uuid not null references drawings on delete cascade,
  letter text not null check (letter ~ '^[A-HJ-NPRTUVWY]{1,3}$'),
  -- A returned revision is issued again under the same letter.
  issue integer not null check (issue > 0),
  purpose text not null check (length(purpose) between 1 and 80),
  description text not null check (length(description) <= 200),
  state text not null check (state in ('in review','returned','sealing','sealed','superseded','void')),
  sequence integer not null,
  snapshot jsonb not null,
  digest text not null check (digest ~ '^[0-9a-f]{64}$'),
  rule_set text not null,
  check_result jsonb not null,
  issued_by uuid not null references users,
  issued_at timestamptz not null default now(),
  returned_by uuid references users,
  returned_at timestamptz,
  return_comment text check (length(return_comment) <= 4000),
  voided_at timestamptz,
  superseded_at timestamptz,
  unique (job_id, letter, issue)
);
create unique index revisions_one_open on revisions (job_id) where state in ('in review','sealing');
create unique index revisions_one_current on revisions (job_id) where state in ('sealed','void');
create function revision_stays_as_issued() returns trigger language plpgsql as $$
begin
  if (new.snapshot, new.digest, new.rule_set, new.check_result, new.letter, new.issue, new.job_id)
     is distinct from (old.snapshot, old.digest, old.rule_set, old.check_result, old.letter, old.issue, old.job_id) then
    raise exception 'a revision stays as it was issued';
  end if;
  return new;
end $$;
create trigger revisions_immutable before update on revisions for each row execute function revision_stays_as_issued();

create table finding_acceptances (
  id uuid primary key default gen_random_uuid(),
  revision_id uuid not null references revisions on delete cascade,
  finding_key text not null check (length(finding_key) <= 400),
  reason text not null check (length(reason) between 1 and 600),
  accepted_by uuid not null references users,
  by_name text not null,
  license_text text not null,
  accepted_on date not null,
  created_at timestamptz not null default now(),
  unique (revision_id, finding_key)
);
create table seals (
  id uuid primary key default gen_random_uuid(),
  revision_id uuid not null unique references revisions on delete cascade,
  sealed_by uuid not null references users,
  -- The license as it was on the day, whatever happens to it later.
  licensee_name text not null,
  license_state text not null,
  license_number text not null,
  license_title text not null,
  license_expires_on date not null,
  seal_object_key text not null,
  seal_code text not null unique check (seal_code ~ '^[0-9A-Z]{4}-[0-9A-Z]{4}$'),
  sealed_at timestamptz not null,
  completed_at timestamptz
);
create table sheet_sets (
  id uuid primary key default gen_random_uuid(),
  revision_id uuid not null references revisions on delete cascade,
  kind text not null check (kind in ('preview','sealed')),
  state text not null check (state in ('queued','drawing','ready','failed')),
  object_key text,
  digest text check (digest ~ '^[0-9a-f]{64}$'),
  bytes integer check (bytes > 0),
  sheets integer check (sheets > 0),
  error text,
  created_at timestamptz not null default now(),
  finished_at timestamptz,
  unique (revision_id, kind),
  check (state <> 'ready' or (object_key is not null and digest is not null and bytes is not null))
);
create function sealed_sheets_stay() returns trigger language plpgsql as $$
begin
  if old.kind = 'sealed' and old.state = 'ready' then
    raise exception 'sealed sheets stay as they are';
  end if;
  return new;
end $$;
create trigger sheet_sets_write_once before update on sheet_sets for each row execute function sealed_sheets_stay();
`;

const DOWN = `drop table sheet_sets, seals, finding_acceptances, revisions cascade;
drop function sealed_sheets_stay, revision_stays_as_issued;`;

export const up = ({ context }: { context: QueryInterface }) =>
  context.sequelize.transaction((transaction) => context.sequelize.query(UP, { transaction }));
export const down = ({ context }: { context: QueryInterface }) => context.sequelize.query(DOWN);
