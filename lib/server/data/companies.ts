import "server-only";
import type { z } from "zod";
import type { CompanyDetail, companyChange } from "@/lib/api";
import { mayInCompany } from "@/lib/policy";
import { notFound } from "@/lib/server/http/problem";
import { companyAccess, type Actor } from "./actor";
import { audit, changes } from "./audit";
import { database, inTransaction } from "./database";

/** A company's settings, for everybody who belongs to its office. */
export async function getCompany(actor: Actor, companyId: string): Promise<CompanyDetail> {
  const roles = await companyAccess(actor, companyId, "company.view");
  const company = await database().Company.findByPk(companyId);
  if (!company) throw notFound();
  return {
    id: company.id, name: company.name, jobNumberScheme: company.jobNumberScheme, createdAt: company.createdAt.toISOString(), may: { settings: mayInCompany(roles, "company.settings") },
  };
}

/** Changes a company's name or how its jobs are numbered. Jobs keep the number they have, sealed sheets the name. */
export async function changeCompany(actor: Actor, companyId: string, change: z.output<typeof companyChange>): Promise<CompanyDetail> {
  await inTransaction(async (transaction) => {
    await companyAccess(actor, companyId, "company.settings", transaction);
    const company = await database().Company.findByPk(companyId, { transaction, lock: transaction.LOCK.UPDATE });
    if (!company) throw notFound();
    const facts = { name: change.name ?? company.name, jobNumberScheme: change.jobNumberScheme ?? company.jobNumberScheme };
    const { before, after } = changes({ name: company.name, jobNumberScheme: company.jobNumberScheme }, facts);
    if (Object.keys(after).length === 0) return;
    await company.update(facts, { transaction });
    await audit(transaction, actor, { action: "company.edit", subject: `companies/${companyId}`, companyId, detail: { fields: Object.keys(after), before, after } });
  });
  return getCompany(actor, companyId);
}
