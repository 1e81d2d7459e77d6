import { conductorSchedule, equipmentSchedule, printedColumns, racewaySchedule, type Schedule } from "@/lib/schedules";
import { cautionPrimitives, CAUTIONS_PX } from "./bottom";
import type { SheetContext, SheetPage, SheetWords } from "./context";
import { drawingArea, framePrimitives } from "./frame";
import { layered, type Primitive } from "./primitives";
import { sheetGeometry } from "./size";
import { fitColumns, headPx, rowHeight, tableHeight, tablePrimitives, type Column, type Table } from "./table";
import { titleBlockPrimitives } from "./titleBlock";

const TITLE_PX = 26;
const GAP_PX = 18;
/** Words of a cell run on in further lines from this width, px. */
const WRAP_PX = 330;
const MARGIN_PX = 14;

function tableOf(title: string, schedule: Schedule, widthPx: number): Table {
  const columns = printedColumns(schedule);
  const heads = columns.map((column) => ({ head: column.unit ? `${column.label}, ${column.unit}` : column.label, ...(column.right ? { anchor: "end" as const } : {}) }));
  const rows = schedule.rows.map((row) => columns.map((column) => column.print(row)));
  return { title, columns: narrowed(fitColumns(heads, rows, WRAP_PX), widthPx), rows };
}

/** Columns that together fit the sheet: the widest give way first, and their words run on in further lines. */
function narrowed(columns: Column[], widthPx: number): Column[] {
  const fitted = columns.map((column) => ({ ...column }));
  for (let over = fitted.reduce((sum, column) => sum + column.width, 0) - widthPx; over > 0;) {
    const widest = fitted.reduce((a, b) => (b.width > a.width ? b : a));
    if (widest.width <= 60) break;
    const cut = Math.min(over, Math.max(1, widest.width * 0.05));
    widest.width -= cut;
    over -= cut;
  }
  return fitted;
}

/** Parts of the tables that fill one sheet each; a long table goes on with its head repeated, nothing shrinks. */
function paged(tables: readonly Table[], heightPx: number): Table[][] {
  const pages: Table[][] = [[]];
  let left = heightPx;
  for (const table of tables) {
    let rows = table.rows;
    let title = table.title ?? "";
    while (rows.length > 0) {
      const fits = rowsWithin(table, rows, left - TITLE_PX - headPx(table));
      const empty = pages.at(-1)?.length === 0;
      if (fits < Math.min(3, rows.length) && !empty) {
        pages.push([]);
        left = heightPx;
        continue;
      }
      const part: Table = { ...table, title, rows: rows.slice(0, Math.max(1, fits)) };
      pages.at(-1)?.push(part);
      left -= TITLE_PX + tableHeight(part) + GAP_PX;
      rows = rows.slice(part.rows.length);
      title = `${table.title ?? ""}, CONTINUED`;
    }
  }
  return pages.filter((page) => page.length > 0);
}

/** How many of the rows fit a height, from the first. */
function rowsWithin(table: Table, rows: readonly (readonly string[])[], heightPx: number): number {
  let free = heightPx;
  const first = rows.findIndex((row) => { free -= rowHeight(table, row); return free < 0; });
  return first === -1 ? rows.length : first;
}

/** What the licensee accepted in writing, which the rule line of every sheet points to. */
function acceptedTable(context: SheetContext, widthPx: number): Table {
  const rows = (context.check?.findings ?? []).flatMap((finding) => (finding.accepted ? [[finding.message, finding.citation, finding.accepted.reason, finding.accepted.by, finding.accepted.license, finding.accepted.on]] : []));
  const heads = ["Finding", "Section", "Accepted because", "By", "License", "Date"].map((head) => ({ head }));
  return { title: "ACCEPTED IN WRITING", columns: narrowed(fitColumns(heads, rows, 440), widthPx), rows };
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
    acceptedTable(context, width),
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
