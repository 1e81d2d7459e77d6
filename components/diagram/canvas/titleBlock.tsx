"use client";
import { useMemo } from "react";
import { useEditor } from "@/components/diagram/editorContext";
import { PrimitiveShapes } from "@/components/diagram/nodes/primitiveSvg";
import { bottomAreas } from "@/lib/sheets/areas";
import { cautionPrimitives, stripPrimitives } from "@/lib/sheets/bottom";
import type { SheetContext } from "@/lib/sheets/context";
import { textSpan } from "@/lib/sheets/lettering";
import type { Primitive, TextPrimitive } from "@/lib/sheets/primitives";
import type { SheetGeometry } from "@/lib/sheets/size";
import { titleBlockPrimitives } from "@/lib/sheets/titleBlock";

/** Title block, cautions and legend as they will print, drawn by the sheet's own functions; lettering too small to read on screen shows as bars. */
export function TitleBlock({ geometry, small }: { geometry: SheetGeometry; small: boolean }) {
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
  if (!small) return <PrimitiveShapes primitives={primitives} />;
  const tiny = (primitive: Primitive): primitive is TextPrimitive => primitive.type === "text" && primitive.size < 16;
  return (
    <>
      <PrimitiveShapes primitives={primitives.filter((primitive) => !tiny(primitive))} />
      {primitives.filter(tiny).map((words, index) => {
        const span = textSpan(words.x, words.text, words.size, words.face, words.anchor);
        return <rect key={index} x={span.left} y={words.y - 9} width={Math.max(0, span.right - span.left)} height={6} className="fill-g2" />;
      })}
    </>
  );
}
