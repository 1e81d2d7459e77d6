"use client";
import { useMemo } from "react";
import { useEditor } from "@/components/diagram/editorContext";
import { PrimitiveShapes } from "@/components/diagram/nodes/primitiveSvg";
import { bottomAreas } from "@/lib/sheets/areas";
import { cautionPrimitives, stripPrimitives } from "@/lib/sheets/bottom";
import type { SheetContext } from "@/lib/sheets/context";
import type { SheetGeometry } from "@/lib/sheets/size";
import { titleBlockPrimitives } from "@/lib/sheets/titleBlock";

/** Title block, cautions and legend as they will print; drawn by the same functions as the sheet. */
export function TitleBlock({ geometry }: { geometry: SheetGeometry }) {
  const graph = useEditor((editor) => editor.graph);
  const check = useEditor((editor) => editor.check);
  const primitives = useMemo(() => {
    const { drawing } = graph;
    const { cautions, strip } = bottomAreas(geometry);
    const context: Omit<SheetContext, "states"> = { drawing, graph, check, digest: check?.digest ?? "", revisions: [], seal: null, sealPlace: "DRAFT" };
    return [
      ...titleBlockPrimitives(geometry, context, { number: drawing.sheet.number, title: drawing.sheet.title, subtitle: drawing.sheet.subtitle, index: 1, count: 1, scale: "NONE" }, { acceptedOn: "E-603" }),
      ...cautionPrimitives(cautions, graph), ...stripPrimitives(strip, graph, "E-603", geometry.pxPerIn),
    ];
  }, [geometry, graph, check]);
  return <PrimitiveShapes primitives={primitives} />;
}
