"use client";

import { useDeferredValue, useState } from "react";
import type { CompanyAnswer } from "@/lib/api";
import { useMe } from "@/lib/client/queries";
import { EVERYTHING, recordsTableUrl, useRecords, type RecordsChoice } from "@/lib/client/recordsApi";
import { useSettled } from "@/lib/client/useSettled";
import { OfficeBar } from "@/components/jobs/OfficeBar";
import { Button, buttonClass } from "@/components/ui/Button";
import { EmptyNote, ErrorNote, Skeleton } from "@/components/ui/Notes";
import { RecordDetail } from "./RecordDetail";
import { RecordFilters } from "./RecordFilters";
import { RecordsTable } from "./RecordsTable";

/** Who did what, when and from where: a register that is only added to. For administrators. */
export function RecordsPage() {
  const me = useMe();
  const companies = me.data?.companies.filter((each) => each.may.records) ?? [];
  const [chosenId, setChosenId] = useState<string | null>(null);
  const company = companies.find((each) => each.id === chosenId) ?? companies[0];
  return (
    <div className="flex h-full flex-col">
      <OfficeBar />
      {me.isPending && <div className="m-3 bg-paper"><Skeleton lines={8} height={40} /></div>}
      {me.isError && <div className="m-3"><ErrorNote error={me.error} onRetry={() => void me.refetch()} /></div>}
      {me.data && !company && <div className="m-3 bg-paper"><EmptyNote title="For administrators">The records of a company are open to its administrators.</EmptyNote></div>}
      {company && <Register key={company.id} company={company} companies={companies} onCompany={setChosenId} />}
    </div>
  );
}

function Register({ company, companies, onCompany }: { company: CompanyAnswer; companies: readonly CompanyAnswer[]; onCompany: (id: string) => void }) {
  const [choice, setChoice] = useState<RecordsChoice>(EVERYTHING);
  const [chosenId, setChosenId] = useState<string | null>(null);
  const asked = useSettled(choice, 250);
  const records = useRecords(company.id, asked);
  const pages = useDeferredValue(records.data?.pages);
  const lines = pages?.flatMap((page) => page.records) ?? [];
  const chosen = lines.find((each) => each.id === chosenId) ?? lines[0] ?? null;
  const narrowed = JSON.stringify(asked) !== JSON.stringify(EVERYTHING);
  return (
    <main className={`grid min-h-0 flex-1 gap-5 p-3 narrow:gap-4 phone:block phone:overflow-y-auto ${chosen ? "grid-cols-[minmax(0,1fr)_430px] narrow:grid-cols-[minmax(0,1fr)_330px]" : "grid-cols-1"}`}>
      <section className="flex min-h-0 flex-col bg-paper shadow-[0_0_0_1px_var(--rule),2px_3px_0_0_var(--hatch)]" aria-labelledby="records-heading">
        <div className="flex shrink-0 items-baseline gap-4 px-5 pt-4 pb-3">
          <h1 id="records-heading" className="text-title font-heading stretch-heading tracking-[-0.015em]">Records</h1>
          <p className="min-w-0 flex-1 truncate text-text text-ink2">Who did what at {company.name}. Entries are only added, never changed.</p>
          {companies.length > 1 && (
            <label className="text-body text-ink2">
              Company{" "}
              <select value={company.id} onChange={(event) => onCompany(event.target.value)} className="h-bar-control border border-rule bg-paper px-2 text-body text-ink">
                {companies.map((each) => <option key={each.id} value={each.id}>{each.name}</option>)}
              </select>
            </label>
          )}
          {narrowed && <Button size="bar" look="quiet" onClick={() => setChoice(EVERYTHING)}>Show everything</Button>}
          <a href={recordsTableUrl(company.id, asked)} download className={`${buttonClass("plain", "bar")} hover:bg-paper`} title="What is filtered here, newest first, at most 100,000 entries">Download CSV</a>
        </div>
        <RecordFilters choice={choice} onChange={setChoice} people={pages?.[0]?.people ?? []} />
        <div className="min-h-0 flex-1 overflow-y-auto" aria-busy={records.isFetching || undefined}>
          {records.isPending && <Skeleton lines={12} height={32} />}
          {records.isError && <div className="p-5"><ErrorNote error={records.error} onRetry={() => void records.refetch()} /></div>}
          {records.data && lines.length === 0 && (narrowed
            ? <EmptyNote title="Nothing found" action={<Button size="bar" onClick={() => setChoice(EVERYTHING)}>Show everything</Button>}>No entry fits all of what you chose. Words are looked for in names, mail addresses, jobs, actions and details.</EmptyNote>
            : <EmptyNote title="Nothing recorded yet">Each change of a job, a drawing, the library, people and licenses will stand here.</EmptyNote>)}
          {lines.length > 0 && <RecordsTable lines={lines} chosenId={chosen?.id ?? null} onChoose={setChosenId} />}
          {records.hasNextPage && (
            <div className="px-5 py-3"><Button size="bar" busy={records.isFetchingNextPage} onClick={() => void records.fetchNextPage()}>Show older entries</Button></div>
          )}
        </div>
      </section>
      {chosen && <RecordDetail line={chosen} />}
    </main>
  );
}
