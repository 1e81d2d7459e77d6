import { bondingJumper, equipmentGroundingConductor } from "@/lib/calc";
import { MATERIAL_BY_SYMBOL } from "@/lib/code";
import { equipmentOfNode } from "@/lib/diagram/graph";
import type { Conductor } from "@/lib/diagram/schema";
import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import type { Step } from "@/lib/calc";
import { columnAmpacityA, deviceRatingA, terminalsOf, wireOf, type SectionOf } from "@/lib/rules/shared/conductors";
import { loadA } from "@/lib/rules/shared/currents";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, numberOf, PASS, Reader } from "@/lib/rules/shared/outcome";
import { powerCircuits, supplies, topology } from "@/lib/rules/shared/topology";
import { compareSizes, CONDUCTOR_SIZES, isConductorSize, type ConductorSize } from "@/lib/units";

interface Floor { size: ConductorSize; why: string; from: readonly string[]; steps: readonly Step[] }

/** Least current that must return by the neutral: half of the 120 V loads stand on one leg at best, and the largest always on one. */
function unbalance(context: CheckContext, id: string, reader: Reader): { amperes: number; loads: readonly string[] } {
  const { side } = topology(context.graph);
  const away = [side(id, "from"), side(id, "to")].find((one) => supplies(one) === 0);
  const loads = (away?.loads ?? []).filter((load) => numberOf(context, load, "phaseV") === 120);
  const currents = loads.map((load) => { const amperes = loadA(context, load); if (amperes === null) reader.number(load, "currentA"); return amperes ?? 0; });
  return { amperes: Math.max(0, ...currents, currents.reduce((a, b) => a + b, 0) / 2), loads };
}
/** Smallest neutral that the fault path asks for: that of the service, or an equipment grounding conductor's size. */
function faultFloor(context: CheckContext, id: string, section: SectionOf, reader: Reader): Floor | null {
  const metal = section.grounded?.metal;
  const wire = wireOf(context, id, section, reader);
  if (!wire || !metal) return null;
  const material = MATERIAL_BY_SYMBOL[metal];
  const { runs, protectors } = topology(context.graph);
  const service = (["from", "to"] as const).some((end) => runs(id, end).some((run) => run.stop === "source" && context.graph.kind(equipmentOfNode(run.node)).capabilities.source === "utility"));
  if (service) {
    const jumper = bondingJumper({ edition: context.edition, supplySize: wire.size, supplyMaterial: wire.material, sets: wire.sets, material });
    return { size: jumper.value, why: "the grounded conductor of the service asks for", from: [], steps: jumper.steps };
  }
  const devices = [...new Set(protectors(id).map((one) => one.device))];
  const ratings = devices.map((device) => deviceRatingA(context, device)).filter((value): value is number => value !== null);
  if (ratings.length === 0) return null;
  const ground = equipmentGroundingConductor({ edition: context.edition, ocpdA: Math.max(...ratings), material, ungroundedSize: wire.size, ungroundedMaterial: wire.material, sets: section.parallelSets });
  return { size: ground.value, why: `its ${Math.max(...ratings)} A device asks for the size of an equipment grounding conductor,`, from: devices, steps: ground.steps };
}
/** Size that carries the unbalance at the weaker terminal. */
function unbalanceFloor(context: CheckContext, id: string, section: SectionOf, reader: Reader): Floor | null {
  const { amperes, loads } = unbalance(context, id, reader);
  const wire = wireOf(context, id, section, reader);
  const metal = section.grounded?.metal;
  if (amperes === 0 || !wire || !metal) return null;
  const column = terminalsOf(context, id, null, 75).lowest;
  const size = CONDUCTOR_SIZES.filter((one) => compareSizes(one, "14 AWG") >= 0).find((one) => columnAmpacityA({ ...wire, size: one, material: MATERIAL_BY_SYMBOL[metal] }, column) >= amperes - 1e-9);
  return size ? { size, why: `${Math.round(amperes * 10) / 10} A return by it and ask for`, from: loads, steps: [{ symbol: "In", expression: "largest 120 V load, or half of all of them", substituted: `${loads.length} loads`, result: amperes, unit: "A", citation: "220.61" }] } : null;
}
/** Smallest sizes by both grounds. The fault floor is one of feeders and sources; a branch circuit has only its load. */
function floorsOf(context: CheckContext, id: string, section: SectionOf, reader: Reader): readonly Floor[] {
  const { ungrounded, grounded } = section;
  // As large as the ungrounded conductors it is never below the fault floor.
  const full = isConductorSize(ungrounded?.size) && isConductorSize(grounded?.size) && compareSizes(grounded.size, ungrounded.size) >= 0 && grounded.metal === ungrounded.metal;
  const { side } = topology(context.graph);
  const feeder = !full && [side(id, "from"), side(id, "to")].every((one) => one.buses.length + one.converters.length + supplies(one) > 0);
  return [feeder ? faultFloor(context, id, section, reader) : null, unbalanceFloor(context, id, section, reader)].filter((one): one is Floor => one !== null);
}
const largest = (floors: readonly Floor[]): Floor | undefined => floors.toSorted((a, b) => compareSizes(b.size, a.size))[0];

export const neutralTooSmall: Rule = {
  meta: {
    id: "neutral-too-small", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "The neutral must carry the largest unbalanced current, may not be below the equipment grounding conductor of its feeder, and at the service not below the grounded-conductor table.",
    risk: "An overloaded neutral burns open and puts 240 V on 120 V equipment; at the service it is the only fault path.",
    citations: sections(["220.61, 215.2(A)(1), 250.24(C), 705.95", "read"], ["220.61, 215.2(A)(1), 250.24(C), 705.28(C)", "read"], ["220.61, 215.2(A)(1), 250.24(D), 705.28(C)", "read"], "Article 120, 215.2(A)(1), 250.24(D), 705.28(C)"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["circuits.sections.grounded", "circuits.sections.ungrounded", "equipment.props.phaseV", "equipment.props.currentA", "equipment.props.ratingA", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: ({ drawing, graph }) => powerCircuits(graph).filter((id) => drawing.circuits[id]?.system === "ac" && Object.values(drawing.circuits[id]?.sections ?? {}).some((section) => (section.grounded?.count ?? 0) > 0)).map(circuitRef),
  evaluate: (anchor, context): Outcome => {
    const { id } = anchor;
    const reader = new Reader(context);
    let judged = false;
    for (const section of context.graph.sections(id)) {
      const neutral: Conductor | null = section.grounded;
      if (!neutral || neutral.count === 0) continue;
      if (neutral.metal === null) reader.ask(anchor, `sections.${section.id}.grounded.metal`, `metal of the neutral of ${nameOf(context, anchor)}`);
      const floor = largest(floorsOf(context, id, section, reader));
      if (!floor && isConductorSize(neutral.size)) judged = true;
      if (floor && !isConductorSize(neutral.size)) reader.ask(anchor, `sections.${section.id}.grounded.size`, `size of the neutral of ${nameOf(context, anchor)}`);
      if (!floor || !isConductorSize(neutral.size)) continue;
      judged = true;
      if (compareSizes(neutral.size, floor.size) >= 0) continue;
      return found({
        variant: "neutral-below", anchor, field: `sections.${section.id}.grounded.size`, related: floor.from.map(equipmentRef),
        message: `${nameOf(context, anchor)} has a ${neutral.size} neutral; ${floor.why} ${floor.size}.`,
        steps: [...floor.steps, { symbol: "N", expression: "not below", substituted: `${neutral.size} ≥ ${floor.size}`, result: "fails", unit: "" }],
      });
    }
    return !reader.complete ? reader.outcome() : judged ? PASS : NOT_APPLICABLE;
  },
  suggest: ({ anchor: { id }, anchor }, context) => {
    const patches = context.graph.sections(id).flatMap((section) => {
      const floor = section.grounded ? largest(floorsOf(context, id, section, new Reader(context))) : undefined;
      return floor && isConductorSize(section.grounded?.size) && compareSizes(section.grounded.size, floor.size) < 0 ? [{ op: "replace" as const, path: `/circuits/${id}/sections/${section.id}/grounded/size`, value: floor.size }] : [];
    });
    return patches.length > 0 ? [{ label: `Enlarge the neutral of ${nameOf(context, anchor)} to ${patches[0]?.value}`, also: "Check the raceway fill.", patches }] : [];
  },
  examples: { violates: "A 14 AWG neutral on a 60 A island feeder, whose equipment grounding conductor is 10 AWG.", passes: "A 6 AWG neutral." },
};
