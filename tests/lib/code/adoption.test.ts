import { describe, expect, it } from "vitest";
import { adoptionFaults, adoptionInForce, editionName, isPreview, nextAdoption, previewNote, type Adoption } from "@/lib/code/adoption";
import { EDITIONS } from "@/lib/code/types";

const adoption = (edition: Adoption["edition"], effectiveFrom: string | null = null, effectiveTo: string | null = null): Adoption => ({ edition, effectiveFrom, effectiveTo });
const history = [adoption("2023", "2025-01-01"), adoption("2017", null, "2019-12-31"), adoption("2020", "2021-07-01", "2025-06-30")];

describe("the edition in force", () => {
  it.each([
    ["2018-05-01", "2017"], ["2019-12-31", "2017"],
    // Lapsed, and the next one not yet adopted.
    ["2020-08-01", "2017"],
    ["2021-07-01", "2020"],
    // Both are in force while they overlap; the later one counts.
    ["2025-03-01", "2023"], ["2026-12-01", "2023"],
  ])("on %s is %s, whatever order the list has", (today, edition) => {
    expect(adoptionInForce(history, today).edition).toBe(edition);
    expect(adoptionInForce([...history].reverse(), today).edition).toBe(edition);
  });

  it("is the first to come before any has begun, and never none", () => {
    expect(adoptionInForce([adoption("2026", "2028-01-01"), adoption("2023", "2027-01-01")], "2026-12-01").edition).toBe("2023");
    expect(() => adoptionInForce([], "2026-12-01")).toThrow(RangeError);
    expect(nextAdoption(history, "2022-01-01")).toMatchObject({ edition: "2023" });
    expect(nextAdoption(history, "2026-12-01")).toBeNull();
  });
});

describe("a list of adoptions", () => {
  it("is whole while every edition has its own day", () => {
    expect(adoptionFaults(history)).toEqual([]);
  });
  it("names what is doubled or ends before it begins", () => {
    expect(adoptionFaults([adoption("2020"), adoption("2020", "2024-01-01")])).toMatchObject([{ index: 1, field: "edition" }]);
    expect(adoptionFaults([adoption("2017"), adoption("2020")])).toMatchObject([{ index: 1, field: "effectiveFrom" }]);
    expect(adoptionFaults([adoption("2020", "2024-02-01", "2024-01-31")])).toMatchObject([{ index: 0, field: "effectiveTo" }]);
  });
});

describe("a preview", () => {
  it("is 2026 alone, and says so wherever the edition is named", () => {
    expect(EDITIONS.filter(isPreview)).toEqual(["2026"]);
    expect(editionName("2023")).toBe("NEC 2023");
    expect(editionName("2026")).toBe("NEC 2026 (preview, not confirmed)");
    expect(previewNote("2026")).toContain("limits of 2023");
    expect(previewNote("2023")).toBe("");
  });
});
