"use client";

import { useMemo, useState } from "react";
import type { FilePurpose, JobAnswer } from "@/lib/api";
import { useFiles } from "@/lib/client/filesApi";
import { Panel } from "@/components/jobs/Panel";
import { SelectField } from "@/components/ui/Field";
import { EmptyNote, ErrorNote, Skeleton } from "@/components/ui/Notes";
import { FileDrop } from "./FileDrop";
import { FileList } from "./FileList";

/** What is added here, as the list of choices says it. */
const CHOICES: readonly [FilePurpose, string][] = [
  ["document", "Document"], ["datasheet", "Datasheet"], ["site photo", "Site photo"], ["background", "Sketch or photo for under the sheet"],
];
const FEW = 6;

/** Papers and pictures of a job. The counter never sees them. */
export function DocumentsPanel({ job }: { job: JobAnswer }) {
  const place = useMemo(() => ({ jobId: job.id }), [job.id]);
  const files = useFiles(place, job.may.viewDrawing);
  const [purpose, setPurpose] = useState<FilePurpose>("document");
  const [all, setAll] = useState(false);
  if (!job.may.viewDrawing) return null;
  const rows = files.data?.files ?? [];
  const shown = all ? rows : rows.slice(0, FEW);
  return (
    <Panel title="Documents" id="documents" aside={rows.length > 0 && <span className="text-label text-ink2">{rows.length === 1 ? "1 file" : `${rows.length} files`}</span>}>
      <div className="grid gap-3 border-b border-g2 p-5">
        <SelectField label="What it is" className="max-w-72" value={purpose} onChange={(event) => setPurpose(CHOICES.find(([each]) => each === event.target.value)?.[0] ?? "document")}>
          {CHOICES.map(([value, words]) => <option key={value} value={value}>{words}</option>)}
        </SelectField>
        <FileDrop place={place} purpose={purpose} label="Add files" />
      </div>
      {files.isPending && <Skeleton lines={2} height={80} />}
      {files.isError && <div className="p-5"><ErrorNote error={files.error} onRetry={() => void files.refetch()} /></div>}
      {files.data && rows.length === 0 && (
        <EmptyNote title="No documents yet">Bills, plot plans, letters of the utility, photos of the site: whatever the job is drawn from. Everybody of the office on this job reads them.</EmptyNote>
      )}
      <FileList files={shown} place={place} />
      {rows.length > FEW && (
        <button type="button" onClick={() => setAll(!all)} aria-expanded={all} className="w-full border-t border-g2 px-5 py-3 text-left text-text font-strong hover:underline">
          {all ? "Show fewer" : `Show all ${rows.length}`}
        </button>
      )}
    </Panel>
  );
}
