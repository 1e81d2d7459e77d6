import type { Schedule, ScheduleColumn } from "./types";

/** Columns that a sheet prints: those of its own that hold something in at least one row. The first, the tag, always stands. */
export function printedColumns(schedule: Schedule): readonly ScheduleColumn[] {
  return schedule.printed.filter((column, index) => index === 0 || schedule.rows.some((row) => column.print(row) !== ""));
}
