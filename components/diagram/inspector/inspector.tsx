"use client";
import { deleteEdit } from "@/components/diagram/actions/elementEdits";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { BUTTON } from "@/components/diagram/chrome/controls";
import { kindOf, nameOf, tagOf } from "@/lib/client/describe";
import type { ElementRef } from "@/lib/diagram/schema";
import { BondForm, InterlockForm, SensorForm, TextForm } from "./accessoryForms";
import { CircuitForm } from "./circuitForm";
import { EquipmentForm } from "./equipmentForm";
import { RacewayForm } from "./racewayForm";
import { SheetForm } from "./sheetForm";
import { TextField } from "@/components/fields/fields";
import { useEdit } from "./useEdit";

const FORMS: Partial<Record<ElementRef["collection"], React.ComponentType<{ id: string }>>> = {
  equipment: EquipmentForm, circuits: CircuitForm, raceways: RacewayForm, sensors: SensorForm, bonds: BondForm, interlocks: InterlockForm, texts: TextForm,
};

/** The Data tab: what is selected, or the sheet's own data where nothing is. */
export function Inspector() {
  const store = useEditorStore();
  const graph = useEditor((editor) => editor.graph);
  const selection = useEditor((editor) => editor.selection);
  const readOnly = useEditor((editor) => editor.readOnly);
  const [only, ...others] = selection;
  if (!only) return <SheetForm />;
  if (others.length > 0) {
    return (
      <>
        <h2 className="border-b-[1.5px] border-ink pb-1 text-finding font-heading">{selection.length} selected</h2>
        <ul className="mt-1 list-none">
          {selection.map((ref) => <li key={`${ref.collection}/${ref.id}`}><button type="button" className="w-full border-b border-desk2 py-1.5 text-left text-body hover:bg-panel" onClick={() => store.getState().select([ref])}>{nameOf(graph, ref)}</button></li>)}
        </ul>
        {!readOnly && <DeleteButton refs={selection} />}
      </>
    );
  }
  if (!Object.hasOwn(graph.drawing[only.collection], only.id)) return <SheetForm />;
  const Form = FORMS[only.collection];
  return (
    <>
      <Heading element={only} />
      {Form && <Form id={only.id} />}
      {!readOnly && <DeleteButton refs={selection} />}
    </>
  );
}

function DeleteButton({ refs }: { refs: readonly ElementRef[] }) {
  const store = useEditorStore();
  const graph = useEditor((editor) => editor.graph);
  return <button type="button" className={`${BUTTON} mt-5 w-full`} onClick={() => { const edit = deleteEdit(graph, refs); store.getState().run(edit.commands, edit.title); }}>Delete{refs.length === 1 && refs[0] ? ` ${tagOf(graph, refs[0])}` : ` ${refs.length} elements`}</button>;
}

function Heading({ element }: { element: ElementRef }) {
  const graph = useEditor((editor) => editor.graph);
  const { readOnly, set, mark } = useEdit(element);
  const tagged = element.collection !== "texts" && element.collection !== "labels" && element.collection !== "acceptances";
  return (
    <>
      <div className="flex items-baseline gap-2.5 border-b-[1.5px] border-ink pb-1.5">
        <h2 className="font-lettering text-[24px] leading-none [-webkit-text-stroke:.5px]">{tagged ? tagOf(graph, element) : "Note"}</h2>
        <span className="text-label text-ink2 stretch-label">{kindOf(graph, element)}</span>
      </div>
      {tagged && <div className="mt-2 grid grid-cols-2 gap-2"><TextField label="Tag" value={tagOf(graph, element)} readOnly={readOnly} mark={mark("tag")} wide onCommit={(text) => set("tag", text.trim(), `tag ${text.trim()}`)} /></div>}
    </>
  );
}
