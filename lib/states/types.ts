/**
 * Operating states: every combination of switch positions the interlocks allow, after contracting switches
 * that cannot change which sources meet, which bonds are in force or which buses are live.
 */
export type StateGroup = "utility" | "island" | "generator" | "off";

/** A switch that was taken out of the walk, and why. */
export interface Contraction {
  equipment: string;
  reason: "load side: no source or bond beyond" | "series with another" | "alike with another" | "behind a converter";
  /** Switch that stands for it, where there is one. */
  with: string | null;
}
export interface OperatingState {
  group: StateGroup;
  /** Closed positions of the walked switches: equipment id, or `id:position` of a transfer switch. */
  closed: readonly string[];
  /** Sources joined with each other in this state, equipment ids; converters that follow or form are listed with them. */
  islands: readonly Island[];
}
export interface Island {
  /** Utility and generator sources energizing it. */
  sources: readonly string[];
  converters: readonly string[];
  /** Nodes `equipment/port` that are live together. */
  nodes: ReadonlySet<string>;
  /** Neutral-to-ground joints in force on the neutral of this island: bond ids grouped so that joints at or ahead of one service are one group. */
  bondGroups: readonly (readonly string[])[];
  hasNeutral: boolean;
}
export interface StateSpace {
  /** All switches of the drawing on paths between sources, buses and bonds. */
  switches: readonly string[];
  contractions: readonly Contraction[];
  /** Switches left on the ac side after contraction. */
  walked: readonly string[];
  positionsAll: number;
  positionsExcluded: number;
  states: readonly OperatingState[];
  /** States that join sources which must never meet. */
  forbidden: readonly OperatingState[];
  /** States a rule may judge: reachable and not forbidden. */
  allowed: readonly OperatingState[];
}
