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
/** Cell lettering stands on this line over the row's lower edge, px, for a row of the given height. */
const rise = (rowPx: number): number => (rowPx - LETTERING.note.size * 0.72) / 2;

/** Width of a table, px. */
export const tableWidth = (table: Table): number => table.columns.reduce((sum, column) => sum + column.width, 0);
/** Lines of a column's head, broken so that it fits. */
export const headLines = (column: Column): string[] => wrapText(letter(column.head), 13, "narrow", column.width - 2 * PAD + 1);
export const headPx = (table: Table, rowPx = 17): number => rowPx + (Math.max(1, ...table.columns.map((c) => headLines(c).length)) - 1) * 13;
/** Height of a table under its title, px. */
export const tableHeight = (table: Table): number => headPx(table, table.rowPx) + table.rows.length * (table.rowPx ?? 17);

/**
 * A ruled table with its upper left corner at x, y; the title stands over it.
 * Words that do not fit a cell are cut with a mark, never drawn over a line.
 */
export function tablePrimitives(x: number, y: number, table: Table): Primitive[] {
  const rowPx = table.rowPx ?? 17;
  const head = headPx(table, rowPx);
  const width = tableWidth(table);
  const height = tableHeight(table);
  const edges = table.columns.map((_, i) => x + table.columns.slice(0, i).reduce((sum, c) => sum + c.width, 0));
  const lines = [
    ...edges.slice(1).map((edge) => `M${n(edge)} ${n(y)}V${n(y + height)}`),
    ...table.rows.slice(1).map((_, i) => `M${n(x)} ${n(y + head + (i + 1) * rowPx)}H${n(x + width)}`),
  ].join("");
  const cell = (words: string, i: number, baseline: number): Primitive[] => {
    const column = table.columns[i] as Column;
    const fitted = fitText(letter(words), 13, "narrow", column.width - 2 * PAD + 2);
    if (!fitted) return [];
    const anchor = column.anchor ?? "start";
    const edge = edges[i] as number;
    const at = anchor === "start" ? edge + PAD : anchor === "end" ? edge + column.width - PAD : edge + column.width / 2;
    return [text(at, baseline, fitted, "note", { anchor })];
  };
  return [
    ...(table.title ? [text(x, y - 6, letter(table.title), "tag", { size: 15, bold: 0.45 })] : []),
    box(x, y, width, height, { weight: WEIGHTS.tableOutline }),
    path(`M${n(x)} ${n(y + head)}H${n(x + width)}${lines}`, { weight: WEIGHTS.tableLine, layer: "ground" }),
    ...table.columns.flatMap((column, i) => headLines(column).flatMap((line, k, all) => cellHead(line, edges[i] as number, column, y + head - rise(rowPx) - (all.length - 1 - k) * 13))),
    ...table.rows.flatMap((row, r) => row.flatMap((words, i) => (table.columns[i] ? cell(words, i, y + head + (r + 1) * rowPx - rise(rowPx)) : []))),
  ];
}

function cellHead(words: string, edge: number, column: Column, baseline: number): Primitive[] {
  const anchor = column.anchor ?? "start";
  const at = anchor === "start" ? edge + PAD : anchor === "end" ? edge + column.width - PAD : edge + column.width / 2;
  return [text(at, baseline, fitText(words, 13, "narrow", column.width - 2 * PAD + 2), "note", { anchor, ink: "ink2" })];
}

/** Column widths that fit their words, no wider than `most`, px. */
export function fitColumns(columns: readonly Omit<Column, "width">[], rows: readonly (readonly string[])[], most = 400): Column[] {
  return columns.map((column, i) => {
    const heads = letter(column.head).split(" ").map((word) => textWidth(word, 13, "narrow"));
    const cells = rows.map((row) => textWidth(letter(row[i] ?? ""), 13, "narrow"));
    return { ...column, width: Math.min(most, Math.ceil(Math.max(...heads, ...cells, 14) + 2 * PAD + 1)) };
  });
}
