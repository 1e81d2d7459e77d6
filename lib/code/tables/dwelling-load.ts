/**
 * Demand factors of dwelling load calculations.
 * Source: the worked examples of NFPA 70 Informative Annex D (D1(a), D1(b), D2(a), D2(c)) give the lighting, range, dryer,
 * and optional-method figures; appliance demand, cooking table rows beyond the first and the existing-dwelling figures are
 * from memory and to be verified in the adopted book.
 */

/** General lighting and receptacles, VA per ft². */
export const LIGHTING_VA_PER_FT2 = 3;
/** Each small-appliance and laundry circuit, VA. */
export const APPLIANCE_CIRCUIT_VA = 1500;
export const MIN_SMALL_APPLIANCE_CIRCUITS = 2;
/** Lighting demand: share of each slice up to `toVa`. */
export const LIGHTING_DEMAND: readonly { readonly toVa: number; readonly share: number }[] = [
  { toVa: 3000, share: 1 },
  { toVa: 120000, share: 0.35 },
  { toVa: Number.MAX_SAFE_INTEGER, share: 0.25 },
];
/** From this number of fixed appliances their sum may take the share below. */
export const FIXED_APPLIANCE_COUNT = 4;
export const FIXED_APPLIANCE_SHARE = 0.75;
export const DRYER_MIN_VA = 5000;
/** Demand of one to five household ranges of up to 12 kW, kW (cooking table, column C). */
export const RANGE_DEMAND_KW: readonly number[] = [8, 11, 14, 17, 20];
export const RANGE_COLUMN_KW = 12;
export const RANGE_MAX_KW = 27;
/** Increase of the demand for each kW, or larger part of one, above 12 kW. */
export const RANGE_INCREASE_PER_KW = 0.05;
/** Neutral share of ranges and dryers. */
export const NEUTRAL_COOKING_SHARE = 0.7;
/** Optional method: full share to 10 kVA, then 40 %. */
export const OPTIONAL_FULL_VA = 10000;
export const OPTIONAL_SHARE = 0.4;
/** Optional method, electric space heating: less than four separately controlled units, and four or more. */
export const OPTIONAL_HEAT_SHARE_FEW = 0.65;
export const OPTIONAL_HEAT_SHARE_MANY = 0.4;
export const OPTIONAL_HEAT_MANY_UNITS = 4;
/** Optional method: electric heat that supplements a heat pump. */
export const OPTIONAL_SUPPLEMENT_SHARE = 0.65;
/** Existing dwelling: full share to 8 kVA, then 40 %. */
export const EXISTING_FULL_VA = 8000;
export const EXISTING_SHARE = 0.4;
/** Existing load by measured maximum demand takes this factor. */
export const MEASURED_FACTOR = 1.25;
/** Least rating of a service of a one-family dwelling, A. */
export const DWELLING_SERVICE_MIN_RATING_A = 100;
export const LARGEST_MOTOR_SHARE = 0.25;
