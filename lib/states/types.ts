/**
 * Operating states: every combination of switch positions the interlocks allow, after contracting switches
 * that cannot change which sources meet, which bonds are in force or which buses are live.
 */
export type StateGroup = "utility" | "island" | "generator" | "off";

/** A switch that was taken out of the walk, and why. */
export interface Contraction {
  equipment: string;
  reason: "load side: no source or bond beyond" | "series with another" | "alike with another" | "behind a converter";
  /** Switch that stands for it, or bus cabinet it hangs on, where there is one. */
  with: string | null;
}
export interface OperatingState {
  group: StateGroup;
  /** Closed positions of the walked switches: equipment id, or `id:position` of a transfer switch. */
  closed: readonly string[];
  /** Switch positions that come to this same outcome: the same sources, converters and buses live together. */
  positions: number;
  /** What is live together; parts without a source or converter are left out. */
  readonly islands: readonly Island[];
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
  /** Equipment whose neutrals are joined in this island. */
  neutralOwners: ReadonlySet<string>;
}
export interface StateSpace {
  /** All switches of the drawing on paths between sources, buses and bonds. */
  switches: readonly string[];
  contractions: readonly Contraction[];
  /** Switches left on the ac side after contraction. */
  walked: readonly string[];
  /** Contactors that open by listed control when the utility is lost. */
  held: readonly string[];
  positionsAll: number;
  positionsExcluded: number;
  /** Positions of the walked switches, and those of them that an interlock shuts out. */
  walkedAll: number;
  walkedExcluded: number;
  /** Reachable positions of the walked switches by group. */
  counts: Readonly<Record<StateGroup, number>>;
  /** False only where more than `EVERY_POSITION_LIMIT` switches stayed: then the largest closed positions were walked, which still finds every meeting of sources, and `counts` holds those alone. */
  everyPosition: boolean;
  states: readonly OperatingState[];
  /** States that join sources which must never meet. */
  forbidden: readonly OperatingState[];
  /** States kept off by the listed control of a contactor and by no mechanical lock: converters would feed the utility side. */
  heldOff: readonly OperatingState[];
  /** States a rule may judge: reachable, not forbidden and not held off. */
  allowed: readonly OperatingState[];
}
