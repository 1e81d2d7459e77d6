import type { QueryInterface } from "sequelize";

const UP = `
alter table jobs
  add column due_on date,
  -- Where the office stands with the job; the state of its revisions is another matter.
  add column office_status text not null default 'open' check (office_status in ('open', 'on hold', 'closed')),
  add column archived_at timestamptz,
  add column archived_by uuid references users,
  add column permit_fee_cents bigint check (permit_fee_cents between 0 and 100000000000),
  add column permit_fee_paid_on date,
  add column permit_receipt text not null default '' check (length(permit_receipt) <= 60);
create index jobs_due on jobs (company_id, due_on) where due_on is not null and archived_at is null;
alter table companies add column job_number_scheme text not null default '{yy}-{nnn}' check (length(job_number_scheme) between 3 and 40);
-- What lists show and search, taken out of the document by the database, so that no list opens a drawing and nothing is kept twice by hand.
alter table drawings
  add column address_lines text generated always as (document #>> '{sheet,titleBlock,addressLines}') stored,
  add column parcel text generated always as (document #>> '{sheet,titleBlock,parcel}') stored,
  add column owner_name text generated always as (document #>> '{sheet,titleBlock,owner}') stored,
  add column permit_number text generated always as (document #>> '{sheet,titleBlock,permitNumber}') stored,
  add column edition text generated always as (document #>> '{site,edition}') stored;
create index revisions_latest on revisions (job_id, issued_at desc);
`;

const DOWN = `
drop index revisions_latest;
alter table drawings drop column address_lines, drop column parcel, drop column owner_name, drop column permit_number, drop column edition;
alter table companies drop column job_number_scheme;
alter table jobs drop column due_on, drop column office_status, drop column archived_at, drop column archived_by,
  drop column permit_fee_cents, drop column permit_fee_paid_on, drop column permit_receipt;
`;

export const up = ({ context }: { context: QueryInterface }) =>
  context.sequelize.transaction((transaction) => context.sequelize.query(UP, { transaction }));
export const down = ({ context }: { context: QueryInterface }) =>
  context.sequelize.transaction((transaction) => context.sequelize.query(DOWN, { transaction }));
