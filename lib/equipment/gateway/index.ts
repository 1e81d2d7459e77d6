import { choice, defineKind, text } from "../define";
import { identity, lines } from "../shared";

/** Communication gateway or controller: it takes data links and sensor leads and switches no power. */
export const gateway = defineKind({
  kind: "gateway", title: "Communication gateway", tagPrefix: "GW", railGroup: "convert and distribute",
  properties: { ...identity, purpose: choice("Purpose", ["monitoring", "power control system", "load management", "microgrid control"]), firmware: text("Firmware", 24, { group: "settings" }), enclosureType: choice("Enclosure type", ["1", "2", "3R", "3S", "4", "4X", "12"]) },
  defaults: { purpose: "monitoring" },
  capabilities: {},
  symbol: () => "jbox",
  box: { x: -2, y: -1, width: 4, height: 2 },
  ports: () => [{ id: "data", label: "Data", system: "data", side: "bottom", x: 0, y: 1, poles: ["D"], many: true }],
  joins: () => [],
  annotation: (p) => lines(p.purpose?.toUpperCase() ?? null),
  scheduleFields: ["make", "model", "purpose", "firmware", "listing"],
});
