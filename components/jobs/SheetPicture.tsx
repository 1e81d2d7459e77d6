"use client";

import { useQuery } from "@tanstack/react-query";
import Link from "next/link";
import { api } from "@/lib/client/api";
import { SheetDrawing } from "./SheetDrawing";
import { paths } from "./paths";

export const paperClass = "dimmed-sheet relative block aspect-[17/11] overflow-hidden bg-paper shadow-[0_0_0_1px_var(--rule),3px_4px_0_0_var(--hatch)]";

/** The job's sheet as it is now, in small; a click opens it. */
export function SheetPicture({ jobId, changedAt }: { jobId: string; changedAt: string }) {
  const drawing = useQuery({ queryKey: ["drawing-picture", jobId, changedAt], queryFn: () => api.drawing(jobId), staleTime: Infinity });
  const empty = drawing.data && Object.keys(drawing.data.drawing.equipment).length === 0;
  return (
    <Link href={paths.drawing(jobId)} aria-label={`Open the drawing ${drawing.data?.drawing.sheet.number ?? ""}`} className={paperClass}>
      {drawing.data && <SheetDrawing drawing={drawing.data.drawing} />}
      {empty && <span className="absolute inset-0 grid place-items-center pr-[20%] pb-[18%] font-lettering text-text text-ink2">NOTHING DRAWN YET</span>}
      {drawing.isError && <span className="absolute inset-0 grid place-items-center text-text text-ink2">The picture could not be loaded</span>}
    </Link>
  );
}
