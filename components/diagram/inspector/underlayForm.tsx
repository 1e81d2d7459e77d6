"use client";
import { useParams } from "next/navigation";
import { useMemo } from "react";
import { underlayFor, underlayWidth } from "@/components/diagram/actions/underlayEdit";
import { BUTTON, FIELD, LABEL } from "@/components/diagram/chrome/controls";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { FileDrop } from "@/components/files/FileDrop";
import type { FileAnswer } from "@/lib/api";
import { SELECT } from "@/lib/client/editorTypes";
import { useFiles } from "@/lib/client/filesApi";
import { readNumber, showValue } from "@/lib/client/readField";
import type { Command } from "@/lib/diagram/commands";
import type { Underlay } from "@/lib/diagram/schema";
import { drawingArea } from "@/lib/sheets/frame";
import { FRAME_ORIGIN_PX, PX_PER_UNIT } from "@/lib/sheets/primitives";
import { sheetGeometry } from "@/lib/sheets/size";
import { FieldGroup, TextField } from "@/components/fields/fields";

const isPicture = (file: FileAnswer): boolean => file.contentType !== "application/pdf" && file.widthPx !== null && file.heightPx !== null;

/** The picture under the sheet: which one, how dark, how large. On the screen alone. */
export function UnderlayForm() {
  const { jobId } = useParams<{ jobId: string }>();
  const place = useMemo(() => ({ jobId }), [jobId]);
  const store = useEditorStore();
  const readOnly = useEditor((editor) => editor.readOnly);
  const sheet = useEditor((editor) => editor.drawing.sheet);
  const { underlay } = sheet;
  const files = useFiles(place, !readOnly);
  const pictures = (files.data?.files ?? []).filter(isPicture);
  const choose = (file: FileAnswer): void => {
    if (file.widthPx === null || file.heightPx === null) return;
    const area = drawingArea(sheetGeometry(store.getState().drawing.sheet.size));
    const units = { at: { x: (area.left - FRAME_ORIGIN_PX) / PX_PER_UNIT, y: (area.top - FRAME_ORIGIN_PX) / PX_PER_UNIT }, width: (area.right - area.left) / PX_PER_UNIT, height: (area.bottom - area.top) / PX_PER_UNIT };
    store.getState().run([underlayFor(file.id, { widthPx: file.widthPx, heightPx: file.heightPx }, units)]);
  };
  if (readOnly && !underlay) return null;
  return (
    <FieldGroup title="Background" note="never printed" open={underlay !== undefined}>
      {underlay && <Placed underlay={underlay} readOnly={readOnly} pxPerIn={sheetGeometry(sheet.size).pxPerIn} />}
      {!readOnly && pictures.length > 0 && (
        <label className="col-span-2 block">
          <span className={LABEL}>Picture of this job</span>
          <select className={FIELD} value={underlay?.file ?? ""} onChange={(event) => { const file = pictures.find((each) => each.id === event.target.value); if (file) choose(file); }}>
            {(!underlay || !pictures.some((each) => each.id === underlay.file)) && <option value="">{underlay ? "a picture that is not here any more" : "choose"}</option>}
            {pictures.map((each) => <option key={each.id} value={each.id}>{each.name}</option>)}
          </select>
        </label>
      )}
      {files.isError && <p role="alert" className="col-span-2 text-small text-red">The pictures of this job could not be listed. <button type="button" className="underline" onClick={() => void files.refetch()}>Try again</button></p>}
      {!readOnly && <div className="col-span-2"><FileDrop place={place} purpose="background" label={underlay ? "Another picture" : "Add a sketch or photo"} multiple={false} onStored={choose} /></div>}
      {!readOnly && !underlay && <p className="col-span-2 text-small text-ink3">It lies dimmed under the drawing on the screen. Of a PDF, take a picture of the page.</p>}
    </FieldGroup>
  );
}

function Placed({ underlay, readOnly, pxPerIn }: { underlay: Underlay; readOnly: boolean; pxPerIn: number }) {
  const store = useEditorStore();
  const adjusting = useEditor((editor) => editor.tool.kind === "underlay");
  const run = (command: Command): string | null => (store.getState().run([command]) ? null : store.getState().notice?.text ?? "not accepted");
  /** Inches on the sheet at full size. */
  const inches = (units: number): number => (units * PX_PER_UNIT) / pxPerIn;
  const number = (label: string, value: number, least: number, most: number, command: (units: number) => Command) => (
    <TextField label={label} unit="in" value={showValue(Math.round(inches(value) * 100) / 100)} readOnly={readOnly} onCommit={(text) => {
      const answer = readNumber(text, "in", inches(least), inches(most));
      if (!answer.ok) return answer.reason;
      return typeof answer.value === "number" ? run(command((answer.value * pxPerIn) / PX_PER_UNIT)) : "is missing";
    }} />
  );
  const percent = Math.round(underlay.opacity * 100);
  return (
    <>
      {number("Width", underlay.width, 2, 600, (units) => underlayWidth(underlay, units))}
      <TextField label="Height" unit="in" value={showValue(Math.round(inches(underlay.height) * 100) / 100)} readOnly onCommit={() => null} />
      {number("From the left", underlay.at.x, -600, 600, (x) => ({ type: "setUnderlay", change: { at: { ...underlay.at, x } } }))}
      {number("From the top", underlay.at.y, -400, 400, (y) => ({ type: "setUnderlay", change: { at: { ...underlay.at, y } } }))}
      <label className="col-span-2 block">
        <span className={LABEL}>Darkness, {percent} %</span>
        <input
          type="range" min={5} max={80} step={5} value={percent} disabled={readOnly} className="h-bar-control w-full accent-[var(--ink)]"
          onChange={(event) => { store.getState().preview([{ type: "setUnderlay", change: { opacity: Number(event.target.value) / 100 } }]); }}
          onPointerUp={() => store.getState().commit()} onKeyUp={() => store.getState().commit()} onBlur={() => store.getState().commit()}
        />
      </label>
      {!readOnly && (
        <div className="col-span-2 grid grid-cols-3 gap-2">
          <button type="button" className={`${BUTTON} !px-1`} aria-pressed={adjusting} onClick={() => {
            if (underlay.hidden) run({ type: "setUnderlay", change: { hidden: false } });
            store.getState().setTool(adjusting ? SELECT : { kind: "underlay" });
          }}>{adjusting ? "Done" : "Adjust"}</button>
          <button type="button" className={`${BUTTON} !px-1`} onClick={() => run({ type: "setUnderlay", change: { hidden: !underlay.hidden } })}>{underlay.hidden ? "Show" : "Hide"}</button>
          <button type="button" className={`${BUTTON} !px-1`} onClick={() => { if (adjusting) store.getState().setTool(SELECT); run({ type: "removeUnderlay" }); }}>Remove</button>
        </div>
      )}
    </>
  );
}
