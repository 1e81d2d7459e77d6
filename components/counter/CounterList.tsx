"use client";

import Link from "next/link";
import type { CounterLine } from "@/lib/api";
import { dateWords } from "@/lib/client/dates";
import { useCounter } from "@/lib/client/queries";
import { paths } from "@/components/jobs/paths";
import { Caution } from "@/components/ui/Caution";
import { EmptyNote, ErrorNote, Skeleton } from "@/components/ui/Notes";
import { StateStamp } from "@/components/ui/StateStamp";
import { CounterBar } from "./CounterBar";

/** Everything that was brought to this clerk. */
export function CounterList() {
  const counter = useCounter();
  const jobs = counter.data?.jobs ?? [];
  return (
    <div className="min-h-full bg-panel">
      <CounterBar />
      <main className="mx-auto max-w-[1120px] px-10 py-9 phone:px-4">
        <h1 className="text-counter font-heading stretch-heading tracking-[-0.015em] narrow:text-[34px]">Permits</h1>
        <p className="mt-2 text-finding text-ink2">Sealed sheet sets of the jobs you were added to. What is not sealed is not here.</p>
        <div className="mt-7 border-t-[1.5px] border-ink">
          {counter.isPending && <Skeleton lines={3} height={84} />}
          {counter.isError && <div className="py-5"><ErrorNote error={counter.error} onRetry={() => void counter.refetch()} /></div>}
          {counter.data && jobs.length === 0 && <EmptyNote title="Nothing here yet">A job appears as soon as its office adds you to it as permit clerk.</EmptyNote>}
          <ul>{jobs.map((job) => <CounterRow key={job.jobId} job={job} />)}</ul>
        </div>
        <Caution compact className="mt-8" />
      </main>
    </div>
  );
}

function CounterRow({ job }: { job: CounterLine }) {
  const { current } = job;
  return (
    <li className="border-b border-desk2">
      <Link href={paths.counter(job.jobId)} className="grid min-h-[84px] grid-cols-[170px_minmax(0,1fr)_auto] items-center gap-5 px-2 py-3 hover:bg-vellum phone:grid-cols-1 phone:gap-1">
        <span className="text-finding font-strong text-ink2">{job.permitNumber || "no number yet"}</span>
        <span className="min-w-0">
          <span className="block truncate text-heading font-heading">{job.name}</span>
          <span className="block truncate text-finding text-ink2">{job.addressLines.split("\n").filter(Boolean).join(", ") || `Job ${job.number}`}</span>
        </span>
        <span className="flex items-center gap-4">
          {current ? (
            <>
              <span className="text-right text-text text-ink2">Rev {current.letter}, {dateWords(current.sealedAt)}<br />{current.licensee}</span>
              <StateStamp state={current.state} />
            </>
          ) : <span className="text-text text-ink2">Nothing sealed yet</span>}
        </span>
      </Link>
    </li>
  );
}
