"use client";

import { useMutation, useQueryClient } from "@tanstack/react-query";
import Link from "next/link";
import { useRef, useState, type FormEvent, type KeyboardEvent } from "react";
import type { LibraryEntryAnswer } from "@/lib/api";
import { ApiProblem } from "@/lib/client/api";
import { filesKey, uploadFile, uploadRefusal } from "@/lib/client/filesApi";
import { useLibraryEntry } from "@/lib/client/libraryApi";
import { OfficeBar } from "@/components/jobs/OfficeBar";
import { paths } from "@/components/jobs/paths";
import { BarCell } from "@/components/ui/Bar";
import { Button } from "@/components/ui/Button";
import { Caution } from "@/components/ui/Caution";
import { LeaveDialog } from "@/components/ui/LeaveDialog";
import { ErrorNote, Refused, Skeleton } from "@/components/ui/Notes";
import { badField } from "./badField";
import { ConflictPanel } from "./ConflictPanel";
import { EntryFields } from "./EntryFields";
import { DatasheetsPanel, PicturesPanel, useEntryFiles } from "./EntryFiles";
import { EntryHead } from "./EntryHead";
import { SaveBar } from "./SaveBar";
import { UsedOnPanel } from "./UsedOnPanel";
import { VersionsPanel } from "./VersionsPanel";
import { sourceWithFile, withSource } from "./entryDraft";
import { useEntryForm } from "./useEntryForm";

/** One entry of the library. */
export function EntryPage({ entryId }: { entryId: string }) {
  const entry = useLibraryEntry(entryId);
  const missing = entry.error instanceof ApiProblem && entry.error.status === 404;
  return (
    <div className="flex min-h-full flex-col">
      <OfficeBar>{entry.data && <BarCell label="Library entry">{entry.data.name}</BarCell>}</OfficeBar>
      <main className="mx-auto w-full max-w-[1560px] p-6 narrow:p-4 phone:p-3">
        <p className="mb-2 text-body"><Link href={paths.library} className="border-b border-dotted border-ink3 text-ink2">Library</Link></p>
        {entry.isPending && <div className="bg-paper"><Skeleton lines={6} /></div>}
        {entry.isError && !entry.data && <ErrorNote error={entry.error} {...(missing ? { title: "There is no such entry" } : { onRetry: () => void entry.refetch() })} />}
        {entry.data && <EntryForm key={entry.data.id} entry={entry.data} />}
      </main>
    </div>
  );
}

function EntryForm({ entry }: { entry: LibraryEntryAnswer }) {
  const { edit } = entry.may;
  const form = useRef<HTMLFormElement>(null);
  const state = useEntryForm(entry);
  const files = useEntryFiles(entry);
  const upload = useRowUpload(entry.id, (name, file) => state.setDraft((now) => withSource(now, name, sourceWithFile(now.data.sources[name], file, files.datasheets.map((each) => each.name)))));
  const [wrong, setWrong] = useState<string | null>(null);
  const nameRefused = state.error instanceof ApiProblem && state.error.field === "name" ? state.error.fieldMessage : undefined;

  const submit = (event: FormEvent) => {
    event.preventDefault();
    const bad = badField(form.current);
    setWrong(bad ? "A value above could not be read. It is marked." : state.draft.name.trim() === "" ? "The entry has no name." : null);
    if (bad) bad.focus();
    else if (state.draft.name.trim() !== "") state.save();
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (!(event.ctrlKey || event.metaKey) || event.key.toLowerCase() !== "s") return;
    event.preventDefault();
    // A field takes over its text when it is left.
    if (document.activeElement instanceof HTMLElement) document.activeElement.blur();
    setTimeout(() => form.current?.requestSubmit());
  };
  return (
    <>
      <EntryHead entry={entry} />
      <div className="grid grid-cols-[minmax(0,1fr)_400px] items-start gap-5 narrow:grid-cols-[minmax(0,1fr)_312px] narrow:gap-4 phone:grid-cols-1">
        <div className="min-w-0">
          <form ref={form} onSubmit={submit} onKeyDown={onKeyDown} onInput={() => state.setTyping(true)} noValidate aria-label="Values" className="bg-paper shadow-[0_0_0_1px_var(--rule),2px_3px_0_0_var(--hatch)]">
            <EntryFields key={state.round} kind={entry.kind} draft={state.draft} onDraft={state.setDraft} nameError={nameRefused} readOnly={!edit} datasheets={files.datasheets} onUpload={edit ? upload.choose : null} />
            {upload.strip}
            {state.conflict && state.merge && <ConflictPanel merge={state.merge} version={state.conflict.version} theirs={state.sides} onSide={state.chooseSide} busy={state.busy} onSave={state.saveMerged} onGiveUp={state.takeBack} />}
            {edit && !state.conflict && (
              <SaveBar label="Save as a new version" busy={state.busy} changed={state.changed} note={state.note} onNote={state.setNote} onTakeBack={() => { setWrong(null); state.takeBack(); }}>
                {wrong && state.changed && <p role="alert" className="text-text font-strong text-red">{wrong}</p>}
                {!nameRefused && <Refused error={state.error} />}
                {!state.changed && state.savedVersion !== null && <p role="status" className="text-text text-ink2">Saved; version {state.savedVersion} is the one drawings take now. Those that hold an older one say so.</p>}
              </SaveBar>
            )}
          </form>
          <Caution compact className="mt-5" />
        </div>
        <div className="grid min-w-0 gap-5 narrow:gap-4">
          <DatasheetsPanel files={files} edit={edit} />
          <VersionsPanel entry={entry} onTakeUp={(version, data) => { state.setDraft((now) => ({ ...now, data })); state.setNote(`As in version ${version}`); window.scrollTo({ top: 0 }); }} />
          <UsedOnPanel entry={entry} />
          <PicturesPanel files={files} edit={edit} name={entry.name} />
        </div>
      </div>
      <LeaveDialog unsaved={edit && state.changed} what="What you typed on this entry is" />
    </>
  );
}

/** A datasheet chosen beside a value: kept with the entry, then named as that value's source. */
function useRowUpload(entryId: string, onStored: (name: string, file: { id: string; name: string }) => void) {
  const client = useQueryClient();
  const input = useRef<HTMLInputElement>(null);
  const row = useRef("");
  const send = useMutation({
    mutationFn: ({ file }: { name: string; file: File }) => uploadFile({ place: { entryId }, file, purpose: "datasheet" }),
    onSuccess: (stored, { name }) => onStored(name, stored),
    onSettled: () => client.invalidateQueries({ queryKey: [...filesKey({ entryId })] }),
  });
  const file = send.variables?.file;
  return {
    choose: (name: string) => { row.current = name; input.current?.click(); },
    strip: (
      <>
        <input ref={input} type="file" accept="application/pdf" className="sr-only" tabIndex={-1} aria-label="Datasheet for this value" onInput={(event) => event.stopPropagation()} onChange={(event) => { const chosen = event.target.files?.[0]; event.target.value = ""; if (chosen) send.mutate({ name: row.current, file: chosen }); }} />
        {send.isPending && <p role="status" className="border-t border-g1 px-6 py-2.5 text-text text-ink2">Sending {file?.name}</p>}
        {send.isError && (
          <div className="flex flex-wrap items-center gap-3 border-t border-g1 px-6 py-2.5">
            <p role="alert" className="text-text font-strong text-red">{send.error instanceof ApiProblem ? uploadRefusal(file?.name ?? "It", send.error) : "That did not work."}</p>
            <Button size="bar" onClick={() => send.variables && send.mutate(send.variables)}>Try again</Button>
            <Button size="bar" look="quiet" onClick={() => send.reset()}>Put away</Button>
          </div>
        )}
      </>
    ),
  };
}
