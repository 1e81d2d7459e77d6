import type { Command } from "@/lib/diagram/commands";
import type { DrawingGraph } from "@/lib/diagram/graph";
import type { ElementRef } from "@/lib/diagram/schema";
import type { GridColumn } from "./gridTypes";

/** One line of a schedule: an element, or one section of a circuit. */
export interface ScheduleRow { readonly key: string; readonly ref: ElementRef; readonly tag: string; readonly source: unknown }
export interface ScheduleGrid {
  readonly label: string;
  readonly columns: readonly GridColumn<ScheduleRow>[];
  readonly rows: readonly ScheduleRow[];
  /** Fields of the element that a column shows, as findings name them. */
  readonly fieldsOf: (row: ScheduleRow, column: string) => readonly string[];
  readonly command: (row: ScheduleRow, column: string, text: string) => { readonly commands: readonly Command[] } | { readonly reason: string };
}
const none = (label: string): ScheduleGrid => ({ label, columns: [], rows: [], fieldsOf: () => [], command: () => ({ reason: "not yet" }) });
export const conductorGrid = (_graph: DrawingGraph): ScheduleGrid => none("Conductors");
export const racewayGrid = (_graph: DrawingGraph): ScheduleGrid => none("Raceways");
export const equipmentGrid = (_graph: DrawingGraph): ScheduleGrid => none("Equipment");
