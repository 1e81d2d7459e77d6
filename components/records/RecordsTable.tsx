import { Fragment, useEffect, useRef, type KeyboardEvent } from "react";
import type { RecordLine } from "@/lib/api";
import { dateWords, timeWords } from "@/lib/client/dates";

interface RecordsTableProps { lines: readonly RecordLine[]; chosenId: string | null; onChoose: (id: string) => void }

const HEAD = "h-8 border-b border-ink bg-paper px-3 text-left text-body font-medium text-ink2";

const DAY = "h-7 border-b border-g1 bg-vellum text-left text-body font-strong";

/** The register: a line an entry, days as headings. Arrows choose. */
export function RecordsTable({ lines, chosenId, onChoose }: RecordsTableProps) {
  const onKeyDown = (event: KeyboardEvent) => {
    const step = event.key === "ArrowDown" ? 1 : event.key === "ArrowUp" ? -1 : 0;
    if (step === 0) return;
    event.preventDefault();
    const at = lines.findIndex((each) => each.id === chosenId);
    const next = lines[Math.min(lines.length - 1, Math.max(0, at + step))];
    if (next) onChoose(next.id);
  };
  return (
    <table role="grid" className="w-full table-fixed border-separate border-spacing-0 outline-offset-[-2px]" tabIndex={0} aria-label="Entries, newest first. Arrow keys choose one." aria-activedescendant={chosenId ? `record-${chosenId}` : undefined} onKeyDown={onKeyDown}>
      <thead className="sticky top-0 z-[1]">
        <tr>
          <th className={`${HEAD} w-[96px] pl-5`}>Time</th>
          <th className={`${HEAD} w-[150px]`}>Who</th>
          <th className={HEAD}>What</th>
          <th className={`${HEAD} w-[190px] narrow:w-[116px]`}>Job</th>
          <th className={`${HEAD} w-[132px] pr-5 narrow:hidden`}>From</th>
        </tr>
      </thead>
      <tbody>
        {lines.map((line, index) => {
          const day = dateWords(line.at);
          const before = lines[index - 1];
          return (
            <Fragment key={line.id}>
              {(!before || dateWords(before.at) !== day) && (
                // Two cells: where the last column is left out, nothing may reach into it.
                <tr><th colSpan={4} scope="rowgroup" className={`${DAY} pl-5`}>{day}</th><td className={`${DAY} narrow:hidden`} /></tr>
              )}
              <Row line={line} chosen={line.id === chosenId} onChoose={onChoose} />
            </Fragment>
          );
        })}
      </tbody>
    </table>
  );
}

function Row({ line, chosen, onChoose }: { line: RecordLine; chosen: boolean; onChoose: (id: string) => void }) {
  const row = useRef<HTMLTableRowElement>(null);
  useEffect(() => {
    if (chosen) row.current?.scrollIntoView({ block: "nearest" });
  }, [chosen]);
  const cell = `h-row truncate border-b border-g2 px-3 text-body ${chosen ? "bg-tint" : "group-hover:bg-vellum"}`;
  return (
    // The sticky heading covers 32 px, the day above a line 28 px more.
    <tr ref={row} id={`record-${line.id}`} className="group cursor-default scroll-mt-[60px]" aria-selected={chosen} onClick={() => onChoose(line.id)}>
      <td className={`${cell} pl-5 text-ink2 tabular-nums ${chosen ? "[box-shadow:inset_5px_0_0_var(--copper)]" : ""}`}>{timeWords(line.at)}</td>
      <td className={`${cell} ${line.person ? "" : "text-ink3"}`}>{line.person?.name ?? "Ferrule itself"}</td>
      <td className={cell}><span className="font-medium">{line.words}</span>{line.note && <span className="text-ink2">: {line.note}</span>}</td>
      <td className={cell}>{line.job && <><span className="font-lettering text-text">{line.job.number}</span><span className="text-ink2 narrow:hidden"> {line.job.name}</span></>}</td>
      <td className={`${cell} pr-5 text-ink2 tabular-nums narrow:hidden`}>{line.address}</td>
    </tr>
  );
}
