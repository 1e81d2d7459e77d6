import "server-only";
import { QueryTypes, type Transaction } from "sequelize";
import type { SheetSetAnswer } from "@/lib/api";
import { drawingDigest } from "@/lib/diagram/canonical";
import type { Drawing } from "@/lib/diagram/schema";
import type { CheckResult } from "@/lib/rules/engine/types";
import { nextState, withAcceptances } from "@/lib/workflow";
import type { Revision, Seal, SheetSet } from "@/models";
import { audit } from "./audit";
import { database, inTransaction } from "./database";
import { touchJob } from "./touch";

/** One line of the revision table on the sheets, oldest first. */
export interface RevisionTableRow { letter: string; description: string; date: string; by: string }
/** Everything that a sheet set of one revision is drawn from. */
export interface SheetSource {
  revisionId: string;
  kind: "preview" | "sealed";
  drawing: Drawing;
  /** As issued, with the licensee's acceptances. */
  check: CheckResult;
  digest: string;
  ruleSet: string;
  letter: string;
  issue: number;
  purpose: string;
  issuedAt: Date;
  revisions: RevisionTableRow[];
  /** Whether the file gets a bookmark for each sheet. */
  bookmarks: boolean;
  /** Null on a preview. `graphicKey` leads to the seal graphic (PNG) in the store. */
  seal: {
    licensee: string; title: string; state: string; number: string; expiresOn: string; sealCode: string; sealedAt: Date; graphicKey: string;
  } | null;
}
/** What the worker stored. `digest` is the SHA-256 of the file. */
export interface DrawnSheets { objectKey: string; digest: string; bytes: number; sheets: number }

export const SHEETS_TASK = "renderSheets";
/** Tries before a failed drawing of the sheets is given up. */
export const SHEETS_ATTEMPTS = 4;

/** Asks the worker for the sheets, as part of the transaction: without commit there is no job. */
export async function queueSheets(revisionId: string, kind: "preview" | "sealed", transaction: Transaction): Promise<void> {
  const { sequelize, SheetSet } = database();
  const [set] = await SheetSet.findOrCreate({ where: { revisionId, kind }, defaults: { revisionId, kind, state: "queued" }, transaction });
  if (set.state === "ready") return;
  await set.update({ state: "queued", error: null, finishedAt: null }, { transaction });
  await sequelize.query(
    "select graphile_worker.add_job(:task, json_build_object('revisionId', :revisionId::text, 'sealed', :sealed::boolean), job_key := :key, max_attempts := :attempts)",
    {
      type: QueryTypes.SELECT, transaction,
      replacements: { task: SHEETS_TASK, revisionId, sealed: kind === "sealed", key: `${SHEETS_TASK}:${revisionId}:${kind}`, attempts: SHEETS_ATTEMPTS },
    },
  );
}

/**
 * What the sheets of a revision are drawn from.
 * @throws Error when there is no such revision, or a sealed set is asked for without a seal in progress or done
 */
export async function sheetSource(revisionId: string, sealed: boolean): Promise<SheetSource> {
  const { Revision, Seal, FindingAcceptance, User } = database();
  const revision = await Revision.findByPk(revisionId, {
    include: [{ model: Seal, as: "seal" }, { model: FindingAcceptance, as: "acceptances" }],
  });
  if (!revision) throw new Error(`no revision ${revisionId}`);
  if (sealed && !revision.seal) throw new Error(`revision ${revisionId} has no seal`);
  const earlier = await Revision.findAll({
    where: { jobId: revision.jobId }, attributes: ["id", "letter", "issue", "description", "purpose", "issuedAt", "state"],
    include: [{ model: User, as: "issuer", attributes: ["name"] }], order: [["issuedAt", "ASC"]],
  });
  const rows = earlier.filter((each) => each.id === revision.id || (each.issuedAt < revision.issuedAt && ["sealed", "superseded", "void"].includes(each.state)));
  return {
    revisionId, kind: sealed ? "sealed" : "preview", drawing: revision.snapshot, check: checkOf(revision), digest: revision.digest, ruleSet: revision.ruleSet,
    letter: revision.letter, issue: revision.issue, purpose: revision.purpose, issuedAt: revision.issuedAt,
    bookmarks: revision.jurisdiction?.bookmarks ?? true,
    revisions: rows.map((each) => ({
      letter: each.letter, description: each.description || each.purpose, date: each.issuedAt.toISOString().slice(0, 10), by: each.issuer?.name ?? "",
    })),
    seal: sealed && revision.seal ? sealFacts(revision.seal) : null,
  };
}

const sealFacts = (seal: Seal) => ({
  licensee: seal.licenseeName, title: seal.licenseTitle, state: seal.licenseState, number: seal.licenseNumber, expiresOn: seal.licenseExpiresOn,
  sealCode: seal.sealCode, sealedAt: seal.sealedAt, graphicKey: seal.sealObjectKey,
});

/** Check result of a revision with what was accepted. The acceptances must have been loaded. */
export function checkOf(revision: Revision): CheckResult {
  return withAcceptances(revision.checkResult, (revision.acceptances ?? []).map((each) => ({
    findingKey: each.findingKey, reason: each.reason, by: each.byName, license: each.licenseText, on: each.acceptedOn,
  })));
}

/** Notes that the worker has begun. */
export async function startSheets(revisionId: string, sealed: boolean): Promise<void> {
  await database().SheetSet.update({ state: "drawing", error: null }, { where: { revisionId, kind: kindOf(sealed), state: ["queued", "failed", "drawing"] } });
}

/**
 * Notes the stored bytes; for a sealed set this completes the seal. May be run again with the same bytes.
 * @throws Error when other bytes were stored before, or the revision is not being sealed any more
 */
export async function finishSheets(revisionId: string, sealed: boolean, drawn: DrawnSheets): Promise<void> {
  const { Revision, Drawing, SheetSet } = database();
  await inTransaction(async (transaction) => {
    const revision = await Revision.findByPk(revisionId, { transaction, lock: transaction.LOCK.UPDATE });
    const set = await SheetSet.findOne({ where: { revisionId, kind: kindOf(sealed) }, transaction, lock: transaction.LOCK.UPDATE });
    if (!revision || !set) throw new Error(`no sheets wanted for revision ${revisionId}`);
    if (set.state === "ready") {
      if (set.digest !== drawn.digest && sealed) throw new Error(`revision ${revisionId} was sealed with other bytes`);
      if (sealed) return;
    }
    await set.update({ ...drawn, state: "ready", error: null, finishedAt: new Date() }, { transaction });
    if (!sealed) return;
    if (nextState(revision.state, "finish seal") === null) throw new Error(`revision ${revisionId} is ${revision.state} and not being sealed`);
    await completeSeal(revision, drawn, transaction);
    const drawing = await Drawing.findByPk(revision.drawingId, { transaction, lock: transaction.LOCK.SHARE });
    if (drawing) await markSealAgainstDraft(drawing.jobId, drawing.document, transaction);
  });
}

async function completeSeal(revision: Revision, drawn: DrawnSheets, transaction: Transaction): Promise<void> {
  const { Revision, Seal } = database();
  const now = new Date();
  await Revision.update({ state: "superseded", supersededAt: now }, { where: { jobId: revision.jobId, state: ["sealed", "void"] }, transaction });
  await revision.update({ state: "sealed" }, { transaction });
  await Seal.update({ completedAt: now }, { where: { revisionId: revision.id }, transaction });
  await touchJob(revision.jobId, transaction);
  await audit(transaction, null, {
    action: "revision.sealed", subject: `revisions/${revision.id}`, jobId: revision.jobId,
    detail: { letter: revision.letter, drawingDigest: revision.digest, fileDigest: drawn.digest },
  });
}

/** Notes a failure. At the last try a seal in progress is taken back, so that the licensee can seal again. */
export async function failSheets(revisionId: string, sealed: boolean, message: string, last: boolean): Promise<void> {
  const { Revision, Seal, SheetSet } = database();
  await inTransaction(async (transaction) => {
    const revision = await Revision.findByPk(revisionId, { transaction, lock: transaction.LOCK.UPDATE });
    const set = await SheetSet.findOne({ where: { revisionId, kind: kindOf(sealed) }, transaction, lock: transaction.LOCK.UPDATE });
    if (!revision || !set || set.state === "ready") return;
    await set.update({ state: last ? "failed" : "queued", error: message.slice(0, 500), finishedAt: last ? new Date() : null }, { transaction });
    if (!sealed || !last || nextState(revision.state, "seal failed") === null) return;
    await Seal.destroy({ where: { revisionId, completedAt: null }, transaction });
    await revision.update({ state: "in review" }, { transaction });
    await audit(transaction, null, { action: "revision.seal.failed", subject: `revisions/${revisionId}`, jobId: revision.jobId, detail: { message: message.slice(0, 500) } });
  });
}

/** Sealed sheets hold while the drawing is the sealed one; a change makes the seal void, taking it back restores it. */
export async function markSealAgainstDraft(jobId: string, document: Drawing, transaction: Transaction, title = ""): Promise<void> {
  const current = await database().Revision.findOne({
    where: { jobId, state: ["sealed", "void"] }, attributes: ["id", "state", "digest", "ruleSet", "letter"], transaction, lock: transaction.LOCK.UPDATE,
  });
  if (!current) return;
  const same = drawingDigest(document, current.ruleSet) === current.digest;
  const state = nextState(current.state, same ? "draft restored" : "draft changed");
  if (state === null) return;
  await current.update({ state, voidedAt: same ? null : new Date() }, { transaction });
  await audit(transaction, null, {
    action: same ? "revision.seal.restored" : "revision.seal.void", subject: `revisions/${current.id}`, jobId, detail: { letter: current.letter, edit: title },
  });
}

export function sheetSetAnswer(set: SheetSet | undefined): SheetSetAnswer | null {
  if (!set) return null;
  return {
    kind: set.kind, state: set.state, fileDigest: set.digest, bytes: set.bytes, sheets: set.sheets, error: set.error, finishedAt: set.finishedAt?.toISOString() ?? null,
  };
}

const kindOf = (sealed: boolean) => (sealed ? "sealed" as const : "preview" as const);
