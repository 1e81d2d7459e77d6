import { shown } from "@/lib/calc";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { circuitsTo, FAULT_CONVENTION, faultSteps, totalA, type FaultRow } from "@/lib/rules/shared/faultCurrent";
import { answerOf, failingTogether, fewNames, higherRating, judgeFault, type FaultVerdict } from "@/lib/rules/shared/faultJudgment";
import { circuitRef, equipmentRef, found, NOT_APPLICABLE, numberOf } from "@/lib/rules/shared/outcome";

/** A series rating stated for the device is judged by its own rule; the rating alone need not carry the current then. */
const seriesStated = (context: CheckContext, { equipment, point, ratingKA }: FaultRow): boolean =>
  ratingKA !== null && ratingKA * 1000 < totalA(point) && (numberOf(context, equipment, "seriesKA") ?? 0) * 1000 >= totalA(point);
const verdictsOf = (context: CheckContext): ReadonlyMap<string, FaultVerdict> => judgeFault(context, "interruptingKA", (row) => seriesStated(context, row));
const rowsOf = (verdicts: ReadonlyMap<string, FaultVerdict>, ids: readonly string[]): readonly FaultRow[] => ids.flatMap((each) => verdicts.get(each)?.row ?? []);

export const interruptingLow: Rule = {
  meta: {
    id: "interrupting-low", group: "Fault current and ratings", severity: "must-fix", evidence: "derived",
    statement: "Every overcurrent device interrupts the fault current that all sources together can drive at its line side.",
    risk: "The device bursts while it opens a fault, with arc and flame where someone stands to reset it.",
    citations: sameSection("110.9"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.interruptingKA", "equipment.props.seriesKA", "equipment.props.availableFaultCurrentA", "site.availableFaultCurrentA", "equipment.props.faultA", "circuits.from", "circuits.to", "circuits.sections", "interlocks"],
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
    const ratings = [...new Set(rowsOf(verdicts, group).map((each) => each.ratingKA ?? 0))].sort((a, b) => a - b);
    const parent = context.drawing.equipment[anchor.id]?.parent ?? null;
    const current = totalA(row.point);
    return found({
      variant: "below-fault-current", anchor, field: "props.interruptingKA", related: [...group.slice(1).map(equipmentRef), ...(parent ? [equipmentRef(parent)] : []), ...circuitsTo(row.point).map(circuitRef)],
      message: `${fewNames(context, group)} interrupt${group.length === 1 ? "s" : ""} ${ratings.map((each) => shown(each)).join(" and ")} kA; ${shown(current, 0)} A can flow into a fault at the line side. The interrupting rating must not be lower.`,
      steps: [...faultSteps(context, row.point), { symbol: "Ir", expression: "not below the fault current", substituted: `${shown((ratings[0] ?? 0) * 1000, 0)} A ≥ ${shown(current, 0)} A`, result: "fails", unit: "" }, { symbol: "Note", expression: FAULT_CONVENTION, substituted: "", result: "", unit: "" }],
    });
  },
  suggest: ({ anchor: { id } }, context) => {
    const verdicts = verdictsOf(context);
    const rows = rowsOf(verdicts, failingTogether(context, verdicts, id));
    return higherRating(context, rows, Math.max(0, ...rows.map((row) => totalA(row.point))) / 1000, "devices", "Or a series rating that is listed for this very pair and marked on the equipment.");
  },
  examples: { violates: "A 10 kA breaker on the bus at a service of 10,400 A.", passes: "A 22 kA breaker there, or 10 kA 46 ft down 1 AWG, where 6,350 A and 120 A of two inverters are left." },
};
