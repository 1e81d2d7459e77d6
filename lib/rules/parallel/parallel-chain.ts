import { NEVER_MUST_FIX, notCode } from "@/lib/rules/engine/meta";
import type { CheckContext, FindingDraft, Outcome, Rule } from "@/lib/rules/engine/types";
import { equipmentRef, found, names, nameOf, NOT_APPLICABLE, PASS, propertyLabel, Reader } from "@/lib/rules/shared/outcome";
import { firstWords, groupLedBy, parallelGroups, parallelPage, withPage } from "@/lib/rules/shared/parallel";

/** Units that each unit of a group is linked with by data circuits. */
function links({ drawing, graph }: CheckContext, group: readonly string[]): ReadonlyMap<string, ReadonlySet<string>> {
  const inside = new Set(group);
  const map = new Map(group.map((each) => [each, new Set<string>()]));
  for (const unit of group) {
    for (const id of graph.circuitsAt(unit)) {
      const circuit = drawing.circuits[id];
      if (circuit?.system !== "data") continue;
      const other = circuit.from.equipment === unit ? circuit.to.equipment : circuit.from.equipment;
      if (other !== unit && inside.has(other)) map.get(unit)?.add(other);
    }
  }
  return map;
}
function reached(map: ReadonlyMap<string, ReadonlySet<string>>, start: string): ReadonlySet<string> {
  const seen = new Set([start]);
  const queue = [start];
  for (let at = queue.pop(); at !== undefined; at = queue.pop()) for (const next of map.get(at) ?? []) if (!seen.has(next)) { seen.add(next); queue.push(next); }
  return seen;
}

export const parallelChain: Rule = {
  meta: {
    id: "parallel-chain", group: "Parallel inverters", severity: "must-fix", evidence: "derived",
    statement: "The data link of units in parallel is one unbroken chain with terminators at its two ends alone.",
    risk: "Without the link the units lose each other: they trip, or form two grids on one bus.",
    citations: notCode("manufacturer's instructions"), mustFixAllowed: NEVER_MUST_FIX, mustFixWith: "instruction", limits: {},
    reads: ["circuits.from", "circuits.to", "circuits.system", "equipment.props.terminator", "equipment.props.parallelLink", "equipment.props.parallelInstruction"], absorbs: [],
  },
  subjects: (context) => parallelGroups(context).map((group) => equipmentRef(group[0] ?? "")),
  evaluate: ({ id }, context) => {
    const group = groupLedBy(context, id);
    if (!group) return NOT_APPLICABLE;
    const asked = firstWords(context, group, "parallelLink");
    const reader = new Reader(context);
    if (asked === null) { reader.text(group[0] ?? id, "parallelLink"); return reader.outcome(); }
    if (!asked.startsWith("chain")) return NOT_APPLICABLE;
    const map = links(context, group);
    const degree = (unit: string): number => map.get(unit)?.size ?? 0;
    const steps = group.map((unit) => ({ symbol: nameOf(context, equipmentRef(unit)), expression: "linked with", substituted: names(context, [...(map.get(unit) ?? [])].map(equipmentRef)), result: degree(unit), unit: "" }));
    const draft = (variant: string, anchor: string, related: readonly string[], message: string, field?: string): Outcome => {
      const finding: FindingDraft = { variant, anchor: equipmentRef(anchor), related: related.filter((each) => each !== anchor).map(equipmentRef), message, steps, ...(field ? { field } : {}), ...withPage(parallelPage(context, group)) };
      return found(finding);
    };
    const whole = reached(map, group[0] ?? id);
    const lost = group.filter((unit) => !whole.has(unit));
    if (lost.length > 0) return draft("broken", lost[0] ?? id, group, `No data link joins ${names(context, lost.map(equipmentRef))} with ${names(context, [...whole].map(equipmentRef))}. Units in parallel must be linked in one chain.`);
    const branch = group.find((unit) => degree(unit) > 2);
    if (branch !== undefined) return draft("branch", branch, [...(map.get(branch) ?? [])], `The data link branches at ${nameOf(context, equipmentRef(branch))} to ${degree(branch)} units. It must run from unit to unit.`);
    const ends = group.filter((unit) => degree(unit) < 2);
    if (ends.length === 0) return draft("ring", group[0] ?? id, group, `The data link of ${names(context, group.map(equipmentRef))} is a ring. It must be a chain with two ends.`);
    if (asked !== "chain") return PASS;
    const outcomes: Outcome[] = [];
    for (const unit of group) {
      const on = context.drawing.equipment[unit]?.props.terminator;
      const end = ends.includes(unit);
      const name = nameOf(context, equipmentRef(unit));
      if (typeof on !== "boolean") reader.ask(equipmentRef(unit), "props.terminator", propertyLabel(context, unit, "terminator"));
      else if (on !== end) outcomes.push(draft(end ? "terminator-off" : "terminator-on", unit, ends, end ? `${name} is the end of the data link; its terminator is off and must be on.` : `${name} stands inside the chain; its terminator is on and must be off.`, "props.terminator"));
    }
    if (!reader.complete) outcomes.push(reader.outcome());
    return outcomes.length > 0 ? outcomes : PASS;
  },
  suggest: ({ variant, anchor }, context) => variant.startsWith("terminator")
    ? [{ label: `Turn the terminator of ${nameOf(context, anchor)} ${variant === "terminator-off" ? "on" : "off"}`, also: "", patches: [{ op: "add", path: `/equipment/${anchor.id}/props/terminator`, value: variant === "terminator-off" }] }]
    : [],
  examples: { violates: "Three units of which two are linked, or all three in a ring.", passes: "Unit 1 to unit 2 to unit 3, terminators on in units 1 and 3." },
};
