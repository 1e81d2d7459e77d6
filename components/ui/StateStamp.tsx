import type { JobState } from "@/lib/workflow";

const LOOKS: Record<JobState, { word: string; className: string }> = {
  draft: { word: "Draft", className: "border border-dashed border-ink" },
  "in review": { word: "In review", className: "border border-ink bg-vellum" },
  returned: { word: "Returned", className: "border-2 border-ink font-heading" },
  sealing: { word: "Being sealed", className: "border border-dashed border-green text-green" },
  sealed: { word: "Sealed", className: "border border-green px-3 font-heading text-green [box-shadow:inset_0_0_0_2px_var(--paper),inset_0_0_0_3px_var(--green)]" },
  superseded: { word: "Superseded", className: "border border-rule text-ink2" },
  void: { word: "Void", className: "border border-rule text-ink2 line-through" },
};

/** State as a rubber stamp; the states differ by outline first, by color second. */
export function StateStamp({ state }: { state: JobState }) {
  const { word, className } = LOOKS[state];
  return <span className={`inline-flex h-[26px] items-center bg-paper px-2.5 text-text font-strong whitespace-nowrap ${className}`}>{word}</span>;
}
