import { createHash } from "node:crypto";
import { QueryTypes } from "sequelize";
import { database } from "@/lib/server/data/database";
import { finishSheets, sheetSource, startSheets } from "@/lib/server/data/sheetSets";
import { putOnce } from "@/lib/server/storage";

/** Jobs that wait for the worker, for one revision. */
export async function queuedJobs(revisionId: string): Promise<{ sealed: boolean }[]> {
  const rows = await database().sequelize.query<{ key: string }>(
    "select key from graphile_worker.jobs where key like :key", { replacements: { key: `renderSheets:${revisionId}:%` }, type: QueryTypes.SELECT },
  );
  return rows.map((row) => ({ sealed: row.key.endsWith(":sealed") }));
}

/**
 * Stands in for the drawing of the PDF alone: what the sheets are drawn from is read, and bytes are stored and noted, as the
 * worker does it.
 * @returns the bytes and their SHA-256
 */
export async function drawSheets(revisionId: string, sealed: boolean): Promise<{ bytes: Buffer; digest: string }> {
  await startSheets(revisionId, sealed);
  const source = await sheetSource(revisionId, sealed);
  const bytes = Buffer.from(`%PDF-1.4\n% ${source.letter} ${source.digest} ${source.seal?.sealCode ?? "not sealed"}\n%%EOF\n`);
  const file = await putOnce("sheets", bytes, "application/pdf");
  await finishSheets(revisionId, sealed, { objectKey: file.key, digest: file.digest, bytes: file.bytes, sheets: 2 });
  return { bytes, digest: createHash("sha256").update(bytes).digest("hex") };
}
