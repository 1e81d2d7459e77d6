"use client";

import { useRouter, useSearchParams } from "next/navigation";
import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import type { CompanyAnswer, LibraryLine } from "@/lib/api";
import { useLibrary, type LibraryChoice } from "@/lib/client/libraryApi";
import { useMe } from "@/lib/client/queries";
import { useRegisterKeys } from "@/lib/client/useRegisterKeys";
import { useSettled } from "@/lib/client/useSettled";
import { isKindId } from "@/lib/equipment/registry";
import { mayInCompany } from "@/lib/policy";
import { OfficeBar } from "@/components/jobs/OfficeBar";
import { paths } from "@/components/jobs/paths";
import { Button, LinkButton } from "@/components/ui/Button";
import { EmptyNote, ErrorNote, Skeleton } from "@/components/ui/Notes";
import { KindOptions } from "./KindOptions";
import { LibraryTable } from "./LibraryTable";
import { kindTitle } from "./kinds";

const EVERYTHING: LibraryChoice = { q: "", kind: "", archived: false };
const NONE: readonly LibraryLine[] = [];

/** The company's equipment with the datasheet behind each rating. */
export function LibraryPage() {
  const me = useMe();
  const companies = me.data?.companies ?? [];
  const [companyId, setCompanyId] = useState<string | null>(null);
  const company = companies.find((each) => each.id === companyId) ?? companies[0];
  const [choice, setChoice] = useLibraryChoice();
  const find = useRef<HTMLInputElement>(null);
  const set = (part: Partial<LibraryChoice>) => setChoice({ ...choice, ...part });
  return (
    <div className="flex h-full flex-col">
      <OfficeBar primary={company && mayInCompany(company.roles, "library.edit") && <LinkButton href={paths.newEntry(choice.kind)} size="bar" look="primary">New entry</LinkButton>}>
        <label className="flex w-[300px] items-center gap-2 border-l border-desk2 px-2.5 text-ink2 focus-within:bg-vellum">
          <svg viewBox="0 0 18 18" className="size-4 shrink-0" aria-hidden="true"><circle cx="7.5" cy="7.5" r="4.8" fill="none" stroke="currentColor" strokeWidth="1.7" /><path d="M11 11L15.5 15.5" stroke="currentColor" strokeWidth="1.7" /></svg>
          <span className="sr-only">Find name, maker or model</span>
          <input ref={find} value={choice.q} maxLength={120} onChange={(event) => set({ q: event.target.value })} placeholder="Find name, maker or model" className="min-w-0 flex-1 bg-transparent text-body text-ink outline-none placeholder:text-ink2" />
          <kbd className="border border-rule px-1 font-sans text-small stretch-label">Ctrl F</kbd>
        </label>
      </OfficeBar>
      <main className="flex min-h-0 flex-1 flex-col p-3">
        {me.isPending && <div className="bg-paper"><Skeleton lines={12} height={36} /></div>}
        {me.isError && <ErrorNote error={me.error} onRetry={() => void me.refetch()} />}
        {me.data && !company && <div className="bg-paper"><EmptyNote title="No company yet">The library belongs to a company, and you are in none.</EmptyNote></div>}
        {company && <Register key={company.id} company={company} companies={companies} onCompany={setCompanyId} choice={choice} onChoice={setChoice} find={find} />}
      </main>
    </div>
  );
}

/** The choice, kept in the address so that coming back from an entry finds it again. */
function useLibraryChoice() {
  const search = useSearchParams();
  const kind = search.get("kind") ?? "";
  const [choice, setChoice] = useState<LibraryChoice>({ q: (search.get("q") ?? "").slice(0, 120), kind: isKindId(kind) ? kind : "", archived: search.get("archived") === "yes" });
  useEffect(() => {
    const given = new URLSearchParams({ ...(choice.q && { q: choice.q }), ...(choice.kind && { kind: choice.kind }), ...(choice.archived && { archived: "yes" }) }).toString();
    const address = given ? `${paths.library}?${given}` : paths.library;
    if (address !== window.location.pathname + window.location.search) window.history.replaceState(null, "", address);
  }, [choice]);
  return [choice, setChoice] as const;
}

interface RegisterProps {
  company: CompanyAnswer; companies: readonly CompanyAnswer[]; onCompany: (id: string) => void;
  choice: LibraryChoice; onChoice: (choice: LibraryChoice) => void; find: React.RefObject<HTMLInputElement | null>;
}

function Register({ company, companies, onCompany, choice, onChoice, find }: RegisterProps) {
  const router = useRouter();
  const q = useSettled(choice.q, 200);
  const library = useLibrary(company.id, { ...choice, q });
  const [chosenId, setChosenId] = useState<string | null>(null);
  const scroller = useRef<HTMLDivElement>(null);
  const entries = useMemo(() => library.data?.pages.flatMap((page) => page.entries) ?? NONE, [library.data]);
  const first = library.data?.pages[0];
  const edit = first?.may.edit ?? false;
  const chosen = entries.find((each) => each.id === chosenId) ?? entries[0] ?? null;
  const ids = useMemo(() => entries.map((each) => each.id), [entries]);
  const { hasNextPage, isFetchingNextPage, fetchNextPage } = library;
  const onEnd = useCallback(() => {
    if (hasNextPage && !isFetchingNextPage) void fetchNextPage();
  }, [hasNextPage, isFetchingNextPage, fetchNextPage]);
  const open = useCallback((id: string) => router.push(paths.libraryEntry(id)), [router]);
  const make = useCallback(() => router.push(paths.newEntry(choice.kind)), [router, choice.kind]);
  useRegisterKeys({ ids, chosen: chosen?.id ?? null, onChoose: setChosenId, onOpen: open, onNew: edit ? make : null, find });
  const narrowed = choice.q.trim() !== "" || choice.kind !== "" || choice.archived;
  const select = "h-bar-control border border-rule bg-paper px-2 text-body text-ink";

  return (
    <section className="flex min-h-0 flex-1 flex-col bg-paper shadow-[0_0_0_1px_var(--rule),2px_3px_0_0_var(--hatch)]" aria-labelledby="library-heading">
      <div className="flex shrink-0 flex-wrap items-center gap-x-4 gap-y-2 border-b-[1.5px] border-ink px-5 py-3">
        <h1 id="library-heading" className="text-title font-heading stretch-heading tracking-[-0.015em]">Library</h1>
        <p role="status" className="mr-auto text-text text-ink2">{first ? `${first.total.toLocaleString("en-US")} ${first.total === 1 ? "entry" : "entries"}` : ""}</p>
        {companies.length > 1 && (
          <select aria-label="Company" value={company.id} onChange={(event) => onCompany(event.target.value)} className={select}>
            {companies.map((each) => <option key={each.id} value={each.id}>{each.name}</option>)}
          </select>
        )}
        <select aria-label="Kind" value={choice.kind} onChange={(event) => onChoice({ ...choice, kind: event.target.value })} className={`${select} w-[210px]`}>
          <option value="">Every kind</option>
          <KindOptions />
        </select>
        <label className="flex h-bar-control items-center gap-2 text-body">
          <input type="checkbox" checked={choice.archived} onChange={(event) => onChoice({ ...choice, archived: event.target.checked })} className="size-4 accent-[var(--ink)]" />
          Archived
        </label>
        {edit && <LinkButton href={paths.importEntries(choice.kind)} size="bar">Import a table</LinkButton>}
      </div>
      <div ref={scroller} className="min-h-0 flex-1 overflow-y-auto" aria-busy={library.isFetching || undefined}>
        {library.isPending && <Skeleton lines={16} height={36} />}
        {library.isError && <div className="p-5"><ErrorNote error={library.error} onRetry={() => void library.refetch()} /></div>}
        {first && entries.length === 0 && (narrowed
          ? <EmptyNote title="Nothing found" action={<Button size="bar" onClick={() => onChoice(EVERYTHING)}>Show everything</Button>}>{nothingWords(choice)}</EmptyNote>
          : <EmptyNote title="The library is empty" action={edit && <><LinkButton href={paths.newEntry()} look="primary">New entry</LinkButton><LinkButton href={paths.importEntries()}>Import a table</LinkButton></>}>What your company installs, with its ratings and the datasheet page behind each. A drawing takes them from here.</EmptyNote>)}
        {entries.length > 0 && <LibraryTable entries={entries} total={first?.total ?? entries.length} chosenId={chosen?.id ?? null} onChoose={setChosenId} scroller={scroller} onEnd={onEnd} />}
      </div>
      <p className="flex shrink-0 items-center gap-1.5 border-t border-g1 px-5 py-2.5 text-body text-ink2 phone:hidden" aria-hidden="true">
        {chosen && <><Key>↑</Key><Key>↓</Key> choose <Key>Enter</Key> open </>}
        {edit && <><Key>N</Key> new entry</>}
        <span className="ml-auto">Starter entries hold invented example values. Replace each from the product&apos;s datasheet before a drawing rests on it.</span>
      </p>
    </section>
  );
}

const nothingWords = ({ q, kind, archived }: LibraryChoice): string =>
  `${archived ? "No archived entry" : "No entry"}${kind ? ` of ${kindTitle(kind).toLowerCase()}` : ""} fits${q.trim() ? ` ${q.trim()}` : ""}. Words are looked for in names, makers, models and kinds.`;

const Key = ({ children }: { children: string }) => <kbd className="border border-rule bg-vellum px-1.5 font-sans text-label font-strong [&:not(:first-child)]:ml-2">{children}</kbd>;
