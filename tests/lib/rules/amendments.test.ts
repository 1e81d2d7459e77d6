import { describe, expect, it } from "vitest";
import type { Amendment } from "@/lib/diagram/schema";
import { amendmentFaults, limitOf, ruleMeta, wholeAmendment } from "@/lib/rules/engine/amendments";
import { amend } from "@/lib/rules/engine/amend";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";

const CAP = "string-over-building-cap";
const note = (change: Partial<Amendment> = {}): Amendment => ({ rule: CAP, effect: "note", limit: null, unit: "", severity: null, citation: "Ordinance 7", ...change });
const limit = (value: number | null, change: Partial<Amendment> = {}): Amendment => note({ effect: "limit", limit: value, limitName: "building", unit: "V", ...change });
const fields = (amendment: Amendment) => amendmentFaults(amendment).map((each) => each.field);
const meta = (() => {
  const found = ruleMeta(CAP);
  if (!found) throw new Error(`${CAP} is gone`);
  return found;
})();

describe("an amendment", () => {
  it("of each effect is whole with what the effect needs", () => {
    for (const amendment of [note(), note({ effect: "off" }), note({ effect: "severity", severity: "advice" }), limit(600), limit(0)]) expect(amendmentFaults(amendment)).toEqual([]);
  });

  it("is named where it is not", () => {
    expect(fields(note({ rule: "nothing" }))).toEqual(["rule"]);
    expect(fields(note({ rule: "constructor" }))).toEqual(["rule"]);
    expect(fields(note({ citation: "" }))).toEqual(["citation"]);
    expect(fields(note({ effect: "severity" }))).toEqual(["severity"]);
    expect(fields(note({ effect: "off", severity: "advice" }))).toEqual(["severity"]);
    expect(fields(note({ limit: 5 }))).toEqual(["limit"]);
    expect(fields(limit(null))).toEqual(["limit"]);
    expect(fields(limit(600, { unit: "A" }))).toEqual(["unit"]);
    expect(fields(limit(600, { limitName: "roof" }))).toEqual(["limitName"]);
    // The rule's own limit is 1,000 V (690.7); ten times that and no more is taken.
    expect([fields(limit(10_000)), fields(limit(10_000.5))]).toEqual([[], ["limit"]]);
    expect(amendmentFaults(limit(600, { limitName: undefined }))[0]?.message).toContain("dwelling, building");
  });

  it("of the only limit a rule has needs no name, and is stored with it", () => {
    const own = ruleMeta("parallel-lead-length");
    const amendment = limit(3, { rule: "parallel-lead-length", limitName: undefined, unit: "" });
    expect(own && limitOf(own, undefined)?.name).toBe("tolerance");
    expect(amendmentFaults(amendment)).toEqual([]);
    expect(wholeAmendment(amendment)).toMatchObject({ limitName: "tolerance", unit: "%", limit: 3 });
  });
});

describe("the engine", () => {
  const limits = (amendment: Amendment) => {
    const drawing = cleanDrawing();
    drawing.site.amendments = { a: amendment };
    return Object.fromEntries(Object.entries(amend(drawing, meta).limits).map(([name, each]) => [name, each.value]));
  };
  it("changes the limit an amendment names and no other", () => {
    expect(limits(limit(550))).toEqual({ dwelling: 600, building: 550 });
    expect(limits(limit(550, { limitName: "dwelling" }))).toEqual({ dwelling: 550, building: 1000 });
    expect(limits(limit(550, { limitName: "roof" }))).toEqual({ dwelling: 600, building: 1000 });
  });
  it("reads one that names none as older drawings have it: every limit of its unit", () => {
    expect(limits(limit(550, { limitName: undefined }))).toEqual({ dwelling: 550, building: 550 });
    expect(limits(limit(550, { limitName: undefined, unit: "A" }))).toEqual({ dwelling: 600, building: 1000 });
  });
});
