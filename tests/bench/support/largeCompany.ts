import pg from "pg";
import { RULE_SET_VERSION } from "@/lib/rules";
import { check } from "@/lib/rules/engine/run";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";
import { firstAdministrator, inCompany, type Person } from "@/tests/api/support/people";

export const JOBS = 2000;
export const ENTRIES = 5000;
export const NAMES = ["Marrow", "Cobble", "Pellow", "Quill", "Hollin", "Fenwater", "Ashby", "Brook", "Nettle", "Larkmead", "Thorn", "Weir", "Hazel", "Sorrel", "Tansy"] as const;
export const PLACES = ["barn", "workshop", "house", "dairy", "boatyard", "mill", "chapel hall", "greenhouse", "pump house", "stable", "cottage"] as const;
export const TOWNS = ["Nettlecombe", "Stannage", "Dunmouth", "Aldersea", "Fernhollow", "Orrin Bridge", "Carrick"] as const;
export const MAKERS = ["Tern", "Oddfellow", "Plover", "Ousel", "Sandmartin", "Wagtail"] as const;
export const THINGS = ["breaker", "disconnect", "inverter", "module", "battery", "wireway", "meter socket"] as const;

const array = (words: readonly string[]): string => `(array[${words.map((word) => `'${word}'`).join(", ")}])`;
const nth = (words: readonly string[], divisor: number): string => `${array(words)}[1 + (i / ${divisor}) % ${words.length}]`;

/*
 * 2,000 jobs as an office has them after years: each with a whole farm drawing, two in three with issued revisions, one in five
 * archived; a designer and a licensee on every one.
 */
const JOBS_SQL = `
create temporary table made as select i, gen_random_uuid() as job, gen_random_uuid() as drawing,
  to_char(17 + i / 220, 'FM00') || '-' || to_char(i % 220 + 1, 'FM000') as number,
  ${nth(NAMES, 1)} || ' ' || ${nth(PLACES, 15)} || ' ' || i as name, ${nth(TOWNS, 3)} as town from generate_series(1, ${JOBS}) i;
insert into jurisdictions (company_id, name, editions) select $1, town || ' County', '[{"edition": "2023", "effectiveFrom": null, "effectiveTo": null}]' from unnest(${array(TOWNS)}) town;
insert into jobs (id, company_id, number, name, jurisdiction_id, created_by, updated_at, due_on, office_status, archived_at)
  select job, $1, made.number, made.name, u.id, $2, now() - make_interval(hours => i), case when i % 3 = 0 then current_date + (i % 90 - 30) end,
    ${array(["open", "open", "open", "on hold", "closed"])}[1 + i % 5], case when i % 5 = 4 then now() end
  from made join jurisdictions u on u.company_id = $1 and u.name = town || ' County';
insert into drawings (id, job_id, document, checked_sequence, checked_rule_set, check_counts)
  select drawing, job, jsonb_set($5::jsonb, '{sheet,titleBlock}', ($5::jsonb #> '{sheet,titleBlock}') || jsonb_build_object('jobName', name, 'jobNumber', number,
    'addressLines', i || ' ' || ${nth(NAMES, 7)} || ' Lane' || chr(10) || town, 'parcel', '07-' || i, 'owner', ${nth(NAMES, 4)} || ' ' || ${nth(NAMES, 2)}, 'permitNumber', 'BP-' || 1000 + i)),
    0, $6, $7::jsonb from made;
insert into job_members (job_id, user_id, roles) select job, $3::uuid, array['designer'] from made union all select job, $4::uuid, array['licensee'] from made;
insert into revisions (job_id, drawing_id, letter, issue, purpose, description, state, sequence, snapshot, digest, rule_set, check_result, issued_by, issued_at)
  select job, drawing, letter, 1, 'issued for permit', '', case when letter = 'A' and i % 3 = 2 then 'superseded' when letter = 'A' then 'in review' else 'sealed' end,
    0, $5::jsonb, repeat('0', 64), $6, '{}', $2, now() - make_interval(hours => i + case letter when 'A' then 2 else 1 end)
  from made cross join unnest(array['A', 'B']) letter where i % 3 = 2 or (i % 3 = 1 and letter = 'A');`;

const ENTRIES_SQL = `
create temporary table made_entries as select i, gen_random_uuid() as id, ${nth(THINGS, 1)} as thing, ${nth(MAKERS, 3)} as maker from generate_series(1, ${ENTRIES}) i;
insert into library_entries (id, company_id, kind, name, make, model, current_version, created_by)
  select id, $1, ${array(["breaker", "disconnect", "hybrid-inverter", "pv-string", "battery", "breaker", "meter"])}[1 + i % 7], maker || ' ' || thing || ' ' || i, maker, upper(left(maker, 2)) || '-' || i, 1, $2 from made_entries;
insert into library_versions (entry_id, version, data, made_by) select e.id, 1, coalesce((select v.data from library_entries s join library_versions v on v.entry_id = s.id where s.company_id = $1 and s.starter and s.kind = e.kind limit 1),
  '{"ports": {}, "props": {}, "sources": {}}'), $2 from library_entries e join made_entries m on m.id = e.id;`;

export interface LargeCompany { companyId: string; administrator: Person; designer: Person; licensee: Person }

/** One statement of several at a time: the driver takes parameters for one alone, so they are written in as literals. */
async function run(client: pg.Client, sql: string, values: readonly string[]): Promise<void> {
  await client.query(sql.replace(/\$(\d)/g, (_, index: string) => client.escapeLiteral(values[Number(index) - 1] ?? "")));
}

/** A company with many jobs and entries; people are made and signed in as the product does it. */
export async function largeCompany(client: pg.Client): Promise<LargeCompany> {
  const administrator = await firstAdministrator();
  const { companyId } = administrator;
  const designer = await inCompany(administrator, companyId, ["designer"]);
  const licensee = await inCompany(administrator, companyId, ["licensee"]);
  const drawing = cleanDrawing();
  await client.query("begin");
  await run(client, JOBS_SQL, [companyId, administrator.id, designer.id, licensee.id, JSON.stringify(drawing), RULE_SET_VERSION, JSON.stringify(check(drawing).counts)]);
  await run(client, ENTRIES_SQL, [companyId, administrator.id]);
  await client.query("commit");
  await client.query("analyze");
  return { companyId, administrator, designer, licensee };
}
