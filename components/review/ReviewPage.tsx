"use client";

import Link from "next/link";
import type { RevisionAnswer } from "@/lib/api";
import { ApiProblem, api } from "@/lib/client/api";
import { dateWords } from "@/lib/client/dates";
import { useRevision } from "@/lib/client/queries";
import { editionName } from "@/lib/code/adoption";
import { OfficeBar } from "@/components/jobs/OfficeBar";
import { paths } from "@/components/jobs/paths";
import { BarCell } from "@/components/ui/Bar";
import { Caution } from "@/components/ui/Caution";
import { ErrorNote, Skeleton } from "@/components/ui/Notes";
import { StateStamp } from "@/components/ui/StateStamp";
import { buttonClass } from "@/components/ui/Button";
import { Changes } from "./Changes";
import { Redlines } from "./Redlines";
import { SealPanel } from "./SealPanel";
import { SheetView } from "./SheetView";

/** States in which the worker is drawing and the page waits for it. */
const WAITING_MS = 1200;

/** What a licensee sees of one revision: the frozen sheet, what changed, what is open, and the seal. */
export function ReviewPage({ revisionId }: { revisionId: string }) {
  const revision = useRevision(revisionId, (data) => (data?.state === "sealing" || data?.preview?.state === "queued" || data?.preview?.state === "drawing" ? WAITING_MS : false));
  const missing = revision.error instanceof ApiProblem && revision.error.status === 404;
  return (
    <div className="flex h-dvh flex-col overflow-hidden phone:h-auto phone:overflow-visible">
      <OfficeBar>
        {revision.data && (
          <>
            <BarCell label={`Job ${revision.data.jobNumber}`}><Link href={paths.job(revision.data.jobId)} className="border-b border-dotted border-ink3">{revision.data.jobName}</Link></BarCell>
            <BarCell label="Revision">Rev {revision.data.letter}, {revision.data.purpose}</BarCell>
            <BarCell label="Issued by">{revision.data.issuedBy}, {dateWords(revision.data.issuedAt)}</BarCell>
            <BarCell label="Adopted code">{editionName(revision.data.check.edition)}</BarCell>
          </>
        )}
      </OfficeBar>
      {revision.isPending && <main className="p-6"><div className="bg-paper"><Skeleton lines={6} /></div></main>}
      {revision.isError && <main className="p-6"><ErrorNote error={revision.error} {...(missing ? { title: "There is no such revision" } : { onRetry: () => void revision.refetch() })} /></main>}
      {revision.data && <Desk revision={revision.data} />}
    </div>
  );
}

function Desk({ revision }: { revision: RevisionAnswer }) {
  return (
    <main className="grid min-h-0 flex-1 grid-cols-[minmax(0,1fr)_440px] gap-4 p-3 narrow:grid-cols-[minmax(0,1fr)_360px] phone:grid-cols-1">
      <div className="flex min-h-0 min-w-0 flex-col border border-rule bg-paper shadow-[2px_3px_0_0_var(--hatch)]">
        <header className="flex flex-wrap items-center gap-3 border-b-[1.5px] border-ink px-5 py-3">
          <h1 className="text-title font-heading stretch-heading narrow:text-heading">Rev {revision.letter}{revision.issue > 1 ? `, issue ${revision.issue}` : ""}</h1>
          <StateStamp state={revision.state} />
          <span className="text-text text-ink2">{revision.description}</span>
          <span className="flex-1" />
          {(revision.may.preview || revision.may.download) && (
            <a href={api.sheetsUrl(revision.id)} className={`${buttonClass("plain", "bar")} hover:bg-vellum`}>
              {revision.sealedSet?.state === "ready" ? "Download the sealed set" : "All sheets as PDF"}
            </a>
          )}
        </header>
        <SheetView revision={revision} />
        <Changes revision={revision} />
      </div>
      <div className="flex min-h-0 flex-col gap-3 overflow-y-auto pr-1 [scrollbar-width:thin]">
        <Redlines revision={revision} />
        <SealPanel revision={revision} />
        <Caution compact className="mb-2" />
      </div>
    </main>
  );
}
