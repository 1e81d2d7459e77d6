"use client";

import Link from "next/link";
import { useRouter, useSearchParams } from "next/navigation";
import { useRef, useState, type FormEvent } from "react";
import { ApiProblem } from "@/lib/client/api";
import { useAddEntry } from "@/lib/client/libraryApi";
import { useMe } from "@/lib/client/queries";
import { isKindId, kindDefinition, type KindId } from "@/lib/equipment/registry";
import { mayInCompany } from "@/lib/policy";
import { PartIcon } from "@/components/diagram/chrome/partIcon";
import { OfficeBar } from "@/components/jobs/OfficeBar";
import { paths } from "@/components/jobs/paths";
import { EmptyNote, ErrorNote, Refused, Skeleton } from "@/components/ui/Notes";
import { LeaveDialog } from "@/components/ui/LeaveDialog";
import { SelectField } from "@/components/ui/Field";
import { EntryFields } from "./EntryFields";
import { SaveBar } from "./SaveBar";
import { emptyDraft, kept, sameDraft } from "./entryDraft";
import { KIND_GROUPS, groupTitle } from "./kinds";
import { badField } from "./badField";

/** A new entry: first its kind, then what is known of it. */
export function NewEntryPage() {
  const me = useMe();
  const given = useSearchParams().get("kind") ?? "";
  const companies = me.data?.companies.filter((each) => mayInCompany(each.roles, "library.edit")) ?? [];
  const [companyId, setCompanyId] = useState<string | null>(null);
  const company = companies.find((each) => each.id === companyId) ?? companies[0];
  const kind = isKindId(given) ? given : null;
  return (
    <div className="flex min-h-full flex-col">
      <OfficeBar />
      <main className="mx-auto w-full max-w-[1180px] p-6 phone:p-3">
        <p className="mb-2 text-body"><Link href={paths.library} className="border-b border-dotted border-ink3 text-ink2">Library</Link></p>
        <h1 className="mb-4 text-[34px] leading-tight font-heading stretch-heading tracking-[-0.015em] narrow:text-title">{kind ? `New ${kindDefinition(kind).title.toLowerCase()}` : "New entry"}</h1>
        {me.isPending && <div className="bg-paper"><Skeleton lines={6} /></div>}
        {me.isError && <ErrorNote error={me.error} onRetry={() => void me.refetch()} />}
        {me.data && !company && <div className="bg-paper"><EmptyNote title="For designers and administrators">They keep the library of a company; everybody else of the office reads it.</EmptyNote></div>}
        {company && companies.length > 1 && <SelectField label="Company" className="mb-4 max-w-[320px]" value={company.id} onChange={(event) => setCompanyId(event.target.value)}>{companies.map((each) => <option key={each.id} value={each.id}>{each.name}</option>)}</SelectField>}
        {company && (kind ? <NewEntryForm key={kind} kind={kind} companyId={company.id} /> : <Kinds />)}
      </main>
    </div>
  );
}

/** Which kind it is of, by its symbol, as in the parts rail. */
function Kinds() {
  return (
    <div className="bg-paper px-6 pt-2 pb-6 shadow-[0_0_0_1px_var(--rule),2px_3px_0_0_var(--hatch)]">
      {KIND_GROUPS.map(({ group, kinds }) => (
        <section key={group}>
          <h2 className="mt-5 mb-2 border-b border-ink pb-1 text-finding font-heading">{groupTitle(group)}</h2>
          <ul className="grid grid-cols-4 gap-2 narrow:grid-cols-3 phone:grid-cols-1">
            {kinds.map(({ id, title }) => (
              <li key={id}><Link href={paths.newEntry(id)} className="flex h-target items-center gap-3 border border-rule px-3 text-text font-strong hover:border-ink hover:bg-vellum"><span className="w-[66px] shrink-0"><PartIcon part={id} /></span>{title}</Link></li>
            ))}
          </ul>
        </section>
      ))}
    </div>
  );
}

function NewEntryForm({ kind, companyId }: { kind: KindId; companyId: string }) {
  const router = useRouter();
  const add = useAddEntry(companyId);
  const form = useRef<HTMLFormElement>(null);
  const [draft, setDraft] = useState(() => emptyDraft(kind));
  const [note, setNote] = useState("");
  const [typing, setTyping] = useState(false);
  const [nameError, setNameError] = useState<string>();
  const [bad, setBad] = useState(false);
  const changed = typing || !sameDraft(draft, emptyDraft(kind));

  const submit = (event: FormEvent) => {
    event.preventDefault();
    setNameError(draft.name.trim() ? undefined : "is missing");
    const wrong = badField(form.current);
    setBad(wrong !== null);
    wrong?.focus();
    if (!draft.name.trim() || wrong) return;
    add.mutate({ kind, name: draft.name.trim(), data: kept(kindDefinition(kind), draft.data), note: note.trim() }, {
      onSuccess: ({ id }) => router.replace(paths.libraryEntry(id)),
      onError: (error) => { if (error instanceof ApiProblem && error.field === "name") setNameError(error.fieldMessage); },
    });
  };
  const elsewhere = add.error instanceof ApiProblem && add.error.field === "name" ? null : add.error;
  return (
    <form ref={form} onSubmit={submit} onInput={() => setTyping(true)} noValidate className="bg-paper shadow-[0_0_0_1px_var(--rule),2px_3px_0_0_var(--hatch)]">
      <p className="border-b border-g1 px-6 py-4 text-text text-ink2 phone:px-4">Only what the datasheet says. What you leave open is <em>not known</em>: a drawing that needs it asks for it, and never takes it for granted. Datasheets and pictures are added once the entry is kept.</p>
      <EntryFields kind={kind} draft={draft} onDraft={setDraft} nameError={nameError} readOnly={false} datasheets={[]} onUpload={null} />
      <SaveBar label="Keep the entry" busy={add.isPending} changed={changed} note={note} onNote={setNote}>
        {bad && <p role="alert" className="text-text font-strong text-red">A value above could not be read. It is marked.</p>}
        <Refused error={elsewhere} />
      </SaveBar>
      <LeaveDialog unsaved={changed && !add.isSuccess} what="This entry is" />
    </form>
  );
}
