import { CAUTIONS, CAUTION_TEXT, CAUTION_TITLE } from "@/lib/cautions";

/** The cautions of the trade; stands on every check, sheet and download page. */
export function Caution({ compact = false, className = "" }: { compact?: boolean; className?: string }) {
  return (
    <aside aria-label={CAUTION_TITLE} data-caution="" className={`border-l-[3px] border-ink pl-3 text-label text-ink2 ${className}`}>
      {compact ? (
        <p><strong className="font-heading text-ink">{CAUTION_TITLE}.</strong> {CAUTION_TEXT}</p>
      ) : (
        <>
          <p className="font-heading text-ink">{CAUTION_TITLE}</p>
          {CAUTIONS.map((sentence) => <p key={sentence} className="mt-1">{sentence}</p>)}
        </>
      )}
    </aside>
  );
}
