import type { LibraryData } from "@/lib/api";
import { kindDefinition } from "@/lib/equipment/registry";
import type { KindDefinition, PropertyValue } from "@/lib/equipment/define";
import { libraryDifferences, type DataDifference } from "@/lib/equipment/libraryDifferences";
import { wholeEquipmentData } from "@/lib/equipment/libraryData";
import { STARTER_SOURCE } from "@/lib/equipment/starter/entry";

export type Source = LibraryData["sources"][string];
/** What is being typed about an entry. */
export interface EntryDraft { readonly name: string; readonly data: LibraryData }

/** A new entry knows nothing yet: what a kind mostly is says nothing about this product. */
export const emptyDraft = (kind: string): EntryDraft => ({ name: "", data: wholeEquipmentData(kindDefinition(kind), { props: {}, sources: {}, ports: {} }) });

/** Members in the order of their names, so that two values written in different orders read alike. */
const sorted = (value: unknown): unknown => (value !== null && typeof value === "object" && !Array.isArray(value)
  ? Object.fromEntries(Object.entries(value).filter(([, each]) => each !== undefined).sort(([a], [b]) => (a < b ? -1 : 1)).map(([name, each]) => [name, sorted(each)])) : value);
const alike = (a: unknown, b: unknown): boolean => JSON.stringify(sorted(a)) === JSON.stringify(sorted(b));

/** Whether two drafts say the same. */
export const sameDraft = (a: EntryDraft, b: EntryDraft): boolean => a.name === b.name && alike(a.data, b.data);

/** Puts a value. An invented one that is replaced takes its source with it: the new one was read somewhere else. */
export function withProperty(draft: EntryDraft, name: string, value: PropertyValue): EntryDraft {
  const now = { ...draft, data: { ...draft.data, props: { ...draft.data.props, [name]: value } } };
  return draft.data.props[name] !== value && draft.data.sources[name]?.document === STARTER_SOURCE.document ? withSource(now, name, { document: "", page: "" }) : now;
}
export const withPort = (draft: EntryDraft, port: string, data: LibraryData["ports"][string]): EntryDraft => ({ ...draft, data: { ...draft.data, ports: { ...draft.data.ports, [port]: data } } });

/** Puts a source, or takes it away where it says nothing any more. */
export function withSource(draft: EntryDraft, name: string, source: Source): EntryDraft {
  const { [name]: _, ...others } = draft.data.sources;
  const empty = source.document === "" && source.page === "" && source.file === undefined;
  return { ...draft, data: { ...draft.data, sources: empty ? others : { ...others, [name]: source } } };
}

/** A source with a stored datasheet. It is named after the file where no document is named yet, or where the name was another file's. */
export function sourceWithFile(source: Source | undefined, file: { id: string; name: string } | null, fileNames: readonly string[]): Source {
  const { document = "", page = "" } = source ?? {};
  if (!file) return { document, page };
  const taken = document === "" || fileNames.some((name) => documentName(name) === document);
  return { document: taken ? documentName(file.name) : document, page, file: file.id };
}
/** A file's name without its ending, as the name of a document. */
export const documentName = (fileName: string): string => fileName.replace(/\.pdf$/i, "").trim().slice(0, 120);

/** First page in what somebody wrote for one: "3", "p. 3", "12-13"; null where none can be told. */
export function firstPage(page: string): number | null {
  const found = /\d{1,4}/.exec(page);
  return found && Number(found[0]) > 0 ? Number(found[0]) : null;
}

/** Rated properties that have a value and name no document. */
export const unsourced = (definition: KindDefinition, data: LibraryData): string[] => Object.entries(definition.properties)
  .filter(([name, property]) => property.rated && (data.props[name] ?? null) !== null && !data.sources[name]?.document).map(([name]) => name);

/** Gives every value without a source this one; what has one keeps it, and pages that were noted stay. */
export function sourceForAll(definition: KindDefinition, draft: EntryDraft, document: string, file: string | undefined): EntryDraft {
  return unsourced(definition, draft.data).reduce((now, name) => withSource(now, name, { document, page: now.data.sources[name]?.page ?? "", ...(file ? { file } : {}) }), draft);
}

/** The data as it is kept: sources of unknown values and ports that these properties do not give are left out. */
export function kept(definition: KindDefinition, data: LibraryData): LibraryData {
  const ports = definition.ports(wholeEquipmentData(definition, data).props as never).map((port) => port.id);
  const stays = (source: string): boolean => (source.startsWith("ports.") ? ports.includes(source.split(".")[1] ?? "") : (data.props[source] ?? null) !== null);
  return {
    props: data.props,
    sources: Object.fromEntries(Object.entries(data.sources).filter(([name]) => stays(name))),
    ports: Object.fromEntries(Object.entries(data.ports).filter(([id]) => ports.includes(id))),
  };
}

/** What differs from one version to another. */
export const versionDifferences = (definition: KindDefinition, from: LibraryData, to: LibraryData): DataDifference[] => libraryDifferences(definition, { then: from, now: to, held: from });

/** A part of an entry that two people changed in different ways, with its single values: `drawn` is mine, `now` is theirs. */
export interface Clash { readonly part: string; readonly lines: readonly DataDifference[] }
export interface Merge { readonly draft: EntryDraft; readonly clashes: readonly Clash[]; readonly taken: readonly DataDifference[] }

const PARTS = ["props", "sources", "ports"] as const;

/**
 * Joins what is typed here with what somebody else kept meanwhile. What one alone changed is taken from that one; where both changed the
 * same part (a property, its source, a port), `mine` stands in the draft and the part is among the clashes.
 */
export function mergeDrafts(definition: KindDefinition, base: EntryDraft, mine: EntryDraft, theirs: EntryDraft): Merge {
  const differences = libraryDifferences(definition, { then: base.data, now: theirs.data, held: mine.data });
  const clashing = new Set<string>();
  const data: LibraryData = { props: {}, sources: {}, ports: {} };
  for (const part of PARTS) {
    const [before, here, there] = [base.data[part], mine.data[part], theirs.data[part]] as Record<string, unknown>[];
    const joined: Record<string, unknown> = {};
    for (const name of new Set([...Object.keys(there ?? {}), ...Object.keys(here ?? {})])) {
      const changedHere = !alike(here?.[name], before?.[name]);
      const changedThere = !alike(there?.[name], before?.[name]);
      if (changedHere && changedThere && !alike(here?.[name], there?.[name])) clashing.add(`${part}/${name}`);
      const value = changedHere ? here?.[name] : there?.[name];
      if (value !== undefined) joined[name] = value;
    }
    Object.assign(data[part], joined);
  }
  const partOf = (path: string): string => path.split("/").slice(1, 3).join("/").replaceAll("~1", "/").replaceAll("~0", "~");
  const nameClash = mine.name !== base.name && theirs.name !== base.name && mine.name !== theirs.name;
  return {
    draft: { name: mine.name !== base.name ? mine.name : theirs.name, data },
    clashes: [
      ...(nameClash ? [{ part: "name", lines: [{ path: "/name", label: "Name", unit: "", drawn: mine.name, now: theirs.name }] }] : []),
      ...[...clashing].map((part) => ({ part, lines: differences.filter((each) => partOf(each.path) === part) })).filter((each) => each.lines.length > 0),
    ],
    taken: differences.filter((each) => !clashing.has(partOf(each.path))),
  };
}

/** The joined draft with their side of one part. */
export function withTheirs(merged: EntryDraft, theirs: EntryDraft, part: string): EntryDraft {
  if (part === "name") return { ...merged, name: theirs.name };
  const [collection, name = ""] = part.split("/") as [(typeof PARTS)[number], string];
  const value = theirs.data[collection][name];
  const { [name]: _, ...others } = merged.data[collection] as Record<string, unknown>;
  return { ...merged, data: { ...merged.data, [collection]: value === undefined ? others : { ...others, [name]: value } } };
}
