import { spawnSync } from "node:child_process";
import path from "node:path";
import { describe, expect, it } from "vitest";

const root = path.resolve(import.meta.dirname, "../../..");
const calc = (...args: string[]) => spawnSync(process.execPath, ["--import", "tsx", "scripts/calc.ts", ...args], { cwd: root, encoding: "utf8" });

describe("calculations on the command line", () => {
  it("lists every calculation with schemas of input and output", () => {
    const { status, stdout } = calc("--list");
    const list = JSON.parse(stdout) as { name: string; input: object; output: object; sample: object }[];
    expect(status).toBe(0);
    expect(list.length).toBeGreaterThan(35);
    for (const entry of list) expect([typeof entry.input, typeof entry.output, typeof entry.sample], entry.name).toEqual(["object", "object", "object"]);
  });
  it("prints value and steps of one", () => {
    const { status, stdout, stderr } = calc("conductor-ampacity", JSON.stringify({ edition: "2023", size: "#1", material: "copper", insulation: "THWN-2", terminalC: 75, parts: [{ kind: "raceway", lengthFt: 46, ambientC: 40, currentCarryingCount: 2 }] }));
    const result = JSON.parse(stdout) as { value: number; steps: { symbol: string; citation?: string }[] };
    expect([status, stderr, result.value]).toEqual([0, "", 130]);
    expect(result.steps[0]).toMatchObject({ symbol: "A", substituted: "1 AWG copper THWN-2", result: 145, citation: "NEC 2023 Table 310.16" });
  });
  it.each([
    [["conductor-ampacity", '{"edition":"2023","size":"#1","material":"copper","insulation":"THWN-2","terminalC":75,"parts":[{"kind":"raceway","lengthFt":-4,"ambientC":40,"currentCarryingCount":2}]}'], "parts.0.lengthFt: -4 is out of range (allowed: 0 to 20000 ft)"],
    [["smallest-overcurrent-device", '{"edition":"2023"}'], "requiredA: value is missing"],
    [["smallest-overcurrent-device", '{"edition":"2023","requiredA":"40"}'], 'requiredA: expected a finite number, got "40"'],
    [["smallest-overcurrent-device", '{"edition":"2019","requiredA":40}'], 'edition: "2019" is not known (allowed: 2017, 2020, 2023, 2026)'],
    [["smallest-overcurrent-device", '{"edition":"2023","requiredA":NaN}'], "input: not valid JSON"],
    [["smallest-overcurrent-device"], "input: not valid JSON"],
    [["no-such", "{}"], 'name: "no-such" is not a calculation'],
    [[], "usage"],
  ])("%j: exit 2 and the field", (args, message) => {
    const { status, stdout, stderr } = calc(...args);
    expect([status, stdout]).toEqual([2, ""]);
    expect(stderr).toContain(message);
  });
});
