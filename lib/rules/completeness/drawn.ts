import { MUST_FIX_TO_2023, NEVER_MUST_FIX, notCode, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import type { ElementRef } from "@/lib/diagram/schema";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, numberOf, PASS, Reader } from "@/lib/rules/shared/outcome";
import { loadA } from "@/lib/rules/shared/currents";
import { powerCircuits, topology } from "@/lib/rules/shared/topology";

const base = { group: "Ratings and completeness", evidence: "derived", absorbs: [] } as const;
const all = (context: CheckContext): readonly string[] => Object.keys(context.drawing.equipment).sort();
const power = (system: string): boolean => system === "ac" || system === "pv-dc" || system === "battery-dc";
const first = (context: CheckContext): readonly ElementRef[] => {
  const ids = all(context);
  const at = ids.find((id) => context.graph.kind(id).capabilities.source === "utility") ?? ids[0];
  return at === undefined ? [] : [equipmentRef(at)];
};

export const terminalUnconnected: Rule = {
  meta: {
    ...base, id: "terminal-unconnected", severity: "should-fix",
    statement: "Every power terminal is used or marked spare.", risk: "A forgotten conductor is found at start-up, or an open terminal is left live.",
    citations: notCode("completeness of the drawing"), mustFixAllowed: NEVER_MUST_FIX, limits: {}, reads: ["circuits.from", "circuits.to", "equipment.ports.spare"],
  },
  subjects: (context) => all(context).filter((id) => context.graph.ports(id).some((port) => power(port.system) && !port.many)).map(equipmentRef),
  evaluate: (anchor, context): Outcome => {
    const ports = context.graph.ports(anchor.id).filter((port) => power(port.system) && !port.many);
    const open = ports.filter((port) => context.graph.circuitsAt(anchor.id, port.id).length === 0 && port.data.spare !== true);
    // A piece on which nothing lands at all is judged as a whole elsewhere.
    if (open.length === 0) return PASS;
    if (open.length === ports.length) return NOT_APPLICABLE;
    return found({
      variant: "open", anchor, field: `ports.${open[0]?.id ?? ""}`, related: [],
      message: `${nameOf(context, anchor)}: nothing lands on ${open.map((port) => port.label).join(", ")}. Connect it or mark it spare.`, steps: [],
    });
  },
  suggest: (finding, context) => {
    const open = context.graph.ports(finding.anchor.id).filter((port) => power(port.system) && !port.many && context.graph.circuitsAt(finding.anchor.id, port.id).length === 0 && port.data.spare !== true);
    return [{
      label: "Mark it spare", also: "Cap the terminal and say so at the equipment.",
      patches: open.map((port) => (context.drawing.equipment[finding.anchor.id]?.ports[port.id] === undefined
        ? { op: "add" as const, path: `/equipment/${finding.anchor.id}/ports/${port.id}`, value: { spare: true } }
        : { op: "add" as const, path: `/equipment/${finding.anchor.id}/ports/${port.id}/spare`, value: true })),
    }];
  },
  examples: { violates: "The load terminals of a switch with nothing on them.", passes: "A spare tracker input marked spare." },
};

/** Nodes that a source or a converter feeds with every switch closed, found in one walk. */
const reached = (context: CheckContext): ReadonlySet<string> => context.once("equipment that a source reaches", () => {
  const { graph } = context;
  const found = new Set<string>();
  const queue = all(context).filter((id) => { const { source, converter } = graph.kind(id).capabilities; return Boolean(source ?? converter); });
  for (const id of queue) found.add(id);
  for (let id = queue.pop(); id !== undefined; id = queue.pop()) {
    for (const port of graph.ports(id)) {
      for (const edge of graph.edgesAt(`${id}/${port.id}`)) {
        for (const node of [edge.a, edge.b]) {
          const other = node.slice(0, node.indexOf("/"));
          if (!found.has(other)) { found.add(other); queue.push(other); }
        }
      }
    }
  }
  return found;
});
export const orphanEquipment: Rule = {
  meta: {
    ...base, id: "orphan-equipment", severity: "advice",
    statement: "Everything with power terminals is reached from a source.", risk: "It is bought and mounted for nothing, or its circuit is missing from the drawing.",
    citations: notCode("completeness of the drawing"), mustFixAllowed: NEVER_MUST_FIX, limits: {}, reads: ["circuits.from", "circuits.to"],
  },
  subjects: (context) => all(context).filter((id) => context.graph.ports(id).some((port) => power(port.system))).map(equipmentRef),
  evaluate: (anchor, context): Outcome => (reached(context).has(anchor.id) ? PASS : found({
    variant: "not-reached", anchor, related: [], message: `No source reaches ${nameOf(context, anchor)}.`, steps: [],
  })),
  examples: { violates: "A disconnect drawn with nothing on its line side.", passes: "The same disconnect in the path." },
};

export const codeEditionMissing: Rule = {
  meta: {
    ...base, id: "code-edition-missing", severity: "should-fix",
    statement: "The sheet names the adopted code with its edition.", risk: "Nobody can say by which rules the work is judged.",
    citations: notCode("plan review, common practice"), mustFixAllowed: NEVER_MUST_FIX, limits: {}, reads: ["sheet.titleBlock.codes", "site.edition"],
  },
  subjects: first,
  evaluate: (anchor, context): Outcome => {
    const { codes } = context.drawing.sheet.titleBlock;
    if (codes.includes(context.edition)) return PASS;
    return found({ variant: codes.trim() === "" ? "none" : "other-edition", anchor, field: "titleBlock.codes", related: [], message: codes.trim() === "" ? "The title block names no adopted code." : `The title block reads "${codes}"; the drawing is checked by NEC ${context.edition}.`, steps: [] });
  },
  suggest: (_, context) => [{ label: `Write NEC ${context.edition}`, also: "Add the local ordinance and the other adopted codes.", patches: [{ op: "replace", path: "/sheet/titleBlock/codes", value: `NEC ${context.edition}` }] }],
  examples: { violates: "\"Per NEC\".", passes: "\"NEC 2023, county ordinance 26-4\"." },
};

const FIELDS = { jobName: "job", jobNumber: "job number", addressLines: "address", designedBy: "designer", contractor: "contractor", scope: "scope" } as const;
export const sheetFieldsMissing: Rule = {
  meta: {
    ...base, id: "sheet-fields-missing", severity: "should-fix",
    statement: "The title block is filled in: job, number, address, scope, designer, contractor.", risk: "The counter sends the set back before anybody reads it.",
    citations: notCode("plan review, common practice"), mustFixAllowed: NEVER_MUST_FIX, limits: {}, reads: Object.keys(FIELDS).map((field) => `sheet.titleBlock.${field}`),
  },
  subjects: first,
  evaluate: (anchor, context): Outcome => {
    const block = context.drawing.sheet.titleBlock;
    const open = (Object.keys(FIELDS) as (keyof typeof FIELDS)[]).filter((field) => block[field].trim() === "");
    return open.length === 0 ? PASS : found({ variant: "empty", anchor, field: `titleBlock.${open[0] ?? ""}`, related: [], message: `The title block lacks ${open.map((field) => FIELDS[field]).join(", ")}.`, steps: [] });
  },
  examples: { violates: "A sheet without a designer.", passes: "Every field filled." },
};

export const conductorRunLengthMissing: Rule = {
  meta: {
    ...base, id: "conductor-run-length-missing", severity: "advice",
    statement: "Every power circuit has its run length: voltage drop, taps and fault currents hang on it.", risk: "What depends on length is not checked, and the wire is bought by guess.",
    citations: notCode("plan review, common practice"), mustFixAllowed: NEVER_MUST_FIX, limits: {}, reads: ["circuits.sections.lengthFt"],
  },
  subjects: ({ graph }) => powerCircuits(graph).map(circuitRef),
  evaluate: (anchor, context): Outcome => {
    const open = context.graph.sections(anchor.id).find((section) => section.lengthFt === null || section.lengthFt === 0);
    if (!open) return PASS;
    return found({ variant: "no-length", anchor, field: `sections.${open.id}.lengthFt`, related: [], message: `${nameOf(context, anchor)} has no run length.`, steps: [] });
  },
  examples: { violates: "A feeder without a length.", passes: "46 ft." },
};

export const panelSpacesExceeded: Rule = {
  meta: {
    ...base, id: "panel-spaces-exceeded", severity: "must-fix",
    statement: "The poles in a panelboard fit its spaces and the number it is marked for, and no space holds two devices.", risk: "A crowded panel overheats and is outside its listing.",
    citations: sections(["408.54, 110.3(B)", "read"], ["408.54, 110.3(B)", "read"], ["408.54, 110.3(B)", "read"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.spacesTotal", "equipment.props.polesMaximum", "equipment.props.poles", "equipment.spaces", "equipment.parent"],
  },
  subjects: (context) => all(context).filter((id) => Object.hasOwn(context.graph.kind(id).properties, "spacesTotal")).map(equipmentRef),
  evaluate: (anchor, context): Outcome | readonly Outcome[] => {
    const branch = context.graph.children(anchor.id).filter((id) => context.graph.kind(id).capabilities.overcurrent === true && (context.drawing.equipment[id]?.spaces?.length ?? -1) !== 0);
    if (branch.length === 0) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const poles = branch.reduce<number | null>((sum, id) => { const own = reader.number(id, "poles"); return sum === null || own === null ? null : sum + own; }, 0);
    const total = numberOf(context, anchor.id, "spacesTotal");
    const marked = numberOf(context, anchor.id, "polesMaximum");
    // Battery cabinets have no numbered spaces; where neither is marked there is nothing to exceed.
    if (total === null && marked === null) return context.graph.port(anchor.id, "bus")?.system === "ac" ? { outcome: "needs-data", fields: [{ ref: anchor, field: "props.spacesTotal", label: "Spaces" }] } : NOT_APPLICABLE;
    const outcomes: Outcome[] = [];
    const most = Math.min(total ?? Infinity, marked ?? Infinity);
    if (poles === null) outcomes.push(reader.outcome());
    else if (poles > most) {
      outcomes.push(found({
        variant: "too-many", anchor, field: marked !== null && marked < (total ?? Infinity) ? "props.polesMaximum" : "props.spacesTotal", related: branch.map(equipmentRef),
        message: `${nameOf(context, anchor)} holds ${poles} poles; it takes ${most}.`, steps: [{ symbol: "Poles", expression: "sum of the devices", substituted: `${poles} ≤ ${most}`, result: "fails", unit: "" }],
      }));
    }
    const holder = new Map<number, string>();
    for (const id of branch) {
      for (const space of context.drawing.equipment[id]?.spaces ?? []) {
        const other = holder.get(space);
        if (other !== undefined && other !== id) outcomes.push(found({ variant: "same-space", anchor: equipmentRef(id), field: "spaces", related: [equipmentRef(other), anchor], message: `${nameOf(context, equipmentRef(id))} and ${nameOf(context, equipmentRef(other))} are both in space ${space} of ${nameOf(context, anchor)}.`, steps: [] }));
        else if (total !== null && space > total) outcomes.push(found({ variant: "no-such-space", anchor: equipmentRef(id), field: "spaces", related: [anchor], message: `${nameOf(context, equipmentRef(id))} is in space ${space}; ${nameOf(context, anchor)} has ${total}.`, steps: [] }));
        holder.set(space, id);
      }
    }
    return outcomes.length > 0 ? outcomes : PASS;
  },
  examples: { violates: "26 poles in 24 spaces.", passes: "22 poles in 24 spaces." },
};

export const legBalance: Rule = {
  meta: {
    ...base, id: "leg-balance", severity: "advice",
    statement: "Line-to-neutral loads are spread over the two legs of a panelboard.", risk: "One leg of the inverters is overloaded in island operation while the other has room.",
    citations: notCode("common practice, no published source"), mustFixAllowed: NEVER_MUST_FIX,
    limits: { share: { value: 20, unit: "%", source: "common practice, no published source" } }, reads: ["equipment.spaces", "equipment.props.poles", "equipment.props.currentA", "circuits.from", "circuits.to"],
  },
  subjects: (context) => all(context).filter((id) => Object.hasOwn(context.graph.kind(id).properties, "spacesTotal") && context.graph.port(id, "bus")?.system === "ac").map(equipmentRef),
  evaluate: (anchor, context): Outcome => {
    const legs: [number, number] = [0, 0];
    let loads = 0;
    for (const id of context.graph.children(anchor.id)) {
      const breaker = context.drawing.equipment[id];
      const [space] = breaker?.spaces ?? [];
      const edge = context.graph.edges.find((one) => one.id === id && one.by === "switch");
      if (breaker?.props.poles !== 1 || space === undefined || !edge) continue;
      const beyond = topology(context.graph).beyond(`${id}/load`, edge).loads;
      const amperes = beyond.reduce((sum, load) => sum + (loadA(context, load) ?? 0), 0);
      // Spaces 1 and 2 are on one leg, 3 and 4 on the other: pairs alternate down the bus.
      const leg = (Math.ceil(space / 2) - 1) % 2;
      legs[leg as 0 | 1] += amperes;
      loads += beyond.length;
    }
    const [least, most] = [Math.min(...legs), Math.max(...legs)];
    if (loads < 2 || most === 0) return NOT_APPLICABLE;
    const percent = (100 * (most - least)) / most;
    const limit = context.limit("share");
    if (percent <= limit + 1e-9) return PASS;
    return found({
      variant: "uneven", anchor, related: [], message: `${nameOf(context, anchor)}: ${legs[0]} A on one leg, ${legs[1]} A on the other. They should lie within ${limit} %.`,
      steps: [{ symbol: "ΔI", expression: "difference over the larger", substituted: `(${most} − ${least}) / ${most}`, result: Math.round(percent), unit: "%" }],
    });
  },
  examples: { violates: "82 A on one leg, 31 A on the other.", passes: "58 A and 54 A." },
};

export const loadCalcMissing: Rule = {
  meta: {
    ...base, id: "load-calc-missing", severity: "should-fix",
    statement: "Where a main, a panelboard or loads are new, the load of the service or feeder is worked out and fits its device.", risk: "The new main trips on the first cold evening, or a feeder is overloaded.",
    citations: sections(["220.82, 220.83, 220.87", "unconfirmed"], ["220.82, 220.83, 220.87", "unconfirmed"], ["220.82, 220.83, 220.87", "unconfirmed"], "Article 120"), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: ["site.load", "equipment.status", "equipment.props.ratingA", "circuits.from", "circuits.to"],
  },
  subjects: (context) => {
    const fresh = all(context).filter((id) => context.graph.kind(id).capabilities.bus === true && context.graph.port(id, "bus")?.system === "ac" && context.drawing.equipment[id]?.status === "new" && context.drawing.equipment[id]?.parent === null);
    // The load stated for the site is that of the service; without a new service the first new bus stands for its feeder.
    const bus = fresh.find((id) => context.drawing.equipment[id]?.props.serviceEquipment === true) ?? fresh[0];
    const loads = all(context).some((id) => context.graph.kind(id).capabilities.load !== undefined);
    return bus !== undefined && loads ? [equipmentRef(bus)] : [];
  },
  evaluate: (anchor, context): Outcome => {
    const { load } = context.drawing.site;
    if (!load || load.resultA === null) return { outcome: "needs-data", fields: [{ ref: anchor, field: "site.load", label: "load of the service" }] };
    const main = context.graph.children(anchor.id).find((id) => context.drawing.equipment[id]?.props.position === "main");
    const ratingA = main === undefined ? null : numberOf(context, main, "ratingA");
    if (main === undefined || ratingA === null || load.resultA <= ratingA) return PASS;
    return found({
      variant: "above-main", anchor, field: "site.load", related: [equipmentRef(main)], message: `The load is ${load.resultA} A by ${load.method}; ${nameOf(context, equipmentRef(main))} is ${ratingA} A.`,
      steps: [{ symbol: "I", expression: "load not above the main", substituted: `${load.resultA} A ≤ ${ratingA} A`, result: "fails", unit: "" }],
    });
  },
  examples: { violates: "A load of 164 A on a 150 A main.", passes: "96 A on the same main." },
};

/** What the drawing itself shows or lacks. */
export const drawnRules: readonly Rule[] = [terminalUnconnected, orphanEquipment, codeEditionMissing, sheetFieldsMissing, conductorRunLengthMissing, panelSpacesExceeded, legBalance, loadCalcMissing];
