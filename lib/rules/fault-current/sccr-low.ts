import { shown } from "@/lib/calc";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { circuitsTo, deviceAhead, FAULT_CONVENTION, faultSteps, totalA, type FaultRow } from "@/lib/rules/shared/faultCurrent";
import { answerOf, failingTogether, fewNames, higherRating, isOfMarking, judgeFault, type FaultVerdict } from "@/lib/rules/shared/faultJudgment";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, numberOf, textOf } from "@/lib/rules/shared/outcome";

/** A rating stated with the device that is really installed ahead carries the current. */
function withDevice(context: CheckContext, { equipment, point }: FaultRow): boolean {
  const [kA, marking] = [numberOf(context, equipment, "shortCircuitWithKA"), textOf(context, equipment, "shortCircuitWith")];
  if (kA === null || marking === null || point.sourceA === null || kA * 1000 < totalA(point)) return false;
  const ahead = deviceAhead(context.graph, point, equipment);
  return ahead !== null && isOfMarking(context, ahead, marking);
}
const verdictsOf = (context: CheckContext): ReadonlyMap<string, FaultVerdict> => judgeFault(context, "shortCircuitKA", (row) => withDevice(context, row));
const rowsOf = (verdicts: ReadonlyMap<string, FaultVerdict>, ids: readonly string[]): readonly FaultRow[] => ids.flatMap((each) => verdicts.get(each)?.row ?? []);

export const sccrLow: Rule = {
  meta: {
    id: "sccr-low", group: "Fault current and ratings", severity: "must-fix", evidence: "derived",
    statement: "The short-circuit rating of panelboards, switches and other equipment is not below the fault current there.",
    risk: "Busbars and contacts tear loose before the device ahead opens: the enclosure does not contain the arc.",
    citations: sameSection("110.10, 408.6"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.shortCircuitKA", "equipment.props.shortCircuitWithKA", "equipment.props.shortCircuitWith", "equipment.props.availableFaultCurrentA", "site.availableFaultCurrentA", "equipment.props.faultA", "circuits.from", "circuits.to", "circuits.sections", "interlocks"],
    absorbs: [],
  },
  subjects: (context) => [...verdictsOf(context).keys()].map(equipmentRef),
  evaluate: (anchor, context) => {
    const verdicts = verdictsOf(context);
    const answer = answerOf(verdicts.get(anchor.id));
    if (answer) return answer;
    const group = failingTogether(context, verdicts, anchor.id);
    const { row } = verdicts.get(anchor.id) as FaultVerdict;
    if (group[0] !== anchor.id) return NOT_APPLICABLE;
    const current = totalA(row.point);
    const marking = textOf(context, anchor.id, "shortCircuitWith");
    const ahead = deviceAhead(context.graph, row.point, anchor.id);
    const other = marking !== null && ahead !== null && !isOfMarking(context, ahead, marking) ? ` Its ${shown(numberOf(context, anchor.id, "shortCircuitWithKA") ?? 0)} kA hold behind ${marking} only; ${nameOf(context, equipmentRef(ahead))} is another.` : "";
    return found({
      variant: "below-fault-current", anchor, field: "props.shortCircuitKA", related: [...group.slice(1).map(equipmentRef), ...(ahead ? [equipmentRef(ahead)] : []), ...circuitsTo(row.point).map(circuitRef)],
      message: `${fewNames(context, group)}: short-circuit rating ${shown(row.ratingKA ?? 0)} kA; ${shown(current, 0)} A can flow into a fault there. The rating must not be lower.${other}`,
      steps: [...faultSteps(context, row.point), { symbol: "SCCR", expression: "not below the fault current", substituted: `${shown((row.ratingKA ?? 0) * 1000, 0)} A ≥ ${shown(current, 0)} A`, result: "fails", unit: "" }, { symbol: "Note", expression: FAULT_CONVENTION, substituted: "", result: "", unit: "" }],
    });
  },
  suggest: ({ anchor: { id } }, context) => {
    const verdicts = verdictsOf(context);
    const rows = rowsOf(verdicts, failingTogether(context, verdicts, id));
    return higherRating(context, rows, Math.max(0, ...rows.map((row) => totalA(row.point))) / 1000, "equipment", "Or a current-limiting device ahead with which the marking states a higher rating.");
  },
  examples: { violates: "A cabinet of 5 kA where 6,350 A of the utility and 120 A of two inverters meet.", passes: "A cabinet of 10 kA there, or 5 kA marked 14 kA behind the fuses that stand ahead of it." },
};
