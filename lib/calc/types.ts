export type { Citation } from "@/lib/code";
import type { Citation } from "@/lib/code";

/** One line of a worksheet; the screen and the sheet print the same line. */
export interface Step {
  readonly symbol: string;
  /** Formula in letters, for example I × 1.25, or what is looked up. */
  readonly expression: string;
  /** The same with numbers and units. */
  readonly substituted: string;
  /** A number, or a word where the line picks a size or decides. Numbers are not rounded here. */
  readonly result: number | string;
  /** Unit of the result, empty for a plain number or a word. */
  readonly unit: string;
  /** Table or section printed at the right edge. */
  readonly citation?: string;
}

/** What every calculation returns: the value, its unit, the worked steps and the references. */
export interface Calculation<Value = number> {
  readonly value: Value;
  readonly unit: string;
  readonly steps: readonly Step[];
  readonly citations: readonly Citation[];
}

/** A calculation with its further results by name. */
export interface CalcResult<Value, Detail> extends Calculation<Value> {
  readonly detail: Detail;
}
