import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, it } from "vitest";
import type { Drawing } from "@/lib/diagram/schema";
import { database } from "@/lib/server/data/database";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";
import { plant } from "@/seeders/demo/planted";
import { drawingOf, place, save } from "./support/drawings";
import { firstAdministrator, inCompany, newJob, onJob, signIn, type Person } from "./support/people";
import { request } from "./support/server";

let owner: Person & { companyId: string };
let installer: Person;
let stranger: Person;
let neighbor: Person & { companyId: string };
let sharedId: string;

const adopted = [{ edition: "2023", effectiveFrom: null, effectiveTo: null }];
const facts = (change: Record<string, unknown> = {}) => ({ companyId: owner.companyId, name: `Township ${randomUUID().slice(0, 8)}`, editions: adopted, ...change });
const make = (change: Record<string, unknown> = {}, as: Person = owner) => request("POST", "/api/jurisdictions", { as, body: facts(change) });
const get = (id: string, as: Person = owner) => request("GET", `/api/jurisdictions/${id}`, { as });
const patch = (id: string, version: number, change: Record<string, unknown>, as: Person = owner) => request("PATCH", `/api/jurisdictions/${id}`, { as, body: { version, ...change } });
const remove = (id: string, as: Person = owner) => request("DELETE", `/api/jurisdictions/${id}`, { as });
const update = (jobId: string, as: Person = owner, query = "") => request("GET", `/api/jobs/${jobId}/jurisdiction-update${query}`, { as });
const take = (jobId: string, version: number, as: Person = owner, change: Record<string, unknown> = {}) => request("POST", `/api/jobs/${jobId}/jurisdiction-update`, { as, body: { version, ...change } });
const limit = (value: number, change: Record<string, unknown> = {}) => ({
  rule: "string-over-building-cap", effect: "limit", limitName: "building", limit: value, unit: "V", severity: null, citation: "Township ordinance 7, section 3", ...change,
});
const PARTS = ["equipment", "circuits", "raceways", "bonds", "interlocks", "sensors", "labels", "texts"] as const;
const partsOf = (drawing: Drawing) => PARTS.map((part) => ({ op: "replace" as const, path: `/${part}`, value: drawing[part] }));

beforeAll(async () => {
  owner = await firstAdministrator();
  installer = await inCompany(owner, owner.companyId, ["installer"]);
  stranger = await onJob(owner, await newJob(owner), ["installer", "licensee", "permit clerk"], "Stranger");
  const { Company, Jurisdiction, Membership, User } = database();
  // A second company, as a hosted product has many.
  const company = await Company.create({ name: "Southfork Works" });
  const first = await User.findByPk(owner.id, { rejectOnEmpty: true });
  const user = await User.create({ email: "other.company@example.test", name: "Of the other company", passwordHash: first.passwordHash });
  await Membership.create({ companyId: company.id, userId: user.id, roles: ["administrator", "designer"] });
  const session = await signIn(user.email);
  neighbor = { id: user.id, email: user.email, name: user.name, password: owner.password, cookie: session?.cookie ?? "", companyId: company.id };
  const shared = await Jurisdiction.create({ companyId: null, name: "Shared County", editions: [{ edition: "2023", effectiveFrom: null, effectiveTo: null }], amendments: {} });
  sharedId = shared.id;
});

describe("who may enter and change a jurisdiction", () => {
  it("is who designs or administers in the company; others of it read, and nobody else knows of it", async () => {
    const { body, status } = await make();
    expect(status).toBe(201);
    expect(body).toMatchObject({ edition: "2023", version: 1, shared: false, signs: "licensed professional", jobs: 0, contacts: [], may: { edit: true, copyTo: [] }, requirements: { lockableVisibleSwitch: null } });
    expect((await get(body.id, installer)).body.may.edit).toBe(false);
    expect((await make({}, installer)).status).toBe(403);
    expect((await patch(body.id, 1, { notes: "x" }, installer)).status).toBe(403);
    expect((await remove(body.id, installer)).status).toBe(403);
    for (const as of [stranger, neighbor]) {
      expect((await get(body.id, as)).status).toBe(404);
      expect((await patch(body.id, 1, { notes: "x" }, as)).status).toBe(404);
      expect((await remove(body.id, as)).status).toBe(404);
      expect((await make({}, as)).status).toBe(404);
      expect((await request("POST", "/api/jurisdictions", { as: neighbor, body: { companyId: neighbor.companyId, copyOf: body.id } })).status).toBe(404);
      expect((await request("GET", "/api/jurisdictions", { as })).body.jurisdictions.map((each: { id: string }) => each.id)).toEqual([sharedId]);
    }
  });

  it("keeps a shared one as it is, and copies it to a company", async () => {
    const shared = await get(sharedId);
    expect(shared.body).toMatchObject({ shared: true, may: { edit: false, copyTo: [{ id: owner.companyId }] } });
    expect(await patch(sharedId, 1, { notes: "x" })).toMatchObject({ status: 403, body: { detail: expect.stringContaining("Copy it to your company") } });
    expect((await remove(sharedId)).status).toBe(403);
    const copy = await request("POST", "/api/jurisdictions", { as: owner, body: { companyId: owner.companyId, copyOf: sharedId } });
    expect(copy).toMatchObject({ status: 201, body: { name: "Shared County", shared: false, version: 1, may: { edit: true } } });
    expect(await request("POST", "/api/jurisdictions", { as: owner, body: { companyId: owner.companyId, copyOf: sharedId } })).toMatchObject({ status: 409, body: { code: "jurisdiction-taken", field: "name" } });
    expect((await patch(copy.body.id, 1, { notes: "Ours." })).body.notes).toBe("Ours.");
    expect((await get(sharedId)).body.notes).toBe("");
  });
});

describe("a change", () => {
  it("is made once: of two on the same version the second is refused, and both stand apart", async () => {
    const { body } = await make();
    const answers = await Promise.all([patch(body.id, 1, { notes: "one" }), patch(body.id, 1, { notes: "two" })]);
    expect(answers.map((each) => each.status).sort()).toEqual([200, 409]);
    expect(answers.find((each) => each.status === 409)?.body).toMatchObject({ code: "stale-version", version: 2 });
    const now = await get(body.id);
    expect(now.body.version).toBe(2);
    expect(now.body).toMatchObject({ changedBy: owner.name });
    const { AuditEntry } = database();
    const entries = await AuditEntry.findAll({ where: { subject: `jurisdictions/${body.id}` }, order: [["id", "ASC"]] });
    expect(entries.map((each) => each.action)).toEqual(["jurisdiction.create", "jurisdiction.edit"]);
    expect(entries[1]).toMatchObject({ companyId: owner.companyId, actorId: owner.id, detail: { version: 2, fields: ["notes"] } });
    // Sending what is there already is no change.
    expect((await patch(body.id, 2, { notes: now.body.notes })).body.version).toBe(2);
  });

  it("says which edition is in force from the dates alone", async () => {
    const editions = [{ edition: "2020", effectiveFrom: null, effectiveTo: "2024-12-31" }, { edition: "2023", effectiveFrom: "2025-01-01", effectiveTo: null }, { edition: "2026", effectiveFrom: "2999-01-01", effectiveTo: null }];
    expect((await make({ editions })).body.edition).toBe("2023");
    expect((await make({ editions: [] })).body).toMatchObject({ code: "field", field: "editions" });
    expect((await make({ editions: [...editions, { edition: "2020", effectiveFrom: "2010-01-01", effectiveTo: null }] })).body.errors).toContainEqual({ field: "editions.3.edition", detail: "2020 is listed twice" });
    expect((await make({ editions: [{ edition: "2020", effectiveFrom: "2024-02-30", effectiveTo: null }] })).status).toBe(422);
  });

  it.each([
    ["a rule that is not there", limit(500, { rule: "no-such-rule" }), "rule"],
    ["a limit that is not named where there are two", limit(500, { limitName: undefined }), "limitName"],
    ["a limit the rule does not have", limit(500, { limitName: "barn" }), "limitName"],
    ["a limit beyond ten times the rule's own", limit(10_001), "limit"],
    ["a limit below nothing", limit(-1), "limit"],
    ["a limit in another unit", limit(500, { unit: "A" }), "unit"],
    ["no limit at all", limit(500, { limit: null }), "limit"],
    ["a limit of a rule without limits", { ...limit(5), rule: "duplicate-tag", limitName: undefined }, "rule"],
    ["a severity that is not given", limit(500, { effect: "severity", limit: null, limitName: undefined }), "severity"],
    ["no ordinance", limit(500, { citation: " " }), "citation"],
  ])("is refused for an amendment with %s, and the place is named", async (_, amendment, field) => {
    const { body } = await make();
    const answer = await patch(body.id, 1, { amendments: { a1: amendment } });
    expect(answer).toMatchObject({ status: 422, body: { field: `amendments.a1.${field}` } });
    expect((await get(body.id)).body).toMatchObject({ version: 1, amendments: {} });
  });

  it("leaves an amendment alone whose rule has gone since", async () => {
    const { Jurisdiction } = database();
    const old = { rule: "long-gone", effect: "note" as const, limit: null, unit: "", severity: null, citation: "Ordinance 1" };
    const row = await Jurisdiction.create({ companyId: owner.companyId, name: "Old rules", editions: [{ edition: "2023", effectiveFrom: null, effectiveTo: null }], amendments: { a1: old } });
    expect(await patch(row.id, 1, { amendments: { a1: old, a2: limit(500) } })).toMatchObject({ status: 200, body: { amendments: { a1: old, a2: { limitName: "building", unit: "V" } } } });
    expect((await patch(row.id, 2, { amendments: { a1: { ...old, citation: "Ordinance 2" }, a2: limit(500) } })).status).toBe(422);
  });

  it("refuses a file-name template that no file can be named by, and links that are no pages", async () => {
    const { body } = await make();
    const profile = { ...body.exportProfile, fileNameTemplate: "{job}-{owner}" };
    expect((await patch(body.id, 1, { exportProfile: profile })).body).toMatchObject({ field: "exportProfile.fileNameTemplate", detail: expect.stringContaining("{owner}") });
    const contact = { name: "Counter", role: "", email: "", phone: "", web: "javascript:alert(1)" };
    expect((await patch(body.id, 1, { contacts: [contact] })).body.field).toBe("contacts.0.web");
    expect((await patch(body.id, 1, { contacts: [{ ...contact, web: "https://town.example/permits" }] })).status).toBe(200);
  });
});

describe("a jurisdiction that jobs use", () => {
  let jurisdictionId: string;
  let jobId: string;

  beforeAll(async () => {
    const requirements = { lockableVisibleSwitch: "yes", separateMeter: null, notes: "" };
    const made = await make({ ordinance: "ordinance 7", requirements });
    jurisdictionId = made.body.id;
    const profile = { ...made.body.exportProfile, sheetSize: "ARCH D", fileNameTemplate: "{date} {job} rev {revision}" };
    expect((await patch(jurisdictionId, 1, { exportProfile: profile })).status).toBe(200);
    jobId = await newJob(owner, { number: "J/7", jurisdiction: { id: jurisdictionId } });
    const { id, drawing } = await drawingOf(owner, jobId);
    expect(drawing.sheet.size).toBe("ARCH D");
    expect(drawing.site.requirements).toEqual(requirements);
    expect((await save(owner, id, 0, partsOf(cleanDrawing()))).status).toBe(200);
  });

  it("is not deleted, and an unused one is", async () => {
    expect(await remove(jurisdictionId)).toMatchObject({ status: 409, body: { code: "jurisdiction-used", jobs: 1 } });
    const { body } = await make();
    expect((await remove(body.id)).status).toBe(204);
    expect((await get(body.id)).status).toBe(404);
  });

  it("changes no drawing by itself; taken over, its amendment changes what the checker finds", async () => {
    expect((await update(jobId)).body).toMatchObject({ changes: [], findings: { added: [], removed: [], changed: [] } });
    const before = await drawingOf(owner, jobId);
    // Twelve modules of 43.5 V each at the record low are 522 V (tests/rules/cases/string-over-building-cap.cases.ts: 609.2 V with fourteen).
    expect((await patch(jurisdictionId, 2, { amendments: { a1: limit(500) } })).status).toBe(200);
    expect((await drawingOf(owner, jobId)).drawing).toEqual(before.drawing);
    const seen = await update(jobId, owner);
    expect(seen.body.changes).toEqual([{ part: "amendment", label: "Amendment of string-over-building-cap", was: null, now: "building limit 500 V; Township ordinance 7, section 3" }]);
    expect(seen.body.findings.added.map((each: { rule: string }) => each.rule)).toEqual(Array(4).fill("string-over-building-cap"));
    expect(seen.body.findings.added[0]).toMatchObject({ severity: "must-fix", citation: "NEC 2023 690.7 (section to be verified); Township ordinance 7, section 3" });
    expect(seen.body.findings.removed).toEqual([]);
    const taken = await take(jobId, 3);
    expect(taken).toMatchObject({ status: 200, body: { changes: [] } });
    const after = await drawingOf(owner, jobId);
    expect(after.sequence).toBe(before.sequence + 1);
    const { check } = await import("@/lib/rules/engine/run");
    expect(check(after.drawing).findings.filter((each) => each.rule === "string-over-building-cap")).toHaveLength(4);
    expect(check(before.drawing).findings.filter((each) => each.rule === "string-over-building-cap")).toEqual([]);
    const saves = await request("GET", `/api/drawings/${after.id}/patches?since=${before.sequence}`, { as: owner });
    expect(saves.body.entries).toMatchObject([{ author: owner.name, title: expect.stringContaining("Take over Township") }]);
  });

  it("is taken over as it was seen, by who may change the job", async () => {
    expect(await take(jobId, 2)).toMatchObject({ status: 409, body: { code: "stale-version" } });
    const reader = await onJob(owner, jobId, ["installer"]);
    const clerk = await onJob(owner, jobId, ["permit clerk"]);
    expect((await update(jobId, reader)).body.may).toEqual({ take: false });
    expect((await take(jobId, 3, reader)).status).toBe(403);
    expect((await update(jobId, clerk)).status).toBe(403);
    expect((await update(jobId, stranger)).status).toBe(404);
    expect((await update(jobId, neighbor)).status).toBe(404);
  });

  it("keeps requirements and amendments from being edited in the drawing", async () => {
    const { id, sequence } = await drawingOf(owner, jobId);
    const value = { lockableVisibleSwitch: "no", separateMeter: null, notes: "" };
    for (const [path, given] of [["/site/requirements", value], ["/site/requirements/lockableVisibleSwitch", "no"], ["/site/amendments/a1/limit", 900]] as const) {
      expect(await save(owner, id, sequence, [{ op: "replace", path, value: given }])).toMatchObject({ status: 422, body: { code: "protected" } });
    }
  });

  it("leaves a job its edition where only the rest is wanted, and names the title block's line", async () => {
    expect((await patch(jurisdictionId, 3, { editions: [{ edition: "2020", effectiveFrom: null, effectiveTo: null }], ordinance: "ordinance 8" })).status).toBe(200);
    const all = (await update(jobId)).body.changes;
    expect(all).toEqual([
      { part: "edition", label: "Adopted code", was: "NEC 2023", now: "NEC 2020" },
      { part: "codes", label: "Codes in the title block", was: "NEC 2023, ordinance 7", now: "NEC 2020, ordinance 8" },
    ]);
    expect((await update(jobId, owner, "?edition=keep")).body.changes).toEqual([{ part: "codes", label: "Codes in the title block", was: "NEC 2023, ordinance 7", now: "NEC 2023, ordinance 8" }]);
    expect((await take(jobId, 4, owner, { edition: "keep" })).body.changes).toEqual([]);
    expect((await drawingOf(owner, jobId)).drawing).toMatchObject({ site: { edition: "2023" }, sheet: { titleBlock: { codes: "NEC 2023, ordinance 8" } } });
  });
});

describe("a revision", () => {
  it("keeps who had to sign and how the file is named, as on the day of issue", async () => {
    const { drawSheets } = await import("./support/sheets");
    const { body } = await make({ signs: "preparer declaration accepted" });
    const profile = { ...body.exportProfile, fileNameTemplate: "{job} {set} {revision}_{date}", bookmarks: false };
    await patch(body.id, 1, { exportProfile: profile });
    const jobId = await newJob(owner, { number: "26/41", jurisdiction: { id: body.id } });
    const { id } = await drawingOf(owner, jobId);
    await save(owner, id, 0, place("ds-1", "DS-1"));
    const issued = await request("POST", `/api/jobs/${jobId}/revisions`, { as: owner, body: { purpose: "issued for permit" } });
    await patch(body.id, 2, { signs: "licensed professional", exportProfile: { ...profile, fileNameTemplate: "{revision}", bookmarks: true } });
    const revision = await request("GET", `/api/revisions/${issued.body.id}`, { as: owner });
    expect(revision.body.jurisdiction).toEqual({ name: body.name, signs: "preparer declaration accepted" });
    const { sheetSource } = await import("@/lib/server/data/sheetSets");
    expect((await sheetSource(issued.body.id, false)).bookmarks).toBe(false);
    await drawSheets(issued.body.id, false);
    const file = await request("GET", `/api/revisions/${issued.body.id}/sheets.pdf`, { as: owner });
    const day = revision.body.issuedAt.slice(0, 10);
    expect(file.headers.get("content-disposition")).toBe(`attachment; filename="26-41-PREVIEW-A_${day}.pdf"`);
    await expect(database().Revision.update({ jurisdiction: null }, { where: { id: issued.body.id } })).rejects.toThrow("stays as it was issued");
  });

  it("under the preview edition is issued, cites nothing as confirmed, and is not sealed", async () => {
    const jobId = await newJob(owner);
    const { id } = await drawingOf(owner, jobId);
    await request("PATCH", `/api/jobs/${jobId}`, { as: owner, body: { site: { edition: "2026" } } });
    expect((await save(owner, id, 1, partsOf(plant(cleanDrawing(), [4])))).status).toBe(200);
    const licensee = await onJob(owner, jobId, ["licensee"]);
    const { png } = await import("./support/png");
    await request("PUT", "/api/me/license", { as: licensee, body: { state: "Test State", number: "L-9", title: "PE", expiresOn: "2099-12-31" } });
    await request("PUT", "/api/me/license/seal-graphic", { as: licensee, raw: new Uint8Array(png(400, 400)), headers: { "content-type": "image/png" } });
    const issued = await request("POST", `/api/jobs/${jobId}/revisions`, { as: owner, body: { purpose: "issued for permit" } });
    expect(issued.status).toBe(201);
    const { body } = await request("GET", `/api/revisions/${issued.body.id}`, { as: licensee });
    const cited = body.check.findings.flatMap((each: { citation: string; folded: { citation: string }[] }) => [each.citation, ...each.folded.map((one) => one.citation)]).filter((text: string) => text.includes("NEC 2026"));
    expect(cited.length).toBeGreaterThan(0);
    for (const citation of cited) expect(citation).toContain("(not confirmed)");
    expect(body.sealRefusals.map((each: { code: string }) => each.code)).toContain("edition-preview");
    const sealing = await request("POST", `/api/revisions/${issued.body.id}/seal`, { as: licensee, body: { password: licensee.password } });
    expect(sealing).toMatchObject({ status: 409, body: { refusals: expect.arrayContaining([expect.objectContaining({ code: "edition-preview" })]) } });
    expect(sealing.body.detail).toContain("cannot be sealed");
  });
});
