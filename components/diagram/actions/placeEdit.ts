import type { Command } from "@/lib/diagram/commands";
import type { DrawingGraph } from "@/lib/diagram/graph";
import type { ElementRef, Equipment, Point } from "@/lib/diagram/schema";
import { isKindId, kindDefinition, type KindId } from "@/lib/equipment/registry";
import type { PartId } from "@/lib/client/editorTypes";
import { withRoutes, type PlacedEdit, type Refused } from "./edit";
import { circuitsNear, enclosureAt } from "./hits";

/** Distance between breakers along a bus, so that their lettering stays apart; grid units. */
const BREAKER_PITCH = 3;
/** A mark set down this near to a circuit is meant for it; grid units. */
const NEAR = 2;
const onGrid = (point: Point): Point => ({ x: Math.round(point.x), y: Math.round(point.y) });

/** Free place on a panel's bus nearest to where a breaker was set down; the panel is made longer when there is none. */
function placeOnBus(graph: DrawingGraph, panelId: string, at: Point): { at: Point; grow: Command[] } {
  const panel = graph.drawing.equipment[panelId];
  if (!panel?.bus || !panel.size) return { at, grow: [] };
  const { bus } = panel;
  const { vertical, length } = bus;
  const left = vertical ? at.x < panel.at.x + bus.x : at.y < panel.at.y + bus.y;
  const wanted = Math.round(vertical ? at.y - panel.at.y - bus.y : at.x - panel.at.x - bus.x);
  const taken = graph.circuitsAt(panelId, "bus").flatMap((id) => {
    const circuit = graph.drawing.circuits[id];
    const end = circuit?.from.equipment === panelId ? circuit.from : circuit?.to;
    const part = graph.drawing.equipment[(end === circuit?.from ? circuit?.to : circuit?.from)?.equipment ?? ""];
    if (!circuit || !end || !part) return [];
    // The main breaker stands at the end of the bus and takes the first place on both sides.
    const side = vertical ? part.at.x < panel.at.x + bus.x : part.at.y < panel.at.y + bus.y;
    return part.props["position"] === "main" || side === left ? [end.offset] : [];
  });
  const fits = (offset: number): boolean => taken.every((other) => Math.abs(other - offset) >= BREAKER_PITCH);
  const offsets = Array.from({ length: Math.floor(length) + 1 }, (_, offset) => offset).filter((offset) => offset >= 1 && fits(offset)).sort((a, b) => Math.abs(a - wanted) - Math.abs(b - wanted));
  const grow: Command[] = [];
  let offset = offsets[0];
  if (offset === undefined) {
    offset = Math.max(1, ...taken.map((each) => each + BREAKER_PITCH));
    const more = Math.max(1, Math.ceil(offset + 1 - length));
    const size = vertical ? { width: panel.size.width, height: panel.size.height + more } : { width: panel.size.width + more, height: panel.size.height };
    grow.push({ type: "resizeElement", ref: { collection: "equipment", id: panelId }, at: panel.at, size });
  }
  return { grow, at: vertical ? { x: at.x, y: panel.at.y + bus.y + offset } : { x: panel.at.x + bus.x + offset, y: at.y } };
}

/** Room for the lettering on top, the main breaker and a column of branches: what a new panel starts with, grid units. */
const PANEL: Partial<Record<KindId, Partial<Equipment>>> = {
  "meter-main": { size: { width: 23, height: 21 }, bus: { x: 9, y: 5, length: 13, vertical: true }, label: { x: 14.5, y: 1.7, anchor: "start" } },
  "panelboard": { size: { width: 16, height: 17 }, bus: { x: 4, y: 5, length: 10, vertical: true } },
  "interconnect-cabinet": { size: { width: 22, height: 20 }, bus: { x: 10, y: 7, length: 11, vertical: true } },
};

function placeKind(graph: DrawingGraph, kind: KindId, at: Point, id: string, selection: readonly ElementRef[]): PlacedEdit {
  const definition = kindDefinition(kind);
  const select: ElementRef = { collection: "equipment", id };
  const only = selection.length === 1 && selection[0]?.collection === "equipment" ? selection[0].id : null;
  const chosen = only !== null && graph.drawing.equipment[only]?.bus ? only : null;
  // Enclosures and sources stand by themselves; devices belong to the enclosure they are set down in.
  const own = definition.capabilities.enclosure || definition.capabilities.source || definition.capabilities.load || definition.capabilities.electrode || kind === "meter" || kind === "disconnect";
  const parent = own ? null : enclosureAt(graph, at) ?? (definition.capabilities.switching === "breaker" ? chosen : null);
  if (parent !== null && definition.capabilities.switching === "breaker" && graph.drawing.equipment[parent]?.bus) {
    const bus = placeOnBus(graph, parent, at);
    return { commands: withRoutes(graph, [...bus.grow, { type: "placeEquipment", id, kind, at: onGrid(bus.at), parent }]), select };
  }
  const change = PANEL[kind];
  return { commands: [{ type: "placeEquipment", id, kind, at: onGrid(at), parent, ...(change ? { change } : {}) }], select };
}

function placeSensor(graph: DrawingGraph, at: Point, id: string, selection: readonly ElementRef[]): PlacedEdit | Refused {
  const chosen = selection.find((ref) => ref.collection === "circuits")?.id;
  const near = circuitsNear(graph, at, chosen ? 1000 : NEAR).find((each) => graph.drawing.circuits[each.id]?.system === "ac" && (!chosen || each.id === chosen));
  if (!near) return { reason: "A current sensor sits on an ac circuit: press on its line." };
  const place = near.level ? { x: near.point.x - 1.5, y: near.point.y } : { x: near.point.x, y: near.point.y - 1.5 };
  return { commands: [{ type: "placeSensor", id, circuit: near.id, at: place, change: { rotation: near.level ? 0 : 90 } }], select: { collection: "sensors", id } };
}

function placeMark(graph: DrawingGraph, kind: "conduit" | "nipple", at: Point, id: string): PlacedEdit {
  const near = circuitsNear(graph, at, NEAR);
  const first = near[0];
  const level = first?.level ?? true;
  const size = level ? { width: 1, height: 2 } : { width: 2, height: 1 };
  const center = first ? first.point : onGrid(at);
  const commands: Command[] = [{ type: "placeRaceway", id, kind, at: { x: center.x - size.width / 2, y: center.y - size.height / 2 }, change: { vertical: !level, size } }];
  // A mark across a circuit says that the circuit runs through it.
  for (const circuit of near.filter((each) => each.distance <= 1.2 && each.level === level)) {
    const section = graph.sections(circuit.id).at(-1);
    if (section && graph.drawing.circuits[circuit.id]?.wiring === "field") commands.push({ type: "addToRoute", circuit: circuit.id, section: section.id, raceway: id, compartment: null });
  }
  return { commands, select: { collection: "raceways", id } };
}

function placeBond(graph: DrawingGraph, at: Point, id: string, selection: readonly ElementRef[]): PlacedEdit | Refused {
  const hit = enclosureAt(graph, at) ?? selection.find((ref) => ref.collection === "equipment")?.id ?? null;
  const owner = hit === null ? undefined : graph.enclosures(hit).find((each) => graph.kind(each).capabilities.neutralBar);
  if (!owner) return { reason: "A bond stands in equipment with a neutral bar: press inside it." };
  const { capabilities } = graph.kind(owner);
  const kind = capabilities.source === "generator" ? "neutral strap" : capabilities.converter ? "neutral relay" : graph.drawing.equipment[owner]?.props["serviceEquipment"] === true ? "main bonding jumper" : "neutral strap";
  return { commands: [{ type: "addBond", id, equipment: owner, kind, change: { at: onGrid(at) } }], select: { collection: "bonds", id } };
}

function placeInterlock(graph: DrawingGraph, at: Point, id: string, selection: readonly ElementRef[]): PlacedEdit | Refused {
  const switching = (each: string): boolean => Object.hasOwn(graph.drawing.equipment, each) && Boolean(graph.kind(each).capabilities.switching);
  const chosen = selection.filter((ref) => ref.collection === "equipment" && switching(ref.id)).map((ref) => ref.id);
  const distance = (each: string): number => Math.hypot((graph.drawing.equipment[each]?.at.x ?? 0) + 1.5 - at.x, (graph.drawing.equipment[each]?.at.y ?? 0) - at.y);
  const nearest = Object.keys(graph.drawing.equipment).filter((each) => switching(each) && !graph.drawing.equipment[each]?.integral).sort((a, b) => distance(a) - distance(b) || (a < b ? -1 : 1));
  const switches = chosen.length >= 2 ? chosen : nearest.slice(0, 2);
  if (switches.length < 2) return { reason: "An interlock excludes at least two switches or breakers. Place them first." };
  return { commands: [{ type: "addInterlock", id, switches, change: { at: onGrid(at) } }], select: { collection: "interlocks", id } };
}

/** What setting a part down at a place does: where it belongs, what it lands on, or why it cannot stand there. */
export function placeEdit(graph: DrawingGraph, part: PartId, at: Point, newId: (prefix: string) => string, selection: readonly ElementRef[] = []): PlacedEdit | Refused {
  if (isKindId(part)) return placeKind(graph, part, at, newId("e"), selection);
  switch (part) {
    case "circuit": return { reason: "Press on the port where the circuit starts." };
    case "sensor": return placeSensor(graph, at, newId("t"), selection);
    case "conduit": case "nipple": return placeMark(graph, part, at, newId("r"));
    case "bond": return placeBond(graph, at, newId("b"), selection);
    case "interlock": return placeInterlock(graph, at, newId("i"), selection);
    case "text": {
      const id = newId("n");
      return { commands: [{ type: "placeText", id, at: onGrid(at), lines: "NOTE" }], select: { collection: "texts", id } };
    }
    case "wireway": case "box": {
      const id = newId("r");
      const corner = part === "wireway" ? { x: at.x - 15, y: at.y - 3 } : { x: at.x - 4, y: at.y - 1.5 };
      return { commands: [{ type: "placeRaceway", id, kind: part, at: onGrid(corner) }], select: { collection: "raceways", id } };
    }
  }
}
