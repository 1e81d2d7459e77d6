import { z } from "zod";
import { portDataSchema, sourceSchema, type PortData } from "@/lib/diagram/schema";
import type { PropertyValue } from "@/lib/equipment/define";
import type { FileAnswer } from "./files";
import { filledLine, line } from "./text";

/**
 * What one version of an entry holds: exactly what a drawing's equipment holds, so that placing is copying. Which
 * properties there are, and their bounds, follows from the kind (lib/equipment).
 */
export const libraryData = z.strictObject({
  props: z.record(z.string().max(48), z.union([z.number(), line(400), z.boolean(), z.null()])),
  sources: z.record(z.string().max(48), sourceSchema),
  ports: z.record(z.string().max(24), portDataSchema),
});
export interface LibraryData {
  props: Record<string, PropertyValue>;
  sources: Record<string, z.infer<typeof sourceSchema>>;
  ports: Record<string, PortData>;
}

export const libraryEntryInput = z.strictObject({ kind: z.string().max(40), name: filledLine(120), data: libraryData, note: line(300).default("") });
export type LibraryEntryInput = z.input<typeof libraryEntryInput>;
/** A change makes a new version; `baseVersion` is the one that was edited, so that two people cannot overwrite each other unseen. */
export const libraryEntryChange = z.strictObject({
  baseVersion: z.number().int().min(1), name: filledLine(120).optional(), data: libraryData.optional(), note: line(300).default(""), archived: z.boolean().optional(),
});
export type LibraryEntryChange = z.input<typeof libraryEntryChange>;
export const libraryQuery = z.strictObject({
  q: line(120).default(""), kind: z.string().max(40).optional(), archived: z.enum(["yes", "no"]).default("no"),
  limit: z.coerce.number().int().min(1).max(200).default(50), offset: z.coerce.number().int().min(0).max(1_000_000).default(0),
});

/** One line of the library's list. `keyRating` is what a drawing prints beside the tag, without maker and model. `rated`/`sourced` count the rated properties that have a value, and of those the ones with a source. */
export interface LibraryLine {
  id: string; kind: string; name: string; make: string; model: string; keyRating: string; version: number; archived: boolean; starter: boolean; rated: number; sourced: number; changedAt: string;
}
export interface LibraryVersionLine { version: number; by: string; at: string; note: string }
export interface LibraryEntryAnswer extends LibraryLine {
  companyId: string; data: LibraryData; versions: LibraryVersionLine[]; files: FileAnswer[]; usedBy: { jobId: string; number: string; name: string; tags: string[]; version: number }[]; may: { edit: boolean };
}
export interface LibraryListAnswer { entries: LibraryLine[]; total: number; may: { edit: boolean } }
/** One value that differs between the version a drawing was drawn with and the entry as it is now. */
export interface LibraryDifference { path: string; label: string; unit: string; drawn: PropertyValue; now: PropertyValue }
/** Equipment of a drawing whose entry has a later version. `data` is that version, for taking it over. */
export interface LibraryUpdate { equipment: string; tag: string; entryId: string; entryName: string; drawn: number; now: number; archived: boolean; differences: LibraryDifference[]; data: LibraryData }

/** `confirm` is the digest of the preview that is to be carried out; without it nothing is written. */
export const importQuery = z.strictObject({ kind: z.string().max(40), confirm: z.string().max(64).optional() });
export const templateQuery = z.strictObject({ kind: z.string().max(40), fill: z.enum(["yes", "no"]).default("no") });
/** Largest table, bytes. */
export const IMPORT_BYTES = 5 * 1024 * 1024;
/** What a confirmed import did, in entries. */
export interface ImportAnswer { added: number; changed: number; same: number }
/** Entries that can be placed in a job's drawing, with their values. */
export interface JobLibraryAnswer { entries: (LibraryLine & { data: LibraryData })[] }
export interface LibraryVersionAnswer { version: number; data: LibraryData; by: string; at: string; note: string }
/** One cell that was not understood: row as a spreadsheet numbers it (the heading is row 1), the column's heading, what stood there and why it was not taken. */
export interface ImportFault { row: number; column: string; value: string; reason: string }
export interface ImportRow { row: number; name: string; action: "add" | "new version" | "same"; data: LibraryData; entryId: string | null; baseVersion: number | null }
/** What an import would do. Nothing is written until it is confirmed with the same `digest`. */
export interface ImportPreview { kind: string; digest: string; total: number; good: ImportRow[]; faults: ImportFault[]; unknownColumns: string[] }
