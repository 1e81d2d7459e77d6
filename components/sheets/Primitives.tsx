import { memo } from "react";
import { DASHES, type Ink, type Primitive } from "@/lib/sheets/primitives";

/** Inks of the sheet on screen; at night the sheet's own class changes them. */
const INK: Readonly<Record<Ink, string>> = {
  ink: "var(--dk)", ink2: "var(--dk2)", paper: "var(--paper)", ww: "var(--ww)", pv: "var(--pv)", bat: "var(--bat)",
  seal: "var(--sealink)", red: "var(--red)", copper: "var(--copper)",
};
const FACE = { normal: "var(--font-lettering), sans-serif", narrow: "var(--font-lettering-narrow), sans-serif" } as const;

function Drawn({ primitive }: { primitive: Primitive }) {
  switch (primitive.type) {
    case "path": {
      const dash = DASHES[primitive.dash];
      return (
        <path
          d={primitive.d}
          fill={primitive.fill ? INK[primitive.fill] : "none"}
          stroke={primitive.stroke ? INK[primitive.stroke] : "none"}
          strokeWidth={primitive.weight}
          strokeDasharray={dash.length ? dash.join(" ") : undefined}
          strokeLinecap={primitive.cap}
          strokeLinejoin="round"
        />
      );
    }
    case "text":
      return (
        <text
          x={primitive.x}
          y={primitive.y}
          fontFamily={FACE[primitive.face]}
          fontSize={primitive.size}
          fill={INK[primitive.ink]}
          stroke={primitive.bold > 0 ? INK[primitive.ink] : undefined}
          strokeWidth={primitive.bold > 0 ? primitive.bold : undefined}
          textAnchor={primitive.anchor}
          transform={primitive.turn ? `rotate(${primitive.turn} ${primitive.x} ${primitive.y})` : undefined}
        >
          {primitive.text}
        </text>
      );
    case "image":
      return <image x={primitive.x} y={primitive.y} width={primitive.width} height={primitive.height} href={primitive.href} />;
    case "group": {
      const scale = primitive.mirrored || primitive.scale !== 1 ? ` scale(${primitive.mirrored ? -primitive.scale : primitive.scale} ${primitive.scale})` : "";
      const turn = primitive.turn ? ` rotate(${primitive.turn})` : "";
      return (
        <g transform={`translate(${primitive.x} ${primitive.y})${turn}${scale}`}>
          {primitive.children.map((child, i) => <Drawn key={i} primitive={child} />)}
        </g>
      );
    }
  }
}

/** Draws primitives inside an svg element, in the order given, with the inks of the current theme. */
export const Primitives = memo(function Primitives({ primitives }: { primitives: readonly Primitive[] }) {
  return primitives.map((primitive, i) => <Drawn key={i} primitive={primitive} />);
});
