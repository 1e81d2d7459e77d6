import type { PartId } from "@/lib/client/editorTypes";
import { isKindId, kindDefinition, KIND_IDS } from "@/lib/equipment/registry";

export interface Part { readonly id: PartId; readonly title: string }

/** Parts that are not equipment, with the box their ghost shows, grid units. */
const OTHER: Readonly<Record<Exclude<PartId, (typeof KIND_IDS)[number]>, { title: string; box: { x: number; y: number; width: number; height: number } }>> = {
  circuit: { title: "Circuit", box: { x: 0, y: 0, width: 0, height: 0 } },
  wireway: { title: "Wireway", box: { x: -15, y: -3, width: 30, height: 6 } },
  conduit: { title: "Conduit", box: { x: -1, y: -1, width: 2, height: 2 } },
  nipple: { title: "Nipple", box: { x: -1, y: -1, width: 2, height: 2 } },
  box: { title: "Box", box: { x: -4, y: -1.5, width: 8, height: 3 } },
  sensor: { title: "Sensor", box: { x: -1.5, y: -1, width: 3, height: 2 } },
  bond: { title: "Bond", box: { x: -1, y: -1, width: 2, height: 2 } },
  interlock: { title: "Interlock", box: { x: -2, y: -1, width: 4, height: 2 } },
  text: { title: "Note", box: { x: 0, y: -1, width: 6, height: 1.2 } },
};
const isOther = (part: PartId): part is keyof typeof OTHER => Object.hasOwn(OTHER, part);

export const partTitle = (part: PartId): string => (isOther(part) ? OTHER[part].title : SHORT[part] ?? kindDefinition(part).title);
export const partBox = (part: PartId) => (isOther(part) ? OTHER[part].box : kindDefinition(part).box);

/** Names short enough for the rail. */
const SHORT: Partial<Record<PartId, string>> = {
  utility: "Utility", meter: "Meter", "meter-main": "Meter-main", panelboard: "Panel", "interconnect-cabinet": "Interconnect", "dc-bus-cabinet": "Dc bus", breaker: "Breaker",
  "transfer-switch": "Transfer", "hybrid-inverter": "Inverter", "pv-switch": "PV switch", battery: "Battery", "pv-string": "PV string", electrode: "Ground", "surge-protector": "Surge", "shutdown-initiator": "Shutdown",
};

const RAIL_GROUPS = ["sources", "switch and protect", "convert and distribute", "loads", "route and ground"] as const;
const AFTER: Partial<Record<(typeof RAIL_GROUPS)[number], readonly PartId[]>> = {
  "switch and protect": ["interlock"], "convert and distribute": ["sensor"], "route and ground": ["circuit", "wireway", "conduit", "nipple", "box", "bond", "text"],
};
/** The parts rail: every kind of the registry under its heading, then the tools that belong there. */
export const RAIL: readonly { readonly group: string; readonly parts: readonly Part[] }[] = RAIL_GROUPS.map((group) => ({
  group,
  parts: [...KIND_IDS.filter((kind) => kindDefinition(kind).railGroup === group), ...(AFTER[group] ?? [])].map((id) => ({ id, title: partTitle(id) })),
}));

/** Key that picks a part while no field is being typed in. */
export const PART_KEYS: Readonly<Record<string, PartId>> = { u: "utility", b: "breaker", p: "panelboard", i: "hybrid-inverter", s: "pv-string", g: "generator", w: "wireway", c: "circuit" };
export const keyOfPart = (part: PartId): string | null => Object.entries(PART_KEYS).find(([, id]) => id === part)?.[0] ?? null;
export const isKindPart = (part: PartId): boolean => isKindId(part);
