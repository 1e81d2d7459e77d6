import { acImpedance, CONDUIT_MATERIALS, dcResistanceOhmPerKft, MATERIALS, type ConduitMaterial, type Edition, type Material } from "@/lib/code";
import { checkInteger, checkNumber, checkOneOf, circularMils, parseConductorSize, type ConductorSize } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

export const DROP_SYSTEMS = ["dc", "ac 1-phase", "ac 3-phase"] as const;
/**
 * `table 9`: effective impedance R cos φ + X sin φ of ac conductors in conduit; `table 8`: dc resistance at 75 °C;
 * `K`: resistivity constant and circular mils, common practice, no published source.
 */
export const DROP_METHODS = ["table 9", "table 8", "K"] as const;
export type DropMethod = (typeof DROP_METHODS)[number];

export interface VoltageDropInput {
  readonly edition: Edition;
  readonly system: (typeof DROP_SYSTEMS)[number];
  /** Left out: table 8 for dc, table 9 for ac. */
  readonly method?: DropMethod;
  readonly currentA: number;
  /** Voltage between the conductors of the circuit, V. */
  readonly voltageV: number;
  /** One-way length along the route, ft. */
  readonly lengthFt: number;
  readonly size: ConductorSize;
  readonly material: Material;
  readonly sets?: number;
  readonly solid?: boolean;
  readonly coated?: boolean;
  /** Table 9 only; a cable without metal takes pvc. */
  readonly conduit?: ConduitMaterial;
  /** Power factor, 1 for inverter circuits. */
  readonly powerFactor?: number;
}

export interface VoltageDropDetail {
  readonly dropPct: number;
  /** Effective impedance of one conductor, Ω per 1000 ft, before parallel sets. */
  readonly ohmPerKft: number;
  readonly method: DropMethod;
  readonly endVoltageV: number;
}

/** Resistivity at 75 °C in Ω·cmil/ft: common practice, no published source. */
const K_CONSTANT = { copper: 12.9, aluminum: 21.2 } as const;

/**
 * Voltage drop in V along a circuit, and in percent. A source at the far end makes the same figure a rise.
 * @throws QuantityError or CodeLookupError naming the field. Source: Chapter 9 Tables 8 and 9 with note 2.
 */
export function voltageDrop(input: VoltageDropInput): CalcResult<number, VoltageDropDetail> {
  const sheet = new Worksheet(input.edition);
  const system = checkOneOf("system", input.system, DROP_SYSTEMS);
  const method = checkOneOf("method", input.method ?? (system === "dc" ? "table 8" : "table 9"), DROP_METHODS);
  if (system === "dc" && method === "table 9") checkOneOf("method", "table 9 (ac) for dc", ["table 8", "K"]);
  const current = checkNumber("currentA", input.currentA, { min: 0, max: 10000, unit: "A" });
  const voltage = checkNumber("voltageV", input.voltageV, { min: 0, max: 35000, unit: "V", aboveMin: true });
  const length = checkNumber("lengthFt", input.lengthFt, { min: 0, max: 50000, unit: "ft" });
  const sets = checkInteger("sets", input.sets ?? 1, { min: 1, max: 20, unit: "conductors a phase" });
  const ohm = effectiveOhm(sheet, input, method);
  const k = system === "ac 3-phase" ? Math.sqrt(3) : 2;
  const drop = sheet.number("Vd", `${system === "ac 3-phase" ? "√3" : "2"} × Z × I × L / (1000 × n)`, `${k === 2 ? "2" : "1.732"} × ${shown(ohm)} Ω/kft × ${shown(current)} A × ${shown(length)} ft / (1000 × ${sets})`, (k * ohm * current * length) / (1000 * sets), "V");
  const percent = sheet.number("Vd%", "Vd / V", `${shown(drop)} V / ${shown(voltage)} V`, (100 * drop) / voltage, "%", "voltage-drop-note");
  return sheet.result(drop, "V", { dropPct: percent, ohmPerKft: ohm, method, endVoltageV: voltage - drop });
}

/**
 * The same drop in percent without its worked lines, at unity power factor, for many circuits at once: Table 8 for dc,
 * the resistance of Table 9 for ac.
 * @throws CodeLookupError where the table holds no value.
 */
export function voltageDropPct(input: Pick<VoltageDropInput, "system" | "currentA" | "voltageV" | "lengthFt" | "size" | "material" | "sets" | "conduit">): number {
  const ohm = input.system === "dc" ? dcResistanceOhmPerKft(input.size, input.material) : acImpedance(input.size, input.material, input.conduit ?? "pvc").resistanceOhmPerKft;
  const k = input.system === "ac 3-phase" ? Math.sqrt(3) : 2;
  return (k * ohm * input.currentA * input.lengthFt) / (10 * (input.sets ?? 1) * input.voltageV);
}

/**
 * Voltage rise in V at the output of an inverter: the drop of the same circuit at unity power factor, with the voltage at
 * the inverter for a given voltage at the connection.
 * @throws QuantityError or CodeLookupError naming the field.
 */
export function inverterVoltageRise(input: Omit<VoltageDropInput, "powerFactor" | "system"> & { readonly system: "ac 1-phase" | "ac 3-phase" }): CalcResult<number, { readonly risePct: number; readonly inverterV: number }> {
  const drop = voltageDrop({ ...input, powerFactor: 1 });
  const sheet = new Worksheet(input.edition);
  sheet.include(drop);
  const inverterV = sheet.number("Vinv", "V + rise", `${shown(input.voltageV)} V + ${shown(drop.value)} V`, input.voltageV + drop.value, "V");
  return sheet.result(drop.value, "V", { risePct: drop.detail.dropPct, inverterV });
}

function effectiveOhm(sheet: Worksheet, input: VoltageDropInput, method: DropMethod): number {
  const size = parseConductorSize(input.size);
  const material = checkOneOf("material", input.material, MATERIALS);
  if (method === "table 8") {
    return sheet.number("R", "dc resistance at 75 °C", `${size} ${material}, ${input.solid === true ? "solid" : "stranded"}`, dcResistanceOhmPerKft(size, material, input.solid, input.coated), "Ω/kft", "conductor-properties");
  }
  if (method === "K") {
    const k = material === "copper" ? K_CONSTANT.copper : K_CONSTANT.aluminum;
    return sheet.number("R", "1000 × K / area (common practice, no published source)", `1000 × ${k} / ${shown(circularMils(size))} cmil`, (1000 * k) / circularMils(size), "Ω/kft");
  }
  const conduit = checkOneOf("conduit", input.conduit ?? "pvc", CONDUIT_MATERIALS);
  const powerFactor = checkNumber("powerFactor", input.powerFactor ?? 1, { min: 0.1, max: 1, unit: "" });
  const { resistanceOhmPerKft: r, reactanceOhmPerKft: x } = acImpedance(size, material, conduit);
  const sine = Math.sqrt(1 - powerFactor * powerFactor);
  return sheet.number("Z", "R cos φ + X sin φ", `${r} Ω/kft × ${shown(powerFactor)} + ${x} Ω/kft × ${shown(sine)} (${size} ${material}, ${conduit})`, r * powerFactor + x * sine, "Ω/kft", "ac-impedance");
}
