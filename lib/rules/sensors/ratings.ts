import { shown } from "@/lib/calc";
import type { Sensor } from "@/lib/diagram/schema";
import { NEVER_MUST_FIX, notCode } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { ratingRule } from "@/lib/rules/families/rating";
import { deviceRatingA } from "@/lib/rules/shared/conductors";
import { circuitRef, equipmentRef, found, nameOf, names, PASS, propertyLabel, Reader, sensorRef } from "@/lib/rules/shared/outcome";
import { leadingSensors, sensorPage, sensorsTogether } from "@/lib/rules/shared/sensors";
import { topology } from "@/lib/rules/shared/topology";

const sensorOf = (context: CheckContext, id: string): Sensor => context.drawing.sensors[id] as Sensor;

/** Smallest device in series with the circuit: what can flow for long. Null: none, or its rating is asked for. */
function flowsA(context: CheckContext, circuit: string, reader: Reader): { amperes: number; device: string } | null {
  const { protectors, ratingField } = topology(context.graph);
  const devices = [...new Set(protectors(circuit).map((one) => one.device))].map((device) => ({ device, amperes: deviceRatingA(context, device) }));
  for (const { device, amperes } of devices) {
    const field = ratingField(device) ?? "ratingA";
    if (amperes === null) reader.ask(equipmentRef(device), `props.${field}`, propertyLabel(context, device, field));
  }
  return devices.filter((one): one is { device: string; amperes: number } => one.amperes !== null).sort((a, b) => a.amperes - b.amperes)[0] ?? null;
}

export const ctRating: Rule = {
  meta: {
    id: "ct-rating", group: "Metering and current sensors", severity: "should-fix", evidence: "rated",
    statement: "A sensor is rated for the current of the conductor it encloses, and the ratio set in the instrument is the sensor's own.",
    risk: "A small sensor saturates and reads low at the top of the load; a wrong ratio scales every reading.",
    citations: notCode("manufacturer's instructions"), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["sensors.ratingA", "sensors.settingA", "sensors.circuit", "equipment.props.ratingA", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: (context) => leadingSensors(context).map(sensorRef),
  evaluate: (anchor, context): Outcome | readonly Outcome[] => {
    const group = sensorsTogether(context, anchor.id);
    const { circuit } = sensorOf(context, anchor.id);
    const reader = new Reader(context);
    const flows = flowsA(context, circuit, reader);
    const outcomes: Outcome[] = [];
    for (const id of group) if (sensorOf(context, id).ratingA === null) reader.ask(sensorRef(id), "ratingA", "primary rating of the sensor");
    const small = group.filter((id) => { const { ratingA } = sensorOf(context, id); return flows !== null && ratingA !== null && ratingA < flows.amperes - 1e-9; });
    if (small.length > 0 && flows) {
      outcomes.push(found({
        variant: "below-current", anchor: sensorRef(small[0] ?? anchor.id), field: "ratingA", related: [...small.slice(1).map(sensorRef), circuitRef(circuit), equipmentRef(flows.device)],
        message: `${names(context, small.map(sensorRef))}: ${shown(sensorOf(context, small[0] ?? "").ratingA ?? 0)} A on ${nameOf(context, circuitRef(circuit))}, which ${nameOf(context, equipmentRef(flows.device))} protects at ${shown(flows.amperes)} A. The sensor should be rated for that current.`,
        steps: small.map((id) => ({ symbol: nameOf(context, sensorRef(id)), expression: "rating not below the device", substituted: `${shown(sensorOf(context, id).ratingA ?? 0)} A ≥ ${shown(flows.amperes)} A`, result: "fails", unit: "" })),
      }));
    }
    // What no instrument reads has no setting.
    for (const id of group) if (sensorOf(context, id).reads !== null && sensorOf(context, id).settingA == null) reader.ask(sensorRef(id), "settingA", "primary rating as set in the instrument");
    const odd = group.filter((id) => { const { ratingA, settingA, reads } = sensorOf(context, id); return reads !== null && ratingA !== null && settingA != null && settingA !== ratingA; });
    if (odd.length > 0) {
      const { settingA, ratingA } = sensorOf(context, odd[0] ?? "");
      outcomes.push(found({
        variant: "setting-unequal", anchor: sensorRef(odd[0] ?? anchor.id), field: "settingA", related: odd.slice(1).map(sensorRef),
        message: `${names(context, odd.map(sensorRef))}: the instrument is set to ${shown(settingA ?? 0)} A, the sensor is ${shown(ratingA ?? 0)} A. Both should be equal.`, steps: [],
      }));
    }
    if (!reader.complete) outcomes.push(reader.outcome());
    return outcomes.length > 0 ? outcomes : PASS;
  },
  suggest: (finding, context) => {
    const ids = [finding.anchor.id, ...finding.related.filter((ref) => ref.collection === "sensors").map((ref) => ref.id)];
    return finding.variant === "setting-unequal"
      ? [{ label: `Set the instrument to ${shown(sensorOf(context, finding.anchor.id).ratingA ?? 0)} A`, also: "", patches: ids.map((id) => ({ op: "add" as const, path: `/sensors/${id}/settingA`, value: sensorOf(context, id).ratingA })) }]
      : [];
  },
  examples: { violates: "A 100 A sensor on a feeder of 125 A.", passes: "A 200 A sensor there, set as 200 A." },
};

/** Length of the lead: that of the circuit drawn for it, or the stated one. */
function leadFt(context: CheckContext, sensor: Sensor): number | null {
  if (!sensor.lead || !context.drawing.circuits[sensor.lead]) return sensor.leadLengthFt ?? null;
  return context.graph.sections(sensor.lead).reduce<number | null>((sum, section) => (sum === null || section.lengthFt === null ? null : sum + section.lengthFt), 0);
}
export const ctSpliceLength: Rule = ratingRule({
  meta: {
    id: "ct-splice-length", group: "Metering and current sensors", severity: "advice", evidence: "rated",
    statement: "The lead of a sensor is no longer than the maker allows; an extension is a twisted pair.",
    risk: "A long lead weakens and disturbs the small signal: the reading drifts.",
    citations: notCode("manufacturer's instructions"), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["sensors.lead", "sensors.leadLengthFt", "sensors.leadLimitFt", "circuits.sections.lengthFt"], absorbs: [],
  },
  variant: "too-long", unit: "ft", bound: "most", name: "lead", subjects: (context) => leadingSensors(context).map(sensorRef),
  demand: ({ id }, context, reader) => {
    const sensor = sensorOf(context, id);
    if (sensor.leadLimitFt === null) reader.ask(sensorRef(id), "leadLimitFt", "longest lead that the maker allows");
    return sensor.leadLimitFt === null ? null : { value: sensor.leadLimitFt, words: "the maker allows", related: [...sensorsTogether(context, id).slice(1).map(sensorRef), ...(sensor.lead ? [circuitRef(sensor.lead)] : [])] };
  },
  rating: ({ id }, context) => {
    const sensor = sensorOf(context, id);
    const section = sensor.lead && context.drawing.circuits[sensor.lead] ? context.graph.sections(sensor.lead).find((one) => one.lengthFt === null) : undefined;
    return section && sensor.lead
      ? { value: null, field: `sections.${section.id}.lengthFt`, label: `length of ${nameOf(context, circuitRef(sensor.lead))}`, ref: circuitRef(sensor.lead) }
      : { value: leadFt(context, sensor), field: "lead", label: "the cable that is its lead, or the length of its lead inside the enclosure" };
  },
  instruction: ({ id }, context) => sensorPage(sensorOf(context, id)),
  examples: { violates: "120 ft where the maker allows 33 ft.", passes: "16 ft of shielded twisted pair." },
});
