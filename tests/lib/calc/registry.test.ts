import { describe, expect, it } from "vitest";
import { CALCULATIONS, jsonSchemas } from "@/lib/calc/registry";
import { FieldError } from "@/lib/units";

type Json = unknown;
type Path = readonly string[];

/** All leaves of a sample with their path. */
function leaves(value: Json, path: Path = []): { path: Path; value: Json }[] {
  if (typeof value !== "object" || value === null) return [{ path, value }];
  return Object.entries(value).flatMap(([key, inner]) => leaves(inner, [...path, key]));
}

function withLeaf(sample: Json, path: Path, value: Json): Json {
  const copy = structuredClone(sample) as Record<string, Json>;
  let at: Record<string, Json> = copy;
  for (const key of path.slice(0, -1)) at = at[key] as Record<string, Json>;
  const last = path.at(-1) ?? "";
  if (value === undefined) delete at[last];
  else at[last] = value;
  return copy;
}

function numbersOf(value: Json): number[] {
  if (typeof value === "number") return [value];
  if (typeof value !== "object" || value === null) return [];
  return Object.values(value).flatMap(numbersOf);
}

describe.each(CALCULATIONS.map((entry) => [entry.name, entry] as const))("%s", (_, entry) => {
  it("works on its sample and gives what its output schema says", () => {
    const result = entry.run(entry.sample);
    expect(entry.input.safeParse(entry.sample).success).toBe(true);
    const output = entry.output.safeParse(structuredClone(result));
    expect(output.error?.issues ?? []).toEqual([]);
    expect(numbersOf(result).every(Number.isFinite)).toBe(true);
    expect(result.steps.length).toBeGreaterThan(0);
    // Every reference printed beside a step is in the list of references.
    const printed = new Set(result.steps.flatMap((step) => (step.citation === undefined ? [] : [step.citation])));
    for (const text of printed) expect(result.citations.some((citation) => text.startsWith(`${citation.code} ${citation.edition} ${citation.section}`)), text).toBe(true);
  });

  it("is deterministic and leaves its input alone", () => {
    const input = structuredClone(entry.sample);
    expect(entry.run(input)).toEqual(entry.run(entry.sample));
    expect(input).toEqual(entry.sample);
  });

  it("has JSON schemas of input and output", () => {
    const { input, output } = jsonSchemas(entry);
    expect(JSON.stringify(input)).toContain("edition");
    expect(output).toMatchObject({ type: "object", required: ["value", "unit", "steps", "citations", "detail"] });
  });

  it("names each field that is missing, of a wrong kind, not finite or far out of range", () => {
    for (const leaf of leaves(entry.sample)) {
      const bad = typeof leaf.value === "number" ? [Number.NaN, Infinity, -1e9, 1e12, "12 A", null, undefined, {}] : typeof leaf.value === "boolean" ? ["yes"] : ["no such word", 1e9, {}, undefined];
      for (const value of bad) {
        const label = `${leaf.path.join(".")} = ${String(value)}`;
        const optionalGone = value === undefined && entry.input.safeParse(withLeaf(entry.sample, leaf.path, undefined)).success;
        const freeText = value === "no such word" && ["label"].includes(leaf.path.at(-1) ?? "");
        if (optionalGone || freeText) continue;
        // A height above the roof and a limit may be null or huge on purpose; those two are met by their own tests.
        let refused: FieldError | null = null;
        try {
          const result = entry.run(withLeaf(entry.sample, leaf.path, value));
          expect(numbersOf(result).every(Number.isFinite), label).toBe(true);
        } catch (error) {
          if (!(error instanceof FieldError)) throw new Error(`${label}: ${String(error)}`, { cause: error });
          refused = error;
        }
        expect(refused, `${label} was accepted`).not.toBeNull();
        expect(leaf.path.join(".").startsWith(refused?.field ?? "?") || (refused?.field ?? "").startsWith(leaf.path.slice(0, 1).join(".")), `${label} named ${refused?.field}`).toBe(true);
      }
    }
  });

  it("refuses a field it does not know, and anything but an object", () => {
    expect(() => entry.run({ ...entry.sample, lenghtFt: 3 })).toThrow("lenghtFt: is not a field of this calculation");
    for (const raw of [null, 3, "x", [], undefined]) expect(() => entry.run(raw)).toThrow(FieldError);
    expect(() => entry.run({})).toThrow(FieldError);
  });
});

it("names are unique and in the trade's words", () => {
  const names = CALCULATIONS.map((entry) => entry.name);
  expect(new Set(names).size).toBe(names.length);
  for (const name of names) expect(name).toMatch(/^[a-z]+(-[a-z]+)+$/);
});
