import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, it } from "vitest";
import { canonicalJson } from "@/lib/diagram/canonical";
import { drawingOf, equipment, place, save } from "./support/drawings";
import { firstAdministrator, jobBody, newJob, site, type Person } from "./support/people";
import { request } from "./support/server";

let owner: Person & { companyId: string };
let jobId: string;
let drawingId: string;
const SCRIPT = "<script>alert(1)</script>";

beforeAll(async () => {
  owner = await firstAdministrator();
  jobId = await newJob(owner);
  drawingId = (await drawingOf(owner, jobId)).id;
  await save(owner, drawingId, 0, place("ds-1", "DS-1"));
});

/** Sends a save that must be refused, and sees that nothing was stored. */
async function refused(patches: unknown, change: Record<string, unknown> = {}) {
  const before = await drawingOf(owner, jobId);
  const answer = await save(owner, drawingId, before.sequence, patches, change);
  const after = await drawingOf(owner, jobId);
  expect(after.sequence).toBe(before.sequence);
  expect(canonicalJson(after.drawing)).toBe(canonicalJson(before.drawing));
  expect(answer.headers.get("content-type")).toBe("application/problem+json");
  expect(answer.body).toMatchObject({ type: "about:blank", title: expect.any(String), status: answer.status, code: expect.any(String), detail: expect.any(String), requestId: expect.any(String) });
  return { status: answer.status, field: answer.body.field };
}
const add = (path: string, value: unknown) => [{ op: "add", path, value }];

describe("a save that would break the drawing", () => {
  it.each([
    ["a field that no drawing has", add("/secrets", {}), "/secrets"],
    ["a field that no equipment has", add("/equipment/ds-1/shade", "blue"), "/equipment/ds-1/shade"],
    ["an unknown kind", add("/equipment/x", { ...equipment("disconnect", "X"), kind: "toaster" }), "/equipment/x/kind"],
    ["a parent that is not there", add("/equipment/x", equipment("breaker", "X", { parent: "nowhere" })), "/equipment/x/parent"],
    ["equipment inside itself", add("/equipment/x", equipment("interconnect-cabinet", "X", { parent: "x" })), "/equipment/x/parent"],
    ["a circle of parents", [
      ...add("/equipment/a", equipment("interconnect-cabinet", "A", { parent: "b" })), ...add("/equipment/b", equipment("interconnect-cabinet", "B", { parent: "a" })),
    ], "/equipment/a/parent"],
    ["a circuit to equipment that is not there", add("/circuits/f1", {
      tag: "F1", callout: null, wiring: "field", system: "ac", from: { equipment: "ds-1", port: "line", offset: 0 }, to: { equipment: "gone", port: "line", offset: 0 },
      status: "new", load: null, sections: {}, points: [], bends: [], calloutAt: null,
    }), "/circuits/f1"],
    ["a number where text belongs", add("/equipment/ds-1/tag", 7), "/equipment/ds-1/tag"],
    ["null where a place belongs", add("/equipment/ds-1/at", { x: null, y: 1 }), "/equipment/ds-1/at/x"],
    ["a place far off the sheet", add("/equipment/ds-1/at", { x: 1e9, y: 1 }), "/equipment/ds-1/at/x"],
    ["an id that is none", add("/equipment/DS 1", equipment("disconnect", "X")), "/equipment/DS 1"],
    ["a control character in a tag", add("/equipment/ds-1/tag", "DS\u0000"), "/equipment/ds-1/tag"],
    ["another schema version", [{ op: "replace", path: "/schemaVersion", value: 99 }], "/schemaVersion"],
  ])("is refused for %s, and the place is named", async (_, patches, place) => {
    const answer = await refused(patches);
    expect(answer.status).toBe(422);
    expect(answer.field).toMatch(new RegExp(`^${place.replaceAll("/", "\\/")}`));
  });

  it.each([
    ["a place that is not there", [{ op: "replace", path: "/equipment/gone/tag", value: "X" }]],
    ["a value that was another", [{ op: "test", path: "/equipment/ds-1/tag", value: "OTHER" }, { op: "remove", path: "/equipment/ds-1" }]],
    ["a place in the middle of a list", [{ op: "add", path: "/circuits/x/points/0", value: { x: 1, y: 1 } }]],
  ])("is refused for %s, with the operation named", async (_, patches) => {
    expect(await refused(patches)).toMatchObject({ status: 422, field: expect.stringMatching(/^patches\.\d+$/) });
  });

  it.each(["__proto__", "constructor", "prototype"])("never reaches an object's %s", async (key) => {
    expect((await refused([{ op: "add", path: `/equipment/${key}`, value: { polluted: true } }])).status).toBe(422);
    const raw = `{"saveId":"${randomUUID()}","baseSequence":1,"title":"","patches":[{"op":"add","path":"/equipment/x","value":{"${key}":{"polluted":true}}}]}`;
    expect((await request("POST", `/api/drawings/${drawingId}/patches`, { as: owner, raw })).status).toBe(422);
    expect(({} as Record<string, unknown>)["polluted"]).toBeUndefined();
  });
});

describe("a save that is no save", () => {
  it.each([
    ["an operation that copies", { patches: [{ op: "copy", from: "/equipment", path: "/equipment/x" }] }, "patches.0"],
    ["no operation", { patches: [] }, "patches"],
    ["6,000 operations", { patches: Array.from({ length: 6000 }, () => ({ op: "test", path: "/sheet", value: 1 })) }, "patches"],
    ["a path that is none", { patches: [{ op: "remove", path: "equipment" }] }, "patches.0.path"],
    ["a save id that is none", { saveId: "1" }, "saveId"],
    ["a negative base", { baseSequence: -1 }, "baseSequence"],
    ["half a base", { baseSequence: 1.5 }, "baseSequence"],
    ["a field of its own", { force: true }, "force"],
    ["a line break in its title", { title: "a\nb" }, "title"],
  ])("is refused for %s", async (_, change, field) => {
    const answer = await refused(place("x", "X"), change);
    expect(answer.status).toBe(422);
    expect(answer.field).toMatch(new RegExp(`^${field.replace(".", "\\.")}`));
  });
});

describe("a body that is no request", () => {
  const post = (raw: BodyInit, headers: Record<string, string> = {}) => request("POST", `/api/drawings/${drawingId}/patches`, { as: owner, raw, headers });

  it("is refused when it is no JSON, NaN and Infinity among it", async () => {
    for (const raw of ["{", "", '{"baseSequence": NaN}', '{"baseSequence": Infinity}', "undefined"]) expect(await post(raw)).toMatchObject({ status: 400, body: { code: "not-json" } });
    expect(await post("[]")).toMatchObject({ status: 422, body: { field: "body" } });
    expect(await post("null")).toMatchObject({ status: 422, body: { field: "body" } });
  });

  it("is refused when it is not sent as JSON", async () => {
    expect(await post("a=1", { "content-type": "application/x-www-form-urlencoded" })).toMatchObject({ status: 415, body: { code: "content-type" } });
    expect(await post("{}", { "content-type": "text/plain" })).toMatchObject({ status: 415 });
  });

  it("is refused at 10 MB, with its size stated and without", async () => {
    const large = JSON.stringify({ saveId: randomUUID(), baseSequence: 1, title: "", patches: [{ op: "add", path: "/x", value: "x".repeat(10 * 1024 * 1024) }] });
    expect(await post(large, { "content-length": String(large.length) })).toMatchObject({ status: 413, body: { code: "too-large" } });
    const stream = new ReadableStream<Uint8Array>({
      start(controller) {
        for (let index = 0; index < 10; index += 1) controller.enqueue(new Uint8Array(1024 * 1024).fill(32));
        controller.close();
      },
    });
    expect(await post(stream)).toMatchObject({ status: 413, body: { code: "too-large" } });
  });
});

describe("a job", () => {
  const make = (change: Record<string, unknown>) => request("POST", "/api/jobs", { as: owner, body: jobBody(owner.companyId, change) });

  it.each([
    ["no name", { name: "  " }, "name"],
    ["no number", { number: "" }, "number"],
    ["a name that is too long", { name: "x".repeat(121) }, "name"],
    ["a line break in its name", { name: "a\nb" }, "name"],
    ["an edition that nobody adopted", { site: { ...site, edition: "1897" } }, "site.edition"],
    ["a record low in words", { site: { ...site, recordLowC: "cold" } }, "site.recordLowC"],
    ["a record low below all records", { site: { ...site, recordLowC: -200 } }, "site.recordLowC"],
    ["a site with a field of its own", { site: { ...site, amendments: {} } }, "site.amendments"],
    ["a jurisdiction that is not known", { jurisdiction: { id: randomUUID() } }, "jurisdiction"],
    ["a field of its own", { state: "sealed" }, "state"],
  ])("is refused with %s", async (_, change, field) => {
    expect(await make(change)).toMatchObject({ status: 422, body: { code: "field", field } });
  });

  it("is refused under a number that the company has", async () => {
    const number = `N-${randomUUID().slice(0, 6)}`;
    expect((await make({ number })).status).toBe(201);
    expect(await make({ number })).toMatchObject({ status: 409, body: { code: "number-taken", field: "number" } });
    expect((await request("PATCH", `/api/jobs/${jobId}`, { as: owner, body: { number } })).body.code).toBe("number-taken");
  });

  it("keeps a name with a script in it as words", async () => {
    const made = await make({ name: SCRIPT });
    expect((await request("GET", `/api/jobs/${made.body.id}`, { as: owner })).body.name).toBe(SCRIPT);
    expect((await drawingOf(owner, made.body.id)).drawing.sheet.titleBlock.jobName).toBe(SCRIPT);
  });

  it("carries a change of its site into the drawing, as an edit in the journal", async () => {
    const before = await drawingOf(owner, jobId);
    const changed = await request("PATCH", `/api/jobs/${jobId}`, { as: owner, body: { name: "Renamed", site: { recordLowC: -31, utilityName: null } } });
    expect(changed.body).toMatchObject({ name: "Renamed", site: { recordLowC: -31, utilityName: null, designHighC: 33 } });
    const after = await drawingOf(owner, jobId);
    expect(after.sequence).toBe(before.sequence + 1);
    expect(after.drawing.site.recordLowC).toBe(-31);
    expect(after.drawing.sheet.titleBlock.jobName).toBe("Renamed");
    // Nothing changed is no edit.
    await request("PATCH", `/api/jobs/${jobId}`, { as: owner, body: { site: { recordLowC: -31 } } });
    expect((await drawingOf(owner, jobId)).sequence).toBe(after.sequence);
  });
});

describe("a person", () => {
  const invite = (body: unknown) => request("POST", `/api/jobs/${jobId}/members`, { as: owner, body });
  it.each([
    ["an address that is none", { email: "nobody", name: "N", password: "long enough, really", roles: ["designer"] }, "email"],
    ["no role", { email: "a@example.test", name: "N", password: "long enough, really", roles: [] }, "roles"],
    ["a role that there is not", { email: "a@example.test", name: "N", password: "long enough, really", roles: ["owner"] }, "roles.0"],
    ["a short password", { email: "a@example.test", name: "N", password: "short", roles: ["designer"] }, "password"],
    ["no name and no account", { email: "b@example.test", password: "long enough, really", roles: ["designer"] }, "name"],
    ["no password and no account", { email: "b@example.test", name: "N", roles: ["designer"] }, "password"],
  ])("is refused with %s", async (_, body, field) => {
    expect(await invite(body)).toMatchObject({ status: 422, body: { field } });
  });
  it("is known by address whatever its letters, and gets roles added", async () => {
    const first = await invite({ email: "Case@Example.test", name: "Case", password: "long enough, really", roles: ["designer"] });
    const second = await invite({ email: "case@example.TEST", roles: ["installer"] });
    expect(second.body).toMatchObject({ userId: first.body.userId, roles: ["designer", "installer"], name: "Case" });
  });
});
