import { canonicalJson } from "./canonical";
import type { PatchOperation } from "./patch";
import type { Drawing, Edition, Requirements, Site } from "./schema";

/** What a drawing takes over from its jurisdiction. */
export interface LocalRules { edition: Edition; ordinance: string; amendments: Site["amendments"]; requirements: Requirements }

export const NO_REQUIREMENTS: Requirements = { lockableVisibleSwitch: null, separateMeter: null, notes: "" };

/** Members of a site that come from the jurisdiction. Requirements of which nothing is known are left out. */
export function siteFrom(local: Pick<LocalRules, "amendments" | "requirements">): Pick<Site, "amendments" | "requirements"> {
  return { amendments: local.amendments, ...(same(local.requirements, NO_REQUIREMENTS) ? {} : { requirements: local.requirements }) };
}

/** One thing in which a drawing differs from its jurisdiction; null where it has nothing of the kind. */
export interface LocalChange { part: "edition" | "codes" | "amendment" | "requirements"; label: string; was: string | null; now: string | null }
const same = (one: unknown, other: unknown): boolean => canonicalJson(one ?? null) === canonicalJson(other ?? null);

/** Line of adopted codes in the title block: kept where it already names edition and ordinance. */
export function codesLine(codes: string, edition: Edition, ordinance: string): string {
  const inEdition = /NEC \d{4}/.test(codes) ? codes.replace(/NEC \d{4}/, `NEC ${edition}`) : codes;
  const named = inEdition.includes(`NEC ${edition}`) && (ordinance === "" || inEdition.toLowerCase().includes(ordinance.toLowerCase()));
  return named ? inEdition : [`NEC ${edition}`, ordinance].filter(Boolean).join(", ").slice(0, 160);
}

/** What would change in a drawing that takes over its jurisdiction as it is now, in the order in which a person reads it. */
export function localChanges(drawing: Drawing, local: LocalRules): LocalChange[] {
  const { site, sheet } = drawing;
  const changes: LocalChange[] = [];
  if (site.edition !== local.edition) changes.push({ part: "edition", label: "Adopted code", was: `NEC ${site.edition}`, now: `NEC ${local.edition}` });
  const codes = codesLine(sheet.titleBlock.codes, local.edition, local.ordinance);
  if (codes !== sheet.titleBlock.codes) changes.push({ part: "codes", label: "Codes in the title block", was: sheet.titleBlock.codes || null, now: codes });
  for (const id of [...new Set([...Object.keys(site.amendments), ...Object.keys(local.amendments)])].sort()) {
    const [was, now] = [site.amendments[id], local.amendments[id]];
    if (!same(was, now)) changes.push({ part: "amendment", label: `Amendment of ${now?.rule ?? was?.rule ?? ""}`, was: was ? amendmentWords(was) : null, now: now ? amendmentWords(now) : null });
  }
  const asked = site.requirements ?? NO_REQUIREMENTS;
  for (const [field, label] of REQUIREMENT_LABELS) {
    if (asked[field] !== local.requirements[field]) changes.push({ part: "requirements", label, was: asked[field] || "not known", now: local.requirements[field] || "not known" });
  }
  return changes;
}

export const REQUIREMENT_LABELS = [
  ["lockableVisibleSwitch", "Lockable switch with visible open contacts"], ["separateMeter", "Separate production meter"], ["notes", "Further requirements"],
] as const satisfies readonly (readonly [keyof Requirements, string])[];

/** An amendment in words, for lists: what it does and by which ordinance. */
export function amendmentWords({ effect, limit, limitName, unit, severity, citation }: Site["amendments"][string]): string {
  const what = effect === "limit" ? `${limitName ? `${limitName} ` : ""}limit ${limit ?? "not given"}${unit ? ` ${unit}` : ""}` : effect === "severity" ? `severity ${severity ?? "not given"}` : effect === "off" ? "does not apply" : "note";
  return `${what}; ${citation}`;
}

/** The edit that takes a jurisdiction over; empty when nothing differs. Each value is tested, so that a drawing that moved on is seen. */
export function localPatches(drawing: Drawing, local: LocalRules): PatchOperation[] {
  const { site, sheet } = drawing;
  const codes = codesLine(sheet.titleBlock.codes, local.edition, local.ordinance);
  return [
    ...replaced("/site/edition", site.edition, local.edition),
    ...protectedPatches(site, local),
    ...replaced("/sheet/titleBlock/codes", sheet.titleBlock.codes, codes),
  ];
}

/** The part of it that no other edit may make: amendments and requirements. */
export function protectedPatches(site: Site, local: Pick<LocalRules, "amendments" | "requirements">): PatchOperation[] {
  const { requirements } = siteFrom(local);
  const asks = requirements ?? (site.requirements ? NO_REQUIREMENTS : undefined);
  return [
    ...replaced("/site/amendments", site.amendments, local.amendments),
    ...(asks === undefined ? [] : site.requirements === undefined ? [{ op: "add" as const, path: "/site/requirements", value: asks }] : replaced("/site/requirements", site.requirements, asks)),
  ];
}

function replaced(path: string, was: unknown, now: unknown): PatchOperation[] {
  return same(was, now) ? [] : [{ op: "test", path, value: was }, { op: "replace", path, value: now }];
}
