import { z } from "zod";
import { BURIAL_LOCATIONS, BURIAL_METHODS, CONDUIT_MATERIALS, EDITIONS, ESS_LOCATIONS, INSULATIONS, MATERIALS, RACEWAY_KINDS } from "@/lib/code";
import { CONDUCTOR_SIZES, TRADE_SIZES } from "@/lib/units";
import { ROUTE_PART_KINDS } from "../ampacity";
import { DROP_METHODS, DROP_SYSTEMS } from "../voltage-drop";

/** Pieces that the input and output schemas of the calculations share. Ranges are checked and named by the calculations. */
export const number = (unit: string): z.ZodNumber => z.number().describe(unit);
export const count = (what: string): z.ZodNumber => z.number().int().describe(what);
export const edition = z.enum(EDITIONS).describe("edition of the National Electrical Code");
export const size = z.union([z.string(), z.number()]).describe("conductor size as the trade writes it: 10 AWG, #8, 1/0, 250 kcmil");
export const tradeSize = z.union([z.string(), z.number()]).describe("trade size of a raceway: 3/4, 1-1/4, 2");
export const material = z.enum(MATERIALS);
export const insulation = z.enum(INSULATIONS as [string, ...string[]]);
export const terminal = z.union([z.literal(60), z.literal(75), z.literal(90)]).describe("temperature rating of the terminals, °C");
export const racewayKind = z.enum(RACEWAY_KINDS);
export const conduit = z.enum(CONDUIT_MATERIALS);
export const essLocation = z.enum(ESS_LOCATIONS);
export const burialLocation = z.enum(BURIAL_LOCATIONS);
export const burialMethod = z.enum(BURIAL_METHODS);
export const sizeOut = z.enum(CONDUCTOR_SIZES as [string, ...string[]]);
export const tradeSizeOut = z.enum(TRADE_SIZES);

export const routePart = z.strictObject({
  label: z.string().optional(),
  kind: z.enum(ROUTE_PART_KINDS),
  lengthFt: number("ft"),
  racewayLengthFt: number("ft, whole raceway where this part is a stretch of it").optional(),
  ambientC: number("°C"),
  currentCarryingCount: count("current-carrying conductors at the fullest cross section"),
  rooftopHeightIn: number("in above a roof in sunlight, null when not on a roof").nullable().optional(),
});

export const fillItem = z.strictObject({
  label: z.string().optional(),
  count: count("conductors or cables"),
  outsideDiameterIn: number("in").optional(),
  size: size.optional(),
  insulation: insulation.optional(),
  bare: z.boolean().optional(),
  solid: z.boolean().optional(),
  compact: z.boolean().optional(),
  covered: z.boolean().optional(),
});

export const circuitUse = z.discriminatedUnion("kind", [
  z.strictObject({ kind: z.literal("load"), continuousA: number("A"), noncontinuousA: number("A"), branch: z.boolean().optional(), hundredPercentRated: z.boolean().optional() }),
  z.strictObject({
    kind: z.literal("pv"), basis: z.enum(["short circuit", "converter output", "converter input", "engineered"]).optional(), currentA: number("A"),
    parallelStrings: count("strings").optional(), bifacialGain: number("share").optional(), engineeredA: number("A").optional(), systemKw: number("kW").optional(),
  }),
  z.strictObject({ kind: z.literal("inverter output"), outputA: number("A"), count: count("inverters").optional() }),
  z.strictObject({ kind: z.literal("battery input"), ratedA: number("A").optional(), powerW: number("W").optional(), efficiency: number("share").optional(), lowestV: number("V").optional() }),
  z.strictObject({ kind: z.literal("storage"), nameplateA: number("A"), ocpdA: number("A") }),
  z.strictObject({ kind: z.literal("generator"), nameplateA: number("A"), overloadPrevented: z.boolean().optional(), setOcpdA: number("A").nullable().optional() }),
  z.strictObject({ kind: z.literal("motor"), largestA: number("A"), otherMotorsA: number("A").optional(), otherLoadA: number("A").optional() }),
  z.strictObject({ kind: z.literal("hvac"), minimumCircuitA: number("A") }),
]);

export const dropFields = {
  system: z.enum(DROP_SYSTEMS),
  method: z.enum(DROP_METHODS).optional(),
  currentA: number("A"),
  voltageV: number("V"),
  lengthFt: number("ft, one way"),
  size,
  material,
  sets: count("conductors in parallel a phase").optional(),
  solid: z.boolean().optional(),
  coated: z.boolean().optional(),
  conduit: conduit.optional(),
  powerFactor: number("power factor").optional(),
};

export const coefficient = z.union([z.strictObject({ pctPerC: number("%/°C") }), z.strictObject({ voltPerC: number("V/°C") })]);
export const circularRaceway = z.strictObject({ kind: racewayKind, tradeSize, lengthIn: number("in") });
export const wireway = z.strictObject({ kind: z.enum(["metal wireway", "nonmetallic wireway"]), widthIn: number("in"), heightIn: number("in") });
const segmentFields = { label: z.string(), lengthFt: number("ft"), sets: count("conductors in parallel a phase").optional(), contributionA: number("A").optional() };
export const faultSegment = z.union([
  z.strictObject({ ...segmentFields, size, material, conduit, neutralSize: size.optional() }),
  z.strictObject({ ...segmentFields, constantC: number("published constant"), neutralConstantC: number("published constant").optional() }),
]);

export const stepSchema = z.strictObject({
  symbol: z.string(), expression: z.string(), substituted: z.string(), result: z.union([z.number(), z.string()]), unit: z.string(), citation: z.string().optional(),
});
export const citationSchema = z.strictObject({
  meaning: z.string(), code: z.string(), edition: z.string(), section: z.string(), title: z.string(), confirmation: z.enum(["read", "agreed", "unconfirmed", "preview"]),
});
