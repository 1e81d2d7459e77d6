/** A block of cells as tab-separated lines, the way every spreadsheet copies: a cell with tab, break or quote is quoted. */
export function toTabbed(cells: readonly (readonly string[])[]): string {
  const cell = (text: string): string => (/[\t\n\r"]/.test(text) ? `"${text.replace(/"/g, "\"\"")}"` : text);
  return cells.map((row) => row.map(cell).join("\t")).join("\n");
}

/** Cells of pasted text. One trailing line break is the end of the last line, not a further line. */
export function fromTabbed(text: string): string[][] {
  const rows: string[][] = [[]];
  let cell = "";
  let quoted = false;
  const endCell = (): void => { (rows.at(-1) as string[]).push(cell); cell = ""; };
  const source = text.replace(/\r\n?/g, "\n").replace(/\n$/, "");
  for (let i = 0; i < source.length; i++) {
    const char = source[i] as string;
    if (quoted) {
      if (char !== "\"") cell += char;
      else if (source[i + 1] === "\"") { cell += char; i++; }
      else quoted = false;
    } else if (char === "\"" && cell === "") quoted = true;
    else if (char === "\t") endCell();
    else if (char === "\n") { endCell(); rows.push([]); }
    else cell += char;
  }
  endCell();
  return rows;
}

/** Rectangle of cells, ends included. */
export interface CellRange { readonly top: number; readonly left: number; readonly bottom: number; readonly right: number }
export interface CellPlace { readonly row: number; readonly column: number }

export const rangeOf = (a: CellPlace, b: CellPlace): CellRange => ({
  top: Math.min(a.row, b.row), bottom: Math.max(a.row, b.row), left: Math.min(a.column, b.column), right: Math.max(a.column, b.column),
});
export const inRange = (range: CellRange, row: number, column: number): boolean =>
  row >= range.top && row <= range.bottom && column >= range.left && column <= range.right;

/**
 * Where each pasted cell goes. One pasted cell (or one pasted row or column) fills the selected range when that is a
 * multiple of it; otherwise the block starts at the range's corner. Cells beyond the grid are left out and counted.
 */
export function placePaste(block: readonly (readonly string[])[], range: CellRange, rows: number, columns: number): { cells: { row: number; column: number; text: string }[]; outside: number } {
  const height = block.length;
  const width = Math.max(0, ...block.map((line) => line.length));
  if (height === 0 || width === 0) return { cells: [], outside: 0 };
  const tall = range.bottom - range.top + 1;
  const wide = range.right - range.left + 1;
  const down = tall % height === 0 ? tall : height;
  const across = wide % width === 0 ? wide : width;
  const cells: { row: number; column: number; text: string }[] = [];
  let outside = 0;
  for (let r = 0; r < down; r++) {
    for (let c = 0; c < across; c++) {
      const text = block[r % height]?.[c % width];
      if (text === undefined) continue;
      if (range.top + r >= rows || range.left + c >= columns) outside++;
      else cells.push({ row: range.top + r, column: range.left + c, text });
    }
  }
  return { cells, outside };
}
