import { choice, defineKind, flag, number, text } from "../define";
import { groundPort, lines, withUnit } from "../shared";

export const load = defineKind({
  kind: "load", title: "Load", tagPrefix: "L", railGroup: "loads",
  properties: {
    description: text("Load", 60),
    use: choice("Kind of load", ["general", "motor", "air conditioning or refrigeration", "lighting", "receptacles", "heating"]),
    powerKW: number("Power", "kW", 0, 5000),
    horsepower: number("Motor power", "hp", 0.05, 500, { rated: true }),
    currentA: number("Current", "A", 0, 5000),
    continuous: flag("Runs three hours or more"),
    minimumCircuitA: number("Minimum circuit ampacity on the nameplate", "A", 0, 2000, { rated: true }),
    maximumOvercurrentA: number("Largest overcurrent device on the nameplate", "A", 0, 4000, { rated: true }),
    phaseV: number("Voltage", "V", 100, 600),
  },
  defaults: { use: "general" },
  capabilities: { load: "general" },
  symbol: (p) => (p.use === "motor" ? "motor" : "load"),
  box: { x: -1.6, y: -2.6, width: 3.2, height: 3.2 },
  ports: (p) => [
    p.use === "motor"
      ? { id: "line", label: "Line", system: "ac", side: "left", x: -2, y: 0, poles: p.phaseV === 120 ? ["L1", "N"] : ["L1", "L2", "N"] }
      : { id: "line", label: "Line", system: "ac", side: "bottom", x: 0, y: 0, poles: p.phaseV === 120 ? ["L1", "N"] : ["L1", "L2", "N"] },
    groundPort(0, 0.5),
  ],
  joins: () => [],
  annotation: (p) => lines(p.description?.toUpperCase() ?? null, p.powerKW === null ? withUnit(p.currentA, "A") : withUnit(p.powerKW, "kW")),
  scheduleFields: ["description", "use", "powerKW", "currentA", "continuous", "minimumCircuitA", "maximumOvercurrentA"],
});
