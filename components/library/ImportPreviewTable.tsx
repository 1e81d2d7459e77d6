"use client";

import Link from "next/link";
import { useState } from "react";
import type { ImportPreview, ImportRow } from "@/lib/api";
import { keyRating, ratedCounts } from "@/lib/equipment/libraryData";
import { kindDefinition } from "@/lib/equipment/registry";
import { paths } from "@/components/jobs/paths";
import { Button } from "@/components/ui/Button";
import { showValue } from "@/lib/client/readField";

interface ImportPreviewProps { preview: ImportPreview; busy: boolean; blocked: boolean; onConfirm: () => void }

const FEW = 50;
const HEAD = "sticky top-0 h-8 border-b border-ink bg-paper px-3 text-left text-label font-medium text-ink2";
const CELL = "h-row border-b border-g2 px-3 py-1 text-body align-top";
const ACTIONS: Readonly<Record<ImportRow["action"], string>> = { add: "new entry", "new version": "new version", same: "the same" };

/** What a table would do: every cell that was not taken, every row that would be. */
export function ImportPreviewTable({ preview, busy, blocked, onConfirm }: ImportPreviewProps) {
  const of = (action: ImportRow["action"]) => preview.good.filter((row) => row.action === action).length;
  const writes = of("add") + of("new version");
  const badRows = preview.total - preview.good.length;
  const label = of("new version") > 0 ? `Take in the ${counted(writes, "good row")}` : `Add the ${counted(writes, "good row")}`;
  return (
    <>
      <dl className="mb-4 grid max-w-[720px] grid-cols-5 border border-rule phone:grid-cols-2">
        <Count name="Rows" value={preview.total} />
        <Count name="New entries" value={of("add")} />
        <Count name="New versions" value={of("new version")} />
        <Count name="The same" value={of("same")} />
        <Count name="Rows with faults" value={badRows} bad={badRows > 0} />
      </dl>
      {preview.unknownColumns.length > 0 && <p className="mb-4 border-l-[3px] border-ochre bg-vellum px-4 py-2.5 text-text">Not read, since the kind has no such {preview.unknownColumns.length === 1 ? "column" : "columns"}: <strong className="font-strong">{preview.unknownColumns.join(", ")}</strong>. The empty table shows how they are written.</p>}
      {preview.faults.length > 0 && (
        <>
          <h3 className="mb-1 text-text font-heading">{preview.faults.length === 1 ? "One cell that was not understood" : `${preview.faults.length.toLocaleString("en-US")} cells that were not understood`}</h3>
          <Few items={preview.faults} what="cells">
            {(faults) => (
              <table className="w-full border-separate border-spacing-0" aria-label="Cells that were not understood">
                <thead><tr><th className={`${HEAD} w-[64px]`}>Row</th><th className={`${HEAD} w-[27%]`}>Column</th><th className={`${HEAD} w-[20%]`}>Value</th><th className={HEAD}>Why it was not taken</th></tr></thead>
                <tbody>
                  {faults.map((fault, index) => (
                    <tr key={`${fault.row} ${fault.column} ${index}`}>
                      <td className={`${CELL} tabular-nums`}>{fault.row}</td><td className={CELL}>{fault.column}</td>
                      <td className={`${CELL} break-all`}>{fault.value === "" ? <span className="text-ink3">empty</span> : <span className="bg-vellum px-1 font-strong">{fault.value}</span>}</td><td className={`${CELL} text-red`}>{fault.reason}</td>
                    </tr>
                  ))}
                </tbody>
              </table>
            )}
          </Few>
        </>
      )}
      {preview.good.length > 0 && (
        <>
          <h3 className="mt-5 mb-1 text-text font-heading">{counted(preview.good.length, "good row")}</h3>
          <GoodRows preview={preview} />
        </>
      )}
      <div className="mt-5 flex flex-wrap items-center gap-3">
        <Button look="primary" busy={busy} disabled={writes === 0 || blocked} onClick={onConfirm}>{label}</Button>
        <p className="text-text text-ink2">{writes === 0 ? (preview.total === 0 ? "The table has no rows." : badRows === 0 ? "Everything in it is in the library already." : "No row can be taken in.") : badRows > 0 ? `${counted(badRows, "row")} with faults ${badRows === 1 ? "is" : "are"} left out; or mend the table and drop it again.` : "Every row is good."}</p>
      </div>
    </>
  );
}

const counted = (count: number, one: string): string => `${count.toLocaleString("en-US")} ${one}${count === 1 ? "" : "s"}`;

/** Rows that can be taken in; once they are, with the way to each entry. */
export function GoodRows({ preview, done = false }: { preview: ImportPreview; done?: boolean }) {
  return (
    <Few items={preview.good} what="rows">
      {(good) => (
        <table className="w-full border-separate border-spacing-0" aria-label="Good rows">
          <thead><tr><th className={`${HEAD} w-[64px]`}>Row</th><th className={HEAD}>Name</th><th className={`${HEAD} w-[150px]`}>Model</th><th className={`${HEAD} w-[190px]`}>Key rating</th><th className={`${HEAD} w-[140px]`}>Ratings</th><th className={`${HEAD} w-[120px]`}>{done ? "Is now" : "Becomes"}</th></tr></thead>
          <tbody>{good.map((row) => <Good key={row.row} kind={preview.kind} row={row} done={done} />)}</tbody>
        </table>
      )}
    </Few>
  );
}

function Good({ kind, row, done }: { kind: string; row: ImportRow; done: boolean }) {
  const definition = kindDefinition(kind);
  const { rated, sourced } = ratedCounts(definition.properties, row.data);
  // An entry that was just made is found by its name.
  const to = row.entryId ? paths.libraryEntry(row.entryId) : done ? `${paths.library}?${new URLSearchParams({ kind, q: row.name }).toString()}` : null;
  return (
    <tr>
      <td className={`${CELL} tabular-nums`}>{row.row}</td>
      <td className={`${CELL} font-medium`}>{to ? <Link href={to} {...(done ? {} : { target: "_blank" })} className="hover:underline">{row.name}</Link> : row.name}</td>
      <td className={CELL}>{showValue(row.data.props["model"])}</td>
      <td className={CELL}>{keyRating(definition, row.data)}</td>
      <td className={`${CELL} text-ink2`}>{rated === 0 ? "none known" : `${sourced} of ${rated} sourced`}</td>
      <td className={`${CELL} ${row.action === "same" ? "text-ink3" : ""}`}>{ACTIONS[row.action]}{row.action === "new version" && row.baseVersion !== null ? ` ${row.baseVersion + 1}` : ""}</td>
    </tr>
  );
}

function Count({ name, value, bad = false }: { name: string; value: number; bad?: boolean }) {
  return (
    <div className="border-r border-rule px-3 py-2 last:border-r-0">
      <dt className="text-label text-ink2">{name}</dt>
      <dd className={`text-heading font-heading tabular-nums ${bad ? "text-red" : ""}`}>{value.toLocaleString("en-US")}</dd>
    </div>
  );
}

/** The first items of a long list, and all of them when asked. */
function Few<Item>({ items, what, children }: { items: readonly Item[]; what: string; children: (shown: readonly Item[]) => React.ReactNode }) {
  const [all, setAll] = useState(false);
  return (
    <>
      <div className="max-h-[420px] overflow-y-auto border-b border-g1">{children(all ? items : items.slice(0, FEW))}</div>
      {items.length > FEW && <button type="button" aria-expanded={all} onClick={() => setAll(!all)} className="py-2 text-body font-strong hover:underline">{all ? `Show the first ${FEW}` : `Show all ${items.length.toLocaleString("en-US")} ${what}`}</button>}
    </>
  );
}
