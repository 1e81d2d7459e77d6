import { defaultSection, newCircuit, newEquipment } from "@/lib/diagram/commands";
import type {
  Bond, Cable, Circuit, Conductor, Drawing, Endpoint, Equipment, Interlock, Point, PortData, Raceway, Section, Sensor, Stretch,
} from "@/lib/diagram/schema";
import type { PropertyValue, System } from "@/lib/equipment/define";
import type { KindId } from "@/lib/equipment/registry";

/** Place of a part in words and its ambient, °C. */
export const place = (building: string, where: string, exposure: Equipment["location"]["exposure"], ambientC: number): Equipment["location"] =>
  ({ building, place: where, exposure, ambientC });

type Pt = readonly [number, number];
export const points = (...list: readonly Pt[]): Point[] => list.map(([x, y]) => ({ x, y }));

interface More extends Partial<Omit<Equipment, "props" | "at">> {
  /** Datasheet page behind the rated values; `book` names the sheet. */
  page?: string;
  book?: string;
}
const idOf = (tag: string): string => tag.toLowerCase().replace(/[^a-z0-9]+/g, "-");

/** Collects a drawing piece by piece. Ids are the tags in small letters; nothing else reads them. */
export class DrawingBuilder {
  readonly equipment: Drawing["equipment"] = {};
  readonly circuits: Drawing["circuits"] = {};
  readonly raceways: Drawing["raceways"] = {};
  readonly bonds: Drawing["bonds"] = {};
  readonly interlocks: Drawing["interlocks"] = {};
  readonly sensors: Drawing["sensors"] = {};
  readonly labels: Drawing["labels"] = {};
  readonly texts: Drawing["texts"] = {};

  /** Adds equipment; values left out stay not known. */
  add(kind: KindId, tag: string, at: Pt, props: Record<string, PropertyValue>, more: More = {}): string {
    const id = idOf(tag);
    const { page, book, ...change } = more;
    const made = newEquipment(kind, tag, { x: at[0], y: at[1] });
    const rated = page ? Object.fromEntries(Object.entries(props).filter(([, value]) => typeof value === "number").map(([name]) => [name, { document: book ?? `${tag} data sheet`, page }])) : {};
    // Places are shared words of the seed; each piece has its own.
    this.equipment[id] = { ...made, ...structuredClone(change), props: { ...made.props, ...props }, sources: { ...rated, ...change.sources } };
    return id;
  }
  port(equipment: string, port: string, data: PortData): void {
    const found = this.equipment[equipment];
    if (!found) throw new Error(`no equipment ${equipment}`);
    found.ports[port] = { ...found.ports[port], ...data };
  }
  /** Factory joint inside listed equipment. */
  join(from: string, to: string, drawn: readonly Pt[] = []): void {
    const a = endpoint(from);
    const b = endpoint(to);
    const system = systemOf(this.equipment[a.equipment], a.port);
    this.circuits[`j-${a.equipment}-${a.port}-${b.equipment}-${b.port}`.slice(0, 64)] = { ...newCircuit(system, "", a, b), wiring: "factory", points: points(...drawn) };
  }
  circuit(tag: string, from: string, to: string, sections: readonly Partial<Section>[], more: Partial<Circuit> = {}): string {
    const id = idOf(tag);
    const a = endpoint(from);
    const b = endpoint(to);
    const system = systemOf(this.equipment[a.equipment], a.port);
    this.circuits[id] = {
      ...newCircuit(system, tag, a, b),
      sections: Object.fromEntries(sections.map((section, order) => [`s${order + 1}`, {
        ...defaultSection(system, []), ungrounded: null, grounded: null, equipmentGround: null, cable: null, order, ...section,
      }])),
      ...more,
    };
    return id;
  }
  raceway(tag: string, kind: Raceway["kind"], at: Pt, change: Partial<Raceway>, stretches: readonly Partial<Stretch>[]): string {
    const id = idOf(tag);
    const tube = kind === "conduit" || kind === "nipple";
    this.raceways[id] = {
      kind, tag, status: "new", type: tube ? "EMT" : null, tradeSize: null, metal: true, widthIn: null, heightIn: null, depthIn: null,
      bendsDegrees: null, compartments: kind === "wireway" ? { c1: { order: 0, name: "A", widthIn: null } } : {}, from: null, to: null, sealed: null,
      location: place("A", "plant room", "indoor dry", 40), at: { x: at[0], y: at[1] }, size: { width: 0, height: 0 }, vertical: false, label: null, note: "",
      ...change,
      stretches: Object.fromEntries(stretches.map((stretch, order) => [`t${order + 1}`, {
        order, lengthFt: null, ambientC: 40, exposure: "indoor dry" as const, aboveRoofIn: null, burialDepthIn: null, ...stretch,
      }])),
    };
    return id;
  }
  bond(tag: string, bond: Omit<Bond, "tag">): void { this.bonds[idOf(tag)] = { tag, ...bond }; }
  interlock(tag: string, interlock: Omit<Interlock, "tag">): void { this.interlocks[idOf(tag)] = { tag, ...interlock }; }
  sensor(tag: string, sensor: Omit<Sensor, "tag">): void { this.sensors[idOf(tag)] = { tag, ...sensor }; }
  text(id: string, at: Pt, lines: string, keynote: string | null = null, style: "note" | "heading" | "compartment" = "note", vertical = false): void {
    this.texts[id] = { at: { x: at[0], y: at[1] }, lines, style, keynote, vertical };
  }
}

/** Reads `CB-F1.load` or `IC-200.bus@3`. */
export function endpoint(words: string): Endpoint {
  const dot = words.indexOf(".");
  const tag = words.slice(0, dot);
  const [port = "", offset] = words.slice(dot + 1).split("@");
  return { equipment: idOf(tag), port, offset: offset === undefined ? 0 : Number(offset) };
}
function systemOf(equipment: Equipment | undefined, port: string): System {
  if (!equipment) throw new Error("a circuit ends at equipment that is not there");
  if (port === "ground") return "ground";
  if (port === "data") return "data";
  if (equipment.kind === "pv-string" || equipment.kind === "pv-switch" || /^pv\d+$/.test(port)) return "pv-dc";
  if (equipment.kind === "battery" || equipment.kind === "dc-bus-cabinet" || port === "battery" || equipment.props.current === "battery dc") return "battery-dc";
  return "ac";
}

/** Conductors of one function; copper, THWN-2, class B, 600 V unless said. */
export const wire = (count: number, size: string, color: string | null, change: Partial<Conductor> = {}): Conductor => ({
  count, size, metal: "Cu", insulation: "THWN-2", strands: "class B", outerDiameterIn: null, voltageRatingV: 600, color, ...change,
});
export const bare = (size: string, change: Partial<Conductor> = {}): Conductor => wire(1, size, "bare", { insulation: "bare", voltageRatingV: null, ...change });
export const cable = (type: string, outerDiameterIn: number, count = 1, wetListed: boolean | null = null): Cable =>
  ({ type, class: "class 2", count, outerDiameterIn, voltageRatingV: 300, wetListed });
/** Raceways in order; wireways take their only compartment. */
export const route = (...tags: readonly string[]): Section["route"] => tags.map((tag) => ({ raceway: idOf(tag), compartment: tag.startsWith("WW-") ? "c1" : null }));
/** Terminal as marked: temperature, wire range, torque. */
export const terminal = (torqueLbfIn: number, range: readonly [string, string], source: string, metals: "CU" | "AL9CU" = "AL9CU", fineStrand: boolean | null = null): PortData =>
  ({ terminal: { temperatureC: 75, metals, smallest: range[0], largest: range[1], torqueLbfIn, torqueSource: source, fineStrand } });
