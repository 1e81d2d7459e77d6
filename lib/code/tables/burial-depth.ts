/**
 * Minimum cover, underground, to 1000 V.
 * Source: NFPA 70-2023 Table 300.5(A); 2017 and 2020 Table 300.5.
 * Unit: inch, top of cable or raceway to finished grade. Under a slab of 4 in, columns 4 and 5 ask 6 in for direct burial, 4 in in raceway.
 */
import type { TableInfo } from "../types";

export const BURIAL_INFO: TableInfo = {
  meaning: "burial-depth",
  title: "Minimum cover requirements",
  values: { "2017": "read", "2020": "read", "2023": "read", "2026": "preview" },
};

/** Wiring methods, the columns of the table. */
export const BURIAL_METHODS = ["direct-burial", "RMC-IMC", "nonmetallic-raceway", "residential-branch-gfci", "low-voltage-lighting"] as const;
export type BurialMethod = (typeof BURIAL_METHODS)[number];

export interface BurialRow {
  readonly location: BurialLocation;
  readonly text: string;
  /** Cover by method, in the order of BURIAL_METHODS. */
  readonly coverIn: readonly [number, number, number, number, number];
}

export const BURIAL_LOCATIONS = [
  "other",
  "under-concrete-2in",
  "under-building",
  "under-slab-4in",
  "street-driveway-parking",
  "dwelling-driveway",
  "airport-runway",
] as const;
export type BurialLocation = (typeof BURIAL_LOCATIONS)[number];

export const BURIAL_ROWS: readonly BurialRow[] = [
  { location: "other", text: "all locations not specified below", coverIn: [24, 6, 18, 12, 6] },
  { location: "under-concrete-2in", text: "in trench below 2 in thick concrete or equivalent", coverIn: [18, 6, 12, 6, 6] },
  { location: "under-building", text: "under a building (raceway, or MC/MI identified for direct burial)", coverIn: [0, 0, 0, 0, 0] },
  { location: "under-slab-4in", text: "under 4 in thick concrete exterior slab, no vehicles, slab 6 in beyond", coverIn: [18, 4, 4, 6, 6] },
  { location: "street-driveway-parking", text: "under streets, highways, roads, alleys, driveways, parking lots", coverIn: [24, 24, 24, 24, 24] },
  { location: "dwelling-driveway", text: "one- and two-family dwelling driveways and outdoor parking, dwelling purposes only", coverIn: [18, 18, 18, 12, 18] },
  { location: "airport-runway", text: "in or under airport runways", coverIn: [18, 18, 18, 18, 18] },
];

/** Row "under slab", columns 4 and 5: cover in a raceway instead of direct burial. */
export const SLAB_RACEWAY_COVER_IN = 4;
