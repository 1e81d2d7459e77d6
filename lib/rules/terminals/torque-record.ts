import type { Torque } from "@/lib/diagram/schema";
import { NEVER_MUST_FIX, sameSection, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule, RuleMeta } from "@/lib/rules/engine/types";
import { comparison } from "@/lib/rules/shared/protection";
import { equipmentRef, found, nameOf, NOT_APPLICABLE, PASS } from "@/lib/rules/shared/outcome";

type Entry = Torque & { id: string };
/** Recorded torques by equipment; entries at equipment that is not drawn any more say nothing. */
const recorded = (context: CheckContext): ReadonlyMap<string, readonly Entry[]> => context.once("recorded torques", () => {
  const map = new Map<string, Entry[]>();
  for (const [id, torque] of Object.entries(context.drawing.torques ?? {}).sort(([a], [b]) => (a < b ? -1 : 1))) {
    if (!context.drawing.equipment[torque.equipment]) continue;
    const list = map.get(torque.equipment);
    if (list) list.push({ ...torque, id });
    else map.set(torque.equipment, [{ ...torque, id }]);
  }
  return map;
});
const subjects: Rule["subjects"] = (context) => [...recorded(context).keys()].sort().map(equipmentRef);
const ask = (entry: Entry, field: keyof Torque, label: string): Outcome => ({ outcome: "needs-data", fields: [{ ref: equipmentRef(entry.equipment), field: `torques.${entry.id}.${field}`, label }] });
const each = (judge: (entry: Entry, context: CheckContext) => Outcome): Rule["evaluate"] => ({ id }, context) => (recorded(context).get(id) ?? []).map((entry) => judge(entry, context));
const group: Pick<RuleMeta, "group" | "evidence" | "mustFixAllowed" | "absorbs"> = { group: "Terminals, temperature, torque", evidence: "rated", mustFixAllowed: NEVER_MUST_FIX, absorbs: [] };

/** Torque as applied against the value asked for. */
export const torqueOutOfBand: Rule = {
  meta: {
    ...group, id: "torque-out-of-band", severity: "should-fix", mustFixWith: "instruction",
    statement: "A recorded torque must lie within the range the maker states, and should lie within 10 % of a single value.",
    risk: "Too loose burns; too tight has crushed the strands or cracked the lug.",
    citations: sameSection("110.14(D)", ["unconfirmed", "unconfirmed", "unconfirmed"]),
    limits: { tolerancePercent: { value: 10, unit: "%", source: "common practice, no published source; the code gives no tolerance" } },
    reads: ["torques.specifiedLbfIn", "torques.achievedLbfIn", "torques.tolerancePercent", "equipment.ports.terminal.torqueSource"],
  },
  subjects,
  evaluate: each((entry, context) => {
    const { specifiedLbfIn: asked, achievedLbfIn: reached, tolerancePercent: stated } = entry;
    if (asked === null) return ask(entry, "specifiedLbfIn", "torque asked for");
    if (reached === null) return ask(entry, "achievedLbfIn", "torque reached");
    const percent = stated ?? context.limit("tolerancePercent");
    const off = (100 * Math.abs(reached - asked)) / asked;
    if (off <= percent + 1e-9) return PASS;
    const anchor = equipmentRef(entry.equipment);
    const page = context.graph.port(entry.equipment, entry.port)?.data.terminal?.torqueSource ?? "";
    return found({
      variant: `${entry.port}-${entry.id}`, anchor, field: `torques.${entry.id}.achievedLbfIn`, related: [], ...(stated === null ? {} : { severity: "must-fix" as const, instruction: page }),
      message: `${nameOf(context, anchor)}: ${reached} lbf·in recorded on ${entry.on}, ${asked} lbf·in asked for${stated === null ? "" : `, ± ${stated} %`}. Loosen it fully, look at it and terminate it again; do not only tighten on.`,
      steps: [{ symbol: "d", expression: "difference / value asked for", substituted: `|${reached} − ${asked}| / ${asked}`, result: off, unit: "%" }, comparison("d", off, percent, "%", false)],
    });
  }),
  examples: { violates: "106 lbf·in asked for, 35 lbf·in recorded.", passes: "106 lbf·in recorded." },
};

/** Calibration of the tool on the day it was used. */
export const torqueToolStale: Rule = {
  meta: {
    ...group, id: "torque-tool-stale", severity: "advice",
    statement: "The torque tool should be within its calibration interval on the day it is used.",
    risk: "Every joint of that day has a value that nobody can vouch for.",
    citations: sections(["110.14(D)", "unconfirmed"], ["110.14(D)", "unconfirmed"], ["110.14(D)", "unconfirmed"]), limits: {},
    reads: ["torques.tool", "torques.toolDueOn", "torques.on"],
  },
  subjects,
  evaluate: each((entry, context) => {
    if (entry.tool.trim() === "") return NOT_APPLICABLE;
    if (entry.toolDueOn === null) return ask(entry, "toolDueOn", `day on which the calibration of ${entry.tool} ends`);
    if (entry.on <= entry.toolDueOn) return PASS;
    const anchor = equipmentRef(entry.equipment);
    return found({
      variant: `${entry.port}-${entry.id}`, anchor, field: `torques.${entry.id}.toolDueOn`, related: [],
      // The 2017 text asks for a calibrated tool; later ones for any approved means.
      ...(context.edition === "2017" ? { severity: "should-fix" as const } : {}),
      message: `${nameOf(context, anchor)} was tightened on ${entry.on} with ${entry.tool}, whose calibration ended on ${entry.toolDueOn}.`,
      steps: [{ symbol: "day", expression: "not after the end of the calibration", substituted: `${entry.on} ≤ ${entry.toolDueOn}`, result: "fails", unit: "" }],
    });
  }),
  examples: { violates: "A tool due on 2026-03-01, used on 2026-05-02.", passes: "A tool in date." },
};
