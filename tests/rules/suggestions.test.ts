import { readdirSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { checkDocument } from "@/lib/diagram/check";
import { applyCommand } from "@/lib/diagram/commands";
import type { Drawing } from "@/lib/diagram/schema";
import { check } from "@/lib/rules/engine/run";
import type { CheckResult } from "@/lib/rules/engine/types";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";
import type { RuleCase } from "./support";

const folder = path.join(import.meta.dirname, "cases");
const files = readdirSync(folder).filter((file) => file.endsWith(".cases.ts")).sort();
const all = await Promise.all(files.map(async (file) => ({ rule: path.basename(file, ".cases.ts"), cases: ((await import(path.join(folder, file))) as { cases: readonly RuleCase[] }).cases })));

/** Keys of the must-fix findings. */
const mustFix = (result: CheckResult): readonly string[] => result.findings.filter((each) => each.kind === "finding" && each.severity === "must-fix").map((each) => each.key);

/** Suggestions that say "check the raceway fill" where the raceway of the case is full already. */
const FULL_RACEWAY = new Set(["derated-ampacity: feeder crowded into the PV conduit"]);

function prove(rule: string, drawing: Drawing, full: boolean): void {
  const before = check(drawing);
  const had = new Set(mustFix(before));
  for (const finding of before.findings.filter((each) => each.rule === rule && each.kind === "finding")) {
    for (const suggestion of finding.suggestions) {
      const done = applyCommand(drawing, { type: "applySuggestion", label: suggestion.label, patches: suggestion.patches });
      expect(done.ok, `${suggestion.label} can be applied`).toBe(true);
      if (!done.ok) continue;
      const after = check(done.drawing);
      expect(after.findings.some((each) => each.key === finding.key), `${suggestion.label} clears ${finding.key}`).toBe(false);
      expect(mustFix(after).filter((key) => !had.has(key) && !(full && key.startsWith("conduit-overfill:"))), `${suggestion.label} adds nothing`).toEqual([]);
    }
  }
}

describe("every suggestion made for a case clears its finding and adds no must-fix", () => {
  for (const { rule, cases } of all) for (const one of cases.filter((each) => (each.finds ?? []).length > 0)) {
    it(`${rule}: ${one.name}`, () => {
      const drawing = cleanDrawing();
      one.edit(drawing);
      // The editor refuses to change a document that does not hold together.
      if (checkDocument(drawing).length === 0) prove(rule, drawing, FULL_RACEWAY.has(`${rule}: ${one.name}`));
    });
  }
});
