import { useEffect } from "react";
import { useReactFlow } from "reactflow";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { tagBox } from "@/lib/sheets/oneline";
import { viewTime } from "./view";

/** Brings the element that the store asks for to the middle of the view; one already in plain sight stays where it is. */
export function useReveal(): void {
  const store = useEditorStore();
  const reveal = useEditor((editor) => editor.reveal);
  const { setCenter, getZoom, flowToScreenPosition } = useReactFlow();
  useEffect(() => {
    if (!reveal) return;
    const box = tagBox(store.getState().graph, reveal.ref);
    const canvas = document.querySelector("[data-testid=canvas]")?.getBoundingClientRect();
    if (!box || !canvas) return;
    const middle = { x: box.x + box.width / 2, y: box.y + box.height / 2 };
    const place = flowToScreenPosition(middle);
    const seen = place.x > canvas.left + 120 && place.x < canvas.right - 60 && place.y > canvas.top + 40 && place.y < canvas.bottom - 40;
    if (!seen) void setCenter(middle.x, middle.y, { zoom: getZoom(), duration: viewTime() });
  }, [reveal, store, setCenter, getZoom, flowToScreenPosition]);
}
