"use client";

import { useQuery } from "@tanstack/react-query";
import Link from "next/link";
import { useState } from "react";
import { OfficeBar } from "@/components/jobs/OfficeBar";
import { paths } from "@/components/jobs/paths";
import { BarCell } from "@/components/ui/Bar";
import { LinkButton, buttonClass } from "@/components/ui/Button";
import { Caution } from "@/components/ui/Caution";
import { ErrorNote, Skeleton } from "@/components/ui/Notes";
import { ApiProblem, api } from "@/lib/client/api";
import { useRevisions } from "@/lib/client/queries";
import type { SheetPage } from "@/lib/sheets/context";
import { SheetPicture } from "./SheetPicture";
import { usePreview } from "./usePreview";

const name = (page: SheetPage): string => page.title.charAt(0) + page.title.slice(1).toLowerCase();

/** The set as it would print now: all sheets in small, or one of them large. */
export function SheetsPage({ jobId }: { jobId: string }) {
  const drawing = useQuery({ queryKey: ["drawing-sheets", jobId], queryFn: () => api.drawing(jobId), refetchOnMount: "always" });
  const preview = usePreview(drawing.data?.drawing);
  const [chosen, setChosen] = useState<string | null>(null);
  const missing = drawing.error instanceof ApiProblem && drawing.error.status === 404;
  const pages = preview.pages ?? [];
  const open = pages.find((page) => page.number === chosen) ?? null;
  return (
    <div className="flex h-dvh flex-col overflow-hidden phone:h-auto phone:overflow-visible">
      <OfficeBar>
        {drawing.data && (
          <>
            <BarCell label={`Job ${drawing.data.jobNumber}`}><Link href={paths.job(jobId)} className="border-b border-dotted border-ink3">{drawing.data.jobName}</Link></BarCell>
            <BarCell label="Shown">Draft of Rev {drawing.data.revisionLetter}</BarCell>
          </>
        )}
      </OfficeBar>
      <main className="grid min-h-0 flex-1 grid-cols-[300px_minmax(0,1fr)] phone:grid-cols-1">
        <nav aria-label="Sheets" className="flex min-h-0 flex-col gap-4 overflow-y-auto border-r border-rule bg-panel p-5">
          <div>
            <h1 className="text-title font-heading stretch-heading">Sheet set</h1>
            <p className="mt-1 text-text text-ink2">{pages[0] ? `${pages.length} sheets, ${pages[0].widthIn} × ${pages[0].heightIn} in. Least lettering 3/16 in at full size, 3/32 in on the half-size print.` : "Sheets are drawn from the drawing as it is now."}</p>
          </div>
          <ol className="list-none border-t border-ink">
            {pages.map((page) => (
              <li key={page.number} className="border-b border-desk2">
                <button type="button" aria-pressed={page.number === chosen} onClick={() => setChosen(page.number === chosen ? null : page.number)} className={`grid w-full grid-cols-[64px_minmax(0,1fr)] items-baseline py-2 pl-2 text-left hover:bg-vellum ${page.number === chosen ? "border-l-[5px] border-ink bg-vellum" : ""}`}>
                  <span className="font-lettering text-finding">{page.number}</span><span className="text-text">{name(page)}</span>
                </button>
              </li>
            ))}
          </ol>
          <Issued jobId={jobId} />
          <Caution compact />
        </nav>
        <div className="dimmed-sheet min-h-0 overflow-auto bg-desk p-6">
          {drawing.isPending || (drawing.data && !preview.pages && !preview.error) ? <div className="bg-paper"><Skeleton lines={6} /></div> : null}
          {drawing.isError && <ErrorNote error={drawing.error} {...(missing ? { title: "There is no such job" } : { onRetry: () => void drawing.refetch() })} />}
          {preview.error && <ErrorNote error={null} title={preview.error} />}
          {open ? (
            <figure className="min-w-[1100px] border border-rule">
              <SheetPicture page={open} label={`Sheet ${open.number}, ${name(open)}`} />
            </figure>
          ) : (
            <ul className="grid list-none grid-cols-3 gap-6 narrow:grid-cols-2 phone:grid-cols-1">
              {pages.map((page) => (
                <li key={page.number}>
                  <button type="button" onClick={() => setChosen(page.number)} className="block w-full border border-rule shadow-[3px_4px_0_0_var(--hatch)]" aria-label={`Open sheet ${page.number}, ${name(page)}`}>
                    <SheetPicture page={page} />
                  </button>
                  <p className="mt-2 text-text"><span className="font-heading">{page.number}</span> {name(page)}</p>
                </li>
              ))}
            </ul>
          )}
        </div>
      </main>
    </div>
  );
}

/** The newest revision's frozen sheets, which are what goes out of the house. */
function Issued({ jobId }: { jobId: string }) {
  const revisions = useRevisions(jobId);
  const newest = revisions.data?.revisions[0];
  if (!newest) return <p className="text-text text-ink2">Nothing is issued yet. Issue the drawing to get its sheets as one PDF.</p>;
  return (
    <div className="flex flex-col items-start gap-2">
      <p className="text-text">Rev {newest.letter}, {newest.purpose}: {newest.state}</p>
      <a href={api.sheetsUrl(newest.id)} className={`${buttonClass("plain", "bar")} hover:bg-paper`}>Sheets of Rev {newest.letter} as PDF</a>
      <LinkButton href={paths.revision(jobId, newest.id)} size="bar" look="quiet">Open the review</LinkButton>
    </div>
  );
}
