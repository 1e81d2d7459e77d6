"use client";

import { useRouter } from "next/navigation";
import { useCallback, useMemo, useRef, useState, type UIEvent } from "react";
import type { JobLine, JobTab } from "@/lib/api";
import { useJobs } from "@/lib/client/jobsApi";
import { useMe } from "@/lib/client/queries";
import { useRegisterKeys } from "@/lib/client/useRegisterKeys";
import { useSettled } from "@/lib/client/useSettled";
import { LicenseLine } from "@/components/people/LicenseLine";
import { Button, LinkButton } from "@/components/ui/Button";
import { EmptyNote, ErrorNote, Skeleton } from "@/components/ui/Notes";
import { JobFilters } from "./JobFilters";
import { JobPreview } from "./JobPreview";
import { JobsTable } from "./JobsTable";
import { OfficeBar } from "./OfficeBar";
import { paths } from "./paths";
import { EVERYTHING, askedBy, unusual, useJobsChoice, type JobsChoice } from "./useJobsChoice";

const TABS: readonly { id: JobTab; label: string }[] = [
  { id: "all", label: "All" }, { id: "mine", label: "Waits for me" }, { id: "draft", label: "Draft" }, { id: "review", label: "In review" }, { id: "sealed", label: "Sealed" },
];
const NO_JOBS: readonly JobLine[] = [];

/** All jobs of the person, with the chosen one shown beside. */
export function JobsRegister() {
  const router = useRouter();
  const me = useMe();
  const [choice, setChoice] = useJobsChoice();
  const set = (part: Partial<JobsChoice>) => setChoice({ ...choice, ...part });
  const [chosenId, setChosenId] = useState<string | null>(null);
  const find = useRef<HTMLInputElement>(null);
  const jobs = useJobs(askedBy({ ...choice, q: useSettled(choice.q, 150) }));
  const [first] = jobs.data?.pages ?? [];
  const shown = useMemo(() => jobs.data?.pages.flatMap((page) => page.jobs) ?? NO_JOBS, [jobs.data]);
  const untouched = Object.keys(unusual({ ...choice, sort: "changed" })).length === 0;
  const chosen = shown.find((job) => job.id === chosenId) ?? shown[0] ?? null;
  const mayCreate = me.data?.companies.some((each) => each.may.createJobs) ?? false;
  const ids = useMemo(() => shown.map((job) => job.id), [shown]);
  const open = useCallback((id: string) => router.push(paths.job(id)), [router]);
  const make = useCallback(() => router.push(paths.newJob), [router]);
  useRegisterKeys({ ids, chosen: chosen?.id ?? null, onChoose: setChosenId, onOpen: open, onNew: mayCreate ? make : null, find });
  const more = () => { if (jobs.hasNextPage && !jobs.isFetchingNextPage) void jobs.fetchNextPage(); };
  const nearEnd = ({ currentTarget: { scrollTop, clientHeight, scrollHeight } }: UIEvent<HTMLElement>) => { if (scrollHeight - scrollTop - clientHeight < 400) more(); };

  return (
    <div className="flex h-full flex-col">
      <OfficeBar primary={mayCreate && <LinkButton href={paths.newJob} size="bar" look="primary">New job</LinkButton>}>
        <label className="flex w-[300px] items-center gap-2 border-l border-desk2 px-2.5 text-ink2 focus-within:bg-vellum">
          <svg viewBox="0 0 18 18" className="size-4 shrink-0" aria-hidden="true"><circle cx="7.5" cy="7.5" r="4.8" fill="none" stroke="currentColor" strokeWidth="1.7" /><path d="M11 11L15.5 15.5" stroke="currentColor" strokeWidth="1.7" /></svg>
          <span className="sr-only">Find job, permit or address</span>
          <input ref={find} value={choice.q} maxLength={120} onChange={(event) => set({ q: event.target.value })} placeholder="Find job, permit or address" className="min-w-0 flex-1 bg-transparent text-body text-ink outline-none placeholder:text-ink2" />
          <kbd className="font-sans border border-rule px-1 text-small stretch-label">Ctrl F</kbd>
        </label>
      </OfficeBar>
      <main className={`grid min-h-0 flex-1 gap-5 p-3 narrow:gap-4 phone:block phone:overflow-y-auto ${chosen ? "grid-cols-[minmax(0,1fr)_462px] narrow:grid-cols-[minmax(0,1fr)_300px]" : "grid-cols-1"}`}>
        <section className="flex min-h-0 flex-col bg-paper shadow-[0_0_0_1px_var(--rule),2px_3px_0_0_var(--hatch)]" aria-labelledby="jobs-heading">
          <div className="flex shrink-0 items-end gap-6 border-b-[1.5px] border-ink px-5 pt-4 narrow:gap-4">
            <h1 id="jobs-heading" className="pb-2.5 text-title font-heading stretch-heading tracking-[-0.015em]">Jobs</h1>
            <div role="group" aria-label="Show" className="-mb-[1.5px] flex min-w-0 items-end overflow-x-auto">
              {TABS.map((each) => (
                <button
                  key={each.id} type="button" aria-pressed={choice.tab === each.id} onClick={() => set({ tab: each.id })}
                  className={`-ml-px border border-b-0 border-ink px-3.5 text-text whitespace-nowrap first:ml-0 ${choice.tab === each.id ? "h-9 bg-paper font-heading" : "mb-[1.5px] h-[34px] bg-vellum text-ink2"}`}
                >
                  {each.label} <span className="ml-0.5 font-normal text-ink3">{first?.tabs[each.id] ?? ""}</span>
                </button>
              ))}
            </div>
          </div>
          <JobFilters choice={choice} onChange={set} jurisdictions={first?.jurisdictions ?? []} />
          <div className={`min-h-0 flex-1 overflow-auto ${jobs.isPlaceholderData ? "opacity-70" : ""}`} aria-busy={jobs.isFetching || undefined} onScroll={nearEnd}>
            {jobs.isPending && <Skeleton lines={6} />}
            {jobs.isError && <div className="p-5"><ErrorNote error={jobs.error} onRetry={() => void jobs.refetch()} /></div>}
            {first && shown.length === 0 && untouched && (
              <EmptyNote title="No jobs yet" action={mayCreate && <LinkButton href={paths.newJob} look="primary">New job</LinkButton>}>
                {mayCreate ? "A job is one site: its address, the code that was adopted there, the people, and one drawing from which everything else follows." : "You are not on a job yet. Its administrator puts you on it."}
              </EmptyNote>
            )}
            {first && shown.length === 0 && !untouched && <EmptyNote title="Nothing found" action={<Button size="bar" onClick={() => setChoice(EVERYTHING)}>Show all jobs</Button>}>No job here fits{choice.q.trim() && ` ${choice.q.trim()}`}. Words are looked for in number, name, address, parcel, owner, permit number and jurisdiction.</EmptyNote>}
            {shown.length > 0 && <JobsTable jobs={shown} chosenId={chosen?.id ?? null} onChoose={setChosenId} />}
            {jobs.hasNextPage && (
              <div className="flex items-center gap-3 px-5 py-3 text-body text-ink2">
                <Button size="bar" busy={jobs.isFetchingNextPage} onClick={more}>Show more</Button>
                {shown.length} of {first?.total}
              </div>
            )}
          </div>
          <LicenseLine className="shrink-0 border-t border-g1 px-5 py-2" />
          <p className="flex shrink-0 items-center gap-1.5 px-5 py-3 text-body text-ink2 phone:hidden" aria-hidden="true">
            {chosen && <><Key>↑</Key><Key>↓</Key> choose <Key>Enter</Key> open </>}
            {mayCreate && <><Key>N</Key> new job</>}
          </p>
        </section>
        {chosen && <JobPreview job={chosen} />}
      </main>
    </div>
  );
}

const Key = ({ children }: { children: string }) => <kbd className="font-sans border border-rule bg-vellum px-1.5 text-label font-strong [&:not(:first-child)]:ml-2">{children}</kbd>;
