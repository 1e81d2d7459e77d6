import type { QueryInterface } from "sequelize";

const ROLES = "array['administrator','designer','licensee','installer','permit clerk']::text[]";

const UP = `
create table companies (
  id uuid primary key default gen_random_uuid(),
  name text not null check (length(name) between 1 and 120),
  created_at timestamptz not null default now()
);
create table users (
  id uuid primary key default gen_random_uuid(),
  email text not null check (length(email) between 3 and 254),
  name text not null check (length(name) between 1 and 80),
  password_hash text not null,
  -- A session of an older version is refused: changing it signs a person out everywhere.
  session_version integer not null default 1,
  active boolean not null default true,
  created_at timestamptz not null default now()
);
create unique index users_email on users (lower(email));
create table memberships (
  id uuid primary key default gen_random_uuid(),
  company_id uuid not null references companies on delete cascade,
  user_id uuid not null references users on delete cascade,
  roles text[] not null check (roles <@ ${ROLES} and cardinality(roles) > 0),
  created_at timestamptz not null default now(),
  unique (company_id, user_id)
);
create index memberships_user on memberships (user_id);
create table jurisdictions (
  id uuid primary key default gen_random_uuid(),
  -- Null: known to every company.
  company_id uuid references companies on delete cascade,
  name text not null check (length(name) between 1 and 120),
  edition text not null check (edition in ('2017','2020','2023','2026')),
  ordinance text not null default '',
  amendments jsonb not null default '{}' check (jsonb_typeof(amendments) = 'object'),
  created_at timestamptz not null default now()
);
create unique index jurisdictions_name on jurisdictions (coalesce(company_id, '00000000-0000-0000-0000-000000000000'::uuid), lower(name));
create table jobs (
  id uuid primary key default gen_random_uuid(),
  company_id uuid not null references companies,
  number text not null check (length(number) between 1 and 40),
  name text not null check (length(name) between 1 and 120),
  jurisdiction_id uuid references jurisdictions,
  created_by uuid not null references users,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  unique (company_id, number)
);
create index jobs_company on jobs (company_id, updated_at desc);
create table job_members (
  id uuid primary key default gen_random_uuid(),
  job_id uuid not null references jobs on delete cascade,
  user_id uuid not null references users on delete cascade,
  roles text[] not null check (roles <@ ${ROLES} and cardinality(roles) > 0),
  created_at timestamptz not null default now(),
  unique (job_id, user_id)
);
create index job_members_user on job_members (user_id);
create table licenses (
  id uuid primary key default gen_random_uuid(),
  user_id uuid not null unique references users on delete cascade,
  state text not null check (length(state) between 1 and 60),
  number text not null check (length(number) between 1 and 40),
  title text not null check (length(title) between 1 and 80),
  expires_on date not null,
  seal_object_key text,
  seal_width_px integer,
  seal_height_px integer,
  updated_at timestamptz not null default now(),
  check ((seal_object_key is null) = (seal_width_px is null) and (seal_object_key is null) = (seal_height_px is null))
);
`;

const DOWN = "drop table licenses, job_members, jobs, jurisdictions, memberships, users, companies cascade;";

export const up = ({ context }: { context: QueryInterface }) =>
  context.sequelize.transaction((transaction) => context.sequelize.query(UP, { transaction }));
export const down = ({ context }: { context: QueryInterface }) => context.sequelize.query(DOWN);
