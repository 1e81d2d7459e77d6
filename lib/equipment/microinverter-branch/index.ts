import { choice, defineKind, flag, number } from "../define";
import { groundPort, identity, lines, withUnit } from "../shared";

/** Modules with an inverter each, joined on one ac branch circuit by the maker's cable. */
export const microinverterBranch = defineKind({
  kind: "microinverter-branch", title: "Microinverter branch", tagPrefix: "MI", railGroup: "sources",
  properties: {
    ...identity,
    units: number("Units on the branch", "", 1, 60, { integer: true, group: "construction" }),
    unitsMost: number("Units on one branch at most", "", 1, 60, { integer: true, rated: true }),
    unitVA: number("Output of one unit", "VA", 10, 3000, { rated: true }),
    unitA: number("Output current of one unit", "A", 0.05, 20, { rated: true }),
    continuousA: number("Output current of the branch", "A", 0.1, 200, { rated: true }),
    outputV: number("Ac voltage", "V", 100, 600, { rated: true }),
    faultA: number("Fault current contribution", "A", 0, 500, { rated: true }),
    maximumOvercurrentA: number("Largest ac overcurrent device", "A", 1, 200, { rated: true }),
    listedInteractive: flag("Listed interactive", { rated: true }),
    listedGeneratorMode: flag("Listed mode beside a generator, no output toward it", { rated: true }),
    outputConductors: choice("Output", ["line to line", "line to neutral", "three-phase"], { rated: true }),
    mounting: choice("Mounting", ["roof of a building", "building wall or canopy", "ground, no building"], { group: "place" }),
  },
  defaults: {},
  capabilities: { converter: true, follower: true },
  symbol: () => "pv",
  box: { x: -1, y: 0, width: 2, height: 4 },
  ports: (p) => [
    { id: "ac", label: "Branch", system: "ac", side: "bottom", x: 0, y: 4, poles: p.outputConductors === "line to neutral" ? ["L1", "N"] : p.outputConductors === "three-phase" ? ["L1", "L2", "L3"] : ["L1", "L2"] },
    groundPort(1, 3),
  ],
  joins: () => [],
  annotation: (p) => lines(p.units !== null && `${p.units} UNITS`, withUnit(p.continuousA, "A")),
  scheduleFields: ["make", "model", "units", "unitVA", "continuousA", "maximumOvercurrentA", "listing"],
});
