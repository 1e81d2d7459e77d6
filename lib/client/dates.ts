const DAY_MS = 86_400_000;
const startOfDay = (date: Date) => new Date(date.getFullYear(), date.getMonth(), date.getDate()).getTime();
const time = new Intl.DateTimeFormat("en-US", { hour: "numeric", minute: "2-digit" });
const monthDay = new Intl.DateTimeFormat("en-US", { month: "long", day: "numeric" });
const full = new Intl.DateTimeFormat("en-US", { month: "long", day: "numeric", year: "numeric" });
const calendar = new Intl.DateTimeFormat("en-US", { month: "long", day: "numeric", year: "numeric", timeZone: "UTC" });

/** When something happened, as a list says it: "10 min ago", "Today, 9:12 AM", "Yesterday", "April 20". */
export function whenWords(iso: string, now: Date = new Date()): string {
  const date = new Date(iso);
  const minutes = Math.floor((now.getTime() - date.getTime()) / 60_000);
  if (minutes < 1) return "Just now";
  if (minutes < 60) return `${minutes} min ago`;
  const days = Math.round((startOfDay(now) - startOfDay(date)) / DAY_MS);
  if (days === 0) return `Today, ${time.format(date)}`;
  if (days === 1) return "Yesterday";
  return date.getFullYear() === now.getFullYear() ? monthDay.format(date) : full.format(date);
}

/** 9:12 AM, in the reader's zone. */
export const timeWords = (iso: string): string => time.format(new Date(iso));
/** The same within a sentence: "changed just now". */
export const whenInSentence = (iso: string): string => whenWords(iso).replace(/^(Just|Today|Yesterday)/, (word) => word.toLowerCase());

/** April 23, 2026, in the reader's zone. */
export const dateWords = (iso: string): string => full.format(new Date(iso));
/** April 23, 2026, 2:20 PM. */
export const momentWords = (iso: string): string => `${full.format(new Date(iso))}, ${time.format(new Date(iso))}`;
/** A calendar date (2027-12-31) in words; it belongs to no zone. */
export const calendarWords = (isoDate: string): string => calendar.format(new Date(`${isoDate}T00:00:00Z`));
const shortCalendar = new Intl.DateTimeFormat("en-US", { month: "short", day: "numeric", year: "numeric", timeZone: "UTC" });
/** The same where room is short: Dec 31, 2027. */
export const shortCalendarWords = (isoDate: string): string => shortCalendar.format(new Date(`${isoDate}T00:00:00Z`));
/** Days from the reader's today to a calendar date; negative once it is past. */
export function daysUntil(isoDate: string, now: Date = new Date()): number {
  const [year = 0, month = 1, day = 1] = isoDate.split("-").map(Number);
  return Math.round((new Date(year, month - 1, day).getTime() - startOfDay(now)) / DAY_MS);
}
/** The reader's calendar date: 2027-12-31. */
export function localDay(now: Date = new Date()): string {
  return [now.getFullYear(), now.getMonth() + 1, now.getDate()].map((part) => String(part).padStart(2, "0")).join("-");
}
/** A file size: 254 kB, 3.1 MB (powers of ten). */
export function sizeWords(bytes: number): string {
  return bytes < 1_000_000 ? `${Math.max(1, Math.round(bytes / 1000))} kB` : `${(bytes / 1_000_000).toFixed(1)} MB`;
}
