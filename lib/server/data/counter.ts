import "server-only";
import { Op } from "sequelize";
import type { CounterAnswer, CounterLine, CounterRevision, SealAnswer } from "@/lib/api";
import { may } from "@/lib/policy";
import { SEALED_STATES } from "@/lib/workflow";
import type { Job, Revision, Seal } from "@/models";
import { notFound } from "@/lib/server/http/problem";
import { jobAccess, type Actor } from "./actor";
import { database } from "./database";
import { checkOf, sheetSetAnswer } from "./sheetSets";

/** Jobs of a permit clerk. Nothing of a drawing shows that was not sealed, so names come from the sealed snapshot. */
export async function listCounter(actor: Actor): Promise<CounterLine[]> {
  const { Job, JobMember, Jurisdiction } = database();
  const members = await JobMember.findAll({ where: { userId: actor.id, roles: { [Op.contains]: ["permit clerk"] } }, attributes: ["jobId"] });
  const jobs = await Job.findAll({
    where: { id: members.map((each) => each.jobId) }, include: [{ model: Jurisdiction, as: "jurisdiction" }], order: [["updatedAt", "DESC"]], limit: 500,
  });
  const revisions = await sealedRevisions(jobs.map((job) => job.id));
  return jobs.map((job) => line(job, revisions.filter((each) => each.jobId === job.id)));
}

async function sealedRevisions(jobIds: readonly string[]): Promise<Revision[]> {
  const { FindingAcceptance, Revision, Seal, SheetSet } = database();
  return Revision.findAll({
    where: { jobId: [...jobIds], state: [...SEALED_STATES] }, order: [["issuedAt", "DESC"]],
    include: [{ model: Seal, as: "seal" }, { model: SheetSet, as: "sheetSets" }, { model: FindingAcceptance, as: "acceptances" }],
  });
}

function line(job: Job, revisions: readonly Revision[]): CounterLine {
  const current = revisions.find((each) => each.state !== "superseded");
  const block = revisions[0]?.snapshot.sheet.titleBlock;
  return {
    jobId: job.id, number: job.number, name: block?.jobName ?? job.name, addressLines: block?.addressLines ?? "", permitNumber: block?.permitNumber ?? "",
    jurisdiction: job.jurisdiction?.name ?? null,
    current: current?.seal ? { letter: current.letter, state: current.state, sealedAt: current.seal.sealedAt.toISOString(), licensee: current.seal.licenseeName } : null,
  };
}

/** The sealed sets of one job, newest first, with their states and digests. */
export async function counterJob(actor: Actor, jobId: string): Promise<CounterAnswer> {
  const { job, roles } = await jobAccess(actor, jobId, "job.view");
  if (!may(roles, "sheets.download", "sealed")) throw notFound();
  const jurisdiction = job.jurisdictionId ? await database().Jurisdiction.findByPk(job.jurisdictionId) : null;
  const revisions = await sealedRevisions([jobId]);
  const { current: _, ...facts } = line(job, revisions);
  return {
    ...facts, jurisdiction: jurisdiction?.name ?? null, parcel: revisions[0]?.snapshot.sheet.titleBlock.parcel ?? "",
    revisions: revisions.flatMap((each) => counterRevision(each) ?? []),
  };
}

const sealAnswer = (seal: Seal): SealAnswer => ({
  licensee: seal.licenseeName, title: seal.licenseTitle, licenseState: seal.licenseState, licenseNumber: seal.licenseNumber,
  licenseExpiresOn: seal.licenseExpiresOn, sealCode: seal.sealCode, sealedAt: seal.sealedAt.toISOString(),
});

function counterRevision(revision: Revision): CounterRevision | null {
  const sheetSet = sheetSetAnswer((revision.sheetSets ?? []).find((each) => each.kind === "sealed"));
  if (!revision.seal || !sheetSet) return null;
  const check = checkOf(revision);
  return {
    id: revision.id, letter: revision.letter, purpose: revision.purpose, description: revision.description, state: revision.state,
    seal: sealAnswer(revision.seal), sheetSet, voidedAt: revision.voidedAt?.toISOString() ?? null, supersededAt: revision.supersededAt?.toISOString() ?? null,
    drawingDigest: revision.digest, ruleSet: revision.ruleSet, edition: check.edition, rulesRun: check.rulesRun, counts: check.counts,
  };
}
