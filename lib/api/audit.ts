import { z } from "zod";
import { line } from "./text";

/** Kinds of what is recorded, as a list offers them; `prefixes` are what an action's name begins with before its first dot. */
export const RECORD_KINDS = [
  { id: "jobs", label: "Jobs and site visits", prefixes: ["job", "visit"] },
  { id: "drawing", label: "Drawing edits", prefixes: ["drawing"] },
  { id: "revisions", label: "Revisions and seals", prefixes: ["revision", "finding", "sheets"] },
  { id: "files", label: "Files", prefixes: ["file"] },
  { id: "library", label: "Equipment library", prefixes: ["library"] },
  { id: "jurisdictions", label: "Jurisdictions", prefixes: ["jurisdiction"] },
  { id: "people", label: "People and roles", prefixes: ["person", "member"] },
  { id: "accounts", label: "Accounts and licenses", prefixes: ["account", "password", "license"] },
  { id: "company", label: "Company and records", prefixes: ["company", "records"] },
] as const;
/** Everything but the kind of which there are most. */
export const ALL_BUT_DRAWING = "but-drawing";
/** The worker process, which acts for nobody. */
export const BY_ITSELF = "itself";

const moment = z.union([z.iso.date(), z.iso.datetime({ offset: true })], "takes a day such as 2026-12-31, or a moment");
const filters = {
  /** Words that all have to stand in an entry: who, which job, what and its details. */
  q: line(120).default(""),
  /** A kind of RECORD_KINDS, ALL_BUT_DRAWING, or the name of one action. */
  action: z.string().regex(/^[a-z][a-z.-]{0,59}$/, "is no action").optional(),
  person: z.union([z.uuid(), z.literal(BY_ITSELF)], "is no person").optional(),
  /** First day (UTC) or first moment. */
  from: moment.optional(),
  /** Last day (UTC), itself included, or the moment before which it was. */
  to: moment.optional(),
};
export const recordsExportQuery = z.strictObject(filters);
export const recordsQuery = z.strictObject({
  ...filters,
  /** `next` of the page before. */
  cursor: z.string().regex(/^\d{1,19}$/, "is no cursor").optional(),
  limit: z.coerce.number().int().min(1).max(100).default(50),
});
export type RecordsFilter = z.output<typeof recordsExportQuery>;

/** Most rows of one file; what is beyond is said in its last row. */
export const EXPORT_ROWS = 100_000;

export interface RecordChange { field: string; before: string; after: string }
export interface RecordLine {
  id: string;
  at: string;
  /** Null: the worker process. */
  person: { id: string; name: string; email: string } | null;
  action: string;
  /** What happened, as a sentence without its subject, and the fact worth a line. */
  words: string;
  note: string | null;
  job: { id: string; number: string; name: string } | null;
  subject: string;
  /** What changed, field by field. */
  changes: RecordChange[];
  /** What else is known of it. */
  facts: { field: string; value: string }[];
  requestId: string | null;
  address: string | null;
  userAgent: string | null;
}
export interface RecordsAnswer {
  records: RecordLine[];
  /** Cursor of the next page; null at the end. */
  next: string | null;
  /** Everybody who may appear in the records, by name; on the first page alone. */
  people?: { id: string; name: string }[];
}
