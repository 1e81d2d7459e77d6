import type { Drawing, Raceway } from "@/lib/diagram/schema";
import type { System } from "@/lib/equipment/define";

const RACEWAY_PREFIX: Record<Raceway["kind"], string> = { conduit: "R-", nipple: "N-", wireway: "WW-", box: "JB-" };
/** Circuits are numbered without a hyphen, except data runs, after common drafting practice. */
const CIRCUIT_PREFIX: Record<System, string> = { ac: "F", "pv-dc": "S", "battery-dc": "B", data: "K-", ground: "GC-" };

/** Every tag in use on the drawing. */
export function usedTags(drawing: Pick<Drawing, "equipment" | "circuits" | "raceways" | "sensors" | "bonds" | "interlocks">): Set<string> {
  const maps = [drawing.equipment, drawing.circuits, drawing.raceways, drawing.sensors, drawing.bonds, drawing.interlocks];
  return new Set(maps.flatMap((map) => Object.values(map).map((element) => element.tag)));
}
/** Lowest free number behind a prefix: CB-1, CB-2, F3. Text that already ends in the separator is used as it is. */
export function nextTag(drawing: Parameters<typeof usedTags>[0], prefix: string): string {
  const used = usedTags(drawing);
  for (let n = 1; ; n++) if (!used.has(`${prefix}${n}`)) return `${prefix}${n}`;
}
export const equipmentPrefix = (tagPrefix: string): string => `${tagPrefix}-`;
export const racewayPrefix = (kind: Raceway["kind"]): string => RACEWAY_PREFIX[kind];
export const circuitPrefix = (system: System): string => CIRCUIT_PREFIX[system];
