import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { Rule } from "@/lib/rules/engine/types";
import { circuitRef, equipmentRef, found, isTrue, nameOf, NOT_APPLICABLE, numberOf, PASS, Reader } from "@/lib/rules/shared/outcome";
import { comparison } from "@/lib/rules/shared/protection";
import { coldVoltage, pvStrings, stringRun } from "@/lib/rules/shared/strings";

export const stringOverInverter: Rule = {
  meta: {
    id: "string-over-inverter", group: "PV source circuits", severity: "must-fix", evidence: "rated",
    statement: "The open-circuit voltage of a string on the coldest day stays within the inverter's largest dc input voltage.",
    risk: "One cold morning destroys the inverter, and its warranty does not cover it.",
    citations: sameSection("690.7(A)"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.modules", "equipment.props.openCircuitV", "equipment.props.openCircuitPercentPerC", "equipment.props.pvMaximumV", "site.recordLowC", "circuits.from", "circuits.to"],
    absorbs: ["insulation-voltage-class", "string-over-building-cap"],
  },
  subjects: (context) => pvStrings(context).map(equipmentRef),
  evaluate: ({ id }, context) => {
    const run = stringRun(context, id);
    if (!run || run.inverter === null || isTrue(context, id, "converters")) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const limitV = reader.number(run.inverter, "pvMaximumV");
    const cold = coldVoltage(context, id, reader, limitV ?? undefined);
    if (limitV === null || !cold) return reader.outcome();
    if (cold.value <= limitV + 1e-9) return PASS;
    const anchor = circuitRef(run.circuit);
    // Switches on the way that the same voltage breaks belong to this one fault.
    const weak = run.passed.filter((one) => { const ratingV = numberOf(context, one, "voltageV"); return ratingV !== null && ratingV < cold.value; });
    return found({
      variant: "above-input", anchor, related: [run.inverter, ...weak, id].map(equipmentRef),
      message: `${nameOf(context, anchor)} reaches ${cold.value.toFixed(1)} V at ${context.drawing.site.recordLowC} °C; ${nameOf(context, equipmentRef(run.inverter))} takes ${limitV} V at most.`,
      steps: [...cold.steps, comparison("Vmax", cold.value, limitV, "V", false, 1)],
    });
  },
  suggest: (finding, context) => {
    const string = finding.related.find((ref) => ref.collection === "equipment" && context.graph.kind(ref.id).capabilities.source === "pv")?.id;
    const inverter = finding.related[0]?.id;
    if (string === undefined || inverter === undefined) return [];
    const most = coldVoltage(context, string, new Reader(context), numberOf(context, inverter, "pvMaximumV") ?? undefined)?.detail.largestModuleCount ?? 0;
    return most < 1 ? [] : [{ label: `Use ${most} modules in series`, also: "Check the hot operating voltage and the number of strings.", patches: [{ op: "replace", path: `/equipment/${string}/props/modules`, value: most }] }];
  },
  examples: { violates: "14 modules of 38.6 V at −24 °C: 609 V on a 600 V input.", passes: "12 modules: 522 V." },
};
