import { readdirSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { rules } from "@/lib/rules";
import { say, type RuleCase } from "./support";

const folder = path.join(import.meta.dirname, "cases");
const files = readdirSync(folder).filter((file) => file.endsWith(".cases.ts")).sort();
const all = await Promise.all(files.map(async (file) => ({ rule: path.basename(file, ".cases.ts"), cases: ((await import(path.join(folder, file))) as { cases: readonly RuleCase[] }).cases })));

describe("cases of every rule on the farm system", () => {
  it("every rule has cases, and none is without a rule", () => {
    expect(all.map((each) => each.rule)).toEqual(rules.map((rule) => rule.meta.id).sort());
  });
  for (const { rule, cases } of all) {
    const { meta } = rules.find((each) => each.meta.id === rule) ?? { meta: null };
    describe(rule, () => {
      it("has no case twice, shows a fault where it can find one, and a lawful case", () => {
        expect(new Set(cases.map((each) => each.name)).size).toBe(cases.length);
        expect(new Set(cases.map((each) => each.edit.toString())).size).toBe(cases.length);
        // Completeness alone asks for values and condemns nothing.
        if (rule !== "rating-unknown") expect(cases.some((each) => (each.finds ?? []).length > 0)).toBe(true);
        expect(cases.some((each) => !each.finds && !each.asks)).toBe(true);
        expect(cases.every((each) => each.source.length > 3)).toBe(true);
      });
      it("asks for what is missing, and a derived rule is tried by moving things", () => {
        const asksNothing = ["sources-not-interlocked", "duplicate-tag", "raceway-not-routed", "bundling-count", "circuit-conductors-together", "parallel-common-output",
          // What they miss is their finding.
          "code-edition-missing", "sheet-fields-missing", "conductor-run-length-missing", "terminal-unconnected", "orphan-equipment", "leg-balance"];
        // What a person may state after building waits as an open question and is asked of nobody as a missing value.
        if (meta?.evidence === "declared" && meta.severity !== "must-fix") expect(cases.some((each) => (each.open ?? []).length > 0 && (each.stated ?? []).length === 0)).toBe(true);
        else if (!asksNothing.includes(rule)) expect(cases.some((each) => (each.asks ?? []).length > 0)).toBe(true);
        // Words and lengths of the sheet itself: there is nothing to move.
        const notMoved = ["duplicate-tag", "code-edition-missing", "sheet-fields-missing", "conductor-run-length-missing", "switched-neutral-symbol"];
        if (meta?.evidence === "derived" && !notMoved.includes(rule)) expect(cases.some((each) => each.moved)).toBe(true);
      });
      for (const one of cases) {
        it(`${one.name} (${one.source})`, () => {
          expect(say(rule, one.edit)).toEqual({ finds: [...(one.finds ?? [])].sort(), asks: [...(one.asks ?? [])].sort(), open: [...(one.open ?? [])].sort(), stated: [...(one.stated ?? [])].sort() });
        });
      }
    });
  }
});
