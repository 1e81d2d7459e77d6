"use client";

import { useEffect, useRef } from "react";
import { Button } from "@/components/ui/Button";
import { valueWords, Differences } from "./Differences";
import type { Merge } from "./entryDraft";

interface ConflictPanelProps {
  merge: Merge; version: number;
  /** Parts where their side was chosen. */
  theirs: ReadonlySet<string>; onSide: (part: string, theirs: boolean) => void;
  busy: boolean; onSave: () => void; onGiveUp: () => void;
}

/** Somebody kept a version while this one was typed: both sides of every value that both changed, and what only they changed. */
export function ConflictPanel({ merge, version, theirs, onSide, busy, onSave, onGiveUp }: ConflictPanelProps) {
  const heading = useRef<HTMLHeadingElement>(null);
  // The button that was pressed is gone, and this may be far below it.
  useEffect(() => heading.current?.focus(), [version]);
  return (
    <section aria-labelledby="conflict-heading" className="border-t-[3px] border-ochre bg-vellum px-6 py-4 phone:px-4">
      <h2 id="conflict-heading" ref={heading} tabIndex={-1} className="scroll-mt-6 outline-none text-heading font-heading stretch-heading">Version {version} was kept while you typed</h2>
      <p className="mt-1 max-w-[72ch] text-text text-ink2">Nothing of yours was written, and nothing is lost. {merge.clashes.length > 0 ? "Where both of you changed the same value, choose one; yours is chosen now." : "You changed different values, so both go together."}</p>
      {merge.clashes.length > 0 && (
        <table className="mt-3 w-full border-separate border-spacing-0" aria-label="Values that both changed">
          <thead><tr>{["Value", "Yours", `Version ${version}`].map((each) => <th key={each} className="border-b border-ink px-2 py-1 text-left text-label font-medium text-ink2 first:pl-0">{each}</th>)}</tr></thead>
          <tbody>
            {merge.clashes.map(({ part, lines }) => (
              <tr key={part}>
                <th scope="row" className="border-b border-g1 py-2 pr-2 text-left align-top text-body font-normal">{lines.map((line) => <p key={line.path}>{line.label}</p>)}</th>
                {([false, true] as const).map((side) => (
                  <td key={String(side)} className="border-b border-g1 px-2 py-2 align-top">
                    <label className="flex items-start gap-2 text-text">
                      <input type="radio" name={`side ${part}`} checked={theirs.has(part) === side} onChange={() => onSide(part, side)} className="mt-0.5 size-4 accent-[var(--ink)]" />
                      <span className={theirs.has(part) === side ? "font-strong" : "text-ink2"}>{lines.map((line) => <span key={line.path} className="block">{valueWords(side ? line.now : line.drawn, line.unit)}</span>)}</span>
                    </label>
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      )}
      {merge.taken.length > 0 && (
        <details className="mt-3" open={merge.taken.length <= 8}>
          <summary className="cursor-pointer text-body font-strong">{merge.taken.length === 1 ? "One value that only they changed is taken over" : `${merge.taken.length} values that only they changed are taken over`}</summary>
          <div className="mt-2"><Differences lines={merge.taken} /></div>
        </details>
      )}
      <div className="mt-4 flex flex-wrap gap-2">
        <Button look="primary" busy={busy} onClick={onSave}>Save on top of version {version}</Button>
        <Button disabled={busy} onClick={onGiveUp}>Give up mine</Button>
      </div>
    </section>
  );
}
