import type { DrawingGraph } from "@/lib/diagram/graph";
import type { CheckContext } from "@/lib/rules/engine/types";
import { stateSpace, type StateSpace } from "@/lib/states";
import { FieldError } from "@/lib/units";

/** What the shared readings of the rules ask for; schedules run no rule, so there is no limit to ask. */
export function readingContext(graph: DrawingGraph): CheckContext {
  let space: StateSpace | null = null;
  return {
    drawing: graph.drawing, graph, edition: graph.drawing.site.edition, states: () => (space ??= stateSpace(graph)),
    limit: (name) => { throw new RangeError(`a schedule has no limit ${name}`); },
  };
}

/** A figure, or null where data are missing or a table holds no value: the cell then stays empty and a finding says why. */
export function attempt<T>(work: () => T | null): T | null {
  try {
    return work();
  } catch (error) {
    if (error instanceof FieldError) return null;
    throw error;
  }
}

/** Keeps one result for each drawing graph, since a graph never changes. */
export function perGraph<T>(build: (graph: DrawingGraph) => T): (graph: DrawingGraph) => T {
  const cache = new WeakMap<DrawingGraph, T>();
  return (graph) => {
    let known = cache.get(graph);
    if (known === undefined) { known = build(graph); cache.set(graph, known); }
    return known;
  };
}
