import type { Sensor } from "@/lib/diagram/schema";
import { NEVER_MUST_FIX, notCode } from "@/lib/rules/engine/meta";
import type { CheckContext, FindingDraft, Rule, Suggestion } from "@/lib/rules/engine/types";
import { circuitRef, found, nameOf, names, NOT_APPLICABLE, PASS, Reader, sensorRef } from "@/lib/rules/shared/outcome";
import { sensorsTogether as together } from "@/lib/rules/shared/sensors";
import { powerCircuits, topology, type Side } from "@/lib/rules/shared/topology";

type Purpose = NonNullable<Sensor["purpose"]>;
/** Where the arrow must point for a purpose, and what must lie on either side. Null: the maker's figure decides alone. */
function fits(context: CheckContext, purpose: Purpose, circuit: string): { toward: "from" | "to" | null; reason: string | null } {
  const { side } = topology(context.graph);
  const sides = { from: side(circuit, "from"), to: side(circuit, "to") } as const;
  const all = Object.keys(context.drawing.equipment).filter((id) => context.graph.kind(id).capabilities.converter);
  const toward = (test: (near: Side, far: Side) => boolean): "from" | "to" | null => (test(sides.from, sides.to) ? "from" : test(sides.to, sides.from) ? "to" : null);
  if (purpose === "interconnect exchange" || purpose === "whole-premises exchange") {
    const utility = toward((near) => near.utilities.length > 0);
    if (utility === null) return { toward: null, reason: "no utility lies on either side of it" };
    const inside = sides[utility === "from" ? "to" : "from"];
    if (!all.some((id) => inside.converters.includes(id))) return { toward: utility, reason: "no inverter lies beyond it, so it cannot see what is exported" };
    if (all.some((id) => sides[utility].converters.includes(id))) return { toward: utility, reason: "an inverter lies on its utility side and is not seen" };
    if (purpose === "whole-premises exchange" && sides[utility].loads.length > 0) return { toward: utility, reason: "loads lie on its utility side and are not seen" };
    return { toward: utility, reason: null };
  }
  if (purpose === "generator exchange") {
    const set = toward((near) => near.generators.length > 0 && near.utilities.length + near.converters.length + near.loads.length === 0);
    return set === null ? { toward: null, reason: "it does not lie between a generator and the bus" } : { toward: set, reason: null };
  }
  if (purpose === "inverter output") {
    const unit = toward((near, far) => near.converters.length > 0 && near.utilities.length === 0 && far.utilities.length + far.buses.length > 0);
    return unit === null ? { toward: null, reason: "no inverter lies on one side of it alone" } : { toward: null, reason: null };
  }
  return { toward: null, reason: null };
}

export const ctWrongSide: Rule = {
  meta: {
    id: "ct-wrong-side", group: "Metering and current sensors", severity: "must-fix", evidence: "derived",
    statement: "A current sensor sits where its purpose asks: exchange sensors between the utility and the point where every source joins, generator sensors between the set and the bus.",
    risk: "The inverter regulates on a current that says nothing: it exports where it must not, or feeds the generator.",
    citations: notCode("manufacturer's instructions"), mustFixAllowed: NEVER_MUST_FIX, mustFixWith: "instruction", limits: {},
    reads: ["sensors.circuit", "sensors.purpose", "sensors.arrow", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: (context) => Object.keys(context.drawing.sensors).sort().filter((id) => together(context, id)[0] === id).map(sensorRef),
  evaluate: (anchor, context) => {
    const sensor = context.drawing.sensors[anchor.id];
    if (!sensor || sensor.purpose === "load") return NOT_APPLICABLE;
    const reader = new Reader(context);
    const group = together(context, anchor.id).map(sensorRef);
    if (sensor.purpose === null) { for (const ref of group) reader.ask(ref, "purpose", "what the sensor measures"); return reader.outcome(); }
    const { toward, reason } = fits(context, sensor.purpose, sensor.circuit);
    const page = sensor.instruction ? `${sensor.instruction.document} p. ${sensor.instruction.page}` : null;
    const draft = (variant: string, message: string): FindingDraft => ({
      variant, anchor, field: "circuit", related: [...group.slice(1), circuitRef(sensor.circuit)], message,
      steps: [{ symbol: names(context, group), expression: sensor.purpose ?? "", substituted: `on ${nameOf(context, circuitRef(sensor.circuit))}`, result: reason ?? "arrow reversed", unit: "", ...(page ? { citation: page } : {}) }],
      ...(page ? { instruction: page } : {}),
    });
    if (reason !== null) return found(draft("wrong-place", `${names(context, group)} on ${nameOf(context, circuitRef(sensor.circuit))}: ${reason}.`));
    if (toward === null) return PASS;
    for (const ref of group) if (context.drawing.sensors[ref.id]?.arrow == null) reader.ask(ref, "arrow", "which way the arrow points");
    const reversed = group.filter((ref) => { const { arrow } = context.drawing.sensors[ref.id] ?? {}; return arrow && arrow !== toward; });
    if (reversed.length > 0) return found({ ...draft("reversed", `The arrow of ${names(context, reversed)} points away from the source it must point to.`), field: "arrow" });
    return reader.complete ? PASS : reader.outcome();
  },
  suggest: (finding, context) => {
    const sensor = context.drawing.sensors[finding.anchor.id];
    if (!sensor?.purpose) return [];
    const { purpose } = sensor;
    const group = together(context, finding.anchor.id);
    const move = (circuit: string, toward: "from" | "to" | null, label: string): Suggestion => {
      const run = context.drawing.circuits[circuit];
      const [a, b] = run?.points ?? [];
      // Off the middle, where the run's callout stands.
      const at = a && b ? { x: a.x + (b.x - a.x) * 0.75 - 1.5, y: a.y + (b.y - a.y) * 0.75 } : sensor.at;
      return {
        label, also: "", patches: group.flatMap((id) => [
          { op: "replace" as const, path: `/sensors/${id}/circuit`, value: circuit }, { op: "replace" as const, path: `/sensors/${id}/at`, value: at },
          ...(toward ? [{ op: "replace" as const, path: `/sensors/${id}/arrow`, value: toward }] : []),
        ]),
      };
    };
    if (finding.variant === "reversed") return [move(sensor.circuit, fits(context, purpose, sensor.circuit).toward, `Turn ${names(context, group.map(sensorRef))} around`)];
    // Nearest to the interconnection first: the run that holds the fewest loads ahead of the sources.
    const lawful = powerCircuits(context.graph).filter((id) => context.drawing.circuits[id]?.system === "ac" && fits(context, purpose, id).reason === null);
    const { side } = topology(context.graph);
    const best = lawful.toSorted((x, y) => side(x, "from").nodes.size - side(y, "from").nodes.size || (x < y ? -1 : 1)).at(-1);
    return best === undefined ? [] : [move(best, fits(context, purpose, best).toward, `Move ${names(context, group.map(sensorRef))} to ${nameOf(context, circuitRef(best))}`)];
  },
  examples: { violates: "Exchange sensors on the feeder of the loads.", passes: "Exchange sensors between the meter and the interconnect device, arrows to the utility." },
};
