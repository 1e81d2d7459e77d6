import { isPreview, previewNote } from "@/lib/code/adoption";
import { findingEvidence } from "@/lib/rules/engine/accept";
import type { CheckResult, Finding } from "@/lib/rules/engine/types";
import type { Refusal, RevisionState } from "./revision";

/** A licensee's written acceptance of one finding of one revision. */
export interface FindingAcceptance { findingKey: string; reason: string; by: string; license: string; on: string }

/** True when the finding stands in the way of a seal until it is repaired or accepted in writing. */
export function blocksSeal(finding: Finding): boolean {
  if (finding.accepted) return false;
  return finding.kind === "needs-data" ? finding.blocks : finding.severity === "must-fix";
}

/**
 * Check result of a revision with what the licensee accepted beside it. The snapshot and its digest stay as issued.
 * Counts move from their severity to `accepted`.
 */
export function withAcceptances(result: CheckResult, acceptances: readonly FindingAcceptance[]): CheckResult {
  const byKey = new Map(acceptances.map((each) => [each.findingKey, each]));
  const counts = { ...result.counts };
  const findings = result.findings.map((finding) => {
    const acceptance = byKey.get(finding.key);
    if (!acceptance || finding.accepted) return finding;
    counts.accepted += 1;
    if (finding.kind === "needs-data") counts.needsData -= 1;
    else if (finding.severity === "must-fix") counts.mustFix -= 1;
    else if (finding.severity === "should-fix") counts.shouldFix -= 1;
    else counts.advice -= 1;
    const { by, license, reason, on } = acceptance;
    return { ...finding, accepted: { by, license, reason, on } };
  });
  return { ...result, counts, findings };
}

/** What an acceptance rests on: when one of these changes, the finding has to be accepted anew. */
const evidence = (finding: Finding) => `${finding.kind} ${finding.severity} ${findingEvidence(finding)}`;

/**
 * Findings of a new revision that were accepted in the last sealed one and are still the same in place and numbers.
 * @returns their keys; the acceptance goes on under its own name and date
 */
export function carriedAcceptances(before: CheckResult, now: CheckResult, acceptedKeys: readonly string[]): string[] {
  const was = new Map(before.findings.map((finding) => [finding.key, evidence(finding)]));
  return now.findings.filter((finding) => acceptedKeys.includes(finding.key) && was.get(finding.key) === evidence(finding)).map((finding) => finding.key);
}

/** What sealing depends on. Dates are ISO calendar dates. */
export interface SealQuestion {
  state: RevisionState;
  check: CheckResult;
  /** Digest of the drawing being worked on, with the revision's rule set. */
  draftDigest: string;
  license: { state: string; number: string; expiresOn: string; hasSealGraphic: boolean } | null;
  today: string;
}

/** Everything that stands in the way of a seal, in the order in which a person would settle it. */
export function sealRefusals(question: SealQuestion): Refusal[] {
  const { state, check, draftDigest, license, today } = question;
  const refusals: Refusal[] = [];
  if (state !== "in review") refusals.push({ code: "not-in-review", detail: `A revision is sealed from review; this one is ${state}.` });
  if (draftDigest !== check.digest) {
    refusals.push({ code: "draft-moved-on", detail: "The drawing was changed after this revision was issued. Return it and have it issued again." });
  }
  // Limits of another edition are no ground on which a licensee can answer for a permit.
  if (isPreview(check.edition)) refusals.push({ code: "edition-preview", detail: previewNote(check.edition) });
  const blocking = check.findings.filter(blocksSeal);
  const mustFix = blocking.filter((finding) => finding.kind === "finding");
  const needsData = blocking.filter((finding) => finding.kind === "needs-data");
  if (mustFix.length > 0) {
    refusals.push({ code: "must-fix-open", detail: `${mustFix.length} must-fix ${mustFix.length === 1 ? "redline is" : "redlines are"} open. Repair each or accept it in writing.`, findings: mustFix.map(name) });
  }
  if (needsData.length > 0) {
    refusals.push({ code: "needs-data-open", detail: `${needsData.length} must-fix ${needsData.length === 1 ? "rule waits" : "rules wait"} for data. Enter the value or accept its absence in writing.`, findings: needsData.map(name) });
  }
  if (!license) refusals.push({ code: "license-missing", detail: "Your license is not entered yet. Enter it on your account page." });
  else {
    if (license.expiresOn < today) refusals.push({ code: "license-expired", detail: `License ${license.number} (${license.state}) expired on ${license.expiresOn}.` });
    if (!license.hasSealGraphic) refusals.push({ code: "seal-graphic-missing", detail: "Your seal graphic is not uploaded yet. Add it on your account page." });
  }
  return refusals;
}

const name = (finding: Finding) => ({ key: finding.key, message: finding.message });
