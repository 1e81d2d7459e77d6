"use client";
import { memo, useEffect, useRef, type KeyboardEvent } from "react";
import type { Node } from "reactflow";
import { underlayEdit, type UnderlayCorner } from "@/components/diagram/actions/underlayEdit";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { SELECT } from "@/lib/client/editorTypes";
import { fileUrl } from "@/lib/client/filesApi";
import type { Underlay as UnderlayData } from "@/lib/diagram/schema";
import { PX_PER_UNIT, sheetPx } from "@/lib/sheets/primitives";
import { useCanvasActions } from "./canvasActions";
import { useCanvasView } from "./view";

/** The picture on the paper, dimmed. Sheets know nothing of it: it is on the screen alone. */
export const Underlay = memo(function Underlay({ widthPx, heightPx }: { widthPx: number; heightPx: number }) {
  const underlay = useEditor((editor) => editor.drawing.sheet.underlay);
  if (!underlay || underlay.hidden) return null;
  return (
    <>
      <clipPath id="sheet-paper"><rect width={widthPx} height={heightPx} /></clipPath>
      <g clipPath="url(#sheet-paper)">
        <image
          data-testid="underlay" href={fileUrl(underlay.file, { width: 1280 })} x={sheetPx(underlay.at.x)} y={sheetPx(underlay.at.y)}
          width={underlay.width * PX_PER_UNIT} height={underlay.height * PX_PER_UNIT} opacity={underlay.opacity} preserveAspectRatio="none"
        />
      </g>
    </>
  );
});

export const UNDERLAY_ID = "underlay";
/** Handle of the background, over everything while it is adjusted. */
export const underlayNode = ({ at, width, height }: UnderlayData): Node => ({
  id: UNDERLAY_ID, type: "underlay", position: { x: sheetPx(at.x), y: sheetPx(at.y) }, data: {}, zIndex: 1000, width: width * PX_PER_UNIT, height: height * PX_PER_UNIT,
  style: { width: width * PX_PER_UNIT, height: height * PX_PER_UNIT }, draggable: false, selectable: false, focusable: false, connectable: false, deletable: false,
});

const CORNERS: readonly { corner: UnderlayCorner; className: string; words: string }[] = [
  { corner: "nw", className: "left-0 top-0 cursor-nwse-resize", words: "top left" },
  { corner: "ne", className: "left-full top-0 cursor-nesw-resize", words: "top right" },
  { corner: "sw", className: "left-0 top-full cursor-nesw-resize", words: "bottom left" },
  { corner: "se", className: "left-full top-full cursor-nwse-resize", words: "bottom right" },
];
const ARROWS: Readonly<Record<string, readonly [number, number]>> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, -1], ArrowDown: [0, 1] };

/** Moves and sizes the background by pointer or keys; Enter or Escape ends it. */
export const UnderlayView = memo(function UnderlayView() {
  const store = useEditorStore();
  const { adjustUnderlay } = useCanvasActions();
  const { zoom } = useCanvasView();
  const handle = useRef<HTMLDivElement>(null);
  useEffect(() => handle.current?.focus({ preventScroll: true }), []);
  const keys = (event: KeyboardEvent): void => {
    const { drawing: { sheet: { underlay } }, run, setTool } = store.getState();
    const arrow = ARROWS[event.key];
    if (event.key === "Enter" || event.key === "Escape") setTool(SELECT);
    else if (arrow && underlay) run([underlayEdit(underlay, event.shiftKey ? "se" : null, event.shiftKey ? arrow[0] + arrow[1] : arrow[0], event.shiftKey ? (arrow[0] + arrow[1]) * (underlay.height / underlay.width) : arrow[1])]);
    else return;
    event.preventDefault();
    event.stopPropagation();
  };
  return (
    <div
      role="application" aria-label="Background. Arrow keys move it, Shift with an arrow key sizes it, Enter ends." tabIndex={0} data-testid="underlay-handle" ref={handle}
      className="nodrag nopan absolute inset-0 cursor-move border-2 border-dashed border-copper bg-copper/5 outline-none focus-visible:outline-2" style={{ pointerEvents: "all" }}
      onPointerDown={(event) => adjustUnderlay(null, event)} onKeyDown={keys}
    >
      {CORNERS.map(({ corner, className, words }) => (
        <button
          key={corner} type="button" tabIndex={-1} aria-label={`Size the background from ${words}`} className={`absolute size-4 border-2 border-copper bg-paper ${className}`}
          // As large at every zoom.
          style={{ transform: `translate(-50%, -50%) scale(${1 / zoom})` }} onPointerDown={(event) => adjustUnderlay(corner, event)}
        />
      ))}
    </div>
  );
});
