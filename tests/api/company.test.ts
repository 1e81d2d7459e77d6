import { beforeAll, describe, expect, it, vi } from "vitest";
import { plainAddress } from "@/lib/server/http/connection";
import { firstAdministrator, inCompany, newJob, onJob, type Person } from "./support/people";
import { request } from "./support/server";

// Settings are read once, so this file stands behind a proxy as a whole.
vi.stubEnv("TRUST_PROXY", "yes");

let owner: Person & { companyId: string };
let designer: Person;
const settings = (as: Person = owner) => request("GET", `/api/companies/${owner.companyId}`, { as });
const change = (body: unknown, as: Person = owner, headers: Record<string, string> = {}) => request("PATCH", `/api/companies/${owner.companyId}`, { as, body, headers });
const records = async (query: string) => (await request("GET", `/api/companies/${owner.companyId}/audit${query}`, { as: owner })).body.records;

beforeAll(async () => {
  owner = await firstAdministrator();
  designer = await inCompany(owner, owner.companyId, ["designer"]);
});

describe("a company's settings", () => {
  it("are read by its office and changed by its administrators", async () => {
    expect((await settings(designer)).body).toMatchObject({ id: owner.companyId, name: "Northlight Works", jobNumberScheme: "{yy}-{nnn}", may: { settings: false } });
    expect((await change({ name: "Other" }, designer)).status).toBe(403);
    const outside = await onJob(owner, await newJob(owner), ["designer"], "Designer from outside");
    expect((await settings(outside)).status).toBe(404);
    expect((await change({ name: "Northlight & Daughters" })).body).toMatchObject({ name: "Northlight & Daughters", may: { settings: true } });
    expect((await request("GET", "/api/me", { as: designer })).body.companies[0].name).toBe("Northlight & Daughters");
  });

  it("number new jobs, and leave the numbers that are there", async () => {
    const before = await newJob(owner, { number: "26-001" });
    expect((await change({ jobNumberScheme: "NL-{yyyy}-{nnnn}" })).status).toBe(200);
    expect((await request("GET", `/api/jobs/${before}`, { as: owner })).body.number).toBe("26-001");
  });

  it.each([
    [{ name: "" }, "name"], [{ name: "x".repeat(121) }, "name"], [{ jobNumberScheme: "{yy}" }, "jobNumberScheme"], [{ jobNumberScheme: "{yy}-{nnn}-{nn}" }, "jobNumberScheme"],
    [{ jobNumberScheme: "<b>{nnn}</b>" }, "jobNumberScheme"], [{ jobNumberScheme: `${"x".repeat(40)}{nnn}` }, "jobNumberScheme"], [{ id: "other" }, "id"],
  ])("refuse %j", async (body, field) => {
    expect(await change(body)).toMatchObject({ status: 422, body: { field } });
  });

  it("are recorded with before and after and the address the proxy wrote; a change of nothing is none", async () => {
    const was = (await settings()).body.name;
    await change({ name: "Northlight Works" }, owner, { "x-forwarded-for": "198.51.100.7, 203.0.113.9", "user-agent": "Office/2" });
    const [line] = await records("?action=company.edit");
    expect(line).toMatchObject({ changes: [{ field: "name", before: was, after: "Northlight Works" }], address: plainAddress("203.0.113.9"), userAgent: "Office/2", facts: [] });
    const count = (await records("?action=company.edit")).length;
    await change({ name: "Northlight Works" });
    expect((await records("?action=company.edit")).length).toBe(count);
    expect((await records("?q=203.0.113.9")).length).toBe(1);
  });
});

describe("licenses of a company's people", () => {
  const license = { state: "Test State", number: "L-1", title: "PE" };
  const day = (shift: number) => new Date(Date.now() + shift * 86_400_000).toISOString().slice(0, 10);

  it("are shown to whoever manages them, with what has to be said about their end, and to nobody else", async () => {
    const person = await inCompany(owner, owner.companyId, ["licensee"]);
    const seen = async (as: Person) => (await request("GET", `/api/companies/${owner.companyId}/people`, { as })).body.people.find((each: { userId: string }) => each.userId === person.id);
    expect((await seen(owner)).license).toBeNull();
    await request("PUT", "/api/me/license", { as: person, body: { ...license, expiresOn: day(20) } });
    expect((await seen(owner)).license).toMatchObject({ ...license, expiresOn: day(20), expiry: { nearness: "within 30 days", daysLeft: 20 } });
    expect(await seen(designer)).not.toHaveProperty("license");
  });

  it.each([[91, null], [90, "within 90 days"], [30, "within 30 days"], [0, "within 30 days"], [-1, "expired"]])("ending in %d days make their person's pages say %j", async (shift, nearness) => {
    await request("PUT", "/api/me/license", { as: designer, body: { ...license, expiresOn: day(shift) } });
    expect((await request("GET", "/api/me", { as: designer })).body.licenseWarning?.nearness ?? null).toBe(nearness);
    expect((await request("GET", "/api/me/license", { as: designer })).body.license.expired).toBe(shift < 0);
  });
});
