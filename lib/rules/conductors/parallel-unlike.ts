import type { Circuit } from "@/lib/diagram/schema";
import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, PatchOperation, Rule } from "@/lib/rules/engine/types";
import { circuitRef, found, nameOf, PASS, Reader } from "@/lib/rules/shared/outcome";
import { parallelRuns } from "@/lib/rules/shared/sets";

/** What must be alike in every run of a pole, by words; null where it is not known. */
function traits(context: CheckContext, id: string, reader: Reader): Readonly<Record<string, string | null>> {
  const list = context.graph.sections(id);
  const name = nameOf(context, circuitRef(id));
  for (const section of list) {
    const at = `sections.${section.id}`;
    if (section.lengthFt === null) reader.ask(circuitRef(id), `${at}.lengthFt`, `length of ${name}`);
    if (section.ungrounded?.size == null) reader.ask(circuitRef(id), `${at}.ungrounded.size`, `size of the conductors of ${name}`);
    if (section.ungrounded?.metal == null) reader.ask(circuitRef(id), `${at}.ungrounded.metal`, `metal of the conductors of ${name}`);
    if (section.ungrounded?.insulation == null) reader.ask(circuitRef(id), `${at}.ungrounded.insulation`, `insulation of the conductors of ${name}`);
  }
  const join = (values: readonly (string | null | undefined)[]): string | null => (values.some((value) => value == null) ? null : values.join(", "));
  return {
    length: list.some((section) => section.lengthFt === null) ? null : `${Math.round(list.reduce((sum, section) => sum + (section.lengthFt ?? 0), 0) * 100) / 100} ft`,
    size: join(list.map((section) => section.ungrounded?.size)), metal: join(list.map((section) => section.ungrounded?.metal)), insulation: join(list.map((section) => section.ungrounded?.insulation)),
  };
}

export const parallelUnlike: Rule = {
  meta: {
    id: "parallel-unlike", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "Conductors in parallel for one pole must have the same length, metal, size, insulation and termination.",
    risk: "The shorter or larger run carries more than its share and overheats behind a device that sees only the sum.",
    citations: sections(["310.10(H)(2)", "read"], ["310.10(G)(2)", "read"], ["310.10(G)(2)", "read"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.from", "circuits.to", "circuits.sections.lengthFt", "circuits.sections.ungrounded"], absorbs: [],
  },
  // Packs and strings with a device of their own end at different terminals and are judged by the lead lengths.
  subjects: (context) => parallelRuns(context).map((group) => circuitRef(group[0] ?? "")),
  evaluate: (anchor, context): Outcome => {
    const group = parallelRuns(context).find((one) => one[0] === anchor.id) ?? [];
    const reader = new Reader(context);
    const each = group.map((id) => ({ id, traits: traits(context, id, reader) }));
    const [first, ...others] = each;
    for (const trait of ["length", "metal", "size", "insulation"]) {
      const odd = others.find((one) => one.traits[trait] != null && first?.traits[trait] != null && one.traits[trait] !== first.traits[trait]);
      if (!odd || !first) continue;
      return found({
        variant: `unlike-${trait}`, anchor, field: trait === "length" ? "sections" : `sections.ungrounded.${trait}`, related: group.filter((id) => id !== anchor.id).map(circuitRef),
        message: `${nameOf(context, anchor)} and ${nameOf(context, circuitRef(odd.id))} are in parallel and differ in ${trait}: ${first.traits[trait]} and ${odd.traits[trait]}.`,
        steps: each.map((one) => ({ symbol: trait, expression: nameOf(context, circuitRef(one.id)), substituted: "", result: one.traits[trait] ?? "not known", unit: "" })),
      });
    }
    return reader.complete ? PASS : reader.outcome();
  },
  suggest: ({ anchor, related }, context) => {
    const first = context.graph.sections(anchor.id);
    const [model] = first;
    if (first.length !== 1 || !model) return [];
    const patches = related.flatMap((ref): PatchOperation[] => {
      const list = Object.entries((context.drawing.circuits[ref.id] as Circuit).sections);
      const [only] = list;
      return list.length === 1 && only ? [{ op: "replace", path: `/circuits/${ref.id}/sections/${only[0]}/lengthFt`, value: model.lengthFt }, { op: "replace", path: `/circuits/${ref.id}/sections/${only[0]}/ungrounded`, value: model.ungrounded }] : [];
    });
    return patches.length > 0 ? [{ label: `Make every run like ${nameOf(context, anchor)}`, also: "Cut them together and land them at like terminals.", patches }] : [];
  },
  examples: { violates: "1/0 AWG of 8 ft in parallel with 1/0 AWG of 11 ft.", passes: "Both 8 ft." },
};
