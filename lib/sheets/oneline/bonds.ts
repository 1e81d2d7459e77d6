import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Bond } from "@/lib/diagram/schema";
import { letter } from "@/lib/sheets/lettering";
import { WEIGHTS, ellipseData, group, owned, path, sheetPx, text, type Primitive, type TextPrimitive } from "@/lib/sheets/primitives";
import type { OneLineOptions } from "./appearance";

const JUMPERS: ReadonlySet<Bond["kind"]> = new Set(["main bonding jumper", "system bonding jumper", "supply-side bonding jumper"]);
/** Whether the part is in place, as lettered beside its tag; jumpers that are in place carry no word. */
export function bondState(bond: Bond): string {
  if (bond.kind === "neutral relay") return bond.fitted === false ? "RELAY OFF" : bond.closes === "island" ? "RELAY, ISLAND" : "RELAY";
  if (bond.fitted === null) return "NOT KNOWN";
  if (JUMPERS.has(bond.kind)) return bond.fitted ? "" : "OUT";
  return bond.fitted ? "IN" : "OUT";
}

/** Tag of a bond; null when it has no place on the sheet. */
export function bondTag(graph: DrawingGraph, id: string, options: OneLineOptions = {}): TextPrimitive | null {
  const bond = graph.drawing.bonds[id];
  if (!bond?.at) return null;
  const big = options.detail === "tags" ? { size: 19.5, bold: 0.5 } : {};
  return JUMPERS.has(bond.kind)
    ? text(sheetPx(bond.at.x + 1), sheetPx(bond.at.y + 4.3), letter(bond.tag), "tag", big)
    : text(sheetPx(bond.at.x + 2.6), sheetPx(bond.at.y + 0.4), letter(bond.tag), "tag", big);
}

/** Bars and link of a jumper, upright, px from its place: neutral bar, link, ground bar. */
const BARS = "M-5 0H5V30H-5ZM-5 62.4H5V92.4H-5Z";
const jumper = (inPlace: boolean): Primitive[] => [
  path(BARS, { weight: WEIGHTS.symbol }),
  path(inPlace ? "M0 30V62.4" : "M0 30V40M0 52.4V62.4", { weight: WEIGHTS.symbol }),
  path(ellipseData(0, 30, 3) + ellipseData(0, 62.4, 3), { stroke: null, fill: "ink" }),
];
/** A strap, screw or relay: two points, joined when the part is in place. */
const strap = (inPlace: boolean): Primitive[] => [
  path(inPlace ? "M0 0H24" : "M0 0L19 -8", { weight: WEIGHTS.symbol, cap: "round" }),
  path(ellipseData(0, 0, 2.4) + ellipseData(24, 0, 2.4), { stroke: null, fill: "ink" }),
];

/** A joint between neutral and ground, drawn as it is: in place or left out. */
export function bondPrimitives(graph: DrawingGraph, id: string, options: OneLineOptions = {}): Primitive[] {
  const bond = graph.drawing.bonds[id];
  const tag = bondTag(graph, id, options);
  if (!bond?.at || !tag) return [];
  const x = sheetPx(bond.at.x);
  const y = sheetPx(bond.at.y);
  const small = options.detail === "tags";
  const state = small ? "" : bondState(bond);
  if (JUMPERS.has(bond.kind)) {
    const bars = small ? [] : [text(x + 12, y + 20.4, "N", "note"), text(x + 12, y + 80.4, "G", "note")];
    const word = state ? [text(x + 12, y + 66, state, "note")] : [];
    return owned([group(jumper(bond.fitted !== false), { x, y }), tag, ...bars, ...word], { collection: "bonds", id });
  }
  const word = state ? [text(tag.x, tag.y + 14.4, state, "note")] : [];
  return owned([group(strap(bond.fitted === true), { x, y }), tag, ...word], { collection: "bonds", id });
}
