import { TAP_SHARE_10_FT, TAP_SHARE_25_FT } from "@/lib/code/tables/source-constants";
import { nodeKey, type End } from "@/lib/diagram/graph";
import type { Circuit } from "@/lib/diagram/schema";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { columnAmpacityA, deviceRatingA, terminalsOf } from "@/lib/rules/shared/conductors";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { compact, largerConductor } from "@/lib/rules/shared/protection";
import { circuitAmpacityA, judgeTap, type Judged } from "@/lib/rules/shared/tapPaths";
import { powerCircuits, supplies, topology } from "@/lib/rules/shared/topology";

interface Secondary { transformer: string; end: End; other: End }
/** Circuits that start at the secondary of a transformer. One that forms a neutral beside the bus has no secondary of its own. */
function secondaryOf(context: CheckContext, id: string): Secondary | null {
  const circuit = context.drawing.circuits[id] as Circuit;
  for (const end of ["from", "to"] as const) {
    const { equipment, port } = circuit[end];
    if (!context.graph.kind(equipment).capabilities.transformer || port !== "secondary" || context.drawing.equipment[equipment]?.props.construction === "neutral forming") continue;
    const other = end === "from" ? "to" : "from";
    // Fed from the secondary side alone it is a primary.
    return supplies(topology(context.graph).beyond(nodeKey(equipment, "primary"), null)) > 0 ? { transformer: equipment, end, other } : null;
  }
  return null;
}
interface Start { deviceA: number; device: string; ratio: number; byPrimary: boolean }
/** Primary device and the voltage ratio by which it counts on the secondary. */
function startOf(context: CheckContext, { transformer }: Secondary, reader: Reader): Start | null {
  const primary = topology(context.graph).runsFrom(nodeKey(transformer, "primary")).find((run) => run.device !== null);
  if (!primary?.device) return null;
  const ratingA = deviceRatingA(context, primary.device);
  if (ratingA === null) reader.number(primary.device, topology(context.graph).ratingField(primary.device) ?? "ratingA");
  const [primaryV, secondaryV] = [reader.number(transformer, "primaryV"), reader.number(transformer, "secondaryV")];
  const secondary = reader.text(transformer, "secondary");
  if (ratingA === null || primaryV === null || secondaryV === null || secondary === null) return null;
  return { deviceA: ratingA, device: primary.device, ratio: primaryV / secondaryV, byPrimary: secondary === "2-wire" || secondary === "3-wire, delta" };
}
const judge = (context: CheckContext, id: string, secondary: Secondary, start: Start, amperes: number, reader: Reader): Judged | null => {
  const onSecondary = start.deviceA * start.ratio;
  // Two wires, or delta to delta, and the primary device sees what the conductors see.
  if (start.byPrimary && onSecondary <= amperes + 1e-9) return { ok: true, variant: "", says: "", steps: [], neededA: null };
  return judgeTap(context, id, { other: secondary.other, thirdA: onSecondary * TAP_SHARE_25_FT, tenthA: onSecondary * TAP_SHARE_10_FT, shortFt: context.limit("shortFt"), longFt: context.limit("longFt"), fromTap: false }, amperes, reader);
};

export const transformerSecondaryConductor: Rule = {
  meta: {
    id: "transformer-secondary-conductor", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "Conductors on a transformer secondary need a device of their own within 10 or 25 ft, or outdoors at the disconnect; the primary device protects only 2-wire and delta-to-delta secondaries. No next size up.",
    risk: "A line-to-neutral fault on the secondary looks like a load to the primary device.",
    citations: sameSection("240.21(C), 240.4(F), 450.3(B)"), mustFixAllowed: MUST_FIX_TO_2023,
    limits: { shortFt: { value: 10, unit: "ft", source: "240.21(C)(2)" }, longFt: { value: 25, unit: "ft", source: "240.21(C)(6)" } },
    reads: ["equipment.props.construction", "equipment.props.secondary", "equipment.props.primaryV", "equipment.props.secondaryV", "equipment.props.ratingA", "circuits.from", "circuits.to", "circuits.sections.lengthFt", "circuits.sections.ungrounded", "circuits.sections.route"], absorbs: [],
  },
  subjects: (context) => powerCircuits(context.graph).filter((id) => secondaryOf(context, id) !== null).map(circuitRef),
  evaluate: (anchor, context): Outcome => {
    const secondary = secondaryOf(context, anchor.id);
    if (!secondary) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const start = startOf(context, secondary, reader);
    if (!start) return reader.complete ? NOT_APPLICABLE : reader.outcome();
    const amperes = circuitAmpacityA(context, anchor.id, reader);
    const judged = amperes === null ? null : judge(context, anchor.id, secondary, start, amperes, reader);
    if (!judged) return reader.outcome();
    if (judged.ok) return PASS;
    return found({
      variant: judged.variant, anchor, field: "sections", related: [equipmentRef(secondary.transformer), equipmentRef(start.device)],
      message: `${nameOf(context, anchor)} leaves ${nameOf(context, equipmentRef(secondary.transformer))} without a device of its own: ${judged.says}.`,
      steps: [{ symbol: "In′", expression: "primary device × primary voltage / secondary voltage", substituted: `${start.deviceA} A × ${Math.round(start.ratio * 1000) / 1000}`, result: start.deviceA * start.ratio, unit: "A" }, ...judged.steps],
    });
  },
  suggest: ({ anchor: { id } }, context) => {
    const secondary = secondaryOf(context, id);
    const start = secondary && startOf(context, secondary, new Reader(context));
    const amperes = circuitAmpacityA(context, id, new Reader(context));
    const needed = secondary && start && amperes !== null ? judge(context, id, secondary, start, amperes, new Reader(context))?.neededA ?? null : null;
    return needed === null ? [] : compact([largerConductor(context, id, (_, wire) => columnAmpacityA(wire, terminalsOf(context, id, null, 75).lowest) >= needed, "Check the raceway fill and the terminals.")]);
  },
  examples: { violates: "A transformer 240 V to 120/240 V with 30 ft of secondary conductors before the first device.", passes: "10 ft to one breaker that does not exceed the conductors." },
};
