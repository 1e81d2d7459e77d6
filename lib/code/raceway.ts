import { checkOneOf, parseConductorSize, parseTradeSize, sizeIndex, type ConductorSize, type TradeSize } from "@/lib/units";
import { CodeLookupError } from "./errors";
import { compactColumn, dimensionGroup, INSULATIONS, type Insulation } from "./insulation";
import { BENDING_SPACE_ROWS } from "./tables/bending-space";
import { BOX_VOLUME_ROWS } from "./tables/box-volume";
import { COMPACT_ROWS } from "./tables/compact-dimensions";
import { CONDUCTOR_DIMENSIONS, type DimensionGroup } from "./tables/conductor-dimensions";
import { CONDUCTOR_PROPERTIES } from "./tables/conductor-properties";
import { RACEWAY_DIMENSIONS, RACEWAY_KINDS, type RacewayDimensionRow, type RacewayKind } from "./tables/raceway-dimensions";

/** Outside measures of one conductor: diameter in in, area in in², and the meaning of the table they come from. */
export interface ConductorDimensions {
  readonly diameterIn: number;
  readonly areaIn2: number;
  readonly meaning: "conductor-dimensions" | "compact-dimensions" | "fill-bare";
}

const ROWS = new Map<RacewayKind, readonly RacewayDimensionRow[]>(RACEWAY_KINDS.map((kind) => [kind, rowsOf(kind)]));
const RACEWAYS = new Map(RACEWAY_KINDS.flatMap((kind) => (ROWS.get(kind) ?? []).map((row) => [`${kind} ${row.tradeSize}`, row] as const)));
const DIMENSIONS = new Map(
  (Object.keys(CONDUCTOR_DIMENSIONS) as DimensionGroup[]).flatMap((group) => CONDUCTOR_DIMENSIONS[group].map((row) => [`${group} ${row[0]}`, row] as const)),
);

/** Internal diameter in in and total area in in² of a conduit or tubing, Table 4. @throws CodeLookupError. */
export function racewayDimensions(kind: RacewayKind, tradeSize: TradeSize): RacewayDimensionRow {
  checkOneOf("racewayKind", kind, RACEWAY_KINDS);
  const row = RACEWAYS.get(`${kind} ${parseTradeSize(tradeSize)}`);
  if (row === undefined) throw new CodeLookupError("tradeSize", `the table holds no ${kind} ${tradeSize}`, racewayTradeSizes(kind).join(", "));
  return row;
}

/** Trade sizes of a kind of raceway, smallest first. */
export function racewayTradeSizes(kind: RacewayKind): readonly TradeSize[] {
  return (ROWS.get(checkOneOf("racewayKind", kind, RACEWAY_KINDS)) ?? []).map((row) => row.tradeSize);
}

/**
 * Diameter and area of an insulated conductor by Table 5, or Table 5A for compact stranding.
 * @param covered RHH, RHW and RHW-2 with an outer covering; the larger rows, the safe ones when not known.
 * @param at prefix of the field names in a refusal, such as `items.0.`.
 * @throws CodeLookupError where no table holds the type: the outside diameter of the product is needed.
 */
export function conductorDimensions(size: ConductorSize, insulation: Insulation, compact = false, covered = true, at = ""): ConductorDimensions {
  const key = parseConductorSize(size, `${at}size`);
  checkOneOf(`${at}insulation`, insulation, INSULATIONS);
  if (compact) {
    const column = compactColumn(insulation);
    const cell = column === null ? null : (COMPACT_ROWS.find((row) => row.size === key)?.[column] ?? null);
    if (cell === null) throw new CodeLookupError(`${at}size`, `no compact ${insulation} ${key} in the table; enter the outside diameter`);
    return { diameterIn: cell[0], areaIn2: cell[1], meaning: "compact-dimensions" };
  }
  const group = dimensionGroup(insulation, covered);
  if (group === null) throw new CodeLookupError(`${at}insulation`, `no ${insulation} in the table; enter the outside diameter`);
  const row = DIMENSIONS.get(`${group} ${key}`);
  if (row === undefined) throw new CodeLookupError(`${at}size`, `no ${insulation} ${key} in the table; enter the outside diameter`);
  return { diameterIn: row[1], areaIn2: row[2], meaning: "conductor-dimensions" };
}

/** Diameter and area of a bare conductor, Table 8; solid where asked and made (8 AWG and smaller). @throws CodeLookupError. */
export function bareConductorDimensions(size: ConductorSize, solid = false, at = ""): ConductorDimensions {
  const key = parseConductorSize(size, `${at}size`);
  const row = CONDUCTOR_PROPERTIES.find((item) => item.size === key && (item.strands === 1) === solid);
  if (row === undefined) throw new CodeLookupError(`${at}size`, `no ${solid ? "solid" : "stranded"} bare ${key} in the table`);
  return { diameterIn: row.overallDiameterIn, areaIn2: row.overallAreaIn2, meaning: "fill-bare" };
}

/**
 * Wire-bending space in in, Table 312.6(A).
 * @param compactAluminum use the column of compact aluminum: at terminals only, never for gutters and wireways.
 * @returns null where the table specifies none (10 AWG and smaller).
 * @throws CodeLookupError for a number of wires the table does not hold.
 */
export function bendingSpaceIn(size: ConductorSize, wiresPerTerminal = 1, compactAluminum = false): number | null {
  const index = sizeIndex(parseConductorSize(size));
  checkOneOf("wiresPerTerminal", wiresPerTerminal, [1, 2, 3, 4, 5]);
  const row = BENDING_SPACE_ROWS.find((item) => {
    const range = compactAluminum ? item.compactAluminum : ([item.from, item.to] as const);
    return range !== null && index <= sizeIndex(range[1]);
  });
  if (row === undefined) throw new CodeLookupError("size", `no row for ${size}`);
  const space = row.spaceIn[wiresPerTerminal - 1] ?? null;
  if (space === null && row.spaceIn[0] !== null) throw new CodeLookupError("wiresPerTerminal", `no value for ${wiresPerTerminal} wires of ${size}`);
  return space;
}

/** Volume in in³ that one conductor takes in a box. @throws CodeLookupError from 4 AWG up: 314.28 applies. */
export function boxVolumeIn3(size: ConductorSize): number {
  const key = parseConductorSize(size);
  const row = BOX_VOLUME_ROWS.find((item) => item.size === key);
  if (row === undefined) throw new CodeLookupError("size", `the box volume table holds no ${key}`, "18 AWG to 6 AWG");
  return row.volumeIn3;
}

function rowsOf(kind: RacewayKind): readonly RacewayDimensionRow[] {
  if (kind === "HDPE") return RACEWAY_DIMENSIONS["PVC 40"];
  if (kind !== "LFNC") return RACEWAY_DIMENSIONS[kind];
  // The type letter is not on the drawing: the smallest of the three types is on the safe side.
  const types = [RACEWAY_DIMENSIONS["LFNC-A"], RACEWAY_DIMENSIONS["LFNC-B"], RACEWAY_DIMENSIONS["LFNC-C"]];
  return RACEWAY_DIMENSIONS["LFNC-A"].map((row) => {
    const same = types.flatMap((rows) => rows.filter((other) => other.tradeSize === row.tradeSize));
    return same.reduce((least, other) => (other.totalAreaIn2 < least.totalAreaIn2 ? other : least), row);
  });
}
