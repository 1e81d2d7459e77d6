"use client";

import Link from "next/link";
import { useState } from "react";
import type { JobAnswer, JurisdictionUpdate, UpdateFinding } from "@/lib/api";
import { jurisdictionKeys, jurisdictionsApi, useJurisdictionUpdate } from "@/lib/client/jurisdictionsApi";
import { keys, useChange } from "@/lib/client/queries";
import { previewNote } from "@/lib/code/adoption";
import { Button } from "@/components/ui/Button";
import { Dialog } from "@/components/ui/Dialog";
import { ErrorNote, Refused, Skeleton } from "@/components/ui/Notes";
import { RedlineMark } from "@/components/ui/RedlineMark";
import { paths } from "./paths";

const count = (number: number, one: string, many: string) => `${number} ${number === 1 ? one : many}`;

/** What differs, in few words: "1 amendment and the adopted code". */
function summary(changes: JurisdictionUpdate["changes"]): string {
  const amendments = changes.filter((each) => each.part === "amendment").length;
  const requirements = changes.filter((each) => each.part === "requirements").length;
  const parts = [
    ...(changes.some((each) => each.part === "edition") ? ["the adopted code"] : changes.some((each) => each.part === "codes") ? ["the line of codes"] : []),
    ...(amendments > 0 ? [count(amendments, "amendment", "amendments")] : []), ...(requirements > 0 ? [count(requirements, "requirement", "requirements")] : []),
  ];
  return parts.length < 2 ? parts.join("") : `${parts.slice(0, -1).join(", ")} and ${parts.at(-1) ?? ""}`;
}

/** Says that a job's drawing differs from its jurisdiction, shows what would change, and takes it over when asked. */
export function JurisdictionNotice({ job }: { job: JobAnswer }) {
  const update = useJurisdictionUpdate(job.id, "take", job.changedAt, job.may.viewDrawing && job.jurisdiction !== null);
  const [open, setOpen] = useState(false);
  const { data } = update;
  const differs = data?.jurisdiction && data.changes.length > 0;
  const preview = previewNote(job.site.edition);
  return (
    <>
      {preview && <p className="col-span-2 border-l-[3px] border-ochre pl-3 text-text phone:col-span-1">{preview}</p>}
      {differs && data.jurisdiction && (
        <div role="status" className="col-span-2 flex flex-wrap items-center justify-between gap-3 border-l-[3px] border-ochre bg-vellum py-2.5 pr-3 pl-3 phone:col-span-1">
          <p className="text-text">This drawing and {data.jurisdiction.name} differ: {summary(data.changes)}.</p>
          <Button size="bar" onClick={() => setOpen(true)}>{data.may.take ? "See and take over" : "See what differs"}</Button>
        </div>
      )}
      {differs && <TakeOver job={job} open={open} onOpenChange={setOpen} editionDiffers={data.changes.some((each) => each.part === "edition")} />}
    </>
  );
}

function TakeOver({ job, open, onOpenChange, editionDiffers }: { job: JobAnswer; open: boolean; onOpenChange: (open: boolean) => void; editionDiffers: boolean }) {
  const [edition, setEdition] = useState<"take" | "keep">("take");
  const update = useJurisdictionUpdate(job.id, edition, job.changedAt, open);
  const take = useChange((version: number) => jurisdictionsApi.take(job.id, { version, edition }), [keys.job(job.id), keys.jobs, jurisdictionKeys.update(job.id)]);
  const { data } = update;
  return (
    <Dialog open={open} onOpenChange={onOpenChange} title={`Take over ${job.jurisdiction?.name ?? "the jurisdiction"}`} description="Your drawing keeps what it was drawn under until you take the jurisdiction over as it is now. It is one edit, under your name.">
      {editionDiffers && (
        <label className="mb-4 flex min-h-control items-center gap-3 text-text">
          <input type="checkbox" className="size-4 accent-ink" checked={edition === "keep"} onChange={(event) => setEdition(event.target.checked ? "keep" : "take")} />
          Keep NEC {job.site.edition} for this job
        </label>
      )}
      {update.isPending && <Skeleton lines={3} height={40} />}
      {update.isError && <ErrorNote error={update.error} onRetry={() => void update.refetch()} />}
      {data && data.changes.length === 0 && <p className="text-text text-ink2">Nothing else differs.</p>}
      {data && data.changes.length > 0 && (
        <>
          <ul className="list-none border-t border-g1">
            {data.changes.map((each) => (
              <li key={`${each.part}${each.label}${each.now ?? ""}`} className="border-b border-g1 py-2 text-text">
                <p className="font-strong">{each.label}</p>
                <p className="text-body text-ink2">{each.was ?? "none"} <span aria-hidden="true">→</span><span className="sr-only">becomes</span> {each.now ?? "none"}</p>
              </li>
            ))}
          </ul>
          <Findings findings={data.findings} />
        </>
      )}
      {job.state === "sealed" && data?.may.take && <p className="mt-3 text-text font-strong">Taking it over makes the seal of Rev {job.revision} void.</p>}
      <Refused error={take.error} />
      <div className="mt-5 flex flex-wrap items-center gap-2">
        {data?.jurisdiction && data.may.take && data.changes.length > 0 && (
          <Button look="primary" busy={take.isPending} onClick={() => data.jurisdiction && take.mutate(data.jurisdiction.version, { onSuccess: () => onOpenChange(false), onError: () => void update.refetch() })}>Take it over</Button>
        )}
        <Button onClick={() => onOpenChange(false)}>{data?.may.take ? "Leave it" : "Close"}</Button>
        {job.jurisdiction && <Link href={paths.jurisdiction(job.jurisdiction.id)} className="ml-auto border-b border-dotted border-ink3 text-body text-ink2">Open the jurisdiction</Link>}
      </div>
    </Dialog>
  );
}

function Findings({ findings }: { findings: JurisdictionUpdate["findings"] }) {
  const { added, removed, changed } = findings;
  if (added.length + removed.length + changed.length === 0) return <p className="mt-3 text-text text-ink2">The redlines stay as they are.</p>;
  return (
    <div className="mt-4 grid gap-3">
      <List title={count(added.length, "redline comes", "redlines come")} rows={added} />
      <List title={count(removed.length, "redline goes", "redlines go")} rows={removed} />
      <List title={count(changed.length, "redline reads otherwise", "redlines read otherwise")} rows={changed.map((each) => each.now)} />
    </div>
  );
}

function List({ title, rows }: { title: string; rows: readonly UpdateFinding[] }) {
  if (rows.length === 0) return null;
  return (
    <section>
      <h3 className="text-body font-strong">{title}</h3>
      <ul className="list-none">
        {rows.map((each) => (
          <li key={each.key} className="flex gap-2.5 border-b border-g2 py-1.5 text-body">
            <RedlineMark kind={each.kind === "needs-data" ? "needs-data" : each.severity === "advice" ? "note" : each.severity} label={each.kind === "needs-data" ? "needs data" : each.severity} />
            <span className="min-w-0">{each.message}<span className="block text-label text-ink3">{each.citation}</span></span>
          </li>
        ))}
      </ul>
    </section>
  );
}
