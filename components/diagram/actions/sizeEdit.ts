import { equipmentGroundingConductor, largestOvercurrentDevice, smallestOvercurrentDevice } from "@/lib/calc";
import type { Step } from "@/lib/calc/types";
import { CodeLookupError, isInsulation, MATERIAL_BY_SYMBOL } from "@/lib/code";
import type { Command } from "@/lib/diagram/commands";
import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Circuit, Section } from "@/lib/diagram/schema";
import { checkContext } from "@/lib/rules/engine/context";
import type { CheckContext } from "@/lib/rules/engine/types";
import { columnAmpacityA, correctedAmpacity, terminalsOf, type Wire } from "@/lib/rules/shared/conductors";
import { carriedBy, type Carried } from "@/lib/rules/shared/currents";
import { numberOf, Reader } from "@/lib/rules/shared/outcome";
import { largestDevice } from "@/lib/rules/shared/protection";
import { topology } from "@/lib/rules/shared/topology";
import { CONDUCTOR_SIZES } from "@/lib/units";

/** Result of sizing: the steps with what they lead to, or why it cannot be worked out yet. */
export type Sizing = { readonly reason: string } | { readonly steps: readonly Step[]; readonly result: string; readonly commands: readonly Command[]; readonly title: string };

const missing = (reader: Reader): Sizing => ({ reason: `Not known yet: ${reader.missing.slice(0, 4).map((each) => each.label).join("; ")}.` });

interface Fit { wire: Wire; steps: readonly Step[] }

/** One size against what the circuit asks for; null when it is too small, or not in a table. Missing data are asked of the reader. */
function fit(context: CheckContext, id: string, section: Section & { id: string }, wire: Wire, carried: Carried, deviceA: number | null, reader: Reader): Fit | null {
  try {
    const terminals = terminalsOf(context, id, deviceA);
    const { beforeFactorsA, afterFactorsA } = carried.required.detail;
    const ampacity = correctedAmpacity(context, id, section, wire, terminals.lowest, reader);
    if (!ampacity || columnAmpacityA(wire, terminals.lowest) < beforeFactorsA - 1e-9 || ampacity.value < afterFactorsA - 1e-9) return null;
    if (deviceA === null) return { wire, steps: ampacity.steps };
    const largest = largestDevice(context, id, wire, ampacity.value);
    // Small conductors have a limit of their own, whatever their ampacity.
    const small = largestOvercurrentDevice({ edition: context.edition, ampacityA: ampacity.value, size: wire.size, material: wire.material });
    return deviceA > Math.min(largest.value, small.value) + 1e-9 ? null : { wire, steps: [...ampacity.steps, ...largest.steps] };
  } catch (error) {
    if (error instanceof CodeLookupError) return null;
    throw error;
  }
}

/** Conductors, equipment ground and, where its rating is not known, device of a circuit, by what it carries and how it runs as drawn. */
export function sizeEdit(graph: DrawingGraph, id: string): Sizing {
  const { drawing } = graph;
  const circuit = drawing.circuits[id] as Circuit;
  const { edition } = drawing.site;
  const context = checkContext(graph);
  const reader = new Reader(context);
  const section = graph.sections(id)[0];
  if (!section) return { reason: "The circuit has no conductors to size." };
  const carried = carriedBy(context, id, reader);
  if (!carried) return reader.missing.length > 0 ? missing(reader) : { reason: "Nothing drawn at its ends tells its current. State its load above first." };
  const { protectors, ratingField } = topology(graph);
  const devices = [...new Set(protectors(id).map((one) => one.device))];
  const ratings = devices.map((device) => numberOf(context, device, ratingField(device) ?? "ratingA")).filter((rating): rating is number => rating !== null);
  const { minimumOcpdA, maximumA } = carried.required.detail;
  const chosen = devices.length === 0 ? null : smallestOvercurrentDevice({ edition, requiredA: minimumOcpdA ?? maximumA });
  const deviceA = ratings.length > 0 ? Math.max(...ratings) : chosen?.value ?? null;
  const material = MATERIAL_BY_SYMBOL[section.ungrounded?.metal ?? "Cu"];
  const insulation = section.ungrounded?.insulation && isInsulation(section.ungrounded.insulation) ? section.ungrounded.insulation : "THWN-2";
  let found: Fit | null = null;
  for (const size of CONDUCTOR_SIZES) {
    found = fit(context, id, section, { size, material, insulation, sets: section.parallelSets }, carried, deviceA, reader);
    if (found || reader.missing.length > 0) break;
  }
  if (!found) return reader.missing.length > 0 ? missing(reader) : { reason: "No conductor of the tables carries it. Use sets in parallel, or a smaller device." };
  const { size } = found.wire;
  const ground = equipmentGroundingConductor({ edition, ocpdA: deviceA ?? carried.required.detail.beforeFactorsA, material, ungroundedSize: size, ungroundedMaterial: material, minimumSize: null, pvCircuit: circuit.system === "pv-dc", sets: section.parallelSets });
  const metal = section.ungrounded?.metal ?? "Cu";
  const commands: Command[] = graph.sections(id).map((each) => ({
    type: "setSection", circuit: id, section: each.id,
    change: {
      ...(each.ungrounded ? { ungrounded: { ...each.ungrounded, size, metal, insulation } } : {}),
      ...(each.grounded ? { grounded: { ...each.grounded, size } } : {}),
      ...(each.equipmentGround ? { equipmentGround: { ...each.equipmentGround, size: ground.value } } : {}),
    },
  }));
  const unrated = devices.filter((device) => numberOf(context, device, ratingField(device) ?? "ratingA") === null);
  for (const device of unrated) commands.push({ type: "setProperty", id: device, name: ratingField(device) ?? "ratingA", value: deviceA });
  return {
    steps: [...carried.required.steps, ...(ratings.length === 0 && chosen ? chosen.steps : []), ...found.steps, ...ground.steps], commands, title: `size ${circuit.tag}`,
    result: `${size} ${metal}${deviceA === null ? "" : `, ${deviceA} A`}, EGC ${ground.value}`,
  };
}
