"use client";

import Link from "next/link";
import { useState } from "react";
import type { JurisdictionAnswer } from "@/lib/api";
import { useJurisdictions, useMe } from "@/lib/client/queries";
import { editionName, nextAdoption } from "@/lib/code/adoption";
import { mayInCompany } from "@/lib/policy";
import { OfficeBar } from "@/components/jobs/OfficeBar";
import { Panel } from "@/components/jobs/Panel";
import { paths } from "@/components/jobs/paths";
import { Button } from "@/components/ui/Button";
import { TextField } from "@/components/ui/Field";
import { EmptyNote, ErrorNote, Skeleton } from "@/components/ui/Notes";
import { NewJurisdiction } from "./NewJurisdiction";

/** The authorities a company works under: its own, and those that every company knows. */
export function JurisdictionsPage() {
  const me = useMe();
  const list = useJurisdictions();
  const [words, setWords] = useState("");
  const [adding, setAdding] = useState(false);
  const companies = (me.data?.companies ?? []).filter((each) => mayInCompany(each.roles, "jurisdictions.edit"));
  const all = list.data?.jurisdictions ?? [];
  const wanted = words.trim().toLowerCase();
  const found = all.filter((each) => `${each.name} ${each.ordinance} ${each.edition} ${Object.values(each.amendments).map((one) => one.citation).join(" ")}`.toLowerCase().includes(wanted));
  const groups = [
    ...(me.data?.companies ?? []).map((company) => ({ title: company.name, rows: found.filter((each) => each.companyId === company.id), own: true })),
    { title: "Known to every company", rows: found.filter((each) => each.shared), own: false },
  ].filter(({ rows, own }) => rows.length > 0 || (own && wanted === ""));
  return (
    <div className="flex min-h-full flex-col">
      <OfficeBar primary={companies.length > 0 && <Button size="bar" look="primary" onClick={() => setAdding(true)}>New jurisdiction</Button>} />
      <main className="mx-auto w-full max-w-[1120px] p-6 phone:p-3">
        <h1 className="mb-1 text-[34px] leading-tight font-heading stretch-heading tracking-[-0.015em]">Jurisdictions</h1>
        <p className="mb-5 max-w-[72ch] text-text text-ink2">Who adopted which code, what was amended there, who has to sign and how the set is handed in. A change here changes no drawing: each job says that it may be taken over.</p>
        {all.length > 0 && <TextField label="Search" type="search" placeholder="Name, ordinance, edition" value={words} onChange={(event) => setWords(event.target.value)} className="mb-5 max-w-[420px]" />}
        {(list.isPending || me.isPending) && <div className="bg-paper"><Skeleton lines={4} height={60} /></div>}
        {list.isError && <ErrorNote error={list.error} onRetry={() => void list.refetch()} />}
        {list.data && me.data && found.length === 0 && wanted !== "" && <div className="bg-paper"><EmptyNote title="Nothing by these words">No jurisdiction has them in its name, ordinance or amendments.</EmptyNote></div>}
        <div className="grid gap-6">
          {list.data && me.data && groups.map(({ title, rows, own }) => (
            <Panel key={title} title={title} aside={<span className="text-label text-ink2">{rows.length === 0 ? "" : rows.length}</span>}>
              {rows.length === 0 && own ? (
                <EmptyNote title="None of your own yet" action={companies.length > 0 && <Button look="primary" onClick={() => setAdding(true)}>New jurisdiction</Button>}>Enter the office you hand in to, or copy one below and change the copy.</EmptyNote>
              ) : <Rows rows={rows} />}
            </Panel>
          ))}
        </div>
      </main>
      {companies.length > 0 && <NewJurisdiction open={adding} onOpenChange={setAdding} companies={companies} />}
    </div>
  );
}

function Rows({ rows }: { rows: readonly JurisdictionAnswer[] }) {
  const today = new Date().toISOString().slice(0, 10);
  return (
    <ul>
      {rows.map((row) => {
        const next = nextAdoption(row.editions, today);
        const amendments = Object.keys(row.amendments).length;
        return (
          <li key={row.id} className="border-b border-g2 last:border-b-0">
            <Link href={paths.jurisdiction(row.id)} className="grid min-h-[60px] grid-cols-[minmax(0,1.4fr)_minmax(0,1fr)_minmax(0,0.8fr)] items-center gap-4 px-5 py-2.5 hover:bg-vellum phone:grid-cols-1 phone:gap-1">
              <span className="min-w-0">
                <span className="block truncate text-finding font-finding">{row.name}</span>
                <span className="block truncate text-body text-ink2">{row.ordinance || "No ordinance"}</span>
              </span>
              <span className="min-w-0 text-text">{editionName(row.edition)}{next && <span className="block text-label text-ink2">{editionName(next.edition)} from {next.effectiveFrom}</span>}</span>
              <span className="text-body text-ink2">{amendments === 0 ? "No amendment" : `${amendments} ${amendments === 1 ? "amendment" : "amendments"}`}<span className="block text-label text-ink3">{row.signs === "licensed professional" ? "Seal of a licensee" : "Declaration accepted"}</span></span>
            </Link>
          </li>
        );
      })}
    </ul>
  );
}
