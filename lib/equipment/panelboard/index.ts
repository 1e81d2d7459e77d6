import { choice, defineKind, flag } from "../define";
import { busProperties, enclosureProperties, groundPort, identity, lines, withUnit } from "../shared";

export const panelboard = defineKind({
  kind: "panelboard", title: "Panelboard", tagPrefix: "PNL", railGroup: "convert and distribute",
  properties: { ...identity, ...busProperties, ...enclosureProperties, serviceEquipment: flag("Used as service equipment"), suitableAsServiceEquipment: flag("Suitable as service equipment", { rated: true }), busEnds: choice("Bus fed from", ["top", "center", "bottom"]), mainType: choice("Main", ["main lugs only", "main breaker"]) },
  defaults: { busEnds: "top" },
  capabilities: { bus: true, enclosure: true, neutralBar: true, service: true },
  symbol: () => null,
  box: { x: 0, y: 0, width: 16, height: 14 },
  ports: () => [
    { id: "bus", label: "Bus", system: "ac", side: "right", x: 4, y: 4, poles: ["L1", "L2", "N"], many: true },
    groundPort(1, 12),
  ],
  joins: () => [],
  annotation: (p) => lines(p.mainType === "main lugs only" && "MLO", [withUnit(p.busA, "A BUS"), withUnit(p.shortCircuitKA, "kA")].filter(Boolean).join(", ") || null),
  scheduleFields: ["make", "model", "busA", "shortCircuitKA", "spacesTotal", "enclosureType", "listing"],
});
