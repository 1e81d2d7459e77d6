import type { Rule } from "@/lib/rules/engine/types";
import { backfedNotSecured } from "./backfed-not-secured";
import { fineStrandTerminal } from "./fine-strand-terminal";
import { lineLoadBackfed } from "./line-load-backfed";
import { terminalRange } from "./terminal-range";
import { terminalUnmarked60 } from "./terminal-unmarked-60";
import { torqueOutOfBand, torqueToolStale } from "./torque-record";
import { torqueValueMissing } from "./torque-value-missing";
import { twoWiresOneTerminal } from "./two-wires-one-terminal";

/** Rules of this room beside those that the index of all names one by one. */
export const terminalRules: readonly Rule[] = [backfedNotSecured, lineLoadBackfed, terminalUnmarked60, twoWiresOneTerminal, terminalRange, fineStrandTerminal, torqueValueMissing, torqueOutOfBand, torqueToolStale];
