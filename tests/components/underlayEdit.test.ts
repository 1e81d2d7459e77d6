import { describe, expect, it } from "vitest";
import { underlayEdit, underlayFor, underlayWidth } from "@/components/diagram/actions/underlayEdit";
import { applyCommand } from "@/lib/diagram/commands";
import { emptyDrawing } from "@/lib/diagram/new";
import type { Drawing, Underlay } from "@/lib/diagram/schema";

const FILE = "0e0d5c1a-7f7e-4a52-9c59-0b2f5e1c7a11";
const under: Underlay = { file: FILE, at: { x: 10, y: 20 }, width: 60, height: 40, opacity: 0.35, hidden: false };
const start = (): Drawing => { const drawing = emptyDrawing({}); return { ...drawing, sheet: { ...drawing.sheet, underlay: under } }; };
function after(command: Parameters<typeof applyCommand>[1]): Underlay | undefined {
  const result = applyCommand(start(), command);
  if (!result.ok) throw new Error(result.reason);
  return result.drawing.sheet.underlay;
}

describe("a background that is adjusted", () => {
  it("moves by half grid units", () => {
    expect(after(underlayEdit(under, null, 2.3, -30.1))).toEqual({ ...under, at: { x: 12.5, y: -10 } });
  });
  it.each([
    ["se", 30, 0, { x: 10, y: 20 }], ["nw", -30, 0, { x: -20, y: 0 }], ["ne", 30, 0, { x: 10, y: 0 }], ["sw", -30, 0, { x: -20, y: 20 }], ["se", 0, 20, { x: 10, y: 20 }],
  ] as const)("sized at %s keeps its ratio and its opposite corner", (corner, dx, dy, at) => {
    expect(after(underlayEdit(under, corner, dx, dy))).toEqual({ ...under, at, width: 90, height: 60 });
  });
  it("never gets smaller or larger than a drawing takes", () => {
    expect(after(underlayEdit(under, "se", -500, -500))).toMatchObject({ width: 3, height: 2 });
    expect(after(underlayEdit(under, "se", 5000, 5000))).toMatchObject({ width: 600, height: 400 });
    expect(after(underlayWidth(under, 30))).toMatchObject({ width: 30, height: 20, at: under.at });
  });
  it("lies first in the middle of the area, as large as it fits", () => {
    const area = { at: { x: 0, y: 0 }, width: 100, height: 60 };
    expect(after(underlayFor(FILE, { widthPx: 4000, heightPx: 3000 }, area))).toMatchObject({ width: 80, height: 60, at: { x: 10, y: 0 } });
    expect(after(underlayFor(FILE, { widthPx: 3000, heightPx: 300 }, area))).toMatchObject({ width: 100, height: 10, at: { x: 0, y: 25 } });
  });
});
