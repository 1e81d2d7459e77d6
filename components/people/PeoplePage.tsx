"use client";

import { useMe } from "@/lib/client/queries";
import { OfficeBar } from "@/components/jobs/OfficeBar";
import { EmptyNote, ErrorNote, Skeleton } from "@/components/ui/Notes";
import { CompanyPeople } from "./CompanyPeople";
import { CompanySettings } from "./CompanySettings";

/** The people of the person's companies, and the companies' settings for who may change them. */
export function PeoplePage() {
  const me = useMe();
  return (
    <div className="flex min-h-full flex-col">
      <OfficeBar />
      <main className="mx-auto w-full max-w-[980px] p-6 phone:p-3">
        <h1 className="mb-1 text-[34px] leading-tight font-heading stretch-heading tracking-[-0.015em]">People</h1>
        <p className="mb-5 max-w-[62ch] text-text text-ink2">Who belongs to the company. Seeing a job takes a place on that job; administrators see all of them. Licensees, clerks and installers from outside are added on the job alone.</p>
        {me.isPending && <div className="bg-paper"><Skeleton lines={3} height={60} /></div>}
        {me.isError && <ErrorNote error={me.error} onRetry={() => void me.refetch()} />}
        {me.data?.companies.length === 0 && <EmptyNote title="You belong to no company here">You see the jobs that you were added to.</EmptyNote>}
        <div className="grid gap-6">
          {me.data?.companies.map((company) => (
            <div key={company.id} className="grid gap-6">
              <CompanyPeople company={company} self={me.data.id} />
              {company.may.settings && <CompanySettings company={company} />}
            </div>
          ))}
        </div>
      </main>
    </div>
  );
}
