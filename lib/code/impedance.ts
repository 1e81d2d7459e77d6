import { checkOneOf, parseConductorSize, type ConductorSize } from "@/lib/units";
import { CodeLookupError } from "./errors";
import { AC_IMPEDANCE_ROWS } from "./tables/ac-impedance";
import { CONDUCTOR_PROPERTIES } from "./tables/conductor-properties";
import type { Material } from "./types";

/** Conduit materials that Table 9 tells apart; a cable without conduit and PVC take the nonmetallic column. */
export const CONDUIT_MATERIALS = ["pvc", "aluminum", "steel"] as const;
export type ConduitMaterial = (typeof CONDUIT_MATERIALS)[number];

/** Resistance and reactance to neutral in Ω per 1000 ft. */
export interface Impedance {
  readonly resistanceOhmPerKft: number;
  readonly reactanceOhmPerKft: number;
}

const IMPEDANCE = new Map(AC_IMPEDANCE_ROWS.map((row) => [row.size, row]));

/** Table 8 and Table 9 give copper and aluminum only. */
function metal(material: Material): "copper" | "aluminum" {
  if (material === "copper" || material === "aluminum") return material;
  throw new CodeLookupError("material", `the table holds no resistance of ${material}`, "copper, aluminum");
}

/**
 * dc resistance at 75 °C in Ω per 1000 ft, Table 8.
 * @param solid solid conductor; only 8 AWG and smaller are made so.
 * @param coated tinned copper.
 * @throws CodeLookupError where the table holds none.
 */
export function dcResistanceOhmPerKft(size: ConductorSize, material: Material, solid = false, coated = false): number {
  const key = parseConductorSize(size);
  const row = CONDUCTOR_PROPERTIES.find((item) => item.size === key && (item.strands === 1) === solid);
  if (row === undefined) throw new CodeLookupError("size", `no ${solid ? "solid" : "stranded"} ${key} in the table`);
  return metal(material) === "aluminum" ? row.aluminum : coated ? row.copperCoated : row.copperUncoated;
}

/** ac resistance and reactance of conductors in conduit, Table 9. @throws CodeLookupError where the table holds none. */
export function acImpedance(size: ConductorSize, material: Material, conduit: ConduitMaterial): Impedance {
  const key = parseConductorSize(size);
  const column = CONDUIT_MATERIALS.indexOf(checkOneOf("conduit", conduit, CONDUIT_MATERIALS)) as 0 | 1 | 2;
  const row = IMPEDANCE.get(key);
  const resistance = row?.[metal(material)][column];
  if (row === undefined || resistance === undefined || resistance === null) throw new CodeLookupError("size", `no ${material} ${key} in the impedance table`);
  return { resistanceOhmPerKft: resistance, reactanceOhmPerKft: conduit === "steel" ? row.reactanceSteel : row.reactancePvcAluminum };
}

/** True where Table 9 holds the size: 700, 800, 900 kcmil and sizes above 1000 kcmil are not in it. */
export function hasAcImpedance(size: ConductorSize, material: Material): boolean {
  const row = IMPEDANCE.get(size);
  return row !== undefined && material !== "copper-clad aluminum" && row[material][0] !== null;
}
