import { z } from "zod";
import { SYSTEMS } from "@/lib/equipment/define";

/**
 * The drawing: one JSON document keyed by stable ids, so that a change is a small patch.
 * Positions are grid units; one unit is 1/8 in on the half-size print (1/4 in at full size).
 * `null` always means "not known yet".
 */
export const SCHEMA_VERSION = 1;

/** Stable id of an element. Never shown, never read by a rule. */
export const idSchema = z.string().regex(/^[a-z0-9][a-z0-9-]{0,63}$/, "use lower-case letters, digits and hyphens");

// Text that can be printed: no control characters. Angle brackets are allowed; every output escapes them.
const words = (max: number) => z.string().max(max).regex(/^[^\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]*$/, "holds a control character");
const coordinate = z.number().min(-2000).max(2000);
export const pointSchema = z.strictObject({ x: coordinate, y: coordinate });
export const EDITIONS = ["2017", "2020", "2023", "2026"] as const;
export type Edition = (typeof EDITIONS)[number];

export const OCCUPANCIES = ["one- or two-family dwelling", "multifamily dwelling", "accessory building", "farm building", "commercial building", "ground-mounted, no building"] as const;

/** A local amendment copied from the jurisdiction, so that a drawing can be checked by itself. */
export const amendmentSchema = z.strictObject({
  rule: z.string().max(64),
  effect: z.enum(["off", "limit", "severity", "note"]),
  limit: z.number().nullable().default(null),
  unit: words(16).default(""),
  severity: z.enum(["must-fix", "should-fix", "advice"]).nullable().default(null),
  citation: words(120),
  /** Limit of the rule that is amended; left out: every limit of that unit. */
  limitName: words(48).optional(),
});

/** What the utility or the authority asks of every installation, copied from the jurisdiction; null is not known. */
export const requirementsSchema = z.strictObject({
  lockableVisibleSwitch: z.enum(["yes", "no"]).nullable(),
  separateMeter: z.enum(["yes", "no"]).nullable(),
  notes: words(400),
});

export const SERVICE_SYSTEMS = ["120/240 V, 3-wire", "208Y/120 V, 4-wire", "240/120 V, 4-wire delta with high leg", "480Y/277 V, 4-wire", "120 V, 2-wire"] as const;
export const siteSchema = z.strictObject({
  edition: z.enum(EDITIONS),
  occupancy: z.enum(OCCUPANCIES).nullable(),
  recordLowC: z.number().min(-60).max(40).nullable(),
  designHighC: z.number().min(-10).max(60).nullable(),
  elevationM: z.number().min(-100).max(5000).nullable(),
  utilityName: words(80).nullable(),
  availableFaultCurrentA: z.number().min(0).max(200000).nullable(),
  temperatureSource: words(160).nullable(),
  amendments: z.record(idSchema, amendmentSchema),
  requirements: requirementsSchema.optional(),
  /** Who gave the available fault current, and on which day. */
  faultCurrentSource: words(160).nullable().optional(),
  faultCurrentOn: z.iso.date().nullable().optional(),
  /** Conductors of the utility's system at the service. */
  serviceSystem: z.enum(SERVICE_SYSTEMS).nullable().optional(),
  /** Residential and fire code adopted with the electrical code. */
  residentialCode: z.enum(["none", "2015", "2018", "2021", "2024"]).nullable().optional(),
  fireCode: z.enum(["none", "2015", "2018", "2021", "2024"]).nullable().optional(),
  /** Load of the service or of the largest feeder, and how it was worked out. */
  load: z.strictObject({ method: words(120), resultA: z.number().min(0).max(10000).nullable(), source: words(160) }).nullable().optional(),
});

/** A sketch or photo that lies dimmed under the drawing on screen; never printed. Place and size are grid units. */
export const underlaySchema = z.strictObject({
  file: z.uuid(), at: pointSchema, width: z.number().min(1).max(600), height: z.number().min(1).max(400), opacity: z.number().min(0.05).max(0.8), hidden: z.boolean(),
});
export const SHEET_SIZES = ["ANSI B", "ANSI C", "ANSI D", "ANSI E", "ARCH B", "ARCH C", "ARCH D", "ARCH E"] as const;
export const titleBlockSchema = z.strictObject({
  jobName: words(120), jobNumber: words(40), addressLines: words(240), parcel: words(60), owner: words(120),
  designedBy: words(80), checkedBy: words(80), preparer: words(160), contractor: words(160),
  permitNumber: words(60), codes: words(160), scope: words(400),
});
export const sheetSchema = z.strictObject({
  size: z.enum(SHEET_SIZES),
  title: words(80),
  subtitle: words(80),
  number: words(12),
  titleBlock: titleBlockSchema,
  /** Where derived tables stand on the one-line, by table name; a table without a place is not drawn. */
  tables: z.partialRecord(z.enum(["states", "interlocks", "bus-checks", "fault-current"]), pointSchema),
  underlay: underlaySchema.optional(),
});

/** Where a rating was read. `file` is the stored datasheet, where one was uploaded. */
export const sourceSchema = z.strictObject({ document: words(120), page: words(40), file: z.uuid().optional() });
/** Entry and version of the company's equipment library from which the ratings were copied. */
export const libraryRefSchema = z.strictObject({ entry: z.uuid(), version: z.number().int().min(1).max(100_000) });
const propertyValue = z.union([z.number(), words(400), z.boolean(), z.null()]);

export const TERMINAL_METALS = ["CU", "AL", "AL9CU", "CU-AL"] as const;
/** What is marked at a terminal. Torque is in lbf·in as marked or instructed. */
export const terminalSchema = z.strictObject({
  temperatureC: z.union([z.literal(60), z.literal(75), z.literal(90)]).nullable(),
  metals: z.enum(TERMINAL_METALS).nullable(),
  smallest: words(16).nullable(),
  largest: words(16).nullable(),
  torqueLbfIn: z.number().min(0.5).max(5000).nullable(),
  torqueSource: words(80).nullable(),
  /** Conductors that one terminal is identified for. */
  conductorsMost: z.number().int().min(1).max(12).nullable().optional(),
  /** Identified for finely stranded conductors. */
  fineStrand: z.boolean().nullable().optional(),
  /** True where someone looked and found no temperature marking. */
  noTemperatureMark: z.boolean().nullable().optional(),
});
/** Values marked at one port of one piece of equipment. Left out means: the kind asks for none here. */
export const portDataSchema = z.strictObject({
  nominalV: z.number().min(0).max(40000).nullable().optional(),
  maximumV: z.number().min(0).max(40000).nullable().optional(),
  continuousA: z.number().min(0).max(10000).nullable().optional(),
  maximumA: z.number().min(0).max(10000).nullable().optional(),
  maximumOvercurrentA: z.number().min(0).max(10000).nullable().optional(),
  terminal: terminalSchema.optional(),
  /** Left without a conductor on purpose: capped or marked spare. */
  spare: z.boolean().nullable().optional(),
});

export const ROOMS = [
  "outside wall", "outside on the ground", "garage", "utility closet or storage room", "mechanical room", "basement", "attic", "crawl space", "kitchen", "living space",
  "sleeping room", "closet opening into a sleeping room", "bathroom", "clothes closet", "stairway", "barn or livestock area", "workshop", "roof",
] as const;
export const locationSchema = z.strictObject({
  building: words(80).nullable(),
  place: words(80).nullable(),
  exposure: z.enum(["indoor dry", "indoor damp", "outdoor", "roof", "underground"]).nullable(),
  ambientC: z.number().min(-60).max(120).nullable(),
  /** Use of the room or place, as location limits of the codes name it. */
  room: z.enum(ROOMS).nullable().optional(),
  /** Reached quickly without tools, ladders or climbing over things. */
  readilyAccessible: z.boolean().nullable().optional(),
  corrosive: z.boolean().nullable().optional(),
  /** What stands opposite the working space: nothing live, grounded parts, or other live parts. */
  opposite: z.enum(["no live or grounded parts", "grounded parts", "live parts"]).nullable().optional(),
  /** From the nearest door or window into the dwelling, ft. */
  fromOpeningFt: z.number().min(0).max(500).nullable().optional(),
});

export const equipmentSchema = z.strictObject({
  kind: z.string().max(40),
  tag: words(24),
  status: z.enum(["new", "existing", "relocated", "removed"]),
  /** Enclosure it stands in. */
  parent: idSchema.nullable(),
  /** Integral part drawn by its parent's symbol; it has ports but no symbol of its own. */
  integral: z.boolean(),
  /** Not drawn on the one-line, so as not to crowd it; it stands in the schedules and is checked like the rest. */
  offSheet: z.boolean().optional(),
  at: pointSchema,
  rotation: z.union([z.literal(0), z.literal(90), z.literal(180), z.literal(270)]),
  mirrored: z.boolean(),
  size: z.strictObject({ width: z.number().min(1).max(600), height: z.number().min(1).max(400) }).nullable(),
  /** Bus line inside an enclosure, relative to `at`. */
  bus: z.strictObject({ x: coordinate, y: coordinate, length: z.number().min(1).max(400), vertical: z.boolean() }).nullable(),
  /** Where the tag starts, relative to `at`; null takes the kind's place. */
  label: z.strictObject({ x: coordinate, y: coordinate, anchor: z.enum(["start", "middle", "end"]) }).nullable(),
  /** Spaces in the panelboard it is mounted in, lowest number first, for example [1, 3]; main devices use []. */
  spaces: z.array(z.number().int().min(1).max(84)).max(6).nullable(),
  location: locationSchema,
  props: z.record(z.string().max(48), propertyValue),
  sources: z.record(z.string().max(48), sourceSchema),
  ports: z.record(z.string().max(24), portDataSchema),
  note: words(200),
  library: libraryRefSchema.optional(),
});

export const endpointSchema = z.strictObject({
  equipment: idSchema,
  port: z.string().max(24),
  /** Place along a bus, grid units from the start of its line; 0 elsewhere. */
  offset: z.number().min(0).max(400),
});

export const CONDUCTOR_SIZE = /^(\d{1,2} AWG|[1-4]\/0 AWG|\d{3,4} kcmil)$/;
export const INSULATIONS = ["THHN", "THWN", "THWN-2", "XHHW", "XHHW-2", "RHW-2", "USE-2", "PV wire", "TW", "bare"] as const;
/** Conductors of one function in one set. */
export const conductorSchema = z.strictObject({
  count: z.number().int().min(0).max(12),
  size: z.string().regex(CONDUCTOR_SIZE, "write a size as 8 AWG, 1/0 AWG or 250 kcmil").nullable(),
  metal: z.enum(["Cu", "Al"]).nullable(),
  insulation: z.enum(INSULATIONS).nullable(),
  strands: z.enum(["solid", "class B", "class C", "class K"]).nullable(),
  /** Measured outside diameter where it is not that of the tables. */
  outerDiameterIn: z.number().min(0.02).max(6).nullable(),
  voltageRatingV: z.number().min(30).max(35000).nullable(),
  color: words(40).nullable(),
});
/** A cable drawn as one thing: data, control, sensor leads, jacketed power cable. */
export const cableSchema = z.strictObject({
  type: words(40),
  class: z.enum(["class 1", "class 2", "class 3", "power"]).nullable(),
  count: z.number().int().min(1).max(40),
  outerDiameterIn: z.number().min(0.02).max(6).nullable(),
  voltageRatingV: z.number().min(30).max(35000).nullable(),
  wetListed: z.boolean().nullable(),
});
export const routeStepSchema = z.strictObject({ raceway: idSchema, compartment: idSchema.nullable() });
/** Length of one circuit with the same conductors. A circuit has one section unless its wire changes at a box. */
export const sectionSchema = z.strictObject({
  order: z.number().int().min(0).max(20),
  /** Cut length of one conductor along this section, ft. */
  lengthFt: z.number().min(0).max(20000).nullable(),
  parallelSets: z.number().int().min(1).max(12),
  ungrounded: conductorSchema.nullable(),
  grounded: conductorSchema.nullable(),
  equipmentGround: conductorSchema.nullable(),
  /** This section uses the equipment grounding conductor drawn with another circuit in the same raceways. */
  sharesGroundOf: idSchema.nullable(),
  cable: cableSchema.nullable(),
  route: z.array(routeStepSchema).max(40),
  /** Ambient where the conductors are not in a raceway. */
  ambientC: z.number().min(-60).max(120).nullable(),
});
export const circuitSchema = z.strictObject({
  tag: words(24),
  /** Number shown in the bubble on the sheet when several runs carry one callout; null takes the tag. */
  callout: words(24).nullable(),
  /** `factory` joins parts inside listed equipment: drawn as a line, no schedule row, no conductors to size. */
  wiring: z.enum(["field", "factory"]),
  system: z.enum(SYSTEMS),
  from: endpointSchema,
  to: endpointSchema,
  status: z.enum(["new", "existing", "relocated", "removed"]),
  /** Load current stated by the designer where the drawing cannot derive it. */
  load: z.strictObject({ continuousA: z.number().min(0).max(10000), otherA: z.number().min(0).max(10000), basis: words(200) }).nullable(),
  sections: z.record(idSchema, sectionSchema),
  /** Routed polyline as drawn, both ends included; empty until routed. The sheet draws it and never re-routes. */
  points: z.array(pointSchema).max(200),
  /** Bend points a person placed; the router keeps them. */
  bends: z.array(pointSchema).max(60),
  calloutAt: pointSchema.nullable(),
  /** Not drawn on the one-line, so as not to crowd it; it stands in the schedules and is checked like the rest. */
  offSheet: z.boolean().optional(),
});

export const RACEWAY_TYPES = ["EMT", "IMC", "RMC", "FMC", "LFMC", "LFNC", "ENT", "PVC 40", "PVC 80", "PVC A", "PVC EB", "HDPE"] as const;
/** Part of a raceway with one surrounding. */
export const stretchSchema = z.strictObject({
  order: z.number().int().min(0).max(20),
  lengthFt: z.number().min(0).max(20000).nullable(),
  ambientC: z.number().min(-60).max(120).nullable(),
  exposure: z.enum(["indoor dry", "indoor damp", "outdoor", "roof", "underground"]).nullable(),
  /** Height above a roof in sunlight, in; null when not over a roof. */
  aboveRoofIn: z.number().min(0).max(240).nullable(),
  burialDepthIn: z.number().min(0).max(240).nullable(),
});
export const compartmentSchema = z.strictObject({ order: z.number().int().min(0).max(6), name: words(24), widthIn: z.number().min(0.5).max(48).nullable() });
export const racewaySchema = z.strictObject({
  kind: z.enum(["conduit", "nipple", "wireway", "box"]),
  tag: words(24),
  status: z.enum(["new", "existing", "relocated", "removed"]),
  type: z.enum(RACEWAY_TYPES).nullable(),
  tradeSize: z.string().regex(/^(\d|\d-\d\/\d|\d\/\d)$/, "write a trade size as 3/4, 1 or 1-1/4").nullable(),
  metal: z.boolean().nullable(),
  /** Inside width, height and length of wireways and boxes, in. */
  widthIn: z.number().min(0.5).max(96).nullable(),
  heightIn: z.number().min(0.5).max(96).nullable(),
  depthIn: z.number().min(0.5).max(96).nullable(),
  stretches: z.record(idSchema, stretchSchema),
  bendsDegrees: z.number().min(0).max(3600).nullable(),
  /** More than one compartment means fixed dividers over the full length. */
  compartments: z.record(idSchema, compartmentSchema),
  /** What it enters at each end: equipment or another raceway. */
  from: idSchema.nullable(),
  to: idSchema.nullable(),
  sealed: z.boolean().nullable(),
  location: locationSchema,
  /** Band, box or mark on the sheet. Conduits and nipples are marks across their circuits. */
  at: pointSchema,
  size: z.strictObject({ width: z.number().min(0).max(600), height: z.number().min(0).max(400) }),
  vertical: z.boolean(),
  /** Not drawn on the one-line, so as not to crowd it; it stands in the schedules and is checked like the rest. */
  offSheet: z.boolean().optional(),
  label: z.strictObject({ x: coordinate, y: coordinate, anchor: z.enum(["start", "middle", "end"]) }).nullable(),
  note: words(200),
});

/** A physical joint between neutral and ground. `relay` joints follow the converter's mode. */
export const bondSchema = z.strictObject({
  tag: words(24),
  kind: z.enum(["main bonding jumper", "system bonding jumper", "supply-side bonding jumper", "neutral strap", "bonding screw", "neutral relay"]),
  equipment: idSchema,
  /** The part is in place (strap or screw fitted, relay enabled). */
  fitted: z.boolean().nullable(),
  size: z.string().regex(CONDUCTOR_SIZE).nullable(),
  /** Relays only: state in which the relay closes. */
  closes: z.enum(["always", "island"]),
  at: pointSchema.nullable(),
});
/** Mechanical or listed exclusion: of the switches named, at most one can be closed. */
export const interlockSchema = z.strictObject({
  tag: words(24),
  kind: z.enum(["mechanical slide", "key", "listed transfer mechanism", "electrical"]),
  listed: z.boolean().nullable(),
  switches: z.record(idSchema, z.literal(true)),
  at: pointSchema.nullable(),
  note: words(120),
});
export const SENSOR_PURPOSES = ["interconnect exchange", "whole-premises exchange", "generator exchange", "load", "inverter output"] as const;
export const sensorSchema = z.strictObject({
  tag: words(24),
  circuit: idSchema,
  pole: z.enum(["L1", "L2", "L3"]).nullable(),
  purpose: z.enum(SENSOR_PURPOSES).nullable(),
  /** Which end of the circuit the arrow points to. */
  arrow: z.enum(["from", "to"]).nullable(),
  ratio: words(40).nullable(),
  ratingA: z.number().min(0).max(10000).nullable(),
  leadLimitFt: z.number().min(0).max(2000).nullable(),
  /** Equipment that reads it. */
  reads: idSchema.nullable(),
  /** What one sensor measures by the instruction: the conductor it encloses, or the whole circuit from that one. */
  covers: z.enum(["its conductor", "all conductors"]).nullable().optional(),
  /** Primary current set in the equipment that reads it, A. */
  settingA: z.number().min(0).max(10000).nullable().optional(),
  /** Data circuit drawn as its lead; where none is drawn, the length of the lead inside the enclosure, ft. */
  lead: idSchema.nullable().optional(),
  leadLengthFt: z.number().min(0).max(2000).nullable().optional(),
  /** Page of the maker's instruction that fixes its place. */
  instruction: sourceSchema.nullable(),
  at: pointSchema,
  rotation: z.union([z.literal(0), z.literal(90), z.literal(180), z.literal(270)]),
});
export const labelSchema = z.strictObject({
  number: words(8), rule: words(64).nullable(), lines: words(600),
  places: z.record(idSchema, z.literal(true)), status: z.enum(["new", "existing", "relocated", "removed"]),
  /** Height of the smallest required letters, in. */
  letterHeightIn: z.number().min(0.05).max(6).nullable().optional(),
  background: z.enum(["white", "yellow", "orange", "red", "black"]).nullable().optional(),
  reflective: z.boolean().nullable().optional(),
  handwritten: z.boolean().nullable().optional(),
});
/** Written acceptance of one finding by a licensee. `anchor` is collection/id, `digest` what was accepted. */
export const acceptanceSchema = z.strictObject({
  rule: z.string().max(64), anchor: z.string().max(140), variant: z.string().max(64), reason: words(600),
  by: words(80), license: words(80), on: z.iso.date(), evidence: z.string().max(128),
});
/**
 * What a person states because no drawing can show it. `anchor` is collection/id, or `site`. The server sees to it that
 * `by` is who saved it.
 */
export const statementSchema = z.strictObject({
  rule: z.string().max(64), anchor: z.string().max(140), value: z.enum(["yes", "no", "not applicable"]), by: words(80), on: z.iso.date(), note: words(300),
});
/** Distance between two pieces of equipment, ft, and whether one is seen from the other. */
export const distanceSchema = z.strictObject({ a: idSchema, b: idSchema, ft: z.number().min(0).max(5000).nullable(), inSight: z.boolean().nullable() });
/** Tightening torque of one terminal as it was applied: value asked for, value reached, and the tool. */
export const torqueSchema = z.strictObject({
  equipment: idSchema, port: z.string().max(24),
  specifiedLbfIn: z.number().min(0.5).max(5000).nullable(), achievedLbfIn: z.number().min(0).max(5000).nullable(),
  /** Range that the maker states about the value; null where only the value is stated. */
  tolerancePercent: z.number().min(0).max(50).nullable(),
  tool: words(80), toolDueOn: z.iso.date().nullable(), on: z.iso.date(), by: words(80),
});
export const textSchema = z.strictObject({ at: pointSchema, lines: words(600), style: z.enum(["note", "heading", "compartment"]), keynote: words(4).nullable(), vertical: z.boolean() });

export const drawingSchema = z.strictObject({
  schemaVersion: z.literal(SCHEMA_VERSION),
  site: siteSchema,
  sheet: sheetSchema,
  equipment: z.record(idSchema, equipmentSchema),
  circuits: z.record(idSchema, circuitSchema),
  raceways: z.record(idSchema, racewaySchema),
  bonds: z.record(idSchema, bondSchema),
  interlocks: z.record(idSchema, interlockSchema),
  sensors: z.record(idSchema, sensorSchema),
  labels: z.record(idSchema, labelSchema),
  acceptances: z.record(idSchema, acceptanceSchema),
  texts: z.record(idSchema, textSchema),
  statements: z.record(idSchema, statementSchema).optional(),
  distances: z.record(idSchema, distanceSchema).optional(),
  torques: z.record(idSchema, torqueSchema).optional(),
});

export type Drawing = z.infer<typeof drawingSchema>;
export type Site = z.infer<typeof siteSchema>;
export type Amendment = z.infer<typeof amendmentSchema>;
export type Requirements = z.infer<typeof requirementsSchema>;
export type Sheet = z.infer<typeof sheetSchema>;
export type Underlay = z.infer<typeof underlaySchema>;
export type Equipment = z.infer<typeof equipmentSchema>;
export type PortData = z.infer<typeof portDataSchema>;
export type Circuit = z.infer<typeof circuitSchema>;
export type Section = z.infer<typeof sectionSchema>;
export type Conductor = z.infer<typeof conductorSchema>;
export type Cable = z.infer<typeof cableSchema>;
export type Raceway = z.infer<typeof racewaySchema>;
export type Stretch = z.infer<typeof stretchSchema>;
export type Bond = z.infer<typeof bondSchema>;
export type Interlock = z.infer<typeof interlockSchema>;
export type Sensor = z.infer<typeof sensorSchema>;
export type Statement = z.infer<typeof statementSchema>;
export type Torque = z.infer<typeof torqueSchema>;
export type Distance = z.infer<typeof distanceSchema>;
export type Acceptance = z.infer<typeof acceptanceSchema>;
export type Endpoint = z.infer<typeof endpointSchema>;
export type RouteStep = z.infer<typeof routeStepSchema>;
export type Point = z.infer<typeof pointSchema>;

/** The maps of the drawing that hold elements, in the order in which findings list them. */
export const COLLECTIONS = ["equipment", "circuits", "raceways", "bonds", "interlocks", "sensors", "labels", "acceptances", "texts"] as const;
export type Collection = (typeof COLLECTIONS)[number];
/** Names one element of the drawing. */
export interface ElementRef { collection: Collection; id: string }
/** Schema of one element of each map. */
export const ELEMENT_SCHEMAS: Readonly<Record<Collection, z.ZodType>> = {
  equipment: equipmentSchema, circuits: circuitSchema, raceways: racewaySchema, bonds: bondSchema, interlocks: interlockSchema, sensors: sensorSchema,
  labels: labelSchema, acceptances: acceptanceSchema, texts: textSchema,
};
