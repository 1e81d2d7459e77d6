import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { Outcome, Rule } from "@/lib/rules/engine/types";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, numberOf, PASS, propertyLabel, Reader, textOf } from "@/lib/rules/shared/outcome";
import { deviceSides } from "@/lib/rules/shared/devices";

export const commonTripMultipole: Rule = {
  meta: {
    id: "common-trip-multipole", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "A device opens all ungrounded conductors of its circuit together: by common trip, by a gang switch, or by identified handle ties where only loads are fed on a grounded 120/240 V system.",
    risk: "One pole stays live while the other has tripped; a source goes on feeding through the load.",
    citations: sections(["240.15(B), 210.4(B), 705.22(6)", "read"], ["240.15(B), 210.4(B), 705.20", "read"], ["240.15(B), 210.4(B), 705.20", "read"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.poles", "equipment.props.poleJoin", "circuits.sections.ungrounded.count", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: ({ drawing, graph }) => Object.keys(drawing.equipment).sort().filter((id) => {
    const { switching, overcurrent } = graph.kind(id).capabilities;
    return (switching === "breaker" || switching === "switch" || overcurrent === true) && graph.port(id, "line")?.system === "ac" && Object.hasOwn(graph.kind(id).properties, "poles");
  }).map(equipmentRef),
  evaluate: (anchor, context): Outcome => {
    const { id } = anchor;
    const circuits = context.graph.circuitsAt(id).filter((circuit) => context.drawing.circuits[circuit]?.wiring === "field");
    const widest = circuits.map((circuit) => ({ circuit, count: Math.max(0, ...context.graph.sections(circuit).map((section) => section.ungrounded?.count ?? 0)) })).toSorted((a, b) => b.count - a.count)[0];
    if (!widest || widest.count < 2) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const poles = numberOf(context, id, "poles");
    if (poles === null) { reader.number(id, "poles"); return reader.outcome(); }
    if (poles >= widest.count) return PASS;
    const join = textOf(context, id, "poleJoin");
    if (join === "common trip") return PASS;
    const sides = deviceSides(context, id);
    const sources = sides ? [...sides.load.converters, ...sides.load.generators, ...sides.line.generators.filter(() => sides.line.utilities.length + sides.line.loads.length === 0)] : [];
    if (join === "identified handle ties" && sources.length === 0) return PASS;
    if (join === null && sources.length === 0 && Object.hasOwn(context.graph.kind(id).properties, "poleJoin")) { reader.ask(anchor, "props.poleJoin", propertyLabel(context, id, "poleJoin")); return reader.outcome(); }
    return found({
      variant: "opens-one-by-one", anchor, field: "props.poles", related: [circuitRef(widest.circuit), ...sources.map(equipmentRef)],
      message: `${nameOf(context, anchor)} has ${poles} pole for ${widest.count} ungrounded conductors of ${nameOf(context, circuitRef(widest.circuit))}; ${sources.length > 0 ? "with a source on the circuit they must have a common trip" : "they must open together"}.`,
      steps: [{ symbol: "poles", expression: "not below the ungrounded conductors", substituted: `${poles} ≥ ${widest.count}`, result: "fails", unit: "" }],
    });
  },
  suggest: ({ anchor, related }, context) => {
    const count = Math.max(2, ...context.graph.sections(related[0]?.id ?? "").map((section) => section.ungrounded?.count ?? 0));
    return [{ label: `Use a ${count}-pole device for ${nameOf(context, anchor)}`, also: "It takes more spaces.", patches: [{ op: "replace", path: `/equipment/${anchor.id}/props/poles`, value: count }] }];
  },
  examples: { violates: "Two single-pole 45 A breakers without a tie on a 240 V inverter.", passes: "One 2-pole 45 A breaker with common trip." },
};
