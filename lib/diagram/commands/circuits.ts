import type { Draft } from "immer";
import type { Circuit, Conductor, Drawing, Endpoint, Equipment, Section } from "@/lib/diagram/schema";
import type { Pole, System } from "@/lib/equipment/define";
import { kindDefinition } from "@/lib/equipment/registry";
import { free, nameOf, need } from "./lookup";
import { circuitPrefix, nextTag } from "./tags";
import { Refusal, type Recipe } from "./types";

const conductor = (count: number, insulation: Conductor["insulation"]): Conductor =>
  ({ count, size: null, metal: "Cu", insulation, strands: "class B", outerDiameterIn: null, voltageRatingV: insulation === "bare" ? null : 600, color: null });

/** Conductors a new circuit starts with: how many is known from the poles, the size is not. */
export function defaultSection(system: System, poles: readonly Pole[]): Section {
  const base: Section = {
    order: 0, lengthFt: null, parallelSets: 1, ungrounded: null, grounded: null, equipmentGround: null, sharesGroundOf: null, cable: null, route: [], ambientC: null,
  };
  switch (system) {
    case "data": return { ...base, cable: { type: "Cat 6", class: "class 2", count: 1, outerDiameterIn: null, voltageRatingV: 300, wetListed: null } };
    case "ground": return { ...base, equipmentGround: conductor(1, "bare") };
    case "ac": return {
      ...base, ungrounded: conductor(Math.max(1, poles.filter((pole) => pole.startsWith("L")).length), "THWN-2"),
      grounded: poles.includes("N") ? conductor(1, "THWN-2") : null, equipmentGround: conductor(1, "THWN-2"),
    };
    case "pv-dc": case "battery-dc": return { ...base, ungrounded: conductor(2, "THWN-2"), equipmentGround: conductor(1, "THWN-2") };
  }
}

/** A circuit without sections, bends or a drawn way. */
export function newCircuit(system: System, tag: string, from: Endpoint, to: Endpoint): Circuit {
  return { tag, callout: null, wiring: "field", system, from, to, status: "new", load: null, sections: {}, points: [], bends: [], calloutAt: null };
}

function portAt(draft: Draft<Drawing>, endpoint: Endpoint) {
  const equipment = need(draft, "equipment", endpoint.equipment);
  const port = kindDefinition(equipment.kind).ports(equipment.props as never).find((each) => each.id === endpoint.port);
  if (!port) throw new Refusal(`${equipment.tag || "This equipment"} has no such port.`);
  return { equipment, port };
}

/** Parts of one enclosure are joined by its factory wiring; everything else is wired in the field. */
function insideOne(draft: Draft<Drawing>, a: Endpoint, b: Endpoint): boolean {
  const one = draft.equipment[a.equipment] as Equipment;
  const two = draft.equipment[b.equipment] as Equipment;
  return one.parent === b.equipment || two.parent === a.equipment || (one.parent !== null && one.parent === two.parent);
}

/** @throws Refusal saying why the circuit may not land at this end */
function mayLand(draft: Draft<Drawing>, circuitId: string, circuit: Pick<Circuit, "system" | "wiring">, endpoint: Endpoint): void {
  const { equipment, port } = portAt(draft, endpoint);
  if (port.system !== circuit.system) throw new Refusal(`${equipment.tag || "This"} ${port.label.toLowerCase()} is for ${port.system.replace("-", " ")}, not for ${circuit.system.replace("-", " ")}.`);
  if (port.many) return;
  const other = Object.entries(draft.circuits).find(([id, each]) => id !== circuitId && each.wiring === circuit.wiring
    && [each.from, each.to].some((end) => end.equipment === endpoint.equipment && end.port === endpoint.port));
  if (other) throw new Refusal(`${equipment.tag || "This"} ${port.label.toLowerCase()} already holds ${other[1].tag || "a circuit"}. Only buses and bars take several.`);
}

export const joinPorts: Recipe<"joinPorts"> = (draft, command) => {
  free(draft, "circuits", command.id);
  const { from, to } = command;
  if (from.equipment === to.equipment) throw new Refusal("A circuit joins two pieces of equipment.");
  const start = portAt(draft, from);
  const end = portAt(draft, to);
  if (start.port.system !== end.port.system) throw new Refusal(`${start.port.system.replace("-", " ")} cannot land on ${end.port.system.replace("-", " ")}.`);
  const wiring = command.change?.wiring ?? (start.port.system !== "ground" && insideOne(draft, from, to) ? "factory" : "field");
  const tag = command.tag ?? (wiring === "factory" ? "" : nextTag(draft as Drawing, circuitPrefix(start.port.system)));
  // A line-to-line device has no neutral pole, yet its circuit may carry one from the panel's neutral bar; the poles of the fuller end count.
  const poles = start.port.poles.length >= end.port.poles.length ? start.port.poles : end.port.poles;
  const circuit: Circuit = {
    ...newCircuit(start.port.system, tag, from, to), wiring, points: [...(command.points ?? [])],
    sections: wiring === "factory" ? {} : { s1: defaultSection(start.port.system, poles) },
    ...command.change,
  };
  for (const endpoint of [from, to]) mayLand(draft, command.id, circuit, endpoint);
  draft.circuits[command.id] = circuit;
  return tag ? `draw ${tag}` : "join";
};

export const setEnd: Recipe<"setEnd"> = (draft, command) => {
  const circuit = need(draft, "circuits", command.circuit);
  const other = command.end === "from" ? circuit.to : circuit.from;
  if (other.equipment === command.endpoint.equipment) throw new Refusal("A circuit joins two pieces of equipment.");
  mayLand(draft, command.circuit, circuit, command.endpoint);
  circuit[command.end] = command.endpoint;
  return `move an end of ${circuit.tag || "the circuit"}`;
};

export const routeCircuit: Recipe<"routeCircuit"> = (draft, command) => {
  const circuit = need(draft, "circuits", command.circuit);
  circuit.points = [...command.points];
  if (command.bends) circuit.bends = [...command.bends];
  if (command.calloutAt !== undefined) circuit.calloutAt = command.calloutAt;
  return `route ${circuit.tag || "the circuit"}`;
};

function section(draft: Draft<Drawing>, circuitId: string, sectionId: string) {
  const circuit = need(draft, "circuits", circuitId);
  const found = Object.hasOwn(circuit.sections, sectionId) ? circuit.sections[sectionId] : undefined;
  if (!found) throw new Refusal("This part of the circuit is not there any more.");
  return { circuit, section: found };
}

export const setSection: Recipe<"setSection"> = (draft, command) => {
  const { circuit, section: found } = section(draft, command.circuit, command.section);
  Object.assign(found, command.change);
  return `change ${circuit.tag || "the circuit"}`;
};

export const splitSection: Recipe<"splitSection"> = (draft, command) => {
  const { circuit, section: found } = section(draft, command.circuit, command.section);
  if (Object.hasOwn(circuit.sections, command.id)) throw new Refusal("This id is taken already.", "id");
  for (const each of Object.values(circuit.sections)) if (each.order > found.order) each.order += 1;
  circuit.sections[command.id] = { ...structuredCloneDraft(found), order: found.order + 1, lengthFt: command.lengthFt, route: [] };
  return `split ${circuit.tag}`;
};
const structuredCloneDraft = (value: Draft<Section>): Section => JSON.parse(JSON.stringify(value)) as Section;

export const removeSection: Recipe<"removeSection"> = (draft, command) => {
  const { circuit } = section(draft, command.circuit, command.section);
  if (Object.keys(circuit.sections).length === 1) throw new Refusal("A circuit keeps one section. Delete the circuit instead.");
  delete circuit.sections[command.section];
  return `remove a section of ${circuit.tag}`;
};

export const addToRoute: Recipe<"addToRoute"> = (draft, command) => {
  const { circuit, section: found } = section(draft, command.circuit, command.section);
  const raceway = need(draft, "raceways", command.raceway);
  if (found.route.some((step) => step.raceway === command.raceway)) throw new Refusal(`${circuit.tag} already runs through ${raceway.tag}.`);
  // With one compartment there is nothing to choose.
  const only = Object.keys(raceway.compartments);
  const compartment = command.compartment ?? (only.length === 1 ? only[0] as string : null);
  if (compartment === null && only.length > 1) throw new Refusal(`${raceway.tag} has ${only.length} compartments. Choose one.`, "compartment");
  const route = found.route.map((step) => ({ ...step }));
  route.splice(command.index ?? route.length, 0, { raceway: command.raceway, compartment });
  found.route = route;
  return `route ${circuit.tag} through ${raceway.tag}`;
};

export const removeFromRoute: Recipe<"removeFromRoute"> = (draft, command) => {
  const { circuit, section: found } = section(draft, command.circuit, command.section);
  found.route = found.route.filter((step) => step.raceway !== command.raceway).map((step) => ({ ...step }));
  return `take ${circuit.tag} out of ${nameOf(draft, { collection: "raceways", id: command.raceway })}`;
};
