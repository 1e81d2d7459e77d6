/**
 * Constants of the photovoltaic, interconnection, storage, generator and motor articles.
 * Source: NFPA 70-2017 690, 705, 706, 445; NFPA 70-2020 690; 430.22 and 430.52 as long-standing practice; 445.12(C) and
 * thresholds of 690.11 and 690.12 as read in 2017.
 */
import type { Edition } from "../types";

/** 690.8(A), 690.8(B)(1), 705.28(B), 706.31(B): factor of a continuous current. */
export const CONTINUOUS_FACTOR = 1.25;
/** 690.8(A)(1): irradiance above standard conditions. */
export const PV_IRRADIANCE_FACTOR = 1.25;
/** 690.8(A)(1)(2): an engineered current may not fall below this share, from 100 kW. */
export const PV_ENGINEERED_FLOOR = 0.7;
export const PV_ENGINEERED_MIN_KW = 100;
/** 690.7: on or in one- and two-family dwellings, other buildings, not on buildings. */
export const PV_BUILDING_VOLTAGE = { dwelling: 600, building: 1000, ground: 1500 } as const;
/** 705.12(B): share of the busbar with the sources at opposite ends. */
export const BUSBAR_OPPOSITE_FACTOR = 1.2;
/** 445.13(A): generator conductors to the first distribution device. */
export const GENERATOR_CONDUCTOR_FACTOR = 1.15;
/** 430.22: conductors of a single continuous-duty motor. */
export const MOTOR_CONDUCTOR_FACTOR = 1.25;
/** 430.52: largest rating of an inverse time breaker and of a dual element fuse, share of full-load current. */
export const MOTOR_OCPD_FACTOR = { "inverse time breaker": 2.5, "dual element fuse": 1.75, "nontime delay fuse": 3 } as const;
/** 705.12(A)(3) of 2023: a tap carries a third of all devices that can feed it. */
export const TAP_SHARE_25_FT = 1 / 3;
export const TAP_SHARE_10_FT = 0.1;
/** 310.10(G)(1): smallest conductor that may be paralleled. */
export const PARALLEL_MIN_SIZE = "1/0 AWG" as const;
/** 705.11(B): smallest supply-side conductors from 2020. */
export const SUPPLY_SIDE_MIN_SIZE = { copper: "6 AWG", aluminum: "4 AWG" } as const;
/** 310.14(A)(2): a hotter or more crowded part of this length, or this share of the circuit, need not govern. */
export const LESSER_PART_FT = 10;
export const LESSER_PART_SHARE = 0.1;
/** 110.14(C)(1): terminals of circuits to this rating are 60 °C unless marked. */
export const TERMINAL_60C_MAX_A = 100;
/** Series converter input rating as maximum current: 690.8(A)(2), from 2020. */
export const CONVERTER_INPUT_FROM: Edition = "2020";
/** Informational notes of 210.19 and 215.2. */
export const VOLTAGE_DROP_BRANCH_PCT = 3;
export const VOLTAGE_DROP_TOTAL_PCT = 5;
