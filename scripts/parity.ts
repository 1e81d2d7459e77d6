/**
 * Parts that belong together: every rule has its cases and what its page needs, every equipment
 * kind its symbol, node and schedule fields. A room that does not exist yet is named, not failed;
 * once it exists, each gap in it fails.
 */
import { existsSync, readdirSync } from "node:fs";
import path from "node:path";
import { pathToFileURL } from "node:url";

const root = path.resolve(import.meta.dirname, "..");
const gaps: string[] = [];
const absent: string[] = [];
const isObject = (value: unknown): value is Record<string, unknown> => typeof value === "object" && value !== null;

function filesUnder(folder: string, pattern: RegExp): string[] {
  const full = path.join(root, folder);
  if (!existsSync(full)) {
    absent.push(folder);
    return [];
  }
  return readdirSync(full, { recursive: true, encoding: "utf8" }).filter((name) => pattern.test(name)).map((name) => path.join(folder, name)).sort();
}

async function exportsOf(file: string): Promise<Record<string, unknown>> {
  return (await import(pathToFileURL(path.join(root, file)).href)) as Record<string, unknown>;
}

interface RuleLike {
  meta: Record<string, unknown> & { id: string };
  examples?: unknown;
}

const isRule = (value: unknown): value is RuleLike =>
  isObject(value) && isObject(value["meta"]) && typeof value["meta"]["id"] === "string" && typeof value["evaluate"] === "function";

function checkRule(rule: RuleLike, file: string): void {
  const { id } = rule.meta;
  const filled = (field: string) => typeof rule.meta[field] === "string" && String(rule.meta[field]).trim().length > 0;
  if (!/^[a-z][a-z0-9]*(-[a-z0-9]+)*$/.test(id)) gaps.push(`${file}: "${id}" is not kebab-case`);
  for (const field of ["group", "severity", "evidence", "statement", "risk"]) {
    if (!filled(field)) gaps.push(`rule ${id}: its page needs meta.${field}`);
  }
  const { citations, reads } = rule.meta;
  if (!Array.isArray(citations) || citations.length === 0) gaps.push(`rule ${id}: its page needs meta.citations`);
  if (!Array.isArray(reads) || reads.length === 0) gaps.push(`rule ${id}: its page needs meta.reads`);
  for (const example of ["violates", "passes"]) {
    if (!isObject(rule.examples) || !rule.examples[example]) gaps.push(`rule ${id}: its page needs examples.${example}`);
  }
}

async function checkRules(): Promise<number> {
  const files = filesUnder("lib/rules", /^(?!engine[\\/]).*\.ts$/).filter((file) => !file.endsWith(".d.ts"));
  const found = new Map<string, { rule: RuleLike; file: string; listed: boolean }>();
  const listed = new Set<string>();
  for (const file of files) {
    for (const value of Object.values(await exportsOf(file))) {
      // Rules stand alone, in families (lists or records) and in the index of all.
      const group = isRule(value) ? [] : Array.isArray(value) ? value.filter(isRule) : isObject(value) ? Object.values(value).filter(isRule) : [];
      for (const rule of isRule(value) ? [value] : group) {
        const before = found.get(rule.meta.id);
        if (before && before.rule !== rule) gaps.push(`rule ${rule.meta.id} is defined twice: ${before.file} and ${file}`);
        if (!before) found.set(rule.meta.id, { rule, file, listed: false });
      }
      if (/^lib[\\/]rules[\\/](index|registry)\.ts$/.test(file)) for (const rule of group) listed.add(rule.meta.id);
    }
  }
  const caseFiles = filesUnder("tests/rules", /\.(ts|json)$/);
  const names = new Set(caseFiles.flatMap((file) => file.split(path.sep).map((part) => part.split(".")[0] ?? "")));
  for (const [id, { rule, file }] of found) {
    checkRule(rule, file);
    if (!listed.has(id)) gaps.push(`rule ${id} (${file}) is not in the list of lib/rules/index.ts, so it never runs`);
    if (!names.has(id)) gaps.push(`rule ${id} has no case file tests/rules/${id}.*`);
  }
  // A case file for a rule that is gone proves nothing.
  for (const file of caseFiles.filter((each) => /\.cases?\.(ts|json)$/.test(each))) {
    const id = path.basename(file).split(".")[0] ?? "";
    if (!found.has(id)) gaps.push(`${file}: there is no rule ${id}`);
  }
  return found.size;
}

interface KindLike {
  kind: string;
  properties: Record<string, unknown>;
  defaults: Record<string, unknown>;
  symbol: (props: Record<string, unknown>) => string | null;
  scheduleFields: readonly string[];
}

async function symbolNames(): Promise<Set<string> | null> {
  const files = filesUnder("lib/symbols", /\.ts$/);
  if (files.length === 0) return null;
  const names = new Set<string>();
  for (const file of files) {
    for (const value of Object.values(await exportsOf(file))) {
      if (Array.isArray(value)) value.forEach((each) => isObject(each) && typeof each["id"] === "string" && names.add(each["id"]));
      else if (isObject(value)) {
        if (typeof value["id"] === "string") names.add(value["id"]);
        Object.keys(value).forEach((key) => names.add(key));
      }
    }
  }
  return names;
}

async function checkKinds(): Promise<number> {
  if (!existsSync(path.join(root, "lib/equipment/registry.ts"))) {
    absent.push("lib/equipment/registry.ts");
    return 0;
  }
  const registry = await exportsOf("lib/equipment/registry.ts");
  const ids = registry["KIND_IDS"] as readonly string[];
  const definition = registry["kindDefinition"] as (kind: string) => KindLike;
  const symbols = await symbolNames();
  const { applyCommand } = (await exportsOf("lib/diagram/commands/index.ts")) as unknown as typeof import("../lib/diagram/commands");
  const { emptyDrawing } = (await exportsOf("lib/diagram/new.ts")) as unknown as typeof import("../lib/diagram/new");
  const { buildGraph } = (await exportsOf("lib/diagram/graph.ts")) as unknown as typeof import("../lib/diagram/graph");
  const { equipmentPrimitives } = (await exportsOf("lib/sheets/oneline/equipment.ts")) as unknown as typeof import("../lib/sheets/oneline/equipment");
  for (const id of ids) {
    const kind = definition(id);
    if (kind.kind !== id) gaps.push(`kind ${id} calls itself ${kind.kind}`);
    const props = { ...Object.fromEntries(Object.keys(kind.properties).map((name) => [name, null])), ...kind.defaults };
    const symbol = kind.symbol(props);
    if (symbols && symbol !== null && !symbols.has(symbol)) gaps.push(`kind ${id}: lib/symbols has no symbol "${symbol}"`);
    // Canvas and sheet draw every kind by the same functions, so a kind is drawn once it can be placed and leaves a mark.
    const placed = applyCommand(emptyDrawing({}), { type: "placeEquipment", id: "one", kind: id as never, at: { x: 20, y: 20 } });
    if (!placed.ok) gaps.push(`kind ${id} cannot be placed: ${placed.reason}`);
    else if (equipmentPrimitives(buildGraph(placed.drawing), "one").length === 0) gaps.push(`kind ${id} is drawn as nothing`);
    if (kind.scheduleFields.length === 0) gaps.push(`kind ${id} has no schedule fields`);
    for (const field of kind.scheduleFields) {
      if (!(field in kind.properties)) gaps.push(`kind ${id}: schedule field ${field} is not one of its properties`);
    }
  }
  const folders = readdirSync(path.join(root, "lib/equipment"), { withFileTypes: true }).filter((each) => each.isDirectory() && !["shared", "starter"].includes(each.name));
  for (const { name } of folders) if (!ids.includes(name)) gaps.push(`lib/equipment/${name} is not in the registry`);
  return ids.length;
}

const rules = await checkRules();
const kinds = await checkKinds();
console.log(`parity: ${rules} rules, ${kinds} equipment kinds`);
if (absent.length > 0) console.log(`not there yet: ${[...new Set(absent)].join(", ")}`);
if (gaps.length > 0) {
  console.error(gaps.join("\n"));
  process.exitCode = 1;
}
