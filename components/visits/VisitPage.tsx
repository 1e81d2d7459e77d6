"use client";

import Link from "next/link";
import { useEffect, useMemo, useState } from "react";
import type { VisitAnswer, VisitContent, VisitsAnswer } from "@/lib/api";
import { ApiProblem } from "@/lib/client/api";
import { calendarWords } from "@/lib/client/dates";
import { useMe } from "@/lib/client/queries";
import { useVisit } from "@/lib/client/useVisit";
import { useVisits } from "@/lib/client/visitsApi";
import { keptVisits, type KeptVisit } from "@/lib/client/visitStore";
import { emptyVisit } from "@/lib/diagram/siteVisit";
import { OfficeBar } from "@/components/jobs/OfficeBar";
import { paths } from "@/components/jobs/paths";
import { BarCell } from "@/components/ui/Bar";
import { Button } from "@/components/ui/Button";
import { EmptyNote, ErrorNote, Skeleton } from "@/components/ui/Notes";
import { SaveStamp, SaveTrouble } from "./SaveLine";
import { TakeOver } from "./TakeOver";
import { VisitForm } from "./VisitForm";
import { VisitProvider } from "./visitContext";

const todayHere = (): string => { const now = new Date(); return [now.getFullYear(), now.getMonth() + 1, now.getDate()].map((part) => String(part).padStart(2, "0")).join("-"); };
const nobody = { edit: false, take: false };

/** Site visits of a job: written on a phone at the site, taken into the drawing at the desk. */
export function VisitPage({ jobId }: { jobId: string }) {
  const visits = useVisits(jobId);
  const me = useMe();
  const [kept, setKept] = useState<KeptVisit[] | null>(null);
  useEffect(() => { void keptVisits(jobId).then(setKept); }, [jobId]);
  const missing = visits.error instanceof ApiProblem && visits.error.status === 404;
  // Without an answer of the server, what this device keeps is still there to go on with.
  const answer: VisitsAnswer | null = visits.data ?? (visits.isError && !missing && kept && kept.length > 0 ? { jobNumber: "", jobName: "", visits: [], may: { edit: true, take: false } } : null);
  return (
    <div className="flex min-h-full flex-col">
      <div className="phone:hidden"><OfficeBar>{visits.data && <BarCell label={`Job ${visits.data.jobNumber}`}>{visits.data.jobName}</BarCell>}</OfficeBar></div>
      <main className="mx-auto w-full max-w-[1280px] flex-1 p-6 pb-16 phone:p-0 phone:pb-20">
        {(visits.isPending || kept === null) && <div className="bg-paper"><Skeleton lines={5} /></div>}
        {visits.isError && <div className="phone:p-3"><ErrorNote error={visits.error} {...(missing ? { title: "There is no such job" } : { onRetry: () => void visits.refetch() })} /></div>}
        {answer && kept && <Visits jobId={jobId} answer={answer} kept={kept} name={me.data?.name ?? ""} />}
      </main>
    </div>
  );
}

function Visits({ jobId, answer, kept, name }: { jobId: string; answer: VisitsAnswer; kept: readonly KeptVisit[]; name: string }) {
  // Visits begun here that the server has not seen yet come first: they are what a person comes back for.
  const own = kept.filter((each) => !answer.visits.some((visit) => visit.id === each.visitId));
  const [begun, setBegun] = useState<{ id: string; blank: VisitContent } | null>(null);
  const begin = () => { const made = { id: crypto.randomUUID(), blank: { visitedOn: todayHere(), byName: name, data: emptyVisit() } }; setBegun(made); setChosen(made.id); };
  const [chosen, setChosen] = useState<string | null>(own[0]?.visitId ?? answer.visits[0]?.id ?? null);
  const all = useMemo(() => {
    const words = ({ visitedOn, byName }: VisitContent) => [calendarWords(visitedOn), byName].filter(Boolean).join(", ");
    const listed = [...own.map((each) => ({ id: each.visitId, words: `${words(each.content)}, on this device` })), ...answer.visits.map((each) => ({ id: each.id, words: words(each) }))];
    return begun && !listed.some((each) => each.id === begun.id) ? [{ id: begun.id, words: "New visit" }, ...listed] : listed;
  }, [own, answer.visits, begun]);
  const stored = answer.visits.find((each) => each.id === chosen) ?? null;
  const mine = kept.find((each) => each.visitId === chosen) ?? null;
  const blank = mine?.content ?? (begun?.id === chosen ? begun.blank : null) ?? { visitedOn: todayHere(), byName: name, data: emptyVisit() };
  const picker = (
    <div className="flex items-center gap-2">
      {all.length > 1 && (
        <span className="relative min-w-0 flex-1">
          <select aria-label="Visit" className="h-target w-full max-w-80 appearance-none border border-rule bg-paper pr-9 pl-3 text-finding" value={chosen ?? ""} onChange={(event) => setChosen(event.target.value)}>
            {all.map((each) => <option key={each.id} value={each.id}>{each.words}</option>)}
          </select>
          <svg viewBox="0 0 12 8" className="pointer-events-none absolute top-5 right-3 h-2 w-3" aria-hidden="true"><path d="M1 1.5L6 6.5L11 1.5" fill="none" stroke="currentColor" strokeWidth="1.6" /></svg>
        </span>
      )}
      {answer.may.edit && <Button className="!h-target" onClick={begin}>New visit</Button>}
    </div>
  );
  if (chosen === null) {
    return (
      <>
        <Head jobId={jobId} answer={answer} />
        <div className="bg-paper shadow-[0_0_0_1px_var(--rule),2px_3px_0_0_var(--hatch)]">
          <EmptyNote title="No visit yet" action={answer.may.edit ? <Button look="primary" className="!h-target" onClick={begin}>Begin a visit</Button> : undefined}>
            Photograph panel labels, copy bus and main ratings, measure runs and working space, read roof and attic. What is written here stays on the device until the server has it.
          </EmptyNote>
        </div>
      </>
    );
  }
  return <Open key={chosen} jobId={jobId} visitId={chosen} answer={answer} stored={stored} kept={mine} blank={blank} picker={picker} />;
}

function Head({ jobId, answer, children }: { jobId: string; answer: VisitsAnswer; children?: React.ReactNode }) {
  return (
    <header className="mb-5 flex flex-wrap items-end justify-between gap-4 phone:sticky phone:top-0 phone:z-20 phone:mb-0 phone:min-h-field-header phone:flex-nowrap phone:items-center phone:border-b-[1.5px] phone:border-ink phone:bg-panel phone:py-1 phone:pr-3">
      <div className="flex min-w-0 items-center">
        <Link href={paths.job(jobId)} aria-label="Back to the job" className="hidden size-target shrink-0 place-items-center phone:grid">
          <svg viewBox="0 0 12 20" className="h-5 w-3" aria-hidden="true"><path d="M10.5 1.5L2 10l8.5 8.5" fill="none" stroke="currentColor" strokeWidth="2" /></svg>
        </Link>
        <div className="min-w-0">
          <h1 className="text-title font-heading stretch-heading phone:text-field">Site visit</h1>
          <p className="truncate text-finding text-ink2 phone:text-body">{answer.jobNumber && <Link href={paths.job(jobId)} className="hover:underline">{answer.jobNumber}, {answer.jobName}</Link>}</p>
        </div>
      </div>
      {children}
    </header>
  );
}

interface OpenProps { jobId: string; visitId: string; answer: VisitsAnswer; stored: VisitAnswer | null; kept: KeptVisit | null; blank: VisitContent; picker: React.ReactNode }
function Open({ jobId, visitId, answer, stored, kept, blank, picker }: OpenProps) {
  const open = useVisit({ jobId, visitId, stored, kept, blank });
  const [taking, setTaking] = useState(false);
  const { save } = open.state;
  const may = answer.may ?? nobody;
  const value = useMemo(() => ({ open, readOnly: !may.edit, jobId }), [open, may.edit, jobId]);
  const ready = save.kind === "saved";
  return (
    <VisitProvider value={value}>
      <Head jobId={jobId} answer={answer}>
        <div className="flex items-center gap-3"><div className="phone:hidden">{picker}</div><SaveStamp /></div>
      </Head>
      <div className="phone:px-4 phone:[&:not(:empty)]:pt-3"><SaveTrouble onFlush={() => { void open.keeper.flush(); open.queue.flush(); }} onSettle={(prefer) => open.keeper.settle(prefer)} /></div>
      {taking ? <TakeOver jobId={jobId} content={open.state.content} onBack={() => setTaking(false)} /> : (
        <>
          <div className="hidden border-b border-g1 bg-paper px-4 py-3 phone:block">{picker}</div>
          {!may.edit && <p className="mb-4 border-l-[3px] border-blue bg-paper p-4 text-finding phone:mx-4">To read. Designers, installers and administrators of the job write visits.</p>}
          <VisitForm />
          {may.take && (
            <div className="mt-6 ml-[224px] flex flex-wrap items-center gap-4 phone:m-0 phone:bg-paper phone:px-4 phone:py-6">
              <Button look="primary" className="!h-target !px-6 phone:w-full" disabled={!ready} onClick={() => { setTaking(true); window.scrollTo({ top: 0 }); }}>Take into the drawing</Button>
              <span className="text-text text-ink2">{ready ? "You see each value before it is set." : save.kind === "new" ? "Nothing is written yet." : "Once all is saved."}</span>
            </div>
          )}
        </>
      )}
    </VisitProvider>
  );
}
