import { ONE_DAY, celsius, line, temperatureWords, type LineContext, type VisitLine } from "./line";
import type { Command } from "@/lib/diagram/commands";
import { stretchesOf } from "@/lib/diagram/graph";
import { kindDefinition } from "@/lib/equipment/registry";

/** Lengths that were measured, each for the section it was measured for. */
export function lengthLines({ drawing, visit, choices, source }: LineContext): VisitLine[] {
  return visit.data.lengths.flatMap((each) => {
    const choice = choices.lengths[each.id];
    const circuit = choice && drawing.circuits[choice.circuit];
    const section = circuit?.sections[choice?.section ?? ""];
    if (!choice || !circuit || !section) return [];
    const many = Object.keys(circuit.sections).length > 1;
    return line(source, {
      key: `length.${each.id}`, target: circuit.tag || "Circuit", field: many ? `Length, part ${section.order + 1}` : "Length", unit: "ft", before: section.lengthFt, after: each.lengthFt,
      commands: [{ type: "setSection", circuit: choice.circuit, section: choice.section, change: { lengthFt: each.lengthFt } }],
    });
  });
}

const CLEAR = [["clearWidthIn", "Clear width"], ["clearHeightIn", "Clear height"], ["clearDepthIn", "Clear depth in front"]] as const;

/** Where equipment is to stand, with the working space that was measured there. */
export function placeLines({ drawing, visit, choices, source }: LineContext): VisitLine[] {
  return visit.data.places.flatMap((place) => {
    const id = choices.places[place.id];
    const equipment = id === undefined ? undefined : drawing.equipment[id];
    if (id === undefined || !equipment) return [];
    const key = `place.${place.id}`;
    const target = equipment.tag;
    const set = (name: string, value: unknown): Command[] => [{ type: "setField", ref: { collection: "equipment", id }, path: ["location", name], value }];
    const ambientC = place.ambient && celsius(place.ambient);
    return [
      ...line(source, { key: `${key}.building`, target, field: "Building", before: equipment.location.building, after: place.building, commands: set("building", place.building) }),
      ...line(source, { key: `${key}.place`, target, field: "Place", before: equipment.location.place, after: place.place, commands: set("place", place.place) }),
      ...line(source, { key: `${key}.exposure`, target, field: "Exposure", before: equipment.location.exposure, after: place.exposure, commands: set("exposure", place.exposure) }),
      ...line(source, {
        key: `${key}.ambientC`, target, field: "Ambient", unit: "°C", before: equipment.location.ambientC, after: ambientC, caution: ONE_DAY, commands: set("ambientC", ambientC),
        ...(place.ambient ? { words: temperatureWords(place.ambient) } : {}),
      }),
      ...CLEAR.filter(([name]) => Object.hasOwn(kindDefinition(equipment.kind).properties, name)).flatMap(([name, field]) => line(source, {
        key: `${key}.${name}`, target, field, unit: "in", before: equipment.props[name], after: place[name], commands: [{ type: "setProperty", id, name, value: place[name] }],
      })),
    ];
  });
}

/** Surroundings of raceways that run over the roof or through the attic. */
export function racewayLines({ drawing, visit, choices, source }: LineContext): VisitLine[] {
  const { temperatures, roof } = visit.data;
  return Object.entries(choices.raceways).flatMap(([id, where]) => {
    const raceway = drawing.raceways[id];
    if (!raceway) return [];
    const all = stretchesOf(raceway);
    // The part on the roof, or indoors. Where no part says where it is, the choice holds for all of it.
    const open = all.every((each) => each.exposure === null);
    const meant = all.filter((each) => open || (where === "roof" ? each.exposure === "roof" : each.exposure === "indoor dry" || each.exposure === "indoor damp"));
    const read = temperatures[where];
    return meant.flatMap((stretch) => {
      const key = `raceway.${id}.${stretch.id}`;
      const part = all.length > 1 ? `, part ${stretch.order + 1}` : "";
      const ambientC = read && celsius(read);
      return [
        ...line(source, {
          key: `${key}.ambientC`, target: raceway.tag, field: `Ambient${part}`, unit: "°C", before: stretch.ambientC, after: ambientC, caution: ONE_DAY,
          commands: [{ type: "setStretch", raceway: id, stretch: stretch.id, change: { ambientC } }], ...(read ? { words: temperatureWords(read) } : {}),
        }),
        ...(where === "roof"
          ? line(source, {
            key: `${key}.aboveRoofIn`, target: raceway.tag, field: `Height above the roof${part}`, unit: "in", before: stretch.aboveRoofIn, after: roof.conduitAboveRoofIn,
            commands: [{ type: "setStretch", raceway: id, stretch: stretch.id, change: { aboveRoofIn: roof.conduitAboveRoofIn } }],
          })
          : []),
      ];
    });
  });
}
