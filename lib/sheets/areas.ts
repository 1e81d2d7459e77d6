import { CAUTIONS_PX, STRIP_PX } from "./bottom";
import { drawingArea, type Area } from "./frame";
import type { SheetGeometry } from "./size";

/** The drawing's own area, the cautions under it and the strip at the bottom, px. */
export function bottomAreas(g: SheetGeometry): { drawing: Area; cautions: Area; strip: Area } {
  const inner = drawingArea(g);
  const strip = { ...inner, top: inner.bottom - STRIP_PX };
  const cautions = { ...inner, top: strip.top - CAUTIONS_PX, bottom: strip.top };
  return { drawing: { ...inner, bottom: cautions.top }, cautions, strip };
}
