import { choice, number, text, type InternalJoin, type PortDefinition } from "@/lib/equipment/define";

/** Properties that most kinds share, declared once. */
export const identity = {
  make: text("Maker", 60),
  model: text("Model", 60),
  listing: text("Listing standard", 60),
} as const;
export const enclosureProperties = {
  enclosureType: choice("Enclosure type", ["1", "2", "3R", "3S", "4", "4X", "12"]),
  handleHeightIn: number("Height of highest handle", "in", 0, 200, { group: "place" }),
  clearDepthIn: number("Clear depth in front", "in", 0, 240, { group: "place" }),
  clearWidthIn: number("Clear width", "in", 0, 240, { group: "place" }),
  clearHeightIn: number("Clear height", "in", 0, 240, { group: "place" }),
} as const;
/** Rating that holds only behind a device of the named family, fuse class or model, as the marking states it. */
export const withDeviceAhead = {
  shortCircuitWithKA: number("Short-circuit rating with the device ahead", "kA", 0.1, 300, { rated: true }),
  shortCircuitWith: text("Device ahead of that rating: family, fuse class or model", 40, { group: "construction", rated: true }),
} as const;
export const busProperties = {
  busA: number("Bus rating", "A", 1, 6000, { rated: true }),
  shortCircuitKA: number("Short-circuit rating", "kA", 0.1, 300, { rated: true }),
  ...withDeviceAhead,
  breakerFamily: text("Breaker family", 20, { group: "construction" }),
  spacesTotal: number("Spaces", "", 1, 84, { integer: true, group: "construction" }),
  polesMaximum: number("Poles at most", "", 1, 84, { integer: true, group: "construction", rated: true }),
} as const;

/** Ac poles of a two- or three-pole device on a split-phase or three-phase system. */
export function acPoles(poles: number | null): readonly ("L1" | "L2" | "L3")[] {
  return poles === 1 ? ["L1"] : poles === 3 ? ["L1", "L2", "L3"] : ["L1", "L2"];
}
/** Ports of a two-port device three grid units long, line on the left. */
export function linePorts(system: "ac" | "pv-dc" | "battery-dc", poles: PortDefinition["poles"], length = 3): readonly PortDefinition[] {
  return [
    { id: "line", label: "Line", system, side: "left", x: 0, y: 0, poles },
    { id: "load", label: "Load", system, side: "right", x: length, y: 0, poles },
  ];
}
export const switched: readonly InternalJoin[] = [{ a: "line", b: "load", by: "switch" }];
export const groundPort = (x: number, y: number): PortDefinition =>
  ({ id: "ground", label: "Ground bar", system: "ground", side: "bottom", x, y, poles: ["G"], many: true });
/** Drops what is not known, so that an annotation never prints an empty value. */
export const lines = (...parts: readonly (string | null | false)[]): readonly string[] => parts.filter((p): p is string => Boolean(p));
/** Prints a value with its unit, or null when it is not known. */
export const withUnit = (value: number | null, unit: string): string | null => (value === null ? null : unit ? `${value} ${unit}` : `${value}`);
