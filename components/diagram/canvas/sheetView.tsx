"use client";
import { memo, useMemo } from "react";
import type { Node } from "reactflow";
import { useEditor } from "@/components/diagram/editorContext";
import { PrimitiveShapes } from "@/components/diagram/nodes/primitiveSvg";
import { drawingArea, framePrimitives, INNER_PX } from "@/lib/sheets/frame";
import { PX_PER_UNIT } from "@/lib/sheets/primitives";
import { sheetGeometry } from "@/lib/sheets/size";
import { TitleBlock } from "./titleBlock";
import { Underlay } from "./underlayView";
import { DETAIL_ZOOM, useCanvasView } from "./view";

/** The paper under everything; it is seen, never picked. */
export const SHEET_NODE: Node = {
  id: "sheet", type: "sheet", position: { x: 0, y: 0 }, data: {}, zIndex: -20, selectable: false, draggable: false, focusable: false, connectable: false, deletable: false, width: 1, height: 1,
  style: { width: 1, height: 1, pointerEvents: "none" },
};

/** Paper with border, zones, title block and the hairline grid. */
export const SheetView = memo(function SheetView() {
  const sheet = useEditor((editor) => editor.drawing.sheet);
  const geometry = useMemo(() => sheetGeometry(sheet.size), [sheet.size]);
  // The paper comes first; what lies under the drawing lies on it, and everything else over that.
  const [paper, ...frame] = useMemo(() => framePrimitives(geometry), [geometry]);
  const area = drawingArea(geometry);
  const small = useCanvasView().zoom < DETAIL_ZOOM;
  return (
    <svg width={geometry.widthPx} height={geometry.heightPx} className="pointer-events-none absolute left-0 top-0 overflow-visible [filter:drop-shadow(2px_3px_0_var(--hatch))]" aria-hidden="true" data-testid="sheet">
      <defs>
        <pattern id="sheet-grid" x={INNER_PX} y={INNER_PX} width={PX_PER_UNIT} height={PX_PER_UNIT} patternUnits="userSpaceOnUse">
          <path d={`M${PX_PER_UNIT} 0V${PX_PER_UNIT}H0`} className="fill-none stroke-grid" strokeWidth={0.8} />
        </pattern>
      </defs>
      <rect width={geometry.widthPx} height={geometry.heightPx} className="fill-paper stroke-rule" strokeWidth={1} />
      {paper && <PrimitiveShapes primitives={[paper]} />}
      <Underlay widthPx={geometry.widthPx} heightPx={geometry.heightPx} />
      <PrimitiveShapes primitives={frame} />
      <rect x={area.left + 1} y={area.top + 1} width={area.right - area.left - 2} height={area.bottom - area.top - 2} fill="url(#sheet-grid)" />
      <TitleBlock geometry={geometry} small={small} />
    </svg>
  );
});
