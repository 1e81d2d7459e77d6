import type { VisitContent } from "@/lib/api";
import { canonicalJson } from "@/lib/diagram/canonical";
import { VISIT_PARTS, type VisitPart } from "@/lib/diagram/siteVisit";

/** Parts of a visit in words, as the form heads them. */
export const PART_WORDS: Readonly<Record<VisitPart | "visitedOn" | "byName", string>> = {
  service: "Service", panels: "Panels", found: "Other equipment found", lengths: "Run lengths", places: "Places for new equipment", temperatures: "Temperatures", roof: "Roof",
  grounding: "Grounding", photos: "Photos", note: "Notes", visitedOn: "Day of the visit", byName: "Who was there",
};
type Name = keyof typeof PART_WORDS;

const same = (one: unknown, other: unknown): boolean => canonicalJson(one ?? null) === canonicalJson(other ?? null);
interface Row { id: string }
const isRows = (value: unknown): value is Row[] => Array.isArray(value) && value.every((each) => typeof each === "object" && each !== null && "id" in each);

export interface Merged {
  content: VisitContent;
  /** Parts that both changed, in words; there `prefer` was followed. */
  clashes: string[];
}

/** One value that may have been changed on both sides. Rows of a list are looked at one by one, so that two people may each add some. */
function mergeValue(base: unknown, mine: unknown, theirs: unknown, prefer: "mine" | "theirs", clash: () => void): unknown {
  if (same(mine, base) || same(mine, theirs)) return theirs;
  if (same(theirs, base)) return mine;
  if (isRows(base) && isRows(mine) && isRows(theirs)) {
    const find = (rows: readonly Row[], id: string) => rows.find((row) => row.id === id);
    const ids = [...new Set([...theirs, ...mine].map((row) => row.id))];
    return ids.map((id) => mergeValue(find(base, id), find(mine, id), find(theirs, id), prefer, clash)).filter((row) => row !== undefined);
  }
  clash();
  return prefer === "mine" ? mine : theirs;
}

/** Puts what was changed here since `base` onto what others made of it. */
export function mergeVisits(base: VisitContent, mine: VisitContent, theirs: VisitContent, prefer: "mine" | "theirs" = "mine"): Merged {
  const clashes = new Set<string>();
  const take = (name: Name, b: unknown, m: unknown, t: unknown) => mergeValue(b, m, t, prefer, () => clashes.add(PART_WORDS[name]));
  const data = Object.fromEntries(VISIT_PARTS.map((part) => [part, take(part, base.data[part], mine.data[part], theirs.data[part])])) as VisitContent["data"];
  return {
    content: {
      visitedOn: take("visitedOn", base.visitedOn, mine.visitedOn, theirs.visitedOn) as string, byName: take("byName", base.byName, mine.byName, theirs.byName) as string, data,
    },
    clashes: [...clashes],
  };
}
export const sameVisit = (one: VisitContent, other: VisitContent): boolean => same(one, other);
