import type { QueryInterface } from "sequelize";

const UP = `
create table site_visits (
  -- Made by the device that begins the visit, which may have no connection at that time.
  id uuid primary key,
  job_id uuid not null references jobs,
  visited_on date not null,
  by_name text not null check (length(by_name) <= 80),
  data jsonb not null check (jsonb_typeof(data) = 'object'),
  version integer not null default 1 check (version > 0),
  created_by uuid not null references users,
  created_at timestamptz not null default now(),
  updated_by uuid not null references users,
  updated_at timestamptz not null default now()
);
create index site_visits_job on site_visits (job_id, visited_on desc, created_at desc);
`;

const DOWN = "drop table site_visits;";

export const up = ({ context }: { context: QueryInterface }) =>
  context.sequelize.transaction((transaction) => context.sequelize.query(UP, { transaction }));
export const down = ({ context }: { context: QueryInterface }) => context.sequelize.query(DOWN);
