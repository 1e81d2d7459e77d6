import type { Command } from "@/lib/diagram/commands";
import type { DrawingGraph, End } from "@/lib/diagram/graph";
import { formatNumber } from "@/lib/units";
import type { CellAnswer, CellValue, Schedule, ScheduleColumn, ScheduleRow } from "./types";
import { showValue } from "./readField";

/** What a schedule says about a column; the rest follows. */
export interface ColumnPlan extends Partial<Pick<ScheduleColumn, "unit" | "right" | "options" | "fields" | "text" | "print">>, Pick<ScheduleColumn, "id" | "label" | "group" | "width" | "value"> {
  /** Absent where the cell is worked out from the drawing. */
  readonly write?: (row: ScheduleRow, text: string) => CellAnswer;
  /** Rows in which the cell may be written. */
  readonly when?: (row: ScheduleRow) => boolean;
  /** The sheet shows it in another column. */
  readonly screenOnly?: boolean;
}

const WORKED_OUT = { reason: "it is worked out from the drawing" };
function column(plan: ColumnPlan): ScheduleColumn {
  const { write, when, screenOnly: _, ...rest } = plan;
  const editable = (row: ScheduleRow): boolean => write !== undefined && (when?.(row) ?? true);
  const text = plan.text ?? ((row: ScheduleRow) => showValue(plan.value(row)));
  return {
    unit: "", right: false, fields: () => [], print: text, ...rest, text, editable,
    parse: (row, entry) => (write === undefined ? WORKED_OUT : editable(row) ? write(row, entry) : { reason: "it has no meaning here" }),
  };
}

/**
 * Puts columns and rows together; rows come in the order of their tags, numbers in tags by their value.
 * `onSheet` names the columns of the sheet, or describes those that only the sheet has; left out, they are those not marked otherwise.
 */
export function schedule(label: string, plans: readonly ColumnPlan[], rows: readonly ScheduleRow[], onSheet?: readonly (string | ColumnPlan)[]): Schedule {
  const columns = plans.map(column);
  const byId = new Map(columns.map((each) => [each.id, each]));
  const printed = onSheet?.flatMap((each) => (typeof each === "string" ? byId.get(each) ?? [] : column(each))) ?? columns.filter((_, index) => plans[index]?.screenOnly !== true);
  return {
    label, columns, printed, rows: [...rows].sort(byTag),
    fieldsOf: (row, id) => byId.get(id)?.fields(row) ?? [],
    command: (row, id, text) => byId.get(id)?.parse(row, text) ?? { reason: "there is no such column" },
  };
}
const byTag = (a: ScheduleRow, b: ScheduleRow): number => a.tag.localeCompare(b.tag, "en", { numeric: true }) || (a.key < b.key ? -1 : a.key > b.key ? 1 : 0);

export const one = (command: Command): CellAnswer => ({ commands: [command] });
export const tagColumn = (label: string, width = 84): ColumnPlan => ({
  id: "tag", label, group: "", width, value: (row) => row.tag, fields: () => ["tag"],
  write: (row, text) => (text.trim() === "" ? { reason: "a tag is needed" } : one({ type: "setTag", ref: row.ref, tag: text.trim() })),
});
/** A figure worked out from the drawing, with the most decimals worth showing. Not known is empty. */
export const figure = (id: string, label: string, unit: string, group: string, decimals: number, value: (row: ScheduleRow) => CellValue, width = 72): ColumnPlan => ({
  id, label, unit, group, width, right: true, value,
  text: (row) => { const found = value(row); return typeof found === "number" ? formatNumber(found, decimals) : showValue(found); },
});

/** The option written, null for an empty entry, undefined for a word that is none. */
export const choose = <T extends string>(text: string, options: readonly T[]): T | null | undefined =>
  (text.trim() === "" ? null : options.find((each) => each.toLowerCase() === text.trim().toLowerCase()));

/** Tag of equipment or of a raceway, or what it is where it has none. */
export function tagOf(graph: DrawingGraph, id: string | null): string {
  if (id === null) return "";
  const { equipment, raceways } = graph.drawing;
  return equipment[id] ? equipment[id].tag || graph.kind(id).title : raceways[id]?.tag || raceways[id]?.kind || "";
}
/** Where an end of a circuit lands: the tag, and the place where there are several. */
export function landing(graph: DrawingGraph, circuit: string, end: End): string {
  const endpoint = graph.drawing.circuits[circuit]?.[end];
  if (!endpoint) return "";
  const port = graph.port(endpoint.equipment, endpoint.port);
  return `${tagOf(graph, endpoint.equipment)}${port ? ` ${port.label.toLowerCase()}` : ""}`;
}
