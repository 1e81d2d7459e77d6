import { checkOneOf } from "@/lib/units";
import { PREVIEW_REMARK } from "./adoption";
import { CodeLookupError } from "./errors";
import { GROUNDING_SECTIONS } from "./sections/grounding";
import { LOAD_SECTIONS } from "./sections/loads";
import { RACEWAY_SECTIONS } from "./sections/raceways";
import { SOURCE_SECTIONS } from "./sections/sources";
import { WIRING_SECTIONS } from "./sections/wiring";
import type { SectionEntry } from "./sections/entry";
import { EDITIONS, type Citation, type Confirmation, type Edition } from "./types";

/** Section numbers move between editions, meanings do not: every reference goes by its meaning. */
export const SECTIONS: Readonly<Record<string, SectionEntry>> = {
  ...WIRING_SECTIONS,
  ...RACEWAY_SECTIONS,
  ...GROUNDING_SECTIONS,
  ...SOURCE_SECTIONS,
  ...LOAD_SECTIONS,
};

/** Keys of all meanings. */
export const MEANINGS: readonly string[] = Object.keys(SECTIONS);

/** One object a meaning and edition, made on first use: citations are asked for on every line of every worksheet. */
const CACHE: Readonly<Record<Edition, Map<string, Citation>>> = { "2017": new Map(), "2020": new Map(), "2023": new Map(), "2026": new Map() };

/**
 * The citation of a meaning in an edition.
 * @throws CodeLookupError when the meaning is not known or the edition has no such rule.
 */
export function cite(meaning: string, edition: Edition): Citation {
  const cached = CACHE[edition]?.get(meaning);
  if (cached !== undefined) return cached;
  checkOneOf("edition", edition, EDITIONS);
  const entry = Object.hasOwn(SECTIONS, meaning) ? SECTIONS[meaning] : undefined;
  if (entry === undefined) throw new CodeLookupError("meaning", `"${meaning}" is not a known meaning`);
  const place = entry.places[edition];
  if (place === null) throw new CodeLookupError("edition", `${edition} has no rule "${entry.title}"`);
  const citation: Citation = { meaning, code: entry.code, edition: entry.bookEdition ?? edition, section: place.section, title: entry.title, confirmation: place.confirmation };
  CACHE[edition].set(meaning, citation);
  return citation;
}

/** The citation, or null where the edition has no such rule. */
export function citeOrNull(meaning: string, edition: Edition): Citation | null {
  return SECTIONS[meaning]?.places[edition] === null ? null : cite(meaning, edition);
}

const NOTES: Readonly<Record<Confirmation, string>> = {
  read: "",
  agreed: " (section to be verified)",
  unconfirmed: " (verify in the adopted book)",
  preview: ` (${PREVIEW_REMARK})`,
};
const TEXTS = new WeakMap<Citation, string>();

/** A citation as printed: `NEC 2023 Table 310.16`, with a note where the number was not read in that edition. */
export function citationText(citation: Citation): string {
  const cached = TEXTS.get(citation);
  if (cached !== undefined) return cached;
  const text = `${citation.code} ${citation.edition} ${citation.section}${NOTES[citation.confirmation]}`;
  TEXTS.set(citation, text);
  return text;
}
