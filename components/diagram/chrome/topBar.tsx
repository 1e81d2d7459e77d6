"use client";
import Link from "next/link";
import type { ReactNode } from "react";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { useCanvasView } from "@/components/diagram/canvas/view";
import { saveWords } from "@/lib/client/saveState";
import { QUIET } from "./controls";
import { FerruleMark, Icon, type IconName } from "./icons";

export interface BarFacts { readonly jobId: string; readonly jobNumber: string; readonly jobName: string; readonly sheetNumber: string; readonly sheetTitle: string; readonly revisionLetter: string }

function Cell({ top, children, tone = "" }: { top: string; children: ReactNode; tone?: string }) {
  return (
    <div className={`flex min-w-0 flex-col justify-center whitespace-nowrap border-l border-desk2 pl-2.5 pr-3.5 leading-tight ${tone}`}>
      <span className="text-small text-ink2 stretch-label">{top}</span>
      <span className="overflow-hidden text-ellipsis text-text font-medium">{children}</span>
    </div>
  );
}

function SaveCell({ letter }: { letter: string }) {
  const save = useEditor((editor) => editor.save);
  const readOnly = useEditor((editor) => editor.readOnly);
  const empty = useEditor((editor) => Object.keys(editor.drawing.equipment).length === 0);
  const icon: IconName | null = readOnly ? "lock" : save.kind === "offline" ? "offline" : save.kind === "failed" || save.kind === "conflict" ? "warn" : null;
  const top = readOnly ? `Draft of Rev ${letter}` : save.kind === "offline" ? `Offline since ${new Date(save.since).toLocaleTimeString("en-US", { hour: "numeric", minute: "2-digit" })}` : save.kind === "failed" ? "Not saved" : `Draft of Rev ${letter}`;
  return (
    <Cell top={top} tone={save.kind === "failed" && !readOnly ? "text-red" : ""}>
      <span className="inline-flex items-center gap-1.5" role="status" aria-label="Save state" data-testid="save-state">{icon && <Icon name={icon} size={15} />}{readOnly ? "Read only" : saveWords(save, empty)}</span>
    </Cell>
  );
}

function IssueCell({ jobId, mayIssue }: { jobId: string; mayIssue: boolean }) {
  const counts = useEditor((editor) => editor.check?.counts ?? null);
  const unsaved = useEditor((editor) => editor.save.kind !== "saved");
  const empty = useEditor((editor) => Object.keys(editor.drawing.equipment).length === 0);
  const goes = counts === null ? null : counts.mustFix > 0 ? `${counts.mustFix} must-fix` : counts.needsData > 0 ? `${counts.needsData} needs data` : null;
  if (!mayIssue) return null;
  const off = unsaved || empty;
  return (
    <div className="flex items-center gap-2 px-3">
      {goes && <em className={`w-[84px] text-right text-label font-strong not-italic leading-[1.1] stretch-label ${counts && counts.mustFix > 0 ? "text-red" : "text-ink2"}`}>{goes} {counts && (counts.mustFix || counts.needsData) === 1 && counts.mustFix === 0 ? "goes" : "go"} along</em>}
      {off
        ? <button type="button" disabled className="h-bar-control whitespace-nowrap border border-rule px-3 text-body font-strong text-ink3" title={empty ? "Nothing is drawn yet" : "Issue waits until all changes are saved"}>Issue for review</button>
        : <Link href={`/jobs/${jobId}/issue`} className="inline-flex h-bar-control items-center whitespace-nowrap border border-ink bg-ink px-3 text-body font-strong text-onink">Issue for review</Link>}
    </div>
  );
}

/** One slim bar, always in this order: job, sheet, save state in words, undo and redo, find, zoom, people; then issue. */
export function TopBar({ facts, mayIssue, people, onFind, onFit }: { facts: BarFacts; mayIssue: boolean; people: readonly string[]; onFind: () => void; onFit: () => void }) {
  const store = useEditorStore();
  const history = useEditor((editor) => editor.history);
  const readOnly = useEditor((editor) => editor.readOnly);
  const view = useCanvasView();
  const undo = history.past.at(-1)?.title;
  const redo = history.future.at(-1)?.title;
  return (
    <header className="relative z-20 flex h-bar flex-none items-stretch border-b-[1.5px] border-ink bg-panel">
      <Link href="/jobs" className="flex items-center gap-2 px-3 text-[16px] font-heading" aria-label="Ferrule, all jobs"><FerruleMark /><span className="narrow:max-[1320px]:hidden">Ferrule</span></Link>
      <Link href={`/jobs/${facts.jobId}`} className="flex min-w-0"><Cell top={`Job ${facts.jobNumber}`}><span className="border-b border-dotted border-ink3">{facts.jobName}</span></Cell></Link>
      <Cell top="Sheet"><span>{facts.sheetNumber} <span className="narrow:hidden">{facts.sheetTitle}</span></span></Cell>
      <SaveCell letter={facts.revisionLetter} />
      <div className="flex items-center gap-0.5 border-l border-desk2 px-2">
        <button type="button" className={QUIET} aria-label={undo ? `Undo: ${undo}` : "Undo"} title={undo ? `Undo: ${undo} (Ctrl Z)` : "Nothing to undo"} disabled={readOnly || !undo} onClick={() => store.getState().undo()}><Icon name="undo" /></button>
        <button type="button" className={QUIET} aria-label={redo ? `Redo: ${redo}` : "Redo"} title={redo ? `Redo: ${redo} (Ctrl Y)` : "Nothing to redo"} disabled={readOnly || !redo} onClick={() => store.getState().redo()}><Icon name="redo" /></button>
      </div>
      <button type="button" onClick={onFind} className="flex items-center gap-2 whitespace-nowrap border-l border-desk2 px-2.5 text-body text-ink2" aria-label="Find tag or text">
        <Icon name="find" size={16} /><span className="narrow:hidden">Find tag or text</span><kbd className="border border-rule px-1.5 py-0.5 text-small font-strong stretch-label narrow:hidden">Ctrl F</kbd>
      </button>
      <div className="flex items-center border-l border-desk2 px-1">
        <button type="button" className={QUIET} aria-label="Zoom out" onClick={view.zoomOut}><Icon name="minus" size={15} /></button>
        <button type="button" className="min-w-11 text-center text-body font-strong" aria-label={`Zoom ${Math.round(view.zoom * 100)} %, back to 100 %`} title="Back to 100 %" onClick={() => view.zoomTo(1)}>{Math.round(view.zoom * 100)} %</button>
        <button type="button" className={QUIET} aria-label="Zoom in" onClick={view.zoomIn}><Icon name="plus" size={15} /></button>
        <button type="button" className={QUIET} aria-label="Whole sheet" title="Whole sheet (Shift 1)" onClick={onFit}><Icon name="fit" size={16} /></button>
      </div>
      <div className="flex-1 border-l border-desk2" />
      <ul aria-label="People on this job" className="flex items-center px-3">
        {people.slice(0, 4).map((name) => <li key={name} title={name} className="-ml-1.5 grid size-7 place-items-center rounded-full border border-ink bg-paper text-small font-finding stretch-label"><span aria-label={name}>{name.split(/\s+/).map((word) => word[0] ?? "").join("").slice(0, 2).toUpperCase()}</span></li>)}
      </ul>
      <IssueCell jobId={facts.jobId} mayIssue={mayIssue} />
    </header>
  );
}
