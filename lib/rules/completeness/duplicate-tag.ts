import { nextTag } from "@/lib/diagram/commands/tags";
import type { ElementRef } from "@/lib/diagram/schema";
import { NEVER_MUST_FIX, notCode } from "@/lib/rules/engine/meta";
import type { CheckContext, Rule } from "@/lib/rules/engine/types";
import { found, NOT_APPLICABLE, PASS } from "@/lib/rules/shared/outcome";

const TAGGED = ["equipment", "circuits", "raceways", "bonds", "interlocks", "sensors"] as const;
/** Tags are compared as they are read aloud: without case and outer blanks. */
const spoken = (tag: string): string => tag.trim().toUpperCase();

const known = new WeakMap<CheckContext["graph"], ReadonlyMap<string, readonly ElementRef[]>>();
/** Who bears each tag; gathered once a drawing. */
function bearers(context: CheckContext): ReadonlyMap<string, readonly ElementRef[]> {
  let map = known.get(context.graph);
  if (!map) { map = gather(context); known.set(context.graph, map); }
  return map;
}
function gather(context: CheckContext): ReadonlyMap<string, readonly ElementRef[]> {
  const map = new Map<string, ElementRef[]>();
  for (const collection of TAGGED) {
    for (const id of Object.keys(context.drawing[collection]).sort()) {
      const tag = spoken(context.drawing[collection][id]?.tag ?? "");
      if (tag !== "") map.set(tag, [...(map.get(tag) ?? []), { collection, id }]);
    }
  }
  return map;
}
const tagOf = (context: CheckContext, { collection, id }: ElementRef): string => (TAGGED as readonly string[]).includes(collection) ? context.drawing[collection as (typeof TAGGED)[number]][id]?.tag ?? "" : "";

export const duplicateTag: Rule = {
  meta: {
    id: "duplicate-tag", group: "Ratings and completeness", severity: "should-fix", evidence: "derived",
    statement: "Every tag on the drawing names one thing.",
    risk: "Somebody opens, orders or wires the wrong one.",
    citations: notCode("drafting practice: unique reference designations"), mustFixAllowed: NEVER_MUST_FIX, limits: {},
    reads: TAGGED.map((each) => `${each}.tag`), absorbs: [],
  },
  subjects: (context) => [...bearers(context).values()].map((list) => list[0]).filter((ref): ref is ElementRef => ref !== undefined),
  evaluate: (ref, context) => {
    const tag = tagOf(context, ref);
    const list = bearers(context).get(spoken(tag)) ?? [];
    if (tag === "") return NOT_APPLICABLE;
    const [first, ...others] = list;
    if (!first || others.length === 0) return PASS;
    return found({ variant: "twice", anchor: others[0] ?? first, field: "tag", related: list.filter((each) => each !== others[0]), message: `${tag} is used ${list.length} times. A tag names one thing.`, steps: [] });
  },
  suggest: (finding, context) => {
    const tag = tagOf(context, finding.anchor).trim();
    const fresh = nextTag(context.drawing, tag.replace(/\d+$/, "") || `${tag}-`);
    return [{ label: `Rename this one to ${fresh}`, also: "", patches: [{ op: "replace", path: `/${finding.anchor.collection}/${finding.anchor.id}/tag`, value: fresh }] }];
  },
  examples: { violates: "Two breakers named CB-3.", passes: "CB-3 and CB-4." },
};
