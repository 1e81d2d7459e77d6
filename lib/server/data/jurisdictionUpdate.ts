import "server-only";
import { randomUUID } from "node:crypto";
import type { z } from "zod";
import type { JurisdictionUpdate, UpdateFinding, updateInput } from "@/lib/api";
import { adoptionInForce } from "@/lib/code/adoption";
import { localChanges, localPatches, type LocalRules } from "@/lib/diagram/jurisdiction";
import { applyPatches } from "@/lib/diagram/patch";
import type { Drawing as DrawingDocument } from "@/lib/diagram/schema";
import { may } from "@/lib/policy";
import { check } from "@/lib/rules/engine/run";
import type { Finding } from "@/lib/rules/engine/types";
import type { Jurisdiction } from "@/models";
import { conflict, notFound } from "@/lib/server/http/problem";
import { jobAccess, type Actor } from "./actor";
import { audit } from "./audit";
import { database, inTransaction } from "./database";
import { refuseArchived } from "./jobs";
import { writeSave } from "./journal";
import { today } from "./licenses";

/** What a drawing is to take over. With `keep`, the edition it was begun under stays. */
function localRules(row: Jurisdiction, document: DrawingDocument, edition: "take" | "keep"): LocalRules {
  return {
    edition: edition === "keep" ? document.site.edition : adoptionInForce(row.editions, today()).edition,
    ordinance: row.ordinance, amendments: row.amendments, requirements: row.requirements,
  };
}

/**
 * Whether a job's drawing differs from its jurisdiction as it is now, and which findings would come and go if it were
 * taken over. Nothing is changed.
 */
export async function jurisdictionUpdate(actor: Actor, jobId: string, edition: "take" | "keep" = "take"): Promise<JurisdictionUpdate> {
  const { job, roles } = await jobAccess(actor, jobId, "drawing.view");
  const { Drawing, Jurisdiction } = database();
  const [drawing, row] = await Promise.all([Drawing.findOne({ where: { jobId } }), job.jurisdictionId ? Jurisdiction.findByPk(job.jurisdictionId) : null]);
  if (!drawing) throw notFound();
  if (!row) return { jurisdiction: null, changes: [], findings: { added: [], removed: [], changed: [] }, may: { take: false } };
  const { document } = drawing;
  const local = localRules(row, document, edition);
  const changes = localChanges(document, local);
  return {
    jurisdiction: { id: row.id, name: row.name, version: row.version }, changes,
    findings: changes.length === 0 ? { added: [], removed: [], changed: [] } : comparison(document, applyPatches(document, localPatches(document, local))),
    may: { take: may(roles, "job.edit") && job.archivedAt === null },
  };
}

const shown = ({ key, rule, severity, kind, message, citation }: Finding): UpdateFinding => ({ key, rule, severity, kind, message, citation });

function comparison(before: DrawingDocument, after: DrawingDocument): JurisdictionUpdate["findings"] {
  const [was, now] = [check(before).findings.map(shown), check(after).findings.map(shown)];
  const wasByKey = new Map(was.map((each) => [each.key, each]));
  const nowKeys = new Set(now.map((each) => each.key));
  return {
    added: now.filter((each) => !wasByKey.has(each.key)),
    removed: was.filter((each) => !nowKeys.has(each.key)),
    changed: now.flatMap((each) => {
      const other = wasByKey.get(each.key);
      return other && (other.severity !== each.severity || other.citation !== each.citation || other.message !== each.message) ? [{ was: other, now: each }] : [];
    }),
  };
}

/**
 * Takes a jurisdiction as it is now over into the job's drawing, as one save of the journal.
 * @throws Problem 409 `stale-version` when it was changed after what the person saw
 */
export async function takeJurisdiction(actor: Actor, jobId: string, { version, edition }: z.output<typeof updateInput>): Promise<JurisdictionUpdate> {
  const { Drawing, Jurisdiction } = database();
  await inTransaction(async (transaction) => {
    const { job } = await jobAccess(actor, jobId, "job.edit", { transaction });
    refuseArchived(job);
    const drawing = await Drawing.findOne({ where: { jobId }, transaction, lock: transaction.LOCK.UPDATE });
    const row = job.jurisdictionId ? await Jurisdiction.findByPk(job.jurisdictionId, { transaction, lock: transaction.LOCK.SHARE }) : null;
    if (!drawing) throw notFound();
    if (!row) throw conflict("jurisdiction-missing", "This job has no jurisdiction yet. Choose one on the job's page.");
    if (row.version !== version) throw conflict("stale-version", "The jurisdiction was changed again. Look at what would change now.", { version: row.version });
    const local = localRules(row, drawing.document, edition);
    const changes = localChanges(drawing.document, local);
    const patches = localPatches(drawing.document, local);
    if (patches.length === 0) return;
    await writeSave(drawing, { saveId: randomUUID(), baseSequence: drawing.sequence, patches, title: `Take over ${row.name}`.slice(0, 120), amends: true }, actor, transaction);
    await audit(transaction, actor, {
      action: "job.jurisdiction", subject: `jobs/${jobId}`, jobId, companyId: job.companyId, detail: { jurisdiction: row.id, name: row.name, version, changes: changes.map((each) => `${each.label}: ${each.was ?? "none"} to ${each.now ?? "none"}`).slice(0, 50) },
    });
  });
  return jurisdictionUpdate(actor, jobId, edition);
}
