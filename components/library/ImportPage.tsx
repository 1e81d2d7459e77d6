"use client";

import Link from "next/link";
import { useRouter, useSearchParams } from "next/navigation";
import { useRef, useState, type DragEvent } from "react";
import { IMPORT_BYTES } from "@/lib/api";
import { ApiProblem } from "@/lib/client/api";
import { sizeWords } from "@/lib/client/dates";
import { libraryApi, libraryKeys, tableUrl } from "@/lib/client/libraryApi";
import { useChange, useMe } from "@/lib/client/queries";
import { isKindId } from "@/lib/equipment/registry";
import { mayInCompany } from "@/lib/policy";
import { OfficeBar } from "@/components/jobs/OfficeBar";
import { paths } from "@/components/jobs/paths";
import { Button, LinkButton, buttonClass } from "@/components/ui/Button";
import { SelectField } from "@/components/ui/Field";
import { EmptyNote, ErrorNote, Refused, Skeleton } from "@/components/ui/Notes";
import { GoodRows, ImportPreviewTable } from "./ImportPreviewTable";
import { KindOptions } from "./KindOptions";
import { kindTitle } from "./kinds";

/** Takes in many entries of one kind from a table; nothing is written before its preview is confirmed. */
export function ImportPage() {
  const me = useMe();
  const router = useRouter();
  const given = useSearchParams().get("kind") ?? "";
  const kind = isKindId(given) ? given : null;
  const companies = me.data?.companies.filter((each) => mayInCompany(each.roles, "library.edit")) ?? [];
  const [companyId, setCompanyId] = useState<string | null>(null);
  const company = companies.find((each) => each.id === companyId) ?? companies[0];
  return (
    <div className="flex min-h-full flex-col">
      <OfficeBar />
      <main className="mx-auto w-full max-w-[1180px] p-6 phone:p-3">
        <p className="mb-2 text-body"><Link href={paths.library} className="border-b border-dotted border-ink3 text-ink2">Library</Link></p>
        <h1 className="mb-4 text-[34px] leading-tight font-heading stretch-heading tracking-[-0.015em] narrow:text-title">Import a table</h1>
        {me.isPending && <div className="bg-paper"><Skeleton lines={4} /></div>}
        {me.isError && <ErrorNote error={me.error} onRetry={() => void me.refetch()} />}
        {me.data && !company && <div className="bg-paper"><EmptyNote title="For designers and administrators">They keep the library of a company; everybody else of the office reads it.</EmptyNote></div>}
        {company && (
          <div className="bg-paper shadow-[0_0_0_1px_var(--rule),2px_3px_0_0_var(--hatch)]">
            <Step number={1} title="Which kind, in which table" text="A table holds one kind of equipment, one entry a row. Its columns are the kind's properties, each rated one with its datasheet and page.">
              <div className="flex flex-wrap items-end gap-3">
                {companies.length > 1 && <SelectField label="Company" className="w-[220px]" value={company.id} onChange={(event) => setCompanyId(event.target.value)}>{companies.map((each) => <option key={each.id} value={each.id}>{each.name}</option>)}</SelectField>}
                <SelectField label="Kind" className="w-[260px]" value={kind ?? ""} onChange={(event) => router.replace(paths.importEntries(event.target.value))}>
                  <option value="">Choose a kind</option>
                  <KindOptions />
                </SelectField>
                {kind && <a href={tableUrl(company.id, kind, false)} download className={`${buttonClass()} hover:bg-paper`}>Download an empty table</a>}
                {kind && <a href={tableUrl(company.id, kind, true)} download className={`${buttonClass()} hover:bg-paper`}>Download with your entries</a>}
              </div>
            </Step>
            {kind ? <Table key={`${company.id} ${kind}`} companyId={company.id} kind={kind} /> : <p className="px-6 py-5 text-text text-ink2">Choose the kind first.</p>}
          </div>
        )}
      </main>
    </div>
  );
}

function Step({ number, title, text, children }: { number: number; title: string; text: string; children: React.ReactNode }) {
  return (
    <section className="border-b border-g1 px-6 py-5 last:border-b-0 phone:px-4" aria-label={title}>
      <h2 className="text-finding font-heading"><span className="mr-2 inline-grid size-6 place-items-center border border-ink text-body">{number}</span>{title}</h2>
      <p className="mt-1 mb-3 max-w-[80ch] text-text text-ink2">{text}</p>
      {children}
    </section>
  );
}

const tooLarge = (file: File): string | null => (file.size > IMPORT_BYTES ? `${file.name} is larger than ${sizeWords(IMPORT_BYTES)}, the most that is taken.` : file.size === 0 ? `${file.name} is empty.` : null);

/** The table on its way: chosen, looked at, and only then taken in. */
function Table({ companyId, kind }: { companyId: string; kind: string }) {
  const input = useRef<HTMLInputElement>(null);
  const [file, setFile] = useState<File | null>(null);
  const [over, setOver] = useState(false);
  const preview = useChange((given: File) => libraryApi.previewImport(companyId, kind, given), []);
  const confirm = useChange(({ given, digest }: { given: File; digest: string }) => libraryApi.confirmImport(companyId, kind, given, digest), [libraryKeys.list]);
  const unusable = file ? tooLarge(file) : null;
  const take = (chosen: File | undefined) => {
    if (!chosen) return;
    setFile(chosen);
    confirm.reset();
    preview.reset();
    if (!tooLarge(chosen)) preview.mutate(chosen);
  };
  const drag = (event: DragEvent, inside: boolean) => {
    if (!event.dataTransfer.types.includes("Files")) return;
    event.preventDefault();
    setOver(inside);
  };
  const outdated = confirm.error instanceof ApiProblem && confirm.error.code === "import-changed";
  return (
    <>
      <Step number={2} title="The filled table" text="As comma-separated values (CSV), as any spreadsheet saves it. The first row holds the headings. An empty cell is a value that is not known.">
        <div
          onDragEnter={(event) => drag(event, true)} onDragOver={(event) => drag(event, true)} onDragLeave={() => setOver(false)}
          onDrop={(event) => { drag(event, false); take(event.dataTransfer.files[0]); }}
          className={`flex flex-wrap items-center gap-x-4 gap-y-2 border border-dashed px-4 py-4 transition-colors duration-quick ${over ? "border-copper bg-tint" : "border-rule bg-vellum"}`}
        >
          <input ref={input} type="file" accept=".csv,text/csv" aria-label="Table" className="sr-only" tabIndex={-1} onChange={(event) => { take(event.target.files?.[0]); event.target.value = ""; }} />
          <Button onClick={() => input.current?.click()}>{file ? "Choose another table" : "Choose a table"}</Button>
          <p className="min-w-0 flex-1 basis-48 text-text text-ink2">{over ? "Let go to look at it." : file ? <><span className="font-strong text-ink">{file.name}</span>, {sizeWords(file.size)}</> : `Or drop it here. Up to ${sizeWords(IMPORT_BYTES)} and 2,000 rows.`}</p>
        </div>
        {unusable && <p role="alert" className="mt-3 text-text font-strong text-red">{unusable}</p>}
        {preview.isPending && <p role="status" className="mt-3 text-text text-ink2">Looking at every cell</p>}
        {preview.isError && <div className="mt-3"><ErrorNote title="The table cannot be used" error={preview.error} {...(file ? { onRetry: () => preview.mutate(file) } : {})} /></div>}
      </Step>
      {file && preview.data && !confirm.data && (
        <Step number={3} title="What it would do" text="Nothing has been written yet.">
          <ImportPreviewTable preview={preview.data} busy={confirm.isPending} blocked={outdated} onConfirm={() => confirm.mutate({ given: file, digest: preview.data.digest })} />
          <div className="mt-3 flex flex-wrap items-center gap-3 empty:hidden">
            <Refused error={confirm.error} />
            {outdated && <Button onClick={() => take(file)}>Look at the preview again</Button>}
          </div>
        </Step>
      )}
      {confirm.data && preview.data && (
        <Step number={3} title="Taken in" text={`${kindTitle(kind)}, from ${file?.name ?? "the table"}.`}>
          <p role="status" className="text-finding font-strong">{resultWords(confirm.data)}</p>
          {preview.data.faults.length > 0 && <p className="mt-1 text-text text-ink2">{preview.data.total - preview.data.good.length === 1 ? "One row was left out. Mend it" : `${preview.data.total - preview.data.good.length} rows were left out. Mend them`} in the table and drop it again: what is the same already stays as it is.</p>}
          <div className="mt-4"><GoodRows preview={preview.data} done /></div>
          <div className="mt-4 flex flex-wrap gap-2">
            <LinkButton href={`${paths.library}?kind=${kind}`} look="primary">See them in the library</LinkButton>
            <Button onClick={() => { setFile(null); confirm.reset(); preview.reset(); }}>Import more</Button>
          </div>
        </Step>
      )}
    </>
  );
}

const entries = (count: number): string => `${count.toLocaleString("en-US")} ${count === 1 ? "entry" : "entries"}`;
/** "180 entries added, 12 entries have a new version, 3 entries were the same." */
const resultWords = ({ added, changed, same }: { added: number; changed: number; same: number }): string =>
  `${[`${entries(added)} added`, changed > 0 && `${entries(changed)} with a new version`, same > 0 && `${entries(same)} the same as before`].filter(Boolean).join(", ")}.`;
