"use client";

import type { HistoryLine, JobAnswer } from "@/lib/api";
import { momentWords, whenWords } from "@/lib/client/dates";
import { useHistory } from "@/lib/client/jobsApi";
import { Button } from "@/components/ui/Button";
import { ErrorNote, Skeleton } from "@/components/ui/Notes";
import { Panel } from "./Panel";

/** What was done to the job, newest first, each line with who and when. */
export function HistoryPanel({ job }: { job: JobAnswer }) {
  const history = useHistory(job.id);
  const lines = history.data?.pages.flatMap((page) => page.entries) ?? [];
  return (
    <Panel title="History">
      {history.isPending && <Skeleton lines={4} height={52} />}
      {history.isError && <div className="p-5"><ErrorNote error={history.error} onRetry={() => void history.refetch()} /></div>}
      {history.data && lines.length === 0 && <p className="px-5 py-4 text-text text-ink2">Nothing is recorded yet.</p>}
      <ol>{lines.map((each) => <Line key={each.id} line={each} />)}</ol>
      {history.hasNextPage && (
        <div className="px-5 py-3"><Button size="bar" busy={history.isFetchingNextPage} onClick={() => void history.fetchNextPage()}>Show earlier</Button></div>
      )}
    </Panel>
  );
}

function Line({ line: { at, by, what, detail } }: { line: HistoryLine }) {
  return (
    <li className="border-b border-g2 px-5 py-2.5 last:border-b-0">
      <p className="flex items-baseline justify-between gap-3">
        <span className="min-w-0 text-text font-strong">{what}</span>
        <time dateTime={at} title={momentWords(at)} className="shrink-0 text-body text-ink2">{whenWords(at)}</time>
      </p>
      <p className="text-body text-ink2">{by ?? "The system"}{detail && <span className="wrap-anywhere">: {detail}</span>}</p>
    </li>
  );
}
