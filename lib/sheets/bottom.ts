import { CAUTIONS } from "@/lib/cautions";
import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Area } from "./frame";
import { letter, wrapText } from "./lettering";
import { legendPrimitives, lineLegend, symbolLegend } from "./legend";
import { keynoteMark } from "./oneline/texts";
import { WEIGHTS, n, path, text, type Primitive } from "./primitives";

/** Heights of the cautions and of the strip under the drawing, px. */
export const CAUTIONS_PX = 40;
export const STRIP_PX = 212;
/** Distance of legend rows, px, and the width of a legend column. */
const ROW_MOST = 22.4;
const LEGEND_COLUMNS = 4;
const LEGEND_PX = 178;
/** Least width of the place for approval stamps: 6 in on the plotted sheet. */
export const STAMP_LEAST_IN = 6;

const SOURCE_WORDS = { utility: "UTILITY", pv: "PV", battery: "BATTERY", generator: "GENERATOR" } as const;
const COUNT_WORDS = ["NO", "ONE SOURCE", "TWO SOURCES", "THREE SOURCES", "FOUR SOURCES"] as const;
/** Names the kinds of sources that the drawing has, so that nobody trusts one open switch. */
export function sourcesSentence(graph: DrawingGraph): string {
  const found = new Set(Object.keys(graph.drawing.equipment).flatMap((id) => graph.kind(id).capabilities.source ?? []));
  const names = (Object.keys(SOURCE_WORDS) as (keyof typeof SOURCE_WORDS)[]).filter((source) => found.has(source)).map((source) => SOURCE_WORDS[source]);
  return names.length ? ` ${COUNT_WORDS[names.length] ?? `${names.length} SOURCES`}: ${names.join(", ")}.` : "";
}

/** The cautions in a box of their own, wrapped to its width. */
export function cautionPrimitives(area: Area, graph: DrawingGraph): Primitive[] {
  const words = letter(CAUTIONS.slice(0, 2).join(" ")) + sourcesSentence(graph) + ` ${letter(CAUTIONS.slice(2).join(" "))}`;
  const left = area.left + 104;
  const lines = wrapText(words, 13, "narrow", area.right - left - 8);
  return [
    path(`M${n(area.left)} ${n(area.top)}H${n(area.right)}M${n(area.left)} ${n(area.bottom)}H${n(area.right)}`, { weight: WEIGHTS.frame, layer: "ground" }),
    text(area.left + 12, area.top + 26, "CAUTIONS", "tag", { size: 15, bold: 0.45 }),
    ...lines.map((line, i) => text(left, area.top + 17 + i * 15.6, line, "note")),
  ];
}

/** Corner marks of the place that stays clear for approval stamps, with its size on the plotted sheet. */
export function stampPrimitives(area: Area, pxPerIn: number): Primitive[] {
  const gap = 6, tick = 14;
  const corner = (x: number, y: number, sx: number, sy: number) =>
    `M${n(x + gap * sx)} ${n(y + (gap + tick) * sy)}V${n(y + gap * sy)}H${n(x + (gap + tick) * sx)}`;
  const d = corner(area.left, area.top, 1, 1) + corner(area.right, area.top, -1, 1) + corner(area.left, area.bottom, 1, -1) + corner(area.right, area.bottom, -1, -1);
  const size = `${eighths((area.right - area.left) / pxPerIn)} × ${eighths((area.bottom - area.top) / pxPerIn)} IN`;
  const words = wrapText(`APPROVAL STAMPS. KEEP CLEAR, ${size} AT FULL SIZE.`, 13, "narrow", area.right - area.left - 48);
  return [path(d, { weight: WEIGHTS.tableOutline, layer: "ground" }), ...words.map((line, i) => text(area.left + 26, area.top + 21 + i * 15, line, "note"))];
}
/** Inches to the eighth below, as a carpenter writes them: 4.4 is 4-3/8. */
export function eighths(inches: number): string {
  const parts = Math.floor(inches * 8 + 1e-6);
  const whole = Math.floor(parts / 8);
  let top = parts % 8, under = 8;
  if (top === 0) return String(whole);
  while (top % 2 === 0) { top /= 2; under /= 2; }
  return whole ? `${whole}-${top}/${under}` : `${top}/${under}`;
}

interface Keynote { number: string; lines: string[] }
/** Keynotes of the drawing by number; a mark without words repeats another. */
export function keynotes(graph: DrawingGraph, width: number): Keynote[] {
  const words = new Map<string, string>();
  for (const id of Object.keys(graph.drawing.texts).sort()) {
    const each = graph.drawing.texts[id];
    if (each?.keynote && (each.lines || !words.has(each.keynote))) words.set(each.keynote, each.lines);
  }
  return [...words].sort(([a], [b]) => Number(a) - Number(b) || (a < b ? -1 : 1)).map(([number, lines]) => ({ number, lines: wrapText(letter(lines.replace(/\n/g, " ")), 13, "narrow", width) }));
}

/** Legend, keynotes and the place for stamps under a one-line. Columns take what they need; stamps get the rest. */
export function stripPrimitives(area: Area, graph: DrawingGraph, scheduleNumber: string, pxPerIn: number): Primitive[] {
  const first = area.top + 39;
  const entries = [...symbolLegend(graph), ...lineLegend(graph, scheduleNumber)];
  // Rows stay wide until all columns are used; after that they draw together.
  const rows = Math.max(8, Math.ceil(entries.length / LEGEND_COLUMNS));
  const pitch = Math.min(ROW_MOST, (area.bottom - 14 - first) / Math.max(1, rows - 1));
  const columns = Array.from({ length: Math.ceil(entries.length / rows) }, (_, i) => entries.slice(i * rows, (i + 1) * rows));
  const heading = (x: number, words: string) => text(x, area.top + 19, words, "tag", { size: 15, bold: 0.45 });
  const divider = (x: number) => path(`M${n(x)} ${n(area.top)}V${n(area.bottom)}`, { weight: WEIGHTS.tableLine, layer: "ground" });
  const made: Primitive[] = [];
  let x = area.left + 12;
  if (columns.length) made.push(heading(x, "LEGEND"));
  for (const column of columns) {
    made.push(...legendPrimitives(x, first, pitch, column));
    x += LEGEND_PX;
  }
  if (columns.length) made.push(divider(x - 6));
  const noteWidth = Math.max(200, Math.min(300, area.right - STAMP_LEAST_IN * pxPerIn - x - 18));
  const notes = keynotes(graph, noteWidth - 32);
  if (notes.length) {
    made.push(heading(x + 6, "KEYNOTES"), ...keynoteColumn(x + 6, first, notes), divider(x + noteWidth + 6));
    x += noteWidth + 12;
  }
  return [...made, ...stampPrimitives({ ...area, left: x - 6 }, pxPerIn)];
}

function keynoteColumn(x: number, first: number, notes: readonly Keynote[]): Primitive[] {
  let y = first - 4;
  return notes.flatMap((note) => {
    const here = y;
    y += note.lines.length * 15 + 4;
    return [keynoteMark(x + 9, here, note.number), ...note.lines.map((line, i) => text(x + 26, here + 4.6 + i * 15, line, "note"))];
  });
}
