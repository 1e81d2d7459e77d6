import type { SheetPage } from "@/lib/sheets/context";
import { Primitives } from "./Primitives";

/** One sheet as a picture that takes the width it is given. */
export function SheetPicture({ page, label }: { page: SheetPage; label?: string }) {
  return (
    <svg viewBox={`0 0 ${page.widthPx} ${page.heightPx}`} className="block h-auto w-full bg-paper" {...(label ? { role: "img", "aria-label": label } : { "aria-hidden": true })}>
      <Primitives primitives={page.primitives} />
    </svg>
  );
}
