import "server-only";
import type { LibraryData, LibraryLine } from "@/lib/api";
import { equipmentDataFaults, keyRating, ratedCounts, wholeEquipmentData } from "@/lib/equipment/libraryData";
import { isKindId, kindDefinition } from "@/lib/equipment/registry";
import { STARTER_SOURCE } from "@/lib/equipment/starter";
import type { LibraryEntry } from "@/models";
import { Problem, unprocessable } from "@/lib/server/http/problem";

const text = (value: unknown): string => (typeof value === "string" ? value : "");

/** Maker and model as the entry's columns keep them, empty where the kind has none or they are not known. */
export const identityOf = (data: LibraryData): { make: string; model: string } => ({ make: text(data.props["make"]), model: text(data.props["model"]) });

/**
 * The data with every property of its kind.
 * @throws Problem 422 naming each wrong field, from `data` on
 */
export function soundData(kind: string, data: LibraryData): LibraryData {
  const definition = knownKind(kind);
  const faults = equipmentDataFaults(definition, data);
  if (faults.length === 0) return wholeEquipmentData(definition, data);
  const errors = faults.slice(0, 20).map((fault) => ({ field: `data${fault.path.replaceAll("/", ".")}`, detail: fault.message }));
  const [first] = errors;
  throw new Problem(422, "field", "Something in the request is wrong", `${first?.field}: ${first?.detail}`, { field: first?.field, errors });
}

/** @throws Problem 422 when there is no such kind of equipment */
export function knownKind(kind: string): ReturnType<typeof kindDefinition> {
  if (!isKindId(kind)) throw unprocessable("kind", "is no kind of equipment");
  return kindDefinition(kind);
}

/** Whether values of the starter set are left in it, by what stands as their source. */
export const stillInvented = (data: LibraryData): boolean => Object.values(data.sources).some((source) => source.document === STARTER_SOURCE.document);

/** A stored version with the properties its kind has today. */
export const readData = (kind: string, data: LibraryData): LibraryData => (isKindId(kind) ? wholeEquipmentData(kindDefinition(kind), data) : data);

/** Line of the list, from an entry and the data of its current version. */
export function libraryLine(row: LibraryEntry, data: LibraryData): LibraryLine {
  return {
    id: row.id, kind: row.kind, name: row.name, make: row.make, model: row.model, keyRating: isKindId(row.kind) ? keyRating(kindDefinition(row.kind), data) : "", version: row.currentVersion, archived: row.archivedAt !== null,
    starter: row.starter, ...(isKindId(row.kind) ? ratedCounts(kindDefinition(row.kind).properties, data) : { rated: 0, sourced: 0 }), changedAt: row.updatedAt.toISOString(),
  };
}
