import { shown } from "@/lib/calc";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, FindingDraft, Outcome, Rule, Suggestion } from "@/lib/rules/engine/types";
import { loadA } from "@/lib/rules/shared/currents";
import { deviceAhead, faultRows, faultSteps, totalA, type FaultRow } from "@/lib/rules/shared/faultCurrent";
import { isOfMarking } from "@/lib/rules/shared/faultJudgment";
import { equipmentRef, found, nameOf, NOT_APPLICABLE, numberOf, PASS, propertyLabel, Reader, textOf } from "@/lib/rules/shared/outcome";
import { motorLoads, topology, type Side } from "@/lib/rules/shared/topology";

/** Breakers that carry their fault current by a series rating alone. */
function leaning(context: CheckContext): ReadonlyMap<string, FaultRow> {
  return context.once("breakers with a series rating", () => new Map(faultRows(context).flatMap((row) => {
    const seriesKA = numberOf(context, row.equipment, "seriesKA");
    const current = totalA(row.point);
    return seriesKA !== null && row.ratingField === "interruptingKA" && row.ratingKA !== null && row.ratingKA * 1000 < current && seriesKA * 1000 >= current ? [[row.equipment, row] as const] : [];
  })));
}
/** What lies beyond a device, on the side away from the current. */
function beyond(context: CheckContext, device: string): readonly Side[] {
  const edge = context.graph.edges.find((one) => one.id === device && one.by === "switch");
  return edge ? [topology(context.graph).beyond(edge.a, edge), topology(context.graph).beyond(edge.b, edge)] : [];
}
/** Motors between the two devices: on the load side of the higher-rated, on the line side of the lower-rated. */
function motorsBetween(context: CheckContext, higher: string, lower: string): readonly string[] {
  const away = (device: string): Side | undefined => beyond(context, device).find((side) => side.utilities.length === 0);
  const [outer, inner] = [away(higher), away(lower)];
  if (!outer) return [];
  const past = new Set(inner?.loads ?? []);
  return motorLoads(context.graph, outer).filter((id) => !past.has(id));
}

export const seriesRating: Rule = {
  meta: {
    id: "series-rating", group: "Fault current and ratings", severity: "must-fix", evidence: "rated",
    statement: "A series rating is used only for the tested pair of devices, marked on the equipment, and with no more motors between them than the code allows.",
    risk: "An untested pair does not clear the fault together: the smaller device bursts.",
    citations: sameSection("240.86, 110.22(C)"), mustFixAllowed: MUST_FIX_TO_2023,
    limits: { motorShare: { value: 1, unit: "%", source: "240.86(C): of the interrupting rating of the lower-rated breaker" } },
    reads: ["equipment.props.seriesKA", "equipment.props.seriesWith", "equipment.props.seriesMarked", "equipment.props.interruptingKA", "equipment.props.family", "equipment.props.currentA", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: (context) => [...leaning(context).keys()].map(equipmentRef),
  evaluate: (anchor, context) => {
    const { id } = anchor;
    const row = leaning(context).get(id);
    if (!row) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const name = nameOf(context, anchor);
    const ahead = deviceAhead(context.graph, row.point, id);
    const outcomes: Outcome[] = [];
    const draft = (variant: string, field: string, message: string, related: readonly string[] = []): void => {
      const finding: FindingDraft = { variant, anchor, field: `props.${field}`, related: related.map(equipmentRef), message, steps: faultSteps(context, row.point) };
      outcomes.push(found(finding));
    };
    const marking = reader.text(id, "seriesWith");
    const ahead0 = ahead === null ? [] : [ahead];
    if (marking !== null && (ahead === null || !isOfMarking(context, ahead, marking))) {
      if (ahead !== null && textOf(context, ahead, "family") === null && textOf(context, ahead, "model") === null) reader.text(ahead, "family");
      else draft("other-pair", "seriesWith", `${name} has a series rating behind ${marking}; ahead of it stands ${ahead === null ? "no device" : nameOf(context, equipmentRef(ahead))}. The pair must be the tested one.`, ahead0);
    }
    const marked = context.drawing.equipment[id]?.props.seriesMarked;
    if (marked === false) draft("not-marked", "seriesMarked", `${name} is used by its series rating of ${shown(numberOf(context, id, "seriesKA") ?? 0)} kA; the equipment is not marked with it and must be.`);
    else if (marked !== true) reader.ask(anchor, "props.seriesMarked", propertyLabel(context, id, "seriesMarked"));
    if (ahead !== null && row.ratingKA !== null) {
      const motors = motorsBetween(context, ahead, id);
      const sum = motors.reduce((total, each) => total + (loadA(context, each) ?? (reader.number(each, "currentA") ?? 0)), 0);
      const limitA = (row.ratingKA * 1000 * context.limit("motorShare")) / 100;
      if (sum > limitA + 1e-9) draft("motors-between", "seriesKA", `Motors of ${shown(sum)} A hang between ${nameOf(context, equipmentRef(ahead))} and ${name}; a series rating of a ${shown(row.ratingKA)} kA breaker allows ${shown(limitA)} A.`, [...ahead0, ...motors]);
    }
    if (!reader.complete) outcomes.push(reader.outcome());
    return outcomes.length > 0 ? outcomes : PASS;
  },
  suggest: ({ variant, anchor: { id } }, context): readonly Suggestion[] => {
    const row = leaning(context).get(id);
    if (!row) return [];
    if (variant === "not-marked") return [{ label: "Mark the series rating on the equipment", also: "The marking names both devices and is put on in the field, readily visible.", patches: [{ op: "add", path: `/equipment/${id}/props/seriesMarked`, value: true }] }];
    const full = [10, 14, 18, 22, 25, 42, 65, 100, 200].find((kA) => kA * 1000 >= totalA(row.point));
    return full === undefined ? [] : [{ label: `Use a device of ${full} kA, fully rated`, also: "", patches: [{ op: "replace", path: `/equipment/${id}/props/interruptingKA`, value: full }] }];
  },
  examples: { violates: "A 10 kA breaker behind a 22 kA main that the marking does not name, at 10,400 A.", passes: "The same pair, tested, marked on the panelboard, with an 8 A pump between." },
};
