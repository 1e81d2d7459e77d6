import { racewayFill, type FilledRaceway, type RacewayFillDetail } from "@/lib/calc";
import { RACEWAY_KINDS } from "@/lib/code";
import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Raceway } from "@/lib/diagram/schema";
import { currentCarrying } from "@/lib/rules/shared/conductors";
import { Reader } from "@/lib/rules/shared/outcome";
import { fillItemsOf, isSleeve, racewayLengthFt } from "@/lib/rules/shared/raceways";
import { parseTradeSize } from "@/lib/units";
import { checkContext } from "@/lib/rules/engine/context";
import { attempt, perGraph } from "./context";

/** Fill and number of current-carrying conductors of a raceway. Null is not known, or has no meaning for it. */
export interface RacewayFigures {
  usedIn2: number | null;
  fillPct: number | null;
  limitPct: number | null;
  roomLeftIn2: number | null;
  currentCarrying: number | null;
}
const NOTHING: RacewayFigures = { usedIn2: null, fillPct: null, limitPct: null, roomLeftIn2: null, currentCarrying: null };

function body(raceway: Raceway): FilledRaceway | null {
  if (raceway.kind === "wireway") {
    if (raceway.widthIn === null || raceway.heightIn === null) return null;
    return { kind: raceway.metal === false ? "nonmetallic wireway" : "metal wireway", widthIn: raceway.widthIn, heightIn: raceway.heightIn };
  }
  const kind = RACEWAY_KINDS.find((each) => each === raceway.type);
  const lengthFt = racewayLengthFt(raceway);
  return raceway.kind === "box" || !kind || raceway.tradeSize === null || lengthFt === null || lengthFt <= 0
    ? null : { kind, tradeSize: parseTradeSize(raceway.tradeSize), lengthIn: lengthFt * 12 };
}

const cacheOf = perGraph((graph) => ({ context: checkContext(graph), known: new Map<string, RacewayFigures>() }));

/** Figures of a raceway, worked out once a drawing. Nothing is claimed about the fill while the size of one conductor in it is missing. */
export function racewayFigures(graph: DrawingGraph, id: string): RacewayFigures {
  const { context, known } = cacheOf(graph);
  const found = known.get(id);
  if (found) return found;
  const raceway = graph.drawing.raceways[id];
  const figures = raceway && graph.occupants(id).length > 0 ? work() : NOTHING;
  known.set(id, figures);
  return figures;

  function work(): RacewayFigures {
    const reader = new Reader(context);
    const items = fillItemsOf(context, id, reader);
    const shape = body(raceway as Raceway);
    const fill = shape && reader.complete && items.length > 0 && !isSleeve(graph, id) ? attempt((): { value: number; detail: RacewayFillDetail } => racewayFill({ edition: context.edition, raceway: shape, items })) : null;
    return {
      usedIn2: fill?.detail.usedIn2 ?? null, fillPct: fill?.value ?? null, limitPct: fill?.detail.limitPct ?? null, roomLeftIn2: fill?.detail.roomLeftIn2 ?? null,
      currentCarrying: raceway?.kind === "box" ? null : mostCarrying(),
    };
  }
  /** Fullest compartment, since each is judged by itself. */
  function mostCarrying(): number {
    const compartments = Object.keys(raceway?.compartments ?? {});
    return Math.max(...(compartments.length > 1 ? compartments.map((each) => currentCarrying(context, id, each)) : [currentCarrying(context, id)]));
  }
}
