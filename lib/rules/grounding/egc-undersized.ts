import { equipmentGroundingConductor, type EquipmentGroundDetail, type CalcResult } from "@/lib/calc";
import { MATERIAL_BY_SYMBOL } from "@/lib/code";
import { equipmentOfNode } from "@/lib/diagram/graph";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { deviceRatingA, wireOf, type SectionOf } from "@/lib/rules/shared/conductors";
import { carriedBy } from "@/lib/rules/shared/currents";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, propertyLabel, Reader } from "@/lib/rules/shared/outcome";
import { powerCircuits, topology } from "@/lib/rules/shared/topology";
import { compareSizes, isConductorSize, type ConductorSize } from "@/lib/units";

/** Circuits whose fault current the conductor of one section may carry: its own, and those drawn to share it. */
function served(context: CheckContext, id: string): readonly string[] {
  const sharing = context.once("circuits that share a grounding conductor", () => {
    const map = new Map<string, string[]>();
    for (const other of Object.keys(context.drawing.circuits).sort()) {
      const owners = new Set(Object.values(context.drawing.circuits[other]?.sections ?? {}).flatMap((section) => (section.sharesGroundOf === null ? [] : [section.sharesGroundOf])));
      for (const owner of owners) if (owner !== other) map.set(owner, [...(map.get(owner) ?? []), other]);
    }
    return map;
  });
  return [id, ...(sharing.get(id) ?? [])];
}
/** Largest device ahead of the circuits, A; PV circuits without one by the rating a device would have. */
function deviceA(context: CheckContext, circuits: readonly string[], reader: Reader): { amperes: number; from: readonly string[] } | null {
  let best: { amperes: number; from: readonly string[] } | null = null;
  for (const circuit of circuits) {
    const devices = [...new Set(topology(context.graph).protectors(circuit).map((one) => one.device))];
    for (const device of devices) {
      const amperes = deviceRatingA(context, device);
      if (amperes === null) {
        const field = topology(context.graph).ratingField(device) ?? "ratingA";
        reader.ask(equipmentRef(device), `props.${field}`, propertyLabel(context, device, field));
      } else if (!best || amperes > best.amperes) best = { amperes, from: [device] };
    }
    if (devices.length > 0 || context.drawing.circuits[circuit]?.system !== "pv-dc") continue;
    const assumed = carriedBy(context, circuit, reader)?.required.value;
    if (assumed !== undefined && (!best || assumed > best.amperes)) best = { amperes: assumed, from: [] };
  }
  return best;
}
/** Conductors ahead of the service disconnect are bonded by another table. */
const isService = (context: CheckContext, id: string): boolean => (["from", "to"] as const).some((end) => topology(context.graph).runs(id, end)
  .some((run) => run.stop === "source" && context.graph.kind(equipmentOfNode(run.node)).capabilities.source === "utility"));

function required(context: CheckContext, id: string, section: SectionOf, amperes: number, reader: Reader): CalcResult<ConductorSize, EquipmentGroundDetail> | null {
  const wire = wireOf(context, id, section, reader);
  const metal = section.equipmentGround?.metal ?? null;
  if (metal === null) reader.ask(circuitRef(id), `sections.${section.id}.equipmentGround.metal`, `metal of the equipment grounding conductor of ${nameOf(context, circuitRef(id))}`);
  if (!wire || metal === null) return null;
  return equipmentGroundingConductor({ edition: context.edition, ocpdA: amperes, material: MATERIAL_BY_SYMBOL[metal], ungroundedSize: wire.size, ungroundedMaterial: wire.material, sets: section.parallelSets, pvCircuit: context.drawing.circuits[id]?.system === "pv-dc" });
}

export const egcUndersized: Rule = {
  meta: {
    id: "egc-undersized", group: "Grounding and bonding", severity: "must-fix", evidence: "derived",
    statement: "The equipment grounding conductor follows the largest overcurrent device ahead of the circuits it serves.",
    risk: "A ground fault burns the conductor off before the device opens, and metal parts stay live.",
    citations: sameSection("250.122(A), (C)"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.sections.equipmentGround", "circuits.sections.sharesGroundOf", "circuits.sections.ungrounded", "equipment.props.ratingA", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: ({ graph, drawing }) => powerCircuits(graph).filter((id) => Object.values(drawing.circuits[id]?.sections ?? {}).some((section) => (section.equipmentGround?.count ?? 0) > 0)).map(circuitRef),
  evaluate: ({ id }, context) => {
    if (isService(context, id)) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const device = deviceA(context, served(context, id), reader);
    if (!device) return reader.complete ? NOT_APPLICABLE : reader.outcome();
    for (const section of context.graph.sections(id)) {
      const size = section.equipmentGround?.size ?? null;
      if (!section.equipmentGround || section.equipmentGround.count === 0) continue;
      if (!isConductorSize(size)) { reader.ask(circuitRef(id), `sections.${section.id}.equipmentGround.size`, `size of the equipment grounding conductor of ${nameOf(context, circuitRef(id))}`); continue; }
      const needed = required(context, id, section, device.amperes, reader);
      if (!needed || compareSizes(size, needed.value) >= 0) continue;
      const anchor = circuitRef(id);
      return found({
        variant: "below-table", anchor, field: `sections.${section.id}.equipmentGround.size`, related: device.from.map(equipmentRef),
        message: `${nameOf(context, anchor)} has a ${size} equipment grounding conductor; ${device.from.length > 0 ? `${nameOf(context, equipmentRef(device.from[0] ?? ""))} of ${device.amperes} A` : `its ${Math.round(device.amperes * 100) / 100} A`} asks for ${needed.value}.`,
        steps: [...needed.steps, { symbol: "EGC", expression: "not below", substituted: `${size} ≥ ${needed.value}`, result: "fails", unit: "" }],
      });
    }
    return reader.complete ? PASS : reader.outcome();
  },
  suggest: ({ anchor: { id } }, context) => {
    const reader = new Reader(context);
    const device = deviceA(context, served(context, id), reader);
    if (!device) return [];
    const sizes = context.graph.sections(id).flatMap((section) => {
      const needed = section.equipmentGround && section.equipmentGround.count > 0 ? required(context, id, section, device.amperes, reader) : null;
      return needed && isConductorSize(section.equipmentGround?.size) && compareSizes(section.equipmentGround.size, needed.value) < 0 ? [{ section: section.id, size: needed.value }] : [];
    });
    const first = sizes[0];
    return first ? [{ label: `Enlarge the equipment grounding conductor to ${first.size}`, also: "Check the raceway fill.", patches: sizes.map(({ section, size }) => ({ op: "replace" as const, path: `/circuits/${id}/sections/${section}/equipmentGround/size`, value: size })) }] : [];
  },
  examples: { violates: "12 AWG copper with a 60 A device.", passes: "10 AWG copper with the same device." },
};
