import { NEVER_MUST_FIX, notCode } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { declaredRule } from "@/lib/rules/families/declared";
import { equipmentRef, sensorRef } from "@/lib/rules/shared/outcome";
import { parallelGroups } from "@/lib/rules/shared/parallel";
import { leadingSensors } from "@/lib/rules/shared/sensors";

const common = { group: "Metering and current sensors", evidence: "declared", mustFixAllowed: NEVER_MUST_FIX, limits: {}, absorbs: [] } as const;

const ctReversed = declaredRule({
  meta: {
    ...common, id: "ct-reversed", severity: "should-fix",
    statement: "Arrow and leg of each sensor are proved by switching loads and PV and reading the sign.",
    risk: "A reversed sensor turns import into export: the inverter runs away from its target.",
    citations: notCode("manufacturer's instructions"), reads: ["sensors.circuit", "sensors.arrow", "sensors.pole", "statements"],
    question: "Does every sensor read the right leg with the right sign, tried by switching loads and PV?",
  },
  // What nobody reads proves nothing.
  subjects: (context) => leadingSensors(context).filter((id) => context.drawing.sensors[id]?.reads != null).map(sensorRef),
  refused: (name) => `${name} and the sensors beside it do not read the right leg with the right sign.`,
  examples: { violates: "Arrow to the loads where the instruction asks for the grid.", passes: "Arrow to the grid, sign read with a load switched." },
});

/** Units of a group whose own sensor inputs nothing is wired to, while another unit of the group reads for all. */
function unread(context: CheckContext): readonly string[] {
  const readers = new Set(Object.values(context.drawing.sensors).flatMap((one) => one.reads ?? []));
  return parallelGroups(context).flatMap((group) => (group.some((unit) => readers.has(unit)) ? group.filter((unit) => !readers.has(unit)) : []));
}
const ctNotUsed = declaredRule({
  meta: {
    ...common, id: "ct-not-used", severity: "advice",
    statement: "Sensor inputs that the system does not use are said to be unused, and their leads are capped.",
    risk: "Someone connects the loose lead later, or looks for the sensor that was never meant to be.",
    citations: notCode("manufacturer's instructions"), reads: ["sensors.reads", "circuits.from", "circuits.to", "statements"],
    question: "Are the sensor inputs of this unit unused on purpose, capped, and said to be so on the sheet?",
  },
  subjects: (context) => unread(context).map(equipmentRef),
  refused: (name) => `The sensor inputs of ${name} are not used, and nothing says so.`,
  examples: { violates: "A loose sensor lead in the second unit.", passes: "Inputs capped, \"not used\" on the sheet." },
});

const productionMeter = declaredRule({
  meta: {
    ...common, id: "production-meter", severity: "should-fix",
    statement: "Where the utility or an incentive program asks for a production meter, it is drawn with the rating of its socket.",
    risk: "The program refuses payment or the utility refuses permission to operate until the meter is added.",
    citations: notCode("utility or program requirement"), reads: ["site.requirements.separateMeter", "circuits.from", "circuits.to", "statements"],
    question: "Is every production meter that the utility or an incentive program asks for drawn with the rating of its socket, or is none asked for?",
  },
  // Asked where something produces, unless the jurisdiction's sheet says that no such meter is wanted.
  subjects: ({ drawing, graph }) => {
    if (drawing.site.requirements?.separateMeter === "no" || !Object.keys(drawing.equipment).some((id) => graph.kind(id).capabilities.converter)) return [];
    return Object.keys(drawing.equipment).sort().filter((id) => graph.kind(id).capabilities.source === "utility" && graph.circuitsAt(id).length > 0).map(equipmentRef);
  },
  refused: () => "A production meter is asked for and not drawn with the rating of its socket.",
  examples: { violates: "No production meter on a job under an incentive program that asks for one.", passes: "A second meter in a 100 A socket between the inverters and the panelboard." },
});
export const sensorStatementRules: readonly Rule[] = [ctReversed, ctNotUsed, productionMeter];
