import { NEVER_MUST_FIX, notCode } from "@/lib/rules/engine/meta";
import type { Rule } from "@/lib/rules/engine/types";
import { equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader, textOf } from "@/lib/rules/shared/outcome";
import { groupLedBy, parallelGroups } from "@/lib/rules/shared/parallel";

export const parallelFirmware: Rule = {
  meta: {
    id: "parallel-firmware", group: "Parallel inverters", severity: "should-fix", evidence: "rated",
    statement: "Units that run in parallel have the same firmware before they are paralleled.",
    risk: "Units that disagree on protocol trip each other or share current badly; the maker refuses parallel operation.",
    citations: notCode("manufacturer's instructions"), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["equipment.props.firmware", "equipment.props.role", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: (context) => parallelGroups(context).map((group) => equipmentRef(group[0] ?? "")),
  evaluate: ({ id }, context) => {
    const group = groupLedBy(context, id);
    if (!group) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const levels = group.map((each) => ({ each, firmware: reader.text(each, "firmware") }));
    const known = levels.filter((one): one is { each: string; firmware: string } => one.firmware !== null);
    const leader = known.find((one) => textOf(context, one.each, "role") === "primary") ?? known[0];
    const odd = leader ? known.filter((one) => one.firmware !== leader.firmware) : [];
    if (!leader || odd.length === 0) return reader.complete ? PASS : reader.outcome();
    return odd.map(({ each, firmware }) => found({
      variant: "unequal", anchor: equipmentRef(each), field: "props.firmware", related: [equipmentRef(leader.each)],
      message: `${nameOf(context, equipmentRef(each))} runs ${firmware}, ${nameOf(context, equipmentRef(leader.each))} runs ${leader.firmware}. Units in parallel must match before they are paralleled.`,
      steps: levels.map((one) => ({ symbol: nameOf(context, equipmentRef(one.each)), expression: "firmware", substituted: textOf(context, one.each, "firmwareInstruction") ?? "", result: one.firmware ?? "not known", unit: "" })),
      ...(textOf(context, each, "firmwareInstruction") ? { instruction: textOf(context, each, "firmwareInstruction") ?? "" } : {}),
    }));
  },
  suggest: (finding, context) => {
    const level = finding.related[0] ? textOf(context, finding.related[0].id, "firmware") : null;
    return level === null ? [] : [{ label: `Plan ${level} for ${nameOf(context, finding.anchor)}`, also: "The update itself is a hold point before parallel operation.", patches: [{ op: "replace", path: `/equipment/${finding.anchor.id}/props/firmware`, value: level }] }];
  },
  examples: { violates: "4.2.1 in one unit, 4.1.8 in the other.", passes: "4.2.1 in both." },
};
