"use client";
import { setSheetCommand } from "@/components/diagram/actions/commandsOf";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { editionName } from "@/lib/code/adoption";
import { readNumber, showValue } from "@/lib/client/readField";
import { OCCUPANCIES, type Drawing } from "@/lib/diagram/schema";
import { ChoiceField, FieldGroup, TextField } from "@/components/fields/fields";
import { UnderlayForm } from "./underlayForm";

/** Data of the whole sheet, shown while nothing is selected. */
export function SheetForm() {
  const store = useEditorStore();
  const drawing = useEditor((editor) => editor.drawing);
  const readOnly = useEditor((editor) => editor.readOnly);
  const { site, sheet } = drawing;
  const set = (path: string, value: unknown, title: string): string | null => (store.getState().run([setSheetCommand(path, value)], title) ? null : store.getState().notice?.text ?? "not accepted");
  const number = (field: keyof Drawing["site"], label: string, unit: string, low: number, high: number) => (
    <TextField label={label} unit={unit} value={showValue(site[field] as number | null)} readOnly={readOnly} onCommit={(text) => {
      const answer = readNumber(text, unit, low, high);
      return answer.ok ? set(`site.${field}`, answer.value, label.toLowerCase()) : answer.reason;
    }} />
  );
  const block = (field: keyof Drawing["sheet"]["titleBlock"], label: string, wide = false) => <TextField label={label} wide={wide} value={sheet.titleBlock[field]} readOnly={readOnly} onCommit={(text) => set(`sheet.titleBlock.${field}`, text.trim(), label.toLowerCase())} />;
  return (
    <>
      <div className="flex items-baseline gap-2.5 border-b-[1.5px] border-ink pb-1.5"><h2 className="font-lettering text-[24px] leading-none [-webkit-text-stroke:.5px]">{sheet.number}</h2><span className="text-label text-ink2">{sheet.size}, nothing selected</span></div>
      <p className="mt-2 text-label leading-snug text-ink2">Select anything on the sheet to see its data here. These values hold for the whole drawing.</p>
      <FieldGroup title="Site" note={editionName(site.edition)}>
        <ChoiceField label="Occupancy" wide value={site.occupancy ?? ""} options={OCCUPANCIES} readOnly={readOnly} onCommit={(value) => set("site.occupancy", value || null, "occupancy")} />
        {number("recordLowC", "Record low", "°C", -60, 40)}
        {number("designHighC", "Design high", "°C", -10, 60)}
        {number("elevationM", "Elevation", "m", -100, 5000)}
        {number("availableFaultCurrentA", "Fault current", "A", 0, 200000)}
        <TextField label="Utility" wide value={site.utilityName ?? ""} readOnly={readOnly} onCommit={(text) => set("site.utilityName", text.trim() || null, "utility")} />
      </FieldGroup>
      <UnderlayForm />
      <FieldGroup title="Title block" open={false}>
        {block("designedBy", "Designed by")}
        {block("checkedBy", "Checked by")}
        {block("permitNumber", "Permit number")}
        {block("codes", "Codes")}
        {block("scope", "Scope", true)}
        {block("contractor", "Contractor", true)}
      </FieldGroup>
    </>
  );
}
