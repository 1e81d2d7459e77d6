import { PARALLEL_MIN_SIZE } from "@/lib/code/tables/source-constants";
import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, PatchOperation, Rule } from "@/lib/rules/engine/types";
import { columnAmpacityA, terminalsOf, wireOf } from "@/lib/rules/shared/conductors";
import { circuitRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { fitsTerminals } from "@/lib/rules/shared/protection";
import { parallelRuns } from "@/lib/rules/shared/sets";
import { powerCircuits } from "@/lib/rules/shared/topology";
import { compareSizes, CONDUCTOR_SIZES } from "@/lib/units";

const inParallel = (context: CheckContext, id: string): readonly string[] => parallelRuns(context).find((group) => group.includes(id)) ?? [];
const ROLES = ["ungrounded", "grounded"] as const;

export const parallelTooSmall: Rule = {
  meta: {
    id: "parallel-too-small", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "Power conductors joined in parallel at both ends must be 1/0 AWG or larger.",
    risk: "Small conductors never share the current evenly; one carries most of it and nothing protects it.",
    citations: sections(["310.10(H)(1)", "read"], ["310.10(G)(1)", "read"], ["310.10(G)(1)", "read"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.sections.parallelSets", "circuits.sections.ungrounded.size", "circuits.from", "circuits.to"], absorbs: [],
  },
  // Runs with a device or a source of their own are joined at one end only and are no parallel conductors.
  subjects: (context) => context.once("circuits with parallel conductors", () => {
    const joined = new Set(parallelRuns(context).flat());
    return powerCircuits(context.graph).filter((id) => joined.has(id) || Object.values(context.drawing.circuits[id]?.sections ?? {}).some((section) => section.parallelSets > 1));
  }).map(circuitRef),
  evaluate: (anchor, context) => {
    const { id } = anchor;
    const reader = new Reader(context);
    const group = inParallel(context, id);
    for (const section of context.graph.sections(id)) {
      if (section.parallelSets < 2 && group.length === 0) continue;
      const wire = wireOf(context, id, section, reader);
      if (!wire || compareSizes(wire.size, PARALLEL_MIN_SIZE) >= 0) continue;
      const count = section.parallelSets > 1 ? section.parallelSets : group.length;
      return found({
        variant: "below-1-0", anchor, field: `sections.${section.id}.ungrounded.size`, related: group.filter((one) => one !== id).map(circuitRef),
        message: `${nameOf(context, anchor)} runs ${count} × ${wire.size} in parallel; parallel conductors must be ${PARALLEL_MIN_SIZE} or larger.`,
        steps: [{ symbol: "size", expression: "not below", substituted: `${wire.size} ≥ ${PARALLEL_MIN_SIZE}`, result: "fails", unit: "" }],
      });
    }
    return reader.complete ? (context.graph.sections(id).length > 0 ? PASS : NOT_APPLICABLE) : reader.outcome();
  },
  suggest: ({ anchor: { id }, anchor }, context) => {
    if (inParallel(context, id).length > 0) return [];
    let label = "";
    const column = terminalsOf(context, id, null, 75).lowest;
    const patches = context.graph.sections(id).flatMap((section): PatchOperation[] => {
      const wire = section.parallelSets > 1 ? wireOf(context, id, section, new Reader(context)) : null;
      if (!wire) return [];
      const one = CONDUCTOR_SIZES.find((size) => compareSizes(size, wire.size) > 0 && fitsTerminals(context, id, size) && columnAmpacityA({ ...wire, size, sets: 1 }, column) >= columnAmpacityA(wire, column) - 1e-9);
      if (!one) return [];
      label = one;
      const base = `/circuits/${id}/sections/${section.id}`;
      return [{ op: "replace", path: `${base}/parallelSets`, value: 1 }, ...ROLES.flatMap((role): PatchOperation[] => (section[role] ? [{ op: "replace", path: `${base}/${role}/size`, value: one }, { op: "replace", path: `${base}/${role}/outerDiameterIn`, value: null }] : []))];
    });
    return patches.length > 0 ? [{ label: `Pull one ${label} a pole in ${nameOf(context, anchor)}`, also: "Check the raceway fill, the terminals and the equipment grounding conductor.", patches }] : [];
  },
  examples: { violates: "Two 2 AWG conductors a pole.", passes: "Two 1/0 AWG conductors a pole." },
};
