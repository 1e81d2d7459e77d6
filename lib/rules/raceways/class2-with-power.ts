import type { Occupant } from "@/lib/diagram/graph";
import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { meetingRefs, meetings, type Meetings } from "@/lib/rules/shared/mixing";
import { circuitRef, found, nameOf, names, NOT_APPLICABLE, PASS, racewayRef } from "@/lib/rules/shared/outcome";
import { compact } from "@/lib/rules/shared/protection";
import { withoutRaceways } from "@/lib/rules/shared/reroute";

const limited = (one: Occupant): boolean => one.cable !== null && one.system === "data" && one.cable.class !== "class 1" && one.cable.class !== "power";
const power = (one: Occupant): boolean => one.role !== "equipment ground" && (one.system === "ac" || one.system === "pv-dc" || one.system === "battery-dc" || one.cable?.class === "power" || one.cable?.class === "class 1");

const cache = new WeakMap<CheckContext["graph"], { raceways: Meetings; boxes: Meetings }>();
function look(context: CheckContext): { raceways: Meetings; boxes: Meetings } {
  let known = cache.get(context.graph);
  if (!known) {
    const isBox = (id: string): boolean => context.drawing.raceways[id]?.kind === "box";
    // Reclassified and wired as Class 1 it may go with power; while the class is not known, it is asked for.
    const judge = (pick: (id: string) => boolean): Meetings => meetings(context, limited, power, (first, _, reader) => {
      const unknown = first.filter((one) => one.cable?.class == null);
      for (const one of unknown) reader.ask(circuitRef(one.circuit), `sections.${one.section}.cable.class`, `class of the cable of ${nameOf(context, circuitRef(one.circuit))}`);
      return unknown.length === first.length ? null : false;
    }, pick);
    known = { raceways: judge((id) => !isBox(id)), boxes: judge(isBox) };
    cache.set(context.graph, known);
  }
  return known;
}

export const class2WithPower: Rule = {
  meta: {
    id: "class2-with-power", group: "Raceways and separation", severity: "must-fix", evidence: "derived",
    statement: "Class 2 and 3 conductors may not share a raceway, cable or enclosure with power conductors unless a barrier or a listed permission parts them.",
    risk: "A damaged power conductor puts line voltage on data wiring that people touch.",
    citations: sections(["725.136(A)", "read"], ["725.136(A)", "agreed"], ["725.136(A)", "agreed"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.system", "circuits.sections.cable.class", "circuits.sections.route", "raceways.compartments", "raceways.kind"], absorbs: ["ct-in-power-raceway"],
  },
  subjects: ({ drawing }) => Object.keys(drawing.raceways).sort().map(racewayRef),
  evaluate: ({ id }, context): Outcome => {
    const all = look(context);
    const isBox = context.drawing.raceways[id]?.kind === "box";
    const { meetings: list, asked, judged } = isBox ? all.boxes : all.raceways;
    const meeting = list.find((one) => one.anchor === id);
    if (!meeting) return asked.get(id) ?? (judged.has(id) ? PASS : NOT_APPLICABLE);
    return found({
      variant: isBox ? "in-box" : "in-raceway", anchor: racewayRef(id), related: meetingRefs(meeting),
      // In a box 1/4 in of separation would do; the drawing does not record it.
      ...(isBox ? { severity: "should-fix" as const } : {}),
      message: `${names(context, meeting.first.map(circuitRef))} (Class 2) lie${meeting.first.length === 1 ? "s" : ""} in ${names(context, meeting.raceways.map(racewayRef))} with power: ${names(context, meeting.second.map(circuitRef))}.${isBox ? " Keep 1/4 in or a barrier between them." : ""}`,
      steps: meeting.raceways.map((raceway) => ({ symbol: nameOf(context, racewayRef(raceway)), expression: "data and power together", substituted: names(context, meeting.first.map(circuitRef)), result: names(context, meeting.second.map(circuitRef)), unit: "" })),
    });
  },
  suggest: (finding, context) => {
    const all = look(context);
    const meeting = [...all.raceways.meetings, ...all.boxes.meetings].find((one) => one.anchor === finding.anchor.id);
    return meeting && finding.variant === "in-raceway" ? compact([withoutRaceways(context, meeting.first, meeting.raceways, "Draw a raceway of its own for the data cable, 3/4 in for example.")]) : [];
  },
  examples: { violates: "The battery's data cable in the inverter's ac nipple.", passes: "A nipple of its own for the data cable." },
};
