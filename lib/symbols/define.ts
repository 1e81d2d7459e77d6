/**
 * A symbol as path data. Coordinates are px from the origin, 12 px to the grid unit (1/8 in on the half-size print);
 * the origin is the first place where a conductor lands, unless the symbol is drawn about its middle.
 */
export interface SymbolShape {
  /** Name in the legend. */
  title: string;
  paths: {
    /** Conductor that belongs to the symbol; drawn in the weight of a circuit. */
    lead?: string;
    stroke?: string;
    /** Closed shapes filled with ink. */
    fill?: string;
    dash?: string;
  };
  /** Letters in the symbol, by their middle and baseline; they stay upright when the symbol is turned. */
  texts: readonly { x: number; y: number; text: string; size: number }[];
  /** Places where conductors land. Each lies on a grid point. */
  ports: readonly { x: number; y: number }[];
}
