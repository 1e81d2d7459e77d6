import { citationText, cite, type Citation, type Edition } from "@/lib/code";
import { finiteResult, formatNumber } from "@/lib/units";
import type { CalcResult, Step } from "./types";

export type { Calculation, CalcResult, Step } from "./types";

/** A number as it stands in a substituted formula. */
export function shown(value: number, decimals = 4): string {
  return formatNumber(value, decimals);
}

/** Collects the steps and references of one calculation. */
export class Worksheet {
  private readonly steps: Step[] = [];
  private readonly citations = new Set<Citation>();

  constructor(private readonly edition: Edition) {}

  /** Adds a line and returns its result unrounded. `meaning` is a key of lib/code/editions. */
  number(symbol: string, expression: string, substituted: string, result: number, unit: string, meaning?: string): number {
    this.push(symbol, expression, substituted, finiteResult(symbol, result), unit, meaning);
    return result;
  }

  /** Adds a line whose result is a word, such as a conductor size. */
  text<Text extends string>(symbol: string, expression: string, substituted: string, result: Text, meaning?: string): Text {
    this.push(symbol, expression, substituted, result, "", meaning);
    return result;
  }

  /** Adds a reference without a line. */
  cite(meaning: string): void {
    this.citations.add(cite(meaning, this.edition));
  }

  /** Takes over the lines and references of a calculation that this one rests on. */
  include(result: CalcResult<unknown, unknown>): void {
    this.steps.push(...result.steps);
    for (const citation of result.citations) this.citations.add(citation);
  }

  /** Closes the worksheet. */
  result<Value, Detail>(value: Value, unit: string, detail: Detail): CalcResult<Value, Detail> {
    return { value, unit, steps: this.steps, citations: [...this.citations], detail };
  }

  private push(symbol: string, expression: string, substituted: string, result: number | string, unit: string, meaning: string | undefined): void {
    if (meaning === undefined) {
      this.steps.push({ symbol, expression, substituted, result, unit });
      return;
    }
    const citation = cite(meaning, this.edition);
    this.citations.add(citation);
    this.steps.push({ symbol, expression, substituted, result, unit, citation: citationText(citation) });
  }
}
