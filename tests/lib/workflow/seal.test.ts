import { describe, expect, it } from "vitest";
import type { CheckResult, Finding, Severity } from "@/lib/rules/engine/types";
import { blocksSeal, carriedAcceptances, sealRefusals, withAcceptances, type SealQuestion } from "@/lib/workflow";

const finding = (key: string, change: Partial<Finding> = {}): Finding => ({
  key, rule: "some-rule", severity: "must-fix", kind: "finding", citation: "", verifySection: false, risk: "", suggestions: [], folded: [], fields: [], blocks: false,
  accepted: null, variant: "v", anchor: { collection: "equipment", id: key }, related: [], message: `${key} is wrong`, steps: [], ...change,
});
const result = (findings: Finding[], counts: Partial<CheckResult["counts"]> = {}): CheckResult => ({
  ruleSet: "1", edition: "2023", digest: "d", rulesRun: 1, findings, declarations: [], timing: {},
  counts: { mustFix: 0, shouldFix: 0, advice: 0, needsData: 0, accepted: 0, declared: 0, pass: 0, ...counts },
});
const question = (change: Partial<SealQuestion> = {}): SealQuestion => ({
  state: "in review", check: result([]), draftDigest: "d", today: "2026-12-01",
  license: { state: "Test State", number: "L-1", expiresOn: "2026-12-01", hasSealGraphic: true }, ...change,
});
const codes = (change: Partial<SealQuestion>) => sealRefusals(question(change)).map((each) => each.code);

describe("what stands in the way of a seal", () => {
  it("is nothing for a clean drawing under a license that ends today", () => {
    expect(codes({})).toEqual([]);
  });

  it.each<[string, Partial<Finding>, boolean]>([
    ["a must-fix", {}, true],
    ["a must-fix that was accepted", { accepted: { by: "a", license: "b", reason: "c", on: "2026-01-01" } }, false],
    ["a should-fix", { severity: "should-fix" }, false],
    ["needs data of a must-fix rule", { kind: "needs-data", severity: "advice" as Severity, blocks: true }, true],
    ["needs data of another rule", { kind: "needs-data", blocks: false }, false],
  ])("%s: %j", (_, change, blocks) => {
    expect(blocksSeal(finding("a", change))).toBe(blocks);
  });

  it("is each of these by its name, in the order in which a person settles them", () => {
    const check = result([finding("a"), finding("b", { kind: "needs-data", blocks: true }), finding("c", { severity: "should-fix" })]);
    const refusals = sealRefusals(question({ check, draftDigest: "other", license: { state: "S", number: "L-1", expiresOn: "2026-11-30", hasSealGraphic: false } }));
    expect(refusals.map((each) => each.code)).toEqual(["draft-moved-on", "must-fix-open", "needs-data-open", "license-expired", "seal-graphic-missing"]);
    expect(refusals.flatMap((each) => each.findings ?? []).map((each) => each.key)).toEqual(["a", "b"]);
    expect(codes({ check: { ...result([]), edition: "2026" } })).toEqual(["edition-preview"]);
    expect(codes({ license: null })).toEqual(["license-missing"]);
    expect(codes({ state: "returned" })).toEqual(["not-in-review"]);
  });
});

describe("acceptances", () => {
  const acceptance = { findingKey: "a", reason: "r", by: "L", license: "PE L-1", on: "2026-12-01" };

  it("move a finding from its count to the accepted ones, and leave digest and the rest alone", () => {
    const check = result([finding("a"), finding("b"), finding("n", { kind: "needs-data", blocks: true })], { mustFix: 2, needsData: 1 });
    const once = withAcceptances(check, [acceptance]);
    expect(once.counts).toEqual({ ...check.counts, mustFix: 1, accepted: 1 });
    expect(once.findings.map((each) => each.accepted?.reason ?? null)).toEqual(["r", null, null]);
    expect(withAcceptances(once, [acceptance]).counts).toEqual(once.counts);
    expect(withAcceptances(check, [{ ...acceptance, findingKey: "n" }]).counts).toEqual({ ...check.counts, needsData: 0, accepted: 1 });
    expect(withAcceptances(check, [{ ...acceptance, findingKey: "gone" }])).toEqual(check);
    expect(check.findings[0]?.accepted).toBeNull();
  });

  it("go on to the next revision only while kind, severity and numbers stay", () => {
    const before = result([finding("a"), finding("b")]);
    const step = { symbol: "I", expression: "", substituted: "", result: 50, unit: "A" };
    const carried = (now: Finding[]) => carriedAcceptances(before, result(now), ["a"]);
    expect(carried([finding("a"), finding("b")])).toEqual(["a"]);
    expect(carried([finding("a", { steps: [step] })])).toEqual([]);
    expect(carried([finding("a", { severity: "should-fix" })])).toEqual([]);
    expect(carried([finding("b")])).toEqual([]);
  });
});
