import type { QueryInterface } from "sequelize";

const UP = `
create table drawings (
  id uuid primary key default gen_random_uuid(),
  job_id uuid not null unique references jobs on delete cascade,
  sequence integer not null default 0 check (sequence >= 0),
  document jsonb not null check (jsonb_typeof(document) = 'object'),
  -- Counts of the last check, for lists; they belong to checked_sequence and checked_rule_set alone.
  checked_sequence integer,
  checked_rule_set text,
  check_counts jsonb,
  updated_at timestamptz not null default now(),
  updated_by uuid references users
);
create table drawing_patches (
  id bigint generated always as identity primary key,
  drawing_id uuid not null references drawings on delete cascade,
  sequence integer not null check (sequence > 0),
  save_id uuid not null,
  base_sequence integer not null check (base_sequence >= 0 and base_sequence < sequence),
  author_id uuid not null references users,
  title text not null check (length(title) <= 200),
  patches jsonb not null check (jsonb_typeof(patches) = 'array'),
  created_at timestamptz not null default now(),
  unique (drawing_id, sequence),
  -- A save that is sent twice is known by its id.
  unique (drawing_id, save_id)
);
`;

const DOWN = "drop table drawing_patches, drawings cascade;";

export const up = ({ context }: { context: QueryInterface }) =>
  context.sequelize.transaction((transaction) => context.sequelize.query(UP, { transaction }));
export const down = ({ context }: { context: QueryInterface }) => context.sequelize.query(DOWN);
