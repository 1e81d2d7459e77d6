"use client";

import { useQuery } from "@tanstack/react-query";
import Link from "next/link";
import { useMemo } from "react";
import { api } from "@/lib/client/api";
import { buildGraph } from "@/lib/diagram/graph";
import type { Drawing } from "@/lib/diagram/schema";
import { oneLine } from "@/lib/sheets/oneline";
import { box, type Ink } from "@/lib/sheets/primitives";
import { sheetSvg } from "@/lib/sheets/svg";
import { paths } from "./paths";

/** Half-size print of ANSI D, px. */
const WIDTH_PX = 17 * 96;
const HEIGHT_PX = 11 * 96;
const INKS: Readonly<Record<Ink, string>> = {
  ink: "var(--dk)", ink2: "var(--dk2)", paper: "var(--paper)", ww: "var(--ww)", pv: "var(--pv)", bat: "var(--bat)", seal: "var(--sealink)", red: "var(--red)", copper: "var(--copper)",
};

function picture(drawing: Drawing): string {
  const frame = [box(24, 24, WIDTH_PX - 48, HEIGHT_PX - 48, { weight: 0.8 }), box(60, 60, WIDTH_PX - 120, HEIGHT_PX - 120, { weight: 2 })];
  // Every lettering is escaped where the SVG is written.
  return sheetSvg([...frame, ...oneLine(buildGraph(drawing))], WIDTH_PX, HEIGHT_PX, INKS);
}

/** The job's sheet in small, drawn from the drawing itself; a click opens it. */
export function SheetPicture({ jobId, changedAt }: { jobId: string; changedAt: string }) {
  const drawing = useQuery({ queryKey: ["drawing-picture", jobId, changedAt], queryFn: () => api.drawing(jobId), staleTime: Infinity });
  const svg = useMemo(() => {
    if (!drawing.data) return null;
    try {
      return picture(drawing.data.drawing);
    } catch {
      return null;
    }
  }, [drawing.data]);
  const empty = drawing.data && Object.keys(drawing.data.drawing.equipment).length === 0;
  return (
    <Link
      href={paths.drawing(jobId)} aria-label={`Open the drawing ${drawing.data?.drawing.sheet.number ?? ""}`}
      className="dimmed-sheet relative block aspect-[17/11] overflow-hidden bg-paper shadow-[0_0_0_1px_var(--rule),3px_4px_0_0_var(--hatch)]"
    >
      {svg && (
        <span
          className="block [&_svg]:block [&_svg]:h-auto [&_svg]:w-full [&_text]:font-lettering [&_text[font-family*=Narrow]]:font-lettering-narrow"
          aria-hidden="true" dangerouslySetInnerHTML={{ __html: svg }}
        />
      )}
      {empty && <span className="absolute inset-0 grid place-items-center font-lettering text-text text-ink2">NOTHING DRAWN YET</span>}
      {drawing.isError && <span className="absolute inset-0 grid place-items-center text-text text-ink2">The picture could not be loaded</span>}
    </Link>
  );
}
