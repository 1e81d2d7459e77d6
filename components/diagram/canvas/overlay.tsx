"use client";
import { useMemo, useState } from "react";
import { useViewport } from "reactflow";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { placeMarks, type PlacedMark } from "@/components/diagram/redlines/placeMarks";
import { RedlineLayer } from "@/components/diagram/redlines/redlineLayer";
import { partBox, partTitle } from "@/components/diagram/actions/parts";
import { portPoint } from "@/lib/client/landing";
import type { PartId } from "@/lib/client/editorTypes";
import type { Point } from "@/lib/diagram/schema";
import { PX_PER_UNIT, sheetPx } from "@/lib/sheets/primitives";
import { LandingMark } from "./portDots";
import { pathData, pointToPx } from "./sheetUnits";
import type { JoinPreview } from "./useJoining";
import { DETAIL_ZOOM } from "./view";

const NO_FINDINGS: readonly never[] = [];

/** What lies over the drawing and is not drawn on it: redlines, the circuit being joined, the part being placed. */
export function Overlay({ join, ghost, part }: { join: JoinPreview | null; ghost: Point | null; part: PartId | null }) {
  const { x, y, zoom } = useViewport();
  const store = useEditorStore();
  const graph = useEditor((editor) => editor.graph);
  const findings = useEditor((editor) => editor.check?.findings ?? NO_FINDINGS);
  const opened = useEditor((editor) => editor.opened);
  const [pointed, setPointed] = useState<PlacedMark | null>(null);
  // Marks keep a size that can be hit however far the view is out.
  const scale = zoom < DETAIL_ZOOM ? Math.min(2.4, Math.round((DETAIL_ZOOM / zoom) * 10) / 10 * 1.15) : 1;
  const detail = zoom < DETAIL_ZOOM ? "tags" : "full";
  const marks = useMemo(() => placeMarks(graph, findings, { detail }, scale), [graph, findings, detail, scale]);
  const start = join ? portPoint(graph, join.from) : null;
  const target = join ? join.landing?.point ?? join.to : null;
  const box = part ? partBox(part) : null;
  const screen = (px: number, offset: number): number => px * zoom + offset;
  return (
    <>
      <svg className="pointer-events-none absolute inset-0 z-[5] size-full overflow-hidden" data-testid="redline-layer">
        <g transform={`translate(${x} ${y}) scale(${zoom})`}>
          <RedlineLayer marks={marks} opened={opened} scale={scale} onPoint={setPointed} onOpen={(key) => {
            const { open, select, check } = store.getState();
            const finding = check?.findings.find((each) => each.key === key);
            open(key);
            if (finding) select([finding.anchor]);
          }} />
          {start && target && (
            <>
              <path className="fill-none stroke-copper" strokeWidth={2.6} strokeDasharray="6 4" d={pathData([start, { x: target.x, y: start.y }, target])} />
              {join?.landing && <LandingMark landing={join.landing} {...pointToPx(join.landing.point)} />}
            </>
          )}
          {ghost && box && <rect x={sheetPx(ghost.x + box.x)} y={sheetPx(ghost.y + box.y)} width={box.width * PX_PER_UNIT} height={box.height * PX_PER_UNIT} className="fill-copper/10 stroke-copper" strokeWidth={1.6} strokeDasharray="5 4" />}
        </g>
      </svg>
      {join?.landing && <Tip left={screen(sheetPx(join.landing.point.x), x) + 14} top={screen(sheetPx(join.landing.point.y), y) - 32}>{join.landing.reason ?? "Let go to join here"}</Tip>}
      {ghost && part && <Tip left={screen(sheetPx(ghost.x), x) + 14} top={screen(sheetPx(ghost.y), y) - 34}>{partTitle(part)}</Tip>}
      {pointed && <Tip left={screen(pointed.x, x) + 16} top={screen(pointed.y, y) + 12}>{pointed.finding.message}</Tip>}
    </>
  );
}

function Tip({ left, top, children }: { left: number; top: number; children: string }) {
  return <p className="pointer-events-none absolute z-[6] max-w-80 bg-ink px-2 py-1 text-label text-onink stretch-label" style={{ left, top }}>{children}</p>;
}
