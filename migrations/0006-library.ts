import type { QueryInterface } from "sequelize";

const UP = `
create table library_entries (
  id uuid primary key default gen_random_uuid(),
  company_id uuid not null references companies,
  kind text not null check (length(kind) between 1 and 40),
  name text not null check (length(name) between 1 and 120),
  -- Copied from the current version's properties, so that lists need not open it.
  make text not null default '',
  model text not null default '',
  current_version integer not null check (current_version > 0),
  -- Came with the company: invented values, to begin with.
  starter boolean not null default false,
  archived_at timestamptz,
  -- Null: made with the company, by nobody.
  created_by uuid references users,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  -- What a search looks in. A scan of one company's few thousand rows is quicker than keeping another index.
  search text generated always as (lower(name || ' ' || make || ' ' || model)) stored
);
create unique index library_entries_name on library_entries (company_id, kind, lower(name));
create table library_versions (
  entry_id uuid not null references library_entries,
  version integer not null check (version > 0),
  data jsonb not null check (jsonb_typeof(data) = 'object'),
  note text not null default '' check (length(note) <= 300),
  made_by uuid references users,
  made_at timestamptz not null default now(),
  primary key (entry_id, version)
);
-- Entry and first version are written together; the entry comes first.
alter table library_entries add constraint library_entries_current
  foreign key (id, current_version) references library_versions (entry_id, version) deferrable initially deferred;
create function library_version_stays() returns trigger language plpgsql as $$
begin
  raise exception 'a version of a library entry is never changed; make the next one';
end $$;
create trigger library_versions_append_only before update or delete on library_versions
  for each row execute function library_version_stays();
-- Which entries a drawing uses, kept beside it: an index on the document is not taken by the planner, and opening two thousand documents is slow.
alter table drawings add column library_entries jsonb generated always as (jsonb_path_query_array(document, '$.equipment.*.library.entry')) stored;
do $$
begin
  if exists (select 1 from information_schema.columns where table_schema = current_schema() and table_name = 'stored_files' and column_name = 'library_entry_id') then
    alter table stored_files add constraint stored_files_library_entry foreign key (library_entry_id) references library_entries;
  end if;
end $$;
`;

const DOWN = `
alter table drawings drop column library_entries;
alter table if exists stored_files drop constraint if exists stored_files_library_entry;
drop table library_versions, library_entries cascade;
drop function library_version_stays;
`;

export const up = ({ context }: { context: QueryInterface }) =>
  context.sequelize.transaction((transaction) => context.sequelize.query(UP, { transaction }));
export const down = ({ context }: { context: QueryInterface }) => context.sequelize.query(DOWN);
