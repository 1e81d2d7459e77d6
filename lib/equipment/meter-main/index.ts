import { choice, defineKind, flag } from "../define";
import { busProperties, enclosureProperties, groundPort, identity, lines, withUnit } from "../shared";

export const meterMain = defineKind({
  kind: "meter-main", title: "Meter-main panelboard", tagPrefix: "MM", railGroup: "convert and distribute",
  properties: { ...identity, ...busProperties, ...enclosureProperties, serviceEquipment: flag("Used as service equipment"), suitableAsServiceEquipment: flag("Suitable as service equipment", { rated: true }), busEnds: choice("Bus fed from", ["top", "center", "bottom"]) },
  defaults: { busEnds: "top", serviceEquipment: true },
  capabilities: { bus: true, enclosure: true, neutralBar: true, service: true },
  symbol: () => null,
  box: { x: 0, y: 0, width: 16, height: 14 },
  ports: () => [
    { id: "bus", label: "Bus", system: "ac", side: "right", x: 4, y: 4, poles: ["L1", "L2", "N"], many: true },
    groundPort(1, 12),
  ],
  joins: () => [],
  annotation: (p) => lines(`METER-MAIN${p.enclosureType ? `, NEMA ${p.enclosureType}` : ""}`, withUnit(p.busA, "A BUS")),
  scheduleFields: ["make", "model", "busA", "shortCircuitKA", "spacesTotal", "enclosureType", "listing"],
});
