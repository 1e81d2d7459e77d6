import { z } from "zod";
import { conductorAmpacity } from "../ampacity";
import { currentCarryingCount, NEUTRAL_ROLES } from "../conductor-count";
import { dwellingServiceConductor } from "../dwelling-service";
import { bondingJumper, ELECTRODES, groundingElectrodeConductor } from "../electrode-conductor";
import { equipmentGroundingConductor } from "../equipment-ground";
import { hvacDevice, MOTOR_DEVICES, motorDevice } from "../motor";
import { largestOvercurrentDevice, smallestOvercurrentDevice } from "../overcurrent-device";
import { requiredAmpacity } from "../required-ampacity";
import { sizeCircuit } from "../size-circuit";
import { define, type CalculationEntry } from "./define";
import { circuitUse, conduit, count, dropFields, edition, fillItem, insulation, material, number, racewayKind, routePart, size, sizeOut, terminal, tradeSizeOut } from "./schemas";

const parts = z.array(routePart);
const wire = { material, insulation, wet: z.boolean().optional(), terminalC: terminal, parts };
const supply = { edition, supplySize: size, supplyMaterial: material, sets: count("conductors a phase").optional(), material };
const oneRoute = [{ kind: "raceway", lengthFt: 40, ambientC: 40, currentCarryingCount: 2 }];

export const CONDUCTOR_CALCULATIONS: readonly CalculationEntry[] = [
  define({
    name: "conductor-ampacity", title: "Ampacity of circuit conductors after correction, adjustment and terminal limit", calculate: conductorAmpacity,
    input: z.strictObject({ edition, size, ...wire, conductorRatingC: z.union([z.literal(60), z.literal(75), z.literal(90), z.literal(105), z.literal(125)]).optional(), sets: count("conductors a phase").optional() }),
    value: number("A"),
    detail: z.strictObject({
      tableA: number("A"), conductorRatingC: number("°C"), governingPart: count("index"), correctedA: number("A"), terminalLimitA: number("A"),
      parts: z.array(z.strictObject({ label: z.string(), lengthFt: number("ft"), ambientC: number("°C"), correctionFactor: number(""), adjustmentFactor: number(""), ampacityA: number("A") })),
      governedBy: z.enum(["correction and adjustment", "terminal temperature"]), smallConductorLimitA: number("A").nullable(), sets: count(""), parallelAllowed: z.boolean(),
    }),
    sample: { edition: "2023", size: "8 AWG", material: "copper", insulation: "THWN-2", terminalC: 75, parts: oneRoute },
  }),
  define({
    name: "current-carrying-count", title: "Current-carrying conductors at one cross section", calculate: currentCarryingCount,
    input: z.strictObject({ edition, circuits: z.array(z.strictObject({ label: z.string().optional(), ungroundedCount: count("conductors"), neutral: z.enum(NEUTRAL_ROLES), alternative: z.string().optional() })) }),
    value: count("conductors"), detail: z.strictObject({ perCircuit: z.array(z.strictObject({ label: z.string(), count: count("conductors") })) }),
    sample: { edition: "2023", circuits: [{ ungroundedCount: 2, neutral: "unbalance" }, { ungroundedCount: 1, neutral: "two-wire" }] },
  }),
  define({
    name: "required-ampacity", title: "Ampacity that a circuit asks of its conductors, and its smallest device", calculate: requiredAmpacity,
    input: z.strictObject({ edition, use: circuitUse }), value: number("A"),
    detail: z.strictObject({ maximumA: number("A"), beforeFactorsA: number("A"), afterFactorsA: number("A"), minimumOcpdA: number("A").nullable() }),
    sample: { edition: "2023", use: { kind: "inverter output", outputA: 32.5 } },
  }),
  define({
    name: "largest-overcurrent-device", title: "Largest overcurrent device that conductors and equipment permit", calculate: largestOvercurrentDevice,
    input: z.strictObject({ edition, ampacityA: number("A"), size, material, roundUp: z.boolean().optional(), smallConductorLimit: z.boolean().optional(), dwelling83: z.boolean().optional(), nameplateMaxA: number("A").nullable().optional(), fuse: z.boolean().optional() }),
    value: number("A"),
    detail: z.strictObject({ byConductorA: number("A"), smallConductorLimitA: number("A").nullable(), nameplateMaxA: number("A").nullable(), governedBy: z.enum(["conductor", "next size up", "small conductor", "nameplate", "83 % rule"]), standardA: number("A").nullable() }),
    sample: { edition: "2023", ampacityA: 380, size: "500 kcmil", material: "copper" },
  }),
  define({
    name: "smallest-overcurrent-device", title: "Smallest standard overcurrent device for a current", calculate: smallestOvercurrentDevice,
    input: z.strictObject({ edition, requiredA: number("A"), fuse: z.boolean().optional() }), value: number("A"), detail: z.strictObject({ isStandard: z.boolean() }),
    sample: { edition: "2023", requiredA: 40.625 },
  }),
  define({
    name: "motor-device", title: "Largest branch-circuit device of a motor", calculate: motorDevice,
    input: z.strictObject({ edition, fullLoadA: number("A"), device: z.enum(MOTOR_DEVICES).optional() }), value: number("A"), detail: z.strictObject({ limitA: number("A") }),
    sample: { edition: "2023", fullLoadA: 8 },
  }),
  define({
    name: "hvac-device", title: "Device of air-conditioning equipment by its marking", calculate: hvacDevice,
    input: z.strictObject({ edition, minimumCircuitA: number("A"), maximumDeviceA: number("A") }), value: number("A"), detail: z.strictObject({ minimumCircuitA: number("A") }),
    sample: { edition: "2023", minimumCircuitA: 17, maximumDeviceA: 25 },
  }),
  define({
    name: "equipment-grounding-conductor", title: "Equipment grounding conductor with proportional increase", calculate: equipmentGroundingConductor,
    input: z.strictObject({ edition, ocpdA: number("A"), material, ungroundedSize: size, ungroundedMaterial: material, minimumSize: size.nullable().optional(), pvCircuit: z.boolean().optional(), sets: count("conductors a phase").optional() }),
    value: sizeOut, detail: z.strictObject({ tableSize: sizeOut, ratio: number(""), requiredCmil: number("cmil"), limitedToUngrounded: z.boolean(), perRaceway: z.boolean() }),
    sample: { edition: "2023", ocpdA: 80, material: "copper", ungroundedSize: "3 AWG", ungroundedMaterial: "copper", minimumSize: "4 AWG" },
  }),
  define({
    name: "grounding-electrode-conductor", title: "Grounding electrode conductor", calculate: groundingElectrodeConductor,
    input: z.strictObject({ ...supply, electrode: z.enum(ELECTRODES).optional(), ringSize: size.optional() }), value: sizeOut, detail: z.strictObject({ supplyAreaCmil: number("cmil"), tableSize: sizeOut }),
    sample: { edition: "2023", supplySize: "250 kcmil", supplyMaterial: "aluminum", material: "copper", electrode: "rod, pipe or plate" },
  }),
  define({
    name: "bonding-jumper", title: "Main, system or supply-side bonding jumper", calculate: bondingJumper,
    input: z.strictObject(supply), value: sizeOut, detail: z.strictObject({ supplyAreaCmil: number("cmil"), aboveTable: z.boolean() }),
    sample: { edition: "2023", supplySize: "250 kcmil", supplyMaterial: "aluminum", material: "copper" },
  }),
  define({
    name: "dwelling-service-conductor", title: "Conductor of a dwelling service or feeder, 83 % rule", calculate: dwellingServiceConductor,
    input: z.strictObject({ edition, ratingA: number("A"), material, route: z.strictObject({ insulation, wet: z.boolean().optional(), terminalC: terminal, parts }).optional() }),
    value: sizeOut, detail: z.strictObject({ requiredAmpacityA: number("A"), by: z.enum(["table", "83 % rule"]) }),
    sample: { edition: "2023", ratingA: 200, material: "aluminum" },
  }),
  define({
    name: "size-circuit", title: "Smallest conductors, device, grounding conductor and raceway that pass all tests", calculate: sizeCircuit,
    input: z.strictObject({
      edition, use: circuitUse, ...wire, maxSets: count("sets").optional(), groundMaterial: material.optional(),
      device: z.strictObject({ needed: z.boolean().optional(), ratingA: number("A").optional(), nameplateMaxA: number("A").optional(), roundUp: z.boolean().optional(), fuse: z.boolean().optional() }).optional(),
      drop: z.strictObject({ system: dropFields.system, voltageV: number("V"), conduit: conduit.optional(), powerFactor: number("").optional(), method: dropFields.method, currentA: number("A"), lengthFt: number("ft"), limitPct: number("%") }).optional(),
      raceway: z.strictObject({ kind: racewayKind, lengthIn: number("in"), conductorsPerSet: count("conductors"), others: z.array(fillItem).optional(), reserve: z.array(fillItem).optional() }).optional(),
    }),
    value: z.string(),
    detail: z.strictObject({
      size: sizeOut, sets: count("sets"), deviceA: number("A").nullable(), groundSize: sizeOut, tradeSize: tradeSizeOut.nullable(), ampacityA: number("A"), dropPct: number("%").nullable(),
      rejected: z.array(z.strictObject({ size: sizeOut, sets: count("sets"), reason: z.string() })),
    }),
    sample: { edition: "2023", use: { kind: "inverter output", outputA: 32.5 }, material: "copper", insulation: "THWN-2", terminalC: 75, parts: oneRoute, raceway: { kind: "EMT", lengthIn: 480, conductorsPerSet: 3 } },
  }),
];
