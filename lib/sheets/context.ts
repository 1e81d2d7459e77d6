import type { DrawingGraph } from "@/lib/diagram/graph";
import type { Drawing } from "@/lib/diagram/schema";
import type { CheckResult } from "@/lib/rules/engine/types";
import type { StateSpace } from "@/lib/states/types";
import type { Primitive } from "./primitives";

/** One line of the revision table. `date` is YYYY-MM-DD. */
export interface RevisionLine { letter: string; description: string; date: string; by: string }
/** The seal as it is printed. Dates are YYYY-MM-DD, in the time zone of the seal. */
export interface SealOnSheet {
  licensee: string;
  title: string;
  state: string;
  number: string;
  expiresOn: string;
  signedOn: string;
  sealCode: string;
  /** PNG of the licensee's seal as a data address; null draws a ring seal from the words above. A preview of sealed sheets points to the file. */
  graphic: { href: string; widthPx: number; heightPx: number } | "in the file" | null;
  /** Printed in the ring, for example DEMONSTRATION ONLY; empty takes the state. */
  legend: string;
}
/** What a sheet prints about the check. */
export type CheckOnSheet = Pick<CheckResult, "ruleSet" | "edition" | "digest" | "rulesRun" | "counts" | "findings">;

/** Everything that sheets are drawn from. All of it is handed in; nothing here asks a clock or a store. */
export interface SheetContext {
  drawing: Drawing;
  graph: DrawingGraph;
  states: StateSpace;
  /** Null before the first check, on a preview of the draft. */
  check: CheckOnSheet | null;
  /** SHA-256 of the canonical drawing with rule set and edition, hex. */
  digest: string;
  revisions: readonly RevisionLine[];
  seal: SealOnSheet | null;
  /** Words in the seal's place while there is none. */
  sealPlace: "NOT SEALED" | "DRAFT";
}
/** Words that only the frame of a sheet needs. */
export interface SheetWords { number: string; title: string; subtitle: string; index: number; count: number; scale: string }
/** One sheet: a picture of a given size. Inches are those of the plotted sheet at full size. */
export interface SheetPage { number: string; title: string; widthIn: number; heightIn: number; widthPx: number; heightPx: number; primitives: Primitive[] }
