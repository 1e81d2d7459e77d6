import { useQueryClient } from "@tanstack/react-query";
import { useMemo, useState } from "react";
import type { LibraryData, LibraryEntryAnswer } from "@/lib/api";
import { ApiProblem } from "@/lib/client/api";
import { libraryKeys, useChangeEntry } from "@/lib/client/libraryApi";
import { kindDefinition } from "@/lib/equipment/registry";
import { kept, mergeDrafts, sameDraft, withTheirs, type EntryDraft } from "./entryDraft";

interface Base { version: number; draft: EntryDraft }
const baseOf = (entry: LibraryEntryAnswer): Base => ({ version: entry.version, draft: { name: entry.name, data: entry.data } });

/** The entry as somebody else kept it, out of the refusal of a save. */
function theirsOf(error: unknown): Base | null {
  if (!(error instanceof ApiProblem) || error.code !== "entry-changed") return null;
  const { version, name, data } = error.body as unknown as { version: number; name: string; data: LibraryData };
  return { version, draft: { name, data } };
}

/**
 * What is typed about an entry, until it is kept as a version. Typing is never lost: not by a refusal, nor by what somebody else kept
 * meanwhile, which is joined with it before it is saved again.
 */
export function useEntryForm(entry: LibraryEntryAnswer) {
  const definition = kindDefinition(entry.kind);
  const [base, setBase] = useState(() => baseOf(entry));
  const [draft, setDraft] = useState(base.draft);
  const [note, setNote] = useState("");
  const [typing, setTyping] = useState(false);
  const [conflict, setConflict] = useState<Base | null>(null);
  const [sides, setSides] = useState<ReadonlySet<string>>(new Set());
  // A new number makes new fields: text that was not taken goes with the old ones.
  const [round, setRound] = useState(0);
  const [savedVersion, setSavedVersion] = useState<number | null>(null);
  const client = useQueryClient();
  const change = useChangeEntry(entry.id);
  const changed = !sameDraft(draft, base.draft);

  // What others keep is shown as long as nothing was typed here; otherwise saving finds it.
  if (!changed && !typing && (entry.version !== base.version || entry.name !== base.draft.name)) {
    setBase(baseOf(entry));
    setDraft(baseOf(entry).draft);
  }
  const merge = useMemo(() => (conflict ? mergeDrafts(definition, base.draft, draft, conflict.draft) : null), [definition, conflict, base, draft]);

  const send = (from: Base, given: EntryDraft) => {
    const sent = { name: given.name.trim(), data: kept(definition, given.data) };
    setSavedVersion(null);
    change.mutate({ baseVersion: from.version, note: note.trim(), ...(sent.name === from.draft.name ? {} : { name: sent.name }), ...(sameDraft({ ...sent, name: "" }, { ...from.draft, name: "" }) ? {} : { data: sent.data }) }, {
      onSuccess: (answer) => {
        setBase(baseOf(answer));
        // What was typed while it was on its way stays.
        setDraft((now) => (sameDraft(now, given) ? baseOf(answer).draft : now));
        setNote("");
        setTyping(false);
        setSavedVersion(answer.version);
      },
      onError: (error) => {
        const theirs = theirsOf(error);
        if (!theirs) return;
        // Its list of versions, and the entry to come back to.
        void client.invalidateQueries({ queryKey: [...libraryKeys.entry(entry.id)] });
        setSides(new Set());
        setConflict(theirs);
      },
    });
  };

  return {
    draft, setDraft, note, setNote, changed: changed || typing, setTyping, conflict, merge, sides, savedVersion, round,
    busy: change.isPending, error: change.error && !theirsOf(change.error) ? change.error : null,
    save: () => (changed ? send(base, draft) : setTyping(false)),
    chooseSide: (part: string, theirs: boolean) => setSides((now) => new Set(theirs ? [...now, part] : [...now].filter((each) => each !== part))),
    /** Saves the joined draft on top of what somebody else kept. */
    saveMerged: () => {
      if (!conflict || !merge) return;
      const joined = [...sides].reduce((now, part) => withTheirs(now, conflict.draft, part), merge.draft);
      setBase(conflict);
      setDraft(joined);
      setConflict(null);
      send(conflict, joined);
    },
    takeBack: () => { setDraft(base.draft); setNote(""); setTyping(false); setConflict(null); setRound((now) => now + 1); change.reset(); },
  };
}
