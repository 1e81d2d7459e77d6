import "server-only";
import { QueryTypes } from "sequelize";
import type { z } from "zod";
import type { JobLibraryAnswer, LibraryEntryAnswer, LibraryUpdate, libraryQuery } from "@/lib/api";
import { libraryDifferences } from "@/lib/equipment/libraryDifferences";
import { isKindId, kindDefinition } from "@/lib/equipment/registry";
import { notFound } from "@/lib/server/http/problem";
import { jobAccess, type Actor } from "./actor";
import { database } from "./database";
import { libraryLine, readData } from "./libraryRows";
import { findEntries } from "./librarySearch";

/** Most entries offered for placing at once. */
const OFFERED = 200;
const MOST_USES = 200;

interface Use { jobId: string; number: string; name: string; tag: string; version: number }

/** Jobs the person may see whose drawing, as it is now, holds equipment of this entry. */
export async function usesOf(actor: Actor, companyId: string, entryId: string): Promise<LibraryEntryAnswer["usedBy"]> {
  // The first condition reads a small column, so that only drawings that use the entry are opened.
  const rows = await database().sequelize.query<Use>(
    `select j.id as "jobId", j.number, j.name, coalesce(e.value->>'tag', '') as tag, coalesce((e.value->'library'->>'version')::int, 0) as version
       from drawings d join jobs j on j.id = d.job_id, jsonb_each(d.document->'equipment') e
      where d.library_entries @> jsonb_build_array(:entryId::text)
        and j.company_id = :companyId and e.value->'library'->>'entry' = :entryId
        and (exists (select from memberships m where m.company_id = j.company_id and m.user_id = :userId and 'administrator' = any (m.roles))
          or exists (select from job_members m where m.job_id = j.id and m.user_id = :userId and m.roles && array['administrator','designer','licensee','installer']))
      order by j.updated_at desc, tag`,
    { replacements: { entryId, companyId, userId: actor.id }, type: QueryTypes.SELECT },
  );
  const jobs = new Map<string, LibraryEntryAnswer["usedBy"][number]>();
  for (const { tag, ...row } of rows) {
    // Equipment of one job may have been drawn with different versions.
    const key = `${row.jobId} ${row.version}`;
    const there = jobs.get(key);
    if (there) there.tags.push(tag);
    else if (jobs.size < MOST_USES) jobs.set(key, { ...row, tags: [tag] });
  }
  return [...jobs.values()];
}

/** What can be placed in a job's drawing: its company's entries with their values, also for somebody who is on the job alone. */
export async function jobLibrary(actor: Actor, jobId: string, query: Pick<z.output<typeof libraryQuery>, "q" | "kind">): Promise<JobLibraryAnswer> {
  const { job } = await jobAccess(actor, jobId, "drawing.view");
  const { rows } = await findEntries(job.companyId, { ...query, archived: "no", limit: OFFERED, offset: 0 });
  return { entries: rows.map(({ row, data }) => ({ ...libraryLine(row, data), data })) };
}

/** Equipment of a drawing whose entry has a later version, and what taking it over would change. */
export async function libraryUpdates(actor: Actor, jobId: string): Promise<{ updates: LibraryUpdate[] }> {
  const { job } = await jobAccess(actor, jobId, "drawing.view");
  const { Drawing, LibraryEntry } = database();
  const drawing = await Drawing.findOne({ where: { jobId }, attributes: ["document"] });
  if (!drawing) throw notFound();
  const placed = Object.entries(drawing.document.equipment).flatMap(([id, equipment]) => (equipment.library ? [{ id, equipment, ...equipment.library }] : []));
  if (placed.length === 0) return { updates: [] };
  const rows = await LibraryEntry.findAll({ where: { companyId: job.companyId, id: [...new Set(placed.map((each) => each.entry))] } });
  const entries = new Map(rows.map((row) => [row.id, row]));
  const behind = placed.filter(({ entry, version, equipment }) => {
    const row = entries.get(entry);
    return row !== undefined && row.currentVersion > version && row.kind === equipment.kind;
  });
  const versions = await versionsOf(behind.flatMap(({ entry, version }) => [{ entry, version }, { entry, version: entries.get(entry)?.currentVersion ?? version }]));
  const updates = behind.flatMap(({ id, equipment, entry, version }): LibraryUpdate[] => {
    const row = entries.get(entry);
    const now = row && versions.get(`${entry} ${row.currentVersion}`);
    if (!row || !now || !isKindId(row.kind)) return [];
    const data = readData(row.kind, now);
    const then = versions.get(`${entry} ${version}`);
    return [{
      equipment: id, tag: equipment.tag, entryId: entry, entryName: row.name, drawn: version, now: row.currentVersion, archived: row.archivedAt !== null, data,
      differences: libraryDifferences(kindDefinition(row.kind), { then: then ? readData(row.kind, then) : equipment, now: data, held: equipment }),
    }];
  });
  return { updates };
}

async function versionsOf(wanted: readonly { entry: string; version: number }[]): Promise<Map<string, JobLibraryAnswer["entries"][number]["data"]>> {
  if (wanted.length === 0) return new Map();
  const pairs = [...new Map(wanted.map((each) => [`${each.entry} ${each.version}`, each])).values()];
  const rows = await database().LibraryVersion.findAll({ where: { entryId: pairs.map((each) => each.entry), version: pairs.map((each) => each.version) } });
  return new Map(rows.map((row) => [`${row.entryId} ${row.version}`, row.data]));
}
