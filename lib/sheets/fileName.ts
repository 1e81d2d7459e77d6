/** What a file-name template may hold in braces, with what stands there. */
export const FILE_NAME_PARTS = {
  job: "job number", set: "SET, or PREVIEW before the seal", revision: "revision letter", sheet: "sheet number, ALL for the whole set", date: "day of the seal or of the issue, 2026-12-01",
} as const;
export type FileNamePart = keyof typeof FILE_NAME_PARTS;
export type FileNameValues = Readonly<Record<FileNamePart, string>>;

export const DEFAULT_FILE_NAME = "{job}-{set}-{revision}";
/** Longest name without its ending, characters. */
export const FILE_NAME_CHARACTERS = 100;
const SAMPLE: FileNameValues = { job: "26-031", set: "SET", revision: "B", sheet: "E-601", date: "2026-12-01" };

/** What is wrong with a template, as it goes on from the name of its field; null when nothing is. */
export function templateFault(template: string, split: "one file" | "one file a sheet"): string | null {
  if (template.trim() === "") return "is missing";
  const unknown = [...template.matchAll(/\{([^{}]*)\}/g)].map((match) => match[1] ?? "").find((part) => !isPart(part));
  if (unknown !== undefined) return `knows no {${unknown}}; there are ${Object.keys(FILE_NAME_PARTS).map((part) => `{${part}}`).join(" ")}`;
  const between = template.replace(/\{[^{}]*\}/g, "");
  const stray = /[^A-Za-z0-9 _-]/.exec(between)?.[0];
  if (stray !== undefined) return `may hold letters, digits, spaces, hyphens and underscores; not ${stray}`;
  if (!template.includes("{job}") && !template.includes("{revision}")) return "needs {job} or {revision}: else every file has one name";
  if (split === "one file a sheet" && !template.includes("{sheet}")) return "needs {sheet} where each sheet is a file of its own";
  return null;
}
const isPart = (part: string): part is FileNamePart => Object.hasOwn(FILE_NAME_PARTS, part);

/**
 * The file's name: the template filled in, then letters, digits, hyphens and underscores alone, at most 100 characters.
 * @param ending without the dot
 */
export function fileName(template: string, values: FileNameValues, ending = "pdf"): string {
  const filled = template.replace(/\{([^{}]*)\}/g, (whole, part: string) => (isPart(part) ? safeName(values[part]) : whole));
  return `${safeName(filled)}.${ending}`;
}

/** What is not a letter, digit, hyphen or underscore becomes a hyphen; none at the ends. */
export function safeName(text: string): string {
  return text.replace(/[^A-Za-z0-9_-]+/g, "-").replace(/^-+|-+$/g, "").slice(0, FILE_NAME_CHARACTERS).replace(/-+$/, "") || "job";
}

/** The name a template gives, with figures of an example. */
export const sampleFileName = (template: string): string => fileName(template, SAMPLE);
