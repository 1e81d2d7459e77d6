import type { Draft } from "immer";
import { placePoint } from "@/lib/diagram/graph";
import type { Drawing, Point } from "@/lib/diagram/schema";
import { kindDefinition } from "@/lib/equipment/registry";
import { idsOf, nameOf, need, withParts } from "./lookup";
import { Refusal, type Recipe } from "./types";

const shifted = (point: Point, dx: number, dy: number): Point => ({ x: point.x + dx, y: point.y + dy });

/** Moves elements with their parts. A circuit whose both ends move keeps its shape; with one end moved its drawn way is cleared, to be routed anew. */
export const moveElements: Recipe<"moveElements"> = (draft, { refs, dx, dy }) => {
  const equipment = withParts(draft, idsOf(refs, "equipment"));
  for (const id of equipment) {
    const each = need(draft, "equipment", id);
    each.at = shifted(each.at, dx, dy);
  }
  for (const bond of Object.values(draft.bonds)) if (bond.at && equipment.has(bond.equipment)) bond.at = shifted(bond.at, dx, dy);
  const chosen = new Set(idsOf(refs, "circuits"));
  const whole = new Set<string>();
  for (const [id, circuit] of Object.entries(draft.circuits)) {
    const ends = Number(equipment.has(circuit.from.equipment)) + Number(equipment.has(circuit.to.equipment));
    if (ends === 2) {
      whole.add(id);
      circuit.points = circuit.points.map((point) => shifted(point, dx, dy));
      circuit.bends = circuit.bends.map((point) => shifted(point, dx, dy));
      if (circuit.calloutAt) circuit.calloutAt = shifted(circuit.calloutAt, dx, dy);
    } else if (ends === 1 && circuit.points.length > 0) {
      circuit.points = [];
      circuit.calloutAt = null;
    } else if (ends === 0 && chosen.has(id) && circuit.calloutAt && refs.length === 1) {
      circuit.calloutAt = shifted(circuit.calloutAt, dx, dy);
    }
  }
  for (const id of idsOf(refs, "raceways")) { const each = need(draft, "raceways", id); each.at = shifted(each.at, dx, dy); }
  for (const id of idsOf(refs, "texts")) { const each = need(draft, "texts", id); each.at = shifted(each.at, dx, dy); }
  for (const id of idsOf(refs, "interlocks")) { const each = need(draft, "interlocks", id); if (each.at) each.at = shifted(each.at, dx, dy); }
  for (const id of idsOf(refs, "bonds")) {
    const each = need(draft, "bonds", id);
    if (each.at && !equipment.has(each.equipment)) each.at = shifted(each.at, dx, dy);
  }
  const sensors = new Set(idsOf(refs, "sensors"));
  for (const [id, each] of Object.entries(draft.sensors)) if (sensors.has(id) || whole.has(each.circuit)) each.at = shifted(each.at, dx, dy);
  return refs.length === 1 && refs[0] ? `move ${nameOf(draft, refs[0])}` : `move ${refs.length} elements`;
};

function rerouteLater(draft: Draft<Drawing>, equipment: ReadonlySet<string>): void {
  for (const circuit of Object.values(draft.circuits)) {
    if (circuit.points.length > 0 && (equipment.has(circuit.from.equipment) || equipment.has(circuit.to.equipment))) circuit.points = [];
  }
}

export const turnElements: Recipe<"turnElements"> = (draft, { refs, turn }) => {
  const ids = idsOf(refs, "equipment");
  for (const id of ids) {
    const each = need(draft, "equipment", id);
    if (each.size) throw new Refusal("An enclosure is not turned; move its parts instead.");
    const parts = withParts(draft, [id]);
    parts.delete(id);
    if (turn === "mirror") each.mirrored = !each.mirrored;
    else each.rotation = ((each.rotation + 90) % 360) as 0 | 90 | 180 | 270;
    // Integral parts turn about their carrier, so that their ports stay on its outline.
    for (const part of parts) {
      const inner = need(draft, "equipment", part);
      const local = { x: inner.at.x - each.at.x, y: inner.at.y - each.at.y };
      inner.at = placePoint({ at: each.at, rotation: turn === "mirror" ? 0 : 90, mirrored: turn === "mirror" }, local);
      if (turn === "mirror") inner.mirrored = !inner.mirrored;
      else inner.rotation = ((inner.rotation + 90) % 360) as 0 | 90 | 180 | 270;
    }
    rerouteLater(draft, new Set([id, ...parts]));
  }
  for (const id of idsOf(refs, "raceways")) {
    const each = need(draft, "raceways", id);
    each.vertical = !each.vertical;
    each.size = { width: each.size.height, height: each.size.width };
  }
  for (const id of idsOf(refs, "sensors")) {
    const each = need(draft, "sensors", id);
    each.rotation = ((each.rotation + 90) % 360) as 0 | 90 | 180 | 270;
  }
  const word = turn === "mirror" ? "mirror" : "turn";
  return refs.length === 1 && refs[0] ? `${word} ${nameOf(draft, refs[0])}` : `${word} ${refs.length} elements`;
};

export const resizeElement: Recipe<"resizeElement"> = (draft, { ref, at, size }) => {
  if (ref.collection === "raceways") {
    const each = need(draft, "raceways", ref.id);
    each.at = at;
    each.size = size;
  } else if (ref.collection === "equipment") {
    const each = need(draft, "equipment", ref.id);
    if (!each.size) throw new Refusal("Only enclosures, bands and boxes change size.");
    const dx = at.x - each.at.x;
    const dy = at.y - each.at.y;
    // The parts and the bus stay where they are on the sheet; only the outline changes.
    if (each.bus) {
      const grown = each.bus.vertical ? size.height - each.size.height : size.width - each.size.width;
      const stretched = each.bus.length + (dx === 0 && dy === 0 ? grown : 0);
      const fits = (each.bus.vertical ? size.height - (each.bus.y - dy) : size.width - (each.bus.x - dx)) - 0.5;
      const used = Math.max(1, ...Object.values(draft.circuits).flatMap((circuit) => [circuit.from, circuit.to]).filter((end) => end.equipment === ref.id && end.port === "bus").map((end) => end.offset));
      each.bus = { ...each.bus, x: each.bus.x - dx, y: each.bus.y - dy, length: Math.max(used, Math.min(stretched, fits)) };
    }
    if (each.label) each.label = { ...each.label, x: each.label.x - dx, y: each.label.y - dy };
    each.at = at;
    each.size = size;
  } else throw new Refusal("Only enclosures, bands and boxes change size.");
  return `resize ${nameOf(draft, ref)}`;
};

export const setParent: Recipe<"setParent"> = (draft, { id, parent }) => {
  const each = need(draft, "equipment", id);
  if (parent !== null) {
    if (!kindDefinition(need(draft, "equipment", parent).kind).capabilities.enclosure) throw new Refusal("Only enclosures hold other equipment.", "parent");
    if (withParts(draft, [id]).has(parent)) throw new Refusal("Equipment cannot stand inside itself.", "parent");
  }
  each.parent = parent;
  if (parent === null) each.spaces = null;
  return parent === null ? `take ${each.tag} out` : `put ${each.tag} into ${nameOf(draft, { collection: "equipment", id: parent })}`;
};
