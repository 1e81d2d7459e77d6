import type { Draft } from "immer";
import type { PatchOperation } from "@/lib/diagram/patch";
import type {
  Bond, Circuit, Drawing, ElementRef, Endpoint, Equipment, Interlock, Point, PortData, Raceway, Section, Sensor, Sheet, Site, Stretch, Underlay,
} from "@/lib/diagram/schema";
import type { KindId } from "@/lib/equipment/registry";
import type { PropertyValue } from "@/lib/equipment/define";

export interface SourceNote { document: string; page: string }
type Change<T> = Partial<T>;

/** Part of a drawing that can be pasted into this or another drawing. */
export type Fragment = Pick<Drawing, "equipment" | "circuits" | "raceways" | "bonds" | "interlocks" | "sensors" | "texts">;

/** Everything that changes a drawing, as plain data. New ids are handed in, so that a command gives the same result everywhere. */
export type Command =
  /** Places equipment with the parts it always comes with (`parts: false` leaves those out). */
  | { type: "placeEquipment"; id: string; kind: KindId; at: Point; parent?: string | null; tag?: string; props?: Record<string, PropertyValue>; change?: Change<Equipment>; parts?: boolean }
  | { type: "moveElements"; refs: readonly ElementRef[]; dx: number; dy: number }
  | { type: "turnElements"; refs: readonly ElementRef[]; turn: "clockwise" | "mirror" }
  | { type: "resizeElement"; ref: ElementRef; at: Point; size: { width: number; height: number } }
  | { type: "setParent"; id: string; parent: string | null }
  | { type: "deleteElements"; refs: readonly ElementRef[] }
  | { type: "setProperty"; id: string; name: string; value: PropertyValue; source?: SourceNote | null }
  /** Copies ratings, their sources and port values from an entry of the library and keeps which version they came from. Null lets go of the entry; the values stay. */
  | { type: "takeFromLibrary"; id: string; from: { ref: NonNullable<Equipment["library"]>; name: string; data: Pick<Equipment, "props" | "sources" | "ports"> } | null }
  | { type: "setPort"; id: string; port: string; change: Change<PortData> }
  /** One field of one element, for example ["location", "ambientC"]. Lists are set whole. */
  | { type: "setField"; ref: ElementRef; path: readonly string[]; value: unknown }
  | { type: "setTag"; ref: ElementRef; tag: string }
  | { type: "joinPorts"; id: string; from: Endpoint; to: Endpoint; tag?: string; points?: readonly Point[]; change?: Change<Circuit> }
  | { type: "setEnd"; circuit: string; end: "from" | "to"; endpoint: Endpoint }
  | { type: "routeCircuit"; circuit: string; points: readonly Point[]; bends?: readonly Point[]; calloutAt?: Point | null }
  | { type: "setSection"; circuit: string; section: string; change: Change<Section> }
  | { type: "splitSection"; circuit: string; section: string; id: string; lengthFt: number | null }
  | { type: "removeSection"; circuit: string; section: string }
  /** Adds a raceway to the end of a section's route, or takes it out. */
  | { type: "addToRoute"; circuit: string; section: string; raceway: string; compartment: string | null; index?: number }
  | { type: "removeFromRoute"; circuit: string; section: string; raceway: string }
  | { type: "placeRaceway"; id: string; kind: Raceway["kind"]; at: Point; tag?: string; change?: Change<Raceway> }
  | { type: "setRaceway"; id: string; change: Change<Raceway> }
  | { type: "setStretch"; raceway: string; stretch: string; change: Change<Stretch> }
  | { type: "removeStretch"; raceway: string; stretch: string }
  | { type: "setCompartment"; raceway: string; compartment: string; name: string; widthIn: number | null }
  | { type: "removeCompartment"; raceway: string; compartment: string }
  | { type: "placeSensor"; id: string; circuit: string; at: Point; tag?: string; change?: Change<Sensor> }
  | { type: "setSensor"; id: string; change: Change<Sensor> }
  | { type: "addBond"; id: string; equipment: string; kind: Bond["kind"]; change?: Change<Bond> }
  | { type: "setBond"; id: string; change: Change<Bond> }
  | { type: "addInterlock"; id: string; switches: readonly string[]; change?: Change<Interlock> }
  | { type: "setInterlock"; id: string; change: Change<Interlock> }
  | { type: "placeText"; id: string; at: Point; lines: string; style?: "note" | "heading" | "compartment"; keynote?: string | null }
  | { type: "setSite"; change: Change<Site> }
  | { type: "setSheet"; change: Change<Omit<Sheet, "titleBlock" | "underlay">> }
  /** Puts a picture under the drawing, or changes how it lies there. It is never printed. */
  | { type: "setUnderlay"; change: Change<Underlay> }
  | { type: "removeUnderlay" }
  | { type: "setTitleBlock"; change: Change<Sheet["titleBlock"]> }
  | { type: "applySuggestion"; label: string; patches: readonly PatchOperation[] }
  | { type: "paste"; content: Fragment; ids: Readonly<Record<string, string>>; dx: number; dy: number };
export type CommandType = Command["type"];
export type CommandOf<T extends CommandType> = Extract<Command, { type: T }>;

export interface CommandDone {
  ok: true;
  drawing: Drawing;
  patches: PatchOperation[];
  inverse: PatchOperation[];
  /** What undo will say it took back. */
  title: string;
  /** What else changed or was dropped, as sentences. */
  also: readonly string[];
}
export interface CommandRefused { ok: false; reason: string; field?: string }
export type CommandResult = CommandDone | CommandRefused;

/** Thrown inside a command's recipe; becomes a refusal and leaves the drawing as it was. */
export class Refusal extends Error {
  override readonly name = "Refusal";
  constructor(reason: string, readonly field?: string) { super(reason); }
}
/** A recipe changes the draft and answers the title of the step; `say` adds what else changed. */
export type Recipe<T extends CommandType> = (draft: Draft<Drawing>, command: CommandOf<T>, say: (sentence: string) => void) => string;
