import type { CheckContext } from "@/lib/rules/engine/types";
import { topology } from "./topology";

/** Inverters whose ac outputs meet with every switch closed, in groups of two or more; ids in order. */
export function parallelGroups(context: CheckContext): readonly (readonly string[])[] {
  const { drawing, graph } = context;
  const seen = new Set<string>();
  const groups: (readonly string[])[] = [];
  for (const id of Object.keys(drawing.equipment).sort()) {
    if (seen.has(id) || !graph.kind(id).capabilities.converter) continue;
    const group = topology(graph).beyond(`${id}/ac`, null).converters;
    for (const each of group) seen.add(each);
    if (group.length > 1) groups.push(group);
  }
  return groups;
}
/** The group of an inverter that is the first of its group, so that a group is judged once. */
export const groupLedBy = (context: CheckContext, id: string): readonly string[] | null => parallelGroups(context).find((group) => group[0] === id) ?? null;
