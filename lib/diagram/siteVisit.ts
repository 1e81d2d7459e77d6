import { z } from "zod";
import { CONDUCTOR_SIZE, SERVICE_SYSTEMS, idSchema, locationSchema } from "./schema";

/**
 * What was seen, read and measured at the site. `null` everywhere means "not looked at", which is not the same as "not there".
 * Nothing here is a rating of the drawing yet; `fromVisit` says what would become one.
 */
const words = (max: number) =>
  z.string().max(max, `is longer than ${max} characters`).regex(/^[^\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]*$/, "holds a control character").nullable();
const measured = (least: number, most: number) => z.number().min(least, `must be at least ${least}`).max(most, `must be at most ${most}`).nullable();
const whole = (least: number, most: number) => z.number().int("is no whole number").min(least, `must be at least ${least}`).max(most, `must be at most ${most}`).nullable();
const amps = measured(1, 6000);
const id = idSchema;
const rows = <T extends z.ZodType>(row: T, most: number) => z.array(row).max(most, `are more than ${most}`);

export const TEMPERATURE_UNITS = ["°F", "°C"] as const;
export type TemperatureUnit = (typeof TEMPERATURE_UNITS)[number];
/** Lowest and highest temperature that is taken, by unit: the same two points. */
export const TEMPERATURE_LIMITS: Readonly<Record<TemperatureUnit, readonly [number, number]>> = { "°F": [-76, 248], "°C": [-60, 120] };
/** A temperature as it was read, in the unit it was read in. */
export const readTemperatureSchema = z.strictObject({ value: z.number(), unit: z.enum(TEMPERATURE_UNITS) })
  .refine(({ value, unit }) => value >= TEMPERATURE_LIMITS[unit][0] && value <= TEMPERATURE_LIMITS[unit][1], "is outside of what is taken")
  .nullable();
export type ReadTemperature = z.infer<typeof readTemperatureSchema>;

export const visitServiceSchema = z.strictObject({
  utilityName: words(80),
  system: z.enum(SERVICE_SYSTEMS).nullable(),
  /** Rating of the service's main overcurrent device as marked, A. */
  mainRatingA: amps,
  /** Available fault current as the utility states it, A; nobody measures it on a visit. */
  availableFaultCurrentA: measured(0, 200_000),
  faultCurrentStatedBy: words(120),
  meterNumber: words(40),
  meterType: words(80),
});
export const visitPanelSchema = z.strictObject({
  id, name: words(40), location: words(80),
  /** Maker, model and whatever else the label says, as read. */
  labelText: words(400),
  busA: amps, mainA: amps, spacesTotal: whole(1, 84), spacesFree: whole(0, 84),
  labelPhotos: rows(z.uuid(), 20), note: words(400),
});
export const visitFoundSchema = z.strictObject({ id, what: words(80), labelText: words(400), place: words(80), note: words(400) });
export const visitLengthSchema = z.strictObject({ id, from: words(60), to: words(60), lengthFt: measured(0, 20_000), route: words(400) });
export const visitPlaceSchema = z.strictObject({
  id, what: words(80), building: words(80), place: words(80), exposure: locationSchema.shape.exposure, ambient: readTemperatureSchema,
  clearWidthIn: measured(0, 240), clearHeightIn: measured(0, 240), clearDepthIn: measured(0, 240), note: words(400),
});
export const visitTemperaturesSchema = z.strictObject({
  roof: readTemperatureSchema, attic: readTemperatureSchema, room: readTemperatureSchema, when: words(80), how: words(160),
});
export const visitRoofSchema = z.strictObject({
  type: words(80),
  /** Height of conduit above the roof that its supports will give, in. */
  conduitAboveRoofIn: measured(0, 240),
  note: words(400),
});
/** The kinds of electrode as the drawing names them. */
export const ELECTRODES = ["ground rod", "two ground rods", "concrete-encased", "metal water pipe", "ground ring", "structural metal"] as const;
export const visitGroundingSchema = z.strictObject({
  electrodes: z.array(z.enum(ELECTRODES)).max(ELECTRODES.length).nullable(),
  conductorSize: z.string().regex(CONDUCTOR_SIZE, "write a size as 6 AWG, 1/0 AWG or 250 kcmil").nullable(),
  /** A bond between neutral and ground was seen in the service equipment. */
  bondSeen: z.enum(["yes", "no"]).nullable(),
  note: words(400),
});
export const visitPhotoSchema = z.strictObject({ id, file: z.uuid(), what: words(80), caption: words(200) });

export const visitDataSchema = z.strictObject({
  service: visitServiceSchema,
  panels: rows(visitPanelSchema, 40),
  found: rows(visitFoundSchema, 100),
  lengths: rows(visitLengthSchema, 200),
  places: rows(visitPlaceSchema, 60),
  temperatures: visitTemperaturesSchema,
  roof: visitRoofSchema,
  grounding: visitGroundingSchema,
  photos: rows(visitPhotoSchema, 300),
  note: words(4000),
});
export type VisitData = z.infer<typeof visitDataSchema>;
export type VisitPanel = z.infer<typeof visitPanelSchema>;
export type VisitFound = z.infer<typeof visitFoundSchema>;
export type VisitLength = z.infer<typeof visitLengthSchema>;
export type VisitPlace = z.infer<typeof visitPlaceSchema>;
export type VisitPhoto = z.infer<typeof visitPhotoSchema>;
/** Parts of a visit; two people who change different parts do not disturb each other. */
export type VisitPart = keyof VisitData;
export const VISIT_PARTS = Object.keys(visitDataSchema.shape) as readonly VisitPart[];

/** A visit on which nothing was looked at yet. */
export const emptyVisit = (): VisitData => ({
  service: { utilityName: null, system: null, mainRatingA: null, availableFaultCurrentA: null, faultCurrentStatedBy: null, meterNumber: null, meterType: null },
  panels: [], found: [], lengths: [], places: [],
  temperatures: { roof: null, attic: null, room: null, when: null, how: null },
  roof: { type: null, conduitAboveRoofIn: null, note: null },
  grounding: { electrodes: null, conductorSize: null, bondSeen: null, note: null },
  photos: [], note: null,
});
/** New rows, with nothing looked at. */
export const emptyRow = {
  panels: (id: string): VisitPanel => ({ id, name: null, location: null, labelText: null, busA: null, mainA: null, spacesTotal: null, spacesFree: null, labelPhotos: [], note: null }),
  found: (id: string): VisitFound => ({ id, what: null, labelText: null, place: null, note: null }),
  lengths: (id: string): VisitLength => ({ id, from: null, to: null, lengthFt: null, route: null }),
  places: (id: string): VisitPlace => ({ id, what: null, building: null, place: null, exposure: null, ambient: null, clearWidthIn: null, clearHeightIn: null, clearDepthIn: null, note: null }),
} as const;

/** Every stored file that a visit shows. */
export const visitFiles = (data: VisitData): string[] => [...data.panels.flatMap((panel) => panel.labelPhotos), ...data.photos.map((photo) => photo.file)];
