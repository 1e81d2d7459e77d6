import { NEVER_MUST_FIX, notCode } from "@/lib/rules/engine/meta";
import type { Rule } from "@/lib/rules/engine/types";
import { equipmentRef, found, names, nameOf, NOT_APPLICABLE, numberOf, PASS, Reader, textOf } from "@/lib/rules/shared/outcome";
import { groupLedBy, parallelGroups } from "@/lib/rules/shared/parallel";

export const parallelRole: Rule = {
  meta: {
    id: "parallel-role", group: "Parallel inverters", severity: "must-fix", evidence: "derived",
    statement: "Of units in parallel exactly one is primary, and no two share an address.",
    risk: "Two primaries form two grids on one bus; none leaves the island dark.",
    citations: notCode("manufacturer's instructions"), mustFixAllowed: NEVER_MUST_FIX, mustFixWith: "instruction", limits: {},
    reads: ["equipment.props.role", "equipment.props.address", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: (context) => parallelGroups(context).map((group) => equipmentRef(group[0] ?? "")),
  evaluate: ({ id }, context) => {
    const group = groupLedBy(context, id);
    if (!group) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const roles = group.map((each) => ({ each, role: reader.text(each, "role") }));
    const primaries = roles.filter((one) => one.role === "primary").map((one) => one.each);
    const page = group.map((each) => textOf(context, each, "parallelInstruction")).find((text) => text !== null);
    const base = { steps: roles.map((one) => ({ symbol: nameOf(context, equipmentRef(one.each)), expression: "role, address", substituted: `${numberOf(context, one.each, "address") ?? "not known"}`, result: one.role ?? "not known", unit: "" })), ...(page ? { instruction: page } : {}) };
    const outcomes = [];
    if (primaries.length > 1) {
      const [first = "", ...others] = primaries;
      outcomes.push(found({ ...base, variant: "several-primaries", anchor: equipmentRef(others[0] ?? first), field: "props.role", related: primaries.filter((each) => each !== (others[0] ?? first)).map(equipmentRef), message: `${names(context, primaries.map(equipmentRef))} are all set as primary. One is primary, the rest secondary.` }));
    } else if (primaries.length === 0 && reader.complete) {
      outcomes.push(found({ ...base, variant: "no-primary", anchor: equipmentRef(id), field: "props.role", related: group.slice(1).map(equipmentRef), message: `None of ${names(context, group.map(equipmentRef))} is set as primary.` }));
    }
    const byAddress = [...groupByAddress(context, group).entries()];
    for (const [address, units] of byAddress) {
      const second = units[1];
      if (second !== undefined) outcomes.push(found({ ...base, variant: "same-address", anchor: equipmentRef(second), field: "props.address", related: units.filter((each) => each !== second).map(equipmentRef), message: `${names(context, units.map(equipmentRef))} share address ${address}.` }));
    }
    if (!reader.complete) outcomes.push(reader.outcome());
    return outcomes.length > 0 ? outcomes : PASS;
  },
  suggest: (finding, context) => finding.variant === "several-primaries"
    ? [{ label: `Set ${nameOf(context, finding.anchor)} as secondary`, also: "", patches: [{ op: "replace", path: `/equipment/${finding.anchor.id}/props/role`, value: "secondary" }] }]
    : finding.variant === "no-primary"
      ? [{ label: `Set ${nameOf(context, finding.anchor)} as primary`, also: "", patches: [{ op: "replace", path: `/equipment/${finding.anchor.id}/props/role`, value: "primary" }] }]
      : [],
  examples: { violates: "Both units set as primary.", passes: "One primary at address 1, one secondary at address 2." },
};
function groupByAddress(context: Parameters<Rule["subjects"]>[0], group: readonly string[]): Map<number, string[]> {
  const map = new Map<number, string[]>();
  for (const each of group) {
    const address = numberOf(context, each, "address");
    if (address !== null) map.set(address, [...(map.get(address) ?? []), each]);
  }
  return map;
}
