"use client";
import { useCallback, type ReactNode } from "react";
import { pointToUnits } from "./sheetUnits";
import type { Point } from "@/lib/diagram/schema";
import { ReactFlowProvider, useReactFlow, useViewport } from "reactflow";

/** Lettering on the sheet is 13 px and more at 100 %; below this zoom it would fall under 11 px, so ratings go and tags grow. */
export const DETAIL_ZOOM = 0.8;
export const ZOOM = { least: 0.25, most: 4, step: 1.25 } as const;

const reduced = (): boolean => typeof matchMedia !== "undefined" && matchMedia("(prefers-reduced-motion: reduce)").matches;
/** Length of a view change, ms; none where the person asks for less motion. */
export const viewTime = (): number => (reduced() ? 0 : 150);

/** Everything that shows or moves the view stands inside this. */
export const CanvasProvider = ({ children }: { children: ReactNode }) => <ReactFlowProvider>{children}</ReactFlowProvider>;

/** The view for the top bar and the keyboard: zoom as a factor, and ways to change it. */
export function useCanvasView() {
  const flow = useReactFlow();
  const { zoom } = useViewport();
  const to = useCallback((factor: number) => { void flow.zoomTo(Math.max(ZOOM.least, Math.min(ZOOM.most, factor)), { duration: viewTime() }); }, [flow]);
  const fitSheet = useCallback((width: number, height: number) => {
    void flow.fitBounds({ x: 0, y: 0, width, height }, { padding: 0.02, duration: viewTime() });
  }, [flow]);
  const unitsAt = useCallback((client: Point): Point => pointToUnits(flow.screenToFlowPosition(client)), [flow]);
  return { zoom, unitsAt, zoomIn: () => to(zoom * ZOOM.step), zoomOut: () => to(zoom / ZOOM.step), zoomTo: to, fitSheet };
}
