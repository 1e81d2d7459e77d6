import type { Circuit } from "@/lib/diagram/schema";
import type { CheckContext } from "@/lib/rules/engine/types";
import { powerCircuits } from "./topology";

/** Field circuits joined at both ends to the same terminals, so that they act as one; ids in order, groups of two or more. */
export function parallelRuns(context: CheckContext): readonly (readonly string[])[] {
  return context.once("circuits in parallel", () => {
    const groups = new Map<string, string[]>();
    for (const id of powerCircuits(context.graph)) {
      const { from, to } = context.drawing.circuits[id] as Circuit;
      const key = [`${from.equipment}/${from.port}`, `${to.equipment}/${to.port}`].sort().join(" ");
      const group = groups.get(key);
      if (group) group.push(id);
      else groups.set(key, [id]);
    }
    return [...groups.values()].filter((group) => group.length > 1);
  });
}
