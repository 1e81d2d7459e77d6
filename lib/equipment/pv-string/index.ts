import { choice, defineKind, flag, number } from "../define";
import { groundPort, identity, lines } from "../shared";

export const pvString = defineKind({
  kind: "pv-string", title: "PV string", tagPrefix: "PV", railGroup: "sources",
  properties: {
    ...identity,
    modules: number("Modules in series", "", 1, 100, { integer: true, group: "construction" }),
    moduleW: number("Module power", "W", 1, 2000, { rated: true }),
    cell: choice("Cell", ["monocrystalline", "polycrystalline", "thin film"], { rated: true }),
    openCircuitV: number("Module open-circuit voltage", "V", 1, 1500, { rated: true }),
    shortCircuitA: number("Module short-circuit current", "A", 0.1, 100, { rated: true }),
    maximumPowerV: number("Module voltage at maximum power", "V", 1, 1500, { rated: true }),
    maximumPowerA: number("Module current at maximum power", "A", 0.1, 100, { rated: true }),
    openCircuitPercentPerC: number("Coefficient of open-circuit voltage", "%/°C", -2, 0, { rated: true }),
    maximumPowerPercentPerC: number("Coefficient of maximum-power voltage", "%/°C", -2, 0, { rated: true }),
    seriesFuseA: number("Largest series fuse", "A", 1, 100, { rated: true }),
    systemVoltageV: number("Largest system voltage", "V", 30, 2000, { rated: true }),
    bifacialGainPercent: number("Bifacial gain of short-circuit current", "%", 0, 50, { rated: true }),
    mounting: choice("Mounting", ["roof of a building", "building wall or canopy", "ground, no building"], { group: "place" }),
    azimuthDegrees: number("Azimuth", "°", 0, 360, { group: "place" }),
    tiltDegrees: number("Tilt", "°", 0, 90, { group: "place" }),
    moduleShutdown: flag("Module-level shutdown units"),
    converters: flag("Module-level dc-dc converters"),
  },
  defaults: { bifacialGainPercent: 0, cell: "monocrystalline", converters: false },
  capabilities: { source: "pv" },
  symbol: () => "pv",
  box: { x: -1, y: 0, width: 2, height: 4 },
  ports: () => [
    { id: "dc", label: "String leads", system: "pv-dc", side: "bottom", x: 0, y: 4, poles: ["+", "-"] },
    groundPort(1, 3),
  ],
  joins: () => [],
  annotation: (p) => lines(p.modules !== null && `${p.modules} IN SERIES`),
  scheduleFields: ["make", "model", "modules", "moduleW", "openCircuitV", "shortCircuitA", "seriesFuseA", "listing"],
});
