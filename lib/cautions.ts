/** The cautions of the trade, in one place; screens, sheets and downloads print these words. */
export const CAUTION_TITLE = "Caution";
export const CAUTIONS: readonly string[] = [
  "Work de-energized. Lock out every source and verify absence of voltage with a rated meter before touching anything.",
  "PV is live in daylight. Batteries are always live.",
  "This drawing and its checks do not replace the adopted code, the authority having jurisdiction, the manufacturer's instructions or a licensed person.",
];
/** One paragraph for places that hold no list. */
export const CAUTION_TEXT = CAUTIONS.join(" ");
