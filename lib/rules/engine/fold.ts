import type { ElementRef } from "@/lib/diagram/schema";
import type { Finding, Rule } from "./types";

const key = (ref: ElementRef): string => `${ref.collection}/${ref.id}`;

/** A child speaks of the same fault when both stand at one element, or each names where the other stands. */
function sameFault(parent: Finding, child: Finding): boolean {
  const [at, of] = [key(parent.anchor), key(child.anchor)];
  return at === of || (parent.related.some((ref) => key(ref) === of) && child.related.some((ref) => key(ref) === at));
}

/** Lists findings that follow from another inside that one: one fault, one redline. */
export function fold(findings: readonly Finding[], rules: readonly Rule[]): readonly Finding[] {
  const absorbs = new Map(rules.map((rule) => [rule.meta.id, new Set(rule.meta.absorbs)]));
  const parentOf = new Map<Finding, Finding>();
  for (const child of findings) {
    const parent = findings.find((one) => one !== child && one.kind === "finding" && absorbs.get(one.rule)?.has(child.rule) === true && sameFault(one, child));
    if (parent) parentOf.set(child, parent);
  }
  const root = (finding: Finding): Finding => {
    let at = finding;
    for (let steps = 0, up = parentOf.get(at); up && steps < findings.length; steps += 1, up = parentOf.get(at)) at = up;
    return at;
  };
  return findings.filter((finding) => !parentOf.has(finding)).map((finding) => {
    const inside = findings.filter((child) => child !== finding && parentOf.has(child) && root(child) === finding);
    if (inside.length === 0) return finding;
    return { ...finding, folded: [...finding.folded, ...inside.map((child) => ({ rule: child.rule, message: child.message, citation: child.citation }))] };
  });
}

/** Findings of one rule at one place are one: the list of elements grows. */
export function merge(findings: readonly Finding[]): readonly Finding[] {
  const byKey = new Map<string, Finding>();
  for (const finding of findings) {
    const known = byKey.get(finding.key);
    if (!known) { byKey.set(finding.key, finding); continue; }
    const have = new Set([key(known.anchor), ...known.related.map(key)]);
    byKey.set(finding.key, { ...known, related: [...known.related, ...finding.related.filter((ref) => !have.has(key(ref)))] });
  }
  return [...byKey.values()];
}
