"use client";
import { memo, useState } from "react";
import { MarkShape } from "./mark";
import { MARK_WORDS } from "./markKind";
import type { PlacedMark } from "./placeMarks";
import { Wave } from "./wave";

const isOpen = (mark: PlacedMark, opened: string | null): boolean => opened !== null && (mark.finding.key === opened || mark.also.includes(opened));

/** Underlines and numbered marks over the drawing. Pointing at one says its sentence; pressing opens it in the margin. */
export const RedlineLayer = memo(function RedlineLayer({ marks, opened, scale, onOpen, onPoint }: {
  marks: readonly PlacedMark[]; opened: string | null; scale: number; onOpen: (key: string) => void; onPoint: (mark: PlacedMark | null) => void;
}) {
  const [pointed, setPointed] = useState<string | null>(null);
  const point = (mark: PlacedMark | null): void => { setPointed(mark?.finding.key ?? null); onPoint(mark); };
  // Several findings at one tag: its wave is that of the worst, which is the first.
  const waved = marks.filter((mark, index) => marks.findIndex((other) => other.tag.x === mark.tag.x && other.tag.y === mark.tag.y) === index);
  return (
    <g>
      {waved.map((mark) => <g key={mark.finding.key} className="pointer-events-none" aria-hidden="true"><Wave kind={mark.kind} x={mark.tag.x} y={mark.tag.y + mark.tag.height + 1.5} width={mark.tag.width} /></g>)}
      {marks.filter((mark) => isOpen(mark, opened)).map((mark) => (
        <path key="leader" className="pointer-events-none fill-none stroke-red" strokeWidth={1.4} d={`M${mark.x < mark.tag.x ? mark.tag.x : Math.min(mark.x, mark.tag.x + mark.tag.width)} ${mark.tag.y + mark.tag.height + 1.5}L${mark.x} ${mark.y}`} />
      ))}
      {marks.map((mark) => (
        <g
          key={mark.finding.key} role="button" tabIndex={0} data-finding={mark.finding.rule} aria-label={`${MARK_WORDS[mark.kind]} ${mark.number}: ${mark.finding.message}${mark.also.length > 0 ? ` And ${mark.also.length} more here.` : ""}`}
          transform={`translate(${mark.x} ${mark.y}) scale(${scale})`} className={`pointer-events-auto cursor-pointer outline-none ${pointed === mark.finding.key ? "[&_path]:stroke-ink [&_circle]:stroke-ink" : ""}`}
          onPointerEnter={() => point(mark)} onPointerLeave={() => point(null)} onFocus={() => point(mark)} onBlur={() => point(null)}
          onClick={(event) => { event.stopPropagation(); onOpen(mark.finding.key); }}
          onKeyDown={(event) => { if (event.key === "Enter" || event.key === " ") { event.preventDefault(); onOpen(mark.finding.key); } }}
        >
          <circle r={14} className="fill-transparent" />
          {mark.also.length > 0 && <text x={9} y={-7} className="fill-ink2 text-[9px]" aria-hidden="true">+{mark.also.length}</text>}
          <MarkShape kind={mark.kind} number={mark.number} open={isOpen(mark, opened) || mark.finding.key === pointed} />
        </g>
      ))}
    </g>
  );
});
