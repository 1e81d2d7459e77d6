"use client";

import { useMemo, useState } from "react";
import type { RevisionAnswer } from "@/lib/api";
import { buildGraph } from "@/lib/diagram/graph";
import type { SealOnSheet } from "@/lib/sheets/context";
import { sheetSet } from "@/lib/sheets/set";
import { stateSpace } from "@/lib/states";
import { Primitives } from "@/components/sheets/Primitives";

/** The seal's words and code as the file has them; its picture stands in the file alone, and is not imitated here. */
function sealOf({ seal, state }: RevisionAnswer): SealOnSheet | null {
  if (!seal || state === "sealing") return null;
  return {
    licensee: seal.licensee, title: seal.title, state: seal.licenseState, number: seal.licenseNumber, expiresOn: seal.licenseExpiresOn,
    signedOn: seal.sealedAt.slice(0, 10), sealCode: seal.sealCode, legend: "", graphic: "in the file",
  };
}

/** The sheets of the frozen drawing, as they will be printed; one at a time. */
export function SheetView({ revision }: { revision: RevisionAnswer }) {
  const pages = useMemo(() => {
    const graph = buildGraph(revision.drawing);
    return sheetSet({
      drawing: revision.drawing, graph, states: stateSpace(graph), check: revision.check, digest: revision.digest,
      revisions: [{ letter: revision.letter, description: revision.description || revision.purpose, date: revision.issuedAt.slice(0, 10), by: revision.issuedBy }],
      seal: sealOf(revision), sealPlace: "DRAFT",
    });
  }, [revision]);
  const [shown, setShown] = useState(0);
  const page = pages[Math.min(shown, pages.length - 1)];
  if (!page) return null;
  return (
    <>
      <div role="tablist" aria-label="Sheets" className="flex border-b border-rule bg-vellum">
        {pages.map((each, index) => (
          <button
            key={each.number} type="button" role="tab" aria-selected={index === shown} onClick={() => setShown(index)}
            className={`border-r border-rule px-4 py-1.5 font-lettering text-text ${index === shown ? "bg-paper text-ink" : "text-ink2"}`}
          >
            {each.number}
          </button>
        ))}
      </div>
      <div className="dimmed-sheet min-h-0 flex-1 overflow-auto bg-paper">
        <svg viewBox={`0 0 ${page.widthPx} ${page.heightPx}`} role="img" aria-label={`Sheet ${page.number}, ${page.title.toLowerCase()}`} className="block h-auto min-h-full w-full min-w-[900px]">
          <Primitives primitives={page.primitives} />
        </svg>
      </div>
    </>
  );
}
