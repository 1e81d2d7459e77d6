import type { DrawingGraph } from "@/lib/diagram/graph";
import { placePoint } from "@/lib/diagram/graph";
import type { Equipment, Point } from "@/lib/diagram/schema";
import type { Anchor } from "@/lib/sheets/primitives";

export interface OneLineOptions {
  /** `tags` is for small zooms: ratings go and tags grow, so that nothing is lettered too small to read. */
  detail?: "full" | "tags";
}

/** How a symbol stands in its outline, by symbol id. Coordinates are grid units from the equipment's origin. */
interface Body {
  outline: "solid" | "dashed" | null;
  symbolAt: Point;
}
const PLAIN: Body = { outline: null, symbolAt: { x: 0, y: 0 } };
const BODIES: Readonly<Record<string, Body>> = {
  generator: { outline: "dashed", symbolAt: { x: 3, y: 3.6 } },
  inverter: { outline: "solid", symbolAt: { x: 2.6, y: 2.3 } },
  switch: { outline: "solid", symbolAt: { x: 0, y: 0 } },
  fusedswitch: { outline: "solid", symbolAt: { x: 0, y: 0 } },
};
export const bodyOf = (symbol: string | null): Body => (symbol === null ? PLAIN : BODIES[symbol] ?? PLAIN);

export const symbolOf = (graph: DrawingGraph, id: string): string | null => graph.kind(id).symbol((graph.drawing.equipment[id] as Equipment).props as never);

export interface Box { x: number; y: number; width: number; height: number }
/** The equipment's box on the sheet in grid units, turned and mirrored as drawn. */
export function equipmentBox(graph: DrawingGraph, id: string): Box {
  const equipment = graph.drawing.equipment[id] as Equipment;
  const own = graph.kind(id).box;
  const width = equipment.size?.width ?? own.width;
  const height = equipment.size?.height ?? own.height;
  const a = placePoint(equipment, { x: own.x, y: own.y });
  const b = placePoint(equipment, { x: own.x + width, y: own.y + height });
  return { x: Math.min(a.x, b.x), y: Math.min(a.y, b.y), width: Math.abs(a.x - b.x), height: Math.abs(a.y - b.y) };
}

/** Integral parts are drawn by their parent's symbol; only a switch with poles of its own inside a converter is shown. */
const SHOWN_INTEGRAL: ReadonlySet<string> = new Set(["pvswitch"]);
export const isDrawn = (graph: DrawingGraph, id: string): boolean => {
  const equipment = graph.drawing.equipment[id] as Equipment;
  return equipment.offSheet !== true && (!equipment.integral || SHOWN_INTEGRAL.has(symbolOf(graph, id) ?? ""));
};

/** Where the tag stands and how the lines under it run. */
export interface Placement {
  x: number;
  y: number;
  anchor: Anchor;
  /** `beside`: first line right of the tag. `under`: lines below it. `over`: lines end above the symbol, tag on top. */
  lines: "beside" | "under" | "over";
  heading: boolean;
}
const at = (x: number, y: number, extra: Partial<Placement> = {}): Placement => ({ x, y, anchor: "start", lines: "under", heading: false, ...extra });
const BY_SYMBOL: Readonly<Record<string, Placement>> = {
  utility: at(2.5, 0.3),
  meter: at(2, -0.1),
  contactor: at(0.6, 2.2),
  generator: at(5.6, 2, { heading: true }),
  inverter: at(5.3, 2, { heading: true }),
  battery: at(0, 3.15, { anchor: "middle" }),
  pv: at(0, -0.6, { anchor: "middle", lines: "over" }),
  pvswitch: at(-1.9, -0.35),
  load: at(0, -3.2, { anchor: "middle", lines: "over" }),
  motor: at(0, 2.5, { anchor: "middle" }),
  rod: at(1.3, 1.4),
  ground: at(1.3, 1.4),
  spd: at(1.3, 3.4),
  estop: at(1.5, 0.3),
};
/** Place of the tag where the drawing does not say one, by symbol, turn and size. */
export function defaultPlacement(graph: DrawingGraph, id: string): Placement {
  const equipment = graph.drawing.equipment[id] as Equipment;
  const symbol = symbolOf(graph, id);
  if (symbol === null) {
    const box = equipmentBox(graph, id);
    return box.width < 7 || box.height < 5 ? at(0, box.height + 1.3) : at(0.8, 1.7, { heading: true });
  }
  const upright = equipment.rotation === 90 || equipment.rotation === 270;
  if (symbol === "switch" || symbol === "fusedswitch") {
    const box = equipmentBox(graph, id);
    return upright
      ? at(box.x + box.width + 0.5 - equipment.at.x, box.y + 1.4 - equipment.at.y, { heading: true })
      : at(box.x - equipment.at.x, box.y - 0.6 - equipment.at.y, { heading: true, lines: "over" });
  }
  const named = BY_SYMBOL[symbol];
  if (named && !(upright && symbol === "contactor")) return named;
  const down = equipment.rotation === 90 ? 1 : -1;
  if (upright) return at(1.7, down * 1.5 - (down < 0 ? 0.6 : 0) + 0.2);
  const branch = equipment.props["position"] !== "main";
  const left = equipment.rotation === 180 || equipment.mirrored ? -3 : 0;
  // A branch letters its tag and rating in one line, under its circuit's bubble.
  return at(branch ? left - 0.9 : left, branch ? 1.72 : 2.2, { lines: branch ? "beside" : "under" });
}

/** Letters behind the tag that say what happens to the part; new work carries none. */
export const STATUS_MARK: Readonly<Record<Equipment["status"], string>> = { new: "", existing: " (E)", relocated: " (R)", removed: " (D)" };
