import { shown } from "@/lib/calc";
import { nodeKey } from "@/lib/diagram/graph";
import { NEVER_MUST_FIX, notCode, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { ratingRule } from "@/lib/rules/families/rating";
import { outputA } from "@/lib/rules/shared/currents";
import { circuitsTo, faultCurrents, faultRows, faultSteps, FAULT_CONVENTION, statedFaultA, totalA } from "@/lib/rules/shared/faultCurrent";
import { fewNames } from "@/lib/rules/shared/faultJudgment";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, numberOf, PASS, propertyLabel, Reader } from "@/lib/rules/shared/outcome";

const utilitiesOf = ({ drawing, graph }: CheckContext): readonly string[] => Object.keys(drawing.equipment).sort().filter((id) => graph.kind(id).capabilities.source === "utility");

/** What the utility gives stands on the plans with who said it and when. */
export const faultCurrentMissing: Rule = {
  meta: {
    id: "fault-current-missing", group: "Fault current and ratings", severity: "should-fix", evidence: "derived",
    statement: "The available fault current at the service stands on the plans with its source and date.",
    risk: "Without it no interrupting and no short-circuit rating can be judged, at plan check or later.",
    citations: sections(["110.24(A), 110.9", "unconfirmed"], ["110.24(A), 230.85, 110.9", "unconfirmed"], ["110.24(A), 230.85, 110.9", "unconfirmed"]), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["site.availableFaultCurrentA", "site.faultCurrentSource", "site.faultCurrentOn", "equipment.props.availableFaultCurrentA", "equipment.sources", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: (context) => utilitiesOf(context).map(equipmentRef),
  evaluate: (anchor, context) => {
    const { site } = context.drawing;
    // A utility that feeds nothing on the drawing has no service yet.
    if (context.graph.circuitsAt(anchor.id).length === 0) return NOT_APPLICABLE;
    const stated = statedFaultA(context, anchor.id);
    const reader = new Reader(context);
    if (stated === null) {
      reader.ask(anchor, "props.availableFaultCurrentA", propertyLabel(context, anchor.id, "availableFaultCurrentA"));
      return reader.outcome();
    }
    const source = (site.faultCurrentSource ?? "").trim() !== "" || (context.drawing.equipment[anchor.id]?.sources.availableFaultCurrentA?.document ?? "").trim() !== "";
    const missing = [...(source ? [] : ["source"]), ...(site.faultCurrentOn ? [] : ["date"])];
    if (missing.length === 0) return PASS;
    return found({
      variant: missing.join("-"), anchor, field: source ? "site.faultCurrentOn" : "site.faultCurrentSource", related: [],
      message: `${shown(stated, 0)} A available at the service without ${missing.join(" and ")}. The plans should say who gave it and on which day.`, steps: [],
    });
  },
  examples: { violates: "10,400 A without letter and date.", passes: "10,400 A, the utility's letter of March 12, 2026." },
};

/** Equipment that carries the fault current only because conductors weaken it: the computation belongs on the sheet. */
export const faultAttenuation: Rule = {
  meta: {
    id: "fault-attenuation", group: "Fault current and ratings", severity: "advice", evidence: "derived",
    statement: "Where a rating holds only because conductors weaken the fault current, the computation by conductor length is shown.",
    risk: "The reviewer takes the service figure and rejects lawful equipment.",
    citations: notCode("good practice"), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["equipment.props.shortCircuitKA", "equipment.props.interruptingKA", "equipment.props.availableFaultCurrentA", "circuits.from", "circuits.to", "circuits.sections", "sheet.tables"], absorbs: [],
  },
  subjects: (context) => utilitiesOf(context).map(equipmentRef),
  evaluate: (anchor, context) => {
    const stated = statedFaultA(context, anchor.id);
    const reader = new Reader(context);
    if (stated === null) { reader.ask(anchor, "props.availableFaultCurrentA", propertyLabel(context, anchor.id, "availableFaultCurrentA")); return reader.outcome(); }
    const leaning = faultRows(context).filter(({ point, ratingKA }) => ratingKA !== null && ratingKA * 1000 < stated + point.invertersA && ratingKA * 1000 >= totalA(point)
      && point.source?.id === anchor.id && circuitsTo(point).length > 0);
    const [first] = leaning;
    if (!first) return NOT_APPLICABLE;
    if (context.drawing.sheet.tables["fault-current"]) return PASS;
    return found({
      variant: "not-shown", anchor, related: [...leaning.map((row) => equipmentRef(row.equipment)), ...circuitsTo(first.point).map(circuitRef)],
      message: `${fewNames(context, leaning.map((row) => row.equipment))} ${leaning.length === 1 ? "is" : "are"} rated below the ${shown(stated, 0)} A of the service and ${leaning.length === 1 ? "holds" : "hold"} by the length of conductors. The computation should be on the sheet.`,
      steps: [...faultSteps(context, first.point), { symbol: "Note", expression: FAULT_CONVENTION, substituted: "", result: "", unit: "" }],
    });
  },
  suggest: () => [{ label: "Place the fault-current table on the sheet", also: "Drag it to where there is room.", patches: [{ op: "add", path: "/sheet/tables/fault-current", value: { x: 2, y: 48 } }] }],
  examples: { violates: "Gear of 10 kA at 6,350 A, with 10,400 A at the service and no computation on the sheet.", passes: "The table beside the one-line, 10,400 A to 6,350 A by 46 ft of 1 AWG." },
};

/** What inverters add is stated, and is not less than what they feed in service. */
export const inverterContribution: Rule = ratingRule({
  meta: {
    id: "inverter-contribution", group: "Fault current and ratings", severity: "advice", evidence: "rated",
    statement: "The fault current of each inverter is stated from its data sheet and added to that of the utility.",
    risk: "All sources count toward the fault current; a share that is left out is never checked.",
    citations: sections(["705.16, 110.9, 110.10", "unconfirmed"], ["110.9, 110.10", "unconfirmed"], ["110.9, 110.10", "unconfirmed"]), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["equipment.props.faultA", "equipment.props.continuousA", "circuits.from", "circuits.to"], absorbs: [],
  },
  variant: "below-output", unit: "A", bound: "least", name: "fault current contribution",
  subjects: (context) => Object.keys(context.drawing.equipment).sort().filter((id) => context.graph.kind(id).capabilities.converter && context.graph.port(id, "ac") !== null).map(equipmentRef),
  demand: ({ id }, context, reader) => {
    // Alone on an island nothing adds to anything.
    const point = faultCurrents(context).at(nodeKey(id, "ac"));
    if (!point?.source) return null;
    const output = outputA(context, id, reader);
    return output === null ? null : { value: output, words: `its output alone is` };
  },
  rating: ({ id }, context) => ({ value: numberOf(context, id, "faultA"), field: "props.faultA", label: `${propertyLabel(context, id, "faultA")} of ${nameOf(context, equipmentRef(id))}` }),
  examples: { violates: "Fault current of 10 A stated for an inverter of 32.5 A.", passes: "Two inverters of 60 A for one cycle, added to 6,350 A." },
});
export const faultRatingRules: readonly Rule[] = [faultCurrentMissing, faultAttenuation, inverterContribution];
