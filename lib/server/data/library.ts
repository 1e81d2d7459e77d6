import "server-only";
import { isDeepStrictEqual } from "node:util";
import { QueryTypes, UniqueConstraintError, type Transaction } from "sequelize";
import type { z } from "zod";
import type { LibraryEntryAnswer, LibraryListAnswer, LibraryVersionAnswer, libraryEntryChange, libraryEntryInput, libraryQuery } from "@/lib/api";
import { mayInCompany } from "@/lib/policy";
import type { LibraryEntry, LibraryVersion } from "@/models";
import { conflict, notFound, unprocessable } from "@/lib/server/http/problem";
import { companyAccess, type Actor } from "./actor";
import { audit } from "./audit";
import { database, inTransaction } from "./database";
import { filesOf } from "./files";
import { usesOf } from "./libraryUse";
import { identityOf, libraryLine, readData, soundData, stillInvented } from "./libraryRows";
import { findEntries } from "./librarySearch";

const nameTaken = (error: unknown) => error instanceof UniqueConstraintError
  ? conflict("name-taken", "Another entry of this kind has this name. It may be an archived one.", { field: "name" }) : error;

/** Entries of a company's library, by name. `archived` lists the archived ones instead. */
export async function listLibrary(actor: Actor, companyId: string, query: z.output<typeof libraryQuery>): Promise<LibraryListAnswer> {
  const roles = await companyAccess(actor, companyId, "library.view");
  const { rows, total } = await findEntries(companyId, query);
  return { entries: rows.map(({ row, data }) => libraryLine(row, data)), total, may: { edit: mayInCompany(roles, "library.edit") } };
}

/** Takes an entry in, as version 1. @throws Problem 422 naming a wrong value; 409 when the name is taken */
export async function addEntry(actor: Actor, companyId: string, input: z.output<typeof libraryEntryInput>): Promise<{ id: string }> {
  const { LibraryEntry } = database();
  try {
    return await inTransaction(async (transaction) => {
      await companyAccess(actor, companyId, "library.edit", transaction);
      const data = soundData(input.kind, input.data);
      await demandOwnFiles(companyId, data, transaction);
      const row = await LibraryEntry.create({ companyId, kind: input.kind, name: input.name, ...identityOf(data), currentVersion: 1, createdBy: actor.id }, { transaction });
      await database().LibraryVersion.create({ entryId: row.id, version: 1, data, note: input.note, madeBy: actor.id }, { transaction });
      await audit(transaction, actor, { action: "library.create", subject: `library_entries/${row.id}`, companyId, detail: { kind: row.kind, name: row.name } });
      return { id: row.id };
    });
  } catch (error) {
    throw nameTaken(error);
  }
}

async function currentVersion(row: LibraryEntry, transaction: Transaction | null = null): Promise<LibraryVersion> {
  return database().LibraryVersion.findOne({ where: { entryId: row.id, version: row.currentVersion }, transaction, rejectOnEmpty: true });
}

/** One entry as it is now, its versions and where it is used. */
export async function getEntry(actor: Actor, entryId: string): Promise<LibraryEntryAnswer> {
  const { LibraryEntry, LibraryVersion, User } = database();
  const row = await LibraryEntry.findByPk(entryId);
  if (!row) throw notFound();
  const roles = await companyAccess(actor, row.companyId, "library.view");
  const edit = mayInCompany(roles, "library.edit");
  const [current, versions, usedBy, files] = await Promise.all([
    currentVersion(row),
    LibraryVersion.findAll({ where: { entryId }, attributes: ["version", "madeAt", "note"], include: [{ model: User, as: "maker", attributes: ["name"] }], order: [["version", "DESC"]] }),
    usesOf(actor, row.companyId, entryId), filesOf({ libraryEntryId: entryId }, edit),
  ]);
  const data = readData(row.kind, current.data);
  return {
    ...libraryLine(row, data), companyId: row.companyId, data, versions: versions.map(versionLine), files, usedBy, may: { edit },
  };
}

const versionLine = (row: LibraryVersion) => ({ version: row.version, by: row.maker?.name ?? "Starter set", at: row.madeAt.toISOString(), note: row.note });

/** One version of an entry, as it was written. */
export async function getVersion(actor: Actor, entryId: string, version: number): Promise<LibraryVersionAnswer> {
  const { LibraryEntry, LibraryVersion, User } = database();
  const row = await LibraryEntry.findByPk(entryId);
  if (!row) throw notFound();
  await companyAccess(actor, row.companyId, "library.view");
  const found = await LibraryVersion.findOne({ where: { entryId, version }, include: [{ model: User, as: "maker", attributes: ["name"] }] });
  if (!found) throw notFound();
  return { ...versionLine(found), data: readData(row.kind, found.data) };
}

/**
 * Changes an entry. Other values make a new version; a name and the archive do not, since drawings hold neither.
 * @throws Problem 409 `entry-changed` with the entry as it is, when somebody made a version since `baseVersion`
 */
export async function changeEntry(actor: Actor, entryId: string, change: z.output<typeof libraryEntryChange>): Promise<LibraryEntryAnswer> {
  try {
    await inTransaction((transaction) => writeChange(actor, entryId, change, transaction));
  } catch (error) {
    throw nameTaken(error);
  }
  return getEntry(actor, entryId);
}

async function writeChange(actor: Actor, entryId: string, change: z.output<typeof libraryEntryChange>, transaction: Transaction): Promise<void> {
  const row = await database().LibraryEntry.findByPk(entryId, { transaction, lock: transaction.LOCK.UPDATE });
  if (!row) throw notFound();
  await companyAccess(actor, row.companyId, "library.edit", transaction);
  const current = await currentVersion(row, transaction);
  const before = readData(row.kind, current.data);
  if (change.baseVersion !== row.currentVersion) {
    throw conflict("entry-changed", "Somebody changed this entry since you opened it. Nothing of yours was written; compare and save again.", {
      version: row.currentVersion, name: row.name, data: before,
    });
  }
  const data = change.data && soundData(row.kind, change.data);
  const renamed = change.name !== undefined && change.name !== row.name;
  const rewritten = data !== undefined && !isDeepStrictEqual(data, before);
  if (rewritten) {
    await demandOwnFiles(row.companyId, data, transaction);
    await database().LibraryVersion.create({ entryId, version: row.currentVersion + 1, data, note: change.note, madeBy: actor.id }, { transaction });
    await row.update({ ...identityOf(data), currentVersion: row.currentVersion + 1, starter: row.starter && stillInvented(data) }, { transaction });
  }
  if (renamed) await row.update({ name: change.name ?? row.name }, { transaction });
  if (rewritten || renamed) await audit(transaction, actor, { action: "library.change", ...subject(row), detail: { version: row.currentVersion, name: row.name, note: change.note } });
  if (change.archived !== undefined && change.archived !== (row.archivedAt !== null)) {
    await row.update({ archivedAt: change.archived ? new Date() : null }, { transaction });
    await audit(transaction, actor, { action: "library.archive", ...subject(row), detail: { archived: change.archived, name: row.name } });
  }
}

const subject = (row: LibraryEntry) => ({ subject: `library_entries/${row.id}`, companyId: row.companyId });

/** A source may name no file of another company: it would be offered for download. */
async function demandOwnFiles(companyId: string, data: LibraryEntryAnswer["data"], transaction: Transaction): Promise<void> {
  const files = [...new Set(Object.values(data.sources).flatMap((source) => (source.file ? [source.file] : [])))];
  if (files.length === 0) return;
  const rows = await database().sequelize.query<{ id: string }>(
    "select id from stored_files where id in (:files) and company_id = :companyId and job_id is null",
    { replacements: { files, companyId }, type: QueryTypes.SELECT, transaction },
  );
  const missing = files.find((file) => !rows.some((row) => row.id === file));
  const name = Object.entries(data.sources).find(([, source]) => source.file !== undefined && source.file === missing)?.[0];
  if (name !== undefined) throw unprocessable(`data.sources.${name}.file`, "is no file of this library");
}
