"use client";
import "reactflow/dist/base.css";
import { useCallback, useMemo, useRef, useState, type MouseEvent } from "react";
import ReactFlow, { ConnectionMode, SelectionMode, type EdgeChange, type NodeChange } from "reactflow";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { sameRef } from "@/lib/client/editorTypes";
import type { ElementRef } from "@/lib/diagram/schema";
import { CanvasActionsContext, type CanvasActions } from "./canvasActions";
import { CircuitView } from "./circuitView";
import { ElementView } from "./elementView";
import { createFlow, nodeId, refOf } from "./flow";
import { Overlay } from "./overlay";
import { SHEET_NODE, SheetView } from "./sheetView";
import { UNDERLAY_ID, UnderlayView, underlayNode } from "./underlayView";
import { useDragging } from "./useDragging";
import { useJoining } from "./useJoining";
import { usePlacing } from "./usePlacing";
import { useReveal } from "./useReveal";
import { DETAIL_ZOOM, useCanvasView, ZOOM } from "./view";

const NODE_TYPES = { element: ElementView, sheet: SheetView, underlay: UnderlayView };
const EDGE_TYPES = { circuit: CircuitView };
const MIDDLE_AND_RIGHT = [1, 2];

/** The sheet on the desk: what is drawn, and every gesture on it. */
export function Canvas({ start }: { start: { x: number; y: number; zoom: number } }) {
  const store = useEditorStore();
  const graph = useEditor((editor) => editor.graph);
  const selection = useEditor((editor) => editor.selection);
  const tool = useEditor((editor) => editor.tool);
  const readOnly = useEditor((editor) => editor.readOnly);
  const frame = useRef<HTMLDivElement>(null);
  const { zoom } = useCanvasView();
  const detail = zoom < DETAIL_ZOOM ? "tags" : "full";
  const [flowOf] = useState(createFlow);
  const flow = useMemo(() => flowOf(graph, { detail }), [flowOf, graph, detail]);

  const { onPositions, onDragStop, resize, bend, adjustUnderlay } = useDragging(flow.nodes);
  const { preview, grabPort, pressSheet } = useJoining();
  const { ghost, part, place } = usePlacing(frame);
  useReveal();

  const underlay = useEditor((editor) => (editor.tool.kind === "underlay" ? editor.drawing.sheet.underlay : undefined));
  const nodes = useMemo(() => [SHEET_NODE, ...flow.nodes.map((node) => {
    const selected = selection.some((ref) => nodeId(ref) === node.id);
    return { ...node, selected, draggable: !readOnly && node.data.hit !== "none" && !underlay, selectable: node.data.hit !== "none" };
  }), ...(underlay ? [underlayNode(underlay)] : [])], [flow.nodes, selection, readOnly, underlay]);
  const edges = useMemo(() => flow.edges.map((edge) => ({ ...edge, selected: selection.some((ref) => nodeId(ref) === edge.id) })), [flow.edges, selection]);

  const changeSelection = useCallback((changes: readonly { id: string; selected: boolean }[]): void => {
    if (changes.length === 0) return;
    const { selection: now, select } = store.getState();
    const off = new Set(changes.filter((change) => !change.selected).map((change) => change.id));
    const on = changes.filter((change) => change.selected).map((change) => refOf(change.id));
    const kept = now.filter((ref) => !off.has(nodeId(ref)));
    select([...kept, ...on.filter((ref, index) => !kept.some((other) => sameRef(other, ref)) && on.findIndex((other) => sameRef(other, ref)) === index)]);
  }, [store]);
  const onNodesChange = useCallback((changes: NodeChange[]): void => {
    changeSelection(changes.flatMap((change) => (change.type === "select" && change.id !== SHEET_NODE.id && change.id !== UNDERLAY_ID ? [change] : [])));
    if (!readOnly) onPositions(changes);
  }, [changeSelection, onPositions, readOnly]);
  const onEdgesChange = useCallback((changes: EdgeChange[]): void => {
    changeSelection(changes.flatMap((change) => (change.type === "select" ? [change] : [])));
  }, [changeSelection]);

  const choosePort = useCallback<CanvasActions["choosePort"]>((dot) => {
    const { setTool, say } = store.getState();
    if (dot.taken) say(dot.taken, "refused");
    else setTool({ kind: "join", from: dot.ref });
  }, [store]);
  const select = useCallback((ref: ElementRef, add: boolean): void => {
    const { selection: now, select: choose } = store.getState();
    choose(add ? [...now.filter((other) => !sameRef(other, ref)), ...(now.some((other) => sameRef(other, ref)) ? [] : [ref])] : [ref]);
  }, [store]);
  const actions = useMemo<CanvasActions>(() => ({ grabPort, choosePort, resize, bend, select, adjustUnderlay }), [grabPort, choosePort, resize, bend, select, adjustUnderlay]);

  // While a tool is on, a press on the sheet belongs to the tool, whatever lies there.
  const toTool = (event: MouseEvent): boolean => (tool.kind === "place" || tool.kind === "join") && event.button === 0 && !(tool.kind === "join" && event.target instanceof Element && event.target.closest("[data-port]"));
  const swallow = (event: MouseEvent): void => { if (toTool(event)) { event.stopPropagation(); if (event.type === "mousedown") event.preventDefault(); } };
  return (
    <CanvasActionsContext.Provider value={actions}>
      <div
        ref={frame} className={`dimmed-sheet absolute inset-0 [&_.react-flow__nodesselection]:hidden [&_.react-flow__selection]:border [&_.react-flow__selection]:border-copper [&_.react-flow__selection]:bg-copper/10 ${tool.kind === "place" || tool.kind === "join" ? "[&_*]:!cursor-crosshair" : ""}`} data-testid="canvas" tabIndex={-1}
        onPointerDownCapture={swallow} onMouseDownCapture={swallow}
        onClickCapture={(event) => {
          if (!toTool(event)) return;
          event.stopPropagation();
          const client = { x: event.clientX, y: event.clientY };
          if (tool.kind === "place") place(client);
          else pressSheet(client);
        }}
        onContextMenu={(event) => event.preventDefault()}
      >
        <ReactFlow
          aria-label="Sheet" nodes={nodes} edges={edges} nodeTypes={NODE_TYPES} edgeTypes={EDGE_TYPES} onNodesChange={onNodesChange} onEdgesChange={onEdgesChange} onNodeDragStop={onDragStop} onSelectionDragStop={onDragStop}
          defaultViewport={start} minZoom={ZOOM.least} maxZoom={ZOOM.most} connectionMode={ConnectionMode.Loose} selectionMode={SelectionMode.Full}
          nodesConnectable={false} nodesFocusable={false} edgesFocusable={false} elevateNodesOnSelect={false} disableKeyboardA11y selectionOnDrag panOnDrag={MIDDLE_AND_RIGHT} panOnScroll zoomOnDoubleClick={false}
          deleteKeyCode={null} multiSelectionKeyCode={["Shift", "Control", "Meta"]} selectionKeyCode={null} nodeDragThreshold={3} proOptions={{ hideAttribution: true }}
        />
        <Overlay join={preview} ghost={ghost} part={part} />
      </div>
    </CanvasActionsContext.Provider>
  );
}
