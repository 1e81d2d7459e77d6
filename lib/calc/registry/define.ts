import { z } from "zod";
import { FieldError, QuantityError } from "@/lib/units";
import type { CalcResult } from "../types";
import { citationSchema, stepSchema } from "./schemas";

/** One calculation as the command line and a form see it. */
export interface CalculationEntry {
  readonly name: string;
  readonly title: string;
  readonly input: z.ZodType;
  readonly output: z.ZodType;
  /** Input that works, for the help and the tests. */
  readonly sample: Readonly<Record<string, unknown>>;
  /** Runs on any input. @throws FieldError naming the field that is wrong. */
  readonly run: (input: unknown) => CalcResult<unknown, unknown>;
}

/** Describes a calculation by its schemas. The function checks its own ranges; the schema adds unknown and misspelled fields. */
export function define<Input, Value, Detail>(options: {
  name: string; title: string; input: z.ZodType; value: z.ZodType; detail: z.ZodType; sample: Readonly<Record<string, unknown>>; calculate: (input: Input) => CalcResult<Value, Detail>;
}): CalculationEntry {
  const { name, title, input, sample, calculate } = options;
  const output = z.strictObject({ value: options.value, unit: z.string(), steps: z.array(stepSchema), citations: z.array(citationSchema), detail: options.detail });
  return { name, title, input, output, sample, run: (raw) => runChecked(input, raw, (checked) => calculate(checked as Input)) };
}

function runChecked<Result>(schema: z.ZodType, raw: unknown, calculate: (input: unknown) => Result): Result {
  if (typeof raw !== "object" || raw === null || Array.isArray(raw)) throw new QuantityError("input", "expected a JSON object");
  const checked = schema.safeParse(raw);
  const unknown = checked.success ? undefined : checked.error.issues.find((issue) => issue.code === "unrecognized_keys");
  if (unknown !== undefined) throw fieldErrorOf(unknown);
  let result: Result;
  try {
    result = calculate(raw);
  } catch (error) {
    // The calculation names the field with its range; the schema speaks for what the calculation could not even read.
    if (error instanceof FieldError || checked.success) throw error;
    throw fieldErrorOf(firstIssue(checked.error));
  }
  if (!checked.success) throw fieldErrorOf(firstIssue(checked.error));
  return result;
}

function firstIssue(error: z.ZodError): z.core.$ZodIssue {
  const [issue] = error.issues;
  if (issue === undefined) throw new QuantityError("input", "not valid");
  return deepest(issue);
}

/** Of a failed union the branch that came furthest tells most. */
function deepest(issue: z.core.$ZodIssue): z.core.$ZodIssue {
  if (issue.code !== "invalid_union" || issue.errors.length === 0) return issue;
  const inner = [...issue.errors].sort((a, b) => a.length - b.length)[0]?.[0];
  return inner === undefined ? issue : deepest({ ...inner, path: [...issue.path, ...inner.path] });
}

function fieldErrorOf(issue: z.core.$ZodIssue): FieldError {
  const path = issue.path.map(String);
  if (issue.code === "unrecognized_keys") return new QuantityError([...path, issue.keys[0] ?? ""].join("."), "is not a field of this calculation");
  const allowed = issue.code === "invalid_value" ? issue.values.map(String).join(", ") : issue.code === "invalid_type" ? issue.expected : null;
  return new QuantityError(path.join(".") || "input", issue.message, allowed);
}
