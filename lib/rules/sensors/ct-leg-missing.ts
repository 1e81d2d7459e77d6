import type { Sensor } from "@/lib/diagram/schema";
import { nextTag } from "@/lib/diagram/commands/tags";
import { NEVER_MUST_FIX, notCode } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule, Suggestion } from "@/lib/rules/engine/types";
import { circuitRef, found, nameOf, names, NOT_APPLICABLE, PASS, Reader, sensorRef } from "@/lib/rules/shared/outcome";
import { sensorPage } from "@/lib/rules/shared/sensors";

type Leg = NonNullable<Sensor["pole"]>;
const LEGS: readonly Leg[] = ["L1", "L2", "L3"];
/** Ungrounded legs of a circuit: those that both its terminals have. */
function legsOf({ drawing, graph }: CheckContext, id: string): readonly Leg[] {
  const circuit = drawing.circuits[id];
  if (!circuit || circuit.system !== "ac") return [];
  const [from, to] = [graph.port(circuit.from.equipment, circuit.from.port), graph.port(circuit.to.equipment, circuit.to.port)];
  return LEGS.filter((leg) => from?.poles.includes(leg) && to?.poles.includes(leg));
}
/** Sensors that measure one exchange; where a sensor measures a load or an output, those on one circuit. */
function pairs(context: CheckContext): ReadonlyMap<string, readonly string[]> {
  return context.once("legs that sensors cover", () => {
    const byKey = new Map<string, string[]>();
    for (const id of Object.keys(context.drawing.sensors).sort()) {
      const { purpose, reads, circuit } = context.drawing.sensors[id] as Sensor;
      const key = JSON.stringify([purpose, reads, purpose?.endsWith("exchange") ? "" : circuit]);
      byKey.set(key, [...(byKey.get(key) ?? []), id]);
    }
    return new Map([...byKey.values()].map((group) => [group[0] ?? "", group]));
  });
}
function missingLegs(context: CheckContext, group: readonly string[]): readonly Leg[] {
  const covered = new Set(group.map((id) => context.drawing.sensors[id]?.pole));
  return legsOf(context, context.drawing.sensors[group[0] ?? ""]?.circuit ?? "").filter((leg) => !covered.has(leg));
}

export const ctLegMissing: Rule = {
  meta: {
    id: "ct-leg-missing", group: "Metering and current sensors", severity: "must-fix", evidence: "derived",
    statement: "Every ungrounded leg of a measured circuit has a sensor, unless the instruction says that one sensor measures all of them.",
    risk: "The load of the other leg is not seen: the inverter exports or imports what it believes to be zero.",
    citations: notCode("manufacturer's instructions"), mustFixAllowed: NEVER_MUST_FIX, mustFixWith: "instruction", limits: {},
    reads: ["sensors.circuit", "sensors.pole", "sensors.purpose", "sensors.reads", "sensors.covers", "sensors.instruction", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: (context) => [...pairs(context).keys()].map(sensorRef),
  evaluate: (anchor, context): Outcome => {
    const group = pairs(context).get(anchor.id);
    const sensor = context.drawing.sensors[anchor.id];
    if (!group || !sensor || legsOf(context, sensor.circuit).length < 2) return NOT_APPLICABLE;
    const members = group.map((id) => [id, context.drawing.sensors[id] as Sensor] as const);
    if (members.some(([, one]) => one.covers === "all conductors")) return PASS;
    const missing = missingLegs(context, group);
    if (missing.length === 0) return PASS;
    const reader = new Reader(context);
    for (const [id, one] of members) {
      if (one.pole === null) reader.ask(sensorRef(id), "pole", "conductor that the sensor encloses");
      // Some products measure 240 V with one sensor: only the instruction tells.
      if (one.covers == null) reader.ask(sensorRef(id), "covers", "what one sensor measures by the instruction");
    }
    if (!reader.complete) return reader.outcome();
    const page = sensorPage(sensor);
    return found({
      variant: "leg-missing", anchor, field: "pole", related: [...group.slice(1).map(sensorRef), circuitRef(sensor.circuit)],
      message: `${names(context, group.map(sensorRef))} on ${nameOf(context, circuitRef(sensor.circuit))} measure${group.length === 1 ? "s" : ""} ${[...new Set(members.map(([, one]) => one.pole))].join(" and ")} alone; ${missing.join(" and ")} must have a sensor as well.`,
      steps: members.map(([id, one]) => ({ symbol: nameOf(context, sensorRef(id)), expression: "encloses", substituted: "", result: one.pole ?? "", unit: "", ...(page ? { citation: page } : {}) })),
      ...(page ? { instruction: page } : {}),
    });
  },
  suggest: ({ anchor }, context): readonly Suggestion[] => {
    const group = pairs(context).get(anchor.id) ?? [];
    const [leg] = missingLegs(context, group);
    const first = context.drawing.sensors[group[0] ?? ""];
    if (leg === undefined || !first || missingLegs(context, group).length > 1) return [];
    // Two sensors on one leg: one of them belongs to the other.
    const twice = group.find((id, i) => group.slice(0, i).some((other) => context.drawing.sensors[other]?.pole === context.drawing.sensors[id]?.pole));
    if (twice !== undefined) return [{ label: `Put ${nameOf(context, sensorRef(twice))} on ${leg}`, also: "", patches: [{ op: "replace", path: `/sensors/${twice}/pole`, value: leg }] }];
    let id = `${group[0]}-${leg.toLowerCase()}`.slice(-60);
    while (Object.hasOwn(context.drawing.sensors, id)) id = `${id}x`;
    const tag = nextTag(context.drawing, "CT-");
    return [{ label: `Add ${tag} on ${leg}`, also: "Its lead lands beside the first one's.", patches: [{ op: "add", path: `/sensors/${id}`, value: { ...first, tag, pole: leg } }] }];
  },
  examples: { violates: "One sensor on L1 of a 120/240 V feeder.", passes: "A sensor on L1 and one on L2." },
};
