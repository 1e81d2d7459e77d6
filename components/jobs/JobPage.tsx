"use client";

import type { JobAnswer } from "@/lib/api";
import { ApiProblem } from "@/lib/client/api";
import { dateWords, whenInSentence } from "@/lib/client/dates";
import { useJob } from "@/lib/client/queries";
import { DocumentsPanel } from "@/components/files/DocumentsPanel";
import { BarCell } from "@/components/ui/Bar";
import { LinkButton } from "@/components/ui/Button";
import { Caution } from "@/components/ui/Caution";
import { ErrorNote, Skeleton } from "@/components/ui/Notes";
import { RedlineCounts } from "@/components/ui/RedlineMark";
import { StateStamp } from "@/components/ui/StateStamp";
import { Due } from "./Due";
import { HistoryPanel } from "./HistoryPanel";
import { JobMenu } from "./JobMenu";
import { MembersPanel } from "./MembersPanel";
import { OfficeBar } from "./OfficeBar";
import { OfficePanel } from "./OfficePanel";
import { PlaceLine } from "./PlaceLine";
import { RevisionsPanel } from "./RevisionsPanel";
import { SheetPicture } from "./SheetPicture";
import { SitePanel } from "./SitePanel";
import { paths } from "./paths";

/** One job: where it stands, its revisions, its people, its site. */
export function JobPage({ jobId, issueOpen = false }: { jobId: string; issueOpen?: boolean }) {
  const job = useJob(jobId);
  const missing = job.error instanceof ApiProblem && job.error.status === 404;
  return (
    <div className="flex min-h-full flex-col">
      <OfficeBar>{job.data && <BarCell label={`Job ${job.data.number}`}>{job.data.name}</BarCell>}</OfficeBar>
      <main className="mx-auto w-full max-w-[1480px] flex-1 p-6 phone:p-3">
        {job.isPending && <div className="bg-paper"><Skeleton lines={5} /></div>}
        {job.isError && <ErrorNote error={job.error} {...(missing ? { title: "There is no such job" } : { onRetry: () => void job.refetch() })} />}
        {job.data && <Desk job={job.data} issueOpen={issueOpen} />}
      </main>
    </div>
  );
}

function Desk({ job, issueOpen }: { job: JobAnswer; issueOpen: boolean }) {
  return (
    <>
      <div className="mb-5 flex flex-wrap items-end justify-between gap-4">
        <div className="min-w-0">
          <p className="flex flex-wrap items-baseline gap-x-5 text-text text-ink2">
            <span className="font-lettering text-[16px]">{job.number}</span>
            {(job.dueOn || job.officeStatus !== "open") && <span>{job.dueOn && job.officeStatus !== "closed" && "Due "}<Due dueOn={job.dueOn} officeStatus={job.officeStatus} line /></span>}
          </p>
          <h1 className="text-[34px] leading-tight font-heading stretch-heading tracking-[-0.015em] narrow:text-title">{job.name}</h1>
          <p className="mt-1 text-finding text-ink2"><PlaceLine addressLines={job.addressLines} parcel={job.parcel} empty="No address yet" /></p>
        </div>
        <div className="flex items-center gap-4">
          <span className="text-text text-ink2">{job.revision ? `Rev ${job.revision}` : "Not issued"}</span>
          <StateStamp state={job.state} />
          <RedlineCounts counts={job.counts} />
          <span className="text-text text-ink2">changed {whenInSentence(job.changedAt)}</span>
          {job.may.viewDrawing && <LinkButton href={paths.drawing(job.id)} look="primary">Open the drawing</LinkButton>}
          {job.may.viewDrawing && <LinkButton href={paths.visit(job.id)}>Site visit</LinkButton>}
          {job.may.viewDrawing && !job.empty && <LinkButton href={paths.sheets(job.id)}>Sheets</LinkButton>}
          <JobMenu job={job} />
        </div>
      </div>
      {job.archivedAt && <p role="status" className="mb-5 border-l-[3px] border-ochre bg-paper px-4 py-3 text-text"><strong className="font-heading">In the archive</strong> since {dateWords(job.archivedAt)}. The job stays as it is.{job.may.archive ? " Under More it is taken out again." : " An administrator can take it out again."}</p>}
      <div className="grid grid-cols-[minmax(0,1fr)_440px] items-start gap-5 narrow:grid-cols-[minmax(0,1fr)_340px] phone:grid-cols-1">
        <div className="grid gap-5">
          <RevisionsPanel job={job} issueOpen={issueOpen} />
          <DocumentsPanel job={job} />
          <SitePanel job={job} />
        </div>
        <div className="grid gap-5">
          <SheetPicture jobId={job.id} changedAt={job.changedAt} />
          {job.may.viewDrawing && <OfficePanel job={job} />}
          <MembersPanel job={job} />
          {job.may.history && <HistoryPanel job={job} />}
          <Caution />
        </div>
      </div>
    </>
  );
}
