import type { SheetGeometry } from "./size";
import { WEIGHTS, box, n, path, text, type Primitive } from "./primitives";

/** Frame lines, px from the sheet's edges at half size. */
export const BORDER_PX = 40;
export const INNER_PX = 60;
/** Width of the title block at the right. */
export const TITLE_PX = 252;
const ZONE_LETTERS = "DCBA";
const ZONE_COLUMNS = 8;

export interface Area { left: number; top: number; right: number; bottom: number }
/** Area inside the inner frame left of the title block. */
export const drawingArea = (g: SheetGeometry): Area => ({ left: INNER_PX, top: INNER_PX, right: g.widthPx - INNER_PX - TITLE_PX, bottom: g.heightPx - INNER_PX });

/** Paper, border, inner frame, zones with letters and figures, centering marks. */
export function framePrimitives(g: SheetGeometry): Primitive[] {
  const right = g.widthPx - INNER_PX;
  const bottom = g.heightPx - INNER_PX;
  const columnPx = (right - INNER_PX) / ZONE_COLUMNS;
  const rowPx = (bottom - INNER_PX) / ZONE_LETTERS.length;
  const ticks: string[] = [];
  const letters: Primitive[] = [];
  for (let i = 0; i < ZONE_COLUMNS; i += 1) {
    const x = INNER_PX + columnPx * (i + 0.5);
    // Zones are numbered from the right, as on engineering drawings.
    const number = String(ZONE_COLUMNS - i);
    letters.push(text(x, 55, number, "callout", { anchor: "middle" }), text(x, g.heightPx - 45, number, "callout", { anchor: "middle" }));
    const edge = n(INNER_PX + columnPx * i);
    if (i) ticks.push(`M${edge} ${BORDER_PX}V${INNER_PX}M${edge} ${n(bottom)}V${n(g.heightPx - BORDER_PX)}`);
  }
  [...ZONE_LETTERS].forEach((zone, i) => {
    const y = INNER_PX + rowPx * (i + 0.5) + 4.5;
    letters.push(text(50, y, zone, "callout", { anchor: "middle" }), text(g.widthPx - 50, y, zone, "callout", { anchor: "middle" }));
    const edge = n(INNER_PX + rowPx * i);
    if (i) ticks.push(`M${BORDER_PX} ${edge}H${INNER_PX}M${n(right)} ${edge}H${n(g.widthPx - BORDER_PX)}`);
  });
  const cx = n(g.widthPx / 2), cy = n(g.heightPx / 2);
  ticks.push(`M${cx} 30V40M${cx} ${n(g.heightPx - 40)}V${n(g.heightPx - 30)}M30 ${cy}H40M${n(g.widthPx - 40)} ${cy}H${n(g.widthPx - 30)}`);
  return [
    path(`M0 0H${g.widthPx}V${g.heightPx}H0Z`, { fill: "paper", stroke: null, layer: "ground" }),
    box(BORDER_PX, BORDER_PX, g.widthPx - 2 * BORDER_PX, g.heightPx - 2 * BORDER_PX, { weight: WEIGHTS.border }),
    box(INNER_PX, INNER_PX, right - INNER_PX, bottom - INNER_PX, { weight: WEIGHTS.frame }),
    path(`M${n(right - TITLE_PX)} ${INNER_PX}V${n(bottom)}`, { weight: WEIGHTS.frame, layer: "ground" }),
    path(ticks.join(""), { weight: WEIGHTS.border, layer: "ground" }),
    ...letters,
  ];
}
