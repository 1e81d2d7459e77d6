import { choice, defineKind, number, text } from "../define";
import { lines } from "../shared";

export const utility = defineKind({
  kind: "utility", title: "Utility service", tagPrefix: "UTIL", railGroup: "sources",
  properties: {
    name: text("Utility", 80),
    systemVoltage: choice("System", ["120/240 V 1-ph 3-W", "120/208 V 3-ph 4-W", "277/480 V 3-ph 4-W", "240 V 3-ph 3-W"], { group: "rating" }),
    service: choice("Service drop", ["overhead", "underground"]),
    availableFaultCurrentA: number("Available fault current", "A", 0, 200000, { rated: true }),
  },
  defaults: { systemVoltage: "120/240 V 1-ph 3-W" },
  capabilities: { source: "utility" },
  symbol: () => "utility",
  box: { x: -1.5, y: -1, width: 3, height: 5 },
  ports: () => [{ id: "load", label: "Service", system: "ac", side: "bottom", x: 0, y: 4, poles: ["L1", "L2", "N"] }],
  joins: () => [],
  annotation: (p) => lines(p.name?.toUpperCase() ?? null, p.systemVoltage && `${p.systemVoltage.toUpperCase()}${p.service ? `, ${p.service.toUpperCase()}` : ""}`, p.availableFaultCurrentA !== null && `${p.availableFaultCurrentA.toLocaleString("en-US")} A AVAILABLE`),
  scheduleFields: ["name", "systemVoltage", "availableFaultCurrentA"],
});
