import { describe, expect, it } from "vitest";
import { licenseExpiry } from "@/lib/workflow";

// Distances in days counted on a calendar: November 2026 has 30 days, December 2026 and January 2027 have 31, 2028 is a leap year.
describe("the end of a license", () => {
  it.each([
    ["2026-11-30", "expired", -1], ["2025-12-01", "expired", -365],
    ["2026-12-01", "within 30 days", 0], ["2026-12-02", "within 30 days", 1], ["2026-12-31", "within 30 days", 30],
    ["2027-01-01", "within 90 days", 31], ["2027-03-01", "within 90 days", 90],
    ["2027-03-02", "in force", 91], ["2030-12-31", "in force", 1491],
  ])("%s, seen on December 1, 2026, is %s (%d days)", (expiresOn, nearness, daysLeft) => {
    expect(licenseExpiry(expiresOn, "2026-12-01")).toMatchObject({ nearness, daysLeft });
  });

  it("counts the leap day", () => {
    expect(licenseExpiry("2028-03-01", "2028-02-28").daysLeft).toBe(2);
    expect(licenseExpiry("2027-03-01", "2027-02-28").daysLeft).toBe(1);
  });

  it("says it in words, one day without an s, and nothing while the end is far", () => {
    const words = (expiresOn: string) => licenseExpiry(expiresOn, "2026-12-01").words;
    expect(words("2026-11-30")).toBe("Expired November 30, 2026, 1 day ago. Nothing can be sealed under it.");
    expect(words("2026-12-01")).toBe("Expires today, December 1, 2026: the last day on which it can seal.");
    expect(words("2026-12-02")).toBe("Expires December 2, 2026, in 1 day.");
    expect(words("2027-03-01")).toBe("Expires March 1, 2027, in 90 days.");
    expect(words("2027-03-02")).toBeNull();
  });

  it.each(["2027-02-30", "31.12.2027", "2027-12-31T00:00:00Z", ""])("takes %j for no date", (text) => {
    expect(() => licenseExpiry(text, "2026-12-01")).toThrow(RangeError);
  });
});
