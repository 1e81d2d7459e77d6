import type { RecordChange, RecordLine } from "@/lib/api";

const isObject = (value: unknown): value is Record<string, unknown> => value !== null && typeof value === "object" && !Array.isArray(value);

/** A value in words: lists with commas, groups as name and value. */
export function valueWords(value: unknown): string {
  if (value === null || value === undefined || value === "") return "";
  if (typeof value === "boolean") return value ? "yes" : "no";
  if (Array.isArray(value)) return value.map(valueWords).filter(Boolean).join(value.some(isObject) ? "; " : ", ");
  if (isObject(value)) return Object.entries(value).map(([name, each]) => `${fieldWords(name)}: ${valueWords(each) || "none"}`).join("; ");
  return String(value);
}

/** Units at the end of a field's name, as they are written. */
const UNITS: Readonly<Record<string, string>> = { a: "A", c: "°C", cents: "cents", ft: "ft", in: "in", m: "m", v: "V", w: "W" };

/** A field's name as people read it: `expiresOn` → "expires on", `designHighC` → "design high, °C". */
export function fieldWords(name: string): string {
  const words = name.replace(/([a-z0-9])([A-Z])/g, (_, before: string, after: string) => `${before} ${after.toLowerCase()}`);
  const unit = /^(.+) (\w{1,5})$/.exec(words);
  const written = unit && Object.hasOwn(UNITS, unit[2] ?? "") ? UNITS[unit[2] ?? ""] : undefined;
  return unit && written ? `${unit[1]}, ${written}` : words;
}

/** What changed, and what else an entry's detail says. */
export function recordParts(detail: Record<string, unknown>): Pick<RecordLine, "changes" | "facts"> {
  const { before, after, ...others } = detail;
  const was = isObject(before) ? before : {};
  const is = isObject(after) ? after : {};
  const changes: RecordChange[] = [...new Set([...Object.keys(was), ...Object.keys(is)])]
    .map((field) => ({ field: fieldWords(field), before: valueWords(was[field]), after: valueWords(is[field]) }));
  // What stands among the changes, and the list of changed fields, say nothing more.
  const rest = Object.entries(others).filter(([field]) => !(field in is) && !(field === "fields" && changes.length > 0));
  const facts = rest.map(([field, value]) => ({ field: fieldWords(field), value: valueWords(value) })).filter((each) => each.value !== "");
  return { changes, facts };
}
