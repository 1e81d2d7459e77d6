import type { Finding } from "@/lib/rules/engine/types";

/** Shape of a redline's mark: the same on the sheet, in the margin and in lists. */
export type MarkKind = "must" | "should" | "data" | "note";

export const MARK_WORDS: Readonly<Record<MarkKind, string>> = { must: "must-fix", should: "should-fix", data: "needs data", note: "note" };

export const markKind = (finding: Pick<Finding, "kind" | "severity">): MarkKind =>
  finding.kind === "needs-data" ? "data" : finding.severity === "must-fix" ? "must" : finding.severity === "should-fix" ? "should" : "note";

const ORDER: readonly MarkKind[] = ["must", "should", "data", "note"];
/** Redlines as numbered in margin and on the sheet: must-fix first, then in the order in which the checker found them. Accepted ones carry no number. */
export function numbered(findings: readonly Finding[]): readonly { finding: Finding; number: number; kind: MarkKind }[] {
  return findings
    .filter((finding) => !finding.accepted)
    .map((finding, index) => ({ finding, index, kind: markKind(finding) }))
    .sort((a, b) => ORDER.indexOf(a.kind) - ORDER.indexOf(b.kind) || a.index - b.index)
    .map(({ finding, kind }, index) => ({ finding, kind, number: index + 1 }));
}
