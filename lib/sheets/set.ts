import type { SheetContext, SheetPage } from "./context";
import { oneLineSheet } from "./oneLineSheet";
import { schedulePages, scheduleSheet } from "./scheduleSheet";
import type { Table } from "./table";

/** Number of the first schedule sheet; further ones take numbers that no sheet of the set uses. */
const SCHEDULE = "E-603";
const FURTHER_FROM = 608;

const NOUNS: Readonly<Record<string, string>> = { CONDUCTOR: "CONDUCTORS", RACEWAY: "RACEWAYS", EQUIPMENT: "EQUIPMENT", ACCEPTED: "ACCEPTED IN WRITING" };
/** Title and subtitle of a schedule sheet, from the tables that stand on it. */
function titleOf(tables: readonly Table[]): { title: string; subtitle: string } {
  const [first = "SCHEDULES", ...others] = [...new Set(tables.map((table) => { const word = (table.title ?? "").split(" ")[0] ?? ""; return NOUNS[word] ?? word; }))];
  return { title: first, subtitle: others.length ? `AND ${others.join(", ")}` : "SCHEDULE" };
}

/** All sheets of a drawing, in the order of the set. */
export function sheetSet(context: SheetContext): SheetPage[] {
  const { sheet } = context.drawing;
  const schedules = schedulePages(context);
  const count = 1 + schedules.length;
  const numbers = { schedule: SCHEDULE, accepted: schedules.length > 1 ? `E-${FURTHER_FROM + schedules.length - 2}` : SCHEDULE };
  return [
    oneLineSheet(context, { number: sheet.number, title: sheet.title, subtitle: sheet.subtitle, index: 1, count, scale: "NONE" }, numbers),
    ...schedules.map((tables, i) => scheduleSheet(context, {
      number: i === 0 ? SCHEDULE : `E-${FURTHER_FROM + i - 1}`, ...titleOf(tables), index: i + 2, count, scale: "NONE",
    }, tables, numbers.accepted)),
  ];
}
