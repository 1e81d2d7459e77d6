import type { Occupant } from "@/lib/diagram/graph";
import { NEVER_MUST_FIX, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { serviceVolts } from "@/lib/rules/shared/faultCurrent";
import { meetingRefs, meetings, type Meetings } from "@/lib/rules/shared/mixing";
import { circuitRef, found, nameOf, names, NOT_APPLICABLE, numberOf, PASS, racewayRef, type Reader, sensorRef } from "@/lib/rules/shared/outcome";
import { compact } from "@/lib/rules/shared/protection";
import { withoutRaceways } from "@/lib/rules/shared/reroute";
import { coldVoltageOf } from "@/lib/rules/shared/strings";
import { topology } from "@/lib/rules/shared/topology";

/** Voltage that power conductors put up at most; of what is not known, the class of their insulation, 600 V. */
function voltsOf(context: CheckContext, circuit: string): number {
  const system = context.drawing.circuits[circuit]?.system;
  if (system === "ac") return serviceVolts(context) ?? 600;
  if (system === "pv-dc") return coldVoltageOf(context, circuit) ?? 600;
  const { side } = topology(context.graph);
  const packs = [...side(circuit, "from").batteries, ...side(circuit, "to").batteries].map((id) => numberOf(context, id, "mostV"));
  return packs.length === 0 || packs.includes(null) ? 600 : Math.max(...packs.filter((each) => each !== null));
}
/** Leads insulated for the power beside them, and not wired as Class 2, may lie with it. Null: not known yet. */
function mayShare(context: CheckContext, leads: readonly Occupant[], power: readonly Occupant[], reader: Reader): boolean | null {
  let open = false;
  for (const lead of leads) {
    const field = `sections.${lead.section}.cable`;
    const name = nameOf(context, circuitRef(lead.circuit));
    if (lead.cable?.class == null) { reader.ask(circuitRef(lead.circuit), `${field}.class`, `class of the cable of ${name}`); open = true; continue; }
    if (lead.cable.class === "class 2" || lead.cable.class === "class 3") return false;
    const { voltageRatingV } = lead.cable;
    if (voltageRatingV === null) { reader.ask(circuitRef(lead.circuit), `${field}.voltageRatingV`, `voltage rating of the cable of ${name}`); open = true; continue; }
    if (power.some((one) => voltsOf(context, one.circuit) > voltageRatingV + 1e-9)) return false;
  }
  return open ? null : true;
}
const leadsOf = (context: CheckContext): ReadonlySet<string> => context.once("leads of sensors", () => new Set(Object.values(context.drawing.sensors).flatMap((one) => one.lead ?? [])));
const look = (context: CheckContext): Meetings => context.once("leads of sensors beside power", () => {
  const leads = leadsOf(context);
  const power = (one: Occupant): boolean => one.role !== "equipment ground" && (one.system === "ac" || one.system === "pv-dc" || one.system === "battery-dc");
  if (leads.size === 0) return { meetings: [], asked: new Map(), judged: new Set() };
  return meetings(context, (one) => one.cable !== null && leads.has(one.circuit), power, (first, second, reader) => mayShare(context, first, second, reader), (id) => context.drawing.raceways[id]?.kind !== "box");
});

export const ctInPowerRaceway: Rule = {
  meta: {
    id: "ct-in-power-raceway", group: "Metering and current sensors", severity: "should-fix", evidence: "derived",
    statement: "The lead of a current sensor runs apart from power conductors, unless it is no Class 2 circuit and insulated for their voltage.",
    risk: "A damaged power conductor puts line voltage on the sensor input; the current beside it falsifies the reading.",
    citations: sections(["725.136", "unconfirmed"], ["725.136", "unconfirmed"], ["725.136", "unconfirmed"]), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["sensors.lead", "sensors.leadLengthFt", "circuits.sections.cable.class", "circuits.sections.cable.voltageRatingV", "circuits.sections.route", "raceways.compartments"], absorbs: [],
  },
  subjects: (context) => [
    ...Object.keys(context.drawing.sensors).sort().filter((id) => !context.drawing.sensors[id]?.lead).map(sensorRef),
    ...[...look(context).judged].sort().map(racewayRef),
  ],
  evaluate: (anchor, context): Outcome => {
    if (anchor.collection === "sensors") {
      // A lead that is drawn nowhere and has a length lies inside the enclosure.
      return context.drawing.sensors[anchor.id]?.leadLengthFt == null ? { outcome: "needs-data", fields: [{ ref: anchor, field: "lead", label: "the cable that is its lead, or the length of its lead inside the enclosure" }] } : NOT_APPLICABLE;
    }
    const { meetings: list, asked } = look(context);
    const meeting = list.find((one) => one.anchor === anchor.id);
    if (!meeting) return asked.get(anchor.id) ?? PASS;
    return found({
      variant: "with-power", anchor, related: meetingRefs(meeting),
      message: `${names(context, meeting.first.map(circuitRef))}, the lead of a current sensor, lies in ${names(context, meeting.raceways.map(racewayRef))} with power: ${names(context, meeting.second.map(circuitRef))}. It should run apart.`,
      steps: meeting.raceways.map((raceway) => ({ symbol: nameOf(context, racewayRef(raceway)), expression: "lead and power together", substituted: names(context, meeting.first.map(circuitRef)), result: names(context, meeting.second.map(circuitRef)), unit: "" })),
    });
  },
  suggest: ({ anchor }, context) => {
    const meeting = look(context).meetings.find((one) => one.anchor === anchor.id);
    return meeting ? compact([withoutRaceways(context, meeting.first, meeting.raceways, "Draw a raceway of its own for the lead.")]) : [];
  },
  examples: { violates: "A Class 2 sensor lead in the feeder's conduit, or a lead of 150 V there at 240 V.", passes: "A conduit of its own, or a lead of 600 V that is not Class 2." },
};
