import { useVirtualizer } from "@tanstack/react-virtual";
import Link from "next/link";
import { useEffect, type RefObject } from "react";
import type { LibraryLine } from "@/lib/api";
import { whenWords } from "@/lib/client/dates";
import { isKindId } from "@/lib/equipment/registry";
import { PartIcon } from "@/components/diagram/chrome/partIcon";
import { paths } from "@/components/jobs/paths";
import { kindTitle } from "./kinds";

interface LibraryTableProps {
  entries: readonly LibraryLine[];
  total: number;
  chosenId: string | null;
  onChoose: (id: string) => void;
  scroller: RefObject<HTMLDivElement | null>;
  /** Called when the last lines come into sight. */
  onEnd: () => void;
}

const ROW = 36;
const HEAD = "h-8 border-b border-ink bg-paper px-3 text-left text-body font-medium text-ink2";

/** The library's list. Only lines in sight are in the page, so that thousands of entries scroll like ten. */
export function LibraryTable({ entries, total, chosenId, onChoose, scroller, onEnd }: LibraryTableProps) {
  // The virtualizer keeps its own state by design; nothing here relies on it being memoized.
  // eslint-disable-next-line react-hooks/incompatible-library
  const virtual = useVirtualizer({ count: entries.length, getScrollElement: () => scroller.current, estimateSize: () => ROW, overscan: 12, scrollPaddingStart: 32 });
  const shown = virtual.getVirtualItems();
  const last = shown.at(-1)?.index ?? 0;
  useEffect(() => {
    if (last >= entries.length - 20) onEnd();
  }, [last, entries.length, onEnd]);
  const chosenAt = entries.findIndex((each) => each.id === chosenId);
  useEffect(() => {
    if (chosenAt >= 0) virtual.scrollToIndex(chosenAt, { align: "auto" });
  }, [chosenAt, virtual]);
  const before = shown[0]?.start ?? 0;
  const after = virtual.getTotalSize() - (shown.at(-1)?.end ?? 0);
  return (
    <table aria-rowcount={total + 1} aria-label="Entries of the library" className="w-full table-fixed border-separate border-spacing-0">
      <thead className="sticky top-0 z-[1]">
        <tr aria-rowindex={1}>
          <th className={`${HEAD} w-[88px] pl-5`}><span className="sr-only">Symbol</span></th>
          <th className={HEAD}>Name</th>
          <th className={`${HEAD} w-[190px] narrow:w-[160px]`}>Kind</th>
          <th className={`${HEAD} w-[150px] narrow:w-[120px]`}>Maker</th>
          <th className={`${HEAD} w-[150px] narrow:w-[120px]`}>Model</th>
          <th className={`${HEAD} w-[190px] narrow:w-[150px]`}>Key rating</th>
          <th className={`${HEAD} w-[140px] narrow:w-[120px]`}>Ratings</th>
          <th className={`${HEAD} w-[76px] text-right`}>Version</th>
          <th className={`${HEAD} w-[132px] pr-5 text-right`}>Changed</th>
        </tr>
      </thead>
      <tbody>
        {before > 0 && <tr aria-hidden="true"><td colSpan={9} style={{ height: before }} /></tr>}
        {shown.map(({ index }) => {
          const entry = entries[index];
          return entry && <Row key={entry.id} entry={entry} index={index} chosen={entry.id === chosenId} onChoose={onChoose} />;
        })}
        {after > 0 && <tr aria-hidden="true"><td colSpan={9} style={{ height: after }} /></tr>}
      </tbody>
    </table>
  );
}

function Row({ entry, index, chosen, onChoose }: { entry: LibraryLine; index: number; chosen: boolean; onChoose: (id: string) => void }) {
  const cell = `h-9 truncate border-b border-g2 px-3 text-body ${chosen ? "bg-tint" : "group-hover:bg-vellum"}`;
  return (
    <tr aria-rowindex={index + 2} aria-current={chosen || undefined} className="group cursor-default" onClick={() => onChoose(entry.id)}>
      <td className={`${cell} pl-5 ${chosen ? "[box-shadow:inset_5px_0_0_var(--copper)]" : ""}`}>{isKindId(entry.kind) && <PartIcon part={entry.kind} />}</td>
      <td className={cell} title={entry.name}><Link href={paths.libraryEntry(entry.id)} className="text-text font-finding hover:underline">{entry.name}</Link></td>
      <td className={`${cell} text-ink2`} title={kindTitle(entry.kind)}>{kindTitle(entry.kind)}</td>
      <td className={cell} title={entry.make}>{entry.make || <Unknown />}</td>
      <td className={cell} title={entry.model}>{entry.model || <Unknown />}</td>
      <td className={`${cell} tabular-nums`} title={entry.keyRating}>{entry.keyRating || <Unknown />}</td>
      <td className={cell}><Sourced entry={entry} /></td>
      <td className={`${cell} text-right tabular-nums`}>{entry.version}</td>
      <td className={`${cell} pr-5 text-right text-ink2`}>{whenWords(entry.changedAt)}</td>
    </tr>
  );
}

const Unknown = () => <span className="text-ink3" title="not known">–</span>;

/** How many of the known ratings say where they were read. What the starter set holds was read nowhere. */
export function Sourced({ entry }: { entry: Pick<LibraryLine, "starter" | "rated" | "sourced"> }) {
  if (entry.starter) return <span className="text-ochre">invented values</span>;
  if (entry.rated === 0) return <span className="text-ink3">none known</span>;
  return <span className={entry.sourced < entry.rated ? "text-ink2" : "font-medium"}>{entry.sourced} of {entry.rated} sourced</span>;
}
