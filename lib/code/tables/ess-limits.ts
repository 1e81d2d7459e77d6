/**
 * Energy storage in one- and two-family dwellings: energy by location and spacing.
 * Source: IRC 2021 R328, NFPA 855-2023 15.5.2 through secondary sources; neither text was read. Which book governs, and
 * whether 80 kWh is meant per location or per dwelling, is decided by state and locality.
 */
export const ESS_LOCATIONS = ["interior utility or storage space", "garage or accessory structure", "exterior wall", "outdoors on the ground"] as const;
export type EssLocation = (typeof ESS_LOCATIONS)[number];

export const ESS_LIMITS_KWH: Readonly<Record<EssLocation, number>> = {
  "interior utility or storage space": 40,
  "garage or accessory structure": 80,
  "exterior wall": 80,
  "outdoors on the ground": 80,
};

export const ESS_UNIT_LIMIT_KWH = 20;
/** Below this energy a unit is outside the scope. */
export const ESS_SCOPE_KWH = 1;
/** Between units, and from doors and windows that open into the dwelling, unless the listing says otherwise. */
export const ESS_SPACING_FT = 3;
