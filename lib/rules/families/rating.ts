import type { CheckContext, FindingDraft, Outcome, Rule, RuleMeta, Suggestion } from "@/lib/rules/engine/types";
import type { ElementRef } from "@/lib/diagram/schema";
import type { Step } from "@/lib/calc/types";
import { shown } from "@/lib/calc/worksheet";
import { found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";

/** What is demanded of a rating at one element, with the steps that lead to it and the elements it comes from. */
export interface Demand { value: number; steps?: readonly Step[]; related?: readonly ElementRef[]; words: string }
/** A marked value: null where it is not known, and the field that holds it. */
export interface Marked { value: number | null; field: string; label: string; ref?: ElementRef }

/** One row of the family "a rating is not below what is demanded of it" (or not above, with `most`). */
export interface RatingRow {
  meta: RuleMeta;
  variant: string;
  unit: string;
  /** `least`: the rating may not be below the demand. `most`: it may not be above. */
  bound: "least" | "most";
  subjects: (context: CheckContext) => readonly ElementRef[];
  /** Null: nothing is demanded here. Missing values are asked of the reader. */
  demand: (ref: ElementRef, context: CheckContext, reader: Reader) => Demand | null;
  rating: (ref: ElementRef, context: CheckContext) => Marked;
  /** What the rating is called in the sentence, for example "Interrupting rating". */
  name: string;
  /** Maker's page behind the limit, which raises a maker rule to must-fix. */
  instruction?: (ref: ElementRef, context: CheckContext) => string | null;
  suggest?: (finding: FindingDraft, context: CheckContext) => readonly Suggestion[];
  examples: Rule["examples"];
}

/** Compares marked ratings with what topology, tables or other ratings demand. */
export function ratingRule(row: RatingRow): Rule {
  const evaluate = (ref: ElementRef, context: CheckContext): Outcome => {
    const reader = new Reader(context);
    const demand = row.demand(ref, context, reader);
    if (!demand) return reader.complete ? NOT_APPLICABLE : reader.outcome();
    const marked = row.rating(ref, context);
    if (marked.value === null) reader.ask(marked.ref ?? ref, marked.field, marked.label);
    if (!reader.complete || marked.value === null) return reader.outcome();
    const holds = row.bound === "least" ? marked.value >= demand.value - 1e-9 : marked.value <= demand.value + 1e-9;
    if (holds) return PASS;
    const page = row.instruction?.(ref, context) ?? null;
    const sign = row.bound === "least" ? "≥" : "≤";
    return found({
      variant: row.variant, anchor: ref, field: marked.field, related: demand.related ?? [],
      message: `${nameOf(context, ref)}: ${row.name} ${shown(marked.value)} ${row.unit}; ${demand.words} ${shown(demand.value)} ${row.unit}.`,
      steps: [...(demand.steps ?? []), { symbol: row.name, expression: row.bound === "least" ? "not below" : "not above", substituted: `${shown(marked.value)} ${row.unit} ${sign} ${shown(demand.value)} ${row.unit}`, result: "fails", unit: "", ...(page === null ? {} : { citation: page }) }],
      ...(page === null ? {} : { instruction: page }),
    });
  };
  return { meta: row.meta, subjects: row.subjects, evaluate, ...(row.suggest ? { suggest: row.suggest } : {}), examples: row.examples };
}
