import type { Edition } from "@/lib/code";
import { checkInteger, checkList, checkOneOf } from "@/lib/units";
import { Worksheet, type CalcResult } from "./worksheet";

/** What the neutral of a circuit carries. Only `unbalance` leaves it out of the count. */
export const NEUTRAL_ROLES = ["none", "unbalance", "two-wire", "nonlinear", "three-wire of a wye"] as const;
export type NeutralRole = (typeof NEUTRAL_ROLES)[number];

export interface CountedCircuit {
  readonly label?: string;
  /** Ungrounded power conductors, spares included. Grounding, bonding, signal and control conductors are left out. */
  readonly ungroundedCount: number;
  readonly neutral: NeutralRole;
  /** Circuits with one name here exclude each other (interlocked alternatives): only the largest of them counts. */
  readonly alternative?: string;
}

export interface ConductorCountDetail {
  readonly perCircuit: readonly { readonly label: string; readonly count: number }[];
}

/**
 * Number of current-carrying conductors at one cross section.
 * @throws QuantityError naming the field. Source: 310.15(C)(1) with its footnote, 310.15(E), 310.15(F).
 */
export function currentCarryingCount(input: { readonly edition: Edition; readonly circuits: readonly CountedCircuit[] }): CalcResult<number, ConductorCountDetail> {
  const sheet = new Worksheet(input.edition);
  const alternatives = new Map<string, number>();
  let total = 0;
  const perCircuit = checkList("circuits", input.circuits, 1, 500).map((circuit, index) => {
    const field = `circuits.${index}`;
    const label = circuit.label ?? `circuit ${index + 1}`;
    const ungrounded = checkInteger(`${field}.ungroundedCount`, circuit.ungroundedCount, { min: 0, max: 200, unit: "conductors" });
    const neutral = checkOneOf(`${field}.neutral`, circuit.neutral, NEUTRAL_ROLES);
    const counted = neutral === "none" || neutral === "unbalance" ? 0 : 1;
    const count = sheet.number("n", "ungrounded + counted neutral", `${label}: ${ungrounded} + ${counted} (${neutral})`, ungrounded + counted, "", neutral === "none" ? "egc-not-counted" : "neutral-count");
    if (circuit.alternative === undefined) total += count;
    else alternatives.set(circuit.alternative, Math.max(alternatives.get(circuit.alternative) ?? 0, count));
    return { label, count };
  });
  for (const [name, count] of alternatives) {
    total += sheet.number("n", "largest of the circuits that cannot be live together", name, count, "", "bundling-adjustment");
  }
  sheet.number("Σn", "sum", "", total, "", "bundling-adjustment");
  return sheet.result(total, "conductors", { perCircuit });
}
