import "server-only";
import { CsvError, parse } from "csv-parse/sync";
import { Problem } from "./problem";

const unreadable = (detail: string) => new Problem(422, "table", "The table cannot be read", detail, { field: "file" });

const starts = (bytes: Uint8Array, ...first: number[]): boolean => first.every((byte, index) => bytes[index] === byte);

/**
 * Rows of a CSV file, headings first, cells as they stand. Commas, semicolons and tabs divide cells, whichever the headings use most;
 * a quoted cell may hold line breaks. An empty line is a row, so that rows count as a spreadsheet numbers them.
 * @throws Problem 422 naming the line where it is broken
 */
export function readTable(bytes: Uint8Array): string[][] {
  if (bytes.length === 0) throw unreadable("The file is empty.");
  if (starts(bytes, 0x50, 0x4b) || starts(bytes, 0xd0, 0xcf)) throw unreadable("This is a spreadsheet's own file. Save the sheet as CSV (UTF-8) and take that one.");
  if (starts(bytes, 0xff, 0xfe) || starts(bytes, 0xfe, 0xff)) throw unreadable("The file is written in UTF-16. Save it as CSV (UTF-8).");
  let text: string;
  try {
    text = new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    throw unreadable("The file holds characters that are not UTF-8. Save it as CSV (UTF-8).");
  }
  if (text.includes("\u0000")) throw unreadable("The file is no text.");
  try {
    const rows = parse(text, { bom: true, delimiter: delimiterOf(text), relax_column_count: true, skip_empty_lines: false, record_delimiter: ["\r\n", "\n", "\r"] });
    return rows.map((row, index) => (index === 0 ? withoutEnd(row.map((cell) => cell.trim())) : row));
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    const line = typeof error["lines"] === "number" ? ` at line ${error["lines"]}` : "";
    throw unreadable(`A quotation mark is missing or stands too much${line}. A cell that holds one writes it twice and is itself quoted.`);
  }
}

/** Spreadsheets write empty headings after the last one. */
function withoutEnd(headings: string[]): string[] {
  const last = headings.findLastIndex((heading) => heading !== "");
  return headings.slice(0, last + 1);
}

/** Sign that divides most cells of the first line, outside of quotation marks. */
function delimiterOf(text: string): string {
  const counts = new Map([[",", 0], [";", 0], ["\t", 0]]);
  let quoted = false;
  for (const sign of text.slice(0, 20_000)) {
    if (sign === "\"") quoted = !quoted;
    else if (!quoted && (sign === "\n" || sign === "\r")) break;
    else if (!quoted && counts.has(sign)) counts.set(sign, (counts.get(sign) ?? 0) + 1);
  }
  return [...counts].reduce((most, each) => (each[1] > most[1] ? each : most))[0];
}

/** CSV text that spreadsheets open as UTF-8 (RFC 4180, with a byte order mark). Cells must be made harmless before. */
export function writeTable(rows: readonly (readonly string[])[]): string {
  const cell = (text: string) => (/[",;\r\n\t]/.test(text) ? `"${text.replaceAll("\"", "\"\"")}"` : text);
  return `\ufeff${rows.map((row) => row.map(cell).join(",")).join("\r\n")}\r\n`;
}
