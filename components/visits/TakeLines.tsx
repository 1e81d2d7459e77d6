"use client";

import type { VisitLine } from "@/lib/diagram/fromVisit";

interface Props { lines: readonly VisitLine[]; taken: ReadonlySet<string>; wanted: ReadonlySet<string>; onTick: (key: string, on: boolean) => void }

/** Each value that would be set: where, what it is now, what it would be. */
export function TakeLines({ lines, taken, wanted, onTick }: Props) {
  const groups = [...new Set(lines.map((line) => line.target))];
  return (
    <div className="px-6 py-4 phone:px-4">
      {groups.map((target) => (
        <fieldset key={target} className="mb-4 min-w-0">
          <legend className="w-full border-b border-ink pb-1 text-finding font-heading">{target}</legend>
          {lines.filter((line) => line.target === target).map((line) => {
            const open = line.needs === null || wanted.has(line.needs);
            return (
              <label key={line.key} className={`grid min-h-target grid-cols-[24px_minmax(140px,240px)_minmax(0,1fr)] items-center gap-x-3 border-b border-g2 py-2 text-finding phone:grid-cols-[28px_minmax(0,1fr)] ${open ? "cursor-pointer" : "text-ink3"}`}>
                <input type="checkbox" className="size-5 accent-[var(--ink)]" checked={taken.has(line.key)} disabled={!open} onChange={(event) => onTick(line.key, event.target.checked)} />
                <span className="min-w-0 text-ink2">{line.field}</span>
                <span className="min-w-0 phone:col-start-2">
                  {line.before && <><s className="text-ink3">{line.before}</s><span className="sr-only"> becomes</span><span aria-hidden="true"> → </span></>}
                  <span className="font-strong">{line.after}</span>
                  {line.replaces && <span className="ml-2 border border-ochre px-1 text-label text-ochre">replaces</span>}
                  {line.caution && <span className="mt-0.5 block text-body text-ink2">{line.caution}</span>}
                </span>
              </label>
            );
          })}
        </fieldset>
      ))}
    </div>
  );
}
