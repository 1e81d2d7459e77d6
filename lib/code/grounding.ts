import { checkNumber, checkOneOf, circularMils, sizeForCircularMils, isConductorSize, type ConductorSize } from "@/lib/units";
import { CodeLookupError } from "./errors";
import { BONDING_JUMPER_ROWS, BONDING_JUMPER_SHARE_ABOVE_TABLE } from "./tables/bonding-jumper";
import { EGC_ROWS } from "./tables/egc";
import { GEC_ROWS } from "./tables/gec";
import { MATERIALS, type Material } from "./types";

/**
 * Equipment grounding conductor by the rating of the overcurrent device in A, Table 250.122.
 * @throws CodeLookupError above 6000 A.
 */
export function egcSizeForOcpd(ocpdA: number, material: Material): ConductorSize {
  checkNumber("ocpdA", ocpdA, { min: 0, max: 6000, unit: "A", aboveMin: true });
  checkOneOf("material", material, MATERIALS);
  const row = EGC_ROWS.find((item) => ocpdA <= item.ocpdA);
  if (row === undefined) throw new CodeLookupError("ocpdA", `no row for ${ocpdA} A`, "up to 6000 A");
  return material === "copper" ? row.copper : row.aluminum;
}

/**
 * Grounding electrode conductor by the area of the largest ungrounded supply conductor, or the sum of a parallel set,
 * in circular mils, Table 250.66.
 */
export function gecSizeForSupply(supplyAreaCmil: number, supplyMaterial: Material, material: Material): ConductorSize {
  const row = supplyRow(GEC_ROWS, supplyAreaCmil, supplyMaterial);
  checkOneOf("material", material, MATERIALS);
  return material === "copper" ? row.copper : row.aluminum;
}

/**
 * Main, system or supply-side bonding jumper by the area of the ungrounded supply conductors in circular mils,
 * Table 250.102(C)(1); above the table 12.5 % of that area.
 * @throws CodeLookupError above the table when jumper and supply are of different metals: the table asks for conductors of
 * the jumper metal with equivalent ampacity.
 */
export function bondingJumperSize(supplyAreaCmil: number, supplyMaterial: Material, material: Material): ConductorSize {
  checkOneOf("material", material, MATERIALS);
  const lastCmil = supplyMaterial === "copper" ? 1100e3 : 1750e3;
  if (checkNumber("supplyAreaCmil", supplyAreaCmil, { min: 0, max: 2e7, unit: "cmil", aboveMin: true }) > lastCmil) {
    if ((supplyMaterial === "copper") !== (material === "copper")) {
      throw new CodeLookupError("material", "above the table jumper and supply must be of one metal for this look-up");
    }
    return sizeForCircularMils(supplyAreaCmil * BONDING_JUMPER_SHARE_ABOVE_TABLE, "supplyAreaCmil");
  }
  const row = supplyRow(BONDING_JUMPER_ROWS, supplyAreaCmil, supplyMaterial);
  return material === "copper" ? row.copper : row.aluminum;
}

interface SupplyRow {
  readonly maxCopper: ConductorSize | "1100 kcmil" | null;
  readonly maxAluminum: ConductorSize | null;
  readonly copper: ConductorSize;
  readonly aluminum: ConductorSize;
}

function supplyRow<Row extends SupplyRow>(rows: readonly Row[], supplyAreaCmil: number, supplyMaterial: Material): Row {
  checkNumber("supplyAreaCmil", supplyAreaCmil, { min: 0, max: 2e7, unit: "cmil", aboveMin: true });
  checkOneOf("supplyMaterial", supplyMaterial, MATERIALS);
  const row = rows.find((item) => {
    const limit = supplyMaterial === "copper" ? item.maxCopper : item.maxAluminum;
    return limit === null || supplyAreaCmil <= (isConductorSize(limit) ? circularMils(limit) : 1100e3);
  });
  if (row === undefined) throw new CodeLookupError("supplyAreaCmil", `no row for ${supplyAreaCmil} cmil`);
  return row;
}
