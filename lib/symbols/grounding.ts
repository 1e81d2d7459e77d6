import type { SymbolShape } from "./define";

/** Grounding and bonding. */
export const groundingSymbols = {
  ground: {
    title: "Ground",
    paths: { stroke: "M0 0V9M-11 9H11M-7 13.5H7M-3 18H3" },
    texts: [],
    ports: [{ x: 0, y: 0 }],
  },
  rod: {
    title: "Ground rod",
    paths: { stroke: "M0 0V30M-9 8H9M-4 30L0 36L4 30Z" },
    texts: [],
    ports: [{ x: 0, y: 0 }],
  },
  mbj: {
    title: "Main bonding jumper",
    paths: { stroke: "M0 -9V9M48 -9V9M0 0H48", fill: "M-3 0a3 3 0 1 0 6 0a3 3 0 1 0 -6 0ZM45 0a3 3 0 1 0 6 0a3 3 0 1 0 -6 0Z" },
    texts: [],
    ports: [{ x: 0, y: 0 }, { x: 48, y: 0 }],
  },
  gbar: {
    title: "Ground or neutral bar",
    paths: { stroke: "M0 -5H48V5H0ZM8 -2V2M16 -2V2M24 -2V2M32 -2V2M40 -2V2" },
    texts: [],
    ports: [{ x: 0, y: 0 }],
  },
} as const satisfies Readonly<Record<string, SymbolShape>>;
