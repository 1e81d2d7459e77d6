import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { Autosave, QUIET_MS, RETRY_MS, type Draft } from "@/lib/client/autosave";
import { saveWords, type SaveAnswer, type SaveBatch, type SaveState } from "@/lib/client/saveState";

const change = (n: number) => ({ title: `change ${n}`, patches: [{ op: "replace" as const, path: `/v${n}`, value: n }] });

function setUp(answers: SaveAnswer<object>[]) {
  const sent: SaveBatch[] = [];
  const states: SaveState<object>[] = [];
  const others: unknown[] = [];
  let draft: Draft | null = null;
  let ids = 0;
  const save = new Autosave<object>({
    drawingId: "d", now: () => Date.now(), newId: () => `id-${++ids}`,
    send: async (batch) => { sent.push(batch); return answers.shift() ?? { kind: "saved", sequence: batch.baseSequence + 1, rebased: [] }; },
    keep: async (value) => { draft = value; },
    onState: (state) => states.push(state),
    onOthers: (patches) => others.push(...patches),
  }, 7);
  return { save, sent, states, others, draft: () => draft };
}

describe("autosave", () => {
  beforeEach(() => { vi.useFakeTimers(); });
  afterEach(() => { vi.useRealTimers(); });

  it("sends a burst of edits as one save within a second of the last", async () => {
    const t = setUp([]);
    t.save.add(change(1));
    await vi.advanceTimersByTimeAsync(QUIET_MS - 10);
    t.save.add(change(2));
    expect(t.sent).toHaveLength(0);
    await vi.advanceTimersByTimeAsync(1000);
    expect(t.sent).toHaveLength(1);
    expect(t.sent[0]).toMatchObject({ baseSequence: 7, patches: [{ path: "/v1" }, { path: "/v2" }] });
    expect(t.states.at(-1)).toEqual({ kind: "saved" });
    expect(t.save.currentSequence).toBe(8);
  });

  it("keeps everything on failure, says so, and sends the same save again with waits that grow", async () => {
    const fail = { kind: "failed" as const, detail: "error", requestId: "7F3A", again: true };
    const t = setUp([fail, fail]);
    t.save.add(change(1));
    await vi.advanceTimersByTimeAsync(QUIET_MS);
    expect(t.states.at(-1)).toMatchObject({ kind: "failed", kept: 1, requestId: "7F3A" });
    await vi.advanceTimersByTimeAsync(RETRY_MS[0]);
    expect(t.sent).toHaveLength(2);
    await vi.advanceTimersByTimeAsync(RETRY_MS[1] - 1);
    expect(t.sent).toHaveLength(2);
    await vi.advanceTimersByTimeAsync(1);
    expect(new Set(t.sent.map((batch) => batch.saveId))).toEqual(new Set(["id-1"]));
    expect(t.states.at(-1)).toEqual({ kind: "saved" });
  });

  it("says offline, counts what is kept, and leaves it on the device", async () => {
    const t = setUp([{ kind: "offline" }]);
    t.save.add(change(1));
    await vi.advanceTimersByTimeAsync(QUIET_MS);
    t.save.add(change(2));
    const state = t.states.at(-1) as SaveState<object>;
    expect(state).toMatchObject({ kind: "offline", kept: 2 });
    expect(saveWords(state, false)).toBe("2 changes kept here");
    await vi.advanceTimersByTimeAsync(0);
    expect(t.draft()).toMatchObject({ sent: { saveId: "id-1" }, waiting: [{ title: "change 2" }] });
  });

  it("takes up a draft under its old save id, and clears it when confirmed", async () => {
    const t = setUp([]);
    t.save.resume({ drawingId: "d", sequence: 7, sent: { saveId: "before", baseSequence: 6, title: "x", patches: [] }, waiting: [change(3)], savedAt: 0 });
    await vi.advanceTimersByTimeAsync(10);
    expect(t.sent.map((batch) => batch.saveId)).toEqual(["before", "id-1"]);
    expect(t.draft()).toBeNull();
  });

  it("stops at a conflict, sends nothing until a person has settled it", async () => {
    const t = setUp([{ kind: "conflict", conflict: { sequence: 9, drawing: {}, overlapping: ["/v1"], theirs: [], by: ["B"], at: null } }]);
    t.save.add(change(1));
    await vi.advanceTimersByTimeAsync(QUIET_MS);
    t.save.add(change(2));
    await vi.advanceTimersByTimeAsync(60_000);
    expect(t.sent).toHaveLength(1);
    expect(t.states.at(-1)).toMatchObject({ kind: "conflict", kept: 2 });
    expect(t.save.pendingChanges()).toHaveLength(2);
    t.save.settle(9, [change(2)]);
    await vi.advanceTimersByTimeAsync(10);
    expect(t.sent[1]).toMatchObject({ baseSequence: 9, patches: [{ path: "/v2" }] });
  });

  it("hands over what others changed", async () => {
    const t = setUp([{ kind: "saved", sequence: 12, rebased: [{ op: "add", path: "/q", value: 1 }] }]);
    t.save.add(change(1));
    await vi.advanceTimersByTimeAsync(QUIET_MS);
    expect(t.others).toEqual([{ op: "add", path: "/q", value: 1 }]);
    expect(t.save.currentSequence).toBe(12);
  });

  it("does not try again what the server will never take", async () => {
    const t = setUp([{ kind: "failed", detail: "not allowed", requestId: null, again: false }]);
    t.save.add(change(1));
    await vi.advanceTimersByTimeAsync(120_000);
    expect(t.sent).toHaveLength(1);
    expect(t.states.at(-1)).toMatchObject({ kind: "failed", again: false, kept: 1 });
  });
});
