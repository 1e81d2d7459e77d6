import type { DrawingGraph } from "@/lib/diagram/graph";
import { FieldError } from "@/lib/units";

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
