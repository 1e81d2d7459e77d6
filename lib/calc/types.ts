/** Where a number or a limit comes from: a table or section of one edition. */
export interface Citation { edition: string; section: string; confirmation: "read" | "agreed" | "unconfirmed" | "preview" }
/** One line of a worksheet; the screen and the sheet print the same line. */
export interface Step {
  symbol: string;
  /** Formula in letters, for example I × 1.25. */
  expression: string;
  /** The same with numbers and units. */
  substituted: string;
  result: number;
  unit: string;
  /** Table or section printed at the right edge. */
  citation?: string;
}
export interface Calculation<Value = number> { value: Value; unit: string; steps: readonly Step[]; citations: readonly Citation[] }
