"use client";
import { useVirtualizer } from "@tanstack/react-virtual";
import { useEffect, useId, useRef } from "react";
import { WAVE_CLASS } from "@/components/diagram/redlines/wave";
import { inRange } from "./gridText";
import type { GridColumn, GridProps } from "./gridTypes";
import { useGrid } from "./useGrid";

const ROW = 28;
const HEAD = 46;

/**
 * Schedule as a grid of cells: one tab stop, arrows move, typing replaces, F2 or Enter edits, Enter goes down, Tab right,
 * Esc cancels, ranges copy and paste as tab-separated text. Every change goes through `onChange` as one step or not at all.
 */
export function Grid<Row>(props: GridProps<Row>) {
  const { columns, rows, rowKey } = props;
  const scroller = useRef<HTMLDivElement>(null);
  const id = useId();
  const grid = useGrid(props, 8);
  const { at, range, edit } = grid;
  // The virtualizer keeps its own state by design; nothing here relies on it being memoized.
  // eslint-disable-next-line react-hooks/incompatible-library
  const virtual = useVirtualizer({ count: rows.length, getScrollElement: () => scroller.current, estimateSize: () => ROW, overscan: 6 });
  const lefts = columns.reduce<number[]>((sums, column) => [...sums, (sums.at(-1) ?? 0) + column.width], [0]);
  const width = lefts.at(-1) ?? 0;
  const frozen = columns[0]?.width ?? 0;

  useEffect(() => {
    const element = scroller.current;
    if (!element) return;
    const top = HEAD + at.row * ROW;
    if (top - element.scrollTop < HEAD) element.scrollTop = top - HEAD;
    else if (top + ROW > element.scrollTop + element.clientHeight) element.scrollTop = top + ROW - element.clientHeight;
    const left = lefts[at.column] ?? 0;
    const right = left + (columns[at.column]?.width ?? 0);
    if (at.column > 0 && left - element.scrollLeft < frozen) element.scrollLeft = left - frozen;
    else if (right > element.scrollLeft + element.clientWidth) element.scrollLeft = right - element.clientWidth;
    // Only a move of the focused cell scrolls; a change of widths or rows leaves the view where it is.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [at.row, at.column]);

  const cellId = (row: number, column: number): string => `${id}-${row}-${column}`;
  return (
    <div className="flex h-full min-h-0 flex-col">
      <div
        ref={scroller} role="grid" tabIndex={0} aria-label={props.label} aria-rowcount={rows.length + 1} aria-colcount={columns.length}
        aria-readonly={props.readOnly} aria-multiselectable="true" aria-activedescendant={rows.length > 0 ? cellId(at.row, at.column) : undefined}
        className="relative min-h-0 flex-1 overflow-auto bg-paper stretch-schedule text-body outline-offset-[-2px] [scrollbar-width:thin]"
        onKeyDown={edit ? undefined : grid.onKey} onCopy={grid.onCopy} onPaste={grid.onPaste}
      >
        <GridHead columns={columns} width={width} />
        <div role="rowgroup" className="relative" style={{ height: virtual.getTotalSize(), width }}>
          {virtual.getVirtualItems().map((item) => {
            const row = rows[item.index] as Row;
            const selected = props.selected.has(rowKey(row));
            return (
              <div key={rowKey(row)} role="row" aria-rowindex={item.index + 2} aria-selected={selected} className="absolute left-0 flex" style={{ top: item.start, height: ROW, width }}>
                {columns.map((column, index) => {
                  const focused = item.index === at.row && index === at.column;
                  const editing = edit && edit.place.row === item.index && edit.place.column === index;
                  const mark = props.mark(row, column);
                  const ground = index === 0 ? "sticky left-0 z-10 bg-vellum font-heading border-r-[1.5px] border-r-ink" : selected || (inRange(range, item.index, index) && range.bottom + range.right > range.top + range.left) ? "bg-tint" : "bg-paper";
                  const groupStart = index > 1 && column.group !== columns[index - 1]?.group;
                  return (
                    <div
                      key={column.id} id={cellId(item.index, index)} role="gridcell" aria-colindex={index + 1} aria-selected={inRange(range, item.index, index)}
                      aria-readonly={!column.editable(row)} title={mark?.statement}
                      className={`h-row flex-none overflow-hidden text-ellipsis whitespace-nowrap border-b border-r border-b-g2 border-r-g1 px-1.5 leading-[27px] ${ground} ${column.right ? "text-right" : ""} ${groupStart ? "border-l-[1.5px] border-l-ink" : ""} ${focused ? "outline-2 -outline-offset-2 outline-copper" : ""} ${column.editable(row) ? "" : "text-ink2"}`}
                      style={{ width: column.width }}
                      onMouseDown={(event) => { if (!editing) { grid.go({ row: item.index, column: index }, event.shiftKey); scroller.current?.focus({ preventScroll: true }); event.preventDefault(); } }}
                      onMouseEnter={(event) => { if (event.buttons === 1 && !edit) grid.go({ row: item.index, column: index }, true); }}
                      onDoubleClick={() => grid.begin({ row: item.index, column: index })}
                    >
                      {editing
                        ? <CellInput column={column} text={edit.text} replace={edit.replace} onText={(text) => grid.setEdit({ ...edit, text })} onKey={(event) => { grid.onEditKey(event); if (["Enter", "Tab", "Escape"].includes(event.key)) scroller.current?.focus({ preventScroll: true }); }} onLeave={() => grid.finish({ row: 0, column: 0 })} />
                        : <><span className={mark ? WAVE_CLASS[mark.kind] : ""}>{column.text(row) || (mark ? "not known" : "")}</span>{mark && <span className="sr-only">, {mark.statement}</span>}</>}
                    </div>
                  );
                })}
              </div>
            );
          })}
        </div>
        {rows.length === 0 && <p className="px-3 py-3 text-body text-ink2">Nothing here yet. What is drawn on the sheet is listed here.</p>}
      </div>
      <p role="status" className={grid.message ? "border-t border-ink bg-vellum px-3 py-1 text-label text-red" : "sr-only"}>{grid.message}</p>
    </div>
  );
}

function GridHead<Row>({ columns, width }: { columns: readonly GridColumn<Row>[]; width: number }) {
  return (
    <div role="rowgroup" className="sticky top-0 z-20" style={{ width }}>
      <div role="row" aria-rowindex={1} className="flex bg-vellum">
        {columns.map((column, index) => {
          const start = index === 0 || column.group !== columns[index - 1]?.group;
          return (
            <div key={column.id} role="columnheader" aria-colindex={index + 1} className={`flex-none border-r border-b border-r-g1 border-b-ink bg-vellum px-1.5 text-label leading-none text-ink2 ${index === 0 ? "sticky left-0 z-10 border-r-[1.5px] border-r-ink" : start ? "border-l-[1.5px] border-l-ink" : ""}`} style={{ width: column.width, height: HEAD }}>
              <span aria-hidden={!start} className="block h-[22px] overflow-visible whitespace-nowrap pt-1.5 font-heading text-ink">{start ? column.group : ""}</span>
              <span className={`block overflow-hidden text-ellipsis whitespace-nowrap pt-1.5 ${column.right ? "text-right" : ""}`}>{column.label}{column.unit ? ` ${column.unit}` : ""}</span>
            </div>
          );
        })}
      </div>
    </div>
  );
}

function CellInput<Row>({ column, text, replace, onText, onKey, onLeave }: { column: GridColumn<Row>; text: string; replace: boolean; onText: (text: string) => void; onKey: (event: React.KeyboardEvent) => void; onLeave: () => void }) {
  const input = useRef<HTMLInputElement>(null);
  const list = useId();
  useEffect(() => {
    input.current?.focus();
    if (!replace) input.current?.select();
    // Runs once, when the cell turns into a field.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, []);
  return (
    <>
      <input ref={input} aria-label={column.label} list={column.options ? list : undefined} value={text} onChange={(event) => onText(event.target.value)} onKeyDown={onKey} onBlur={onLeave} className={`h-[24px] w-full bg-paper font-strong outline-none ${column.right ? "text-right" : ""}`} />
      {column.options && <datalist id={list}>{column.options.map((option) => <option key={option} value={option} />)}</datalist>}
    </>
  );
}
