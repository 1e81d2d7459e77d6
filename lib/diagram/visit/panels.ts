import { freePlace } from "./freePlace";
import { line, type LineContext, type VisitLine } from "./line";
import type { Command } from "@/lib/diagram/commands";
import type { Drawing, Equipment, Point } from "@/lib/diagram/schema";
import type { VisitData, VisitPanel } from "@/lib/diagram/siteVisit";
import { kindDefinition } from "@/lib/equipment/registry";

const PAGE = "panel label";

/** Main overcurrent device of a panel, where one is drawn. */
export function mainOf(drawing: Drawing, panel: string): { id: string; equipment: Equipment } | null {
  const found = Object.entries(drawing.equipment)
    .find(([, each]) => each.parent === panel && each.props.position === "main" && kindDefinition(each.kind).capabilities.overcurrent === true);
  return found ? { id: found[0], equipment: found[1] } : null;
}

/** Poles that the main of a panel at this service has; null where the service leaves it open. */
const polesOf = (system: VisitData["service"]["system"]): number | null => (system === "120/240 V, 3-wire" ? 2 : system === "120 V, 2-wire" ? 1 : null);

/** Places a main breaker above the bus of a panel and joins it, as found; how it is mounted was not looked at. */
function placeMain(panel: string, at: Point, bus: { x: number; y: number }, ratingA: number, visit: VisitData, source: string): Command[] {
  const id = `${panel}-main`;
  const top = { x: at.x + bus.x, y: at.y + bus.y };
  return [
    {
      type: "placeEquipment", id, kind: "breaker", parent: panel, parts: false, at: { x: top.x, y: top.y - 4 }, change: { rotation: 90, spaces: [], status: "existing" },
      props: { position: "main", mount: null, poles: polesOf(visit.service.system) },
    },
    { type: "setProperty", id, name: "ratingA", value: ratingA, source: { document: source.slice(0, 120), page: PAGE } },
    {
      type: "joinPorts", id: `${id}-bus`, from: { equipment: id, port: "load", offset: 0 }, to: { equipment: panel, port: "bus", offset: 0 }, tag: "",
      points: [{ x: top.x, y: top.y - 1 }, top], change: { wiring: "factory", sections: {}, status: "existing" },
    },
    { type: "setProperty", id: panel, name: "mainType", value: "main breaker" },
  ];
}

/** A name that can stand as a tag: short, plain and not taken. */
function tagFor(drawing: Drawing, name: string | null): string | null {
  const tag = name?.trim().toUpperCase() ?? "";
  const taken = Object.values(drawing.equipment).some((each) => each.tag.toUpperCase() === tag);
  return /^[A-Z0-9][A-Z0-9 -]{0,11}$/.test(tag) && !taken ? tag : null;
}

/** Panels of the visit, each as what was chosen for it: a new one, found on site, or one that is drawn already. */
export function panelLines({ drawing, visit, choices, source }: LineContext): VisitLine[] {
  const placed: { x: number; y: number; width: number; height: number }[] = [];
  return visit.data.panels.flatMap((panel) => {
    const choice = choices.panels[panel.id];
    if (!choice || choice.as === "nothing") return [];
    if (choice.as === "update") {
      const equipment = drawing.equipment[choice.id];
      return equipment && kindDefinition(equipment.kind).capabilities.bus ? knownPanel({ drawing, visit, choices, source }, panel, choice.id, equipment) : [];
    }
    const box = kindDefinition(choice.as).box;
    const at = freePlace(drawing, box.width, box.height, placed);
    placed.push({ ...at, width: box.width, height: box.height });
    return newPanel({ drawing, visit, choices, source }, panel, choice.as, choice.id, at);
  });
}

const noteOf = (panel: VisitPanel): string => [panel.name, panel.labelText].filter(Boolean).join(": ").slice(0, 200);

function newPanel({ drawing, visit, source }: LineContext, panel: VisitPanel, kind: "panelboard" | "meter-main", id: string, at: Point): VisitLine[] {
  const definition = kindDefinition(kind);
  const target = `New ${definition.title.toLowerCase()}${panel.name ? ` ${panel.name}` : ""}`;
  const key = `panel.${panel.id}`;
  const needs = `${key}.place`;
  const tag = tagFor(drawing, panel.name);
  const existing = (ref: string, collection: "equipment" | "circuits"): Command => ({ type: "setField", ref: { collection, id: ref }, path: ["status"], value: "existing" });
  const port = definition.ports({} as never).find((each) => each.id === "bus") ?? { x: 4, y: 4 };
  const main: Command[] = panel.mainA === null ? []
    : kind === "meter-main" ? [{ type: "setProperty", id: `${id}-main`, name: "ratingA", value: panel.mainA, source: { document: source.slice(0, 120), page: PAGE } }]
    : placeMain(id, at, port, panel.mainA, visit.data, source);
  return [
    ...line(source, {
      key: needs, target, field: "On the sheet", before: null, after: "placed as existing",
      commands: [
        {
          type: "placeEquipment", id, kind, at, ...(tag ? { tag } : {}),
          change: { status: "existing", note: noteOf(panel), location: { building: null, place: panel.location, exposure: null, ambientC: null } },
        },
        ...(kind === "meter-main" ? [existing(`${id}-main`, "equipment"), existing(`${id}-main-bus`, "circuits")] : []),
      ],
    }),
    ...line(source, rated(key, target, id, "busA", "Bus rating", null, panel.busA, source, needs)),
    ...line(source, { key: `${key}.mainA`, target, field: "Main", unit: "A", before: null, after: panel.mainA, needs, commands: main }),
    ...line(source, { key: `${key}.spacesTotal`, target, field: "Spaces", before: null, after: panel.spacesTotal, needs, commands: [{ type: "setProperty", id, name: "spacesTotal", value: panel.spacesTotal }] }),
  ];
}

function knownPanel({ drawing, visit, source }: LineContext, panel: VisitPanel, id: string, equipment: Equipment): VisitLine[] {
  const key = `panel.${panel.id}`;
  const target = equipment.tag;
  const main = mainOf(drawing, id);
  const mainLines = main
    ? line(source, { ...rated(key, `${main.equipment.tag || "Main"} in ${target}`, main.id, "ratingA", "Trip rating", main.equipment.props.ratingA as number | null, panel.mainA, source, null), key: `${key}.mainA` })
    // A main that is not drawn is placed over the bus line; where there is no upright one, nobody can say where.
    : equipment.bus?.vertical && panel.mainA !== null
      ? line(source, {
        key: `${key}.mainA`, target, field: "Main", unit: "A", before: null, after: panel.mainA,
        commands: placeMain(id, equipment.at, equipment.bus, panel.mainA, visit.data, source)
          .filter((command) => command.type !== "setProperty" || command.name !== "mainType" || Object.hasOwn(kindDefinition(equipment.kind).properties, "mainType")),
      })
      : [];
  const field = (path: readonly string[], value: unknown): Command[] => [{ type: "setField", ref: { collection: "equipment", id }, path, value }];
  return [
    ...line(source, { key: `${key}.status`, target, field: "Status", before: equipment.status, after: "existing", commands: field(["status"], "existing") }),
    ...line(source, rated(key, target, id, "busA", "Bus rating", equipment.props.busA as number | null, panel.busA, source, null)),
    ...mainLines,
    ...(Object.hasOwn(kindDefinition(equipment.kind).properties, "spacesTotal")
      ? line(source, { key: `${key}.spacesTotal`, target, field: "Spaces", before: equipment.props.spacesTotal, after: panel.spacesTotal, commands: [{ type: "setProperty", id, name: "spacesTotal", value: panel.spacesTotal }] })
      : []),
    ...line(source, { key: `${key}.location`, target, field: "Place", before: equipment.location.place, after: panel.location, commands: field(["location", "place"], panel.location) }),
    // What the label says goes along where no note was written.
    ...(equipment.note === "" ? line(source, { key: `${key}.note`, target, field: "Note", before: null, after: noteOf(panel), commands: field(["note"], noteOf(panel)) }) : []),
  ];
}

function rated(key: string, target: string, id: string, name: string, field: string, before: number | null, after: number | null, source: string, needs: string | null) {
  return {
    key: `${key}.${name}`, target, field, unit: "A", before, after, needs,
    commands: [{ type: "setProperty" as const, id, name, value: after, source: { document: source.slice(0, 120), page: PAGE } }],
  };
}
