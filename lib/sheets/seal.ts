import type { SealOnSheet } from "./context";
import { letter, textWidth, wrapText } from "./lettering";
import { LETTERING, WEIGHTS, ellipseData, n, path, text, type Primitive } from "./primitives";

const MONTHS = ["JANUARY", "FEBRUARY", "MARCH", "APRIL", "MAY", "JUNE", "JULY", "AUGUST", "SEPTEMBER", "OCTOBER", "NOVEMBER", "DECEMBER"];
/** A calendar date as US sheets write it: APRIL 23, 2026. What is no date is printed as given. */
export function sheetDate(iso: string): string {
  const [, year, month, day] = /^(\d{4})-(\d{2})-(\d{2})$/.exec(iso) ?? [];
  const name = MONTHS[Number(month) - 1];
  return name ? `${name} ${Number(day)}, ${year}` : letter(iso);
}

/** Lines printed beside the seal, broken to a width. */
export const sealLines = (seal: SealOnSheet, widthPx: number): string[] => [
  seal.licensee, seal.title, `${seal.state} license ${seal.number}`, "Signed", sheetDate(seal.signedOn), "License expires", sheetDate(seal.expiresOn), seal.legend,
].filter(Boolean).flatMap((line) => wrapText(letter(line), LETTERING.note.size, "narrow", widthPx));

/** Letters around a circle, centered at the top or the bottom of it; each stands upright to the ring. */
function around(cx: number, cy: number, radius: number, words: string, bottom: boolean): Primitive[] {
  const { size } = LETTERING.keynote;
  const gap = 0.6;
  const widths = [...words].map((c) => textWidth(c, size, "normal") + gap);
  let along = -widths.reduce((sum, each) => sum + each, 0) / 2;
  const baseline = bottom ? radius + size * 0.72 / 2 : radius - size * 0.72 / 2;
  return [...words].map((character, i) => {
    const width = widths[i] as number;
    const angle = (along + width / 2) / radius;
    along += width;
    const x = cx + baseline * Math.sin(angle);
    const y = bottom ? cy + baseline * Math.cos(angle) : cy - baseline * Math.cos(angle);
    return text(x, y, character, "keynote", { anchor: "middle", ink: "seal", turn: ((bottom ? -angle : angle) * 180) / Math.PI, layer: "symbol" });
  }).filter((each) => each.text !== " ");
}

/** A seal drawn from the license's words, for licensees without a graphic and for the demonstration. */
function ringSeal(cx: number, cy: number, radius: number, seal: SealOnSheet): Primitive[] {
  const ring = { stroke: "seal", weight: WEIGHTS.seal, layer: "symbol" } as const;
  const ticks = Array.from({ length: 72 }, (_, i) => {
    const angle = (i * 5 * Math.PI) / 180;
    const inner = radius - 6, outer = radius - 2;
    return `M${n(cx + inner * Math.cos(angle))} ${n(cy + inner * Math.sin(angle))}L${n(cx + outer * Math.cos(angle))} ${n(cy + outer * Math.sin(angle))}`;
  }).join("");
  const inner = radius - 24;
  const middle = (radius - 6 + inner) / 2;
  const lines = wrapText(letter(seal.title), 13, "narrow", 2 * inner - 16);
  // A title too long for the ring stands beside it only.
  const title = lines.length <= 2 && lines.every((line) => textWidth(line, 13, "narrow") <= 2 * inner - 10) ? lines : [];
  const number = letter(seal.number);
  const name = letter(seal.licensee);
  const legend = letter(seal.legend || seal.state);
  // Both words share the ring where it is long enough; the legend stands beside the seal in any case.
  const length = (words: string) => textWidth(words, LETTERING.keynote.size, "normal") + words.length * 0.6;
  const below = length(name) + length(legend) < 2 * Math.PI * (middle - 5) * 0.94 ? legend : "";
  const numberSize = Math.min(17, (2 * inner - 14) / textWidth(number, 1, "normal"));
  return [
    path(ellipseData(cx, cy, radius), ring), path(ellipseData(cx, cy, radius - 6), ring), path(ticks, ring), path(ellipseData(cx, cy, inner), ring),
    ...around(cx, cy, middle, name, false), ...(below ? around(cx, cy, middle, below, true) : []),
    ...title.map((line, i) => text(cx, cy - 12 - (title.length - 1 - i) * 14, line, "note", { anchor: "middle", ink: "seal", layer: "symbol" })),
    text(cx, cy + 10 + (title.length - 1) * 3, number, "callout", { size: Math.max(LETTERING.keynote.size, numberSize), anchor: "middle", ink: "seal", layer: "symbol" }),
  ];
}

/** The licensee's seal, or the words that stand in its place, inside a square of the given half width. */
export function sealPrimitives(cx: number, cy: number, radius: number, seal: SealOnSheet | null, place: string): Primitive[] {
  if (!seal || seal.graphic === "in the file") {
    const words = seal ? ["SEALED", "SEE THE FILE"] : [place];
    return [
      path(ellipseData(cx, cy, radius - 2), { weight: WEIGHTS.border, dash: "placeholder", layer: "ground" }),
      ...words.map((line, i) => text(cx, cy + 5 + (i - (words.length - 1) / 2) * 16, line, words.length > 1 ? "note" : "tag", { anchor: "middle" })),
    ];
  }
  if (!seal.graphic) return ringSeal(cx, cy, radius, seal);
  const { href, widthPx, heightPx } = seal.graphic;
  const scale = Math.min((2 * radius) / widthPx, (2 * radius) / heightPx);
  const width = widthPx * scale, height = heightPx * scale;
  return [{ type: "image", x: cx - width / 2, y: cy - height / 2, width, height, href, layer: "symbol" }];
}
