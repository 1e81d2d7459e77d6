import { spawnSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import Ajv2020 from "ajv/dist/2020";
import { afterAll, describe, expect, it } from "vitest";
import { drawingJsonSchema } from "@/lib/diagram/jsonSchema";
import type { Drawing } from "@/lib/diagram/schema";
import { RULE_SET_VERSION, rules } from "@/lib/rules";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";

const folder = mkdtempSync(path.join(tmpdir(), "ferrule-check-"));
afterAll(() => rmSync(folder, { recursive: true, force: true }));
const root = path.resolve(import.meta.dirname, "../..");

function run(name: string, content: string, ...options: string[]) {
  const file = path.join(folder, name);
  writeFileSync(file, content);
  const { status, stdout, stderr } = spawnSync(process.execPath, ["--import", "tsx", "scripts/check.ts", file, ...options], { cwd: root, encoding: "utf8" });
  return { status, stdout, stderr };
}
function edited(edit: (drawing: Drawing) => void): string {
  const drawing = cleanDrawing();
  edit(drawing);
  return JSON.stringify(drawing);
}
const wrongBreaker = () => edited((drawing) => { (drawing.equipment["cb-i2"] as Drawing["equipment"][string]).props["ratingA"] = 60; });

describe("the checker on the command line", () => {
  it("ends with 0 on a drawing without must-fix, and names the value that is missing", () => {
    const { status, stdout } = run("clean.json", edited(() => undefined));
    expect(status).toBe(0);
    expect(stdout).toContain("NEEDS DATA  rating-unknown  DS-1");
    expect(stdout).toContain(RULE_SET_VERSION);
  });
  it("with --strict ends with 1 while a must-fix rule waits for a value", () => {
    expect(run("strict.json", edited(() => undefined), "--strict").status).toBe(1);
  });
  it("ends with 1 on a must-fix finding and gives it as JSON when asked", () => {
    const { status, stdout } = run("wrong.json", wrongBreaker(), "--json");
    expect(status).toBe(1);
    const result = JSON.parse(stdout) as { findings: { rule: string; anchor: { id: string } }[]; rulesRun: number; edition: string };
    expect(result.findings.some((one) => one.anchor.id === "cb-i2")).toBe(true);
    expect(result.edition).toBe("2023");
    expect(result.rulesRun).toBeLessThanOrEqual(rules.length);
  });
  it("takes another edition than the drawing's own", () => {
    expect(run("older.json", edited(() => undefined), "--edition", "2020").stdout).toContain("NEC 2020");
  });
  it.each([
    ["no JSON", "{", [], "not valid JSON"],
    ["no drawing", "{\"schemaVersion\":1}", [], "/site"],
    ["a kind that does not exist", () => edited((drawing) => { (drawing.equipment["cb-i2"] as Drawing["equipment"][string]).kind = "teapot"; }), [], "/equipment/cb-i2/kind"],
    ["an edition that does not exist", "{}", ["--edition", "1999"], "allowed: 2017"],
  ])("ends with 2 on %s and says why", (_, content, options, reason) => {
    const { status, stderr } = run("bad.json", typeof content === "string" ? content : content(), ...options);
    expect(status).toBe(2);
    expect(stderr).toContain(reason);
  });
  it("ends with 2 without a file", () => {
    expect(spawnSync(process.execPath, ["--import", "tsx", "scripts/check.ts"], { cwd: root, encoding: "utf8" }).status).toBe(2);
  });
});

describe("the public description of the drawing file, read by another validator", () => {
  const validate = new Ajv2020({ strict: false, validateFormats: false }).compile(drawingJsonSchema());
  it("takes a whole drawing", () => {
    expect(validate(cleanDrawing()), JSON.stringify(validate.errors?.slice(0, 3))).toBe(true);
  });
  it.each<[string, (drawing: Drawing) => void]>([
    ["a property that the kind does not have", (drawing) => { (drawing.equipment["cb-i2"] as Drawing["equipment"][string]).props["colour"] = 1; }],
    ["a rating beyond its bounds", (drawing) => { (drawing.equipment["cb-i2"] as Drawing["equipment"][string]).props["ratingA"] = -5; }],
    ["a kind that does not exist", (drawing) => { (drawing.equipment["cb-i2"] as Drawing["equipment"][string]).kind = "teapot"; }],
    ["a conductor size that is none", (drawing) => { const section = Object.values(drawing.circuits).flatMap((circuit) => Object.values(circuit.sections)).find((one) => one.ungrounded !== null); if (section?.ungrounded) section.ungrounded.size = "8 gauge"; }],
    ["a field that is none", (drawing) => { (drawing as unknown as Record<string, unknown>)["extra"] = true; }],
  ])("refuses %s", (_, edit) => {
    const drawing = cleanDrawing();
    edit(drawing);
    expect(validate(drawing)).toBe(false);
  });
});
