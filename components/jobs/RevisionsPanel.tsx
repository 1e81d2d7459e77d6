"use client";

import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import type { JobAnswer, RevisionLine } from "@/lib/api";
import { api } from "@/lib/client/api";
import { dateWords, momentWords } from "@/lib/client/dates";
import { useRevisions } from "@/lib/client/queries";
import { Button, LinkButton, buttonClass } from "@/components/ui/Button";
import { Caution } from "@/components/ui/Caution";
import { EmptyNote, ErrorNote, Skeleton } from "@/components/ui/Notes";
import { RedlineCounts } from "@/components/ui/RedlineMark";
import { StateStamp } from "@/components/ui/StateStamp";
import { IssueDialog } from "./IssueDialog";
import { Panel } from "./Panel";
import { paths } from "./paths";

/** Revisions of a job, newest first, with the draft on top. */
export function RevisionsPanel({ job, issueOpen = false }: { job: JobAnswer; issueOpen?: boolean }) {
  const router = useRouter();
  const revisions = useRevisions(job.id);
  const [issuing, setIssuing] = useState(issueOpen);
  const rows = revisions.data?.revisions ?? [];
  const open = rows.some((row) => row.state === "in review" || row.state === "sealing");
  return (
    <Panel
      title="Revisions"
      aside={job.may.issue && (
        <span className="flex items-center gap-3">
          {(open || job.empty) && <span className="text-label text-ink2">{open ? "One is in review" : "Nothing is drawn yet"}</span>}
          <Button size="bar" look="primary" disabled={open || job.empty} onClick={() => setIssuing(true)}>Issue Rev {job.nextLetter}</Button>
        </span>
      )}
    >
      {revisions.isPending && <Skeleton lines={2} />}
      {revisions.isError && <div className="p-5"><ErrorNote error={revisions.error} onRetry={() => void revisions.refetch()} /></div>}
      {revisions.data && rows.length === 0 && (
        <EmptyNote title="Nothing issued yet" action={job.may.editDrawing && <LinkButton href={paths.drawing(job.id)}>Open the drawing</LinkButton>}>
          Draw the system, clear the redlines, then issue it for review. A revision stays as it was issued.
        </EmptyNote>
      )}
      {rows.map((row) => <RevisionRow key={row.id} jobId={job.id} row={row} />)}
      {rows.length > 0 && <Caution compact className="m-5" />}
      <IssueDialog jobId={job.id} letter={job.nextLetter} counts={job.counts} edition={job.site.edition} open={issuing && job.may.issue && !open && !job.empty} onOpenChange={setIssuing} onIssued={(id) => router.push(paths.revision(job.id, id))} />
    </Panel>
  );
}

function RevisionRow({ jobId, row }: { jobId: string; row: RevisionLine }) {
  const sealed = row.state === "sealed" || row.state === "superseded" || row.state === "void";
  return (
    <article className="grid grid-cols-[56px_minmax(0,1fr)_auto] items-start gap-4 border-b border-g2 px-5 py-4">
      <div className="font-lettering">
        <span className="block text-title leading-none">{row.letter}</span>
        {row.issue > 1 && <span className="mt-1 block text-label text-ink2">issue {row.issue}</span>}
      </div>
      <div className="min-w-0">
        <div className="flex flex-wrap items-center gap-3">
          <StateStamp state={row.state} />
          <Link href={paths.revision(jobId, row.id)} className="text-finding font-finding first-letter:uppercase hover:underline">{row.purpose}</Link>
          <RedlineCounts counts={row.counts} />
        </div>
        {row.description && <p className="mt-1.5 text-text">{row.description}</p>}
        <p className="mt-1 text-body text-ink2">
          Issued by {row.issuedBy}, {dateWords(row.issuedAt)}.
          {row.sealedBy && row.sealedAt && ` Sealed by ${row.sealedBy}, ${dateWords(row.sealedAt)}, seal code ${row.sealCode ?? ""}.`}
        </p>
        {row.state === "void" && row.voidedAt && <p className="mt-1 text-body font-strong">The drawing was changed after the seal, {momentWords(row.voidedAt)}.</p>}
        {row.returnComment && (
          <blockquote className="mt-2 border-l-[3px] border-blue pl-3 text-text">
            <p className="whitespace-pre-line">{row.returnComment}</p>
            <footer className="text-label text-ink2">Returned by {row.returnedBy}</footer>
          </blockquote>
        )}
      </div>
      <div className="flex gap-2">
        <LinkButton href={paths.revision(jobId, row.id)} size="bar">{row.state === "in review" ? "Review" : "Open"}</LinkButton>
        {sealed && <a href={api.sheetsUrl(row.id)} className={`${buttonClass("plain", "bar")} hover:bg-paper`}>Download</a>}
      </div>
    </article>
  );
}
