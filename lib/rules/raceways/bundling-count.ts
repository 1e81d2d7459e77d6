import { NEVER_MUST_FIX, sections } from "@/lib/rules/engine/meta";
import type { Rule } from "@/lib/rules/engine/types";
import { currentCarrying } from "@/lib/rules/shared/conductors";
import { deratingOf } from "@/lib/rules/shared/derating";
import { circuitRef, found, nameOf, NOT_APPLICABLE, PASS, racewayRef } from "@/lib/rules/shared/outcome";
import { powerCircuits } from "@/lib/rules/shared/topology";

export const bundlingCount: Rule = {
  meta: {
    id: "bundling-count", group: "Raceways and separation", severity: "should-fix", evidence: "derived",
    statement: "More than three current-carrying conductors over more than 24 in ask for an adjustment, and it is what the circuit fails by.",
    risk: "Conductors heat each other; the number of them is the cause to remove.",
    citations: sections(["310.15(B)(3)(a)", "unconfirmed"], ["310.15(C)(1)", "unconfirmed"], ["310.15(C)(1)", "unconfirmed"]),
    mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["circuits.sections.route", "circuits.sections.ungrounded", "circuits.sections.grounded", "raceways.stretches", "raceways.kind", "interlocks"], absorbs: [],
  },
  subjects: ({ graph }) => powerCircuits(graph).filter((id) => graph.racewaysOf(id).length > 0).map(circuitRef),
  evaluate: ({ id }, context) => {
    const { shortfalls, judged, outcome } = deratingOf(context, id);
    const cause = shortfalls.find((one) => one.byBundling);
    if (!cause) return outcome ?? (judged ? PASS : NOT_APPLICABLE);
    const anchor = circuitRef(id);
    const label = cause.ampacity.detail.parts[cause.ampacity.detail.governingPart];
    const steps = cause.section.route.map((step) => ({ step, count: currentCarrying(context, step.raceway, step.compartment) }));
    const crowded = steps.filter(({ count }) => count > 3);
    const worst = crowded.toSorted((a, b) => b.count - a.count)[0];
    return found({
      variant: "crowded", anchor, related: crowded.map(({ step }) => racewayRef(step.raceway)),
      message: `${nameOf(context, anchor)} lies with ${worst?.count ?? 0} current-carrying conductors in ${label?.label ?? "its raceway"}; without that it would carry its current.`,
      steps: crowded.map(({ step, count }) => ({ symbol: "n", expression: "current-carrying conductors", substituted: nameOf(context, racewayRef(step.raceway)), result: count, unit: "" })),
    });
  },
  examples: { violates: "Eight PV conductors in one raceway figured at 100 %.", passes: "The same conductors figured at 70 %, and still enough." },
};
