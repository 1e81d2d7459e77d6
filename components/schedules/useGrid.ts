import { useState, type ClipboardEvent, type KeyboardEvent } from "react";
import { fromTabbed, placePaste, rangeOf, toTabbed, type CellPlace } from "./gridText";
import type { GridChange, GridProps } from "./gridTypes";

export interface GridEdit { readonly place: CellPlace; readonly text: string; readonly replace: boolean }

/** Selection, editing, keys and clipboard of a grid; the view only draws it. */
export function useGrid<Row>(props: GridProps<Row>, pageRows: number) {
  const { columns, rows, readOnly } = props;
  const [focus, setFocus] = useState<CellPlace>({ row: 0, column: 0 });
  const [anchor, setAnchor] = useState<CellPlace>({ row: 0, column: 0 });
  const [edit, setEdit] = useState<GridEdit | null>(null);
  const [message, setMessage] = useState<string | null>(null);

  const clamp = (place: CellPlace): CellPlace => ({
    row: Math.max(0, Math.min(rows.length - 1, place.row)), column: Math.max(0, Math.min(columns.length - 1, place.column)),
  });
  const at = clamp(focus);
  const range = rangeOf(at, clamp(anchor));

  const go = (place: CellPlace, extend = false): void => {
    const next = clamp(place);
    setFocus(next);
    if (!extend) setAnchor(next);
    setMessage(null);
    const row = rows[next.row];
    if (row && next.row !== at.row) props.onSelect(row);
  };
  const canEdit = (place: CellPlace): boolean => {
    const row = rows[place.row];
    const column = columns[place.column];
    return !readOnly && row !== undefined && column !== undefined && column.editable(row);
  };
  const begin = (place: CellPlace, typed?: string): void => {
    if (readOnly) return setMessage("This drawing is read-only.");
    if (!canEdit(place)) return setMessage(`${columns[place.column]?.label ?? "This cell"} is worked out from the drawing and cannot be typed.`);
    setMessage(null);
    setEdit({ place, text: typed ?? columns[place.column]?.text(rows[place.row] as Row) ?? "", replace: typed !== undefined });
  };
  /** Sends the changes; cells that may not be edited refuse the whole step. */
  const apply = (cells: readonly { row: number; column: number; text: string }[], title: string): boolean => {
    const locked = cells.find((cell) => !canEdit(cell));
    if (locked) {
      setMessage(readOnly ? "This drawing is read-only." : `Nothing changed: ${columns[locked.column]?.label ?? "a column"} in row ${locked.row + 1} is worked out from the drawing.`);
      return false;
    }
    const changes = cells.map((cell): GridChange<Row> => ({ row: rows[cell.row] as Row, column: columns[cell.column] as GridChange<Row>["column"], text: cell.text }));
    const refusal = changes.length === 0 ? null : props.onChange(changes, title);
    setMessage(refusal ? `Nothing changed: ${refusal}` : null);
    return refusal === null;
  };
  const finish = (move: { row: number; column: number }): void => {
    if (!edit) return;
    const before = columns[edit.place.column]?.text(rows[edit.place.row] as Row);
    if (edit.text !== before && !apply([{ ...edit.place, text: edit.text }], `edit ${columns[edit.place.column]?.label.toLowerCase() ?? "cell"}`)) return;
    setEdit(null);
    go({ row: edit.place.row + move.row, column: edit.place.column + move.column });
  };
  const cellsOf = (text: (row: number, column: number) => string) => {
    const cells: { row: number; column: number; text: string }[] = [];
    for (let row = range.top; row <= range.bottom; row++) for (let column = range.left; column <= range.right; column++) cells.push({ row, column, text: text(row, column) });
    return cells;
  };

  const onEditKey = (event: KeyboardEvent): void => {
    event.stopPropagation();
    if (event.key === "Enter") finish({ row: event.shiftKey ? -1 : 1, column: 0 });
    else if (event.key === "Tab") finish({ row: 0, column: event.shiftKey ? -1 : 1 });
    else if (event.key === "Escape") { setEdit(null); setMessage(null); }
    else return;
    event.preventDefault();
  };
  const onKey = (event: KeyboardEvent): void => {
    const control = event.ctrlKey || event.metaKey;
    const moves: Record<string, CellPlace> = {
      ArrowUp: { row: control ? 0 : at.row - 1, column: at.column }, ArrowDown: { row: control ? rows.length : at.row + 1, column: at.column },
      ArrowLeft: { row: at.row, column: control ? 0 : at.column - 1 }, ArrowRight: { row: at.row, column: control ? columns.length : at.column + 1 },
      Home: { row: control ? 0 : at.row, column: 0 }, End: { row: control ? rows.length : at.row, column: columns.length },
      PageUp: { row: at.row - pageRows, column: at.column }, PageDown: { row: at.row + pageRows, column: at.column },
    };
    const move = moves[event.key];
    if (move) go(move, event.shiftKey);
    else if (event.key === "F2" || event.key === "Enter") begin(at);
    else if (event.key === "Delete" || event.key === "Backspace") apply(cellsOf(() => ""), "clear cells");
    else if (control && event.key.toLowerCase() === "d") apply(cellsOf((_, column) => columns[column]?.text(rows[range.top] as Row) ?? "").filter((cell) => cell.row > range.top), "fill down");
    else if (control && event.key.toLowerCase() === "a") { setAnchor({ row: 0, column: 0 }); setFocus({ row: rows.length - 1, column: columns.length - 1 }); }
    else if (!control && !event.altKey && event.key.length === 1) begin(at, event.key);
    else return;
    event.preventDefault();
    event.stopPropagation();
  };
  const onCopy = (event: ClipboardEvent): void => {
    if (edit) return;
    const lines: string[][] = [];
    for (const cell of cellsOf((row, column) => columns[column]?.text(rows[row] as Row) ?? "")) (lines[cell.row - range.top] ??= []).push(cell.text);
    event.clipboardData.setData("text/plain", toTabbed(lines));
    event.preventDefault();
  };
  const onPaste = (event: ClipboardEvent): void => {
    if (edit) return;
    event.preventDefault();
    event.stopPropagation();
    const { cells, outside } = placePaste(fromTabbed(event.clipboardData.getData("text/plain")), range, rows.length, columns.length);
    if (outside > 0) return setMessage(`Nothing changed: ${outside} pasted ${outside === 1 ? "cell does" : "cells do"} not fit into the grid.`);
    apply(cells, cells.length === 1 ? "paste a cell" : `paste ${cells.length} cells`);
  };
  return { at, range, edit, message, go, begin, setEdit, finish, onKey, onEditKey, onCopy, onPaste };
}
