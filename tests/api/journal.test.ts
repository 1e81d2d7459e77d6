import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, it } from "vitest";
import { database } from "@/lib/server/data/database";
import { drawingOf, equipment, move, place, save } from "./support/drawings";
import { firstAdministrator, newJob, onJob, type Person } from "./support/people";
import { request } from "./support/server";

let owner: Person & { companyId: string };
let other: Person;
let jobId: string;
let drawingId: string;

beforeAll(async () => {
  owner = await firstAdministrator();
  jobId = await newJob(owner);
  other = await onJob(owner, jobId, ["designer"], "Second Designer");
  drawingId = (await drawingOf(owner, jobId)).id;
});

const now = async () => drawingOf(owner, jobId);
const sequence = async () => (await now()).sequence as number;

describe("saving a drawing", () => {
  it("keeps an edit under the next number, with its author and title", async () => {
    const base = await sequence();
    await new Promise((resolve) => setTimeout(resolve, 20));
    const started = Date.now();
    const answer = await save(owner, drawingId, base, place("ds-1", "DS-1"), { title: "Place DS-1" });
    expect(answer).toMatchObject({ status: 200, body: { sequence: base + 1, rebased: [] } });
    expect((await now()).drawing.equipment["ds-1"].tag).toBe("DS-1");
    expect(Date.parse((await request("GET", `/api/jobs/${jobId}`, { as: owner })).body.changedAt)).toBeGreaterThanOrEqual(started);
    const journal = await request("GET", `/api/drawings/${drawingId}/patches?since=${base}`, { as: other });
    expect(journal.body.entries).toMatchObject([{ sequence: base + 1, author: "First Administrator", title: "Place DS-1" }]);
  });

  it("answers the same save id the same way and stores it once", async () => {
    const base = await sequence();
    const saveId = randomUUID();
    const first = await save(owner, drawingId, base, place("ds-2", "DS-2"), { saveId });
    const between = await save(other, drawingId, base + 1, place("ds-3", "DS-3"));
    const again = await save(owner, drawingId, base, place("ds-2", "DS-2"), { saveId });
    expect(between.status).toBe(200);
    expect(again.body).toEqual(first.body);
    expect(await sequence()).toBe(base + 2);
  });

  it("does not let somebody else use a save id that was used", async () => {
    const base = await sequence();
    const saveId = randomUUID();
    await save(owner, drawingId, base, place("ds-4", "DS-4"), { saveId });
    expect(await save(other, drawingId, base, place("ds-5", "DS-5"), { saveId })).toMatchObject({ status: 422, body: { field: "saveId" } });
  });

  it("puts an edit on top of others that it does not touch, and hands theirs back", async () => {
    const base = await sequence();
    await save(owner, drawingId, base, move("ds-1", 20));
    const answer = await save(other, drawingId, base, move("ds-2", 30));
    expect(answer).toMatchObject({ status: 200, body: { sequence: base + 2, rebased: move("ds-1", 20) } });
    const { drawing } = await now();
    expect([drawing.equipment["ds-1"].at.x, drawing.equipment["ds-2"].at.x]).toEqual([20, 30]);
  });

  it("refuses an edit of what somebody else changed, shows both sides and stores nothing", async () => {
    const base = await sequence();
    await save(owner, drawingId, base, move("ds-1", 40, 20), { title: "Move DS-1" });
    const answer = await save(other, drawingId, base, move("ds-1", 50, 20));
    expect(answer.status).toBe(409);
    expect(answer.headers.get("content-type")).toBe("application/problem+json");
    expect(answer.body).toMatchObject({
      code: "edit-conflict", overlapping: ["/equipment/ds-1/at/x"], theirs: move("ds-1", 40, 20), yours: move("ds-1", 50, 20), sequence: base + 1,
      edits: [{ author: "First Administrator", title: "Move DS-1" }],
    });
    expect(answer.body.drawing.equipment["ds-1"].at.x).toBe(40);
    expect(await sequence()).toBe(base + 1);
  });

  it("refuses two edits that are whole apart and broken together", async () => {
    await save(owner, drawingId, await sequence(), [{ op: "add", path: "/equipment/cabinet", value: equipment("interconnect-cabinet", "IC-1") }]);
    const base = await sequence();
    await save(owner, drawingId, base, [{ op: "remove", path: "/equipment/cabinet" }], { title: "Delete IC-1" });
    const answer = await save(other, drawingId, base, [{ op: "add", path: "/equipment/inside", value: equipment("breaker", "CB-1", { parent: "cabinet" }) }]);
    expect(answer).toMatchObject({ status: 409, body: { code: "edit-conflict", overlapping: ["/equipment/inside/parent"] } });
    expect((await now()).drawing.equipment["inside"]).toBeUndefined();
  });

  it("refuses a base that is ahead of the drawing", async () => {
    expect(await save(owner, drawingId, (await sequence()) + 1, place("x", "X"))).toMatchObject({ status: 422, body: { field: "baseSequence" } });
  });

  it("gives twelve saves at once twelve numbers without a gap, and keeps all of them", async () => {
    const base = await sequence();
    const answers = await Promise.all(Array.from({ length: 12 }, (_, index) => save(index % 2 ? owner : other, drawingId, base, place(`many-${index}`, `M-${index}`))));
    expect(answers.map((each) => each.status)).toEqual(Array.from({ length: 12 }, () => 200));
    expect(answers.map((each) => each.body.sequence - base).sort((a, b) => a - b)).toEqual(Array.from({ length: 12 }, (_, index) => index + 1));
    const { drawing } = await now();
    expect(Object.keys(drawing.equipment).filter((id) => id.startsWith("many-"))).toHaveLength(12);
  });

  it("lets exactly one of two saves of the same value at once through", async () => {
    const base = await sequence();
    const answers = await Promise.all([save(owner, drawingId, base, move("many-0", 61)), save(other, drawingId, base, move("many-0", 62))]);
    expect(answers.map((each) => each.status).sort()).toEqual([200, 409]);
    expect(await sequence()).toBe(base + 1);
  });

  it("stores one save once when it arrives twice at the same time", async () => {
    const base = await sequence();
    const saveId = randomUUID();
    const answers = await Promise.all([1, 2].map(() => save(owner, drawingId, base, place("twice", "TW"), { saveId })));
    expect(answers[0]?.body).toEqual(answers[1]?.body);
    expect(await sequence()).toBe(base + 1);
  });

  it("takes the journal, replayed from the empty sheet, to the drawing as it is", async () => {
    const { applyPatches } = await import("@/lib/diagram/patch");
    const { canonicalJson } = await import("@/lib/diagram/canonical");
    const jobTwo = await newJob(owner);
    const start = await drawingOf(owner, jobTwo);
    for (const [index, patches] of [place("a", "A"), place("b", "B"), move("a", 33), [{ op: "remove" as const, path: "/equipment/b" }]].entries()) {
      expect((await save(owner, start.id, index, patches)).status).toBe(200);
    }
    const journal = await request("GET", `/api/drawings/${start.id}/patches?since=0`, { as: owner });
    const replayed = journal.body.entries.reduce((document: typeof start.drawing, entry: { patches: never[] }) => applyPatches(document, entry.patches), start.drawing);
    expect(canonicalJson(replayed)).toBe(canonicalJson((await drawingOf(owner, jobTwo)).drawing));
  });

  it("notes each save in the audit log, in the same transaction", async () => {
    const base = await sequence();
    await save(owner, drawingId, base, place("audited", "AU"));
    await save(owner, drawingId, base + 1, [{ op: "replace", path: "/equipment/nowhere/tag", value: "X" }]);
    const rows = await database().AuditEntry.findAll({ where: { action: "drawing.save", subject: `drawings/${drawingId}` } });
    const numbers = rows.map((row) => row.detail["sequence"]);
    expect(numbers).toContain(base + 1);
    expect(numbers).not.toContain(base + 2);
    expect(new Set(numbers).size).toBe(numbers.length);
  });
});

describe("parts of a drawing that are no edits", () => {
  it("takes no acceptance from a designer, in whatever way it is written", async () => {
    const acceptance = { rule: "r", anchor: "equipment/ds-1", variant: "v", reason: "fine", by: "me", license: "none", on: "2026-12-01", evidence: "" };
    for (const patches of [
      [{ op: "add", path: "/acceptances/one", value: acceptance }],
      [{ op: "replace", path: "/acceptances", value: { one: acceptance } }],
    ]) expect(await save(owner, drawingId, await sequence(), patches)).toMatchObject({ status: 422, body: { code: "protected", field: "acceptances" } });
  });

  it("takes no amendment from a designer, so that no rule is switched off by hand", async () => {
    const amendment = { rule: "ocpd-above-conductor", effect: "off", limit: null, unit: "", severity: null, citation: "none" };
    const { drawing } = await now();
    for (const patches of [
      [{ op: "add", path: "/site/amendments/mine", value: amendment }],
      [{ op: "replace", path: "/site", value: { ...drawing.site, amendments: { mine: amendment } } }],
    ]) expect(await save(owner, drawingId, await sequence(), patches)).toMatchObject({ status: 422, body: { code: "protected", field: "site.amendments" } });
  });
});
