import { bareConductorDimensions, conductorDimensions, INSULATIONS, type Insulation } from "@/lib/code";
import { checkInteger, checkNumber, checkOneOf, circleAreaIn2, parseConductorSize, QuantityError, type ConductorSize } from "@/lib/units";
import { shown, type Worksheet } from "./worksheet";

/**
 * Equal conductors or cables in a raceway. Give the outside diameter of the product where it is known or where the tables
 * hold none (PV wire, fine-stranded and data cables); otherwise size and insulation, or size and `bare`.
 * A multiconductor cable counts as one; an oval cable takes its larger diameter.
 */
export interface FillItem {
  readonly label?: string;
  readonly count: number;
  readonly outsideDiameterIn?: number;
  readonly size?: ConductorSize;
  readonly insulation?: Insulation;
  readonly bare?: boolean;
  readonly solid?: boolean;
  /** Compact stranding, Table 5A. */
  readonly compact?: boolean;
  /** RHH, RHW and RHW-2 with outer covering; true unless said otherwise. */
  readonly covered?: boolean;
}

/** An item with its outside measures. */
export interface SizedItem {
  readonly label: string;
  readonly count: number;
  readonly diameterIn: number;
  readonly areaIn2: number;
}

/** Reads the outside measures of each item and writes them into the worksheet. @throws QuantityError or CodeLookupError. */
export function fillItems(sheet: Worksheet, field: string, items: readonly FillItem[]): readonly SizedItem[] {
  return items.map((item, index) => sizedItem(sheet, `${field}.${index}`, item, `item ${index + 1}`));
}

/** Reads the outside measures of one item. @throws QuantityError or CodeLookupError naming the field below `at`. */
export function sizedItem(sheet: Worksheet, at: string, item: FillItem, name: string): SizedItem {
  const count = checkInteger(`${at}.count`, item.count, { min: 0, max: 5000, unit: "conductors" });
  if (item.outsideDiameterIn !== undefined) {
    const diameterIn = checkNumber(`${at}.outsideDiameterIn`, item.outsideDiameterIn, { min: 0.01, max: 10, unit: "in" });
    const label = item.label ?? name;
    const areaIn2 = sheet.number("a", "π/4 × d²", `${label}: d = ${shown(diameterIn)} in`, circleAreaIn2(diameterIn), "in²", "fill-other-conductors");
    return { label, count, diameterIn, areaIn2 };
  }
  if (item.size === undefined) throw new QuantityError(`${at}.size`, "value is missing: give size and insulation, or the outside diameter");
  const size = parseConductorSize(item.size, `${at}.size`);
  if (item.bare !== true && item.insulation === undefined) throw new QuantityError(`${at}.insulation`, "value is missing: give the insulation, or say bare", INSULATIONS.join(", "));
  const found = item.bare === true
    ? bareConductorDimensions(size, item.solid, `${at}.`)
    : conductorDimensions(size, checkOneOf(`${at}.insulation`, item.insulation, INSULATIONS), item.compact, item.covered, `${at}.`);
  const label = item.label ?? `${size} ${item.bare === true ? "bare" : item.insulation}`;
  sheet.number("a", "area of one conductor", label, found.areaIn2, "in²", found.meaning);
  return { label, count, diameterIn: found.diameterIn, areaIn2: found.areaIn2 };
}
