import type { DataDifference } from "@/lib/equipment/libraryDifferences";
import { showValue } from "@/lib/client/readField";
import type { PropertyValue } from "@/lib/equipment/define";

/** A value with its unit; what is not known says so. */
export function valueWords(value: PropertyValue, unit: string): string {
  const shown = showValue(value);
  return shown === "" ? "not known" : unit ? `${shown} ${unit}` : shown;
}

/** Values that differ, one under the other: what it was, what it became. */
export function Differences({ lines }: { lines: readonly DataDifference[] }) {
  return (
    <ul className="grid gap-2.5">
      {lines.map((line) => (
        <li key={line.path} className="min-w-0 text-text">
          <p className="text-label text-ink3">{line.label}</p>
          <p className="break-words"><span className="text-ink2">{valueWords(line.drawn, line.unit)}</span> <span aria-label="became">→</span> <span className="font-strong">{valueWords(line.now, line.unit)}</span></p>
        </li>
      ))}
    </ul>
  );
}
