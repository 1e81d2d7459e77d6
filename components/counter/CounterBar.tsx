"use client";

import Link from "next/link";
import { PersonMenu } from "@/components/jobs/OfficeBar";
import { Brand } from "@/components/ui/Brand";
import { useMe } from "@/lib/client/queries";

/** The counter's quiet head: what this is, all permits, who is here. */
export function CounterBar({ place }: { place?: string | null }) {
  const { data } = useMe();
  return (
    <header className="flex h-[56px] items-center gap-4 border-b-[1.5px] border-ink px-6 phone:px-2">
      <Brand href="/counter" />
      <span className="text-finding text-ink2 phone:hidden">Permit counter{place ? `, ${place}` : ""}</span>
      <span className="flex-1" />
      <Link href="/counter" className="text-finding underline decoration-1 underline-offset-4 hover:decoration-2">All permits</Link>
      {data?.office && <Link href="/jobs" className="text-finding underline decoration-1 underline-offset-4 hover:decoration-2">Jobs</Link>}
      <PersonMenu />
    </header>
  );
}
