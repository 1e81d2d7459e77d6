import type { ElementRef } from "@/lib/diagram/schema";
import { idsOf, nameOf, withParts } from "./lookup";
import { Refusal, type Recipe } from "./types";

/** Deletes elements and what cannot stand without them; says what else went. */
export const deleteElements: Recipe<"deleteElements"> = (draft, { refs }, say) => {
  const there = refs.filter((ref) => Object.hasOwn(draft[ref.collection], ref.id));
  if (there.length === 0) throw new Refusal("Nothing to delete.");
  const title = there.length === 1 && there[0] ? `delete ${nameOf(draft, there[0])}` : `delete ${there.length} elements`;
  const asked = new Set(there.map((ref) => `${ref.collection}/${ref.id}`));
  const went: string[] = [];
  const drop = (ref: ElementRef): void => {
    if (!Object.hasOwn(draft[ref.collection], ref.id)) return;
    const name = nameOf(draft, ref);
    if (!asked.has(`${ref.collection}/${ref.id}`)) went.push(name);
    delete (draft[ref.collection] as Record<string, unknown>)[ref.id];
  };

  const equipment = withParts(draft, idsOf(there, "equipment"));
  const raceways = new Set(idsOf(there, "raceways"));
  const circuits = new Set(idsOf(there, "circuits"));
  for (const [id, circuit] of Object.entries(draft.circuits)) if (equipment.has(circuit.from.equipment) || equipment.has(circuit.to.equipment)) circuits.add(id);

  for (const [id, sensor] of Object.entries(draft.sensors)) {
    if (circuits.has(sensor.circuit)) drop({ collection: "sensors", id });
    else if (sensor.reads && equipment.has(sensor.reads)) sensor.reads = null;
    if (sensor.lead && circuits.has(sensor.lead)) sensor.lead = null;
  }
  for (const [id, bond] of Object.entries(draft.bonds)) if (equipment.has(bond.equipment)) drop({ collection: "bonds", id });
  for (const [id, interlock] of Object.entries(draft.interlocks)) {
    for (const member of Object.keys(interlock.switches)) if (equipment.has(member)) delete interlock.switches[member];
    if (Object.keys(interlock.switches).length < 2) drop({ collection: "interlocks", id });
  }
  for (const circuit of Object.values(draft.circuits)) {
    for (const section of Object.values(circuit.sections)) {
      if (section.route.some((step) => raceways.has(step.raceway))) section.route = section.route.filter((step) => !raceways.has(step.raceway)).map((step) => ({ ...step }));
      if (section.sharesGroundOf && circuits.has(section.sharesGroundOf)) section.sharesGroundOf = null;
    }
  }
  for (const raceway of Object.values(draft.raceways)) {
    for (const end of ["from", "to"] as const) {
      const at = raceway[end];
      if (at && (equipment.has(at) || raceways.has(at))) raceway[end] = null;
    }
  }
  for (const label of Object.values(draft.labels)) for (const place of Object.keys(label.places)) if (equipment.has(place) || raceways.has(place)) delete label.places[place];
  for (const id of circuits) drop({ collection: "circuits", id });
  for (const id of equipment) drop({ collection: "equipment", id });
  for (const ref of there) drop(ref);
  const named = [...new Set(went.filter((name) => name !== "circuit"))];
  if (named.length > 0) say(`Also deleted: ${named.join(", ")}.`);
  return title;
};
