import "server-only";
import { createHash } from "node:crypto";
import { isDeepStrictEqual } from "node:util";
import { QueryTypes, UniqueConstraintError, type Transaction } from "sequelize";
import type { ImportAnswer, ImportFault, ImportPreview, ImportRow, LibraryData } from "@/lib/api";
import { rowData, rowName, shown, type Cell } from "@/lib/equipment/libraryTableRow";
import { entryCells, plainHeading, tableColumns } from "@/lib/equipment/libraryTable";
import { Problem, conflict } from "@/lib/server/http/problem";
import { readTable, writeTable } from "@/lib/server/http/table";
import { companyAccess, type Actor } from "./actor";
import { audit } from "./audit";
import { database, inTransaction } from "./database";
import { identityOf, knownKind, readData, stillInvented } from "./libraryRows";

const MOST_ROWS = 2000;
const MOST_FAULTS = 2000;
interface Present { id: string; name: string; version: number; archived: boolean; starter: boolean; data: LibraryData }

const unusable = (detail: string) => new Problem(422, "table", "The table cannot be used", detail, { field: "file" });

/** Entries of one kind by their name in small letters. */
async function presentEntries(companyId: string, kind: string, transaction: Transaction, lock: boolean): Promise<Map<string, Present>> {
  const rows = await database().sequelize.query<Present>(
    `select e.id, e.name, e.current_version as version, e.archived_at is not null as archived, e.starter, v.data
       from library_entries e join library_versions v on v.entry_id = e.id and v.version = e.current_version
      where e.company_id = :companyId and e.kind = :kind order by lower(e.name) ${lock ? "for update of e" : ""}`,
    { replacements: { companyId, kind }, type: QueryTypes.SELECT, transaction },
  );
  return new Map(rows.map((row) => [row.name.toLowerCase(), { ...row, data: readData(kind, row.data) }]));
}

/** What the table would do to the entries there are. @throws Problem 422 when it is no table of this kind at all */
function plan(kind: string, bytes: Uint8Array, present: ReadonlyMap<string, Present>): ImportPreview {
  const definition = knownKind(kind);
  const [headings = [], ...records] = readTable(bytes);
  if (records.length > MOST_ROWS) throw unusable(`It has ${records.length} rows; ${MOST_ROWS} can be taken in at once.`);
  const known = tableColumns(definition);
  const columns = headings.map((heading) => known.find((column) => column.accepted.includes(plainHeading(heading))) ?? null);
  if (!columns.some((column) => column?.holds === "name")) throw unusable("It has no column Name in its first row. The template has all columns.");
  const twice = columns.findIndex((column, index) => column !== null && columns.indexOf(column) !== index);
  if (twice >= 0) throw unusable(`Column ${headings[twice]} stands in it twice.`);
  const preview: ImportPreview = {
    kind, digest: "", total: 0, good: [], faults: [],
    unknownColumns: headings.filter((heading, index) => columns[index] === null && (heading !== "" || records.some((record) => (record[index] ?? "") !== ""))).map((heading) => heading || "(no heading)"),
  };
  const seen = new Map<string, number>();
  records.forEach((record, index) => {
    if (record.every((text) => text.trim() === "")) return;
    preview.total += 1;
    const cells = headings.map((heading, at): Cell => ({ column: columns[at] ?? null, heading, text: record[at] ?? "" }));
    const row = index + 2;
    const extra = record.findIndex((text, at) => at >= headings.length && text.trim() !== "");
    const read = readRow(cells, row);
    preview.faults.push(...read.faults, ...(extra < 0 ? [] : [{ row, column: `column ${extra + 1}`, value: shown(record[extra] ?? ""), reason: "stands beyond the last heading" }]));
    if (preview.faults.length > MOST_FAULTS) throw unusable(`More than ${MOST_FAULTS} cells cannot be read. Is it a table of this kind?`);
    if (read.good && extra < 0) preview.good.push(read.good);
  });
  preview.digest = digestOf(kind, bytes, preview.good);
  return preview;

  function readRow(cells: readonly Cell[], row: number): { faults: ImportFault[]; good: ImportRow | null } {
    const named = rowName(cells);
    const name = "name" in named ? named.name : "";
    const there = present.get(name.toLowerCase());
    const { data, faults } = rowData(definition, cells, there?.data ?? null);
    const heading = cells.find((cell) => cell.column?.holds === "name")?.heading ?? "Name";
    if ("fault" in named) faults.unshift(named.fault);
    const before = name === "" ? undefined : seen.get(name.toLowerCase());
    if (before !== undefined) faults.unshift({ column: heading, value: name, reason: `stands in row ${before} already` });
    if (name !== "" && before === undefined) seen.set(name.toLowerCase(), row);
    if (there?.archived) faults.unshift({ column: heading, value: name, reason: "is the name of an archived entry; take it out of the archive first" });
    if (faults.length > 0) return { faults: faults.map((fault) => ({ row, ...fault })), good: null };
    const action = !there ? "add" : isDeepStrictEqual(there.data, data) ? "same" : "new version";
    return { faults: [], good: { row, name, action, data, entryId: there?.id ?? null, baseVersion: there?.version ?? null } };
  }
}

/** Stands for the table and for what it would do now: another table, or a library that was changed since, gives another one. */
function digestOf(kind: string, bytes: Uint8Array, rows: readonly ImportRow[]): string {
  const steps = rows.map(({ row, action, entryId, baseVersion }) => [row, action, entryId, baseVersion]);
  return createHash("sha256").update(JSON.stringify([kind, steps])).update("\n").update(bytes).digest("hex");
}

/** What a table would do. Writes nothing. */
export async function previewImport(actor: Actor, companyId: string, kind: string, bytes: Uint8Array): Promise<ImportPreview> {
  return inTransaction(async (transaction) => {
    await companyAccess(actor, companyId, "library.edit", transaction);
    knownKind(kind);
    return plan(kind, bytes, await presentEntries(companyId, kind, transaction, false));
  });
}

/**
 * Takes the good rows of a table in, all of them or none.
 * @param digest of the preview that was shown
 * @throws Problem 409 when the table or the library is not what the preview was made of
 */
export async function confirmImport(actor: Actor, companyId: string, kind: string, bytes: Uint8Array, digest: string): Promise<ImportAnswer> {
  try {
    return await inTransaction(async (transaction) => {
      await companyAccess(actor, companyId, "library.edit", transaction);
      knownKind(kind);
      const present = await presentEntries(companyId, kind, transaction, true);
      const preview = plan(kind, bytes, present);
      if (preview.digest !== digest) throw changedSince();
      const answer = await write(actor, companyId, preview, present, transaction);
      await audit(transaction, actor, { action: "library.import", subject: `companies/${companyId}`, companyId, detail: { kind, ...answer, refusedRows: preview.total - preview.good.length } });
      return answer;
    });
  } catch (error) {
    // Somebody else took in the same name at the same moment.
    throw error instanceof UniqueConstraintError ? changedSince() : error;
  }
}

const changedSince = () => conflict("import-changed", "The table or the library is not what the preview showed. Nothing was written; look at the preview again.");

/** The headings of a kind's table, and its entries under them where they are asked for: what can be filled in and taken in again. */
export async function exportTable(actor: Actor, companyId: string, kind: string, filled: boolean): Promise<string> {
  return inTransaction(async (transaction) => {
    await companyAccess(actor, companyId, "library.view", transaction);
    const columns = tableColumns(knownKind(kind));
    const present = filled ? [...(await presentEntries(companyId, kind, transaction, false)).values()].filter((each) => !each.archived) : [];
    return writeTable([columns.map((column) => column.heading), ...present.map((each) => entryCells(columns, each.name, each.data))]);
  });
}

const NOTE = "From a table";

async function write(actor: Actor, companyId: string, preview: ImportPreview, present: ReadonlyMap<string, Present>, transaction: Transaction): Promise<ImportAnswer> {
  const { LibraryEntry, LibraryVersion } = database();
  const made = preview.good.filter((row) => row.action === "add");
  const changed = preview.good.filter((row) => row.action === "new version");
  const added = await LibraryEntry.bulkCreate(
    made.map(({ name, data }) => ({ companyId, kind: preview.kind, name, ...identityOf(data), currentVersion: 1, createdBy: actor.id })), { transaction },
  );
  const version = (entryId: string, number: number, data: LibraryData) => ({ entryId, version: number, data, note: NOTE, madeBy: actor.id });
  await LibraryVersion.bulkCreate([
    ...added.map((row, index) => version(row.id, 1, made[index]?.data ?? { props: {}, sources: {}, ports: {} })),
    ...changed.map((row) => version(row.entryId ?? "", (row.baseVersion ?? 0) + 1, row.data)),
  ], { transaction });
  for (const { entryId, baseVersion, data, name } of changed) {
    const starter = (present.get(name.toLowerCase())?.starter ?? false) && stillInvented(data);
    await LibraryEntry.update({ ...identityOf(data), currentVersion: (baseVersion ?? 0) + 1, starter }, { where: { id: entryId ?? "" }, transaction });
  }
  return { added: made.length, changed: changed.length, same: preview.good.length - made.length - changed.length };
}
