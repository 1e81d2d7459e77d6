"use client";
import { memo } from "react";
import type { EdgeProps } from "reactflow";
import { useEditor } from "@/components/diagram/editorContext";
import { PrimitiveShapes } from "@/components/diagram/nodes/primitiveSvg";
import { useCanvasActions } from "./canvasActions";
import type { CircuitData } from "./flow";
import { pathData } from "./sheetUnits";

/** One circuit: the stored line in its system's pattern. Selected, each straight piece can be dragged sideways. */
export const CircuitView = memo(function CircuitView({ data, selected }: EdgeProps<CircuitData>) {
  const actions = useCanvasActions();
  const readOnly = useEditor((editor) => editor.readOnly);
  if (!data || data.points.length < 2) return null;
  const { points } = data;
  return (
    <g>
      <g className="pointer-events-none" aria-hidden="true"><PrimitiveShapes primitives={data.primitives} /></g>
      {selected && <path d={pathData(points)} className="pointer-events-none fill-none stroke-copper" strokeWidth={3.6} />}
      <path
        d={pathData(points)} role="button" tabIndex={0} aria-label={data.name} aria-pressed={selected ?? false} data-element={`circuits/${data.ref.id}`}
        className="cursor-pointer fill-none stroke-transparent [pointer-events:stroke] focus-visible:stroke-copper focus-visible:opacity-40" strokeWidth={13}
        onKeyDown={(event) => {
          if (event.key !== "Enter" && event.key !== " ") return;
          event.preventDefault();
          actions.select(data.ref, event.shiftKey);
        }}
      />
      {selected && !readOnly && points.slice(1).map((point, index) => {
        const before = points[index] as { x: number; y: number };
        const horizontal = Math.abs(before.y - point.y) < 1e-6;
        return (
          <path
            key={index} d={pathData([before, point])} className={`nopan fill-none stroke-transparent [pointer-events:stroke] ${horizontal ? "cursor-ns-resize" : "cursor-ew-resize"}`} strokeWidth={13}
            onPointerDown={(event) => actions.bend(data.ref.id, index, event)}
          />
        );
      })}
    </g>
  );
});
