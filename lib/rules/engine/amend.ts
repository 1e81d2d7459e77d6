import { PREVIEW_REMARK } from "@/lib/code/adoption";
import type { Drawing, Edition } from "@/lib/diagram/schema";
import type { FindingDraft, Limit, RuleMeta, Severity } from "./types";

/** What the jurisdiction changed about one rule. */
export interface Amended {
  off: boolean;
  limits: Readonly<Record<string, Limit>>;
  severity: Severity | null;
  /** Local citations and notes, printed beside the code section. */
  notes: readonly string[];
}

/** Reads the local amendments of a rule. An amended limit replaces the limit it names, or else every limit of the same unit. */
export function amend(drawing: Drawing, meta: RuleMeta): Amended {
  const own = Object.entries(drawing.site.amendments).sort(([a], [b]) => (a < b ? -1 : 1)).map(([, amendment]) => amendment).filter((amendment) => amendment.rule === meta.id);
  const limits: Record<string, Limit> = { ...meta.limits };
  for (const amendment of own) {
    if (amendment.effect !== "limit" || amendment.limit === null) continue;
    for (const [name, limit] of Object.entries(limits)) {
      if (amendment.limitName !== undefined ? amendment.limitName === name : amendment.unit === "" || amendment.unit.split(" ")[0] === limit.unit) limits[name] = { ...limit, value: amendment.limit, source: amendment.citation };
    }
  }
  return {
    off: own.some((amendment) => amendment.effect === "off"),
    limits,
    severity: own.findLast((amendment) => amendment.effect === "severity" && amendment.severity !== null)?.severity ?? null,
    notes: own.map((amendment) => amendment.citation).filter((citation) => citation !== ""),
  };
}

/** Section as printed, with the remark that its number was not read in that edition. */
export function citationOf(meta: RuleMeta, edition: Edition, notes: readonly string[]): { citation: string; verifySection: boolean } {
  const citation = meta.citations.find((one) => one.edition === edition);
  const verifySection = citation !== undefined && citation.book !== "" && citation.confirmation !== "read";
  const remark = !verifySection ? "" : citation?.confirmation === "preview" ? ` (${PREVIEW_REMARK})` : " (section to be verified)";
  const own = !citation ? "" : citation.book === "" ? citation.section : `${citation.book ?? "NEC"} ${edition} ${citation.section}${remark}`;
  return { citation: [own, ...notes].filter((text) => text !== "").join("; "), verifySection };
}

/** Severity after amendments and after what the edition's text allows. */
export function severityOf(meta: RuleMeta, edition: Edition, amended: Amended, draft: Pick<FindingDraft, "severity" | "instruction">): { severity: Severity; verify: boolean } {
  // A local ordinance and the maker's own page speak for themselves; the edition's text need not.
  if (amended.severity !== null) return { severity: amended.severity, verify: false };
  const severity = draft.severity ?? meta.severity;
  if (severity !== "must-fix" || meta.mustFixAllowed[edition]) return { severity, verify: false };
  if (meta.mustFixWith === "instruction" && draft.instruction !== undefined && draft.instruction.trim() !== "") return { severity, verify: false };
  return { severity: "should-fix", verify: true };
}
