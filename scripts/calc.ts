/**
 * Calculations on the command line.
 *   npm run --silent calc -- --list          every calculation with its JSON schemas
 *   npm run --silent calc -- NAME '<json>'   the result with its steps
 * Bad input: exit 2 and a message that names the field and what is allowed.
 */
import { CALCULATIONS, jsonSchemas } from "@/lib/calc/registry";
import { FieldError } from "@/lib/units";

const USAGE = "usage: npm run --silent calc -- --list | NAME '<json>'";

function main(args: readonly string[]): number {
  const [name, text] = args;
  if (name === "--list") {
    print(CALCULATIONS.map((entry) => ({ name: entry.name, title: entry.title, ...jsonSchemas(entry), sample: entry.sample })));
    return 0;
  }
  if (name === undefined || name === "--help") {
    console.error(USAGE);
    return name === undefined ? 2 : 0;
  }
  const entry = CALCULATIONS.find((item) => item.name === name);
  if (entry === undefined) return refuse(`name: "${name}" is not a calculation (allowed: ${CALCULATIONS.map((item) => item.name).join(", ")})`);
  let input: unknown;
  try {
    input = JSON.parse(text ?? "");
  } catch {
    return refuse(`input: not valid JSON (allowed: an object such as ${JSON.stringify(entry.sample)})`);
  }
  try {
    print(entry.run(input));
    return 0;
  } catch (error) {
    if (error instanceof FieldError) return refuse(error.message);
    throw error;
  }
}

function print(value: unknown): void {
  process.stdout.write(`${JSON.stringify(value, null, 2)}\n`);
}

function refuse(message: string): number {
  console.error(message);
  return 2;
}

process.exitCode = main(process.argv.slice(2));
