import { z } from "zod";
import { batteryRunTime, chargeCurrent } from "../battery";
import { BUSBAR_PATHS, busbarCheck } from "../busbar";
import { feederWithSource, supplySideConnection, tapWithSource } from "../connection";
import { dcFaultCurrent, faultCurrent } from "../fault-current";
import { stringCurrent } from "../string-current";
import { stringVoltage } from "../string-voltage";
import { inverterVoltageRise, voltageDrop } from "../voltage-drop";
import { define, type CalculationEntry } from "./define";
import { citationSchema, coefficient, count, dropFields, edition, faultSegment, material, number, size, sizeOut } from "./schemas";

const amps = z.array(number("A"));

export const SOURCE_CALCULATIONS: readonly CalculationEntry[] = [
  define({
    name: "string-voltage", title: "Highest string voltage, hot and cold operating voltage", calculate: stringVoltage,
    input: z.strictObject({
      edition, modulesInSeries: count("modules"), vocV: number("V"), vmpV: number("V").optional(), vocCoefficient: z.union([coefficient, z.literal("table")]), vmpCoefficient: coefficient.optional(),
      lowestC: number("°C"), highestCellC: number("°C").optional(), limitV: number("V").optional(),
    }),
    value: number("V"), detail: z.strictObject({ coldVocPerModuleV: number("V"), hotVmpV: number("V").nullable(), coldVmpV: number("V").nullable(), largestModuleCount: count("modules").nullable() }),
    sample: { edition: "2023", modulesInSeries: 12, vocV: 38.6, vocCoefficient: { pctPerC: -0.26 }, lowestC: -24, limitV: 600 },
  }),
  define({
    name: "string-current", title: "Maximum current of a PV input and whether its strings need fuses", calculate: stringCurrent,
    input: z.strictObject({ edition, iscA: number("A"), impA: number("A").optional(), bifacialGain: number("share").optional(), parallelStrings: count("strings"), backfeedA: number("A").optional(), moduleFuseA: number("A"), conductorAmpacityA: number("A").optional() }),
    value: number("A"),
    detail: z.strictObject({
      stringMaximumA: number("A"), inputMaximumA: number("A"), inputIscA: number("A"), inputImpA: number("A").nullable(), reverseA: number("A"),
      stringFuseNeeded: z.boolean(), stringFuseA: number("A").nullable(), fuseWithinModule: z.boolean().nullable(),
    }),
    sample: { edition: "2023", iscA: 14.05, impA: 13.31, parallelStrings: 3, moduleFuseA: 25 },
  }),
  define({
    name: "busbar-check", title: "Busbar with several sources: every path of the rule", calculate: busbarCheck,
    input: z.strictObject({
      edition, busbarA: number("A"), mainDeviceA: number("A"), sourceOutputsA: amps, branchDevicesA: amps.nullable(), oppositeEnds: z.boolean(), centerFedDwelling: z.boolean().optional(), feedThrough: z.boolean().optional(),
      powerControlA: number("A").nullable().optional(),
    }),
    value: z.enum([...BUSBAR_PATHS, "none"]),
    detail: z.strictObject({
      paths: z.array(z.strictObject({ name: z.enum(BUSBAR_PATHS), passes: z.boolean().nullable(), sumA: number("A").nullable(), limitA: number("A").nullable(), citation: citationSchema.nullable() })),
      sourceA: number("A"), complies: z.boolean(), undecided: z.boolean(),
    }),
    sample: { edition: "2023", busbarA: 200, mainDeviceA: 125, sourceOutputsA: [32.5, 32.5], branchDevicesA: [125, 45, 45], oppositeEnds: true },
  }),
  define({
    name: "feeder-with-source", title: "Feeder beyond a source connection", calculate: feederWithSource,
    input: z.strictObject({ edition, feederOcpdA: number("A"), feederAmpacityA: number("A"), sourceOutputsA: amps, loadSideOcpdA: number("A").nullable().optional() }),
    value: number("A"), detail: z.strictObject({ complies: z.boolean(), by: z.enum(["ampacity", "load-side device", "none"]) }),
    sample: { edition: "2023", feederOcpdA: 200, feederAmpacityA: 200, sourceOutputsA: [160] },
  }),
  define({
    name: "tap-with-source", title: "Feeder tap beyond a source connection", calculate: tapWithSource,
    input: z.strictObject({ edition, tap: z.enum(["10 ft", "25 ft"]), feederOcpdA: number("A"), sourceOutputsA: amps, sourceOcpdsA: amps, tapOcpdA: number("A") }),
    value: number("A"), detail: z.strictObject({ baseA: number("A"), shareA: number("A") }),
    sample: { edition: "2023", tap: "25 ft", feederOcpdA: 600, sourceOutputsA: [160], sourceOcpdsA: [200], tapOcpdA: 200 },
  }),
  define({
    name: "supply-side-connection", title: "Supply-side source connection", calculate: supplySideConnection,
    input: z.strictObject({ edition, serviceRatingA: number("A"), serviceAmpacityA: number("A"), sourceOcpdsA: amps, sourceOutputsA: amps, size, material }),
    value: number("A"), detail: z.strictObject({ complies: z.boolean(), limitA: number("A"), leastSize: sizeOut.nullable() }),
    sample: { edition: "2023", serviceRatingA: 200, serviceAmpacityA: 205, sourceOcpdsA: [45, 45], sourceOutputsA: [32.5, 32.5], size: "6 AWG", material: "copper" },
  }),
  define({
    name: "voltage-drop", title: "Voltage drop of a circuit", calculate: voltageDrop,
    input: z.strictObject({ edition, ...dropFields }), value: number("V"),
    detail: z.strictObject({ dropPct: number("%"), ohmPerKft: number("Ω per 1000 ft"), method: z.enum(["table 9", "table 8", "K"]), endVoltageV: number("V") }),
    sample: { edition: "2023", system: "ac 1-phase", currentA: 65, voltageV: 240, lengthFt: 46, size: "1 AWG", material: "copper", conduit: "steel" },
  }),
  define({
    name: "inverter-voltage-rise", title: "Voltage rise at the output of an inverter", calculate: inverterVoltageRise,
    input: z.strictObject({ edition, ...dropFields, system: z.enum(["ac 1-phase", "ac 3-phase"]) }).omit({ powerFactor: true }), value: number("V"),
    detail: z.strictObject({ risePct: number("%"), inverterV: number("V") }),
    sample: { edition: "2023", system: "ac 1-phase", currentA: 32.5, voltageV: 240, lengthFt: 60, size: "8 AWG", material: "copper", conduit: "steel" },
  }),
  define({
    name: "fault-current", title: "Available fault current, point to point", calculate: faultCurrent,
    input: z.strictObject({
      edition, phases: z.union([z.literal(1), z.literal(3)]), lineToLineV: number("V"),
      source: z.discriminatedUnion("kind", [
        z.strictObject({ kind: z.literal("stated"), availableA: number("A") }),
        z.strictObject({ kind: z.literal("transformer"), kva: number("kVA"), impedancePct: number("%"), impedanceTolerance: number("").optional() }),
      ]),
      method: z.enum(["arithmetic", "vector"]), sourceXOverR: number("").optional(), resistanceOnly: z.boolean().optional(),
      lineToNeutral: z.strictObject({ multiplier: number(""), enters: z.enum(["before the first stretch", "after the first stretch"]) }).optional(), segments: z.array(faultSegment),
    }),
    value: number("A"),
    detail: z.strictObject({
      sourceA: number("A"), fullLoadA: number("A").nullable(), convention: z.string(),
      nodes: z.array(z.strictObject({ label: z.string(), boltedA: number("A"), lineToLineA: number("A"), lineToNeutralA: number("A").nullable(), totalA: number("A") })),
    }),
    sample: {
      edition: "2023", phases: 1, lineToLineV: 240, source: { kind: "stated", availableA: 10400 }, method: "vector", sourceXOverR: 1.5,
      segments: [{ label: "feeder", lengthFt: 46, size: "1 AWG", material: "copper", conduit: "steel" }],
    },
  }),
  define({
    name: "dc-fault-current", title: "Short-circuit current of a dc bus", calculate: dcFaultCurrent,
    input: z.strictObject({ edition, voltageV: number("V"), sources: z.array(z.strictObject({ label: z.string(), shortCircuitA: number("A"), leadOhm: number("Ω").optional() })) }),
    value: number("A"), detail: z.strictObject({ perSourceA: amps }),
    sample: { edition: "2023", voltageV: 51.2, sources: [{ label: "battery", shortCircuitA: 3600 }] },
  }),
  define({
    name: "battery-run-time", title: "Run time of a battery", calculate: batteryRunTime,
    input: z.strictObject({ edition, energyKwh: number("kWh"), usableShare: number("share"), efficiency: number("share"), loadW: number("W") }), value: number("h"), detail: z.strictObject({ usableKwh: number("kWh") }),
    sample: { edition: "2023", energyKwh: 50, usableShare: 0.8, efficiency: 0.94, loadW: 2000 },
  }),
  define({
    name: "charge-current", title: "Charge current of a battery", calculate: chargeCurrent,
    input: z.strictObject({ edition, powerW: number("W"), efficiency: number("share"), batteryV: number("V"), limitA: number("A").optional(), energyKwh: number("kWh").optional() }),
    value: number("A"), detail: z.strictObject({ withinLimit: z.boolean().nullable(), hours: number("h").nullable() }),
    sample: { edition: "2023", powerW: 3000, efficiency: 0.94, batteryV: 51.2, limitA: 100, energyKwh: 12.5 },
  }),
];
