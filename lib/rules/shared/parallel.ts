import { nodeKey } from "@/lib/diagram/graph";
import type { CheckContext } from "@/lib/rules/engine/types";
import { textOf } from "./outcome";
import { topology } from "./topology";

/**
 * Inverters that form one ac output together: they meet with every switch closed, in groups of two or more; ids in order.
 * Those that only follow another source's voltage are no units of such a group.
 */
export function parallelGroups(context: CheckContext): readonly (readonly string[])[] {
  return context.once("inverters in parallel", () => {
    const { drawing, graph } = context;
    const seen = new Set<string>();
    const groups: (readonly string[])[] = [];
    for (const id of Object.keys(drawing.equipment).sort()) {
      const { converter, follower } = graph.kind(id).capabilities;
      if (seen.has(id) || !converter || follower || !graph.port(id, "ac")) continue;
      const group = topology(graph).beyond(nodeKey(id, "ac"), null).converters.filter((each) => !graph.kind(each).capabilities.follower);
      for (const each of group) seen.add(each);
      if (group.length > 1) groups.push(group);
    }
    return groups;
  });
}
/** The group of an inverter that is the first of its group, so that a group is judged once. */
export const groupLedBy = (context: CheckContext, id: string): readonly string[] | null => parallelGroups(context).find((group) => group[0] === id) ?? null;
/** Maker's page on parallel operation, from whichever unit cites it; null: none does. */
export const parallelPage = (context: CheckContext, group: readonly string[]): string | null => group.map((each) => textOf(context, each, "parallelInstruction")).find((text) => text !== null) ?? null;
/** A finding's page, as a part of it. */
export const withPage = (page: string | null): { instruction?: string } => (page === null ? {} : { instruction: page });
/** What the instruction asks of a group, from the first unit that says it; null: none does. */
export const firstWords = (context: CheckContext, group: readonly string[], key: string): string | null => group.map((each) => textOf(context, each, key)).find((text) => text !== null) ?? null;
