import { z } from "zod";
import type { Drawing } from "@/lib/diagram/schema";
import type { CheckResult } from "@/lib/rules/engine/types";
import type { Refusal, RevisionState, Signer } from "@/lib/workflow";
import { filledLine, filledParagraph, line } from "./text";

export const PURPOSES = ["issued for permit", "plan-check response", "issued for construction", "field change", "as-built"] as const;
export const issueInput = z.strictObject({ purpose: filledLine(80), description: line(200).default("") });
export type IssueInput = z.input<typeof issueInput>;
export const returnInput = z.strictObject({ comment: filledParagraph(4000) });
export const acceptInput = z.strictObject({ findingKey: z.string().min(1).max(400), reason: filledParagraph(600) });
export const sealInput = z.strictObject({ password: z.string().min(1, "is missing").max(200) });

export interface SheetSetAnswer {
  kind: "preview" | "sealed"; state: "queued" | "drawing" | "ready" | "failed";
  /** SHA-256 of the file, hex; it stands nowhere in the file. */
  fileDigest: string | null; bytes: number | null; sheets: number | null; error: string | null; finishedAt: string | null;
}
export interface SealAnswer {
  licensee: string; title: string; licenseState: string; licenseNumber: string; licenseExpiresOn: string; sealCode: string; sealedAt: string;
}
export interface RevisionAnswer {
  id: string; jobId: string; jobNumber: string; jobName: string; letter: string; issue: number; purpose: string; description: string;
  state: RevisionState; issuedBy: string; issuedAt: string; returnedBy: string | null; returnedAt: string | null; returnComment: string | null;
  voidedAt: string | null; supersededAt: string | null;
  digest: string; ruleSet: string; drawing: Drawing; check: CheckResult;
  /** The authority and whom it asks to sign, as on the day of issue. */
  jurisdiction: { name: string; signs: Signer } | null;
  /** Last sealed revision before this one, to compare with. */
  previous: { id: string; letter: string } | null;
  seal: SealAnswer | null; preview: SheetSetAnswer | null; sealedSet: SheetSetAnswer | null;
  /** What stands in the way of a seal by the person who asks; empty when nothing does. */
  sealRefusals: Refusal[];
  may: { return: boolean; accept: boolean; seal: boolean; download: boolean; preview: boolean };
}
export interface RevisionStatus { id: string; state: RevisionState; preview: SheetSetAnswer | null; sealedSet: SheetSetAnswer | null }

/** One job at the permit counter. `current` is the sealed revision in force, also when its seal is void. */
export interface CounterLine {
  jobId: string; number: string; name: string; addressLines: string; permitNumber: string; jurisdiction: string | null;
  current: { letter: string; state: RevisionState; sealedAt: string; licensee: string } | null;
}
export interface CounterRevision {
  id: string; letter: string; purpose: string; description: string; state: RevisionState; seal: SealAnswer; sheetSet: SheetSetAnswer;
  voidedAt: string | null; supersededAt: string | null; drawingDigest: string; ruleSet: string; edition: string; rulesRun: number; counts: CheckResult["counts"];
}
export interface CounterAnswer extends Omit<CounterLine, "current"> { parcel: string; revisions: CounterRevision[] }
