import { sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { backfed, breakers, fedByGenerator, onIsland } from "@/lib/rules/shared/backfeed";
import { equipmentRef, found, nameOf, names, NOT_APPLICABLE, Reader, textOf } from "@/lib/rules/shared/outcome";
import type { Side } from "@/lib/rules/shared/topology";

/** Sources that keep the load terminals live once the breaker is pulled: the utility, a set, or an inverter that goes on without the utility. */
function keepLive(context: CheckContext, id: string, load: Side, reader: Reader): readonly string[] {
  const inverters = load.converters.filter((inverter) => {
    if (context.graph.kind(inverter).capabilities.follower) return false;
    const standAlone = context.drawing.equipment[inverter]?.props.listedStandAlone ?? null;
    if (standAlone === false) return false;
    // One that only follows the utility here goes dark with it, as the listing asks.
    if (!onIsland(context, id)) return false;
    if (standAlone === null) reader.ask(equipmentRef(inverter), "props.listedStandAlone", "Listed stand-alone");
    return standAlone === true;
  });
  return [...load.utilities, ...(load.generators.length > 0 && fedByGenerator(context, id) ? load.generators : []), ...inverters];
}

export const backfedNotSecured: Rule = {
  meta: {
    id: "backfed-not-secured", group: "Terminals, temperature, torque", severity: "must-fix", evidence: "derived",
    statement: "A plug-on breaker fed from its load terminals must be fastened so that a pull alone does not take it off, unless only listed interactive sources that go dark with the utility feed it.",
    risk: "The pulled breaker hangs on its wires with a live stab.",
    citations: sections(["408.36(D), 710.15(E); waiver 705.12(B)(5)", "read"], ["408.36(D), 710.15(E); waiver 705.12(E)", "unconfirmed"], ["408.36(D), 710.15(E); waiver 705.30", "read"]),
    mustFixAllowed: { "2017": true, "2020": false, "2023": true, "2026": false }, limits: {},
    reads: ["equipment.props.mount", "equipment.props.listedStandAlone", "circuits.from", "circuits.to", "interlocks"], absorbs: [],
  },
  subjects: (context) => breakers(context).filter((id) => { const mount = textOf(context, id, "mount"); return mount === null || mount === "plug-on"; }).map(equipmentRef),
  evaluate: (anchor, context) => {
    const { id } = anchor;
    const sides = backfed(context, id);
    const circuits = context.graph.circuitsAt(id, "load");
    // Terminals joined at the factory hold no field conductors.
    if (!sides || !circuits.some((circuit) => context.drawing.circuits[circuit]?.wiring === "field")) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const sources = keepLive(context, id, sides.load, reader);
    if (sources.length === 0) return reader.complete ? NOT_APPLICABLE : reader.outcome();
    if (reader.text(id, "mount") === null) return reader.outcome();
    return found({
      variant: "not-fastened", anchor, field: "props.mount", related: [...sources.map(equipmentRef), ...circuits.map((circuit) => ({ collection: "circuits" as const, id: circuit }))],
      message: `${nameOf(context, anchor)} is plug-on and fed at its load terminals by ${names(context, sources.map(equipmentRef))}; it must be fastened or bolted on.`,
      steps: [{ symbol: "mount", expression: "more than a pull to take it off", substituted: "plug-on", result: "fails", unit: "" }],
    });
  },
  suggest: ({ anchor }, context) => [{ label: `Fasten ${nameOf(context, anchor)} with the listed hold-down kit`, also: "The kit must be the maker's for this breaker and panel.", patches: [{ op: "replace", path: `/equipment/${anchor.id}/props/mount`, value: "plug-on with hold-down" }] }],
  examples: { violates: "A plug-on 45 A breaker fed by an inverter that goes on without the utility, with no clip.", passes: "The same breaker with its hold-down kit." },
};
