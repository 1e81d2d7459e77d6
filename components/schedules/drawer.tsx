"use client";
import { useCallback, useMemo, useRef, useState } from "react";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { markKind } from "@/components/diagram/redlines/markKind";
import { conductorGrid, equipmentGrid, racewayGrid, type ScheduleGrid, type ScheduleRow } from "./scheduleGrid";
import { Grid } from "./grid";
import type { CellMark, GridChange, GridColumn } from "./gridTypes";
import type { Finding } from "@/lib/rules/engine/types";

const TABS = [
  { id: "conductors", title: "Conductors", build: conductorGrid },
  { id: "raceways", title: "Raceways", build: racewayGrid },
  { id: "equipment", title: "Equipment", build: equipmentGrid },
] as const;
export type DrawerTab = (typeof TABS)[number]["id"];
const NONE: readonly Finding[] = [];
const LEAST = 130;

/** Schedules under the sheet, one tab each; rows and the canvas selection go together, edits pass the same gate as everywhere. */
export function Drawer({ open, onOpen }: { open: boolean; onOpen: (open: boolean) => void }) {
  const store = useEditorStore();
  const graph = useEditor((editor) => editor.graph);
  const [tab, setTab] = useState<DrawerTab>("conductors");
  const [height, setHeight] = useState(234);
  const grids = useMemo(() => Object.fromEntries(TABS.map(({ id, build }) => [id, build(graph)])) as Record<DrawerTab, ScheduleGrid>, [graph]);
  const tabs = useRef<HTMLDivElement>(null);
  const drag = (event: React.PointerEvent): void => {
    const start = { y: event.clientY, height };
    event.currentTarget.setPointerCapture(event.pointerId);
    const move = (moved: PointerEvent): void => setHeight(Math.max(LEAST, Math.min(window.innerHeight - 220, start.height + start.y - moved.clientY)));
    const up = (): void => { window.removeEventListener("pointermove", move); window.removeEventListener("pointerup", up); };
    window.addEventListener("pointermove", move);
    window.addEventListener("pointerup", up);
  };
  return (
    <section aria-label="Schedules" className="relative z-[8] flex flex-none flex-col border-t-[1.5px] border-ink bg-panel" style={{ height: open ? height : 29 }}>
      {open && <div className="absolute -top-1.5 left-0 right-0 h-2.5 cursor-ns-resize" onPointerDown={drag} role="separator" aria-orientation="horizontal" aria-label="Height of the schedules" aria-valuenow={height} tabIndex={0} onKeyDown={(event) => { if (event.key === "ArrowUp" || event.key === "ArrowDown") { event.preventDefault(); event.stopPropagation(); setHeight((now) => Math.max(LEAST, now + (event.key === "ArrowUp" ? 28 : -28))); } }} />}
      <div ref={tabs} role="tablist" aria-label="Schedules" className="flex h-7 flex-none items-stretch bg-desk">
        {TABS.map(({ id, title }) => (
          <button
            key={id} type="button" role="tab" aria-selected={open && tab === id} aria-expanded={open && tab === id} tabIndex={tab === id ? 0 : -1}
            className={`border-r border-ink px-3 text-label stretch-label ${open && tab === id ? "bg-paper font-heading text-ink" : "bg-panel text-ink2"}`}
            onClick={() => { setTab(id); onOpen(!(open && tab === id)); }}
            onKeyDown={(event) => {
              const step = event.key === "ArrowRight" ? 1 : event.key === "ArrowLeft" ? -1 : 0;
              if (!step) return;
              event.stopPropagation();
              const next = TABS[(TABS.findIndex((each) => each.id === id) + step + TABS.length) % TABS.length];
              if (next) { setTab(next.id); (tabs.current?.children[TABS.indexOf(next)] as HTMLElement | undefined)?.focus(); }
            }}
          >
            {title} <span className="ml-0.5 font-normal text-ink3">{grids[id].rows.length}</span>
          </button>
        ))}
        <span className="flex-1" />
        <button type="button" className="border-l border-ink bg-panel px-3 text-label text-ink2 stretch-label" aria-expanded={open} onClick={() => onOpen(!open)}>{open ? "Close drawer" : "Open drawer"}</button>
      </div>
      {open && <div className="min-h-0 flex-1" role="tabpanel" aria-label={TABS.find((each) => each.id === tab)?.title}><ScheduleView key={tab} grid={grids[tab]} store={store} /></div>}
    </section>
  );
}

function ScheduleView({ grid, store }: { grid: ScheduleGrid; store: ReturnType<typeof useEditorStore> }) {
  const selection = useEditor((editor) => editor.selection);
  const readOnly = useEditor((editor) => editor.readOnly);
  const findings = useEditor((editor) => editor.check?.findings ?? NONE);
  const selected = useMemo(() => new Set(selection.map((ref) => `${ref.collection}/${ref.id}`)), [selection]);
  const marks = useMemo(() => {
    const map = new Map<string, CellMark>();
    const put = (key: string, mark: CellMark): void => { if (!map.has(key)) map.set(key, mark); };
    for (const finding of findings) {
      if (finding.accepted) continue;
      const mark = { kind: markKind(finding), statement: finding.message };
      put(`${finding.anchor.collection}/${finding.anchor.id}/${finding.field ?? "tag"}`, mark);
      for (const field of finding.fields) put(`${field.ref.collection}/${field.ref.id}/${field.field}`, mark);
    }
    return map;
  }, [findings]);
  const mark = useCallback((row: ScheduleRow, column: GridColumn<ScheduleRow>): CellMark | null => {
    for (const field of grid.fieldsOf(row, column.id)) {
      const found = marks.get(`${row.ref.collection}/${row.ref.id}/${field}`);
      if (found) return found;
    }
    return null;
  }, [grid, marks]);
  const change = useCallback((changes: readonly GridChange<ScheduleRow>[], title: string): string | null => {
    const commands = [];
    for (const each of changes) {
      const answer = grid.command(each.row, each.column.id, each.text);
      if ("reason" in answer) return `${each.column.label} of ${each.row.tag}: ${answer.reason}`;
      commands.push(...answer.commands);
    }
    return store.getState().run(commands, title) ? null : store.getState().notice?.text ?? "not accepted";
  }, [grid, store]);
  return (
    <Grid
      label={grid.label} columns={grid.columns} rows={grid.rows} rowKey={(row) => row.key} selected={useSelectedRows(grid, selected)} mark={mark} readOnly={readOnly}
      onSelect={(row) => { store.getState().select([row.ref]); store.getState().show(row.ref); }} onChange={change}
    />
  );
}

const useSelectedRows = (grid: ScheduleGrid, selected: ReadonlySet<string>): ReadonlySet<string> =>
  useMemo(() => new Set(grid.rows.filter((row) => selected.has(`${row.ref.collection}/${row.ref.id}`)).map((row) => row.key)), [grid, selected]);
