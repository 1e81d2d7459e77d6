import { z } from "zod";
import { SCREW_CONNECTORS } from "@/lib/code";
import { boxFill, pullBox, wireBendingSpace } from "../boxes";
import { dwellingLoadStandard } from "../dwelling-load";
import { dwellingLoadExisting, dwellingLoadOptional, existingLoadMeasured, lineCurrents } from "../dwelling-load-optional";
import { racewayFill, smallestRaceway } from "../raceway-fill";
import { burialDepth, storageLimits, workingSpace } from "../site";
import { convertTorque, defaultTorque, TORQUE_UNITS } from "../terminations";
import { define, type CalculationEntry } from "./define";
import { burialLocation, burialMethod, circularRaceway, count, edition, essLocation, fillItem, number, racewayKind, size, tradeSize, tradeSizeOut, wireway } from "./schemas";

const va = z.array(number("VA"));
const general = { edition, floorAreaFt2: number("ft²"), smallApplianceCircuits: count("circuits"), laundryCircuits: count("circuits") };
const load = z.strictObject({ generalVa: number("VA"), generalDemandVa: number("VA"), heatOrCoolingVa: number("VA"), amps: number("A"), serviceRatingA: number("A"), neutralVa: number("VA").nullable() });

export const PLACE_CALCULATIONS: readonly CalculationEntry[] = [
  define({
    name: "raceway-fill", title: "Fill of a raceway and the room left", calculate: racewayFill,
    input: z.strictObject({ edition, raceway: z.union([circularRaceway, wireway]), items: z.array(fillItem), later: fillItem.optional() }), value: number("%"),
    detail: z.strictObject({
      usedIn2: number("in²"), totalIn2: number("in²"), limitPct: number("%"), allowedIn2: number("in²"), conductorCount: count("conductors"), fits: z.boolean(), roomLeftIn2: number("in²"),
      laterCount: count("conductors").nullable(), largestCountEqual: count("conductors").nullable(), jamRatio: number("").nullable(), jamLikely: z.boolean(),
    }),
    sample: { edition: "2023", raceway: { kind: "EMT", tradeSize: "3/4", lengthIn: 96 }, items: [{ count: 2, outsideDiameterIn: 0.25 }], later: { label: "Cat 6", count: 1, outsideDiameterIn: 0.25 } },
  }),
  define({
    name: "smallest-raceway", title: "Smallest trade size with a reserve for later", calculate: smallestRaceway,
    input: z.strictObject({ edition, kind: racewayKind, lengthIn: number("in"), items: z.array(fillItem), reserve: z.array(fillItem).optional() }), value: tradeSizeOut,
    detail: z.strictObject({ fillPct: number("%"), fillWithReservePct: number("%"), limitPct: number("%") }),
    sample: { edition: "2023", kind: "EMT", lengthIn: 480, items: [{ count: 3, size: "1 AWG", insulation: "THWN-2" }, { count: 1, size: "6 AWG", insulation: "THWN-2" }] },
  }),
  define({
    name: "box-fill", title: "Volume that the contents of a box need", calculate: boxFill,
    input: z.strictObject({
      edition, conductors: z.array(z.strictObject({ size, count: count("conductors") })), groundCount: count("conductors").optional(), largestGround: size.optional(), internalClamps: z.boolean().optional(),
      supportFittings: count("fittings").optional(), deviceYokes: z.array(size).optional(), boxVolumeIn3: number("in³").optional(),
    }),
    value: number("in³"), detail: z.strictObject({ fits: z.boolean().nullable() }),
    sample: { edition: "2023", conductors: [{ size: "10 AWG", count: 16 }], groundCount: 2, largestGround: "10 AWG", boxVolumeIn3: 720 },
  }),
  define({
    name: "pull-box", title: "Least distance in a pull or junction box", calculate: pullBox,
    input: z.strictObject({ edition, pull: z.enum(["straight", "angle or U"]), largestTradeSize: tradeSize, otherTradeSizes: z.array(tradeSize).optional() }), value: number("in"), detail: z.strictObject({ betweenEntriesIn: number("in") }),
    sample: { edition: "2023", pull: "angle or U", largestTradeSize: "2", otherTradeSizes: ["1"] },
  }),
  define({
    name: "wire-bending-space", title: "Wire-bending space at a terminal or in a wireway", calculate: wireBendingSpace,
    input: z.strictObject({ edition, size, place: z.enum(["terminal", "wireway"]), wiresPerTerminal: count("wires").optional(), compactAluminum: z.boolean().optional() }), value: number("in"), detail: z.strictObject({ specified: z.boolean() }),
    sample: { edition: "2023", size: "1 AWG", place: "wireway" },
  }),
  define({
    name: "convert-torque", title: "Torque in another unit", calculate: convertTorque,
    input: z.strictObject({ edition, torque: number("in the unit of from"), from: z.enum(TORQUE_UNITS), to: z.enum(TORQUE_UNITS) }), value: number("in the unit of to"),
    detail: z.strictObject({ lbfIn: number("lbf·in"), lbfFt: number("lbf·ft"), newtonMeter: number("N·m") }),
    sample: { edition: "2023", torque: 16, from: "lbf·ft", to: "lbf·in" },
  }),
  define({
    name: "default-torque", title: "Tightening torque where the maker gives none", calculate: defaultTorque,
    input: z.union([
      z.strictObject({ edition, screw: z.enum(SCREW_CONNECTORS), size }),
      z.strictObject({ edition, screw: z.literal("small slotted"), slotLengthIn: z.string(), wideSlot: z.boolean() }),
      z.strictObject({ edition, screw: z.literal("socket"), acrossFlatsIn: z.string() }),
    ]),
    value: number("lbf·in"), detail: z.strictObject({ newtonMeter: number("N·m") }),
    sample: { edition: "2023", screw: "hex-other", size: "2 AWG" },
  }),
  define({
    name: "working-space", title: "Clear working space in front of equipment", calculate: workingSpace,
    input: z.strictObject({ edition, voltageToGroundV: number("V"), condition: z.union([z.literal(1), z.literal(2), z.literal(3)]), equipmentWidthIn: number("in").optional(), equipmentHeightFt: number("ft").optional(), existingDwellingPanelA: number("A").optional() }),
    value: number("ft"), detail: z.strictObject({ widthIn: number("in"), heightFt: number("ft"), headroomExcepted: z.boolean() }),
    sample: { edition: "2023", voltageToGroundV: 522, condition: 2 },
  }),
  define({
    name: "burial-depth", title: "Minimum cover underground", calculate: burialDepth,
    input: z.strictObject({ edition, location: burialLocation, method: burialMethod, inRaceway: z.boolean().optional() }), value: number("in"), detail: z.strictObject({ measuredTo: z.string() }),
    sample: { edition: "2023", location: "other", method: "nonmetallic-raceway" },
  }),
  define({
    name: "storage-limits", title: "Storage energy by location in one- and two-family dwellings", calculate: storageLimits,
    input: z.strictObject({ edition, units: z.array(z.strictObject({ label: z.string(), energyKwh: number("kWh"), location: essLocation })), perDwellingKwh: number("kWh").nullable().optional() }), value: number("kWh"),
    detail: z.strictObject({
      byLocation: z.array(z.strictObject({ location: essLocation, energyKwh: number("kWh"), limitKwh: number("kWh"), within: z.boolean() })), unitsOverLimit: z.array(z.string()), within: z.boolean(), spacingFt: number("ft"),
    }),
    sample: { edition: "2023", units: [{ label: "battery", energyKwh: 12.5, location: "garage or accessory structure" }] },
  }),
  define({
    name: "dwelling-load-standard", title: "Dwelling load, standard method", calculate: dwellingLoadStandard,
    input: z.strictObject({
      ...general, rangesVa: va.optional(), dryersVa: va.optional(), appliances: z.array(z.strictObject({ label: z.string(), va: number("VA"), onNeutral: z.boolean().optional() })).optional(), heatVa: number("VA").optional(),
      coolingVa: number("VA").optional(), largestMotorVa: number("VA").optional(), otherVa: number("VA").optional(), voltageV: number("V").optional(),
    }),
    value: number("VA"), detail: load,
    sample: { edition: "2023", floorAreaFt2: 2500, smallApplianceCircuits: 2, laundryCircuits: 1, rangesVa: [11000], dryersVa: [4500], heatVa: 10000 },
  }),
  define({
    name: "dwelling-load-optional", title: "Dwelling load, optional method", calculate: dwellingLoadOptional,
    input: z.strictObject({ ...general, nameplatesVa: va, coolingVa: number("VA").optional(), heatPumpVa: number("VA").optional(), supplementHeatVa: number("VA").optional(), spaceHeatVa: number("VA").optional(), spaceHeatUnits: count("units").optional(), voltageV: number("V").optional() }),
    value: number("VA"), detail: load,
    sample: { edition: "2023", floorAreaFt2: 2000, smallApplianceCircuits: 2, laundryCircuits: 1, nameplatesVa: [12000, 4500], heatPumpVa: 5760, supplementHeatVa: 15000 },
  }),
  define({
    name: "dwelling-load-existing", title: "Load of an existing dwelling with new loads", calculate: dwellingLoadExisting,
    input: z.strictObject({ ...general, nameplatesVa: va, heatVa: number("VA").optional(), coolingVa: number("VA").optional(), voltageV: number("V").optional() }), value: number("VA"), detail: load,
    sample: { edition: "2023", floorAreaFt2: 1500, smallApplianceCircuits: 2, laundryCircuits: 1, nameplatesVa: [12000, 5000] },
  }),
  define({
    name: "existing-load-measured", title: "Existing load by measured maximum demand", calculate: existingLoadMeasured,
    input: z.strictObject({ edition, maximumDemandA: number("A"), newLoadA: number("A"), serviceRatingA: number("A") }), value: number("A"), detail: z.strictObject({ fits: z.boolean() }),
    sample: { edition: "2023", maximumDemandA: 80, newLoadA: 40, serviceRatingA: 200 },
  }),
  define({
    name: "line-currents", title: "Currents of both lines and the neutral, row by row", calculate: lineCurrents,
    input: z.strictObject({ edition, rows: z.array(z.strictObject({ label: z.string(), lineA: number("A"), neutral: number("A"), lineB: number("A"), motorA: z.tuple([number("A"), number("A"), number("A")]).optional() })) }),
    value: number("A"), detail: z.strictObject({ lineA: number("A"), neutral: number("A"), lineB: number("A"), serviceRatingA: number("A") }),
    sample: { edition: "2023", rows: [{ label: "general", lineA: 78, neutral: 61, lineB: 78 }] },
  }),
];
