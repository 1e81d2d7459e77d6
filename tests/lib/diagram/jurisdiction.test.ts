import { describe, expect, it } from "vitest";
import { NO_REQUIREMENTS, codesLine, localChanges, localPatches, siteFrom, type LocalRules } from "@/lib/diagram/jurisdiction";
import { applyPatches } from "@/lib/diagram/patch";
import { drawingSchema } from "@/lib/diagram/schema";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";

const drawing = cleanDrawing();
const asDrawn: LocalRules = { edition: "2023", ordinance: "county ordinance 26-4", amendments: drawing.site.amendments, requirements: NO_REQUIREMENTS };
const local: LocalRules = {
  edition: "2020", ordinance: "ordinance 9", requirements: { lockableVisibleSwitch: "yes", separateMeter: null, notes: "Beside the meter." },
  amendments: { x: { rule: "duplicate-tag", effect: "off", limit: null, unit: "", severity: null, citation: "Ordinance 9" } },
};

describe("taking a jurisdiction over", () => {
  it("is nothing where the drawing is as the jurisdiction has it", () => {
    expect(localChanges(drawing, asDrawn)).toEqual([]);
    expect(localPatches(drawing, asDrawn)).toEqual([]);
  });

  it("says every difference, and leaves none once it is done", () => {
    expect(localChanges(drawing, local).map((each) => [each.part, each.was, each.now])).toEqual([
      ["edition", "NEC 2023", "NEC 2020"],
      ["codes", drawing.sheet.titleBlock.codes, "NEC 2020, ordinance 9"],
      ["amendment", "limit 600 V; County ordinance 26-4, OC-2 (PV dc at most 600 V on or in any building)", null],
      ["amendment", null, "does not apply; Ordinance 9"],
      ["requirements", "not known", "yes"],
      ["requirements", "not known", "Beside the meter."],
    ]);
    const taken = applyPatches(drawing, localPatches(drawing, local));
    expect(drawingSchema.safeParse(taken).success).toBe(true);
    expect(localChanges(taken, local)).toEqual([]);
    // And back: a requirement that is no longer asked is not left standing.
    const back = applyPatches(taken, localPatches(taken, asDrawn));
    expect(localChanges(back, asDrawn)).toEqual([]);
    expect(back.site.requirements).toEqual(NO_REQUIREMENTS);
  });

  it("does not put empty requirements into a drawing that has none", () => {
    expect(siteFrom(asDrawn)).toEqual({ amendments: drawing.site.amendments });
    expect("requirements" in applyPatches(drawing, localPatches(drawing, { ...local, requirements: NO_REQUIREMENTS })).site).toBe(false);
  });

  it("refuses a drawing that moved on under it", () => {
    const patches = localPatches(drawing, local);
    const moved = { ...drawing, site: { ...drawing.site, edition: "2017" as const } };
    expect(() => applyPatches(moved, patches)).toThrow();
  });
});

describe("the line of codes", () => {
  it.each([
    ["NEC 2023, IRC 2021, county ordinance 26-4", "2023", "County Ordinance 26-4", "NEC 2023, IRC 2021, county ordinance 26-4"],
    ["NEC 2020, IRC 2021, ordinance 7", "2023", "ordinance 7", "NEC 2023, IRC 2021, ordinance 7"],
    ["NEC 2023", "2023", "", "NEC 2023"],
    ["NEC 2023", "2023", "ordinance 7", "NEC 2023, ordinance 7"],
    ["", "2023", "", "NEC 2023"],
  ] as const)("%j for %s and %j is %j", (codes, edition, ordinance, line) => {
    expect(codesLine(codes, edition, ordinance)).toBe(line);
  });
});
