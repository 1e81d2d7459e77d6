/**
 * The checker on the command line.
 *   npm run --silent check -- FILE.json [--edition 2023] [--json] [--strict]
 * Exit 0: no must-fix finding. 1: must-fix findings; with --strict also where a must-fix rule waits for a value.
 * 2: the file cannot be read, with the reason. `-` reads standard input.
 */
import { readFileSync } from "node:fs";
import { checkDocument } from "@/lib/diagram/check";
import { EDITIONS, type Drawing, type Edition } from "@/lib/diagram/schema";
import { check } from "@/lib/rules/engine/run";
import type { CheckResult } from "@/lib/rules/engine/types";

const USAGE = `usage: npm run --silent check -- FILE.json [--edition ${EDITIONS.join("|")}] [--json] [--strict]`;
const refuse = (reason: string): 2 => { console.error(reason); return 2; };

function main(args: readonly string[]): number {
  const rest = [...args];
  const json = rest.includes("--json");
  const strict = rest.includes("--strict");
  const at = rest.indexOf("--edition");
  const edition = at < 0 ? null : rest[at + 1];
  const files = rest.filter((each, i) => each !== "--json" && each !== "--strict" && i !== at && (at < 0 || i !== at + 1));
  if (edition !== null && !EDITIONS.includes(edition as Edition)) return refuse(`--edition: "${edition ?? ""}" is none (allowed: ${EDITIONS.join(", ")})`);
  const unknown = files.find((each) => each.startsWith("--"));
  if (unknown) return refuse(`${unknown} is no option\n${USAGE}`);
  const [file] = files;
  if (file === undefined || files.length > 1) return refuse(USAGE);
  let document: unknown;
  try {
    document = JSON.parse(readFileSync(file === "-" ? 0 : file, "utf8"));
  } catch (error) {
    return refuse(`${file}: ${error instanceof SyntaxError ? `not valid JSON (${error.message})` : "cannot be read"}`);
  }
  const faults = checkDocument(document);
  if (faults.length > 0) return refuse(`${file} is no drawing:\n${faults.slice(0, 20).map((fault) => `  ${fault.path || "/"}: ${fault.message}`).join("\n")}${faults.length > 20 ? `\n  and ${faults.length - 20} more` : ""}`);
  const drawing = document as Drawing;
  const result = check(edition === null ? drawing : { ...drawing, site: { ...drawing.site, edition: edition as Edition } });
  process.stdout.write(json ? `${JSON.stringify(result, null, 2)}\n` : report(result));
  return result.findings.some((one) => one.accepted === null && (one.kind === "finding" ? one.severity === "must-fix" : strict && one.blocks)) ? 1 : 0;
}

function report(result: CheckResult): string {
  const { counts } = result;
  const lines = result.findings.map((one) => `${one.accepted ? "ACCEPTED" : one.kind === "needs-data" ? "NEEDS DATA" : one.severity.toUpperCase()}  ${one.rule}  ${one.message}${one.citation ? `  [${one.citation}]` : ""}`);
  const open = result.declarations.filter((one) => one.statement === null);
  return [
    ...lines, ...open.map((one) => `NOT STATED  ${one.rule}  ${one.question}`),
    `${result.rulesRun} rules of rule set ${result.ruleSet}, NEC ${result.edition}: ${counts.mustFix} must-fix, ${counts.shouldFix} should-fix, ${counts.advice} advice, ${counts.needsData} needs data, ${counts.accepted} accepted, ${counts.declared} declared, ${open.length} not stated. Drawing digest ${result.digest}`,
    "The checker supports and never replaces the adopted code, the authority having jurisdiction, the manufacturers and licensed people.", "",
  ].join("\n");
}

process.exitCode = main(process.argv.slice(2));
