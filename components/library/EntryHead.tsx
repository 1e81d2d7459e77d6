import type { LibraryEntryAnswer } from "@/lib/api";
import { whenInSentence } from "@/lib/client/dates";
import { useChangeEntry } from "@/lib/client/libraryApi";
import { isKindId } from "@/lib/equipment/registry";
import { PartIcon } from "@/components/diagram/chrome/partIcon";
import { Button } from "@/components/ui/Button";
import { Refused } from "@/components/ui/Notes";
import { Sourced } from "./LibraryTable";
import { kindTitle } from "./kinds";

/** What entry this is, how far its values can be trusted, and its way into the archive and back. */
export function EntryHead({ entry }: { entry: LibraryEntryAnswer }) {
  const change = useChangeEntry(entry.id);
  const archive = () => change.mutate({ baseVersion: entry.version, archived: !entry.archived });
  return (
    <>
      <div className="mb-4 flex flex-wrap items-end justify-between gap-4">
        <div className="min-w-0 flex-1 basis-[480px]">
          <h1 className="text-[34px] leading-tight font-heading stretch-heading tracking-[-0.015em] break-words narrow:text-title">{entry.name}</h1>
          <p className="mt-1 flex flex-wrap items-center gap-x-3 text-text text-ink2">
            {isKindId(entry.kind) && <span className="-mx-4"><PartIcon part={entry.kind} /></span>}
            <span>{kindTitle(entry.kind)}</span>
            {entry.keyRating && <span>{entry.keyRating}</span>}
            <span>Version {entry.version}, changed {whenInSentence(entry.changedAt)}</span>
            <Sourced entry={entry} />
          </p>
        </div>
        <div className="flex items-center gap-3">
          <Refused error={change.error} />
          {entry.may.edit && <Button busy={change.isPending} onClick={archive}>{entry.archived ? "Bring back" : "Archive"}</Button>}
        </div>
      </div>
      {entry.archived && <p role="status" className="mb-4 border-l-[3px] border-ink bg-paper px-4 py-3 text-text">It is archived: no drawing is offered it any more. Drawings that hold it keep it.</p>}
      {entry.starter && (
        <p className="mb-4 border-l-[3px] border-ochre bg-paper px-4 py-3 text-text"><strong className="font-heading">Invented example values.</strong> This entry came with the library so that there is something to draw with. No product has these ratings: replace each from the datasheet of what you install, with its page, before a drawing rests on it.</p>
      )}
    </>
  );
}
