import { propertyFault } from "@/lib/diagram/check";
import type { KindDefinition, Property, PropertyValue } from "./define";
import type { EquipmentData } from "./libraryData";

/*
 * A kind's library as a table: one entry a row. Values at ports are not in it; a change by table leaves them as they are.
 */

/** What a column holds: the entry's name, a property, or where a rated property was read. */
export type TableColumn =
  | { holds: "name"; heading: string; accepted: readonly string[] }
  | { holds: "value" | "document" | "page"; heading: string; accepted: readonly string[]; property: string };

const withUnit = (property: Property): string => (property.type === "number" && property.unit ? `${property.label} (${property.unit})` : property.label);

/** Columns of a kind in order. A heading with another unit is another heading: nothing is converted. */
export function tableColumns(definition: KindDefinition): TableColumn[] {
  const columns: TableColumn[] = [{ holds: "name", heading: "Name", accepted: ["name"] }];
  for (const [property, each] of Object.entries(definition.properties)) {
    // The utility's name is a property like any other, and the heading of the entry's own name is taken.
    const own = property === "name" ? [] : [property];
    const column = (holds: "value" | "document" | "page", heading: string, more: readonly string[]): TableColumn =>
      ({ holds, heading, property, accepted: [heading, ...more].map(plainHeading) });
    columns.push(column("value", withUnit(each), own));
    if (each.rated) for (const [holds, word] of [["document", "datasheet"], ["page", "page"]] as const) columns.push(column(holds, `${each.label}: ${word}`, own.map((name) => `${name}: ${word}`)));
  }
  return columns;
}

/** A heading as it is compared: letter case and blanks do not matter. */
export const plainHeading = (heading: string): string => heading.replace(/\s+/g, " ").trim().toLowerCase();

/** A cell that begins like a formula would be run by a spreadsheet that opens the file. */
const FORMULA = /^'*[=+\-@\t\r]/;
const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i;

const CELL_LENGTH = 400;

/** A cell's text as it is written out, made harmless where a spreadsheet would take it for a formula. */
export const guardedCell = (text: string): string => (FORMULA.test(text) && !NUMBER.test(text) ? `'${text}` : text);
/** Takes off again what `guardedCell` put on. */
export const openedCell = (text: string): string => (text.startsWith("'") && FORMULA.test(text) ? text.slice(1) : text);

/** A property's value as a cell; what is not known is an empty one. */
export function cellOf(value: PropertyValue): string {
  if (value === null) return "";
  return typeof value === "boolean" ? (value ? "yes" : "no") : guardedCell(String(value));
}

export type CellReading = { value: PropertyValue } | { fault: string };

/** Reads a cell as a value of the property, or says why it is none. Nothing is guessed: a comma may be a decimal or a thousands mark. */
export function readCell(property: Property, cell: string): CellReading {
  const given = cell.trim();
  if (given === "") return { value: null };
  if (given.length > CELL_LENGTH) return { fault: `is longer than ${CELL_LENGTH} characters` };
  const value = property.type === "number" ? numberOf(property.unit, given) : property.type === "flag" ? flagOf(given)
    : property.type === "choice" ? { value: property.options.find((option) => option.toLowerCase() === given.toLowerCase()) ?? given } : textOf(given);
  if ("fault" in value) return value;
  const fault = propertyFault(property, value.value);
  return fault ? { fault } : value;
}

function numberOf(unit: string, given: string): CellReading {
  if (NUMBER.test(given)) return { value: Number(given) };
  if (/^[+-]?[\d.,\s']*,[\d.,\s']*$/.test(given)) return { fault: "has a comma; write decimals with a point, and thousands without a mark" };
  if (/^[+-]?[\d.]+\s*\D+$/.test(given)) return { fault: unit ? `must be the number alone; the column is in ${unit}` : "must be the number alone" };
  return { fault: "must be a number" };
}

function flagOf(given: string): CellReading {
  const word = given.toLowerCase();
  if (word === "yes" || word === "true") return { value: true };
  return word === "no" || word === "false" ? { value: false } : { fault: "must be yes or no" };
}

/** Text of one line. */
export function textOf(given: string): { value: string } | { fault: string } {
  const text = openedCell(given).trim();
  if (/[\r\n]/.test(text)) return { fault: "holds a line break; write it on one line" };
  return /[\u0000-\u001f\u007f]/.test(text) ? { fault: "holds a control character" } : { value: text };
}

/** Cells of one entry under the columns. */
export function entryCells(columns: readonly TableColumn[], name: string, data: EquipmentData): string[] {
  return columns.map((column) => {
    if (column.holds === "name") return guardedCell(name);
    if (column.holds === "value") return cellOf(data.props[column.property] ?? null);
    return guardedCell(data.sources[column.property]?.[column.holds] ?? "");
  });
}
