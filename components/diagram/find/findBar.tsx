"use client";
import { useEffect, useId, useRef, useState } from "react";
import { Icon } from "@/components/diagram/chrome/icons";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { findElements, kindOf, nameOf, tagOf } from "@/lib/client/describe";
import type { ElementRef } from "@/lib/diagram/schema";

const SHOWN = 30;

/** Finds by tag, name or rating; the arrows walk the hits, each is brought into view and selected. */
export function FindBar({ onClose }: { onClose: () => void }) {
  const store = useEditorStore();
  const graph = useEditor((editor) => editor.graph);
  const [query, setQuery] = useState("");
  const [at, setAt] = useState(0);
  const input = useRef<HTMLInputElement>(null);
  const id = useId();
  useEffect(() => input.current?.focus(), []);
  const hits = findElements(graph, query);
  const index = hits.length === 0 ? 0 : ((at % hits.length) + hits.length) % hits.length;
  const go = (ref: ElementRef | undefined): void => {
    if (!ref) return;
    store.getState().select([ref]);
    store.getState().show(ref);
  };
  const step = (by: number): void => { const next = index + by; setAt(next); go(hits[((next % hits.length) + hits.length) % hits.length]); };
  return (
    <div role="search" className="absolute left-1/2 top-2 z-[15] w-96 -translate-x-1/2 border border-ink bg-panel shadow-hard">
      <div className="flex items-center gap-2 px-2.5">
        <Icon name="find" size={16} />
        <input
          ref={input} role="combobox" aria-expanded={hits.length > 0} aria-controls={`${id}-list`} aria-activedescendant={hits[index] ? `${id}-${index}` : undefined} aria-label="Find tag or text" value={query} placeholder="Tag, kind or rating"
          className="h-control min-w-0 flex-1 bg-transparent text-text outline-none"
          onChange={(event) => { setQuery(event.target.value); setAt(0); }}
          onKeyDown={(event) => {
            event.stopPropagation();
            if (event.key === "Escape") { onClose(); return; }
            if (event.key === "Enter") { event.preventDefault(); if (event.shiftKey) step(-1); else go(hits[index]); }
            if (event.key === "ArrowDown") { event.preventDefault(); step(1); }
            if (event.key === "ArrowUp") { event.preventDefault(); step(-1); }
          }}
        />
        <span className="text-label text-ink2" role="status">{query ? (hits.length === 0 ? "none" : `${index + 1} of ${hits.length}`) : ""}</span>
        <button type="button" aria-label="Close find" className="p-1" onClick={onClose}><Icon name="close" size={14} /></button>
      </div>
      {hits.length > 0 && (
        <ul role="listbox" id={`${id}-list`} aria-label="Found" className="max-h-72 list-none overflow-y-auto border-t border-ink bg-paper">
          {hits.slice(0, SHOWN).map((ref, hit) => (
            <li key={`${ref.collection}/${ref.id}`} id={`${id}-${hit}`} role="option" aria-selected={hit === index} aria-label={nameOf(graph, ref)} className={`flex cursor-pointer justify-between gap-3 px-2.5 py-1 text-body ${hit === index ? "bg-tint" : "hover:bg-vellum"}`} onMouseDown={(event) => { event.preventDefault(); setAt(hit); go(ref); }}>
              <span className="font-finding">{tagOf(graph, ref)}</span><span className="text-ink2 stretch-label">{kindOf(graph, ref)}</span>
            </li>
          ))}
          {hits.length > SHOWN && <li className="px-2.5 py-1 text-label text-ink2">and {hits.length - SHOWN} more</li>}
        </ul>
      )}
    </div>
  );
}
