import type { SymbolShape } from "./define";

/** Ways of conductors and marks on them. */
export const routingSymbols = {
  raceway: {
    title: "Raceway, circuits inside",
    paths: { stroke: "M0 -13A5 13 0 1 0 .01 -13" },
    texts: [],
    ports: [],
  },
  nipple: {
    title: "Nipple",
    paths: { stroke: "M0 -7V7M3.5 -7V7M20.5 -7V7M24 -7V7M3.5 -6H20.5M3.5 6H20.5" },
    texts: [],
    ports: [],
  },
  jbox: {
    title: "Junction box",
    paths: { stroke: "M-24 -12H24V12H-24Z" },
    texts: [{ x: 0, y: 5, text: "J", size: 13 }],
    ports: [{ x: -24, y: 0 }, { x: 24, y: 0 }],
  },
  dot: {
    title: "Joined",
    paths: { stroke: "M-12 0H12M0 0V12", fill: "M-3 0a3 3 0 1 0 6 0a3 3 0 1 0 -6 0Z" },
    texts: [],
    ports: [{ x: -12, y: 0 }, { x: 12, y: 0 }, { x: 0, y: 12 }],
  },
  cross: {
    title: "Crossing, not joined",
    paths: { stroke: "M0 -12V12M-12 0H-5A5 5 0 0 1 5 0H12" },
    texts: [],
    ports: [{ x: -12, y: 0 }, { x: 12, y: 0 }, { x: 0, y: -12 }, { x: 0, y: 12 }],
  },
  flag: {
    title: "Continued at",
    paths: { stroke: "M0 0H8M8 -9H56L66 0L56 9H8Z" },
    texts: [{ x: 33, y: 4.6, text: "E-605", size: 12.6 }],
    ports: [{ x: 0, y: 0 }],
  },
} as const satisfies Readonly<Record<string, SymbolShape>>;
