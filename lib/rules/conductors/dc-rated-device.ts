import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { deviceSides } from "@/lib/rules/shared/devices";
import { equipmentRef, found, nameOf, NOT_APPLICABLE, numberOf, PASS, propertyLabel, Reader } from "@/lib/rules/shared/outcome";

const isDc = (context: CheckContext, id: string): boolean => context.graph.ports(id).some((port) => port.system === "battery-dc" || port.system === "pv-dc");

/** Largest voltage of the batteries on either side of a device; of the inverter's window where no battery is drawn. Strings are judged against every part they pass by a rule of their own. */
function batteryV(context: CheckContext, id: string, reader: Reader): { volts: number; from: readonly string[] } | null {
  const sides = deviceSides(context, id);
  if (!sides) return null;
  const batteries = [...new Set([...sides.line.batteries, ...sides.load.batteries])];
  const from = batteries.length > 0 ? batteries : [...new Set([...sides.line.converters, ...sides.load.converters])];
  const values = from.map((one) => reader.number(one, batteries.length > 0 ? "mostV" : "batteryMostV")).filter((value): value is number => value !== null);
  return values.length > 0 ? { volts: Math.max(...values), from } : null;
}

export const dcRatedDevice: Rule = {
  meta: {
    id: "dc-rated-device", group: "Conductors and overcurrent", severity: "must-fix", evidence: "rated",
    statement: "Breakers, fuses and switches in dc circuits must be marked for dc, at not less than the voltage of the circuit.",
    risk: "Dc has no zero crossing: a device made for ac draws an arc that does not go out.",
    citations: sections(["110.3(B), 690.9(B), 690.13(E), 690.15(C), 706.21(C)", "read"], ["110.3(B), 690.9(B), 690.13(D), 690.15(C), 706.31(C)", "read"], ["110.3(B), 690.9(B), 690.13(D), 690.15(C), 706.31(C)", "read"]),
    mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.markedDc", "equipment.props.voltageV", "equipment.props.mostV", "equipment.props.batteryMostV", "circuits.from", "circuits.to"], absorbs: ["voltage-class"],
  },
  subjects: (context) => Object.keys(context.drawing.equipment).sort().filter((id) => {
    const { properties, capabilities } = context.graph.kind(id);
    return Object.hasOwn(properties, "markedDc") && (capabilities.switching !== undefined || capabilities.overcurrent === true) && isDc(context, id) && context.graph.circuitsAt(id).length > 0;
  }).map(equipmentRef),
  evaluate: (anchor, context) => {
    const { id } = anchor;
    const marked = context.drawing.equipment[id]?.props.markedDc ?? null;
    if (marked === false) {
      return found({ variant: "not-marked-dc", anchor, field: "props.markedDc", related: context.graph.circuitsAt(id).map((circuit) => ({ collection: "circuits" as const, id: circuit })), message: `${nameOf(context, anchor)} stands in a dc circuit and is not marked for dc.`, steps: [{ symbol: "marking", expression: "marked for dc", substituted: nameOf(context, anchor), result: "fails", unit: "" }] });
    }
    const reader = new Reader(context);
    if (marked === null) reader.ask(anchor, "props.markedDc", propertyLabel(context, id, "markedDc"));
    if (context.graph.ports(id).some((port) => port.system === "battery-dc")) {
      const rated = numberOf(context, id, "voltageV");
      const circuit = batteryV(context, id, reader);
      if (circuit && rated === null) reader.number(id, "voltageV");
      if (circuit && rated !== null && rated < circuit.volts - 1e-9) {
        return found({
          variant: "below-voltage", anchor, field: "props.voltageV", related: circuit.from.map(equipmentRef),
          message: `${nameOf(context, anchor)} is rated ${rated} V dc; its circuit reaches ${circuit.volts} V.`,
          steps: [{ symbol: "U", expression: "not below the largest voltage of the circuit", substituted: `${rated} V ≥ ${circuit.volts} V`, result: "fails", unit: "" }],
        });
      }
    }
    return reader.complete ? (marked === true ? PASS : NOT_APPLICABLE) : reader.outcome();
  },
  examples: { violates: "A 240 V ac breaker in a 522 V string.", passes: "A switch marked 600 V dc in the same string." },
};
