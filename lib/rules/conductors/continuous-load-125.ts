import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { askTerminals, columnAmpacityA, deviceRatingA, terminalsOf, wireOf } from "@/lib/rules/shared/conductors";
import { carriedBy, carriedName } from "@/lib/rules/shared/currents";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { compact, comparison, largerConductor } from "@/lib/rules/shared/protection";
import { powerCircuits, topology } from "@/lib/rules/shared/topology";

const JUDGED = new Set(["pv", "inverter output", "load"]);
const ratingOf = (context: CheckContext, id: string): number | null => {
  const ratings = topology(context.graph).protectors(id).map((one) => deviceRatingA(context, one.device)).filter((value): value is number => value !== null);
  return ratings.length > 0 ? Math.max(...ratings) : null;
};

export const continuousLoad125: Rule = {
  meta: {
    id: "continuous-load-125", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "Conductors of a continuous source or load must carry 125 % of its current at the terminal column, before any correction.",
    risk: "Terminals run hot for hours, springs and screws lose force, and the joint burns.",
    citations: sections(["210.19(A)(1), 215.2(A)(1), 690.8(B)(1), 705.60(B)", "read"], ["210.19(A)(1), 215.2(A)(1), 690.8(B)(1), 705.28(B)(1)", "read"], ["210.19(A), 215.2(A)(1), 690.8(B)(1), 705.28(B)(1)", "read"]),
    mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.sections.ungrounded", "circuits.load", "circuits.from", "circuits.to", "equipment.props.continuousA", "equipment.props.shortCircuitA", "equipment.props.currentA", "equipment.props.continuous", "equipment.props.listedHundredPercent", "equipment.ports.terminal.temperatureC"],
    absorbs: ["derated-ampacity"],
  },
  subjects: ({ graph }) => powerCircuits(graph).map(circuitRef),
  evaluate: ({ id }, context) => {
    const reader = new Reader(context);
    const carried = carriedBy(context, id, reader);
    if (!carried || !JUDGED.has(carried.kind)) {
      // Storage and generator conductors follow their own sections; what is missing there is asked for there.
      return reader.complete || context.drawing.circuits[id]?.system === "battery-dc" || carried ? NOT_APPLICABLE : reader.outcome();
    }
    const needed = carried.required.detail.beforeFactorsA;
    const terminals = terminalsOf(context, id, ratingOf(context, id));
    for (const section of context.graph.sections(id)) {
      const wire = wireOf(context, id, section, reader);
      if (!wire || columnAmpacityA(wire, terminals.highest) >= needed - 1e-9) continue;
      if (terminals.unmarked.length > 0 && columnAmpacityA(wire, 90) >= needed - 1e-9) { askTerminals(context, reader, terminals); continue; }
      const anchor = circuitRef(id);
      const ampacityA = columnAmpacityA(wire, terminals.highest);
      return found({
        variant: "below-125", anchor, field: `sections.${section.id}.ungrounded.size`, related: carried.from.map(equipmentRef),
        message: `${nameOf(context, anchor)} is ${wire.size} ${wire.material}, ${ampacityA} A at ${terminals.highest} °C; ${carriedName(context, carried.from) || "its stated load"} asks for ${Math.round(needed * 100) / 100} A.`,
        steps: [...carried.required.steps, { symbol: "At", expression: `table, ${terminals.highest} °C terminal column`, substituted: `${wire.size} ${wire.material}`, result: ampacityA, unit: "A" }, comparison("A", needed, ampacityA, "A", false)],
      });
    }
    return reader.complete ? PASS : reader.outcome();
  },
  suggest: (finding, context) => {
    const { id } = finding.anchor;
    const carried = carriedBy(context, id, new Reader(context));
    if (!carried) return [];
    const { lowest } = terminalsOf(context, id, ratingOf(context, id));
    return compact([largerConductor(context, id, (_, wire) => columnAmpacityA(wire, lowest) >= carried.required.detail.beforeFactorsA, "Check the raceway fill, the terminals and the equipment grounding conductor.")]);
  },
  examples: { violates: "An inverter of 33.3 A on 10 AWG copper: 35 A is below 41.7 A.", passes: "The same inverter on 8 AWG copper, 50 A." },
};
