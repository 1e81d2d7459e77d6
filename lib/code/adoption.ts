import { EDITIONS, type Edition } from "./types";

/** When a jurisdiction's adoption of an edition began and ended, ISO calendar dates; null: before anybody looked, or open. */
export interface Adoption { edition: Edition; effectiveFrom: string | null; effectiveTo: string | null }

/** Editions whose text was not read: the rules run with the limits of the edition named beside. */
const PREVIEWS: Readonly<Partial<Record<Edition, Edition>>> = { "2026": "2023" };
/** What stands beside every section of such an edition. */
export const PREVIEW_REMARK = "not confirmed";

/** True for an edition that can be chosen and checked, and under which nothing may be sealed. */
export const isPreview = (edition: Edition): boolean => PREVIEWS[edition] !== undefined;
/** `NEC 2023`, or `NEC 2026 (preview, not confirmed)`. */
export const editionName = (edition: Edition): string => (isPreview(edition) ? `NEC ${edition} (preview, ${PREVIEW_REMARK})` : `NEC ${edition}`);
/** What a preview means for who draws under it; empty for an edition that was read. */
export function previewNote(edition: Edition): string {
  const limits = PREVIEWS[edition];
  return limits ? `NEC ${edition} is a preview here: the rules run with the limits of ${limits} and every section reads "${PREVIEW_REMARK}". It can be issued for review; it cannot be sealed for permit.` : "";
}

const from = (adoption: Adoption): string => adoption.effectiveFrom ?? "";
/**
 * The adoption in force on a day: of those that have begun and not ended, the one that began last. A lapsed adoption
 * without a successor goes on, and before the first one that first one counts: a permit is never judged by no code.
 * @param today ISO calendar date
 * @throws RangeError when there is no adoption at all
 */
export function adoptionInForce(adoptions: readonly Adoption[], today: string): Adoption {
  const inOrder = [...adoptions].sort((a, b) => (from(a) < from(b) ? -1 : from(a) > from(b) ? 1 : 0));
  const begun = inOrder.filter((each) => from(each) <= today);
  const chosen = begun.findLast((each) => each.effectiveTo === null || each.effectiveTo >= today) ?? begun.at(-1) ?? inOrder[0];
  if (!chosen) throw new RangeError("a jurisdiction has adopted at least one edition");
  return chosen;
}

/** The next adoption that begins after a day, or null. */
export const nextAdoption = (adoptions: readonly Adoption[], today: string): Adoption | null =>
  [...adoptions].sort((a, b) => (from(a) < from(b) ? -1 : 1)).find((each) => from(each) > today) ?? null;

/** What is wrong with a list of adoptions, each with the place in the list; empty when nothing is. */
export function adoptionFaults(adoptions: readonly Adoption[]): { index: number; field: "edition" | "effectiveFrom" | "effectiveTo"; message: string }[] {
  return adoptions.flatMap((each, index) => {
    const before = adoptions.slice(0, index);
    return [
      ...(before.some((other) => other.edition === each.edition) ? [{ index, field: "edition" as const, message: `${each.edition} is listed twice` }] : []),
      ...(!EDITIONS.includes(each.edition) ? [{ index, field: "edition" as const, message: "is not known" }] : []),
      ...(before.some((other) => from(other) === from(each)) ? [{ index, field: "effectiveFrom" as const, message: "is the day on which another edition takes effect" }] : []),
      ...(each.effectiveTo !== null && each.effectiveTo < from(each) ? [{ index, field: "effectiveTo" as const, message: "is before the day it takes effect" }] : []),
    ];
  });
}
