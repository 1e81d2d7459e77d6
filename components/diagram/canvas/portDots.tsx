import type { Landing } from "@/lib/client/landing";
import type { PortRef } from "@/lib/client/editorTypes";

/** One port as drawn by a node: place and length relative to the node, px. */
export interface PortDot {
  readonly ref: PortRef;
  readonly label: string;
  readonly left: number;
  readonly top: number;
  /** Px along a bus line; 0 for a single place. */
  readonly length: number;
  readonly vertical: boolean;
  /** Why nothing more may land here, or null. */
  readonly taken: string | null;
}

const REACH = 9;

/** Port to grab: seen on hover, on selection and while joining. A bus can be grabbed anywhere along its line. */
export function PortButton({ dot, shown, tabbable, onGrab, onChoose }: {
  dot: PortDot; shown: boolean; tabbable: boolean;
  onGrab: (dot: PortDot, event: React.PointerEvent) => void; onChoose: (dot: PortDot) => void;
}) {
  const width = REACH * 2 + (dot.vertical ? 0 : dot.length);
  const height = REACH * 2 + (dot.vertical ? dot.length : 0);
  return (
    <button
      type="button" tabIndex={tabbable ? 0 : -1} data-port={`${dot.ref.equipment}/${dot.ref.port}`} aria-label={dot.label} title={dot.taken ? `${dot.label}. ${dot.taken}` : dot.label}
      className={`nodrag nopan pointer-events-auto absolute z-10 grid cursor-crosshair place-items-center group-hover/node:opacity-100 focus-visible:opacity-100 ${shown ? "opacity-100" : "opacity-0"}`}
      style={{ left: dot.left - REACH, top: dot.top - REACH, width, height }}
      onPointerDown={(event) => onGrab(dot, event)}
      onKeyDown={(event) => { if (event.key === "Enter" || event.key.toLowerCase() === "j") { event.preventDefault(); event.stopPropagation(); onChoose(dot); } }}
    >
      {dot.length > 0
        ? <span className="block bg-copper" style={dot.vertical ? { width: 6, height: dot.length + 4 } : { height: 6, width: dot.length + 4 }} />
        : <span className={`block size-[7px] rounded-full border-[1.5px] border-copper ${dot.taken ? "bg-copper" : "bg-paper"}`} />}
    </button>
  );
}

/** Ring at the place where the circuit would land, or the reason why it may not. */
export function LandingMark({ landing, x, y }: { landing: Landing; x: number; y: number }) {
  return landing.reason
    ? <path d={`M${x - 6} ${y - 6}L${x + 6} ${y + 6}M${x + 6} ${y - 6}L${x - 6} ${y + 6}`} className="fill-none stroke-red" strokeWidth={2.4} />
    : <circle cx={x} cy={y} r={6} className="fill-paper stroke-copper" strokeWidth={2.6} />;
}
