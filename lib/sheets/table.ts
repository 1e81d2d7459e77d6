import { fitText, letter, textWidth, wrapText } from "./lettering";
import { LETTERING, WEIGHTS, box, n, path, text, type Anchor, type Primitive } from "./primitives";

export interface Column { head: string; width: number; anchor?: Anchor }
export interface Table {
  title?: string;
  columns: readonly Column[];
  rows: readonly (readonly string[])[];
  rowPx?: number;
}
const PAD = 5;
/** Height of a row of one line, and of every further line in it, px. */
export const ROW_PX = 17;
const LINE_PX = 13.5;
/** Cell lettering stands on this line over the row's lower edge, px, for a row of the given height. */
const rise = (rowPx: number): number => (rowPx - LETTERING.note.size * 0.72) / 2;

/** Width of a table, px. */
export const tableWidth = (table: Table): number => table.columns.reduce((sum, column) => sum + column.width, 0);
/** Lines of words within a column; a single word that is too wide is cut with a mark. */
const linesIn = (words: string, column: Column): string[] =>
  wrapText(letter(words), LETTERING.note.size, "narrow", column.width - 2 * PAD + 1).map((line) => fitText(line, LETTERING.note.size, "narrow", column.width - 2 * PAD + 2));
export const headPx = (table: Table, rowPx = ROW_PX): number => rowPx + (Math.max(1, ...table.columns.map((column) => linesIn(column.head, column).length)) - 1) * LINE_PX;
/** Height of one row, px: as many lines as its fullest cell takes. */
export const rowHeight = (table: Table, row: readonly string[]): number =>
  (table.rowPx ?? ROW_PX) + (Math.max(1, ...table.columns.map((column, i) => linesIn(row[i] ?? "", column).length)) - 1) * LINE_PX;
/** Height of a table under its title, px. */
export const tableHeight = (table: Table): number => headPx(table, table.rowPx) + table.rows.reduce((sum, row) => sum + rowHeight(table, row), 0);

/**
 * A ruled table with its upper left corner at x, y; the title stands over it.
 * Cells take as many lines as their words need; nothing is drawn over a line.
 */
export function tablePrimitives(x: number, y: number, table: Table): Primitive[] {
  const rowPx = table.rowPx ?? ROW_PX;
  const head = headPx(table, rowPx);
  const width = tableWidth(table);
  const height = tableHeight(table);
  const edges = table.columns.map((_, i) => x + table.columns.slice(0, i).reduce((sum, c) => sum + c.width, 0));
  let at = y + head;
  const tops = table.rows.map((row) => { const top = at; at += rowHeight(table, row); return top; });
  const lines = [
    ...edges.slice(1).map((edge) => `M${n(edge)} ${n(y)}V${n(y + height)}`),
    ...tops.slice(1).map((top) => `M${n(x)} ${n(top)}H${n(x + width)}`),
  ].join("");
  return [
    ...(table.title ? [text(x, y - 6, letter(table.title), "tag", { size: 15, bold: 0.45 })] : []),
    box(x, y, width, height, { weight: WEIGHTS.tableOutline }),
    path(`M${n(x)} ${n(y + head)}H${n(x + width)}${lines}`, { weight: WEIGHTS.tableLine, layer: "ground" }),
    ...table.columns.flatMap((column, i) => linesIn(column.head, column).flatMap((line, k, all) =>
      cell(line, edges[i] as number, column, y + head - rise(rowPx) - (all.length - 1 - k) * LINE_PX, "ink2"))),
    ...table.rows.flatMap((row, r) => table.columns.flatMap((column, i) => linesIn(row[i] ?? "", column).flatMap((line, k) =>
      cell(line, edges[i] as number, column, (tops[r] as number) + rowPx - rise(rowPx) + k * LINE_PX, "ink")))),
  ];
}

function cell(words: string, edge: number, column: Column, baseline: number, ink: "ink" | "ink2"): Primitive[] {
  if (!words) return [];
  const anchor = column.anchor ?? "start";
  const at = anchor === "start" ? edge + PAD : anchor === "end" ? edge + column.width - PAD : edge + column.width / 2;
  return [text(at, baseline, words, "note", { anchor, ink })];
}

/** Column widths that fit their words, no wider than `most`, px. */
export function fitColumns(columns: readonly Omit<Column, "width">[], rows: readonly (readonly string[])[], most = 400): Column[] {
  return columns.map((column, i) => {
    const heads = letter(column.head).split(" ").map((word) => textWidth(word, 13, "narrow"));
    const cells = rows.map((row) => textWidth(letter(row[i] ?? ""), 13, "narrow"));
    return { ...column, width: Math.min(most, Math.ceil(Math.max(...heads, ...cells, 14) + 2 * PAD + 1)) };
  });
}
