import type { Occupant } from "@/lib/diagram/graph";
import type { ElementRef } from "@/lib/diagram/schema";
import type { CheckContext, Outcome } from "@/lib/rules/engine/types";
import { circuitRef, nameOf, racewayRef, Reader } from "./outcome";
import { circuitsIn, sharedPaths } from "./raceways";

/** Two kinds of conductors that meet in raceways, one entry for each path on which the same circuits do. */
export interface Meeting { anchor: string; raceways: readonly string[]; first: readonly string[]; second: readonly string[] }
export interface Meetings { meetings: readonly Meeting[]; asked: ReadonlyMap<string, Outcome>; judged: ReadonlySet<string> }

/**
 * Finds where conductors of two kinds lie in one raceway without a divider between them.
 * `barred` says that a pair may lie together, or null while a value is missing, which it asks the reader for.
 */
export function meetings(context: CheckContext, isFirst: (one: Occupant) => boolean | null, isSecond: (one: Occupant) => boolean, mayShare: (first: readonly Occupant[], second: readonly Occupant[], reader: Reader) => boolean | null, pick: (raceway: string) => boolean): Meetings {
  const mixed = new Map<string, readonly string[]>();
  const others = new Map<string, readonly string[]>();
  const asked = new Map<string, Outcome>();
  const judged = new Set<string>();
  for (const id of Object.keys(context.drawing.raceways).sort().filter(pick)) {
    const occupants = context.graph.occupants(id);
    if (!occupants.some((one) => isFirst(one) !== false)) continue;
    judged.add(id);
    const reader = new Reader(context);
    const divided = Object.keys(context.drawing.raceways[id]?.compartments ?? {}).length > 1;
    const groups = divided ? byCompartment(occupants) : new Map([["", occupants]]);
    for (const [compartment, group] of groups) {
      const first = group.filter((one) => isFirst(one) !== false);
      const second = group.filter((one) => isSecond(one) && !first.includes(one));
      if (divided && compartment === "" && first.length + second.length > 0 && groups.size > 1) {
        for (const circuit of circuitsIn([...first, ...second])) askCompartment(context, reader, circuit, id);
        continue;
      }
      if (first.length === 0 || second.length === 0) continue;
      const share = mayShare(first, second, reader);
      if (share !== false) continue;
      mixed.set(id, [...new Set([...(mixed.get(id) ?? []), ...circuitsIn(first)])]);
      others.set(id, [...new Set([...(others.get(id) ?? []), ...circuitsIn(second)])]);
    }
    if (!reader.complete) asked.set(id, reader.outcome());
  }
  return {
    asked, judged,
    meetings: sharedPaths(context.graph, mixed).map((path) => ({
      anchor: path.anchor, raceways: path.raceways, first: path.circuits,
      second: [...new Set(path.raceways.flatMap((id) => others.get(id) ?? []))].sort(),
    })),
  };
}
function askCompartment(context: CheckContext, reader: Reader, circuit: string, raceway: string): void {
  for (const section of context.graph.sections(circuit)) {
    section.route.forEach((step, i) => {
      if (step.raceway === raceway && step.compartment === null) reader.ask(circuitRef(circuit), `sections.${section.id}.route.${i}.compartment`, `compartment of ${nameOf(context, racewayRef(raceway))} for ${nameOf(context, circuitRef(circuit))}`);
    });
  }
}
function byCompartment(occupants: readonly Occupant[]): ReadonlyMap<string, readonly Occupant[]> {
  const map = new Map<string, Occupant[]>();
  for (const one of occupants) map.set(one.compartment ?? "", [...(map.get(one.compartment ?? "") ?? []), one]);
  return map;
}

export const meetingRefs = (meeting: Meeting): readonly ElementRef[] => [...meeting.raceways.filter((id) => id !== meeting.anchor).map(racewayRef), ...meeting.first.map(circuitRef), ...meeting.second.map(circuitRef)];
