import type { ElementRef } from "@/lib/diagram/schema";
import type { CheckContext, FindingDraft, Outcome, Rule, RuleMeta, Suggestion } from "@/lib/rules/engine/types";
import { found, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";

/** One row of the family "a thing that is required here is drawn". */
export interface PresentRow {
  meta: RuleMeta;
  variant: string;
  subjects: (context: CheckContext) => readonly ElementRef[];
  /** Whether it is required at this element; null when a value is missing, which it asks of the reader. */
  required: (ref: ElementRef, context: CheckContext, reader: Reader) => boolean | null;
  /** What satisfies it, derived from the drawing. */
  satisfied: (ref: ElementRef, context: CheckContext) => boolean;
  message: (ref: ElementRef, context: CheckContext) => string;
  related?: (ref: ElementRef, context: CheckContext) => readonly ElementRef[];
  field?: string;
  suggest?: (finding: FindingDraft, context: CheckContext) => readonly Suggestion[];
  examples: Rule["examples"];
}

/** Looks for what the drawing must show wherever topology or marking requires it. */
export function presentRule(row: PresentRow): Rule {
  const evaluate = (ref: ElementRef, context: CheckContext): Outcome => {
    const reader = new Reader(context);
    const required = row.required(ref, context, reader);
    if (required === false) return NOT_APPLICABLE;
    if (row.satisfied(ref, context)) return PASS;
    if (required === null || !reader.complete) return reader.complete ? NOT_APPLICABLE : reader.outcome();
    return found({ variant: row.variant, anchor: ref, ...(row.field ? { field: row.field } : {}), related: row.related?.(ref, context) ?? [], message: row.message(ref, context), steps: [] });
  };
  return { meta: row.meta, subjects: row.subjects, evaluate, ...(row.suggest ? { suggest: row.suggest } : {}), examples: row.examples };
}
