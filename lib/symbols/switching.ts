import type { SymbolShape } from "./define";

/** Devices that open, protect and keep apart. */
export const switchingSymbols = {
  breaker: {
    title: "Circuit breaker",
    paths: { lead: "M0 0H8M28 0H36", stroke: "M7 -4.5A12.6 12.6 0 0 1 29 -4.5", fill: "M5.9 0a2.1 2.1 0 1 0 4.2 0a2.1 2.1 0 1 0 -4.2 0ZM25.9 0a2.1 2.1 0 1 0 4.2 0a2.1 2.1 0 1 0 -4.2 0Z" },
    texts: [],
    ports: [{ x: 0, y: 0 }, { x: 36, y: 0 }],
  },
  plugon: {
    title: "Plug-on breaker, held",
    paths: { lead: "M0 0H9M27 0H36", stroke: "M8 -4.5A11.6 11.6 0 0 1 28 -4.5M3.5 -4.5L9 0L3.5 4.5M32.5 -4.5L27 0L32.5 4.5" },
    texts: [],
    ports: [{ x: 0, y: 0 }, { x: 36, y: 0 }],
  },
  fuse: {
    title: "Fuse",
    paths: { stroke: "M0 0H36M7 -5H29V5H7Z" },
    texts: [],
    ports: [{ x: 0, y: 0 }, { x: 36, y: 0 }],
  },
  switch: {
    title: "Disconnect switch",
    paths: { lead: "M0 0H8M28 0H36", stroke: "M8 0L26 -12M28 -5V5", fill: "M5.9 0a2.1 2.1 0 1 0 4.2 0a2.1 2.1 0 1 0 -4.2 0Z" },
    texts: [],
    ports: [{ x: 0, y: 0 }, { x: 36, y: 0 }],
  },
  switchclosed: {
    title: "Disconnect switch, closed",
    paths: { lead: "M0 0H8M28 0H36M8 0H28", stroke: "M28 -5V5", fill: "M5.9 0a2.1 2.1 0 1 0 4.2 0a2.1 2.1 0 1 0 -4.2 0Z" },
    texts: [],
    ports: [{ x: 0, y: 0 }, { x: 36, y: 0 }],
  },
  fusedswitch: {
    title: "Fused disconnect",
    paths: { stroke: "M0 0H8M8 0L25 -11M27 -5V5M27 0H60M34 -5H54V5H34Z", fill: "M5.9 0a2.1 2.1 0 1 0 4.2 0a2.1 2.1 0 1 0 -4.2 0Z" },
    texts: [],
    ports: [{ x: 0, y: 0 }, { x: 60, y: 0 }],
  },
  contactor: {
    title: "Contactor with coil",
    paths: { lead: "M0 0H14M22 0H36", stroke: "M14 -8V8M22 -8V8M18 -8V-12M13 -17a5 5 0 1 0 10 0a5 5 0 1 0 -10 0Z" },
    texts: [],
    ports: [{ x: 0, y: 0 }, { x: 36, y: 0 }],
  },
  doublethrow: {
    title: "Transfer, double throw",
    paths: { stroke: "M0 -12H12M0 12H12M48 0H36M36 0L15 -10.5", fill: "M9.9 -12a2.1 2.1 0 1 0 4.2 0a2.1 2.1 0 1 0 -4.2 0ZM9.9 12a2.1 2.1 0 1 0 4.2 0a2.1 2.1 0 1 0 -4.2 0ZM33.9 0a2.1 2.1 0 1 0 4.2 0a2.1 2.1 0 1 0 -4.2 0Z" },
    texts: [],
    ports: [{ x: 0, y: -12 }, { x: 0, y: 12 }, { x: 48, y: 0 }],
  },
  interlock: {
    title: "Mechanical interlock",
    paths: { stroke: "M-9 6L0 -8L9 6Z", dash: "M-24 0H-9M9 0H24" },
    texts: [],
    ports: [],
  },
  spd: {
    title: "Surge protective device",
    paths: { stroke: "M0 0V8M-9 8H9V28H-9ZM-4 13L4 23M4 23L3.4 18M4 23L-1 22M0 28V36M-9 36H9M-5.5 39.5H5.5M-2 43H2" },
    texts: [],
    ports: [{ x: 0, y: 0 }],
  },
  estop: {
    title: "Shutdown initiator",
    paths: { stroke: "M-12 -4A12 10 0 0 1 12 -4ZM-3 -4V3M3 -4V3M-10 3H10M0 3V12" },
    texts: [],
    ports: [{ x: 0, y: 12 }],
  },
  // One pole, line at the bottom; further channels stand beside it, ganged.
  pvswitch: {
    title: "PV switch, one channel",
    paths: { lead: "M0 0V8M0 28V36", stroke: "M0 8L12 26M-5 28H5", fill: "M-2.1 8a2.1 2.1 0 1 0 4.2 0a2.1 2.1 0 1 0 -4.2 0Z" },
    texts: [],
    ports: [{ x: 0, y: 36 }, { x: 0, y: 0 }],
  },
} as const satisfies Readonly<Record<string, SymbolShape>>;
