import { MUST_FIX_TO_2023, NEVER_MUST_FIX, notCode, sameSection, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule, RuleMeta } from "@/lib/rules/engine/types";
import { declaredRule } from "@/lib/rules/families/declared";
import { presentRule } from "@/lib/rules/families/present";
import { ratingRule } from "@/lib/rules/families/rating";
import { columnAmpacityA, terminalsOf, wireOf } from "@/lib/rules/shared/conductors";
import { loadA } from "@/lib/rules/shared/currents";
import { circuitRef, equipmentRef, found, isTrue, nameOf, NOT_APPLICABLE, numberOf, PASS, propertyLabel, Reader, textOf } from "@/lib/rules/shared/outcome";
import { topology } from "@/lib/rules/shared/topology";

const base = { group: "Generators and transfer", absorbs: [] } as const;
const all = (context: CheckContext): readonly string[] => Object.keys(context.drawing.equipment).sort();
const generators = (context: CheckContext): readonly string[] => all(context).filter((id) => context.graph.kind(id).capabilities.source === "generator");
const dwelling = (context: CheckContext): boolean => context.drawing.site.occupancy === "one- or two-family dwelling";
const fixed = (context: CheckContext, id: string): boolean => textOf(context, id, "use") !== "portable";

/** Conductors between the set and the first device: as far as nothing protects them. */
export const generatorConductor: Rule = {
  meta: {
    ...base, id: "generator-conductor", severity: "must-fix", evidence: "derived",
    statement: "Conductors from a generator to its first overcurrent device carry at least 115 % of the nameplate current, or 100 % where the set cannot be overloaded.",
    risk: "Nothing opens when the set is overloaded; the conductors carry what the engine gives.",
    citations: sameSection("445.13(A)"), mustFixAllowed: MUST_FIX_TO_2023, limits: { share: { value: 115, unit: "%", source: "445.13(A)" } },
    reads: ["equipment.props.ratedA", "circuits.from", "circuits.to", "circuits.sections.ungrounded"],
  },
  subjects: (context) => generators(context).map(equipmentRef),
  evaluate: (anchor, context): Outcome => {
    const first = context.graph.circuitsAt(anchor.id, "load").find((id) => context.drawing.circuits[id]?.wiring === "field");
    // A listed device on the set protects what leaves it.
    if (first === undefined) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const rated = reader.number(anchor.id, "ratedA");
    for (const section of context.graph.sections(first)) {
      const wire = wireOf(context, first, section, reader);
      if (!wire || rated === null) continue;
      const share = isTrue(context, anchor.id, "overloadPrevented") ? 100 : context.limit("share");
      const needed = (rated * share) / 100;
      const has = columnAmpacityA(wire, terminalsOf(context, first, null).highest);
      if (has >= needed - 1e-9) continue;
      return found({
        variant: "below-share", anchor: circuitRef(first), field: `sections.${section.id}.ungrounded.size`, related: [anchor],
        message: `${nameOf(context, circuitRef(first))} carries ${has} A; ${nameOf(context, anchor)} of ${rated} A must have ${share} %, ${needed.toFixed(1)} A, up to its first device.`,
        steps: [{ symbol: "I", expression: `${share} % of the nameplate current`, substituted: `${share / 100} × ${rated} A`, result: Number(needed.toFixed(2)), unit: "A", citation: "445.13(A)" }],
      });
    }
    return reader.complete ? PASS : reader.outcome();
  },
  examples: { violates: "58.3 A set on 65 A wire without a breaker: 67.1 A are needed.", passes: "The same set on 85 A wire." },
};

/** Switching devices of the path from the set to the first bus or transfer equipment. */
export const generatorDisconnect: Rule = {
  meta: {
    ...base, id: "generator-disconnect", severity: "must-fix", evidence: "derived",
    statement: "A generator can be cut from the premises by a disconnecting means that locks open.", risk: "Whoever works on the set or on the conductors cannot keep it from feeding them.",
    citations: sameSection("445.18(A)"), mustFixAllowed: MUST_FIX_TO_2023, limits: {}, reads: ["equipment.props.lockable", "circuits.from", "circuits.to"],
  },
  subjects: (context) => generators(context).filter((id) => fixed(context, id) && context.graph.circuitsAt(id, "load").length > 0).map(equipmentRef),
  evaluate: (anchor, context): Outcome => {
    const devices = topology(context.graph).runsFrom(`${anchor.id}/load`).flatMap((run) => [...(run.device === null ? [] : [run.device]), ...run.equipment.filter((id) => context.graph.kind(id).capabilities.switching !== undefined)]);
    if (devices.length === 0) return found({ variant: "none", anchor, related: [], message: `Nothing disconnects ${nameOf(context, anchor)} from the premises.`, steps: [] });
    if (devices.some((id) => isTrue(context, id, "lockable"))) return PASS;
    const open = devices.filter((id) => Object.hasOwn(context.graph.kind(id).properties, "lockable") && typeof context.drawing.equipment[id]?.props.lockable !== "boolean");
    if (open.length > 0) return { outcome: "needs-data", fields: open.map((id) => ({ ref: equipmentRef(id), field: "props.lockable", label: propertyLabel(context, id, "lockable") })) };
    return found({ variant: "not-lockable", anchor, related: devices.map(equipmentRef), message: `${nameOf(context, equipmentRef(devices[0] ?? ""))} disconnects ${nameOf(context, anchor)} and does not lock open.`, steps: [] });
  },
  examples: { violates: "A set wired straight to the transfer switch.", passes: "A lockable breaker on the set." },
};

export const generatorCapacity = ratingRule({
  meta: {
    ...base, id: "generator-capacity", severity: "should-fix", evidence: "rated",
    statement: "With automatic transfer the set carries the whole load that is moved to it, unless loads are managed; with manual transfer the user chooses.", risk: "The set stalls or trips when the transfer brings everything at once.",
    citations: sameSection("702.4(B)(2)", ["unconfirmed", "unconfirmed", "unconfirmed"]), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["equipment.props.operation", "equipment.props.ratedA", "equipment.props.currentA", "circuits.from", "circuits.to"],
  },
  variant: "below-load", unit: "A", bound: "least", name: "Generator",
  subjects: (context) => generators(context).map(equipmentRef),
  demand: (ref, context) => {
    const transfer = automaticFor(context, ref.id);
    if (transfer === null) return null;
    const loads = [...new Set(context.graph.circuitsAt(transfer, "common").flatMap((circuit) => topology(context.graph).side(circuit, context.drawing.circuits[circuit]?.from.equipment === transfer ? "to" : "from").loads))];
    const managed = loads.filter((id) => isTrue(context, id, "managed"));
    const currents = loads.filter((id) => !managed.includes(id)).map((id) => loadA(context, id));
    if (currents.length === 0 || currents.some((one) => one === null)) return null;
    return { value: currents.reduce<number>((sum, one) => sum + (one ?? 0), 0), words: "what is moved to it at once takes", related: [equipmentRef(transfer)] };
  },
  rating: (ref, context) => ({ value: numberOf(context, ref.id, "ratedA"), field: "props.ratedA", label: propertyLabel(context, ref.id, "ratedA") }),
  examples: { violates: "A 50 A set behind an automatic switch with 60 A of loads.", passes: "The same set with a manual switch." },
});
/** Automatic transfer switch of which the set feeds one throw. */
function automaticFor(context: CheckContext, generator: string): string | null {
  const { beyond } = topology(context.graph);
  return all(context).find((id) => context.graph.kind(id).capabilities.switching === "transfer" && textOf(context, id, "operation") === "automatic"
    && context.graph.ports(id).some((port) => port.id !== "common" && port.system === "ac" && context.graph.circuitsAt(id, port.id).some((circuit) => {
      const each = context.drawing.circuits[circuit];
      const end = each?.from.equipment === id ? "to" : "from";
      const node = each ? `${each[end].equipment}/${each[end].port}` : "";
      return beyond(node, context.graph.edgesAt(node).find((edge) => edge.id === circuit) ?? null).generators.includes(generator);
    }))) ?? null;
}

const stopMeta = { ...base, mustFixAllowed: { "2017": false, "2020": true, "2023": true, "2026": false }, limits: {} } satisfies Partial<RuleMeta>;
/** A stop outside: wired from an initiator in the open, or on the outside of the enclosure where the edition takes that. */
const stopped = (context: CheckContext, id: string): boolean => {
  if (isTrue(context, id, "stopOnEnclosure")) return true;
  return context.graph.circuitsAt(id, "data").some((circuit) => {
    const each = context.drawing.circuits[circuit];
    const other = each?.from.equipment === id ? each.to.equipment : each?.from.equipment;
    return other !== undefined && context.drawing.equipment[other]?.kind === "shutdown-initiator" && textOf(context, other, "purpose") === "generator stop" && context.drawing.equipment[other]?.location.exposure === "outdoor";
  });
};
const knowsStop = (id: string, context: CheckContext, reader: Reader): true | null => {
  if (typeof context.drawing.equipment[id]?.props.stopOnEnclosure === "boolean") return true;
  reader.ask(equipmentRef(id), "props.stopOnEnclosure", propertyLabel(context, id, "stopOnEnclosure"));
  return null;
};
export const generatorShutdown = presentRule({
  meta: {
    ...stopMeta, id: "generator-shutdown", severity: "must-fix", evidence: "derived", from: "2020",
    statement: "A fixed generator at a one- or two-family dwelling has an emergency shutdown outside, readily accessible.", risk: "The fire service cannot stop the set that feeds the house.",
    citations: sections(["445.18", "unconfirmed"], ["445.18(D)", "read"], ["445.19(C)", "read"]),
    reads: ["equipment.props.stopOnEnclosure", "equipment.props.purpose", "circuits.from", "circuits.to", "site.occupancy", "equipment.location.exposure"],
  },
  variant: "no-outside-stop", subjects: (context) => generators(context).filter((id) => fixed(context, id)).map(equipmentRef),
  required: ({ id }, context, reader) => (dwelling(context) ? knowsStop(id, context, reader) : false),
  satisfied: ({ id }, context) => stopped(context, id),
  message: (ref, context) => `${nameOf(context, ref)} has no emergency shutdown outside the dwelling.`,
  examples: { violates: "A stop button only inside a locked hood.", passes: "A button on the outside of the enclosure, or a switch on the wall." },
});
export const generatorRemoteStop = presentRule({
  meta: {
    ...base, id: "generator-remote-stop", severity: "must-fix", evidence: "rated", mustFixAllowed: MUST_FIX_TO_2023,
    statement: "A set above 15 kW, other than at a one- or two-family dwelling, has a labeled remote stop outside its enclosure or room.", risk: "A runaway set cannot be stopped without opening it.",
    citations: sections(["445.18(B)", "read"], ["445.18(B)", "read"], ["445.19(B)", "read"]), limits: { outputKW: { value: 15, unit: "kW", source: "445.19(B)" } },
    reads: ["equipment.props.outputKW", "equipment.props.stopOnEnclosure", "equipment.props.purpose", "circuits.from", "circuits.to", "site.occupancy"],
  },
  variant: "no-remote-stop", subjects: (context) => generators(context).filter((id) => fixed(context, id)).map(equipmentRef),
  required: ({ id }, context, reader) => {
    if (dwelling(context)) return false;
    const outputKW = reader.number(id, "outputKW");
    return outputKW === null ? null : outputKW > context.limit("outputKW") && knowsStop(id, context, reader);
  },
  satisfied: ({ id }, context) => stopped(context, id),
  message: (ref, context) => `${nameOf(context, ref)} of ${numberOf(context, ref.id, "outputKW")} kW has no stop outside its enclosure.`,
  examples: { violates: "A 22 kW farm set without a stop.", passes: "The same set with a stop on the outside of the enclosure." },
});

/** Buses where a set and inverters that follow it are live together in an allowed state. */
export const acCoupledOnGenerator: Rule = {
  meta: {
    ...base, id: "ac-coupled-on-generator", severity: "must-fix", evidence: "derived",
    statement: "With the generator on the bus, inverters that follow its voltage are locked out or listed to give nothing back to it.", risk: "The set is driven as a motor, overspeeds, or its voltage runs away.",
    citations: notCode("manufacturer's instructions; 705.30"), mustFixAllowed: NEVER_MUST_FIX, limits: {}, reads: ["equipment.props.listedGeneratorMode", "circuits.from", "circuits.to", "interlocks.switches"],
  },
  subjects: (context) => (generators(context).length === 0 ? [] : all(context).filter((id) => context.graph.kind(id).capabilities.follower === true && context.graph.port(id, "ac") !== null).map(equipmentRef)),
  evaluate: (anchor, context): Outcome => {
    const together = context.states().allowed.some((state) => state.islands.some((island) => island.converters.includes(anchor.id) && island.sources.some((id) => context.graph.kind(id).capabilities.source === "generator")));
    if (!together) return PASS;
    const listed = context.drawing.equipment[anchor.id]?.props.listedGeneratorMode;
    if (listed === true) return PASS;
    if (typeof listed !== "boolean") return { outcome: "needs-data", fields: [{ ref: anchor, field: "props.listedGeneratorMode", label: propertyLabel(context, anchor.id, "listedGeneratorMode") }] };
    return found({ variant: "together", anchor, related: generators(context).map(equipmentRef), message: `${nameOf(context, anchor)} stays on the bus with ${nameOf(context, equipmentRef(generators(context)[0] ?? ""))} and can feed it backward.`, steps: [] });
  },
  examples: { violates: "Ac-coupled PV stays on the bus with the set.", passes: "The PV breaker opens by its contactor before the set closes in." },
};

export const generatorClearance = declaredRule({
  meta: {
    ...base, id: "generator-clearance", severity: "should-fix", evidence: "declared", mustFixAllowed: NEVER_MUST_FIX, limits: {},
    statement: "The set stands as far from openings and combustible walls as its listing and the engine standard ask.", risk: "Exhaust gets into the building; the wall can catch fire.",
    citations: notCode("manufacturer's instructions; NFPA 37"), reads: ["statements", "equipment.props.use"], question: "Does the set keep the distances from openings and combustible walls that its listing asks for?",
  },
  subjects: (context) => generators(context).filter((id) => fixed(context, id)).map(equipmentRef),
  refused: (name) => `${name} stands nearer to an opening or a combustible wall than its listing allows.`,
  examples: { violates: "3 ft from a window.", passes: "10 ft from the nearest opening." },
});

/** The set itself: conductors, isolation, size, stop, and what shares its bus. */
export const generatorRules: readonly Rule[] = [generatorConductor, generatorDisconnect, acCoupledOnGenerator, generatorShutdown, generatorRemoteStop, generatorCapacity, generatorClearance];
