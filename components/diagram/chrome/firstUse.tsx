"use client";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { BUTTON, PRIMARY } from "./controls";
import { PartIcon } from "./partIcon";

const STEPS = [
  { part: "utility", title: "Place the utility", words: "From the rail, or press U. Its voltage and fault current are asked for in the margin." },
  { part: "meter-main", title: "Place the panel it lands on", words: "It comes with a bus; breakers set down on it land on the bus by themselves." },
  { part: "circuit", title: "Join them", words: "Drag from port to port, or select a port, press J and choose from the list." },
] as const;

/** What to do first, on the sheet itself, while nothing is drawn. */
export function FirstUse({ onPlaceUtility }: { onPlaceUtility: () => void }) {
  const store = useEditorStore();
  const empty = useEditor((editor) => Object.keys(editor.drawing.equipment).length === 0 && Object.keys(editor.drawing.raceways).length === 0);
  const busy = useEditor((editor) => editor.tool.kind !== "select");
  const readOnly = useEditor((editor) => editor.readOnly);
  if (!empty || busy) return null;
  return (
    <section aria-label="Start here" className="absolute left-1/2 top-16 z-[6] w-[520px] max-w-[calc(100%-180px)] -translate-x-1/2 border border-ink bg-vellum p-5">
      <h2 className="border-b border-ink pb-2 text-[17px] font-heading">{readOnly ? "An empty sheet. Nothing is drawn yet." : "An empty sheet. Start with what feeds the building."}</h2>
      {!readOnly && (
        <>
          <ol className="list-none">
            {STEPS.map(({ part, title, words }) => (
              <li key={part} className="flex items-center gap-3 border-b border-desk2 py-2.5"><PartIcon part={part} /><span className="flex-1"><b className="block text-text font-finding">{title}</b><span className="text-body text-ink2">{words}</span></span></li>
            ))}
          </ol>
          <div className="mt-3 flex gap-2">
            <button type="button" className={PRIMARY} onClick={() => store.getState().setTool({ kind: "place", part: "utility" })}>Place the utility</button>
            <button type="button" className={BUTTON} onClick={onPlaceUtility}>Set it down for me</button>
          </div>
        </>
      )}
    </section>
  );
}
