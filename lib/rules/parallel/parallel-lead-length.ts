import type { Circuit } from "@/lib/diagram/schema";
import { NEVER_MUST_FIX, notCode } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { circuitRef, found, nameOf, NOT_APPLICABLE, numberOf, PASS, Reader, textOf } from "@/lib/rules/shared/outcome";
import { powerCircuits, topology } from "@/lib/rules/shared/topology";

/** Battery leads that end at packs or at inverters of one dc bus, in groups; ids in order. */
function leadGroups(context: CheckContext): readonly (readonly string[])[] {
  const { graph, drawing } = context;
  const groups = new Map<string, string[]>();
  for (const id of powerCircuits(graph)) {
    if ((drawing.circuits[id] as Circuit).system !== "battery-dc") continue;
    const { side } = topology(graph);
    for (const [end, other] of [["from", "to"], ["to", "from"]] as const) {
      const own = side(id, end);
      const bus = side(id, other).buses[0];
      const packs = own.batteries.length === 1 && own.converters.length === 0 && own.buses.length === 0;
      const units = own.converters.length === 1 && own.batteries.length === 0 && own.buses.length === 0;
      if (bus !== undefined && (packs || units)) { const key = `${bus} ${packs ? "packs" : "units"}`; groups.set(key, [...(groups.get(key) ?? []), id]); }
    }
  }
  return [...groups.values()].filter((group) => group.length > 1);
}
function lengthFt(context: CheckContext, id: string, reader: Reader): number | null {
  return context.graph.sections(id).reduce<number | null>((sum, section) => {
    if (section.lengthFt === null) reader.ask(circuitRef(id), `sections.${section.id}.lengthFt`, `length of ${nameOf(context, circuitRef(id))}`);
    return sum === null || section.lengthFt === null ? null : sum + section.lengthFt;
  }, 0);
}
function ends(context: CheckContext, id: string): readonly string[] {
  const { side } = topology(context.graph);
  return [...side(id, "from").batteries, ...side(id, "to").batteries, ...side(id, "from").converters, ...side(id, "to").converters];
}

export const parallelLeadLength: Rule = {
  meta: {
    id: "parallel-lead-length", group: "Parallel inverters", severity: "should-fix", evidence: "derived",
    statement: "Battery leads to one dc bus are equally long, so that packs and units share current.",
    risk: "The pack with the shorter lead carries more current, ages first and may trip.",
    citations: notCode("manufacturer's instructions"), mustFixAllowed: NEVER_MUST_FIX,
    limits: { tolerance: { value: 5, unit: "%", source: "common practice, no published source; the maker's figure comes first" } },
    reads: ["circuits.sections.lengthFt", "equipment.props.leadTolerancePercent", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: (context) => leadGroups(context).map((group) => circuitRef(group[0] ?? "")),
  evaluate: ({ id }, context) => {
    const group = leadGroups(context).find((each) => each[0] === id);
    if (!group) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const lengths = group.map((each) => ({ each, feet: lengthFt(context, each, reader) })).filter((one): one is { each: string; feet: number } => one.feet !== null);
    const near = group.flatMap((each) => ends(context, each));
    const tolerance = near.map((each) => numberOf(context, each, "leadTolerancePercent")).find((value) => value !== null) ?? context.limit("tolerance");
    const page = near.map((each) => textOf(context, each, "leadInstruction")).find((text) => text !== null);
    // The length most leads share is the planned one; among equals the shorter.
    const counts = new Map<number, number>();
    for (const { feet } of lengths) counts.set(feet, (counts.get(feet) ?? 0) + 1);
    const planned = [...counts.entries()].sort((a, b) => b[1] - a[1] || a[0] - b[0])[0]?.[0] ?? 0;
    const odd = lengths.filter(({ feet }) => Math.abs(feet - planned) > (planned * tolerance) / 100 + 1e-9);
    if (odd.length === 0) return reader.complete ? PASS : reader.outcome();
    return odd.map(({ each, feet }) => found({
      variant: "unequal", anchor: circuitRef(each), field: `sections.${context.graph.sections(each)[0]?.id ?? "s1"}.lengthFt`, related: group.filter((other) => other !== each).map(circuitRef),
      message: `${nameOf(context, circuitRef(each))} is ${feet} ft, the other leads of this bus are ${planned} ft. Parallel leads share current by length.`,
      steps: lengths.map((one) => ({ symbol: nameOf(context, circuitRef(one.each)), expression: `within ${tolerance} % of ${planned} ft`, substituted: `${one.feet} ft`, result: one.feet, unit: "ft" })),
      ...(page ? { instruction: page } : {}),
    }));
  },
  suggest: (finding, context) => {
    const other = finding.related[0]?.id;
    const sections = context.graph.sections(finding.anchor.id);
    if (other === undefined || sections.length !== 1 || !sections[0]) return [];
    const planned = Number(/within .* of ([\d.]+) ft/.exec(finding.steps[0]?.expression ?? "")?.[1]);
    return Number.isFinite(planned) ? [{ label: `Cut ${nameOf(context, finding.anchor)} to ${planned} ft`, also: "Only where the way allows it; else bring the others to the longer length.", patches: [{ op: "replace", path: `/circuits/${finding.anchor.id}/sections/${sections[0].id}/lengthFt`, value: planned }] }] : [];
  },
  examples: { violates: "8, 8, 8 and 11.5 ft.", passes: "8 ft each." },
};
