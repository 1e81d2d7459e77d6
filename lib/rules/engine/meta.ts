import { EDITION_LIST, type Citation, type Confirmation, type RuleMeta } from "./types";

type Cell = readonly [section: string, confirmation: Exclude<Confirmation, "preview">];

/** Sections of 2017, 2020 and 2023; 2026 shows that of 2023 as preview until its text is read. */
export function sections(in2017: Cell, in2020: Cell, in2023: Cell, in2026: string = in2023[0]): readonly Citation[] {
  return [
    { edition: "2017", section: in2017[0], confirmation: in2017[1] },
    { edition: "2020", section: in2020[0], confirmation: in2020[1] },
    { edition: "2023", section: in2023[0], confirmation: in2023[1] },
    { edition: "2026", section: in2026, confirmation: "preview" },
  ];
}
/** One section in all editions. */
export function sameSection(section: string, marks: readonly [Cell[1], Cell[1], Cell[1]] = ["read", "read", "read"]): readonly Citation[] {
  return sections([section, marks[0]], [section, marks[1]], [section, marks[2]]);
}
/** A rule of makers or of good practice: no code section stands behind it. */
export function notCode(text: string): readonly Citation[] {
  return EDITION_LIST.map((edition) => ({ edition, section: text, confirmation: "unconfirmed" as const, book: "" }));
}
/** Must-fix in the editions whose text was read or is settled; never in one that was not seen. */
export const MUST_FIX_TO_2023: RuleMeta["mustFixAllowed"] = { "2017": true, "2020": true, "2023": true, "2026": false };
/** Never must-fix by itself: no code text stands behind it. */
export const NEVER_MUST_FIX: RuleMeta["mustFixAllowed"] = { "2017": false, "2020": false, "2023": false, "2026": false };
