import { useCallback, useRef, type PointerEvent as ReactPointerEvent } from "react";
import { useReactFlow, type NodeChange } from "reactflow";
import { bendEdit, moveEdit, resizeEdit, settleMove } from "@/components/diagram/actions/moveEdit";
import { underlayEdit } from "@/components/diagram/actions/underlayEdit";
import { useEditorStore } from "@/components/diagram/editorContext";
import type { DrawingGraph } from "@/lib/diagram/graph";
import type { ElementRef, Point } from "@/lib/diagram/schema";
import { PX_PER_UNIT } from "@/lib/sheets/primitives";
import type { Corner } from "./canvasActions";
import { refOf, type ElementNode } from "./flow";
import { pointToUnits } from "./sheetUnits";

interface Move { graph: DrawingGraph; refs: ElementRef[]; origin: Map<string, Point>; dx: number; dy: number; shown: boolean }

/** Follows the pointer from a press to its release; Escape gives back the drawing as it was. */
function follow(onMove: (event: PointerEvent) => void, onEnd: (kept: boolean) => void): void {
  const move = (event: PointerEvent): void => onMove(event);
  const stop = (kept: boolean): void => {
    window.removeEventListener("pointermove", move);
    window.removeEventListener("pointerup", up);
    window.removeEventListener("keydown", key, true);
    onEnd(kept);
  };
  const up = (): void => stop(true);
  const key = (event: KeyboardEvent): void => {
    if (event.key !== "Escape") return;
    event.stopPropagation();
    stop(false);
  };
  window.addEventListener("pointermove", move);
  window.addEventListener("pointerup", up);
  window.addEventListener("keydown", key, true);
}

/** Moving, resizing and bending by pointer: one gesture is one step, snapped to the grid while it runs. */
export function useDragging(nodes: readonly ElementNode[]) {
  const store = useEditorStore();
  const { screenToFlowPosition } = useReactFlow();
  const moving = useRef<Move | null>(null);

  const onPositions = useCallback((changes: readonly NodeChange[]): void => {
    const positions = changes.flatMap((change) => (change.type === "position" && change.dragging && change.position ? [{ id: change.id, position: change.position }] : []));
    const first = positions[0];
    if (!first) return;
    moving.current ??= {
      graph: store.getState().graph, refs: positions.map(({ id }) => refOf(id)), dx: 0, dy: 0, shown: false,
      origin: new Map(nodes.map((node) => [node.id, node.position])),
    };
    const move = moving.current;
    const origin = move.origin.get(first.id);
    if (!origin) return;
    const dx = Math.round((first.position.x - origin.x) / PX_PER_UNIT);
    const dy = Math.round((first.position.y - origin.y) / PX_PER_UNIT);
    if (dx === move.dx && dy === move.dy) return;
    move.dx = dx;
    move.dy = dy;
    const edit = moveEdit(move.graph, move.refs, dx, dy);
    move.shown = store.getState().preview(edit.commands, edit.title);
  }, [nodes, store]);

  const onDragStop = useCallback((): void => {
    const move = moving.current;
    moving.current = null;
    if (!move?.shown) return;
    if (move.dx === 0 && move.dy === 0) { store.getState().cancel(); return; }
    const edit = settleMove(move.graph, move.refs, move.dx, move.dy);
    if (store.getState().preview(edit.commands, edit.title)) store.getState().commit();
    else store.getState().cancel();
  }, [store]);

  const gesture = useCallback((event: ReactPointerEvent, show: (at: Point, start: Point) => boolean): void => {
    if (event.button !== 0 || store.getState().readOnly) return;
    event.preventDefault();
    event.stopPropagation();
    const start = pointToUnits(screenToFlowPosition({ x: event.clientX, y: event.clientY }));
    follow(
      (moved) => { show(pointToUnits(screenToFlowPosition({ x: moved.clientX, y: moved.clientY })), start); },
      (kept) => { if (kept) store.getState().commit(); else store.getState().cancel(); },
    );
  }, [screenToFlowPosition, store]);

  const resize = useCallback((ref: ElementRef, corner: Corner, event: ReactPointerEvent): void => {
    const { graph, preview } = store.getState();
    gesture(event, (at, start) => {
      const edit = resizeEdit(graph, ref, corner, Math.round(at.x - start.x), Math.round(at.y - start.y));
      return edit ? preview(edit.commands, edit.title) : false;
    });
  }, [gesture, store]);

  const bend = useCallback((circuit: string, segment: number, event: ReactPointerEvent): void => {
    const { graph, preview } = store.getState();
    gesture(event, (at, start) => {
      const edit = bendEdit(graph, circuit, segment, at.x - start.x, at.y - start.y);
      return edit ? preview(edit.commands, edit.title) : false;
    });
  }, [gesture, store]);

  const adjustUnderlay = useCallback((corner: Corner | null, event: ReactPointerEvent): void => {
    const { drawing: { sheet: { underlay } }, preview } = store.getState();
    if (!underlay) return;
    gesture(event, (at, start) => preview([underlayEdit(underlay, corner, at.x - start.x, at.y - start.y)]));
  }, [gesture, store]);

  return { onPositions, onDragStop, resize, bend, adjustUnderlay };
}
