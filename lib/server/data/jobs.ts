import "server-only";
import { randomUUID } from "node:crypto";
import type { z } from "zod";
import type { JobAnswer, jobChange, jobInput } from "@/lib/api";
import { protectedPatches, siteFrom } from "@/lib/diagram/jurisdiction";
import { emptyDrawing } from "@/lib/diagram/new";
import type { Drawing as DrawingDocument, Site } from "@/lib/diagram/schema";
import { may, type Role } from "@/lib/policy";
import type { PatchOperation } from "@/lib/rules/engine/types";
import type { Job, Jurisdiction, Revision } from "@/models";
import { conflict, notFound, unprocessable } from "@/lib/server/http/problem";
import { companyAccess, jobAccess, type Actor } from "./actor";
import { audit } from "./audit";
import { database, inTransaction } from "./database";
import { shownCounts } from "./counts";
import { jobChanges } from "./jobChanges";
import { numberTaken, takeNumber } from "./jobNumbers";
import { writeSave } from "./journal";
import { jurisdictionAnswer, makeJurisdiction, visibleJurisdiction } from "./jurisdictions";
import { draftLetter } from "./letters";

/** Makes a job with an empty drawing; who makes it is its administrator, and designer where they design in the company. */
export async function createJob(actor: Actor, input: z.output<typeof jobInput>): Promise<{ id: string }> {
  const { Drawing, Job, JobMember } = database();
  try {
    return await inTransaction(async (transaction) => {
      const roles = await companyAccess(actor, input.companyId, "jobs.create", transaction);
      const { company, number } = await takeNumber(input.companyId, input.number, transaction);
      const jurisdiction = "id" in input.jurisdiction
        ? await visibleJurisdiction(input.jurisdiction.id, input.companyId, transaction)
        : await makeJurisdiction(actor, input.companyId, input.jurisdiction, transaction);
      const site: Site = { ...input.site, ...siteFrom(jurisdiction) };
      const empty = emptyDrawing(site, {
        jobName: input.name, jobNumber: number, addressLines: input.addressLines, parcel: input.parcel, owner: input.owner,
        designedBy: roles.includes("designer") ? actor.name : "", checkedBy: "", preparer: input.preparer, contractor: input.contractor || company.name,
        permitNumber: input.permitNumber, codes: codesLine(site, jurisdiction), scope: input.scope,
      });
      const document = { ...empty, sheet: { ...empty.sheet, size: jurisdiction.exportProfile.sheetSize } };
      const job = await Job.create(
        { companyId: company.id, number, name: input.name, jurisdictionId: jurisdiction.id, createdBy: actor.id }, { transaction },
      );
      await Drawing.create({ jobId: job.id, document, checkedSequence: null, checkedRuleSet: null, checkCounts: null, updatedBy: actor.id }, { transaction });
      const own: Role[] = roles.includes("designer") ? ["administrator", "designer"] : ["administrator"];
      await JobMember.create({ jobId: job.id, userId: actor.id, roles: own }, { transaction });
      await audit(transaction, actor, { action: "job.create", subject: `jobs/${job.id}`, companyId: company.id, jobId: job.id, detail: { number: job.number } });
      return { id: job.id };
    });
  } catch (error) {
    throw numberTaken(error);
  }
}

function codesLine(site: Site, jurisdiction: Jurisdiction): string {
  return [`NEC ${site.edition}`, jurisdiction.ordinance].filter(Boolean).join(", ");
}

/** Latest revision of each job; of one that was taken to review while another is sealed, the one in review. */
async function latestRevisions(jobIds: readonly string[]): Promise<Map<string, Revision>> {
  const rows = await database().Revision.findAll({
    where: { jobId: [...jobIds] }, attributes: ["id", "jobId", "letter", "state", "sequence", "ruleSet", "issuedAt"], order: [["issuedAt", "ASC"]],
  });
  return new Map(rows.map((row) => [row.jobId, row]));
}

/** One job with its site and what the person may do. */
export async function getJob(actor: Actor, jobId: string): Promise<JobAnswer> {
  const { job, roles } = await jobAccess(actor, jobId, "job.view");
  const { Company, Drawing, Jurisdiction } = database();
  const [company, drawing, jurisdiction, latest] = await Promise.all([
    Company.findByPk(job.companyId), Drawing.findOne({ where: { jobId } }),
    job.jurisdictionId ? Jurisdiction.findByPk(job.jurisdictionId) : null, latestRevisions([jobId]),
  ]);
  if (!drawing || !company) throw notFound();
  const block = drawing.document.sheet.titleBlock;
  const office = may(roles, "drawing.view");
  const revision = latest.get(jobId) ?? null;
  // To the counter a job is what was sealed, not what is being drawn.
  const shown = office || (revision && may(roles, "revision.view", revision.state)) ? revision : null;
  return {
    id: job.id, companyId: job.companyId, companyName: company.name, number: job.number, name: job.name, addressLines: block.addressLines,
    parcel: block.parcel, owner: block.owner, scope: block.scope, permitNumber: block.permitNumber, preparer: block.preparer, contractor: block.contractor,
    jurisdiction: jurisdiction && jurisdictionAnswer(jurisdiction), site: drawing.document.site, roles, state: shown?.state ?? "draft",
    revision: shown?.letter ?? null, nextLetter: await draftLetter(jobId), counts: office ? await shownCounts(drawing, revision) : null,
    dueOn: job.dueOn, officeStatus: job.officeStatus, archivedAt: job.archivedAt?.toISOString() ?? null,
    permitFeeCents: office && job.permitFeeCents !== null ? Number(job.permitFeeCents) : null, permitFeePaidOn: office ? job.permitFeePaidOn : null, permitReceipt: office ? job.permitReceipt : "",
    changedAt: job.updatedAt.toISOString(), empty: Object.keys(drawing.document.equipment).length === 0,
    may: {
      duplicate: may(roles, "job.duplicate"), archive: may(roles, "job.archive"), history: may(roles, "history.view"),
      edit: may(roles, "job.edit") && job.archivedAt === null, manageMembers: may(roles, "members.manage"), viewDrawing: office, editDrawing: may(roles, "drawing.edit") && job.archivedAt === null,
      issue: may(roles, "revision.issue"), seal: may(roles, "revision.seal", "in review"),
    },
  };
}

/** Changes job data. What also stands in the drawing is changed there through the journal, in the same transaction. */
export async function updateJob(actor: Actor, jobId: string, change: z.output<typeof jobChange>): Promise<JobAnswer> {
  try {
    await inTransaction(async (transaction) => {
      const { job } = await jobAccess(actor, jobId, "job.edit", { transaction });
      refuseArchived(job);
      const drawing = await database().Drawing.findOne({ where: { jobId }, transaction, lock: transaction.LOCK.UPDATE });
      if (!drawing) throw notFound();
      const jurisdiction = change.jurisdictionId ? await visibleJurisdiction(change.jurisdictionId, job.companyId, transaction) : null;
      const patches = documentChange(drawing.document, change, jurisdiction);
      const differences = await jobChanges(job, drawing.document, change, jurisdiction, transaction);
      if (patches.length > 0) {
        await writeSave(drawing, { saveId: randomUUID(), baseSequence: drawing.sequence, patches, title: "Change the job's data", amends: jurisdiction !== null }, actor, transaction);
      }
      await job.update(
        {
          ...(change.number === undefined ? {} : { number: change.number }), ...(change.name === undefined ? {} : { name: change.name }), ...(jurisdiction ? { jurisdictionId: jurisdiction.id } : {}),
          ...officeFacts(change),
        },
        { transaction },
      );
      await audit(transaction, actor, { action: "job.edit", subject: `jobs/${jobId}`, jobId, detail: { fields: Object.keys(differences.after), ...differences } });
    });
  } catch (error) {
    throw numberTaken(error);
  }
  return getJob(actor, jobId);
}

/** What the office notes about a job and no sheet shows. */
function officeFacts({ dueOn, officeStatus, permitFeeCents, permitFeePaidOn, permitReceipt }: z.output<typeof jobChange>) {
  return {
    ...(dueOn === undefined ? {} : { dueOn }), ...(officeStatus === undefined ? {} : { officeStatus }),
    ...(permitFeeCents === undefined ? {} : { permitFeeCents: permitFeeCents === null ? null : String(permitFeeCents) }),
    ...(permitFeePaidOn === undefined ? {} : { permitFeePaidOn }), ...(permitReceipt === undefined ? {} : { permitReceipt }),
  };
}

/** @throws Problem 409 where the job was put into the archive */
export function refuseArchived(job: Pick<Job, "archivedAt">): void {
  if (job.archivedAt) throw conflict("job-archived", "This job is in the archive and stays as it is. An administrator can take it out again.");
}

function documentChange(document: DrawingDocument, change: z.output<typeof jobChange>, jurisdiction: Jurisdiction | null): PatchOperation[] {
  const { number, jurisdictionId: _, site: siteChange, name, dueOn: _due, officeStatus: _status, permitFeeCents: _cents, permitFeePaidOn: _paid, permitReceipt: _receipt, ...block } = change;
  const codes = jurisdiction || siteChange?.edition
    ? { codes: codesOf(document, siteChange?.edition ?? document.site.edition, jurisdiction) }
    : {};
  const titleBlock = { ...block, ...(name === undefined ? {} : { jobName: name }), ...(number === undefined ? {} : { jobNumber: number }), ...codes };
  return [
    ...replacements("/site", document.site, siteChange ?? {}),
    ...(jurisdiction ? protectedPatches(document.site, jurisdiction) : []),
    ...replacements("/sheet/titleBlock", document.sheet.titleBlock, titleBlock),
  ];
}

function codesOf(document: DrawingDocument, edition: string, jurisdiction: Jurisdiction | null): string {
  if (jurisdiction) return [`NEC ${edition}`, jurisdiction.ordinance].filter(Boolean).join(", ");
  return document.sheet.titleBlock.codes.replace(/NEC \d{4}/, `NEC ${edition}`);
}

function replacements(base: string, now: Readonly<Record<string, unknown>>, wanted: Readonly<Record<string, unknown>>): PatchOperation[] {
  return Object.entries(wanted).flatMap(([field, value]): PatchOperation[] => {
    if (value === undefined || JSON.stringify(now[field]) === JSON.stringify(value)) return [];
    if (!(field in now)) throw unprocessable(field, "is no field of the drawing");
    return [{ op: "test", path: `${base}/${field}`, value: now[field] }, { op: "replace", path: `${base}/${field}`, value }];
  });
}

