import { beforeAll, describe, expect, it } from "vitest";
import { newEquipment } from "@/lib/diagram/commands";
import { drawingOf, save } from "./support/drawings";
import { firstAdministrator, inCompany, newJob, onJob, type Person } from "./support/people";
import { request } from "./support/server";

let owner: Person & { companyId: string };
let designer: Person;
let outside: Person;
let jobId: string;
let entryId: string;

const data = (ratingA: number, more: Record<string, unknown> = {}) => ({
  props: { make: "Oddfellow", current: "ac", ratingA, poles: 2 }, sources: { ratingA: { document: "OF sheet", page: "3" } }, ports: { line: { continuousA: ratingA } }, ...more,
});
const change = (baseVersion: number, next: unknown) => request("PATCH", `/api/library/${entryId}`, { as: owner, body: { baseVersion, data: next } });

beforeAll(async () => {
  owner = await firstAdministrator();
  designer = await inCompany(owner, owner.companyId, ["designer"]);
  jobId = await newJob(owner, { name: "Long barn" });
  outside = await onJob(owner, jobId, ["licensee"]);
  entryId = (await request("POST", `/api/companies/${owner.companyId}/library`, { as: owner, body: { kind: "breaker", name: "OF 60", data: data(60) } })).body.id;
});

/** Places equipment of the entry as the editor does: values copied, entry and version noted. */
async function placed(job: string, id: string, tag: string, held: Record<string, unknown> = {}, library: unknown = { entry: entryId, version: 1 }) {
  const entry = (await request("GET", `/api/library/${entryId}/versions/1`, { as: owner })).body.data;
  const drawing = await drawingOf(owner, job);
  const value = { ...newEquipment("breaker", tag, { x: 10, y: 10 }), ...entry, props: { ...entry.props, ...held }, library };
  expect((await save(owner, drawing.id, drawing.sequence, [{ op: "add", path: `/equipment/${id}`, value }])).status).toBe(200);
}
const updates = async (as: Person = owner) => (await request("GET", `/api/jobs/${jobId}/library-updates`, { as })).body.updates;

describe("placing", () => {
  it("is offered the job's company's entries with their values, also to somebody who is on the job alone", async () => {
    const { status, body } = await request("GET", `/api/jobs/${jobId}/library?kind=breaker&q=of 60`, { as: outside });
    expect(status).toBe(200);
    expect(body.entries).toEqual([expect.objectContaining({ id: entryId, name: "OF 60", version: 1, data: expect.objectContaining({ ports: { line: { continuousA: 60 } } }) })]);
    expect((await request("GET", `/api/jobs/${jobId}/library`, { as: designer })).status).toBe(404);
    const clerk = await onJob(owner, jobId, ["permit clerk"]);
    expect((await request("GET", `/api/jobs/${jobId}/library`, { as: clerk })).status).toBe(403);
    expect((await request("GET", `/api/jobs/${jobId}/library-updates`, { as: clerk })).status).toBe(403);
  });

  it("shows at the entry which jobs use it, to those who may see these jobs", async () => {
    await placed(jobId, "cb-1", "CB-1");
    await placed(jobId, "cb-2", "CB-2", { ratingA: 70 });
    const other = await newJob(owner);
    await placed(other, "cb-9", "CB-9", {}, { entry: "7d444840-9dc0-41d1-b245-5ffdce74fad2", version: 1 });
    const { usedBy } = (await request("GET", `/api/library/${entryId}`, { as: owner })).body;
    expect(usedBy).toEqual([{ jobId, number: expect.any(String), name: "Long barn", tags: ["CB-1", "CB-2"], version: 1 }]);
    expect((await request("GET", `/api/library/${entryId}`, { as: designer })).body.usedBy).toEqual([]);
  });
});

describe("a drawing whose entry has changed", () => {
  it("is told nothing while the versions are the same", async () => {
    expect(await updates()).toEqual([]);
  });

  it("is told what taking the new version over would change, and keeps what it was drawn with", async () => {
    const next = { ...data(70), props: { ...data(70).props, interruptingKA: 22 }, sources: { ratingA: { document: "OF sheet", page: "5" } }, ports: { line: { continuousA: 70, terminal: { temperatureC: 75, metals: null, smallest: null, largest: null, torqueLbfIn: 45, torqueSource: null } } } };
    expect((await change(1, next)).status).toBe(200);
    const [first, second] = await updates(outside);
    expect(first).toMatchObject({ equipment: "cb-1", tag: "CB-1", entryId, entryName: "OF 60", drawn: 1, now: 2, archived: false, data: { props: { ratingA: 70, interruptingKA: 22 } } });
    expect(first.differences).toEqual([
      { path: "/props/ratingA", label: "Trip rating", unit: "A", drawn: 60, now: 70 },
      { path: "/props/interruptingKA", label: "Interrupting rating", unit: "kA", drawn: null, now: 22 },
      { path: "/sources/ratingA/page", label: "Trip rating: page", unit: "", drawn: "3", now: "5" },
      { path: "/ports/line/continuousA", label: "Line: continuous current", unit: "A", drawn: 60, now: 70 },
      { path: "/ports/line/terminal/temperatureC", label: "Line: terminal temperature", unit: "°C", drawn: null, now: 75 },
      { path: "/ports/line/terminal/torqueLbfIn", label: "Line: torque", unit: "lbf·in", drawn: null, now: 45 },
    ]);
    // The second one was set to 70 A for this job already.
    expect(second.differences.map((each: { path: string }) => each.path)).not.toContain("/props/ratingA");
    expect((await drawingOf(owner, jobId)).drawing.equipment["cb-1"].props.ratingA).toBe(60);
  });

  it("is not told of what the designer changed and the entry did not", async () => {
    await placed(jobId, "cb-3", "CB-3", { poles: 1 });
    const third = (await updates()).find((each: { equipment: string }) => each.equipment === "cb-3");
    expect(third.differences.map((each: { path: string }) => each.path)).toContain("/props/ratingA");
    expect(third.differences.map((each: { path: string }) => each.path)).not.toContain("/props/poles");
  });

  it("says that the entry was archived, and shows nothing of another company's entries", async () => {
    await request("PATCH", `/api/library/${entryId}`, { as: owner, body: { baseVersion: 2, archived: true } });
    expect((await updates()).every((each: { archived: boolean }) => each.archived)).toBe(true);
    expect((await request("GET", `/api/jobs/${jobId}/library?q=of 60`, { as: owner })).body.entries).toEqual([]);
    await placed(jobId, "cb-4", "CB-4", {}, { entry: "7d444840-9dc0-41d1-b245-5ffdce74fad2", version: 1 });
    expect((await updates()).map((each: { tag: string }) => each.tag)).toEqual(["CB-1", "CB-2", "CB-3"]);
  });
});
