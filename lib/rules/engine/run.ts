import { drawingDigest } from "@/lib/diagram/canonical";
import { buildGraph } from "@/lib/diagram/graph";
import { COLLECTIONS, type Drawing, type ElementRef } from "@/lib/diagram/schema";
import { RULE_SET_VERSION, rules as allRules } from "@/lib/rules";
import { nameOf, refKey } from "@/lib/rules/shared/outcome";
import { applyAcceptances } from "./accept";
import { withoutRemoved } from "./active";
import { amend, citationOf, severityOf, type Amended } from "./amend";
import { checkContext } from "./context";
import { fold, merge } from "./fold";
import type { CheckContext, CheckResult, Declaration, Finding, FindingDraft, Rule, RuleMeta, Severity } from "./types";

export interface CheckOptions {
  /** Milliseconds of a clock; without one nothing is timed. */
  clock?: () => number;
  /** Rules to run instead of all, for a rule's own page and for tests. */
  rules?: readonly Rule[];
}
interface Waiting { rule: Rule; amended: Amended; blocks: boolean }
interface Asked { ref: ElementRef; field: string; label: string; waiting: Waiting[] }

/**
 * Runs the rules on a drawing. The same drawing gives the same result wherever it is run. A rule that throws becomes
 * needs data for that rule alone.
 */
export function check(document: Drawing, options: CheckOptions = {}): CheckResult {
  const drawing = withoutRemoved(document);
  const { edition } = drawing.site;
  const graph = buildGraph(drawing);
  const shared = checkContext(graph);
  const timing: Record<string, number> = {};
  const found: Finding[] = [];
  const asked = new Map<string, Asked>();
  const declarations: Declaration[] = [];
  let pass = 0;
  let rulesRun = 0;
  const rules = options.rules ?? allRules;

  for (const rule of rules) {
    if (!inForce(rule.meta, edition)) continue;
    const amended = amend(drawing, rule.meta);
    if (amended.off) continue;
    rulesRun += 1;
    const context: CheckContext = { ...shared, limit: (name) => limitOf(rule, amended, name) };
    const started = options.clock?.();
    let subject: ElementRef | null = null;
    try {
      for (const ref of rule.subjects(context)) {
        subject = ref;
        const answer = rule.evaluate(ref, context);
        for (const outcome of "outcome" in answer ? [answer] : answer) {
          if (outcome.outcome === "pass") pass += 1;
          else if (outcome.outcome === "finding") found.push(toFinding(rule, amended, context, outcome.finding));
          else if (outcome.outcome === "declared") declarations.push(toDeclaration(rule, amended, edition, outcome));
          else if (outcome.outcome === "needs-data") ask(asked, { rule, amended, blocks: outcome.blocks === true }, outcome.fields);
        }
      }
    } catch (error) {
      found.push(engineError(rule, amended, context, subject, error));
    }
    if (started !== undefined) timing[rule.meta.id] = (options.clock?.() ?? started) - started;
  }

  const context = { drawing, edition };
  const unknown = [...asked.values()].map((one) => unknownFinding(context, one, rules));
  const folded = fold(merge([...found, ...unknown]), rules);
  const { findings: marked, stale } = applyAcceptances(document, folded);
  const findings = [...marked, ...stale.map(({ id, acceptance, gone }) => staleFinding(context, id, acceptance.rule, acceptance.by, gone))].sort(order(rules));
  const count = (test: (finding: Finding) => boolean): number => findings.filter(test).length;
  const bySeverity = (severity: Severity): number => count((one) => one.kind === "finding" && one.severity === severity);
  return {
    ruleSet: RULE_SET_VERSION, edition, digest: drawingDigest(document, RULE_SET_VERSION), rulesRun,
    counts: {
      mustFix: bySeverity("must-fix"), shouldFix: bySeverity("should-fix"), advice: bySeverity("advice"),
      needsData: count((one) => one.kind === "needs-data"), accepted: count((one) => one.accepted !== null), declared: declarations.filter((one) => one.statement !== null).length, pass,
    },
    findings, declarations, timing,
  };
}

const inForce = ({ from, to }: RuleMeta, edition: Drawing["site"]["edition"]): boolean => (from === undefined || edition >= from) && (to === undefined || edition <= to);

function toDeclaration({ meta }: Rule, amended: Amended, edition: Drawing["site"]["edition"], { ref, statement }: { ref: ElementRef; statement: Declaration["statement"] }): Declaration {
  return { rule: meta.id, anchor: ref, question: meta.question ?? meta.statement, citation: citationOf(meta, edition, amended.notes).citation, statement };
}

function limitOf(rule: Rule, amended: Amended, name: string): number {
  const limit = amended.limits[name];
  if (!limit) throw new RangeError(`rule ${rule.meta.id} has no limit ${name}`);
  return limit.value;
}
const keyOf = (rule: string, anchor: ElementRef, variant: string): string => `${rule}:${refKey(anchor)}:${variant}`;

function toFinding(rule: Rule, amended: Amended, context: CheckContext, draft: FindingDraft): Finding {
  const { meta } = rule;
  const { severity, verify } = severityOf(meta, context.edition, amended, draft);
  const { citation, verifySection } = citationOf(meta, context.edition, amended.notes);
  let suggestions: Finding["suggestions"] = [];
  // A remedy that cannot be worked out is no reason to hide the fault.
  try { suggestions = rule.suggest?.(draft, context) ?? []; } catch { suggestions = []; }
  return {
    ...draft, key: keyOf(meta.id, draft.anchor, draft.variant), rule: meta.id, severity, kind: "finding",
    message: verify ? `${draft.message} Verify in the adopted book or the manufacturer's instructions.` : draft.message,
    citation, verifySection, risk: meta.risk, suggestions, folded: [], fields: [], blocks: false, accepted: null,
  };
}

function engineError(rule: Rule, amended: Amended, context: CheckContext, subject: ElementRef | null, error: unknown): Finding {
  const anchor = subject ?? { collection: "equipment", id: "" };
  const { citation, verifySection } = citationOf(rule.meta, context.edition, amended.notes);
  const { severity } = severityOf(rule.meta, context.edition, amended, {});
  return {
    variant: "engine-error", anchor, related: [], steps: [], key: keyOf(rule.meta.id, anchor, "engine-error"), rule: rule.meta.id, severity, kind: "needs-data",
    message: `Rule ${rule.meta.id} could not be worked out here${error instanceof Error ? ` (${error.message})` : ""}. Check this by hand; the other rules ran.`,
    citation, verifySection, risk: rule.meta.risk, suggestions: [], folded: [], fields: [], blocks: severity === "must-fix", accepted: null,
  };
}

function ask(asked: Map<string, Asked>, waiting: Waiting, fields: readonly { ref: ElementRef; field: string; label: string }[]): void {
  for (const { ref, field, label } of fields) {
    const key = `${refKey(ref)} ${field}`;
    const known = asked.get(key) ?? { ref, field, label, waiting: [] };
    if (!asked.has(key)) asked.set(key, known);
    const same = known.waiting.find((one) => one.rule === waiting.rule);
    if (!same) known.waiting.push({ ...waiting });
    else if (waiting.blocks) same.blocks = true;
  }
}

/** One redline for each missing value, with every rule that waits for it listed inside. */
function unknownFinding(context: Pick<CheckContext, "drawing" | "edition">, asked: Asked, rules: readonly Rule[]): Finding {
  const own = rules.find((rule) => rule.meta.id === "rating-unknown");
  const waiting = asked.waiting.filter((one) => one.rule !== own);
  const variant = asked.field.replace(/([a-z0-9])([A-Z])/g, "$1-$2").replace(/[^A-Za-z0-9]+/g, "-").toLowerCase();
  const blocks = asked.waiting.some((one) => one.blocks || severityOf(one.rule.meta, context.edition, one.amended, {}).severity === "must-fix");
  return {
    variant, anchor: asked.ref, field: asked.field, related: [], steps: [],
    message: `${nameOf(context, asked.ref)}: ${asked.label} is not known. Enter it from the marking or the datasheet.`,
    key: keyOf("rating-unknown", asked.ref, variant), rule: "rating-unknown", severity: own?.meta.severity ?? "should-fix", kind: "needs-data",
    citation: own ? citationOf(own.meta, context.edition, []).citation : "", verifySection: false, risk: own?.meta.risk ?? "", suggestions: [],
    folded: waiting.map(({ rule, amended }) => ({ rule: rule.meta.id, message: `Waits for this value: ${rule.meta.statement}`, citation: citationOf(rule.meta, context.edition, amended.notes).citation })),
    fields: [{ ref: asked.ref, field: asked.field, label: asked.label }], blocks, accepted: null,
  };
}

function staleFinding(context: Pick<CheckContext, "drawing">, id: string, rule: string, by: string, gone: boolean): Finding {
  const anchor: ElementRef = { collection: "acceptances", id };
  return {
    variant: gone ? "gone" : "changed", anchor, related: [], steps: [], key: keyOf("acceptance-stale", anchor, gone ? "gone" : "changed"), rule: "acceptance-stale", severity: "should-fix", kind: "finding",
    message: gone ? `The acceptance of ${rule} by ${by} no longer meets a finding. Withdraw it.` : `What ${by} accepted for ${rule} has changed since. Accept it again or repair it.`,
    citation: "", verifySection: false, risk: "An acceptance covers only what was read and signed.",
    suggestions: [{ label: "Withdraw the acceptance", also: "", patches: [{ op: "remove", path: `/acceptances/${id}` }] }],
    folded: [], fields: [], blocks: false, accepted: null,
  };
}

const RANK: Readonly<Record<Severity, number>> = { "must-fix": 0, "should-fix": 2, "advice": 3 };
function order(rules: readonly Rule[]): (a: Finding, b: Finding) => number {
  const place = new Map(rules.map((rule, i) => [rule.meta.id, i]));
  const rank = (one: Finding): readonly (number | string)[] =>
    [one.kind === "needs-data" ? 1 : RANK[one.severity], place.get(one.rule) ?? rules.length, COLLECTIONS.indexOf(one.anchor.collection), one.anchor.id, one.variant];
  return (a, b) => {
    const [x, y] = [rank(a), rank(b)];
    const i = x.findIndex((value, at) => value !== y[at]);
    const [left, right] = [x[i], y[i]];
    return i < 0 || left === undefined || right === undefined ? 0 : left < right ? -1 : 1;
  };
}
