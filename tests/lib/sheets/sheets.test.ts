import { describe, expect, it } from "vitest";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";
import { CAUTIONS } from "@/lib/cautions";
import { flatten } from "@/lib/sheets/geometry";
import { CAP_HEIGHT_EM, letter } from "@/lib/sheets/lettering";
import { path, text, type Primitive } from "@/lib/sheets/primitives";
import { eighths } from "@/lib/sheets/bottom";
import { sheetDate } from "@/lib/sheets/seal";
import { sheetSet } from "@/lib/sheets/set";
import { SHEET_INCHES, sheetGeometry } from "@/lib/sheets/size";
import { sheetSvg } from "@/lib/sheets/svg";
import { tableHeight, tablePrimitives } from "@/lib/sheets/table";
import { initials, ruleLine } from "@/lib/sheets/titleBlock";
import type { Finding } from "@/lib/rules/engine/types";
import { CHECK, DIGEST, SEAL, contextOf } from "./support/context";
import { farm } from "./support/farm";
import { corners, overlaps } from "./support/overlaps";

const demo = typeof cleanDrawing === "function" ? cleanDrawing() : cleanDrawing;
const SETS = [["the demo", sheetSet(contextOf(demo))], ["another system", sheetSet(contextOf(farm()))], ["an unsealed draft", sheetSet(contextOf(farm(), { seal: null, check: null, revisions: [] }))]] as const;
const words = (primitives: readonly Primitive[]): string[] => flatten(primitives).flatMap((each) => (each.type === "text" ? [each.text.text] : []));
const all = (primitives: readonly Primitive[]): string => words(primitives).join("\n");

describe("the overlap finder", () => {
  const line = path("M0 50H200", { layer: "wire" });
  it("finds words on a line and words on words", () => {
    expect(overlaps([line, text(50, 55, "CB-F1", "tag")])).toHaveLength(1);
    expect(overlaps([line, text(50, 70, "CB-F1", "tag"), text(60, 74, "125 A", "note")])).toHaveLength(1);
    expect(overlaps([line, text(50, 70, "CB-F1", "tag")])).toHaveLength(0);
  });
  it("lets words stand on a shape that covers the line, and not on its edge", () => {
    const cover = path("M40 40H110V60H40Z", { fill: "paper", layer: "mark" });
    expect(overlaps([line, cover, text(50, 55, "CB-F1", "tag", { layer: "mark" })])).toHaveLength(0);
    expect(overlaps([cover, line, text(50, 55, "CB-F1", "tag", { layer: "mark" })])).toHaveLength(1);
    expect(overlaps([line, cover, text(30, 55, "CB-F1", "tag", { layer: "mark" })]).length).toBeGreaterThan(0);
  });
});

describe.each(SETS)("the sheets of %s", (_name, pages) => {
  it("letter nothing over a line or over other words", () => {
    expect(pages.flatMap((page) => overlaps(page.primitives).map((each) => ({ sheet: page.number, ...each })))).toEqual([]);
  });
  it("clip nothing: every word lies inside the border", () => {
    for (const page of pages) {
      for (const each of flatten(page.primitives)) {
        if (each.type !== "text") continue;
        for (const corner of corners(each.text)) {
          expect([each.text.text, corner.x > 40 && corner.x < page.widthPx - 40 && corner.y > 40 && corner.y < page.heightPx - 40]).toEqual([each.text.text, true]);
        }
      }
    }
  });
  it("letter nothing smaller than 3/16 in capitals at full size", () => {
    for (const page of pages) {
      const pxPerIn = page.widthPx / page.widthIn;
      const sizes = flatten(page.primitives).flatMap((each) => (each.type === "text" ? [(each.text.size * CAP_HEIGHT_EM) / pxPerIn] : []));
      expect(Math.min(...sizes)).toBeGreaterThanOrEqual(3 / 16);
    }
  });
  it("print on each: digest, sheet n of N, cautions, plotted size, number", () => {
    pages.forEach((page, i) => {
      const printed = words(page.primitives);
      expect(printed.join(" ").replace(/ /g, "")).toContain(DIGEST.toUpperCase());
      expect(printed).toContain(`${i + 1} OF ${pages.length}`);
      expect(printed).toContain("34 × 22 IN, ANSI D");
      expect(printed).toContain(page.number);
      const run = printed.join(" ");
      for (const caution of CAUTIONS) expect(run).toContain(letter(caution));
    });
    expect(new Set(pages.map((page) => page.number)).size).toBe(pages.length);
  });
  it("are SVG of presentation attributes alone, with nothing unescaped", () => {
    for (const page of pages) {
      const svg = sheetSvg(page.primitives, page.widthPx, page.heightPx);
      expect(svg).not.toMatch(/ (style|class|letter-spacing|dominant-baseline)=|NaN|undefined|Infinity/);
    }
  });
});

describe("the one-line sheet of the demo", () => {
  const [first, ...rest] = sheetSet(contextOf(demo));
  it("shows the tag of everything that is on the sheet, and every callout", () => {
    const printed = new Set(words(first?.primitives ?? []).map((each) => each.replace(/ \([ERD]\)$/, "")));
    const shown = Object.values(demo.equipment).filter((each) => !each.offSheet && (!each.integral || each.kind === "pv-switch")).map((each) => each.tag);
    const raceways = Object.values(demo.raceways).filter((each) => !each.offSheet).map((each) => each.tag);
    const callouts = Object.values(demo.circuits).filter((each) => !each.offSheet && each.wiring === "field").map((each) => letter(each.callout ?? each.tag));
    for (const tag of [...shown, ...raceways, ...callouts]) expect(printed, tag).toContain(tag);
    expect(shown.length + raceways.length + callouts.length).toBeGreaterThan(50);
  });
  it("schedules every circuit, raceway and piece of equipment, also those off the one-line", () => {
    const printed = rest.map((page) => all(page.primitives)).join("\n").split("\n");
    for (const collection of [demo.equipment, demo.raceways]) for (const { tag } of Object.values(collection)) expect(printed).toContain(letter(tag));
    for (const circuit of Object.values(demo.circuits).filter((each) => each.wiring === "field")) expect(printed).toContain(letter(circuit.tag));
  });
  it("works out the busbars as by hand: 1.25 × 65 A + 125 A = 206.25 A against 1.2 × 200 A (705.12(B))", () => {
    const printed = all(first?.primitives ?? []);
    expect(printed).toContain("206.25 A");
    expect(printed).toContain("240 A");
    // With the generator: 1.25 × 65 A + 60 A = 141.25 A against the bus.
    expect(printed).toContain("141.25 A");
  });
});

describe("what a sheet says of its check and its seal", () => {
  const finding = (accepted: boolean, kind: Finding["kind"]): Finding => ({
    key: `r:equipment/${kind}${accepted}:v`, rule: "r", severity: "must-fix", kind, citation: "NEC 2023, 110.9", verifySection: false, risk: "", suggestions: [], folded: [], fields: [], blocks: true,
    variant: "v", anchor: { collection: "equipment", id: "mm" }, related: [], message: "The rating is not known.", steps: [],
    accepted: accepted ? { by: "T. Wrenfield", license: "E-00000", reason: "Read on site.", on: "2026-04-22" } : null,
  });
  const withFindings = (findings: Finding[], counts: Partial<typeof CHECK.counts>) => contextOf(farm(), { check: { ...CHECK, findings, counts: { ...CHECK.counts, ...counts } } });
  it("counts accepted needs-data in the rule line and lists what was accepted on the sheet it names", () => {
    const context = withFindings([finding(true, "needs-data")], { needsData: 0, accepted: 1 });
    expect(ruleLine(context, { acceptedOn: "E-603" })).toBe("27 RULES RUN: MUST-FIX 0, NEEDS DATA 1 (ACCEPTED, SEE E-603), ACCEPTED 1");
    const pages = sheetSet(context);
    const named = /SEE (E-\d+)\)/.exec(words(pages[0]?.primitives ?? []).join(" "))?.[1];
    expect(all(pages.find((page) => page.number === named)?.primitives ?? [])).toContain("READ ON SITE.");
  });
  it("never calls an open one accepted", () => {
    expect(ruleLine(withFindings([finding(false, "needs-data"), finding(true, "needs-data")], { needsData: 1, accepted: 1 }), { acceptedOn: "E-603" }))
      .toBe("27 RULES RUN: MUST-FIX 0, NEEDS DATA 2 (1 ACCEPTED, SEE E-603), ACCEPTED 1");
    expect(ruleLine(contextOf(farm(), { check: null }), { acceptedOn: "E-603" })).toBe("NOT CHECKED YET");
  });
  it("prints no seal, no code and no name of a licensee before there is a seal", () => {
    const [sheet] = sheetSet(contextOf(farm(), { seal: null }));
    expect(words(sheet?.primitives ?? [])).toEqual(expect.arrayContaining(["DRAFT", "SEAL CODE NONE"]));
    expect(all(sheet?.primitives ?? [])).not.toContain("TOBIAS");
  });
  it("prints name, license, day of signing and expiry beside a seal", () => {
    const [sheet] = sheetSet(contextOf(farm()));
    expect(words(sheet?.primitives ?? [])).toEqual(expect.arrayContaining(["TOBIAS WRENFIELD", "OR LICENSE E-00000", "APRIL 23, 2026", "DECEMBER 31, 2027", "SEAL CODE F7K2-91QD"]));
  });
  it("does not imitate the picture of a seal where it shows sealed sheets outside the file", () => {
    const [sheet] = sheetSet(contextOf(farm(), { seal: { ...SEAL, graphic: "in the file" } }));
    expect(words(sheet?.primitives ?? [])).toEqual(expect.arrayContaining(["SEE THE FILE", "SEAL CODE F7K2-91QD", "OR LICENSE E-00000"]));
    expect(overlaps(sheet?.primitives ?? [])).toEqual([]);
    // The ring seal letters the name one character at a time.
    expect(words(sheet?.primitives ?? []).filter((each) => each === "W")).toEqual([]);
  });
  it("writes dates, initials and eighths as the trade does", () => {
    expect(sheetDate("2026-01-09")).toBe("JANUARY 9, 2026");
    expect(sheetDate("not yet")).toBe("NOT YET");
    expect(initials("Ines Okafor-Lund")).toBe("IOL");
    expect([eighths(4.4), eighths(6.25), eighths(12), eighths(0.5), eighths(2.876)]).toEqual(["4-3/8", "6-1/4", "12", "1/2", "2-7/8"]);
  });
});

describe("sizes and tables", () => {
  // ANSI sizes double in area from A (8.5 × 11 in): B 11 × 17, C 17 × 22, D 22 × 34, E 34 × 44 (ASME Y14.1, from memory).
  it("keep half size at 96 px to the inch for D and larger, and never shrink the frame below its width", () => {
    expect(sheetGeometry("ANSI D")).toMatchObject({ widthPx: 1632, heightPx: 1056, halfSize: "HALF SIZE 17 × 11" });
    for (const size of Object.keys(SHEET_INCHES) as (keyof typeof SHEET_INCHES)[]) {
      const g = sheetGeometry(size);
      expect(g.widthPx).toBeGreaterThanOrEqual(1632);
      expect(g.widthPx / g.heightPx).toBeCloseTo(g.widthIn / g.heightIn, 2);
    }
  });
  it("grow a row by its fullest cell instead of cutting words", () => {
    const table = { title: "T", columns: [{ head: "A", width: 60 }, { head: "B", width: 80 }], rows: [["1", "ONE TWO THREE FOUR FIVE SIX"], ["2", "X"]] };
    const printed = words(tablePrimitives(0, 20, table)).join(" ");
    expect(printed).toContain("ONE TWO");
    expect(printed.match(/ONE|TWO|THREE|FOUR|FIVE|SIX/g)).toHaveLength(6);
    expect(tableHeight(table)).toBeGreaterThan(3 * 17);
    expect(overlaps(tablePrimitives(0, 20, table))).toEqual([]);
  });
  it("escapes what a person typed", () => {
    const drawing = farm();
    drawing.sheet.titleBlock.jobName = "<script>&\"";
    const [sheet] = sheetSet(contextOf(drawing));
    const svg = sheetSvg(sheet?.primitives ?? [], 1632, 1056);
    expect(svg).toContain("&lt;SCRIPT&gt;&amp;");
    expect(svg).not.toContain("<SCRIPT");
  });
});
