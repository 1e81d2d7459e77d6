import type { Occupant } from "@/lib/diagram/graph";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { meetingRefs, meetings, type Meetings } from "@/lib/rules/shared/mixing";
import { circuitRef, found, nameOf, names, NOT_APPLICABLE, PASS, racewayRef, Reader } from "@/lib/rules/shared/outcome";
import { withoutRaceways } from "@/lib/rules/shared/reroute";
import { compact } from "@/lib/rules/shared/protection";
import { coldVoltageOf } from "@/lib/rules/shared/strings";

const cache = new WeakMap<CheckContext["graph"], Meetings>();
/** Highest voltage among the string circuits, for the insulation that the exception asks for. */
function highestV(context: CheckContext, first: readonly Occupant[]): number {
  return Math.max(600, ...first.map((one) => coldVoltageOf(context, one.circuit) ?? 600));
}
/** From 2020: all of one kind in jacketed multiconductor, MC or harness cable, insulated for the highest voltage. */
function excepted(context: CheckContext, first: readonly Occupant[], second: readonly Occupant[], reader: Reader): boolean | null {
  if (context.edition === "2017") return false;
  const needed = highestV(context, first);
  let unknown = false;
  for (const side of [first, second]) {
    const cables = side.filter((one) => one.cable?.class === "power");
    if (cables.length < side.length) continue;
    const missing = cables.filter((one) => one.cable?.voltageRatingV == null);
    for (const one of missing) reader.ask(circuitRef(one.circuit), `sections.${one.section}.cable.voltageRatingV`, `voltage rating of the cable of ${nameOf(context, circuitRef(one.circuit))}`);
    if (missing.length > 0) unknown = true;
    else if (cables.every((one) => (one.cable?.voltageRatingV ?? 0) >= needed)) return true;
  }
  return unknown ? null : false;
}
function look(context: CheckContext): Meetings {
  let known = cache.get(context.graph);
  if (!known) {
    // Grounds are no conductors of a system, and the control wires of the PV system may go along.
    known = meetings(context, (one) => one.system === "pv-dc" && one.role !== "equipment ground", (one) => (one.system === "ac" || one.system === "battery-dc") && one.role !== "equipment ground",
      (first, second, reader) => excepted(context, first, second, reader), () => true);
    cache.set(context.graph, known);
  }
  return known;
}

export const pvWithOtherSystems: Rule = {
  meta: {
    id: "pv-with-other-systems", group: "Raceways and separation", severity: "must-fix", evidence: "derived",
    statement: "PV dc conductors may not share a raceway, wireway or box with other power conductors unless a barrier parts them.",
    risk: "A fault puts array voltage on ac conductors, and a person who opened the ac side meets live dc.",
    citations: sameSection("690.31(B)", ["read", "read", "agreed"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.system", "circuits.sections.route", "circuits.sections.cable", "raceways.compartments"], absorbs: [],
  },
  subjects: ({ drawing }) => Object.keys(drawing.raceways).sort().map(racewayRef),
  evaluate: ({ id }, context) => {
    const { meetings: all, asked, judged } = look(context);
    const meeting = all.find((one) => one.anchor === id);
    if (!meeting) return asked.get(id) ?? (judged.has(id) ? PASS : NOT_APPLICABLE);
    const anchor = racewayRef(id);
    return found({
      variant: "mixed", anchor, related: meetingRefs(meeting),
      message: `${names(context, meeting.first.map(circuitRef))} (PV dc) lie${meeting.first.length === 1 ? "s" : ""} in ${names(context, meeting.raceways.map(racewayRef))} with ${names(context, meeting.second.map(circuitRef))}, with no barrier between them.`,
      steps: [...meeting.first, ...meeting.second].map((circuit) => ({ symbol: nameOf(context, circuitRef(circuit)), expression: "system", substituted: names(context, meeting.raceways.map(racewayRef)), result: context.drawing.circuits[circuit]?.system ?? "", unit: "" })),
    });
  },
  suggest: (finding, context) => {
    const meeting = look(context).meetings.find((one) => one.anchor === finding.anchor.id);
    return meeting ? compact([withoutRaceways(context, meeting.first, meeting.raceways, "Draw the way of the strings without it: a raceway of their own, or a divider over the full length.")]) : [];
  },
  examples: { violates: "Strings in the wireway that holds the 240 V feeders.", passes: "Strings in a wireway of their own." },
};
