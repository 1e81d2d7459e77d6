import { shown } from "@/lib/calc";
import { NEVER_MUST_FIX, notCode } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule, RuleMeta, Suggestion } from "@/lib/rules/engine/types";
import { ratingRule } from "@/lib/rules/families/rating";
import { equipmentRef, found, isTrue, nameOf, NOT_APPLICABLE, numberOf, PASS, propertyLabel, Reader, textOf } from "@/lib/rules/shared/outcome";
import { groupLedBy, parallelGroups, parallelPage, withPage } from "@/lib/rules/shared/parallel";

const leaders = (context: CheckContext) => parallelGroups(context).map((group) => equipmentRef(group[0] ?? ""));
const common = { group: "Parallel inverters", citations: notCode("manufacturer's instructions"), mustFixAllowed: NEVER_MUST_FIX, mustFixWith: "instruction", limits: {}, absorbs: [] } as const;

/** One row of "the same in every unit": which values must be equal, and the word for them. */
interface EqualRow { meta: RuleMeta; keys: readonly string[]; silent?: (context: CheckContext, group: readonly string[]) => boolean; words: string; settable: readonly string[]; examples: Rule["examples"] }
function value(context: CheckContext, id: string, key: string, reader: Reader): string | null {
  const number = numberOf(context, id, key);
  return number === null ? textOf(context, id, key) ?? (reader.text(id, key)) : shown(number);
}
/** Values that a whole group must share. The value of the primary, else of most units, is the planned one. */
function equalRule(row: EqualRow): Rule {
  const evaluate = ({ id }: { id: string }, context: CheckContext): Outcome | readonly Outcome[] => {
    const group = groupLedBy(context, id);
    if (!group || row.silent?.(context, group)) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const outcomes: Outcome[] = [];
    for (const key of row.keys) {
      const values = group.map((each) => ({ each, is: value(context, each, key, reader) })).filter((one): one is { each: string; is: string } => one.is !== null);
      const planned = values.find((one) => textOf(context, one.each, "role") === "primary") ?? values[0];
      for (const one of values) {
        if (!planned || one.is === planned.is) continue;
        outcomes.push(found({
          variant: key === row.keys[0] ? "unequal" : `unequal-${key.toLowerCase()}`, anchor: equipmentRef(one.each), field: `props.${key}`, related: [equipmentRef(planned.each)],
          message: `${nameOf(context, equipmentRef(one.each))}: ${one.is}, ${nameOf(context, equipmentRef(planned.each))}: ${planned.is}. ${row.words}`,
          steps: values.map((each) => ({ symbol: nameOf(context, equipmentRef(each.each)), expression: propertyLabel(context, each.each, key), substituted: "", result: each.is, unit: "" })),
          ...withPage(parallelPage(context, group)),
        }));
      }
    }
    if (!reader.complete) outcomes.push(reader.outcome());
    return outcomes.length > 0 ? outcomes : PASS;
  };
  const suggest: Rule["suggest"] = (finding, context): readonly Suggestion[] => {
    const key = finding.field?.replace("props.", "") ?? "";
    const planned = finding.related[0] ? textOf(context, finding.related[0].id, key) : null;
    return planned === null || !row.settable.includes(key) ? [] : [{ label: `Set ${nameOf(context, finding.anchor)} to ${planned}`, also: "", patches: [{ op: "replace", path: `/equipment/${finding.anchor.id}/props/${key}`, value: planned }] }];
  };
  return { meta: row.meta, subjects: leaders, evaluate, suggest, examples: row.examples };
}

const parallelModel = equalRule({
  meta: {
    ...common, id: "parallel-model", severity: "must-fix", evidence: "rated",
    statement: "All units that run in parallel are of one model, unless the instruction allows others.",
    risk: "Units of unlike output and control share current badly and trip, or the maker refuses them together.",
    reads: ["equipment.props.model", "equipment.props.parallelMixed", "equipment.props.parallelInstruction", "circuits.from", "circuits.to"],
  },
  keys: ["model"], settable: [], silent: (context, group) => group.every((each) => isTrue(context, each, "parallelMixed")), words: "Units in parallel must be of one model.",
  examples: { violates: "A 7.8 kW unit beside a 6.0 kW unit of another model.", passes: "Two units of one model." },
});
const parallelPhase = equalRule({
  meta: {
    ...common, id: "parallel-phase", severity: "must-fix", evidence: "rated",
    statement: "All units that run in parallel are set to the same voltage, phases and grid profile.",
    risk: "Units on different voltages or profiles drive current into each other, or one drops out where the other rides through.",
    reads: ["equipment.props.outputV", "equipment.props.profile", "equipment.props.parallelInstruction", "circuits.from", "circuits.to"],
  },
  keys: ["outputV", "profile"], settable: ["profile"], words: "Units in parallel must be set alike.",
  examples: { violates: "208 V in one unit, 240 V in the other.", passes: "240 V and one profile in both." },
});
const parallelCount = ratingRule({
  meta: {
    ...common, id: "parallel-count", severity: "must-fix", evidence: "rated",
    statement: "No more units run in parallel than their listing and instruction allow.",
    risk: "Control and synchronizing are not tested beyond that number: units trip or fail to share.",
    reads: ["equipment.props.parallelMost", "equipment.props.parallelInstruction", "circuits.from", "circuits.to"],
  },
  variant: "too-many", unit: "units", bound: "least", name: "limit of parallel operation", subjects: leaders,
  demand: ({ id }, context) => {
    const group = groupLedBy(context, id);
    return group ? { value: group.length, words: "the group has", related: group.slice(1).map(equipmentRef) } : null;
  },
  // The unit that allows fewest decides; one that says nothing is asked.
  rating: ({ id }, context) => {
    const group = groupLedBy(context, id) ?? [id];
    const known = group.map((each) => ({ each, most: numberOf(context, each, "parallelMost") }));
    const least = known.find((one) => one.most === null) ?? known.toSorted((a, b) => (a.most ?? 0) - (b.most ?? 0))[0] ?? { each: id, most: null };
    return { value: least.most, field: "props.parallelMost", label: propertyLabel(context, least.each, "parallelMost"), ref: equipmentRef(least.each) };
  },
  instruction: ({ id }, context) => parallelPage(context, groupLedBy(context, id) ?? []),
  examples: { violates: "7 units where 6 are allowed.", passes: "2 units where 4 are allowed." },
});
export const parallelEqualRules: readonly Rule[] = [parallelModel, parallelPhase, parallelCount];
