"use client";
import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import type { DrawingAnswer } from "@/lib/api";
import type { Draft } from "@/lib/client/autosave";
import { newId } from "@/lib/client/newId";
import { openDrawing, type OpenDrawing } from "@/lib/client/openDrawing";
import { useFolds } from "@/lib/client/useFolds";
import type { PartId } from "@/lib/client/editorTypes";
import { Drawer } from "@/components/schedules/drawer";
import { sheetGeometry } from "@/lib/sheets/size";
import { placeEdit } from "./actions/placeEdit";
import { useShortcuts } from "./actions/useShortcuts";
import { Canvas } from "./canvas/canvas";
import { CanvasProvider, useCanvasView } from "./canvas/view";
import { FirstUse } from "./chrome/firstUse";
import { JoinList } from "./chrome/joinList";
import { Margin } from "./chrome/margin";
import { PartsRail } from "./chrome/partsRail";
import { ConflictPanel, NoticeLine, Strips } from "./chrome/strips";
import { TopBar } from "./chrome/topBar";
import { EditorProvider, useEditor, useEditorStore } from "./editorContext";
import { FindBar } from "./find/findBar";

/** The drawing editor: the sheet on the desk, its margin, the parts beside it and the schedules under it. */
export function Editor({ answer, draft, people }: { answer: DrawingAnswer; draft: Draft | null; people: readonly string[] }) {
  const [open] = useState<OpenDrawing>(() => openDrawing(answer, draft));
  useEffect(() => {
    open.start();
    return () => open.stop();
  }, [open]);
  return (
    <EditorProvider store={open.store}>
      <CanvasProvider><Desk answer={answer} people={people} open={open} /></CanvasProvider>
    </EditorProvider>
  );
}

function Desk({ answer, people, open }: { answer: DrawingAnswer; people: readonly string[]; open: OpenDrawing }) {
  const store = useEditorStore();
  const sheet = useEditor((editor) => editor.drawing.sheet);
  const readOnly = useEditor((editor) => editor.readOnly);
  const [folds, setFolds] = useFolds();
  const [finding, setFinding] = useState(false);
  const desk = useRef<HTMLElement>(null);
  const view = useCanvasView();
  const { fitSheet } = view;
  const fit = useCallback(() => { const { widthPx, heightPx } = sheetGeometry(sheet.size); fitSheet(widthPx, heightPx); }, [fitSheet, sheet.size]);
  const find = useCallback(() => setFinding(true), []);
  useShortcuts({ onFind: find, onFit: fit, zoomIn: view.zoomIn, zoomOut: view.zoomOut });
  // At a wide window the sheet starts near full size with its corner in view; at a small one the whole sheet is shown.
  const start = useMemo(() => (window.innerWidth >= 1500 ? { x: 46, y: -28, zoom: 0.96 } : { x: 84, y: 22, zoom: (window.innerWidth - 84 - 250) / 1632 }), []);
  const placeInView = useCallback((part: PartId): void => {
    const { graph, run, say, select } = store.getState();
    const frame = desk.current?.getBoundingClientRect();
    if (!frame) return;
    const edit = placeEdit(graph, part, view.unitsAt({ x: frame.left + frame.width / 2, y: frame.top + frame.height / 2 }), newId, store.getState().selection);
    if ("reason" in edit) say(edit.reason, "refused");
    else if (run(edit.commands, edit.title)) select([edit.select]);
  }, [store, view]);
  return (
    <div className="flex h-dvh flex-col overflow-hidden bg-desk">
      <TopBar facts={{ jobId: answer.jobId, jobNumber: answer.jobNumber, jobName: answer.jobName, revisionLetter: answer.revisionLetter, sheetNumber: sheet.number, sheetTitle: titleCase(sheet.title) }} mayIssue={answer.may.issue} people={people} onFind={find} onFit={fit} />
      <Strips onTryAgain={open.saveNow} />
      <div className="flex min-h-0 flex-1">
        <div className="flex min-w-0 flex-1 flex-col">
          <main ref={desk} className="relative min-h-0 flex-1 overflow-hidden">
            <Canvas start={start} />
            {!readOnly && <PartsRail onPlaceInView={placeInView} />}
            <FirstUse onPlaceUtility={() => placeInView("utility")} />
            {!readOnly && <JoinList />}
            {finding && <FindBar onClose={() => setFinding(false)} />}
            <ConflictPanel onSettle={open.settleConflict} />
            <NoticeLine />
          </main>
          <Drawer open={!folds.drawer} onOpen={(shown) => setFolds({ drawer: !shown })} />
        </div>
        <Margin folded={folds.margin} onFold={(margin) => setFolds({ margin })} />
      </div>
    </div>
  );
}

const titleCase = (words: string): string => words.charAt(0) + words.slice(1).toLowerCase();
