import { applyCommand, type Command, type CommandDone } from "@/lib/diagram/commands";
import { emptyDrawing } from "@/lib/diagram/new";
import type { Drawing } from "@/lib/diagram/schema";

/** Runs a command that must be accepted. */
export function done(drawing: Drawing, command: Command): CommandDone {
  const result = applyCommand(drawing, command);
  if (!result.ok) throw new Error(`${command.type} was refused: ${result.reason}`);
  return result;
}
export const run = (drawing: Drawing, ...commands: readonly Command[]): Drawing => commands.reduce((at, command) => done(at, command).drawing, drawing);

const at = (equipment: string, port: string, offset = 0) => ({ equipment, port, offset });
/** A small dwelling system drawn by commands alone: service, one inverter with string and battery, a generator behind an interlock. */
export const SMALL: readonly Command[] = [
  { type: "placeEquipment", id: "grid", kind: "utility", at: { x: 4, y: 4 } },
  { type: "placeEquipment", id: "house", kind: "meter-main", at: { x: 20, y: 4 } },
  { type: "setProperty", id: "house", name: "spacesTotal", value: 20 },
  { type: "placeEquipment", id: "cb-a", kind: "breaker", at: { x: 28, y: 9 }, parent: "house" },
  { type: "placeEquipment", id: "cb-b", kind: "breaker", at: { x: 28, y: 13 }, parent: "house" },
  { type: "setProperty", id: "cb-a", name: "ratingA", value: 40 },
  { type: "placeEquipment", id: "inverter", kind: "hybrid-inverter", at: { x: 60, y: 10 } },
  { type: "placeEquipment", id: "pack", kind: "battery", at: { x: 80, y: 20 } },
  { type: "placeEquipment", id: "array", kind: "pv-string", at: { x: 62, y: 40 } },
  { type: "placeEquipment", id: "genset", kind: "generator", at: { x: 20, y: 40 } },
  { type: "placeEquipment", id: "pump", kind: "load", at: { x: 50, y: 6 } },
  { type: "joinPorts", id: "service", from: at("grid", "load"), to: at("house-main", "line"), tag: "SVC" },
  { type: "joinPorts", id: "output", from: at("inverter", "ac"), to: at("cb-a", "load"), tag: "F2", points: [{ x: 64, y: 10 }, { x: 64, y: 9 }, { x: 29, y: 9 }] },
  { type: "routeCircuit", circuit: "output", points: [{ x: 64, y: 10 }, { x: 64, y: 9 }, { x: 29, y: 9 }], calloutAt: { x: 40, y: 9 } },
  { type: "joinPorts", id: "standby", from: at("genset-cb", "load"), to: at("cb-b", "load"), tag: "F5" },
  { type: "joinPorts", id: "string", from: at("array", "dc"), to: at("inverter-pvs", "line1"), tag: "S1" },
  { type: "joinPorts", id: "store", from: at("pack-bb", "load"), to: at("inverter", "battery"), tag: "B1" },
  { type: "placeRaceway", id: "way", kind: "wireway", at: { x: 40, y: 30 }, tag: "WW-1" },
  { type: "placeRaceway", id: "stub", kind: "nipple", at: { x: 50, y: 20 }, tag: "N-1" },
  { type: "addToRoute", circuit: "output", section: "s1", raceway: "stub", compartment: null },
  { type: "addToRoute", circuit: "output", section: "s1", raceway: "way", compartment: null },
  { type: "addInterlock", id: "lock", switches: ["cb-b", "house-main"] },
  { type: "placeSensor", id: "sensor", circuit: "output", at: { x: 45, y: 9 } },
  { type: "placeText", id: "note", at: { x: 5, y: 60 }, lines: "SEE E-605" },
];
let built: Drawing | null = null;
/** The small system; drawn once, since results of commands cannot be written to. */
export const smallDrawing = (): Drawing => (built ??= run(emptyDrawing({ designHighC: 33, recordLowC: -10 }), ...SMALL));

/** Freezes a value all the way down, so that any write to it throws. */
export function frozen<T>(value: T): T {
  if (typeof value === "object" && value !== null && !Object.isFrozen(value)) {
    Object.freeze(value);
    for (const each of Object.values(value)) frozen(each);
  }
  return value;
}
