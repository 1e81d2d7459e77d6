import "server-only";
import { QueryTypes } from "sequelize";
import type { Counts, JobLine, JobsAnswer, JobsQuery } from "@/lib/api";
import type { Edition } from "@/lib/diagram/schema";
import { ROLES, may, type Role } from "@/lib/policy";
import type { RevisionState } from "@/lib/workflow";
import type { Actor } from "./actor";
import { countsOfRows, type CountedRow } from "./counts";
import { database } from "./database";
import { today } from "./licenses";
import { waitsFor } from "./waitsFor";

/** Roles with which a job stands in the register. */
const OFFICE = ROLES.filter((role) => may([role], "drawing.view"));

/*
 * One statement finds, counts and sorts; nothing of a drawing is opened for it. `mine` repeats for the database what
 * waitsFor() says in words of one row; a test holds both together.
 */
const MATCHED = `
with visible as (
  select j.*, coalesce(m.roles, '{}') || case when a.id is null then '{}'::text[] else array['administrator'] end as my_roles
  from jobs j
  left join job_members m on m.job_id = j.id and m.user_id = :me
  left join memberships a on a.company_id = j.company_id and a.user_id = :me and 'administrator' = any (a.roles)
  where m.id is not null or a.id is not null
), latest as (
  select distinct on (r.job_id) r.job_id, r.id, r.letter, r.state, r.sequence, r.rule_set
  from revisions r join visible v on v.id = r.job_id order by r.job_id, r.issued_at desc
), matched as (
  select v.id, v.number, v.name, v.updated_at, v.due_on, v.office_status, v.archived_at, v.my_roles, v.jurisdiction_id, u.name as jurisdiction,
    d.id as drawing_id, d.sequence, d.checked_sequence, d.checked_rule_set, d.check_counts, d.address_lines, d.parcel, d.permit_number, d.edition,
    r.id as revision_id, r.letter, coalesce(r.state, 'draft') as state, r.sequence as revision_sequence, r.rule_set as revision_rule_set,
    case coalesce(r.state, 'draft')
      when 'in review' then 'licensee' = any (v.my_roles)
      when 'draft' then 'designer' = any (v.my_roles) when 'returned' then 'designer' = any (v.my_roles) when 'void' then 'designer' = any (v.my_roles)
      else false end as mine
  from visible v join drawings d on d.job_id = v.id left join jurisdictions u on u.id = v.jurisdiction_id left join latest r on r.job_id = v.id
  where v.my_roles && array[:office]::text[] and (v.archived_at is not null) = :archived
    and (:status = 'any' or v.office_status = :status)
    and (:jurisdiction = '' or v.jurisdiction_id::text = :jurisdiction)
    and (:due = 'any' or (v.due_on is not null and v.office_status <> 'closed' and v.due_on < case :due when 'late' then :today::date else :today::date + 15 end))
    and lower(concat_ws(' ', v.number, v.name, d.address_lines, d.parcel, d.owner_name, d.permit_number, u.name)) like all (array[:words]::text[])
)`;
const TABS: Readonly<Record<JobsQuery["tab"], string>> = {
  all: "true", mine: "mine", draft: "state in ('draft', 'returned')", review: "state in ('in review', 'sealing')", sealed: "state in ('sealed', 'void')",
};
const ORDER: Readonly<Record<JobsQuery["sort"], string>> = {
  changed: "updated_at desc, id", number: "number desc, id", name: "lower(name), id", due: "due_on nulls last, updated_at desc, id",
};

interface Row extends CountedRow {
  number: string; name: string; updatedAt: Date; dueOn: string | null; officeStatus: JobLine["officeStatus"]; archivedAt: Date | null; myRoles: Role[];
  jurisdiction: string | null; addressLines: string; parcel: string; permitNumber: string; edition: Edition; letter: string | null; state: JobLine["state"]; mine: boolean;
}

/** Words as the database compares them: each must occur; signs of its patterns stand for themselves. */
const patterns = (q: string): string[] => {
  const words = q.toLowerCase().split(/\s+/).filter(Boolean).map((word) => `%${word.replace(/[\\%_]/g, "\\$&")}%`);
  return words.length > 0 ? words : ["%"];
};

/** The register: jobs in which the person has an office role, found, filtered and paged by the database. */
export async function listJobs(actor: Actor, query: JobsQuery): Promise<JobsAnswer> {
  const { sequelize } = database();
  const replacements = {
    me: actor.id, office: OFFICE, archived: query.archived === "yes", status: query.status, jurisdiction: query.jurisdiction ?? "", due: query.due, today: query.today ?? today(),
    words: patterns(query.q), limit: query.limit, offset: query.offset,
  };
  const [rows, [tabs], jurisdictions] = await Promise.all([
    sequelize.query<Row>(`${MATCHED} select id, number, name, updated_at as "updatedAt", due_on::text as "dueOn", office_status as "officeStatus", archived_at as "archivedAt", my_roles as "myRoles",
      jurisdiction, drawing_id as "drawingId", sequence, checked_sequence as "checkedSequence", checked_rule_set as "checkedRuleSet", check_counts as "checkCounts", address_lines as "addressLines", parcel,
      permit_number as "permitNumber", edition, revision_id as "revisionId", letter, state, revision_sequence as "revisionSequence", revision_rule_set as "revisionRuleSet", mine
      from matched where ${TABS[query.tab]} order by ${ORDER[query.sort]} limit :limit offset :offset`, { type: QueryTypes.SELECT, replacements }),
    sequelize.query<Record<JobsQuery["tab"], number>>(`${MATCHED} select ${Object.entries(TABS).map(([tab, test]) => `count(*) filter (where ${test})::int as "${tab}"`).join(", ")} from matched`, { type: QueryTypes.SELECT, replacements }),
    sequelize.query<{ id: string; name: string }>(
      `select distinct u.id, u.name from jurisdictions u join jobs j on j.jurisdiction_id = u.id
       where j.id in (select job_id from job_members where user_id = :me) or j.company_id in (select company_id from memberships where user_id = :me and 'administrator' = any (roles))
       order by u.name limit 200`, { type: QueryTypes.SELECT, replacements },
    ),
  ]);
  const [counts, licensees] = await Promise.all([countsOfRows(rows), licenseesOf(rows.map((row) => row.id))]);
  return {
    total: tabs?.[query.tab] ?? 0, tabs: tabs ?? { all: 0, mine: 0, draft: 0, review: 0, sealed: 0 }, jurisdictions,
    jobs: rows.map((row) => lineOf(row, counts.get(row.drawingId) ?? null, licensees.get(row.id) ?? [], actor)),
  };
}

function lineOf(row: Row, counts: Counts | null, licensees: readonly { id: string; name: string }[], actor: Actor): JobLine {
  const roles = [...new Set(row.myRoles)];
  return {
    id: row.id, number: row.number, name: row.name, place: placeLine(row.addressLines), jurisdiction: row.jurisdiction, permitNumber: row.permitNumber,
    dueOn: row.dueOn, officeStatus: row.officeStatus, archived: row.archivedAt !== null, revision: row.letter, state: row.state, counts, roles,
    waitsFor: waitsFor({ roles, revision: row.state === "draft" ? null : { state: row.state as RevisionState }, counts, licensees, userId: actor.id }),
    edition: row.edition, addressLines: row.addressLines, parcel: row.parcel, licensees: licensees.map((each) => each.name), changedAt: row.updatedAt.toISOString(),
  };
}

/** Town of an address: its last part that is no street. */
const placeLine = (addressLines: string) => addressLines.split(/[\n,]/).map((part) => part.trim()).filter(Boolean)[1] ?? addressLines.trim();

async function licenseesOf(jobIds: readonly string[]): Promise<Map<string, { id: string; name: string }[]>> {
  const found = new Map<string, { id: string; name: string }[]>();
  if (jobIds.length === 0) return found;
  const rows = await database().sequelize.query<{ jobId: string; id: string; name: string }>(
    `select m.job_id as "jobId", u.id, u.name from job_members m join users u on u.id = m.user_id where m.job_id in (:jobIds) and 'licensee' = any (m.roles) order by u.name`,
    { type: QueryTypes.SELECT, replacements: { jobIds } },
  );
  for (const { jobId, ...person } of rows) found.set(jobId, [...(found.get(jobId) ?? []), person]);
  return found;
}
