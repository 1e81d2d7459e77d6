import { WEIGHTS, path, type PathPrimitive } from "@/lib/sheets/primitives";
import { symbol as symbolShape, type SymbolShape } from "@/lib/symbols";

export interface DrawnShape {
  paths: readonly PathPrimitive[];
  /** Letters in the symbol, px from its origin. */
  texts: SymbolShape["texts"];
}

/** A symbol as primitives, px from its origin. An unknown name is a fault of the caller. */
export function shape(symbol: string): DrawnShape {
  const { paths: { lead, stroke, fill, dash }, texts } = symbolShape(symbol);
  const paths: PathPrimitive[] = [];
  if (lead) paths.push(path(lead, { weight: WEIGHTS.lead }));
  if (stroke) paths.push(path(stroke, { weight: WEIGHTS.symbol, cap: "round" }));
  if (dash) paths.push(path(dash, { weight: WEIGHTS.symbol, dash: "link" }));
  if (fill) paths.push(path(fill, { stroke: null, fill: "ink" }));
  return { paths, texts };
}
