import { checkNumber, checkOneOf, parseConductorSize, sizeIndex, type ConductorSize } from "@/lib/units";
import { CodeLookupError } from "./errors";
import { BURIAL_LOCATIONS, BURIAL_METHODS, BURIAL_ROWS, SLAB_RACEWAY_COVER_IN, type BurialLocation, type BurialMethod } from "./tables/burial-depth";
import { CLIMATE_STATIONS, type ClimateStation } from "./tables/climate-stations";
import { ESS_LIMITS_KWH, ESS_LOCATIONS, type EssLocation } from "./tables/ess-limits";
import { VOLTAGE_CORRECTION_ROWS } from "./tables/pv-voltage";
import { SCREW_CONNECTORS, SMALL_SCREW_ROWS, SOCKET_SCREW_ROWS, TORQUE_ROWS, type ScrewConnector } from "./tables/torque";
import { WORKING_SPACE_ROWS } from "./tables/working-space";

/** Factor on the rated open-circuit voltage of crystalline modules at the lowest ambient in °C. @throws CodeLookupError below −40 °C. */
export function pvVoltageFactor(lowestC: number): number {
  checkNumber("lowestC", lowestC, { min: -60, max: 60, unit: "°C" });
  if (lowestC >= 25) return 1;
  const row = VOLTAGE_CORRECTION_ROWS.find((item) => lowestC >= item.minC);
  if (row === undefined) throw new CodeLookupError("lowestC", `no factor for ${lowestC} °C`, "-40 °C and above");
  return row.factor;
}

/** Minimum cover in in. `inRaceway` matters under a slab of 4 in only. */
export function burialCoverIn(location: BurialLocation, method: BurialMethod, inRaceway = false): number {
  checkOneOf("location", location, BURIAL_LOCATIONS);
  const column = BURIAL_METHODS.indexOf(checkOneOf("method", method, BURIAL_METHODS));
  const row = BURIAL_ROWS.find((item) => item.location === location);
  const cover = row?.coverIn[column];
  if (cover === undefined) throw new CodeLookupError("location", `no row for ${location}`);
  return location === "under-slab-4in" && column >= 3 && inRaceway ? SLAB_RACEWAY_COVER_IN : cover;
}

/** Depth of working space in ft by voltage to ground and condition 1, 2 or 3. @throws CodeLookupError above 1000 V. */
export function workingSpaceDepthFt(voltageToGroundV: number, condition: 1 | 2 | 3): number {
  checkNumber("voltageToGroundV", voltageToGroundV, { min: 0, max: 1000, unit: "V" });
  checkOneOf("condition", condition, [1, 2, 3]);
  const row = WORKING_SPACE_ROWS.find((item) => voltageToGroundV <= item.maxV);
  if (row === undefined) throw new CodeLookupError("voltageToGroundV", `no row for ${voltageToGroundV} V`, "0 to 1000 V");
  return row.depthFt[condition];
}

/** Energy limit in kWh of a place in a one- or two-family dwelling. */
export function essLimitKwh(location: EssLocation): number {
  return ESS_LIMITS_KWH[checkOneOf("location", location, ESS_LOCATIONS)];
}

/** Default torque in lbf·in by conductor size and screw, Table I.1. @throws CodeLookupError where the table holds none. */
export function defaultTorqueLbfIn(size: ConductorSize, screw: ScrewConnector): number {
  const index = sizeIndex(parseConductorSize(size));
  const column = SCREW_CONNECTORS.indexOf(checkOneOf("screw", screw, SCREW_CONNECTORS));
  const value = TORQUE_ROWS.find((row) => index <= sizeIndex(row.to))?.torqueLbfIn[column] ?? null;
  if (value === null) throw new CodeLookupError("size", `no value for ${size} with ${screw}`);
  return value;
}

/** Default torque in lbf·in of a slotted screw smaller than No. 10 by slot length, Table I.2. @throws CodeLookupError. */
export function smallScrewTorqueLbfIn(slotLengthIn: string, wideSlot: boolean): number {
  const row = SMALL_SCREW_ROWS.find((item) => item.slotLengthIn === slotLengthIn);
  const value = row === undefined ? null : wideSlot ? row.wideLbfIn : row.narrowLbfIn;
  if (value === null) throw new CodeLookupError("slotLengthIn", `no value for ${slotLengthIn}`, SMALL_SCREW_ROWS.map((item) => item.slotLengthIn).join(", "));
  return value;
}

/** Default torque in lbf·in of a socket screw by width across flats, Table I.3. @throws CodeLookupError. */
export function socketScrewTorqueLbfIn(acrossFlatsIn: string): number {
  const row = SOCKET_SCREW_ROWS.find((item) => item.acrossFlatsIn === acrossFlatsIn);
  if (row === undefined) throw new CodeLookupError("acrossFlatsIn", `no value for ${acrossFlatsIn}`, SOCKET_SCREW_ROWS.map((item) => item.acrossFlatsIn).join(", "));
  return row.torqueLbfIn;
}

/** Station by its WMO number. @throws CodeLookupError. */
export function climateStation(wmo: string): ClimateStation {
  const row = CLIMATE_STATIONS.find((item) => item.wmo === wmo);
  if (row === undefined) throw new CodeLookupError("wmo", `no station ${wmo}`);
  return row;
}
