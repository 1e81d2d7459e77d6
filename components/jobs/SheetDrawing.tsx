"use client";

import { useMemo } from "react";
import { buildGraph } from "@/lib/diagram/graph";
import type { Drawing } from "@/lib/diagram/schema";
import type { CheckResult } from "@/lib/rules/engine/types";
import type { RevisionLine, SealOnSheet } from "@/lib/sheets/context";
import type { Ink } from "@/lib/sheets/primitives";
import { sheetSet } from "@/lib/sheets/set";
import { sheetSvg } from "@/lib/sheets/svg";
import { stateSpace } from "@/lib/states";

const INKS: Readonly<Record<Ink, string>> = {
  ink: "var(--dk)", ink2: "var(--dk2)", paper: "var(--paper)", ww: "var(--ww)", pv: "var(--pv)", bat: "var(--bat)", seal: "var(--sealink)", red: "var(--red)", copper: "var(--copper)",
};

export interface SheetDrawingProps {
  drawing: Drawing;
  check?: CheckResult | null;
  revisions?: readonly RevisionLine[];
  seal?: SealOnSheet | null;
}

function picture({ drawing, check = null, revisions = [], seal = null }: SheetDrawingProps): string | null {
  try {
    const graph = buildGraph(drawing);
    const context = { drawing, graph, states: stateSpace(graph), check, digest: check?.digest ?? "", revisions, seal, sealPlace: check ? "NOT SEALED" as const : "DRAFT" as const };
    const [page] = sheetSet(context);
    return page ? sheetSvg(page.primitives, page.widthPx, page.heightPx, INKS) : null;
  } catch {
    // A half-drawn system may be more than the sheet can lay out; the page around it must not suffer.
    return null;
  }
}

/** The one-line sheet in small, drawn by the same functions as the sheet itself. */
export function SheetDrawing(props: SheetDrawingProps) {
  const { drawing, check, revisions, seal } = props;
  const svg = useMemo(() => picture({ drawing, check: check ?? null, revisions: revisions ?? [], seal: seal ?? null }), [drawing, check, revisions, seal]);
  if (!svg) return <span className="absolute inset-0 grid place-items-center text-text text-ink2">No picture of this drawing</span>;
  // Every word of the drawing is escaped where the SVG is written.
  return (
    <span
      className="block [&_svg]:block [&_svg]:h-auto [&_svg]:w-full [&_text]:font-lettering [&_text[font-family*=Narrow]]:font-lettering-narrow"
      aria-hidden="true" dangerouslySetInnerHTML={{ __html: svg }}
    />
  );
}
