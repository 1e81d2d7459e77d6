import { memo } from "react";
import { DASHES, layered, type Ink, type Primitive } from "@/lib/sheets/primitives";

/** Inks by theme. The drawing's own inks (dk, dk2) stay dark at night, because the sheet stays paper. */
const INK: Readonly<Record<Ink, string>> = {
  ink: "var(--dk)", ink2: "var(--dk2)", paper: "var(--paper)", ww: "var(--ww)", pv: "var(--pv)", bat: "var(--bat)", seal: "var(--sealink)", red: "var(--red)", copper: "var(--copper)",
};

function One({ primitive }: { primitive: Primitive }) {
  switch (primitive.type) {
    case "group": {
      const { x, y, turn, mirrored, scale } = primitive;
      return (
        <g transform={`translate(${x} ${y})${turn ? ` rotate(${turn})` : ""}${mirrored ? " scale(-1 1)" : ""}${scale === 1 ? "" : ` scale(${scale})`}`}>
          {primitive.children.map((child, index) => <One key={index} primitive={child} />)}
        </g>
      );
    }
    case "image": return <image x={primitive.x} y={primitive.y} width={primitive.width} height={primitive.height} href={primitive.href} />;
    case "text": return (
      <text
        x={primitive.x} y={primitive.y} fontSize={primitive.size} textAnchor={primitive.anchor} fill={INK[primitive.ink]}
        className={primitive.face === "narrow" ? "font-lettering-narrow" : "font-lettering"}
        {...(primitive.bold > 0 ? { stroke: INK[primitive.ink], strokeWidth: primitive.bold } : {})}
        {...(primitive.turn ? { transform: `rotate(${primitive.turn} ${primitive.x} ${primitive.y})` } : {})}
      >
        {primitive.text}
      </text>
    );
    case "path": {
      const dash: readonly number[] = DASHES[primitive.dash];
      return (
        <path
          d={primitive.d} fill={primitive.fill ? INK[primitive.fill] : "none"} stroke={primitive.stroke ? INK[primitive.stroke] : "none"} strokeWidth={primitive.weight}
          strokeLinecap={primitive.cap} strokeLinejoin="round" {...(dash.length > 0 ? { strokeDasharray: dash.join(" ") } : {})}
        />
      );
    }
  }
}

/** Draws sheet primitives, layer by layer, where they stand on the sheet. */
export const PrimitiveShapes = memo(function PrimitiveShapes({ primitives }: { primitives: readonly Primitive[] }) {
  return <>{layered(primitives).map((primitive, index) => <One key={index} primitive={primitive} />)}</>;
});

/** Primitives in sheet px, drawn in an element whose own corner is at (left, top) of the sheet. */
export function PrimitiveSvg({ primitives, left, top, className = "" }: { primitives: readonly Primitive[]; left: number; top: number; className?: string }) {
  return (
    <svg width={1} height={1} className={`absolute left-0 top-0 overflow-visible ${className}`} aria-hidden="true">
      <g transform={`translate(${-left} ${-top})`}><PrimitiveShapes primitives={primitives} /></g>
    </svg>
  );
}
