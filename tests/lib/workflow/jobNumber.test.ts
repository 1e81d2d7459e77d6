import { describe, expect, it } from "vitest";
import { nextJobNumber, schemeFault } from "@/lib/workflow/jobNumber";

describe("job number scheme", () => {
  it.each([["{yy}-{nnn}", null], ["J{yyyy}/{nnnn}", null], ["{nn}", null]])("%s makes numbers", (scheme, fault) => expect(schemeFault(scheme)).toBe(fault));
  it.each(["{yy}", "{nn}{nnn}", "{n}", "{mm}-{nnn}", "{yy}-{nnn}<b>", "{yy-{nnn}", ""])("%s makes none", (scheme) => expect(schemeFault(scheme)).toMatch(/^(needs|knows|may)/));

  it.each([
    ["starts a year at one", "{yy}-{nnn}", [], "26-001"],
    ["goes on after the highest", "{yy}-{nnn}", ["26-031", "26-007", "25-099"], "26-032"],
    ["takes no number of another scheme", "{yy}-{nnn}", ["A-26-500", "26-500-B", "26-12x"], "26-001"],
    ["grows beyond its digits", "{yy}-{nn}", ["26-99"], "26-100"],
    ["reads signs as they stand", "J.{yyyy}.{nnn}", ["Jx2026x900", "J.2026.004"], "J.2026.005"],
    ["does not care for letter case and blanks around", "J{nnn}", [" j041 "], "J042"],
  ] as const)("%s", (_, scheme, taken, next) => expect(nextJobNumber(scheme, taken, "2026-12-01")).toBe(next));
});
