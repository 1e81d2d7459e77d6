import "server-only";
import type { Task, TaskList } from "graphile-worker";
import { z } from "zod";
import { failSheets, finishSheets, SHEETS_TASK, sheetSource, startSheets } from "@/lib/server/data/sheetSets";
import { renderSheets } from "@/lib/server/pdf/sheets";
import { putOnce } from "@/lib/server/storage";

const payload = z.strictObject({ revisionId: z.string(), sealed: z.boolean() });

/** Draws the sheets of a revision and stores them. Every step may be repeated: the same revision gives the same bytes. */
const drawSheets: Task = async (raw, helpers) => {
  const { revisionId, sealed } = payload.parse(raw);
  try {
    await startSheets(revisionId, sealed);
    const source = await sheetSource(revisionId, sealed);
    const { bytes, sheets } = await renderSheets(source);
    const file = await putOnce("sheets", bytes, "application/pdf");
    await finishSheets(revisionId, sealed, { objectKey: file.key, digest: file.digest, bytes: file.bytes, sheets });
  } catch (error) {
    const message = error instanceof Error ? error.message : String(error);
    await failSheets(revisionId, sealed, message, helpers.job.attempts >= helpers.job.max_attempts);
    throw error;
  }
};

export const taskList: TaskList = { [SHEETS_TASK]: drawSheets };
