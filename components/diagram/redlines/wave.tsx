import type { MarkKind } from "./markKind";

/** Path of a hand-drawn-looking wave; `period` and `height` in px, the unevenness repeats so that it never flickers. */
function wavePath(x: number, y: number, width: number, period: number, height: number): string {
  const count = Math.max(2, Math.round(width / period));
  let path = `M${x} ${y}`;
  for (let i = 0; i < count; i++) {
    const uneven = Math.sin(i * 2.7) * 0.28;
    path += `q${period / 4} ${-(height * 2 + uneven)} ${period / 2} ${uneven * 0.4}q${period / 4} ${height * 2 - uneven} ${period / 2} ${-uneven * 0.4}`;
  }
  return path;
}

/** Underline of a finding: tight wave must-fix, wide wave should-fix, dots needs data; a note has none. */
export function Wave({ kind, x, y, width }: { kind: MarkKind; x: number; y: number; width: number }) {
  if (kind === "note") return null;
  if (kind === "data") return <path className="fill-none stroke-blue" d={`M${x} ${y}h${width}`} strokeWidth={2.7} strokeDasharray=".1 5.4" strokeLinecap="round" />;
  return kind === "must"
    ? <path className="fill-none stroke-red" strokeWidth={1.7} strokeLinecap="round" d={wavePath(x, y, width, 5, 2)} />
    : <path className="fill-none stroke-ochre" strokeWidth={1.8} strokeLinecap="round" d={wavePath(x, y, width, 12, 2.1)} />;
}

/** Classes of the same underline under a cell of a schedule. */
export const WAVE_CLASS: Readonly<Record<MarkKind, string>> = {
  must: "underline decoration-wavy decoration-red decoration-1 underline-offset-2",
  should: "underline decoration-wavy decoration-ochre decoration-2 underline-offset-2",
  data: "underline decoration-dotted decoration-blue decoration-2 underline-offset-2",
  note: "",
};
