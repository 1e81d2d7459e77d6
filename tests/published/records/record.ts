import { it } from "vitest";

/** A published worked example as one test; the title names the record and where it was published. */
export function record(id: string, source: string, run: () => void): void {
  it(`${id}: ${source}`, run);
}

/** Relative difference, for figures that a source rounds on the way. */
export function off(value: number, expected: number): number {
  return Math.abs(value / expected - 1);
}
