import "server-only";
import type { Transaction } from "sequelize";
import type { Actor } from "./actor";
import { database } from "./database";

interface AuditFacts { action: string; subject: string; companyId?: string; jobId?: string; detail?: Record<string, unknown> }

/** Writes who did what, in the transaction that does it. `actor` is null for the worker process. */
export async function audit(transaction: Transaction, actor: Actor | null, facts: AuditFacts): Promise<void> {
  await database().AuditEntry.create(
    {
      actorId: actor?.id ?? null, requestId: actor?.requestId ?? null, action: facts.action, subject: facts.subject,
      companyId: facts.companyId ?? null, jobId: facts.jobId ?? null, detail: facts.detail ?? {},
    },
    { transaction },
  );
}
