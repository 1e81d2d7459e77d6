import { useCallback, useEffect, useRef, useState } from "react";
import { useReactFlow } from "reactflow";
import { placeEdit } from "@/components/diagram/actions/placeEdit";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { SELECT, type PartId } from "@/lib/client/editorTypes";
import { newId } from "@/lib/client/newId";
import type { Point } from "@/lib/diagram/schema";
import { pointToUnits, snapped } from "./sheetUnits";

/** Placing a part: click it in the rail and click on the sheet, or drag it there. */
export function usePlacing(canvas: React.RefObject<HTMLElement | null>) {
  const store = useEditorStore();
  const tool = useEditor((editor) => editor.tool);
  const { screenToFlowPosition } = useReactFlow();
  const [ghost, setGhost] = useState<Point | null>(null);
  const fromRail = useRef<Point | null>(null);
  const part: PartId | null = tool.kind === "place" ? tool.part : null;

  const place = useCallback((client: Point): void => {
    const { graph, run, say, select, setTool, tool: current } = store.getState();
    if (current.kind !== "place") return;
    const edit = placeEdit(graph, current.part, pointToUnits(screenToFlowPosition(client)), newId);
    if ("reason" in edit) { say(edit.reason, "refused"); return; }
    if (run(edit.commands, edit.title)) { setTool(SELECT); select([edit.select]); }
  }, [screenToFlowPosition, store]);

  useEffect(() => {
    const down = (event: PointerEvent): void => {
      const inRail = event.target instanceof Element && event.target.closest("[data-part]") !== null;
      fromRail.current = inRail && event.button === 0 ? { x: event.clientX, y: event.clientY } : null;
    };
    const up = (event: PointerEvent): void => {
      const start = fromRail.current;
      fromRail.current = null;
      const over = document.elementFromPoint(event.clientX, event.clientY);
      if (start && over && canvas.current?.contains(over) && Math.hypot(event.clientX - start.x, event.clientY - start.y) > 5) place({ x: event.clientX, y: event.clientY });
    };
    window.addEventListener("pointerdown", down, true);
    window.addEventListener("pointerup", up);
    return () => { window.removeEventListener("pointerdown", down, true); window.removeEventListener("pointerup", up); };
  }, [canvas, place]);

  useEffect(() => {
    if (!part) return;
    const move = (event: PointerEvent): void => {
      const over = event.target instanceof Element && (canvas.current?.contains(event.target) || fromRail.current !== null);
      setGhost(over ? snapped(pointToUnits(screenToFlowPosition({ x: event.clientX, y: event.clientY }))) : null);
    };
    window.addEventListener("pointermove", move);
    return () => { window.removeEventListener("pointermove", move); setGhost(null); };
  }, [part, canvas, screenToFlowPosition]);

  return { ghost: part ? ghost : null, part, place };
}
