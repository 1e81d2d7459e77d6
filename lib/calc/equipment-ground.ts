import { CodeLookupError, egcSizeForOcpd, MATERIALS, type Edition, type Material } from "@/lib/code";
import { checkInteger, checkNumber, checkOneOf, circularMils, compareSizes, CONDUCTOR_SIZES, FieldError, parseConductorSize, sizeForCircularMils, type ConductorSize } from "@/lib/units";
import { conductorAmpacity, type AmpacityInput } from "./ampacity";
import { shown, Worksheet, type CalcResult } from "./worksheet";

export interface EquipmentGroundInput {
  readonly edition: Edition;
  /** Largest overcurrent device ahead of the circuits that share the conductor, A. PV circuits without one: 1.25 × maximum current. */
  readonly ocpdA: number;
  readonly material: Material;
  /** Largest ungrounded conductor as installed. */
  readonly ungroundedSize: ConductorSize;
  readonly ungroundedMaterial: Material;
  /**
   * Smallest size with sufficient ampacity for the circuit (see `sufficientSize`); null or left out = not increased.
   */
  readonly minimumSize?: ConductorSize | null;
  /** PV circuits are not increased, 690.45. */
  readonly pvCircuit?: boolean;
  /** Conductors in parallel a phase, each set in its own raceway: a full-size conductor in each. */
  readonly sets?: number;
}

export interface EquipmentGroundDetail {
  readonly tableSize: ConductorSize;
  /** Area ratio of the increase; 1 where none applies. */
  readonly ratio: number;
  /** Area asked for before a size is picked, cmil. */
  readonly requiredCmil: number;
  readonly limitedToUngrounded: boolean;
  readonly perRaceway: boolean;
}

/**
 * Smallest equipment grounding conductor of a circuit: table by the device, increased in proportion to the ungrounded
 * conductors with the areas of Table 8 unrounded, never larger than the ungrounded conductors.
 * @throws QuantityError or CodeLookupError naming the field. Source: 250.122(A), (B), (F), 690.45.
 */
export function equipmentGroundingConductor(input: EquipmentGroundInput): CalcResult<ConductorSize, EquipmentGroundDetail> {
  const sheet = new Worksheet(input.edition);
  const ocpd = checkNumber("ocpdA", input.ocpdA, { min: 0, max: 6000, unit: "A", aboveMin: true });
  const material = checkOneOf("material", input.material, MATERIALS);
  const ungroundedMaterial = checkOneOf("ungroundedMaterial", input.ungroundedMaterial, MATERIALS);
  const ungrounded = parseConductorSize(input.ungroundedSize, "ungroundedSize");
  const sets = checkInteger("sets", input.sets ?? 1, { min: 1, max: 20, unit: "conductors a phase" });
  const tableSize = sheet.text("EGC", "table by the overcurrent device", `${shown(ocpd, 2)} A, ${material}`, egcSizeForOcpd(ocpd, material), "egc-table");
  const minimum = input.minimumSize === undefined || input.minimumSize === null ? null : parseConductorSize(input.minimumSize, "minimumSize");
  let ratio = 1;
  let required = circularMils(tableSize);
  if (input.pvCircuit === true) sheet.text("EGC", "PV circuit, not increased", "", tableSize, "pv-egc");
  else if (minimum !== null && compareSizes(ungrounded, minimum) > 0) {
    ratio = sheet.number("r", "area installed / area of the minimum size", `${shown(circularMils(ungrounded))} cmil / ${shown(circularMils(minimum))} cmil`, circularMils(ungrounded) / circularMils(minimum), "", "egc-upsize");
    required = sheet.number("a", "r × area of the table size", `${shown(ratio)} × ${shown(circularMils(tableSize))} cmil`, ratio * circularMils(tableSize), "cmil", "conductor-properties");
  }
  let value = required > 2e6 ? null : sizeForCircularMils(required, "ocpdA");
  // The comparison is by area and so only holds within one metal; an aluminum phase never caps a copper conductor lower than its own area.
  const limited = material === ungroundedMaterial && (value === null || compareSizes(value, ungrounded) > 0);
  if (limited) value = sheet.text("EGC", "not larger than the ungrounded conductors", `${ungrounded}`, ungrounded, "egc-size");
  if (value === null) throw new FieldError("ocpdA", `${shown(required)} cmil is above the largest size`);
  if (ratio > 1 && !limited) sheet.text("EGC", "next size with that area", `${shown(required)} cmil`, value, "egc-upsize");
  if (sets > 1) sheet.text("EGC", "full size in each raceway of the parallel sets", `${sets} sets`, value, "egc-parallel");
  return sheet.result(value, "", { tableSize, ratio, requiredCmil: required, limitedToUngrounded: limited, perRaceway: sets > 1 });
}

/**
 * Smallest size that has sufficient ampacity for a circuit, the base of a proportional increase: at least the rating of
 * the device and the load. From 2020 heat and bundling are inside it, so an increase for them alone is no increase; in
 * 2017 every increase counts and the base is read without factors.
 * The round-up of 240.4(B) is a permission and never the base.
 * @throws CodeLookupError when no size of the tables suffices.
 */
export function sufficientSize(input: Omit<AmpacityInput, "size"> & { readonly requiredA: number }): ConductorSize {
  const { requiredA, ...circuit } = input;
  checkNumber("requiredA", requiredA, { min: 0, max: 20000, unit: "A", aboveMin: true });
  for (const size of CONDUCTOR_SIZES) {
    const ampacity = ampacityOrNull({ ...circuit, size });
    if (ampacity !== null && ampacity >= requiredA) return size;
  }
  throw new CodeLookupError("requiredA", `no size carries ${requiredA} A`);
}

function ampacityOrNull(input: AmpacityInput): number | null {
  try {
    const { value, detail } = conductorAmpacity(input);
    return input.edition === "2017" ? detail.terminalLimitA : value;
  } catch (error) {
    // Only a size that the table does not hold is passed over; every other fault of the input stands.
    if (error instanceof CodeLookupError && error.field === "size") return null;
    throw error;
  }
}
