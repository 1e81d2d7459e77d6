import "server-only";
import { Op, type Transaction } from "sequelize";
import type { z } from "zod";
import type { RevisionAnswer, RevisionLine, RevisionStatus, acceptInput, issueInput } from "@/lib/api";
import { drawingDigest } from "@/lib/diagram/canonical";
import { may, type JobAction, type Role } from "@/lib/policy";
import { check } from "@/lib/rules/engine/run";
import { OPEN_STATES, carriedAcceptances, nextState, sealRefusals, type Refusal, type RevisionEvent } from "@/lib/workflow";
import type { Job, License, Revision, SheetSet } from "@/models";
import { conflict, notFound, unprocessable } from "@/lib/server/http/problem";
import { demand, jobAccess, rolesInJob, type Actor } from "./actor";
import { audit } from "./audit";
import { database, inTransaction } from "./database";
import { issuedJurisdiction } from "./jurisdictions";
import { refuseArchived } from "./jobs";
import { draftLetter } from "./letters";
import { licenseOf, today } from "./licenses";
import { checkOf, queueSheets, sheetSetAnswer } from "./sheetSets";
import { touchJob } from "./touch";

/** A revision locked for a change, with the job and the person's roles in it. @throws Problem 404 or 403 */
export async function lockRevision(actor: Actor, revisionId: string, action: JobAction, transaction: Transaction): Promise<{ revision: Revision; job: Job; roles: Role[] }> {
  const revision = await database().Revision.findByPk(revisionId, { transaction, lock: transaction.LOCK.UPDATE });
  const job = revision && (await database().Job.findByPk(revision.jobId, { transaction }));
  if (!revision || !job) throw notFound();
  const roles = await rolesInJob(actor.id, job, transaction);
  demand(roles, "revision.view", revision.state);
  // A role that may never do it is refused here; a state in which nobody may is named by the workflow.
  demand(roles, action, "in review");
  refuseArchived(job);
  return { revision, job, roles };
}

/** @throws Problem 409 when the workflow does not allow the step */
export function step(revision: Revision, event: RevisionEvent) {
  const state = nextState(revision.state, event);
  if (state === null) throw conflict("revision-state", `This revision is ${revision.state}; that is done from review only.`, { state: revision.state });
  return state;
}

/** Issues the drawing as it is for review. The server checks it; must-fix redlines go along and block the seal. */
export async function issueRevision(actor: Actor, jobId: string, input: z.output<typeof issueInput>): Promise<{ id: string }> {
  const { Drawing, Revision } = database();
  return inTransaction(async (transaction) => {
    const { job } = await jobAccess(actor, jobId, "revision.issue", { transaction });
    refuseArchived(job);
    const drawing = await Drawing.findOne({ where: { jobId }, transaction, lock: transaction.LOCK.UPDATE });
    if (!drawing) throw notFound();
    const open = await Revision.findOne({ where: { jobId, state: [...OPEN_STATES] }, attributes: ["letter"], transaction });
    if (open) throw conflict("review-open", `Rev ${open.letter} is still in review. It is returned or sealed before another is issued.`);
    if (Object.keys(drawing.document.equipment).length === 0) throw conflict("drawing-empty", "There is nothing on the sheet yet.");
    const letter = await draftLetter(jobId, transaction);
    const issue = (await Revision.count({ where: { jobId, letter }, transaction })) + 1;
    const result = check(drawing.document);
    const revision = await Revision.create(
      {
        jobId, drawingId: drawing.id, letter, issue, purpose: input.purpose, description: input.description, state: "in review",
        sequence: drawing.sequence, snapshot: drawing.document, digest: result.digest, ruleSet: result.ruleSet, checkResult: result, issuedBy: actor.id,
        jurisdiction: job.jurisdictionId ? await issuedJurisdiction(job.jurisdictionId, transaction) : null,
      },
      { transaction },
    );
    await carryAcceptances(revision, transaction);
    await touchJob(jobId, transaction);
    await queueSheets(revision.id, "preview", transaction);
    await audit(transaction, actor, {
      action: "revision.issue", subject: `revisions/${revision.id}`, jobId, detail: { letter, issue, sequence: drawing.sequence, digest: result.digest, counts: result.counts },
    });
    return { id: revision.id };
  });
}

/** What a licensee accepted in the sealed revision stays accepted while place and numbers of the finding stay. */
async function carryAcceptances(revision: Revision, transaction: Transaction): Promise<void> {
  const { FindingAcceptance, Revision } = database();
  const last = await Revision.findOne({
    where: { jobId: revision.jobId, state: ["sealed", "void"] }, include: [{ model: FindingAcceptance, as: "acceptances" }], transaction,
  });
  const accepted = last?.acceptances ?? [];
  if (!last || accepted.length === 0) return;
  const keys = carriedAcceptances(last.checkResult, revision.checkResult, accepted.map((each) => each.findingKey));
  await FindingAcceptance.bulkCreate(
    accepted.filter((each) => keys.includes(each.findingKey)).map(({ findingKey, reason, acceptedBy, byName, licenseText, acceptedOn }) => ({
      revisionId: revision.id, findingKey, reason, acceptedBy, byName, licenseText, acceptedOn,
    })),
    { transaction },
  );
}

/** Revisions of a job that the person may see, newest first. */
export async function listRevisions(actor: Actor, jobId: string): Promise<RevisionLine[]> {
  const { roles } = await jobAccess(actor, jobId, "job.view");
  const { FindingAcceptance, Revision, Seal, User } = database();
  const rows = await Revision.findAll({
    where: { jobId }, attributes: { exclude: ["snapshot"] }, order: [["issuedAt", "DESC"]],
    include: [
      { model: User, as: "issuer", attributes: ["name"] }, { model: User, as: "returner", attributes: ["name"] },
      { model: Seal, as: "seal" }, { model: FindingAcceptance, as: "acceptances" },
    ],
  });
  return rows.filter((row) => may(roles, "revision.view", row.state)).map((row) => ({
    id: row.id, letter: row.letter, issue: row.issue, purpose: row.purpose, description: row.description, state: row.state,
    issuedBy: row.issuer?.name ?? "", issuedAt: row.issuedAt.toISOString(),
    sealedBy: row.seal?.completedAt ? row.seal.licenseeName : null, sealedAt: row.seal?.completedAt ? row.seal.sealedAt.toISOString() : null,
    sealCode: row.seal?.completedAt ? row.seal.sealCode : null,
    returnComment: row.returnComment, returnedBy: row.returner?.name ?? null, voidedAt: row.voidedAt?.toISOString() ?? null, counts: checkOf(row).counts,
  }));
}

/** A revision the person may see, without a lock. @throws Problem 404 or 403 */
export async function viewRevision(actor: Actor, revisionId: string): Promise<{ revision: Revision; job: Job; roles: Role[] }> {
  const { FindingAcceptance, Job, Revision, Seal, SheetSet, User } = database();
  const revision = await Revision.findByPk(revisionId, {
    include: [
      { model: Job, as: "job" }, { model: User, as: "issuer", attributes: ["name"] }, { model: User, as: "returner", attributes: ["name"] },
      { model: Seal, as: "seal" }, { model: SheetSet, as: "sheetSets" }, { model: FindingAcceptance, as: "acceptances" },
    ],
  });
  if (!revision?.job) throw notFound();
  const roles = await rolesInJob(actor.id, revision.job);
  demand(roles, "revision.view", revision.state);
  return { revision, job: revision.job, roles };
}

/** A revision with its drawing, check result, seal and what the person may do next. */
export async function getRevision(actor: Actor, revisionId: string): Promise<RevisionAnswer> {
  const { revision, job, roles } = await viewRevision(actor, revisionId);
  const checked = checkOf(revision);
  const [previous, refusals] = await Promise.all([
    database().Revision.findOne({
      where: { jobId: job.id, state: ["sealed", "superseded", "void"], issuedAt: { [Op.lt]: revision.issuedAt } },
      attributes: ["id", "letter"], order: [["issuedAt", "DESC"]],
    }),
    may(roles, "revision.seal", "in review") ? refusalsFor(revision, await licenseOf(actor.id)) : [],
  ]);
  const { seal } = revision;
  return {
    id: revision.id, jobId: job.id, jobNumber: job.number, jobName: job.name, letter: revision.letter, issue: revision.issue, purpose: revision.purpose,
    description: revision.description, state: revision.state, issuedBy: revision.issuer?.name ?? "", issuedAt: revision.issuedAt.toISOString(),
    returnedBy: revision.returner?.name ?? null, returnedAt: revision.returnedAt?.toISOString() ?? null, returnComment: revision.returnComment,
    voidedAt: revision.voidedAt?.toISOString() ?? null, supersededAt: revision.supersededAt?.toISOString() ?? null,
    digest: revision.digest, ruleSet: revision.ruleSet, drawing: revision.snapshot, check: checked,
    jurisdiction: revision.jurisdiction && { name: revision.jurisdiction.name, signs: revision.jurisdiction.signs },
    previous: previous && { id: previous.id, letter: previous.letter },
    seal: !seal ? null : {
      licensee: seal.licenseeName, title: seal.licenseTitle, licenseState: seal.licenseState, licenseNumber: seal.licenseNumber,
      licenseExpiresOn: seal.licenseExpiresOn, sealCode: seal.sealCode, sealedAt: seal.sealedAt.toISOString(),
    },
    ...sets(revision.sheetSets ?? []), sealRefusals: refusals,
    may: {
      return: may(roles, "revision.return", revision.state), accept: may(roles, "finding.accept", revision.state),
      seal: may(roles, "revision.seal", revision.state), download: may(roles, "sheets.download", revision.state), preview: may(roles, "sheets.preview"),
    },
  };
}

const sets = (rows: readonly SheetSet[]) => ({
  preview: sheetSetAnswer(rows.find((row) => row.kind === "preview")), sealedSet: sheetSetAnswer(rows.find((row) => row.kind === "sealed")),
});

/** State of a revision and its sheets, for a page that waits for the worker. */
export async function revisionStatus(actor: Actor, revisionId: string): Promise<RevisionStatus> {
  const { revision, roles } = await viewRevision(actor, revisionId);
  const { preview, sealedSet } = sets(revision.sheetSets ?? []);
  return { id: revision.id, state: revision.state, preview: may(roles, "sheets.preview") ? preview : null, sealedSet };
}

/** What stands in the way of a seal. The revision's acceptances must have been loaded. */
export async function refusalsFor(revision: Revision, license: License | null, transaction?: Transaction): Promise<Refusal[]> {
  const drawing = await database().Drawing.findByPk(revision.drawingId, { attributes: ["document"], transaction: transaction ?? null });
  if (!drawing) throw notFound();
  return sealRefusals({
    state: revision.state, check: checkOf(revision), draftDigest: drawingDigest(drawing.document, revision.ruleSet),
    license: license && { state: license.state, number: license.number, expiresOn: license.expiresOn, hasSealGraphic: license.sealObjectKey !== null },
    today: today(),
  });
}

/** Sends a revision back to the designer with a comment. */
export async function returnRevision(actor: Actor, revisionId: string, comment: string): Promise<RevisionAnswer> {
  await inTransaction(async (transaction) => {
    const { revision, job } = await lockRevision(actor, revisionId, "revision.return", transaction);
    const state = step(revision, "return");
    await revision.update({ state, returnedBy: actor.id, returnedAt: new Date(), returnComment: comment }, { transaction });
    await touchJob(job.id, transaction);
    await audit(transaction, actor, { action: "revision.return", subject: `revisions/${revision.id}`, jobId: job.id, detail: { letter: revision.letter } });
  });
  return getRevision(actor, revisionId);
}

/** Accepts one finding in writing, under the person's license. The snapshot stays as issued. */
export async function acceptFinding(actor: Actor, revisionId: string, input: z.output<typeof acceptInput>): Promise<RevisionAnswer> {
  const { FindingAcceptance } = database();
  await inTransaction(async (transaction) => {
    const { revision, job } = await lockRevision(actor, revisionId, "finding.accept", transaction);
    if (revision.state !== "in review") throw conflict("revision-state", `This revision is ${revision.state}; findings are accepted in review only.`, { state: revision.state });
    const finding = revision.checkResult.findings.find((each) => each.key === input.findingKey);
    if (!finding) throw unprocessable("findingKey", "is no finding of this revision");
    const license = await licenseOf(actor.id);
    if (!license) throw conflict("license-missing", "Your license is not entered yet. Enter it on your account page.");
    if (license.expiresOn < today()) throw conflict("license-expired", `License ${license.number} (${license.state}) expired on ${license.expiresOn}.`);
    const [, made] = await FindingAcceptance.findOrCreate({
      where: { revisionId, findingKey: input.findingKey }, transaction,
      defaults: {
        revisionId, findingKey: input.findingKey, reason: input.reason, acceptedBy: actor.id, byName: actor.name,
        licenseText: `${license.title} ${license.number} (${license.state})`, acceptedOn: today(),
      },
    });
    if (!made) throw conflict("accepted-before", "This finding was accepted already.");
    await audit(transaction, actor, {
      action: "finding.accept", subject: `revisions/${revisionId}`, jobId: job.id, detail: { findingKey: input.findingKey, reason: input.reason, message: finding.message },
    });
  });
  return getRevision(actor, revisionId);
}
