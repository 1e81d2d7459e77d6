import type { Circuit } from "@/lib/diagram/schema";
import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { circuitRef, equipmentRef, found, nameOf, names, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import type { StateGroup } from "@/lib/states/types";

type Groups = readonly (readonly string[])[];
const WORDS: Readonly<Record<StateGroup, string>> = { utility: "UTILITY", island: "ISLAND", generator: "GENERATOR", off: "OFF" };
const isService = (context: CheckContext, bonds: readonly string[]): boolean =>
  bonds.some((id) => { const kind = context.drawing.bonds[id]?.kind; return kind === "main bonding jumper" || kind === "supply-side bonding jumper"; });

/** Circuits that carry the neutral away from the equipment that holds a bond. */
function neutralCircuits(context: CheckContext, owner: string): readonly string[] {
  const { drawing, graph } = context;
  return Object.keys(drawing.circuits).sort().filter((id) => {
    const circuit = drawing.circuits[id] as Circuit;
    const ends = [circuit.from, circuit.to].map((end) => graph.neutralOwner(end.equipment));
    return circuit.wiring === "field" && ends.includes(owner) && ends[0] !== ends[1] && Object.values(circuit.sections).some((section) => (section.grounded?.count ?? 0) > 0);
  });
}
/** A second bond at an outdoor source is lawful where no metal but the neutral runs back: 250.30(A)(1) exception. */
const separateSources = new WeakMap<CheckContext["graph"], Map<string, boolean>>();
function noParallelPath(context: CheckContext, owner: string): boolean {
  // Asked for every state; the answer hangs on the wiring alone.
  const answers = separateSources.get(context.graph) ?? new Map<string, boolean>();
  separateSources.set(context.graph, answers);
  const before = answers.get(owner);
  if (before !== undefined) return before;
  const answer = outdoorWithoutPath(context, owner);
  answers.set(owner, answer);
  return answer;
}
function outdoorWithoutPath(context: CheckContext, owner: string): boolean {
  const { drawing } = context;
  if (drawing.equipment[owner]?.location.exposure !== "outdoor" || context.graph.kind(owner).capabilities.source !== "generator") return false;
  const circuits = neutralCircuits(context, owner);
  return circuits.length > 0 && circuits.every((id) => Object.values((drawing.circuits[id] as Circuit).sections).every((section) =>
    (section.equipmentGround?.count ?? 0) === 0 && section.sharesGroundOf === null && section.route.length > 0 && section.route.every((step) => drawing.raceways[step.raceway]?.metal === false)));
}
const ownersOf = (context: CheckContext, bonds: readonly string[]): readonly string[] => [...new Set(bonds.map((id) => context.drawing.bonds[id]?.equipment ?? ""))];

/** Bond groups that count as separate joints of one neutral. */
const separate = (context: CheckContext, groups: Groups): Groups => groups.filter((bonds) => !ownersOf(context, bonds).every((owner) => noParallelPath(context, owner)));

interface Fault { groups: Groups; states: Set<StateGroup> }

export const neutralBondCount: Rule = {
  meta: {
    id: "neutral-bond-count", group: "Grounding and bonding", severity: "must-fix", evidence: "derived",
    statement: "In every operating state the neutral of each connected system is joined to ground at exactly one place.",
    risk: "With two joints neutral current flows on metal that people touch and ground-fault devices trip or stay blind; with none a fault to ground does not trip anything.",
    citations: sections(["250.24(A)(5), 250.30(A)(1)", "read"], ["250.24(A)(5), 250.30(A)(1)", "read"], ["250.24(B), 250.30(A)(1)", "read"]),
    mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["bonds.equipment", "bonds.fitted", "bonds.closes", "circuits.sections.grounded", "circuits.from", "circuits.to", "interlocks"],
    absorbs: ["generator-bond-vs-transfer", "inverter-bond-relay", "neutral-bond-missing", "slash-rated-breaker"],
  },
  subjects: ({ drawing, graph }) => Object.keys(drawing.equipment).sort().filter((id) => { const { source } = graph.kind(id).capabilities; return source === "utility" || source === "generator"; }).slice(0, 1).map(equipmentRef),
  evaluate: (_ref, context) => {
    const reader = new Reader(context);
    for (const [id, bond] of Object.entries(context.drawing.bonds)) {
      if (bond.fitted === null) reader.ask({ collection: "bonds", id }, "fitted", `whether ${bond.kind} ${bond.tag} is fitted`);
    }
    const faults = new Map<string, Fault>();
    let judged = false;
    for (const state of context.states().allowed) {
      if (state.group === "off") continue;
      for (const island of state.islands) {
        if (!island.hasNeutral || island.sources.length + island.converters.length === 0) continue;
        judged = true;
        const groups = island.bondGroups.length > 1 ? separate(context, island.bondGroups) : island.bondGroups;
        // Two joints are known to be too many; none may only be not known yet.
        if (groups.length === 1 || (groups.length === 0 && !reader.complete)) continue;
        const key = groups.map((bonds) => bonds.join("+")).sort().join(" ");
        const fault = faults.get(key) ?? { groups, states: new Set<StateGroup>() };
        fault.states.add(state.group);
        faults.set(key, fault);
      }
    }
    if (!judged) return NOT_APPLICABLE;
    const outcomes = [...faults.values()].map((fault) => (fault.groups.length === 0 ? none(context, fault) : several(context, fault)));
    if (!reader.complete) outcomes.push(reader.outcome());
    return outcomes.length > 0 ? outcomes : PASS;
  },
  suggest: (finding, context) => finding.variant !== "several" ? [] : Object.entries(context.drawing.bonds)
    .filter(([, bond]) => bond.equipment === finding.anchor.id && bond.fitted === true)
    .map(([id, bond]) => ({
      label: `Remove ${bond.kind} ${bond.tag} of ${nameOf(context, finding.anchor)}`, also: "By the maker's instructions and by a qualified person; post the sign that the neutral is bonded at the service.",
      patches: [{ op: "replace" as const, path: `/bonds/${id}/fitted`, value: false }],
    })),
  examples: { violates: "Main bonding jumper in the meter-main and the strap of a generator left in, neutral solid.", passes: "Strap taken out; the one joint is in the meter-main." },
};

const inStates = (states: ReadonlySet<StateGroup>): string => { const list = (["utility", "island", "generator"] as const).filter((each) => states.has(each)).map((each) => WORDS[each]); return list.length < 2 ? list.join("") : `${list.slice(0, -1).join(", ")} and ${list.at(-1)}`; };
function several(context: CheckContext, { groups, states }: Fault) {
  // The service's own joint is the one that stays; the other is the fault.
  const order = groups.toSorted((a, b) => Number(isService(context, a)) - Number(isService(context, b)) || (a.join() < b.join() ? -1 : 1));
  const owners = [...new Set(order.flatMap((bonds) => ownersOf(context, bonds)))];
  const [first = "", ...others] = owners;
  return found({
    variant: "several", anchor: equipmentRef(first), related: [...others.map(equipmentRef), ...neutralCircuits(context, first).map(circuitRef)],
    message: `The neutral is bonded in ${names(context, owners.map(equipmentRef))}: ${groups.length} bonds in ${inStates(states)}, where there must be one.`,
    steps: order.map((bonds) => ({ symbol: bonds.map((id) => context.drawing.bonds[id]?.tag).join(", "), expression: "neutral-to-ground bond in force", substituted: names(context, ownersOf(context, bonds).map(equipmentRef)), result: "fitted", unit: "" })),
  });
}
function none(context: CheckContext, { states }: Fault) {
  const source = Object.keys(context.drawing.equipment).sort().find((id) => context.graph.kind(id).capabilities.source === (states.has("utility") ? "utility" : "generator"))
    ?? Object.keys(context.drawing.equipment).sort().find((id) => context.graph.kind(id).capabilities.converter) ?? "";
  return found({
    variant: "none", anchor: equipmentRef(source), related: [],
    message: `The neutral is bonded to ground nowhere in ${inStates(states)}. There must be one bond.`,
    steps: [{ symbol: "n", expression: "neutral-to-ground bonds in force", substituted: inStates(states), result: 0, unit: "" }],
  });
}
