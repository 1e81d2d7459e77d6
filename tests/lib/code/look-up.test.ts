import { describe, expect, it } from "vitest";
import {
  ambientCorrectionFactor, bendingSpaceIn, bondingJumperSize, bundlingFactor, citationText, cite, citeOrNull, CodeLookupError, compactColumn, conductorDimensions, climateStation, dimensionGroup, dwellingServiceSize, egcSizeForOcpd,
  EDITIONS, INSULATIONS, insulationRatingC, isInsulation, isStandardRatingA, MATERIAL_BY_SYMBOL, racewayDimensions, RACEWAY_KINDS, rooftopAdderC, standardRatingAtLeastA, standardRatingAtMostA, standardRatingsA, tableAmpacityA,
  type Edition, type Insulation, type Material, type RacewayKind,
} from "@/lib/code";
import { INSULATIONS as DRAWN_INSULATIONS, RACEWAY_TYPES, EDITIONS as DRAWN_EDITIONS } from "@/lib/diagram/schema";
import { FieldError, QuantityError } from "@/lib/units";

const field = (run: () => unknown): string => {
  try {
    run();
  } catch (error) {
    if (error instanceof FieldError) return error.field;
    throw error;
  }
  return "nothing refused";
};

describe("look-ups refuse what a table does not hold, and name the field", () => {
  it.each<[string, () => unknown, string]>([
    ["14 AWG aluminum", () => tableAmpacityA("14 AWG", "aluminum", 75), "size"],
    ["18 AWG at 75 °C", () => tableAmpacityA("18 AWG", "copper", 75), "size"],
    ["unknown column", () => tableAmpacityA("8 AWG", "copper", 80 as 75), "columnC"],
    ["unknown metal", () => tableAmpacityA("8 AWG", "silver" as Material, 75), "material"],
    ["60 °C conductor at 56 °C", () => ambientCorrectionFactor(56, 60), "ambientC"],
    ["90 °C conductor at 86 °C", () => ambientCorrectionFactor(86, 90), "ambientC"],
    ["NaN ambient", () => ambientCorrectionFactor(Number.NaN, 90), "ambientC"],
    ["no conductor", () => bundlingFactor(0), "currentCarryingCount"],
    ["half a conductor", () => bundlingFactor(3.5), "currentCarryingCount"],
    ["height below the roof", () => rooftopAdderC(-1, "THWN-2", "2023"), "rooftopHeightIn"],
    ["unknown edition", () => rooftopAdderC(1, "THWN-2", "2014" as Edition), "edition"],
    ["above 6000 A", () => standardRatingAtLeastA(6001, "2023"), "currentA"],
    ["device above 6000 A", () => egcSizeForOcpd(6001, "copper"), "ocpdA"],
    ["no device", () => egcSizeForOcpd(0, "copper"), "ocpdA"],
    ["other metal above the table", () => bondingJumperSize(1200e3, "copper", "aluminum"), "material"],
    ["160 A dwelling service", () => dwellingServiceSize(160, "copper"), "ratingA"],
    ["EMT 3/8", () => racewayDimensions("EMT", "3/8"), "tradeSize"],
    ["unknown raceway", () => racewayDimensions("hose" as RacewayKind, "1"), "racewayKind"],
    ["PV wire in the dimension table", () => conductorDimensions("10 AWG", "PV wire"), "insulation"],
    ["compact 3 AWG", () => conductorDimensions("3 AWG", "XHHW-2", true), "size"],
    ["THHN of 1250 kcmil", () => conductorDimensions("1250 kcmil", "THHN"), "size"],
    ["six wires a terminal", () => bendingSpaceIn("250 kcmil", 6), "wiresPerTerminal"],
    ["THHN in a wet place", () => insulationRatingC("THHN", true), "insulation"],
    ["unknown insulation", () => insulationRatingC("PVC" as Insulation, false), "insulation"],
    ["unknown station", () => climateStation("000000"), "wmo"],
    ["unknown meaning", () => cite("no-such-meaning", "2023"), "meaning"],
    ["inherited meaning", () => cite("toString", "2023"), "meaning"],
    ["rule the edition has not", () => cite("pv-converter-input", "2017"), "edition"],
  ])("%s", (_, run, name) => expect(field(run)).toBe(name));

  it("tells a missing table value from bad input", () => {
    expect(() => tableAmpacityA("14 AWG", "aluminum", 75)).toThrow(CodeLookupError);
    expect(() => bundlingFactor(-1)).toThrow(QuantityError);
  });
});

describe("what the drawing can say, the tables know", () => {
  it("editions, raceways and insulations", () => {
    expect(DRAWN_EDITIONS).toEqual(EDITIONS);
    for (const type of RACEWAY_TYPES) expect(RACEWAY_KINDS).toContain(type);
    for (const insulation of DRAWN_INSULATIONS) expect(insulation === "bare" || isInsulation(insulation), insulation).toBe(true);
    expect([MATERIAL_BY_SYMBOL.Cu, MATERIAL_BY_SYMBOL.Al]).toEqual(["copper", "aluminum"]);
  });
  it("every insulation has a rating, and a row set unless its product states the diameter", () => {
    for (const insulation of INSULATIONS) {
      expect([60, 75, 90]).toContain(insulationRatingC(insulation, false));
      if (dimensionGroup(insulation, true) === null) expect(["UF", "PV wire"]).toContain(insulation);
      if (compactColumn(insulation) !== null) expect(conductorDimensions("2 AWG", insulation, true).meaning).toBe("compact-dimensions");
    }
    expect([insulationRatingC("XHHW", true), insulationRatingC("XHHW", false), insulationRatingC("THWN-2", true)]).toEqual([75, 90, 90]);
  });
});

describe("ratings and citations", () => {
  it("finds the standard rating above and below, undisturbed by binary fractions", () => {
    expect([standardRatingAtLeastA(1.25 * 32, "2023"), standardRatingAtLeastA(40.0001, "2023"), standardRatingAtMostA(44.9, "2023"), standardRatingAtMostA(9, "2023"), standardRatingAtMostA(12, "2020")]).toEqual([40, 45, 40, null, null]);
    expect([isStandardRatingA(601, "2023"), isStandardRatingA(601, "2023", true), isStandardRatingA(10, "2020"), isStandardRatingA(10, "2020", true)]).toEqual([false, true, false, true]);
    expect([...standardRatingsA("2020", true)].sort((a, b) => a - b)).toEqual(standardRatingsA("2020", true));
  });
  it("prints how sure a section is", () => {
    expect(citationText(cite("ampacity-table", "2023"))).toBe("NEC 2023 Table 310.16");
    expect(citationText(cite("busbar-sum", "2023"))).toBe("NEC 2023 705.12(B)(1) (section to be verified)");
    expect(citationText(cite("load-optional", "2023"))).toContain("verify in the adopted book");
    expect(citationText(cite("ampacity-table", "2026"))).toBe("NEC 2026 Table 310.16 (not confirmed)");
    expect(citationText(cite("ess-limits", "2017"))).toBe("IRC 2021 R328 (verify in the adopted book)");
    expect(cite("ampacity-table", "2023")).toBe(cite("ampacity-table", "2023"));
    expect([citeOrNull("pv-converter-input", "2017"), citeOrNull("pv-converter-input", "2020")?.section]).toEqual([null, "690.8(A)(2)"]);
  });
});
