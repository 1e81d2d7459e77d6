/** Editions of the National Electrical Code that a jurisdiction may have adopted. */
export const EDITIONS = ["2017", "2020", "2023", "2026"] as const;
export type Edition = (typeof EDITIONS)[number];

/**
 * How sure a value or a section number of one edition is.
 * read: the text of that edition was read; agreed: long-standing and read in another edition or in every trade text;
 * unconfirmed: secondary sources or memory, to be verified in the adopted book; preview: edition not seen, values of the
 * edition before are shown.
 */
export type Confirmation = "read" | "agreed" | "unconfirmed" | "preview";

/** What a table file says of itself. `meaning` is the key of its section number in editions.ts. */
export interface TableInfo {
  readonly meaning: string;
  readonly title: string;
  /** Confirmation of the values, edition by edition; the section number has its own in editions.ts. */
  readonly values: Readonly<Record<Edition, Confirmation>>;
}

/** A reference into an adopted code, printed beside a step or a finding. */
export interface Citation {
  /** Key of the meaning in editions.ts. */
  readonly meaning: string;
  /** Book, such as NEC or IRC. */
  readonly code: string;
  readonly edition: string;
  /** Section or table number as printed in that edition. */
  readonly section: string;
  readonly title: string;
  readonly confirmation: Confirmation;
}

/** Metal of a conductor. Tables that do not tell copper-clad aluminum from aluminum treat both alike. */
export const MATERIALS = ["copper", "aluminum", "copper-clad aluminum"] as const;
export type Material = (typeof MATERIALS)[number];

/** Metal by its symbol on a drawing. */
export const MATERIAL_BY_SYMBOL = { Cu: "copper", Al: "aluminum" } as const satisfies Record<string, Material>;
