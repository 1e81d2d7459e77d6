import { stretchesOf } from "@/lib/diagram/graph";
import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Raceway } from "@/lib/diagram/schema";
import { letter, textSpan, textWidth } from "@/lib/sheets/lettering";
import { LETTERING, PX_PER_UNIT, WEIGHTS, box, ellipseData, n, owned, path, sheetPx, text, type Primitive, type TextPrimitive } from "@/lib/sheets/primitives";
import { STATUS_MARK, type Box, type OneLineOptions } from "./appearance";
import { LINE_PITCH } from "./texts";

/** Least extent of a mark across its circuits, and of a nipple along them, grid units. */
const MARK_ACROSS = 1.8;
const MARK_ALONG = 0.75;
const NIPPLE_ALONG = 1;
/** Between a tag and the line beside it. */
const TAG_GAP_PX = 7;

/**
 * Box of a raceway on the sheet, grid units. A mark without a size takes the usual one, about its place.
 * `vertical` means that the raceway itself runs up and down there.
 */
export function racewayBox(raceway: Raceway): Box {
  const { at, size, vertical, kind } = raceway;
  const along = kind === "nipple" ? NIPPLE_ALONG : MARK_ALONG;
  const width = size.width || (vertical ? MARK_ACROSS : along);
  const height = size.height || (vertical ? along : MARK_ACROSS);
  return { x: size.width ? at.x : at.x - width / 2, y: size.height ? at.y : at.y - height / 2, width, height };
}

const trim = (value: number): string => String(Math.round(value * 100) / 100);
const total = (raceway: Raceway): number | null => {
  const lengths = stretchesOf(raceway).map((stretch) => stretch.lengthFt);
  return lengths.length === 0 || lengths.includes(null) ? null : lengths.reduce<number>((sum, each) => sum + (each ?? 0), 0);
};

/** Lines printed with a raceway's tag, for example `1 IN PVC 40, 85 FT` and `18 IN DEEP`. Unknown values are left out. */
export function racewayLines(raceway: Raceway): string[] {
  if (raceway.kind === "wireway" || raceway.kind === "box") {
    const inches = [raceway.widthIn, raceway.heightIn, raceway.depthIn].filter((v): v is number => v !== null).map(trim);
    const metal = raceway.metal === null ? "" : raceway.metal ? " METAL" : " NONMETALLIC";
    return inches.length ? [`${inches.join(" × ")} IN${metal}`] : metal ? [metal.trim()] : [];
  }
  const size = raceway.tradeSize === null ? null : `${raceway.tradeSize} IN`;
  if (raceway.kind === "nipple") return size ? [size] : [];
  const length = total(raceway);
  const first = [[size, raceway.type].filter(Boolean).join(" ") || null, length === null ? null : `${trim(length)} FT`].filter(Boolean).join(", ");
  const depth = stretchesOf(raceway).map((s) => s.burialDepthIn).filter((v): v is number => v !== null);
  return [first, depth.length ? `${trim(Math.min(...depth))} IN DEEP` : ""].filter(Boolean).map(letter);
}

function defaultLabel(raceway: Raceway): { x: number; y: number } {
  const own = racewayBox(raceway);
  const x = own.x - raceway.at.x;
  const y = own.y - raceway.at.y;
  if (raceway.kind === "wireway") return raceway.vertical ? { x: x + own.width + 0.6, y: y + 1.4 } : { x: x + 0.8, y: y - 0.6 };
  if (raceway.kind === "box") return { x: x + 0.6, y: y + own.height / 2 + 0.38 };
  if (raceway.vertical) return { x: x + own.width + 0.5, y: y + own.height / 2 + 0.4 };
  return { x, y: y - 0.6 };
}

/** A band too low for two lines of lettering shows its tag alone inside; the schedule holds its size. */
const insideLowBand = (raceway: Raceway, y: number): boolean =>
  raceway.kind === "wireway" && !raceway.vertical && raceway.size.height < 4 && y > 0 && y < raceway.size.height;

/** Tag of a raceway and the lines beside and under it. */
export function racewayLabel(raceway: Raceway, options: OneLineOptions = {}): { tag: TextPrimitive; lines: TextPrimitive[] } {
  const label = raceway.label ?? { ...defaultLabel(raceway), anchor: "start" as const };
  const x = sheetPx(raceway.at.x + label.x);
  const y = sheetPx(raceway.at.y + label.y);
  const small = options.detail === "tags";
  const words = raceway.tag + STATUS_MARK[raceway.status];
  const heading = raceway.kind === "wireway" && Math.max(raceway.size.width, raceway.size.height) > 20;
  const lines = small || insideLowBand(raceway, label.y) ? [] : racewayLines(raceway);
  const first = lines[0];
  const tag = text(x, y, words, heading ? "heading" : "tag", { anchor: label.anchor, ...(small ? { size: 19.5, bold: 0.5 } : {}) });
  const under = (line: string, i: number) => text(x, y + i * LINE_PITCH * PX_PER_UNIT, line, "note", { anchor: label.anchor });
  if (first === undefined) return { tag, lines: [] };
  if (label.anchor === "middle") return { tag, lines: lines.map((line, i) => under(line, i + 1)) };
  // Tag and first line read on from left to right; the pair ends at an end anchor.
  const pair = textWidth(first, LETTERING.note.size, "narrow") + TAG_GAP_PX;
  const placed = label.anchor === "end" ? { ...tag, x: x - pair } : tag;
  const right = textSpan(placed.x, words, tag.size, tag.face, tag.anchor).right + TAG_GAP_PX;
  return { tag: placed, lines: [text(right, y, first, "note"), ...lines.slice(1).map((line, i) => under(line, i + 1))] };
}

/** A raceway as it stands on the one-line: a band, a box, a mark across its circuits, or the two ends of a nipple. */
export function racewayPrimitives(graph: DrawingGraph, id: string, options: OneLineOptions = {}): Primitive[] {
  const raceway = graph.drawing.raceways[id];
  if (!raceway || raceway.offSheet) return [];
  const own = racewayBox(raceway);
  const px = { x: sheetPx(own.x), y: sheetPx(own.y), width: own.width * PX_PER_UNIT, height: own.height * PX_PER_UNIT };
  const label = racewayLabel(raceway, options);
  const body = raceway.kind === "wireway" ? band(raceway, px)
    : raceway.kind === "box" ? [box(px.x, px.y, px.width, px.height, { weight: WEIGHTS.outline, fill: "paper" })]
    : raceway.kind === "nipple" ? nipple(raceway, px)
    : [path(ellipseData(px.x + px.width / 2, px.y + px.height / 2, px.width / 2, px.height / 2), { weight: WEIGHTS.mark, layer: "mark" })];
  return owned([...body, label.tag, ...label.lines], { collection: "raceways", id });
}

/** Bars across the circuits where a nipple leaves one enclosure and enters the next. */
function nipple(raceway: Raceway, { x, y, width, height }: Box): Primitive[] {
  const d = raceway.vertical
    ? `M${n(x)} ${n(y)}H${n(x + width)}M${n(x)} ${n(y + height)}H${n(x + width)}`
    : `M${n(x)} ${n(y)}V${n(y + height)}M${n(x + width)} ${n(y)}V${n(y + height)}`;
  return [path(d, { weight: WEIGHTS.nipple, layer: "mark" })];
}

/** A wireway: a tinted band with inner lines along its run and a heavy line for each fixed divider. */
function band(raceway: Raceway, { x, y, width, height }: Box): Primitive[] {
  const inner = 4;
  const lines = raceway.vertical
    ? `M${n(x + inner)} ${n(y)}V${n(y + height)}M${n(x + width - inner)} ${n(y)}V${n(y + height)}`
    : `M${n(x)} ${n(y + inner)}H${n(x + width)}M${n(x)} ${n(y + height - inner)}H${n(x + width)}`;
  const dividers = dividerShares(raceway).map((share) => raceway.vertical
    ? `M${n(x + share * width)} ${n(y)}V${n(y + height)}`
    : `M${n(x)} ${n(y + share * height)}H${n(x + width)}`).join("");
  return [
    box(x, y, width, height, { fill: "ww", weight: WEIGHTS.band }),
    path(lines, { weight: WEIGHTS.bandInner, layer: "ground" }),
    ...(dividers ? [path(dividers, { weight: WEIGHTS.frame, layer: "ground" })] : []),
  ];
}

/** Where the fixed dividers lie across a wireway, as shares of its width; equal parts where a width is not known. */
export function dividerShares(raceway: Raceway): number[] {
  const parts = Object.entries(raceway.compartments).sort(([a, p], [b, q]) => p.order - q.order || (a < b ? -1 : 1)).map(([, part]) => part.widthIn);
  const known = parts.every((width): width is number => width !== null);
  const sum = known ? parts.reduce((total, width) => total + width, 0) : parts.length;
  let at = 0;
  return parts.slice(0, -1).map((width) => { at += known ? (width as number) / sum : 1 / sum; return at; });
}
