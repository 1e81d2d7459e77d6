import type { Command } from "@/lib/diagram/commands";
import type { Drawing } from "@/lib/diagram/schema";
import type { ReadTemperature, VisitData } from "@/lib/diagram/siteVisit";
import { convert, formatNumber } from "@/lib/units";

/** A visit as it is taken over: what was found, on which day (YYYY-MM-DD) and by whom. */
export interface VisitFacts { visitedOn: string; byName: string; data: VisitData }

/** What a panel of the visit is on the drawing. `id` of a new one is made by the caller. */
export type PanelChoice = { as: "panelboard" | "meter-main"; id: string } | { as: "update"; id: string } | { as: "nothing" };
export interface VisitChoices {
  /** By id of the visit's panel. */
  panels: Readonly<Record<string, PanelChoice>>;
  /** By id of the visit's length: the section of a circuit it was measured for. */
  lengths: Readonly<Record<string, { circuit: string; section: string }>>;
  /** By id of the visit's location: the equipment that stands there. */
  places: Readonly<Record<string, string>>;
  /** By id of a raceway: where it runs. Raceways that are left out are not touched. */
  raceways: Readonly<Record<string, "roof" | "attic">>;
}
export const NO_CHOICES: VisitChoices = { panels: {}, lengths: {}, places: {}, raceways: {} };

/** One value that would be set, as the preview shows it. */
export interface VisitLine {
  /** Stable while the choices are the same. */
  key: string;
  /** Where it would be set, in words: a tag, or "Site". */
  target: string;
  field: string;
  /** Value now and value from the visit, in words with unit; empty is not known. */
  before: string;
  after: string;
  /** A value that is known now would be replaced by another one. */
  replaces: boolean;
  /** What to think of before taking it. */
  caution: string | null;
  /** Where the value comes from, as the drawing will say it. */
  source: string;
  /** Line without which this one has no place: the panel that is to be placed. */
  needs: string | null;
  commands: readonly Command[];
}
export interface LineContext { drawing: Drawing; visit: VisitFacts; choices: VisitChoices; source: string }

type Value = number | string | boolean | null | undefined;
const inWords = (value: Value, unit: string): string => {
  if (value === null || value === undefined || value === "") return "";
  if (typeof value === "boolean") return value ? "yes" : "no";
  return `${typeof value === "number" ? formatNumber(value, 2) : value}${unit ? ` ${unit}` : ""}`;
};

interface Facts {
  key: string; target: string; field: string; unit?: string; before: Value; after: Value;
  /** The new value in words, where it is not simply value and unit. */
  words?: string; caution?: string | null; needs?: string | null; commands: readonly Command[];
}
/** A line, or none where the visit has no value or the drawing has the same one. */
export function line(source: string, { key, target, field, unit = "", before, after, words, caution = null, needs = null, commands }: Facts): VisitLine[] {
  if (after === null || after === undefined || after === "" || before === after) return [];
  const now = inWords(before, unit);
  return [{ key, target, field, before: now, after: words ?? inWords(after, unit), replaces: now !== "", caution, source, needs, commands }];
}

const MONTHS = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];
/** "site visit, Nov 30, 2026, K. Fenner": printed as the source of each value. */
export function visitSource({ visitedOn, byName }: Pick<VisitFacts, "visitedOn" | "byName">): string {
  const [year = "", month = "1", day = "1"] = visitedOn.split("-");
  return ["site visit", `${MONTHS[Number(month) - 1] ?? month} ${Number(day)}, ${year}`, byName.trim()].filter(Boolean).join(", ");
}

/** A temperature that was read, in °C to a tenth. */
export function celsius(read: NonNullable<ReadTemperature>): number {
  return Math.round(convert(read.value, read.unit, "°C", "temperature") * 10) / 10;
}
/** "104 °F (40 °C)", or "40 °C" where it was read so. */
export function temperatureWords(read: NonNullable<ReadTemperature>): string {
  const own = `${formatNumber(read.value, 1)} ${read.unit}`;
  return read.unit === "°C" ? own : `${own} (${formatNumber(celsius(read), 1)} °C)`;
}
/** Said of every temperature: what was read on one day is not what conductors are judged by. */
export const ONE_DAY = "Read on one day. Conductors and equipment are judged by the highest temperature that is expected; take it only if this is it.";
