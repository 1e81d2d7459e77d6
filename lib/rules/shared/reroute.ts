import type { CheckContext, PatchOperation, Suggestion } from "@/lib/rules/engine/types";
import { circuitRef, names, racewayRef } from "./outcome";

/** Takes circuits out of raceways they may not lie in. The rest of their way stays as drawn. */
export function withoutRaceways(context: CheckContext, circuits: readonly string[], raceways: readonly string[], also: string): Suggestion | null {
  const patches = circuits.flatMap((id) => context.graph.sections(id).flatMap((section): PatchOperation[] => {
    const route = section.route.filter((step) => !raceways.includes(step.raceway));
    return route.length === section.route.length ? [] : [{ op: "replace", path: `/circuits/${id}/sections/${section.id}/route`, value: route }];
  }));
  return patches.length === 0 ? null : { label: `Take ${names(context, circuits.map(circuitRef))} out of ${names(context, raceways.map(racewayRef))}`, also, patches };
}
