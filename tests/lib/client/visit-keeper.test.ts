import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import type { VisitAnswer, VisitChange, VisitContent, VisitInput } from "@/lib/api";
import { ApiProblem } from "@/lib/client/api";
import { QUIET_MS, RETRY_MS, VisitKeeper, visitSaveWords, type KeeperParts } from "@/lib/client/visitKeeper";
import { mergeVisits } from "@/lib/client/visitMerge";
import type { KeptVisit } from "@/lib/client/visitStore";
import { emptyRow, emptyVisit, type VisitData } from "@/lib/diagram/siteVisit";

const BLANK: VisitContent = { visitedOn: "2026-11-30", byName: "K. Fenner", data: emptyVisit() };
const noted = (note: string, on: VisitContent = BLANK): VisitContent => ({ ...on, data: { ...on.data, note } });
const part = (change: Partial<VisitData>, on: VisitContent = BLANK): VisitContent => ({ ...on, data: { ...on.data, ...change } });
const panel = (id: string, busA: number | null = null) => ({ ...emptyRow.panels(id), busA });
const answer = (content: VisitContent, version: number): VisitAnswer =>
  ({ ...content, id: "v", jobId: "j", version, createdBy: "", createdAt: "", updatedBy: "", updatedAt: "", may: { edit: true, take: true } });
const refusal = (status: number, code: string, more = {}) => new ApiProblem({ type: "about:blank", title: "", status, code, detail: "It was refused.", requestId: "r1", ...more });

/** A server with one visit, of which every answer can be lost or refused. */
function world(stored: VisitAnswer | null = null, kept: KeptVisit | null = null) {
  let row = stored;
  const device: { visit: KeptVisit | null; broken: boolean } = { visit: kept, broken: false };
  const fail: unknown[] = [];
  const calls: string[] = [];
  const gate = (lost: boolean, work: () => VisitAnswer): Promise<VisitAnswer> => {
    const error = fail.shift();
    if (error && !lost) return Promise.reject(error as Error);
    const made = work();
    return error ? Promise.reject(error as Error) : Promise.resolve(made);
  };
  let lost = false;
  const parts: KeeperParts = {
    create: ({ id: _, ...content }: VisitInput) => gate(lost, () => { calls.push("create"); row ??= answer(content as VisitContent, 1); return row; }),
    change: ({ version, ...content }: VisitChange) => gate(lost, () => {
      calls.push("change");
      if (!row || row.version !== version) throw refusal(409, "stale-version", { visit: row });
      return (row = { ...row, ...(content as VisitContent), version: version + 1 });
    }).catch((error: unknown) => Promise.reject(error as Error)),
    keep: (visit) => device.broken ? Promise.reject(new Error("no room")) : Promise.resolve(void (device.visit = visit)),
    now: () => 1,
  };
  const keeper = new VisitKeeper("v", "j", parts, { stored, kept, blank: BLANK });
  keeper.start();
  return { keeper, device, fail, calls, server: () => row, setServer: (visit: VisitAnswer) => { row = visit; }, loseAnswers: (on: boolean) => { lost = on; } };
}
const settle = (ms: number) => vi.advanceTimersByTimeAsync(ms);

beforeEach(() => vi.useFakeTimers());
afterEach(() => vi.useRealTimers());

describe("a visit that is open", () => {
  it("is on the device at once, on the server soon after, and then no longer on the device", async () => {
    const { keeper, device, calls, server } = world();
    expect(keeper.snapshot().save.kind).toBe("new");
    keeper.change((content) => noted("d", content));
    await settle(0);
    expect(device.visit).toMatchObject({ version: 0, content: { data: { note: "d" } } });
    keeper.change((content) => noted("dog", content));
    await settle(QUIET_MS - 1);
    expect(calls).toEqual([]);
    await settle(1);
    expect([calls, server()?.data.note, keeper.snapshot().save.kind, device.visit]).toEqual([["create"], "dog", "saved", null]);
    keeper.change((content) => noted("dogs", content));
    await settle(QUIET_MS);
    expect([calls, server()?.version]).toEqual([["create", "change"], 2]);
  });

  it("that was begun and not written in is not stored", async () => {
    const { keeper, calls } = world();
    await keeper.flush();
    await settle(60_000);
    expect(calls).toEqual([]);
  });

  it("without a connection stays on the device and is sent when it is back", async () => {
    const { keeper, device, fail, server } = world();
    fail.push(refusal(0, "offline"), refusal(0, "offline"));
    keeper.change((content) => noted("cellar", content));
    await settle(QUIET_MS);
    expect([keeper.snapshot().save.kind, device.visit?.content.data.note, server()]).toEqual(["offline", "cellar", null]);
    await settle(RETRY_MS[0]);
    expect(server()).toBeNull();
    await settle(RETRY_MS[1]);
    expect([keeper.snapshot().save.kind, server()?.data.note]).toEqual(["saved", "cellar"]);
  });

  it("whose answer was lost is not stored twice, and what was typed meanwhile arrives too", async () => {
    const { keeper, fail, calls, server, loseAnswers } = world();
    loseAnswers(true);
    fail.push(refusal(0, "offline"));
    keeper.change((content) => noted("first", content));
    await settle(QUIET_MS);
    loseAnswers(false);
    keeper.change((content) => noted("first and second", content));
    await settle(60_000);
    expect(calls).toEqual(["create", "create", "change"]);
    expect([server()?.data.note, server()?.version, keeper.snapshot().save.kind]).toEqual(["first and second", 2, "saved"]);
  });

  it("is put back after a crash, with what could not be read as typed", async () => {
    const first = world(answer(BLANK, 3));
    first.keeper.change((content) => part({ panels: [panel("p1", 200)] }, content));
    first.keeper.setTyped("panels.p1.mainA", "2oo");
    await settle(0);
    first.keeper.stop();
    const again = world(answer(BLANK, 3), first.device.visit);
    expect(again.keeper.snapshot()).toMatchObject({ content: { data: { panels: [{ busA: 200 }] } }, typed: { "panels.p1.mainA": "2oo" }, save: { kind: "waiting" } });
    await settle(0);
    expect(again.server()?.data.panels).toEqual([panel("p1", 200)]);
    // An entry that cannot be read is on this device alone, and stays there.
    expect(again.device.visit?.typed).toEqual({ "panels.p1.mainA": "2oo" });
  });

  it("says when the device keeps nothing, and saves all the same", async () => {
    const { keeper, device, server } = world();
    device.broken = true;
    keeper.change((content) => noted("x", content));
    await settle(0);
    expect(keeper.snapshot().kept).toBe(false);
    await settle(QUIET_MS);
    expect(server()?.data.note).toBe("x");
  });

  it("that the server refuses is not sent again and again, and is not lost", async () => {
    const { keeper, device, fail, calls } = world(answer(BLANK, 1));
    fail.push(refusal(422, "field"));
    keeper.change((content) => noted("x", content));
    await settle(120_000);
    expect(calls).toEqual([]);
    expect(keeper.snapshot().save).toMatchObject({ kind: "failed", again: false, detail: "It was refused." });
    expect(device.visit?.content.data.note).toBe("x");
  });
});

describe("a visit that two people write in", () => {
  const base = part({ panels: [panel("p1", 100)] });
  it("keeps both where they wrote in different places", async () => {
    const { keeper, server, setServer } = world(answer(base, 1));
    setServer(answer(part({ panels: [panel("p1", 100), panel("p2", 60)] }, noted("theirs", base)), 2));
    keeper.change((content) => part({ panels: [panel("p1", 125), panel("p3", 30)] }, content));
    await settle(QUIET_MS + 10);
    expect(keeper.snapshot().save.kind).toBe("saved");
    expect(server()).toMatchObject({ version: 3, data: { note: "theirs", panels: [panel("p1", 125), panel("p2", 60), panel("p3", 30)] } });
  });
  it.each([["mine", 125], ["theirs", 200]] as const)("asks where both wrote in the same place: %s", async (prefer, busA) => {
    const { keeper, server, setServer, device } = world(answer(base, 1));
    setServer(answer(noted("theirs", part({ panels: [panel("p1", 200)] }, base)), 2));
    keeper.change((content) => part({ panels: [panel("p1", 125)] }, content));
    await settle(QUIET_MS + 10);
    expect(keeper.snapshot().save).toMatchObject({ kind: "conflict", parts: ["Panels"] });
    // Typing goes on meanwhile and is kept.
    keeper.change((content) => part({ roof: { type: "standing seam", conduitAboveRoofIn: null, note: null } }, content));
    await settle(60_000);
    expect([server()?.version, device.visit?.content.data.roof.type]).toEqual([2, "standing seam"]);
    keeper.settle(prefer);
    await settle(10);
    expect(server()).toMatchObject({ version: 3, data: { note: "theirs", panels: [{ busA }], roof: { type: "standing seam" } } });
    expect(device.visit).toBeNull();
  });
  it("puts what a device kept onto what others made of the visit meanwhile", async () => {
    const kept: KeptVisit = { visitId: "v", jobId: "j", version: 1, base, content: noted("from the cellar", base), typed: {}, keptAt: 1 };
    const { server } = world(answer(part({ panels: [panel("p1", 200)] }, base), 4), kept);
    await settle(10);
    expect(server()).toMatchObject({ version: 5, data: { note: "from the cellar", panels: [{ busA: 200 }] } });
  });
  it("lets a row go that one removed and the other did not touch, and asks where they did", () => {
    const removed = part({ panels: [] });
    expect(mergeVisits(base, removed, noted("theirs", base))).toMatchObject({ clashes: [], content: { data: { panels: [], note: "theirs" } } });
    expect(mergeVisits(base, removed, part({ panels: [panel("p1", 200)] }))).toMatchObject({ clashes: ["Panels"], content: { data: { panels: [] } } });
    expect(mergeVisits(base, removed, part({ panels: [panel("p1", 200)] }), "theirs").content.data.panels).toEqual([panel("p1", 200)]);
  });
});

it("says the state of saving in words", () => {
  expect(visitSaveWords({ kind: "saved" }, 0)).toBe("All saved");
  expect(visitSaveWords({ kind: "saved" }, 2)).toBe("Text saved, 2 photos to send");
  expect(visitSaveWords({ kind: "offline" }, 1)).toBe("No connection, kept here, 1 photo to send");
});
