import type { Drawing, ElementRef, Point } from "@/lib/diagram/schema";
import { kindDefinition } from "@/lib/equipment/registry";
import { idsOf, withParts } from "./lookup";
import { circuitPrefix, equipmentPrefix, nextTag, racewayPrefix, usedTags } from "./tags";
import { Refusal, type Fragment, type Recipe } from "./types";

/** What a copy takes along: elements with their parts, the circuits between them, their bonds, and interlocks and sensors that lie wholly inside. */
export function copyElements(drawing: Drawing, refs: readonly ElementRef[]): { content: Fragment; cut: readonly string[] } {
  const equipment = withParts(drawing, idsOf(refs, "equipment"));
  const raceways = new Set(idsOf(refs, "raceways"));
  const pick = <T>(map: Record<string, T>, keep: (value: T, id: string) => boolean): Record<string, T> =>
    Object.fromEntries(Object.entries(map).filter(([id, value]) => keep(value, id)));
  const touching = Object.values(drawing.circuits).filter((each) => equipment.has(each.from.equipment) !== equipment.has(each.to.equipment));
  const circuits = pick(drawing.circuits, (each) => equipment.has(each.from.equipment) && equipment.has(each.to.equipment));
  return {
    content: {
      equipment: pick(drawing.equipment, (_, id) => equipment.has(id)), circuits,
      raceways: pick(drawing.raceways, (_, id) => raceways.has(id)), bonds: pick(drawing.bonds, (each) => equipment.has(each.equipment)),
      interlocks: pick(drawing.interlocks, (each) => Object.keys(each.switches).every((id) => equipment.has(id))),
      sensors: pick(drawing.sensors, (each) => Object.hasOwn(circuits, each.circuit)), texts: pick(drawing.texts, (_, id) => idsOf(refs, "texts").includes(id)),
    },
    cut: touching.map((each) => each.tag).filter(Boolean),
  };
}

/** Ids for which a paste needs a new one. */
export const idsIn = (content: Fragment): string[] => Object.values(content).flatMap((map) => Object.keys(map));

/** Puts a copied fragment on the sheet with new ids and tags. Routes keep only raceways that came along. */
export const paste: Recipe<"paste"> = (draft, { content, ids, dx, dy }) => {
  const fresh = (id: string): string => {
    const made = Object.hasOwn(ids, id) ? ids[id] : undefined;
    if (!made) throw new Refusal("The copied elements cannot be pasted here.", "ids");
    return made;
  };
  const move = (point: Point): Point => ({ x: point.x + dx, y: point.y + dy });
  const inside = (id: string | null): string | null => (id !== null && (Object.hasOwn(content.equipment, id) || Object.hasOwn(content.raceways, id)) ? fresh(id) : null);
  const tag = (old: string, prefix: string): string => (old === "" ? "" : usedTags(draft as Drawing).has(old) ? nextTag(draft as Drawing, prefix) : old);
  const copy = <T>(value: T): T => JSON.parse(JSON.stringify(value)) as T;
  for (const [id, each] of Object.entries(content.equipment)) {
    const definition = kindDefinition(each.kind);
    const parent = inside(each.parent);
    draft.equipment[fresh(id)] = {
      ...copy(each), tag: tag(each.tag, each.tag.startsWith("BB-") ? "BB-" : equipmentPrefix(definition.tagPrefix)), at: move(each.at), parent,
      spaces: parent === null ? null : each.spaces,
    };
  }
  for (const [id, each] of Object.entries(content.raceways)) {
    draft.raceways[fresh(id)] = { ...copy(each), tag: tag(each.tag, racewayPrefix(each.kind)), at: move(each.at), from: inside(each.from), to: inside(each.to) };
  }
  for (const [id, each] of Object.entries(content.circuits)) {
    const sections = Object.fromEntries(Object.entries(copy(each.sections)).map(([sectionId, section]) => [sectionId, {
      ...section, sharesGroundOf: section.sharesGroundOf !== null && Object.hasOwn(content.circuits, section.sharesGroundOf) ? fresh(section.sharesGroundOf) : null,
      route: section.route.flatMap((step) => { const raceway = inside(step.raceway); return raceway ? [{ ...step, raceway }] : []; }),
    }]));
    draft.circuits[fresh(id)] = {
      ...copy(each), tag: tag(each.tag, circuitPrefix(each.system)), callout: null, sections,
      from: { ...each.from, equipment: fresh(each.from.equipment) }, to: { ...each.to, equipment: fresh(each.to.equipment) },
      points: each.points.map(move), bends: each.bends.map(move), calloutAt: each.calloutAt ? move(each.calloutAt) : null,
    };
  }
  for (const [id, each] of Object.entries(content.bonds)) draft.bonds[fresh(id)] = { ...copy(each), equipment: fresh(each.equipment), tag: tag(each.tag, "BJ-"), at: each.at ? move(each.at) : null };
  for (const [id, each] of Object.entries(content.interlocks)) {
    draft.interlocks[fresh(id)] = { ...copy(each), tag: tag(each.tag, "IL-"), at: each.at ? move(each.at) : null, switches: Object.fromEntries(Object.keys(each.switches).map((member) => [fresh(member), true as const])) };
  }
  for (const [id, each] of Object.entries(content.sensors)) draft.sensors[fresh(id)] = { ...copy(each), tag: tag(each.tag, "CT-"), circuit: fresh(each.circuit), reads: inside(each.reads), ...(each.lead ? { lead: Object.hasOwn(content.circuits, each.lead) ? fresh(each.lead) : null } : {}), at: move(each.at) };
  for (const [id, each] of Object.entries(content.texts)) draft.texts[fresh(id)] = { ...copy(each), at: move(each.at) };
  const count = Object.keys(content.equipment).length + Object.keys(content.raceways).length;
  return `paste ${count} element${count === 1 ? "" : "s"}`;
};
