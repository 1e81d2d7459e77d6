import { Worksheet } from "@/lib/calc";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { equipmentRef, found, nameOf, names, NOT_APPLICABLE, PASS, propertyLabel, Reader } from "@/lib/rules/shared/outcome";
import { topology } from "@/lib/rules/shared/topology";

/** Standard interrupting ratings for dc devices, kA: common practice, no published source. */
const OFFERED_KA = [5, 10, 14, 20, 25, 35, 50, 65, 100, 200];
const ratingKey = (context: CheckContext, id: string): string => (Object.hasOwn(context.graph.kind(id).properties, "interruptingKA") ? "interruptingKA" : "shortCircuitKA");

/** Batteries behind each terminal of the device; the side with more current decides. */
function worstSide(context: CheckContext, id: string, reader: Reader): { kiloamperes: number; batteries: readonly string[] } | null {
  const edge = context.graph.edges.find((one) => one.id === id && one.by === "switch");
  if (!edge) return null;
  const { beyond } = topology(context.graph);
  const sides = [edge.a, edge.b].map((node) => {
    const batteries = beyond(node, edge).batteries;
    return { batteries, kiloamperes: batteries.reduce((sum, battery) => sum + (reader.number(battery, "shortCircuitKA") ?? 0), 0) };
  });
  return sides.toSorted((a, b) => b.kiloamperes - a.kiloamperes)[0] ?? null;
}

export const dcInterrupting: Rule = {
  meta: {
    id: "dc-interrupting", group: "Fault current and ratings", severity: "must-fix", evidence: "derived",
    statement: "A dc overcurrent device can interrupt the sum of what all batteries behind it can feed into a fault.",
    risk: "The device bursts while it opens and feeds an arc next to the batteries.",
    citations: sameSection("110.9"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.interruptingKA", "equipment.props.shortCircuitKA", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: ({ graph, drawing }) => Object.keys(drawing.equipment).sort().filter((id) => topology(graph).ratingField(id) !== null && graph.port(id, "line")?.system === "battery-dc").map(equipmentRef),
  evaluate: (anchor, context) => {
    const { id } = anchor;
    const reader = new Reader(context);
    const worst = worstSide(context, id, reader);
    if (!worst || worst.batteries.length === 0) return NOT_APPLICABLE;
    const key = ratingKey(context, id);
    const ratingKA = context.drawing.equipment[id]?.props[key];
    if (typeof ratingKA !== "number") reader.ask(anchor, `props.${key}`, propertyLabel(context, id, key));
    if (typeof ratingKA !== "number") return reader.outcome();
    // What is known already may be more than the device interrupts.
    if (worst.kiloamperes <= ratingKA + 1e-9) return reader.complete ? PASS : reader.outcome();
    const cabinet = context.drawing.equipment[id]?.parent ?? null;
    const sheet = new Worksheet(context.edition);
    for (const battery of worst.batteries) sheet.number("Isc", "short-circuit current of the battery", nameOf(context, equipmentRef(battery)), new Reader(context).number(battery, "shortCircuitKA") ?? 0, "kA");
    sheet.number("ΣIsc", "sum", `${worst.batteries.length} batteries`, worst.kiloamperes, "kA", "interrupting-rating");
    sheet.text("Ir", "not below the sum", `${ratingKA} kA ≥ ${worst.kiloamperes.toFixed(1)} kA`, "fails", "interrupting-rating");
    return found({
      variant: "below-fault-current", anchor, field: `props.${key}`, related: [...(cabinet ? [cabinet] : []), ...worst.batteries].map(equipmentRef),
      message: `${nameOf(context, anchor)} interrupts ${ratingKA} kA; ${names(context, worst.batteries.map(equipmentRef))} can feed ${worst.kiloamperes.toFixed(1)} kA into a fault there.`,
      steps: sheet.result(worst.kiloamperes, "kA", null).steps,
    });
  },
  suggest: ({ anchor: { id } }, context) => {
    const worst = worstSide(context, id, new Reader(context));
    const rating = OFFERED_KA.find((one) => worst !== null && one >= worst.kiloamperes);
    return rating === undefined ? [] : [{ label: `Use a device of ${rating} kA`, also: "Take it only with the maker's dc rating at the battery voltage.", patches: [{ op: "replace", path: `/equipment/${id}/props/${ratingKey(context, id)}`, value: rating }] }];
  },
  examples: { violates: "A 10 kA breaker where four batteries feed 14.4 kA.", passes: "A 20 kA breaker." },
};
