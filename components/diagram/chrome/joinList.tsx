"use client";
import { useEffect, useMemo, useRef, useState } from "react";
import { joinEdit } from "@/components/diagram/actions/joinEdit";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { SELECT } from "@/lib/client/editorTypes";
import { landingList } from "@/lib/client/landing";
import { newId } from "@/lib/client/newId";

/** Joining without a pointer: the ports that may take the circuit, nearest first; Enter joins, Esc leaves. */
export function JoinList() {
  const store = useEditorStore();
  const graph = useEditor((editor) => editor.graph);
  const tool = useEditor((editor) => editor.tool);
  const from = tool.kind === "join" ? tool.from : null;
  const [query, setQuery] = useState("");
  const [at, setAt] = useState(0);
  const input = useRef<HTMLInputElement>(null);
  const all = useMemo(() => (from ? landingList(graph, from) : []), [graph, from]);
  const hits = all.filter((each) => each.label.toLowerCase().includes(query.trim().toLowerCase()));
  // The list is for keys; a pointer join goes on beside it and must not lose the focus to it.
  const byKeyboard = useKeyboardStarted(from !== null);
  useEffect(() => { if (from && byKeyboard) input.current?.focus(); }, [from, byKeyboard]);
  if (!from) return null;
  const index = Math.min(at, Math.max(0, hits.length - 1));
  const join = (hit: number): void => {
    const target = hits[hit];
    if (!target) return;
    const { run, setTool, select } = store.getState();
    const edit = joinEdit(graph, from, target.ref, newId("c"));
    if (run(edit.commands, edit.title)) { setTool(SELECT); select([edit.select]); setQuery(""); setAt(0); }
  };
  const start = graph.drawing.equipment[from.equipment]?.tag || graph.kind(from.equipment).title;
  return (
    <section aria-label="Join" className="absolute left-[92px] top-2 z-[13] w-80 border border-ink bg-panel shadow-hard">
      <p className="border-b border-ink px-2.5 py-1.5 text-body"><b className="font-finding">From {start} {graph.port(from.equipment, from.port)?.label.toLowerCase()}.</b> Press on a port, or choose here. Esc leaves.</p>
      <input
        ref={input} aria-label="Join to" placeholder="Type a tag" value={query} role="combobox" aria-expanded aria-controls="join-list" aria-activedescendant={hits[index] ? `join-${index}` : undefined}
        className="h-bar-control w-full bg-paper px-2.5 text-text outline-none" onChange={(event) => { setQuery(event.target.value); setAt(0); }}
        onKeyDown={(event) => {
          if (event.key === "Escape") return;
          event.stopPropagation();
          if (event.key === "ArrowDown") { event.preventDefault(); setAt(Math.min(hits.length - 1, index + 1)); }
          else if (event.key === "ArrowUp") { event.preventDefault(); setAt(Math.max(0, index - 1)); }
          else if (event.key === "Enter") { event.preventDefault(); join(index); }
        }}
      />
      <ul id="join-list" role="listbox" aria-label="Ports" className="max-h-56 list-none overflow-y-auto border-t border-desk2 bg-paper">
        {hits.map((hit, place) => <li key={`${hit.ref.equipment}/${hit.ref.port}`} id={`join-${place}`} role="option" aria-selected={place === index} className={`cursor-pointer px-2.5 py-1 text-body ${place === index ? "bg-tint" : "hover:bg-vellum"}`} onMouseDown={(event) => { event.preventDefault(); join(place); }}>{hit.label}</li>)}
        {hits.length === 0 && <li className="px-2.5 py-1 text-body text-ink2">No port here may take this circuit. Its system and a free place have to match.</li>}
      </ul>
    </section>
  );
}

/** True when the last thing a person did before the join began was pressing a key. */
function useKeyboardStarted(active: boolean): boolean {
  const last = useRef<"key" | "pointer">("pointer");
  const [byKey, setByKey] = useState(false);
  useEffect(() => {
    const key = (): void => { last.current = "key"; };
    const pointer = (): void => { last.current = "pointer"; };
    window.addEventListener("keydown", key, true);
    window.addEventListener("pointerdown", pointer, true);
    return () => { window.removeEventListener("keydown", key, true); window.removeEventListener("pointerdown", pointer, true); };
  }, []);
  useEffect(() => { setByKey(active && last.current === "key"); }, [active]);
  return byKey;
}
