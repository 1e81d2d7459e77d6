import type { SymbolShape } from "./define";

/** Sources of energy and the places where one is connected. */
export const sourcesSymbols = {
  utility: {
    title: "Utility service",
    paths: { lead: "M0 38V48", stroke: "M0 -8V4M-12 -8H12M-12 -11V-5M12 -11V-5M-10 14a10 10 0 1 0 20 0a10 10 0 1 0 -20 0ZM-10 28a10 10 0 1 0 20 0a10 10 0 1 0 -20 0Z" },
    texts: [],
    ports: [{ x: 0, y: 48 }],
  },
  generator: {
    title: "Generator",
    paths: { lead: "M0 21V36", stroke: "M-21 0a21 21 0 1 0 42 0a21 21 0 1 0 -42 0Z" },
    texts: [{ x: 0, y: 6.5, text: "G", size: 18 }],
    ports: [{ x: 0, y: 36 }],
  },
  pv: {
    title: "PV string",
    paths: { lead: "M0 36V48", stroke: "M-12 0H12V36H-12ZM-12 0L0 13L12 0" },
    texts: [],
    ports: [{ x: 0, y: 48 }],
  },
  battery: {
    title: "Battery",
    paths: { stroke: "M0 0V6M-15 6H15M-8 12H8M-15 18H15M-8 24H8" },
    texts: [],
    ports: [{ x: 0, y: 0 }],
  },
  inlet: {
    title: "Inlet, flanged",
    paths: { stroke: "M36 0H22M22 -9H14A9 9 0 0 0 14 9H22ZM6 -4H-2M6 4H-2" },
    texts: [],
    ports: [{ x: 0, y: 0 }, { x: 36, y: 0 }],
  },
} as const satisfies Readonly<Record<string, SymbolShape>>;
