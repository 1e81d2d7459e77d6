import { randomUUID } from "node:crypto";
import { QueryTypes } from "sequelize";
import { beforeAll, describe, expect, it } from "vitest";
import { drawingDigest } from "@/lib/diagram/canonical";
import { applyCommand } from "@/lib/diagram/commands";
import { emptyRow, emptyVisit, type VisitData } from "@/lib/diagram/siteVisit";
import { database } from "@/lib/server/data/database";
import { down, up } from "@/migrations/0009-site-visits";
import { drawingOf, save } from "./support/drawings";
import { uploaded } from "./support/files";
import { png } from "./support/png";
import { firstAdministrator, newJob, onJob, type Person } from "./support/people";
import { request } from "./support/server";

let owner: Person & { companyId: string };
let installer: Person;
let licensee: Person;
let jobId: string;
let otherJob: string;

beforeAll(async () => {
  owner = await firstAdministrator();
  jobId = await newJob(owner);
  otherJob = await newJob(owner);
  installer = await onJob(owner, jobId, ["installer"], "Kit Fenner");
  licensee = await onJob(owner, jobId, ["licensee"]);
});

const panel = { ...emptyRow.panels("p1"), name: "House panel", labelText: "Halden MM, 225 A", busA: 225, mainA: 200, spacesTotal: 30, spacesFree: 4 };
const bodyOf = (change: Partial<VisitData> = {}, rest: Record<string, unknown> = {}) => ({ id: randomUUID(), visitedOn: "2026-11-30", byName: "Kit Fenner", data: { ...emptyVisit(), ...change }, ...rest });
const add = (as: Person, body: unknown, job = jobId) => request("POST", `/api/jobs/${job}/visits`, { as, body });
const change = (as: Person, id: string, body: unknown) => request("PATCH", `/api/visits/${id}`, { as, body });
const logged = (subject: string) => database().sequelize.query<{ action: string; detail: Record<string, never>; actor_id: string }>(
  "select action, detail, actor_id from audit_log where subject = :subject order by id", { replacements: { subject }, type: QueryTypes.SELECT });

describe("a site visit", () => {
  it("is stored as it was written, read again and listed, the latest day first", async () => {
    const data = { panels: [panel], temperatures: { roof: { value: 141, unit: "°F" as const }, attic: { value: 48, unit: "°C" as const }, room: null, when: "2 PM, sunny", how: "probe in the shade" } };
    const made = await add(installer, bodyOf(data));
    expect(made).toMatchObject({ status: 201, body: { version: 1, visitedOn: "2026-11-30", byName: "Kit Fenner", createdBy: "Kit Fenner", may: { edit: true, take: false } } });
    // The unit is the one that was typed, beside the other.
    expect(made.body.data).toEqual({ ...emptyVisit(), ...data });
    const earlier = await add(owner, bodyOf({}, { visitedOn: "2026-03-02" }));
    expect((await request("GET", `/api/visits/${made.body.id}`, { as: licensee })).body).toMatchObject({ data: { panels: [panel] }, may: { edit: false, take: false } });
    const list = await request("GET", `/api/jobs/${jobId}/visits`, { as: owner });
    expect(list.body).toMatchObject({ jobName: "Test barn", may: { edit: true, take: true } });
    expect(list.body.visits.map((each: { id: string }) => each.id)).toEqual([made.body.id, earlier.body.id]);
  });

  it("sent twice is stored once, also at the same time, and nobody else's id is taken for it", async () => {
    const body = bodyOf({ panels: [panel] });
    const answers = await Promise.all([add(installer, body), add(installer, body), add(installer, body)]);
    expect(answers.map((each) => [each.status, each.body.id, each.body.version])).toEqual(Array(3).fill([201, body.id, 1]));
    expect((await logged(`visits/${body.id}`)).map((each) => each.action)).toEqual(["visit.create"]);
    expect(await add(owner, body)).toMatchObject({ status: 422, body: { field: "id" } });
    expect(await add(owner, body, otherJob)).toMatchObject({ status: 422, body: { field: "id" } });
  });

  it("changed by two people at once keeps both: the second one is shown the first one's", async () => {
    const { body: made } = await add(installer, bodyOf());
    expect(await change(installer, made.id, { version: 1, data: { ...made.data, panels: [panel] } })).toMatchObject({ status: 200, body: { version: 2, updatedBy: "Kit Fenner" } });
    const stale = await change(owner, made.id, { version: 1, byName: "Somebody else" });
    expect(stale).toMatchObject({ status: 409, body: { code: "stale-version", visit: { version: 2, byName: "Kit Fenner", data: { panels: [panel] } } } });
    expect((await request("GET", `/api/visits/${made.id}`, { as: owner })).body).toMatchObject({ version: 2, byName: "Kit Fenner" });
    // What changes nothing makes no version and no entry in the log.
    expect((await change(owner, made.id, { version: 2, byName: "Kit Fenner" })).body.version).toBe(2);
    expect((await logged(`visits/${made.id}`)).map((each) => each.action)).toEqual(["visit.create", "visit.edit"]);
  });

  it("leaves in the log what changed from what to what", async () => {
    const { body: made } = await add(installer, bodyOf({ panels: [panel] }));
    await change(owner, made.id, { version: 1, data: { ...made.data, panels: [{ ...panel, busA: 200 }], note: "Dog in the yard." } });
    const [created, edited] = await logged(`visits/${made.id}`);
    expect(created?.detail).toMatchObject({ after: { "panels 1 busA": 225, "panels 1 mainA": 200, byName: "Kit Fenner" } });
    expect(edited).toMatchObject({ actor_id: owner.id, detail: { version: 2, before: { "panels 1 busA": 225, note: null }, after: { "panels 1 busA": 200, note: "Dog in the yard." } } });
    expect(Object.keys(edited?.detail["after"] ?? {})).toHaveLength(2);
  });

  it("shows photos of its own job alone", async () => {
    const own = (await uploaded(installer, `/api/jobs/${jobId}`, png(60, 60), "label.png", "site photo")).id;
    const foreign = (await uploaded(owner, `/api/jobs/${otherJob}`, png(61, 60), "label.png", "site photo")).id;
    const photos = (file: string) => [{ id: "f1", file, what: "meter", caption: null }];
    const made = await add(installer, bodyOf({ photos: photos(own), panels: [{ ...panel, labelPhotos: [own] }] }));
    expect(made.status).toBe(201);
    for (const data of [{ photos: photos(foreign) }, { photos: photos(randomUUID()) }, { panels: [{ ...panel, labelPhotos: [foreign] }] }]) {
      expect(await add(installer, bodyOf(data))).toMatchObject({ status: 422, body: { code: "unknown-file" } });
      expect(await change(installer, made.body.id, { version: 1, data: { ...emptyVisit(), ...data } })).toMatchObject({ status: 422, body: { code: "unknown-file" } });
    }
    // A photo that was removed from the job does not lock the visit that shows it.
    expect((await request("DELETE", `/api/files/${own}`, { as: owner })).status).toBe(204);
    expect((await change(installer, made.body.id, { version: 1, data: { ...made.body.data, note: "still editable" } })).status).toBe(200);
  });

  it.each<[string, unknown, string]>([
    ["a bus of no size", { panels: [{ ...panel, busA: 0 }] }, "data.panels.0.busA"],
    ["more free spaces than any panel has", { panels: [{ ...panel, spacesFree: 85 }] }, "data.panels.0.spacesFree"],
    ["a temperature without unit", { temperatures: { ...emptyVisit().temperatures, attic: { value: 40 } } }, "data.temperatures.attic.unit"],
    ["an attic hotter than is taken", { temperatures: { ...emptyVisit().temperatures, attic: { value: 249, unit: "°F" } } }, "data.temperatures.attic"],
    ["a wire size nobody makes", { grounding: { ...emptyVisit().grounding, conductorSize: "6" } }, "data.grounding.conductorSize"],
    ["a control character", { note: "a\u0007b" }, "data.note"],
    ["a photo named by a path", { photos: [{ id: "f1", file: "../etc", what: null, caption: null }] }, "data.photos.0.file"],
    ["a field that is none", { service: { ...emptyVisit().service, ratingA: 5 } }, "data.service.ratingA"],
    ["forty-one panels", { panels: Array.from({ length: 41 }, (_, i) => ({ ...panel, id: `p${i}` })) }, "data.panels"],
  ])("with %s is refused, naming it", async (_, data, field) => {
    const answer = await add(installer, bodyOf(data as Partial<VisitData>));
    expect([answer.status, answer.body.field]).toEqual([422, field]);
  });

  it("is for the office: a licensee reads it, a clerk does not learn of it", async () => {
    const { body: made } = await add(installer, bodyOf());
    const clerk = await onJob(owner, jobId, ["permit clerk"]);
    expect((await change(licensee, made.id, { version: 1, byName: "x" })).status).toBe(403);
    expect((await add(licensee, bodyOf())).status).toBe(403);
    for (const address of [`/api/visits/${made.id}`, `/api/jobs/${jobId}/visits`]) expect((await request("GET", address, { as: clerk })).status).toBe(403);
  });

  it("of an archived job stays as it is", async () => {
    const job = await newJob(owner);
    const { body: made } = await add(owner, bodyOf(), job);
    await request("POST", `/api/jobs/${job}/archive`, { as: owner, body: { archived: true } });
    expect(await change(owner, made.id, { version: 1, byName: "x" })).toMatchObject({ status: 409, body: { code: "job-archived" } });
    expect((await add(owner, bodyOf(), job)).status).toBe(409);
    expect((await request("GET", `/api/jobs/${job}/visits`, { as: owner })).body.may).toEqual({ edit: false, take: false });
  });
});

describe("the picture under the sheet", () => {
  it("is saved like any other edit, leaves the digest as it is, and stays with its own job when that is copied", async () => {
    const job = await newJob(owner);
    const file = (await uploaded(owner, `/api/jobs/${job}`, png(62, 60), "sketch.png", "background")).id;
    const { id, sequence, drawing } = await drawingOf(owner, job);
    const placed = applyCommand(drawing, { type: "setUnderlay", change: { file, width: 30, height: 20 } });
    if (!placed.ok) throw new Error(placed.reason);
    expect((await save(owner, id, sequence, placed.patches)).status).toBe(200);
    const now = (await drawingOf(owner, job)).drawing;
    expect(now.sheet.underlay).toMatchObject({ file, opacity: 0.35 });
    expect(drawingDigest(now, "1")).toBe(drawingDigest(drawing, "1"));
    const copy = await request("POST", `/api/jobs/${job}/duplicate`, { as: owner, body: { number: `C-${randomUUID().slice(0, 8)}`, name: "A copy", drawing: true } });
    expect(copy.status).toBe(201);
    expect((await drawingOf(owner, copy.body.id)).drawing.sheet).not.toHaveProperty("underlay");
  });
});

describe("the visits' migration", () => {
  it("leads back and forward again", async () => {
    const { sequelize } = database();
    const context = sequelize.getQueryInterface();
    await down({ context });
    await expect(sequelize.query("select 1 from site_visits")).rejects.toThrow("does not exist");
    await up({ context });
    expect(await sequelize.query("select count(*)::int as n from site_visits", { type: QueryTypes.SELECT })).toEqual([{ n: 0 }]);
  });
});
