import { QueryTypes } from "sequelize";
import { describe, expect, it } from "vitest";
import { database } from "@/lib/server/data/database";
import { down, up } from "@/migrations/0010-administration";
import { firstAdministrator, newJob } from "./support/people";
import { request } from "./support/server";

describe("the administration's migration", () => {
  it("leads back with every entry kept, and forward again with company and words of the old ones, which still cannot be changed", async () => {
    const owner = await firstAdministrator();
    const jobId = await newJob(owner, { number: "M-1", name: "Migrated barn" });
    const { sequelize } = database();
    const context = sequelize.getQueryInterface();
    const count = async () => (await sequelize.query<{ n: number }>("select count(*)::int as n from audit_log", { type: QueryTypes.SELECT }))[0]?.n;
    const before = await count();
    await down({ context });
    // As entries of a job were written before: without its company.
    await sequelize.query("insert into audit_log (actor_id, job_id, action, subject, detail) values (:id, :jobId, 'job.edit', 'jobs/x', '{\"fields\":\"Parcel 77\"}')", { replacements: { id: owner.id, jobId } });
    await expect(sequelize.query("delete from audit_log")).rejects.toThrow("only added to");
    await up({ context });
    expect(await count()).toBe((before ?? 0) + 1);
    const found = await request("GET", `/api/companies/${owner.companyId}/audit?q=migrated+parcel+first`, { as: owner });
    expect(found.body.records).toMatchObject([{ action: "job.edit", job: { id: jobId }, person: { id: owner.id }, address: null }]);
    for (const sql of ["delete from audit_log", "truncate audit_log", "update audit_log set company_id = null"]) await expect(sequelize.query(sql)).rejects.toThrow("only added to");
  });
});
