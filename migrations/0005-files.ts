import type { QueryInterface } from "sequelize";

const UP = `
create table stored_files (
  id uuid primary key default gen_random_uuid(),
  company_id uuid not null references companies,
  job_id uuid references jobs,
  -- Its foreign key comes with the table it points to, whichever of the two is made last.
  library_entry_id uuid,
  purpose text not null check (purpose in ('document','datasheet','picture','site photo','background')),
  name text not null check (length(name) between 1 and 120),
  content_type text not null check (content_type in ('application/pdf','image/png','image/jpeg','image/webp')),
  bytes integer not null check (bytes > 0),
  -- SHA-256 of the stored bytes, hex; the key in the store is made of it.
  digest text not null check (digest ~ '^[0-9a-f]{64}$'),
  object_key text not null check (object_key = 'files/' || digest),
  width_px integer check (width_px > 0),
  height_px integer check (height_px > 0),
  pages integer check (pages > 0),
  uploaded_by uuid not null references users,
  uploaded_at timestamptz not null default now(),
  removed_at timestamptz,
  removed_by uuid references users,
  check (job_id is null or library_entry_id is null),
  check ((width_px is null) = (height_px is null) and (width_px is null) <> (pages is null)),
  check ((pages is null) = (content_type <> 'application/pdf')),
  check ((removed_at is null) = (removed_by is null))
);
create index stored_files_job on stored_files (job_id, uploaded_at desc) where removed_at is null;
create index stored_files_library_entry on stored_files (library_entry_id, uploaded_at desc) where removed_at is null;
create index stored_files_object on stored_files (object_key);
-- What was uploaded stays what it is: sealed drawings refer to it. It is marked as removed, never taken out.
create function stored_file_stays() returns trigger language plpgsql as $$
begin
  raise exception 'a stored file is only marked as removed';
end $$;
create trigger stored_files_write_once before delete or update of
  id, company_id, job_id, purpose, content_type, bytes, digest, object_key, width_px, height_px, pages, uploaded_by, uploaded_at
  on stored_files for each row execute function stored_file_stays();
do $$
begin
  if exists (select 1 from information_schema.tables where table_schema = current_schema() and table_name = 'library_entries') then
    alter table stored_files add constraint stored_files_library_entry foreign key (library_entry_id) references library_entries;
  end if;
end $$;
`;

const DOWN = "drop table stored_files cascade; drop function stored_file_stays;";

export const up = ({ context }: { context: QueryInterface }) =>
  context.sequelize.transaction((transaction) => context.sequelize.query(UP, { transaction }));
export const down = ({ context }: { context: QueryInterface }) => context.sequelize.query(DOWN);
