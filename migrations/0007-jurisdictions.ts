import type { QueryInterface } from "sequelize";

const NO_REQUIREMENTS = '{"lockableVisibleSwitch":null,"separateMeter":null,"notes":""}';
const PLAIN_PROFILE = JSON.stringify({
  sheetSize: "ANSI D", leastLetteringIn: null, maximumBytes: null, fileNameTemplate: "{job}-{set}-{revision}", split: "one file", bookmarks: true, stampStrip: null, cutSheets: null,
});
/** `${columns}` with the columns that may not change once a revision was issued. */
const stays = (columns: readonly string[]) => `
create or replace function revision_stays_as_issued() returns trigger language plpgsql as $$
begin
  if (${columns.map((column) => `new.${column}`).join(", ")})
     is distinct from (${columns.map((column) => `old.${column}`).join(", ")}) then
    raise exception 'a revision stays as it was issued';
  end if;
  return new;
end $$;`;
const ISSUED = ["snapshot", "digest", "rule_set", "check_result", "letter", "issue", "job_id"];

const UP = `
alter table jurisdictions
  -- Adoptions with their dates; which edition is in force follows from them and the day.
  add column editions jsonb,
  add column signs text not null default 'licensed professional' check (signs in ('licensed professional', 'preparer declaration accepted')),
  add column requirements jsonb not null default '${NO_REQUIREMENTS}' check (jsonb_typeof(requirements) = 'object'),
  add column export_profile jsonb not null default '${PLAIN_PROFILE}' check (jsonb_typeof(export_profile) = 'object'),
  add column contacts jsonb not null default '[]' check (jsonb_typeof(contacts) = 'array'),
  add column notes text not null default '' check (length(notes) <= 4000),
  -- Raised with every change, so that nobody overwrites what they have not seen.
  add column version integer not null default 1 check (version > 0),
  add column updated_at timestamptz not null default now(),
  add column updated_by uuid references users;
update jurisdictions set editions = jsonb_build_array(jsonb_build_object('edition', edition, 'effectiveFrom', null, 'effectiveTo', null));
alter table jurisdictions
  alter column editions set not null,
  add check (jsonb_typeof(editions) = 'array' and jsonb_array_length(editions) > 0),
  drop column edition;
create index jobs_jurisdiction on jobs (jurisdiction_id);
-- What the authority asked for on the day of issue; null for revisions issued before it was kept.
alter table revisions add column jurisdiction jsonb;
${stays([...ISSUED, "jurisdiction"])}
`;

const DOWN = `
${stays(ISSUED)}
alter table revisions drop column jurisdiction;
drop index jobs_jurisdiction;
alter table jurisdictions add column edition text check (edition in ('2017','2020','2023','2026'));
update jurisdictions set edition = (
  select each->>'edition' from jsonb_array_elements(editions) each
  order by coalesce(each->>'effectiveFrom', '') <= current_date::text desc, coalesce(each->>'effectiveFrom', '') desc limit 1
);
alter table jurisdictions
  alter column edition set not null,
  drop column editions, drop column signs, drop column requirements, drop column export_profile, drop column contacts, drop column notes,
  drop column version, drop column updated_at, drop column updated_by;
`;

export const up = ({ context }: { context: QueryInterface }) =>
  context.sequelize.transaction((transaction) => context.sequelize.query(UP, { transaction }));
export const down = ({ context }: { context: QueryInterface }) =>
  context.sequelize.transaction((transaction) => context.sequelize.query(DOWN, { transaction }));
