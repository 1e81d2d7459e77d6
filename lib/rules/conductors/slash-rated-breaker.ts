import { equipmentOfNode } from "@/lib/diagram/graph";
import { NEVER_MUST_FIX, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { breakers } from "@/lib/rules/shared/backfeed";
import { equipmentRef, found, nameOf, names, NOT_APPLICABLE, numberOf, PASS, propertyLabel, Reader } from "@/lib/rules/shared/outcome";
import { serviceSystem } from "@/lib/rules/shared/voltage";
import type { Island } from "@/lib/states/types";

const acBreakers = (context: CheckContext): readonly string[] => breakers(context).filter((id) => context.graph.port(id, "line")?.system === "ac" && (numberOf(context, id, "poles") ?? 2) > 1);
/** What names the systems without a bond: the utility before a set, a set before an inverter. */
function sourceOf(context: CheckContext, islands: readonly Island[]): string {
  const all = [...new Set(islands.flatMap((island) => [...island.sources, ...island.converters]))].sort();
  const { kind } = context.graph;
  return all.find((id) => kind(id).capabilities.source === "utility") ?? all.find((id) => kind(id).capabilities.source === "generator") ?? all[0] ?? "";
}

export const slashRatedBreaker: Rule = {
  meta: {
    id: "slash-rated-breaker", group: "Conductors and overcurrent", severity: "should-fix", evidence: "derived",
    statement: "A breaker with a slash rating should stand only on a solidly grounded system in which each pole is within the lower figure to ground.",
    risk: "A first ground fault on an ungrounded system puts the full voltage across one pole, which is not tested for it.",
    citations: sameSection("240.85", ["unconfirmed", "unconfirmed", "unconfirmed"]), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["equipment.props.slashRated", "equipment.props.voltageV", "bonds.equipment", "bonds.fitted", "site.serviceSystem", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: ({ drawing, graph }) => Object.keys(drawing.equipment).sort().filter((id) => { const { source, converter } = graph.kind(id).capabilities; return source === "utility" || source === "generator" || converter === true; }).slice(0, 1).map(equipmentRef),
  evaluate: (_ref, context): Outcome | readonly Outcome[] => {
    const slash = new Set(acBreakers(context).filter((id) => context.drawing.equipment[id]?.props.slashRated === true));
    const reader = new Reader(context);
    for (const id of acBreakers(context)) if ((context.drawing.equipment[id]?.props.slashRated ?? null) === null) reader.ask(equipmentRef(id), "props.slashRated", propertyLabel(context, id, "slashRated"));
    const open: Island[] = [];
    const live = new Set<string>();
    for (const state of context.states().allowed) {
      if (state.group === "off" || slash.size === 0) continue;
      for (const island of state.islands) {
        // One bond in the mode grounds the system; several are the rule of bonds.
        if (island.bondGroups.length > 0 || island.sources.length + island.converters.length === 0) continue;
        const breakersHere = [...island.nodes].map(equipmentOfNode).filter((id) => slash.has(id));
        if (breakersHere.length > 0) open.push(island);
        for (const id of breakersHere) live.add(id);
      }
    }
    const outcomes = open.length > 0 ? [ungrounded(context, sourceOf(context, open), [...live].sort())] : [];
    const system = serviceSystem(context);
    const high = system?.highLegV ?? null;
    const over = high === null ? [] : [...slash].sort().filter((id) => high > (numberOf(context, id, "voltageV") ?? 240) / 2);
    if (high !== null && over.length > 0) outcomes.push(highLeg(context, high, over));
    if (outcomes.length === 0 && !reader.complete) return reader.outcome();
    return outcomes.length > 0 ? outcomes : slash.size > 0 ? PASS : NOT_APPLICABLE;
  },
  examples: { violates: "A breaker of 120/240 V on the output of a set whose neutral is bonded nowhere.", passes: "The same breaker on a system with its neutral bonded." },
};

function ungrounded(context: CheckContext, source: string, list: readonly string[]): Outcome {
  const anchor = equipmentRef(source);
  return found({
    variant: "not-grounded", anchor, related: list.map(equipmentRef), message: `${nameOf(context, anchor)} is not solidly grounded in every state; ${names(context, list.map(equipmentRef))} ${list.length === 1 ? "has a slash rating and" : "have slash ratings and"} should be straight rated.`,
    steps: [{ symbol: "n", expression: "neutral-to-ground bonds in force", substituted: nameOf(context, anchor), result: 0, unit: "" }],
  });
}
function highLeg(context: CheckContext, volts: number, list: readonly string[]): Outcome {
  const anchor = equipmentRef(list[0] ?? "");
  return found({
    variant: "high-leg", anchor, field: "props.slashRated", related: list.slice(1).map(equipmentRef), message: `${names(context, list.map(equipmentRef))}: the high leg stands ${volts} V above ground, more than the lower figure of the slash rating.`,
    steps: [{ symbol: "U", expression: "lower figure not below the voltage to ground", substituted: `${(numberOf(context, anchor.id, "voltageV") ?? 240) / 2} V ≥ ${volts} V`, result: "fails", unit: "" }],
  });
}
