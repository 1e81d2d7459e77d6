import { beforeAll, describe, expect, it } from "vitest";
import { database } from "@/lib/server/data/database";
import { failSheets } from "@/lib/server/data/sheetSets";
import type { CheckResult, Finding } from "@/lib/rules/engine/types";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";
import { plant } from "@/seeders/demo/planted";
import { drawingOf, equipment, place, save } from "./support/drawings";
import { firstAdministrator, newJob, onJob, type Person } from "./support/people";
import { png } from "./support/png";
import { request } from "./support/server";
import { drawSheets, queuedJobs } from "./support/sheets";

let owner: Person & { companyId: string };
let licensee: Person;
let clerk: Person;
let jobId: string;
let drawingId: string;
/** Where DS-1 stands at first. */
let home: number;
const license = { state: "Test State", number: "L-7", title: "PE", expiresOn: "2099-12-31" };

const post = (as: Person, address: string, body: unknown) => request("POST", address, { as, body });
const issue = async (description = "") => post(owner, `/api/jobs/${jobId}/revisions`, { purpose: "issued for permit", description });
const revision = (as: Person, id: string) => request("GET", `/api/revisions/${id}`, { as });
const seal = (id: string, as = licensee) => post(as, `/api/revisions/${id}/seal`, { password: as.password });
/** Edits the drawing; `x` moves the first box. */
async function edit(x: number) {
  const { sequence } = await drawingOf(owner, jobId);
  return save(owner, drawingId, sequence, [{ op: "replace", path: "/equipment/ds-1/at/x", value: x }], { title: `Move DS-1 to ${x}` });
}
const blocking = (check: CheckResult) => check.findings.filter((each: Finding) => !each.accepted && (each.kind === "needs-data" ? each.blocks : each.severity === "must-fix"));
async function acceptAll(id: string) {
  for (const finding of blocking((await revision(licensee, id)).body.check)) {
    expect((await post(licensee, `/api/revisions/${id}/accept`, { findingKey: finding.key, reason: "Rating plate to be read before energizing." })).status).toBe(200);
  }
}

beforeAll(async () => {
  owner = await firstAdministrator();
  jobId = await newJob(owner, { number: "26/T 1", permitNumber: "BP-1" });
  licensee = await onJob(owner, jobId, ["licensee"], "Licensed Person");
  clerk = await onJob(owner, jobId, ["permit clerk"], "Clerk Person");
  drawingId = (await drawingOf(owner, jobId)).id;
});

describe("issuing", () => {
  it("needs something on the sheet", async () => {
    expect(await issue()).toMatchObject({ status: 409, body: { code: "drawing-empty" } });
  });

  it("freezes the drawing, checks it on the server and asks the worker for a preview", async () => {
    // The demo with one breaker too large, and the one rating in it that is not known.
    const drawing = plant(cleanDrawing(), [4]);
    home = drawing.equipment["ds-1"]?.at.x ?? 0;
    const parts = ["equipment", "circuits", "raceways", "bonds", "interlocks", "sensors", "labels", "texts"] as const;
    expect((await save(owner, drawingId, 0, parts.map((part) => ({ op: "replace", path: `/${part}`, value: drawing[part] })))).status).toBe(200);
    const issued = await issue("First issue");
    expect(issued.status).toBe(201);
    const { body } = await revision(licensee, issued.body.id);
    expect(body).toMatchObject({ letter: "A", issue: 1, state: "in review", purpose: "issued for permit", description: "First issue", issuedBy: "First Administrator", previous: null, seal: null });
    const { check } = await import("@/lib/rules/engine/run");
    const { drawing: stored } = await drawingOf(owner, jobId);
    expect(body.check).toEqual(JSON.parse(JSON.stringify(check(stored))));
    expect(body.digest).toBe(check(stored).digest);
    expect(blocking(body.check).map((each) => each.kind).sort()).toEqual(["finding", "needs-data"]);
    expect(await queuedJobs(issued.body.id)).toEqual([{ sealed: false }]);
    expect(await request("GET", `/api/revisions/${issued.body.id}/sheets.pdf`, { as: licensee })).toMatchObject({ status: 409, body: { code: "sheets-not-ready" } });
    const { bytes } = await drawSheets(issued.body.id, false);
    const preview = await request("GET", `/api/revisions/${issued.body.id}/sheets.pdf`, { as: owner });
    expect(preview.bytes.equals(bytes)).toBe(true);
    expect(preview.headers.get("content-disposition")).toBe('attachment; filename="26-T-1-PREVIEW-A.pdf"');
  });

  it("waits while one is in review, and lets only one of two at once through", async () => {
    expect(await issue()).toMatchObject({ status: 409, body: { code: "review-open" } });
    const other = await newJob(owner);
    const { id } = await drawingOf(owner, other);
    await save(owner, id, 0, place("ds-1", "DS-1"));
    const answers = await Promise.all([1, 2].map(() => post(owner, `/api/jobs/${other}/revisions`, { purpose: "issued for permit" })));
    expect(answers.map((each) => each.status).sort()).toEqual([201, 409]);
  });
});

const latest = async (as = owner) => (await request("GET", `/api/jobs/${jobId}/revisions`, { as })).body.revisions[0];

describe("returning", () => {
  it("gives the comment to the designer and the same letter to the next issue", async () => {
    const { id } = await latest();
    expect((await post(licensee, `/api/revisions/${id}/return`, { comment: "Name the second switch." })).body).toMatchObject({ state: "returned", returnedBy: "Licensed Person" });
    expect(await latest()).toMatchObject({ state: "returned", returnComment: "Name the second switch." });
    expect(await post(licensee, `/api/revisions/${id}/return`, { comment: "Again." })).toMatchObject({ status: 409, body: { code: "revision-state" } });
    await issue();
    expect(await latest()).toMatchObject({ letter: "A", issue: 2, state: "in review" });
  });
});

describe("sealing", () => {
  it("names everything in the way, and asks for the password first", async () => {
    const { id } = await latest();
    expect(await post(licensee, `/api/revisions/${id}/seal`, { password: "not mine" })).toMatchObject({ status: 422, body: { field: "password", code: "wrong-password" } });
    const answer = await seal(id);
    expect(answer.status).toBe(409);
    const codes = answer.body.refusals.map((each: { code: string }) => each.code);
    expect(codes).toContain("license-missing");
    const findings = answer.body.refusals.flatMap((each: { findings?: { key: string }[] }) => (each.findings ?? []).map((one) => one.key)).sort();
    expect(findings).toEqual(blocking((await revision(licensee, id)).body.check).map((each) => each.key).sort());
    expect((await revision(licensee, id)).body).toMatchObject({ state: "in review", seal: null, sealRefusals: answer.body.refusals });
  });

  it("takes an acceptance under a license that is in force, once, with its reason", async () => {
    const { id } = await latest();
    const [first] = blocking((await revision(licensee, id)).body.check);
    const accept = () => post(licensee, `/api/revisions/${id}/accept`, { findingKey: first?.key, reason: "Read on site." });
    expect((await accept()).body.code).toBe("license-missing");
    await request("PUT", "/api/me/license", { as: licensee, body: { ...license, expiresOn: "2020-01-01" } });
    expect((await accept()).body.code).toBe("license-expired");
    await request("PUT", "/api/me/license", { as: licensee, body: license });
    const before = (await revision(licensee, id)).body;
    const after = (await accept()).body;
    expect(after.check.counts.accepted).toBe(before.check.counts.accepted + 1);
    expect(after.check.findings.find((each: Finding) => each.key === first?.key).accepted).toMatchObject({ by: "Licensed Person", license: "PE L-7 (Test State)", reason: "Read on site." });
    expect([after.digest, after.drawing]).toEqual([before.digest, before.drawing]);
    expect((await accept()).body.code).toBe("accepted-before");
    await acceptAll(id);
  });

  it("needs a seal graphic, a license in force, and the drawing as it was issued", async () => {
    const { id } = await latest();
    const codes = async () => (await seal(id)).body.refusals?.map((each: { code: string }) => each.code);
    expect(await codes()).toEqual(["seal-graphic-missing"]);
    await request("PUT", "/api/me/license/seal-graphic", { as: licensee, raw: new Uint8Array(png(300, 300)) });
    await request("PUT", "/api/me/license", { as: licensee, body: { ...license, expiresOn: "2020-01-01" } });
    expect(await codes()).toEqual(["license-expired"]);
    await request("PUT", "/api/me/license", { as: licensee, body: license });
    await edit(99);
    expect(await codes()).toEqual(["draft-moved-on"]);
    await edit(home);
    expect((await revision(licensee, id)).body.sealRefusals).toEqual([]);
    // In force through its last day, and no day longer.
    const day = (shift: number) => new Date(Date.now() + shift * 86_400_000).toISOString().slice(0, 10);
    await request("PUT", "/api/me/license", { as: licensee, body: { ...license, expiresOn: day(0) } });
    expect((await revision(licensee, id)).body.sealRefusals).toEqual([]);
    await request("PUT", "/api/me/license", { as: licensee, body: { ...license, expiresOn: day(-1) } });
    expect(await codes()).toEqual(["license-expired"]);
    await request("PUT", "/api/me/license", { as: licensee, body: license });
  });

  it("goes back to review when the sheets cannot be drawn, and can be tried again", async () => {
    const { id } = await latest();
    expect(await seal(id)).toMatchObject({ status: 202, body: { state: "sealing", sealedSet: { state: "queued" } } });
    await failSheets(id, true, "the worker ran out of ink", false);
    expect((await request("GET", `/api/revisions/${id}/status`, { as: licensee })).body.state).toBe("sealing");
    await failSheets(id, true, "the worker ran out of ink", true);
    expect((await request("GET", `/api/revisions/${id}/status`, { as: licensee })).body).toMatchObject({ state: "in review", sealedSet: { state: "failed", error: "the worker ran out of ink" } });
  });

  it("is complete when the bytes are stored: digest beside them, seen and downloaded by the clerk", async () => {
    const { id } = await latest();
    expect((await request("GET", `/api/counter/${jobId}`, { as: clerk })).body.revisions).toEqual([]);
    await Promise.all([seal(id), seal(id)]);
    expect(await queuedJobs(id)).toContainEqual({ sealed: true });
    expect((await request("GET", `/api/revisions/${id}`, { as: clerk })).status).toBe(404);
    const { bytes, digest } = await drawSheets(id, true);
    const counter = (await request("GET", `/api/counter/${jobId}`, { as: clerk })).body;
    expect(counter).toMatchObject({ name: "Test barn", permitNumber: "BP-1", revisions: [{ letter: "A", state: "sealed", sheetSet: { fileDigest: digest, bytes: bytes.length, sheets: 2 }, seal: { licensee: "Licensed Person", licenseNumber: "L-7" } }] });
    expect(counter.revisions[0].seal.sealCode).toMatch(/^[0-9A-HJKMNP-TV-Z]{4}-[0-9A-HJKMNP-TV-Z]{4}$/);
    const file = await request("GET", `/api/revisions/${id}/sheets.pdf`, { as: clerk });
    expect(file.bytes.equals(bytes)).toBe(true);
    expect([file.headers.get("content-type"), file.headers.get("content-disposition"), file.headers.get("x-file-digest")]).toEqual(["application/pdf", 'attachment; filename="26-T-1-SET-A.pdf"', digest]);
    expect((await request("GET", "/api/counter", { as: clerk })).body.jobs[0].current).toMatchObject({ letter: "A", state: "sealed" });
    const job = (await request("GET", `/api/jobs/${jobId}`, { as: owner })).body;
    const listed = (await request("GET", "/api/jobs", { as: owner })).body.jobs.find((each: { id: string }) => each.id === jobId);
    const { check } = (await revision(licensee, id)).body;
    expect(check.counts.accepted).toBeGreaterThan(0);
    expect([job.counts, listed.counts]).toEqual([check.counts, check.counts]);
  });

  it("is done once: no second seal, no return, no other bytes", async () => {
    const { id } = await latest();
    expect((await seal(id)).body.refusals[0]).toMatchObject({ code: "not-in-review" });
    expect((await post(licensee, `/api/revisions/${id}/return`, { comment: "Late." })).status).toBe(409);
    const { finishSheets } = await import("@/lib/server/data/sheetSets");
    await expect(finishSheets(id, true, { objectKey: "sheets/other", digest: "0".repeat(64), bytes: 1, sheets: 1 })).rejects.toThrow("other bytes");
    await drawSheets(id, true);
  });
});

describe("a sealed set", () => {
  it("becomes void for everybody when the drawing changes, and counts again when that is taken back", async () => {
    const { id } = await latest();
    const states = async () => [(await latest()).state, (await request("GET", `/api/counter/${jobId}`, { as: clerk })).body.revisions[0].state, (await request("GET", "/api/counter", { as: clerk })).body.jobs[0].current.state];
    await edit(77);
    expect(await states()).toEqual(["void", "void", "void"]);
    expect((await revision(licensee, id)).body.voidedAt).toEqual(expect.any(String));
    await edit(78);
    await edit(home);
    expect(await states()).toEqual(["sealed", "sealed", "sealed"]);
    const actions = (await database().AuditEntry.findAll({ where: { subject: `revisions/${id}` }, order: [["id", "ASC"]] })).map((row) => row.action);
    expect(actions.filter((action) => action.startsWith("revision.seal."))).toEqual(["revision.seal.failed", "revision.seal.void", "revision.seal.restored"]);
    expect(actions).toContain("sheets.download");
  });

  it("is superseded by the next one; what was accepted goes on where nothing changed", async () => {
    await edit(55);
    const { sequence } = await drawingOf(owner, jobId);
    await save(owner, drawingId, sequence, [{ op: "add", path: "/equipment/ds-3", value: equipment("disconnect", "DS-3") }]);
    const issued = await issue("Second");
    const { body } = await revision(licensee, issued.body.id);
    expect(body).toMatchObject({ letter: "B", issue: 1, previous: { letter: "A" } });
    const accepted = body.check.findings.filter((each: Finding) => each.accepted);
    expect(accepted.length).toBeGreaterThan(0);
    expect(accepted.every((each: Finding) => !JSON.stringify([each.anchor, each.fields]).includes("ds-3"))).toBe(true);
    await acceptAll(issued.body.id);
    await seal(issued.body.id);
    await drawSheets(issued.body.id, true);
    const { revisions } = (await request("GET", `/api/counter/${jobId}`, { as: clerk })).body;
    expect(revisions.map((each: { letter: string; state: string }) => [each.letter, each.state])).toEqual([["B", "sealed"], ["A", "superseded"]]);
    expect((await request("GET", `/api/revisions/${revisions[1].id}/sheets.pdf`, { as: clerk })).status).toBe(200);
    expect((await request("GET", `/api/jobs/${jobId}`, { as: owner })).body).toMatchObject({ state: "sealed", revision: "B", nextLetter: "C" });
  });
});

describe("the database", () => {
  const run = (sql: string) => database().sequelize.query(sql);
  it("refuses to change what was issued, sealed or logged, whoever asks", async () => {
    await expect(run("update revisions set snapshot = '{}' where letter = 'A'")).rejects.toThrow("stays as it was issued");
    await expect(run("update sheet_sets set digest = repeat('0', 64) where kind = 'sealed'")).rejects.toThrow("sealed sheets stay");
    await expect(run("delete from audit_log")).rejects.toThrow("only added to");
    await expect(run("update audit_log set detail = '{}'")).rejects.toThrow("only added to");
    await expect(run(`insert into revisions select gen_random_uuid(), job_id, drawing_id, 'C', 1, purpose, description, 'sealed', sequence, snapshot, digest, rule_set, check_result, issued_by
      from revisions where state = 'sealed' limit 1`)).rejects.toThrow();
  });
});
