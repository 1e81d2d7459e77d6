import { bench, describe } from "vitest";
import { conductorAmpacity, racewayFill, sizeCircuit, voltageDrop, type CircuitToSize } from "@/lib/calc";

const parts = [
  { kind: "raceway", lengthFt: 8, ambientC: 33, currentCarryingCount: 8, rooftopHeightIn: 1 },
  { kind: "raceway", lengthFt: 54, ambientC: 40, currentCarryingCount: 8 },
  { kind: "metal wireway", lengthFt: 5, ambientC: 40, currentCarryingCount: 8 },
] as const;
const wire = { edition: "2023", material: "copper", insulation: "THWN-2", terminalC: 75 } as const;

describe("one circuit, target 50 µs", () => {
  bench("ampacity, fill and drop", () => {
    conductorAmpacity({ ...wire, size: "10 AWG", parts });
    racewayFill({ edition: "2023", raceway: { kind: "EMT", tradeSize: "1", lengthIn: 744 }, items: [{ count: 8, size: "10 AWG", insulation: "THWN-2" }, { count: 1, size: "10 AWG", insulation: "THWN-2" }] });
    voltageDrop({ edition: "2023", system: "dc", voltageV: 387.6, currentA: 13.31, lengthFt: 78, size: "10 AWG", material: "copper" });
  });
});

describe("sizing a circuit, target 5 ms", () => {
  const circuit: CircuitToSize = { ...wire, use: { kind: "load", continuousA: 240, noncontinuousA: 40 }, maxSets: 2, parts, drop: { system: "ac 1-phase", voltageV: 240, currentA: 240, lengthFt: 300, limitPct: 2 }, raceway: { kind: "EMT", lengthIn: 744, conductorsPerSet: 3 } };
  bench("size", () => {
    sizeCircuit(circuit);
  });
});
