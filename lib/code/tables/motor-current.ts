/**
 * Full-load currents of single-phase ac motors.
 * Source: Table 430.248; figures from memory, the same in all editions as far as known.
 * Unit: A by horsepower at 115 V and 230 V; 208 V is 110 % of the 230 V figure.
 */
import type { TableInfo } from "../types";

export const MOTOR_CURRENT_INFO: TableInfo = {
  meaning: "motor-conductor",
  title: "Full-load currents of single-phase motors",
  values: { "2017": "unconfirmed", "2020": "unconfirmed", "2023": "unconfirmed", "2026": "preview" },
};

export const SINGLE_PHASE_MOTOR_ROWS: readonly { readonly horsepower: number; readonly a115: number; readonly a230: number }[] = [
  { horsepower: 1 / 6, a115: 4.4, a230: 2.2 }, { horsepower: 0.25, a115: 5.8, a230: 2.9 }, { horsepower: 1 / 3, a115: 7.2, a230: 3.6 },
  { horsepower: 0.5, a115: 9.8, a230: 4.9 }, { horsepower: 0.75, a115: 13.8, a230: 6.9 }, { horsepower: 1, a115: 16, a230: 8 },
  { horsepower: 1.5, a115: 20, a230: 10 }, { horsepower: 2, a115: 24, a230: 12 }, { horsepower: 3, a115: 34, a230: 17 },
  { horsepower: 5, a115: 56, a230: 28 }, { horsepower: 7.5, a115: 80, a230: 40 }, { horsepower: 10, a115: 100, a230: 50 },
];
