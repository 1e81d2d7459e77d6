import "server-only";
import { fieldWords } from "./recordWords";

type Detail = Readonly<Record<string, unknown>>;
interface Words {
  what: string;
  detail: (detail: Detail) => string | null;
  /** Instead of `what`, where the detail tells which of two it was. */
  told?: (detail: Detail) => string;
}

const nothing = (): null => null;
const text = (value: unknown): string | null => (typeof value === "string" && value !== "" ? value : typeof value === "number" ? String(value) : null);
const list = (value: unknown): string => (Array.isArray(value) ? value.filter((each) => typeof each === "string").map(fieldWords).join(", ") : "");
const part = (key: string, words = "") => (detail: Detail): string | null => { const value = text(detail[key]); return value === null ? null : `${words}${value}`; };
/** Whom it was about, and their roles. */
const about = (detail: Detail): string | null => [text(detail["person"]), list(detail["roles"])].filter(Boolean).join(": ") || null;
const revision = (detail: Detail): string | null => (text(detail["letter"]) === null ? null : `Rev ${text(detail["letter"])}`);

/** Every action of the audit log in words: what was done, and the fact worth a line. Actions that end alike share a reader. */
export const ACTION_WORDS: Readonly<Record<string, Words>> = {
  "company.create": { what: "Set the company up", detail: nothing },
  "company.edit": { what: "Changed the company's settings", detail: (d) => list(d["fields"]) || null },
  "drawing.save": { what: "Changed the drawing", detail: part("title") },
  "file.add": { what: "Added a file", detail: part("name") },
  "file.remove": { what: "Removed a file", detail: part("name") },
  "finding.accept": { what: "Accepted a finding in writing", detail: part("reason") },
  "job.archive": { what: "Moved the job into or out of the archive", detail: nothing, told: (d) => (d["archived"] === true ? "Put the job into the archive" : "Took the job out of the archive") },
  "job.create": { what: "Made the job", detail: part("number") },
  "job.duplicate": { what: "Made the job as a copy", detail: part("from", "of ") },
  "job.edit": { what: "Changed the job's data", detail: (d) => list(d["fields"]) || null },
  "job.jurisdiction": { what: "Took over a change of the jurisdiction", detail: part("name") },
  "jurisdiction.create": { what: "Entered a jurisdiction", detail: part("name") },
  "jurisdiction.delete": { what: "Deleted a jurisdiction", detail: part("name") },
  "jurisdiction.edit": { what: "Changed a jurisdiction", detail: (d) => list(d["fields"]) || text(d["name"]) },
  "library.archive": { what: "Moved a library entry into or out of the archive", detail: part("name"), told: (d) => (d["archived"] === true ? "Put a library entry into the archive" : "Took a library entry out of the archive") },
  "library.change": { what: "Changed a library entry", detail: (d) => text(d["name"]) ?? text(d["note"]) },
  "library.create": { what: "Added a library entry", detail: part("name") },
  "library.import": { what: "Imported library entries", detail: (d) => [text(d["kind"]), text(d["added"]) && `${text(d["added"])} added`].filter(Boolean).join(", ") || null },
  "license.put": { what: "Entered a license", detail: part("number") },
  "license.seal-graphic": { what: "Uploaded a seal graphic", detail: nothing },
  "member.add": { what: "Put somebody on the job", detail: about },
  "member.remove": { what: "Took somebody off the job", detail: part("person") },
  "member.roles": { what: "Changed somebody's roles in the job", detail: about },
  "password.change": { what: "Changed the password", detail: nothing },
  "person.add": { what: "Added somebody to the company", detail: about },
  "person.active": { what: "Closed or opened an account", detail: part("person"), told: (d) => (d["active"] === true ? "Opened an account" : "Closed an account") },
  "person.remove": { what: "Took somebody out of the company", detail: part("person") },
  "person.roles": { what: "Changed somebody's roles in the company", detail: about },
  "records.export": { what: "Exported the records", detail: (d) => (text(d["rows"]) === null ? null : `${text(d["rows"])} rows`) },
  "revision.issue": { what: "Issued a revision for review", detail: revision },
  "revision.return": { what: "Returned a revision with comments", detail: revision },
  "revision.seal": { what: "Sealed a revision", detail: revision },
  "revision.seal.failed": { what: "The sheets of a seal could not be drawn", detail: part("message") },
  "revision.seal.restored": { what: "The seal counts again: the drawing is the sealed one", detail: revision },
  "revision.seal.void": { what: "The seal became void: the drawing was changed", detail: revision },
  "revision.sealed": { what: "The sealed sheets were finished", detail: revision },
  "sheets.download": { what: "Downloaded a sealed set", detail: revision },
  "visit.create": { what: "Recorded a site visit", detail: part("visitedOn") },
  "visit.edit": { what: "Changed a site visit", detail: part("visitedOn") },
};

/** One entry of the audit log in words. An action without words shows itself, so that nothing is hidden. */
export function historyWords(action: string, detail: Detail): { what: string; detail: string | null } {
  const words = Object.hasOwn(ACTION_WORDS, action) ? ACTION_WORDS[action] : undefined;
  return words ? { what: words.told?.(detail) ?? words.what, detail: words.detail(detail) } : { what: action, detail: null };
}
