import { MARK_WORDS, type MarkKind } from "./markKind";

const LETTER: Readonly<Record<MarkKind, string>> = { must: "fill-onred", should: "fill-ochre", data: "fill-blue", note: "fill-blue" };

/** Mark of a redline as SVG content around (0, 0): filled square, circle, dotted circle or speech tick, with its number. */
export function MarkShape({ kind, number, open = false }: { kind: MarkKind; number: number; open?: boolean }) {
  return (
    <g>
      {open && <path className="fill-none stroke-ink" strokeWidth={1.7} d="M-13 -13H13V13H-13Z" />}
      {kind === "must" && <path className="fill-red stroke-red" strokeWidth={1.6} d="M-8.5 -8.5H8.5V8.5H-8.5Z" />}
      {kind === "should" && <circle className="fill-paper stroke-ochre" strokeWidth={1.8} r={9} />}
      {kind === "data" && <circle className="fill-paper stroke-blue" strokeWidth={2} strokeDasharray=".1 4.05" strokeLinecap="round" r={9} />}
      {kind === "note" && <path className="fill-paper stroke-blue" strokeWidth={1.6} d="M-9.5 -8.5H9.5V5.5H-1.5L-6 10.5V5.5H-9.5Z" />}
      <text className={`font-sans ${LETTER[kind]}`} y={kind === "note" ? 2.7 : 4.3} textAnchor="middle" fontSize={number > 99 ? 10 : 12.4} fontWeight={650} style={{ fontStretch: "86%" }}>{number}</text>
    </g>
  );
}

/** The mark beside a sentence. */
export function Mark({ kind, number, open = false, size = 26 }: { kind: MarkKind; number: number; open?: boolean; size?: number }) {
  return (
    <svg className="block flex-none overflow-visible" viewBox="-13.6 -13.6 27.2 27.2" width={size} height={size} role="img" aria-label={`${MARK_WORDS[kind]} ${number}`}>
      <MarkShape kind={kind} number={number} open={open} />
    </svg>
  );
}
