import { useEffect } from "react";
import { useEditorStore } from "@/components/diagram/editorContext";
import { SELECT } from "@/lib/client/editorTypes";
import { newId } from "@/lib/client/newId";
import type { ElementRef } from "@/lib/diagram/schema";
import { copyText, pasteEdit } from "./clipboard";
import { deleteEdit, duplicateEdit, rotateEdit } from "./elementEdits";
import { moveEdit, settleMove } from "./moveEdit";
import { PART_KEYS } from "./parts";
import { whyNot } from "@/lib/client/landing";

const ARROWS: Readonly<Record<string, readonly [number, number]>> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, -1], ArrowDown: [0, 1] };
const FAR = 10;
const typing = (target: EventTarget | null): boolean => target instanceof Element && target.closest("input, textarea, select, [contenteditable], [role=grid], [role=dialog]") !== null;

/** Keys of the editor. While a field or the grid has the focus, only find, undo and redo are taken. */
export function useShortcuts({ onFind, onFit, zoomIn, zoomOut }: { onFind: () => void; onFit: () => void; zoomIn: () => void; zoomOut: () => void }): void {
  const store = useEditorStore();
  useEffect(() => {
    let nudge: { refs: readonly ElementRef[]; graph: ReturnType<typeof store.getState>["graph"]; dx: number; dy: number } | null = null;
    const endNudge = (): void => {
      const done = nudge;
      nudge = null;
      if (!done) return;
      const edit = settleMove(done.graph, done.refs, done.dx, done.dy);
      if (store.getState().preview(edit.commands, edit.title)) store.getState().commit();
      else store.getState().cancel();
    };
    const startJoin = (): void => {
      const { selection, graph, setTool, say } = store.getState();
      const only = selection.length === 1 && selection[0]?.collection === "equipment" ? selection[0].id : null;
      const free = only ? graph.ports(only).filter((port) => whyNot(graph, null, { equipment: only, port: port.id, offset: 0 }) === null) : [];
      const focused = document.activeElement?.closest("[data-port]")?.getAttribute("data-port")?.split("/");
      const port = free.find((each) => focused?.[0] === only && focused?.[1] === each.id) ?? free.find((each) => each.system !== "ground" && each.system !== "data") ?? free[0];
      if (only && port) setTool({ kind: "join", from: { equipment: only, port: port.id, offset: 0 } });
      else if (only) say("Every port of it is taken.", "refused");
      else setTool({ kind: "join", from: null });
    };
    const down = (event: KeyboardEvent): void => {
      const control = event.ctrlKey || event.metaKey;
      const key = event.key.length === 1 ? event.key.toLowerCase() : event.key;
      const editor = store.getState();
      if (control && key === "f") { event.preventDefault(); onFind(); return; }
      if (control && (key === "z" || key === "y")) {
        if (typing(event.target) && event.target instanceof HTMLInputElement && event.target.getAttribute("role") !== "combobox" && event.target.value !== event.target.defaultValue) return;
        event.preventDefault();
        endNudge();
        if (key === "y" || event.shiftKey) editor.redo();
        else editor.undo();
        return;
      }
      if (event.key === "Escape") {
        if (nudge) { nudge = null; editor.cancel(); }
        else if (editor.tool.kind !== "select") editor.setTool(SELECT);
        else if (typing(event.target)) return;
        else if (editor.opened) editor.open(null);
        else editor.select([]);
        return;
      }
      if (typing(event.target)) return;
      const arrow = ARROWS[event.key];
      if (arrow && editor.selection.length > 0 && !control && !event.altKey) {
        event.preventDefault();
        if (editor.readOnly) { editor.say("This drawing is read-only.", "refused"); return; }
        nudge ??= { refs: editor.selection, graph: editor.graph, dx: 0, dy: 0 };
        const by = event.shiftKey ? FAR : 1;
        nudge.dx += arrow[0] * by;
        nudge.dy += arrow[1] * by;
        const edit = moveEdit(nudge.graph, nudge.refs, nudge.dx, nudge.dy);
        editor.preview(edit.commands, edit.title);
        return;
      }
      if (control && key === "a") {
        event.preventDefault();
        editor.select((["equipment", "circuits", "raceways", "sensors", "bonds", "interlocks", "texts"] as const).flatMap((collection) => Object.keys(editor.drawing[collection]).map((id) => ({ collection, id }))));
        return;
      }
      const shift1 = event.shiftKey && event.code === "Digit1";
      if (shift1 || (control && key === "0")) { event.preventDefault(); onFit(); return; }
      if (key === "+" || key === "=") { zoomIn(); return; }
      if (key === "-" && !control) { zoomOut(); return; }
      if (editor.readOnly) return;
      const edit = event.key === "Delete" || event.key === "Backspace" ? (editor.selection.length > 0 ? deleteEdit(editor.graph, editor.selection) : null)
        : control && key === "d" ? duplicateEdit(editor.graph, editor.selection, newId)
        : !control && key === "r" ? rotateEdit(editor.graph, editor.selection) : null;
      if (edit) {
        event.preventDefault();
        if ("reason" in edit) editor.say(edit.reason, "refused");
        else if (editor.run(edit.commands, edit.title) && edit.selectAll) editor.select(edit.selectAll);
        return;
      }
      if (control || event.altKey) return;
      if (key === "j") { event.preventDefault(); startJoin(); return; }
      const part = PART_KEYS[key];
      if (part && !event.shiftKey) { event.preventDefault(); editor.setTool(part === "circuit" ? { kind: "join", from: null } : { kind: "place", part }); }
    };
    const up = (event: KeyboardEvent): void => { if (ARROWS[event.key]) endNudge(); };
    const copy = (event: ClipboardEvent): void => {
      const { graph, selection, say } = store.getState();
      if (typing(event.target) || selection.length === 0 || (window.getSelection()?.toString() ?? "") !== "") return;
      event.clipboardData?.setData("text/plain", copyText(graph, selection));
      event.preventDefault();
      say(`${selection.length} copied.`);
    };
    const paste = (event: ClipboardEvent): void => {
      if (typing(event.target)) return;
      const editor = store.getState();
      const edit = pasteEdit(editor.graph, event.clipboardData?.getData("text/plain") ?? "", newId);
      event.preventDefault();
      if ("reason" in edit) editor.say(edit.reason, "refused");
      else if (editor.run(edit.commands, edit.title) && edit.selectAll) { editor.select(edit.selectAll); if (edit.note) editor.say(edit.note); }
    };
    window.addEventListener("keydown", down);
    window.addEventListener("keyup", up);
    window.addEventListener("blur", endNudge);
    document.addEventListener("copy", copy);
    document.addEventListener("paste", paste);
    return () => {
      window.removeEventListener("keydown", down);
      window.removeEventListener("keyup", up);
      window.removeEventListener("blur", endNudge);
      document.removeEventListener("copy", copy);
      document.removeEventListener("paste", paste);
    };
  }, [store, onFind, onFit, zoomIn, zoomOut]);
}
