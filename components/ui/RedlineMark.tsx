/** Kinds of marks in the margin, told apart by shape first. */
export type MarkKind = "must-fix" | "should-fix" | "needs-data" | "note";

const SHAPES: Record<MarkKind, { path: string; className: string; letter: string; y: number; dash?: string }> = {
  "must-fix": { path: "M-8.5 -8.5H8.5V8.5H-8.5Z", className: "fill-red stroke-red", letter: "fill-onred", y: 4.1 },
  "should-fix": { path: "M-9 0A9 9 0 1 1 9 0A9 9 0 1 1 -9 0Z", className: "fill-paper stroke-ochre", letter: "fill-ochre", y: 4.1 },
  "needs-data": { path: "M-9 0A9 9 0 1 1 9 0A9 9 0 1 1 -9 0Z", className: "fill-paper stroke-blue", letter: "fill-blue", y: 4.1, dash: "0.1 4.05" },
  note: { path: "M-9.5 -8.5H9.5V5.5H-1.5L-6 10.5V5.5H-9.5Z", className: "fill-paper stroke-blue", letter: "fill-blue", y: 2.7 },
};
const WORDS: Record<MarkKind, string> = { "must-fix": "must-fix", "should-fix": "should-fix", "needs-data": "needs data", note: "notes" };

/** A mark with its number: a count in lists, the redline's own number elsewhere. */
export function RedlineMark({ kind, number, label }: { kind: MarkKind; number?: number; label?: string }) {
  const shape = SHAPES[kind];
  return (
    <svg viewBox="-13.6 -13.6 27.2 27.2" width="25" height="25" role="img" aria-label={label ?? `${number ?? ""} ${WORDS[kind]}`.trim()} className="inline-block shrink-0 overflow-visible align-middle">
      <path d={shape.path} className={shape.className} strokeWidth="1.8" strokeDasharray={shape.dash} strokeLinecap="round" />
      {number !== undefined && (
        <text y={shape.y} textAnchor="middle" className={`${shape.letter} text-label font-heading stretch-label`}>{number}</text>
      )}
    </svg>
  );
}

/** Open redlines of a check as a row of marks; the word "none" when there are none. */
export function RedlineCounts({ counts }: { counts: { mustFix: number; shouldFix: number; needsData: number } | null }) {
  if (!counts) return <span className="text-ink3">not checked</span>;
  if (counts.mustFix + counts.shouldFix + counts.needsData === 0) return <span className="text-ink3">none</span>;
  return (
    <span className="inline-flex items-center gap-1">
      {counts.mustFix > 0 && <RedlineMark kind="must-fix" number={counts.mustFix} />}
      {counts.shouldFix > 0 && <RedlineMark kind="should-fix" number={counts.shouldFix} />}
      {counts.needsData > 0 && <RedlineMark kind="needs-data" number={counts.needsData} />}
    </span>
  );
}
