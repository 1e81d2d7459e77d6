import { choice, defineKind, text } from "../define";
import { identity, lines } from "../shared";

/** Switch that starts rapid shutdown or the storage emergency stop. */
export const shutdownInitiator = defineKind({
  kind: "shutdown-initiator", title: "Shutdown initiator", tagPrefix: "RSD", railGroup: "switch and protect",
  properties: { ...identity, purpose: choice("Purpose", ["PV rapid shutdown", "storage emergency stop", "both", "generator stop"]), enclosureType: choice("Enclosure type", ["1", "3R", "4", "4X"]), circuitVoltage: text("Control circuit", 40) },
  defaults: { purpose: "PV rapid shutdown" },
  capabilities: {},
  symbol: () => "estop",
  box: { x: -1.2, y: -1.4, width: 2.4, height: 2.4 },
  ports: () => [{ id: "data", label: "Control", system: "data", side: "bottom", x: 0, y: 1, poles: ["D"], many: true }],
  joins: () => [],
  annotation: (p) => lines(p.purpose === "storage emergency stop" ? "STORAGE STOP" : p.purpose === "PV rapid shutdown" ? "PV SHUTDOWN" : p.purpose?.toUpperCase() ?? null),
  scheduleFields: ["make", "model", "purpose", "enclosureType", "listing"],
});
