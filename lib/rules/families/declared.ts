import type { ElementRef } from "@/lib/diagram/schema";
import type { CheckContext, Outcome, Rule, RuleMeta, Suggestion } from "@/lib/rules/engine/types";
import { found, nameOf, refKey } from "@/lib/rules/shared/outcome";

/** One row of the family "only a person can tell". */
export interface DeclaredRow {
  /** `question` is answered well by yes. */
  meta: RuleMeta & { question: string };
  /** Where the question is asked; the list is derived from the drawing, so that it is never asked in vain. */
  subjects: (context: CheckContext) => readonly ElementRef[];
  /** Sentence of the finding after a stated no. */
  refused: (name: string) => string;
  suggest?: (ref: ElementRef, context: CheckContext) => readonly Suggestion[];
  examples: Rule["examples"];
}

/** Statement about an element under a rule; the latest one counts. */
export function statementOf({ drawing }: Pick<CheckContext, "drawing">, rule: string, ref: ElementRef) {
  return Object.entries(drawing.statements ?? {})
    .filter(([, one]) => one.rule === rule && (one.anchor === refKey(ref) || one.anchor === "site"))
    .sort(([a, x], [b, y]) => (x.on === y.on ? (a < b ? -1 : 1) : x.on < y.on ? -1 : 1)).at(-1)?.[1] ?? null;
}

/** A rule that asks a person and repeats the answer. It never passes: yes is *declared*, no is a finding, silence an open question. */
export function declaredRule(row: DeclaredRow): Rule {
  const evaluate = (ref: ElementRef, context: CheckContext): Outcome => {
    const statement = statementOf(context, row.meta.id, ref);
    if (statement?.value === "no") {
      return found({ variant: "stated-no", anchor: ref, field: "statements", related: [], message: `${row.refused(nameOf(context, ref))} Stated by ${statement.by}, ${statement.on}.`, steps: [] });
    }
    // What must be right before building is asked for like a missing rating; the rest waits in the list of open questions.
    if (!statement && row.meta.severity === "must-fix") return { outcome: "needs-data", fields: [{ ref, field: `statements.${row.meta.id}`, label: `a statement: ${row.meta.question}` }] };
    return { outcome: "declared", ref, statement: statement && { by: statement.by, on: statement.on, value: statement.value as "yes" | "not applicable", note: statement.note } };
  };
  const { suggest } = row;
  return { meta: row.meta, subjects: row.subjects, evaluate, ...(suggest ? { suggest: (finding, context) => suggest(finding.anchor, context) } : {}), examples: row.examples };
}
