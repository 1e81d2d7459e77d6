/** Days before the last day of a license from which a warning stands, the urgent one first. */
export const WARNING_DAYS = [30, 90] as const;

/** How near the end of a license is. Dates of a license are days of its state: it is in force through its last day. */
export type LicenseNearness = "expired" | "within 30 days" | "within 90 days" | "in force";
export interface LicenseExpiry { nearness: LicenseNearness; /** Days from today to the last day; negative once it is over. */ daysLeft: number; /** Null where nothing has to be said. */ words: string | null }

const DAY_MS = 86_400_000;
const dayNumber = (isoDate: string): number => {
  const time = /^\d{4}-\d{2}-\d{2}$/.test(isoDate) ? Date.parse(`${isoDate}T00:00:00Z`) : Number.NaN;
  // A day that the month does not have is read as one of the next month.
  if (Number.isNaN(time) || new Date(time).toISOString().slice(0, 10) !== isoDate) throw new RangeError(`${isoDate} is no calendar date`);
  return time / DAY_MS;
};
const calendar = new Intl.DateTimeFormat("en-US", { month: "long", day: "numeric", year: "numeric", timeZone: "UTC" });
const daysWords = (days: number): string => (days === 1 ? "1 day" : `${days} days`);

/**
 * What has to be said about the end of a license.
 * @param expiresOn last day in force, YYYY-MM-DD
 * @param today the day it is judged on, YYYY-MM-DD
 * @throws RangeError when one of them is no calendar date
 */
export function licenseExpiry(expiresOn: string, today: string): LicenseExpiry {
  const daysLeft = dayNumber(expiresOn) - dayNumber(today);
  const date = calendar.format(new Date(`${expiresOn}T00:00:00Z`));
  if (daysLeft < 0) return { nearness: "expired", daysLeft, words: `Expired ${date}, ${daysWords(-daysLeft)} ago. Nothing can be sealed under it.` };
  if (daysLeft > WARNING_DAYS[1]) return { nearness: "in force", daysLeft, words: null };
  const words = daysLeft === 0 ? `Expires today, ${date}: the last day on which it can seal.` : `Expires ${date}, in ${daysWords(daysLeft)}.`;
  return { nearness: daysLeft <= WARNING_DAYS[0] ? "within 30 days" : "within 90 days", daysLeft, words };
}
