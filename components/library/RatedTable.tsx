"use client";

import { useId } from "react";
import type { FileAnswer } from "@/lib/api";
import { fileUrl } from "@/lib/client/filesApi";
import type { Property, PropertyValue } from "@/lib/equipment/define";
import { STARTER_SOURCE } from "@/lib/equipment/starter/entry";
import { PropertyField } from "@/components/fields/equipmentFields";
import { TextField } from "@/components/fields/fields";
import { firstPage, sourceWithFile, type EntryDraft, type Source } from "./entryDraft";

export interface SourceEditing {
  readOnly: boolean;
  datasheets: readonly Pick<FileAnswer, "id" | "name">[];
  onProperty: (name: string, value: PropertyValue) => void;
  onSource: (name: string, source: Source) => void;
  /** Takes a datasheet from the person's device for this property; null where none can be kept yet. */
  onUpload: ((name: string) => void) | null;
}

const HEAD = "h-8 border-b border-ink px-1.5 text-left text-label font-medium text-ink2 first:pl-0 last:pr-0";
const CELL = "h-[46px] border-b border-g2 px-1.5 py-1 align-middle first:pl-0 last:pr-0";

/** Rated values as a table: each with the document, the page and the stored datasheet it was read from. */
export function RatedTable({ caption, entries, draft, ...editing }: SourceEditing & { caption: string; entries: readonly (readonly [string, Property])[]; draft: EntryDraft }) {
  const documents = useId();
  const known = [...new Set([...editing.datasheets.map((file) => file.name.replace(/\.pdf$/i, "")), ...Object.values(draft.data.sources).map((source) => source.document)])].filter((name) => name !== "" && name !== STARTER_SOURCE.document);
  return (
    <>
      <datalist id={documents}>{known.map((name) => <option key={name} value={name} />)}</datalist>
      <table aria-label={caption} className="w-full table-fixed border-separate border-spacing-0">
        <thead>
          <tr>
            <th className={`${HEAD} w-[29%]`}>{caption === "Ratings" ? "Rating" : "As stated"}</th>
            <th className={`${HEAD} w-[17%]`}>Value</th>
            <th className={HEAD}>Document</th>
            <th className={`${HEAD} w-[64px]`}>Page</th>
            <th className={`${HEAD} w-[212px] narrow:w-[176px]`}>Stored datasheet</th>
          </tr>
        </thead>
        <tbody>{entries.map(([name, property]) => <Row key={name} name={name} property={property} draft={draft} documents={documents} {...editing} />)}</tbody>
      </table>
    </>
  );
}

function Row({ name, property, draft, documents, readOnly, onProperty, onSource, ...rest }: SourceEditing & { name: string; property: Property; draft: EntryDraft; documents: string }) {
  const value = draft.data.props[name] ?? null;
  const source = draft.data.sources[name];
  const label = property.label.charAt(0).toLowerCase() + property.label.slice(1);
  const invented = source?.document === STARTER_SOURCE.document;
  const missing = value !== null && !source?.document;
  const set = (part: Partial<Source>) => { onSource(name, { document: "", page: "", ...source, ...part }); return null; };
  return (
    <tr>
      <th scope="row" className={`${CELL} text-left text-body font-normal`}>
        {property.label}
        {missing && <span className="block text-label text-ochre">no source</span>}
        {invented && <span className="block text-label text-ochre">invented value</span>}
      </th>
      <td className={CELL}>
        <div className="flex items-center gap-1.5">
          <div className="min-w-0 flex-1"><PropertyField bare property={property} value={value} readOnly={readOnly} onCommit={(typed) => { onProperty(name, typed); return null; }} /></div>
          {property.type === "number" && property.unit && <span className="w-9 shrink-0 text-label text-ink2" aria-hidden="true">{property.unit}</span>}
        </div>
      </td>
      {value === null
        ? <td className={CELL} colSpan={3} />
        : (
          <>
            <td className={CELL}><TextField bare label={`Document of ${label}`} value={source?.document ?? ""} empty="datasheet or manual" suggestions={documents} readOnly={readOnly} onCommit={(typed) => (typed.trim().length > 120 ? "at most 120 characters" : set({ document: typed.trim() }))} /></td>
            <td className={CELL}><TextField bare label={`Page of ${label}`} value={source?.page ?? ""} empty="page" readOnly={readOnly} onCommit={(typed) => (typed.trim().length > 40 ? "at most 40 characters" : set({ page: typed.trim() }))} /></td>
            <td className={CELL}><Stored name={name} label={label} source={source} readOnly={readOnly} onSource={onSource} {...rest} /></td>
          </>
        )}
    </tr>
  );
}

const UPLOAD = "upload";

/** The stored datasheet of one value: which one, and a link that opens it at its page. */
function Stored({ name, label, source, readOnly, datasheets, onSource, onUpload }: Omit<SourceEditing, "onProperty"> & { name: string; label: string; source: Source | undefined }) {
  const page = firstPage(source?.page ?? "");
  const chosen = source?.file;
  const link = chosen && (
    <a href={`${fileUrl(chosen, { inline: true })}${page === null ? "" : `#page=${page}`}`} target="_blank" rel="noreferrer" aria-label={`Open the datasheet of ${label}${page === null ? "" : ` at page ${page}`}`} className="shrink-0 text-body font-strong underline underline-offset-4">
      {page === null ? "Open" : `p. ${page}`}
    </a>
  );
  if (readOnly) return link ?? <span className="text-label text-ink3">none stored</span>;
  if (datasheets.length === 0 && !onUpload) return <span className="text-label text-ink3">once the entry is kept</span>;
  return (
    <div className="flex items-center gap-2">
      <select
        aria-label={`Stored datasheet of ${label}`} value={chosen ?? ""} className="h-bar-control min-w-0 flex-1 border border-rule bg-paper px-1.5 text-label text-ink"
        onChange={(event) => {
          if (event.target.value === UPLOAD) onUpload?.(name);
          else onSource(name, sourceWithFile(source, datasheets.find((file) => file.id === event.target.value) ?? null, datasheets.map((file) => file.name)));
        }}
      >
        <option value="">none</option>
        {chosen && !datasheets.some((file) => file.id === chosen) && <option value={chosen}>no longer listed</option>}
        {datasheets.map((file) => <option key={file.id} value={file.id}>{file.name}</option>)}
        {onUpload && <option value={UPLOAD}>Add a new one…</option>}
      </select>
      {link}
    </div>
  );
}
