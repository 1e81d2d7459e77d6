/**
 * Compact copper and aluminum building wire, nominal dimensions.
 * Source: NFPA 70-2017 Chapter 9 Table 5A; the THHN column from that single source.
 * Diameter in inches, area in in². rhwUse: RHH and RHW without outer covering, and USE.
 */
import type { ConductorSize } from "@/lib/units";
import type { TableInfo } from "../types";

export const COMPACT_DIMENSIONS_INFO: TableInfo = {
  meaning: "compact-dimensions",
  title: "Compact copper and aluminum building wire",
  values: { "2017": "read", "2020": "agreed", "2023": "unconfirmed", "2026": "preview" },
};

/** Diameter in in and area in in², or null where the table holds none. */
export type CompactCell = readonly [number, number] | null;

export interface CompactRow {
  readonly size: ConductorSize;
  readonly bareDiameterIn: number;
  readonly rhwUse: CompactCell;
  readonly thw: CompactCell;
  readonly thhn: CompactCell;
  readonly xhhw: CompactCell;
}

export const COMPACT_ROWS: readonly CompactRow[] = [
  { size: "8 AWG", bareDiameterIn: 0.134, rhwUse: [0.26, 0.0531], thw: [0.255, 0.051], thhn: null, xhhw: [0.224, 0.0394] },
  { size: "6 AWG", bareDiameterIn: 0.169, rhwUse: [0.295, 0.0683], thw: [0.29, 0.066], thhn: [0.24, 0.0452], xhhw: [0.26, 0.053] },
  { size: "4 AWG", bareDiameterIn: 0.213, rhwUse: [0.335, 0.0881], thw: [0.335, 0.0881], thhn: [0.305, 0.073], xhhw: [0.305, 0.073] },
  { size: "2 AWG", bareDiameterIn: 0.268, rhwUse: [0.39, 0.1194], thw: [0.39, 0.1194], thhn: [0.36, 0.1017], xhhw: [0.36, 0.1017] },
  { size: "1 AWG", bareDiameterIn: 0.299, rhwUse: [0.465, 0.1698], thw: [0.465, 0.1698], thhn: [0.415, 0.1352], xhhw: [0.415, 0.1352] },
  { size: "1/0 AWG", bareDiameterIn: 0.336, rhwUse: [0.5, 0.1963], thw: [0.5, 0.1963], thhn: [0.45, 0.159], xhhw: [0.45, 0.159] },
  { size: "2/0 AWG", bareDiameterIn: 0.376, rhwUse: [0.54, 0.229], thw: [0.545, 0.2332], thhn: [0.495, 0.1924], xhhw: [0.49, 0.1885] },
  { size: "3/0 AWG", bareDiameterIn: 0.423, rhwUse: [0.59, 0.2733], thw: [0.59, 0.2733], thhn: [0.54, 0.229], xhhw: [0.54, 0.229] },
  { size: "4/0 AWG", bareDiameterIn: 0.475, rhwUse: [0.64, 0.3217], thw: [0.645, 0.3267], thhn: [0.595, 0.278], xhhw: [0.59, 0.2733] },
  { size: "250 kcmil", bareDiameterIn: 0.52, rhwUse: [0.715, 0.4015], thw: [0.725, 0.4128], thhn: [0.67, 0.3525], xhhw: [0.66, 0.3421] },
  { size: "300 kcmil", bareDiameterIn: 0.57, rhwUse: [0.765, 0.4596], thw: [0.775, 0.4717], thhn: [0.72, 0.4071], xhhw: [0.715, 0.4015] },
  { size: "350 kcmil", bareDiameterIn: 0.616, rhwUse: [0.81, 0.5153], thw: [0.82, 0.5281], thhn: [0.77, 0.4656], xhhw: [0.76, 0.4536] },
  { size: "400 kcmil", bareDiameterIn: 0.659, rhwUse: [0.855, 0.5741], thw: [0.865, 0.5876], thhn: [0.815, 0.5216], xhhw: [0.8, 0.5026] },
  { size: "500 kcmil", bareDiameterIn: 0.736, rhwUse: [0.93, 0.6793], thw: [0.94, 0.6939], thhn: [0.885, 0.6151], xhhw: [0.88, 0.6082] },
  { size: "600 kcmil", bareDiameterIn: 0.813, rhwUse: [1.035, 0.8413], thw: [1.05, 0.8659], thhn: [0.985, 0.762], xhhw: [0.98, 0.7542] },
  { size: "700 kcmil", bareDiameterIn: 0.877, rhwUse: [1.1, 0.9503], thw: [1.11, 0.9676], thhn: [1.05, 0.8659], xhhw: [1.05, 0.8659] },
  { size: "750 kcmil", bareDiameterIn: 0.908, rhwUse: [1.135, 1.0118], thw: [1.15, 1.0386], thhn: [1.075, 0.9076], xhhw: [1.09, 0.9331] },
  { size: "900 kcmil", bareDiameterIn: 0.999, rhwUse: [1.24, 1.2076], thw: [1.224, 1.1766], thhn: [1.194, 1.1196], xhhw: [1.169, 1.0733] },
  { size: "1000 kcmil", bareDiameterIn: 1.06, rhwUse: [1.285, 1.2968], thw: [1.285, 1.2968], thhn: [1.255, 1.237], xhhw: [1.23, 1.1882] },
];
