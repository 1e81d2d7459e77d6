import "server-only";
import { may } from "@/lib/policy";
import { DEFAULT_FILE_NAME, fileName } from "@/lib/sheets/fileName";
import { SEALED_STATES } from "@/lib/workflow";
import type { Job, Revision } from "@/models";
import { Problem, notFound } from "@/lib/server/http/problem";
import { getBytes } from "@/lib/server/storage";
import type { Actor } from "./actor";
import { audit } from "./audit";
import { inTransaction } from "./database";
import { viewRevision } from "./revisions";

export interface SheetFile { bytes: Buffer; fileName: string; digest: string; sealed: boolean }

/**
 * The PDF of a revision: the sealed bytes where it is sealed, else the office's preview.
 * @throws Problem 404 for a person who may not see it; 409 with code `sheets-not-ready` while the worker draws
 */
export async function sheetFile(actor: Actor, revisionId: string): Promise<SheetFile> {
  const { revision, job, roles } = await viewRevision(actor, revisionId);
  const sealed = SEALED_STATES.includes(revision.state);
  if (!may(roles, sealed ? "sheets.download" : "sheets.preview", revision.state)) throw notFound();
  const set = (revision.sheetSets ?? []).find((each) => each.kind === (sealed ? "sealed" : "preview"));
  if (!set) throw notFound();
  if (set.state === "failed") throw new Problem(409, "sheets-failed", "The sheets could not be drawn", set.error ?? "The sheets could not be drawn.");
  if (set.state !== "ready" || !set.objectKey || !set.digest) {
    throw new Problem(409, "sheets-not-ready", "Not ready", "The sheets are being drawn. Try again in a few seconds.", { retryAfter: 2 });
  }
  const bytes = await getBytes(set.objectKey);
  if (sealed) {
    await inTransaction((transaction) => audit(transaction, actor, {
      action: "sheets.download", subject: `revisions/${revision.id}`, jobId: job.id, detail: { letter: revision.letter, fileDigest: set.digest },
    }));
  }
  return { bytes, fileName: sheetFileName(job, revision, sealed), digest: set.digest, sealed };
}

/** Name of the whole set by the jurisdiction's template as it was at issue, for example 26-031-SET-B.pdf. */
export function sheetFileName(job: Pick<Job, "number">, revision: Pick<Revision, "letter" | "issuedAt" | "jurisdiction" | "seal">, sealed: boolean): string {
  const on = sealed && revision.seal ? revision.seal.sealedAt : revision.issuedAt;
  return fileName(revision.jurisdiction?.fileNameTemplate ?? DEFAULT_FILE_NAME, {
    job: job.number, set: sealed ? "SET" : "PREVIEW", revision: revision.letter, sheet: "ALL", date: on.toISOString().slice(0, 10),
  });
}
