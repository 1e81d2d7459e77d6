import { nodeKey } from "@/lib/diagram/graph";
import { NEVER_MUST_FIX, notCode } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { equipmentRef, found, names, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { firstWords, groupLedBy, parallelGroups, parallelPage, withPage } from "@/lib/rules/shared/parallel";
import { topology, type Side } from "@/lib/rules/shared/topology";

const bankOf = (context: CheckContext, unit: string): Side => topology(context.graph).beyond(nodeKey(unit, "battery"), null);
const listed = (context: CheckContext, side: Side): string => (side.batteries.length === 0 ? "no battery" : names(context, side.batteries.map(equipmentRef)));

export const parallelBatteryCommon: Rule = {
  meta: {
    id: "parallel-battery-common", group: "Parallel inverters", severity: "must-fix", evidence: "derived",
    statement: "Units that must share a battery bank meet it through one bus; units that must not are kept apart.",
    risk: "Units that read different batteries disagree on the state of charge: one pushes current into the other's bank through the ac bus.",
    citations: notCode("manufacturer's instructions"), mustFixAllowed: NEVER_MUST_FIX, mustFixWith: "instruction", limits: {},
    reads: ["circuits.from", "circuits.to", "equipment.props.parallelBank", "equipment.props.parallelInstruction"], absorbs: [],
  },
  subjects: (context) => parallelGroups(context).map((group) => equipmentRef(group[0] ?? "")),
  evaluate: ({ id }, context): Outcome | readonly Outcome[] => {
    const group = groupLedBy(context, id);
    if (!group) return NOT_APPLICABLE;
    const banks = group.map((unit) => ({ unit, side: bankOf(context, unit) }));
    if (banks.every(({ side }) => side.batteries.length === 0)) return NOT_APPLICABLE;
    const asked = firstWords(context, group, "parallelBank");
    if (asked === null) { const reader = new Reader(context); reader.text(group[0] ?? id, "parallelBank"); return reader.outcome(); }
    if (asked === "either") return PASS;
    const steps = banks.map(({ unit, side }) => ({ symbol: nameOf(context, equipmentRef(unit)), expression: "batteries", substituted: listed(context, side), result: side.batteries.length, unit: "" }));
    const page = withPage(parallelPage(context, group));
    if (asked === "separate banks") {
      const owner = new Map<string, string>();
      for (const { unit, side } of banks) {
        const other = side.batteries.map((battery) => owner.get(battery)).find((each) => each !== undefined);
        if (other !== undefined) return found({ variant: "shared", anchor: equipmentRef(unit), related: [equipmentRef(other), ...side.batteries.map(equipmentRef)], message: `${nameOf(context, equipmentRef(unit))} and ${nameOf(context, equipmentRef(other))} share ${listed(context, side)}. The instruction asks for a bank of its own for each unit.`, steps, ...page });
        for (const battery of side.batteries) owner.set(battery, unit);
      }
      return PASS;
    }
    // The bank that most batteries stand in is the planned one.
    const planned = banks.toSorted((a, b) => b.side.batteries.length - a.side.batteries.length)[0];
    const odd = banks.filter(({ side }) => side.batteries.join() !== planned?.side.batteries.join());
    if (!planned || odd.length > 0) {
      return odd.map(({ unit, side }) => found({
        variant: "apart", anchor: equipmentRef(unit), related: [...(planned ? [equipmentRef(planned.unit)] : []), ...side.batteries.map(equipmentRef)],
        message: `${nameOf(context, equipmentRef(unit))} has ${listed(context, side)}, ${planned ? nameOf(context, equipmentRef(planned.unit)) : ""} has ${planned ? listed(context, planned.side) : ""}. Units in parallel must share one bank through one bus.`, steps, ...page,
      }));
    }
    if (planned.side.buses.length > 0) return PASS;
    return found({ variant: "no-bus", anchor: equipmentRef(planned.unit), related: group.filter((each) => each !== planned.unit).map(equipmentRef), message: `${names(context, group.map(equipmentRef))} meet ${listed(context, planned.side)} without a bus. One bus must join them.`, steps, ...page });
  },
  examples: { violates: "Two packs on one unit, two on the other, with no bus between.", passes: "Four packs and both units on one bus." },
};
