"use client";

import { useState, type ReactNode } from "react";
import type { VisitData } from "@/lib/diagram/siteVisit";
import { newId } from "@/lib/client/newId";
import { useVisitForm } from "./visitContext";

type Part = "panels" | "found" | "lengths" | "places";
type Row<P extends Part> = VisitData[P][number];

interface RowsProps<P extends Part> {
  part: P;
  /** What one row is, for its heading and the buttons: "panel". */
  noun: string;
  /** What to enter here, while there is nothing. */
  empty: string;
  make: (id: string) => Row<P>;
  title: (row: Row<P>) => string | null;
  children: (row: Row<P>, set: (to: Partial<Row<P>>) => void) => ReactNode;
}

/** Things of one sort, each on a card of its own. What was removed can be put back. */
export function Rows<P extends Part>({ part, noun, empty, make, title, children }: RowsProps<P>) {
  const { data, readOnly, setRow, addRow, removeRow } = useVisitForm();
  const [removed, setRemoved] = useState<{ row: Row<P>; index: number } | null>(null);
  const rows = data[part] as Row<P>[];
  return (
    <div className="col-span-full grid gap-4">
      {rows.length === 0 && <p className="max-w-[56ch] text-finding text-ink2">{empty}</p>}
      {rows.map((row, index) => (
        <fieldset key={row.id} className="min-w-0 border border-rule bg-paper">
          <legend className="sr-only">{title(row) ?? `${noun} ${index + 1}`}</legend>
          <div className="flex min-h-target items-center justify-between gap-3 border-b border-g1 bg-vellum pl-4">
            <p className="min-w-0 truncate text-finding font-heading">{title(row) ?? <span className="first-letter:uppercase inline-block">{noun} {index + 1}</span>}</p>
            {!readOnly && (
              <button type="button" className="h-target shrink-0 px-4 text-text underline underline-offset-4" aria-label={`Remove ${title(row) ?? `${noun} ${index + 1}`}`} onClick={() => { setRemoved({ row, index }); removeRow(part, row.id); }}>Remove</button>
            )}
          </div>
          <div className="grid grid-cols-2 gap-x-5 gap-y-4 p-4 phone:grid-cols-1">{children(row, (to) => setRow(part, row.id, to as never))}</div>
        </fieldset>
      ))}
      {removed && (
        <p role="status" className="flex items-center justify-between gap-3 border border-dashed border-rule pl-4 text-finding">
          <span className="min-w-0 truncate">{title(removed.row) ?? noun} was removed.</span>
          <button type="button" className="h-target shrink-0 px-4 font-strong underline underline-offset-4" onClick={() => { addRow(part, removed.row as never, removed.index); setRemoved(null); }}>Put back</button>
        </p>
      )}
      {!readOnly && (
        <button type="button" className="h-target border border-dashed border-ink bg-vellum text-finding font-strong hover:bg-paper" onClick={() => addRow(part, make(newId(part.slice(0, -1))) as never)}>Add a {noun}</button>
      )}
    </div>
  );
}
