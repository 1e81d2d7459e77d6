import { choice, defineKind, flag, number } from "../define";
import { enclosureProperties, groundPort, identity, lines, withUnit } from "../shared";

/** Its neutral strap is a bond of the drawing, so that fitting or removing it is one fact in one place. */
export const generator = defineKind({
  kind: "generator", title: "Generator", tagPrefix: "G", railGroup: "sources",
  properties: {
    ...identity, ...enclosureProperties,
    outputKW: number("Output", "kW", 0.1, 5000, { rated: true }),
    outputV: number("Voltage", "V", 100, 600, { rated: true }),
    ratedA: number("Rated current", "A", 0.1, 8000, { rated: true }),
    faultA: number("Fault current contribution", "A", 0, 50000, { rated: true }),
    fuel: choice("Fuel", ["propane", "natural gas", "diesel", "gasoline"]),
    use: choice("Use", ["fixed standby", "portable"]),
    stopOnEnclosure: flag("Stop on the outside of the enclosure", { rated: true }),
    overloadPrevented: flag("Built so that it cannot be overloaded", { rated: true }),
    listedParallelWithUtility: flag("Listed and set for parallel operation with the utility", { rated: true }),
  },
  defaults: { use: "fixed standby" },
  capabilities: { source: "generator", enclosure: true, neutralBar: true },
  symbol: () => "generator",
  box: { x: 0, y: 0, width: 14.4, height: 12.2 },
  ports: () => [
    { id: "load", label: "Output", system: "ac", side: "bottom", x: 3, y: 6.6, poles: ["L1", "L2", "N"] },
    { id: "data", label: "Start", system: "data", side: "left", x: 0, y: 6, poles: ["D"], many: true },
    groundPort(1, 12),
  ],
  joins: () => [],
  annotation: (p) => lines([withUnit(p.outputKW, "kW"), p.fuel?.toUpperCase()].filter(Boolean).join(" ") || null, [p.outputV === 240 ? "120/240 V" : withUnit(p.outputV, "V"), withUnit(p.ratedA, "A")].filter(Boolean).join(" ") || null),
  scheduleFields: ["make", "model", "outputKW", "outputV", "ratedA", "fuel", "listing"],
});
