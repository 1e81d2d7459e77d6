"use client";

import { useState } from "react";
import type { LibraryData, LibraryEntryAnswer } from "@/lib/api";
import { momentWords, whenWords } from "@/lib/client/dates";
import { useLibraryVersion } from "@/lib/client/libraryApi";
import { kindDefinition } from "@/lib/equipment/registry";
import { Panel } from "@/components/jobs/Panel";
import { Button } from "@/components/ui/Button";
import { ErrorNote } from "@/components/ui/Notes";
import { Differences } from "./Differences";
import { versionDifferences } from "./entryDraft";

const FEW = 8;

/** All versions with who made them, when and why, and what differs between two of them. */
export function VersionsPanel({ entry, onTakeUp }: { entry: LibraryEntryAnswer; onTakeUp: (version: number, data: LibraryData) => void }) {
  const [chosen, setChosen] = useState<number | null>(null);
  const [all, setAll] = useState(false);
  const shown = all ? entry.versions : entry.versions.slice(0, FEW);
  return (
    <Panel title="Versions" aside={<span className="text-label text-ink2">{entry.versions.length === 1 ? "1 version" : `${entry.versions.length} versions`}</span>}>
      <ol>
        {shown.map((line) => (
          <li key={line.version} className="border-b border-g2 last:border-b-0">
            <button
              type="button" aria-expanded={chosen === line.version} onClick={() => setChosen(chosen === line.version ? null : line.version)}
              className={`grid w-full grid-cols-[28px_minmax(0,1fr)] gap-x-2 px-5 py-2.5 text-left hover:bg-vellum ${chosen === line.version ? "bg-tint" : ""}`}
            >
              <span className="text-finding font-heading tabular-nums">{line.version}</span>
              <span className="min-w-0">
                <span className="block text-text break-words">{line.note || (line.version === 1 ? "Entered" : "No note")}</span>
                <span className="block text-label text-ink3" title={momentWords(line.at)}>{line.by}, {whenWords(line.at)}</span>
              </span>
            </button>
            {chosen === line.version && <Compared key={line.version} entry={entry} version={line.version} onTakeUp={onTakeUp} />}
          </li>
        ))}
      </ol>
      {entry.versions.length > FEW && <button type="button" aria-expanded={all} onClick={() => setAll(!all)} className="w-full border-t border-g2 px-5 py-3 text-left text-text font-strong hover:underline">{all ? "Show fewer" : `Show all ${entry.versions.length}`}</button>}
    </Panel>
  );
}

/** What differs between a version and another one: at first the one before it. */
function Compared({ entry, version, onTakeUp }: { entry: LibraryEntryAnswer; version: number; onTakeUp: (version: number, data: LibraryData) => void }) {
  const others = entry.versions.map((each) => each.version).filter((each) => each !== version);
  const [other, setOther] = useState<number | null>(version > 1 ? version - 1 : others[0] ?? null);
  const [here, there] = [useLibraryVersion(entry.id, version), useLibraryVersion(entry.id, other)];
  const failed = here.error ?? there.error;
  const older = Math.min(version, other ?? version) === version ? here.data : there.data;
  const newer = older === here.data ? there.data : here.data;
  const lines = older && newer ? versionDifferences(kindDefinition(entry.kind), older.data, newer.data) : null;
  return (
    <div className="border-t border-g2 bg-vellum px-5 py-3">
      {other === null ? <p className="text-text text-ink2">The only version so far.</p> : (
        <label className="mb-2.5 flex items-center gap-2 text-body text-ink2">
          Compared with version
          <select value={other} onChange={(event) => setOther(Number(event.target.value))} className="h-8 border border-rule bg-paper px-2 text-body text-ink">
            {others.map((each) => <option key={each} value={each}>{each}</option>)}
          </select>
        </label>
      )}
      {failed && <ErrorNote error={failed} onRetry={() => { void here.refetch(); void there.refetch(); }} />}
      {other !== null && !lines && !failed && <p role="status" className="text-text text-ink2">Looking at both</p>}
      {lines && lines.length === 0 && <p className="text-text text-ink2">No value differs.</p>}
      {lines && lines.length > 0 && <Differences lines={lines} />}
      {entry.may.edit && version !== entry.version && here.data && (
        <Button size="bar" className="mt-3" onClick={() => here.data && onTakeUp(version, here.data.data)}>Put its values into the form</Button>
      )}
    </div>
  );
}
