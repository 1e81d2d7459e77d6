import { racewayDimensions, racewayTradeSizes, RACEWAY_KINDS, type Edition, type RacewayKind } from "@/lib/code";
import { FILL_NIPPLE, FILL_ONE, FILL_OVER_TWO, FILL_TWO, JAM_RATIO_MAX, JAM_RATIO_MIN, NIPPLE_MAX_LENGTH_IN, ROUND_UP_FROM } from "@/lib/code/tables/raceway-fill";
import { WIREWAY_FILL } from "@/lib/code/tables/wireway";
import { checkList, checkNumber, checkOneOf, FieldError, parseTradeSize, type TradeSize } from "@/lib/units";
import { fillItems, sizedItem, type FillItem, type SizedItem } from "./fill-item";
import { shown, Worksheet, type CalcResult } from "./worksheet";

/** A circular raceway by kind and trade size, or a wireway by its inside width and height. */
export type FilledRaceway =
  | { readonly kind: RacewayKind; readonly tradeSize: TradeSize; readonly lengthIn: number }
  | { readonly kind: "metal wireway" | "nonmetallic wireway"; readonly widthIn: number; readonly heightIn: number };

export interface RacewayFillInput {
  readonly edition: Edition;
  readonly raceway: FilledRaceway;
  readonly items: readonly FillItem[];
  /** One conductor or cable kept in mind for later; the result says how many more of it fit. */
  readonly later?: FillItem;
}

export interface RacewayFillDetail {
  readonly usedIn2: number;
  readonly totalIn2: number;
  /** Share of the total that may be used, in percent: 53, 31, 40, 60 or 20. */
  readonly limitPct: number;
  readonly allowedIn2: number;
  readonly conductorCount: number;
  readonly fits: boolean;
  /** Area left within the limit that holds now, in²; below 0 when overfull. */
  readonly roomLeftIn2: number;
  /** How many more of `later` fit, or null where none was given. */
  readonly laterCount: number | null;
  /** Largest number of these conductors by note 7 where all are equal, otherwise null. */
  readonly largestCountEqual: number | null;
  readonly jamRatio: number | null;
  readonly jamLikely: boolean;
}

const LENGTH = { min: 0, max: 240000, unit: "in", aboveMin: true } as const;

/** No trade size of the table holds the conductors. */
export class NoRacewayError extends FieldError {}

/**
 * Fill of a raceway in percent of its inside area, the limit that holds, and the room left.
 * @throws QuantityError or CodeLookupError naming the field. Source: Chapter 9 Tables 1, 4, 5, 5A, 8 and notes; 376.22(A).
 */
export function racewayFill(input: RacewayFillInput): CalcResult<number, RacewayFillDetail> {
  const sheet = new Worksheet(input.edition);
  const { totalIn2, insideDiameterIn } = insideArea(sheet, input.raceway);
  const items = fillItems(sheet, "items", checkList("items", input.items, 0, 500));
  const count = items.reduce((sum, item) => sum + item.count, 0);
  const used = sheet.number("Σa", "sum of the areas", items.map((item) => `${item.count} × ${shown(item.areaIn2)}`).join(" + "), sumArea(items), "in²");
  const limit = limitFor(input.raceway, count);
  const allowed = sheet.number("Amax", "limit × A", `${shown(limit.share)} × ${shown(totalIn2)} in²`, limit.share * totalIn2, "in²", limit.meaning);
  const percent = sheet.number("fill", "Σa / A", `${shown(used)} in² / ${shown(totalIn2)} in²`, (100 * used) / totalIn2, "%");
  const equal = equalCount(input.raceway, items, allowed);
  if (equal !== null) sheet.number("nmax", "equal conductors, rounded up from 0.8", `${shown(allowed)} in² / ${shown(items[0]?.areaIn2 ?? 0)} in²`, equal, "", "fill-rounding");
  const fits = within(used, allowed) || (equal !== null && count <= equal);
  const jamRatio = insideDiameterIn === null ? null : jam(sheet, insideDiameterIn, items, count);
  const later = input.later === undefined ? null : laterCount(sheet, input.raceway, totalIn2, items, input.later);
  return sheet.result(percent, "%", {
    usedIn2: used, totalIn2, limitPct: limit.share * 100, allowedIn2: allowed, conductorCount: count, fits,
    roomLeftIn2: allowed - used, laterCount: later, largestCountEqual: equal, jamRatio,
    jamLikely: jamRatio !== null && jamRatio >= JAM_RATIO_MIN && jamRatio <= JAM_RATIO_MAX,
  });
}

/**
 * Smallest trade size of a kind of conduit or tubing that holds the conductors, with a reserve kept for later ones.
 * @returns the trade size; the detail names the fill with and without the reserve.
 * @throws NoRacewayError when no trade size of the table is large enough.
 */
export function smallestRaceway(input: {
  readonly edition: Edition; readonly kind: RacewayKind; readonly lengthIn: number; readonly items: readonly FillItem[]; readonly reserve?: readonly FillItem[];
}): CalcResult<TradeSize, { readonly fillPct: number; readonly fillWithReservePct: number; readonly limitPct: number }> {
  const sheet = new Worksheet(input.edition);
  checkOneOf("kind", input.kind, RACEWAY_KINDS);
  checkNumber("lengthIn", input.lengthIn, LENGTH);
  const items = checkList("items", input.items, 1, 500);
  const all = [...items, ...checkList("reserve", input.reserve ?? [], 0, 100)];
  for (const tradeSize of racewayTradeSizes(input.kind)) {
    const raceway = { kind: input.kind, tradeSize, lengthIn: input.lengthIn };
    const withReserve = racewayFill({ edition: input.edition, raceway, items: all });
    const now = all.length === items.length ? withReserve : racewayFill({ edition: input.edition, raceway, items });
    if (withReserve.detail.fits && now.detail.fits) {
      sheet.include(withReserve);
      sheet.text("size", "smallest trade size that holds them", `${input.kind}`, tradeSize, "raceway-dimensions");
      return sheet.result(tradeSize, "", { fillPct: now.value, fillWithReservePct: withReserve.value, limitPct: withReserve.detail.limitPct });
    }
  }
  throw new NoRacewayError("items", `no ${input.kind} of the table holds these conductors`, racewayTradeSizes(input.kind).join(", "));
}

function insideArea(sheet: Worksheet, raceway: FilledRaceway): { totalIn2: number; insideDiameterIn: number | null } {
  checkOneOf("raceway.kind", raceway?.kind, [...RACEWAY_KINDS, "metal wireway", "nonmetallic wireway"]);
  if ("tradeSize" in raceway) {
    checkNumber("raceway.lengthIn", raceway.lengthIn, LENGTH);
    const row = racewayDimensions(raceway.kind, parseTradeSize(raceway.tradeSize, "raceway.tradeSize"));
    sheet.number("A", "inside area", `${raceway.kind} ${row.tradeSize}`, row.totalAreaIn2, "in²", "raceway-dimensions");
    return { totalIn2: row.totalAreaIn2, insideDiameterIn: row.internalDiameterIn };
  }
  if (raceway.kind !== "metal wireway" && raceway.kind !== "nonmetallic wireway") throw new FieldError("raceway.tradeSize", "value is missing");
  const width = checkNumber("raceway.widthIn", raceway.widthIn, { min: 0, max: 120, unit: "in", aboveMin: true });
  const height = checkNumber("raceway.heightIn", raceway.heightIn, { min: 0, max: 120, unit: "in", aboveMin: true });
  return { totalIn2: sheet.number("A", "width × height", `${shown(width)} in × ${shown(height)} in`, width * height, "in²"), insideDiameterIn: null };
}

function limitFor(raceway: FilledRaceway, count: number): { share: number; meaning: string } {
  if (!("tradeSize" in raceway)) return { share: WIREWAY_FILL, meaning: raceway.kind === "metal wireway" ? "wireway-fill" : "nonmetallic-wireway-fill" };
  if (raceway.lengthIn <= NIPPLE_MAX_LENGTH_IN) return { share: FILL_NIPPLE, meaning: "fill-nipple" };
  return { share: count <= 1 ? FILL_ONE : count === 2 ? FILL_TWO : FILL_OVER_TWO, meaning: "fill-table" };
}

function sumArea(items: readonly SizedItem[]): number {
  return items.reduce((sum, item) => sum + item.count * item.areaIn2, 0);
}

/** Equal sums of areas in another order must not decide: a few units in the last place are no overfill. */
function within(used: number, allowed: number): boolean {
  return used <= allowed * (1 + 1e-12);
}

/** Note 7: largest number of equal conductors or cables in a conduit or tubing. */
function equalCount(raceway: FilledRaceway, items: readonly SizedItem[], allowed: number): number | null {
  const first = items[0];
  if (first === undefined || !("tradeSize" in raceway) || items.some((item) => item.areaIn2 !== first.areaIn2)) return null;
  const quotient = allowed / first.areaIn2 + 1e-9;
  return quotient - Math.floor(quotient) >= ROUND_UP_FROM ? Math.ceil(quotient) : Math.floor(quotient);
}

function jam(sheet: Worksheet, insideDiameterIn: number, items: readonly SizedItem[], count: number): number | null {
  const first = items[0];
  if (count !== 3 || first === undefined || items.some((item) => item.diameterIn !== first.diameterIn)) return null;
  return sheet.number("j", "inside diameter / conductor diameter", `${shown(insideDiameterIn)} in / ${shown(first.diameterIn)} in`, insideDiameterIn / first.diameterIn, "", "jam-ratio");
}

function laterCount(sheet: Worksheet, raceway: FilledRaceway, totalIn2: number, items: readonly SizedItem[], later: FillItem): number {
  const one = sizedItem(sheet, "later", later, "item");
  const count = items.reduce((sum, item) => sum + item.count, 0);
  let best = 0;
  // The limit changes with the count (53, 31, 40 %), so two may fail where three pass: look past the first failure.
  for (let more = 1; more <= 3 || best === more - 1; more += 1) {
    const all = [...items, { ...one, count: more }];
    const allowed = limitFor(raceway, count + more).share * totalIn2;
    const equal = equalCount(raceway, all, allowed);
    if (within(sumArea(all), allowed) || (equal !== null && count + more <= equal)) best = more;
    if (more > 10000) break;
  }
  return sheet.number("more", `further ${one.label} that fit`, `${shown(one.areaIn2)} in² each`, best, "");
}
