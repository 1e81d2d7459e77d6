import type { QueryInterface } from "sequelize";

const UP = `
create table audit_log (
  id bigint generated always as identity primary key,
  at timestamptz not null default now(),
  actor_id uuid references users,
  company_id uuid references companies,
  job_id uuid references jobs on delete set null,
  action text not null check (length(action) between 1 and 60),
  subject text not null check (length(subject) <= 200),
  detail jsonb not null default '{}',
  request_id text
);
create index audit_log_job on audit_log (job_id, at desc);
create function audit_stays() returns trigger language plpgsql as $$
begin
  raise exception 'the audit log is only added to';
end $$;
create trigger audit_log_append_only before delete or update of at, actor_id, action, subject, detail on audit_log
  for each row execute function audit_stays();
`;

const DOWN = "drop table audit_log cascade; drop function audit_stays;";

export const up = ({ context }: { context: QueryInterface }) =>
  context.sequelize.transaction((transaction) => context.sequelize.query(UP, { transaction }));
export const down = ({ context }: { context: QueryInterface }) => context.sequelize.query(DOWN);
