"use client";

import { useQuery, useQueryClient } from "@tanstack/react-query";
import { useMemo, useState } from "react";
import type { DrawingAnswer, JobAnswer, VisitContent } from "@/lib/api";
import { ApiProblem, api } from "@/lib/client/api";
import { CommandsRefused, changeDrawing, takeBack, type DrawingChange } from "@/lib/client/takeVisit";
import { fromVisit, guessedChoices, takenAtFirst, visitLines, visitSource, type VisitChoices } from "@/lib/diagram/fromVisit";
import { keys, useJob } from "@/lib/client/queries";
import { Button, LinkButton } from "@/components/ui/Button";
import { EmptyNote, ErrorNote, Refused, Skeleton } from "@/components/ui/Notes";
import { paths } from "@/components/jobs/paths";
import { TakeChoices } from "./TakeChoices";
import { TakeLines } from "./TakeLines";

interface Props { jobId: string; content: VisitContent; onBack: () => void }

/** A visit is taken into the drawing: what each row is there, which values would be set, and one step that sets them. */
export function TakeOver({ jobId, content, onBack }: Props) {
  // Read anew each time: lines are worked out for the drawing as it is now.
  const drawing = useQuery({ queryKey: ["drawing", jobId, "take"], queryFn: () => api.drawing(jobId), staleTime: 0, gcTime: 0, refetchOnWindowFocus: false });
  const job = useJob(jobId);
  return (
    <section aria-labelledby="take-title" className="mx-auto max-w-[1120px] bg-paper shadow-[0_0_0_1px_var(--rule),2px_3px_0_0_var(--hatch)]">
      <div className="flex flex-wrap items-center justify-between gap-3 border-b-[1.5px] border-ink px-6 py-4 phone:px-4">
        <div>
          <h2 id="take-title" className="text-heading font-heading stretch-heading">Take into the drawing</h2>
          <p className="text-text text-ink2">From the {visitSource(content)}.</p>
        </div>
        <Button className="phone:!h-target" onClick={onBack}>Back to the visit</Button>
      </div>
      {drawing.isPending && <Skeleton lines={5} height={48} />}
      {drawing.isError && <div className="p-5"><ErrorNote error={drawing.error} title="The drawing could not be read" onRetry={() => void drawing.refetch()} /></div>}
      {drawing.data && <Taking key={drawing.data.sequence} jobId={jobId} answer={drawing.data} content={content} job={job.data ?? null} onReread={() => void drawing.refetch()} />}
    </section>
  );
}

function Taking({ jobId, answer, content, job, onReread }: { jobId: string; answer: DrawingAnswer; content: VisitContent; job: JobAnswer | null; onReread: () => void }) {
  const client = useQueryClient();
  const [choices, setChoices] = useState<VisitChoices>(() => guessedChoices(answer.drawing, content.data));
  /** Ticks a person changed; the rest is as it starts. */
  const [ticked, setTicked] = useState<Readonly<Record<string, boolean>>>({});
  const [done, setDone] = useState<{ change: DrawingChange; count: number; back: boolean } | null>(null);
  const [busy, setBusy] = useState(false);
  const [failure, setFailure] = useState<unknown>(null);
  const lines = useMemo(() => visitLines(answer.drawing, content, choices), [answer.drawing, content, choices]);
  const wanted = new Set(lines.filter((line) => ticked[line.key] ?? takenAtFirst(line)).map((line) => line.key));
  const taken = new Set(lines.filter((line) => wanted.has(line.key) && (line.needs === null || wanted.has(line.needs))).map((line) => line.key));
  const conflict = failure instanceof ApiProblem && failure.status === 409 && failure.code === "edit-conflict";

  const run = async (work: () => Promise<void>) => {
    setBusy(true);
    setFailure(null);
    try {
      await work();
      await client.invalidateQueries({ queryKey: [...keys.job(jobId)] });
    } catch (error) {
      setFailure(error);
    } finally {
      setBusy(false);
    }
  };
  const take = () => run(async () => {
    const change = await changeDrawing(answer, fromVisit(answer.drawing, content, choices, taken), `take over the ${visitSource(content)}`);
    setDone({ change, count: taken.size, back: false });
  });
  const undo = () => run(async () => {
    if (!done) return;
    await takeBack(done.change);
    setDone({ ...done, back: true });
  });

  if (done) {
    return (
      <div className="px-6 py-8 phone:px-4" role="status">
        <p className="text-heading font-heading stretch-heading">{done.back ? "It was taken back." : `${done.count === 1 ? "One value is" : `${done.count} values are`} in the drawing.`}</p>
        <p className="mt-1 max-w-[60ch] text-finding text-ink2">{done.back ? "The drawing is as it was before." : "They were saved as one change; ratings name the visit as their source. New panels stand where there was room; move them to where they belong."}</p>
        <div className="mt-5 flex flex-wrap items-center gap-2">
          <LinkButton href={paths.drawing(jobId)} look="primary" className="phone:!h-target">Open the drawing</LinkButton>
          {!done.back && <Button className="phone:!h-target" busy={busy} onClick={() => void undo()}>Take it back</Button>}
          <Button look="quiet" className="phone:!h-target" onClick={onReread}>Look again</Button>
          {failure !== null && (conflict ? <p role="alert" className="text-text font-strong text-red">Somebody has changed what was set. Change it in the drawing.</p> : <Refused error={failure} />)}
        </div>
      </div>
    );
  }
  if (!answer.may.edit) return <EmptyNote title="Only designers of this job draw">The visit is stored. A designer takes from it into the drawing.</EmptyNote>;
  return (
    <>
      <TakeChoices drawing={answer.drawing} data={content.data} choices={choices} onChange={setChoices} />
      {lines.length === 0
        ? <EmptyNote title="Nothing to take">The drawing has everything that this visit says of what was chosen above, or the visit says nothing of it.</EmptyNote>
        : <TakeLines lines={lines} taken={taken} wanted={wanted} onTick={(key, on) => setTicked({ ...ticked, [key]: on })} />}
      {lines.length > 0 && (
        <div className="sticky bottom-0 flex flex-wrap items-center gap-3 border-t border-ink bg-paper px-6 py-4 phone:px-4">
          <Button look="primary" className="phone:!h-target phone:w-full" disabled={taken.size === 0} busy={busy} onClick={() => void take()}>{taken.size === 0 ? "Tick what to take" : `Take ${taken.size} ${taken.size === 1 ? "value" : "values"} into the drawing`}</Button>
          {job?.state === "sealed" && <span className="text-text">Taking values makes the seal of Rev {job.revision} void.</span>}
          {conflict && (
            <p role="alert" className="flex flex-wrap items-center gap-3 text-text font-strong text-red">Somebody changed the same parts of the drawing. Nothing was taken. <Button onClick={onReread}>Look again</Button></p>
          )}
          {failure instanceof CommandsRefused && <p role="alert" className="text-text font-strong text-red">{failure.message}</p>}
          {!conflict && !(failure instanceof CommandsRefused) && <Refused error={failure} />}
        </div>
      )}
    </>
  );
}
