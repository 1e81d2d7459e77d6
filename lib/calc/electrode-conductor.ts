import { bondingJumperSize, gecSizeForSupply, MATERIALS, type Edition, type Material } from "@/lib/code";
import { GEC_ELECTRODE_LIMITS } from "@/lib/code/tables/gec";
import { checkInteger, checkOneOf, circularMils, compareSizes, parseConductorSize, type ConductorSize } from "@/lib/units";
import { shown, Worksheet, type CalcResult } from "./worksheet";

/** Electrode that a conductor runs to alone; `other`: water pipe, structural metal or more than one kind. */
export const ELECTRODES = ["rod, pipe or plate", "concrete-encased", "ground ring", "other"] as const;

export interface SupplyConductors {
  readonly edition: Edition;
  /** Largest ungrounded supply conductor, with its parallel sets. */
  readonly supplySize: ConductorSize;
  readonly supplyMaterial: Material;
  readonly sets?: number;
  /** Metal of the conductor that is sized. */
  readonly material: Material;
}

interface SupplyDetail {
  /** Area of the supply conductors, all sets, cmil. */
  readonly supplyAreaCmil: number;
}

/**
 * Grounding electrode conductor: table by the supply conductors, with the limit of the electrode it runs to alone.
 * @throws QuantityError or CodeLookupError naming the field. Source: Table 250.66, 250.66(A) to (C).
 */
export function groundingElectrodeConductor(
  input: SupplyConductors & { readonly electrode?: (typeof ELECTRODES)[number]; readonly ringSize?: ConductorSize },
): CalcResult<ConductorSize, SupplyDetail & { readonly tableSize: ConductorSize }> {
  const sheet = new Worksheet(input.edition);
  const area = supplyArea(sheet, input);
  const material = checkOneOf("material", input.material, MATERIALS);
  const tableSize = sheet.text("GEC", "table by the supply conductors", `${shown(area)} cmil ${input.supplyMaterial}`, gecSizeForSupply(area, input.supplyMaterial, material), "gec-table");
  const electrode = checkOneOf("electrode", input.electrode ?? "other", ELECTRODES);
  let value = tableSize;
  const limit = electrode === "other" ? null : electrode === "ground ring"
    ? parseConductorSize(input.ringSize, "ringSize")
    : GEC_ELECTRODE_LIMITS[electrode][material === "copper" ? "copper" : "aluminum"];
  if (limit !== null && compareSizes(limit, tableSize) < 0) {
    const meaning = electrode === "concrete-encased" ? "gec-concrete" : electrode === "ground ring" ? "gec-ring" : "gec-rod";
    value = sheet.text("GEC", "need not be larger to this electrode alone", electrode, limit, meaning);
  }
  return sheet.result(value, "", { supplyAreaCmil: area, tableSize });
}

/**
 * Main, system or supply-side bonding jumper, and the smallest grounded conductor of a service.
 * @throws QuantityError or CodeLookupError naming the field. Source: Table 250.102(C)(1).
 */
export function bondingJumper(input: SupplyConductors): CalcResult<ConductorSize, SupplyDetail & { readonly aboveTable: boolean }> {
  const sheet = new Worksheet(input.edition);
  const area = supplyArea(sheet, input);
  const material = checkOneOf("material", input.material, MATERIALS);
  const aboveTable = area > (input.supplyMaterial === "copper" ? 1100e3 : 1750e3);
  const value = sheet.text("BJ", aboveTable ? "12.5 % of the supply area, next size" : "table by the supply conductors", `${shown(area)} cmil ${input.supplyMaterial}`, bondingJumperSize(area, input.supplyMaterial, material), "bonding-jumper-table");
  return sheet.result(value, "", { supplyAreaCmil: area, aboveTable });
}

function supplyArea(sheet: Worksheet, input: SupplyConductors): number {
  const size = parseConductorSize(input.supplySize, "supplySize");
  checkOneOf("supplyMaterial", input.supplyMaterial, MATERIALS);
  const sets = checkInteger("sets", input.sets ?? 1, { min: 1, max: 20, unit: "conductors a phase" });
  return sheet.number("a", "sets × area", `${sets} × ${shown(circularMils(size))} cmil`, sets * circularMils(size), "cmil", "conductor-properties");
}
