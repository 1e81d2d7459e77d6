import { dwellingServiceSize, MATERIALS, type Edition, type Material } from "@/lib/code";
import { DWELLING_SERVICE_FACTOR, DWELLING_SERVICE_MAX_A, DWELLING_SERVICE_MIN_A } from "@/lib/code/tables/dwelling-service";
import { checkNumber, checkOneOf, FieldError, type ConductorSize } from "@/lib/units";
import { sufficientSize } from "./equipment-ground";
import type { AmpacityInput } from "./ampacity";
import { shown, Worksheet, type CalcResult } from "./worksheet";

/**
 * Smallest ungrounded conductor of a single-phase dwelling service or feeder that carries the whole load of the dwelling.
 * With a route the 83 % rule is used with its factors; without one the printed table, which holds no factors.
 * @throws QuantityError or CodeLookupError naming the field. Source: 310.12 (2017: 310.15(B)(7)).
 */
export function dwellingServiceConductor(input: {
  readonly edition: Edition; readonly ratingA: number; readonly material: Material;
  readonly route?: Pick<AmpacityInput, "insulation" | "wet" | "terminalC" | "parts">;
}): CalcResult<ConductorSize, { readonly requiredAmpacityA: number; readonly by: "table" | "83 % rule" }> {
  const sheet = new Worksheet(input.edition);
  const rating = checkNumber("ratingA", input.ratingA, { min: DWELLING_SERVICE_MIN_A, max: DWELLING_SERVICE_MAX_A, unit: "A" });
  const material = checkOneOf("material", input.material, MATERIALS);
  const required = sheet.number("A", "0.83 × rating", `${DWELLING_SERVICE_FACTOR} × ${shown(rating)} A`, DWELLING_SERVICE_FACTOR * rating, "A", "dwelling-83");
  if (input.route === undefined && input.edition !== "2017") {
    const size = sheet.text("size", "table, no correction or adjustment", `${shown(rating)} A ${material}`, dwellingServiceSize(rating, material), "dwelling-83");
    return sheet.result(size, "", { requiredAmpacityA: required, by: "table" });
  }
  if (input.route === undefined) throw new FieldError("route", "value is missing: the 2017 edition has no table here");
  // The 83 % rule asks for an ampacity, so the corrected one is compared in every edition.
  const size = sufficientSize({ ...input.route, edition: input.edition === "2017" ? "2020" : input.edition, material, requiredA: required });
  return sheet.result(sheet.text("size", "smallest size with that ampacity after factors", `${shown(required, 2)} A`, size, "ampacity-table"), "", { requiredAmpacityA: required, by: "83 % rule" });
}
