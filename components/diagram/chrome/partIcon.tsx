import { PrimitiveShapes } from "@/components/diagram/nodes/primitiveSvg";
import type { PartId } from "@/lib/client/editorTypes";
import { isKindId, kindDefinition } from "@/lib/equipment/registry";
import { shape } from "@/lib/sheets/oneline/shape";

/** Pictures of parts that have no symbol of their own, around (0, 0). */
const DRAWN: Partial<Record<PartId, string>> = {
  panelboard: "M-14 -10H14V10H-14ZM0 -6V6", "meter-main": "M-14 -10H14V10H-14ZM4 -6V6M-5 0a4 4 0 1 1 -8 0a4 4 0 1 1 8 0", "interconnect-cabinet": "M-16 -10H16V10H-16ZM0 -6V6M0 -3H8M0 3H8M-8 0H0", "dc-bus-cabinet": "M-16 -10H16V10H-16ZM-11 -3H11M-6 -3V4M0 -3V4M6 -3V4",
  combiner: "M-14 -10H14V10H-14ZM-7 10V0H7V10M0 10V0M0 0V-10",
  wireway: "M-22 -9H22V9H-22ZM-22 -5H22M-22 5H22M-26 0H26", conduit: "M-20 0H20M-4 0a4 9 0 1 0 8 0a4 9 0 1 0 -8 0", box: "M-14 -8H14V8H-14ZM-20 0H-14M14 0H20", circuit: "M-22 0H-11M11 0H22M-11 0a7 7 0 0 1 7 -7H4a7 7 0 0 1 0 14H-4a7 7 0 0 1 -7 -7",
  text: "M-8 -7H8M0 -7V8", bond: "M-16 -7V7M16 -7V7M-16 0H16",
};
const SYMBOL: Partial<Record<PartId, string>> = { sensor: "ct", nipple: "nipple", interlock: "interlock" };
/** Offsets and sizes that bring a symbol into a cell of 72 by 34. */
const FIT: Readonly<Record<string, readonly [x: number, y: number, scale: number]>> = {
  utility: [0, 18, 0.55], generator: [0, 6, 0.62], pv: [0, 24, 0.58], battery: [0, 12, 0.95], breaker: [18, -4, 0.95], plugon: [18, -4, 0.95], switch: [18, -5, 0.95], contactor: [18, -6, 0.85], doublethrow: [24, 0, 0.75],
  inverter: [0, 0, 0.56], meter: [0, 0, 0.62], pvswitch: [18, -5, 0.95], load: [0, -14, 0.8], motor: [-5, 0, 0.7], rod: [0, 18, 0.75], ground: [0, 9, 0.9], spd: [0, 22, 0.62], estop: [0, 0, 0.95], ct: [18, 0, 0.9], nipple: [12, 0, 1.1], interlock: [0, 0, 0.9],
  fuse: [18, 0, 0.95], transformer: [24, 0, 0.75], inlet: [18, 0, 0.85],
};

/** Picture of a part for the rail: its symbol, scaled into the cell. */
export function PartIcon({ part }: { part: PartId }) {
  const drawn = DRAWN[part];
  const symbol = drawn ? null : SYMBOL[part] ?? (isKindId(part) ? kindDefinition(part).symbol(Object.fromEntries(Object.keys(kindDefinition(part).properties).map((name) => [name, kindDefinition(part).defaults[name] ?? null])) as never) : null);
  const [x, y, scale] = FIT[symbol ?? ""] ?? [0, 0, 0.8];
  const found = symbol === "pvswitch" ? shape("switch") : symbol ? shape(symbol) : null;
  return (
    <svg viewBox="-36 -17 72 34" width={66} height={26} className="mx-auto block" aria-hidden="true">
      {drawn && <path d={drawn} className="fill-none stroke-ink" strokeWidth={1.5} />}
      {found && (
        <g transform={`scale(${scale}) translate(${-x} ${-y})`}>
          <PrimitiveShapes primitives={found.paths} />
          {found.texts.map((each) => <text key={each.text} x={each.x} y={each.y} fontSize={each.size} textAnchor="middle" className="fill-ink font-lettering">{each.text}</text>)}
        </g>
      )}
    </svg>
  );
}
