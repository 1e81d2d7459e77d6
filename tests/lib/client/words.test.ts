import { describe, expect, it } from "vitest";
import { calendarWords, sizeWords, whenWords } from "@/lib/client/dates";
import { returnPath } from "@/lib/client/returnPath";

describe("the way back after signing in", () => {
  it.each(["/", "/jobs", "/jobs/1?tab=people#x"])("leads to %s on this site", (path) => {
    expect(returnPath(path)).toBe(path);
  });
  it.each([undefined, "", "jobs", "//elsewhere.example", "/\\elsewhere.example", "https://elsewhere.example", "javascript:alert(1)", "/\n/elsewhere.example"])("never leads to %j", (path) => {
    expect(returnPath(path)).toBe("/");
  });
});

describe("times in words", () => {
  const now = new Date(2026, 11, 1, 14, 30);
  it.each([
    [new Date(2026, 11, 1, 14, 29, 40), "Just now"],
    [new Date(2026, 11, 1, 14, 20), "10 min ago"],
    [new Date(2026, 11, 1, 9, 12), "Today, 9:12 AM"],
    [new Date(2026, 10, 30, 23, 59), "Yesterday"],
    [new Date(2026, 3, 20), "April 20"],
    [new Date(2025, 3, 20), "April 20, 2025"],
  ])("%s is %s", (date, words) => {
    expect(whenWords(date.toISOString(), now)).toBe(words);
  });

  it("say a calendar date as it is written, in every zone", () => {
    expect(calendarWords("2027-12-31")).toBe("December 31, 2027");
  });

  it("say sizes in kB and MB", () => {
    expect([1, 1499, 254_000, 999_499, 3_100_000].map(sizeWords)).toEqual(["1 kB", "1 kB", "254 kB", "999 kB", "3.1 MB"]);
  });
});
