import { convertingSymbols } from "./converting";
import type { SymbolShape } from "./define";
import { groundingSymbols } from "./grounding";
import { routingSymbols } from "./routing";
import { sourcesSymbols } from "./sources";
import { switchingSymbols } from "./switching";

export type { SymbolShape } from "./define";

/** Every symbol of the one-line by its id: the canvas, the legend, the parts rail and the prints draw from this one set. */
export const SYMBOLS = { ...sourcesSymbols, ...switchingSymbols, ...convertingSymbols, ...groundingSymbols, ...routingSymbols } as const;
export type SymbolId = keyof typeof SYMBOLS;
export const SYMBOL_IDS = Object.keys(SYMBOLS) as readonly SymbolId[];
export const isSymbolId = (id: string): id is SymbolId => Object.hasOwn(SYMBOLS, id);

/**
 * Symbol of an id, px from its origin, 12 px to the grid unit.
 * @throws RangeError for an id that is none, which is a fault of the caller: kinds name only symbols that exist
 */
export function symbol(id: string): SymbolShape {
  if (!isSymbolId(id)) throw new RangeError(`no symbol is named ${id}`);
  return SYMBOLS[id];
}
