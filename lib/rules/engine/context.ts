import type { DrawingGraph } from "@/lib/diagram/graph";
import { stateSpace, type StateSpace } from "@/lib/states";
import type { CheckContext } from "./types";

/** What rules and their shared readings ask for, over one drawing. States and `once` values are worked out on first use and kept. */
export function checkContext(graph: DrawingGraph, options: { states?: StateSpace } = {}): CheckContext {
  let space = options.states ?? null;
  const kept = new Map<string, unknown>();
  return {
    drawing: graph.drawing, graph, edition: graph.drawing.site.edition,
    states: () => (space ??= stateSpace(graph)),
    limit: (name) => { throw new RangeError(`no rule is running, so there is no limit ${name}`); },
    once: <T>(name: string, work: () => T): T => {
      if (!kept.has(name)) kept.set(name, work());
      return kept.get(name) as T;
    },
  };
}
