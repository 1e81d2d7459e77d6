import { defineKind, flag, number } from "../define";
import { groundPort, identity, lines, withUnit } from "../shared";

/** Vehicle supply equipment; one that can send power back is a source as well. */
export const vehicleCharger = defineKind({
  kind: "vehicle-charger", title: "Vehicle charger", tagPrefix: "EV", railGroup: "loads",
  properties: {
    ...identity,
    currentA: number("Charging current as set", "A", 1, 200),
    powerKW: number("Charging power", "kW", 0.1, 100),
    phaseV: number("Voltage", "V", 100, 600),
    continuous: flag("Runs three hours or more"),
    managed: flag("Listed load management limits it", { rated: true }),
    exportKW: number("Power back to the premises", "kW", 0, 100, { rated: true }),
    exportA: number("Output current back to the premises", "A", 0, 400, { rated: true }),
    maximumOvercurrentA: number("Largest overcurrent device on the nameplate", "A", 0, 400, { rated: true }),
    minimumCircuitA: number("Minimum circuit ampacity on the nameplate", "A", 0, 400, { rated: true }),
  },
  defaults: { continuous: true },
  capabilities: { load: "general" },
  symbol: () => "load",
  box: { x: -1.6, y: -2.6, width: 3.2, height: 3.2 },
  ports: () => [
    { id: "line", label: "Line", system: "ac", side: "bottom", x: 0, y: 0, poles: ["L1", "L2"] },
    groundPort(0, 0.5),
  ],
  joins: () => [],
  annotation: (p) => lines("VEHICLE CHARGER", withUnit(p.currentA, "A")),
  scheduleFields: ["make", "model", "currentA", "exportKW", "maximumOvercurrentA", "listing"],
});
