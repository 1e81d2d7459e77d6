import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import type { FileAnswer } from "@/lib/api";
import { ApiProblem } from "@/lib/client/api";
import { PHOTO_RETRY_MS, PhotoQueue } from "@/lib/client/photoQueue";
import type { KeptPhoto } from "@/lib/client/visitStore";

const photo = (key: string): KeptPhoto => ({ key, jobId: "j", visitId: "v", target: { panel: null }, file: new File(["x"], `${key}.jpg`), addedAt: 1 });
const refusal = (status: number) => new ApiProblem({ type: "about:blank", title: "", status, code: "x", detail: "No.", requestId: "r" });
function queue() {
  const fail: unknown[] = [];
  const log: string[] = [];
  const device = new Map<string, KeptPhoto>();
  const made = new PhotoQueue({
    send: async (each) => {
      log.push(`send ${each.key}`);
      const error = fail.shift();
      if (error) throw error as Error;
      return { id: `file-${each.key}` } as FileAnswer;
    },
    keep: async (key, each) => { log.push(each ? `keep ${key}` : `forget ${key}`); if (each) device.set(key, each); else device.delete(key); },
    onStored: async (each, file) => { log.push(`show ${file.id} of ${each.key}`); },
  });
  made.start();
  return { made, fail, log, device };
}
beforeEach(() => vi.useFakeTimers());
afterEach(() => vi.useRealTimers());

describe("photos of a visit", () => {
  it("are kept first, sent one after the other, shown in the visit, and forgotten here last", async () => {
    const { made, log, device } = queue();
    await Promise.all([made.add(photo("a")), made.add(photo("b"))]);
    await vi.advanceTimersByTimeAsync(100);
    expect(log).toEqual(["keep a", "keep b", "send a", "show file-a of a", "forget a", "send b", "show file-b of b", "forget b"]);
    expect([made.snapshot(), device.size]).toEqual([[], 0]);
  });
  it("wait for a connection and are sent when it is back", async () => {
    const { made, fail, log, device } = queue();
    fail.push(refusal(0), refusal(503));
    await made.add(photo("a"));
    await vi.advanceTimersByTimeAsync(10);
    expect(made.snapshot()[0]).toMatchObject({ state: "waiting", error: { status: 0 } });
    expect(device.has("a")).toBe(true);
    await vi.advanceTimersByTimeAsync(PHOTO_RETRY_MS[0]);
    expect(made.snapshot()).toHaveLength(1);
    made.flush();
    await vi.advanceTimersByTimeAsync(10);
    expect([made.snapshot().length, log.filter((each) => each === "send a").length]).toEqual([0, 3]);
  });
  it("that are refused for what they are stay in sight with the reason and do not hold up the others", async () => {
    const { made, fail, log } = queue();
    fail.push(refusal(422));
    await made.add(photo("a"));
    await made.add(photo("b"));
    await vi.advanceTimersByTimeAsync(200_000);
    expect(made.snapshot()).toMatchObject([{ photo: { key: "a" }, state: "refused", error: { status: 422 } }]);
    expect(log.filter((each) => each.startsWith("send"))).toEqual(["send a", "send b"]);
    await made.putAway("a");
    expect(made.snapshot()).toEqual([]);
  });
  it("of a former page are taken up again", async () => {
    const { made, log } = queue();
    made.resume([photo("a")]);
    made.resume([photo("a")]);
    await vi.advanceTimersByTimeAsync(10);
    expect(log.filter((each) => each.startsWith("send"))).toEqual(["send a"]);
  });
});
