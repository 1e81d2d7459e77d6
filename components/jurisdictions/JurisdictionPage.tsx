"use client";

import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import type { JurisdictionDetail } from "@/lib/api";
import { ApiProblem } from "@/lib/client/api";
import { whenInSentence } from "@/lib/client/dates";
import { jurisdictionsApi, useJurisdiction } from "@/lib/client/jurisdictionsApi";
import { keys, useChange } from "@/lib/client/queries";
import { OfficeBar } from "@/components/jobs/OfficeBar";
import { paths } from "@/components/jobs/paths";
import { BarCell } from "@/components/ui/Bar";
import { Button } from "@/components/ui/Button";
import { Caution } from "@/components/ui/Caution";
import { Dialog } from "@/components/ui/Dialog";
import { ErrorNote, Refused, Skeleton } from "@/components/ui/Notes";
import { JurisdictionForm } from "./JurisdictionForm";

/** One authority having jurisdiction. */
export function JurisdictionPage({ jurisdictionId }: { jurisdictionId: string }) {
  const jurisdiction = useJurisdiction(jurisdictionId);
  // A new number makes a new form: what was typed on an older state is given up on purpose.
  const [round, setRound] = useState(0);
  const missing = jurisdiction.error instanceof ApiProblem && jurisdiction.error.status === 404;
  return (
    <div className="flex min-h-full flex-col">
      <OfficeBar>{jurisdiction.data && <BarCell label="Jurisdiction">{jurisdiction.data.name}</BarCell>}</OfficeBar>
      <main className="mx-auto w-full max-w-[1120px] p-6 phone:p-3">
        <p className="mb-2 text-body"><Link href={paths.jurisdictions} className="border-b border-dotted border-ink3 text-ink2">Jurisdictions</Link></p>
        {jurisdiction.isPending && <div className="bg-paper"><Skeleton lines={6} /></div>}
        {jurisdiction.isError && <ErrorNote error={jurisdiction.error} {...(missing ? { title: "There is no such jurisdiction" } : { onRetry: () => void jurisdiction.refetch() })} />}
        {jurisdiction.data && (
          <>
            <Head jurisdiction={jurisdiction.data} />
            <JurisdictionForm key={round} jurisdiction={jurisdiction.data} onReload={() => void jurisdiction.refetch().then(() => setRound(round + 1))} />
            <Caution compact className="mt-5" />
          </>
        )}
      </main>
    </div>
  );
}

function Head({ jurisdiction }: { jurisdiction: JurisdictionDetail }) {
  const router = useRouter();
  const copy = useChange((companyId: string) => jurisdictionsApi.make({ companyId, copyOf: jurisdiction.id }), [keys.jurisdictions]);
  const [deleting, setDeleting] = useState(false);
  const remove = useChange(() => jurisdictionsApi.remove(jurisdiction.id), []);
  const { copyTo, edit } = jurisdiction.may;
  const copyFor = async (companyId: string) => {
    const made = await copy.mutateAsync(companyId).catch(() => null);
    if (made) router.push(paths.jurisdiction(made.id));
  };
  return (
    <div className="mb-5 flex flex-wrap items-end justify-between gap-4">
      <div className="min-w-0">
        <h1 className="text-[34px] leading-tight font-heading stretch-heading tracking-[-0.015em] narrow:text-title">{jurisdiction.name}</h1>
        <p className="mt-1 text-text text-ink2">
          {jurisdiction.shared ? "Known to every company; to read." : `Version ${jurisdiction.version}, changed ${whenInSentence(jurisdiction.changedAt)}${jurisdiction.changedBy ? ` by ${jurisdiction.changedBy}` : ""}.`}
          {" "}{jurisdiction.jobs === 0 ? "No job uses it yet." : `${jurisdiction.jobs} ${jurisdiction.jobs === 1 ? "job uses" : "jobs use"} it.`}
        </p>
        <Refused error={copy.error} />
      </div>
      <div className="flex flex-wrap gap-2">
        {copyTo.map((company) => (
          <Button key={company.id} look="primary" busy={copy.isPending} onClick={() => void copyFor(company.id)}>{copyTo.length === 1 ? "Copy to your company" : `Copy to ${company.name}`}</Button>
        ))}
        {edit && <Button onClick={() => setDeleting(true)}>Delete</Button>}
      </div>
      <Dialog open={deleting} onOpenChange={setDeleting} title={`Delete ${jurisdiction.name}`} description="It is gone from the list for good. While a job uses it, it stays.">
        <Refused error={remove.error} />
        <div className="mt-4 flex gap-2">
          <Button look="primary" busy={remove.isPending} onClick={() => remove.mutate(undefined, { onSuccess: () => router.push(paths.jurisdictions) })}>Delete it</Button>
          <Button onClick={() => setDeleting(false)}>Keep it</Button>
        </div>
      </Dialog>
    </div>
  );
}
