import type { Edge, Node } from "reactflow";
import { nameOf } from "@/lib/client/describe";
import { whyNot } from "@/lib/client/landing";
import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Collection, ElementRef } from "@/lib/diagram/schema";
import { textSpan } from "@/lib/sheets/lettering";
import { calloutPlace, circuitLine, elementPrimitives, equipmentBox, interlockPlace, racewayBox, tagBox, type Box, type OneLineOptions } from "@/lib/sheets/oneline";
import { LETTERING, PX_PER_UNIT, sheetPx, type Primitive } from "@/lib/sheets/primitives";
import type { PortDot } from "./portDots";

/** How an element is picked: by its whole box, by its outline and lettering, or not by itself. */
export type Hit = "box" | "edge" | "none";
export interface ElementData {
  readonly ref: ElementRef;
  readonly name: string;
  readonly primitives: readonly Primitive[];
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
  readonly hit: Hit;
  /** Box of the tag, px from the node's corner: it is picked with the element. */
  readonly tag: Box | null;
  readonly ports: readonly PortDot[];
  readonly resizable: boolean;
}
export interface CircuitData {
  readonly ref: ElementRef;
  readonly name: string;
  readonly primitives: readonly Primitive[];
  readonly points: readonly { x: number; y: number }[];
}
export type ElementNode = Node<ElementData>;
export type CircuitEdge = Edge<CircuitData>;

export const nodeId = (ref: ElementRef): string => `${ref.collection}:${ref.id}`;
export function refOf(id: string): ElementRef {
  const at = id.indexOf(":");
  return { collection: id.slice(0, at) as Collection, id: id.slice(at + 1) };
}

/** Layers: bands and enclosures under the circuits, devices and marks above. */
const LEVEL = { sheet: -20, band: -10, enclosure: -5, device: 5, mark: 8, callout: 9 } as const;

const px = (box: Box): Box => ({ x: sheetPx(box.x), y: sheetPx(box.y), width: box.width * PX_PER_UNIT, height: box.height * PX_PER_UNIT });
const around = (x: number, y: number, halfWidth: number, halfHeight: number): Box => ({ x: sheetPx(x - halfWidth), y: sheetPx(y - halfHeight), width: 2 * halfWidth * PX_PER_UNIT, height: 2 * halfHeight * PX_PER_UNIT });

function boxOf(graph: DrawingGraph, ref: ElementRef): Box | null {
  const { drawing } = graph;
  const { collection, id } = ref;
  if (collection === "equipment") return px(equipmentBox(graph, id));
  if (collection === "raceways") {
    const raceway = drawing.raceways[id];
    return raceway ? px(racewayBox(raceway)) : null;
  }
  if (collection === "circuits") {
    const place = calloutPlace(graph, id);
    const tag = tagBox(graph, ref);
    return place && tag ? around(place.x, place.y, Math.max(1.1, tag.width / 24 + 0.5), 0.8) : null;
  }
  if (collection === "sensors") {
    const sensor = drawing.sensors[id];
    if (!sensor) return null;
    const turned = sensor.rotation === 90 || sensor.rotation === 270;
    return turned ? around(sensor.at.x, sensor.at.y + 1.5, 1.1, 1.5) : around(sensor.at.x + 1.5, sensor.at.y, 1.5, 1.1);
  }
  if (collection === "interlocks") {
    const place = interlockPlace(graph, id);
    return place ? around(place.x, place.y, 1.2, 1) : null;
  }
  if (collection === "bonds") {
    const at = drawing.bonds[id]?.at;
    return at ? around(at.x, at.y, 1, 1) : tagBox(graph, ref);
  }
  const text = drawing.texts[id];
  if (!text) return null;
  const style = LETTERING[text.style === "note" ? "note" : text.style];
  const lines = text.lines.split("\n");
  const wide = Math.max(14, ...lines.map((line) => textSpan(0, line.toUpperCase(), style.size, style.face, "start").right));
  const tall = lines.length * style.size * 1.2;
  if (text.keynote !== null) return around(text.at.x, text.at.y, 0.9, 0.9);
  const x = sheetPx(text.at.x);
  const y = sheetPx(text.at.y);
  return text.vertical ? { x: x - style.size, y: y - wide, width: tall, height: wide } : { x, y: y - style.size, width: wide, height: tall };
}

function portDots(graph: DrawingGraph, id: string, box: Box): PortDot[] {
  const equipment = graph.drawing.equipment[id];
  return graph.ports(id).map((port): PortDot => {
    const onBus = port.id === "bus" && equipment?.bus ? equipment.bus : null;
    const place = onBus && equipment ? { x: equipment.at.x + onBus.x, y: equipment.at.y + onBus.y } : port.position;
    const ref = { equipment: id, port: port.id, offset: 0 };
    return {
      ref, left: sheetPx(place.x) - box.x, top: sheetPx(place.y) - box.y, length: onBus ? onBus.length * PX_PER_UNIT : 0, vertical: onBus?.vertical ?? false,
      label: `${equipment?.tag || graph.kind(id).title} ${port.label.toLowerCase()} port`, taken: whyNot(graph, null, ref),
    };
  });
}

function elementNode(graph: DrawingGraph, ref: ElementRef, options: OneLineOptions): ElementNode | null {
  const box = boxOf(graph, ref);
  if (!box) return null;
  const all = elementPrimitives(graph, ref, options);
  const isCircuit = ref.collection === "circuits";
  const primitives = isCircuit ? all.filter((primitive) => primitive.layer !== "wire") : all;
  if (isCircuit && primitives.length === 0) return null;
  const equipment = ref.collection === "equipment" ? graph.drawing.equipment[ref.id] : undefined;
  const raceway = ref.collection === "raceways" ? graph.drawing.raceways[ref.id] : undefined;
  const hollow = equipment !== undefined && (equipment.size !== null || equipment.bus !== null || (graph.kind(ref.id).capabilities.enclosure === true && graph.kind(ref.id).symbol(equipment.props as never) === null));
  const tag = tagBox(graph, ref, options);
  const level = raceway ? (raceway.kind === "wireway" ? LEVEL.band : raceway.kind === "box" ? LEVEL.enclosure : LEVEL.mark)
    : equipment ? (hollow ? LEVEL.enclosure : LEVEL.device) : isCircuit ? LEVEL.callout : LEVEL.mark;
  const hit: Hit = all.length === 0 ? "none" : hollow || raceway?.kind === "box" ? "edge" : "box";
  const data: ElementData = {
    ref, primitives, left: box.x, top: box.y, width: box.width, height: box.height, hit, name: nameOf(graph, ref),
    tag: tag && !isCircuit ? { x: tag.x - box.x, y: tag.y - box.y, width: tag.width, height: tag.height } : null,
    ports: equipment ? portDots(graph, ref.id, box) : [],
    resizable: hollow || raceway?.kind === "wireway" || raceway?.kind === "box",
  };
  return {
    id: nodeId(ref), type: "element", position: { x: box.x, y: box.y }, data, zIndex: level, width: box.width, height: box.height,
    style: { width: box.width, height: box.height, pointerEvents: "none" }, focusable: false, connectable: false,
  };
}

function circuitEdge(graph: DrawingGraph, id: string, options: OneLineOptions): CircuitEdge | null {
  const circuit = graph.drawing.circuits[id];
  if (!circuit || !graph.port(circuit.from.equipment, circuit.from.port) || !graph.port(circuit.to.equipment, circuit.to.port)) return null;
  const ref: ElementRef = { collection: "circuits", id };
  return {
    id: nodeId(ref), type: "circuit", source: nodeId({ collection: "equipment", id: circuit.from.equipment }), sourceHandle: circuit.from.port,
    target: nodeId({ collection: "equipment", id: circuit.to.equipment }), targetHandle: circuit.to.port, focusable: false, zIndex: 0,
    data: { ref, name: nameOf(graph, ref), points: circuitLine(graph, id).points, primitives: elementPrimitives(graph, ref, options).filter((primitive) => primitive.layer === "wire") },
  };
}

const DRAWN = ["raceways", "equipment", "circuits", "sensors", "bonds", "interlocks", "texts"] as const;

/** Keeps the object of the last time where nothing of it has changed, so that only changed parts are drawn again. */
function reuse<T extends { id: string; data?: unknown; position?: unknown }>(next: T, before: ReadonlyMap<string, T>): T {
  const last = before.get(next.id);
  return last && JSON.stringify(last.data) === JSON.stringify(next.data) && JSON.stringify(last.position) === JSON.stringify(next.position) ? last : next;
}

export interface Flow { readonly nodes: readonly ElementNode[]; readonly edges: readonly CircuitEdge[] }
/** Nodes and edges of a drawing; unchanged ones are those of `before`. */
export function toFlow(graph: DrawingGraph, options: OneLineOptions, before: Flow | null): Flow {
  const nodesBefore = new Map((before?.nodes ?? []).map((node) => [node.id, node]));
  const edgesBefore = new Map((before?.edges ?? []).map((edge) => [edge.id, edge]));
  const nodes = DRAWN.flatMap((collection) => Object.keys(graph.drawing[collection]).map((id) => elementNode(graph, { collection, id }, options)))
    .filter((node): node is ElementNode => node !== null).map((node) => reuse(node, nodesBefore));
  const edges = Object.keys(graph.drawing.circuits).map((id) => circuitEdge(graph, id, options))
    .filter((edge): edge is CircuitEdge => edge !== null).map((edge) => reuse(edge, edgesBefore));
  return { nodes, edges };
}

/** `toFlow` that remembers its last answer, so that parts that did not change keep their objects from one drawing to the next. */
export function createFlow(): (graph: DrawingGraph, options: OneLineOptions) => Flow {
  let last: Flow | null = null;
  return (graph, options) => last = toFlow(graph, options, last);
}
