import type { InternalJoin, KindDefinition, PortDefinition, System } from "@/lib/equipment/define";
import { kindDefinition } from "@/lib/equipment/registry";
import type { Circuit, Drawing, Equipment, Point, PortData, Raceway, Section, Conductor, Cable } from "@/lib/diagram/schema";

/** A port of one piece of equipment with its marked values and its place on the sheet. */
export interface PortInfo extends PortDefinition {
  equipment: string;
  data: PortData;
  position: Point;
}
/** One group of like conductors or one cable lying in a raceway. */
export interface Occupant {
  circuit: string;
  section: string;
  system: System;
  compartment: string | null;
  parallelSets: number;
  role: "ungrounded" | "grounded" | "equipment ground" | "cable";
  conductor: Conductor | null;
  cable: Cable | null;
}
/** An edge of the conduction graph: either a circuit or a path inside equipment. Nodes are `equipment/port`. */
export interface ConductionEdge {
  a: string;
  b: string;
  by: InternalJoin["by"] | "circuit";
  /** Circuit id, or id of the equipment whose inside is crossed. */
  id: string;
  position?: string;
}
export type End = "from" | "to";

/** Read-only index of a drawing: built once a change, shared by rules, states, schedules and sheets. */
export interface DrawingGraph {
  readonly drawing: Drawing;
  kind(equipmentId: string): KindDefinition;
  ports(equipmentId: string): readonly PortInfo[];
  port(equipmentId: string, portId: string): PortInfo | null;
  /** Circuits landing on the equipment, or on one of its ports, in id order. */
  circuitsAt(equipmentId: string, portId?: string): readonly string[];
  /** Parts standing directly inside, in id order. */
  children(equipmentId: string): readonly string[];
  /** Itself, then its enclosures outward. */
  enclosures(equipmentId: string): readonly string[];
  /** Where a grounded conductor landing on this equipment is joined: itself or the nearest enclosure with a neutral bar. */
  neutralOwner(equipmentId: string): string;
  sections(circuitId: string): readonly (Section & { id: string })[];
  /** What lies in a raceway, in id order; with a compartment, only what lies in that one. */
  occupants(racewayId: string, compartment?: string | null): readonly Occupant[];
  /** Raceways a circuit passes, in order, each once per section. */
  racewaysOf(circuitId: string): readonly { raceway: string; compartment: string | null; section: string }[];
  readonly edges: readonly ConductionEdge[];
  edgesAt(node: string): readonly ConductionEdge[];
}

export const nodeKey = (equipment: string, port: string): string => `${equipment}/${port}`;
export const equipmentOfNode = (node: string): string => node.slice(0, node.indexOf("/"));
const byId = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);
const push = <K, V>(map: Map<K, V[]>, key: K, value: V): void => {
  const list = map.get(key);
  if (list) list.push(value);
  else map.set(key, [value]);
};

/** Turns a kind's port place by the equipment's rotation and mirror, and moves it to the sheet. */
export function placePoint(equipment: Pick<Equipment, "at" | "rotation" | "mirrored">, local: Point): Point {
  const x = equipment.mirrored ? -local.x : local.x;
  const y = local.y;
  const turned = equipment.rotation === 0 ? { x, y }
    : equipment.rotation === 90 ? { x: -y, y: x }
    : equipment.rotation === 180 ? { x: -x, y: -y }
    : { x: y, y: -x };
  return { x: equipment.at.x + turned.x, y: equipment.at.y + turned.y };
}

/** Place of a circuit's end on the sheet; on a bus it slides along the bus line. Null when the port does not exist. */
export function endpointPosition(graph: DrawingGraph, circuit: Circuit, end: End): Point | null {
  const endpoint = circuit[end];
  const equipment = graph.drawing.equipment[endpoint.equipment];
  const port = graph.port(endpoint.equipment, endpoint.port);
  if (!equipment || !port) return null;
  if (endpoint.port === "bus" && equipment.bus) {
    const { bus } = equipment;
    const along = Math.min(endpoint.offset, bus.length);
    return bus.vertical
      ? { x: equipment.at.x + bus.x, y: equipment.at.y + bus.y + along }
      : { x: equipment.at.x + bus.x + along, y: equipment.at.y + bus.y };
  }
  return port.position;
}

/** Builds the index. Broken references (a circuit to a missing port) are left out of the edges; the document check names them. */
export function buildGraph(drawing: Drawing): DrawingGraph {
  const ports = new Map<string, readonly PortInfo[]>();
  const portByNode = new Map<string, PortInfo>();
  const children = new Map<string, string[]>();
  const circuitsByNode = new Map<string, string[]>();
  const circuitsByEquipment = new Map<string, string[]>();
  const edges: ConductionEdge[] = [];
  const edgesByNode = new Map<string, ConductionEdge[]>();
  const occupantsByRaceway = new Map<string, Occupant[]>();

  for (const id of Object.keys(drawing.equipment).sort(byId)) {
    const equipment = drawing.equipment[id] as Equipment;
    const definition = kindDefinition(equipment.kind);
    const list = definition.ports(equipment.props as never).map((port): PortInfo => ({
      ...port, equipment: id, data: equipment.ports[port.id] ?? {}, position: placePoint(equipment, port),
    }));
    ports.set(id, list);
    for (const port of list) portByNode.set(nodeKey(id, port.id), port);
    if (equipment.parent) push(children, equipment.parent, id);
    for (const join of definition.joins(equipment.props as never)) {
      edges.push({ a: nodeKey(id, join.a), b: nodeKey(id, join.b), by: join.by, id, ...(join.position ? { position: join.position } : {}) });
    }
  }
  for (const id of Object.keys(drawing.circuits).sort(byId)) {
    const circuit = drawing.circuits[id] as Circuit;
    const a = nodeKey(circuit.from.equipment, circuit.from.port);
    const b = nodeKey(circuit.to.equipment, circuit.to.port);
    for (const node of new Set([a, b])) push(circuitsByNode, node, id);
    for (const equipment of new Set([circuit.from.equipment, circuit.to.equipment])) push(circuitsByEquipment, equipment, id);
    if (portByNode.has(a) && portByNode.has(b) && circuit.system !== "data" && circuit.system !== "ground") {
      edges.push({ a, b, by: "circuit", id });
    }
    for (const [sectionId, section] of Object.entries(circuit.sections)) {
      for (const step of section.route) {
        const base = { circuit: id, section: sectionId, system: circuit.system, compartment: step.compartment, parallelSets: section.parallelSets };
        const groups = [["ungrounded", section.ungrounded], ["grounded", section.grounded], ["equipment ground", section.equipmentGround]] as const;
        for (const [role, conductor] of groups) {
          if (conductor && conductor.count > 0) push(occupantsByRaceway, step.raceway, { ...base, role, conductor, cable: null });
        }
        if (section.cable) push(occupantsByRaceway, step.raceway, { ...base, role: "cable", conductor: null, cable: section.cable });
      }
    }
  }
  for (const edge of edges) { push(edgesByNode, edge.a, edge); push(edgesByNode, edge.b, edge); }

  const enclosures = (id: string): string[] => {
    const chain: string[] = [];
    for (let at: string | null = id; at && drawing.equipment[at] && !chain.includes(at); at = drawing.equipment[at]?.parent ?? null) chain.push(at);
    return chain;
  };
  const kind = (id: string): KindDefinition => kindDefinition((drawing.equipment[id] as Equipment).kind);
  const sections = (id: string) => Object.entries((drawing.circuits[id] as Circuit).sections)
    .map(([sectionId, section]) => ({ ...section, id: sectionId }))
    .sort((a, b) => a.order - b.order || byId(a.id, b.id));

  return {
    drawing, edges, kind, enclosures, sections,
    ports: (id) => ports.get(id) ?? [],
    port: (id, port) => portByNode.get(nodeKey(id, port)) ?? null,
    circuitsAt: (id, port) => (port === undefined ? circuitsByEquipment.get(id) : circuitsByNode.get(nodeKey(id, port))) ?? [],
    children: (id) => children.get(id) ?? [],
    neutralOwner: (id) => enclosures(id).find((at) => kind(at).capabilities.neutralBar) ?? id,
    occupants: (id, compartment) => (occupantsByRaceway.get(id) ?? []).filter((o) => compartment === undefined || o.compartment === compartment),
    racewaysOf: (id) => sections(id).flatMap((section) => section.route.map((step) => ({ ...step, section: section.id }))),
    edgesAt: (node) => edgesByNode.get(node) ?? [],
  };
}

/** The raceway's sorted stretches. */
export function stretchesOf(raceway: Raceway): readonly (Raceway["stretches"][string] & { id: string })[] {
  return Object.entries(raceway.stretches).map(([id, stretch]) => ({ ...stretch, id })).sort((a, b) => a.order - b.order || byId(a.id, b.id));
}
