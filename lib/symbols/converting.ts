import type { SymbolShape } from "./define";

/** What converts, measures and uses energy. */
export const convertingSymbols = {
  inverter: {
    title: "Multimode inverter",
    paths: { stroke: "M-24 -24H24V24H-24ZM-24 24L24 -24M-17 -11c2.2 -5.5 5 -5.5 7 0s4.8 5.5 7 0M4 10H17M4 15H17" },
    texts: [],
    ports: [{ x: 0, y: -24 }, { x: 0, y: 24 }, { x: 24, y: 0 }, { x: -24, y: 0 }],
  },
  transformer: {
    title: "Transformer",
    paths: { stroke: "M0 0H8M8 0a10 10 0 1 0 20 0a10 10 0 1 0 -20 0ZM20 0a10 10 0 1 0 20 0a10 10 0 1 0 -20 0ZM40 0H48" },
    texts: [],
    ports: [{ x: 0, y: 0 }, { x: 48, y: 0 }],
  },
  rsd: {
    title: "Module shutdown unit",
    paths: { lead: "M0 0V6M0 30V36", stroke: "M-10 6H10V30H-10Z" },
    texts: [{ x: 0, y: 22, text: "RS", size: 11 }],
    ports: [{ x: 0, y: 0 }, { x: 0, y: 36 }],
  },
  meter: {
    title: "Utility meter",
    paths: { lead: "M0 -24V-15M0 15V24", stroke: "M-15 0a15 15 0 1 0 30 0a15 15 0 1 0 -30 0Z" },
    texts: [{ x: 0, y: 4.5, text: "WH", size: 11.5 }],
    ports: [{ x: 0, y: -24 }, { x: 0, y: 24 }],
  },
  ct: {
    title: "Current sensor",
    paths: { lead: "M0 0H36", stroke: "M18 -9a9 9 0 1 0 0.01 0M18 9V14" },
    texts: [],
    ports: [{ x: 0, y: 0 }, { x: 36, y: 0 }],
  },
  ctr: {
    title: "Current sensor, to source",
    paths: { lead: "M0 0H36", stroke: "M18 -9a9 9 0 1 0 0.01 0M18 -9V-14" },
    texts: [],
    ports: [{ x: 0, y: 0 }, { x: 36, y: 0 }],
  },
  aux: {
    title: "Auxiliary contact",
    paths: { stroke: "M0 0H12M24 0H36M12 -6V6M24 -6V6" },
    texts: [],
    ports: [{ x: 0, y: 0 }, { x: 36, y: 0 }],
  },
  motor: {
    title: "Motor load",
    paths: { lead: "M-24 0H-15", stroke: "M-15 0a15 15 0 1 0 30 0a15 15 0 1 0 -30 0Z" },
    texts: [{ x: 0, y: 5.5, text: "M", size: 15 }],
    ports: [{ x: -24, y: 0 }],
  },
  load: {
    title: "Branch load",
    paths: { lead: "M0 0V-24", fill: "M-4.5 -22L0 -31L4.5 -22Z" },
    texts: [],
    ports: [{ x: 0, y: 0 }],
  },
} as const satisfies Readonly<Record<string, SymbolShape>>;
