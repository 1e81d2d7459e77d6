import { randomUUID } from "node:crypto";
import { describe, expect, it } from "vitest";
import { failureAllowance, takeAllowance } from "@/lib/server/http/rateLimit";

describe("allowances", () => {
  it("are used up within a window, said with the time to wait, and come back after it", () => {
    const key = randomUUID();
    for (let use = 0; use < 3; use += 1) takeAllowance(key, 3, 60, 1000);
    expect(() => takeAllowance(key, 3, 60, 31_000)).toThrow(expect.objectContaining({ status: 429, members: { retryAfter: 30 } }));
    expect(() => takeAllowance(key, 3, 60, 61_001)).not.toThrow();
  });

  it("are kept apart by key", () => {
    const [one, other] = [randomUUID(), randomUUID()];
    takeAllowance(one, 1, 60, 0);
    expect(() => takeAllowance(other, 1, 60, 0)).not.toThrow();
  });

  it("for passwords count failures alone", () => {
    const key = randomUUID();
    for (let success = 0; success < 20; success += 1) failureAllowance(key, 2, 60);
    failureAllowance(key, 2, 60)();
    failureAllowance(key, 2, 60)();
    expect(() => failureAllowance(key, 2, 60)).toThrow(expect.objectContaining({ status: 429 }));
  });
});
