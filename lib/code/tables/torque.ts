/**
 * Recommended tightening torque in the absence of the value of the maker.
 * Source: NFPA 70 Informative Annex I, Tables I.1, I.2, I.3, from UL 486A-486B; edition 2011 and copies of 2020, summary of 2023.
 * Unit: lbf·in. The value marked on the equipment or in its instructions comes first (110.14(D), 110.3(B)).
 */
import type { ConductorSize } from "@/lib/units";
import type { TableInfo } from "../types";

export const TORQUE_INFO: TableInfo = {
  meaning: "torque-defaults",
  title: "Recommended tightening torque",
  values: { "2017": "agreed", "2020": "agreed", "2023": "agreed", "2026": "preview" },
};

/**
 * Table I.1 columns: slotted screw No. 10 and larger, slot to 0.047 in wide and 1/4 in long (narrow) or more (wide);
 * hexagonal head with external drive, split-bolt or other connectors.
 */
export const SCREW_CONNECTORS = ["slotted-narrow", "slotted-wide", "hex-split-bolt", "hex-other"] as const;
export type ScrewConnector = (typeof SCREW_CONNECTORS)[number];

export interface TorqueRow {
  readonly from: ConductorSize;
  readonly to: ConductorSize;
  /** In the order of SCREW_CONNECTORS. */
  readonly torqueLbfIn: readonly [number | null, number | null, number | null, number | null];
}

export const TORQUE_ROWS: readonly TorqueRow[] = [
  { from: "18 AWG", to: "10 AWG", torqueLbfIn: [20, 35, 80, 75] },
  { from: "8 AWG", to: "8 AWG", torqueLbfIn: [25, 40, 80, 75] },
  { from: "6 AWG", to: "4 AWG", torqueLbfIn: [35, 45, 165, 110] },
  { from: "3 AWG", to: "3 AWG", torqueLbfIn: [35, 50, 275, 150] },
  { from: "2 AWG", to: "2 AWG", torqueLbfIn: [40, 50, 275, 150] },
  { from: "1 AWG", to: "1 AWG", torqueLbfIn: [null, 50, 275, 150] },
  { from: "1/0 AWG", to: "2/0 AWG", torqueLbfIn: [null, 50, 385, 180] },
  { from: "3/0 AWG", to: "4/0 AWG", torqueLbfIn: [null, 50, 500, 250] },
  { from: "250 kcmil", to: "350 kcmil", torqueLbfIn: [null, 50, 650, 325] },
  { from: "400 kcmil", to: "400 kcmil", torqueLbfIn: [null, 50, 825, 325] },
  { from: "500 kcmil", to: "500 kcmil", torqueLbfIn: [null, 50, 825, 375] },
  { from: "600 kcmil", to: "750 kcmil", torqueLbfIn: [null, 50, 1000, 375] },
  { from: "800 kcmil", to: "1000 kcmil", torqueLbfIn: [null, 50, 1100, 500] },
  { from: "1250 kcmil", to: "2000 kcmil", torqueLbfIn: [null, null, 1100, 600] },
];

/** Table I.2: slotted screws smaller than No. 10, for 8 AWG and smaller; slot width below 0.047 in, and from it. */
export const SMALL_SCREW_ROWS: readonly { readonly slotLengthIn: string; readonly narrowLbfIn: number | null; readonly wideLbfIn: number }[] = [
  { slotLengthIn: "less than 5/32", narrowLbfIn: 7, wideLbfIn: 9 },
  { slotLengthIn: "5/32", narrowLbfIn: 7, wideLbfIn: 12 },
  { slotLengthIn: "3/16", narrowLbfIn: 7, wideLbfIn: 12 },
  { slotLengthIn: "7/32", narrowLbfIn: 7, wideLbfIn: 12 },
  { slotLengthIn: "1/4", narrowLbfIn: 9, wideLbfIn: 12 },
  { slotLengthIn: "9/32", narrowLbfIn: null, wideLbfIn: 15 },
  { slotLengthIn: "over 9/32", narrowLbfIn: null, wideLbfIn: 20 },
];

/** Table I.3: screws with recessed Allen or square drive, by width across flats. */
export const SOCKET_SCREW_ROWS: readonly { readonly acrossFlatsIn: string; readonly torqueLbfIn: number }[] = [
  { acrossFlatsIn: "1/8", torqueLbfIn: 45 },
  { acrossFlatsIn: "5/32", torqueLbfIn: 100 },
  { acrossFlatsIn: "3/16", torqueLbfIn: 120 },
  { acrossFlatsIn: "7/32", torqueLbfIn: 150 },
  { acrossFlatsIn: "1/4", torqueLbfIn: 200 },
  { acrossFlatsIn: "5/16", torqueLbfIn: 275 },
  { acrossFlatsIn: "3/8", torqueLbfIn: 375 },
  { acrossFlatsIn: "1/2", torqueLbfIn: 500 },
  { acrossFlatsIn: "9/16", torqueLbfIn: 600 },
];
