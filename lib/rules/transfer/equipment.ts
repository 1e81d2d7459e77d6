import { MUST_FIX_TO_2023, NEVER_MUST_FIX, notCode, sameSection, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { ratingRule } from "@/lib/rules/families/rating";
import { deviceRatingA } from "@/lib/rules/shared/conductors";
import { equipmentRef, found, isTrue, nameOf, NOT_APPLICABLE, numberOf, PASS, propertyLabel, textOf } from "@/lib/rules/shared/outcome";
import { topology } from "@/lib/rules/shared/topology";

const base = { group: "Generators and transfer", absorbs: [] } as const;
const all = (context: CheckContext): readonly string[] => Object.keys(context.drawing.equipment).sort();
const transfers = (context: CheckContext): readonly string[] => all(context).filter((id) => context.graph.kind(id).capabilities.switching === "transfer");
const inlets = (context: CheckContext): readonly string[] => all(context).filter((id) => context.drawing.equipment[id]?.kind === "power-inlet");

/** First overcurrent devices along the circuits that leave a port. */
const away = (context: CheckContext, id: string, port: string): readonly string[] =>
  context.graph.circuitsAt(id, port).flatMap((circuit) => topology(context.graph).runs(circuit, context.drawing.circuits[circuit]?.from.equipment === id ? "to" : "from")
    .flatMap((run) => (run.device === null || run.device === id ? [] : [run.device])));

export const transferRating = ratingRule({
  meta: {
    ...base, id: "transfer-rating", severity: "must-fix", evidence: "rated",
    statement: "Transfer equipment is rated for the device of each source it takes over.", risk: "Its contacts weld on the first long load, and both sources may stay joined.",
    citations: sections(["702.5, 110.3(B)", "read"], ["702.5, 110.3(B)", "read"], ["702.5, 110.3(B)", "read"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.ratingA", "circuits.from", "circuits.to"],
  },
  variant: "below-device", unit: "A", bound: "least", name: "Transfer equipment",
  subjects: (context) => transfers(context).map(equipmentRef),
  demand: (ref, context, reader) => {
    const devices = ["a", "b"].flatMap((port) => away(context, ref.id, port));
    let best: { value: number; device: string } | null = null;
    for (const device of new Set(devices)) {
      const value = deviceRatingA(context, device);
      const field = topology(context.graph).ratingField(device) ?? "ratingA";
      if (value === null) reader.ask(equipmentRef(device), `props.${field}`, propertyLabel(context, device, field));
      else if (!best || value > best.value) best = { value, device };
    }
    return best && { value: best.value, words: "the device ahead of it is", related: [equipmentRef(best.device)] };
  },
  rating: (ref, context) => ({ value: numberOf(context, ref.id, "ratingA"), field: "props.ratingA", label: propertyLabel(context, ref.id, "ratingA") }),
  examples: { violates: "A 100 A transfer switch behind a 125 A breaker.", passes: "A 125 A switch." },
});

export const interlockNotListed: Rule = {
  meta: {
    ...base, id: "interlock-not-listed", severity: "must-fix", evidence: "rated",
    statement: "An interlock is listed for the panelboard and the breakers it holds apart.", risk: "A home-made bar slips, and both sources are on.",
    citations: sameSection("702.5, 110.3(B)", ["unconfirmed", "unconfirmed", "unconfirmed"]), mustFixAllowed: NEVER_MUST_FIX, mustFixWith: "instruction", limits: {}, reads: ["interlocks.listed", "interlocks.kind"],
  },
  subjects: ({ drawing }) => Object.keys(drawing.interlocks).sort().map((id) => ({ collection: "interlocks" as const, id })),
  evaluate: (anchor, context): Outcome => {
    const interlock = context.drawing.interlocks[anchor.id];
    if (!interlock) return NOT_APPLICABLE;
    if (interlock.listed === true) return PASS;
    if (interlock.listed === null) return { outcome: "needs-data", fields: [{ ref: anchor, field: "listed", label: "listed for this panelboard and these breakers" }] };
    return found({ variant: "not-listed", anchor, field: "listed", related: Object.keys(interlock.switches).sort().map(equipmentRef), message: `${nameOf(context, anchor)} is not listed for its panelboard and breakers.`, steps: [] });
  },
  examples: { violates: "A home-made bar between two breakers.", passes: "A slide listed for the cabinet and its breaker family." },
};

export const inletInterlock100: Rule = {
  meta: {
    ...base, id: "inlet-interlock-100", severity: "must-fix", evidence: "rated", from: "2020",
    statement: "A power inlet of 100 A or more is listed and has an interlocked disconnect.", risk: "A loaded plug is pulled and arcs in the hand.",
    citations: sections(["702.7(C)", "unconfirmed"], ["702.7(D)", "agreed"], ["702.7(D)", "agreed"]), mustFixAllowed: MUST_FIX_TO_2023, limits: { ratingA: { value: 100, unit: "A", source: "702.7(D)" } },
    reads: ["equipment.props.ratingA", "equipment.props.interlockedSwitch"],
  },
  subjects: (context) => inlets(context).map(equipmentRef),
  evaluate: (anchor, context): Outcome => {
    const ratingA = numberOf(context, anchor.id, "ratingA");
    const interlocked = context.drawing.equipment[anchor.id]?.props.interlockedSwitch;
    if (ratingA === null) return { outcome: "needs-data", fields: [{ ref: anchor, field: "props.ratingA", label: propertyLabel(context, anchor.id, "ratingA") }] };
    if (ratingA < context.limit("ratingA")) return NOT_APPLICABLE;
    if (interlocked === true) return PASS;
    if (typeof interlocked !== "boolean") return { outcome: "needs-data", fields: [{ ref: anchor, field: "props.interlockedSwitch", label: propertyLabel(context, anchor.id, "interlockedSwitch") }] };
    return found({ variant: "plain", anchor, field: "props.interlockedSwitch", related: [], message: `${nameOf(context, anchor)} of ${ratingA} A has no interlocked disconnect.`, steps: [] });
  },
  examples: { violates: "200 A single-pole inlets without a switch.", passes: "A 200 A inlet with an interlocked switch." },
};

export const portableInlet: Rule = {
  meta: {
    ...base, id: "portable-inlet", severity: "should-fix", evidence: "rated",
    statement: "An inlet is rated for the device behind it and marked for the neutral of the set: bonded or floating.", risk: "A set with a bonded neutral is plugged in where the neutral is bonded already, or none is bonded at all.",
    citations: sameSection("702.7(C)", ["unconfirmed", "unconfirmed", "unconfirmed"]), mustFixAllowed: NEVER_MUST_FIX, limits: {}, reads: ["equipment.props.neutralMark", "equipment.props.ratingA", "circuits.from", "circuits.to"],
  },
  subjects: (context) => inlets(context).map(equipmentRef),
  evaluate: (anchor, context): Outcome | readonly Outcome[] => {
    const outcomes: Outcome[] = [];
    const mark = textOf(context, anchor.id, "neutralMark");
    if (mark === null) outcomes.push(found({ variant: "not-marked", anchor, field: "props.neutralMark", related: [], message: `${nameOf(context, anchor)} is not marked for a bonded or a floating neutral.`, steps: [] }));
    const ratingA = numberOf(context, anchor.id, "ratingA");
    const device = away(context, anchor.id, "load")[0] ?? null;
    const deviceA = device === null ? null : deviceRatingA(context, device);
    if (ratingA === null) outcomes.push({ outcome: "needs-data", fields: [{ ref: anchor, field: "props.ratingA", label: propertyLabel(context, anchor.id, "ratingA") }] });
    else if (device !== null && deviceA !== null && deviceA > ratingA) outcomes.push(found({ variant: "above-inlet", anchor, field: "props.ratingA", related: [equipmentRef(device)], message: `${nameOf(context, equipmentRef(device))} of ${deviceA} A stands behind ${nameOf(context, anchor)} of ${ratingA} A.`, steps: [] }));
    return outcomes.length > 0 ? outcomes : PASS;
  },
  examples: { violates: "An inlet without a mark.", passes: "A 30 A inlet marked for a floating neutral behind a 30 A breaker." },
};

export const switchedNeutralSymbol: Rule = {
  meta: {
    ...base, id: "switched-neutral-symbol", severity: "advice", evidence: "derived",
    statement: "Transfer equipment shows its poles and whether it switches the neutral, so that the bond can be judged.", risk: "Nobody can tell whether the set is a separately derived system.",
    citations: notCode("common practice, no published source"), mustFixAllowed: NEVER_MUST_FIX, limits: {}, reads: ["equipment.props.poles", "equipment.props.switchedNeutral"],
  },
  subjects: (context) => transfers(context).map(equipmentRef),
  evaluate: (anchor, context): Outcome => {
    const props = context.drawing.equipment[anchor.id]?.props ?? {};
    const open = (["poles", "switchedNeutral"] as const).filter((key) => props[key] === null || props[key] === undefined);
    if (open.length > 0) return { outcome: "needs-data", fields: open.map((key) => ({ ref: anchor, field: `props.${key}`, label: propertyLabel(context, anchor.id, key) })) };
    const lines = context.drawing.site.serviceSystem === "208Y/120 V, 4-wire" || context.drawing.site.serviceSystem === "480Y/277 V, 4-wire" ? 3 : 2;
    const least = lines + (props.switchedNeutral === true ? 1 : 0);
    if (Number(props.poles) >= least) return PASS;
    return found({ variant: "too-few", anchor, field: "props.poles", related: [], message: `${nameOf(context, anchor)} shows ${String(props.poles)} poles; ${least} are switched${props.switchedNeutral === true ? ", the neutral among them" : ""}.`, steps: [] });
  },
  examples: { violates: "A switch of 2 poles said to switch the neutral of a 3-wire system.", passes: "3 poles with a switched neutral." },
};

export const generatorParallel: Rule = {
  meta: {
    ...base, id: "generator-parallel", severity: "must-fix", evidence: "rated",
    statement: "A generator runs in parallel with grid-forming inverters only where both are listed for it.", risk: "Two voltage sources fight: the set loses speed control or the inverters trip on overcurrent.",
    citations: sections(["705.40, 110.3(B)", "read"], ["705.40, 110.3(B)", "agreed"], ["705.40, 110.3(B)", "agreed"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.listedGeneratorMode", "circuits.from", "circuits.to", "interlocks.switches"],
  },
  subjects: (context) => (all(context).some((id) => context.graph.kind(id).capabilities.source === "generator") ? all(context).filter((id) => { const { converter, follower } = context.graph.kind(id).capabilities; return converter === true && follower !== true; }).map(equipmentRef) : []),
  evaluate: (anchor, context): Outcome => {
    const sets = new Set(context.states().allowed.flatMap((state) => state.islands.filter((island) => island.converters.includes(anchor.id)).flatMap((island) => island.sources.filter((id) => context.graph.kind(id).capabilities.source === "generator"))));
    if (sets.size === 0) return PASS;
    if (isTrue(context, anchor.id, "listedGeneratorMode")) return PASS;
    if (typeof context.drawing.equipment[anchor.id]?.props.listedGeneratorMode !== "boolean") return { outcome: "needs-data", fields: [{ ref: anchor, field: "props.listedGeneratorMode", label: propertyLabel(context, anchor.id, "listedGeneratorMode") }] };
    return found({ variant: "not-listed", anchor, field: "props.listedGeneratorMode", related: [...sets].sort().map(equipmentRef), message: `${nameOf(context, anchor)} runs beside ${[...sets].sort().map((id) => nameOf(context, equipmentRef(id))).join(", ")} and is not listed for it.`, steps: [] });
  },
  examples: { violates: "A gas set closed onto the bus of grid-forming inverters without a listed mode.", passes: "Inverters with a listed generator mode." },
};

/** Transfer equipment, interlocks and inlets. */
export const transferEquipmentRules: readonly Rule[] = [transferRating, interlockNotListed, generatorParallel, inletInterlock100, portableInlet, switchedNeutralSymbol];
