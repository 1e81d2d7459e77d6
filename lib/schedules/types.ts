import type { Command } from "@/lib/diagram/commands";
import type { ElementRef } from "@/lib/diagram/schema";

/** One line of a schedule: an element, or one section of a circuit. */
export interface ScheduleRow { readonly key: string; readonly ref: ElementRef; readonly tag: string; readonly section: string | null }
/** What an entry asks for: commands to run as one step, or why it cannot be taken. */
export type CellAnswer = { readonly commands: readonly Command[] } | { readonly reason: string };
export type CellValue = number | string | boolean | null;

/** One column, read alike by the grid on screen and by the printed sheet. */
export interface ScheduleColumn {
  readonly id: string;
  readonly label: string;
  readonly unit: string;
  /** Heading over neighboring columns of the same group. */
  readonly group: string;
  /** Width on screen, px. */
  readonly width: number;
  /** Numbers stand on the right. */
  readonly right: boolean;
  /** Words to choose from. */
  readonly options?: readonly string[];
  /** Value itself; null is not known, or has no meaning in this row. */
  readonly value: (row: ScheduleRow) => CellValue;
  /** As shown in the grid, without the unit. */
  readonly text: (row: ScheduleRow) => string;
  /** As lettered on the sheet. */
  readonly print: (row: ScheduleRow) => string;
  readonly editable: (row: ScheduleRow) => boolean;
  /** Fields of the element that the cell shows, as findings name them. */
  readonly fields: (row: ScheduleRow) => readonly string[];
  /** Reads an entry. A cell that is worked out answers that it is. */
  readonly parse: (row: ScheduleRow, text: string) => CellAnswer;
}
export interface Schedule {
  readonly label: string;
  /** Columns on screen. */
  readonly columns: readonly ScheduleColumn[];
  /** Columns on the sheet; ask `printedColumns` for those that hold something. */
  readonly printed: readonly ScheduleColumn[];
  readonly rows: readonly ScheduleRow[];
  readonly fieldsOf: (row: ScheduleRow, column: string) => readonly string[];
  readonly command: (row: ScheduleRow, column: string, text: string) => CellAnswer;
}
