import type { Confirmation, Edition } from "../types";

export interface SectionPlace {
  readonly section: string;
  readonly confirmation: Confirmation;
}

export interface SectionEntry {
  readonly code: string;
  /** Fixed edition of a book that is not the electrical code. */
  readonly bookEdition?: string;
  readonly title: string;
  /** null: the edition has no such rule. */
  readonly places: Readonly<Record<Edition, SectionPlace | null>>;
}

type Sure = "read" | "agreed" | "unconfirmed";
type Cell = readonly [section: string, confirmation: Sure] | null;

/** One section number in all editions; the three marks are the confirmation in 2017, 2020 and 2023. */
export function same(title: string, section: string, marks: readonly [Sure, Sure, Sure] = ["read", "agreed", "read"]): SectionEntry {
  return moved(title, [section, marks[0]], [section, marks[1]], [section, marks[2]]);
}

/** A section that moved: its place in 2017, 2020 and 2023. 2026 shows the place of 2023 as preview unless given. */
export function moved(title: string, in2017: Cell, in2020: Cell, in2023: Cell, in2026?: string | null): SectionEntry {
  const place = (cell: Cell): SectionPlace | null => (cell === null ? null : { section: cell[0], confirmation: cell[1] });
  const preview = in2026 === undefined ? (in2023?.[0] ?? null) : in2026;
  return {
    code: "NEC",
    title,
    places: {
      "2017": place(in2017),
      "2020": place(in2020),
      "2023": place(in2023),
      "2026": preview === null ? null : { section: preview, confirmation: "preview" },
    },
  };
}

/** A section of another book, the same whatever electrical code is adopted. */
export function otherBook(code: string, bookEdition: string, title: string, section: string, confirmation: Confirmation): SectionEntry {
  const place: SectionPlace = { section, confirmation };
  return { code, bookEdition, title, places: { "2017": place, "2020": place, "2023": place, "2026": place } };
}
