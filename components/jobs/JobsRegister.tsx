"use client";

import { useRouter } from "next/navigation";
import { useEffect, useMemo, useRef, useState } from "react";
import type { JobLine } from "@/lib/api";
import { useJobs, useMe } from "@/lib/client/queries";
import { LinkButton } from "@/components/ui/Button";
import { EmptyNote, ErrorNote, Skeleton } from "@/components/ui/Notes";
import { JobPreview } from "./JobPreview";
import { JobsTable } from "./JobsTable";
import { OfficeBar } from "./OfficeBar";
import { paths } from "./paths";

const TABS: readonly { id: string; label: string; holds: (job: JobLine) => boolean }[] = [
  { id: "all", label: "All", holds: () => true },
  { id: "mine", label: "Waits for me", holds: (job) => job.waitsFor?.mine ?? false },
  { id: "draft", label: "Draft", holds: (job) => job.state === "draft" || job.state === "returned" },
  { id: "review", label: "In review", holds: (job) => job.state === "in review" || job.state === "sealing" },
  { id: "sealed", label: "Sealed", holds: (job) => job.state === "sealed" || job.state === "void" },
];

const matches = (job: JobLine, words: string) =>
  words.toLowerCase().split(/\s+/).every((word) => `${job.number} ${job.name} ${job.addressLines} ${job.parcel} ${job.permitNumber} ${job.jurisdiction ?? ""}`.toLowerCase().includes(word));

/** All jobs of the person, with the chosen one shown beside. */
export function JobsRegister() {
  const jobs = useJobs();
  const me = useMe();
  const [tab, setTab] = useState("all");
  const [words, setWords] = useState("");
  const [chosenId, setChosenId] = useState<string | null>(null);
  const find = useRef<HTMLInputElement>(null);
  const all = useMemo(() => jobs.data?.jobs ?? [], [jobs.data]);
  const shown = useMemo(() => all.filter((job) => (TABS.find((each) => each.id === tab)?.holds(job) ?? true) && matches(job, words)), [all, tab, words]);
  const chosen = shown.find((job) => job.id === chosenId) ?? shown[0] ?? null;
  const mayCreate = me.data?.companies.some((each) => each.may.createJobs) ?? false;
  useRegisterKeys(shown, chosen, setChosenId, find, mayCreate);

  return (
    <div className="flex h-full flex-col">
      <OfficeBar primary={mayCreate && <LinkButton href={paths.newJob} size="bar" look="primary">New job</LinkButton>}>
        <label className="flex w-[300px] items-center gap-2 border-l border-desk2 px-2.5 text-ink2 focus-within:bg-vellum">
          <svg viewBox="0 0 18 18" className="size-4 shrink-0" aria-hidden="true"><circle cx="7.5" cy="7.5" r="4.8" fill="none" stroke="currentColor" strokeWidth="1.7" /><path d="M11 11L15.5 15.5" stroke="currentColor" strokeWidth="1.7" /></svg>
          <span className="sr-only">Find job, permit or address</span>
          <input ref={find} value={words} onChange={(event) => setWords(event.target.value)} placeholder="Find job, permit or address" className="min-w-0 flex-1 bg-transparent text-body text-ink outline-none placeholder:text-ink2" />
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
                  key={each.id} type="button" aria-pressed={tab === each.id} onClick={() => setTab(each.id)}
                  className={`-ml-px border border-b-0 border-ink px-3.5 text-text whitespace-nowrap first:ml-0 ${tab === each.id ? "h-9 bg-paper font-heading" : "mb-[1.5px] h-[34px] bg-vellum text-ink2"}`}
                >
                  {each.label} <span className="ml-0.5 font-normal text-ink3">{all.filter(each.holds).length}</span>
                </button>
              ))}
            </div>
          </div>
          <div className="min-h-0 flex-1 overflow-y-auto">
            {jobs.isPending && <Skeleton lines={6} />}
            {jobs.isError && <div className="p-5"><ErrorNote error={jobs.error} onRetry={() => void jobs.refetch()} /></div>}
            {jobs.data && all.length === 0 && (
              <EmptyNote title="No jobs yet" action={mayCreate && <LinkButton href={paths.newJob} look="primary">New job</LinkButton>}>
                {mayCreate ? "A job is one site: its address, the code that was adopted there, the people, and one drawing from which everything else follows." : "You are not on a job yet. Its administrator puts you on it."}
              </EmptyNote>
            )}
            {all.length > 0 && shown.length === 0 && <EmptyNote title="Nothing found">No job here fits. Clear what you typed, or look under All.</EmptyNote>}
            {shown.length > 0 && <JobsTable jobs={shown} chosenId={chosen?.id ?? null} onChoose={setChosenId} />}
          </div>
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

/** Arrows choose, Enter opens, N makes a job, Ctrl F finds; never while somebody types or a control has the focus. */
function useRegisterKeys(
  shown: readonly JobLine[], chosen: JobLine | null, choose: (id: string) => void, find: React.RefObject<HTMLInputElement | null>, mayCreate: boolean,
) {
  const router = useRouter();
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if ((event.ctrlKey || event.metaKey) && event.key.toLowerCase() === "f") {
        event.preventDefault();
        find.current?.focus();
        return;
      }
      if (event.ctrlKey || event.metaKey || event.altKey) return;
      const target = event.target as HTMLElement;
      const inFind = target === find.current;
      if (!inFind && target !== document.body) return;
      const at = shown.findIndex((job) => job.id === chosen?.id);
      const step = event.key === "ArrowDown" ? 1 : event.key === "ArrowUp" ? -1 : 0;
      const next = step === 0 ? undefined : shown[Math.min(shown.length - 1, Math.max(0, at + step))];
      if (next) {
        event.preventDefault();
        choose(next.id);
      } else if (event.key === "Enter" && chosen) router.push(paths.job(chosen.id));
      else if (event.key.toLowerCase() === "n" && !inFind && mayCreate) router.push(paths.newJob);
      else if (event.key === "Escape" && inFind) find.current?.blur();
    };
    window.addEventListener("keydown", onKey);
    return () => window.removeEventListener("keydown", onKey);
  }, [shown, chosen, choose, find, mayCreate, router]);
}
