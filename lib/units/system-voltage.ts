import { QuantityError } from "./errors";

/** A nominal system voltage. `lineToNeutralV` is null where the system has no neutral. */
export interface SystemVoltage {
  readonly lineToLineV: number;
  readonly lineToNeutralV: number | null;
  readonly phases: 1 | 3;
}

/**
 * Reads a system voltage: `120/240 V` (single-phase three-wire), `208Y/120 V` and `480Y/277` (three-phase four-wire),
 * `240 V`. Alternating current only; a dc voltage is a plain quantity.
 * @throws QuantityError naming the field when the two numbers do not belong together.
 */
export function parseSystemVoltage(text: unknown, field = "systemVoltage"): SystemVoltage {
  const allowed = "such as 120/240 V, 208Y/120 V, 240 V";
  if (typeof text !== "string") throw new QuantityError(field, text === undefined || text === null ? "value is missing" : "expected text", allowed);
  const clean = text.trim().replace(/\s*v(?:ac)?$/i, "").replace(/\s+/g, "");
  const wye = /^(\d+)[yY]\/(\d+)$/.exec(clean);
  if (wye) return wyeSystem(Number(wye[1]), Number(wye[2]), field, text);
  const pair = /^(\d+)\/(\d+)$/.exec(clean);
  if (pair) {
    const low = Math.min(Number(pair[1]), Number(pair[2]));
    const high = Math.max(Number(pair[1]), Number(pair[2]));
    if (low > 0 && high === 2 * low) return { lineToLineV: high, lineToNeutralV: low, phases: 1 };
    return wyeSystem(high, low, field, text);
  }
  const single = /^\d+$/.exec(clean);
  if (single && Number(clean) > 0 && Number(clean) <= 2000) return { lineToLineV: Number(clean), lineToNeutralV: null, phases: 1 };
  throw new QuantityError(field, `"${text.slice(0, 40)}" is not a system voltage`, allowed);
}

/** A system voltage as printed: `120/240 V`, `208Y/120 V`, `240 V`. */
export function formatSystemVoltage(system: SystemVoltage): string {
  if (system.lineToNeutralV === null) return `${system.lineToLineV} V`;
  return system.phases === 1 ? `${system.lineToNeutralV}/${system.lineToLineV} V` : `${system.lineToLineV}Y/${system.lineToNeutralV} V`;
}

function wyeSystem(high: number, low: number, field: string, text: string): SystemVoltage {
  // Nominal wye voltages are rounded (208/120 = 1.733, 480/277 = 1.733), so compare with the root of three loosely.
  if (low > 0 && high <= 2000 && Math.abs(high / low - Math.sqrt(3)) < 0.02) return { lineToLineV: high, lineToNeutralV: low, phases: 3 };
  throw new QuantityError(field, `"${text.slice(0, 40)}": ${high} V and ${low} V do not belong to one system`, "such as 120/240 V, 208Y/120 V, 240 V");
}
