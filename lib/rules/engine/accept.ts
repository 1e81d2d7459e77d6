import type { Acceptance, Drawing } from "@/lib/diagram/schema";
import type { Finding } from "./types";

/**
 * Fingerprint of what a finding rests on: place, way and numbers, without tags. An acceptance stores it, so that it
 * stops holding when the numbers change. 16 hexadecimal digits.
 */
export function findingEvidence(finding: Pick<Finding, "rule" | "anchor" | "variant" | "field" | "steps" | "fields">): string {
  const text = JSON.stringify([
    finding.rule, finding.anchor.collection, finding.anchor.id, finding.variant, finding.field ?? "",
    finding.steps.map((step) => [step.symbol, step.result, step.unit]), finding.fields.map((one) => one.field),
  ]);
  // FNV-1a over two lanes: a mark of change, not a seal.
  let [low, high] = [0x811c9dc5, 0xcbf29ce4];
  for (let i = 0; i < text.length; i += 1) {
    low = Math.imul(low ^ text.charCodeAt(i), 0x01000193) >>> 0;
    high = Math.imul(high ^ text.charCodeAt(i) ^ (low >>> 13), 0x01000193) >>> 0;
  }
  return low.toString(16).padStart(8, "0") + high.toString(16).padStart(8, "0");
}

const names = (acceptance: Acceptance, finding: Finding): boolean =>
  acceptance.rule === finding.rule && acceptance.anchor === `${finding.anchor.collection}/${finding.anchor.id}`
  && (acceptance.variant === "" || acceptance.variant === finding.variant || acceptance.variant === finding.field);
const holds = (acceptance: Acceptance, finding: Finding): boolean => acceptance.evidence === "" || acceptance.evidence === findingEvidence(finding);

/** Marks accepted findings, and reports acceptances whose finding is gone or has changed since. */
export function applyAcceptances(drawing: Drawing, findings: readonly Finding[]): { findings: readonly Finding[]; stale: readonly { id: string; acceptance: Acceptance; gone: boolean }[] } {
  const entries = Object.entries(drawing.acceptances).sort(([a], [b]) => (a < b ? -1 : 1));
  const used = new Set<string>();
  const marked = findings.map((finding) => {
    const entry = entries.find(([, acceptance]) => names(acceptance, finding) && holds(acceptance, finding));
    if (!entry) return finding;
    used.add(entry[0]);
    const { by, license, reason, on } = entry[1];
    return { ...finding, accepted: { by, license, reason, on } };
  });
  const stale = entries.filter(([id, acceptance]) => !used.has(id) && !marked.some((finding) => finding.accepted !== null && names(acceptance, finding)))
    .map(([id, acceptance]) => ({ id, acceptance, gone: !findings.some((finding) => names(acceptance, finding)) }));
  return { findings: marked, stale };
}
