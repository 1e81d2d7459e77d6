import "server-only";
import type { Transaction } from "sequelize";
import type { z } from "zod";
import { FILE_BYTES, type FileAnswer, type uploadQuery } from "@/lib/api";
import type { StoredFile } from "@/models";
import { interrupted, readUpload } from "@/lib/server/files/upload";
import { fileTooLarge, inspectFile, type InspectedFile } from "@/lib/server/files/inspect";
import { displayName } from "@/lib/server/files/names";
import { conflict, notFound } from "@/lib/server/http/problem";
import { discard, exists, putOnce } from "@/lib/server/storage";
import type { Actor } from "./actor";
import { audit } from "./audit";
import { database, inTransaction } from "./database";
import { addAccess, fileAccess, listAccess, placeOf, type FileOwner } from "./fileAccess";
import { touchJob } from "./touch";

/** Most files kept at one place; beyond this a list is of no use any more. */
const FILES_AT_ONE_PLACE = 1_000;
const FOLDER = "files";

const fileAnswer = (row: StoredFile, remove: boolean): FileAnswer => ({
  id: row.id, name: row.name, purpose: row.purpose, contentType: row.contentType, bytes: row.bytes, digest: row.digest, widthPx: row.widthPx ?? null,
  heightPx: row.heightPx ?? null, pages: row.pages ?? null, uploadedBy: row.uploader?.name ?? "", uploadedAt: row.uploadedAt.toISOString(), may: { remove },
});

/** Files that are there, newest first, without asking who wants to know: for answers that have asked already. */
export async function filesOf(owner: FileOwner, remove: boolean): Promise<FileAnswer[]> {
  const rows = await database().StoredFile.findAll({
    where: { ...placeOf(owner), removedAt: null }, include: [{ model: database().User, as: "uploader", attributes: ["name"] }],
    order: [["uploadedAt", "DESC"], ["id", "ASC"]], limit: FILES_AT_ONE_PLACE,
  });
  return rows.map((row) => fileAnswer(row, remove));
}

/** Files of a job or of a library entry that the person may see. @throws Problem 404 or 403 */
export async function listFiles(actor: Actor, owner: FileOwner): Promise<FileAnswer[]> {
  const access = await listAccess(actor, owner);
  return filesOf(owner, access.remove);
}

/**
 * Takes a file: permission, then the whole body, then what it is, then the store, and the row last. So a file that was
 * refused or broke off has left nothing behind.
 * @throws Problem 404, 403, 400 `interrupted`, 413, 422, 409 when the place is full, 503 `store-down`
 */
export async function addFile(actor: Actor, owner: FileOwner, about: z.output<typeof uploadQuery>, request: Request): Promise<FileAnswer> {
  // Before a byte is read: a stranger does not get to send twenty megabytes.
  await addAccess(actor, owner);
  const file = await inspectFile(await readUpload(request, FILE_BYTES, fileTooLarge), about.purpose);
  if (request.signal.aborted) throw interrupted();
  const stored = await putOnce(FOLDER, file.bytes, file.contentType);
  try {
    return await inTransaction(async (transaction) => {
      const { row, remove } = await writeRow(actor, owner, about, file, stored.digest, transaction);
      // Somebody else's failed upload of the same bytes may have taken them out again before our lock.
      if (!(await exists(stored.key))) await putOnce(FOLDER, file.bytes, file.contentType);
      return fileAnswer(row, remove);
    });
  } catch (error) {
    await discardUnused(stored.key);
    throw error;
  }
}

async function writeRow(
  actor: Actor, owner: FileOwner, about: z.output<typeof uploadQuery>, file: InspectedFile, digest: string, transaction: Transaction,
): Promise<{ row: StoredFile; remove: boolean }> {
  const { StoredFile, User } = database();
  // Permission again, now that the body took its time.
  const { companyId, remove } = await addAccess(actor, owner, transaction);
  await lockObject(`${FOLDER}/${digest}`, transaction);
  if ((await StoredFile.count({ where: { ...placeOf(owner), removedAt: null }, transaction })) >= FILES_AT_ONE_PLACE) {
    throw conflict("files-full", `There are ${FILES_AT_ONE_PLACE.toLocaleString("en-US")} files here already. Remove some first.`);
  }
  const name = displayName(about.name, file.contentType);
  const row = await StoredFile.create(
    {
      companyId, ...placeOf(owner), purpose: about.purpose, name, contentType: file.contentType, bytes: file.bytes.length, digest, objectKey: `${FOLDER}/${digest}`,
      widthPx: file.widthPx, heightPx: file.heightPx, pages: file.pages, uploadedBy: actor.id,
    },
    { transaction },
  );
  row.uploader = await User.findByPk(actor.id, { attributes: ["name"], transaction, rejectOnEmpty: true });
  if (row.jobId) await touchJob(row.jobId, transaction);
  await audit(transaction, actor, {
    action: "file.add", subject: `files/${row.id}`, companyId, ...(row.jobId ? { jobId: row.jobId } : {}),
    detail: { name, purpose: about.purpose, contentType: file.contentType, bytes: file.bytes.length, digest, ...(row.libraryEntryId ? { libraryEntryId: row.libraryEntryId } : {}) },
  });
  return { row, remove };
}

/** Held until the transaction ends: who writes a row for an object and who takes the object out never meet. */
const lockObject = (key: string, transaction: Transaction) =>
  database().sequelize.query("select pg_advisory_xact_lock(hashtextextended(:key, 0))", { replacements: { key }, transaction });

/** An object whose row could not be written goes again, unless another row needs it. What fails here is only an object that nothing leads to. */
async function discardUnused(key: string): Promise<void> {
  try {
    await inTransaction(async (transaction) => {
      await lockObject(key, transaction);
      if ((await database().StoredFile.count({ where: { objectKey: key }, transaction })) === 0) await discard(key);
    });
  } catch (error) {
    console.error(`could not take out ${key}:`, error);
  }
}

/** Marks a file as removed. The bytes stay, since something sealed may refer to them. @throws Problem 404 or 403 */
export async function removeFile(actor: Actor, fileId: string): Promise<void> {
  await inTransaction(async (transaction) => {
    const row = await database().StoredFile.findOne({ where: { id: fileId, removedAt: null }, transaction, lock: transaction.LOCK.UPDATE });
    if (!row) throw notFound();
    await fileAccess(actor, row, "remove", transaction);
    await row.update({ removedAt: new Date(), removedBy: actor.id }, { transaction });
    if (row.jobId) await touchJob(row.jobId, transaction);
    await audit(transaction, actor, {
      action: "file.remove", subject: `files/${row.id}`, companyId: row.companyId, ...(row.jobId ? { jobId: row.jobId } : {}),
      detail: { name: row.name, purpose: row.purpose, digest: row.digest },
    });
  });
}

/** What a download needs to know of a file. */
export type ReadableFile = Pick<StoredFile, "name" | "contentType" | "bytes" | "digest" | "objectKey">;

/** A file the person may read. @throws Problem 404, also for one that was removed; 403 */
export async function readableFile(actor: Actor, fileId: string): Promise<ReadableFile> {
  const row = await database().StoredFile.findOne({ where: { id: fileId, removedAt: null } });
  if (!row) throw notFound();
  await fileAccess(actor, row, "view");
  return row;
}
