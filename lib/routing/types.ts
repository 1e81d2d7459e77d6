/** Grid units of the sheet; x grows to the right and y downward. */
export interface RoutePoint { readonly x: number; readonly y: number }
export interface RouteBox { readonly x: number; readonly y: number; readonly width: number; readonly height: number }
export type RouteDirection = "left" | "right" | "up" | "down";

/** One end of a line. A direction makes the line leave (or enter) that way; null takes any. */
export interface RouteEnd { readonly point: RoutePoint; readonly direction: RouteDirection | null }

export interface RouteRequest {
  readonly from: RouteEnd;
  readonly to: RouteEnd;
  /** Points the line must pass, in order: bends a person placed, or a lane of a band. */
  readonly via: readonly RoutePoint[];
}

/** What the line has to find its way through. */
export interface RouteField {
  /** Boxes no line may cross. */
  readonly obstacles: readonly RouteBox[];
  /** Lines already drawn: crossing one costs, lying on one costs much more. */
  readonly lines: readonly (readonly RoutePoint[])[];
}

export interface RouteOptions {
  /** Distance kept from boxes, grid units. */
  readonly margin: number;
  /** Distance between parallel lines, grid units. */
  readonly spacing: number;
  /** Price of one bend, in grid units of length. */
  readonly bendCost: number;
  /** Price of crossing a drawn line. */
  readonly crossingCost: number;
  /** Price of each unit of length on top of a drawn line. */
  readonly overlapCost: number;
}

export const DEFAULT_ROUTE_OPTIONS: RouteOptions = { margin: 1, spacing: 1, bendCost: 5, crossingCost: 2.5, overlapCost: 20 };

export const STEPS: Readonly<Record<RouteDirection, RoutePoint>> = {
  left: { x: -1, y: 0 }, right: { x: 1, y: 0 }, up: { x: 0, y: -1 }, down: { x: 0, y: 1 },
};
