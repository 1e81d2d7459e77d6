import { describe, expect, it } from "vitest";
import { checkDocument } from "@/lib/diagram/check";
import type { Drawing } from "@/lib/diagram/schema";
import { check } from "@/lib/rules/engine/run";
import { plantSecond, secondSystem } from "@/tests/fixtures/secondSystem";

/** Rule, tag and severity of each mistake on this system, worked out by hand. The rules know neither its tags nor its ids. */
const ROWS: Readonly<Record<number, readonly string[]>> = {
  1: ["pv-with-other-systems TR must-fix"], 2: ["nipple-overfill NP-2 must-fix", "class2-with-power NP-2 must-fix"], 3: ["class2-with-power NP-2 must-fix"],
  4: ["ocpd-above-conductor QI3 must-fix"], 5: ["sources-not-interlocked QA must-fix"], 6: ["busbar-no-method SP must-fix"], 7: ["string-over-inverter SWT must-fix"],
  8: ["parallel-firmware AV-3 should-fix"], 9: ["parallel-lead-length BP2 should-fix"], 10: ["dc-interrupting QV1 must-fix"], 11: ["neutral-bond-count GEN must-fix"], 12: ["ct-wrong-side XF must-fix"],
};
const NUMBERS = Object.keys(ROWS).map(Number);
const seen = (drawing: Drawing): string[] => check(drawing).findings.map((finding) => {
  const element = (drawing[finding.anchor.collection] as Record<string, { tag?: string }>)[finding.anchor.id];
  return `${finding.rule} ${element?.tag ?? ""} ${finding.kind === "needs-data" ? "needs-data" : finding.severity}`;
}).sort();
const expected = (numbers: readonly number[]): string[] => [...new Set(numbers.flatMap((number) => ROWS[number] ?? []))].sort();

/** The same drawing with every id replaced and every map in another order. */
function renamed(drawing: Drawing): Drawing {
  const maps = ["equipment", "circuits", "raceways", "bonds", "interlocks", "sensors"] as const;
  const ids = new Map(maps.flatMap((map) => Object.keys(drawing[map]).map((id, index) => [id, `z${map.slice(0, 2)}${index}`] as const)));
  const text = JSON.stringify(drawing, (key, value: unknown) => {
    const name = (id: string): string => ids.get(id) ?? id;
    if (typeof value === "string" && ["parent", "equipment", "raceway", "circuit", "from", "to", "reads", "lead", "sharesGroundOf"].includes(key)) return name(value);
    if (typeof value === "object" && value !== null && !Array.isArray(value) && ([...maps, "switches"] as string[]).includes(key)) {
      return Object.fromEntries(Object.entries(value).map(([id, each]) => [name(id), each] as const).reverse());
    }
    return value;
  });
  return JSON.parse(text) as Drawing;
}

describe("a second system with other tags, sizes and a transfer switch", () => {
  it("is lawful: nothing is found", () => {
    expect(checkDocument(secondSystem())).toEqual([]);
    expect(seen(secondSystem())).toEqual([]);
  });
  for (const number of NUMBERS) it(`shows mistake ${number} as it shows in the demo`, () => {
    expect(checkDocument(plantSecond([number]))).toEqual([]);
    expect(seen(plantSecond([number]))).toEqual(expected([number]));
  });
  it("shows the union of pairs that do not touch each other", () => {
    for (const pair of [[1, 8], [2, 9], [3, 10], [4, 11], [6, 12], [7, 5], [8, 9, 10, 11]]) expect(seen(plantSecond(pair)), pair.join()).toEqual(expected(pair));
  });
  it("finds the same whatever the ids are, in whatever order the parts stand, and wherever they are drawn", () => {
    for (const number of [1, 4, 5, 6, 7, 9, 11, 12]) {
      const drawing = renamed(plantSecond([number]));
      expect(checkDocument(drawing)).toEqual([]);
      for (const each of Object.values(drawing.equipment)) each.at = { x: each.at.y + 7, y: each.at.x - 3 };
      expect(seen(drawing).map((each) => each.split(" ")[0])).toEqual(expected([number]).map((each) => each.split(" ")[0]));
    }
  });
  it("does not read tags: with every tag changed the rules are the same", () => {
    for (const number of NUMBERS) {
      const drawing = plantSecond([number]);
      let next = 0;
      for (const map of ["equipment", "circuits", "raceways", "bonds", "sensors"] as const) for (const each of Object.values(drawing[map])) each.tag = `T${next++}`;
      expect(seen(drawing).map((each) => each.split(" ")[0]).sort()).toEqual(expected([number]).map((each) => each.split(" ")[0]).sort());
    }
  });
});
