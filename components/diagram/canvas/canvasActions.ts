import { createContext, useContext, type PointerEvent } from "react";
import type { ElementRef } from "@/lib/diagram/schema";
import type { PortDot } from "./portDots";

/** Corner of a box being resized. */
export type Corner = "nw" | "ne" | "sw" | "se";

/** What parts of the canvas ask the canvas to do; gestures live in one place. */
export interface CanvasActions {
  grabPort: (dot: PortDot, event: PointerEvent) => void;
  choosePort: (dot: PortDot) => void;
  resize: (ref: ElementRef, corner: Corner, event: PointerEvent) => void;
  bend: (circuit: string, segment: number, event: PointerEvent) => void;
  select: (ref: ElementRef, add: boolean) => void;
  /** Moves the background, or with a corner sizes it. */
  adjustUnderlay: (corner: Corner | null, event: PointerEvent) => void;
}
const nothing = (): void => undefined;
export const CanvasActionsContext = createContext<CanvasActions>({ grabPort: nothing, choosePort: nothing, resize: nothing, bend: nothing, select: nothing, adjustUnderlay: nothing });
export const useCanvasActions = (): CanvasActions => useContext(CanvasActionsContext);
