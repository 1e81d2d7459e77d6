import { conductorSchedule, equipmentSchedule, printedColumns, racewaySchedule, type Schedule } from "@/lib/schedules";
import { cautionPrimitives, CAUTIONS_PX } from "./bottom";
import type { SheetContext, SheetPage, SheetWords } from "./context";
import { drawingArea, framePrimitives } from "./frame";
import { layered, type Primitive } from "./primitives";
import { sheetGeometry } from "./size";
import { fitColumns, headPx, tableHeight, tablePrimitives, type Table } from "./table";
import { titleBlockPrimitives } from "./titleBlock";

const TITLE_PX = 26;
const GAP_PX = 18;
const ROW_PX = 17;
const MARGIN_PX = 14;

function tableOf(title: string, schedule: Schedule, widthPx: number): Table {
  const columns = printedColumns(schedule);
  const heads = columns.map((column) => ({ head: column.unit ? `${column.label}, ${column.unit}` : column.label, ...(column.right ? { anchor: "end" as const } : {}) }));
  const rows = schedule.rows.map((row) => columns.map((column) => column.print(row)));
  const fitted = fitColumns(heads, rows, 230);
  // Too wide for the sheet: the widest columns give way first, their words are cut with a mark.
  for (let over = fitted.reduce((sum, column) => sum + column.width, 0) - widthPx; over > 0;) {
    const widest = fitted.reduce((a, b) => (b.width > a.width ? b : a));
    const cut = Math.min(over, Math.max(1, widest.width * 0.05));
    if (widest.width <= 30) break;
    widest.width -= cut;
    over -= cut;
  }
  return { title, columns: fitted, rows, rowPx: ROW_PX };
}

/** Parts of the tables that fill one sheet each; a long table goes on with its head repeated, nothing shrinks. */
function paged(tables: readonly Table[], heightPx: number): Table[][] {
  const pages: Table[][] = [[]];
  let left = heightPx;
  for (const table of tables) {
    let rows = table.rows;
    let title = table.title ?? "";
    while (rows.length > 0) {
      const base = TITLE_PX + headPx(table, ROW_PX);
      const fits = Math.floor((left - base) / ROW_PX);
      if (fits < Math.min(3, rows.length)) {
        pages.push([]);
        left = heightPx;
        continue;
      }
      const part: Table = { ...table, title, rows: rows.slice(0, fits) };
      pages.at(-1)?.push(part);
      left -= TITLE_PX + tableHeight(part) + GAP_PX;
      rows = rows.slice(fits);
      title = `${table.title ?? ""}, CONTINUED`;
    }
  }
  return pages.filter((page) => page.length > 0);
}

/** What the licensee accepted in writing, which the rule line of every sheet points to. */
function acceptedTable(context: SheetContext): Table {
  const rows = (context.check?.findings ?? []).flatMap((finding) => (finding.accepted ? [[finding.message, finding.citation, finding.accepted.reason, finding.accepted.by, finding.accepted.license, finding.accepted.on]] : []));
  const heads = ["Finding", "Section", "Accepted because", "By", "License", "Date"].map((head) => ({ head }));
  return { title: "ACCEPTED IN WRITING", columns: fitColumns(heads, rows, 360), rows, rowPx: ROW_PX };
}

/** How many sheets the schedules take, and what stands on each. Worked out before the sheets are numbered. */
export function schedulePages(context: SheetContext): Table[][] {
  const g = sheetGeometry(context.drawing.sheet.size);
  const area = drawingArea(g);
  const width = area.right - area.left - 2 * MARGIN_PX;
  const tables = [
    tableOf("CONDUCTOR SCHEDULE", conductorSchedule(context.graph), width),
    tableOf("RACEWAY SCHEDULE", racewaySchedule(context.graph), width),
    tableOf("EQUIPMENT SCHEDULE", equipmentSchedule(context.graph), width),
    acceptedTable(context),
  ].filter((table) => table.rows.length > 0);
  return paged(tables, area.bottom - area.top - CAUTIONS_PX - 2 * MARGIN_PX);
}

/** One sheet of the conductor, raceway and equipment schedules. */
export function scheduleSheet(context: SheetContext, words: SheetWords, tables: readonly Table[], accepted: string): SheetPage {
  const g = sheetGeometry(context.drawing.sheet.size);
  const area = drawingArea(g);
  const primitives: Primitive[] = [...framePrimitives(g)];
  let y = area.top + MARGIN_PX;
  for (const table of tables) {
    y += TITLE_PX;
    primitives.push(...tablePrimitives(area.left + MARGIN_PX, y, table));
    y += tableHeight(table) + GAP_PX;
  }
  primitives.push(
    ...cautionPrimitives({ ...area, top: area.bottom - CAUTIONS_PX }, context.graph),
    ...titleBlockPrimitives(g, context, words, { acceptedOn: accepted }),
  );
  return { number: words.number, title: words.title, widthIn: g.widthIn, heightIn: g.heightIn, widthPx: g.widthPx, heightPx: g.heightPx, primitives: layered(primitives) };
}
