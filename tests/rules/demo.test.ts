import { describe, expect, it } from "vitest";
import { applyCommand } from "@/lib/diagram/commands";
import { checkDocument } from "@/lib/diagram/check";
import { buildGraph } from "@/lib/diagram/graph";
import type { Drawing } from "@/lib/diagram/schema";
import { rules } from "@/lib/rules";
import { check } from "@/lib/rules/engine/run";
import { stateSpace } from "@/lib/states";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";
import { plant, PLANTED } from "@/seeders/demo/planted";

/** What each planted mistake gives: rule, tag of the anchor, severity. Worked out by hand for the farm system, one fault one finding. */
const ROWS: Readonly<Record<number, readonly string[]>> = {
  1: ["pv-with-other-systems WW-1 must-fix"],
  2: ["nipple-overfill N-2 must-fix", "class2-with-power N-2 must-fix"],
  3: ["class2-with-power N-2 must-fix"],
  4: ["ocpd-above-conductor CB-I2 must-fix"],
  5: ["sources-not-interlocked CB-U must-fix"],
  6: ["busbar-no-method MM-225 must-fix"],
  7: ["string-over-inverter S1 must-fix"],
  8: ["parallel-firmware INV-2 should-fix"],
  9: ["parallel-lead-length B4 should-fix"],
  10: ["dc-interrupting CB-D2 must-fix"],
  11: ["neutral-bond-count G-1 must-fix"],
  12: ["ct-wrong-side CT-1 must-fix"],
};
const ALWAYS = "rating-unknown DS-1 needs-data";

function seen(drawing: Drawing): string[] {
  return check(drawing).findings.map((finding) => {
    const element = (drawing[finding.anchor.collection] as Record<string, { tag?: string }>)[finding.anchor.id];
    return `${finding.rule} ${element?.tag ?? finding.anchor.id} ${finding.kind === "needs-data" ? "needs-data" : finding.severity}`;
  }).sort();
}
const expected = (numbers: readonly number[]): string[] => [...new Set([ALWAYS, ...numbers.flatMap((number) => ROWS[number] ?? [])])].sort();
const clean = cleanDrawing();

describe("the farm system", () => {
  it("is a whole document, clean and planted", () => {
    expect(checkDocument(clean)).toEqual([]);
    for (const { number } of PLANTED) expect(checkDocument(plant(clean, [number]))).toEqual([]);
  });
  it("clean, gives only the rating that nobody read", () => {
    const result = check(clean);
    expect(seen(clean)).toEqual([ALWAYS]);
    expect(result.rulesRun).toBe(rules.filter(({ meta: { from, to } }) => (from ?? "2017") <= "2023" && (to ?? "2026") >= "2023").length);
    expect(result.findings[0]?.fields[0]?.field).toBe("props.shortCircuitKA");
    expect(result.findings[0]?.blocks).toBe(true);
  });
  for (const { number, title } of PLANTED) it(`mistake ${number} alone gives exactly its row: ${title}`, () => { expect(seen(plant(clean, [number]))).toEqual(expected([number])); });
  it("all together give the union: ten must-fix and two should-fix", () => {
    const all = plant(clean, PLANTED.map((each) => each.number));
    expect(seen(all)).toEqual(expected(PLANTED.map((each) => each.number)));
    expect(check(all).counts).toMatchObject({ mustFix: 10, shouldFix: 2, needsData: 1 });
  });
  it("pairs give the union of their rows", () => {
    // A fixed walk over pairs, so that a failure can be repeated.
    for (let i = 0; i < 30; i += 1) {
      const pair = [(i * 5) % 12 + 1, (i * 7 + 3) % 12 + 1];
      expect(seen(plant(clean, pair)), pair.join(" and ")).toEqual(expected(pair));
    }
  });
  it("names the consequences inside their cause", () => {
    const folded = (number: number, rule: string) => check(plant(clean, [number])).findings.find((finding) => finding.rule === rule)?.folded.map((each) => each.rule);
    expect(folded(4, "ocpd-above-conductor")).toContain("ocpd-above-nameplate");
    expect(folded(7, "string-over-inverter")).toContain("string-over-building-cap");
  });
  it("every suggestion clears its finding and adds no must-fix", () => {
    for (const { number } of PLANTED) {
      const drawing = plant(clean, [number]);
      for (const finding of check(drawing).findings) {
        for (const suggestion of finding.suggestions) {
          const done = applyCommand(drawing, { type: "applySuggestion", label: suggestion.label, patches: suggestion.patches });
          expect(done.ok, `${finding.rule}: ${suggestion.label}`).toBe(true);
          if (!done.ok) continue;
          const after = check(done.drawing);
          expect(after.findings.some((each) => each.key === finding.key), `${suggestion.label} clears ${finding.key}`).toBe(false);
          const before = new Set(check(drawing).findings.map((each) => each.key));
          expect(after.findings.filter((each) => each.kind === "finding" && each.severity === "must-fix" && !before.has(each.key)).map((each) => each.key), suggestion.label).toEqual([]);
        }
      }
    }
  });
  it("citations follow the edition, and what was not read says so", () => {
    for (const edition of ["2017", "2020", "2023"] as const) {
      const drawing = plant(clean, [1]);
      drawing.site.edition = edition;
      expect(check(drawing).findings.find((finding) => finding.rule === "pv-with-other-systems")?.citation).toContain(edition);
    }
    const preview = plant(clean, [4]);
    preview.site.edition = "2026";
    const finding = check(preview).findings.find((each) => each.rule === "ocpd-above-conductor");
    expect(finding?.severity).toBe("should-fix");
    expect(finding?.verifySection).toBe(true);
  });
});

describe("operating states of the farm system (counted by hand: 2 to the power of the switches, less what the slide shuts out)", () => {
  const space = stateSpace(buildGraph(clean));
  it("counts every position", () => {
    expect(space.switches).toHaveLength(24);
    expect([space.positionsAll, space.positionsExcluded, space.positionsAll - space.positionsExcluded]).toEqual([16_777_216, 4_194_304, 12_582_912]);
    expect(space.walked).toHaveLength(8);
    expect(space.counts).toEqual({ utility: 8, island: 114, generator: 32, off: 38 });
    expect(space.forbidden).toEqual([]);
  });
  it("without the slide the utility and the set meet", () => {
    const open = structuredClone(clean);
    delete open.interlocks["il-1"];
    const positions = stateSpace(buildGraph(open)).forbidden.reduce((sum, state) => sum + state.positions, 0);
    expect(positions).toBe(4);
  });
});
