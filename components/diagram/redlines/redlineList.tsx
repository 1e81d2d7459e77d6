"use client";
import { useEffect, useRef } from "react";
import { suggestionEdit } from "@/components/diagram/actions/suggestionEdit";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { BUTTON, PRIMARY } from "@/components/diagram/chrome/controls";
import { isPreview, previewNote } from "@/lib/code/adoption";
import { tagOf } from "@/lib/client/describe";
import { Mark } from "./mark";
import { MARK_WORDS, numbered, type MarkKind } from "./markKind";
import { Worksheet } from "./worksheet";
import type { Finding } from "@/lib/rules/engine/types";

const NONE: readonly Finding[] = [];

/** The margin's redlines: counted on top, the opened one with its working, the rest as sentences. */
export function RedlineList({ opened }: { opened: string | null }) {
  const store = useEditorStore();
  const check = useEditor((editor) => editor.check);
  const error = useEditor((editor) => editor.checkError);
  const graph = useEditor((editor) => editor.graph);
  const findings = check?.findings ?? NONE;
  const list = numbered(findings);
  const accepted = findings.filter((finding) => finding.accepted);
  const open = (finding: Finding): void => {
    const { open: openKey, select, show } = store.getState();
    openKey(finding.key);
    select([finding.anchor]);
    show(finding.anchor);
  };
  if (error) return <p role="alert" className="border border-red bg-vellum p-3 text-body">The checker stopped: {error}. Nothing here is checked until the page is loaded again.</p>;
  if (!check) return <p className="text-body text-ink2" aria-busy="true">Checking the drawing.</p>;
  const { counts } = check;
  const parts = [[counts.mustFix, "must-fix"], [counts.shouldFix, "should-fix"], [counts.needsData, "needs data"], [counts.advice, "advice"], [counts.accepted, "accepted"]] as const;
  const summary = parts.filter(([count]) => count > 0).map(([count, words]) => `${count} ${words}`).join(", ");
  return (
    <>
      <p className="pb-2 pl-1 text-label leading-snug text-ink2 stretch-label" role="status" aria-label="Redlines">
        {summary ? `${summary}.` : "No redlines."}<br />{check.rulesRun} rules run, NEC {check.edition}.{isPreview(check.edition) && <span className="mt-1 block border-l-[3px] border-ochre pl-2">{previewNote(check.edition)}</span>}
      </p>
      {list.length === 0 && <p className="border border-ink bg-vellum p-3 text-body">Nothing found by these rules. That is not an approval: the adopted code and the authority having jurisdiction decide.</p>}
      <ol className="list-none">
        {list.map(({ finding, number, kind }) => (
          <li key={finding.key} data-rule={finding.rule} data-severity={finding.severity}>
            {finding.key === opened
              ? <Slip finding={finding} number={number} kind={kind} />
              : (
                <button type="button" className="flex w-full gap-2 border-b border-desk2 py-1.5 pl-1 text-left hover:bg-panel" onClick={() => open(finding)} aria-expanded={false}>
                  <Mark kind={kind} number={number} />
                  <span className="min-w-0 flex-1">
                    <span className="mt-0.5 block text-body leading-tight">{finding.message}</span>
                    <span className="mt-0.5 flex justify-between gap-2 text-small text-ink2 stretch-label"><span>{tagOf(graph, finding.anchor)}</span><span className="text-right">{finding.citation}</span></span>
                  </span>
                </button>
              )}
          </li>
        ))}
      </ol>
      {accepted.length > 0 && (
        <details className="mt-3">
          <summary className="cursor-pointer border-b border-ink pb-1 text-text font-heading">Accepted in writing {accepted.length}</summary>
          <ul className="list-none">{accepted.map((finding) => <li key={finding.key} className="border-b border-desk2 py-1.5 text-body leading-tight">{finding.message}<span className="block text-small text-ink2">{finding.accepted?.by}, {finding.accepted?.license}: {finding.accepted?.reason}</span></li>)}</ul>
        </details>
      )}
    </>
  );
}

/** The opened redline: sentence, where, worked steps, what would clear it, what stands folded under it, and the citation. */
function Slip({ finding, number, kind }: { finding: Finding; number: number; kind: MarkKind }) {
  const store = useEditorStore();
  const graph = useEditor((editor) => editor.graph);
  const readOnly = useEditor((editor) => editor.readOnly);
  const slip = useRef<HTMLElement>(null);
  useEffect(() => { slip.current?.scrollIntoView({ block: "nearest" }); }, []);
  const related = [finding.anchor, ...finding.related].map((ref) => tagOf(graph, ref)).filter((tag, index, all) => tag && all.indexOf(tag) === index);
  const last = finding.steps.at(-1);
  return (
    <section ref={slip} className="my-1 border border-ink bg-vellum px-3 pb-2.5 pt-2" aria-label={`${MARK_WORDS[kind]} ${number}`}>
      <div className="flex gap-2">
        <Mark kind={kind} number={number} open size={32} />
        <h2 className="mt-1 flex-1 text-[14.5px] font-finding leading-tight">{finding.message}</h2>
        <button type="button" aria-label="Close this redline" className="-mr-1 self-start p-1 text-small text-ink2 underline" onClick={() => store.getState().open(null)}>close</button>
      </div>
      <p className="mb-1 mt-2 border-b border-ink pb-1 text-label text-ink2 stretch-label">{related.join(", ")}</p>
      <Worksheet steps={finding.steps} {...(last && typeof last.result === "string" ? { result: last.result } : {})} />
      {finding.fields.length > 1 && <ul className="mt-1 list-none text-label">{finding.fields.map((field) => <li key={`${field.ref.id}${field.field}`}>{tagOf(graph, field.ref)}: {field.label} is not known.</li>)}</ul>}
      {finding.suggestions.length > 0 && !readOnly && (
        <div className="mt-2 flex flex-wrap gap-1.5">
          {finding.suggestions.map((suggestion, index) => (
            <button
              key={suggestion.label} type="button" className={`${index === 0 ? PRIMARY : BUTTON} h-auto min-h-bar-control flex-1 !whitespace-normal py-1 leading-tight`}
              onClick={() => { const edit = suggestionEdit(suggestion); store.getState().run(edit.commands, edit.title); }}
            >
              {suggestion.label}
            </button>
          ))}
        </div>
      )}
      {finding.suggestions.filter((suggestion) => suggestion.also).map((suggestion) => <p key={suggestion.label} className="mt-1.5 text-label leading-snug text-ink2 stretch-label">{suggestion.also}</p>)}
      {finding.risk && <p className="mt-1.5 text-label leading-snug text-ink2">{finding.risk}</p>}
      {finding.folded.length > 0 && (
        <div className="mt-2 border-t border-desk2 pt-1.5">
          <h3 className="text-label font-finding">Follows from it</h3>
          <ul className="list-none">{finding.folded.map((folded) => <li key={folded.rule + folded.message} className="py-0.5 text-label leading-tight text-ink2">{folded.message}<span className="block text-small text-ink3">{folded.citation}</span></li>)}</ul>
        </div>
      )}
      <p className="mt-2 border-t border-desk2 pt-1.5 text-small text-ink3">{finding.citation}{finding.verifySection ? ", verify in the adopted book" : ""}</p>
    </section>
  );
}
