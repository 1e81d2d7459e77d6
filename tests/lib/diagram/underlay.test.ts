import { describe, expect, it } from "vitest";
import { drawingDigest } from "@/lib/diagram/canonical";
import { checkDocument } from "@/lib/diagram/check";
import { applyCommand, type Command } from "@/lib/diagram/commands";
import { check } from "@/lib/rules/engine/run";
import { sheetSet } from "@/lib/sheets/set";
import { sheetSvg } from "@/lib/sheets/svg";
import { contextOf } from "@/tests/lib/sheets/support/context";
import { farm } from "@/tests/lib/sheets/support/farm";
import { done, smallDrawing } from "./support";

const FILE = "0e0d5c1a-7f7e-4a52-9c59-0b2f5e1c7a11";
const OTHER = "5a3f2c77-1d2e-4b6a-9f10-6c2d8e4b7a90";
const place = { type: "setUnderlay", change: { file: FILE, width: 80, height: 60 } } as const;

describe("the background under the sheet", () => {
  it("starts dimmed and in sight, and keeps what is not changed", () => {
    const placed = done(smallDrawing(), place);
    expect(placed.drawing.sheet.underlay).toEqual({ file: FILE, at: { x: 4, y: 4 }, width: 80, height: 60, opacity: 0.35, hidden: false });
    expect(placed.title).toBe("place a background");
    const hidden = done(placed.drawing, { type: "setUnderlay", change: { hidden: true, at: { x: -3, y: 10 } } });
    expect(hidden.drawing.sheet.underlay).toEqual({ file: FILE, at: { x: -3, y: 10 }, width: 80, height: 60, opacity: 0.35, hidden: true });
    expect(done(hidden.drawing, { type: "setUnderlay", change: { file: OTHER } }).drawing.sheet.underlay?.file).toBe(OTHER);
  });
  it("goes away without a trace", () => {
    const removed = done(done(smallDrawing(), place).drawing, { type: "removeUnderlay" });
    expect("underlay" in removed.drawing.sheet).toBe(false);
    expect(removed.drawing).toEqual(smallDrawing());
    expect(checkDocument(removed.drawing)).toEqual([]);
    expect(applyCommand(removed.drawing, { type: "removeUnderlay" })).toMatchObject({ ok: false });
  });
  it.each<[Command, string]>([
    [{ type: "setUnderlay", change: { hidden: true } }, "before a picture is chosen"],
    [{ type: "setUnderlay", change: { file: "meter.png" } }, "without the id of a file"],
    [{ ...place, change: { ...place.change, opacity: 0.95 } }, "as dark as the drawing"],
    [{ ...place, change: { ...place.change, width: 0 } }, "without a width"],
  ])("is refused: %o, %s", (command) => {
    expect(applyCommand(smallDrawing(), command)).toMatchObject({ ok: false });
  });
});

describe("what is under the drawing and not of it", () => {
  const plain = farm();
  const under = done(plain, place).drawing;
  it("leaves the drawing digest as it is, whatever is done with it", () => {
    const digest = drawingDigest(plain, "1");
    for (const change of [{}, { opacity: 0.6 }, { hidden: true }, { at: { x: 20, y: 9 } }, { file: OTHER }]) {
      expect(drawingDigest(done(under, { type: "setUnderlay", change }).drawing, "1")).toBe(digest);
    }
    expect(drawingDigest(done(under, { type: "setSheet", change: { subtitle: "EXISTING" } }).drawing, "1")).not.toBe(digest);
  });
  it("changes no finding", () => {
    expect(check(under).findings).toEqual(check(plain).findings);
    expect(check(under).digest).toBe(check(plain).digest);
  });
  it("is on no sheet: every sheet is drawn from the same shapes as without it", () => {
    const sheets = sheetSet(contextOf(under));
    expect(sheets).toEqual(sheetSet(contextOf(plain)));
    for (const sheet of sheets) {
      const svg = sheetSvg(sheet.primitives, sheet.widthPx, sheet.heightPx);
      expect(svg).not.toContain("<image");
      expect(svg).not.toContain(FILE);
    }
  });
});
