import type { Draft } from "immer";
import type { Bond, Drawing, Endpoint, Equipment, Point } from "@/lib/diagram/schema";
import { kindDefinition, type KindId } from "@/lib/equipment/registry";
import { newCircuit } from "./circuits";
import { free, need } from "./lookup";
import { equipmentPrefix, nextTag } from "./tags";
import { Refusal, type Recipe } from "./types";

const NOWHERE: Equipment["location"] = { building: null, place: null, exposure: null, ambientC: null };

/** Equipment of a kind with nothing known but the kind's defaults. */
export function newEquipment(kind: KindId, tag: string, at: Point): Equipment {
  const definition = kindDefinition(kind);
  const props = Object.fromEntries(Object.keys(definition.properties).map((name) => [name, (definition.defaults as Record<string, never>)[name] ?? null]));
  const { enclosure, bus } = definition.capabilities;
  const box = { width: definition.box.width, height: definition.box.height };
  const port = bus ? definition.ports(props as never).find((each) => each.id === "bus") : undefined;
  const across = kind === "dc-bus-cabinet";
  return {
    kind, tag, status: "new", parent: null, integral: false, at, rotation: 0, mirrored: false,
    size: enclosure && definition.symbol(props as never) === null ? box : null,
    bus: port ? { x: port.x, y: port.y, length: across ? box.width - 2 : box.height - port.y - 2, vertical: !across } : null,
    label: null, spaces: null, location: { ...NOWHERE }, props, sources: {}, ports: {}, note: "",
  };
}

/** Lowest free pair (or single, or three) of spaces on one side of the panel; null when it is full or its spaces are not known. */
export function freeSpaces(drawing: Drawing | Draft<Drawing>, panel: string, poles: number): number[] | null {
  const total = drawing.equipment[panel]?.props.spacesTotal;
  if (typeof total !== "number") return null;
  const taken = new Set(Object.values(drawing.equipment).filter((each) => each.parent === panel).flatMap((each) => each.spaces ?? []));
  for (let first = 1; first + (poles - 1) * 2 <= total; first++) {
    const spaces = Array.from({ length: poles }, (_, i) => first + i * 2);
    if (spaces.every((space) => !taken.has(space))) return spaces;
  }
  return null;
}

interface Ports { from: Endpoint; to: Endpoint }
const at0 = (equipment: string, port: string, offset = 0): Endpoint => ({ equipment, port, offset });

function factory(draft: Draft<Drawing>, id: string, { from, to }: Ports, points: Point[]): void {
  const system = kindDefinition((draft.equipment[from.equipment] as Equipment).kind)
    .ports((draft.equipment[from.equipment] as Equipment).props as never).find((port) => port.id === from.port)?.system ?? "ac";
  draft.circuits[id] = { ...newCircuit(system, "", from, to), wiring: "factory", sections: {}, points };
}

function part(draft: Draft<Drawing>, id: string, kind: KindId, parent: string, at: Point, change: Partial<Equipment>, props: Equipment["props"]): Equipment {
  free(draft, "equipment", id);
  const made = newEquipment(kind, nextTag(draft as Drawing, equipmentPrefix(kindDefinition(kind).tagPrefix)), at);
  draft.equipment[id] = { ...made, parent, ...change, props: { ...made.props, ...props } };
  return draft.equipment[id] as Equipment;
}

/** Bond that equipment of this kind may hold. Whether it is fitted is not known until somebody looked. */
function bond(draft: Draft<Drawing>, id: string, equipment: string, kind: Bond["kind"], prefix: string, at: Point): void {
  draft.bonds[id] = { tag: nextTag(draft as Drawing, prefix), kind, equipment, fitted: null, size: null, closes: "always", at };
}

/** Puts a breaker on the bus of the panel it was dropped on: turned to the bus, joined to it, in the next free spaces. */
function mountOnBus(draft: Draft<Drawing>, id: string, panelId: string, dropped: Point): void {
  const panel = need(draft, "equipment", panelId);
  const breaker = need(draft, "equipment", id);
  const bus = panel.bus;
  if (!bus) return;
  const dc = kindDefinition(panel.kind).ports(panel.props as never).find((port) => port.id === "bus")?.system === "battery-dc";
  if (dc) breaker.props.current = "battery dc";
  const start = bus.vertical ? panel.at.y + bus.y : panel.at.x + bus.x;
  const offset = Math.max(0, Math.min(bus.length, Math.round((bus.vertical ? dropped.y : dropped.x) - start)));
  const onBus: Point = bus.vertical ? { x: panel.at.x + bus.x, y: start + offset } : { x: start + offset, y: panel.at.y + bus.y };
  if (bus.vertical) {
    breaker.mirrored = dropped.x < onBus.x;
    breaker.rotation = 0;
    breaker.at = { x: onBus.x + (breaker.mirrored ? -2 : 2), y: onBus.y };
  } else {
    breaker.rotation = dropped.y < onBus.y ? 270 : 90;
    breaker.at = { x: onBus.x, y: onBus.y + (breaker.rotation === 90 ? 1 : -1) };
  }
  const poles = typeof breaker.props.poles === "number" ? breaker.props.poles : 2;
  breaker.spaces = dc ? null : freeSpaces(draft, panelId, poles);
  factory(draft, `${id}-bus`, { from: at0(panelId, "bus", offset), to: at0(id, "line") }, [onBus, { ...breaker.at }]);
}

/** Parts that equipment of a kind always comes with, so that its circuits land where they land in the field. */
function addParts(draft: Draft<Drawing>, id: string): void {
  const made = need(draft, "equipment", id);
  const { x, y } = made.at;
  if (made.kind === "hybrid-inverter") {
    const trackers = typeof made.props.trackers === "number" ? made.props.trackers : 0;
    if (trackers > 0) {
      part(draft, `${id}-pvs`, "pv-switch", id, { x: x + 2.5, y: y + 8.3 }, { integral: true }, { channels: trackers });
      for (let n = 1; n <= trackers; n++) factory(draft, `${id}-pv${n}`, { from: at0(`${id}-pvs`, `load${n}`), to: at0(id, `pv${n}`) }, []);
    }
  } else if (made.kind === "battery") {
    part(draft, `${id}-bb`, "breaker", id, { x, y: y + 3 }, { integral: true, rotation: 270, tag: nextTag(draft as Drawing, "BB-") }, { current: "battery dc", mount: "stud" });
    factory(draft, `${id}-dc`, { from: at0(id, "dc"), to: at0(`${id}-bb`, "line") }, []);
  } else if (made.kind === "generator") {
    part(draft, `${id}-cb`, "breaker", id, { x: x + 3, y: y + 7.6 }, { rotation: 90 }, { position: "main", mount: "bolt-on", poles: 2 });
    factory(draft, `${id}-out`, { from: at0(id, "load"), to: at0(`${id}-cb`, "line") }, [{ x: x + 3, y: y + 6.6 }, { x: x + 3, y: y + 7.6 }]);
    bond(draft, `${id}-strap`, id, "neutral strap", "NS-", { x: x + 6.5, y: y + 10.4 });
  } else if (made.kind === "meter-main" && made.bus) {
    const top: Point = { x: x + made.bus.x, y: y + made.bus.y };
    part(draft, `${id}-main`, "breaker", id, { x: top.x, y: top.y - 4 }, { rotation: 90, spaces: [] }, { position: "main", mount: "bolt-on", poles: 2 });
    factory(draft, `${id}-main-bus`, { from: at0(`${id}-main`, "load"), to: at0(id, "bus", 0) }, [{ x: top.x, y: top.y - 1 }, top]);
    bond(draft, `${id}-mbj`, id, "main bonding jumper", "MBJ-", { x: x + 1.5, y: y + 8 });
  }
}

export const placeEquipment: Recipe<"placeEquipment"> = (draft, command) => {
  free(draft, "equipment", command.id);
  const definition = kindDefinition(command.kind);
  const made = newEquipment(command.kind, command.tag ?? nextTag(draft as Drawing, equipmentPrefix(definition.tagPrefix)), command.at);
  const parent = command.parent ?? null;
  if (parent !== null && !kindDefinition(need(draft, "equipment", parent).kind).capabilities.enclosure) throw new Refusal("Only enclosures hold other equipment.", "parent");
  draft.equipment[command.id] = { ...made, parent, ...command.change, props: { ...made.props, ...command.props } };
  if (command.parts !== false) {
    if (parent !== null && definition.capabilities.switching === "breaker" && !command.change?.rotation) mountOnBus(draft, command.id, parent, command.at);
    addParts(draft, command.id);
  }
  return `place ${draft.equipment[command.id]?.tag || definition.title.toLowerCase()}`;
};
