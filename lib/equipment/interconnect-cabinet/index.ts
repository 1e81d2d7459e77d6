import { choice, defineKind, flag, number } from "../define";
import { busProperties, enclosureProperties, groundPort, identity, lines, withUnit } from "../shared";

export const interconnectCabinet = defineKind({
  kind: "interconnect-cabinet", title: "Interconnect cabinet", tagPrefix: "IC", railGroup: "convert and distribute",
  properties: { ...identity, ...busProperties, ...enclosureProperties, serviceEquipment: flag("Used as service equipment"), suitableAsServiceEquipment: flag("Suitable as service equipment", { rated: true }), busEnds: choice("Bus fed from", ["top", "center", "bottom"]), listedForIsland: flag("Listed for island use", { rated: true }), generatorPositionA: number("Generator position at most", "A", 1, 2000, { rated: true }), neutralBusA: number("Neutral bus", "A", 1, 6000, { rated: true }) },
  defaults: { busEnds: "top" },
  capabilities: { bus: true, enclosure: true, neutralBar: true, service: true },
  symbol: () => null,
  box: { x: 0, y: 0, width: 16, height: 14 },
  ports: () => [
    { id: "bus", label: "Bus", system: "ac", side: "right", x: 4, y: 4, poles: ["L1", "L2", "N"], many: true },
    groundPort(1, 12),
    { id: "data", label: "Control terminals", system: "data", side: "bottom", x: 8, y: 14, poles: ["D"], many: true },
  ],
  joins: () => [],
  annotation: (p) => lines("INTERCONNECT CABINET", [p.enclosureType && `NEMA ${p.enclosureType}`, p.shortCircuitKA !== null && `SCCR ${p.shortCircuitKA} kA`].filter(Boolean).join(", ") || null, withUnit(p.busA, "A BUS")),
  scheduleFields: ["make", "model", "busA", "shortCircuitKA", "spacesTotal", "enclosureType", "listing"],
});
