"use client";
import { useEffect, useState } from "react";
import { useEditor } from "@/components/diagram/editorContext";
import { valueAt } from "@/lib/client/settle";
import { tagOf } from "@/lib/client/describe";
import { buildGraph, type DrawingGraph } from "@/lib/diagram/graph";
import { COLLECTIONS, type Collection } from "@/lib/diagram/schema";
import { BUTTON, PRIMARY } from "./controls";
import { Icon } from "./icons";

const time = (at: number): string => new Date(at).toLocaleTimeString("en-US", { hour: "numeric", minute: "2-digit" });

/** A strip under the bar, only when a person must know or decide. */
export function Strips({ onTryAgain }: { onTryAgain: () => void }) {
  const save = useEditor((editor) => editor.save);
  const readOnly = useEditor((editor) => editor.readOnly);
  if (readOnly) return <Strip icon="lock">You can look, copy and find here. Only designers of this job change the drawing, and nobody while it is in the archive.</Strip>;
  if (save.kind === "offline") return <Strip icon="offline">You can go on drawing. Issue and review wait for the connection.</Strip>;
  if (save.kind === "failed") {
    return (
      <Strip icon="warn" bad>
        <span className="flex-1">Not saved at {time(save.at)}: {save.detail}{save.requestId ? ` Request ${save.requestId}.` : ""} Nothing is lost; {save.kept === 1 ? "the change is" : "the changes are"} kept on this device.</span>
        <button type="button" className={PRIMARY} onClick={onTryAgain}>Try again</button>
      </Strip>
    );
  }
  return null;
}

function Strip({ icon, bad = false, children }: { icon: "lock" | "offline" | "warn"; bad?: boolean; children: React.ReactNode }) {
  return <div role={bad ? "alert" : "status"} className={`relative z-[12] flex flex-none items-center gap-2.5 border-b border-ink bg-vellum px-3 py-2 text-body ${bad ? "border-l-4 border-l-red" : ""}`}><Icon name={icon} size={16} />{children}</div>;
}

/** A field in the words of its form. */
function fieldWords(graph: DrawingGraph | undefined, collection: string, id: string, path: readonly string[]): string {
  const label = collection === "equipment" && path[0] === "props" && graph ? graph.kind(id).properties[path[1] ?? ""]?.label : undefined;
  return (label ?? path.join(" ").replace(/([A-Z])/g, " $1")).toLowerCase();
}

const shown = (value: unknown): string => (value === undefined ? "deleted" : value === null ? "not known" : typeof value === "object" ? "changed" : String(value));

/** Both values where two people changed the same thing, and the choice between them. */
export function ConflictPanel({ onSettle }: { onSettle: (keep: "mine" | "theirs") => void }) {
  const save = useEditor((editor) => editor.save);
  const drawing = useEditor((editor) => editor.drawing);
  if (save.kind !== "conflict") return null;
  const { conflict } = save;
  const graphs = [buildGraph(drawing), buildGraph(conflict.drawing)];
  const names = conflict.overlapping.map((path) => {
    const [, collection = "", id = "", ...rest] = path.split("/");
    const known = (COLLECTIONS as readonly string[]).includes(collection);
    const graph = graphs.find((each) => known && Object.hasOwn(each.drawing[collection as Collection], id));
    return { path, name: graph ? tagOf(graph, { collection: collection as Collection, id }) : collection, field: fieldWords(graph, collection, id, rest) };
  });
  const who = conflict.by.length > 0 ? conflict.by.join(" and ") : "somebody else";
  return (
    <section role="alertdialog" aria-label="Two changes to settle" className="absolute right-4 top-4 z-[16] w-96 border border-ink bg-vellum p-4 shadow-hard">
      <h2 className="text-finding font-finding">You and {who} both changed {[...new Set(names.map((each) => each.name))].slice(0, 3).join(", ")}.</h2>
      <div className="max-h-64 overflow-y-auto">
        <table className="mt-2 w-full text-body">
          <thead><tr className="text-left text-label text-ink2"><th className="font-normal" scope="col">Value</th><th className="font-normal" scope="col">Yours</th><th className="font-normal" scope="col">Theirs</th></tr></thead>
          <tbody>
            {names.map((each) => <tr key={each.path} className="border-b border-desk2 align-top"><th scope="row" className="py-1 pr-2 text-left font-normal">{each.name} {each.field}</th><td className="py-1 pr-2 font-finding">{shown(valueAt(drawing, each.path))}</td><td className="py-1 font-finding">{shown(valueAt(conflict.drawing, each.path))}</td></tr>)}
          </tbody>
        </table>
      </div>
      <div className="mt-3 flex gap-2">
        <button type="button" className={`${BUTTON} flex-1`} onClick={() => onSettle("mine")}>Keep mine</button>
        <button type="button" className={`${BUTTON} flex-1`} onClick={() => onSettle("theirs")}>Take theirs</button>
      </div>
      <p className="mt-2 text-small text-ink2">Your other changes are merged. The value you leave stays in the history of saves.</p>
    </section>
  );
}

/** How long a sentence stays in sight, ms: time to read two lines twice. */
const NOTICE_MS = 7000;

/** The last sentence for the person: what was undone, what was refused and why. */
export function NoticeLine() {
  const notice = useEditor((editor) => editor.notice);
  const [seen, setSeen] = useState(0);
  useEffect(() => {
    if (!notice) return;
    const timer = setTimeout(() => setSeen(notice.id), NOTICE_MS);
    return () => clearTimeout(timer);
  }, [notice]);
  return (
    <div aria-live="polite" role="status" aria-label="Message" className="pointer-events-none absolute bottom-3 left-1/2 z-[14] w-max max-w-[70%] -translate-x-1/2">
      {notice && notice.id !== seen && <p key={notice.id} className={`border bg-vellum px-3 py-1.5 text-body shadow-hard ${notice.tone === "refused" ? "border-red text-red" : "border-ink"}`}>{notice.text}</p>}
    </div>
  );
}
