import "server-only";
import type { Transaction } from "sequelize";
import type { z } from "zod";
import type { jobChange } from "@/lib/api";
import type { Drawing as DrawingDocument } from "@/lib/diagram/schema";
import type { Job, Jurisdiction } from "@/models";
import { changes } from "./audit";
import { database } from "./database";

/**
 * What a change of a job's data would make of it, field by field, for the log; read before it is carried out.
 * @param jurisdiction the authority it is put under, or null where that stays
 */
export async function jobChanges(
  job: Job, document: DrawingDocument, { jurisdictionId: _, site, ...fields }: z.output<typeof jobChange>, jurisdiction: Jurisdiction | null, transaction: Transaction,
): Promise<ReturnType<typeof changes>> {
  const before = jurisdiction && job.jurisdictionId ? await database().Jurisdiction.findByPk(job.jurisdictionId, { attributes: ["name"], transaction }) : null;
  const { number, name, dueOn, officeStatus, permitFeeCents, permitFeePaidOn, permitReceipt } = job;
  const was = {
    ...document.sheet.titleBlock, ...document.site, number, name, dueOn, officeStatus, permitFeePaidOn, permitReceipt,
    permitFeeCents: permitFeeCents === null ? null : Number(permitFeeCents), jurisdiction: before?.name ?? null,
  };
  return changes(was, { ...fields, ...site, ...(jurisdiction ? { jurisdiction: jurisdiction.name } : {}) });
}
