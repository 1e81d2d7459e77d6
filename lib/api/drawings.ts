import { z } from "zod";
import type { Drawing } from "@/lib/diagram/schema";
import type { PatchOperation } from "@/lib/rules/engine/types";
import { line } from "./text";

/** Largest request body, bytes. */
export const BODY_BYTES = 5 * 1024 * 1024;
/** Most operations in one save. */
export const OPERATIONS = 5000;

export const operationSchema = z.strictObject({
  op: z.enum(["add", "remove", "replace", "test"]),
  path: z.string().max(400).regex(/^\//, "starts with /"),
  value: z.unknown().optional(),
});
export const saveInput = z.strictObject({
  /** Made by the client for each save; the same id again gets the same answer. */
  saveId: z.uuid(),
  baseSequence: z.number().int().min(0).max(2_000_000_000),
  patches: z.array(operationSchema).min(1, "holds no operation").max(OPERATIONS),
  title: line(200),
});
export type SaveInput = z.input<typeof saveInput>;

/** Somebody's save, as others are told of it. */
export interface JournalEntry { sequence: number; author: string; authorId: string; at: string; title: string; patches: PatchOperation[] }
export interface DrawingAnswer {
  id: string; jobId: string; jobNumber: string; jobName: string; sequence: number; drawing: Drawing; revisionLetter: string;
  may: { edit: boolean; issue: boolean; seal: boolean };
}
/** `rebased` are the operations of others between the base and this save, to be put under the person's own edits. */
export interface SaveAnswer { sequence: number; rebased: PatchOperation[] }
/** Members of the 409 answer, beside those of every problem. `edits` says who made `theirs`, when and under which name. */
export interface SaveConflict {
  theirs: PatchOperation[]; edits: JournalEntry[]; yours: PatchOperation[]; overlapping: string[]; sequence: number; drawing: Drawing;
}
