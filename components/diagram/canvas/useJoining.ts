import { useCallback, useEffect, useRef, useState, type PointerEvent as ReactPointerEvent } from "react";
import { useReactFlow } from "reactflow";
import { joinEdit } from "@/components/diagram/actions/joinEdit";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { SELECT, type PortRef } from "@/lib/client/editorTypes";
import { landingAt, type Landing } from "@/lib/client/landing";
import { newId } from "@/lib/client/newId";
import type { Point } from "@/lib/diagram/schema";
import { PX_PER_UNIT } from "@/lib/sheets/primitives";
import type { PortDot } from "./portDots";
import { pointToUnits } from "./sheetUnits";

/** Px on screen around a port within which a press or a drop means it. */
const REACH_PX = 18;
/** Px a press may wander and still be a click. */
const WANDER_PX = 5;

export interface JoinPreview { readonly from: PortRef; readonly to: Point; readonly landing: Landing | null; readonly client: Point }

/**
 * Joining two ports: drag from one to the other, or click one and then the other. The tool in the store says what is
 * going on, so that the keyboard and the rail start and end the same thing.
 */
export function useJoining() {
  const store = useEditorStore();
  const tool = useEditor((editor) => editor.tool);
  const { screenToFlowPosition, getZoom } = useReactFlow();
  const [preview, setPreview] = useState<JoinPreview | null>(null);
  const pressed = useRef<Point | null>(null);
  const from = tool.kind === "join" ? tool.from : null;

  const landing = useCallback((client: Point, start: PortRef | null): { at: Point; landing: Landing | null } => {
    const at = pointToUnits(screenToFlowPosition(client));
    const reach = Math.max(1, REACH_PX / getZoom() / PX_PER_UNIT);
    return { at, landing: landingAt(store.getState().graph, start, at, reach) };
  }, [screenToFlowPosition, getZoom, store]);

  const finish = useCallback((start: PortRef, client: Point): boolean => {
    const { graph, run, say, select, setTool } = store.getState();
    const { landing: found } = landing(client, start);
    if (!found) return false;
    if (found.reason) { say(found.reason, "refused"); return false; }
    const edit = joinEdit(graph, start, found.ref, newId("c"));
    if (run(edit.commands, edit.title)) { setTool(SELECT); select([edit.select]); }
    return true;
  }, [landing, store]);

  const begin = useCallback((start: PortRef, client: Point): void => {
    pressed.current = client;
    store.getState().setTool({ kind: "join", from: start });
  }, [store]);

  const grabPort = useCallback((dot: PortDot, event: ReactPointerEvent): void => {
    if (event.button !== 0 || store.getState().readOnly) return;
    event.preventDefault();
    event.stopPropagation();
    const client = { x: event.clientX, y: event.clientY };
    const current = store.getState().tool;
    // A second click on a port ends the join at it; geometry decides where, as for any other place.
    if (current.kind === "join" && current.from) { pressed.current = null; finish(current.from, client); return; }
    const { landing: here } = landing(client, null);
    if (dot.taken) {
      // An integral part may have its own port at the same place: a battery's breaker stands where its leads leave.
      if (here && here.reason === null) begin(here.ref, client);
      else store.getState().say(dot.taken, "refused");
      return;
    }
    begin(dot.length > 0 && here && here.ref.equipment === dot.ref.equipment && here.ref.port === dot.ref.port ? here.ref : dot.ref, client);
  }, [begin, finish, landing, store]);

  /** A press on the sheet while the circuit tool is on. */
  const pressSheet = useCallback((client: Point): void => {
    const current = store.getState().tool;
    if (current.kind !== "join") return;
    if (current.from) { finish(current.from, client); return; }
    const { landing: found } = landing(client, null);
    if (!found) store.getState().say("Press on a port: they show as small circles.", "refused");
    else if (found.reason) store.getState().say(found.reason, "refused");
    else begin(found.ref, client);
  }, [begin, finish, landing, store]);

  useEffect(() => {
    if (!from) return;
    const move = (event: PointerEvent): void => {
      const client = { x: event.clientX, y: event.clientY };
      const { at, landing: found } = landing(client, from);
      setPreview({ from, to: at, landing: found, client });
    };
    const up = (event: PointerEvent): void => {
      const start = pressed.current;
      pressed.current = null;
      if (!start || Math.hypot(event.clientX - start.x, event.clientY - start.y) <= WANDER_PX) return; // A click: the second one ends it.
      if (!finish(from, { x: event.clientX, y: event.clientY })) store.getState().setTool(SELECT);
    };
    window.addEventListener("pointermove", move);
    window.addEventListener("pointerup", up);
    return () => {
      window.removeEventListener("pointermove", move);
      window.removeEventListener("pointerup", up);
      setPreview(null);
    };
  }, [from, finish, landing, store]);

  return { preview: from ? preview : null, grabPort, pressSheet };
}
