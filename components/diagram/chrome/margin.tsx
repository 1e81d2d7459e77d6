"use client";
import { useEffect, useId, useState } from "react";
import { CAUTION_TEXT } from "@/lib/cautions";
import { sameRef } from "@/lib/client/editorTypes";
import { numbered } from "@/components/diagram/redlines/markKind";
import { RedlineList } from "@/components/diagram/redlines/redlineList";
import { Inspector } from "@/components/diagram/inspector/inspector";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { Icon } from "./icons";

const TABS = ["Data", "Redlines"] as const;
type TabName = (typeof TABS)[number];

/** The sheet's margin with its two index tabs. Selecting opens Data; opening a redline on the sheet opens Redlines and keeps the selection. */
export function Margin({ folded, onFold }: { folded: boolean; onFold: (folded: boolean) => void }) {
  const store = useEditorStore();
  const opened = useEditor((editor) => editor.opened);
  const selection = useEditor((editor) => editor.selection);
  const count = useEditor((editor) => (editor.check ? numbered(editor.check.findings).length : 0));
  const [tab, setTab] = useState<TabName>("Redlines");
  const id = useId();
  useEffect(() => store.subscribe((now, before) => {
    if (now.opened !== before.opened && now.opened !== null) setTab("Redlines");
    else if (now.selection !== before.selection && now.selection.length > 0) {
      const anchor = now.check?.findings.find((finding) => finding.key === now.opened)?.anchor;
      // What an opened redline stands at is selected with it; that is not a wish for its data.
      if (!anchor || !now.selection.every((ref) => sameRef(ref, anchor))) setTab("Data");
    }
  }), [store]);
  if (folded) {
    return (
      <aside aria-label="Margin" className="flex w-9 flex-none flex-col items-center border-l border-rule bg-desk pt-2">
        <button type="button" className="grid size-8 place-items-center border border-ink bg-vellum" aria-label="Open the margin" aria-expanded={false} onClick={() => onFold(false)}><span className="rotate-90"><Icon name="down" size={14} /></span></button>
        <span className="mt-3 text-label text-ink2 [writing-mode:vertical-rl]">Data, Redlines {count}</span>
      </aside>
    );
  }
  return (
    <aside aria-label="Margin" className="flex w-margin flex-none flex-col border-l border-rule bg-desk narrow:w-margin-narrow">
      <div role="tablist" aria-label="Margin" className="flex h-10 flex-none items-end border-b border-ink pl-2">
        {TABS.map((name) => (
          <button
            key={name} type="button" role="tab" id={`${id}-${name}`} aria-selected={tab === name} aria-controls={`${id}-panel`} tabIndex={tab === name ? 0 : -1}
            className={`-ml-px h-[31px] border border-b-0 border-ink px-4 text-text narrow:px-3 ${tab === name ? "relative top-px h-8 bg-vellum font-heading text-ink" : "bg-panel font-strong text-ink2"}`}
            onClick={() => setTab(name)}
            onKeyDown={(event) => { if (event.key === "ArrowLeft" || event.key === "ArrowRight") { const next = name === "Data" ? "Redlines" : "Data"; setTab(next); document.getElementById(`${id}-${next}`)?.focus(); event.stopPropagation(); } }}
          >
            {name}{name === "Redlines" && <span className="ml-1 font-normal">{count}</span>}
          </button>
        ))}
        <button type="button" className="mb-0.5 ml-auto mr-1 grid size-8 place-items-center" aria-label="Fold the margin away" aria-expanded onClick={() => onFold(true)}><span className="-rotate-90"><Icon name="down" size={14} /></span></button>
      </div>
      <div role="tabpanel" id={`${id}-panel`} aria-labelledby={`${id}-${tab}`} tabIndex={-1} className={`min-h-0 flex-1 overflow-y-auto px-2.5 pb-3 pt-2.5 [scrollbar-width:thin] ${tab === "Data" ? "bg-vellum" : ""}`}>
        {tab === "Data" ? <Inspector key={selection.map((ref) => `${ref.collection}/${ref.id}`).join(" ")} /> : <RedlineList opened={opened} />}
      </div>
      <p className="flex-none border-t border-ink bg-panel px-2.5 py-1.5 text-small leading-snug text-ink2 stretch-label" data-testid="caution">{CAUTION_TEXT}</p>
    </aside>
  );
}
