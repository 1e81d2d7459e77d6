"use client";
import { memo } from "react";
import { Handle, Position, type NodeProps } from "reactflow";
import { useEditor } from "@/components/diagram/editorContext";
import { PrimitiveSvg } from "@/components/diagram/nodes/primitiveSvg";
import { useCanvasActions, type Corner } from "./canvasActions";
import type { ElementData } from "./flow";
import { PortButton } from "./portDots";

const TICK = 7;
const GAP = 5;
/** Four corner ticks around what is selected: they leave the lettering free. */
export function SelectionTicks({ width, height }: { width: number; height: number }) {
  const corner = (x: number, y: number, sx: number, sy: number): string => `M${x} ${y + sy * TICK}V${y}H${x + sx * TICK}`;
  return <path className="fill-none stroke-copper" strokeWidth={2.4} d={`${corner(-GAP, -GAP, 1, 1)}${corner(width + GAP, -GAP, -1, 1)}${corner(-GAP, height + GAP, 1, -1)}${corner(width + GAP, height + GAP, -1, -1)}`} />;
}

const CORNERS: readonly { corner: Corner; className: string; words: string }[] = [
  { corner: "nw", className: "-left-2.5 -top-2.5 cursor-nwse-resize", words: "top left" },
  { corner: "ne", className: "-right-2.5 -top-2.5 cursor-nesw-resize", words: "top right" },
  { corner: "sw", className: "-bottom-2.5 -left-2.5 cursor-nesw-resize", words: "bottom left" },
  { corner: "se", className: "-bottom-2.5 -right-2.5 cursor-nwse-resize", words: "bottom right" },
];

/** One element on the sheet: its drawing, where it can be picked, its ports, and ticks while selected. */
export const ElementView = memo(function ElementView({ data, selected }: NodeProps<ElementData>) {
  const actions = useCanvasActions();
  const joining = useEditor((editor) => editor.tool.kind === "join");
  const readOnly = useEditor((editor) => editor.readOnly);
  const { width, height, hit, tag } = data;
  const callout = data.ref.collection === "circuits";
  return (
    <div className="group/node absolute inset-0 pointer-events-none">
      <PrimitiveSvg primitives={data.primitives} left={data.left} top={data.top} className="pointer-events-none" />
      {hit !== "none" && (
        <div
          // A circuit is reached by its line; its callout is a second handle for the pointer only.
          {...(callout ? { "aria-hidden": true } : { role: "button", tabIndex: 0, "aria-label": data.name, "aria-pressed": selected })} data-element={`${data.ref.collection}/${data.ref.id}`}
          className="absolute inset-0 pointer-events-none outline-offset-4"
          onKeyDown={(event) => {
            if (event.target !== event.currentTarget || (event.key !== "Enter" && event.key !== " ")) return;
            event.preventDefault();
            actions.select(data.ref, event.shiftKey);
          }}
        >
          <svg width={width} height={height} className="absolute inset-0 overflow-visible" aria-hidden="true">
            {hit === "box"
              ? <rect x={-2} y={-2} width={width + 4} height={height + 4} className="fill-transparent [pointer-events:all]" />
              : <rect width={width} height={height} className="fill-none stroke-transparent [pointer-events:stroke]" strokeWidth={14} />}
            {tag && <rect x={tag.x - 2} y={tag.y - 2} width={tag.width + 4} height={tag.height + 4} className="fill-transparent [pointer-events:all]" />}
            {selected && <SelectionTicks width={width} height={height} />}
          </svg>
        </div>
      )}
      {data.ports.map((dot) => (
        <Handle key={dot.ref.port} id={dot.ref.port} type="source" position={Position.Right} isConnectable={false} className="!pointer-events-none !min-h-0 !min-w-0 !border-0 !bg-transparent" style={{ left: dot.left, top: dot.top, width: 1, height: 1, opacity: 0 }} />
      ))}
      {!readOnly && hit !== "none" && data.ports.map((dot) => (
        <PortButton key={dot.ref.port} dot={dot} shown={selected || joining} tabbable={selected} onGrab={actions.grabPort} onChoose={actions.choosePort} />
      ))}
      {!readOnly && selected && data.resizable && CORNERS.map(({ corner, className, words }) => (
        <button key={corner} type="button" tabIndex={-1} aria-label={`Resize from ${words}`} className={`nodrag nopan pointer-events-auto absolute z-20 size-3 border-2 border-copper bg-paper ${className}`} onPointerDown={(event) => actions.resize(data.ref, corner, event)} />
      ))}
    </div>
  );
});
