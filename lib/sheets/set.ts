import type { SheetContext, SheetPage } from "./context";
import { oneLineSheet } from "./oneLineSheet";

/** All sheets of a drawing, in the order of the set. */
export function sheetSet(context: SheetContext): SheetPage[] {
  const { sheet } = context.drawing;
  return [oneLineSheet(context, { number: sheet.number, title: sheet.title, subtitle: sheet.subtitle, index: 1, count: 1, scale: "NONE" }, { schedule: "E-603", accepted: "E-603" })];
}
