import type { Drawing, Edition, ElementRef } from "@/lib/diagram/schema";
import type { DrawingGraph } from "@/lib/diagram/graph";
import type { PatchOperation } from "@/lib/diagram/patch";
import type { StateSpace } from "@/lib/states/types";
import type { Step } from "@/lib/calc/types";

export type Severity = "must-fix" | "should-fix" | "advice";
export type Evidence = "derived" | "rated" | "declared";
export type Confirmation = "read" | "agreed" | "unconfirmed" | "preview";
export const EDITION_LIST = ["2017", "2020", "2023", "2026"] as const;

/** Section of one edition behind a rule. `confirmation` says how sure the section is; anything but `read` is printed beside it. */
export interface Citation {
  edition: Edition;
  section: string;
  confirmation: Confirmation;
  /** Book; left out for the electrical code, empty for instructions and practice, which have no section. */
  book?: string;
}

/** Limit used by a rule, as data, so that a jurisdiction may tighten it. */
export interface Limit { value: number; unit: string; source: string }

export interface RuleMeta {
  id: string;
  group: string;
  severity: Severity;
  evidence: Evidence;
  /** One line in the trade's words. */
  statement: string;
  /** What happens if it is ignored. */
  risk: string;
  citations: readonly Citation[];
  /** Per edition: may the finding be must-fix. Where false it is should-fix with "verify in the adopted book". */
  mustFixAllowed: Readonly<Record<Edition, boolean>>;
  /** What else raises the rule to must-fix: the instruction page cited for that model. */
  mustFixWith?: "instruction";
  limits: Readonly<Record<string, Limit>>;
  /** Document fields it reads, for its page. */
  reads: readonly string[];
  /** Rules whose findings are listed inside this one's when they share an element. */
  absorbs: readonly string[];
  /** First and last edition that knows the requirement; left out: all of them. Elsewhere the rule does not run. */
  from?: Edition;
  to?: Edition;
  /** Declared rules: what a person is asked to state, as a question that yes answers well. */
  question?: string;
}

export interface CheckContext {
  drawing: Drawing;
  graph: DrawingGraph;
  edition: Edition;
  /** Operating states of the drawing; worked out on first use, once a run. */
  states: () => StateSpace;
  /** Limit of the running rule after amendments. */
  limit: (name: string) => number;
  /** A value that several rules or elements need, worked out once a run. `name` names it across all rules. */
  once: <T>(name: string, work: () => T) => T;
}

export type { PatchOperation };
export interface Suggestion { label: string; also: string; patches: readonly PatchOperation[] }

export interface FindingDraft {
  /** Kebab-case name of the way in which the rule is broken. */
  variant: string;
  /** Element whose tag is underlined. */
  anchor: ElementRef;
  /** Field underlined in the schedules, for example `props.ratingA`. */
  field?: string;
  related: readonly ElementRef[];
  /** Sentence for the margin, with tags and numbers. */
  message: string;
  steps: readonly Step[];
  /** Severity where it differs from the rule's. */
  severity?: Severity;
  /** Maker's instruction page that raises a maker rule to must-fix. */
  instruction?: string;
}
export type Outcome =
  | { outcome: "pass" }
  | { outcome: "not-applicable" }
  | { outcome: "finding"; finding: FindingDraft }
  | {
      outcome: "needs-data";
      fields: readonly { ref: ElementRef; field: string; label: string }[];
      /** True where the value stands on a protected path, so that sealing waits for it whatever the rule's own severity is. */
      blocks?: boolean;
    }
  /** Only a person can tell. Without a statement (null) the question is open; neither is ever counted as a pass. */
  | { outcome: "declared"; ref: ElementRef; statement: { by: string; on: string; value: "yes" | "not applicable"; note: string } | null };

/** One rule. `subjects` lists the elements it looks at; `evaluate` judges one. */
export interface Rule {
  meta: RuleMeta;
  subjects: (context: CheckContext) => readonly ElementRef[];
  evaluate: (ref: ElementRef, context: CheckContext) => Outcome | readonly Outcome[];
  /** Patches proved in tests to clear the finding and to add no must-fix. */
  suggest?: (finding: FindingDraft, context: CheckContext) => readonly Suggestion[];
  examples: { violates: string; passes: string };
}

export interface FoldedFinding { rule: string; message: string; citation: string }
export interface Finding extends FindingDraft {
  /** rule:collection/id:variant — stable while the fault stays. */
  key: string;
  rule: string;
  severity: Severity;
  kind: "finding" | "needs-data";
  citation: string;
  /** True when the section was not read for this edition. */
  verifySection: boolean;
  risk: string;
  suggestions: readonly Suggestion[];
  folded: readonly FoldedFinding[];
  /** needs-data only. */
  fields: readonly { ref: ElementRef; field: string; label: string }[];
  /** True when a must-fix rule waits for this value. */
  blocks: boolean;
  accepted: { by: string; license: string; reason: string; on: string } | null;
}
/** Question of a declared rule at one place, with what was stated; null while nobody has. */
export interface Declaration {
  rule: string;
  anchor: ElementRef;
  question: string;
  citation: string;
  statement: { by: string; on: string; value: "yes" | "not applicable"; note: string } | null;
}
export interface CheckResult {
  ruleSet: string;
  edition: Edition;
  digest: string;
  rulesRun: number;
  counts: { mustFix: number; shouldFix: number; advice: number; needsData: number; accepted: number; declared: number; pass: number };
  findings: readonly Finding[];
  /** Answers and open questions of the declared rules, counted apart from everything else. */
  declarations: readonly Declaration[];
  /** Milliseconds by rule, only where a clock was handed in. */
  timing: Readonly<Record<string, number>>;
}
