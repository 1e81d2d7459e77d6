import type { CounterRevision } from "@/lib/api";
import { dateWords, momentWords } from "@/lib/client/dates";

/** Whether the set may be relied on, in one line that is read first. */
export function SealState({ revision, replaced }: { revision: CounterRevision; replaced: CounterRevision | null }) {
  const { seal } = revision;
  const isVoid = revision.state === "void";
  return (
    <div className={`mt-7 flex items-start gap-5 border-y py-5 ${isVoid ? "border-red" : "border-green"}`}>
      {isVoid ? <VoidMark /> : <SealedMark />}
      <div>
        <p className={`text-heading font-heading stretch-heading ${isVoid ? "text-red" : "text-green"}`}>
          {isVoid ? `The seal of Rev ${revision.letter} is void` : `Rev ${revision.letter} is current and sealed`}
        </p>
        <p className="mt-1 max-w-[56ch] text-finding">
          {isVoid && revision.voidedAt && `The drawing was changed after the seal, ${momentWords(revision.voidedAt)}. The file below is what was sealed; it no longer shows the drawing. `}
          Sealed {dateWords(seal.sealedAt)} by {seal.licensee}, <span className="whitespace-nowrap">{seal.licenseNumber}</span>. Seal code <span className="whitespace-nowrap">{seal.sealCode}</span>.
          {replaced && ` It replaces Rev ${replaced.letter} of ${dateWords(replaced.seal.sealedAt)}.`}
        </p>
      </div>
    </div>
  );
}

function SealedMark() {
  return (
    <svg viewBox="0 0 52 52" className="size-13 shrink-0 text-green" aria-hidden="true">
      <g fill="none" stroke="currentColor" strokeWidth="2"><circle cx="26" cy="26" r="24" /><circle cx="26" cy="26" r="19.5" strokeWidth="1.2" /><path d="M17 27L23.5 33.5L36 19.5" strokeWidth="3.4" /></g>
    </svg>
  );
}

function VoidMark() {
  return (
    <svg viewBox="0 0 52 52" className="size-13 shrink-0 text-red" aria-hidden="true">
      <g fill="none" stroke="currentColor" strokeWidth="2"><circle cx="26" cy="26" r="24" strokeDasharray="5 3.5" /><path d="M15 37L37 15" strokeWidth="3.4" /></g>
    </svg>
  );
}
