import type { KindDefinition } from "./define";
import { equipmentDataFaults, wholeEquipmentData, type EquipmentData } from "./libraryData";
import { readCell, textOf, type TableColumn } from "./libraryTable";

export interface CellFault { column: string; value: string; reason: string }
/** A cell as it was found: `column` is null where the heading is not one of the kind's. */
export interface Cell { column: TableColumn | null; heading: string; text: string }

const NAME_LENGTH = 120;
const LENGTH = { document: 120, page: 40 } as const;

/** Name in a row, or what is wrong with it. */
export function rowName(cells: readonly Cell[]): { name: string } | { fault: CellFault } {
  const cell = cells.find((each) => each.column?.holds === "name");
  const refuse = (reason: string) => ({ fault: { column: cell?.heading ?? "Name", value: shown(cell?.text ?? ""), reason } });
  const read = textOf(cell?.text ?? "");
  if ("fault" in read) return refuse(read.fault);
  if (read.value === "") return refuse("is missing");
  return read.value.length > NAME_LENGTH ? refuse(`is longer than ${NAME_LENGTH} characters`) : { name: read.value };
}

/** What stood in a cell, short enough to be shown. */
export const shown = (text: string): string => (text.length > 80 ? `${text.slice(0, 79)}…` : text);

/**
 * Values of a row on top of what the entry holds. A column that is not in the table leaves its values; an empty cell makes them not known.
 * @returns the whole data, and every cell that could not be taken; with faults the data is of no use
 */
export function rowData(definition: KindDefinition, cells: readonly Cell[], before: EquipmentData | null): { data: EquipmentData; faults: CellFault[] } {
  // A new entry starts with nothing: what a kind has by default is what one mostly meets, not what this product is.
  const base = before ?? { props: {}, sources: {}, ports: {} };
  const data = { ...wholeEquipmentData(definition, base), sources: { ...base.sources } };
  const faults: CellFault[] = [];
  const headings = new Map<string, Cell>();
  for (const cell of cells) {
    const { column } = cell;
    if (column === null || column.holds === "name") continue;
    const property = definition.properties[column.property];
    if (!property) continue;
    const fault = (reason: string) => faults.push({ column: cell.heading, value: shown(cell.text), reason });
    if (column.holds === "value") {
      headings.set(column.property, cell);
      const read = readCell(property, cell.text);
      if ("fault" in read) fault(read.fault);
      else data.props[column.property] = read.value;
      continue;
    }
    const read = textOf(cell.text);
    if ("fault" in read) fault(read.fault);
    else if (read.value.length > LENGTH[column.holds]) fault(`is longer than ${LENGTH[column.holds]} characters`);
    else setSource(data, column.property, column.holds, read.value);
  }
  if (faults.length > 0) return { data, faults };
  for (const [name, source] of Object.entries(data.sources)) {
    if (source.document !== "") continue;
    const page = cells.find(({ column }) => column?.holds === "page" && column.property === name);
    if (source.page !== "" && page) faults.push({ column: page.heading, value: shown(page.text), reason: "is a page without a datasheet" });
    else delete data.sources[name];
  }
  // What is left are values that do not go together, such as a port that the number of trackers no longer gives.
  for (const { path, message } of faults.length > 0 ? [] : equipmentDataFaults(definition, data)) {
    const [, part = "", name = ""] = path.split("/");
    const cell = part === "props" ? headings.get(name) : undefined;
    faults.push({ column: cell?.heading ?? "Name", value: shown(cell?.text ?? ""), reason: cell ? message : `${part === "ports" ? "port " : ""}${name}: ${message}` });
  }
  return { data, faults };
}

function setSource(data: EquipmentData, property: string, part: "document" | "page", value: string): void {
  const before = data.sources[property] ?? { document: "", page: "" };
  const { file, ...rest } = before;
  // The stored file belongs to the document that was named with it.
  const keep = part === "page" || before.document === value;
  data.sources[property] = { ...rest, [part]: value, ...(keep && file ? { file } : {}) };
}
