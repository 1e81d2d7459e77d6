"use client";

import { useEffect, useState } from "react";
import { buildGraph } from "@/lib/diagram/graph";
import type { Drawing } from "@/lib/diagram/schema";
import { startChecker } from "@/lib/client/checker";
import { sheetSet } from "@/lib/sheets/set";
import type { SheetPage } from "@/lib/sheets/context";
import { stateSpace } from "@/lib/states";

export interface Preview { pages: SheetPage[] | null; error: string | null }

/** Sheets of the drawing as it is now, with the check's line on them. They are drafts: no seal, no revision. */
export function usePreview(drawing: Drawing | undefined): Preview {
  const [preview, setPreview] = useState<Preview>({ pages: null, error: null });
  useEffect(() => {
    if (!drawing) return undefined;
    const checker = startChecker((check, checked) => {
      try {
        const graph = buildGraph(checked);
        const pages = sheetSet({ drawing: checked, graph, states: stateSpace(graph), check, digest: check.digest, revisions: [], seal: null, sealPlace: "DRAFT" });
        setPreview({ pages, error: null });
      } catch {
        setPreview({ pages: null, error: "The sheets of this drawing could not be laid out." });
      }
    }, (reason) => setPreview({ pages: null, error: `The checker stopped: ${reason}` }));
    checker.request(drawing);
    return checker.stop;
  }, [drawing]);
  return preview;
}
